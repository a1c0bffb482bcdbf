using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output.Drawings;

/// <summary>Projects a cut frame on a plane.</summary>
/// <param name="package">The frame's papers.</param>
/// <param name="text">Height of words, mm.</param>
internal sealed class LayoutView(ShopPackage package, double text)
{
    /// <summary>Projected curves are thinned to this, mm.</summary>
    private const double Thin = 0.02;

    private readonly SizedFrame _sized = package.Cut.Sized;

    /// <summary>Draws one side.</summary>
    /// <param name="title">Of the view.</param>
    /// <param name="across">Name of the axis to the right.</param>
    /// <param name="upwards">Name of the axis up.</param>
    /// <param name="right">Unit vector to the right.</param>
    /// <param name="up">Unit vector up.</param>
    public LayoutSide Draw(string title, string across, string upwards, Vector3 right, Vector3 up)
    {
        var shapes = new List<Shape>();
        Vector3 toViewer = right.Cross(up);
        Point2 Flat(Vector3 p) => new(p.Dot(right), p.Dot(up));
        foreach (CutTube tube in package.Cut.Tubes)
        {
            Tube(shapes, tube, toViewer, Flat);
        }

        // Twins that hide each other give the same lines: each is drawn once.
        shapes = [.. shapes.OfType<Polyline>().DistinctBy(Trace, StringComparer.Ordinal)];
        Box2 frame = shapes.Select(s => s.Bounds()).Aggregate((a, b) => a.Union(b));
        Names(shapes, Flat);
        Point2[] nodes = [.. _sized.Model.Nodes.Select(n => Flat(n.Position))];
        Scale(shapes, [.. nodes.Select(n => n.X)], x => new Point2(x, frame.Bottom - (3 * text)), across, isUp: false);
        Scale(shapes, [.. nodes.Select(n => n.Y)], y => new Point2(frame.Left - (3 * text), y), upwards, isUp: true);
        shapes.Add(new Text(PaperLayers.Text, new(frame.Left, frame.Top + (3 * text)), 1.3 * text, 0, title));
        return new LayoutSide(shapes, shapes.Select(s => s.Bounds()).Aggregate((a, b) => a.Union(b)));
    }

    /// <summary>What tells a line from others, to 0.01 mm, whichever way it runs.</summary>
    private static string Trace(Polyline line)
    {
        string[] places = [.. line.Points.Select(p => string.Create(CultureInfo.InvariantCulture, $"{Math.Round(p.X, 2) + 0.0:0.##} {Math.Round(p.Y, 2) + 0.0:0.##};"))];
        string forwards = string.Concat(places);
        string back = string.Concat(places.Reverse());
        return line.Layer + (string.CompareOrdinal(forwards, back) < 0 ? forwards : back);
    }

    private void Tube(List<Shape> shapes, CutTube cut, Vector3 toViewer, Func<Vector3, Point2> flat)
    {
        Tube tube = _sized.Model.Tubes[cut.Tube];
        Outline outline = _sized.SectionOf(cut.Tube).Outline;
        Vector3 Wall(End end, double clock, double t)
        {
            (double sin, double cos) = Math.SinCos(clock);
            return tube[end].Point + (t * tube.Into(end)) + (outline.RadiusAt(sin, cos) * tube.AxesAt(end).Radial(clock));
        }

        // The outermost wall lines to both sides, where the tube does not point at the viewer.
        Vector3 side = tube.Axes.X.Cross(toViewer);
        if (tube.Bent is not null)
        {
            shapes.AddRange(LayoutBends.Draw(tube, cut, outline, toViewer, flat));
        }
        else if (side.Length > 1e-6)
        {
            Point2 a = flat(tube.From.Point), b = flat(tube.To.Point);
            shapes.Add(Polyline.Segment(LayoutDrawing.Axes, a, b));
            side = side.Normalized();
            Point2 direction = new(side.Dot(tube.Axes.Z), -side.Dot(tube.Axes.Y));
            foreach (int sign in (ReadOnlySpan<int>)[-1, 1])
            {
                Point2 far = outline.FarthestAlong(sign * direction);
                double clock = Math.Atan2(far.Y, far.X);
                Point2 start = flat(Wall(End.From, clock, cut.From.Surface.At(clock, outline)));
                Point2 stop = flat(Wall(End.To, clock, cut.To.Surface.At(clock, outline)));
                if (start.DistanceTo(stop) > Thin)
                {
                    shapes.Add(Polyline.Segment(LayoutDrawing.Tubes, start, stop));
                }
            }
        }

        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            // The near half of a cut end; the whole of a flat one that faces the viewer.
            bool whole = cut[end].Kind != CutKind.Cope && -tube.Into(end).Dot(toViewer) > 1e-6;
            var run = new List<Point2>();
            foreach (CurvePoint point in Turned(cut[end].Outer.Points, whole ? null : p => tube.AxesAt(end).Radial(p.Clock).Dot(toViewer) >= -1e-9))
            {
                run.Add(flat(Wall(end, point.Clock, point.T)));
            }

            List<Point2> thinned = Thinned(run);
            if (thinned.Count > 1)
            {
                bool closed = whole && thinned.Count > 3;
                shapes.Add(new Polyline(LayoutDrawing.Tubes, closed ? thinned[..^1] : thinned, closed));
            }
        }
    }

    /// <summary>The points that are asked for, in one run: a run across the seam begins after the gap.</summary>
    private static List<CurvePoint> Turned(IReadOnlyList<CurvePoint> points, Func<CurvePoint, bool>? isNear)
    {
        if (isNear is null || points.All(isNear))
        {
            return [.. points];
        }

        int count = points.Count - 1;
        int start = Enumerable.Range(0, count).FirstOrDefault(i => isNear(points[i]) && !isNear(points[(i + count - 1) % count]));
        return [.. Enumerable.Range(0, count).Select(i => points[(start + i) % count]).TakeWhile(isNear)];
    }

    private static List<Point2> Thinned(List<Point2> points)
    {
        var kept = new List<Point2>();
        foreach (Point2 p in points)
        {
            if (kept.Count == 0 || p.DistanceTo(kept[^1]) > Thin)
            {
                kept.Add(p);
            }
        }

        for (int i = kept.Count - 2; i > 0; i--)
        {
            (Point2 a, Point2 b) = (kept[i - 1], kept[i + 1]);
            double chord = a.DistanceTo(b);
            double off = Math.Abs(((b.X - a.X) * (kept[i].Y - a.Y)) - ((b.Y - a.Y) * (kept[i].X - a.X)));
            if (off <= 0.1 * Thin * chord)
            {
                kept.RemoveAt(i);
            }
        }

        return kept;
    }

    /// <summary>A cross at each place, named after the nodes that are seen there.</summary>
    private void Names(List<Shape> shapes, Func<Vector3, Point2> flat)
    {
        const int MostNames = 3;
        const int MostSteps = 6;
        var taken = new List<Box2>();
        foreach (var place in _sized.Model.Nodes
            .Select(n => (n.Name, At: flat(n.Position)))
            .GroupBy(n => (Math.Round(n.At.X, 1), Math.Round(n.At.Y, 1))))
        {
            string[] names = [.. place.Select(n => n.Name)];
            Point2 at = place.First().At;
            double half = 0.6 * text;
            shapes.Add(Polyline.Segment(LayoutDrawing.Nodes, at - new Point2(half, 0), at + new Point2(half, 0)));
            shapes.Add(Polyline.Segment(LayoutDrawing.Nodes, at - new Point2(0, half), at + new Point2(0, half)));
            string words = string.Join(", ", names.Take(MostNames)) + (names.Length > MostNames ? ", ..." : string.Empty);
            var name = new Text(LayoutDrawing.Nodes, at + new Point2(0.5 * text, 0.5 * text), 0.8 * text, 0, words);
            for (int step = 0; step < MostSteps && taken.Exists(b => b.Overlaps(name.Bounds())); step++)
            {
                name = name with { At = name.At + new Point2(0, 1.2 * text) };
            }

            taken.Add(name.Bounds());
            shapes.Add(name);
        }
    }

    /// <summary>A line with a tick at every node's place, and how far that is from the first; a place too near to the last one has no number.</summary>
    private void Scale(List<Shape> shapes, IReadOnlyList<double> places, Func<double, Point2> at, string axis, bool isUp)
    {
        var display = new DisplayFormat(_sized.Model.Display);
        double[] distinct = [.. places.Order()];
        double first = distinct[0];
        Point2 outwards = isUp ? new(-1, 0) : new(0, -1);
        if (distinct[^1] - first > Thin)
        {
            shapes.Add(Polyline.Segment(LayoutDrawing.Dimensions, at(first), at(distinct[^1])));
        }

        double last = double.NegativeInfinity;
        double ticked = double.NegativeInfinity;
        foreach (double place in distinct)
        {
            if (place - ticked <= 0.05)
            {
                continue;
            }

            ticked = place;
            Point2 start = at(place);
            shapes.Add(Polyline.Segment(LayoutDrawing.Dimensions, start, start + (0.8 * text * outwards)));
            bool isLast = distinct[^1] - place <= 0.05;
            if (place - last < 1.2 * text || (!isLast && distinct[^1] - place < 1.2 * text))
            {
                continue;
            }

            last = place;
            string words = place == first ? $"{axis} 0" : display.LengthNumber(place - first);
            double width = Helvetica.Width(words, 0.8 * text);
            shapes.Add(isUp
                ? new Text(LayoutDrawing.Dimensions, start + new Point2((-1.2 * text) - width, -0.4 * text), 0.8 * text, 0, words)
                : new Text(LayoutDrawing.Dimensions, start + new Point2(0.4 * text, (-1.2 * text) - width), 0.8 * text, Math.PI / 2, words));
        }
    }
}
