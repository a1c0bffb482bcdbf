using System.Globalization;
using FrameGen.Fabrication;

namespace FrameGen.Output;

/// <summary>stock-plan.csv: one row a piece, bar by bar, with running marks from the bar's end.</summary>
internal static class StockPlanCsv
{
    /// <summary>Writes the table.</summary>
    public static string Write(ShopPackage package)
    {
        var table = new CsvTable(
            "material", "section", "bar", "bar_mm", "position", "mark", "length_mm", "from_mm", "to_mm", "offcut_mm");
        foreach (StockLot lot in package.Stock.Lots)
        {
            foreach (StockBar bar in lot.Bars)
            {
                for (int i = 0; i < bar.Cuts.Count; i++)
                {
                    StockCut cut = bar.Cuts[i];
                    table.Row(
                        CsvTable.Words(lot.Material),
                        lot.Section.Name,
                        bar.Label,
                        FixedDigits.Length(lot.BarLength),
                        (i + 1).ToString(CultureInfo.InvariantCulture),
                        cut.Part.Mark,
                        FixedDigits.Length(cut.To - cut.From),
                        FixedDigits.Length(cut.From),
                        FixedDigits.Length(cut.To),
                        FixedDigits.Length(bar.Offcut));
                }
            }
        }

        return table.ToString();
    }
}
