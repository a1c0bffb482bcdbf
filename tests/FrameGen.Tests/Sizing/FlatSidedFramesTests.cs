using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Sizing.Analysis;
using FrameGen.Tests.Spec;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>Frames of square, rectangular and elliptic tubes, from the spec's text or by hand to the sized frame.</summary>
public sealed class FlatSidedFramesTests
{
    private const double E = 200_000;
    private const double G = 80_000;
    private const double Load = 500;

    // EN 10219-2 formulas of 60 x 40 x 3 mm, checked against printed tables elsewhere.
    private static readonly FlatSidedTube Rect = new(60, 40, 3);

    private static SizedFrame Size(string text)
    {
        DiagnosticList diagnostics = [];
        FrameModel? model = ModelResolver.Resolve(SpecText.Sound(text), diagnostics);
        SizedFrame? sized = model is null ? null : SectionSizer.Size(model, diagnostics);
        Assert.True(sized is not null, string.Join("\n", diagnostics));
        return sized;
    }

    private static string Cantilever(string section, string up, string force, string along, string targets = "") => $$"""
        framegen: 1
        title: Arm
        nodes: {a: [0 mm, 0 mm, 0 mm], b: [600 mm, 0 mm, 0 mm]}
        tubes:
          arm: {from: a, to: b, group: arms{{up}} }
        groups:
          arms: {material: plain, section: {{section}} }
        materials: {plain: {E: 200 GPa, G: 80 GPa, density: 7.85 g/cm3, yield: 235 MPa, yield_welded: 235 MPa} }
        supports: {a: {hold: [x, y, z, rx, ry, rz]} }
        cases:
          push: {loads: [{node: b, force: {{force}} }]}
        targets:
          - displacement: {case: push, node: b, along: {{along}}, max: 100 mm}
        {{targets}}
        """;

    // P L3/3 E I + P L/(G As): down bends about local y (height 60) unless the top line points sideways.
    [Theory]
    [InlineData("", "[0 N, 0 N, -500 N]", "z", false)]
    [InlineData("", "[0 N, 500 N, 0 N]", "y", true)]
    [InlineData(", up: y", "[0 N, 0 N, -500 N]", "z", true)]
    [InlineData(", up: y", "[0 N, 500 N, 0 N]", "y", false)]
    public void The_bending_axes_follow_the_top_line(string up, string force, string along, bool isAcross)
    {
        (double second, double shear) = isAcross ? (Rect.Iz, 2 * 3 * 37.0) : (Rect.Iy, 2 * 3 * 57.0);
        double expected = (Load * Math.Pow(600, 3) / (3 * E * second)) + (Load * 600 / (G * shear));
        Assert.Equal(expected, Size(Cantilever("rect 60 x 40 x 3 mm", up, force, along)).Targets[0].Value, 1e-9 * expected);

        // Written the other way round and turned, it is the same tube.
        string turned = up.Length == 0 ? ", up: y" : "";
        Assert.Equal(expected, Size(Cantilever("rect 40 x 60 x 3 mm", turned, force, along)).Targets[0].Value, 1e-9 * expected);
    }

    // A clamped post of 800 mm along z, an arm of 600 mm along x on its top, both of rect 60 x 40 x 3, the post's top line along x. Down at
    // the arm's end: the arm's own bending and shear, the post's turn P L H/E Iy times L, its shortening. Sideways: both bend about
    // z, the post twists by P L H/G J.
    [Fact]
    public void A_bracket_of_rectangular_tubes_by_hand()
    {
        const double L = 600;
        const double H = 800;
        FrameBuilder builder = new FrameBuilder()
            .Node("foot", 0, 0, 0).Node("top", 0, 0, H).Node("end", L, 0, H)
            .Fixed("all", Rect, Steel with { E = E, G = G }).Tube("post", "foot", "top", "all").Tube("arm", "top", "end", "all").Clamp("foot");
        SizedFrame sized = builder.Case("down", default, builder.Force("end", 0, 0, -Load)).Case("aside", default, builder.Force("end", 0, Load, 0))
            .Displacement("down", "end", Vector3.UnitZ, 100).Displacement("aside", "end", Vector3.UnitY, 100).Size();
        (double shearY, double shearZ) = (2 * 3 * 37.0, 2 * 3 * 57.0);
        double down = (Load * L * L * L / (3 * E * Rect.Iy)) + (Load * L / (G * shearZ)) + (Load * L * L * H / (E * Rect.Iy)) + (Load * H / (E * Rect.Area));
        double aside = (Load * L * L * L / (3 * E * Rect.Iz)) + (Load * L / (G * shearY))
            + (Load * H * H * H / (3 * E * Rect.Iz)) + (Load * H / (G * shearY)) + (Load * L * L * H / (G * Rect.J));
        Assert.Equal(down, sized.Targets[0].Value, 1e-9 * down);
        Assert.Equal(aside, sized.Targets[1].Value, 1e-9 * aside);
    }

    // The stress at the clamp: M/Wel and nothing else at the outer fibre, where the flow of shear is less than in the middle of the walls.
    [Fact]
    public void Strength_counts_bending_at_the_far_side()
    {
        SizedFrame sized = Size(Cantilever("rect 60 x 40 x 3 mm corner 0 mm", "", "[0 N, 0 N, -500 N]", "z", "  - strength: {safety_factor: 1}"));
        double bending = Load * 600 / new FlatSidedTube(60, 40, 3, 0).ElasticModulusY;
        double stress = sized.Cases[0].Tubes[0].MaxStress;
        Assert.InRange(stress, bending, bending * 1.01);
    }

    // min(Iy, Iz) unless along says otherwise; EI in N.m2.
    [Theory]
    [InlineData("", false)]
    [InlineData(", along: side", false)]
    [InlineData(", along: top", true)]
    public void Member_targets_take_the_weaker_way_or_the_one_they_are_told(string along, bool isTop)
    {
        SizedFrame sized = Size(Cantilever(
            "rect 60 x 40 x 3 mm", "", "[0 N, 0 N, -500 N]", "z", $"  - member: {{group: arms, min_bending_stiffness: 100 N.m2{along}}}"));
        Assert.Equal(E * (isTop ? Rect.Iy : Rect.Iz) / 1e6, sized.Targets[1].Value, 1e-6);
    }

    // EN 1993-1-1 table 5.2 sheet 1: c/t no more than 42 sqrt(235/fy), c the flat: h - 4t with the rule's corners, h - 3t hot-finished, h - 2t sharp.
    [Theory]
    [InlineData(235, 2.0, 2.0, 46, 42.0, false)]
    [InlineData(235, 2.5, 2.0, 36, 42.0, true)]
    [InlineData(355, 2.5, 2.0, 36, 34.172, false)]
    [InlineData(355, 2.5, 1.5, 37, 34.172, false)]
    [InlineData(235, 2.5, 1.5, 37, 42.0, true)]
    [InlineData(235, 2.5, 0.0, 38, 42.0, true)]
    public void Flat_walls_have_the_limit_of_class_3(double yield, double wall, double cornerPerWall, double value, double limit, bool isMet)
    {
        SizedFrame sized = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", 500, 0, 0).Fixed("one", new FlatSidedTube(100, 60, wall, cornerPerWall * wall), Steel with { Yield = yield })
            .Tube("t", "a", "b", "one").Clamp("a").Slenderness(200, wall: true).Size();
        Assert.Equal(value, sized.Targets[0].Value, 1e-9);
        Assert.Equal(limit, sized.Targets[0].Limit, 0.0005);
        Assert.Equal(isMet, sized.Targets[0].Met);
        Assert.Contains("flat of the longer side over thickness of rect 100 x 60 x", sized.Targets[0].Where, StringComparison.Ordinal);
    }

    // Twice the largest radius of curvature of 90 x 45: 90 x 90/45 = 180 mm, over 2 mm; 90 x 235/235.
    [Fact]
    public void The_wall_of_an_ellipse_has_that_of_a_round_tube_of_its_flattest_curve()
    {
        TargetResult result = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", 500, 0, 0).Fixed("one", new EllipseTube(90, 45, 1.9)).Tube("t", "a", "b", "one")
            .Clamp("a").Slenderness(200, wall: true).Size().Targets[0];
        Assert.Equal(180 / 1.9, result.Value, 1e-9);
        Assert.Equal(90, result.Limit, 1e-9);
        Assert.Contains("equivalent diameter over thickness of ellipse 90 x 45 x 1.9 mm", result.Where, StringComparison.Ordinal);
    }

    // Half the larger of height and width: R 30 mm of the rect chord, r 10 mm of the square strut; as for round tubes of 60 and 20.
    [Fact]
    public void Welds_reach_by_half_the_larger_side()
    {
        FrameBuilder builder = new FrameBuilder()
            .Fixed("chords", new FlatSidedTube(40, 60, 3)).Fixed("struts", new FlatSidedTube(20, 20, 2))
            .Node("a", 0, 0, 0).Node("b", 2000, 0, 0).Tube("chord", "a", "b", "chords")
            .NodeOn("n", "chord", 500).Node("top", 500, 0, 800).Tube("strut", "top", "n", "struts");
        FrameModel model = builder.Build();
        DesignSpace space = DesignSpace.Create(model, (_, _) => true, out _);
        var joints = new JointTable(space);
        var analysis = new DesignAnalysis(space, joints, WeldPairs.Build(joints, model), null);
        WeldZone strut = Assert.Single(analysis.Welds().Of(builder.TubeIndex("strut")).ToArray());
        WeldZone chord = Assert.Single(analysis.Welds().Of(builder.TubeIndex("chord")).ToArray());
        Assert.Equal(800 - (30 + 30), strut.From, 1e-9);
        Assert.Equal((500 - (10 + 30), 500 + (10 + 30)), (chord.From, chord.To));
    }

    // Height and width stand in the way by their own names.
    [Fact]
    public void An_unmet_target_names_height_and_width()
    {
        FrameBuilder builder = new FrameBuilder()
            .Choose("one", new FlatSidedTube(50, 30, 2), new FlatSidedTube(60, 40, 2))
            .Node("a", 0, 0, 0).Node("b", 500, 0, 0).Tube("t", "a", "b", "one").Clamp("a").Slenderness(5);
        builder.Size(out DiagnosticList diagnostics);
        Assert.Contains(
            "height at stock's largest 60 mm, width at stock's largest 40 mm", string.Join("\n", diagnostics.Select(d => d.Message)), StringComparison.Ordinal);
    }

    // Under an even load across, the worst place along the tube: against looking at very many.
    [Theory]
    [InlineData(0.5, -2.0, 900)]
    [InlineData(3.0, 1.0, -400)]
    [InlineData(0.0, 2.0, 0)]
    public void The_peak_along_a_loaded_tube_is_found(double py, double pz, double vy)
    {
        var forces = new ElementForces(new SectionForces(2000, vy, 1200, 3e4, 1e5, -2e5), 1000, 0, py, pz);
        StressPeak peak = StressPeak.Find(forces, Rect, 0, 1000);
        double worst = 0;
        for (int k = 0; k <= 10_000; k++)
        {
            SectionForces there = forces.At(k / 10.0);
            worst = Math.Max(worst, Rect.VonMises(in there));
        }

        // Rounded corners and the shear move the worst place a little from where the sharp corner's bending is extreme.
        Assert.InRange(peak.Stress, worst * (1 - 1e-3), worst * (1 + 1e-3));
    }
}
