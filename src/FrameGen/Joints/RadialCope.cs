using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>
/// A cope whose face points at the axis: at each clock angle the whole wall is cut back to the largest t of its lines,
/// so that nothing needs filing. Lines that meet nothing count with t = 0. A rod's axis, which belongs to every clock
/// angle, keeps its own t.
/// </summary>
internal sealed class RadialCope(ContourCope asMet, Outline inner, Outline outer) : CutSurface
{
    /// <summary>Places in the half-plane of one mate are numbered below this.</summary>
    private const int PlacesAMate = 100;

    private readonly Mate[] _mates = [.. asMet.Mates];

    /// <inheritdoc/>
    public override bool IsRadial => true;

    /// <inheritdoc/>
    public override int MarginCount =>
        _mates is [{ IsLimited: false }] ? 0 : (4 * _mates.Length) + (_mates.Length * (_mates.Length - 1) / 2);

    /// <inheritdoc/>
    public override int LimitMarginCount => 4 * _mates.Length;

    /// <inheritdoc/>
    public override double Cut(double sin, double cos, double radius, out int piece)
    {
        if (radius <= 0)
        {
            return asMet.Cut(sin, cos, radius, out piece);
        }

        (double from, double to) = (inner.RadiusAt(sin, cos), outer.RadiusAt(sin, cos));
        piece = Nothing;
        double best = double.NegativeInfinity;
        Span<(double Low, double High)> met = stackalloc (double, double)[_mates.Length];
        int count = 0;
        for (int i = 0; i < _mates.Length; i++)
        {
            if (_mates[i].At(sin, cos).Top(from, to, asMet.Middle, out double low, out double high, out double t, out int place))
            {
                met[count++] = (low, high);
                if (piece == Nothing || t > best + Outline.Graze)
                {
                    (best, piece) = (t, (PlacesAMate * i) + place);
                }
            }
        }

        if (best < -Outline.Graze && !Covers(met[..count], from, to))
        {
            piece = Nothing;
            return 0;
        }

        return best;
    }

    /// <inheritdoc/>
    public override void Margins(double sin, double cos, double radius, Span<double> margins)
    {
        (double from, double to) = (inner.RadiusAt(sin, cos), outer.RadiusAt(sin, cos));
        int next = 0;
        Span<double> tops = stackalloc double[_mates.Length];
        for (int i = 0; i < _mates.Length; i++)
        {
            Mate.HalfPlane plane = _mates[i].At(sin, cos);
            (margins[next], margins[next + 1]) = plane.LimitDepths(from);
            (margins[next + 2], margins[next + 3]) = plane.LimitDepths(to);
            next += 4;
            tops[i] = plane.Top(from, to, asMet.Middle, out _, out _, out double t, out _) ? t : double.NaN;
        }

        Differences(tops, margins[next..]);
    }

    /// <inheritdoc/>
    public override void AddTangents(Outline skin, List<double> clocks)
    {
        asMet.AddTangents(outer, clocks);
        asMet.AddTangents(inner, clocks);
    }

    /// <inheritdoc/>
    public override void AddBreaks(Outline skin, List<double> clocks)
    {
        clocks.AddRange(inner.Breaks);
        clocks.AddRange(outer.Breaks);
        asMet.AddBreaks(inner, clocks);
        asMet.AddBreaks(outer, clocks);
        foreach (Mate mate in _mates)
        {
            mate.AddFlats(clocks);
        }
    }

    // Whether every distance from the axis meets something.
    private static bool Covers(Span<(double Low, double High)> met, double from, double to)
    {
        met.Sort();
        double reached = from;
        foreach ((double low, double high) in met)
        {
            if (low > reached + Outline.Graze)
            {
                return false;
            }

            reached = Math.Max(reached, high);
        }

        return reached >= to - Outline.Graze;
    }
}
