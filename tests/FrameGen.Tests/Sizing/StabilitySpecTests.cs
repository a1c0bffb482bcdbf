using System.Text.Json;
using FrameGen.Diagnostics;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Sizing;
using FrameGen.Spec;
using FrameGen.Tests.Spec;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>Targets on buckling, vibration and slenderness from the spec's text to frame.json.</summary>
public sealed class StabilitySpecTests
{
    private const string Held = "supports: {foot: {hold: [x, y, z, rx, ry, rz]}}\n";
    private const string Cases = "cases: {push: {loads: [{node: head, force: [0 N, 0 N, -2 kN]}]}, pull: {loads: [{node: head, force: [0 N, 0 N, 1 kN]}]}}\n";

    [Fact]
    public void Binds_names_and_units()
    {
        FrameModel model = Resolve(
            Held + Cases + "targets: [{buckling: {min_factor: 3}}, {buckling: {cases: [pull], min_factor: 4}}, {slenderness: {max: 150, wall: true}}, {slenderness: {max: 90}}, {frequency: {min: 12 Hz}}]",
            out DiagnosticList diagnostics)!;
        Assert.Empty(diagnostics);
        var all = Assert.IsType<BucklingTarget>(model.Targets[0]);
        var some = Assert.IsType<BucklingTarget>(model.Targets[1]);
        var walled = Assert.IsType<SlendernessTarget>(model.Targets[2]);
        var plain = Assert.IsType<SlendernessTarget>(model.Targets[3]);
        var frequency = Assert.IsType<FrequencyTarget>(model.Targets[4]);
        Assert.Equal([0, 1], all.Cases);
        Assert.Equal([1], some.Cases);
        Assert.Equal((3.0, 4.0), (all.MinFactor, some.MinFactor));
        Assert.Equal((150.0, true, 90.0, false), (walled.Max, walled.Wall, plain.Max, plain.Wall));
        Assert.Equal(12, frequency.Min, 1e-12);
        Assert.Equal([0], frequency.Supports);
    }

    [Theory]
    [InlineData(Held + "targets: [{buckling: {min_factor: 3}}]", "buckling target: there are no load cases")]
    [InlineData(Held + Cases + "targets: [{buckling: {cases: [pul], min_factor: 3}}]", "did you mean 'pull'?")]
    [InlineData(Held + "targets: [{buckling: {min_factor: '=1-1'}}]", "`=1-1` must be more than 0; it comes to 0")]
    [InlineData("targets: [{frequency: {min: 3 Hz}}]", "frequency target: nothing holds the frame")]
    public void Says_what_a_target_lacks(string added, string message)
    {
        Assert.Null(Resolve(added, out DiagnosticList diagnostics));
        Assert.Contains(diagnostics, d => d.Severity == Severity.Error && d.Message.Contains(message, StringComparison.Ordinal));
    }

    [Fact]
    public void A_walls_limit_needs_a_yield()
    {
        string text = SpecText.Small.Replace("material: S235", "material: soft", StringComparison.Ordinal)
            + "materials: {soft: {E: 70 GPa, G: 27 GPa, density: 2.7 g/cm3}}\ntargets: [{slenderness: {max: 150, wall: true}}]\n";
        var diagnostics = new DiagnosticList();
        Assert.Null(ModelResolver.Resolve(SpecText.Sound(text), diagnostics));
        Assert.Contains("wall: true needs the yield of soft, the material of group posts", Assert.Single(diagnostics).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Factors_and_frequencies_stand_in_frame_json()
    {
        FrameModel model = Resolve(Held + Cases + "targets: [{buckling: {min_factor: 2}}, {frequency: {min: 1 Hz}}]", out DiagnosticList diagnostics)!;
        SizedFrame sized = SectionSizer.Size(model, diagnostics)!;
        using JsonDocument document = JsonDocument.Parse(JsonText.Bytes(json => FrameJson.WriteObject(json, sized)));
        JsonElement root = document.RootElement;
        Assert.Equal(
            ["format", "spec", "tool", "sizing", "groups", "targets", "cases", "frequencies_hz"], root.EnumerateObject().Select(p => p.Name).ToArray());
        double factor = root.GetProperty("cases").GetProperty("push").GetProperty("buckling_factor").GetDouble();
        Assert.Equal(sized.Cases[0].BucklingFactor!.Value, factor, 1e-8 * factor);
        Assert.Equal(JsonValueKind.Null, root.GetProperty("cases").GetProperty("pull").GetProperty("buckling_factor").ValueKind);
        Assert.Equal(3, root.GetProperty("frequencies_hz").GetArrayLength());

        // The entry's value is that of the worse case, its ratio limit over value.
        JsonElement target = root.GetProperty("targets")[0];
        Assert.Equal(factor, target.GetProperty("value").GetDouble());
        Assert.Equal(2 / factor, target.GetProperty("ratio").GetDouble(), 1e-8);
    }

    private static FrameModel? Resolve(string added, out DiagnosticList diagnostics)
    {
        diagnostics = [];
        FrameSpec spec = SpecText.Sound(SpecText.Small + added + "\n");
        return ModelResolver.Resolve(spec, diagnostics);
    }
}
