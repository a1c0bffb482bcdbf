using FrameGen.Diagnostics;

namespace FrameGen.Spec;

/// <summary>What is made least.</summary>
public enum SizingObjective
{
    /// <summary>Mass of the tubes on axis lengths.</summary>
    Mass,

    /// <summary>Their price on axis lengths, by the stock lists' prices per metre.</summary>
    Cost,
}

/// <summary>How sizes are chosen.</summary>
/// <param name="Objective">What is made least.</param>
/// <param name="DifferentSizes">At most so many different tubes, fixed ones among them: the same section and material is one; null for any number.</param>
/// <param name="At">Where it is written.</param>
public sealed record SizingSpec(SizingObjective Objective, int? DifferentSizes, SourcePlace? At)
{
    /// <summary>Where nothing is written.</summary>
    public static SizingSpec Default { get; } = new(SizingObjective.Mass, null, null);
}
