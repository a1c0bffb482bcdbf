using FrameGen.Fabrication;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>What the cut list's template can print; names in the template are these in snake case.</summary>
/// <param name="Head">What stands on top of every paper.</param>
/// <param name="Notes">Of the spec; a user's words; may be empty.</param>
/// <param name="Sections">One a section and material, in the order of cutting: its parts and their sums.</param>
/// <param name="Ends">How each cut end is set out, part by part in the same order.</param>
/// <param name="Placements">Tubes that take a part otherwise than it is drawn.</param>
/// <param name="Pieces">How many pieces in all.</param>
/// <param name="TotalLength">Sum of the cut lengths.</param>
/// <param name="SpecMass">On axis lengths, node to node: what sizing makes least.</param>
/// <param name="CutMass">Of the finished parts.</param>
/// <param name="BoughtMass">Of the bars to buy.</param>
/// <param name="WeldLength">With its unit.</param>
/// <param name="Cautions">Sentences.</param>
public sealed record CutListModel(
    PaperHead Head,
    string Notes,
    IReadOnlyList<CutListSection> Sections,
    IReadOnlyList<CutListEnd> Ends,
    IReadOnlyList<CutListPlacement> Placements,
    int Pieces,
    string TotalLength,
    string SpecMass,
    string CutMass,
    string BoughtMass,
    string WeldLength,
    IReadOnlyList<string> Cautions)
{
    /// <summary>Takes it from the shop's package.</summary>
    public static CutListModel From(ShopPackage package)
    {
        SizedFrame sized = package.Cut.Sized;
        var display = new DisplayFormat(sized.Model.Display);
        return new CutListModel(
            PaperHead.Of(sized),
            sized.Model.Spec.Notes,
            CutListSection.Of(package, display),
            [.. package.Parts.SelectMany(p => CutListEnd.Of(package.Cut, p, display))],
            CutListPlacement.Of(package),
            package.Parts.Sum(p => p.Quantity),
            display.MeasuredNumber(package.Parts.Sum(p => p.Quantity * p.Drawn.CutLength)),
            display.MassNumber(sized.MassKg),
            display.MassNumber(package.Totals.MassKg),
            display.MassNumber(package.Stock.BoughtMassKg),
            display.MeasuredLength(package.Totals.WeldLength),
            Output.Cautions.All);
    }
}

/// <summary>The parts of one section and material, and what they come to.</summary>
/// <param name="Section">As a shop asks for it, and the size of the tube in hand where that was measured.</param>
/// <param name="Material">Name.</param>
/// <param name="Parts">Long ones first.</param>
/// <param name="Pieces">How many.</param>
/// <param name="Length">Sum of their cut lengths, without saw cuts and offcuts.</param>
/// <param name="SpecMass">On axis lengths.</param>
/// <param name="CutMass">Of the finished parts.</param>
public sealed record CutListSection(
    string Section, string Material, IReadOnlyList<CutListPart> Parts, int Pieces, string Length, string SpecMass, string CutMass)
{
    internal static IReadOnlyList<CutListSection> Of(ShopPackage package, DisplayFormat display)
    {
        SizedFrame sized = package.Cut.Sized;
        return
        [
            .. package.Parts
                .GroupBy(p => (sized.ChosenFor(p.Drawn.Tube).Nominal.Name, sized.SectionOf(p.Drawn.Tube).Name, MaterialOf(sized, p)))
                .Select(g => new CutListSection(
                    display.Section(sized.ChosenFor(g.First().Drawn.Tube)),
                    g.Key.Item3,
                    [.. g.Select(p => CutListPart.From(package, p, display))],
                    g.Sum(p => p.Quantity),
                    display.MeasuredNumber(g.Sum(p => p.Quantity * p.Drawn.CutLength)),
                    display.MassNumber(g.SelectMany(p => p.Tubes).Sum(t => AxisMass(sized, t))),
                    display.MassNumber(g.Sum(p => p.Quantity * p.Drawn.MassKg)))),
        ];
    }

    private static string MaterialOf(SizedFrame sized, Part part) => sized.Model.Groups[sized.Model.Tubes[part.Drawn.Tube].Group].Material.Name;

    private static double AxisMass(SizedFrame sized, int tube)
    {
        Tube t = sized.Model.Tubes[tube];
        return t.Length * sized.SectionOf(tube).Area * sized.Model.Groups[t.Group].Material.Density;
    }
}
