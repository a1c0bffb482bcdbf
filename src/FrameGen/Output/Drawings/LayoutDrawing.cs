using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>
/// The whole frame at full size for the bench: seen from above, below that from the front (from −y), and beside that from the side
/// (from +x). Outlines of the cut tubes, centre lines, node names, and where nodes stand along each axis.
/// </summary>
internal static class LayoutDrawing
{
    /// <summary>Silhouettes and cut ends.</summary>
    public const string Tubes = "TUBES";

    /// <summary>Centre lines from node point to node point.</summary>
    public const string Axes = "AXES";

    /// <summary>Crosses and names.</summary>
    public const string Nodes = "NODES";

    /// <summary>Distances along an axis from the frame's least node.</summary>
    public const string Dimensions = "DIMENSIONS";

    private static readonly IReadOnlyList<Layer> Layers =
    [
        new(Tubes, 7, Pen.Black(0.35)),
        new(Axes, 8, new Pen(0.15, Ink.Grey(0.4), [8, 2, 1, 2])),
        new(Nodes, 5, Pen.Black(0.2)),
        new(Dimensions, 3, Pen.Black(0.2)),
        new(PaperLayers.Text, 7, Pen.Black(0.2)),
        new(PaperLayers.Check, 6, Pen.Black(0.2)),
    ];

    /// <summary>Draws the frame.</summary>
    /// <param name="package">The frame's papers.</param>
    public static Drawing Draw(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        Vector3[] at = [.. model.Nodes.Select(n => n.Position)];
        double size = new[] { at.Max(p => p.X) - at.Min(p => p.X), at.Max(p => p.Y) - at.Min(p => p.Y), at.Max(p => p.Z) - at.Min(p => p.Z) }.Max();
        double text = Math.Clamp(size / 90, 4, 30);
        var view = new LayoutView(package, text);
        LayoutSide front = view.Draw("FRONT, from -y", "x", "z", Vector3.UnitX, Vector3.UnitZ);
        LayoutSide side = view.Draw("SIDE, from +x", "y", "z", Vector3.UnitY, Vector3.UnitZ);
        LayoutSide top = view.Draw("TOP, from +z", "x", "y", Vector3.UnitX, Vector3.UnitY);
        double apart = 6 * text;
        var shapes = new List<Shape>();
        shapes.AddRange(front.Shapes);
        shapes.AddRange(Moved(side, new Point2(Math.Ceiling(front.Bounds.Right + apart - side.Bounds.Left), 0)));
        var above = new Point2(0, Math.Ceiling(front.Bounds.Top + apart - top.Bounds.Bottom));
        shapes.AddRange(Moved(top, above));

        double line = Math.Floor(front.Bounds.Bottom - (3 * text));
        string[] words =
        [
            .. PartWords.IsUnmet(package.Cut.Sized) ? (string[])[Cautions.NotMeetingTargets] : [],
            $"{PartWords.Origin(model)}: layout at full size, lengths in {new DisplayFormat(model.Display).LengthUnitName} from the least node; hidden lines are drawn",
            Cautions.OnDrawings,
        ];
        foreach (string sentence in words)
        {
            shapes.Add(new Text(PaperLayers.Text, new(front.Bounds.Left, line), text, 0, sentence));
            line -= 1.8 * text;
        }

        return new Drawing(Layers, shapes);
    }

    private static IEnumerable<Shape> Moved(LayoutSide side, Point2 by) => side.Shapes.Select(s => s switch
    {
        Polyline p => p with { Points = [.. p.Points.Select(q => q + by)] },
        Text t => (Shape)(t with { At = t.At + by }),
        _ => s,
    });
}

/// <summary>The frame seen from one side.</summary>
/// <param name="Shapes">In the frame's own coordinates, right and up.</param>
/// <param name="Bounds">Box round them.</param>
internal sealed record LayoutSide(IReadOnlyList<Shape> Shapes, Box2 Bounds);
