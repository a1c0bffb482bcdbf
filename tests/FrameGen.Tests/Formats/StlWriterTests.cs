using System.Buffers.Binary;
using System.Text;
using FrameGen.Formats.Stl;
using FrameGen.Geometry;
using Xunit;

namespace FrameGen.Tests.Formats;

public class StlWriterTests
{
    private static readonly TriangleMesh Tetrahedron = new(
        [new(0, 0, 0), new(2, 0, 0), new(0, 2, 0), new(0, 0, 2)],
        [0, 2, 1, 0, 1, 3, 1, 2, 3, 0, 3, 2]);

    [Fact]
    public void Header_is_80_bytes_and_does_not_claim_to_be_text()
    {
        byte[] file = StlWriter.Write(Tetrahedron);
        Assert.Equal(84 + (4 * 50), file.Length);
        Assert.Equal(4u, BinaryPrimitives.ReadUInt32LittleEndian(file.AsSpan(80)));
        Assert.DoesNotContain("solid", Encoding.ASCII.GetString(file, 0, 80), StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public void Normals_point_outwards()
    {
        byte[] file = StlWriter.Write(Tetrahedron);
        Assert.Equal([0f, 0f, -1f], Floats(file, 0)[..3]);
        Assert.Equal([0f, -1f, 0f], Floats(file, 1)[..3]);
        float third = 1 / MathF.Sqrt(3);
        Assert.Equal([third, third, third], Floats(file, 2)[..3]);
        Assert.Equal([-1f, 0f, 0f], Floats(file, 3)[..3]);
    }

    [Fact]
    public void Several_meshes_follow_one_another()
    {
        TriangleMesh moved = Tetrahedron with { Vertices = [.. Tetrahedron.Vertices.Select(v => v + new Vector3(10, 0, 0))] };
        byte[] both = StlWriter.Write([Tetrahedron, moved]);
        Assert.Equal(StlWriter.Write(Tetrahedron)[84..], both[84..284]);
        Assert.Equal(StlWriter.Write(moved)[84..], both[284..]);
        Assert.Equal(8u, BinaryPrimitives.ReadUInt32LittleEndian(both.AsSpan(80)));
    }

    [Fact]
    public void Triangles_that_collapse_in_single_precision_are_left_out_and_the_mesh_stays_closed()
    {
        // Far from the origin, two corners 1e-6 mm apart are one: the two triangles on their common edge vanish.
        var far = new Vector3(20000, 30000, 40000);
        Vector3[] corners = [new(0, 0, 0), new(2, 0, 0), new(0, 2, 0), new(0, 0, 2), new(0, 1e-6, 2)];
        int[] triangles = [0, 2, 1, 0, 1, 3, 1, 4, 3, 1, 2, 4, 0, 3, 4, 0, 4, 2];
        byte[] file = StlWriter.Write(new TriangleMesh([.. corners.Select(c => c + far)], triangles));
        Assert.Equal(4u, BinaryPrimitives.ReadUInt32LittleEndian(file.AsSpan(80)));
        Assert.Equal(84 + (4 * 50), file.Length);

        var edges = new Dictionary<(string, string), int>();
        for (int i = 0; i < 4; i++)
        {
            string[] places = [.. Floats(file, i)[3..].Chunk(3).Select(c => string.Join(' ', c))];
            for (int k = 0; k < 3; k++)
            {
                (string, string) edge = (places[k], places[(k + 1) % 3]);
                edges[edge] = edges.GetValueOrDefault(edge) + 1;
            }
        }

        Assert.All(edges, e => Assert.True(e.Value == 1 && edges.GetValueOrDefault((e.Key.Item2, e.Key.Item1)) == 1));
    }

    [Fact]
    public void Refuses_corners_that_are_not_finite()
    {
        TriangleMesh broken = Tetrahedron with { Vertices = [new(double.NaN, 0, 0), .. Tetrahedron.Vertices.Skip(1)] };
        Assert.Throws<ArgumentOutOfRangeException>(() => StlWriter.Write(broken));
    }

    private static float[] Floats(byte[] file, int facet) =>
        [.. Enumerable.Range(0, 12).Select(i => BinaryPrimitives.ReadSingleLittleEndian(file.AsSpan(84 + (50 * facet) + (4 * i))))];
}
