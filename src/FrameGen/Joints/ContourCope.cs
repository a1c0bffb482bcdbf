using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>
/// A cope whose face lies on the mates: every wall line stops where, walked from the tube's middle towards the end, it
/// first meets one; at t = 0 where it meets none.
/// </summary>
internal sealed class ContourCope(IReadOnlyList<Mate> mates, double middle) : CutSurface
{
    /// <summary>Pieces of one mate are numbered below this: its limit, or twice the piece of its outline.</summary>
    private const int PiecesAMate = 16;

    private readonly Mate[] _mates = [.. mates];

    /// <summary>What the end is cut to, in the joint's order.</summary>
    public IReadOnlyList<Mate> Mates => _mates;

    /// <summary>t of the tube's middle, mm.</summary>
    public double Middle { get; } = middle;

    /// <inheritdoc/>
    public override bool IsRadial => false;

    /// <inheritdoc/>
    public override int MarginCount =>
        _mates is [{ IsLimited: false }] ? 0 : (2 * _mates.Length) + (_mates.Length * (_mates.Length - 1) / 2);

    /// <summary>Which mate a piece lies on: its place in <see cref="Mates"/>, or <see cref="CutSurface.Nothing"/>.</summary>
    public static int MateOf(int piece) => piece < 0 ? Nothing : piece / PiecesAMate;

    /// <inheritdoc/>
    public override int LimitMarginCount => 2 * _mates.Length;

    /// <inheritdoc/>
    public override double Cut(double sin, double cos, double radius, out int piece)
    {
        piece = Nothing;
        double best = 0;
        for (int i = 0; i < _mates.Length; i++)
        {
            // A later mate must be met earlier by more than rounding: where two coincide, the first in the order stays.
            Mate.HalfPlane plane = _mates[i].At(sin, cos);
            if (plane.Meets(radius, Middle, out double t, out bool onLimit) &&
                (piece == Nothing || t > best + Outline.Graze))
            {
                (best, piece) = (t, (PiecesAMate * i) + (onLimit ? 1 : 2 * plane.PieceAt(radius)));
            }
        }

        return best;
    }

    /// <inheritdoc/>
    public override void Margins(double sin, double cos, double radius, Span<double> margins)
    {
        int next = 0;
        Span<double> ends = stackalloc double[_mates.Length];
        for (int i = 0; i < _mates.Length; i++)
        {
            Mate.HalfPlane plane = _mates[i].At(sin, cos);
            (margins[next], margins[next + 1]) = plane.LimitDepths(radius);
            next += 2;
            ends[i] = plane.Meets(radius, Middle, out double t, out _) ? t : double.NaN;
        }

        Differences(ends, margins[next..]);
    }

    /// <inheritdoc/>
    public override void AddTangents(Outline skin, List<double> clocks)
    {
        foreach (Mate mate in _mates)
        {
            mate.AddTangents(skin, clocks);
        }
    }

    /// <inheritdoc/>
    public override void AddBreaks(Outline skin, List<double> clocks)
    {
        foreach (Mate mate in _mates)
        {
            mate.AddBreaks(skin, clocks);
        }
    }
}
