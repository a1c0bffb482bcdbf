using System.Text;
using System.Text.Json;
using FrameGen.Output;
using FrameGen.Sizing;
using FrameGen.Tests.Fabrication;
using Xunit;

namespace FrameGen.Tests.Output;

public class FrameJsonTests
{
    [Fact]
    public void Has_the_agreed_keys()
    {
        using JsonDocument document = JsonDocument.Parse(FrameJson.Write(GateFrame.Package()));
        JsonElement root = document.RootElement;
        Assert.Equal(
            ["format", "spec", "tool", "sizing", "groups", "targets", "cases", "tubes", "parts", "stock_plan", "totals"],
            root.EnumerateObject().Select(p => p.Name).ToArray());
        Assert.Equal("framegen-frame/1", root.GetProperty("format").GetString());
        Assert.Equal(
            ["material", "section", "shape", "od_mm", "wall_mm", "area_mm2", "iy_mm4", "iz_mm4", "j_mm4", "mass_kg_per_m", "candidates"],
            root.GetProperty("groups").GetProperty("rails").EnumerateObject().Select(p => p.Name).ToArray());
        Assert.Equal(
            ["nodes", "reactions", "tubes", "buckling_factor"], root.GetProperty("cases").GetProperty("standing").EnumerateObject().Select(p => p.Name).ToArray());
        Assert.Equal(
            ["mass_kg", "centre_of_mass_mm", "weld_length_mm", "outer_area_m2", "cost"],
            root.GetProperty("totals").EnumerateObject().Select(p => p.Name).ToArray());
        Assert.Equal(JsonValueKind.Null, root.GetProperty("totals").GetProperty("cost").ValueKind);
        Assert.Equal(
            ["material", "section", "bar_mm", "bars", "lower_bound", "cuts", "offcut_mm"],
            root.GetProperty("stock_plan")[0].EnumerateObject().Select(p => p.Name).ToArray());
    }

    [Fact]
    public void End_curves_run_every_five_degrees_in_the_pattern_s_y()
    {
        using JsonDocument document = JsonDocument.Parse(FrameJson.Write(GateFrame.Package()));
        JsonElement ends = document.RootElement.GetProperty("tubes").GetProperty("post").GetProperty("ends");
        double[][] from = Rows(ends.GetProperty("from").GetProperty("curve"));
        Assert.Equal(72, from.Length);
        Assert.Equal(-180, from[0][0]);
        Assert.Equal(175, from[71][0]);

        // The classic saddle at clock 90: sqrt(R^2 - r^2).
        double[] side = from.Single(r => r[0] == 90);
        Assert.Equal(Math.Sqrt((20 * 20) - (15 * 15)), side[1], 1e-7);
        Assert.Equal(Math.Sqrt((20 * 20) - (13.5 * 13.5)), side[2], 1e-7);

        // The miter: short by the radius on the arm's side, which is clock 0; y = 600 - t.
        double[] inside = Rows(ends.GetProperty("to").GetProperty("curve")).Single(r => r[0] == 0);
        Assert.Equal([0, 585, 586.5], inside);
    }

    [Fact]
    public void Rounding_noise_prints_as_zero_and_numbers_with_nine_digits()
    {
        string text = Encoding.UTF8.GetString(FrameJson.Write(GateFrame.Package()));
        Assert.Contains("\"displacement_mm\": [0, 0, -0.5]", text, StringComparison.Ordinal);
        Assert.Contains("\"axial_n\": [0, 0]", text, StringComparison.Ordinal);
        Assert.Contains("\"area_mm2\": 238.761042", text, StringComparison.Ordinal); // pi x 2 x 38
        Assert.DoesNotContain("\r", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Texts_of_the_user_come_back_as_they_were()
    {
        const string Title = "gate \"A\" \\ {{ 1 }} \u0001 é ☃ </script>";
        using JsonDocument document = JsonDocument.Parse(FrameJson.Write(GateFrame.Package(Title)));
        Assert.Equal(Title, document.RootElement.GetProperty("spec").GetProperty("title").GetString());
    }

    [Fact]
    public void Unmet_targets_are_in_it()
    {
        using JsonDocument document = JsonDocument.Parse(FrameJson.Write(GateFrame.Package(status: SizingStatus.Unmet)));
        Assert.Equal("unmet", document.RootElement.GetProperty("sizing").GetProperty("status").GetString());
        Assert.False(document.RootElement.GetProperty("targets")[0].GetProperty("met").GetBoolean());
    }

    private static double[][] Rows(JsonElement rows) =>
        [.. rows.EnumerateArray().Select(r => r.EnumerateArray().Select(n => n.GetDouble()).ToArray())];
}
