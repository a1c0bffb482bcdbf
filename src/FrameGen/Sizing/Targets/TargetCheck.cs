using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Targets;

/// <summary>Asks a design about one target. Holds nothing of any design: one serves all threads.</summary>
/// <param name="model">The frame.</param>
/// <param name="target">The target.</param>
internal abstract class TargetCheck(FrameModel model, Target target)
{
    public FrameModel Model { get; } = model;

    public Target Target { get; } = target;

    /// <summary>The spec's word for it.</summary>
    public abstract string Kind { get; }

    /// <summary>What it costs to ask, roughly, in solves: cheap targets refuse a design first.</summary>
    public abstract int Cost { get; }

    /// <summary>True where the frame has to be solved for it.</summary>
    public virtual bool NeedsFrame => true;

    /// <summary>Whether a group may have a section, where a target decides that group by group; true where it takes the whole frame.</summary>
    public virtual bool Allows(int group, Section section) => true;

    /// <summary>Share of the limit that a design uses: met when no more than 1. Allocates nothing.</summary>
    public abstract double Ratio(DesignAnalysis analysis);

    /// <summary>Whether a design meets it; may know sooner than <see cref="Ratio"/>.</summary>
    public virtual bool IsMet(DesignAnalysis analysis) => Ratio(analysis) <= 1;

    /// <summary>Value, limit and words for people.</summary>
    public abstract TargetResult Result(DesignAnalysis analysis);

    /// <summary>Share of the limit that one tube uses by itself; null where the target does not look at that tube, or at no single tubes.</summary>
    public virtual double? RatioOf(DesignAnalysis analysis, int tube) => null;

    /// <summary>The checks of all targets of a frame, in the spec's order.</summary>
    public static IReadOnlyList<TargetCheck> All(FrameModel model)
    {
        int stiffness = 0;
        return [.. model.Targets.Select<Target, TargetCheck>(target => target switch
        {
            DisplacementTarget t => new DisplacementCheck(model, t),
            RotationTarget t => new RotationCheck(model, t),
            StiffnessTarget t => new StiffnessCheck(model, t, stiffness++),
            StrengthTarget t => new StrengthCheck(model, t),
            BucklingTarget t => new BucklingCheck(model, t),
            FrequencyTarget t => new FrequencyCheck(model, t),
            SlendernessTarget t => new SlendernessCheck(model, t),
            MemberDeflectionTarget t => new MemberDeflectionCheck(model, t),
            MemberStiffnessTarget t => new MemberStiffnessCheck(model, t),
            _ => throw new ArgumentOutOfRangeException(nameof(model), target.GetType().Name, "A target that sizing does not know."),
        })];
    }

    /// <summary>The node looked at, or the two of a relative movement.</summary>
    protected string NodeText(int? from, int to) =>
        from is { } f ? $"{Model.Nodes[to].Name} against {Model.Nodes[f].Name}" : Model.Nodes[to].Name;
}
