using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;
using FrameBuilder = FrameGen.Tests.Joints.FrameBuilder;

namespace FrameGen.Tests.Fabrication;

/// <summary>Which tubes of a frame are one part, and what the part is called.</summary>
public class PartSorterTests
{
    /// <summary>
    /// Two rails 400 mm apart along x, equal rungs square to them at x = 200, 500 and 800, the second of which runs the other way; and
    /// two braces of equal length that lean to opposite sides and pass the second rail's axis at 5 mm: mirror images of each other.
    /// </summary>
    private static ShopPackage Ladder(CutMode mode, bool withPost = false, double lean = 150)
    {
        var frame = new FrameBuilder { Mode = mode };
        int[] near = Nodes(0, 0);
        int[] far = Nodes(400, 1);
        var rail = new RoundTube(42.4, 2.6);
        var rung = new RoundTube(30, 2);
        frame.Tube(near[0], near[^1], rail);
        frame.Tube(far[0], far[^1], rail);
        if (withPost)
        {
            int foot = frame.Node(new Vector3(350, 0, 0), 0);
            int post = frame.Tube(foot, frame.Node(new Vector3(350, 0, 300)), rung);
            frame.Joint(foot, 0, Corner.None, new TubeEndId(post, End.From));
        }

        Between(near[1], far[1]);
        Between(far[3], near[3]);
        Between(near[5], far[5]);
        Brace(500 - lean);
        Brace(500 + lean);
        return GateFrame.Planned(frame.Cut());

        int[] Nodes(double y, int through) =>
            [.. new double[] { 0, 200, 500 - lean, 500, 500 + lean, 800, 1000 }.Select(
                (x, i) => frame.Node(new Vector3(x, y, 0), i is 0 or 6 ? null : through))];
        void Between(int from, int to)
        {
            int tube = frame.Tube(from, to, rung);
            frame.Joint(from, from < 7 ? 0 : 1, Corner.None, new TubeEndId(tube, End.From));
            frame.Joint(to, to < 7 ? 0 : 1, Corner.None, new TubeEndId(tube, End.To));
        }

        void Brace(double x)
        {
            int start = frame.Node(new Vector3(500, 0, 0), 0);
            int stop = frame.Node(new Vector3(x, 400, 0), 1);
            int tube = frame.Tube(start, stop, new RoundTube(25, 2), toOffset: new Vector3(0, 0, 5));
            frame.Joint(start, 0, Corner.None, new TubeEndId(tube, End.From));
            frame.Joint(stop, 1, Corner.None, new TubeEndId(tube, End.To));
        }
    }

    [Theory]
    [InlineData(CutMode.Radial)]
    [InlineData(CutMode.Contour)]
    public void Rungs_are_one_part_and_braces_opposite_hands_of_one_mark(CutMode mode)
    {
        ShopPackage package = Ladder(mode);
        Assert.Equal([1, 1, 3, 2], package.Parts.Select(p => p.Quantity).ToArray());
        Part[] braces = [.. package.Parts.Take(2)];
        Assert.Equal(["A", "B"], braces.Select(p => p.Hand).ToArray());
        Assert.Equal(braces[0].Mark, braces[1].Mark);
        Assert.Equal($"{braces[0].Mark}-A", braces[0].Name);
        Part rungs = package.Parts[2];
        Assert.Equal(string.Empty, rungs.Hand);
        Assert.Equal(rungs.Mark, rungs.Name);
        Assert.Equal(new Placement(rungs.Drawn.Tube, 0, Swapped: false), rungs.Placed[0]);
        Assert.Equal(package.Cut.Tubes.Count, package.Parts.Sum(p => p.Quantity));
    }

    [Fact]
    public void A_mark_is_group_length_and_two_letters()
    {
        // A rung between axes 400 mm apart reaches to the far side of neither rail: square copes of a tube narrower than its mate leave
        // √(21.2² − 15²) mm short of the axis at the sides, 21.2 mm at the top.
        Part rungs = Ladder(CutMode.Contour).Parts[2];
        double length = 400 - (2 * Math.Sqrt((21.2 * 21.2) - (15 * 15)));
        Assert.Equal(length, rungs.Drawn.CutLength, 1e-3);
        Assert.Matches("^g2-370[b-df-hj-km-np-tv-z]{2}$", rungs.Mark);
    }

    [Fact]
    public void A_tube_more_leaves_the_other_marks_as_they_are()
    {
        string[] before = [.. Ladder(CutMode.Radial).Parts.Select(p => p.Name[(p.Name.IndexOf('-', StringComparison.Ordinal) + 1)..])];
        string[] after = [.. Ladder(CutMode.Radial, withPost: true).Parts.Select(p => p.Name[(p.Name.IndexOf('-', StringComparison.Ordinal) + 1)..])];
        Assert.Equal(before.Length + 1, after.Length);
        Assert.All(before, name => Assert.Contains(name, after));
    }

    [Fact]
    public void Groups_of_one_section_and_material_share_a_part()
    {
        // Each tube of the ladder stands in a group of its own; the rungs are one part all the same, named after the first one's group.
        ShopPackage package = Ladder(CutMode.Radial);
        Assert.StartsWith("g2-", package.Parts[2].Mark, StringComparison.Ordinal);
        Assert.StartsWith("g0-1000", package.Parts[3].Mark, StringComparison.Ordinal);
    }

    [Fact]
    public void No_two_parts_have_one_file_name()
    {
        // Forty lengths within one millimetre: the same stem, so that letters alone tell them apart.
        var frame = new FrameBuilder();
        for (int i = 0; i < 40; i++)
        {
            frame.Tube(frame.Node(new Vector3(0, 100 * i, 0)), frame.Node(new Vector3(500 + (0.02 * i) + (0.0001 * i), 100 * i, 0)), new Rod(10));
        }

        CutFrame cut = frame.Cut();
        TubeGroup one = cut.Sized.Model.Groups[0];
        FrameModel model = cut.Sized.Model with
        {
            Groups = [one],
            Tubes = [.. cut.Sized.Model.Tubes.Select(t => t with { Group = 0 })],
        };
        ShopPackage package = GateFrame.Planned(cut with { Sized = cut.Sized with { Model = model, Chosen = [cut.Sized.Chosen[0]] } });
        Assert.Equal(40, package.Parts.Count);
        Assert.Equal(40, package.Parts.Select(p => p.Name).Distinct(StringComparer.OrdinalIgnoreCase).Count());
    }
}
