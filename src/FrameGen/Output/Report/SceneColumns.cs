using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Output.Report;

/// <summary>A cut tube as columns along its wall lines, coarse enough for a screen: the same end curves as the meshes, fewer facets.</summary>
/// <remarks>
/// The first column is at clock −π, the last at π. Where an end curve steps, two columns stand at one clock angle. Between neighbouring
/// columns a curve bends by less than a fiftieth of the tube's half size.
/// </remarks>
internal static class SceneColumns
{
    /// <summary>Values a column: outer x, y, inner x, y (x to the top line, y to clock 90°), then where the outer and the inner skin begin and end, from the from point along the axis; mm.</summary>
    public const int Values = 8;

    private const int Even = 40;
    private const double BendShare = 0.02;
    private const double StepShare = 0.004;

    /// <summary>The columns of a tube, <see cref="Values"/> numbers each.</summary>
    public static double[] Of(CutFrame cut, int index)
    {
        Section section = cut.Sized.SectionOf(index);
        Tube tube = cut.Sized.Model.Tubes[index];
        CutTube part = cut.Tubes[index];
        (Outline outer, Outline bore) = (section.Outline, section.Bore);
        double size = Math.Min(outer.HalfHeight, outer.HalfWidth);
        EndCurve[] curves = [part.From.Outer, part.From.Inner, part.To.Outer, part.To.Inner];
        var columns = new List<double>();
        Span<double> before = stackalloc double[curves.Length];
        Span<double> after = stackalloc double[curves.Length];
        foreach (double clock in Clocks(outer, bore, curves, size * BendShare))
        {
            bool steps = false;
            for (int i = 0; i < curves.Length; i++)
            {
                (before[i], after[i]) = At(curves[i].Points, clock);
                steps |= Math.Abs(before[i] - after[i]) > size * StepShare;
            }

            Add(clock, before);
            if (steps)
            {
                Add(clock, after);
            }
        }

        return [.. columns];

        void Add(double clock, ReadOnlySpan<double> t)
        {
            (double sin, double cos) = Math.SinCos(clock);
            double radius = outer.RadiusAt(sin, cos);
            double inside = bore.IsPoint ? 0 : bore.RadiusAt(sin, cos);
            columns.AddRange([radius * cos, radius * sin, inside * cos, inside * sin, t[0], tube.Length - t[2], t[1], tube.Length - t[3]]);
        }
    }

    /// <summary>Where a curve is at a clock angle, coming from the left and going to the right; −π to π.</summary>
    internal static (double Before, double After) At(IReadOnlyList<CurvePoint> points, double clock)
    {
        (int low, int high) = (0, points.Count - 1);
        while (low < high)
        {
            int middle = (low + high) / 2;
            (low, high) = points[middle].Clock < clock ? (middle + 1, high) : (low, middle);
        }

        // The first point at or past the angle, then the last of those at it.
        CurvePoint right = points[low];
        if (right.Clock > clock && low > 0)
        {
            CurvePoint left = points[low - 1];
            double t = left.T + ((right.T - left.T) * (clock - left.Clock) / (right.Clock - left.Clock));
            return (t, t);
        }

        int last = low;
        while (last + 1 < points.Count && points[last + 1].Clock <= clock)
        {
            last++;
        }

        return (right.T, points[last].T);
    }

    private static List<double> Clocks(Outline outer, Outline bore, EndCurve[] curves, double tolerance)
    {
        const double Same = 1e-9;
        List<double> wanted = [.. Enumerable.Range(0, Even + 1).Select(i => Math.PI * ((2.0 * i / Even) - 1))];
        foreach (IReadOnlyList<double> breaks in (IReadOnlyList<double>[])[outer.Breaks, bore.Breaks])
        {
            // A corner's arc lies between two breaks: three chords for each stretch of them.
            for (int i = 0; i < breaks.Count; i++)
            {
                wanted.Add(breaks[i]);
                double gap = i + 1 < breaks.Count ? breaks[i + 1] - breaks[i] : 0;
                wanted.AddRange([breaks[i] + (gap / 3), breaks[i] + (gap * 2 / 3)]);
            }
        }

        wanted.Sort();
        var clocks = new List<double> { -Math.PI };
        foreach (double clock in wanted)
        {
            if (clock > clocks[^1] + Same && clock <= Math.PI)
            {
                Bend(clocks, clock, curves, tolerance);
                clocks.Add(clock);
            }
        }

        return clocks;
    }

    // Adds clock angles until no curve stands off its chords by more than the tolerance, the worst place first.
    private static void Bend(List<double> clocks, double until, EndCurve[] curves, double tolerance)
    {
        double from = clocks[^1];
        (double worst, double place) = (tolerance, double.NaN);
        foreach (EndCurve curve in curves)
        {
            double left = At(curve.Points, from).After;
            double right = At(curve.Points, until).Before;
            foreach (CurvePoint point in curve.Points)
            {
                if (point.Clock > from && point.Clock < until)
                {
                    double chord = left + ((right - left) * (point.Clock - from) / (until - from));
                    (worst, place) = Math.Abs(point.T - chord) > worst ? (Math.Abs(point.T - chord), point.Clock) : (worst, place);
                }
            }
        }

        if (!double.IsNaN(place))
        {
            Bend(clocks, place, curves, tolerance);
            clocks.Add(place);
            Bend(clocks, until, curves, tolerance);
        }
    }
}
