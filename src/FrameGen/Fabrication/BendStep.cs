using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Fabrication;

/// <summary>A bend as it is made. The part is sawn square to its cut length first; distances count from its <c>from</c> end along the straightened axis.</summary>
/// <param name="Bend">The bend; its own distances count from the from point of the tube.</param>
/// <param name="Straight">Before it: from the end of the blank, or of the bend before, mm.</param>
/// <param name="Start">Where it begins, mm from the end of the blank.</param>
/// <param name="MachineAngle">To what a machine is set, so that the bend has its angle once it springs back, rad.</param>
public sealed record BendStep(TubeBend Bend, double Straight, double Start, double MachineAngle)
{
    /// <summary>Where it ends, mm from the end of the blank.</summary>
    public double Stop => Start + (Bend.Stop - Bend.Start);

    /// <summary>The bends of a tube in the order of bending, from its from end; none of a straight one.</summary>
    public static IReadOnlyList<BendStep> Of(FrameModel model, CutTube cut) =>
    [
        .. TubeBend.Of(model.Tubes[cut.Tube]).Select(b => new BendStep(
            b,
            b.Number == 1 ? b.Straight - cut.Start : b.Straight,
            b.Start - cut.Start,
            model.Fabrication.Springback.MachineAngle(b.Angle))),
    ];
}
