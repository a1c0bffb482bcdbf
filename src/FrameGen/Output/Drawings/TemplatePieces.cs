using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Output.Drawings;

/// <summary>Wrap-around paper pieces for the fitted ends of a part, widened for the paper's thickness.</summary>
internal static class TemplatePieces
{
    /// <summary>Between two pieces in one drawing, mm.</summary>
    private const double Apart = 10;

    /// <summary>The pieces of a part, side by side: the from end's first. None where both ends are square.</summary>
    /// <param name="package">The frame's papers.</param>
    /// <param name="part">One of its parts.</param>
    public static IReadOnlyList<TemplatePiece> Of(ShopPackage package, Part part)
    {
        var pattern = new PartPattern(package, part);
        var pieces = new List<TemplatePiece>(2);
        if (pattern.From.IsFitted)
        {
            // It stays where it is in the developed pattern, but for the paper's scale.
            pieces.Add(new TemplatePieceSketch(pattern, pattern.From).Draw(default));
        }

        if (pattern.To.IsFitted)
        {
            var sketch = new TemplatePieceSketch(pattern, pattern.To);
            Point2 shift = pieces.Count == 0
                ? new(0, -Math.Floor(sketch.WasteEdge))
                : new(Math.Ceiling(pieces[0].Bounds.Right + Apart + sketch.HalfWidth), Math.Round(pieces[0].Bounds.Top - sketch.WasteEdge));
            pieces.Add(sketch.Draw(shift));
        }

        return pieces;
    }

    /// <summary>All pieces of a part in one drawing; null where both its ends are square.</summary>
    /// <param name="package">The frame's papers.</param>
    /// <param name="part">One of its parts.</param>
    public static Drawing? Draw(ShopPackage package, Part part)
    {
        IReadOnlyList<TemplatePiece> pieces = Of(package, part);
        return pieces.Count == 0 ? null : new Drawing(PaperLayers.All, [.. pieces.SelectMany(p => p.Drawing.Shapes)]);
    }
}
