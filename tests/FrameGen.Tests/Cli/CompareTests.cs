using System.Text;
using System.Text.Json;
using System.Xml.Linq;
using FrameGen.Cli;
using FrameGen.Tests.Output.Folders;
using Xunit;

namespace FrameGen.Tests.Cli;

/// <summary>The comparison from the command line.</summary>
public sealed class CompareTests : IDisposable
{
    private const string Spec = """
        framegen: 1
        nodes: {wall: [0 mm, 0 mm, 0 mm], tip: [600 mm, 0 mm, 0 mm]}
        tubes: {arm: {from: wall, to: tip, group: arms}}
        groups: {arms: {material: S235, section: round 40 x 2 mm}}
        stock: {yard: {material: S235, price_per_m: 6.4, sizes: [round 38 x 2.5 mm, round 50 x 2.5 mm, square 45 x 3 mm]}}

        """;

    private readonly ScratchFolder _scratch = new();

    public void Dispose() => _scratch.Dispose();

    // PL³/3δ = 500 N (600 mm)³/(3 · 2 mm) = 18 kN.m2; PL³/48δ and PL³/192δ are a sixteenth and a sixty-fourth of it.
    [Theory]
    [InlineData("cantilever", 18000)]
    [InlineData("simply-supported", 1125)]
    [InlineData("fixed-fixed", 281.25)]
    public void A_span_asks_for_its_stiffness(string span, double need)
    {
        using JsonDocument document = Json("--as", span, "--load", "0.5 kN", "--length", "600 mm", "--max-deflection", "2 mm");
        Assert.Equal(need, document.RootElement.GetProperty("need").GetProperty("bending_nm2").GetDouble(), 1e-9 * need);
    }

    // The same stiffness in S235: a square bar's side is (12 EI/E)^(1/4) = (12 · 18e9/210000)^(1/4) = 31.8463 mm, 7.961 kg/m; a round tube of D/t = 20
    // weighs 33.1552 % of it (the classic table of such ratios).
    [Fact]
    public void Rows_are_those_of_the_classic_table()
    {
        using JsonDocument document = Json("--min-bending-stiffness", "18000 N.m2", "--material", "S235");
        JsonElement[] rows = [.. document.RootElement.GetProperty("materials")[0].GetProperty("shapes").EnumerateArray()];
        Assert.Equal(["square bar", "rod", "round", "square", "rect", "ellipse"], rows.Select(r => r.GetProperty("shape").GetString()));
        Assert.Equal(Math.Pow(12 * 18e9 / 210_000, 0.25), rows[0].GetProperty("height_mm").GetDouble(), 1e-6);
        Assert.Equal((1.0, 0.331552), (Math.Round(rows[0].GetProperty("relative").GetDouble(), 9), Math.Round(rows[2].GetProperty("relative").GetDouble(), 6)));
    }

    [Fact]
    public void A_tube_of_a_spec_is_compared_at_the_stiffness_that_it_has()
    {
        _scratch.Write("arm.yaml", Spec);
        using JsonDocument document = Json(_scratch["arm.yaml"], "ARM", "--material", "S235", "--wall-ratio", "20");
        JsonElement root = document.RootElement;

        // I = π (40⁴ − 36⁴)/64 = 43 216 mm4; of itself the same tube weighs 100 %, at its own D/t of 20.
        Assert.Equal(210_000 * Math.PI * (Math.Pow(40, 4) - Math.Pow(36, 4)) / 64 / 1e6, root.GetProperty("need").GetProperty("bending_nm2").GetDouble(), 1e-4);
        JsonElement round = root.GetProperty("materials")[0].GetProperty("shapes").EnumerateArray().Single(r => r.GetProperty("shape").GetString() is "round");
        Assert.Equal((40.0, 2.0, 1.0), (
            Math.Round(round.GetProperty("height_mm").GetDouble(), 6), Math.Round(round.GetProperty("wall_mm").GetDouble(), 6), Math.Round(round.GetProperty("relative").GetDouble(), 8)));
    }

    [Fact]
    public void A_member_target_says_what_its_tube_is_compared_for()
    {
        _scratch.Write("arm.yaml", Spec + "targets: [{member: {tube: arm, as: cantilever, load: 100 N, max_deflection: 2 mm, along: top}}]\n");
        using JsonDocument document = Json(_scratch["arm.yaml"], "arm");
        JsonElement need = document.RootElement.GetProperty("need");
        Assert.Equal((3600.0, "top"), (Math.Round(need.GetProperty("bending_nm2").GetDouble(), 6), need.GetProperty("along").GetString()));
    }

    // 38 x 2.5 mm has I = π (38⁴ − 33⁴)/64 = 44 140 mm4, more than 40 x 2 mm, and is lighter than the built-in lists' 38 x 2.6 mm.
    [Fact]
    public void Prices_of_the_spec_s_lists_are_shown()
    {
        _scratch.Write("arm.yaml", Spec);
        string output = Run("compare", _scratch["arm.yaml"], "arm", "--material", "S235", "--wall", "2.5 mm").Output;
        Assert.Matches(@"round .* 38x2\.5 +2\.19 +6\.40\n", output);
        Assert.Contains("Walls: 2.5 mm at least.", output.ReplaceLineEndings(" "), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--as", "cantilever", "--load", "500 N", "--length", "600 mm", "--max-deflection", "2 mm")]
    [InlineData("--min-bending-stiffness", "6885 N.m2", "--along", "weaker", "--material", "S235,6082-T6", "--wall-ratio", "10,20,40")]
    [InlineData("--min-torsional-stiffness", "30000 N.m2", "--thin-wall")]
    public void Tables_fit_an_old_terminal(params string[] options)
    {
        (int code, string output, string error) = Run(["compare", .. options]);
        Assert.Equal((0, string.Empty), (code, error));
        Assert.All(output.Split('\n'), line => Assert.InRange(line.Length, 0, 80));
        Assert.DoesNotContain("sq\n", output, StringComparison.Ordinal);
        Assert.Contains(" square ", output, StringComparison.Ordinal);
    }

    [Fact]
    public void The_plot_is_a_picture_with_a_curve_for_each_shape_and_metal()
    {
        string file = _scratch["plot.svg"];
        Assert.Equal(0, Run("compare", "--min-bending-stiffness", "6885 N.m2", "--material", "S235,6082-T6", "--svg", file).Code);
        XDocument picture = XDocument.Parse(Encoding.UTF8.GetString(File.ReadAllBytes(file)));
        string[] texts = [.. picture.Descendants().Where(e => e.Name.LocalName is "text").Select(e => e.Value)];
        Assert.Contains("mass, kg/m", texts);
        Assert.Contains("6082-T6", texts);
        int curves = picture.Descendants().Count(e => e.Name.LocalName is "path" && e.Attribute("d")!.Value.Count(c => c is 'L') > 40);
        Assert.Equal(2 * 4, curves);

        // A plot is drawn over a plot, and over nothing else.
        Assert.Equal(0, Run("compare", "--min-bending-stiffness", "100 N.m2", "--material", "S235", "--svg", file).Code);
        _scratch.Write("notes.txt", "bought three bars");
        Assert.Equal(2, Run("compare", "--min-bending-stiffness", "100 N.m2", "--material", "S235", "--svg", _scratch["notes.txt"]).Code);
        Assert.Equal("bought three bars", File.ReadAllText(_scratch["notes.txt"]));
    }

    [Theory]
    [InlineData("nothing to compare for")]
    [InlineData("--as takes cantilever, simply-supported or fixed-fixed, and is cantilver; did you mean 'cantilever'?", "--as", "cantilver")]
    [InlineData("--load is missing: expected a force", "--as", "cantilever")]
    [InlineData("--load: expected a force", "--as", "cantilever", "--load", "500 mm")]
    [InlineData("`-2 mm` must be more than 0", "--as", "cantilever", "--load", "1 N", "--length", "1 m", "--max-deflection", "-2 mm")]
    [InlineData("--wall-ratio is outer size over wall, more than 2, and is 1.5", "--min-bending-stiffness", "1 N.m2", "--wall-ratio", "1.5")]
    [InlineData("there is no material S23", "--min-bending-stiffness", "1 N.m2", "--material", "S23")]
    [InlineData("there is no file nowhere.yaml", "nowhere.yaml", "arm")]
    [InlineData("--by says what of a tube of a spec is kept", "--min-bending-stiffness", "1 N.m2", "--by", "torsion")]
    public void Says_what_makes_no_comparison(string message, params string[] options)
    {
        (int code, _, string error) = Run(["compare", .. options]);
        Assert.Equal(2, code);
        Assert.Contains(message, error, StringComparison.Ordinal);
    }

    [Fact]
    public void Names_the_tubes_where_none_or_a_wrong_one_is_named()
    {
        _scratch.Write("arm.yaml", Spec);
        Assert.Contains("It has arm", Run("compare", _scratch["arm.yaml"]).Error, StringComparison.Ordinal);
        Assert.Contains("did you mean 'arm'?", Run("compare", _scratch["arm.yaml"], "arn").Error, StringComparison.Ordinal);
    }

    private static JsonDocument Json(params string[] options)
    {
        (int code, string output, string error) = Run(["compare", .. options, "--json"]);
        Assert.Equal((0, string.Empty), (code, error));
        return JsonDocument.Parse(output);
    }

    private static (int Code, string Output, string Error) Run(params string[] arguments)
    {
        using var output = new StringWriter();
        using var error = new StringWriter();
        int code = CommandLine.Run(arguments, output, error);
        return (code, output.ToString(), error.ToString());
    }
}
