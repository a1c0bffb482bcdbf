using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Targets;

/// <summary>A unit push or couple alone over the movement it causes there, in N/mm or N·m/deg; infinite where nothing moves.</summary>
/// <param name="model">The frame.</param>
/// <param name="target">The target.</param>
/// <param name="unit">Its position among the frame's stiffness targets.</param>
internal sealed class StiffnessCheck(FrameModel model, StiffnessTarget target, int unit) : TargetCheck(model, target)
{
    /// <summary>N·mm/rad in 1 N·m/deg.</summary>
    private const double NewtonMetrePerDegree = 1000 * 180 / Math.PI;

    /// <inheritdoc/>
    public override string Kind => "stiffness";

    /// <inheritdoc/>
    public override int Cost => 1;

    /// <inheritdoc/>
    public override double Ratio(DesignAnalysis analysis) => target.Min * Compliance(analysis);

    /// <inheritdoc/>
    public override TargetResult Result(DesignAnalysis analysis)
    {
        double scale = target.Turning ? NewtonMetrePerDegree : 1;
        double compliance = Compliance(analysis);
        return new TargetResult(
            target.Index,
            Kind,
            $"{NodeText(target.From, target.To)} {(target.Turning ? "about" : "along")} {Wording.Direction(target.Direction)}",
            compliance > 0 ? 1 / compliance / scale : double.PositiveInfinity,
            target.Min / scale,
            target.Turning ? "N.m/deg" : "N/mm",
            Ratio(analysis),
            "");
    }

    // The movement along a unit push is twice the strain energy, never negative but for rounding where the supports take it all.
    private double Compliance(DesignAnalysis analysis)
    {
        FrameSolution solution = analysis.Unit(unit);
        IReadOnlyList<int> joints = analysis.Structure!.Topology.JointOfNode;
        Vector3 moved = Movement(joints[target.To]);
        if (target.From is { } from)
        {
            moved -= Movement(joints[from]);
        }

        return Math.Max(0, moved.Dot(target.Direction));

        Vector3 Movement(int joint) => target.Turning ? solution.Rotation(joint) : solution.Displacement(joint);
    }
}
