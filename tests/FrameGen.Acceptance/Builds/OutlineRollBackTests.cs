using System.Globalization;
using FrameGen.Geometry;
using FrameGen.Model;
using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>
/// Patterns of tubes that are not round, and of tubes on mates that are not: read by a foreign reader, rolled back round the outline by
/// walking along it, and held against the mate's shape.
/// </summary>
public class OutlineRollBackTests
{
    private const double Tolerance = 0.02;

    [Theory]
    [InlineData("square 30 x 2 mm", "square 50 x 3 mm", 90, 0, "z")]
    [InlineData("square 30 x 2 mm corner 0 mm", "rect 60 x 40 x 3 mm", 55, 0, "z")]
    [InlineData("square 30 x 2 mm", "square 60 x 3 mm", 70, 4, "[0, 1, 1]")]
    [InlineData("rect 40 x 20 x 2 mm", "round 60.3 x 3 mm", 45, 0, "z")]
    [InlineData("rect 20 x 40 x 2 mm", "round 60.3 x 3 mm", 90, -3, "[1, 0.3, 0]")]
    [InlineData("round 30 x 2 mm", "square 50 x 3 mm", 60, 2, "z")]
    [InlineData("round 25 x 1.5 mm", "rect 40 x 60 x 3 mm", 35, 0, "z")]
    [InlineData("ellipse 36 x 24 x 1.5 mm", "round 60.3 x 3 mm", 90, 0, "z")]
    [InlineData("ellipse 36 x 24 x 1.5 mm", "square 50 x 3 mm", 50, 1, "[1, 1, 0]")]
    [InlineData("round 25 x 1.5 mm", "ellipse 50 x 40 x 2 mm", 65, 2, "z")]
    [InlineData("square 25 x 1.5 mm", "ellipse 60 x 45 x 2 mm", 40, 0, "z")]
    public void A_rolled_back_end_fits_its_mate(string tube, string mate, double degrees, double offset, string up)
    {
        (double sin, double cos) = Math.SinCos(degrees * Math.PI / 180);
        string text = string.Create(CultureInfo.InvariantCulture, $$"""
            framegen: 1
            title: One brace of another shape
            nodes:
              a: [-900 mm, 0 mm, 0 mm]
              b: [900 mm, 0 mm, 0 mm]
              m: {on: main, at: 50 %}
              c: [{{500 * cos:0.######}} mm, {{offset}} mm, {{500 * sin:0.######}} mm]
            tubes:
              main:  {from: a, to: b, group: big}
              brace: {from: {node: m, offset: [0 mm, {{offset}} mm, 0 mm]}, to: c, group: small, up: {{(degrees == 90 && up == "z" ? "x" : up)}}}
            groups:
              big:   {material: E235+N, section: {{mate}}}
              small: {material: E235+N, section: {{tube}}}
            """);
        foreach (string cut in new[] { "contour", "radial" })
        {
            using BuiltFrame built = BuiltFrame.FromText($"{text}\nfabrication: {{cut: {cut}}}\n").Succeeded();
            (double gap, double interference) = Worst(built, tube, mate, cut == "radial");
            Assert.True(gap <= Tolerance && interference <= Tolerance, $"{cut}: gap {gap} mm, interference {interference} mm");
        }
    }

    private static (double Gap, double Interference) Worst(BuiltFrame built, string section, string mateSection, bool radial)
    {
        FrameModel model = built.Model();
        Tube tube = model.Tubes.Single(t => t.Name == "brace");
        Tube mate = model.Tubes.Single(t => t.Name == "main");
        var skin = Shape.Of(section);
        var other = Shape.Of(mateSection);
        (string file, double turn, bool swapped) = BuiltFrame.PartOf(built.FrameJson(), "brace");
        Assert.True(turn == 0 && !swapped);
        var pattern = new RolledPattern(
            built.PathOf("developed", file + ".dxf"), tube.From.Point, tube.To.Point, tube.Axes.Z, skin.Perimeter / (2 * Math.PI));
        Assert.Equal(1, pattern.CutLines);
        Vector3 quarter = tube.Axes.X.Cross(tube.Axes.Z);
        Vector3 mateQuarter = mate.Axes.X.Cross(mate.Axes.Z);
        (double gap, double interference) = (0, 0);
        foreach (Point2 point in pattern.EndCurve(atFrom: true))
        {
            Point2 wall = skin.At(point.X);
            double nearest = double.PositiveInfinity;
            double share = radial ? skin.WallShare(wall) : 0;

            // Radial: somewhere on its ray through the wall it touches, and nowhere is it inside.
            for (int k = 0; k <= (radial ? 400 : 0); k++)
            {
                Point2 at = (1 - (k / 400.0 * share)) * wall;
                Vector3 place = tube.From.Point + (point.Y * tube.Axes.X) + (at.X * tube.Axes.Z) + (at.Y * quarter) - mate.From.Point;
                nearest = Math.Min(nearest, other.Outside(new(place.Dot(mate.Axes.Z), place.Dot(mateQuarter))));
            }

            gap = Math.Max(gap, nearest);
            interference = Math.Max(interference, -nearest);
        }

        return (gap, interference);
    }

    /// <summary>A section as a closed line of many short pieces, and a distance from its definition.</summary>
    private sealed class Shape
    {
        private const int Pieces = 200_000;
        private readonly Point2[] _line;
        private readonly double[] _round;
        private readonly double _height, _width, _wall, _corner;
        private readonly bool _isEllipse;

        private Shape(double height, double width, double wall, double corner, bool isEllipse)
        {
            (_height, _width, _wall, _corner, _isEllipse) = (height, width, wall, corner, isEllipse);
            _line = [.. isEllipse
                ? Enumerable.Range(0, Pieces + 1).Select(i => new Point2(
                    -height / 2 * Math.Cos(2 * Math.PI * i / Pieces), -width / 2 * Math.Sin(2 * Math.PI * i / Pieces)))
                : RoundTheCorners()];
            _round = new double[_line.Length];
            for (int i = 1; i < _line.Length; i++)
            {
                _round[i] = _round[i - 1] + _line[i].DistanceTo(_line[i - 1]);
            }
        }

        public double Perimeter => _round[^1];

        public static Shape Of(string section)
        {
            string[] words = section.Split(' ', StringSplitOptions.RemoveEmptyEntries);
            int at = Array.IndexOf(words, "corner");
            double[] sizes = [.. words[1..(at < 0 ? words.Length : at)].Where(w => double.TryParse(w, CultureInfo.InvariantCulture, out _)).Select(w => double.Parse(w, CultureInfo.InvariantCulture))];
            double wall = sizes[^1];
            double width = sizes.Length == 3 ? sizes[1] : sizes[0];
            bool ellipse = words[0] is "round" or "ellipse";

            // EN 10219-2: sizes are calculated with an outer corner of 2 T for walls up to 6 mm.
            double corner = at < 0 ? 2 * wall : double.Parse(words[at + 1], CultureInfo.InvariantCulture);
            return new Shape(sizes[0], width, wall, corner, ellipse);
        }

        /// <summary>The place at a distance round from the top line.</summary>
        public Point2 At(double x)
        {
            double wanted = Math.Clamp(x + (Perimeter / 2), 0, Perimeter);
            int i = Array.BinarySearch(_round, wanted);
            i = Math.Clamp(i < 0 ? ~i : i, 1, _round.Length - 1);
            double share = (wanted - _round[i - 1]) / (_round[i] - _round[i - 1]);
            return _line[i - 1] + (share * (_line[i] - _line[i - 1]));
        }

        /// <summary>Share of the ray from the skin to the axis that lies in the wall.</summary>
        public double WallShare(Point2 skin)
        {
            (double low, double high) = (0, 1);
            for (int i = 0; i < 50; i++)
            {
                double middle = (low + high) / 2;
                (low, high) = Outside((1 - middle) * skin) > -_wall ? (middle, high) : (low, middle);
            }

            return low;
        }

        /// <summary>How far a point lies outside; negative inside.</summary>
        public double Outside(Point2 point)
        {
            if (!_isEllipse)
            {
                double x = Math.Abs(point.X) - (_height / 2) + _corner;
                double y = Math.Abs(point.Y) - (_width / 2) + _corner;
                return Math.Sqrt(Math.Pow(Math.Max(0, x), 2) + Math.Pow(Math.Max(0, y), 2)) + Math.Min(0, Math.Max(x, y)) - _corner;
            }

            // Nearest place on the ellipse, by golden section in its quarter.
            (double px, double py) = (Math.Abs(point.X), Math.Abs(point.Y));
            double Off(double angle) => new Point2(_height / 2 * Math.Cos(angle), _width / 2 * Math.Sin(angle)).DistanceTo(new(px, py));
            (double low, double high) = (0, Math.PI / 2);
            while (high - low > 1e-9)
            {
                double first = low + (0.381966 * (high - low)), second = high - (0.381966 * (high - low));
                (low, high) = Off(first) < Off(second) ? (low, second) : (first, high);
            }

            double inside = (4 * px * px / (_height * _height)) + (4 * py * py / (_width * _width));
            return inside < 1 ? -Off(low) : Off(low);
        }

        // From the middle of the lower flat round by clock 270, the top line and clock 90.
        private IEnumerable<Point2> RoundTheCorners()
        {
            int steps = _corner > 0 ? 20_000 : 0;
            (double x, double y) = ((_height / 2) - _corner, (_width / 2) - _corner);
            yield return new(-_height / 2, 0);
            foreach ((int sideX, int sideY, double start) in new[] { (-1, -1, Math.PI), (1, -1, 1.5 * Math.PI), (1, 1, 0), (-1, 1, 0.5 * Math.PI) })
            {
                for (int i = 0; i <= steps; i++)
                {
                    double angle = start + (Math.PI / 2 * i / Math.Max(1, steps));
                    yield return new((sideX * x) + (_corner * Math.Cos(angle)), (sideY * y) + (_corner * Math.Sin(angle)));
                }
            }

            yield return new(-_height / 2, 0);
        }
    }
}
