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
                package.Cut.Sized.ChosenFor(part.Drawn.Tube).Nominal.Name,
                FixedDigits.Length(part.Drawn.CutLength),
                FixedDigits.Length(tube.Length),
                FixedDigits.Mass(part.Drawn.MassKg),
                FixedDigits.Mass(part.Drawn.MassKg * part.Quantity),
                part.Hand,
                EndText.WithMates(model, part.Drawn.From),
                EndText.WithMates(model, part.Drawn.To),
                part.TwistDegrees is { } twist ? FixedDigits.Angle(twist) : string.Empty,
                CsvTable.Words(Note(package, part)));
        }

        return table.ToString();
    }

    /// <summary>The part's note, and the size of the tube in hand: the section's own column has the nominal one.</summary>
    private static string Note(ShopPackage package, Part part)
    {
        Candidate chosen = package.Cut.Sized.ChosenFor(part.Drawn.Tube);
        string measured = chosen.IsMeasured ? $"measured {chosen.Section.Name}" : string.Empty;
        return string.Join("; ", new[] { part.Note, measured }.Where(n => n.Length > 0));
    }
}
