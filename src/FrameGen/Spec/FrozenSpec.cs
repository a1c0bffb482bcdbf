using FrameGen.Diagnostics;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Spec;

/// <summary>Pinned sizes as written: the file <c>NAME.frozen.yaml</c> beside the spec <c>NAME.yaml</c>.</summary>
/// <param name="File">The file.</param>
/// <param name="Origin">What was frozen, and by what.</param>
/// <param name="Stock">The lists that the sizes came from.</param>
/// <param name="Groups">One a group of that frame.</param>
/// <param name="Marks">The part that each tube was; none where its ends were not cut then.</param>
public sealed record FrozenSpec(
    SourceFile File,
    FrozenOriginSpec Origin,
    IReadOnlyList<FrozenStockSpec> Stock,
    IReadOnlyList<FrozenGroupSpec> Groups,
    IReadOnlyList<FrozenMarkSpec> Marks)
{
    private const string Ending = ".frozen.yaml";

    /// <summary>Where a spec's pinned sizes are: beside it.</summary>
    /// <param name="spec">Path of the spec.</param>
    public static string PathBeside(string spec) => Path.ChangeExtension(spec, null) + Ending;

    /// <summary>True for a name that only pinned sizes have.</summary>
    public static bool IsNamedSo(string path) => path.EndsWith(Ending, StringComparison.OrdinalIgnoreCase);
}

/// <summary>Where pinned sizes come from.</summary>
/// <param name="Spec">Base name of the spec.</param>
/// <param name="Sha256">Of the spec's bytes at that time, lower-case hex.</param>
/// <param name="Tool">Name and version of the program.</param>
/// <param name="At">Where it is written.</param>
public sealed record FrozenOriginSpec(string Spec, string Sha256, string Tool, SourcePlace At);

/// <summary>A stock list at the time of freezing.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Version">What its contents were known by.</param>
public sealed record FrozenStockSpec(Placed<string> Name, string Version);

/// <summary>The pinned size of a group.</summary>
public sealed record FrozenGroupSpec(Placed<string> Name, Placed<string> Material, Placed<Section> Section, Placed<string>? Stock);

/// <summary>The part that a tube was.</summary>
/// <param name="Tube">The tube.</param>
/// <param name="Mark">Mark of the part, with its hand.</param>
public sealed record FrozenMarkSpec(Placed<string> Tube, string Mark);
