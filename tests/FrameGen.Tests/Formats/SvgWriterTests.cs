using System.Globalization;
using System.Text;
using System.Xml.Linq;
using FrameGen.Formats.Drawings;
using FrameGen.Formats.Svg;
using Xunit;

namespace FrameGen.Tests.Formats;

/// <summary>Pictures, read back by an XML reader.</summary>
public sealed class SvgWriterTests
{
    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";

    private static readonly Drawing Sheet = new(
        [new Layer("CUT", 1, new Pen(0.35, new Ink(1, 0, 0.5), [2, 1])), new Layer("TEXT", 7, Pen.Black(0.2))],
        [
            new Polyline("CUT", [new(10, 20), new(110, 20), new(110, 130)], Closed: true),
            Polyline.Segment("CUT", new(10, 20), new(12.3456, 20)),
            new Text("TEXT", new(40, 50), 7.18, Math.PI / 2, "a < b & c"),
        ]);

    [Fact]
    public void Is_as_large_as_the_drawing_and_its_margin()
    {
        XElement root = Root(SvgWriter.Write(Sheet, "A sheet", margin: 5));
        Assert.Equal(("110mm", "120mm", "0 0 110 120"), (root.Attribute("width")!.Value, root.Attribute("height")!.Value, root.Attribute("viewBox")!.Value));
        Assert.Equal("A sheet", root.Element(Svg + "title")!.Value);
    }

    // The drawing's left top corner is at 10, 130; 5 mm of margin; y runs down.
    [Fact]
    public void Lines_stand_where_they_are_drawn_with_y_turned_down()
    {
        XElement group = Root(SvgWriter.Write(Sheet, margin: 5)).Elements(Svg + "g").First();
        Assert.Equal(["M5 115L105 115L105 5Z", "M5 115L7.346 115"], group.Elements(Svg + "path").Select(p => p.Attribute("d")!.Value));
        Assert.Equal(("#ff0080", "0.35", "2 1"), (
            group.Attribute("stroke")!.Value, group.Attribute("stroke-width")!.Value, group.Attribute("stroke-dasharray")!.Value));
    }

    [Fact]
    public void Text_is_turned_the_right_way_and_keeps_its_letters()
    {
        XElement text = Root(SvgWriter.Write(Sheet, margin: 5)).Descendants(Svg + "text").Single();
        Assert.Equal(("a < b & c", "translate(35 85) rotate(-90)"), (text.Value, text.Attribute("transform")!.Value));

        // Capitals of Helvetica are 718 of 1000 high (its font metrics).
        Assert.Equal(10, double.Parse(text.Attribute("font-size")!.Value, CultureInfo.InvariantCulture), 5e-4);
    }

    [Fact]
    public void Refuses_a_drawing_without_shapes_and_a_shape_without_its_layer()
    {
        Assert.Throws<ArgumentException>(() => SvgWriter.Write(new Drawing([], [])));
        Assert.Throws<ArgumentException>(() => SvgWriter.Write(new Drawing([], Sheet.Shapes)));
    }

    private static XElement Root(byte[] bytes) => XDocument.Parse(Encoding.UTF8.GetString(bytes)).Root!;
}
