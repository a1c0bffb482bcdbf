using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>Which mates an end touches: those that cut at least one of its wall lines, outer or inner, as met.</summary>
internal static class Touching
{
    // A divisor of the sampler's own looks, so that what is seen here is seen there.
    private const int QuickLooks = 16;

    /// <summary>The seat: the first mate that touches, by its place among the mates; −1 where none does.</summary>
    /// <remarks>
    /// A few wall lines nearly always show the first mate at once, and one line is proof. Only where they do not are the
    /// exact pieces of both skins found, so the answer is exact either way.
    /// </remarks>
    public static int Seat(ContourCope cope, Outline inner, Outline outer)
    {
        for (int i = 0; i < QuickLooks; i++)
        {
            if (QuickLook(cope, outer, i) == 0)
            {
                return 0;
            }
        }

        bool[] touched = All(cope, inner, outer, new CurveSampler(), out _);
        return Array.IndexOf(touched, true);
    }

    /// <summary>True where a few wall lines already show that something touches; false proves nothing.</summary>
    public static bool IsSeen(ContourCope cope, Outline outer)
    {
        for (int i = 0; i < QuickLooks; i++)
        {
            if (QuickLook(cope, outer, i) >= 0)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>Which mates touch, by their place among the mates.</summary>
    /// <param name="cope">The end, as met.</param>
    /// <param name="inner">The bore; a point for a rod, whose inner line is its axis.</param>
    /// <param name="outer">The outer skin.</param>
    /// <param name="sampler">Its working lists are used.</param>
    /// <param name="partlyMissing">True where some wall line meets nothing.</param>
    public static bool[] All(ContourCope cope, Outline inner, Outline outer, CurveSampler sampler, out bool partlyMissing)
    {
        bool[] touched = new bool[cope.Mates.Count];
        bool missing = false;
        sampler.FindPieces(cope, outer);
        Collect();
        if (!inner.IsPoint)
        {
            sampler.FindPieces(cope, inner);
            Collect();
        }
        else
        {
            cope.Cut(0, 1, 0, out int piece);
            Mark(piece);
        }

        partlyMissing = missing;
        return touched;

        void Collect()
        {
            foreach (CutSample sample in sampler.Trace)
            {
                Mark(sample.Piece);
            }
        }

        void Mark(int piece)
        {
            if (piece == CutSurface.Nothing)
            {
                missing = true;
            }
            else
            {
                touched[ContourCope.MateOf(piece)] = true;
            }
        }
    }

    // The mate that one wall line meets; negative for none.
    private static int QuickLook(ContourCope cope, Outline outer, int look)
    {
        (double sin, double cos) = Math.SinCos(Math.PI * (((2.0 * look) / QuickLooks) - 1));
        cope.Cut(sin, cos, outer.RadiusAt(sin, cos), out int piece);
        return ContourCope.MateOf(piece);
    }

    /// <summary>The mate that an end which touches nothing comes nearest to, and by how much it misses, mm.</summary>
    /// <param name="cope">The end, as met.</param>
    /// <param name="inner">The bore.</param>
    /// <param name="outer">The outer skin.</param>
    /// <param name="frame">The end.</param>
    public static (Mate Mate, double Distance) Nearest(ContourCope cope, Outline inner, Outline outer, in EndFrame frame)
    {
        const int Looks = 360;
        (Mate nearest, double least) = (cope.Mates[0], double.PositiveInfinity);
        foreach (Mate mate in cope.Mates)
        {
            // Axes that pass each other too far apart: exact. Past an end or beyond the middle: by looking at many lines.
            double apart = Line3.CommonNormal(frame.Axis, mate.Axis) is { } normal && !mate.IsParallel
                ? mate.Offset - mate.HalfWidth - outer.HalfWidthAlong(frame.Axes.InSection(normal))
                : 0;
            if (apart > 0)
            {
                (nearest, least) = apart < least ? (mate, apart) : (nearest, least);
                continue;
            }

            for (int i = 0; i < Looks; i++)
            {
                (double sin, double cos) = Math.SinCos(2 * Math.PI * i / Looks);
                Mate.HalfPlane plane = mate.At(sin, cos);
                double distance = Math.Min(
                    plane.Shortfall(outer.RadiusAt(sin, cos), cope.Middle), plane.Shortfall(inner.RadiusAt(sin, cos), cope.Middle));
                if (distance < least)
                {
                    (nearest, least) = (mate, distance);
                }
            }
        }

        return (nearest, least);
    }
}
