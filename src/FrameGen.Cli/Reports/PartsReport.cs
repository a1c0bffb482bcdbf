using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Output;

namespace FrameGen.Cli.Reports;

/// <summary>The parts with their lengths and masses, and the sums.</summary>
internal sealed class PartsReport(Terminal terminal, ShopPackage package)
{
    private readonly DisplayFormat _display = new(package.Cut.Sized.Model.Display);

    /// <summary>Prints the table and the sums.</summary>
    public void Print()
    {
        var table = new ReportTable(
            $"Parts: {package.Parts.Sum(p => p.Quantity)} pieces",
            "mark",
            "=section",
            ">cut " + _display.LengthUnitName,
            ">" + _display.MassUnitName,
            "ends");
        foreach (Part part in package.Parts)
        {
            table.Row(
                part.Quantity == 1 ? part.Name : string.Create(CultureInfo.InvariantCulture, $"{part.Quantity} x {part.Name}"),
                _display.Section(package.Cut.Sized.ChosenFor(part.Drawn.Tube).Nominal),
                _display.LengthNumber(part.Drawn.CutLength),
                _display.MassNumber(part.Drawn.MassKg),
                $"{EndText.Kind(part.Drawn.From.Kind)}, {EndText.Kind(part.Drawn.To.Kind)}");
        }

        table.Draw(terminal);
        terminal.Out.WriteLine(
            $"Total {_display.Mass(package.Totals.MassKg)}, weld {_display.Length(package.Totals.WeldLength)}");
        PrintStock();
    }

    private void PrintStock()
    {
        StockPlan plan = package.Stock;
        if (plan.BarsToBuy == 0)
        {
            terminal.Out.WriteLine("No bars to buy: the rack has it all");
            return;
        }

        var table = new ReportTable("Bars to buy", "=section", "material", ">bar " + _display.LengthUnitName, ">bars", "fewest");
        foreach (StockLot lot in plan.Lots.Where(l => !l.IsRack))
        {
            table.Row(
                _display.Section(lot.Section),
                lot.Material,
                _display.LengthNumber(lot.BarLength),
                lot.Bars.Count.ToString(CultureInfo.InvariantCulture),
                lot.IsOptimal ? "proven" : string.Create(CultureInfo.InvariantCulture, $"at least {lot.LowerBound}"));
        }

        table.Draw(terminal);
        int racked = plan.Lots.Where(l => l.IsRack).Sum(l => l.Bars.Count);
        string rack = racked > 0 ? string.Create(CultureInfo.InvariantCulture, $", and {racked} from the rack") : string.Empty;
        string cost = plan.Cost is { } sum ? $", price {FixedDigits.Print(sum, "0.00")}" : string.Empty;
        terminal.Out.WriteLine(string.Create(
            CultureInfo.InvariantCulture, $"To buy: {plan.BarsToBuy} {(plan.BarsToBuy == 1 ? "bar" : "bars")}, {_display.Mass(plan.BoughtMassKg)}{cost}{rack}"));
    }
}
