using System.Globalization;
using System.Text.Json;
using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>A frame with bent tubes from its spec to its papers: meshes in another program, lengths and masses from closed forms.</summary>
public class BentBuildTests
{
    // A hoop, a stay bent in space and coped at both ends, and a crank of square ends that stands free.
    private const string Text = """
        framegen: 1
        title: Bent tubes
        mirror: {across: y, suffix: [-l, -r]}
        groups:
          main: {material: S235, section: round 30 x 2 mm}
          thin: {material: S235, section: round 20 x 2 mm}
        nodes:
          foot-l: [0 mm, 400 mm, 0 mm]
          top-l: [0 mm, 400 mm, 800 mm]
          mid-l: {on: hoop, distance: 300 mm}
          end-l: [600 mm, 400 mm, 0 mm]
          k1-l: [600 mm, 650 mm, 0 mm]
          k2-l: [300 mm, 650 mm, 250 mm]
          far-l: [2000 mm, 200 mm, 0 mm]
          c1-l: [2300 mm, 200 mm, 0 mm]
          c2-l: [2300 mm, 500 mm, 0 mm]
          tip-l: [2300 mm, 500 mm, 300 mm]
        tubes:
          base-l: {from: foot-l, to: end-l, group: main}
          hoop: {from: foot-l, to: foot-r, via: [top-l, top-r], bend_radius: 150 mm, group: main}
          loop-l: {from: end-l, to: mid-l, via: [k1-l, k2-l], bend_radius: 60 mm, group: thin}
          crank-l: {from: far-l, to: tip-l, via: [c1-l, c2-l], bend_radius: 80 mm, group: main}
        fabrication: {grip: 100 mm, springback: 3 %}

        """;

    [Fact]
    public void A_bent_tube_is_as_long_and_heavy_as_its_straights_and_arcs()
    {
        using BuiltFrame built = BuiltFrame.FromText(Text).Succeeded();
        JsonElement crank = built.FrameJson().GetProperty("tubes").GetProperty("crank-l");

        // 900 mm of sides less four tangents of 80 mm, and two quarter circles; S235 at 7.85 kg/dm³.
        double length = 900 - 320 + (80 * Math.PI);
        Assert.Equal(length, crank.GetProperty("axis_length_mm").GetDouble(), 1e-5);
        Assert.Equal(length, crank.GetProperty("cut_length_mm").GetDouble(), 1e-5);
        Assert.Equal(7.85e-6 * Math.PI * ((15 * 15) - (13 * 13)) * length, crank.GetProperty("mass_kg").GetDouble(), 1e-8);
        IReadOnlyDictionary<string, string>[] rows = [.. built.Csv("bends.csv").Where(r => r["tube"] == "crank-l")];
        Assert.Equal(["220.000", "140.000"], rows.Select(r => r["straight_mm"]));
        Assert.Equal(["0.000", "90.000"], rows.Select(r => r["rotation_deg"]));
        Assert.Equal(["90.000", "90.000"], rows.Select(r => r["angle_deg"]));
        Assert.Equal((220 + (40 * Math.PI) + 140).ToString("0.000", CultureInfo.InvariantCulture), rows[1]["start_mm"]);
        Assert.Equal(92.7, crank.GetProperty("bends")[0].GetProperty("machine_angle_deg").GetDouble(), 1e-6);
        Assert.Contains("| set to |", File.ReadAllText(built.PathOf("bends.md")), StringComparison.Ordinal);
        Assert.Contains("2 bends", built.Csv("cut-list.csv").Single(r => r["tubes"] == "crank-l")["note"], StringComparison.Ordinal);
        Assert.Equal(["A", "B"], built.Csv("cut-list.csv").Where(r => r["tubes"].StartsWith("loop", StringComparison.Ordinal)).Select(r => r["hand"]).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Admesh_finds_nothing_to_mend_in_bent_tubes()
    {
        using BuiltFrame built = BuiltFrame.FromText(Text).Succeeded();
        JsonElement frame = built.FrameJson();
        foreach (JsonElement part in frame.GetProperty("parts").EnumerateArray())
        {
            StlReport report = StlReport.Of(built.PathOf("preview", BuiltFrame.FileOf(part) + ".stl"));
            Assert.True(report.Clean, $"{part.GetProperty("mark")}: {report}");
            double volume = frame.GetProperty("tubes").GetProperty(part.GetProperty("tubes")[0].GetString()!).GetProperty("volume_mm3").GetDouble();
            Assert.InRange(report.Volume / volume, 0.999, 1.0005);
        }

        Assert.True(StlReport.Of(built.PathOf("preview", "frame.stl")).Clean);
    }
}
