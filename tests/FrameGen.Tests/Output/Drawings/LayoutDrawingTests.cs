using FrameGen.Formats.Drawings;
using FrameGen.Output.Drawings;
using FrameGen.Tests.Fabrication;
using Xunit;

namespace FrameGen.Tests.Output.Drawings;

/// <summary>The bench drawing of the garden gate: a rail 40 mm thick and 1000 long, a post of 30 mm on its middle, an arm mitred to its top.</summary>
public class LayoutDrawingTests
{
    [Fact]
    public void The_front_shows_silhouettes_at_full_size()
    {
        Drawing drawing = LayoutDrawing.Draw(GateFrame.CopedPackage());
        Polyline[] tubes = [.. drawing.Shapes.OfType<Polyline>().Where(l => l.Layer is LayoutDrawing.Tubes)];

        // Seen from -y: the rail from x 0 to 1000, 20 above and below its axis; the post's sides 15 to each side of x = 400, from the
        // rail's flank, √(20² − 15²) up, to the miter; the arm 15 above and below z = 600.
        Assert.Contains(tubes, l => Is(l, 0, 20, 1000, 20));
        Assert.Contains(tubes, l => Is(l, 0, -20, 1000, -20));
        Assert.Contains(tubes, l => Is(l, 385, 20, 385, 615));
        Assert.Contains(tubes, l => Is(l, 415, 20, 415, 585));
        Assert.Contains(tubes, l => Is(l, 385, 615, 900, 615));
    }

    [Fact]
    public void Nodes_are_named_and_measured_from_the_least_one()
    {
        Drawing drawing = LayoutDrawing.Draw(GateFrame.CopedPackage());
        string[] words = [.. drawing.Shapes.OfType<Text>().Select(t => t.Content)];
        Assert.All((string[])["x 0", "400.0", "900.0", "1000.0", "z 0", "600.0"], w => Assert.Contains(w, words));
        Assert.Contains(words, w => w.Contains("top", StringComparison.Ordinal));
        Assert.Contains(words, w => w.StartsWith("Garden gate", StringComparison.Ordinal));
    }

    [Fact]
    public void No_line_is_drawn_twice()
    {
        Drawing drawing = LayoutDrawing.Draw(GateFrame.CopedPackage());
        string[] lines = [.. drawing.Shapes.OfType<Polyline>().Select(l => l.Layer + string.Join(' ', l.Points.Select(p => $"{p.X:0.0} {p.Y:0.0}")))];
        Assert.Equal(lines.Length, lines.Distinct(StringComparer.Ordinal).Count());
    }

    private static bool Is(Polyline line, double x1, double y1, double x2, double y2) =>
        line.Points is [var a, var b]
        && ((a.DistanceTo(new(x1, y1)) < 1e-3 && b.DistanceTo(new(x2, y2)) < 1e-3) || (b.DistanceTo(new(x1, y1)) < 1e-3 && a.DistanceTo(new(x2, y2)) < 1e-3));
}
