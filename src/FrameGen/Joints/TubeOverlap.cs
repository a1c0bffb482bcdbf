using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Joints;

/// <summary>Whether the cuts of a short tube's two ends run into each other on any wall line, or all but do.</summary>
internal static class TubeOverlap
{
    private const int Looks = 240;
    private const int Depths = 8;

    /// <summary>
    /// The least length that the cuts leave of any wall line, mm, negative where they overlap; null where every line keeps at
    /// least the tolerance.
    /// </summary>
    public static double? Find(Tube tube, Section section, EndCut from, EndCut to, double tolerance)
    {
        // Cuts bulge within a wall by less than they vary round it: twice what the skins reach is surely clear.
        double reach = Reach(from) + Reach(to) + (2 * section.OuterSize);
        if (tube.Length > 2 * reach)
        {
            return null;
        }

        Outline outer = section.Outline;
        double worst = Crest(from.Surface, to.Surface, section.Bore, outer);

        // Corners are exact on the curves, and a jump may lie beside every look.
        foreach (CurvePoint point in from.Outer.Points)
        {
            worst = Math.Max(worst, point.T + to.Surface.At(point.Clock, outer));
        }

        foreach (CurvePoint point in to.Outer.Points)
        {
            worst = Math.Max(worst, point.T + from.Surface.At(point.Clock, outer));
        }

        return tube.Length - worst < tolerance ? tube.Length - worst : null;
    }

    // The most that both cuts together take from a wall line.
    private static double Crest(EndSurface from, EndSurface to, Outline inner, Outline outer)
    {
        (double worst, double worstClock, double worstShare) = (double.NegativeInfinity, 0, 0);
        for (int i = 0; i < Looks; i++)
        {
            for (int k = 0; k <= Depths; k++)
            {
                Try(2 * Math.PI * i / Looks, (double)k / Depths);
            }
        }

        // The exact crest lies between the looks: halve the stride round the best until nothing is gained.
        double stride = 2 * Math.PI / Looks;
        double depth = 1.0 / Depths;
        for (int step = 0; step < 60; step++)
        {
            (double clock, double share) = (worstClock, worstShare);
            bool better = Try(clock + stride, share) | Try(clock - stride, share) |
                Try(clock, Math.Max(share - depth, 0)) | Try(clock, Math.Min(share + depth, 1));
            if (!better)
            {
                (stride, depth) = (stride / 2, depth / 2);
            }
        }

        return worst;

        // From the outer skin, 0, to the bore, 1.
        bool Try(double clock, double share)
        {
            (double sin, double cos) = Math.SinCos(clock);
            double radius = outer.RadiusAt(sin, cos);
            radius -= (radius - inner.RadiusAt(sin, cos)) * share;
            double taken = from.At(clock, radius) + to.At(clock, radius);
            if (taken <= worst)
            {
                return false;
            }

            (worst, worstClock, worstShare) = (taken, clock, share);
            return true;
        }
    }

    private static double Reach(EndCut cut) =>
        Math.Max(0, Math.Max(cut.Outer.Max, cut.Inner.Max)) +
        Math.Max(cut.Outer.Max - cut.Outer.Min, cut.Inner.Max - cut.Inner.Min);
}
