using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>What is cut to a tube is no wider than it: sizing sees to that.</summary>
public sealed class FitTests
{
    // A strut that lands on a chord; the strut wants to be stiff, and so large.
    private static FrameBuilder Tee(bool wrap, double[] chords, double[] struts) => new FrameBuilder()
        .Choose("chords", [.. chords.Select(d => Round(d, 2))])
        .Choose("struts", [.. struts.Select(d => Round(d, 2))])
        .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Tube("chord", "a", "b", "chords").NodeOn("n", "chord", 500)
        .Node("top", 500, 0, 600).Tube("strut", "n", "top", "struts", wrap: wrap)
        .Clamp("a").Clamp("b");

    [Fact]
    public void A_strut_is_no_wider_than_the_chord_it_lands_on()
    {
        // EI floor of a 30 mm strut: the 20 mm chord would do, but can't carry it.
        double floor = Steel.E * Round(30, 2).Iy * 0.999;
        SizedFrame sized = Tee(false, [20, 25, 30, 35], [20, 25, 30, 35]).MemberStiffness("struts", floor, null).Size();
        Assert.Equal("round 30 x 2 mm", sized.Sections[0].Name);
        Assert.Equal("round 30 x 2 mm", sized.Sections[1].Name);
    }

    [Fact]
    public void What_that_costs_is_said()
    {
        // Half of 30 mm can't be more than half of 20: with wrap, the chord would be 20 x 2 in place of 30 x 2.
        double floor = Steel.E * Round(30, 2).Iy * 0.999;
        SizedFrame sized = Tee(false, [20, 25, 30, 35], [20, 25, 30, 35]).MemberStiffness("struts", floor, null).Size(out DiagnosticList diagnostics);
        FitCost cost = Assert.IsType<FitCost>(sized.Fits);
        Assert.Equal((Round(30, 2).Area - Round(20, 2).Area) * 1000 * 7850e-9, cost.LighterKg, 9);
        FitRule rule = Assert.Single(cost.Rules);
        Assert.Equal("struts can't be wider than chords, 20 mm (round 30 x 2 mm at joint n)", rule.Text);
        Assert.Contains("refused only because struts can't be wider than chords, 20 mm", Assert.Single(diagnostics).Message, StringComparison.Ordinal);
        Assert.Null(Tee(true, [20, 25, 30, 35], [20, 25, 30, 35]).MemberStiffness("struts", floor, null).Size().Fits);
    }

    [Fact]
    public void Unless_it_may_wrap()
    {
        double floor = Steel.E * Round(30, 2).Iy * 0.999;
        SizedFrame sized = Tee(true, [20, 25, 30, 35], [20, 25, 30, 35]).MemberStiffness("struts", floor, null).Size();
        Assert.Equal("round 20 x 2 mm", sized.Sections[0].Name);
        Assert.Equal("round 30 x 2 mm", sized.Sections[1].Name);
    }

    [Fact]
    public void A_joint_that_no_sizes_fit_is_named_with_its_groups_and_sizes()
    {
        string error = Assert.Single(Tee(false, [20, 25], [32, 30]).Errors());
        Assert.StartsWith(
            "no choice of sizes fits joint n: at best strut (struts, round 30 x 2 mm) is wider than the chord (chords, round 25 x 2 mm) it lands on: "
            + "half its width and offset 15 mm, its seat's half 12.5 mm; let chords be larger or struts smaller",
            error,
            StringComparison.Ordinal);
    }

    [Fact]
    public void Joints_that_only_fit_one_at_a_time_are_said_so()
    {
        // The strut lands on a chord of up to 26 mm at one end and carries a tie of 30 mm at the other.
        FrameBuilder builder = Tee(false, [20, 26], [20, 25, 30]).NodeOn("s", "strut", 300).Node("out", 500, 500, 300)
            .Choose("ties", Round(30, 2), Round(40, 2)).Tube("tie", "s", "out", "ties");
        string error = Assert.Single(builder.Errors());
        Assert.StartsWith("no choice of sizes fits every joint at once, though each fits alone", error, StringComparison.Ordinal);
        Assert.Contains("n: strut (struts, round 30 x 2 mm) is wider", error, StringComparison.Ordinal);
        Assert.Contains("s: tie (ties, round 30 x 2 mm) is wider than the strut (struts, round 25 x 2 mm)", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Between_given_sections_it_binds_nothing()
    {
        FrameBuilder builder = new FrameBuilder().Fixed("chords", Round(20, 2)).Fixed("struts", Round(30, 2))
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Tube("chord", "a", "b", "chords").NodeOn("n", "chord", 500)
            .Node("top", 500, 0, 600).Tube("strut", "n", "top", "struts").Clamp("a");
        builder.Case("push", default, builder.Force("top", 1, 0, 0)).Displacement("push", "top", Vector3.UnitX, 10);
        SizedFrame sized = builder.Size(out DiagnosticList diagnostics);
        Assert.Equal(SizingStatus.Fixed, sized.Status);
        Assert.DoesNotContain(diagnostics, d => d.Severity == Severity.Error);
    }

    [Fact]
    public void Designs_that_do_not_fit_are_not_counted()
    {
        // Of nine pairs three don't fit; the last pair in the order is the only one stiff enough.
        FrameBuilder builder = Tee(false, [20, 25, 30], [20, 25, 30]);
        double stiffness = 0.9999 * Stiffness(Round(30, 2), Round(30, 2));
        SizedFrame sized = builder.Stiffness("top", Vector3.UnitY, stiffness).Size();
        Assert.Equal("round 30 x 2 mm", sized.Sections[0].Name);
        Assert.Equal("round 30 x 2 mm", sized.Sections[1].Name);
        Assert.InRange(sized.Analyses, 1, 6);
    }

    [Fact]
    public void Says_so_where_a_joint_keeps_a_target_out_of_reach()
    {
        // The strut would be stiff enough with 35 mm, but the chord ends at 30.
        FrameBuilder builder = Tee(false, [25, 30], [25, 30, 35]);
        builder.Stiffness("top", Vector3.UnitY, 1.1 * Stiffness(Round(30, 2), Round(30, 2))).Size(out DiagnosticList diagnostics);
        string message = Assert.Single(diagnostics).Message;
        Assert.Contains("chords: od at stock's largest 30 mm", message, StringComparison.Ordinal);
        Assert.Contains("struts: wall at stock's largest 2 mm, round 35 x 2 mm does not fit joint n", message, StringComparison.Ordinal);
    }

    private static double Stiffness(RoundTube chord, RoundTube strut) =>
        new FrameBuilder().Fixed("chords", chord).Fixed("struts", strut)
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Tube("chord", "a", "b", "chords").NodeOn("n", "chord", 500)
            .Node("top", 500, 0, 600).Tube("strut", "n", "top", "struts")
            .Clamp("a").Clamp("b")
            .Stiffness("top", Vector3.UnitY, 1).Size().Targets[0].Value;
}
