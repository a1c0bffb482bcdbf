using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;

namespace FrameGen.Sizing.Targets;

/// <summary>Displacement of a node in a case, or of one against another; mm.</summary>
internal sealed class DisplacementCheck(FrameModel model, DisplacementTarget target)
    : MovementCheck(model, target, target.Case, target.From, target.To, target.Along, target.Max)
{
    /// <inheritdoc/>
    public override string Kind => "displacement";

    /// <inheritdoc/>
    protected override string Unit => "mm";

    /// <inheritdoc/>
    protected override double Scale => 1;

    /// <inheritdoc/>
    protected override Vector3 MovementOf(FrameSolution solution, int joint) => solution.Displacement(joint);

    /// <inheritdoc/>
    protected override string Words(Vector3? direction) =>
        direction is { } along ? $"along {Wording.Direction(along)}" : "in any direction";
}
