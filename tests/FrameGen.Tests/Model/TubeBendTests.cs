using CsCheck;
using FrameGen.Geometry;
using FrameGen.Model;
using FrameGen.Tests.Joints;
using Xunit;

namespace FrameGen.Tests.Model;

/// <summary>Lengths, angles and rotations for the bender.</summary>
public class TubeBendTests
{
    private const double R = 50;

    private static readonly Gen<Vector3[]> Corners = Gen.Select(
        Gen.Double[-120, 120].Array[6], c => (Vector3[])[new(0, 0, 0), new(400, c[0], c[1]), new(500 + c[2], 420, c[3]), new(450 + c[4], 500 + c[5], 480), new(950, 700, 500)]);

    // Along x, then y, then up or down z: at the second corner the axis of the bend turns from +z to ±x, about the way +y: ±90 degrees.
    [Theory]
    [InlineData(300, 90)]
    [InlineData(-300, -90)]
    public void A_plane_that_turns_right_handed_along_the_tube_is_positive(double rise, double degrees)
    {
        IReadOnlyList<TubeBend> bends = Of(new(0, 0, 0), new(300, 0, 0), new(300, 300, 0), new(300, 300, rise));
        Assert.Equal([250, 200], bends.Select(b => b.Straight), (a, b) => Math.Abs(a - b) < 1e-9);
        Assert.Equal([250, 450 + (25 * Math.PI)], bends.Select(b => b.Start), (a, b) => Math.Abs(a - b) < 1e-9);
        Assert.Equal([0, degrees], bends.Select(b => double.RadiansToDegrees(b.Rotation)), (a, b) => Math.Abs(a - b) < 1e-9);
        Assert.All(bends, b => Assert.Equal(Math.PI / 2, b.Angle, 1e-12));

        // The first bend goes to +y, which is clock 270 on a tube along +x with its top line up.
        Assert.Equal(-Math.PI / 2, bends[0].Clock, 1e-12);
    }

    [Fact]
    public void A_bend_the_other_way_in_the_same_plane_is_half_a_turn()
    {
        IReadOnlyList<TubeBend> bends = Of(new(0, 0, 0), new(300, 0, 0), new(300, 300, 0), new(600, 300, 0));
        Assert.Equal(Math.PI, bends[1].Rotation);
    }

    // The same from vectors alone: what of the legs before and behind lies square to the leg between, and the angle from the one bend's inside to the other's.
    [Fact]
    public void Tangents_and_rotations_are_those_of_the_corners() => Corners.Sample(corners =>
    {
        IReadOnlyList<TubeBend> bends = Of(corners);
        double before = 0;
        for (int i = 0; i < bends.Count; i++)
        {
            Vector3 u = (corners[i + 1] - corners[i]).Normalized();
            Vector3 v = (corners[i + 2] - corners[i + 1]).Normalized();
            double angle = Math.Acos(u.Dot(v));
            double tangent = R * Math.Tan(angle / 2);
            Assert.Equal(angle, bends[i].Angle, 1e-9);
            Assert.Equal((corners[i + 1] - corners[i]).Length - before - tangent, bends[i].Straight, 1e-8);
            before = tangent;
            if (i > 0)
            {
                Vector3 w = (corners[i] - corners[i - 1]).Normalized();
                Vector3 first = -1 * (w - (w.Dot(u) * u));
                Vector3 second = v - (v.Dot(u) * u);
                double rotation = Math.Atan2(first.Cross(second).Dot(u), first.Dot(second));
                Assert.Equal(0, Math.IEEERemainder(rotation - bends[i].Rotation, 2 * Math.PI), 1e-8);
                Assert.Equal(0, Math.IEEERemainder(bends[i].Clock - bends[i - 1].Clock - rotation, 2 * Math.PI), 1e-8);
            }
        }
    });

    [Fact]
    public void From_the_other_end_the_bends_come_in_reverse_with_the_same_rotations() => Corners.Sample(corners =>
    {
        IReadOnlyList<TubeBend> bends = Of(corners);
        IReadOnlyList<TubeBend> back = Of([.. corners.Reverse()]);
        for (int i = 0; i < bends.Count; i++)
        {
            TubeBend other = back[bends.Count - 1 - i];
            Assert.Equal(bends[i].Angle, other.Angle, 1e-9);
            if (i > 0)
            {
                Assert.Equal(0, Math.IEEERemainder(bends[i].Rotation - back[bends.Count - i].Rotation, 2 * Math.PI), 1e-8);
                Assert.Equal(bends[i].Straight, back[bends.Count - i].Straight, 1e-8);
            }
        }
    });

    [Fact]
    public void A_mirror_turns_every_rotation_the_other_way() => Corners.Sample(corners =>
    {
        IReadOnlyList<TubeBend> bends = Of(corners);
        IReadOnlyList<TubeBend> image = Of([.. corners.Select(c => new Vector3(c.X, -c.Y, c.Z))]);
        Assert.All(bends.Zip(image), p =>
        {
            Assert.Equal(p.First.Angle, p.Second.Angle, 1e-9);
            Assert.Equal(p.First.Straight, p.Second.Straight, 1e-8);
            Assert.Equal(0, Math.IEEERemainder(p.First.Rotation + p.Second.Rotation, 2 * Math.PI), 1e-8);
        });
    });

    [Fact]
    public void Springback_is_bent_on_top()
    {
        Assert.Equal(92, double.RadiansToDegrees(new Springback(double.DegreesToRadians(2), 0).MachineAngle(Math.PI / 2)), 1e-9);
        Assert.Equal(93.6, double.RadiansToDegrees(new Springback(0, 0.04).MachineAngle(Math.PI / 2)), 1e-9);
    }

    private static IReadOnlyList<TubeBend> Of(params Vector3[] corners) =>
        TubeBend.Of(BentFrame.Cut(BentFrame.Alone("round 20 x 2 mm", R, corners)).Sized.Model.Tubes[0]);
}
