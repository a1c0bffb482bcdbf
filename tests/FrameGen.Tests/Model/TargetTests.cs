using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class TargetTests
{
    [Fact]
    public void Binds_a_displacement_and_makes_its_direction_a_unit()
    {
        var target = (DisplacementTarget)Bench()
            .Target(s => Displacement(s, node: "b", along: (0, 3, -4)))
            .Model().Targets[0];

        Assert.Equal((0, 0, null, 1, 3.0), (target.Index, target.Case, target.From, target.To, target.Max));
        Assert.Equal(new Vector3(0, 0.6, -0.8), target.Along);
    }

    [Fact]
    public void Binds_a_movement_between_two_nodes_in_any_direction()
    {
        var target = (DisplacementTarget)Bench().Target(s => Displacement(s, from: "a", to: "b")).Model().Targets[0];

        Assert.Equal((0, 1), (target.From, target.To));
        Assert.Null(target.Along);
    }

    [Theory]
    [InlineData("b", "a", "b", "takes either node, or both from and to")]
    [InlineData(null, "a", null, "takes either node, or both from and to")]
    [InlineData(null, null, null, "takes either node, or both from and to")]
    [InlineData(null, "b", "b", "from and to are both node b")]
    [InlineData("bb", null, null, "there is no node bb; did you mean 'b'?")]
    [InlineData("lonely", null, null, "no tube meets node lonely")]
    public void Refuses_nodes_that_make_no_displacement(string? node, string? from, string? to, string expected)
    {
        string error = Bench().Node("lonely", 0, 0, 800).Target(s => Displacement(s, node, from, to)).Error();

        Assert.Contains(expected, error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_direction_without_length()
    {
        string error = Bench().Target(s => Displacement(s, node: "b", along: (0, 0, 0))).Error();

        Assert.Contains("displacement target: along has no direction", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_an_unknown_case()
    {
        string error = Bench().Target(s => Displacement(s, node: "b", loadCase: "standnig")).Error();

        Assert.Contains("there is no case standnig; did you mean 'standing'?", error, StringComparison.Ordinal);
    }

    // pi/180 rad for a degree; 2 N.m/deg = 2000 N.mm / (pi/180).
    [Fact]
    public void Binds_rotations_and_couples_in_working_units()
    {
        FrameModel model = Bench()
            .Target(s => new RotationTargetSpec(
                s.Name("standing"), s.Name("b"), null, null, s.Numbers(0, 0, 2), s.Quantity(QuantityKind.Angle, "1 deg")!, s.Name("x").At))
            .Target(s => new StiffnessTargetSpec(
                null, s.Name("a"), s.Name("b"), null, s.Numbers(1, 0, 0), s.Quantity(QuantityKind.TurningStiffness, "2 N.m/deg")!, null, s.Name("x").At))
            .Model();
        var rotation = (RotationTarget)model.Targets[0];
        var couple = (StiffnessTarget)model.Targets[1];

        Assert.Equal(Math.PI / 180, rotation.Max, 1e-15);
        Assert.Equal(Vector3.UnitZ, rotation.About);
        Assert.True(couple.Turning);
        Assert.Equal(2000 * 180 / Math.PI, couple.Min, 1e-6);
        Assert.Equal((0, 1), (couple.From, couple.To));
        Assert.Equal([0], couple.Supports);
    }

    [Fact]
    public void Takes_the_supports_of_a_stiffness_target_as_they_are_named()
    {
        var target = (StiffnessTarget)SpecBuilder.WithTubes(("rail-l", "a-l", "b-l"), ("bow", "a-l", "a-r"))
            .Mirror('y', "-l", "-r")
            .Node("a-l", 0, 300, 0).Node("b-l", -900, 300, 0)
            .Hold("a-l").Hold("b-l")
            .Target(s => Push(s, "b-r", supports: ["a-l", "b-l"]))
            .Model().Targets[0];

        Assert.Equal([0, 2], target.Supports);
    }

    [Fact]
    public void Refuses_a_push_that_nothing_holds()
    {
        string error = SpecBuilder.WithTubes(("beam", "a", "b")).Node("a", 0, 0, 0).Node("b", 900, 0, 0).Target(s => Push(s, "b")).Error();

        Assert.Contains("stiffness target: nothing holds the frame", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Looks_at_all_cases_and_all_groups_with_tubes_unless_told()
    {
        FrameModel model = Bench()
            .Fixed("spare", "S235", new RoundTube(20, 2))
            .Fixed("last", "S275", new RoundTube(25, 2))
            .Case("bump", weight: (0, 0, -3))
            .Node("c", 0, 400, 0).Tube("arm", "b", "c", "last")
            .Target(s => Strength(s))
            .Target(s => Strength(s, ["bump"], ["last"]))
            .Model();
        var all = (StrengthTarget)model.Targets[0];
        var some = (StrengthTarget)model.Targets[1];

        Assert.Equal("main last", string.Join(' ', model.Groups.Select(g => g.Name)));
        Assert.Equal([0, 1], all.Cases);
        Assert.Equal([0, 1], all.Groups);
        Assert.Equal([1], some.Cases);
        Assert.Equal([1], some.Groups);
        Assert.Equal(2, some.SafetyFactor);
    }

    [Fact]
    public void Asks_for_the_welded_yield_of_a_material_that_has_none()
    {
        string error = Tee("4130-N", welded: true).Target(s => Strength(s)).Error();

        Assert.Contains("group main is of 4130-N, which has no yield_welded", error, StringComparison.Ordinal);
        Assert.Contains(
            "materials: {4130-N: {E: 199900 MPa, G: 75800 MPa, density: 7833 kg/m3, yield: 517 MPa, ultimate: 655 MPa, yield_welded: ...}}",
            error,
            StringComparison.Ordinal);
        Assert.Contains("welded: false", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Asks_for_no_welded_yield_where_nothing_is_welded()
    {
        Assert.Single(Tee("4130-N", welded: false).Target(s => Strength(s)).Model().Targets);

        // A single tube meets no other that it could be welded to.
        Assert.Single(Held(SpecBuilder.New().Fixed("main", "4130-N", new RoundTube(30, 2))).Target(s => Strength(s)).Model().Targets);
    }

    [Fact]
    public void Asks_for_the_welded_yield_of_a_tube_that_runs_through_a_joint()
    {
        string error = Held(SpecBuilder.New().Fixed("main", "4130-N", new RoundTube(30, 2)).Fixed("mild", "S235", new RoundTube(20, 2)))
            .On("knee", "beam", share: "50 %").Node("foot", 500, 0, -400).Tube("post", "knee", "foot", "mild")
            .Target(s => Strength(s))
            .Error();

        Assert.Contains("group main is of 4130-N", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Asks_for_the_yield_of_a_material_that_has_none()
    {
        string error = Held(SpecBuilder.New().Fixed("main", "soft", new RoundTube(30, 2)))
            .Material("soft", "70 GPa", "27 GPa", null, "2700 kg/m3")
            .Target(s => Strength(s))
            .Error();

        Assert.Contains("group main is of soft, which has no yield;", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_strength_target_without_cases()
    {
        string error = SpecBuilder.WithTubes(("beam", "a", "b")).Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Hold("a").Target(s => Strength(s)).Error();

        Assert.Contains("strength target: there are no load cases", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Binds_closed_form_targets_on_tubes_and_groups()
    {
        FrameModel model = Bench()
            .Target(s => Floor(s, group: "main"))
            .Target(s => new MemberTargetSpec(
                s.Name("beam"), null, SpanKind.Cantilever, s.Quantity(QuantityKind.Force, "200 N"), s.Quantity(QuantityKind.Length, "5 mm"), null, null,
                BendingDirection.Top, s.Name("x").At))
            .Model();
        var floor = (MemberStiffnessTarget)model.Targets[0];
        var deflection = (MemberDeflectionTarget)model.Targets[1];

        // 1 N.m2 = 1e6 N.mm2.
        Assert.Equal((450e6, null), (floor.MinBendingStiffness, floor.MinTorsionalStiffness));
        Assert.Equal("group main", floor.Subject);
        Assert.Equal((SpanKind.Cantilever, 200.0, 5.0, BendingDirection.Top), (deflection.As, deflection.Load, deflection.Max, deflection.Along));
    }

    [Fact]
    public void Refuses_a_closed_form_target_on_a_group_without_tubes()
    {
        string error = Bench().Fixed("spare", "S235", new RoundTube(20, 2)).Target(s => Floor(s, group: "spare")).Error();

        Assert.Contains("member target: group spare has no tubes", error, StringComparison.Ordinal);
    }

    /// <summary>A floor of 450 N.m2 for EI.</summary>
    internal static MemberTargetSpec Floor(SpecBuilder s, string? tube = null, string? group = null) => new(
        tube is null ? null : s.Name(tube),
        group is null ? null : s.Name(group),
        null,
        null,
        null,
        s.Quantity(QuantityKind.BendingStiffness, "450 N.m2"),
        null,
        BendingDirection.Weaker,
        s.Name("x").At);

    private static DisplacementTargetSpec Displacement(
        SpecBuilder s, string? node = null, string? from = null, string? to = null, (double X, double Y, double Z)? along = null, string loadCase = "standing") =>
        new(
            s.Name(loadCase),
            node is null ? null : s.Name(node),
            from is null ? null : s.Name(from),
            to is null ? null : s.Name(to),
            along is { } a ? s.Numbers(a.X, a.Y, a.Z) : null,
            s.Quantity(QuantityKind.Length, "3 mm")!,
            s.Name("x").At);

    private static StiffnessTargetSpec Push(SpecBuilder s, string node, string[]? supports = null) => new(
        s.Name(node),
        null,
        null,
        s.Numbers(0, 0, 1),
        null,
        s.Quantity(QuantityKind.Stiffness, "60 N/mm")!,
        supports is null ? null : [.. supports.Select(s.Name)],
        s.Name("x").At);

    private static StrengthTargetSpec Strength(SpecBuilder s, string[]? cases = null, string[]? groups = null) => new(
        cases is null ? null : [.. cases.Select(s.Name)],
        s.Quantity(QuantityKind.Number, "2")!,
        groups is null ? null : [.. groups.Select(s.Name)],
        s.Name("x").At);

    private static SpecBuilder Held(SpecBuilder spec) => spec
        .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Tube("beam", "a", "b").Hold("a", "x y z rx ry rz").Case("standing", weight: (0, 0, -1));

    private static SpecBuilder Bench() => Held(SpecBuilder.New().Fixed("main", "S235", new RoundTube(30, 2)));

    private static SpecBuilder Tee(string material, bool welded) =>
        Held(SpecBuilder.New().Fixed("main", material, new RoundTube(30, 2), welded)).Node("c", 1000, 500, 0).Tube("arm", "b", "c");
}
