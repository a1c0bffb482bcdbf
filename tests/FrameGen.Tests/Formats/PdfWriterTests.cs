using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using FrameGen.Formats.Drawings;
using FrameGen.Formats.Pdf;
using Xunit;

namespace FrameGen.Tests.Formats;

public class PdfWriterTests
{
    private static readonly Drawing Sample = new(
        [new("A", 1, new Pen(0.25, Ink.Grey(0.5), [3, 1.5]))],
        [
            new Polyline("A", [new(10, 20), new(110, 20), new(110, 30.0004)], Closed: true),
            new Text("A", new(10, 40), 3, 0, "a (b) \\ \u00B0 \u4E2D"),
        ]);

    private static readonly byte[] File = PdfWriter.Write([new PdfPage(210, 297, [new PdfView(Sample, new(5, 0), new Box2(10, 10, 200, 287))])], "T (1)");

    [Fact]
    public void The_cross_reference_table_leads_to_every_object()
    {
        string text = Encoding.Latin1.GetString(File);
        int table = Number(text, text.IndexOf("startxref\n", StringComparison.Ordinal) + 10);
        Assert.StartsWith("xref\n0 7\n0000000000 65535 f \n", text[table..], StringComparison.Ordinal);
        int entries = text.IndexOf("65535 f \n", table, StringComparison.Ordinal) + 9;
        for (int i = 0; i < 6; i++)
        {
            // An entry is 20 bytes: ten digits, five digits, n and a line end of two characters.
            string entry = text.Substring(entries + (20 * i), 20);
            Assert.EndsWith(" 00000 n \n", entry, StringComparison.Ordinal);
            Assert.StartsWith($"{i + 1} 0 obj\n", text[Number(entry, 0)..], StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Lines_keep_millimetres_pens_and_window()
    {
        string text = Encoding.Latin1.GetString(File);
        Assert.Contains("2.83464567 0 0 2.83464567 0 0 cm", text, StringComparison.Ordinal);
        Assert.Contains("10 10 190 277 re W n", text, StringComparison.Ordinal);
        Assert.Contains("0.25 w [3 1.5 ] 0 d 0.5 0.5 0.5 RG", text, StringComparison.Ordinal);
        Assert.Contains("15 20 m\n115 20 l\n115 30 l\ns\n", text, StringComparison.Ordinal);
        Assert.Contains("/MediaBox[0 0 595.2756 841.8898]", text, StringComparison.Ordinal);
        Assert.Contains("/PrintScaling/None", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Brackets_and_characters_that_the_font_lacks_are_written_safely()
    {
        Assert.Contains("(a \\(b\\) \\\\ \u00B0 ?) Tj", Encoding.Latin1.GetString(File), StringComparison.Ordinal);
    }

    [Fact]
    public void The_identifier_is_the_hash_of_the_body_and_nothing_tells_the_time()
    {
        string text = Encoding.Latin1.GetString(File);
        int table = text.LastIndexOf("xref\n0 ", StringComparison.Ordinal);
        Assert.Contains(Convert.ToHexString(SHA256.HashData(File.AsSpan(0, table))), text[table..], StringComparison.Ordinal);
        Assert.DoesNotContain("Date", text, StringComparison.Ordinal);
        Assert.Equal(File, PdfWriter.Write([new PdfPage(210, 297, [new PdfView(Sample, new(5, 0), new Box2(10, 10, 200, 287))])], "T (1)"));
    }

    [Fact]
    public void The_stream_is_as_long_as_it_says()
    {
        string text = Encoding.Latin1.GetString(File);
        int length = text.IndexOf("<</Length ", StringComparison.Ordinal) + 10;
        int start = text.IndexOf("stream\n", StringComparison.Ordinal) + 7;
        Assert.Equal(text.IndexOf("\nendstream", StringComparison.Ordinal) - start, Number(text, length));
    }

    [Fact]
    public void Refuses_a_file_without_pages() => Assert.Throws<ArgumentException>(() => PdfWriter.Write([], "empty"));

    private static int Number(string text, int at) =>
        int.Parse(string.Concat(text[at..].TakeWhile(char.IsAsciiDigit)), CultureInfo.InvariantCulture);
}
