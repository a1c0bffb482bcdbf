using FrameGen.Geometry;
using Xunit;

namespace FrameGen.Tests.Geometry;

public class TubePathTests
{
    private const double R = 150;

    private static readonly TubePath Hoop = TubePath.Through(
        [new(0, 400, 0), new(0, 400, 800), new(0, -400, 800), new(0, -400, 0)], R);

    // Two quarter circles take 2 x 150 mm off each corner's sides and give 150 π/2 back.
    [Fact]
    public void Is_as_long_as_its_straights_and_arcs() => Assert.Equal(2400 - (4 * R) + (Math.PI * R), Hoop.Length, 1e-9);

    [Fact]
    public void Goes_through_known_points()
    {
        Expect(new(0, 400, 0), 0);
        Expect(new(0, 400, 650), 650);
        Expect(new(0, 250 + (R * Math.Sqrt(0.5)), 650 + (R * Math.Sqrt(0.5))), 650 + (R * Math.PI / 4));
        Expect(new(0, 250, 800), 650 + (R * Math.PI / 2));
        Expect(new(0, 0, 800), Hoop.Length / 2);
        Expect(new(0, -400, 0), Hoop.Length);

        void Expect(Vector3 point, double at) => Assert.InRange((Hoop.PointAt(at) - point).Length, 0, 1e-9);
    }

    [Fact]
    public void Carries_the_top_line_round_its_bends()
    {
        // Up along z, the top line to the inside of the hoop: it stays inside.
        var first = TubeAxes.Along(Vector3.UnitZ, -Vector3.UnitY);
        TubeAxes middle = Hoop.Carry(first, Hoop.Length / 2);
        TubeAxes last = Hoop.Carry(first, Hoop.Length);
        Assert.InRange((middle.X + Vector3.UnitY).Length, 0, 1e-12);
        Assert.InRange((middle.Z + Vector3.UnitZ).Length, 0, 1e-12);
        Assert.InRange((last.X + Vector3.UnitZ).Length, 0, 1e-12);
        Assert.InRange((last.Z - Vector3.UnitY).Length, 0, 1e-12);
    }

    // Two bends in planes at right angles: without a twist of its own the top line leaves square to both.
    [Fact]
    public void Carries_the_top_line_out_of_a_plane()
    {
        var path = TubePath.Through([Vector3.Zero, new(500, 0, 0), new(500, 500, 0), new(500, 500, 500)], 100);
        TubeAxes last = path.Carry(TubeAxes.Along(Vector3.UnitX), path.Length);
        Assert.InRange((last.X - Vector3.UnitZ).Length, 0, 1e-12);
        Assert.InRange((last.Z + Vector3.UnitY).Length, 0, 1e-12);
    }

    [Fact]
    public void Direction_is_the_slope_of_the_place()
    {
        TubeAxes axes = TubeAxes.Along(Vector3.UnitZ);
        for (double s = 1; s < Hoop.Length; s += 7.3)
        {
            Vector3 slope = (Hoop.PointAt(s + 1e-4) - Hoop.PointAt(s - 1e-4)) / 2e-4;
            Assert.InRange((slope - Hoop.Carry(axes, s).X).Length, 0, 1e-5);
        }
    }

    [Fact]
    public void Refuses_bends_that_overlap() =>
        Assert.Throws<ArgumentException>(() => TubePath.Through([Vector3.Zero, new(100, 0, 0), new(100, 100, 0), new(200, 100, 0)], 60));
}
