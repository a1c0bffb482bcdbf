using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>A cut that can say which of its smooth pieces a wall line ends on, so that corners can be found exactly.</summary>
internal abstract class CutSurface : EndSurface
{
    /// <summary>The piece of a wall line that meets nothing.</summary>
    public const int Nothing = -1;

    /// <summary>True where t does not depend on the distance from the axis (but at the axis itself).</summary>
    public abstract bool IsRadial { get; }

    /// <summary>How many numbers <see cref="Margins"/> gives for a wall line.</summary>
    public virtual int MarginCount => 0;

    /// <summary>How many of them, the first ones, tell a wall line's depth inside the limits of mates, mm.</summary>
    public virtual int LimitMarginCount => 0;

    /// <inheritdoc/>
    public override double At(double clock, double radius)
    {
        (double sin, double cos) = Math.SinCos(clock);
        return Cut(sin, cos, radius, out _);
    }

    /// <summary>Where a wall line stops.</summary>
    /// <param name="sin">Sine of its clock angle.</param>
    /// <param name="cos">Cosine of its clock angle.</param>
    /// <param name="radius">Its distance from the axis, mm.</param>
    /// <param name="piece">The smooth piece it stops on; a change of it along a skin is a corner.</param>
    /// <returns>t, mm.</returns>
    public abstract double Cut(double sin, double cos, double radius, out int piece);

    /// <summary>
    /// Smooth functions of the clock angle whose change of sign may change the piece; NaN where not defined. A short
    /// piece between two samples shows as an extreme of one of them near zero.
    /// </summary>
    public virtual void Margins(double sin, double cos, double radius, Span<double> margins)
    {
    }

    /// <summary>Adds the clock angles, rad in (−π, π], at which a wall line of a skin grazes a mate.</summary>
    public virtual void AddTangents(Outline skin, List<double> clocks)
    {
    }

    /// <summary>
    /// Adds the clock angles, rad in (−π, π], at which the cut of a skin may have a corner because an outline has: a mate's, or the
    /// tube's own.
    /// </summary>
    public virtual void AddBreaks(Outline skin, List<double> clocks)
    {
    }

    /// <summary>What every two values differ by, each pair once: where two mates' cuts change places.</summary>
    protected static void Differences(ReadOnlySpan<double> values, Span<double> differences)
    {
        int next = 0;
        for (int i = 0; i < values.Length; i++)
        {
            for (int j = 0; j < i; j++)
            {
                differences[next++] = values[i] - values[j];
            }
        }
    }
}
