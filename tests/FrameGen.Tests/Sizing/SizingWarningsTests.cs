using FrameGen.Diagnostics;
using FrameGen.Geometry;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>What is said about a frame beside its numbers.</summary>
public sealed class SizingWarningsTests
{
    private static FrameBuilder Strut() => new FrameBuilder()
        .Node("foot", 0, 0, 0).Node("top", 0, 0, 1500)
        .Fixed("struts", Round(48.3, 3.2)).Tube("strut", "foot", "top", "struts");

    private static string[] Messages(DiagnosticList diagnostics, Severity severity) =>
        [.. diagnostics.Where(d => d.Severity == severity).Select(d => d.Message)];

    [Fact]
    public void A_support_that_has_to_pull_is_pointed_out_once()
    {
        // A beam on two feet, pushed beyond the second one: the first foot lifts with P/2.
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("c", 1500, 0, 0).Fixed("beams", Round(40, 3)).Tube("beam", "a", "c", "beams").NodeOn("b", "beam", 1000)
            .Hold("a", "x", "y", "z").Hold("b", "y", "z", "rx");
        builder.Case("on", default, builder.Force("b", 0, 0, -100)).Case("light", default, builder.Force("c", 0, 0, -10))
            .Case("heavy", default, builder.Force("c", 0, 0, -100));
        builder.Size(out DiagnosticList diagnostics);
        string message = Assert.Single(Messages(diagnostics, Severity.Warning));
        Assert.StartsWith("support a has to pull the frame down with 50 N in case heavy (also in light)", message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_support_that_holds_a_rotation_is_bolted_down_and_can_pull()
    {
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("c", 1500, 0, 0).Fixed("beams", Round(40, 3)).Tube("beam", "a", "c", "beams").NodeOn("b", "beam", 1000)
            .Hold("a", "x", "y", "z", "rx").Hold("b", "y", "z");
        builder.Case("heavy", default, builder.Force("c", 0, 0, -100));
        builder.Size(out DiagnosticList diagnostics);
        Assert.Empty(Messages(diagnostics, Severity.Warning));
    }

    [Fact]
    public void A_frame_that_slides_is_refused_in_words()
    {
        FrameBuilder builder = Strut().Hold("foot", "x", "z", "rx", "ry", "rz");
        builder.Case("push", default, builder.Force("top", 0, 0, -1));
        Assert.StartsWith("the frame can slide along y: no support or tube stops it", Assert.Single(builder.Errors()), StringComparison.Ordinal);
    }

    [Fact]
    public void A_frame_that_turns_is_refused_in_words()
    {
        FrameBuilder builder = Strut().Hold("foot", "x", "y", "z", "ry", "rz");
        builder.Case("push", default, builder.Force("top", 0, 0, -1));
        Assert.StartsWith("the frame can turn about x through (0, 0, 0) mm: no support or tube stops it", Assert.Single(builder.Errors()), StringComparison.Ordinal);
    }

    [Fact]
    public void A_frame_without_supports_names_all_its_motions()
    {
        FrameBuilder builder = Strut().Stiffness("top", Vector3.UnitX, 1);
        IReadOnlyList<string> errors = builder.Errors();
        Assert.Equal(6, errors.Count);
        Assert.Equal(3, errors.Count(e => e.Contains("can slide along", StringComparison.Ordinal)));
    }

    [Fact]
    public void Numbers_that_rounding_has_eaten_are_refused()
    {
        // A hair of 5 m with a block of 2 m across at its end: stiffnesses 20 powers of ten apart.
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", 5000, 0, 0).Node("c", 5010, 0, 0)
            .Fixed("hairs", Round(1, 0.05)).Fixed("blocks", Round(2000, 500))
            .Tube("hair", "a", "b", "hairs").Tube("block", "b", "c", "blocks").Clamp("a");
        builder.Case("push", default, builder.Force("c", 0, 0, -1), builder.Moment("b", 0, 3, 1));
        string error = Assert.Single(builder.Errors());
        Assert.StartsWith("the frame can't be solved reliably: some tubes are so much stiffer than others", error, StringComparison.Ordinal);
    }
}
