using FrameGen.Fabrication;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>What the cut list's template can print; names in the template are these in snake case.</summary>
/// <param name="Title">Of the spec; a user's words, as all texts but numbers are: escape them.</param>
/// <param name="Revision">Of the spec; may be empty.</param>
/// <param name="Notes">Of the spec; may be empty.</param>
/// <param name="SpecFile">Base name of the spec.</param>
/// <param name="SpecHash">First 8 characters of the hash of the spec.</param>
/// <param name="Tool">Name and version of the program.</param>
/// <param name="Frozen">Empty, or the base name of the file that pins the sizes.</param>
/// <param name="FrozenHash">First 8 characters of the hash of that file.</param>
/// <param name="Stamp">Empty, or what has to stand on top of the paper.</param>
/// <param name="LengthUnit">Of all lengths.</param>
/// <param name="MassUnit">Of all masses.</param>
/// <param name="Parts">One a distinct part, in the order of cutting.</param>
/// <param name="Sections">One a section and material, in the same order: what the parts are cut from.</param>
/// <param name="Placements">Tubes that take a part otherwise than it is drawn.</param>
/// <param name="Pieces">How many pieces in all.</param>
/// <param name="TotalLength">Sum of the cut lengths.</param>
/// <param name="TotalMass">Of the cut frame.</param>
/// <param name="WeldLength">With its unit.</param>
/// <param name="Cautions">Sentences.</param>
public sealed record CutListModel(
    string Title,
    string Revision,
    string Notes,
    string SpecFile,
    string SpecHash,
    string Tool,
    string Frozen,
    string FrozenHash,
    string Stamp,
    string LengthUnit,
    string MassUnit,
    IReadOnlyList<CutListPart> Parts,
    IReadOnlyList<CutListSection> Sections,
    IReadOnlyList<CutListPlacement> Placements,
    int Pieces,
    string TotalLength,
    string TotalMass,
    string WeldLength,
    IReadOnlyList<string> Cautions)
{
    /// <summary>Takes it from the shop's package.</summary>
    public static CutListModel From(ShopPackage package)
    {
        SizedFrame sized = package.Cut.Sized;
        SpecIdentity spec = sized.Model.Spec;
        var display = new DisplayFormat(sized.Model.Display);
        return new CutListModel(
            spec.Title,
            spec.Revision,
            spec.Notes,
            spec.FileName,
            spec.Sha256[..8],
            $"{ToolIdentity.Name} {ToolIdentity.Version}",
            sized.Model.Frozen?.FileName ?? string.Empty,
            sized.Model.Frozen?.Sha256[..8] ?? string.Empty,
            sized.Status == SizingStatus.Unmet ? Output.Cautions.NotMeetingTargets : string.Empty,
            display.LengthUnitName,
            display.MassUnitName,
            [.. package.Parts.Select(p => CutListPart.From(package, p, display))],
            CutListSection.Of(package, display),
            CutListPlacement.Of(package),
            package.Parts.Sum(p => p.Quantity),
            display.LengthNumber(package.Parts.Sum(p => p.Quantity * p.Drawn.CutLength)),
            display.MassNumber(package.Totals.MassKg),
            display.Length(package.Totals.WeldLength),
            Output.Cautions.All);
    }
}

/// <summary>One row of the cut list; lengths and masses in the list's units.</summary>
/// <param name="Mark">On every paper of the part, with its hand where it has one.</param>
/// <param name="Quantity">How many to make.</param>
/// <param name="Tubes">Names, separated by spaces.</param>
/// <param name="Material">Name.</param>
/// <param name="Section">As a shop asks for it.</param>
/// <param name="CutLength">Long point to long point.</param>
/// <param name="NodeLength">Axis from node to node.</param>
/// <param name="MassEach">Of one.</param>
/// <param name="MassTotal">Of all of this part.</param>
/// <param name="FromEnd">Kind of cut and mates: <c>cope to rail-l, tail</c>.</param>
/// <param name="ToEnd">Kind of cut and mates.</param>
/// <param name="Twist">Degrees; empty where an end has no seat.</param>
/// <param name="Note">May be empty.</param>
public sealed record CutListPart(
    string Mark,
    int Quantity,
    string Tubes,
    string Material,
    string Section,
    string CutLength,
    string NodeLength,
    string MassEach,
    string MassTotal,
    string FromEnd,
    string ToEnd,
    string Twist,
    string Note)
{
    internal static CutListPart From(ShopPackage package, Part part, DisplayFormat display)
    {
        FrameModel model = package.Cut.Sized.Model;
        Tube tube = model.Tubes[part.Drawn.Tube];
        return new CutListPart(
            part.Name,
            part.Quantity,
            string.Join(' ', part.Tubes.Select(t => model.Tubes[t].Name)),
            model.Groups[tube.Group].Material.Name,
            display.Section(package.Cut.Sized.ChosenFor(part.Drawn.Tube)),
            display.LengthNumber(part.Drawn.CutLength),
            display.LengthNumber(tube.Length),
            display.MassNumber(part.Drawn.MassKg),
            display.MassNumber(part.Drawn.MassKg * part.Quantity),
            EndText.ForPeople(model, part.Drawn.From),
            EndText.ForPeople(model, part.Drawn.To),
            part.TwistDegrees is { } twist ? FixedDigits.Tenths(twist) : string.Empty,
            part.Note);
    }
}

/// <summary>How a tube takes a part that is drawn for another one.</summary>
/// <param name="Tube">Its name.</param>
/// <param name="Mark">Of the part, with its hand where it has one.</param>
/// <param name="Drawn">Name of the tube that the part is drawn for.</param>
/// <param name="Swapped">True where the drawing's FROM end is at the tube's <c>to</c> node.</param>
/// <param name="Turn">Degrees: clock angle on the tube less that on the drawing (negated where swapped).</param>
public sealed record CutListPlacement(string Tube, string Mark, string Drawn, bool Swapped, string Turn)
{
    internal static IReadOnlyList<CutListPlacement> Of(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        return
        [
            .. from part in package.Parts
               from placed in part.Placed
               where placed.Swapped || placed.Turn != 0
               select new CutListPlacement(
                   model.Tubes[placed.Tube].Name,
                   part.Name,
                   model.Tubes[part.Drawn.Tube].Name,
                   placed.Swapped,
                   FixedDigits.Tenths(double.RadiansToDegrees(placed.Turn))),
        ];
    }
}

/// <summary>What the parts of one section and material come to.</summary>
/// <param name="Section">As a shop asks for it.</param>
/// <param name="Material">Name.</param>
/// <param name="Pieces">How many.</param>
/// <param name="Length">Sum of their cut lengths, without saw cuts and offcuts.</param>
/// <param name="Mass">Of the cut parts.</param>
public sealed record CutListSection(string Section, string Material, int Pieces, string Length, string Mass)
{
    internal static IReadOnlyList<CutListSection> Of(ShopPackage package, DisplayFormat display) =>
    [
        .. package.Parts
            .Select(p => (Part: p, Section: package.Cut.Sized.ChosenFor(p.Drawn.Tube).Nominal, Material: MaterialOf(package, p)))
            .GroupBy(p => (p.Section.Name, p.Material))
            .Select(g => new CutListSection(
                display.Section(g.First().Section),
                g.Key.Material,
                g.Sum(p => p.Part.Quantity),
                display.LengthNumber(g.Sum(p => p.Part.Quantity * p.Part.Drawn.CutLength)),
                display.MassNumber(g.Sum(p => p.Part.Quantity * p.Part.Drawn.MassKg)))),
    ];

    private static string MaterialOf(ShopPackage package, Part part)
    {
        FrameModel model = package.Cut.Sized.Model;
        return model.Groups[model.Tubes[part.Drawn.Tube].Group].Material.Name;
    }
}
