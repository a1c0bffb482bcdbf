using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using FrameGen.Spec;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>The choice of sections, on frames whose answer can be worked out by hand.</summary>
public sealed class SectionSizerTests
{
    private static readonly RoundTube[] Sizes = [Round(20, 1.5), Round(25, 1.5), Round(30, 1.5), Round(30, 2.5), Round(40, 2), Round(50, 2)];

    // Two cantilevers that have nothing to do with each other.
    private static FrameBuilder TwoCantilevers(params Section[] sizes)
    {
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("a1", 1000, 0, 0)
            .Node("b", 0, 500, 0).Node("b1", 1000, 500, 0)
            .Choose("one", sizes).Choose("two", sizes)
            .Tube("first", "a", "a1", "one").Tube("second", "b", "b1", "two")
            .Clamp("a").Clamp("b");
        return builder.Case("push", default, builder.Force("a1", 0, 0, -100), builder.Force("b1", 0, 0, -100));
    }

    // PL³/3EI with P = 100 N and L = 1 m; shear adds less than a thousandth.
    private static double Deflection(Section section) => 100 * 1e9 / (3 * Steel.E * section.Iy);

    private static string Names(SizedFrame sized) => string.Join(", ", sized.Sections.Select(s => s.Name));

    [Fact]
    public void Chooses_the_lightest_that_is_stiff_enough()
    {
        double limit = Deflection(Round(30, 1.5)) * 1.01;
        SizedFrame sized = TwoCantilevers(Sizes).Displacement("push", "a1", Vector3.UnitZ, limit).Size();
        Assert.Equal(SizingStatus.ProvenLightest, sized.Status);
        Assert.Equal("round 30 x 1.5 mm", sized.Sections[0].Name);
        Assert.Equal("round 20 x 1.5 mm", sized.Sections[1].Name);
        Assert.Equal(sized.MassKg, sized.BoundKg);
        Assert.Equal((Round(30, 1.5).Area + Round(20, 1.5).Area) * 1000 * 7850e-9, sized.MassKg, 12);

        // Looking at every design in order of mass would come to the answer as the sixth, (one, two) by their place in the list of sizes, whose areas are 87.2, 110.7, 134.3, 216,
        // 238.8, 301.6: 00 (174), 01 and 10 (198), 11 and 02 and 20 (221; 11 has fewer different sizes, then "round 20" comes
        // before "round 30"). The sixth is 20.
        Assert.InRange(sized.Analyses, 1, 6);
    }

    [Fact]
    public void Equal_masses_are_settled_by_fewer_different_sizes_then_by_names()
    {
        // Both groups need a 25: 11 comes first among its equals, though 02 and 20 weigh as much within a gram.
        double limit = Deflection(Round(25, 1.5)) * 1.01;
        SizedFrame sized = TwoCantilevers(Sizes)
            .Displacement("push", "a1", Vector3.UnitZ, limit).Displacement("push", "b1", Vector3.UnitZ, limit).Size();
        Assert.Equal("round 25 x 1.5 mm, round 25 x 1.5 mm", Names(sized));
        Assert.InRange(sized.Analyses, 1, 4);
    }

    [Fact]
    public void Without_targets_the_lightest_is_taken_and_analysed_once_for_its_cases()
    {
        SizedFrame sized = TwoCantilevers(Sizes).Size();
        Assert.Equal("round 20 x 1.5 mm, round 20 x 1.5 mm", Names(sized));
        Assert.Equal(1, sized.Analyses);
        Assert.Equal(Deflection(Round(20, 1.5)), -sized.Cases[0].Displacements[1]!.Value.Z, Deflection(Round(20, 1.5)) / 100);
    }

    [Fact]
    public void Without_cases_nothing_is_analysed()
    {
        SizedFrame sized = new FrameBuilder().Node("a", 0, 0, 0).Node("b", 1000, 0, 0)
            .Choose("one", [.. Sizes]).Tube("only", "a", "b", "one").Size();
        Assert.Equal("round 20 x 1.5 mm", sized.Sections[0].Name);
        Assert.Equal(0, sized.Analyses);
        Assert.Empty(sized.Cases);
        Assert.Equal(SizingStatus.ProvenLightest, sized.Status);
        Assert.Equal(2, sized.Joints.Count);
    }

    [Fact]
    public void Member_targets_filter_and_are_reported()
    {
        // Simply supported: PL³/48EI; 16 times stiffer than the cantilever.
        double limit = Deflection(Round(40, 2)) / 16 * 1.001;
        SizedFrame sized = TwoCantilevers(Sizes)
            .MemberDeflection("two", SpanKind.SimplySupported, 100, limit)
            .MemberStiffness("one", Steel.E * Round(30, 2.5).Iy * 0.999, Steel.G * Round(25, 1.5).J)
            .Size();
        Assert.Equal("round 30 x 2.5 mm, round 40 x 2 mm", Names(sized));
        Assert.Equal("mm", sized.Targets[0].Unit);
        Assert.Equal(limit / 1.001, sized.Targets[0].Value, 12);
        Assert.Equal("N.m2", sized.Targets[1].Unit);
        Assert.Equal("group one, bending stiffness EI", sized.Targets[1].Label);
        Assert.Equal(Steel.E * Round(30, 2.5).Iy / 1e6, sized.Targets[1].Value, 9);
        Assert.Equal(0.999, sized.Targets[1].Ratio, 12);
    }

    [Fact]
    public void A_fixed_frame_that_misses_is_unmet_and_says_by_how_much()
    {
        FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("b", 1000, 0, 0)
            .Fixed("one", Sizes[0]).Tube("only", "a", "b", "one").Clamp("a");
        builder.Case("push", default, builder.Force("b", 0, 0, -100)).Displacement("push", "b", Vector3.UnitZ, 1);
        SizedFrame sized = builder.Size(out DiagnosticList diagnostics);
        Assert.Equal(SizingStatus.Unmet, sized.Status);
        Assert.Null(sized.BoundKg);
        Assert.Equal(1, sized.Analyses);
        Diagnostic warning = Assert.Single(diagnostics);
        Assert.Equal(Severity.Warning, warning.Severity);
        Assert.StartsWith("displacement b along z, case push: 42.", warning.Message, StringComparison.Ordinal);
        Assert.Contains("times the limit of 1 mm", warning.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_target_out_of_reach_is_named_with_the_best_that_can_be_had_and_the_limits_in_the_way()
    {
        var choose = new ChooseSpec(
            [], null, new RangeSpec(null, new SpecQuantity(QuantityKind.Length, null!, Place), ".. 40 mm", Place), null, null, null, Place);
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("a1", 1000, 0, 0).Node("b", 0, 500, 0).Node("b1", 1000, 500, 0)
            .Choose("one", Steel, choose, Round(30, 1.5), Round(40, 2), Round(40, 3)).Choose("two", Sizes)
            .Tube("first", "a", "a1", "one").Tube("second", "b", "b1", "two").Clamp("a").Clamp("b");
        builder.Case("push", default, builder.Force("a1", 0, 0, -100))
            .Stiffness("a1", Vector3.UnitZ, 3 * Steel.E * Round(40, 3).Iy / 1e9 * 1.25)
            .Displacement("push", "a1", Vector3.UnitZ, 100);
        SizedFrame sized = builder.Size(out DiagnosticList diagnostics);

        Assert.Equal(SizingStatus.Unmet, sized.Status);
        Assert.Equal("round 40 x 3 mm, round 20 x 1.5 mm", Names(sized));
        Assert.InRange(sized.Analyses, 1, 18);
        string message = Assert.Single(diagnostics).Message;
        Assert.StartsWith("stiffness a1 along z: out of reach; the best of all sizes is", message, StringComparison.Ordinal);
        Assert.Contains("20 % below the limit", message, StringComparison.Ordinal);
        Assert.Contains("could be met, and all other targets with it", message, StringComparison.Ordinal);
        Assert.Contains("in the way stand one: od at its largest 40 mm, wall at stock's largest 3 mm:", message, StringComparison.Ordinal);
        Assert.DoesNotContain("two:", message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(52.34, 62.5, "52.3 N/mm")]
    [InlineData(4.213, 3, "4.22 N/mm")]
    [InlineData(1234.5, 1000, "1240 N/mm")]
    [InlineData(0.05, 0.06, "0.05 N/mm")]
    public void The_limit_that_could_be_met_is_rounded_to_the_side_that_can(double value, double limit, string words) =>
        Assert.Equal(words, UnmetReport.Reachable(new TargetResult(0, "stiffness", "top", value, limit, "N/mm", 2, "")));

    [Fact]
    public void The_smallest_wider_range_that_would_do_is_named()
    {
        // 40 x 3 is the stiffest within the range; 42, 45 and 50 mm are on the list. The limit lies between 42 and 45.
        SizedFrame sized = Short(0.5 * (Round(42, 3).Iy + Round(45, 3).Iy), Round(42, 3), Round(45, 3), Round(50, 3)).Size(out DiagnosticList diagnostics);
        Assert.Equal(SizingStatus.Unmet, sized.Status);
        string note = Assert.Single(diagnostics, d => d.Severity == Severity.Note).Message;
        Assert.StartsWith("a wider range of one group would do: od of one up to 45 mm (then round 45 x 3 mm; ", note, StringComparison.Ordinal);
    }

    [Fact]
    public void That_no_wider_range_would_do_is_said_too()
    {
        _ = Short(2 * Round(50, 3).Iy, Round(42, 3), Round(50, 3)).Size(out DiagnosticList diagnostics);
        string note = Assert.Single(diagnostics, d => d.Severity == Severity.Note).Message;
        Assert.StartsWith("no wider range of od, height, width or wall would do", note, StringComparison.Ordinal);
    }

    // A cantilever of up to 40 mm with larger sizes on its list, to be as stiff as a second moment of area.
    private static FrameBuilder Short(double inertia, params RoundTube[] beyond)
    {
        FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("a1", 1000, 0, 0)
            .Choose("one", Round(30, 1.5), Round(40, 2), Round(40, 3))
            .Beyond("one", "od", 40, beyond)
            .Tube("first", "a", "a1", "one").Clamp("a");
        return builder.Case("push", default, builder.Force("a1", 0, 0, -100)).Stiffness("a1", Vector3.UnitZ, 3 * Steel.E * inertia / 1e9);
    }

    [Fact]
    public void Targets_that_can_only_be_met_one_at_a_time_are_said_so()
    {
        // A push asks for a large I: the rod; its own weight for a large I/A: the tube.
        var rod = new Rod(40);
        RoundTube tube = Round(38, 1);
        FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("b", 1000, 0, 0)
            .Choose("one", rod, tube).Tube("only", "a", "b", "one").Clamp("a");
        double weight = 7850e-9 * 9.80665 * tube.Area;
        builder.Case("push", default, builder.Force("b", 0, 0, 100)).Case("rest", new Vector3(0, 0, -1))
            .Displacement("push", "b", Vector3.UnitZ, Deflection(rod) * 1.01)
            .Displacement("rest", "b", Vector3.UnitZ, weight * 1e12 / (8 * Steel.E * tube.Iy) * 1.01);
        SizedFrame sized = builder.Size(out DiagnosticList diagnostics);

        // The rod sinks by 171/100 of what the tube does, the tube rises by 6 times what the rod does: the rod is the less bad.
        Assert.Equal(SizingStatus.Unmet, sized.Status);
        Assert.Equal("rod 40 mm", sized.Sections[0].Name);
        Assert.Equal([true, false], sized.Targets.Select(t => t.Met));
        string message = diagnostics.First().Message;
        Assert.StartsWith(
            "each target can be met alone, but no design meets all of them; the least bad, one rod 40 mm, misses displacement b along z, case rest:",
            message,
            StringComparison.Ordinal);
    }

    [Fact]
    public void A_member_target_out_of_reach_is_unmet_too()
    {
        SizedFrame sized = TwoCantilevers(Sizes).MemberStiffness("two", null, Steel.G * Round(50, 2).J * 2).Size(out DiagnosticList diagnostics);
        Assert.Equal(SizingStatus.Unmet, sized.Status);
        Assert.Equal("round 20 x 1.5 mm, round 50 x 2 mm", Names(sized));
        string message = Assert.Single(diagnostics).Message;
        Assert.StartsWith("member group two, torsional stiffness GJ: out of reach;", message, StringComparison.Ordinal);
        Assert.Contains("50 % below the limit", message, StringComparison.Ordinal);
        Assert.Contains("two: od at stock's largest 50 mm", message, StringComparison.Ordinal);
    }

    [Fact]
    public void More_designs_than_can_be_looked_at_one_by_one_are_proven_all_the_same()
    {
        RoundTube[] many = [.. Enumerable.Range(0, 600).Select(i => Round(20 + (0.1 * i), 2))];
        SizedFrame sized = TwoCantilevers(many).Stiffness("a1", Vector3.UnitZ, 100).Size();
        Assert.Equal(SizingStatus.ProvenLightest, sized.Status);
        int chosen = Array.FindIndex(many, s => s.Equals(sized.Sections[0]));
        Assert.True(Deflection(many[chosen]) <= 1 && Deflection(many[chosen - 1]) > 0.995);
        Assert.Equal(many[0], sized.Sections[1]);
    }

    [Fact]
    public void Member_targets_count_before_the_designs_do()
    {
        RoundTube[] many = [.. Enumerable.Range(0, 600).Select(i => Round(20 + (0.1 * i), 2))];
        SizedFrame sized = TwoCantilevers(many).MemberStiffness("one", Steel.E * many[500].Iy, null).Size();
        Assert.Equal(many[500], sized.Sections[0]);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(7)]
    public void The_answer_and_the_count_do_not_depend_on_threads(int threads)
    {
        RoundTube[] many = [.. Enumerable.Range(0, 60).Select(i => Round(20 + (0.5 * i), 1 + (0.3 * (i % 7))))];
        FrameBuilder Frame() => TwoCantilevers(many)
            .Displacement("push", "a1", Vector3.UnitZ, Deflection(Round(33, 2))).Displacement("push", "b1", null, Deflection(Round(37, 1.7)));
        SizedFrame one = Frame().Size();
        SizedFrame several = Frame().Size(out _, threads);
        Assert.Equal(one.Sections, several.Sections);
        Assert.Equal(one.Analyses, several.Analyses);
        Assert.Equal(one.Targets, several.Targets);
        Assert.InRange(one.Analyses, 2, 3600);
    }

    [Fact]
    public void Tells_of_progress()
    {
        RoundTube[] many = [.. Enumerable.Range(0, 60).Select(i => Round(20 + (0.5 * i), 1.5))];
        var told = new List<SizingProgress>();
        SectionSizer.Size(
            TwoCantilevers(many).Displacement("push", "a1", Vector3.UnitZ, 1e-6).Build(), [], new Teller(told), 1);
        Assert.NotEmpty(told);
        Assert.All(told, t => Assert.Equal(3600, t.Total));
        Assert.All(told, t => Assert.InRange(t.Done, 1, 3600));
    }

    private sealed class Teller(List<SizingProgress> told) : IProgress<SizingProgress>
    {
        public void Report(SizingProgress value) => told.Add(value);
    }
}
