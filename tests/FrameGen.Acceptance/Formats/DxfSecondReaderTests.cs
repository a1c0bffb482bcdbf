using System.Text.Json;
using FrameGen.Formats.Drawings;
using FrameGen.Formats.Dxf;
using FrameGen.Geometry;
using FrameGen.Output.Drawings;
using Xunit;

namespace FrameGen.Acceptance.Formats;

/// <summary>Every version and unit of our DXF read by GDAL, which shares no code with the other reader.</summary>
public class DxfSecondReaderTests
{
    public static TheoryData<DxfVersion, bool> Formats => new()
    {
        { DxfVersion.R2000, false }, { DxfVersion.R2000, true }, { DxfVersion.R12, false }, { DxfVersion.R12, true },
    };

    [Theory]
    [MemberData(nameof(Formats))]
    public void Lines_come_back_where_they_are(DxfVersion version, bool inches)
    {
        foreach (string name in (string[])["168 mm tube, asymmetric double cope", "16 mm tube at 35 degrees", "inches on letter, targets missed"])
        {
            (var package, var part) = DrawnTubes.Named(name).Build();
            foreach (Drawing drawing in (Drawing[])[DevelopedPattern.Draw(package, part), TemplatePieces.Draw(package, part)!])
            {
                Drawing whole = CheckSquare.Beside(drawing, inches);
                using JsonDocument read = Read(DxfWriter.Write(whole, new DxfFormat(version, inches)));
                Same(whole, read.RootElement, inches ? 25.4 : 1);
            }
        }
    }

    /// <summary>The square is 100 mm or 4 in on a side, whatever unit the file is in, and stands apart from what is cut.</summary>
    [Theory]
    [MemberData(nameof(Formats))]
    public void The_check_square_has_its_size(DxfVersion version, bool inches)
    {
        (var package, var part) = DrawnTubes.Named("miter").Build();
        Drawing drawing = CheckSquare.Beside(DevelopedPattern.Draw(package, part), inches);
        using JsonDocument read = Read(DxfWriter.Write(drawing, new DxfFormat(version, inches)));
        double[][] square = Points(Lines(read.RootElement, PaperLayers.Check).Single());
        double side = inches ? 4 : 100;
        Assert.Equal(side, square.Max(p => p[0]) - square.Min(p => p[0]), 1e-6);
        Assert.Equal(side, square.Max(p => p[1]) - square.Min(p => p[1]), 1e-6);
        double[][] cut = Points(Lines(read.RootElement, PaperLayers.Cut).Single());
        Assert.True(square.Min(p => p[0]) > cut.Max(p => p[0]));
        Assert.Contains(
            read.RootElement.GetProperty("features").EnumerateArray(),
            f => f.GetProperty("properties").TryGetProperty("Text", out JsonElement words) && words.GetString()!.Contains(inches ? "4 in" : "100 mm", StringComparison.Ordinal));
    }

    private static void Same(Drawing drawing, JsonElement read, double unit)
    {
        Polyline[] drawn = [.. drawing.Shapes.OfType<Polyline>()];
        JsonElement[] lines = [.. read.GetProperty("features").EnumerateArray().Where(f => f.GetProperty("geometry").GetProperty("type").GetString() is not "Point")];
        Assert.Equal(drawn.Length, lines.Length);
        for (int i = 0; i < drawn.Length; i++)
        {
            Assert.Equal(drawn[i].Layer, lines[i].GetProperty("properties").GetProperty("Layer").GetString());

            // GDAL repeats the first point of a closed line at its end.
            double[][] points = Points(lines[i]);
            Assert.Equal(drawn[i].Points.Count + (drawn[i].Closed ? 1 : 0), points.Length);
            for (int k = 0; k < drawn[i].Points.Count; k++)
            {
                Point2 wanted = drawn[i].Points[k];
                Assert.Equal(wanted.X, points[k][0] * unit, 2e-5);
                Assert.Equal(wanted.Y, points[k][1] * unit, 2e-5);
            }
        }
    }

    private static IEnumerable<JsonElement> Lines(JsonElement read, string layer) => read.GetProperty("features").EnumerateArray().Where(
        f => f.GetProperty("properties").GetProperty("Layer").GetString() == layer && f.GetProperty("geometry").GetProperty("type").GetString() is not "Point");

    private static double[][] Points(JsonElement feature)
    {
        JsonElement geometry = feature.GetProperty("geometry");
        JsonElement places = geometry.GetProperty("coordinates");
        if (geometry.GetProperty("type").GetString() is "Polygon")
        {
            places = places[0];
        }

        return [.. places.EnumerateArray().Select(p => new[] { p[0].GetDouble(), p[1].GetDouble() })];
    }

    private static JsonDocument Read(byte[] file)
    {
        ForeignProgram reader = ForeignProgram.Find("ogr2ogr");
        using var folder = new ScratchFolder();
        string json = folder["read.json"];
        reader.Run("-f", "GeoJSON", "-lco", "COORDINATE_PRECISION=7", json, folder.Write("drawing.dxf", file));
        return JsonDocument.Parse(File.ReadAllText(json));
    }
}
