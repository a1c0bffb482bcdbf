using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Output.Drawings;

/// <summary>A square of known size beside a drawing, so that a machine's or a program's wrong scale shows before metal is cut.</summary>
internal static class CheckSquare
{
    /// <summary>From the drawing to the square, mm.</summary>
    private const double Apart = 15;

    /// <summary>The drawing with a square at its lower right, on the layer CHECK: 100 mm, or 4 in where inches are read.</summary>
    /// <param name="drawing">On layers that include CHECK.</param>
    /// <param name="inches">True for 4 in.</param>
    public static Drawing Beside(Drawing drawing, bool inches)
    {
        Box2 bounds = drawing.Bounds() ?? default;
        (double side, string size) = inches ? (101.6, "4 in") : (100, "100 mm");
        var corner = new Point2(Math.Ceiling(bounds.Right + Apart), Math.Floor(bounds.Bottom));
        var square = new Polyline(
            PaperLayers.Check,
            [corner, corner + new Point2(side, 0), corner + new Point2(side, side), corner + new Point2(0, side)],
            Closed: true);
        string[] words = [$"{size} square", "checks the scale:", "measure it, don't cut it"];
        double[] heights = [9, 4, 4];
        double y = corner.Y + (side / 2) + 8;
        var shapes = new List<Shape>(drawing.Shapes) { square };
        for (int i = 0; i < words.Length; i++)
        {
            double width = Helvetica.Width(words[i], heights[i]);
            shapes.Add(new Text(PaperLayers.Check, new(corner.X + ((side - width) / 2), y), heights[i], 0, words[i]));
            y -= i == 0 ? 10 : 7;
        }

        return drawing with { Shapes = shapes };
    }
}
