using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class JointOrderTests
{
    // Directions away from the node; tubes of the big group are 40 mm, of the small one 30 mm wide.
    private static readonly (double, double, double) East = (1, 0, 0);
    private static readonly (double, double, double) North = (0, 1, 0);
    private static readonly (double, double, double) West = (-1, 0, 0);
    private static readonly (double, double, double) Up = (0, 0, 1);

    [Fact]
    public void Puts_larger_tubes_first_and_keeps_the_order_of_the_spec_among_equal_ones()
    {
        FrameModel model = Star(("a", East, "small"), ("b", North, "big"), ("c", Up, "small"), ("d", (1, 1, 1), "big"));

        Assert.Equal("b d a c", Names(model, At(model)));
    }

    [Fact]
    public void Asks_the_design_which_tube_is_larger()
    {
        FrameModel model = Star(("a", East, "small"), ("b", North, "big"));

        NodeJoint joint = JointOrder.At(model, 0, [new RoundTube(35, 2), new RoundTube(25, 2)]);

        Assert.Equal("b a", Names(model, At(model)));
        Assert.Equal("a b", Names(model, joint));
    }

    [Fact]
    public void Takes_one_and_a_half_inches_for_as_large_as_its_millimetres()
    {
        FrameModel model = Star(("a", East, "small"), ("b", North, "big"));

        // 1.5 × 25.4 is not 38.1 in floating point.
        NodeJoint joint = JointOrder.At(model, 0, [new RoundTube(38.1, 2), new RoundTube(1.5 * 25.4, 2)]);

        Assert.Equal("a b", Names(model, joint));
    }

    [Fact]
    public void Puts_a_twin_right_after_its_original()
    {
        FrameModel model = SpecBuilder.WithTubes()
            .Mirror('y', "-l", "-r")
            .Node("hub", 0, 0, 0).Node("nose", 900, 0, 0).Node("arm-l", 0, 500, 200)
            .Tube("brace-l", "hub", "arm-l").Tube("mast", "hub", "nose")
            .Model();

        Assert.Equal("brace-l brace-r mast", Names(model, JointOrder.At(model, 0, Sections(model))));
    }

    [Fact]
    public void Puts_the_mitred_pair_first_then_the_written_order_then_the_rest()
    {
        FrameModel model = Star(
            spec => spec.Joint("hub", miter: ["d", "a"], order: ["c"]),
            ("a", East, "small"), ("b", North, "big"), ("c", Up, "small"), ("d", (1, 1, 1), "big"), ("e", (0, -1, 0), "small"));
        NodeJoint joint = At(model);

        Assert.Equal("d a c b e", Names(model, joint));
        Assert.Equal(Corner.Miter, joint.Corner);
    }

    [Fact]
    public void Puts_a_through_tube_before_all_ends_and_lets_nothing_run_out()
    {
        FrameModel model = SpecBuilder.WithTubes(("beam", "a", "b"), ("post", "knee", "foot"), ("arm", "knee", "hand"))
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Node("foot", 500, 0, -500).Node("hand", 500, 400, 0)
            .On("knee", "beam", share: "50 %")
            .Joint("knee", order: ["beam", "arm"])
            .Model();
        NodeJoint joint = JointOrder.At(model, 4, Sections(model));

        Assert.Equal(0, joint.Through);
        Assert.Equal("arm post", Names(model, joint));
        Assert.Equal(Corner.None, joint.Corner);
    }

    [Fact]
    public void Leaves_a_single_end_alone()
    {
        FrameModel model = Star(("a", East, "small"));

        Assert.Equal(Corner.None, At(model).Corner);
    }

    // Equal tubes, so many degrees apart.
    [Theory]
    [InlineData(30, Corner.RunOut)]
    [InlineData(90, Corner.RunOut)]
    [InlineData(120, Corner.RunOut)] // a hexagon's corner: not more than 120 degrees
    [InlineData(120.001, Corner.Miter)]
    [InlineData(178.9, Corner.Miter)]
    [InlineData(179, Corner.InLine)]
    [InlineData(180, Corner.InLine)]
    public void Tells_the_corner_by_the_angle_of_the_first_two(double degrees, Corner corner)
    {
        double angle = degrees * Math.PI / 180;

        Assert.Equal(corner, At(Star(("a", East, "small"), ("b", (Math.Cos(angle), Math.Sin(angle), 0), "small"))).Corner);
    }

    [Theory]
    [InlineData(10)]
    [InlineData(47)]
    [InlineData(283)]
    public void Gives_a_hexagon_the_same_corners_however_it_is_turned(double degrees)
    {
        double turn = degrees * Math.PI / 180;
        double other = turn + (120 * Math.PI / 180);

        Assert.Equal(
            Corner.RunOut,
            At(Star(("a", (Math.Cos(turn), Math.Sin(turn), 0), "small"), ("b", (Math.Cos(other), Math.Sin(other), 0), "small"))).Corner);
    }

    [Fact]
    public void Mitres_only_tubes_of_one_outer_size() =>
        Assert.Equal(Corner.RunOut, At(Star(("a", East, "small"), ("b", (-1, 1, 0), "big"))).Corner);

    [Fact]
    public void Mitres_tubes_whose_walls_differ()
    {
        FrameModel model = Star(("a", East, "small"), ("b", (-1, 1, 0), "big"));

        Assert.Equal(Corner.Miter, JointOrder.At(model, 0, [new RoundTube(30, 2), new RoundTube(30, 1.5)]).Corner);
    }

    [Fact]
    public void Mitres_no_rod_to_a_tube()
    {
        FrameModel model = Star(("a", East, "small"), ("b", (-1, 1, 0), "big"));

        Assert.Equal(Corner.RunOut, JointOrder.At(model, 0, [new RoundTube(30, 2), new Rod(30)]).Corner);
    }

    [Fact]
    public void Looks_at_the_first_two_of_the_order_only() =>
        Assert.Equal(Corner.RunOut, At(Star(("a", East, "small"), ("b", North, "small"), ("c", (-1, 0.2, 0), "small"))).Corner);

    [Fact]
    public void Obeys_an_order_that_names_both_of_a_pair_it_would_mitre()
    {
        FrameModel both = Star(s => s.Joint("hub", order: ["b", "a"]), ("a", East, "small"), ("b", (-1, 1, 0), "small"));
        FrameModel one = Star(s => s.Joint("hub", order: ["b"]), ("a", East, "small"), ("b", (-1, 1, 0), "small"));

        Assert.Equal(("b a", Corner.RunOut), (Names(both, At(both)), At(both).Corner));
        Assert.Equal(("b a", Corner.Miter), (Names(one, At(one)), At(one).Corner));
    }

    [Theory]
    [InlineData(RequestedCut.Square, null)]
    [InlineData(RequestedCut.Cope, null)]
    [InlineData(RequestedCut.Default, "5 mm")]
    public void Obeys_a_cut_or_extend_of_an_end_it_would_mitre(RequestedCut cut, string? extend)
    {
        SpecBuilder spec = SpecBuilder.WithTubes(("a", "hub", "p")).Node("hub", 0, 0, 0).Node("p", 500, 0, 0).Node("q", -400, 400, 0);
        FrameModel model = spec.Tube("b", "q", "hub", toCut: spec.Cut(cut, extend)).Model();

        Assert.Equal(Corner.RunOut, JointOrder.At(model, 0, Sections(model)).Corner);
    }

    [Fact]
    public void Mitres_only_axes_that_end_at_one_place()
    {
        FrameModel model = SpecBuilder.WithTubes(("a", "hub", "p"))
            .Node("hub", 0, 0, 0).Node("p", 500, 0, 0).Node("q", -400, 400, 0)
            .Tube("b", "hub", "q", fromOffset: (0, 0, 5))
            .Model();

        Assert.Equal(Corner.RunOut, JointOrder.At(model, 0, Sections(model)).Corner);
    }

    [Theory]
    [InlineData(10, Corner.InLine)]
    [InlineData(29, Corner.InLine)]
    [InlineData(31, Corner.RunOut)] // 30 mm tubes: they pass each other without touching
    public void Butts_tubes_in_line_only_where_they_meet(double offset, Corner corner)
    {
        FrameModel model = SpecBuilder.WithTubes(("a", "hub", "p"))
            .Node("hub", 0, 0, 0).Node("p", 500, 0, 0).Node("q", -500, 0, 0)
            .Tube("b", "hub", "q", fromOffset: (0, offset, 0), toOffset: (0, offset, 0))
            .Model();

        Assert.Equal(corner, JointOrder.At(model, 0, Sections(model)).Corner);
    }

    [Fact]
    public void Refuses_a_node_that_is_not_there() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => JointOrder.At(Star(("a", East, "small"), ("b", West, "small")), 3, []));

    private static FrameModel Star(params (string Name, (double X, double Y, double Z) Direction, string Group)[] tubes) => Star(null, tubes);

    private static FrameModel Star(
        Action<SpecBuilder>? more, params (string Name, (double X, double Y, double Z) Direction, string Group)[] tubes)
    {
        SpecBuilder spec = SpecBuilder.New()
            .Fixed("small", "S235", new RoundTube(30, 2)).Fixed("big", "S235", new RoundTube(40, 2)).Node("hub", 0, 0, 0);
        foreach ((string name, (double x, double y, double z), string group) in tubes)
        {
            spec.Node($"end-{name}", 500 * x, 500 * y, 500 * z).Tube(name, "hub", $"end-{name}", group);
        }

        more?.Invoke(spec);
        return spec.Model();
    }

    private static Section[] Sections(FrameModel model) => [.. model.Groups.Select(g => g.Candidates[0].Section)];

    private static NodeJoint At(FrameModel model) => JointOrder.At(model, 0, Sections(model));

    private static string Names(FrameModel model, NodeJoint joint) => string.Join(' ', joint.Ends.Select(e => model.Tubes[e.Tube].Name));
}
