using FrameGen.Fabrication;

namespace FrameGen.Output;

/// <summary>What the stock plan's template can print; names in the template are these in snake case.</summary>
/// <param name="Head">Title, spec, units: what stands on top of every paper.</param>
/// <param name="Kerf">Width of the saw's cut, with its unit.</param>
/// <param name="Trim">Cut off both ends of a bar, with its unit; empty for none.</param>
/// <param name="Buy">One a section and material that has to be bought.</param>
/// <param name="Bars">Bars to buy.</param>
/// <param name="Mass">Of the bars to buy.</param>
/// <param name="Cost">Of the bars to buy, in the shop's own money; empty where a price is missing.</param>
/// <param name="Cutting">One a section and material: how each bar is cut.</param>
public sealed record StockPlanModel(
    PaperHead Head,
    string Kerf,
    string Trim,
    IReadOnlyList<StockToBuy> Buy,
    int Bars,
    string Mass,
    string Cost,
    IReadOnlyList<StockCutting> Cutting)
{
    /// <summary>Takes it from the shop's package.</summary>
    public static StockPlanModel From(ShopPackage package)
    {
        Model.FrameModel model = package.Cut.Sized.Model;
        var display = new DisplayFormat(model.Display);
        StockPlan plan = package.Stock;
        return new StockPlanModel(
            PaperHead.Of(package.Cut.Sized),
            display.MeasuredLength(model.Fabrication.Kerf),
            model.Fabrication.BarTrim > 0 ? display.MeasuredLength(model.Fabrication.BarTrim) : string.Empty,
            [.. plan.Lots.Where(l => !l.IsRack).Select(l => StockToBuy.From(l, display))],
            plan.BarsToBuy,
            display.MassNumber(plan.BoughtMassKg),
            Money(plan.Cost),
            [
                .. plan.Lots.GroupBy(l => (l.Section.Name, l.Material))
                    .Select(g => new StockCutting(display.Section(g.First().Section), g.Key.Material, [.. g.SelectMany(l => StockBarCut.Of(l, display))])),
            ]);
    }

    internal static string Money(double? amount) => amount is { } sum ? FixedDigits.Print(sum, "0.00") : string.Empty;
}

/// <summary>What to buy of one section and material.</summary>
/// <param name="Section">As a shop asks for it.</param>
/// <param name="Material">Name.</param>
/// <param name="BarLength">Of one bar.</param>
/// <param name="Bars">How many.</param>
/// <param name="LowerBound">No plan buys fewer.</param>
/// <param name="Optimal">True where buying fewer is proven to be impossible.</param>
/// <param name="Mass">Of all.</param>
/// <param name="Cost">Of all; empty where the price is not known.</param>
public sealed record StockToBuy(
    string Section, string Material, string BarLength, int Bars, int LowerBound, bool Optimal, string Mass, string Cost)
{
    internal static StockToBuy From(StockLot lot, DisplayFormat display) => new(
        display.Section(lot.Section),
        lot.Material,
        display.MeasuredNumber(lot.BarLength),
        lot.Bars.Count,
        lot.LowerBound,
        lot.IsOptimal,
        display.MassNumber(lot.MassKg),
        StockPlanModel.Money(lot.Cost));
}

/// <summary>How the bars of one section and material are cut.</summary>
/// <param name="Section">As a shop asks for it.</param>
/// <param name="Material">Name.</param>
/// <param name="Bars">Lengths of the rack first; bars that are cut alike are one entry.</param>
public sealed record StockCutting(string Section, string Material, IReadOnlyList<StockBarCut> Bars);

/// <summary>One bar, or several that are cut alike.</summary>
/// <param name="Label">Its number, <c>3</c>; several: <c>1 to 2</c>; on the rack: <c>R1</c>.</param>
/// <param name="Count">How many.</param>
/// <param name="Rack">True where it is on the rack.</param>
/// <param name="Length">As delivered.</param>
/// <param name="Cuts">Pieces in the order of sawing.</param>
/// <param name="Offcut">What is left.</param>
/// <param name="LengthMm">As delivered, a number for drawing.</param>
public sealed record StockBarCut(string Label, int Count, bool Rack, string Length, IReadOnlyList<StockPieceCut> Cuts, string Offcut, double LengthMm)
{
    internal static IEnumerable<StockBarCut> Of(StockLot lot, DisplayFormat display)
    {
        for (int first = 0; first < lot.Bars.Count;)
        {
            int last = first;
            while (last + 1 < lot.Bars.Count && IsCutAlike(lot.Bars[first], lot.Bars[last + 1]))
            {
                last++;
            }

            StockBar bar = lot.Bars[first];
            yield return new StockBarCut(
                last == first ? bar.Label : $"{bar.Label} to {lot.Bars[last].Label}",
                last - first + 1,
                lot.IsRack,
                display.MeasuredNumber(lot.BarLength),
                [
                    .. bar.Cuts.Select(c => new StockPieceCut(
                        c.Part.Name,
                        display.MeasuredNumber(c.To - c.From),
                        display.MeasuredNumber(c.From),
                        display.MeasuredNumber(c.To),
                        c.From,
                        c.To)),
                ],
                display.MeasuredNumber(bar.Offcut),
                lot.BarLength);
            first = last + 1;
        }
    }

    private static bool IsCutAlike(StockBar a, StockBar b) =>
        a.Cuts.Select(c => c.Part.Name).SequenceEqual(b.Cuts.Select(c => c.Part.Name), StringComparer.Ordinal);
}

/// <summary>One piece of a bar.</summary>
/// <param name="Mark">Of the part.</param>
/// <param name="Length">Its cut length.</param>
/// <param name="From">Where it begins, from the bar's end.</param>
/// <param name="To">Where it ends, from the bar's end.</param>
/// <param name="FromMm">Where it begins, a number for drawing.</param>
/// <param name="ToMm">Where it ends, a number for drawing.</param>
public sealed record StockPieceCut(string Mark, string Length, string From, string To, double FromMm, double ToMm);
