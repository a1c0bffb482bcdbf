using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Formats.Dxf;

/// <summary>Writes drawings as ASCII DXF, of the year 2000 (AC1015) or of Release 12 (AC1009), in millimetres or inches.</summary>
/// <remarks>
/// The same drawing gives the same bytes: no dates, no identifiers. Closed lines are closed by their flag; a line of two points
/// is a LINE. Text stands in a style named after Arial, whose widths are those of <see cref="Helvetica"/>.
/// Group codes after the published DXF reference of the format's maker.
/// </remarks>
public static class DxfWriter
{
    /// <summary>Writes a drawing.</summary>
    /// <param name="drawing">Shapes in mm; coordinates up to 1e9.</param>
    /// <param name="format">Version and unit; AC1015 in millimetres unless said otherwise.</param>
    /// <returns>The file.</returns>
    /// <exception cref="ArgumentException">A shape stands on a layer that the drawing does not list; a layer is listed twice or
    /// has a name that DXF forbids; a line has fewer than two points.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A number is not finite, or above 1e9.</exception>
    public static byte[] Write(Drawing drawing, DxfFormat format = default)
    {
        CheckLayers(drawing);
        if (format.Inches)
        {
            drawing = drawing with { Shapes = [.. drawing.Shapes.Select(InInches)] };
        }

        Box2 view = drawing.Bounds() ?? default;
        int firstShape = DxfHandles.FirstFree + drawing.Layers.Count;

        var dxf = new DxfSink();
        if (format.Version == DxfVersion.R12)
        {
            DxfRelease12.Write(dxf, drawing, view, format.Inches);
            return dxf.Add(0, "EOF").ToArray();
        }

        Header(dxf, view, firstShape + drawing.Shapes.Count, format.Inches);
        dxf.Section("CLASSES").EndSection();
        DxfTables.Write(dxf, drawing.Layers, view);
        dxf.Section("ENTITIES");
        for (int i = 0; i < drawing.Shapes.Count; i++)
        {
            Entity(dxf, drawing.Shapes[i], firstShape + i);
        }

        dxf.EndSection();
        DxfObjects.Write(dxf, view);
        return dxf.Add(0, "EOF").ToArray();
    }

    /// <summary>The header's unit: 1 inches, 4 millimetres; and whether the drawing is an English or a metric one.</summary>
    internal static void Units(DxfSink dxf, bool inches)
    {
        dxf.Add(9, "$MEASUREMENT").Add(70, inches ? 0 : 1);
        dxf.Add(9, "$INSUNITS").Add(70, inches ? 1 : 4);
    }

    private static Shape InInches(Shape shape) => shape switch
    {
        Polyline line => line with { Points = [.. line.Points.Select(p => 1 / 25.4 * p)] },
        Text text => text with { At = 1 / 25.4 * text.At, Height = text.Height / 25.4 },
        _ => shape,
    };

    private static void CheckLayers(Drawing drawing)
    {
        var names = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        foreach (Layer layer in drawing.Layers)
        {
            bool plain = layer.Name.Length > 0 && layer.Name.All(c => char.IsAsciiLetterOrDigit(c) || c is '-' or '_');
            if (!plain || layer.ColourIndex is < 1 or > 255 || !names.Add(layer.Name))
            {
                throw new ArgumentException($"The layer '{layer.Name}' has a name or a colour that DXF forbids, or is listed twice.", nameof(drawing));
            }
        }

        foreach (Shape shape in drawing.Shapes)
        {
            if (!names.Contains(shape.Layer))
            {
                throw new ArgumentException($"The drawing has no layer '{shape.Layer}'.", nameof(drawing));
            }
        }
    }

    private static void Header(DxfSink dxf, Box2 view, int nextHandle, bool inches)
    {
        dxf.Section("HEADER");
        dxf.Add(9, "$ACADVER").Add(1, "AC1015");
        dxf.Add(9, "$DWGCODEPAGE").Add(3, "ANSI_1252");
        dxf.Add(9, "$INSBASE").Point(10, 0, 0);
        dxf.Add(9, "$EXTMIN").Point(10, view.Left, view.Bottom);
        dxf.Add(9, "$EXTMAX").Point(10, view.Right, view.Top);
        dxf.Add(9, "$LIMMIN").Flat(10, view.Left, view.Bottom);
        dxf.Add(9, "$LIMMAX").Flat(10, view.Right, view.Top);
        dxf.Add(9, "$LTSCALE").Real(40, 1);
        dxf.Add(9, "$TEXTSIZE").Real(40, 2.5);
        dxf.Add(9, "$TEXTSTYLE").Add(7, "STANDARD");
        dxf.Add(9, "$CLAYER").Add(8, "0");
        dxf.Add(9, "$DIMSTYLE").Add(2, "STANDARD");
        dxf.Add(9, "$LUNITS").Add(70, 2);
        dxf.Add(9, "$LUPREC").Add(70, 4);
        dxf.Add(9, "$HANDSEED").Handle(5, nextHandle);
        Units(dxf, inches);
        dxf.Add(9, "$LWDISPLAY").Add(290, 0);
        dxf.Add(9, "$PSTYLEMODE").Add(290, 1);
        dxf.EndSection();
    }

    private static void Entity(DxfSink dxf, Shape shape, int handle)
    {
        switch (shape)
        {
            case Polyline { Points.Count: < 2 }:
                throw new ArgumentException("A line needs two points.", nameof(shape));
            case Polyline { Points: [Point2 a, Point2 b] } line:
                Begin(dxf, "LINE", handle, line.Layer, "AcDbLine").Point(10, a.X, a.Y).Point(11, b.X, b.Y);
                break;
            case Polyline line:
                Begin(dxf, "LWPOLYLINE", handle, line.Layer, "AcDbPolyline")
                    .Add(90, line.Points.Count).Add(70, line.Closed ? 1 : 0).Real(43, 0);
                foreach (Point2 point in line.Points)
                {
                    dxf.Flat(10, point.X, point.Y);
                }

                break;
            case Text text:
                Begin(dxf, "TEXT", handle, text.Layer, "AcDbText")
                    .Point(10, text.At.X, text.At.Y).Real(40, text.Height).Add(1, DxfText.Encode(text.Content))
                    .Real(50, text.Turn * 180 / Math.PI).Add(7, "STANDARD").Add(100, "AcDbText");
                break;
            default:
                throw new ArgumentException($"DXF has no entity for a {shape.GetType().Name}.", nameof(shape));
        }
    }

    private static DxfSink Begin(DxfSink dxf, string type, int handle, string layer, string subclass) =>
        dxf.Add(0, type).Handle(5, handle).Handle(330, DxfHandles.ModelSpace).Add(100, "AcDbEntity").Add(8, layer).Add(100, subclass);
}
