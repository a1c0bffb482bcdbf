using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>cut-list.csv: one row a distinct part.</summary>
internal static class CutListCsv
{
    /// <summary>Writes the table.</summary>
    public static string Write(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        var table = new CsvTable(
            "mark", "quantity", "tubes", "material", "section", "cut_length_mm", "node_length_mm", "mass_each_kg", "mass_total_kg",
            "hand", "from_end", "to_end", "twist_deg", "note");
        foreach (Part part in package.Parts)
        {
            Tube tube = model.Tubes[part.Drawn.Tube];
            table.Row(
                part.Mark,
                part.Quantity.ToString(CultureInfo.InvariantCulture),
                string.Join(' ', part.Tubes.Select(t => model.Tubes[t].Name)),
                CsvTable.Words(model.Groups[tube.Group].Material.Name),
                package.Cut.Sized.SectionOf(part.Drawn.Tube).Name,
                FixedDigits.Length(part.Drawn.CutLength),
                FixedDigits.Length(tube.Length),
                FixedDigits.Mass(part.Drawn.MassKg),
                FixedDigits.Mass(part.Drawn.MassKg * part.Quantity),
                string.Empty,
                EndText.WithMates(model, part.Drawn.From),
                EndText.WithMates(model, part.Drawn.To),
                part.TwistDegrees is { } twist ? FixedDigits.Angle(twist) : string.Empty,
                CsvTable.Words(part.Note));
        }

        return table.ToString();
    }
}
