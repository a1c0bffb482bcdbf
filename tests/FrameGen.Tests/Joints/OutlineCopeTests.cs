using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>Any outline cut to any outline, against a walk in small steps through solids that are defined by their points alone.</summary>
public class OutlineCopeTests
{
    private static readonly Dictionary<string, Section> Sections = new()
    {
        ["round"] = new RoundTube(30, 2),
        ["rod"] = new Rod(16),
        ["square"] = new FlatSidedTube(30, 30, 2, 0),
        ["rect"] = new FlatSidedTube(40, 25, 2.5, 5),
        ["ellipse"] = new EllipseTube(36, 24, 1.5),
        ["large round"] = new RoundTube(60, 3),
        ["large square"] = new FlatSidedTube(60, 60, 3, 6),
        ["sharp rect"] = new FlatSidedTube(70, 50, 3, 0),
        ["large ellipse"] = new EllipseTube(50, 70, 3),
    };

    /// <summary>Tube, mate, angle in degrees, roll of the tube, roll of the mate, offset.</summary>
    public static TheoryData<string, string, double, double, double, double> Matrix
    {
        get
        {
            TheoryData<string, string, double, double, double, double> data = [];
            int turn = 0;
            foreach (string tube in (string[])["round", "rod", "square", "rect", "ellipse"])
            {
                foreach (string mate in (string[])["large round", "large square", "sharp rect", "large ellipse"])
                {
                    // Each pair square and aligned, then askew, every time by other angles.
                    data.Add(tube, mate, 90, 0, 0, 0);
                    data.Add(tube, mate, 35 + (turn % 5 * 11), 13 + (turn * 17 % 80), turn * 29 % 90, (turn % 3 * 2) - 2);
                    data.Add(tube, mate, 90, 0, 45, 0);
                    turn++;
                }
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Matrix))]
    public void Wall_lines_stop_where_a_walk_stops(string tube, string mate, double angle, double roll, double mateRoll, double offset)
    {
        CutFrame cut = Tee(Sections[tube], Sections[mate], angle, roll, mateRoll, offset, CutMode.Contour).Cut();
        (Tube own, EndCut end) = (cut.Sized.Model.Tubes[1], cut.Tubes[1].From);
        PrismSolid solid = PrismSolid.Of(cut.Sized.Model.Tubes[0], Sections[mate]);
        for (int i = 0; i < 31; i++)
        {
            double clock = -3.1 + (6.2 * i / 30);
            foreach (Outline skin in (Outline[])[Sections[tube].Outline, Sections[tube].Bore])
            {
                double radius = skin.RadiusAt(Math.Sin(clock), Math.Cos(clock));
                Vector3 start = own.From.Point + (radius * own.Axes.Radial(clock));
                double? met = solid.Walk(start, own.Axes.X, 140, -60);
                Assert.NotNull(met);
                Assert.Equal(met.Value, end.Surface.At(clock, radius), 1e-9);
            }
        }
    }

    [Theory]
    [MemberData(nameof(Matrix))]
    public void A_radial_cut_takes_the_most_of_the_wall(string tube, string mate, double angle, double roll, double mateRoll, double offset)
    {
        CutFrame cut = Tee(Sections[tube], Sections[mate], angle, roll, mateRoll, offset, CutMode.Radial).Cut();
        (Tube own, EndCut end) = (cut.Sized.Model.Tubes[1], cut.Tubes[1].From);
        PrismSolid solid = PrismSolid.Of(cut.Sized.Model.Tubes[0], Sections[mate]);
        for (int i = 0; i < 13; i++)
        {
            double clock = -3.05 + (6.2 * i / 12);
            (double sin, double cos) = Math.SinCos(clock);
            double inner = Sections[tube].Bore.RadiusAt(sin, cos), outer = Sections[tube].Outline.RadiusAt(sin, cos);
            const int Depths = 16;
            double most = Enumerable.Range(0, Depths + 1).Max(k =>
            {
                Vector3 start = own.From.Point + ((inner + ((outer - inner) * k / Depths)) * own.Axes.Radial(clock));
                return solid.Walk(start, own.Axes.X, 140, -60) ?? 0;
            });
            double at = end.Surface.At(clock, outer);

            // Between two depths looked at the wall may stand higher by no more than the steepest slope allows.
            Assert.InRange(at, most - 1e-9, most + ((outer - inner) / Depths * 4));
            Assert.Equal(at, end.Surface.At(clock, (inner + outer) / 2), 1e-12);
        }
    }

    [Theory]
    [MemberData(nameof(Matrix))]
    public void Curves_keep_to_the_surface_within_the_tolerance(string tube, string mate, double angle, double roll, double mateRoll, double offset)
    {
        foreach (CutMode mode in (CutMode[])[CutMode.Contour, CutMode.Radial])
        {
            CutFrame cut = Tee(Sections[tube], Sections[mate], angle, roll, mateRoll, offset, mode).Cut();
            EndCut end = cut.Tubes[1].From;
            Outline outer = Sections[tube].Outline;
            IReadOnlyList<CurvePoint> points = end.Outer.Points;
            Assert.Equal(-Math.PI, points[0].Clock);
            Assert.Equal(Math.PI, points[^1].Clock);
            for (int i = 1; i < points.Count; i++)
            {
                (CurvePoint a, CurvePoint b) = (points[i - 1], points[i]);
                double xa = outer.DistanceAt(a.Clock), xb = outer.DistanceAt(b.Clock);
                Assert.True(b.Clock >= a.Clock);
                for (int k = 1; k < 8 && b.Clock - a.Clock > 1e-9; k++)
                {
                    double clock = a.Clock + ((b.Clock - a.Clock) * k / 8);
                    double x = outer.DistanceAt(clock), y = end.Surface.At(clock, outer);
                    double off = Math.Abs(((xb - xa) * (y - a.T)) - ((b.T - a.T) * (x - xa))) / Math.Sqrt(((xb - xa) * (xb - xa)) + ((b.T - a.T) * (b.T - a.T)));
                    Assert.InRange(off, 0, 0.0201);
                }
            }
        }
    }

    [Theory]
    [MemberData(nameof(Matrix))]
    public void Volumes_are_those_of_a_fine_sum(string tube, string mate, double angle, double roll, double mateRoll, double offset)
    {
        foreach (CutMode mode in (CutMode[])[CutMode.Contour, CutMode.Radial])
        {
            CutFrame cut = Tee(Sections[tube], Sections[mate], angle, roll, mateRoll, offset, mode).Cut();
            CutTube part = cut.Tubes[1];
            double length = cut.Sized.Model.Tubes[1].Length;
            (Outline outer, Outline inner) = (Sections[tube].Outline, Sections[tube].Bore);

            // Equal cells in clock angle and wall depth, each with its middle's t: second order, finer than 1e-4 of what is cut.
            int depths = inner.IsPoint ? 60 : 6;
            const int Clocks = 3600;
            double taken = 0;
            for (int i = 0; i < Clocks; i++)
            {
                (double sin, double cos) = Math.SinCos(2 * Math.PI * (i + 0.5) / Clocks);
                double from = inner.RadiusAt(sin, cos), to = outer.RadiusAt(sin, cos);
                for (int k = 0; k < depths; k++)
                {
                    double step = (to - from) / depths;
                    double radius = from + (step * (k + 0.5));
                    taken += part.From.Surface.At(2 * Math.PI * (i + 0.5) / Clocks, radius) * radius * step * 2 * Math.PI / Clocks;
                }
            }

            double area = outer.Area - inner.Area;
            Assert.Equal(1, part.Volume / ((area * length) - taken), 2e-5);
        }
    }

    [Theory]
    [MemberData(nameof(Matrix))]
    public void Meshes_are_closed_and_weigh_what_the_integral_says(string tube, string mate, double angle, double roll, double mateRoll, double offset)
    {
        foreach (CutMode mode in (CutMode[])[CutMode.Contour, CutMode.Radial])
        {
            CutFrame cut = Tee(Sections[tube], Sections[mate], angle, roll, mateRoll, offset, mode).Cut();
            TriangleMesh mesh = TubeMesher.Mesh(cut, 1);
            Assert.InRange(mesh.Volume() / cut.Tubes[1].Volume, 0.999, 1.001);
            HashSet<(int From, int To)> edges = [];
            for (int i = 0; i < mesh.Triangles.Count; i += 3)
            {
                (int a, int b, int c) = (mesh.Triangles[i], mesh.Triangles[i + 1], mesh.Triangles[i + 2]);
                Assert.True(edges.Add((a, b)) && edges.Add((b, c)) && edges.Add((c, a)));
                double area = (mesh.Vertices[b] - mesh.Vertices[a]).Cross(mesh.Vertices[c] - mesh.Vertices[a]).Length / 2;
                Assert.True(area > 1e-6, $"a sliver of {area} mm2");
            }

            Assert.True(edges.All(e => edges.Contains((e.To, e.From))));
        }
    }

    [Theory]
    [InlineData(90.0)]
    [InlineData(60.0)]
    [InlineData(37.0)]
    public void A_square_tube_lands_on_a_flat_by_a_straight_cut(double degrees)
    {
        // The mate's near flat is a plane at half its height: t = (30 + r cos φ) / sin φ, r towards the mate's direction.
        double angle = degrees * Math.PI / 180;
        CutFrame cut = Tee(Sections["square"], Sections["sharp rect"], degrees, 0, 0, 0, CutMode.Contour).Cut();
        EndCut end = cut.Tubes[1].From;
        Outline outer = Sections["square"].Outline;
        foreach (CurvePoint point in end.Outer.Points)
        {
            double towards = -outer.RadiusAt(Math.Sin(point.Clock), Math.Cos(point.Clock)) * Math.Cos(point.Clock);
            Assert.Equal((35 + (towards * Math.Cos(angle))) / Math.Sin(angle), point.T, 1e-9);
        }

        // Vertices at the corners, the middle of the top line and the seam at most: nothing of a curve is left.
        Assert.InRange(end.Outer.Points.Count, 2, 8);
    }

    // A flat side that runs along an edge of its mate, or along where its flat meets a corner arc, lies on no piece but by rounding.
    [Theory]
    [InlineData(60, 60, 0, 90)]
    [InlineData(60, 60, 0, 60)]
    [InlineData(60, 60, 0, 35)]
    [InlineData(48, 60, 6, 90)]
    [InlineData(48, 60, 6, 70)]
    [InlineData(60, 60, 6, 60)]
    public void A_flat_along_an_edge_of_its_mate_is_cut_straight(double size, double mate, double corner, double degrees)
    {
        double angle = degrees * Math.PI / 180;
        foreach (CutMode mode in (CutMode[])[CutMode.Contour, CutMode.Radial])
        {
            CutFrame cut = Tee(new FlatSidedTube(size, size, 3, 0), new FlatSidedTube(mate, mate, 3, corner), degrees, 0, 0, 0, mode).Cut();
            EndCut end = cut.Tubes[1].From;
            Assert.InRange(end.Outer.Points.Count, 2, size < mate || corner == 0 ? 14 : 120);
            if (mode == CutMode.Contour && (size < mate || corner == 0))
            {
                // On the flat all over: the plane at half the mate's height.
                double area = (size * size) - ((size - 6) * (size - 6));
                Assert.Equal(1, cut.Tubes[1].Volume / (area * (400 - (mate / 2 / Math.Sin(angle)))), 1e-9);
            }
        }
    }

    [Theory]
    [InlineData(90)]
    [InlineData(60)]
    [InlineData(115)]
    public void A_corner_of_equal_square_tubes_has_straight_cuts(double degrees)
    {
        double angle = degrees * Math.PI / 180;
        foreach (CutMode mode in (CutMode[])[CutMode.Contour, CutMode.Radial])
        {
            FrameBuilder frame = new() { Mode = mode };
            int node = frame.Node(Vector3.Zero);
            int first = frame.Tube(node, frame.Node(new Vector3(400, 0, 0)), new FlatSidedTube(40, 40, 3, 0));
            int coped = frame.Tube(node, frame.Node(400 * new Vector3(Math.Cos(angle), Math.Sin(angle), 0)), new FlatSidedTube(40, 40, 3, 0));
            frame.Joint(node, null, Corner.RunOut, new TubeEndId(first, End.From), new TubeEndId(coped, End.From));
            CutFrame cut = frame.Cut();

            // (r - R cos φ) / sin φ past the node, and the cut of the other at half its height over the first one's flat.
            Assert.Equal(20 * (1 - Math.Cos(angle)) / Math.Sin(angle), -cut.Tubes[first].From.Outer.Min, 1e-9);
            Assert.InRange(cut.Tubes[coped].From.Outer.Points.Count, 2, 14);
            Assert.Equal((20 + (20 * Math.Abs(Math.Cos(angle)))) / Math.Sin(angle), cut.Tubes[coped].From.Outer.Max, 1e-9);
        }
    }

    [Fact]
    public void A_flat_cut_square_is_the_tube_s_length_less_half_the_mate()
    {
        CutFrame cut = Tee(Sections["rect"], Sections["sharp rect"], 90, 0, 0, 0, CutMode.Radial).Cut();
        double area = Sections["rect"].Outline.Area - Sections["rect"].Bore.Area;
        Assert.Equal(1, cut.Tubes[1].Volume / (area * (400 - 35)), 1e-12);
        Assert.Equal(365, cut.Tubes[1].CutLength, 1e-9);
    }

    [Fact]
    public void A_mate_turned_by_45_degrees_cuts_a_vee()
    {
        // The edge of a sharp 50 square stands √2 · 25 from its axis; its faces fall off at 45 degrees.
        Section mate = new FlatSidedTube(50, 50, 3, 0);
        CutFrame cut = Tee(Sections["square"], mate, 90, 0, 45, 0, CutMode.Contour).Cut();
        EndCut end = cut.Tubes[1].From;
        Assert.Equal(25 * Math.Sqrt(2), end.Outer.Max, 1e-9);
        Assert.Equal((25 * Math.Sqrt(2)) - 15, end.Outer.Min, 1e-9);
        Assert.Contains(end.Outer.Points, p => Math.Abs(p.T - end.Outer.Max) < 1e-9);
        Assert.InRange(end.Outer.Points.Count, 7, 10);
    }

    /// <summary>A mate along x through the origin, and a tube that leaves it at an angle in the plane of x and z; its top line lies in that
    /// plane too, away from the mate's direction, before it is rolled.</summary>
    internal static FrameBuilder Tee(
        Section tube, Section mate, double angleDegrees, double rollDegrees, double mateRollDegrees, double offset, CutMode mode, Func<TubeEnd, TubeEnd>? change = null)
    {
        FrameBuilder frame = new() { Mode = mode };
        double angle = angleDegrees * Math.PI / 180, roll = rollDegrees * Math.PI / 180, mateRoll = mateRollDegrees * Math.PI / 180;
        int left = frame.Node(new Vector3(-500, 0, 0));
        int right = frame.Node(new Vector3(500, 0, 0));
        int node = frame.Node(Vector3.Zero, through: 0);
        Vector3 along = new(Math.Cos(angle), 0, Math.Sin(angle));
        Vector3 point = new(0, offset, 0);
        int far = frame.Node(point + (400 * along));
        int main = frame.Tube(left, right, mate, new Vector3(0, Math.Sin(mateRoll), Math.Cos(mateRoll)));
        Vector3 up = (Math.Cos(roll) * new Vector3(-Math.Sin(angle), 0, Math.Cos(angle))) + (Math.Sin(roll) * Vector3.UnitY);
        int branch = frame.Tube(node, far, tube, up, fromOffset: point, changeFrom: change);
        frame.Joint(node, main, Corner.None, new TubeEndId(branch, End.From));
        return frame;
    }
}
