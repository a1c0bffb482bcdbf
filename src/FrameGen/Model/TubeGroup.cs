using FrameGen.Diagnostics;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>Tubes of one section and material.</summary>
/// <param name="Name">Unique.</param>
/// <param name="Material">Of all its tubes.</param>
/// <param name="Candidates">One for a fixed section; else those to choose from, by mass per metre, then by name.</param>
/// <param name="IsFixed">True where the spec gives the section, or the file beside it that pins sizes.</param>
/// <param name="Choose">What the spec lets it choose from; null for a fixed section.</param>
/// <param name="Welded">False for tubes joined without heat.</param>
/// <param name="At">Where it is written.</param>
public sealed record TubeGroup(
    string Name,
    Material Material,
    IReadOnlyList<Candidate> Candidates,
    bool IsFixed,
    ChooseSpec? Choose,
    bool Welded,
    SourcePlace At)
{
    /// <summary>True where the size is pinned by the file beside the spec; it is fixed then.</summary>
    public bool IsFrozen { get; init; }

    /// <summary>Sizes of the same lists that one range alone keeps out.</summary>
    public IReadOnlyList<BeyondRange> Beyond { get; init; } = [];
}

/// <summary>A size that one range of a group keeps out.</summary>
/// <param name="Candidate">The size.</param>
/// <param name="Key">The range: <c>od</c>, <c>height</c>, <c>width</c>, <c>wall</c>.</param>
/// <param name="Size">What it has there, mm.</param>
/// <param name="By">How far that is beyond the range, mm: positive above it, negative below.</param>
public sealed record BeyondRange(Candidate Candidate, string Key, double Size, double By);

/// <summary>A section that can be bought, or the one that the spec gives.</summary>
/// <param name="Section">Its section.</param>
/// <param name="StockList">The list it comes from; empty for a section of the spec that no list holds.</param>
/// <param name="BarLength">Usual bar, mm.</param>
/// <param name="PricePerMetre">In the shop's own money; null where unknown.</param>
public sealed record Candidate(Section Section, string StockList, double BarLength, double? PricePerMetre)
{
    /// <summary>
    /// The section as it is named and bought; <see cref="Section"/>, which every number is made from, differs from it where the
    /// tube in hand was measured.
    /// </summary>
    public Section Nominal { get; init; } = Section;

    /// <summary>True where <see cref="Section"/> is the size of a tube in hand.</summary>
    public bool IsMeasured => !Section.Equals(Nominal);

    /// <summary>The same bar, by the size measured on it.</summary>
    public Candidate MeasuredAs(Section measured) => this with { Section = measured };
}
