using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Targets;

/// <summary>How far a node moves in a case, alone or against another: a component of the movement, or its length where any direction counts.</summary>
/// <param name="model">The frame.</param>
/// <param name="target">The target.</param>
/// <param name="loadCase">Index of the case.</param>
/// <param name="from">Node it is measured from; null for the movement of one node.</param>
/// <param name="to">The node.</param>
/// <param name="direction">Unit direction; null for any.</param>
/// <param name="max">The limit: mm or rad.</param>
internal abstract class MovementCheck(FrameModel model, Target target, int loadCase, int? from, int to, Vector3? direction, double max)
    : TargetCheck(model, target)
{
    /// <inheritdoc/>
    public override int Cost => 2;

    /// <summary>Unit of what people read.</summary>
    protected abstract string Unit { get; }

    /// <summary>How many of that unit one mm or rad is.</summary>
    protected abstract double Scale { get; }

    /// <inheritdoc/>
    public override double Ratio(DesignAnalysis analysis) => Value(analysis) / max;

    /// <inheritdoc/>
    public override TargetResult Result(DesignAnalysis analysis) => new(
        Target.Index,
        Kind,
        $"{NodeText(from, to)} {Words(direction)}, case {Model.Cases[loadCase].Name}",
        Value(analysis) * Scale,
        max * Scale,
        Unit,
        Ratio(analysis),
        "");

    /// <summary>The movement of a joint, mm or rad.</summary>
    protected abstract Vector3 MovementOf(FrameSolution solution, int joint);

    /// <summary>The direction in words.</summary>
    protected abstract string Words(Vector3? direction);

    private double Value(DesignAnalysis analysis)
    {
        FrameSolution solution = analysis.Case(loadCase);
        IReadOnlyList<int> joints = analysis.Structure!.Topology.JointOfNode;
        Vector3 moved = MovementOf(solution, joints[to]);
        if (from is { } other)
        {
            moved -= MovementOf(solution, joints[other]);
        }

        return direction is { } along ? Math.Abs(moved.Dot(along)) : moved.Length;
    }
}
