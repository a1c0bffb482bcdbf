using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Mechanics.Stability;
using FrameGen.Sizing;
using FrameGen.Sizing.Analysis;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>Buckling factors of every case, and the targets on buckling, vibration and slenderness.</summary>
public sealed class StabilityTests
{
    private const double Height = 1500;

    // From the sizes to the formulas: π²EI/(2L)² clamped below and free above, softened by shear as F. Engesser has it.
    private static double Strength(RoundTube tube)
    {
        double euler = Math.PI * Math.PI * Steel.E * tube.Iy / (4 * Height * Height);
        return euler / (1 + (euler / (Steel.G * tube.ShearAreas(0.3).Y)));
    }

    private static FrameBuilder Post(params Section[] sections) => new FrameBuilder()
        .Node("foot", 0, 0, 0).Node("top", 0, 0, Height)
        .Choose("posts", sections).Tube("post", "foot", "top", "posts").Clamp("foot");

    private static string[] Warnings(DiagnosticList diagnostics) =>
        [.. diagnostics.Where(d => d.Severity == Severity.Warning).Select(d => d.Message)];

    [Fact]
    public void Every_case_has_its_factor_without_a_target()
    {
        FrameBuilder builder = Post(Round(48.3, 3.2));
        builder.Case("push", default, builder.Force("top", 0, 0, -1000)).Case("pull", default, builder.Force("top", 0, 0, 1000))
            .Case("bend", default, builder.Force("top", 1000, 0, 0)).Case("nothing");
        SizedFrame sized = builder.Size(out DiagnosticList diagnostics);
        double expected = Strength(Round(48.3, 3.2)) / 1000;

        // Eight elements a span: no more than a thousandth too high.
        Assert.InRange(sized.Cases[0].BucklingFactor!.Value / expected, 1, 1.001);
        Assert.Equal("node top", sized.Cases[0].BucklesAt);
        Assert.All(sized.Cases.Skip(1), c => Assert.Null(c.BucklingFactor));
        Assert.Equal(3, sized.Frequencies!.Count);
        Assert.DoesNotContain(Warnings(diagnostics), w => w.Contains("buckl", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData(3.01, null)]
    [InlineData(2.99, "case push is near to buckling the frame: 2.99")]
    [InlineData(0.5, "case push buckles the frame: 0.500")]
    public void A_case_that_nearly_buckles_the_frame_is_pointed_out(double factor, string? warning)
    {
        FrameBuilder builder = Post(Round(48.3, 3.2));
        builder.Case("push", default, builder.Force("top", 0, 0, -Strength(Round(48.3, 3.2)) / factor));
        builder.Size(out DiagnosticList diagnostics);
        if (warning is null)
        {
            Assert.Empty(Warnings(diagnostics));
        }
        else
        {
            Assert.StartsWith(warning[..^2], Assert.Single(Warnings(diagnostics)), StringComparison.Ordinal);
        }
    }

    [Fact]
    public void A_buckling_target_that_covers_the_case_replaces_the_warning()
    {
        FrameBuilder builder = Post(Round(48.3, 3.2));
        double push = -Strength(Round(48.3, 3.2)) / 2;
        builder.Case("one", default, builder.Force("top", 0, 0, push)).Case("two", default, builder.Force("top", 0, 0, push)).Buckling(1.5, "one");
        builder.Size(out DiagnosticList diagnostics);
        Assert.StartsWith("case two is near to buckling", Assert.Single(Warnings(diagnostics)), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(5000)]
    [InlineData(9000)]
    [InlineData(12000)]
    public void A_buckling_target_takes_the_lightest_that_stands(double push)
    {
        RoundTube[] tubes = [Round(30, 1.5), Round(30, 3), Round(38, 1.5), Round(38, 2.5), Round(42.4, 2), Round(48.3, 2), Round(48.3, 3.2)];
        FrameBuilder builder = Post(tubes);
        builder.Case("push", default, builder.Force("top", 0, 0, -push)).Buckling(2);
        SizedFrame sized = builder.Size();
        RoundTube expected = tubes.Where(t => Strength(t) >= 2 * push).MinBy(t => t.Area)!;
        Assert.Equal(expected, sized.Sections[0]);
        Assert.Equal(SizingStatus.ProvenLightest, sized.Status);
        TargetResult result = sized.Targets[0];
        Assert.Equal(("buckling", "", 2.0), (result.Kind, result.Unit, result.Limit));
        Assert.InRange(result.Value * push / Strength(expected), 1, 1.001);
        Assert.Equal(2 / result.Value, result.Ratio, 1e-12);
        Assert.Equal("case push, node top moving most", result.Where);
    }

    [Fact]
    public void A_target_on_cases_that_pull_is_met_without_a_limit()
    {
        FrameBuilder builder = Post(Round(30, 1.5), Round(38, 2));
        builder.Case("pull", default, builder.Force("top", 0, 0, 1e5)).Buckling(3);
        SizedFrame sized = builder.Size();
        Assert.Equal(Round(30, 1.5), sized.Sections[0]);
        Assert.Equal((double.PositiveInfinity, 0.0), (sized.Targets[0].Value, sized.Targets[0].Ratio));
    }

    [Fact]
    public void A_frequency_target_takes_the_lightest_that_is_quick_enough()
    {
        // A heavy mass on a light post: f = √(3EI/(L³(1 + 3EI/(GAs L²)) m'))/2π, with 33/140 of the post's own mass (Rayleigh's quotient with the
        // static shape, W. Young, R. Budynas, Roark's Formulas, table of frequencies), right to some thousandths.
        RoundTube[] tubes = [Round(30, 1.5), Round(38, 1.5), Round(42.4, 2), Round(48.3, 2), Round(48.3, 3.2), Round(60.3, 3.2)];
        const double mass = 20;
        double[] hertz = [.. tubes.Select(Hertz)];
        double wanted = 0.5 * (hertz[2] + hertz[3]);
        SizedFrame sized = Post(tubes).MassOnNode("top", mass).Frequency(wanted).Size();
        Assert.Equal(tubes[3], sized.Sections[0]);
        Assert.Equal(3, sized.Frequencies!.Count);
        Assert.Equal(hertz[3], sized.Frequencies[0], 3e-3 * hertz[3]);
        Assert.Equal(sized.Frequencies[0], sized.Frequencies[1], 1e-6 * hertz[3]);
        Assert.Equal(("frequency", "Hz"), (sized.Targets[0].Kind, sized.Targets[0].Unit));
        Assert.Equal(sized.Frequencies[0], sized.Targets[0].Value);
        Assert.Equal(wanted / sized.Targets[0].Value, sized.Targets[0].Ratio, 1e-12);

        static double Hertz(RoundTube tube)
        {
            double bending = 3 * Steel.E * tube.Iy;
            double stiffness = bending / (Height * Height * Height) / (1 + (bending / (Steel.G * tube.ShearAreas(0.3).Y * Height * Height)));
            return Math.Sqrt(1000 * stiffness / (mass + (33.0 / 140 * Steel.Density * tube.Area * Height))) / (2 * Math.PI);
        }
    }

    [Fact]
    public void A_mass_along_a_tube_counts_as_heavier_metal()
    {
        // As much mass again along the tube: 1/√2 of the frequency, but for the rotary inertia, which the mass along the axis has not.
        double bare = Post(Round(48.3, 3.2)).Frequency(1).Size().Frequencies![0];
        double metal = Steel.Density * Round(48.3, 3.2).Area * Height;
        double loaded = Post(Round(48.3, 3.2)).MassAlong("post", metal).Frequency(1).Size().Frequencies![0];
        Assert.Equal(bare / Math.Sqrt(2), loaded, 1e-3 * bare);
    }

    [Fact]
    public void A_frequency_target_needs_supports_that_hold()
    {
        FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Fixed("one", Round(30, 2)).Tube("t", "a", "b", "one");
        builder.Hold("a", "x", "y", "z").Frequency(5);
        Assert.All(builder.Errors(), e => Assert.EndsWith("(with all supports, for the frequency target)", e, StringComparison.Ordinal));
        Assert.NotEmpty(builder.Errors());
    }

    [Fact]
    public void Slenderness_is_taken_between_nodes_and_filters_sizes()
    {
        // i of 48.3 x 3.2 is 15.9853 mm: 1500/i = 93.84, and half of that with a node in the middle.
        SizedFrame plain = Post(Round(30, 1.5), Round(48.3, 3.2)).Slenderness(94).Size();
        Assert.Equal(Round(48.3, 3.2), plain.Sections[0]);
        Assert.Equal(Height / 15.9853, plain.Targets[0].Value, 0.001);
        Assert.Equal("post between foot and top, 1500 mm", plain.Targets[0].Where);
        Assert.Equal(0, plain.Analyses);
        SizedFrame held = Post(Round(48.3, 3.2)).NodeOn("mid", "post", 700).Slenderness(94).Size();
        Assert.Equal(800 / 15.9853, held.Targets[0].Value, 0.001);
        Assert.Equal("post between mid and top, 800 mm", held.Targets[0].Where);
        Assert.Equal(SizingStatus.Unmet, Post(Round(48.3, 3.2)).Slenderness(93).Size().Status);
    }

    [Theory]
    [InlineData(235, 90)]
    [InlineData(275, 76.909)]
    [InlineData(355, 59.577)]
    public void The_wall_has_the_limit_of_class_3(double yield, double limit)
    {
        // EN 1993-1-1 table 5.2 sheet 3: 90 · 235/fy.
        SizedFrame Sized(double wall) => new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", 500, 0, 0).Fixed("one", Round(100, wall), Steel with { Yield = yield }).Tube("t", "a", "b", "one")
            .Clamp("a").Slenderness(200, wall: true).Size();
        TargetResult over = Sized(100 / (limit + 0.01)).Targets[0];
        Assert.False(over.Met);
        Assert.Equal(limit, over.Limit, 0.0005);
        Assert.Equal(limit + 0.01, over.Value, 1e-6);
        Assert.StartsWith("wall of group one", over.Where, StringComparison.Ordinal);
        Assert.True(Sized(100 / (limit - 0.01)).Targets[0].Met);
    }

    [Fact]
    public void A_light_metals_wall_has_a_closer_limit()
    {
        SizedFrame sized = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", 500, 0, 0).Fixed("one", Round(100, 2), Steel with { E = 70_000, G = 27_000 }).Tube("t", "a", "b", "one")
            .Clamp("a").Slenderness(200, wall: true).Size();
        Assert.Equal(30, sized.Targets[0].Limit, 1e-9);
    }

    [Fact]
    public void The_division_of_spans_has_converged_on_a_frame_with_nodes_and_loads_on_its_tubes()
    {
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", 1200, 0, 0).Node("c", 0, 0, 900).Node("d", 1200, 0, 950).Node("e", 600, 700, 0)
            .Fixed("legs", Round(30, 2)).Fixed("thin", Round(16, 1))
            .Tube("leg-1", "a", "c", "legs").Tube("leg-2", "b", "d", "legs").Tube("beam", "c", "d", "legs")
            .Tube("stay-1", "e", "c", "thin").Tube("stay-2", "e", "d", "thin")
            .NodeOn("f", "leg-1", 350).Tube("strut", "f", "d", "thin")
            .Clamp("a").Hold("b", "x", "y", "z").Clamp("e").MassOnNode("d", 8).MassAlong("beam", 5);
        builder.Case("down", new Vector3(0, 0, -1), builder.Point("beam", 420, 0, 100, -2000)).Case("across", default, builder.Force("d", 900, -300, 0))
            .Frequency(1);
        SizedFrame sized = builder.Size();

        // The same frame with thirty-two elements from place to place.
        var model = StructuralModel.Build(builder.Build());
        BeamProfile[] profiles = [.. sized.Chosen.Select((c, g) => Profile(c.Section))];
        for (int c = 0; c < 2; c++)
        {
            FrameSolution coarse = model.Solvers[0].Factor(profiles).Solve(Loads(model, sized, c));
            var finer = RefinedFrame.Divide(model.Topology.Frame, 32);
            double converged = LinearBuckling.Lowest(
                new FrameSolver(finer.Frame, model.Solvers[0].Restraints).Factor(profiles), finer.AxialForces(coarse))!.Factor;
            Assert.InRange(sized.Cases[c].BucklingFactor!.Value / converged, 0.999, 1.001);
        }

        static BeamProfile Profile(Section s) => new(
            Steel.E, Steel.G, s.Area, s.Iy, s.Iz, s.J, s.ShearAreas(Steel.PoissonRatio).Y, s.ShearAreas(Steel.PoissonRatio).Z);
    }

    private static BeamLoads Loads(StructuralModel model, SizedFrame sized, int loadCase)
    {
        CaseLoads loads = model.Cases[loadCase];
        var along = new ElementLoad[loads.Elements.Count];
        loads.Combine([.. sized.Sections.Select(s => Steel.Density * s.Area)], along);
        return new BeamLoads(loads.Nodal, along);
    }
}
