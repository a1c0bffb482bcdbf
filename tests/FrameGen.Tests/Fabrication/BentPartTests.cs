using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Output;
using FrameGen.Tests.Joints;
using Xunit;

namespace FrameGen.Tests.Fabrication;

/// <summary>Which bent tubes are one part, and what the shop bends.</summary>
public class BentPartTests
{
    private static readonly Vector3[] Skew = [new(0, 0, 0), new(400, 0, 0), new(450, 420, 60), new(500, 450, 500), new(900, 500, 600)];

    private static readonly Vector3[] Flat = [new(0, 0, 0), new(400, 0, 0), new(450, 420, 0), new(900, 400, 0)];

    [Fact]
    public void The_same_tube_turned_in_space_or_written_from_its_other_end_is_one_part()
    {
        Part part = Assert.Single(Parts(Skew, [.. Skew.Select(Turned)], [.. Skew.Reverse().Select(Turned)]));
        Assert.Equal([false, false, true], part.Placed.Select(p => p.Swapped));

        // A mark on the drawing at the inside of the first bend comes to the inside of that bend on every tube.
        ShopPackage package = Package(Skew, [.. Skew.Select(Turned)], [.. Skew.Reverse().Select(Turned)]);
        part = package.Parts[0];
        IReadOnlyList<FrameGen.Model.TubeBend>[] bends = [.. package.Cut.Sized.Model.Tubes.Select(FrameGen.Model.TubeBend.Of)];
        double drawn = bends[0][0].Clock;
        Assert.Equal(0, Math.IEEERemainder(drawn + part.Placed[1].Turn - bends[1][0].Clock, 2 * Math.PI), 1e-9);
        Assert.Equal(0, Math.IEEERemainder(part.Placed[2].Turn - drawn - bends[2][^1].Clock, 2 * Math.PI), 1e-9);
    }

    [Fact]
    public void A_mirror_image_is_the_opposite_hand_whichever_comes_first()
    {
        Vector3[] image = [.. Skew.Select(c => new Vector3(c.X, c.Y, -c.Z))];
        IReadOnlyList<Part> parts = Parts(Skew, image);
        Assert.Equal(2, parts.Count);
        Assert.Single(parts.Select(p => p.Mark).Distinct(StringComparer.Ordinal));
        IReadOnlyList<Part> swapped = Parts(image, [.. Skew.Reverse()]);
        Assert.Equal(
            parts.Single(p => p.Tubes.Contains(0)).Hand,
            swapped.Single(p => p.Tubes.Contains(1)).Hand);
    }

    [Fact]
    public void A_flat_tube_is_its_own_mirror_image() =>
        Assert.Equal(2, Assert.Single(Parts(Flat, [.. Flat.Select(c => new Vector3(c.X, -c.Y, 100))])).Quantity);

    [Fact]
    public void Another_rotation_angle_or_place_of_a_bend_is_another_part()
    {
        // The last leg turned about the one before it: all lengths and angles stay, one rotation does not.
        Vector3 axis = (Skew[3] - Skew[2]).Normalized();
        Vector3 leg = Skew[4] - Skew[3];
        const double Turn = 0.01;
        Vector3 moved = Skew[3] + (Math.Cos(Turn) * leg) + (Math.Sin(Turn) * axis.Cross(leg)) + ((1 - Math.Cos(Turn)) * axis.Dot(leg) * axis);
        Assert.Equal(2, Parts(Skew, [.. Skew[..4], moved]).Count);
        Assert.Equal(2, Parts(Flat, [Flat[0], Flat[1], Flat[2], new(900, 405, 0)]).Count);

        // The same length in all, shared out otherwise.
        Vector3[] shifted = [new(10, 0, 0), .. Flat[1..3], Flat[3] + (10 * (Flat[3] - Flat[2]).Normalized())];
        Assert.Equal(2, Parts(Flat, shifted).Count);
    }

    // Corners 1 m apart at right angles, radius 100: 900 mm to the bend, π/2 · 100 round it.
    [Fact]
    public void Bends_csv_has_a_row_a_bend_from_the_end_of_the_blank()
    {
        string text = BentFrame.Alone(
            "round 30 x 2 mm", 100, [new(0, 0, 0), new(1000, 0, 0), new(1000, 1000, 0), new(1000, 1000, -1000)], ", ends: {from: {cut: square, extend: 25 mm}}");
        ShopPackage package = BentFrame.Planned(text + "fabrication: {springback: 2 deg}\n");
        string mark = package.Parts[0].Name;
        Assert.Equal(
            $"""
            tube,mark,bend,straight_mm,rotation_deg,angle_deg,radius_mm,start_mm
            bow,{mark},1,925.000,0.000,90.000,100.000,925.000
            bow,{mark},2,800.000,-90.000,90.000,100.000,1882.080

            """.ReplaceLineEndings("\n"),
            BendsCsv.Write(package));
        BentPart paper = Assert.Single(BendsModel.From(package).Parts);
        Assert.Equal(("92.0", "90.0"), (paper.Bends[1].MachineAngle, paper.Bends[1].Angle));
        Assert.Equal("900.0", paper.LastStraight);
        Assert.Equal("2939.2", paper.CutLength);
    }

    private static Vector3 Turned(Vector3 v)
    {
        // A third of a turn about (1, 1, 1), and a shift.
        return new Vector3(v.Z, v.X, v.Y) + new Vector3(70, -2000, 5);
    }

    private static IReadOnlyList<Part> Parts(params Vector3[][] tubes) => Package(tubes).Parts;

    private static ShopPackage Package(params Vector3[][] tubes)
    {
        var text = new System.Text.StringBuilder("framegen: 1\ngroups: {main: {material: S235, section: round 20 x 2 mm}}\nnodes:\n");
        for (int t = 0; t < tubes.Length; t++)
        {
            for (int i = 0; i < tubes[t].Length; i++)
            {
                // Tubes apart: they are not to meet.
                text.Append(System.Globalization.CultureInfo.InvariantCulture, $"  n{t}-{i}: {BentFrame.At(tubes[t][i] + new Vector3(0, 0, 3000 * t))}\n");
            }
        }

        text.Append("tubes:\n");
        for (int t = 0; t < tubes.Length; t++)
        {
            string via = string.Join(", ", Enumerable.Range(1, tubes[t].Length - 2).Select(i => $"n{t}-{i}"));
            text.Append(System.Globalization.CultureInfo.InvariantCulture, $"  bow-{t}: {{from: n{t}-0, to: n{t}-{tubes[t].Length - 1}, via: [{via}], bend_radius: 60 mm, group: main}}\n");
        }

        return BentFrame.Planned(text.ToString());
    }
}
