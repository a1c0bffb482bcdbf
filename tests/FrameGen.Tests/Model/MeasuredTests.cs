using System.Text.Json;
using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Sizing;
using FrameGen.Tests.Spec;
using Xunit;

namespace FrameGen.Tests.Model;

/// <summary>The tube in hand, from the spec's text to the papers.</summary>
public sealed class MeasuredTests
{
    private const string Loaded = """
        supports: {foot: {hold: [x, y, z, rx, ry, rz]}}
        cases: {push: {loads: [{node: head, force: [0 N, 0 N, -2 kN]}]}}
        targets: [{displacement: {case: push, node: head, along: z, max: 1 mm}}]

        """;

    [Fact]
    public void Takes_the_measures_that_are_written_and_leaves_the_others_nominal()
    {
        Candidate both = Resolve("measured: {posts: {od: 38.06 mm, wall: 1.47 mm}}", out DiagnosticList none)!.Groups[0].Candidates[0];
        Candidate wall = Resolve("measured: {POSTS: {wall: =1.4 mm + 0.07 mm}}", out _)!.Groups[0].Candidates[0];

        Assert.Empty(none);
        Assert.Equal((new RoundTube(38.06, 1.47), new RoundTube(38, 1.5), true), (both.Section, both.Nominal, both.IsMeasured));
        Assert.Equal("round 38 x 1.47 mm", wall.Section.Name);
        Assert.Equal("round 38 x 1.5 mm", wall.Nominal.Name);
    }

    [Theory]
    [InlineData("square 40 x 2 mm", "{height: 40.1 mm}", "square 40.1 x 2 mm")]
    [InlineData("square 40 x 2 mm", "{height: 40.1 mm, width: 39.9 mm, wall: 1.9 mm}", "rect 40.1 x 39.9 x 1.9 mm corner 4 mm")]
    [InlineData("rect 60 x 40 x 2 mm", "{width: 40.2 mm}", "rect 60 x 40.2 x 2 mm")]
    [InlineData("square 40 x 3.2 mm corner 4.8 mm inner 3.2 mm", "{wall: 3.1 mm}", "square 40 x 3.1 mm corner 4.8 mm inner 3.2 mm")]
    [InlineData("ellipse 45 x 28 x 1.5 mm", "{height: 44.8 mm, width: 28.1 mm, wall: 1.48 mm}", "ellipse 44.8 x 28.1 x 1.48 mm")]
    public void Other_shapes_are_measured_by_height_width_and_wall(string section, string measures, string measured) => Assert.Equal(
        measured, Resolve($"measured: {{posts: {measures}}}", out _, section)!.Groups[0].Candidates[0].Section.Name);

    [Fact]
    public void A_rod_is_measured_by_its_diameter() => Assert.Equal(
        new Rod(15.97), Resolve("measured: {posts: {od: 15.97 mm}}", out _, "rod 16 mm")!.Groups[0].Candidates[0].Section);

    [Theory]
    [InlineData("{post: {od: 38.06 mm}}", "round 38 x 1.5 mm", "measured: there is no group post; did you mean 'posts'?")]
    [InlineData("{posts: {od: 42 mm}}", "round 38 x 1.5 mm", "od 42 mm is 10.5 % off round 38 x 1.5 mm: that is another tube")]
    [InlineData("{posts: {wall: 2 mm}}", "round 38 x 1.5 mm", "wall 2 mm is 33.3 % off round 38 x 1.5 mm: that is another tube")]
    [InlineData("{posts: {wall: 4 mm}}", "rod 16 mm", "rod 16 mm has no wall")]
    [InlineData("{posts: {height: 38 mm}}", "round 38 x 1.5 mm", "round 38 x 1.5 mm has no height: it is measured by od")]
    [InlineData("{posts: {od: 40 mm}}", "square 40 x 2 mm", "square 40 x 2 mm has no od: it is measured by height and width")]
    [InlineData("{posts: {od: 9.6 mm, wall: 4.85 mm}}", "round 10 x 4.5 mm", "a wall of 4.85 mm leaves no bore in a tube of 9.6 mm")]
    [InlineData("{posts: {od: =1 mm - 1 mm}}", "round 38 x 1.5 mm", "must be more than 0")]
    public void Says_what_can_not_have_been_measured(string measured, string section, string message)
    {
        Assert.Null(Resolve($"measured: {measured}", out DiagnosticList diagnostics, section));
        Assert.Contains(message, Assert.Single(diagnostics).ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void A_group_that_still_chooses_has_no_tube_to_measure()
    {
        string text = SpecText.Small.Replace("section: round 38 x 1.5 mm", "choose: {stock: en10219, shape: round}", StringComparison.Ordinal);
        var diagnostics = new DiagnosticList();
        Assert.Null(ModelResolver.Resolve(SpecText.Sound(text + "measured: {posts: {od: 38.06 mm}}\n"), diagnostics));
        Assert.Contains("group posts still chooses its size", Assert.Single(diagnostics).Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("od: 38.9 mm", "od 38.9 mm is 2.4 % off")]
    [InlineData("wall: 1.7 mm", "wall 1.7 mm is 13.3 % off")]
    public void Warns_of_more_than_mills_leave(string measure, string message)
    {
        Assert.NotNull(Resolve($"measured: {{posts: {{{measure}}}}}", out DiagnosticList diagnostics));
        Diagnostic warning = Assert.Single(diagnostics);
        Assert.Equal(Severity.Warning, warning.Severity);
        Assert.Contains(message, warning.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Analysis_and_masses_are_those_of_the_measured_tube_under_its_nominal_name()
    {
        // A post of 900 mm, 2 kN along it: u = PL/EA, and m = ρAL, with A = πt(D − t) of the tube in hand.
        const double Area = Math.PI * 1.47 * (38.06 - 1.47);
        ShopPackage package = Plan("measured: {posts: {od: 38.06 mm, wall: 1.47 mm}}");
        using JsonDocument document = JsonDocument.Parse(FrameJson.Write(package));
        JsonElement root = document.RootElement;
        JsonElement group = root.GetProperty("groups").GetProperty("posts");

        Assert.Equal(2000 * 900 / (210_000 * Area), root.GetProperty("targets")[0].GetProperty("value").GetDouble(), 1e-9);
        Assert.Equal(7850e-9 * Area * 900, root.GetProperty("totals").GetProperty("mass_kg").GetDouble(), 1e-8);
        Assert.Equal(("round 38 x 1.5 mm", 38.06, 1.47), (
            group.GetProperty("section").GetString(), group.GetProperty("od_mm").GetDouble(), group.GetProperty("wall_mm").GetDouble()));
    }

    [Fact]
    public void Papers_say_both_sizes()
    {
        IReadOnlyList<OutputFile> files = PaperSet.Create(Plan("measured: {posts: {od: 38.06 mm, wall: 1.47 mm}}"));
        string row = Text(files, "cut-list.csv").Split('\n')[1];

        Assert.Contains(",round 38 x 1.5 mm,", row, StringComparison.Ordinal);
        Assert.EndsWith(",measured round 38.06 x 1.47 mm", row.TrimEnd(), StringComparison.Ordinal);
        Assert.Contains("round 38 x 1.5 mm (measured 38.06 x 1.47 mm)", Text(files, "cut-list.md"), StringComparison.Ordinal);
        Assert.Contains("round 38 x 1.5 mm (measured 38.06 x 1.47 mm)", Text(files, files.Single(f => f.Path.StartsWith("developed/", StringComparison.Ordinal)).Path), StringComparison.Ordinal);
    }

    private static string Text(IReadOnlyList<OutputFile> files, string path) =>
        System.Text.Encoding.UTF8.GetString(files.Single(f => string.Equals(f.Path, path, StringComparison.Ordinal)).Bytes.Span);

    private static FrameModel? Resolve(string added, out DiagnosticList diagnostics, string section = "round 38 x 1.5 mm")
    {
        string text = SpecText.Small.Replace("round 38 x 1.5 mm", section, StringComparison.Ordinal) + added + "\n";
        diagnostics = [];
        return ModelResolver.Resolve(SpecText.Sound(text), diagnostics);
    }

    private static ShopPackage Plan(string added)
    {
        FrameModel model = Resolve(Loaded + added, out DiagnosticList diagnostics)!;
        CutFrame? cut = EndCoper.Cope(SectionSizer.Size(model, diagnostics)!, diagnostics);
        Assert.DoesNotContain(diagnostics, d => d.Severity == Severity.Error);
        return ShopPlanner.Plan(cut!, diagnostics)!;
    }
}
