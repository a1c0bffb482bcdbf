using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>Corners without a through tube: run-out, miters, tubes in line, ends square by request.</summary>
public class CornerTests
{
    private static FrameBuilder Corner(
        double degrees,
        Section first,
        Section second,
        Corner corner,
        Func<TubeEnd, TubeEnd>? changeFirst = null,
        Func<TubeEnd, TubeEnd>? changeSecond = null,
        Vector3? offset = null)
    {
        FrameBuilder frame = new();
        double angle = degrees * Math.PI / 180;
        Vector3 side = offset ?? Vector3.Zero;
        int node = frame.Node(Vector3.Zero);
        int along = frame.Node(new Vector3(600, 0, 0));
        int other = frame.Node(side + new Vector3(500 * Math.Cos(angle), 500 * Math.Sin(angle), 0));
        frame.Tube(node, along, first, changeFrom: changeFirst);
        frame.Tube(node, other, second, changeFrom: changeSecond, fromOffset: side);
        frame.Joint(node, null, corner, new TubeEndId(0, End.From), new TubeEndId(1, End.From));
        return frame;
    }

    [Fact]
    public void A_square_corner_of_equal_tubes_is_flush_with_the_far_side()
    {
        CutFrame cut = Corner(90, new RoundTube(30, 2), new RoundTube(30, 2), FrameGen.Model.Corner.RunOut).Cut();
        Assert.Equal(CutKind.Square, cut.Tubes[0].From.Kind);
        Assert.Equal(-15, cut.Tubes[0].Start, 1e-9);
        Assert.Equal(615, cut.Tubes[0].CutLength, 1e-9);

        // The coped tube's long points, at its sides, reach the first tube's middle.
        Assert.Equal(CutKind.Cope, cut.Tubes[1].From.Kind);
        Assert.Equal(0, cut.Tubes[1].Start, 1e-6);
    }

    // (r − R cos φ) / sin φ, never negative: the shared closed form for meeting axes.
    [Theory]
    [InlineData(90, 40, 30)]
    [InlineData(60, 40, 40)]
    [InlineData(60, 40, 15)]
    [InlineData(105, 40, 30)]
    [InlineData(120, 40, 40)]
    public void Meeting_axes_run_out_by_the_closed_form(double degrees, double first, double second)
    {
        double angle = degrees * Math.PI / 180;
        double expected = Math.Max(0, ((second / 2) - (first / 2 * Math.Cos(angle))) / Math.Sin(angle));
        CutFrame cut = Corner(degrees, new RoundTube(first, 2), new RoundTube(second, 2), FrameGen.Model.Corner.RunOut).Cut();
        Assert.Equal(-expected, cut.Tubes[0].Start, 1e-9);
    }

    // Offset axes have no closed form at hand: with the run-out every line lands on the side, with less one does not.
    [Theory]
    [InlineData(90, 40, 30, 4)]
    [InlineData(70, 40, 30, -5)]
    [InlineData(110, 40, 20, 9)]
    [InlineData(60, 40, 36, 2)]
    public void Offset_axes_run_out_just_far_enough(double degrees, double first, double second, double offset)
    {
        Vector3 side = new(0, 0, offset);
        CutFrame cut = Corner(degrees, new RoundTube(first, 2), new RoundTube(second, 2), FrameGen.Model.Corner.RunOut, offset: side).Cut();
        double runOut = -cut.Tubes[0].Start;
        Assert.Equal(0, OpenEndDepth(degrees, first, second, offset, runOut), 1e-5);
    }

    [Fact]
    public void An_offset_along_the_first_tube_only_shifts_the_run_out()
    {
        CutFrame cut = Corner(
            90, new RoundTube(40, 2), new RoundTube(30, 2), FrameGen.Model.Corner.RunOut, offset: new Vector3(-7, 0, 0)).Cut();
        Assert.Equal(-22, cut.Tubes[0].Start, 1e-9);
    }

    [Fact]
    public void Gap_does_not_count_in_the_run_out()
    {
        CutFrame cut = Corner(
            90, new RoundTube(30, 2), new RoundTube(30, 2), FrameGen.Model.Corner.RunOut, changeSecond: e => e with { Gap = 0.5 }).Cut();
        Assert.Equal(-15, cut.Tubes[0].Start, 1e-9);
        Assert.Equal(0.5, cut.Tubes[1].From.Gap);

        // Walked to a cylinder of 15.5: √(15.5² − 15²) at the sides.
        Assert.Equal(Math.Sqrt((15.5 * 15.5) - 225), cut.Tubes[1].From.Outer.Min, 1e-9);
        Assert.Equal(15.5, cut.Tubes[1].From.Outer.Max, 1e-9);
    }

    [Theory]
    [InlineData(20)]
    [InlineData(-3)]
    public void Extend_overrides_the_run_out(double extend)
    {
        CutFrame cut = Corner(
            90, new RoundTube(30, 2), new RoundTube(30, 2), FrameGen.Model.Corner.RunOut, changeFirst: e => e with { Extend = extend }).Cut();
        Assert.Equal(-extend, cut.Tubes[0].Start, 1e-12);
    }

    [Fact]
    public void An_explicit_square_first_end_runs_out_too()
    {
        CutFrame cut = Corner(
            90, new RoundTube(30, 2), new RoundTube(30, 2), FrameGen.Model.Corner.RunOut, changeFirst: e => e with { Cut = RequestedCut.Square }).Cut();
        Assert.Equal(-15, cut.Tubes[0].Start, 1e-9);
    }

    [Fact]
    public void Nothing_coped_to_the_first_tube_leaves_it_at_the_node()
    {
        CutFrame cut = Corner(
            90, new RoundTube(30, 2), new RoundTube(30, 2), FrameGen.Model.Corner.RunOut,
            changeSecond: e => e with { Cut = RequestedCut.Square, Extend = 4 }).Cut();
        Assert.Equal(0, cut.Tubes[0].Start, 1e-12);
        Assert.Equal(-4, cut.Tubes[1].Start, 1e-12);
        Assert.Empty(cut.Tubes[1].From.Contacts);
    }

    [Fact]
    public void A_run_out_longer_than_the_tube_is_wide_is_refused_with_ways_out()
    {
        SizedFrame sized = Corner(150, new RoundTube(40, 2), new RoundTube(30, 2), FrameGen.Model.Corner.RunOut).Build();
        DiagnosticList diagnostics = [];
        Assert.Null(EndCoper.Cope(sized, diagnostics));

        // (15 − 20 cos 150°) / sin 150° = 64.64 mm.
        Diagnostic error = Assert.Single(diagnostics);
        Assert.Equal(Severity.Error, error.Severity);
        Assert.Equal(sized.Model.Tubes[0].From.At, error.At);
        Assert.Contains("64.6 mm", error.Message, StringComparison.Ordinal);
        Assert.Contains("miter: [t0, t1]", error.Message, StringComparison.Ordinal);
        Assert.Contains("order", error.Message, StringComparison.Ordinal);
        Assert.Contains("extend", error.Message, StringComparison.Ordinal);
    }

    // Case E: r 16, each tube cut 22.5° off square, so the axes make 135°; z = 16 tan 22.5° cos θ, printed to 9 decimals.
    [Fact]
    public void A_miter_follows_the_printed_sinusoid()
    {
        double[] printed = [6.627416998, 6.401593240, 5.739511482, 4.686291501, 3.313708499, 1.715301739, 0];
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero);
        Vector3 other = 400 * new Vector3(Math.Cos(0.75 * Math.PI), 0, Math.Sin(0.75 * Math.PI));
        frame.Tube(node, frame.Node(new Vector3(400, 0, 0)), new RoundTube(32, 2));
        frame.Tube(frame.Node(other), node, new RoundTube(32, 2));
        frame.Joint(node, null, FrameGen.Model.Corner.Miter, new TubeEndId(0, End.From), new TubeEndId(1, End.To));
        CutFrame cut = frame.Cut();
        EndCut end = cut.Tubes[0].From;
        Assert.Equal(CutKind.Miter, end.Kind);

        // The other tube rises to +z over the node, so the first is cut back most on its top line, clock 0.
        for (int i = 0; i < printed.Length; i++)
        {
            Assert.Equal(printed[i], end.Surface.At(i * Math.PI / 12, 16), 5e-10);
            Assert.Equal(printed[i], end.Surface.At(-i * Math.PI / 12, 16), 5e-10);
            Assert.Equal(-printed[i], end.Surface.At(Math.PI - (i * Math.PI / 12), 16), 5e-10);
        }

        Assert.Equal(13.254833996, end.Outer.Max - end.Outer.Min, 5e-10);
        Assert.Equal(cut.Sized.SectionOf(0).Area * 400, cut.Tubes[0].Volume, 1e-6);

        // Cut face: an ellipse of semi-axes r and r / cos 22.5°; its length by Simpson's rule.
        double length = Simpson(v => Math.Sqrt(
            Math.Pow(16 * Math.Sin(v) / Math.Cos(Math.PI / 8), 2) + Math.Pow(16 * Math.Cos(v), 2)), 0, 2 * Math.PI);
        Assert.Equal(length, end.OuterLength, length * 1e-6);

        Contact contact = Assert.Single(end.Contacts);
        Assert.Equal(1, contact.Tube);
        Assert.Equal(0.75 * Math.PI, contact.Angle, 1e-12);
        Assert.Equal(0, contact.Clock!.Value, 1e-12);
    }

    [Fact]
    public void A_third_tube_is_coped_to_both_mitred_ones()
    {
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero);
        frame.Tube(node, frame.Node(new Vector3(400, 0, 0)), new RoundTube(32, 2));
        frame.Tube(node, frame.Node(new Vector3(0, 400, 0)), new RoundTube(32, 2));
        frame.Tube(node, frame.Node(new Vector3(0, 0, 400)), new RoundTube(25, 2));
        frame.Joint(node, null, FrameGen.Model.Corner.Miter, new TubeEndId(0, End.From), new TubeEndId(1, End.From), new TubeEndId(2, End.From));
        CutFrame cut = frame.Cut();
        EndCut end = cut.Tubes[2].From;
        Assert.Equal([0, 1], end.Contacts.Select(c => c.Tube));

        // The third's top line points along x: at clock 0 it stands on the first tube, and on the other side, past the
        // miter's plane x = y, on the second one.
        Assert.Equal(16, end.Surface.At(0, 12.5), 1e-9);
        Assert.Equal(Math.Sqrt(256 - (12.5 * 12.5 / 2)), end.Surface.At(Math.PI / 4, 12.5), 1e-9);
        Assert.Contains(end.Outer.Points, p => Math.Abs(p.Clock - (-0.25 * Math.PI)) < 1e-9 || Math.Abs(p.Clock - (0.25 * Math.PI)) < 1e-9);
    }

    [Fact]
    public void Tubes_in_line_both_end_square_and_carry_a_third_between_them()
    {
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero);
        frame.Tube(node, frame.Node(new Vector3(400, 0, 0)), new RoundTube(32, 2));
        frame.Tube(frame.Node(new Vector3(-400, 0, 0)), node, new RoundTube(32, 2));
        frame.Tube(node, frame.Node(new Vector3(0, 0, 400)), new RoundTube(25, 2));
        frame.Joint(node, null, FrameGen.Model.Corner.InLine, new TubeEndId(0, End.From), new TubeEndId(1, End.To), new TubeEndId(2, End.From));
        CutFrame cut = frame.Cut();
        Assert.Equal(0, cut.Tubes[0].Start, 1e-12);
        Assert.Equal(400, cut.Tubes[1].Stop, 1e-12);
        CutTube through = Tee.Cut(16, new RoundTube(25, 2), Math.PI / 2, 0);
        Assert.Equal(through.Volume, cut.Tubes[2].Volume, through.Volume * 1e-9);
        Assert.Equal(through.From.Outer.Min, cut.Tubes[2].From.Outer.Min, 1e-9);
        Assert.Equal(2, cut.Tubes[2].From.Contacts.Count);
    }

    // By how far the worst wall line misses the side of the first tube past its end x = −runOut: looked at on a fine
    // grid of outer-skin lines, each met with the endless cylinder by hand.
    private static double OpenEndDepth(double degrees, double first, double second, double offset, double runOut)
    {
        double angle = degrees * Math.PI / 180;
        double radius = first / 2;
        double least = double.PositiveInfinity;
        for (int i = 0; i < 200_000; i++)
        {
            double v = 2 * Math.PI * i / 200_000;
            double across = (second / 2 * Math.Sin(v)) + offset;
            double inPlane = second / 2 * Math.Cos(v);
            if (Math.Abs(across) > radius)
            {
                continue;
            }

            // Point (x, y) = inPlane (sin φ, −cos φ) + t (cos φ, sin φ) with y = √(R² − across²).
            double t = (Math.Sqrt((radius * radius) - (across * across)) + (inPlane * Math.Cos(angle))) / Math.Sin(angle);
            least = Math.Min(least, (inPlane * Math.Sin(angle)) + (t * Math.Cos(angle)));
        }

        return Math.Max(0, -least) - runOut;
    }

    private static double Simpson(Func<double, double> function, double from, double to)
    {
        const int Steps = 2000;
        double sum = 0;
        for (int i = 0; i <= Steps; i++)
        {
            sum += function(from + ((to - from) * i / Steps)) * (i is 0 or Steps ? 1 : i % 2 == 1 ? 4 : 2);
        }

        return sum * (to - from) / Steps / 3;
    }
}
