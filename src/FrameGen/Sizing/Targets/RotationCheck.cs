using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;

namespace FrameGen.Sizing.Targets;

/// <summary>Rotation of a node in a case, or of one against another; reported in degrees.</summary>
internal sealed class RotationCheck(FrameModel model, RotationTarget target)
    : MovementCheck(model, target, target.Case, target.From, target.To, target.About, target.Max)
{
    /// <inheritdoc/>
    public override string Kind => "rotation";

    /// <inheritdoc/>
    protected override string Unit => "deg";

    /// <inheritdoc/>
    protected override double Scale => 180 / Math.PI;

    /// <inheritdoc/>
    protected override Vector3 MovementOf(FrameSolution solution, int joint) => solution.Rotation(joint);

    /// <inheritdoc/>
    protected override string Words(Vector3? direction) =>
        direction is { } about ? $"about {Wording.Direction(about)}" : "about any axis";
}
