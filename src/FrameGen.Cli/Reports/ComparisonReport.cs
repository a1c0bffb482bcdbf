using System.Globalization;
using FrameGen.Comparison;
using FrameGen.Mechanics.Materials;
using FrameGen.Output;
using FrameGen.Spec;
using Text = Spectre.Console.Text;

namespace FrameGen.Cli.Reports;

/// <summary>Shapes and metals at equal stiffness, as one table a metal.</summary>
internal sealed class ComparisonReport(Terminal terminal, ShapeComparison comparison)
{
    // Where the walls follow from one limit of D/t alone, every tube has that.
    private readonly bool _slendernessVaries =
        comparison.Materials.SelectMany(m => m.Tubes).Select(t => t.Rule).OfType<WallRule>().Distinct().Count() > 1
        || comparison.Materials.Any(m => m.Tubes.Any(t => t.Rule?.Least is not null));

    private readonly bool _priced = comparison.Materials.Any(m => m.Tubes.Any(t => t.Stock?.PricePerMetre is not null));

    /// <summary>Prints it.</summary>
    public void Print()
    {
        terminal.Draw(new Text($"At equal stiffness, {comparison.Need}: {comparison.Need.Reason}"));
        if (comparison.Need.Bending is not null)
        {
            string way = comparison.Need.Along switch
            {
                BendingDirection.Top => "upright",
                BendingDirection.Side => "lying flat",
                _ => "bent the weaker way",
            };
            terminal.Draw(new Text($"rect and ellipse: half as wide as high, {way}. {Walls()}"));
        }
        else
        {
            terminal.Draw(new Text($"rect and ellipse: half as wide as high. {Walls()}"));
        }

        foreach (MaterialComparison material in comparison.Materials)
        {
            Draw(material);
        }

        terminal.Out.WriteLine();
        terminal.Draw(new Text(
            $"%: mass, {comparison.Reference} (its {Number(comparison.ReferenceMass, 3)} kg/m) being 100. class: of the wall pressed all over, EN 1993-1-1 "
            + "table 5.2; for other metals than steel a guide. In stock: the lightest size that is as stiff, its wall no thinner. Stiffness only: strength, buckling, joints and "
            + "welds may ask for more."));
        if (comparison.Materials.Any(m => m.Tubes.Any(t => ReferenceEquals(t.Shape, ComparedShape.ThinRound))))
        {
            terminal.Draw(new Text("thin-wall: by A = pi d t and I = pi d^3 t / 8, d the mean diameter; all others are exact."));
        }
    }

    private string Walls()
    {
        WallRule? rule = comparison.Materials.SelectMany(m => m.Tubes).Select(t => t.Rule).OfType<WallRule>().FirstOrDefault();
        return (_slendernessVaries, rule) switch
        {
            (_, null) => string.Empty,
            (false, { Slenderness: { } ratio }) => $"Walls: outer size / {FixedDigits.Print(ratio, "0.##")}.",
            (_, { Least: { } least }) => $"Walls: {FixedDigits.Print(least, "0.###")} mm at least.",
            _ => "Walls: by D/t, outer size over wall.",
        };
    }

    private static string Number(double value, int digits)
    {
        int decimals = Math.Clamp(digits - 1 - (int)Math.Floor(Math.Log10(value)), 0, 6);
        return FixedDigits.Print(value, "F" + decimals.ToString(CultureInfo.InvariantCulture));
    }

    private static string Size(Profile profile)
    {
        string outer = profile.Height == profile.Width ? Number(profile.Height, 3) : $"{Number(profile.Height, 3)}x{Number(profile.Width, 3)}";
        return profile.Wall is { } wall ? $"{outer}x{Number(wall, 3)}" : outer;
    }

    // Between the shape, which the row names, and the corners.
    private static string Bought(StockMatch stock)
    {
        string name = stock.Section.Name;
        int from = name.IndexOf(' ', StringComparison.Ordinal) + 1;
        return name[from..name.IndexOf(" mm", StringComparison.Ordinal)].Replace(" x ", "x", StringComparison.Ordinal);
    }

    private void Draw(MaterialComparison metal)
    {
        Material material = metal.Material;
        string[] price = _priced ? [">per m"] : [];
        string[] slenderness = _slendernessVaries ? [">D/t"] : [];
        var table = new ReportTable(
            $"{material.Name}: E {Number(material.E / 1000, 3)} GPa, {Number(material.Density * 1e9, 4)} kg/m3",
            ["=shape", "=size mm", ">kg/m", ">%", .. slenderness, ">class", "=in stock", ">kg/m", .. price]);
        foreach (ComparedTube tube in metal.Tubes)
        {
            price = _priced ? [tube.Stock?.PricePerMetre is { } each ? FixedDigits.Print(each, "0.00") : string.Empty] : [];
            slenderness = _slendernessVaries ? [tube.Size.Slenderness is { } ratio ? FixedDigits.Print(ratio, "0.#") : string.Empty] : [];
            table.Row([
                tube.Shape.Name,
                Size(tube.Size),
                Number(tube.MassPerMetre, 3),
                FixedDigits.Print(100 * tube.Relative, "0.0"),
                .. slenderness,
                tube.Wall is { } wall ? wall.Class.ToString(CultureInfo.InvariantCulture) : string.Empty,
                tube.Stock is { } bought ? Bought(bought) : string.Empty,
                tube.Stock is { } stock ? Number(stock.MassPerMetre, 3) : string.Empty,
                .. price,
            ]);
        }

        table.Draw(terminal);
    }
}
