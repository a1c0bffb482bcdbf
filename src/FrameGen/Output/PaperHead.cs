using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>What stands on top of every paper; in a template <c>head.title</c> and so on.</summary>
/// <param name="Title">Of the spec; a user's words, as all texts but numbers are: escape them.</param>
/// <param name="Revision">Of the spec; may be empty.</param>
/// <param name="SpecFile">Base name of the spec.</param>
/// <param name="SpecHash">First 8 characters of the hash of the spec.</param>
/// <param name="Tool">Name and version of the program.</param>
/// <param name="Frozen">Empty, or the base name of the file that pins the sizes.</param>
/// <param name="FrozenHash">First 8 characters of the hash of that file.</param>
/// <param name="Stamp">Empty, or what has to stand on top of the paper.</param>
/// <param name="LengthUnit">Of all lengths.</param>
/// <param name="MassUnit">Of all masses.</param>
public sealed record PaperHead(
    string Title,
    string Revision,
    string SpecFile,
    string SpecHash,
    string Tool,
    string Frozen,
    string FrozenHash,
    string Stamp,
    string LengthUnit,
    string MassUnit)
{
    internal static PaperHead Of(SizedFrame sized)
    {
        SpecIdentity spec = sized.Model.Spec;
        var display = new DisplayFormat(sized.Model.Display);
        return new PaperHead(
            spec.Title,
            spec.Revision,
            spec.FileName,
            spec.Sha256[..8],
            $"{ToolIdentity.Name} {ToolIdentity.Version}",
            sized.Model.Frozen?.FileName ?? string.Empty,
            sized.Model.Frozen?.Sha256[..8] ?? string.Empty,
            sized.Status == SizingStatus.Unmet ? Cautions.NotMeetingTargets : string.Empty,
            display.LengthUnitName,
            display.MassUnitName);
    }
}
