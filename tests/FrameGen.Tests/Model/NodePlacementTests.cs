using FrameGen.Geometry;
using FrameGen.Model;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class NodePlacementTests
{
    [Fact]
    public void Places_nodes_on_a_tube_by_share_and_by_distance_from_its_from_end()
    {
        FrameModel model = Beam().On("third", "beam", distance: "300 mm").On("middle", "beam", share: "50 %").Model();

        Node third = model.Nodes[2];
        Node middle = model.Nodes[3];
        Assert.Equal(new Vector3(400, 0, 0), third.Position);
        Assert.Equal((0, 300.0), (third.Through, third.ThroughDistance));
        Assert.Equal(new Vector3(600, 0, 0), middle.Position);
        Assert.Equal(500, middle.ThroughDistance);
        Assert.Equal([2, 3], model.Tubes[0].NodesOn);
    }

    [Fact]
    public void Lists_the_nodes_on_a_tube_by_their_distance()
    {
        FrameModel model = Beam().On("late", "beam", share: "80 %").On("early", "beam", share: "20 %").Model();

        Assert.Equal("early late", string.Join(' ', model.Tubes[0].NodesOn.Select(n => model.Nodes[n].Name)));
    }

    [Fact]
    public void Places_a_node_on_the_axis_of_a_tube_that_passes_its_nodes_at_a_distance()
    {
        FrameModel model = SpecBuilder.WithTubes()
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0)
            .Tube("beam", "a", "b", fromOffset: (0, 0, 50), toOffset: (0, 0, 50))
            .On("middle", "beam", share: "50 %")
            .Model();

        Assert.Equal(new Vector3(500, 0, 50), model.Nodes[2].Position);
        Assert.Equal(new Vector3(0, 0, 50), model.Tubes[0].From.Point);
        Assert.Equal(1000, model.Tubes[0].Length);
    }

    [Fact]
    public void Takes_nodes_in_any_order()
    {
        FrameModel model = SpecBuilder.WithTubes(("beam", "a", "b"), ("post", "foot", "knee"))
            .On("knee", "beam", share: "25 %")
            .Offset("foot", "knee", 0, 0, -200)
            .Between("b", "a", "far", "50 %")
            .Node("far", 2000, 0, 0)
            .Node("a", 0, 0, 0)
            .Model();

        Assert.Equal(new Vector3(250, 0, 0), model.Nodes[0].Position);
        Assert.Equal(new Vector3(250, 0, -200), model.Nodes[1].Position);
        Assert.Equal(new Vector3(1000, 0, 0), model.Nodes[2].Position);
    }

    [Fact]
    public void Shows_the_ring_in_which_nodes_depend_on_each_other()
    {
        string error = SpecBuilder.WithTubes(("beam", "a", "b"))
            .Node("a", 0, 0, 0)
            .Offset("b", "c", 1000, 0, 0)
            .On("c", "beam", share: "50 %")
            .Error();

        Assert.Contains("b -> c (on beam) -> b", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Follows_a_chain_of_ten_thousand_offsets()
    {
        const int Links = 10_000;
        SpecBuilder spec = SpecBuilder.WithTubes(("beam", "n0", "n1"));
        for (int i = Links; i > 0; i--)
        {
            spec.Offset($"n{i}", $"n{i - 1}", 1, 2, 0);
        }

        FrameModel model = spec.Node("n0", 0, 0, 0).Model();

        Assert.Equal(new Vector3(Links, 2 * Links, 0), model.Nodes[0].Position);
    }

    [Theory]
    [InlineData("0 %", "a")]
    [InlineData("100 %", "b")]
    [InlineData("-10 %", "a")]
    [InlineData("120 %", "b")]
    public void Sends_a_node_at_or_beyond_a_tubes_end_to_the_end_node(string share, string endNode)
    {
        string error = Beam().On("c", "beam", share: share).Error();

        Assert.Contains("node c is not inside tube beam", error, StringComparison.Ordinal);
        Assert.Contains($"use {endNode} there", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Names_the_nearest_node_or_tube_when_one_is_misspelt()
    {
        string[] errors = Beam().Offset("c", "aa", 0, 0, 10).On("d", "bean", share: "50 %").AllErrors();

        Assert.Contains(errors, e => e.Contains("node c: there is no node aa; did you mean 'a'?", StringComparison.Ordinal));
        Assert.Contains(errors, e => e.Contains("node d: there is no tube bean; did you mean 'beam'?", StringComparison.Ordinal));
    }

    [Fact]
    public void Refuses_two_nodes_at_one_place()
    {
        string error = Beam().Node("c", 100.05, 0.05, 0).Error();

        Assert.Contains("nodes a and c are at the same place", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Suggests_on_for_a_node_that_lies_on_an_axis_without_being_joined_to_it()
    {
        string error = SpecBuilder.WithTubes(("beam", "a", "b"), ("post", "c", "top"))
            .Node("a", 100, 0, 0).Node("b", 1100, 0, 0)
            .Node("c", 350, 0.05, 0).Node("top", 350, 0, 400)
            .Error();

        Assert.Contains("node c lies on the axis of tube beam", error, StringComparison.Ordinal);
        Assert.Contains("c: {on: beam, distance: 250 mm}", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Lets_only_one_tube_run_through_a_node()
    {
        string error = SpecBuilder.WithTubes(("beam", "a", "b"), ("cross", "c", "d"))
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Node("c", 500, -300, 0).Node("d", 500, 300, 0)
            .On("middle", "beam", share: "50 %")
            .Error();

        Assert.Contains("node middle lies on the axis of tube cross", error, StringComparison.Ordinal);
        Assert.Contains("let cross end there, as two tubes", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Lets_a_node_stand_just_beside_an_axis()
    {
        FrameModel model = SpecBuilder.WithTubes(("beam", "a", "b"), ("post", "c", "top"))
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0)
            .Node("c", 350, 0.2, 0).Node("top", 350, 0, 400)
            .Model();

        Assert.Null(model.Nodes[2].Through);
    }

    private static SpecBuilder Beam() => SpecBuilder.WithTubes(("beam", "a", "b")).Node("a", 100, 0, 0).Node("b", 1100, 0, 0);
}
