using FrameGen.Geometry;

namespace FrameGen.Model;

/// <summary>A bend of a tube, as a bender comes to it from the <c>from</c> end.</summary>
/// <param name="Number">1 for the first.</param>
/// <param name="Start">Where it begins: distance from the tube's start along its axis, mm.</param>
/// <param name="Straight">Length of the straight before it, mm: from the tube's start, or from the end of the bend before.</param>
/// <param name="Rotation">Turn of the bend's plane since the bend before, right-handed along the tube, rad in (−π, π]; 0 for the first.</param>
/// <param name="Angle">By which the tube turns, rad.</param>
/// <param name="Radius">Of the axis, mm.</param>
/// <param name="Clock">Clock angle of its inside, rad in (−π, π].</param>
public sealed record TubeBend(int Number, double Start, double Straight, double Rotation, double Angle, double Radius, double Clock)
{
    // Planes nearer to half a turn than this are bent just the other way: rounding must not choose the sign.
    private const double HalfTurn = Math.PI - 1e-8;

    /// <summary>Where it ends, mm.</summary>
    public double Stop => Start + (Radius * Angle);

    /// <summary>The bends of a tube in their order; none for a straight one.</summary>
    public static IReadOnlyList<TubeBend> Of(Tube tube)
    {
        var bends = new List<TubeBend>();
        Vector3 before = Vector3.Zero;
        double stop = 0;
        foreach (PathPiece arc in (tube.Bent?.Pieces ?? []).Where(p => p.IsArc))
        {
            double rotation = bends.Count == 0 ? 0 : Math.Atan2(before.Cross(arc.About).Dot(arc.Along), before.Dot(arc.About));
            double clock = tube.Bent!.Carry(tube.Axes, arc.Start).ClockOf(arc.About.Cross(arc.Along));
            bends.Add(new TubeBend(bends.Count + 1, arc.Start, arc.Start - stop, Signed(rotation), arc.Length / arc.Radius, arc.Radius, Signed(clock)));
            (before, stop) = (arc.About, arc.Start + arc.Length);
        }

        return bends;
    }

    private static double Signed(double angle) => angle <= -HalfTurn ? Math.PI : angle;
}
