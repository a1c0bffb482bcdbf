using CsCheck;
using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Model;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>Bent tubes as they are cut, measured and meshed.</summary>
public class BentTubeTests
{
    private const double R = 120;

    private static readonly Vector3[] Quarter = [new(0, 0, 0), new(R, 0, 0), new(R, R, 0)];

    /// <summary>A frame whose bent tube is coped at both ends, in no common plane.</summary>
    private const string Skew = """
        framegen: 1
        groups:
          main: {material: S235, section: round 40 x 2 mm}
          thin: {material: S235, section: round 25 x 2 mm}
        nodes:
          a: [0 mm, -300 mm, 0 mm]
          b: [0 mm, 300 mm, 0 mm]
          c: [500 mm, -200 mm, 400 mm]
          d: [450 mm, 350 mm, 520 mm]
          low: {on: rail-1, at: 50 %}
          high: {on: rail-2, at: 40 %}
          k1: [250 mm, 40 mm, 60 mm]
          k2: [300 mm, -30 mm, 300 mm]
        tubes:
          rail-1: {from: a, to: b, group: main}
          rail-2: {from: c, to: d, group: main}
          bow: {from: low, to: high, via: [k1, k2], bend_radius: 70 mm, group: thin}

        """;

    // A quarter of a torus: volume π/2 R · A, surface π/2 R · 2πr (Pappus); centre of mass of a bent rod at (2 sin(θ/2)/θ)(R + r²/4R) from
    // the middle of the bend, from ∫ (R + x)² dA = A (R² + r²/4).
    [Fact]
    public void A_quarter_of_a_torus_has_its_volume_surface_and_centre_of_mass()
    {
        CutTube rod = BentFrame.Cut(BentFrame.Alone("rod 16 mm", R, Quarter)).Tubes[0];
        double length = Math.PI / 2 * R;
        Assert.Equal(length, rod.CutLength, 1e-9);
        Assert.Equal(length * Math.PI * 64, rod.Volume, 1e-6);
        Assert.Equal(length * Math.PI * 16, rod.OuterArea, 1e-6);
        double out_ = 2 * Math.Sin(Math.PI / 4) / (Math.PI / 2) * (R + (64 / (4 * R)));
        Assert.InRange((rod.Centroid - new Vector3(out_ * Math.Sqrt(0.5), R - (out_ * Math.Sqrt(0.5)), 0)).Length, 0, 1e-9);

        CutTube tube = BentFrame.Cut(BentFrame.Alone("round 30 x 2 mm", R, Quarter)).Tubes[0];
        Assert.Equal(length * Math.PI * ((15 * 15) - (13 * 13)), tube.Volume, 1e-6);
        Assert.Equal(length * Math.PI * 30, tube.OuterArea, 1e-6);
    }

    [Theory]
    [InlineData("round 25 x 2 mm")]
    [InlineData("rod 20 mm")]
    public void A_mesh_is_where_the_integrals_say(string section)
    {
        CutFrame cut = BentFrame.Cut(Skew.Replace("round 25 x 2 mm", section, StringComparison.Ordinal));
        TriangleMesh own = TubeMesher.Mesh(cut, 2);
        TriangleMesh mesh = TubeMesher.InPlace(cut.Sized.Model.Tubes[2], own);
        CutTube bow = cut.Tubes[2];
        double volume = mesh.Volume();
        Assert.InRange(volume / bow.Volume, 0.999, 1);
        Assert.InRange((Centroid(mesh, volume) - bow.Centroid).Length, 0, 0.05);

        // Its own axes: straight along z up to the first bend, the from point at 0.
        Tube tube = cut.Sized.Model.Tubes[2];
        double straight = tube.Bent!.Pieces[0].Length;
        Assert.All(own.Vertices.Where(v => v.Z < straight - 1 && Math.Abs(v.X) < 20 && Math.Abs(v.Y) < 20), v =>
            Assert.InRange(Math.Sqrt((v.X * v.X) + (v.Y * v.Y)), 0, 12.5 + 1e-6));
    }

    // The end of a bent tube is the end of a straight one that lies where its last straight lies, its top line where the bends carry it.
    [Fact]
    public void The_far_end_is_cut_as_a_straight_tubes_from_the_carried_top_line()
    {
        CutFrame bent = BentFrame.Cut(Skew);
        Tube bow = bent.Sized.Model.Tubes[2];
        Vector3 top = Carried(bow);
        string text = Skew.Replace(
            "bow: {from: low, to: high, via: [k1, k2], bend_radius: 70 mm, group: thin}",
            $"bow: {{from: k2, to: high, up: [{top.X:R}, {top.Y:R}, {top.Z:R}], group: thin}}",
            StringComparison.Ordinal).Replace("low: {on: rail-1, at: 50 %}", "low: [0 mm, 0 mm, 900 mm]", StringComparison.Ordinal);
        text = text.Replace("  low: [0 mm, 0 mm, 900 mm]\n", string.Empty, StringComparison.Ordinal).Replace("  k1: [250 mm, 40 mm, 60 mm]\n", string.Empty, StringComparison.Ordinal);
        EndCut straight = BentFrame.Cut(text).Tubes[2].To;
        EndCut end = bent.Tubes[2].To;
        for (int degrees = -180; degrees < 180; degrees += 15)
        {
            double clock = double.DegreesToRadians(degrees);
            Assert.Equal(straight.Surface.At(clock, 12.5), end.Surface.At(clock, 12.5), 1e-6);
        }

        Assert.Equal(straight.Contacts[0].Clock!.Value, end.Contacts[0].Clock!.Value, 1e-9);
    }

    // A bent tube as the seat is its straight at the joint, whichever of its two it is.
    [Fact]
    public void A_cope_lands_on_the_straight_of_a_bent_seat()
    {
        const string Hoop = """
            framegen: 1
            groups:
              main: {material: S235, section: round 40 x 2 mm}
              thin: {material: S235, section: round 25 x 2 mm}
            nodes:
              a: [0 mm, 0 mm, 0 mm]
              k: [0 mm, 0 mm, 600 mm]
              b: [500 mm, 0 mm, 600 mm]
              on: {on: hoop, distance: DISTANCE}
              c: [300 mm, 0 mm, 100 mm]
            tubes:
              hoop: {from: a, to: b, via: [k], bend_radius: 150 mm, group: main}
              stay: {from: c, to: on, group: thin}
            """;

        // The saddle's heel: (R + r cos φ)/sin φ.
        foreach (double distance in (ReadOnlySpan<double>)[300, 650 + (75 * Math.PI) - 100])
        {
            EndCut end = BentFrame.Cut(Hoop.Replace("DISTANCE", $"{distance:R} mm", StringComparison.Ordinal)).Tubes[1].To;
            Contact seat = Assert.Single(end.Contacts);
            double angle = seat.Angle;
            double most = (20 + (12.5 * Math.Cos(angle))) / Math.Sin(angle);
            Assert.Equal(most, end.Outer.Max, 1e-6);
            Assert.Equal(0, seat.Offset, 1e-9);
        }
    }

    // At 90 degrees to a seat of 40 mm the cut lies from √(20² − 10.5²) = 17.022 mm, where the bore's line stops at the side, to 20 mm; so the blank has
    // 250 − 90 − 17.022 mm before the bend.
    [Theory]
    [InlineData("k: [100 mm, 0 mm, 0 mm]", "", "tube bow, from end at node low: its cut reaches 20.0 mm along the tube, and its bend begins 10.0 mm from the node, so that 10.0 mm of the cut would lie in the bend")]
    [InlineData("k: [250 mm, 0 mm, 0 mm]", "grip: 200 mm", "tube bow: has 142.978 mm of straight before its first bend, and the bender grips 200 mm (fabrication: grip)")]
    [InlineData("k: [250 mm, 0 mm, 0 mm]", "grip: 100 mm", null)]
    public void Says_what_stands_in_the_way(string corner, string fabrication, string? message)
    {
        string text = $$"""
            framegen: 1
            groups:
              main: {material: S235, section: round 40 x 2 mm}
              thin: {material: S235, section: round 25 x 2 mm}
            nodes:
              a: [0 mm, -300 mm, 0 mm]
              b: [0 mm, 300 mm, 0 mm]
              low: {on: rail, at: 50 %}
              {{corner}}
              c: [250 mm, 0 mm, 500 mm]
            tubes:
              rail: {from: a, to: b, group: main}
              bow: {from: low, to: c, via: [k], bend_radius: 90 mm, group: thin}
            fabrication: { {{fabrication}} }
            """.Replace("c: [250 mm", corner.StartsWith("k: [100", StringComparison.Ordinal) ? "c: [100 mm" : "c: [250 mm", StringComparison.Ordinal);
        (CutFrame? cut, DiagnosticList diagnostics) = BentFrame.Try(text);
        if (message is null)
        {
            Assert.NotNull(cut);
            Assert.Empty(diagnostics);
            return;
        }

        Assert.Null(cut);
        Assert.Contains(message, string.Join("\n", diagnostics), StringComparison.Ordinal);
    }

    [Fact]
    public void Warns_of_a_tight_radius_and_refuses_an_impossible_one()
    {
        Vector3[] corners = [new(0, 0, 0), new(300, 0, 0), new(300, 300, 0)];
        (CutFrame? tight, DiagnosticList warned) = BentFrame.Try(BentFrame.Alone("round 30 x 2 mm", 59, corners));
        Assert.NotNull(tight);
        Assert.Contains("tube bow: its bend_radius of 59 mm is less than 2 x its size of 30 mm", Assert.Single(warned).Message, StringComparison.Ordinal);
        Assert.Empty(BentFrame.Try(BentFrame.Alone("round 30 x 2 mm", 60, corners)).Diagnostics);
        (CutFrame? none, DiagnosticList refused) = BentFrame.Try(BentFrame.Alone("round 30 x 2 mm", 15, corners));
        Assert.Null(none);
        Assert.Contains("can't be bent to a radius of 15 mm, no more than half of its size", Assert.Single(refused).Message, StringComparison.Ordinal);
    }

    // The seat's straight ends 10 mm from the node, the stay's 25 mm reach 2.5 mm into the bend: 150 (1 - cos(2.5/150)) = 0.021 mm. Nearer, 12.5 mm: 0.52 mm.
    [Theory]
    [InlineData(640, Severity.Warning, "its cut reaches 2.5 mm into a bend of hoop, which turns away there by 0.021 mm")]
    [InlineData(650, Severity.Error, "its cut reaches 12.5 mm into a bend of hoop, which turns away there by 0.521 mm")]
    public void A_cut_that_reaches_into_a_bend_of_its_seat_is_told_with_numbers(double distance, Severity severity, string message)
    {
        string text = $$"""
            framegen: 1
            groups:
              main: {material: S235, section: round 40 x 2 mm}
              thin: {material: S235, section: round 25 x 2 mm}
            nodes:
              a: [0 mm, 0 mm, 0 mm]
              k: [0 mm, 0 mm, 800 mm]
              b: [500 mm, 0 mm, 800 mm]
              on: {on: hoop, distance: {{distance:R}} mm}
              c: [0 mm, 300 mm, {{distance:R}} mm]
            tubes:
              hoop: {from: a, to: b, via: [k], bend_radius: 150 mm, group: main}
              stay: {from: c, to: on, group: thin}
            """;
        Diagnostic told = Assert.Single(BentFrame.Try(text).Diagnostics);
        Assert.Equal(severity, told.Severity);
        Assert.Contains(message, told.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Any_bent_tubes_mesh_is_closed_and_holds_its_volume() => Gen.Select(Gen.Double[-250, 250], Gen.Double[-250, 250], Gen.Double[30, 80]).Sample(
        (y, z, radius) =>
        {
            Vector3[] corners = [new(0, 0, 0), new(300, 0, 0), new(400, 350 + y, z), new(900, 200, 300)];
            CutFrame cut = BentFrame.Cut(BentFrame.Alone("round 14 x 2 mm", radius, corners));
            TriangleMesh mesh = TubeMesher.Mesh(cut, 0);
            Assert.InRange(mesh.Volume() / cut.Tubes[0].Volume, 0.998, 1);
            var edges = new HashSet<(int, int)>();
            for (int i = 0; i < mesh.Triangles.Count; i += 3)
            {
                for (int k = 0; k < 3; k++)
                {
                    Assert.True(edges.Add((mesh.Triangles[i + k], mesh.Triangles[i + ((k + 1) % 3)])));
                }
            }

            Assert.All(edges, e => Assert.Contains((e.Item2, e.Item1), edges));
        },
        iter: 8,
        threads: 1);

    // Turned bend by bend with Rodrigues' formula about the normals of the corners, written out here again.
    private static Vector3 Carried(Tube tube)
    {
        Vector3[] corners = [tube.From.Point, new(250, 40, 60), new(300, -30, 300), tube.To.Point];
        Vector3 top = tube.Axes.Z;
        for (int i = 1; i < 3; i++)
        {
            Vector3 before = (corners[i] - corners[i - 1]).Normalized();
            Vector3 after = (corners[i + 1] - corners[i]).Normalized();
            Vector3 about = before.Cross(after).Normalized();
            double angle = Math.Acos(before.Dot(after));
            top = (Math.Cos(angle) * top) + (Math.Sin(angle) * about.Cross(top)) + ((1 - Math.Cos(angle)) * about.Dot(top) * about);
        }

        return top;
    }

    private static Vector3 Centroid(TriangleMesh mesh, double volume)
    {
        Vector3 sum = Vector3.Zero;
        for (int i = 0; i < mesh.Triangles.Count; i += 3)
        {
            (Vector3 a, Vector3 b, Vector3 c) = (mesh.Vertices[mesh.Triangles[i]], mesh.Vertices[mesh.Triangles[i + 1]], mesh.Vertices[mesh.Triangles[i + 2]]);
            sum += a.Dot(b.Cross(c)) / 24 * (a + b + c);
        }

        return sum / volume;
    }
}
