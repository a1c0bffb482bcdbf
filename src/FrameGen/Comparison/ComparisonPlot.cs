using System.Globalization;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Comparison;

/// <summary>
/// Draws mass against outer size at equal stiffness: a curve for each shape and metal, from the thickest wall to the thinnest, with a ring at
/// the tubes that were compared and a square at the nearest stock sizes.
/// </summary>
public static class ComparisonPlot
{
    private const double Width = 150;
    private const double Height = 110;
    private const double TextHeight = 2.6;
    private const double MarkRadius = 1.1;
    private const int CurvePoints = 60;
    private const double ThinnestWall = 60;
    private const string Frame = "frame";
    private const string Grid = "grid";
    private const string Words = "words";

    private static readonly Ink[] Inks =
    [
        new(0.08, 0.27, 0.60), new(0.80, 0.33, 0.00), new(0.05, 0.45, 0.20), new(0.50, 0.15, 0.55), new(0.65, 0.05, 0.10), new(0.35, 0.35, 0.35),
    ];

    private static readonly double[][] Dashes = [[], [3, 1.2], [0.8, 0.8], [4, 1, 0.8, 1]];

    /// <summary>Draws a comparison.</summary>
    /// <returns>In mm, the picture's own; left of its axes stand the masses, below the sizes.</returns>
    public static Drawing Draw(ShapeComparison comparison)
    {
        ComparedShape[] shapes = [.. comparison.Materials.SelectMany(m => m.Tubes).Select(t => t.Shape).Where(s => s.IsTube).Distinct()];
        Curve[] curves =
        [
            .. comparison.Materials.SelectMany((m, i) => shapes.Select((s, j) => new Curve(LayerName(i, j), m, Points(comparison.Need, s, m)))),
        ];
        Point2[] all = [.. curves.SelectMany(c => c.Points), .. Marks(comparison).Select(m => m.At)];
        var x = new Axis(all.Min(p => p.X), all.Max(p => p.X), Width);
        var y = new Axis(0, all.Max(p => p.Y), Height);
        var shown = new List<Shape>
        {
            new Text(Words, new Point2(0, Height + TextHeight), TextHeight, 0, $"At equal stiffness, {comparison.Need}"),
        };
        AddAxes(shown, x, y);
        foreach (Curve curve in curves.Where(c => c.Points.Count > 1))
        {
            shown.Add(new Polyline(curve.Layer, [.. curve.Points.Select(p => new Point2(x.Place(p.X), y.Place(p.Y)))], Closed: false));
        }

        foreach ((int metal, bool isStock, Point2 at) in Marks(comparison))
        {
            shown.Add(Mark(LayerName(metal, 0), new Point2(x.Place(at.X), y.Place(at.Y)), isStock));
        }

        AddLegend(shown, comparison, shapes);
        return new Drawing(Layers(comparison.Materials.Count, shapes.Length), shown);
    }

    private static string LayerName(int metal, int shape) => string.Create(CultureInfo.InvariantCulture, $"metal-{metal + 1}-shape-{shape + 1}");

    private static List<Layer> Layers(int metals, int shapes)
    {
        var layers = new List<Layer>
        {
            new(Grid, 9, new Pen(0.1, Ink.Grey(0.8), [])), new(Frame, 7, Pen.Black(0.25)), new(Words, 7, Pen.Black(0.2)),
        };
        for (int metal = 0; metal < metals; metal++)
        {
            for (int shape = 0; shape < Math.Max(shapes, 1); shape++)
            {
                layers.Add(new Layer(LayerName(metal, shape), 7, new Pen(0.4, Inks[metal % Inks.Length], Dashes[shape % Dashes.Length])));
            }
        }

        for (int shape = 0; shape < shapes; shape++)
        {
            layers.Add(new Layer(LayerName(-1, shape), 7, new Pen(0.4, Ink.Black, Dashes[shape % Dashes.Length])));
        }

        return layers;
    }

    // Outer size mm and mass kg/m, the wall from nearly solid to thin.
    private static List<Point2> Points(StiffnessNeed need, ComparedShape shape, MaterialComparison metal)
    {
        double thick = 1.02 / shape.LargestWall!.Value;
        var points = new List<Point2>(CurvePoints);
        for (int i = 0; i < CurvePoints; i++)
        {
            double slenderness = thick * Math.Pow(ThinnestWall / thick, i / (CurvePoints - 1.0));
            if (EqualStiffness.Find(shape, metal.Material, need, new WallRule(slenderness, null)) is { } size)
            {
                points.Add(new Point2(size.OuterSize, 1000 * metal.Material.Density * size.Area));
            }
        }

        return points;
    }

    private static IEnumerable<(int Metal, bool IsStock, Point2 At)> Marks(ShapeComparison comparison)
    {
        for (int metal = 0; metal < comparison.Materials.Count; metal++)
        {
            foreach (ComparedTube tube in comparison.Materials[metal].Tubes)
            {
                yield return (metal, false, new Point2(tube.Size.OuterSize, tube.MassPerMetre));
                if (tube.Stock is { } stock)
                {
                    yield return (metal, true, new Point2(stock.Section.OuterSize, stock.MassPerMetre));
                }
            }
        }
    }

    private static Polyline Mark(string layer, Point2 at, bool isStock)
    {
        int corners = isStock ? 4 : 24;
        double radius = isStock ? MarkRadius * Math.Sqrt(2) : MarkRadius;
        return new Polyline(
            layer,
            [
                .. Enumerable.Range(0, corners).Select(i =>
                {
                    (double sin, double cos) = Math.SinCos((2 * Math.PI * i / corners) + (Math.PI / 4));
                    return at + (radius * new Point2(cos, sin));
                }),
            ],
            Closed: true);
    }

    private static void AddAxes(List<Shape> shapes, Axis x, Axis y)
    {
        foreach (double tick in x.Ticks())
        {
            shapes.Add(Polyline.Segment(Grid, new Point2(x.Place(tick), 0), new Point2(x.Place(tick), Height)));
            string words = Axis.Text(tick);
            shapes.Add(new Text(Words, new Point2(x.Place(tick) - (Helvetica.Width(words, TextHeight) / 2), -2 - TextHeight), TextHeight, 0, words));
        }

        foreach (double tick in y.Ticks())
        {
            shapes.Add(Polyline.Segment(Grid, new Point2(0, y.Place(tick)), new Point2(Width, y.Place(tick))));
            string words = Axis.Text(tick);
            shapes.Add(new Text(Words, new Point2(-2 - Helvetica.Width(words, TextHeight), y.Place(tick) - (TextHeight / 2)), TextHeight, 0, words));
        }

        shapes.Add(new Polyline(Frame, [new(0, 0), new(Width, 0), new(Width, Height), new(0, Height)], Closed: true));
        const string Below = "outer size, mm";
        const string Beside = "mass, kg/m";
        shapes.Add(new Text(Words, new Point2((Width - Helvetica.Width(Below, TextHeight)) / 2, -5 - (2.4 * TextHeight)), TextHeight, 0, Below));
        shapes.Add(new Text(Words, new Point2(-14, (Height - Helvetica.Width(Beside, TextHeight)) / 2), TextHeight, Math.PI / 2, Beside));
    }

    private static void AddLegend(List<Shape> shapes, ShapeComparison comparison, ComparedShape[] tubes)
    {
        const double Line = 2 * TextHeight;
        const double Sample = 12;
        double left = Width + 6;
        double at = Height - TextHeight;
        for (int metal = 0; metal < comparison.Materials.Count; metal++)
        {
            Add(LayerName(metal, 0), comparison.Materials[metal].Material.Name);
        }

        at -= Line / 2;
        for (int shape = 0; shape < tubes.Length; shape++)
        {
            Add(LayerName(-1, shape), tubes[shape].Name);
        }

        at -= Line / 2;
        AddMark(isStock: false, "as compared");
        AddMark(isStock: true, "nearest in stock");

        void Add(string layer, string words)
        {
            shapes.Add(Polyline.Segment(layer, new Point2(left, at + (TextHeight / 2)), new Point2(left + Sample, at + (TextHeight / 2))));
            shapes.Add(new Text(Words, new Point2(left + Sample + 2, at), TextHeight, 0, words));
            at -= Line;
        }

        void AddMark(bool isStock, string words)
        {
            shapes.Add(Mark(Words, new Point2(left + (Sample / 2), at + (TextHeight / 2)), isStock));
            shapes.Add(new Text(Words, new Point2(left + Sample + 2, at), TextHeight, 0, words));
            at -= Line;
        }
    }

    private sealed record Curve(string Layer, MaterialComparison Metal, IReadOnlyList<Point2> Points);

    /// <summary>An axis with ticks at 1, 2 or 5 times a power of ten, from one of them to another.</summary>
    private sealed class Axis
    {
        private const int MostTicks = 10;

        private readonly double _step;
        private readonly double _scale;
        private readonly int _first;
        private readonly int _last;

        public Axis(double least, double most, double length)
        {
            // A single size has a range of nothing.
            double range = Math.Max(most - least, most / 100);
            double power = Math.Pow(10, Math.Floor(Math.Log10(range / MostTicks)));
            _step = power * new[] { 1.0, 2, 5, 10 }.First(m => range / (m * power) <= MostTicks);
            _first = (int)Math.Floor(least / _step);
            _last = Math.Max((int)Math.Ceiling(most / _step), _first + 1);
            _scale = length / ((_last - _first) * _step);
        }

        public double Place(double value) => (value - (_first * _step)) * _scale;

        public IEnumerable<double> Ticks() => Enumerable.Range(_first, _last - _first + 1).Select(i => i * _step);

        public static string Text(double tick) => Math.Round(tick, 9).ToString("0.#########", CultureInfo.InvariantCulture);
    }
}
