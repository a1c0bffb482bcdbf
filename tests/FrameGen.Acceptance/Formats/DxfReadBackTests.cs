using System.Text.Json;
using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Formats.Dxf;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Output.Drawings;
using Xunit;

namespace FrameGen.Acceptance.Formats;

/// <summary>DXF files audited and read by ezdxf.</summary>
public class DxfReadBackTests
{
    // Prints a JSON array, an object a file: what the audit found, header units, texts, lines.
    private const string ReadScript = """
        import sys, json, ezdxf
        from ezdxf.tools.text import plain_text
        from ezdxf.lldxf.encoding import decode_dxf_unicode
        def read(file):
            doc = ezdxf.readfile(file)
            audit = doc.audit()
            lines = []
            texts = []
            for e in doc.modelspace():
                if e.dxftype() == 'LWPOLYLINE':
                    lines.append({'layer': e.dxf.layer, 'closed': bool(e.closed), 'points': [[p[0], p[1]] for p in e.get_points()]})
                elif e.dxftype() == 'LINE':
                    lines.append({'layer': e.dxf.layer, 'closed': False, 'points': [list(e.dxf.start)[:2], list(e.dxf.end)[:2]]})
                elif e.dxftype() == 'TEXT':
                    texts.append(plain_text(decode_dxf_unicode(e.dxf.text)))
            return {'version': doc.dxfversion, 'errors': [e.message for e in audit.errors], 'fixes': [e.message for e in audit.fixes],
                'insunits': doc.header['$INSUNITS'], 'measurement': doc.header['$MEASUREMENT'],
                'layers': sorted(l.dxf.name for l in doc.layers if l.dxf.name != 'Defpoints'), 'lines': lines, 'texts': texts}
        print(json.dumps([read(file) for file in sys.argv[1:]]))
        """;

    [Fact]
    public void A_strict_reader_finds_nothing_to_mend()
    {
        Drawing[] drawings =
        [
            .. DrawnTubes.Names.Select(n => DrawnTubes.Named(n.Data).Build())
                .SelectMany(t => (Drawing?[])[DevelopedPattern.Draw(t.Package, t.Part), TemplatePieces.Draw(t.Package, t.Part)]).OfType<Drawing>(),
            new Drawing(PaperLayers.All, []),
        ];
        Assert.True(drawings.Length > 15);
        foreach ((Drawing drawing, JsonElement read) in drawings.Zip(Read(drawings)))
        {
            Assert.Empty(read.GetProperty("errors").EnumerateArray());
            Assert.Empty(read.GetProperty("fixes").EnumerateArray());
            Assert.Equal("AC1015", read.GetProperty("version").GetString());
            Assert.Equal(4, read.GetProperty("insunits").GetInt32());
            Assert.Equal(1, read.GetProperty("measurement").GetInt32());
            string layers = string.Join(' ', read.GetProperty("layers").EnumerateArray().Select(l => l.GetString()));
            Assert.Equal("0 CHECK CUT SCRIBE TAB TEXT TRIM", layers);
            Assert.Equal(drawing.Shapes.OfType<Polyline>().Count(), read.GetProperty("lines").GetArrayLength());
            Assert.Equal(drawing.Shapes.OfType<Text>().Count(), read.GetProperty("texts").GetArrayLength());
        }
    }

    // One percent sign more is parted by a space: no reader prints two in a row alike.
    [Theory]
    [InlineData("Caf\u00E9 \u00D8 38 \u2116 5", "Caf\u00E9 \u00D8 38 \u2116 5")]
    [InlineData("a^Ib^ c", "a^Ib^ c")]
    [InlineData("tilt %%d %%c", "tilt % %d % %c")]
    [InlineData("\\U+00B0 and {\\H2x;big}", "\\U+00B0 and {\\H2x;big}")]
    public void Codes_of_the_format_in_a_title_are_printed_as_text(string text, string printed)
    {
        JsonElement read = Read(new Drawing(PaperLayers.All, [new Text(PaperLayers.Text, new(0, 0), 2, 0, text)]));
        Assert.Empty(read.GetProperty("errors").EnumerateArray());
        Assert.Equal(printed, read.GetProperty("texts")[0].GetString());
    }

    /// <summary>
    /// The cut line of the file, rolled onto the tube, lies on the mates and inside none of them. Two mates at different
    /// clock angles and slopes: a mirrored, turned or swapped pattern would miss them.
    /// </summary>
    [Fact]
    public void A_developed_pattern_rolled_back_lies_on_its_mates()
    {
        const double length = 700;
        (double Radius, double Angle, double Clock)[] mates = [(22, 50, 1.0), (20, 75, 3.9)];
        Func<double, double> Cut(double r) => DrawnTube.Deeper(
            DrawnTube.Saddle(r, mates[0].Radius, mates[0].Angle, 0, mates[0].Clock),
            DrawnTube.Saddle(r, mates[1].Radius, mates[1].Angle, 0, mates[1].Clock));
        DrawnTube tube = new(new RoundTube(38, 1.5), length) { From = Cut(19), To = Cut(19), Mates = ["bow", "shaft"] };
        (ShopPackage package, Part part) = tube.Build();

        JsonElement read = Read(DevelopedPattern.Draw(package, part));
        JsonElement line = read.GetProperty("lines").EnumerateArray().Single(l => string.Equals(l.GetProperty("layer").GetString(), "CUT", StringComparison.Ordinal));
        Assert.True(line.GetProperty("closed").GetBoolean());

        // The tube's own axes, written out apart from the program: x along it, z the top line, clockwise seen along x.
        Vector3 Wall(double clock) => new(0, -Math.Sin(clock), Math.Cos(clock));
        int looked = 0;
        foreach (JsonElement p in line.GetProperty("points").EnumerateArray())
        {
            (double x, double y) = (p[0].GetDouble(), p[1].GetDouble());
            Vector3 point = new Vector3(y, 0, 0) + (19 * Wall(x / 19));
            bool isFrom = y < length / 2;
            Vector3 node = isFrom ? Vector3.Zero : new(length, 0, 0);
            double[] outside =
            [
                .. mates.Select(m =>
                {
                    double angle = m.Angle * Math.PI / 180;
                    Vector3 away = (Math.Cos(angle) * (isFrom ? 1 : -1) * Vector3.UnitX) + (Math.Sin(angle) * Wall(m.Clock));
                    return away.Cross(point - node).Length - m.Radius;
                }),
            ];
            Assert.Equal(0, outside.Min(), 1e-5);
            looked++;
        }

        Assert.True(looked > 1000);
    }

    /// <summary>y is kept but for a shift, x but for a shift and the paper's scale, both as the piece says.</summary>
    [Fact]
    public void A_template_is_the_pattern_shifted_and_widened()
    {
        (ShopPackage package, Part part) = DrawnTubes.Named("equal tubes at 90 degrees").Build();
        TemplatePiece[] pieces = [.. TemplatePieces.Of(package, part)];
        JsonElement read = Read(TemplatePieces.Draw(package, part)!);
        JsonElement[] cuts = [.. read.GetProperty("lines").EnumerateArray().Where(l => string.Equals(l.GetProperty("layer").GetString(), "CUT", StringComparison.Ordinal))];
        Assert.Equal(2, cuts.Length);
        Func<double, double>[] lines = [DrawnTube.Saddle(19, 19, 90, 0, 1), c => 846 - DrawnTube.Saddle(19, 25, 60, 4, 2)(c)];
        for (int i = 0; i < 2; i++)
        {
            JsonElement[] points = [.. cuts[i].GetProperty("points").EnumerateArray()];

            // The last two are the base edge's corners.
            foreach (JsonElement p in points[..^2])
            {
                double clock = (p[0].GetDouble() - pieces[i].Shift.X) / (19 * 19.05 / 19);
                Assert.Equal(lines[i](clock), p[1].GetDouble() - pieces[i].Shift.Y, 2e-6);
            }

            string shift = string.Create(System.Globalization.CultureInfo.InvariantCulture, $"shift x {pieces[i].Shift.X:0} mm, y {pieces[i].Shift.Y:0} mm");
            string words = string.Join(' ', pieces[i].Drawing.Shapes.OfType<Text>().Select(t => t.Content));
            Assert.Contains(shift, words, StringComparison.Ordinal);
            Assert.Contains("x scale 1.002632", words, StringComparison.Ordinal);
        }
    }

    private static JsonElement Read(Drawing drawing) => Read([drawing])[0];

    private static JsonElement[] Read(Drawing[] drawings)
    {
        ForeignProgram python = ForeignProgram.Python("ezdxf");
        using var folder = new ScratchFolder();
        string script = folder.Write("read.py", ReadScript);
        string[] files = [.. drawings.Select((d, i) => folder.Write($"drawing-{i}.dxf", DxfWriter.Write(d)))];
        using var json = JsonDocument.Parse(python.Run([script, .. files]));
        return [.. json.RootElement.EnumerateArray().Select(e => e.Clone())];
    }
}
