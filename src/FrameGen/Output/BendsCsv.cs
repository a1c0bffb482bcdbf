using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>bends.csv: one row a bend, in the order of bending. Angles are those of the finished part, without springback.</summary>
internal static class BendsCsv
{
    /// <summary>Writes the table, tubes in the order of the spec.</summary>
    public static string Write(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        string[] marks = PartMarks.ByTube(package);
        var table = new CsvTable("tube", "mark", "bend", "straight_mm", "rotation_deg", "angle_deg", "radius_mm", "start_mm");
        foreach (CutTube cut in package.Cut.Tubes)
        {
            foreach (BendStep step in BendStep.Of(model, cut))
            {
                table.Row(
                    model.Tubes[cut.Tube].Name,
                    marks[cut.Tube],
                    step.Bend.Number.ToString(CultureInfo.InvariantCulture),
                    FixedDigits.Length(step.Straight),
                    FixedDigits.Angle(double.RadiansToDegrees(step.Bend.Rotation)),
                    FixedDigits.Angle(double.RadiansToDegrees(step.Bend.Angle)),
                    FixedDigits.Length(step.Bend.Radius),
                    FixedDigits.Length(step.Start));
            }
        }

        return table.ToString();
    }
}
