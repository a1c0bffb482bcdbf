using System.Globalization;
using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Tests.Spec;

namespace FrameGen.Tests.Joints;

/// <summary>Small frames with bent tubes, from the spec's text to cut tubes and parts.</summary>
internal static class BentFrame
{
    public static CutFrame Cut(string text)
    {
        (CutFrame? cut, DiagnosticList diagnostics) = Try(text);
        Xunit.Assert.True(cut is not null, string.Join("\n", diagnostics));
        return cut;
    }

    public static (CutFrame? Cut, DiagnosticList Diagnostics) Try(string text)
    {
        var diagnostics = new DiagnosticList();
        var pipeline = new FramePipeline(diagnostics);
        return (pipeline.Cope(pipeline.Size(pipeline.Resolve(SpecText.Sound(text)))), diagnostics);
    }

    public static ShopPackage Planned(string text) =>
        ShopPlanner.Plan(Cut(text), []) ?? throw new InvalidOperationException("no stock plan");

    /// <summary>One tube alone through corners, ends square.</summary>
    public static string Alone(string section, double radius, IReadOnlyList<Vector3> corners, string more = "")
    {
        string nodes = string.Join("\n", corners.Select((c, i) => $"  n{i}: {At(c)}"));
        string via = string.Join(", ", Enumerable.Range(1, corners.Count - 2).Select(i => $"n{i}"));
        string bow = string.Create(CultureInfo.InvariantCulture, $"from: n0, to: n{corners.Count - 1}, via: [{via}], bend_radius: {radius} mm, group: main{more}");
        return $$"""
            framegen: 1
            groups:
              main: {material: S235, section: {{section}} }
            nodes:
            {{nodes}}
            tubes:
              bow: { {{bow}} }

            """;
    }

    public static string At(Vector3 v) => string.Create(CultureInfo.InvariantCulture, $"[{v.X:R} mm, {v.Y:R} mm, {v.Z:R} mm]");
}
