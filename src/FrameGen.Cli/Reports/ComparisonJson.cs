using System.Text;
using System.Text.Json;
using FrameGen.Comparison;
using FrameGen.Output;
using FrameGen.Spec;

namespace FrameGen.Cli.Reports;

/// <summary>
/// A comparison as JSON: <c>{"format": "framegen-compare/1", "need": {"bending_nm2", "torsion_nm2", "along", "reason"}, "reference": {"text",
/// "mass_kg_per_m"}, "materials": [{"material", "e_mpa", "g_mpa", "density_kg_per_m3", "shapes": [{"shape", "height_mm", "width_mm", "wall_mm",
/// "mass_kg_per_m", "relative", "slenderness", "wall_class", "stock": {"section", "list", "mass_kg_per_m", "price_per_m"}}]}]}</c>.
/// </summary>
internal static class ComparisonJson
{
    private const double SquareMetre = 1e6;

    /// <summary>Prints the object on standard output.</summary>
    public static void Print(Terminal terminal, ShapeComparison comparison)
    {
        byte[] bytes = JsonText.Bytes(json =>
        {
            json.WriteStartObject();
            json.WriteString("format", "framegen-compare/1");
            WriteNeed(json, comparison);
            json.WriteStartArray("materials");
            foreach (MaterialComparison metal in comparison.Materials)
            {
                json.WriteStartObject();
                json.WriteString("material", metal.Material.Name);
                json.Number("e_mpa", metal.Material.E);
                json.Number("g_mpa", metal.Material.G);
                json.Number("density_kg_per_m3", metal.Material.Density * 1e9);
                json.WriteStartArray("shapes");
                foreach (ComparedTube tube in metal.Tubes)
                {
                    Write(json, tube);
                }

                json.WriteEndArray();
                json.WriteEndObject();
            }

            json.WriteEndArray();
            json.WriteEndObject();
        });
        terminal.Out.Write(Encoding.UTF8.GetString(bytes));
    }

    private static void WriteNeed(Utf8JsonWriter json, ShapeComparison comparison)
    {
        json.WriteStartObject("need");
        json.Number("bending_nm2", comparison.Need.Bending / SquareMetre);
        json.Number("torsion_nm2", comparison.Need.Torsion / SquareMetre);
        json.WriteString("along", comparison.Need.Along switch
        {
            BendingDirection.Top => "top",
            BendingDirection.Side => "side",
            _ => "weaker",
        });
        json.WriteString("reason", comparison.Need.Reason);
        json.WriteEndObject();
        json.WriteStartObject("reference");
        json.WriteString("text", comparison.Reference);
        json.Number("mass_kg_per_m", comparison.ReferenceMass);
        json.WriteEndObject();
    }

    private static void Write(Utf8JsonWriter json, ComparedTube tube)
    {
        json.WriteStartObject();
        json.WriteString("shape", tube.Shape.Name);
        json.Number("height_mm", tube.Size.Height);
        json.Number("width_mm", tube.Size.Width);
        json.Number("wall_mm", tube.Size.Wall);
        json.Number("mass_kg_per_m", tube.MassPerMetre);
        json.Number("relative", tube.Relative);
        json.Number("slenderness", tube.Size.Slenderness);
        json.Number("wall_class", tube.Wall?.Class);
        if (tube.Stock is { } stock)
        {
            json.WriteStartObject("stock");
            json.WriteString("section", stock.Section.Name);
            json.WriteString("list", stock.List);
            json.Number("mass_kg_per_m", stock.MassPerMetre);
            json.Number("price_per_m", stock.PricePerMetre);
            json.WriteEndObject();
        }
        else
        {
            json.WriteNull("stock");
        }

        json.WriteEndObject();
    }
}
