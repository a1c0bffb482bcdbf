using FrameGen.Mechanics.Frames;

namespace FrameGen.Sizing.Search;

/// <summary>
/// A number that a target limits from above, as a linear functional of the displacements: q = c + aᵀu, u = K⁻¹f. A movement has a fixed a and no c; a stress
/// follows its own tube's section in both.
/// </summary>
/// <param name="Load">What acts.</param>
/// <param name="Limit">q may be no more.</param>
/// <param name="Functional">a in the design that it was read off, as loads on nodes.</param>
internal sealed record Response(LoadSet Load, double Limit, IReadOnlyList<NodalLoad> Functional)
{
    /// <summary>Where a follows a section; null where it does not.</summary>
    public SectionResponse? Own { get; init; }
}

/// <summary>A functional Σ k gᵀu of the strains of one element, whose k follow from the section.</summary>
/// <param name="Element">Index of the element.</param>
/// <param name="Group">Its group.</param>
/// <param name="Factors">Six k an option of the group.</param>
/// <param name="Constants">c an option of the group.</param>
/// <param name="At">The option that <see cref="Response.Functional"/> was made with.</param>
internal sealed record SectionResponse(int Element, int Group, double[] Factors, double[] Constants, int At);
