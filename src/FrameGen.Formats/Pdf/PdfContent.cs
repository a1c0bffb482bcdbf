using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Formats.Pdf;

/// <summary>The drawing operators of one page, in mm with three decimals.</summary>
internal static class PdfContent
{
    /// <summary>Operators of a page: lines with their pens, text in Helvetica.</summary>
    public static ByteSink Of(PdfPage page)
    {
        var content = new ByteSink();

        // One unit of a PDF page is 1/72 inch; from here on it is a millimetre.
        content.Decimal(72 / 25.4, 8).Bytes(" 0 0 "u8).Decimal(72 / 25.4, 8).Bytes(" 0 0 cm 1 J 1 j\n"u8);
        foreach (PdfView view in page.Views)
        {
            content.Bytes("q\n"u8);
            if (view.Window is { } window)
            {
                Numbers(content, window.Left, window.Bottom, window.Width, window.Height).Bytes("re W n\n"u8);
            }

            var pens = view.Drawing.Layers.ToDictionary(l => l.Name, l => l.Pen, StringComparer.Ordinal);
            string? layer = null;
            foreach (Shape shape in view.Drawing.Shapes)
            {
                if (!string.Equals(shape.Layer, layer, StringComparison.Ordinal))
                {
                    layer = shape.Layer;
                    SetPen(content, pens.TryGetValue(layer, out Pen? pen)
                        ? pen
                        : throw new ArgumentException($"The drawing has no layer '{layer}'.", nameof(page)));
                }

                Add(content, shape, view.Origin);
            }

            content.Bytes("Q\n"u8);
        }

        return content;
    }

    private static void SetPen(ByteSink content, Pen pen)
    {
        content.Decimal(pen.Width, 3).Bytes(" w ["u8);
        foreach (double dash in pen.Dashes)
        {
            content.Decimal(dash, 3).Byte((byte)' ');
        }

        content.Bytes("] 0 d "u8);
        Numbers(content, pen.Ink.Red, pen.Ink.Green, pen.Ink.Blue).Bytes("RG "u8);
        Numbers(content, pen.Ink.Red, pen.Ink.Green, pen.Ink.Blue).Bytes("rg\n"u8);
    }

    private static void Add(ByteSink content, Shape shape, Point2 origin)
    {
        switch (shape)
        {
            case Polyline line:
                for (int i = 0; i < line.Points.Count; i++)
                {
                    Point2 p = origin + line.Points[i];
                    Numbers(content, p.X, p.Y).Bytes(i == 0 ? "m\n"u8 : "l\n"u8);
                }

                content.Bytes(line.Closed ? "s\n"u8 : "S\n"u8);
                break;
            case Text text:
                (double sin, double cos) = Math.SinCos(text.Turn);
                Point2 at = origin + text.At;
                content.Bytes("BT /F1 "u8);
                Numbers(content, text.Height * 1000 / Helvetica.CapHeight).Bytes("Tf "u8);
                content.Decimal(cos, 6).Byte((byte)' ').Decimal(sin, 6).Byte((byte)' ').Decimal(-sin, 6).Byte((byte)' ').Decimal(cos, 6).Byte((byte)' ');
                Numbers(content, at.X, at.Y).Bytes("Tm "u8);
                Literal(content, text.Content).Bytes(" Tj ET\n"u8);
                break;
            default:
                throw new ArgumentException($"A PDF page has no operator for a {shape.GetType().Name}.", nameof(shape));
        }
    }

    /// <summary>A string in brackets, in WinAnsi; <c>?</c> for characters that it lacks.</summary>
    public static ByteSink Literal(ByteSink content, string text)
    {
        content.Byte((byte)'(');
        foreach (char c in text)
        {
            if (char.IsLowSurrogate(c))
            {
                continue;
            }

            byte code = Helvetica.TryEncode(c, out byte known) ? known : (byte)'?';
            if (code is (byte)'(' or (byte)')' or (byte)'\\')
            {
                content.Byte((byte)'\\');
            }

            content.Byte(code);
        }

        return content.Byte((byte)')');
    }

    private static ByteSink Numbers(ByteSink content, params ReadOnlySpan<double> values)
    {
        foreach (double value in values)
        {
            content.Decimal(value, 3).Byte((byte)' ');
        }

        return content;
    }
}
