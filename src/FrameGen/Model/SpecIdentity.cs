using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>What every paper says about its origin.</summary>
/// <param name="Files">Root first, then the included ones.</param>
/// <param name="Includes">For each included file: the path as written and the index into <paramref name="Files"/>.</param>
/// <param name="FileName">Base name of the root file.</param>
/// <param name="Sha256">Of the root file's bytes, lower-case hex.</param>
/// <param name="Title">From the spec; its file name without ending where it has none.</param>
/// <param name="Revision">May be empty.</param>
/// <param name="Notes">May be empty.</param>
public sealed record SpecIdentity(
    IReadOnlyList<SourceFile> Files,
    IReadOnlyList<(string Path, int File)> Includes,
    string FileName,
    string Sha256,
    string Title,
    string Revision,
    string Notes)
{
    /// <summary>The pinned sizes beside the root file; null where there are none.</summary>
    public SourceFile? Frozen { get; init; }
}
