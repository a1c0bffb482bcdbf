using FrameGen.Fabrication;
using FrameGen.Fabrication.Setup;
using FrameGen.Model;
using FrameGen.Output;
using Xunit;

namespace FrameGen.Tests.Fabrication.Setup;

public class SetupPlannerTests
{
    private const string Groups = "groups: {all: {material: S235, section: round 40 x 2 mm}, thin: {material: S235, section: round 20 x 2 mm}}";

    // A bed frame 1200 by 640 (diagonal 1360: 15, 8, 17 times 80) with a slat across its middle.
    private const string Bed = """
        framegen: 1
        mirror: {across: y, suffix: [-l, -r]}
        nodes:
          head-l: [0 mm, 320 mm, 50 mm]
          foot-l: [1200 mm, 320 mm, 50 mm]
          slat-l: {on: rail-l, distance: 900 mm}
        tubes:
          rail-l: {from: head-l, to: foot-l, group: all}
          head: {from: head-l, to: head-r, group: all}
          foot: {from: foot-l, to: foot-r, group: all}
          slat: {from: slat-l, to: slat-r, group: thin}

        """ + Groups;

    [Fact]
    public void Both_diagonals_of_the_whole_come_first_and_then_what_it_does_not_hold()
    {
        FrameModel model = PlannedText.Of(Bed).Cut.Sized.Model;
        SquaringMeasure[] diagonals = [.. Measures(Bed).Where(m => m.Kind == SquaringKind.Diagonal)];
        Assert.Equal(1360, diagonals[0].Distance, 1e-9);
        Assert.Equal(1360, diagonals[1].Distance, 1e-9);

        // Two nodes are left: the larger of the bays beside the slat is 900 long; sqrt(900^2 + 640^2) = 1104.355.
        Assert.Equal(4, diagonals.Length);
        Assert.Equal(1104.355, diagonals[2].Distance, 0.0005);
        Assert.Equal(diagonals[2].Distance, diagonals[3].Distance, 1e-9);
        SquaringMeasure twins = Measures(Bed).Single(m => m.Kind == SquaringKind.Twins && Named(model, m) is "slat-l slat-r");
        Assert.Equal(640, twins.Distance, 1e-9);
    }

    [Fact]
    public void A_box_is_squared_on_all_six_faces_and_a_triangle_needs_no_measure()
    {
        Assert.Equal(12, Measures(Box(0)).Count(m => m.Kind == SquaringKind.Diagonal));
        const string Triangle = """
            framegen: 1
            nodes: {a: [0 mm, 0 mm, 0 mm], b: [400 mm, 0 mm, 0 mm], c: [0 mm, 300 mm, 0 mm]}
            tubes: {ab: {from: a, to: b, group: all}, bc: {from: b, to: c, group: all}, ca: {from: c, to: a, group: all}}

            """ + Groups;
        Assert.Empty(Measures(Triangle));
    }

    [Fact]
    public void A_bay_with_a_corner_out_of_its_plane_has_no_diagonals_to_compare() =>
        Assert.Equal(6, Measures(Box(40)).Count(m => m.Kind == SquaringKind.Diagonal));

    // A stay of 3, 4, 5 from the floor to a post: it rises 4 in 5.
    [Fact]
    public void Heights_blocks_and_angles_are_those_of_the_spec_s_axes()
    {
        const string Stay = """
            framegen: 1
            nodes: {a: [0 mm, 0 mm, 100 mm], b: [0 mm, 900 mm, 100 mm], mid: {on: sill, at: 50 %}, top: [300 mm, 450 mm, 500 mm]}
            tubes: {sill: {from: a, to: b, group: all}, stay: {from: mid, to: top, group: thin}}

            """ + Groups;
        ShopPackage package = PlannedText.Of(Stay);
        SetupPlan plan = SetupPlanner.Plan(package.Cut.Sized);
        Assert.Equal(80, plan.TableZ, 1e-9); // the sill's underside, half of 40 below z 100
        Assert.Equal((20.0, 0.0), (plan.Nodes[0].Height, plan.Nodes[0].Block));
        Assert.Equal(420, plan.Nodes[3].Height, 1e-9);
        Assert.Null(plan.Nodes[3].Block);
        Assert.Equal(500, plan.Tubes[1].Length, 1e-9);
        Assert.Equal(Math.Atan2(4, 3), plan.Tubes[1].Rise, 1e-12);
        Assert.Equal(0, plan.Tubes[1].Bearing!.Value, 1e-12);
        Assert.Equal(Math.PI / 2, plan.Tubes[0].Bearing!.Value, 1e-12);

        JointSetup joint = Assert.Single(plan.Joints);
        Assert.Null(joint.Steps[0].End);
        Assert.Equal(End.From, joint.Steps[1].End);
        Assert.Equal(Math.PI / 2, Assert.Single(joint.Steps[1].Angles), 1e-12);
        string text = TextTemplate.Render("setup.md", SetupModel.From(package));
        Assert.Contains("sill, 450.0 from a", text, StringComparison.Ordinal);
        Assert.Contains("stands at z = 80.0 mm", text, StringComparison.Ordinal);
    }

    private static IReadOnlyList<SquaringMeasure> Measures(string text) => SetupPlanner.Plan(PlannedText.Of(text).Cut.Sized).Measures;

    private static string Named(FrameModel model, SquaringMeasure measure) => $"{model.Nodes[measure.A].Name} {model.Nodes[measure.B].Name}";

    /// <summary>A box 600 x 500 x 400; one corner may be raised out of three of its faces' planes.</summary>
    private static string Box(int raised) => $$"""
        framegen: 1
        nodes:
          a: [0 mm, 0 mm, 0 mm]
          b: [600 mm, 0 mm, 0 mm]
          c: [600 mm, 500 mm, 0 mm]
          d: [0 mm, 500 mm, 0 mm]
          e: [0 mm, 0 mm, 400 mm]
          f: [600 mm, 0 mm, 400 mm]
          g: [{{600 + raised}} mm, {{500 + raised}} mm, {{400 + raised}} mm]
          h: [0 mm, 500 mm, 400 mm]
        tubes:
          ab: {from: a, to: b, group: all}
          bc: {from: b, to: c, group: all}
          cd: {from: c, to: d, group: all}
          da: {from: d, to: a, group: all}
          ef: {from: e, to: f, group: all}
          fg: {from: f, to: g, group: all}
          gh: {from: g, to: h, group: all}
          he: {from: h, to: e, group: all}
          ae: {from: a, to: e, group: all}
          bf: {from: b, to: f, group: all}
          cg: {from: c, to: g, group: all}
          dh: {from: d, to: h, group: all}

        """ + Groups;
}
