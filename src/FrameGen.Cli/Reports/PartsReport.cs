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
                part.Quantity == 1 ? part.Mark : string.Create(CultureInfo.InvariantCulture, $"{part.Quantity} x {part.Mark}"),
                _display.Section(package.Cut.Sized.SectionOf(part.Drawn.Tube)),
                _display.LengthNumber(part.Drawn.CutLength),
                _display.MassNumber(part.Drawn.MassKg),
                $"{EndText.Kind(part.Drawn.From.Kind)}, {EndText.Kind(part.Drawn.To.Kind)}");
        }

        table.Draw(terminal);
        terminal.Out.WriteLine(
            $"Total {_display.Mass(package.Totals.MassKg)}, weld {_display.Length(package.Totals.WeldLength)}");
    }
}
