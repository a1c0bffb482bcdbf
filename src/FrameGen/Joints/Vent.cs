using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>A breathing hole, drilled square to the wall on the top line or on a quarter line beside it.</summary>
/// <param name="Clock">0, π/2 or −π/2, rad: where the papers have a line, and never on the pattern's seam.</param>
/// <param name="T">Of its centre, mm from the end's point into the tube.</param>
/// <param name="Diameter">mm.</param>
public sealed record Vent(double Clock, double T, double Diameter)
{
    /// <summary>What stays between the hole and the cut line, mm: room for the weld.</summary>
    public const double Clear = 10;

    private const int Sides = 72;

    /// <summary>
    /// Chooses the line that lies farthest from all mates, of equal ones the lowest in the frame, and the place on it that is
    /// <see cref="Clear"/> of the cut.
    /// </summary>
    /// <param name="diameter">mm.</param>
    /// <param name="cut">The end.</param>
    /// <param name="outer">The outer skin.</param>
    /// <param name="axes">The tube's local axes.</param>
    internal static Vent Beside(EndCut cut, double diameter, Outline outer, TubeAxes axes)
    {
        (double best, double clock, double lowest) = (double.NegativeInfinity, 0, 0);
        foreach (double line in (ReadOnlySpan<double>)[0, Math.PI / 2, -Math.PI / 2])
        {
            double away = Math.Round(cut.Contacts.Select(c => Away(line, c)).DefaultIfEmpty(0).Min(), 6);
            double height = Math.Round(axes.Radial(line).Z, 6);
            if (away > best || (away == best && height < lowest))
            {
                (best, clock, lowest) = (away, line, height);
            }
        }

        double half = diameter / 2;
        double reach = outer.ClockAt(Math.Min(half, outer.Perimeter / 8));
        double deepest = cut.Outer.Points.Where(p => Math.Abs(p.Clock - clock) <= reach).Select(p => p.T).DefaultIfEmpty(double.NegativeInfinity).Max();
        foreach (double at in (ReadOnlySpan<double>)[clock - reach, clock, clock + reach])
        {
            deepest = Math.Max(deepest, cut.Surface.At(at, outer));
        }

        return new Vent(clock, deepest + Clear + half, diameter);
    }

    /// <summary>The largest hole the drill finds a flat, or half the width of a curve, for, mm.</summary>
    /// <param name="outer">The outer skin.</param>
    internal static double Largest(Outline outer)
    {
        double smaller = Math.Min(outer.HalfHeight, outer.HalfWidth);
        return outer is FlatSidedOutline flat ? 2 * Math.Min(flat.CoreHalfHeight, flat.CoreHalfWidth) : smaller;
    }

    /// <summary>
    /// The drilled circle in the developed pattern: x round the outer skin from the top line, y from the end's point into the tube, mm;
    /// the first point not repeated. Across the tube it is as wide as the drill, so that round a curved skin it is wider.
    /// </summary>
    /// <param name="outer">The outer skin.</param>
    public IReadOnlyList<Point2> Developed(Outline outer)
    {
        (double sin, double cos) = Math.SinCos(Clock);
        OutlineView view = outer.Seen(new Point2(cos, sin), new Point2(-sin, cos));
        var points = new Point2[Sides];
        for (int i = 0; i < Sides; i++)
        {
            (double up, double right) = Math.SinCos(2 * Math.PI * i / Sides);
            double across = Diameter / 2 * right;
            points[i] = new Point2(outer.DistanceAt(Clock + Math.Atan2(across, view.Far(across))), T + (Diameter / 2 * up));
        }

        return points;
    }

    private static double Away(double line, Contact mate)
    {
        if (mate.Clock is not { } clock)
        {
            return 0;
        }

        double apart = Math.Abs(Math.IEEERemainder(line - clock, 2 * Math.PI));
        return mate.SquareCrossing ? Math.Min(apart, Math.PI - apart) : apart;
    }
}
