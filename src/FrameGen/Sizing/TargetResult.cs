namespace FrameGen.Sizing;

/// <summary>A target and what the frame does.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="Kind">The spec's word: <c>displacement</c>, <c>strength</c> …</param>
/// <param name="Label">What is looked at, for people: <c>rear-l along z, case standing</c>.</param>
/// <param name="Value">In <paramref name="Unit"/>; positive infinity for a stiffness where nothing moves, or a safety factor without stress.</param>
/// <param name="Limit">In <paramref name="Unit"/>.</param>
/// <param name="Unit">mm, deg, N/mm, N.m/deg, N.m2; empty for a safety factor.</param>
/// <param name="Ratio">Share of the limit used: met when no more than 1.</param>
/// <param name="Where">What decides: the tube and case of the highest stress, the worst twin; empty where plain.</param>
public sealed record TargetResult(
    int Index, string Kind, string Label, double Value, double Limit, string Unit, double Ratio, string Where)
{
    /// <summary>True when the target holds.</summary>
    public bool Met => Ratio <= 1;

    /// <summary>By tube: the share of the limit that it uses by itself, null where the target does not look at it; empty for a target that looks at no single tubes.</summary>
    public IReadOnlyList<double?> ByTube { get; init; } = [];
}
