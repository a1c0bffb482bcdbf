using FrameGen.Fabrication;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>setup.csv: where each node stands in the jig, and its tubes in the order of fitting.</summary>
internal static class SetupCsv
{
    /// <summary>Writes the table, nodes in the order of the spec.</summary>
    public static string Write(ShopPackage package)
    {
        SizedFrame sized = package.Cut.Sized;
        var table = new CsvTable("node", "x_mm", "y_mm", "z_mm", "tubes");
        for (int i = 0; i < sized.Model.Nodes.Count; i++)
        {
            Node node = sized.Model.Nodes[i];
            table.Row(
                node.Name,
                FixedDigits.Length(node.Position.X),
                FixedDigits.Length(node.Position.Y),
                FixedDigits.Length(node.Position.Z),
                string.Join(' ', sized.Joints[i].Tubes.Select(t => sized.Model.Tubes[t].Name)));
        }

        return table.ToString();
    }
}
