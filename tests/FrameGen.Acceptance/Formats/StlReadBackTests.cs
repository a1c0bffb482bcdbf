using System.Globalization;
using FrameGen.Formats.Stl;
using FrameGen.Geometry;
using Xunit;

namespace FrameGen.Acceptance.Formats;

/// <summary>STL files checked by admesh.</summary>
public class StlReadBackTests
{
    [Theory]
    [InlineData(0)]
    [InlineData(30000)]
    public void A_mesh_checker_finds_one_closed_shell_a_tube_and_nothing_to_mend(double away)
    {
        TriangleMesh a = CopedTube(19, 17.5, 400, 96, new Vector3(away, 0.1 * away, -away));
        TriangleMesh b = CopedTube(8, 6.5, 250, 48, new Vector3(away + 100, 0, away));
        ForeignProgram admesh = ForeignProgram.Find("admesh");
        using var folder = new ScratchFolder();
        string[] report = admesh.Run(folder.Write("frame.stl", StlWriter.Write([a, b]))).Split('\n');

        Assert.Equal(2, Count(report, "Number of parts"));
        Assert.Equal(0, Count(report, "Degenerate facets"));
        Assert.Equal(0, Count(report, "Edges fixed"));
        Assert.Equal(0, Count(report, "Facets removed"));
        Assert.Equal(0, Count(report, "Facets added"));
        Assert.Equal(0, Count(report, "Facets reversed"));
        Assert.Equal(0, Count(report, "Backwards edges"));
        Assert.Equal(0, Count(report, "Normals fixed"));
        Assert.Equal(0, Count(report, "Total disconnected facets"));
        Assert.Equal(a.Count + b.Count, Count(report, "Number of facets"));
    }

    [Fact]
    public void A_mesh_checker_measures_the_same_volume()
    {
        TriangleMesh mesh = CopedTube(19, 17.5, 400, 96, default);
        ForeignProgram admesh = ForeignProgram.Find("admesh");
        using var folder = new ScratchFolder();
        string report = admesh.Run(folder.Write("tube.stl", StlWriter.Write(mesh)));
        string line = report.Split('\n').Single(l => l.Contains("Volume", StringComparison.Ordinal));
        string volume = line[(line.IndexOf("Volume", StringComparison.Ordinal) + 6)..].Trim(' ', ':').Split(' ')[0];

        // admesh adds up in single precision.
        Assert.Equal(1, double.Parse(volume, CultureInfo.InvariantCulture) / mesh.Volume(), 1e-4);
    }

    private static int Count(string[] report, string what)
    {
        string line = report.Last(l => l.Contains(what, StringComparison.Ordinal));
        string rest = line[(line.IndexOf(what, StringComparison.Ordinal) + what.Length)..];
        return int.Parse(rest.Trim(' ', ':').Split(' ')[0], CultureInfo.InvariantCulture);
    }

    /// <summary>A tube along z, coped at its lower end by a cylinder of its own size across it, square at the upper one.</summary>
    private static TriangleMesh CopedTube(double outer, double inner, double length, int sides, Vector3 at)
    {
        var vertices = new List<Vector3>();
        for (int i = 0; i < sides; i++)
        {
            double angle = 2 * Math.PI * i / sides;
            (double sin, double cos) = Math.SinCos(angle);
            foreach (double r in (ReadOnlySpan<double>)[outer, inner])
            {
                double low = Math.Sqrt((outer * outer) - (r * sin * r * sin));
                vertices.Add(at + new Vector3(r * cos, r * sin, low));
                vertices.Add(at + new Vector3(r * cos, r * sin, length));
            }
        }

        var triangles = new List<int>();
        for (int i = 0; i < sides; i++)
        {
            (int a, int b) = (4 * i, 4 * ((i + 1) % sides));
            Quad(a, b, b + 1, a + 1);
            Quad(a + 2, a + 3, b + 3, b + 2);
            Quad(a, a + 2, b + 2, b);
            Quad(a + 1, b + 1, b + 3, a + 3);
        }

        return new TriangleMesh(vertices, triangles);

        void Quad(int a, int b, int c, int d) => triangles.AddRange([a, b, c, a, c, d]);
    }
}
