using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>What holds for any frame: moving it, turning it, swapping a tube's ends, mirroring it.</summary>
public class CopeLawTests
{
    private static readonly Vector3 Shift = new(812.5, -340.25, 1207.125);

    // A turn by 1.1 rad about (1, 2, −2)/3, by Rodrigues' formula.
    private static Vector3 Move(Vector3 v)
    {
        Vector3 axis = new(1 / 3.0, 2 / 3.0, -2 / 3.0);
        (double sin, double cos) = Math.SinCos(1.1);
        return Shift + (cos * v) + (sin * axis.Cross(v)) + ((1 - cos) * axis.Dot(v) * axis);
    }

    private static Vector3 Mirror(Vector3 v) => new(v.X, -v.Y, v.Z);

    [Theory]
    [InlineData(CutMode.Contour)]
    [InlineData(CutMode.Radial)]
    public void Moving_and_turning_a_frame_changes_nothing_but_the_top_lines(CutMode mode)
    {
        for (int seed = 1; seed <= 8; seed++)
        {
            bool through = seed % 2 == 0;
            CutFrame still = Cluster.Scatter(seed, mode, through, offset: 5).Frame.Cut();
            CutFrame moved = Cluster.Scatter(seed, mode, through, offset: 5, move: Move).Frame.Cut();
            for (int i = 0; i < still.Tubes.Count; i++)
            {
                (CutTube a, CutTube b) = (still.Tubes[i], moved.Tubes[i]);
                Assert.Equal(a.Volume, b.Volume, a.Volume * 1e-9);
                Assert.Equal(a.CutLength, b.CutLength, 1e-6);
                Assert.Equal(0, (Move(a.Centroid) - b.Centroid).Length, 1e-6);
                Assert.Equal(a.OuterArea, b.OuterArea, a.OuterArea * 1e-9);
                TubeAxes before = still.Sized.Model.Tubes[i].Axes;
                TubeAxes after = moved.Sized.Model.Tubes[i].Axes;
                double turn = after.ClockOf(Move(before.Z) - Move(Vector3.Zero));
                foreach (End end in (End[])[End.From, End.To])
                {
                    Assert.Equal(a[end].OuterLength, b[end].OuterLength, a[end].OuterLength * 1e-6);
                    Assert.Equal(a[end].Contacts.Select(c => c.Tube), b[end].Contacts.Select(c => c.Tube));
                    double outer = still.Sized.SectionOf(i).OuterSize / 2;
                    for (int k = 0; k < 40; k++)
                    {
                        double clock = 0.05 + (k * Math.PI / 20);
                        Assert.Equal(a[end].Surface.At(clock, outer), b[end].Surface.At(clock + turn, outer), 1e-7);
                    }
                }
            }
        }
    }

    [Theory]
    [InlineData(CutMode.Contour)]
    [InlineData(CutMode.Radial)]
    public void Mirroring_a_frame_gives_opposite_hands(CutMode mode)
    {
        for (int seed = 1; seed <= 8; seed++)
        {
            bool through = seed % 2 == 0;
            CutFrame right = Cluster.Scatter(seed, mode, through, offset: 5).Frame.Cut();
            CutFrame left = Cluster.Scatter(seed, mode, through, offset: 5, move: Mirror).Frame.Cut();
            for (int i = 0; i < right.Tubes.Count; i++)
            {
                (CutTube a, CutTube b) = (right.Tubes[i], left.Tubes[i]);
                Assert.Equal(a.Volume, b.Volume, a.Volume * 1e-9);
                double outer = right.Sized.SectionOf(i).OuterSize / 2;
                for (int k = 0; k < 40; k++)
                {
                    // The default top line (global z) mirrors onto itself, and clock angles change sign.
                    double clock = 0.05 + (k * Math.PI / 20);
                    Assert.Equal(a.From.Surface.At(clock, outer), b.From.Surface.At(-clock, outer), 1e-7);
                    Assert.Equal(a.To.Surface.At(clock, outer), b.To.Surface.At(-clock, outer), 1e-7);
                }
            }
        }
    }

    [Theory]
    [InlineData(CutMode.Contour)]
    [InlineData(CutMode.Radial)]
    public void Swapping_a_tubes_ends_keeps_its_part(CutMode mode)
    {
        CutFrame Frame(bool swapped)
        {
            FrameBuilder frame = new() { Mode = mode };
            int a = frame.Node(Vector3.Zero, through: 0);
            int b = frame.Node(new Vector3(30, 250, 40), through: 1);
            frame.Tube(frame.Node(new Vector3(-300, 0, 0)), frame.Node(new Vector3(300, 0, 0)), new RoundTube(40, 2));
            frame.Tube(frame.Node(new Vector3(-270, 250, -60)), frame.Node(new Vector3(330, 250, 140)), new RoundTube(36, 2));
            int tube = swapped
                ? frame.Tube(b, a, new RoundTube(28, 2), toOffset: new Vector3(0, 0, 4))
                : frame.Tube(a, b, new RoundTube(28, 2), fromOffset: new Vector3(0, 0, 4));
            frame.Joint(a, 0, Corner.None, new TubeEndId(tube, swapped ? End.To : End.From));
            frame.Joint(b, 1, Corner.None, new TubeEndId(tube, swapped ? End.From : End.To));
            return frame.Cut();
        }

        CutTube one = Frame(false).Tubes[2];
        CutTube other = Frame(true).Tubes[2];
        Assert.Equal(one.Volume, other.Volume, one.Volume * 1e-9);
        Assert.Equal(one.CutLength, other.CutLength, 1e-9);
        Assert.Equal(0, (one.Centroid - other.Centroid).Length, 1e-7);
        for (int k = 0; k < 40; k++)
        {
            // The same top line, seen from the other end: clock angles change sign.
            double clock = 0.05 + (k * Math.PI / 20);
            Assert.Equal(one.From.Surface.At(clock, 14), other.To.Surface.At(-clock, 14), 1e-9);
            Assert.Equal(one.To.Surface.At(clock, 14), other.From.Surface.At(-clock, 14), 1e-9);
        }
    }

    // A cope to a mate that leaves at clock 90 and one at the other end at clock 0: seen from outside, growing clock
    // angle, the second stands a quarter turn before the first. A mirrored cut would put it after.
    [Fact]
    public void An_asymmetric_double_cope_is_not_mirrored()
    {
        FrameBuilder frame = new();
        int a = frame.Node(Vector3.Zero);
        int b = frame.Node(new Vector3(300, 0, 0));
        frame.Tube(a, frame.Node(new Vector3(200, -346.4, 0)), new RoundTube(40, 2));
        frame.Tube(b, frame.Node(new Vector3(100, 0, 346.4)), new RoundTube(40, 2));
        frame.Tube(a, b, new RoundTube(30, 2));
        frame.Joint(a, null, Corner.RunOut, new TubeEndId(0, End.From), new TubeEndId(2, End.From));
        frame.Joint(b, null, Corner.RunOut, new TubeEndId(1, End.From), new TubeEndId(2, End.To));
        CutTube tube = frame.Cut().Tubes[2];

        // Both mates lean over the tube at 60 degrees, where they cut it back most: on the side of −y, clock 90, and on top.
        Assert.Equal(Math.PI / 2, tube.From.Outer.Points.MaxBy(p => p.T).Clock, 1e-4);
        Assert.Equal(0, tube.To.Outer.Points.MaxBy(p => p.T).Clock, 1e-4);
        Assert.Equal(Math.PI / 2, tube.From.Contacts[0].Clock!.Value, 1e-9);
        Assert.Equal(0, tube.To.Contacts[0].Clock!.Value, 1e-9);
    }

    [Fact]
    public void Contour_points_lie_on_the_mate_and_radial_cuts_never_reach_into_it()
    {
        for (int degrees = 20; degrees <= 90; degrees += 10)
        {
            foreach (double offset in (double[])[0, 3, -6])
            {
                double angle = degrees * Math.PI / 180;
                Vector3 along = new(Math.Cos(angle), 0, Math.Sin(angle));
                Vector3 top = new(-Math.Sin(angle), 0, Math.Cos(angle));
                CutTube contour = Tee.Cut(21.2, new RoundTube(26.9, 2.6), angle, offset);
                CutTube radial = Tee.Cut(21.2, new RoundTube(26.9, 2.6), angle, offset, CutMode.Radial);
                for (int i = 0; i < 180; i++)
                {
                    double clock = (i + 0.5) * Math.PI / 90;
                    bool touches = false;
                    for (int k = 0; k <= 10; k++)
                    {
                        double radius = 13.45 - (0.26 * k);
                        Assert.Equal(21.2, FromMain(contour, clock, radius), 1e-9);
                        double gap = FromMain(radial, clock, radius) - 21.2;
                        Assert.True(gap > -1e-9);
                        touches |= gap < 0.02;
                    }

                    Assert.True(touches);
                }

                double FromMain(CutTube tube, double clock, double radius)
                {
                    // θ = −clock from the top line towards +y.
                    Vector3 point = new Vector3(0, offset, 0) + (radius * Math.Cos(clock) * top) -
                        (radius * Math.Sin(clock) * Vector3.UnitY) + (tube.From.Surface.At(clock, radius) * along);
                    return Math.Sqrt((point.Y * point.Y) + (point.Z * point.Z));
                }
            }
        }
    }

    // A plain midpoint sum over 4,000 by 40 wall lines; its own error is about 1e-6.
    [Theory]
    [InlineData(CutMode.Contour)]
    [InlineData(CutMode.Radial)]
    public void Volume_and_centre_of_mass_agree_with_a_fine_sum_over_wall_lines(CutMode mode)
    {
        for (int seed = 1; seed <= 5; seed++)
        {
            CutFrame cut = Cluster.Scatter(seed, mode, through: seed % 2 == 0, offset: 4).Frame.Cut();
            for (int i = 1; i < cut.Tubes.Count; i++)
            {
                CutTube tube = cut.Tubes[i];
                Tube axis = cut.Sized.Model.Tubes[i];
                Section section = cut.Sized.SectionOf(i);
                double outer = section.OuterSize / 2;
                double inner = outer - section.Wall;
                const int Turns = 4000;
                const int Depths = 40;
                double volume = 0;
                Vector3 moment = Vector3.Zero;
                for (int t = 0; t < Turns; t++)
                {
                    double clock = 2 * Math.PI * (t + 0.5) / Turns;
                    Vector3 radial = axis.Axes.Radial(clock);
                    for (int d = 0; d < Depths; d++)
                    {
                        double radius = inner + (section.Wall * (d + 0.5) / Depths);
                        double from = tube.From.Surface.At(clock, radius);
                        double to = axis.Length - tube.To.Surface.At(clock, radius);
                        double element = radius * (to - from);
                        volume += element;
                        moment += element * ((radius * radial) + ((from + to) / 2 * axis.Axes.X));
                    }
                }

                Vector3 centroid = axis.From.Point + (moment / volume);
                volume *= 2 * Math.PI / Turns * section.Wall / Depths;
                Assert.Equal(volume, tube.Volume, volume * 2e-6);
                Assert.Equal(0, (centroid - tube.Centroid).Length, 1e-3);
                Assert.Equal(tube.Volume * 7.85e-6, tube.MassKg, 1e-12);
            }
        }
    }
}
