using System.Text;
using FrameGen.Formats.Drawings;
using FrameGen.Formats.Dxf;
using Xunit;

namespace FrameGen.Tests.Formats;

public class DxfWriterTests
{
    private static readonly Layer[] Layers = [new("CUT", 1, Pen.Black(0.5)), new("TEXT", 7, Pen.Black(0.2))];

    [Fact]
    public void A_closed_line_is_closed_by_its_flag_and_repeats_no_vertex()
    {
        List<(int Code, string Value)> pairs = Entity("LWPOLYLINE", new Polyline("CUT", [new(0, 0), new(12.5, 0), new(0, -3)], Closed: true));
        Assert.Contains((90, "3"), pairs);
        Assert.Contains((70, "1"), pairs);
        Assert.Equal((string[])["0.0", "12.5", "0.0"], Values(pairs, 10));
        Assert.Equal((string[])["0.0", "0.0", "-3.0"], Values(pairs, 20));
        Assert.Contains((8, "CUT"), pairs);
    }

    [Fact]
    public void An_open_line_of_two_points_is_a_line()
    {
        List<(int Code, string Value)> pairs = Entity("LINE", Polyline.Segment("CUT", new(1, 2), new(3, 4)));
        Assert.Contains((10, "1.0"), pairs);
        Assert.Contains((20, "2.0"), pairs);
        Assert.Contains((11, "3.0"), pairs);
        Assert.Contains((21, "4.0"), pairs);
    }

    [Fact]
    public void A_text_keeps_place_height_and_turn()
    {
        List<(int Code, string Value)> pairs = Entity("TEXT", new Text("TEXT", new(1, 2), 2.5, Math.PI / 2, "KEEP"));
        Assert.Contains((40, "2.5"), pairs);
        Assert.Contains((50, "90.0"), pairs);
        Assert.Contains((1, "KEEP"), pairs);
    }

    [Fact]
    public void The_header_says_millimetres_and_the_extents()
    {
        List<(int Code, string Value)> pairs = Pairs(new Drawing(Layers, [Polyline.Segment("CUT", new(-4, 2), new(3, 4.25))]));
        Assert.Equal("4", After(pairs, "$INSUNITS"));
        Assert.Equal("1", After(pairs, "$MEASUREMENT"));
        Assert.Equal("AC1015", After(pairs, "$ACADVER"));
        Assert.Equal("-4.0", After(pairs, "$EXTMIN"));
        Assert.Equal("3.0", After(pairs, "$EXTMAX"));
    }

    [Fact]
    public void Every_handle_is_given_once_and_lies_below_the_next_free_one()
    {
        List<(int Code, string Value)> pairs = Pairs(new Drawing(Layers, [.. Enumerable.Range(0, 300).Select(i => Polyline.Segment("CUT", new(i, 0), new(i, 1)))]));
        int start = pairs.IndexOf((2, "TABLES"));
        string[] handles = [.. pairs.Skip(start).Where(p => p.Code is 5 or 105).Select(p => p.Value)];
        Assert.Equal(handles.Length, handles.Distinct(StringComparer.Ordinal).Count());
        int next = Convert.ToInt32(After(pairs, "$HANDSEED"), 16);
        Assert.All(handles, h => Assert.InRange(Convert.ToInt32(h, 16), 1, next - 1));
    }

    [Fact]
    public void Every_reference_leads_to_a_handle_of_the_file()
    {
        List<(int Code, string Value)> pairs = Pairs(new Drawing(Layers, [Polyline.Segment("CUT", new(0, 0), new(1, 1))]));
        int start = pairs.IndexOf((2, "TABLES"));
        HashSet<string> handles = [.. pairs.Skip(start).Where(p => p.Code is 5 or 105).Select(p => p.Value), "0"];
        Assert.All(pairs.Skip(start).Where(p => p.Code is 330 or 340 or 350 or 390), p => Assert.Contains(p.Value, handles));
    }

    // Codes inside DXF text as its published reference lists them: %% for symbols, ^ for controls, \U+ and \M+ for characters.
    [Theory]
    [InlineData("plain text (100 %)", "plain text (100 %)")]
    [InlineData("%%d and %%%", "% %d and % % %")]
    [InlineData("a^Jb", "a^ Jb")]
    [InlineData("a\nb\tc\r\nd", "a b c d")]
    [InlineData("\\U+00B0 \\M+1ABCD \\P", "\\U+005CU+00B0 \\U+005CM+1ABCD \\P")]
    [InlineData("90\u00B0 \u00D8 \u017C", "90\\U+00B0 \\U+00D8 \\U+017C")]
    [InlineData("\u0007", "?")]
    [InlineData("x\U0001F600y", "x?y")]
    public void Control_characters_of_the_format_print_as_text(string text, string written)
    {
        Assert.Contains((1, written), Entity("TEXT", new Text("TEXT", new(0, 0), 2, 0, text)));
    }

    // Release 12: a POLYLINE with vertices that follow (66), closed by its flag (70), no handles and no subclass marks.
    [Fact]
    public void Release_12_has_polylines_with_vertices_and_no_handles()
    {
        var line = new Polyline("CUT", [new(0, 0), new(12.5, 0), new(0, -3)], Closed: true);
        List<(int Code, string Value)> pairs = Pairs(new Drawing(Layers, [line]), new DxfFormat(DxfVersion.R12, Inches: false));
        Assert.Equal("AC1009", After(pairs, "$ACADVER"));
        Assert.Equal("4", After(pairs, "$INSUNITS"));
        int start = pairs.IndexOf((0, "POLYLINE"));
        Assert.Contains((66, "1"), pairs.Skip(start).Take(8));
        Assert.Contains((70, "1"), pairs.Skip(start).Take(8));
        Assert.Equal(["POLYLINE", "VERTEX", "VERTEX", "VERTEX", "SEQEND", "ENDSEC"], Values(pairs[start..], 0)[..6]);
        Assert.Equal((string[])["0.0", "0.0", "12.5", "0.0"], Values(pairs[start..], 10));
        Assert.DoesNotContain(pairs, p => p.Code is 5 or 100 or 330);
    }

    // 25.4 mm are an inch.
    [Theory]
    [InlineData(DxfVersion.R2000)]
    [InlineData(DxfVersion.R12)]
    public void Inches_divide_every_length_by_25_4(DxfVersion version)
    {
        Shape[] shapes = [Polyline.Segment("CUT", new(25.4, 50.8), new(-12.7, 0)), new Text("TEXT", new(254, 0), 2.54, Math.PI / 2, "A")];
        List<(int Code, string Value)> pairs = Pairs(new Drawing(Layers, shapes), new DxfFormat(version, Inches: true));
        Assert.Equal("1", After(pairs, "$INSUNITS"));
        Assert.Equal("0", After(pairs, "$MEASUREMENT"));
        Assert.Equal("-0.5", After(pairs, "$EXTMIN"));
        List<(int Code, string Value)> line = pairs[pairs.IndexOf((0, "LINE"))..];
        Assert.Equal(("1.0", "2.0", "-0.5"), (Values(line, 10)[0], Values(line, 20)[0], Values(line, 11)[0]));
        List<(int Code, string Value)> text = pairs[pairs.IndexOf((0, "TEXT"))..];
        Assert.Equal(("10.0", "0.1", "90.0"), (Values(text, 10)[0], Values(text, 40)[0], Values(text, 50)[0]));
    }

    [Fact]
    public void The_same_drawing_gives_the_same_bytes()
    {
        var drawing = new Drawing(Layers, [Polyline.Segment("CUT", new(0, 0), new(1, 1)), new Text("TEXT", new(0, 0), 2, 0, "A")]);
        Assert.Equal(DxfWriter.Write(drawing), DxfWriter.Write(drawing));
    }

    [Fact]
    public void Refuses_unknown_and_misnamed_layers()
    {
        Assert.Throws<ArgumentException>(() => DxfWriter.Write(new Drawing(Layers, [Polyline.Segment("OTHER", new(0, 0), new(1, 1))])));
        Assert.Throws<ArgumentException>(() => DxfWriter.Write(new Drawing([new("A B", 1, Pen.Black(0.2))], [])));
        Assert.Throws<ArgumentException>(() => DxfWriter.Write(new Drawing([Layers[0], Layers[0]], [])));
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(1e300)]
    public void Refuses_numbers_that_no_drawing_holds(double x)
    {
        Assert.Throws<ArgumentOutOfRangeException>(
            () => DxfWriter.Write(new Drawing(Layers, [Polyline.Segment("CUT", new(x, 0), new(1, 1))])));
    }

    private static string[] Values(List<(int Code, string Value)> pairs, int code) => [.. pairs.Where(p => p.Code == code).Select(p => p.Value)];

    private static string After(List<(int Code, string Value)> pairs, string variable) => pairs[pairs.IndexOf((9, variable)) + 1].Value;

    private static List<(int Code, string Value)> Entity(string type, Shape shape)
    {
        List<(int Code, string Value)> pairs = Pairs(new Drawing(Layers, [shape]));
        int start = pairs.IndexOf((0, type));
        return [.. pairs.Skip(start + 1).TakeWhile(p => p.Code != 0)];
    }

    private static List<(int Code, string Value)> Pairs(Drawing drawing, DxfFormat format = default)
    {
        string[] lines = Encoding.ASCII.GetString(DxfWriter.Write(drawing, format)).Split('\n');
        return [.. lines.Chunk(2).Where(c => c.Length == 2).Select(c => (int.Parse(c[0], System.Globalization.CultureInfo.InvariantCulture), c[1]))];
    }
}
