using System.Globalization;
using System.Security.Cryptography;

namespace FrameGen.Formats.Pdf;

/// <summary>Writes drawings as a PDF 1.4 file at full size: lines and Helvetica, nothing embedded.</summary>
/// <remarks>
/// The file asks viewers not to scale it (<c>PrintScaling None</c>). The same pages give the same bytes: no dates, and the
/// identifier is the SHA-256 of the body. After ISO 32000-1.
/// </remarks>
public static class PdfWriter
{
    /// <summary>Writes pages.</summary>
    /// <param name="pages">One at least.</param>
    /// <param name="title">Of the document.</param>
    /// <exception cref="ArgumentException">No page, or a shape on a layer that its drawing does not list.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A number is not finite, or above 1e9.</exception>
    public static byte[] Write(IReadOnlyList<PdfPage> pages, string title)
    {
        if (pages.Count == 0)
        {
            throw new ArgumentException("A PDF file needs a page.", nameof(pages));
        }

        var pdf = new ByteSink(65536);
        var starts = new List<int>();
        pdf.Bytes("%PDF-1.4\n%\u00E2\u00E3\u00CF\u00D3\n"u8);
        Begin(pdf, starts).Bytes("<</Type/Catalog/Pages 2 0 R/ViewerPreferences<</PrintScaling/None/DisplayDocTitle true>>>>"u8);
        End(pdf);
        Begin(pdf, starts).Bytes("<</Type/Pages/Kids["u8);
        for (int i = 0; i < pages.Count; i++)
        {
            pdf.Integer(PageObject(i)).Bytes(" 0 R "u8);
        }

        pdf.Bytes("]/Count "u8).Integer(pages.Count).Bytes(">>"u8);
        End(pdf);
        Begin(pdf, starts).Bytes("<</Type/Font/Subtype/Type1/BaseFont/Helvetica/Encoding/WinAnsiEncoding>>"u8);
        End(pdf);
        PdfContent.Literal(Begin(pdf, starts).Bytes("<</Producer(FrameGen)/Title"u8), title).Bytes(">>"u8);
        End(pdf);
        for (int i = 0; i < pages.Count; i++)
        {
            Begin(pdf, starts).Bytes("<</Type/Page/Parent 2 0 R/MediaBox[0 0 "u8)
                .Decimal(pages[i].Width * 72 / 25.4, 4).Byte((byte)' ').Decimal(pages[i].Height * 72 / 25.4, 4)
                .Bytes("]/Resources<</Font<</F1 3 0 R>>>>/Contents "u8).Integer(PageObject(i) + 1).Bytes(" 0 R>>"u8);
            End(pdf);
            ByteSink content = PdfContent.Of(pages[i]);
            Begin(pdf, starts).Bytes("<</Length "u8).Integer(content.Length).Bytes(">>\nstream\n"u8)
                .Bytes(content.Written).Bytes("\nendstream"u8);
            End(pdf);
        }

        Trailer(pdf, starts);
        return pdf.ToArray();
    }

    // Catalog, page tree, font and document information come first; then two objects a page.
    private static int PageObject(int page) => 5 + (2 * page);

    private static ByteSink Begin(ByteSink pdf, List<int> starts)
    {
        starts.Add(pdf.Length);
        return pdf.Integer(starts.Count).Bytes(" 0 obj\n"u8);
    }

    private static void End(ByteSink pdf) => pdf.Bytes("\nendobj\n"u8);

    private static void Trailer(ByteSink pdf, List<int> starts)
    {
        string id = Convert.ToHexString(SHA256.HashData(pdf.Written));
        int table = pdf.Length;
        pdf.Bytes("xref\n0 "u8).Integer(starts.Count + 1).Bytes("\n0000000000 65535 f \n"u8);
        foreach (int start in starts)
        {
            pdf.Ascii(start.ToString("D10", CultureInfo.InvariantCulture)).Bytes(" 00000 n \n"u8);
        }

        pdf.Bytes("trailer\n<</Size "u8).Integer(starts.Count + 1).Bytes("/Root 1 0 R/Info 4 0 R/ID[<"u8)
            .Ascii(id).Bytes("><"u8).Ascii(id).Bytes(">]>>\nstartxref\n"u8).Integer(table).Bytes("\n%%EOF\n"u8);
    }
}
