using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Joints;

public class TubeMesherTests
{
    [Theory]
    [InlineData(CutMode.Contour)]
    [InlineData(CutMode.Radial)]
    public void Scattered_nodes_give_closed_meshes_of_the_right_volume(CutMode mode)
    {
        for (int seed = 1; seed <= 10; seed++)
        {
            CutFrame cut = Cluster.Scatter(seed, mode, seed % 2 == 0, offset: seed % 3 == 0 ? 6 : 0).Frame.Cut();
            for (int i = 0; i < cut.Tubes.Count; i++)
            {
                AssertSound(cut, i);
            }
        }
    }

    [Theory]
    [InlineData(CutMode.Contour, 30, 0)]
    [InlineData(CutMode.Radial, 30, 0)]
    [InlineData(CutMode.Contour, 30, 12)]
    [InlineData(CutMode.Radial, 30, 12)]
    [InlineData(CutMode.Contour, 20, 9)]
    [InlineData(CutMode.Radial, 20, 9)]
    public void Tubes_wider_than_their_seats_step_and_stay_closed(CutMode mode, double radius, double offset)
    {
        CutFrame cut = Tee.Frame(20, new RoundTube(2 * radius, 2), 1.1, offset, mode).Cut();
        AssertSound(cut, 1);
        Assert.Contains(
            cut.Tubes[1].From.Outer.Points.Zip(cut.Tubes[1].From.Outer.Points.Skip(1)), p => p.First.Clock == p.Second.Clock);
    }

    [Theory]
    [InlineData(CutMode.Contour)]
    [InlineData(CutMode.Radial)]
    public void Both_ends_may_step_at_the_same_clock_angle(CutMode mode)
    {
        FrameBuilder frame = new() { Mode = mode };
        int[] nodes = [.. ((double[])[0, 300]).SelectMany(x => (int[])
            [frame.Node(new Vector3(x, -400, 0)), frame.Node(new Vector3(x, 400, 0)), frame.Node(new Vector3(x, 0, 0), x > 0 ? 1 : 0)])];
        frame.Tube(nodes[0], nodes[1], new RoundTube(30, 2));
        frame.Tube(nodes[3], nodes[4], new RoundTube(30, 2));
        int tube = frame.Tube(nodes[2], nodes[5], new RoundTube(44, 3));
        frame.Joint(nodes[2], 0, Corner.None, new TubeEndId(tube, End.From));
        frame.Joint(nodes[5], 1, Corner.None, new TubeEndId(tube, End.To));
        AssertSound(frame.Cut(), tube);
    }

    [Theory]
    [InlineData(CutMode.Contour, 90, 0)]
    [InlineData(CutMode.Radial, 90, 0)]
    [InlineData(CutMode.Contour, 40, 3)]
    [InlineData(CutMode.Radial, 40, 3)]
    public void Rods_are_closed_at_their_axis(CutMode mode, double degrees, double offset) =>
        AssertSound(Tee.Frame(18, new Rod(24), degrees * Math.PI / 180, offset, mode).Cut(), 1);

    [Fact]
    public void A_square_tube_end_is_a_plain_ring()
    {
        FrameBuilder frame = new();
        frame.Tube(frame.Node(Vector3.Zero), frame.Node(new Vector3(100, 0, 0)), new RoundTube(30, 2));
        CutFrame cut = frame.Cut();
        AssertSound(cut, 0);
        TriangleMesh mesh = TubeMesher.Mesh(cut, 0);
        Assert.Equal(0, mesh.Vertices.Min(v => v.Z), 1e-12);
        Assert.Equal(100, mesh.Vertices.Max(v => v.Z), 1e-12);
        Assert.Equal(-15, mesh.Vertices.Min(v => v.X), 1e-12);
    }

    [Fact]
    public void The_part_lies_along_z_with_its_top_line_along_x()
    {
        // The branch is longest where it passes the main tube on both sides: at clock 90 and 270, so at y = ±r.
        CutFrame cut = Tee.Frame(20, new RoundTube(30, 2), Math.PI / 2, 0).Cut();
        TriangleMesh mesh = TubeMesher.Mesh(cut, 1);
        Vector3 tip = mesh.Vertices.MinBy(v => v.Z);
        Assert.Equal(15, Math.Abs(tip.Y), 1e-9);
        Assert.Equal(0, tip.X, 1e-9);

        // At 45 degrees the acute side, clock 180, is cut shortest: x = −r.
        cut = Tee.Frame(20, new RoundTube(30, 2), Math.PI / 4, 0).Cut();
        mesh = TubeMesher.Mesh(cut, 1);
        Vector3 crotch = mesh.Vertices.Where(v => v.Z < 100 && Math.Abs((v.X * v.X) + (v.Y * v.Y) - 225) < 1e-6).MaxBy(v => v.Z);
        Assert.Equal(-15, crotch.X, 1e-9);
    }

    [Fact]
    public void In_place_is_the_part_moved()
    {
        CutFrame cut = Cluster.Scatter(3, CutMode.Radial, through: false).Frame.Cut();
        TriangleMesh own = TubeMesher.Mesh(cut, 1);
        TriangleMesh placed = TubeMesher.InPlace(cut.Sized.Model.Tubes[1], TubeMesher.Mesh(cut, 1));
        Tube tube = cut.Sized.Model.Tubes[1];
        Assert.Equal(own.Triangles, placed.Triangles);
        for (int i = 0; i < own.Vertices.Count; i++)
        {
            Vector3 v = own.Vertices[i];
            double radius = Math.Sqrt((v.X * v.X) + (v.Y * v.Y));
            Vector3 expected = tube.From.Point + (v.Z * tube.Axes.X) + (radius * tube.Axes.Radial(Math.Atan2(v.Y, v.X)));
            Assert.Equal(0, (expected - placed.Vertices[i]).Length, 1e-9);
        }

        Assert.Equal(own.Volume(), placed.Volume(), own.Volume() * 1e-9);
    }

    [Fact]
    public void Cut_faces_stand_on_the_mate()
    {
        CutFrame cut = Tee.Frame(19.05, new RoundTube(25.4, 4), Math.PI / 3, 2).Cut();
        TriangleMesh mesh = TubeMesher.InPlace(cut.Sized.Model.Tubes[1], TubeMesher.Mesh(cut, 1));
        double sag = 12.7 / 3000;
        int onFace = 0;
        for (int i = 0; i < mesh.Triangles.Count; i += 3)
        {
            Vector3[] corners = [mesh.Vertices[mesh.Triangles[i]], mesh.Vertices[mesh.Triangles[i + 1]], mesh.Vertices[mesh.Triangles[i + 2]]];
            double[] off = [.. corners.Select(c => Math.Sqrt((c.Y * c.Y) + (c.Z * c.Z)) - 19.05)];
            if (off.All(o => Math.Abs(o) < 1e-3))
            {
                Vector3 centre = (corners[0] + corners[1] + corners[2]) / 3;
                Assert.InRange(Math.Sqrt((centre.Y * centre.Y) + (centre.Z * centre.Z)) - 19.05, -2 * sag, 2 * sag);
                onFace++;
            }
        }

        Assert.True(onFace > 200);
    }

    private static void AssertSound(CutFrame cut, int tube)
    {
        TriangleMesh mesh = TubeMesher.Mesh(cut, tube);
        HashSet<(int, int)> edges = [];
        for (int i = 0; i < mesh.Triangles.Count; i += 3)
        {
            (int a, int b, int c) = (mesh.Triangles[i], mesh.Triangles[i + 1], mesh.Triangles[i + 2]);
            Assert.True(edges.Add((a, b)) && edges.Add((b, c)) && edges.Add((c, a)), "an edge is used twice in one direction");
            Vector3 doubled = (mesh.Vertices[b] - mesh.Vertices[a]).Cross(mesh.Vertices[c] - mesh.Vertices[a]);
            Assert.True(doubled.Length / 2 > 1e-6, $"a facet of {doubled.Length / 2} mm² in tube {tube}");
        }

        Assert.All(edges, e => Assert.Contains((e.Item2, e.Item1), edges));
        Assert.Equal(mesh.Vertices.Count, mesh.Vertices.Distinct().Count());
        double volume = cut.Tubes[tube].Volume;
        Assert.InRange(mesh.Volume(), volume * 0.999, volume * 1.001);
    }
}
