using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>Breathing holes near tube ends.</summary>
public class VentTests
{
    [Fact]
    public void A_drilled_circle_on_a_round_tube_is_wider_round_it()
    {
        // A drill of radius s across a tube of radius R reaches R asin(s/R) round it, and s along it.
        IReadOnlyList<Point2> points = new Vent(Math.PI / 2, 40, 12).Developed(new RoundOutline(15));
        Assert.Equal((15 * Math.PI / 2) + (15 * Math.Asin(6 / 15.0)), points.Max(p => p.X), 1e-12);
        Assert.Equal(46, points.Max(p => p.Y), 1e-12);
        Assert.All(points, p => Assert.Equal(6, Math.Sqrt(Math.Pow(15 * Math.Sin((p.X / 15) - (Math.PI / 2)), 2) + Math.Pow(p.Y - 40, 2)), 1e-9));
    }

    [Fact]
    public void On_a_flat_it_is_a_circle()
    {
        var outline = new FlatSidedOutline(40, 60, 5);
        Point2 centre = new(outline.DistanceAt(-Math.PI / 2), 30);
        Assert.All(new Vent(-Math.PI / 2, 30, 8).Developed(outline), p => Assert.Equal(4, p.DistanceTo(centre), 1e-9));
    }

    [Fact]
    public void It_lies_on_the_line_away_from_the_mate_and_clear_of_the_cut()
    {
        // The mate leaves at clock 180 (the branch leans away from it): the top line is farthest, cut at t = 30 / sin 60 - 15 / tan 60.
        CutTube tube = OutlineCopeTests.Tee(
            new RoundTube(30, 2), new RoundTube(60, 3), 60, 0, 0, 0, FrameGen.Spec.CutMode.Contour, e => e with { Vent = 4 }).Cut().Tubes[1];
        Vent vent = tube.From.Vent!;
        Assert.Equal(0, vent.Clock);
        double cut = (30 - (15 * Math.Cos(Math.PI / 3))) / Math.Sin(Math.PI / 3);
        Assert.InRange(vent.T - 2 - Vent.Clear, cut, cut + 0.2);
        Assert.Null(tube.To.Vent);
    }

    [Fact]
    public void Says_why_one_can_t_be_drilled()
    {
        static string Said(Section section, double diameter)
        {
            DiagnosticList found = [];
            Assert.Null(EndCoper.Cope(
                OutlineCopeTests.Tee(section, new RoundTube(60, 3), 60, 0, 0, 0, FrameGen.Spec.CutMode.Contour, e => e with { Vent = diameter }).Build(), found));
            return Assert.Single(found).Message;
        }

        Assert.Contains("a rod is solid", Said(new Rod(16), 4), StringComparison.Ordinal);
        Assert.Contains("too large for round 30 x 2 mm, which takes 15 mm at most", Said(new RoundTube(30, 2), 16), StringComparison.Ordinal);
    }
}
