using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>The clock angles at which a tube's mesh has vertices: those of all curves, and more where they lie far apart.</summary>
internal sealed class Columns
{
    /// <summary>Columns nearer together than this on the outer skin are one, mm: smaller than any sag, larger than what
    /// single precision loses at 10 m.</summary>
    private const double Narrowest = 2e-3;

    private readonly double _width;

    private Columns(double[] clocks, double width) => (Clocks, _width) = (clocks, width);

    /// <summary>Growing from −π; the column at π is the first one again and not listed.</summary>
    public double[] Clocks { get; }

    /// <summary>Columns for two ends.</summary>
    public static Columns Of(EndRings from, EndRings to, Outline outer, Outline inner, double sag)
    {
        List<double> wanted = [.. outer.Breaks, .. inner.Breaks];
        foreach (EndCurve curve in from.Curves.Concat(to.Curves).Distinct())
        {
            wanted.AddRange(curve.Points.Select(p => p.Clock));
        }

        wanted.Sort();
        double least = Math.Min(outer.HalfHeight, outer.HalfWidth);
        double width = Narrowest / least;

        // A chord over this angle stands off a circle by the sag; other outlines are looked at.
        double widest = 2 * Math.Acos(1 - (sag / least));
        List<double> clocks = [-Math.PI];
        foreach (double clock in wanted)
        {
            if (clock - clocks[^1] > width && Math.PI - clock > width)
            {
                FillUp(clock);
                clocks.Add(clock);
            }
        }

        FillUp(Math.PI);
        return new Columns([.. clocks], width);

        void FillUp(double until)
        {
            if (outer is RoundOutline)
            {
                Fill(clocks, until, widest);
            }
            else
            {
                Halve(clocks, until, outer, inner, sag);
            }
        }
    }

    /// <summary>A curve's t at every column, coming from the left and going to the right: they differ at a step.</summary>
    public (double[] Before, double[] After) Values(EndCurve curve, Func<double, double> exact)
    {
        double[] before = new double[Clocks.Length];
        double[] after = new double[Clocks.Length];
        int next = 0;
        IReadOnlyList<CurvePoint> points = curve.Points;
        for (int i = 0; i < Clocks.Length; i++)
        {
            // Vertices merged into this column lie from it to just right of it, and left of the seam for the first.
            while (next < points.Count && points[next].Clock < Clocks[i] - 1e-12)
            {
                next++;
            }

            int end = next;
            while (end < points.Count && points[end].Clock <= Clocks[i] + _width)
            {
                end++;
            }

            if (i == 0)
            {
                int last = points.Count - 1;
                while (points[last - 1].Clock >= Math.PI - _width)
                {
                    last--;
                }

                (before[i], after[i]) = (points[last].T, points[end - 1].T);
            }
            else if (end > next)
            {
                (before[i], after[i]) = (points[next].T, points[end - 1].T);
            }
            else
            {
                before[i] = after[i] = exact(Clocks[i]);
            }

            next = end;
            if (Math.Abs(before[i] - after[i]) < Narrowest)
            {
                after[i] = before[i];
            }
        }

        return (before, after);
    }

    private static void Fill(List<double> clocks, double until, double widest)
    {
        double from = clocks[^1];
        int parts = (int)Math.Ceiling((until - from) / widest);
        for (int i = 1; i < parts; i++)
        {
            clocks.Add(from + ((until - from) * i / parts));
        }
    }

    private static void Halve(List<double> clocks, double until, Outline outer, Outline inner, double sag)
    {
        double from = clocks[^1];
        double middle = from + ((until - from) / 2);
        if (Sag(outer, from, middle, until) > sag || Sag(inner, from, middle, until) > sag)
        {
            Halve(clocks, middle, outer, inner, sag);
            clocks.Add(middle);
            Halve(clocks, until, outer, inner, sag);
        }
    }

    // How far an outline's point halfway stands off the chord.
    private static double Sag(Outline outline, double from, double middle, double until)
    {
        (Point2 a, Point2 b) = (PointAt(outline, from), PointAt(outline, until));
        Point2 chord = b - a, rise = PointAt(outline, middle) - a;
        return Math.Abs((chord.X * rise.Y) - (chord.Y * rise.X)) / a.DistanceTo(b);
    }

    private static Point2 PointAt(Outline outline, double clock)
    {
        (double sin, double cos) = Math.SinCos(clock);
        double radius = outline.RadiusAt(sin, cos);
        return new(radius * cos, radius * sin);
    }
}
