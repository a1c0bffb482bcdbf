using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Model;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class CaseTests
{
    [Fact]
    public void Takes_in_what_a_case_adds_with_its_factors_and_theirs()
    {
        SpecBuilder spec = Beam();
        FrameModel model = spec
            .Case("all", weight: (0.5, 0, 0), add: [("two", "2"), ("one", "-1")], loads: [spec.NodeLoad("b", (7, 0, 0))])
            .Case("one", weight: (0, 0, -1), loads: [spec.NodeLoad("b", (0, 0, -10), (0, 3, 0))])
            .Case("two", add: [("one", "3")], loads: [spec.LineLoad("beam", (0, 0, -0.2)), spec.PointLoad("beam", share: "25 %", force: (0, 4, 0))])
            .Model();
        LoadCase all = model.Cases[0];

        // By hand: one counts 2 × 3 − 1 = 5 times, two twice.
        Assert.Equal(new Vector3(0.5, 0, -5), all.SelfWeight);
        Assert.Equal(
            [new NodeLoad(1, new Vector3(7, 0, 0), Vector3.Zero), new NodeLoad(1, new Vector3(0, 0, -50), new Vector3(0, 15, 0))], all.NodeLoads);
        Assert.Equal(new LineLoad(0, new Vector3(0, 0, -0.4)), Assert.Single(all.LineLoads));
        Assert.Equal(new PointLoad(0, 250, new Vector3(0, 8, 0), Vector3.Zero), Assert.Single(all.PointLoads));
    }

    [Fact]
    public void Shows_the_ring_in_which_cases_add_each_other()
    {
        string error = Beam().Case("one", add: [("two", "1")]).Case("two", add: [("three", "1")]).Case("three", add: [("two", "1")]).Error();

        Assert.Contains("two -> three -> two", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Sums_up_a_case_that_is_reached_on_very_many_ways()
    {
        SpecBuilder spec = Beam();
        spec.Case("c0", loads: [spec.NodeLoad("b", (0, 0, -1))]);
        for (int i = 1; i <= 40; i++)
        {
            spec.Case($"c{i}", add: [($"c{i - 1}", "1"), ($"c{Math.Max(0, i - 2)}", i == 1 ? "0" : "1")]);
        }

        // Fibonacci numbers: F(41) = 165 580 141 ways.
        Assert.Equal(-165_580_141, Assert.Single(spec.Model().Cases[40].NodeLoads).Force.Z);
    }

    [Fact]
    public void Does_not_inherit_the_supports_of_what_it_adds()
    {
        FrameModel model = Beam().Hold("b", "z")
            .Case("parked", weight: (0, 0, -1), supports: ["a"])
            .Case("towed", add: [("parked", "1")])
            .Model();

        Assert.Equal([0], model.Cases[0].Supports);
        Assert.Equal([0, 1], model.Cases[1].Supports);
    }

    [Fact]
    public void Refuses_a_case_that_nothing_holds()
    {
        string error = SpecBuilder.WithTubes(("beam", "a", "b")).Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Case("one", weight: (0, 0, -1)).Error();

        Assert.Contains("case one: nothing holds the frame", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_support_that_is_not_there()
    {
        string error = Beam().Case("one", weight: (0, 0, -1), supports: ["b"]).Error();

        Assert.Contains("case one: node b has no support; held are a", error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("101 %", null)]
    [InlineData(null, "-1 mm")]
    public void Refuses_a_load_beside_its_tube(string? share, string? distance)
    {
        SpecBuilder spec = Beam();
        string error = spec.Case("one", loads: [spec.PointLoad("beam", share, distance, force: (0, 0, 1))]).Error();

        Assert.Contains("beside the tube, which goes from 0 to 1000 mm", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_loads_masses_and_supports_on_nodes_that_no_tube_meets()
    {
        SpecBuilder spec = Beam().Node("lonely", 0, 0, 900).Hold("lonely").NodeMass("lonely", "1 kg");
        string[] errors = spec.Case("one", loads: [spec.NodeLoad("lonely", (0, 0, 1))]).AllErrors();

        Assert.Equal(3, errors.Length);
        Assert.All(errors, e => Assert.Contains("no tube meets node lonely", e, StringComparison.Ordinal));
    }

    [Fact]
    public void Points_out_a_case_without_loads()
    {
        SpecBuilder spec = Beam().Case("idle");
        spec.Model();

        Assert.StartsWith("case idle has no loads", Assert.Single(spec.Said(Severity.Warning)), StringComparison.Ordinal);
    }

    [Fact]
    public void Evaluates_expressions_of_parameters()
    {
        FrameModel model = Beam().Parameter("payload", "90 kg").TubeMass("beam", "=payload/2").Model();

        Assert.Equal(new CarriedMass(null, 0, 45), Assert.Single(model.Masses));
    }

    [Fact]
    public void Refuses_a_negative_mass()
    {
        string error = Beam().NodeMass("b", "-3 kg").Error();

        Assert.Contains("mass on b must not be negative, and is -3 kg", error, StringComparison.Ordinal);
    }

    private static SpecBuilder Beam() => SpecBuilder.WithTubes(("beam", "a", "b")).Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Hold("a", "x y z rx ry rz");
}
