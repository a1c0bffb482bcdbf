using FrameGen.Geometry;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class MirrorTests
{
    [Fact]
    public void Puts_twins_of_nodes_and_tubes_right_after_their_originals()
    {
        FrameModel model = Sledge().Model();

        Assert.Equal("front-l front-r rear-l rear-r nose axle-l axle-r", string.Join(' ', model.Nodes.Select(n => n.Name)));
        Assert.Equal("rail-l rail-r bow shaft-l shaft-r axle", string.Join(' ', model.Tubes.Select(t => t.Name)));
        Assert.Equal([null, 0, null, null, 3, null], model.Tubes.Select(t => t.Original));
    }

    [Fact]
    public void Reflects_nodes_and_leads_twins_to_twins_and_single_nodes()
    {
        FrameModel model = Sledge().Model();

        Assert.Equal(new Vector3(0, -300, 0), Node(model, "front-r").Position);
        Assert.Equal("front-r rear-r", Ends(model, "rail-r"));
        Assert.Equal("front-r nose", Ends(model, "shaft-r"));
    }

    [Fact]
    public void Puts_the_twin_of_a_node_on_a_tube_on_that_tubes_twin()
    {
        FrameModel model = Sledge().Model();
        Node axle = Node(model, "axle-r");

        Assert.Equal(1, axle.Through);
        Assert.Equal(600, axle.ThroughDistance);
        Assert.Equal(new Vector3(-600, -300, 0), axle.Position);
    }

    [Fact]
    public void Puts_the_twin_of_a_node_on_a_tube_across_the_plane_on_the_same_tube()
    {
        FrameModel model = Sledge().On("lug-l", "bow", distance: "100 mm").Model();
        Node lug = Node(model, "lug-r");

        Assert.Equal("bow", model.Tubes[lug.Through!.Value].Name);
        Assert.Equal(500, lug.ThroughDistance, 1e-9);
        Assert.Equal(new Vector3(0, -200, 0), Node(model, "lug-l").Position with { Y = -Node(model, "lug-l").Position.Y });
    }

    [Fact]
    public void Follows_a_twin_tube_that_is_written_from_its_other_end()
    {
        FrameModel model = Sledge().Tube("rail-r", "rear-r", "front-r").Model();
        Node axle = Node(model, "axle-r");

        Assert.Null(model.Tubes[axle.Through!.Value].Original);
        Assert.Equal(600, axle.ThroughDistance, 1e-9);
        Assert.Equal(new Vector3(-600, -300, 0), axle.Position);
    }

    [Fact]
    public void Refuses_a_twin_node_that_misses_a_tube_written_by_hand()
    {
        string error = Sledge().Node("rear-r", -1200, -330, 0).Error();

        Assert.Contains("node axle-r, the twin of axle-l, would lie", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Lets_a_twin_written_by_hand_win()
    {
        FrameModel model = SpecBuilder.WithTubes(("rail-l", "a-l", "b-l"))
            .Mirror('y', "-l", "-r")
            .Node("a-l", 0, 300, 0).Node("b-l", 500, 300, 0).Node("B-R", 500, -350, 0)
            .Model();

        Assert.Equal(4, model.Nodes.Count);
        Assert.Equal("a-r B-R", Ends(model, "rail-r"));
        Assert.Equal(new Vector3(500, -350, 0), Node(model, "B-R").Position);
    }

    [Fact]
    public void Refuses_a_single_node_off_the_plane()
    {
        string error = Sledge().Node("tow", 1200, 3, 0).Tube("bar", "nose", "tow").Error();

        Assert.Contains("node tow stays single", error, StringComparison.Ordinal);
        Assert.Contains("y = 3 mm", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_node_with_a_twin_on_the_plane()
    {
        string error = Sledge().Node("tow-l", 1200, 0, 0).Tube("bar", "nose", "tow-l").Error();

        Assert.Contains("node tow-l lies on the mirror plane (y = 0), where its twin tow-r would be too", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_tube_that_is_its_own_mirror_image_and_asks_for_a_twin()
    {
        string error = Sledge().Tube("tie-l", "rear-l", "rear-r").Error();

        Assert.Contains("tube tie-l is its own mirror image", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Crosses_a_diagonal_with_its_twin()
    {
        FrameModel model = Sledge().Tube("diagonal-l", "front-l", "rear-r", fromOffset: (0, 0, 40), toOffset: (0, 0, 40)).Model();

        Assert.Equal("front-r rear-l", Ends(model, "diagonal-r"));
    }

    [Fact]
    public void Reflects_offsets_and_a_written_up_and_leaves_a_default_up_alone()
    {
        FrameModel model = SpecBuilder.WithTubes()
            .Mirror('x', "-l", "-r")
            .Node("a-l", 300, 0, 0).Node("b-l", 300, 0, 500).Node("c-l", 300, 800, 0)
            .Tube("post-l", "a-l", "b-l")
            .Tube("rail-l", "a-l", "c-l", up: (1, 0, 1), fromOffset: (7, 0, 0), toOffset: (7, 0, 0))
            .Model();
        Tube post = Tube(model, "post-r");
        Tube rail = Tube(model, "rail-r");

        // A vertical tube's top line is global x on both sides.
        Assert.Equal(Vector3.UnitX, post.Axes.Z);
        Assert.Equal(new Vector3(-307, 0, 0), rail.From.Point);
        Assert.Equal(-Math.Sqrt(0.5), rail.Axes.Z.X, 1e-15);
        Assert.Equal(Math.Sqrt(0.5), rail.Axes.Z.Z, 1e-15);
    }

    // Across y: a force's y changes its sign; a moment keeps its y and changes the others. By hand: a push outwards on the
    // left is a push outwards on the right; a pair of screwdrivers turning in mirror image turn the other way about x and z.
    [Fact]
    public void Reflects_forces_and_turns_moments_by_the_opposite_rule()
    {
        SpecBuilder spec = Sledge().Hold("rear-l").Hold("nose");
        FrameModel model = spec.Case("push", loads: [spec.NodeLoad("front-l", (1, 2, 3), (4, 5, 6))]).Model();

        Assert.Equal(
            [new NodeLoad(0, new Vector3(1, 2, 3), new Vector3(4, 5, 6)), new NodeLoad(1, new Vector3(1, -2, 3), new Vector3(-4, 5, -6))],
            model.Cases[0].NodeLoads);
    }

    // Across x and z the same rule, written out.
    [Theory]
    [InlineData('x', -1, 2, 3, 4, -5, -6)]
    [InlineData('z', 1, 2, -3, -4, -5, 6)]
    public void Reflects_across_every_plane(char across, double fx, double fy, double fz, double mx, double my, double mz)
    {
        SpecBuilder spec = SpecBuilder.WithTubes(("rail-a", "p-a", "q-a")).Mirror(across, "-a", "-b");
        FrameModel model = spec
            .Node("p-a", 300, 300, 300).Node("q-a", 900, 500, 400).Hold("q-a")
            .Case("push", loads: [spec.NodeLoad("p-a", (1, 2, 3), (4, 5, 6))])
            .Model();

        Assert.Equal(new NodeLoad(1, new Vector3(fx, fy, fz), new Vector3(mx, my, mz)), model.Cases[0].NodeLoads[1]);
    }

    // The physics behind the rule: a force at an arm has a moment about the origin; its mirror image has the mirrored moment.
    [Fact]
    public void Reflects_a_force_and_its_moment_consistently()
    {
        var mirror = FrameGen.Model.Resolving.Reflection.Of(new MirrorSpec(1, "-l", "-r", new("f", 1, 1)), [])!;
        var arm = new Vector3(3, -7, 2);
        var force = new Vector3(-5, 11, 13);

        Assert.Equal(mirror.Of(arm).Cross(mirror.Of(force)), mirror.OfMoment(arm.Cross(force)));
    }

    [Fact]
    public void Reflects_loads_along_and_at_places_on_tubes()
    {
        SpecBuilder spec = Sledge().Hold("rear-l").Hold("nose");
        FrameModel model = spec
            .Case("push", loads: [spec.LineLoad("rail-l", (0, 0.5, -2)), spec.PointLoad("rail-l", distance: "100 mm", force: (0, 9, 1), moment: (1, 2, 3))])
            .Model();

        Assert.Equal([new LineLoad(0, new Vector3(0, 0.5, -2)), new LineLoad(1, new Vector3(0, -0.5, -2))], model.Cases[0].LineLoads);
        Assert.Equal(new PointLoad(1, 100, new Vector3(0, -9, 1), new Vector3(-1, 2, -3)), model.Cases[0].PointLoads[1]);
    }

    [Fact]
    public void Finds_the_mirrored_place_on_a_tube_written_from_its_other_end()
    {
        SpecBuilder spec = Sledge().Tube("rail-r", "rear-r", "front-r").Hold("rear-l").Hold("nose");
        FrameModel model = spec.Case("push", loads: [spec.PointLoad("rail-l", distance: "100 mm", force: (0, 0, -1))]).Model();

        Assert.Equal(1100, model.Cases[0].PointLoads[1].Distance, 1e-9);
    }

    [Fact]
    public void Doubles_no_load_on_single_nodes_and_tubes_or_on_twins()
    {
        SpecBuilder spec = Sledge().Hold("rear-l").Hold("nose");
        FrameModel model = spec
            .Case("push", loads: [spec.NodeLoad("nose", (0, 1, 0)), spec.NodeLoad("front-r", (0, 0, 1)), spec.LineLoad("bow", (0, 0, 1))])
            .Model();

        Assert.Equal(2, model.Cases[0].NodeLoads.Count);
        Assert.Single(model.Cases[0].LineLoads);
    }

    [Fact]
    public void Makes_no_twin_where_mirror_is_false()
    {
        SpecBuilder spec = Sledge().Hold("rear-l", mirror: false).Hold("nose").NodeMass("front-l", "3 kg", mirror: false);
        FrameModel model = spec
            .Case("kerb", loads: [spec.NodeLoad("front-l", (0, 0, 1), mirror: false)])
            .Case("gust", loads: [spec.NodeLoad("front-l", (0, 1, 0))], mirror: false)
            .Model();

        Assert.Equal(2, model.Supports.Count);
        Assert.Single(model.Masses);
        Assert.Single(model.Cases[0].NodeLoads);
        Assert.Single(model.Cases[1].NodeLoads);
    }

    [Fact]
    public void Lets_a_load_mass_or_support_on_the_twin_replace_the_made_one()
    {
        SpecBuilder spec = Sledge().Hold("rear-l", "x y z").Hold("rear-r", "z").NodeMass("front-l", "3 kg").NodeMass("front-r", "4 kg")
            .TubeMass("rail-l", "8 kg");
        FrameModel model = spec
            .Case("push", loads: [spec.NodeLoad("front-l", (0, 0, 1)), spec.NodeLoad("front-r", (0, 0, 7))])
            .Case("pull", loads: [spec.NodeLoad("front-l", (0, 0, 1)), spec.LineLoad("rail-r", (0, 0, 1))])
            .Model();

        Assert.Equal(
            [new CarriedMass(0, null, 3), new CarriedMass(1, null, 4), new CarriedMass(null, 0, 8), new CarriedMass(null, 1, 8)], model.Masses);
        Assert.Equal([false, false, true, false, false, false], model.Supports[1].Held);
        Assert.Equal([1.0, 7.0], model.Cases[0].NodeLoads.Select(l => l.Force.Z));

        // Another kind of load on the twin's side leaves the made twin alone.
        Assert.Equal(2, model.Cases[1].NodeLoads.Count);
    }

    [Fact]
    public void Lets_supports_that_a_case_names_act_with_their_twins()
    {
        FrameModel model = Sledge().Hold("rear-l").Hold("axle-l", "z").Hold("nose")
            .Case("parked", weight: (0, 0, -1), supports: ["nose", "axle-l"])
            .Case("rolling", weight: (0, 0, -1))
            .Model();

        Assert.Equal("axle-l axle-r nose", Held(model, model.Cases[0]));
        Assert.Equal("rear-l rear-r axle-l axle-r nose", Held(model, model.Cases[1]));
    }

    [Fact]
    public void Reflects_joints_with_the_names_in_them()
    {
        FrameModel model = Sledge().Joint("front-l", order: ["bow", "rail-l", "shaft-l"]).Joint("nose", miter: ["shaft-l", "shaft-r"]).Model();

        JointRequest twin = model.JointAt[1]!;
        Assert.Equal("bow rail-r shaft-r", string.Join(' ', twin.Order.Select(t => model.Tubes[t].Name)));
        Assert.Equal((3, 4), model.JointAt[4]!.Miter);
        Assert.Equal(3, model.Joints.Count);
    }

    [Fact]
    public void Turns_names_of_twins_in_a_joint_back_into_their_originals()
    {
        FrameModel model = Sledge()
            .Tube("diagonal-l", "front-l", "rear-r", fromOffset: (0, 0, 40), toOffset: (0, 0, 40))
            .Joint("rear-l", order: ["diagonal-r", "rail-l"])
            .Model();

        Assert.Equal("diagonal-l rail-r", string.Join(' ', model.JointAt[3]!.Order.Select(t => model.Tubes[t].Name)));
    }

    [Fact]
    public void Covers_the_twin_with_a_target_on_a_tube()
    {
        FrameModel model = Sledge().Target(s => TargetTests.Floor(s, tube: "rail-l")).Target(s => TargetTests.Floor(s, tube: "shaft-r")).Model();

        Assert.Equal([0, 1], ((MemberTarget)model.Targets[0]).Tubes);
        Assert.Equal([4], ((MemberTarget)model.Targets[1]).Tubes);
        Assert.Equal("tube rail-l", ((MemberTarget)model.Targets[0]).Subject);
    }

    [Theory]
    [InlineData("-l", "/../x")]
    [InlineData("", "-r")]
    [InlineData("-r", "-r")]
    [InlineData("-l", "-x-l")]
    public void Refuses_endings_that_make_no_clear_names(string ending, string twinEnding)
    {
        string error = SpecBuilder.WithTubes(("beam", "a", "b")).Mirror('y', ending, twinEnding).Node("a", 0, 0, 0).Node("b", 500, 0, 0).Error();

        Assert.StartsWith("mirror:", error, StringComparison.Ordinal);
    }

    // A sledge across y: two rails, a bow in front, two shafts to a single nose, an axle between nodes on the rails.
    private static SpecBuilder Sledge() => SpecBuilder
        .WithTubes(("rail-l", "front-l", "rear-l"), ("bow", "front-l", "front-r"), ("shaft-l", "front-l", "nose"), ("axle", "axle-l", "axle-r"))
        .Mirror('y', "-l", "-r")
        .Node("front-l", 0, 300, 0).Node("rear-l", -1200, 300, 0).Node("nose", 850, 0, -60)
        .On("axle-l", "rail-l", share: "50 %");

    private static Node Node(FrameModel model, string name) => Assert.Single(model.Nodes, n => string.Equals(n.Name, name, StringComparison.Ordinal));

    private static Tube Tube(FrameModel model, string name) => Assert.Single(model.Tubes, t => string.Equals(t.Name, name, StringComparison.Ordinal));

    private static string Ends(FrameModel model, string tube) =>
        $"{model.Nodes[Tube(model, tube).From.Node].Name} {model.Nodes[Tube(model, tube).To.Node].Name}";

    private static string Held(FrameModel model, LoadCase loadCase) =>
        string.Join(' ', loadCase.Supports.Select(s => model.Nodes[model.Supports[s].Node].Name));
}
