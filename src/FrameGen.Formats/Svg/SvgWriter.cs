using System.Globalization;
using System.Security;
using System.Text;
using System.Xml;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Formats.Svg;

/// <summary>Writes a drawing as an SVG 1.1 picture at its true size, on white, to 0.001 mm.</summary>
public static class SvgWriter
{
    /// <summary>Writes a drawing.</summary>
    /// <param name="drawing">What is drawn.</param>
    /// <param name="title">Read out, or shown by a pointer; empty for none.</param>
    /// <param name="margin">White round the drawing, mm.</param>
    /// <param name="background">False to leave out the white ground, which a cutter's program could take for a shape to cut.</param>
    /// <returns>UTF-8 text with <c>\n</c> at the ends of lines.</returns>
    /// <exception cref="ArgumentException">The drawing is empty, or a shape stands on a layer that it does not have.</exception>
    public static byte[] Write(Drawing drawing, string title = "", double margin = 5, bool background = true)
    {
        Box2 box = drawing.Bounds() ?? throw new ArgumentException("An empty drawing has no size.", nameof(drawing));
        double left = box.Left - margin;
        double top = box.Top + margin;
        double width = box.Width + (2 * margin);
        double height = box.Height + (2 * margin);
        var sink = new ByteSink();
        sink.Ascii("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n<svg xmlns=\"http://www.w3.org/2000/svg\" version=\"1.1\" width=\"");
        sink.Decimal(width, 3).Ascii("mm\" height=\"").Decimal(height, 3).Ascii("mm\" viewBox=\"0 0 ").Decimal(width, 3).Ascii(" ").Decimal(height, 3);
        sink.Ascii("\">\n");
        if (title.Length > 0)
        {
            sink.Ascii("<title>").Bytes(Escaped(title)).Ascii("</title>\n");
        }

        if (background)
        {
            sink.Ascii("<rect width=\"100%\" height=\"100%\" fill=\"#ffffff\"/>\n");
        }

        string? open = null;
        foreach (Shape shape in drawing.Shapes)
        {
            if (!string.Equals(shape.Layer, open, StringComparison.Ordinal))
            {
                sink.Ascii(open is null ? string.Empty : "</g>\n");
                Open(sink, drawing.Layers.FirstOrDefault(l => string.Equals(l.Name, shape.Layer, StringComparison.Ordinal))
                    ?? throw new ArgumentException($"The drawing has no layer {shape.Layer}.", nameof(drawing)));
                open = shape.Layer;
            }

            Draw(sink, shape, left, top);
        }

        sink.Ascii("</g>\n</svg>\n");
        return sink.ToArray();
    }

    private static void Open(ByteSink sink, Layer layer)
    {
        string ink = Colour(layer.Pen.Ink);
        sink.Ascii("<g class=\"").Ascii(layer.Name).Ascii("\" color=\"").Ascii(ink).Ascii("\" fill=\"none\" stroke=\"").Ascii(ink).Ascii("\" stroke-width=\"").Decimal(layer.Pen.Width, 3);
        sink.Ascii("\" stroke-linejoin=\"round\" stroke-linecap=\"").Ascii(layer.Pen.Dashes.Count == 0 ? "round" : "butt").Ascii("\"");
        for (int i = 0; i < layer.Pen.Dashes.Count; i++)
        {
            sink.Ascii(i == 0 ? " stroke-dasharray=\"" : " ").Decimal(layer.Pen.Dashes[i], 3);
        }

        sink.Ascii(layer.Pen.Dashes.Count == 0 ? ">\n" : "\">\n");
    }

    private static void Draw(ByteSink sink, Shape shape, double left, double top)
    {
        switch (shape)
        {
            case Polyline line:
                sink.Ascii("<path d=\"");
                for (int i = 0; i < line.Points.Count; i++)
                {
                    sink.Ascii(i == 0 ? "M" : "L");
                    Place(sink, line.Points[i], left, top);
                }

                sink.Ascii(line.Closed ? "Z\"/>\n" : "\"/>\n");
                break;
            case Text text:
                // Stroked letters would be fat: they take the layer's colour as their filling.
                sink.Ascii("<text fill=\"currentColor\" stroke=\"none\"");
                WriteText(sink, text, left, top);
                break;
            default:
                throw new ArgumentOutOfRangeException(nameof(shape), shape, "Not a shape that this writer knows.");
        }
    }

    private static void WriteText(ByteSink sink, Text text, double left, double top)
    {
        sink.Ascii(" font-family=\"Helvetica, Arial, sans-serif\" font-size=\"").Decimal(text.Height * 1000 / Helvetica.CapHeight, 3);
        sink.Ascii("\" transform=\"translate(");
        Place(sink, text.At, left, top);
        sink.Ascii(")");
        if (text.Turn != 0)
        {
            sink.Ascii(" rotate(").Decimal(-double.RadiansToDegrees(text.Turn), 3).Ascii(")");
        }

        sink.Ascii("\">").Bytes(Escaped(text.Content)).Ascii("</text>\n");
    }

    // The picture's y runs down.
    private static void Place(ByteSink sink, Point2 point, double left, double top) =>
        sink.Decimal(point.X - left, 3).Ascii(" ").Decimal(top - point.Y, 3);

    private static byte[] Escaped(string text) =>
        Encoding.UTF8.GetBytes(SecurityElement.Escape(string.Concat(text.Select(c => XmlConvert.IsXmlChar(c) || char.IsSurrogate(c) ? c : '?'))));

    private static string Colour(Ink ink)
    {
        static int Byte(double share) => (int)Math.Round(255 * Math.Clamp(share, 0, 1));
        return string.Create(CultureInfo.InvariantCulture, $"#{Byte(ink.Red):x2}{Byte(ink.Green):x2}{Byte(ink.Blue):x2}");
    }
}
