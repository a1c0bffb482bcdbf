using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>welds.csv: one row a seam, joint by joint.</summary>
internal static class WeldsCsv
{
    /// <summary>Writes the table.</summary>
    public static string Write(CutFrame cut, WeldList welds)
    {
        FrameModel model = cut.Sized.Model;
        var table = new CsvTable(
            "node", "tube", "end", "cut", "mates", "length_mm", "fillet_mm", "butt_mm", "least_deg", "most_deg", "leg_mm", "filler_kg");
        foreach (WeldSeam seam in welds.Seams)
        {
            EndCut end = cut.Tubes[seam.End.Tube][seam.End.End];
            table.Row(
                model.Nodes[seam.Node].Name,
                model.Tubes[seam.End.Tube].Name,
                EndText.Name(seam.End.End),
                EndText.Kind(end.Kind),
                string.Join(' ', end.Contacts.Select(c => model.Tubes[c.Tube].Name)),
                FixedDigits.Length(seam.Length),
                FixedDigits.Length(seam.Fillet),
                FixedDigits.Length(seam.Butt),
                FixedDigits.Angle(double.RadiansToDegrees(seam.Least)),
                FixedDigits.Angle(double.RadiansToDegrees(seam.Most)),
                seam.IsWelded ? FixedDigits.Length(seam.Leg) : string.Empty,
                seam.IsWelded ? FixedDigits.Mass(seam.FillerKg) : string.Empty);
        }

        return table.ToString();
    }
}
