using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Sizing;

/// <summary>How sure the choice is.</summary>
public enum SizingStatus
{
    /// <summary>Every group's section is given by the spec, and every target is met.</summary>
    Fixed,

    /// <summary>No lighter design meets the targets: proven.</summary>
    ProvenLightest,

    /// <summary>The best one found, with its bound.</summary>
    BestFound,

    /// <summary>No design meets the targets.</summary>
    Unmet,
}

/// <summary>One section a group, every target with its value, and the analysis behind it.</summary>
/// <param name="Model">The frame.</param>
/// <param name="Chosen">By group.</param>
/// <param name="Status">How sure the choice is.</param>
/// <param name="MassKg">On axis lengths, tubes only: what is minimised.</param>
/// <param name="BoundKg">No design that meets the targets is lighter; null where there is none.</param>
/// <param name="Analyses">Designs analysed, counted in the order of the search: the same on any number of cores.</param>
/// <param name="Targets">One a target, in the spec's order.</param>
/// <param name="Cases">One a load case, in the model's order; empty when nothing is analysed.</param>
/// <param name="Joints">The joint of every node in this design, by node.</param>
public sealed record SizedFrame(
    FrameModel Model,
    IReadOnlyList<Candidate> Chosen,
    SizingStatus Status,
    double MassKg,
    double? BoundKg,
    long Analyses,
    IReadOnlyList<TargetResult> Targets,
    IReadOnlyList<CaseResult> Cases,
    IReadOnlyList<NodeJoint> Joints)
{
    /// <summary>Price of the tubes on axis lengths, in the shop's own money; null where cost is not what is made least.</summary>
    public double? Cost { get; init; }

    /// <summary>No design that meets the targets costs less; null where there is none, or cost is not what is made least.</summary>
    public double? BoundCost { get; init; }

    /// <summary>The lowest natural frequencies, Hz, lowest first, with all supports or those of the frequency target; null when nothing is analysed.</summary>
    public IReadOnlyList<double>? Frequencies { get; init; }

    /// <summary>What the joints' `fits` costs; null where it refuses nothing that would be better.</summary>
    public FitCost? Fits { get; init; }

    /// <summary>What would be chosen today, where the sizes are pinned; null where they are not, or where nothing could be chosen.</summary>
    public SizedFrame? Today { get; init; }

    /// <summary>Section by group.</summary>
    public IReadOnlyList<Section> Sections { get; } = [.. Chosen.Select(c => c.Section)];

    /// <summary>What a tube is made of: its section as bought and as it is.</summary>
    public Candidate ChosenFor(int tube) => Chosen[Model.Tubes[tube].Group];

    /// <summary>The section of a tube as it is: what its numbers are made from.</summary>
    public Section SectionOf(int tube) => Sections[Model.Tubes[tube].Group];
}
