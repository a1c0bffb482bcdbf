using System.Text.Json;
using FrameGen.Cli;
using FrameGen.Tests.Output.Folders;
using Xunit;

namespace FrameGen.Tests.Cli;

/// <summary>Whole runs of the commands on a small stand.</summary>
public sealed class BuildTests : IDisposable
{
    private const string Stand = """
        framegen: 1
        title: Bench stand
        include: [../lists/sizes.yaml]
        nodes:
          a: [0 mm, 0 mm, 0 mm]
          b: [=width, 0 mm, 0 mm]
          m: {on: base, at: 50 %}
          c: {from: m, offset: [0 mm, 0 mm, 500 mm]}
        tubes:
          base: {from: a, to: b, group: tubes}
          mast: {from: m, to: c, group: tubes}
        groups:
          tubes: {material: S235, section: round 30 x 2 mm}
        supports:
          a: {hold: [x, y, z, rx, ry, rz]}
        cases:
          push: {loads: [{node: c, force: [20 N, 0 N, 0 N]}]}
        targets:
          - displacement: {case: push, node: c, along: x, max: LIMIT}
        """;

    private readonly ScratchFolder _scratch = new();

    public BuildTests()
    {
        _scratch.Write("lists/sizes.yaml", "framegen: 1\nparameters: {width: 400 mm}\n");
        Spec("50 mm");
    }

    private string SpecPath => _scratch["jobs/stand.yaml"];

    private string Out => _scratch["out"];

    public void Dispose() => _scratch.Dispose();

    [Fact]
    public void Builds_a_folder_that_verifies()
    {
        (int code, string output, string error) = Run("build", SpecPath, "-o", Out);
        Assert.Equal((0, string.Empty), (code, error));
        Assert.Contains("Bench stand", output, StringComparison.Ordinal);
        Assert.Contains("Cautions:", output, StringComparison.Ordinal);
        Assert.All(output.Split('\n'), l => Assert.InRange(l.Length, 0, Math.Max(80, Out.Length + 30)));
        Assert.Equal(2, Directory.GetFiles(Path.Join(Out, "developed"), "tubes-*.dxf").Length);
        (int verified, string said, _) = Run("verify", Out, "--spec", SpecPath);
        Assert.Equal(0, verified);
        Assert.Contains("the same bytes", said, StringComparison.Ordinal);
    }

    [Fact]
    public void Verify_rebuilds_with_the_options_of_the_build()
    {
        Run("build", SpecPath, "-o", Out, "--dxf", "r12", "--dxf-units", "in", "--format", "svg");
        string[] drawings = Directory.GetFiles(Path.Join(Out, "developed"));
        Assert.All(drawings, f => Assert.Contains("AC1009", File.ReadAllText(f), StringComparison.Ordinal));
        Assert.Single(Directory.GetFiles(Path.Join(Out, "templates"), "*.svg"));
        using (JsonDocument manifest = JsonDocument.Parse(File.ReadAllText(Path.Join(Out, "manifest.json"))))
        {
            JsonElement options = manifest.RootElement.GetProperty("options");
            Assert.Equal(("r12", "in", true), (options.GetProperty("dxf").GetString(), options.GetProperty("dxf_units").GetString(), options.GetProperty("svg").GetBoolean()));
        }

        (int verified, string said, _) = Run("verify", Out, "--spec", SpecPath);
        Assert.Equal(0, verified);
        Assert.Contains("the same bytes", said, StringComparison.Ordinal);
        (int refused, _, string error) = Run("build", SpecPath, "-o", Out, "--dxf", "r13");
        Assert.Equal(2, refused);
        Assert.Contains("r13", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Verify_tells_papers_from_those_the_spec_gives_today()
    {
        Run("build", SpecPath, "-o", Out);
        _scratch.Write("lists/sizes.yaml", "framegen: 1\nparameters: {width: 410 mm}\n");
        Assert.Equal(0, Run("verify", Out).Code);
        (int code, string output, _) = Run("verify", Out, "--spec", SpecPath, "--json");
        Assert.Equal(1, code);
        using JsonDocument document = JsonDocument.Parse(output);
        string[] paths = [.. document.RootElement.GetProperty("differences").EnumerateArray().Select(d => d.GetProperty("path").GetString()!)];
        Assert.Contains(paths, p => p.StartsWith("developed/tubes-", StringComparison.Ordinal));
        Assert.Contains(paths, p => p is "spec/sizes.yaml");
        Assert.DoesNotContain(paths, p => p is "spec/stand.yaml");
    }

    [Fact]
    public void Verify_does_not_call_papers_those_of_a_spec_that_gives_none()
    {
        Run("build", SpecPath, "-o", Out);
        Spec("50 apples");
        (int code, string output, string error) = Run("verify", Out, "--spec", SpecPath);
        Assert.Equal(2, code);
        Assert.DoesNotContain("gives today", output, StringComparison.Ordinal);
        Assert.Contains("gives no papers to compare them with", output, StringComparison.Ordinal);
        Assert.Contains("apples", error, StringComparison.Ordinal);
        using JsonDocument document = JsonDocument.Parse(Run("verify", Out, "--spec", SpecPath, "--json").Output);
        Assert.False(document.RootElement.GetProperty("matches").GetBoolean());
    }

    [Fact]
    public void Letters_that_the_pdf_can_not_print_are_pointed_out()
    {
        _scratch.Write("jobs/stand.yaml", File.ReadAllText(SpecPath).Replace("Bench stand", "Prüfstand 試験 \U0001F6E0", StringComparison.Ordinal));
        (int code, _, string error) = Run("build", SpecPath, "-o", Out);
        Assert.Equal(0, code);
        Assert.Contains("prints ? for what its font lacks of the title and revision: 試 験 \U0001F6E0;", error, StringComparison.Ordinal);
        Assert.Contains("Prüfstand 試験 \U0001F6E0", File.ReadAllText(Path.Join(Out, "cut-list.md")), StringComparison.Ordinal);
    }

    [Fact]
    public void Verify_names_a_file_once()
    {
        Run("build", SpecPath, "-o", Out);
        File.Delete(Path.Join(Out, "ends.csv"));
        File.AppendAllText(Path.Join(Out, "setup.csv"), "x\n");
        string[] said = [.. Run("verify", Out).Output.Split('\n').Where(l => l.Contains(".csv", StringComparison.Ordinal))];
        Assert.Equal(["missing: ends.csv", "changed: setup.csv"], said);
    }

    [Fact]
    public void Verify_sees_through_a_manifest_that_was_made_to_fit()
    {
        Run("build", SpecPath, "-o", Out);
        string list = Path.Join(Out, "cut-list.csv");
        string before = FrameGen.Output.Manifest.Hash(File.ReadAllBytes(list));
        File.AppendAllText(list, "forged\n");
        string after = FrameGen.Output.Manifest.Hash(File.ReadAllBytes(list));
        string manifest = Path.Join(Out, "manifest.json");
        File.WriteAllText(manifest, File.ReadAllText(manifest).Replace(before, after, StringComparison.Ordinal));
        (int code, string output, _) = Run("verify", Out);
        Assert.Equal(1, code);
        Assert.Contains("differs from what its spec gives: cut-list.csv", output, StringComparison.Ordinal);
    }

    [Fact]
    public void Targets_that_are_missed_give_code_1_and_no_papers_unless_asked_for_anyway()
    {
        Spec("0.001 mm");
        (int code, string output, string error) = Run("build", SpecPath, "-o", Out);
        Assert.Equal(1, code);
        Assert.Contains("MISSED", output, StringComparison.Ordinal);
        Assert.Contains("no papers were written", error, StringComparison.Ordinal);
        Assert.False(Directory.Exists(Out));

        Assert.Equal(1, Run("check", SpecPath).Code);
        Assert.Equal(1, Run("size", SpecPath).Code);
        Assert.Equal(1, Run("build", SpecPath, "-o", Out, "--anyway").Code);
        Assert.StartsWith("> **NOT MEETING TARGETS**", File.ReadAllText(Path.Join(Out, "cut-list.md")), StringComparison.Ordinal);
    }

    [Fact]
    public void A_wrong_spec_gives_code_2_every_error_with_its_place_and_leaves_the_old_papers()
    {
        Run("build", SpecPath, "-o", Out);
        byte[] before = File.ReadAllBytes(Path.Join(Out, "manifest.json"));
        _scratch.Write("jobs/stand.yaml", Stand.Replace("group: tubes", "group: tubess", StringComparison.Ordinal).Replace("LIMIT", "1 mm", StringComparison.Ordinal));
        (int code, string output, string error) = Run("build", SpecPath, "-o", Out);
        Assert.Equal((2, string.Empty), (code, output));
        Assert.Contains("stand.yaml:10:", error, StringComparison.Ordinal);
        Assert.Contains("stand.yaml:11:", error, StringComparison.Ordinal);
        Assert.Contains("2 errors", error, StringComparison.Ordinal);
        Assert.Contains("nothing was written", error, StringComparison.Ordinal);
        Assert.Equal(before, File.ReadAllBytes(Path.Join(Out, "manifest.json")));
    }

    [Fact]
    public void A_user_s_file_in_the_folder_is_refused_by_name_and_kept_with_replace()
    {
        Run("build", SpecPath, "-o", Out);
        _scratch.Write("out/sketch.txt", "mine");
        Spec("40 mm");
        (int code, _, string error) = Run("build", SpecPath, "-o", Out);
        Assert.Equal(2, code);
        Assert.Contains("  sketch.txt", error, StringComparison.Ordinal);
        Assert.Equal(0, Run("build", SpecPath, "-o", Out, "--replace", "--quiet").Code);
        Assert.Equal("mine", File.ReadAllText(_scratch["out.kept/sketch.txt"]));
        Assert.Equal(0, Run("verify", Out).Code);
    }

    [Fact]
    public void Json_is_one_object_with_the_frame()
    {
        (int code, string output, _) = Run("check", SpecPath, "--json");
        using JsonDocument document = JsonDocument.Parse(output);
        Assert.Equal(code, document.RootElement.GetProperty("exit_code").GetInt32());
        Assert.Equal("framegen-frame/1", document.RootElement.GetProperty("frame").GetProperty("format").GetString());
        Assert.False(Directory.Exists(_scratch["out"]));
    }

    [Fact]
    public void Tables_have_no_blanks_at_line_ends_and_their_decimal_points_stand_under_each_other()
    {
        Spec("50 mm", more: "\n  - stiffness: {node: c, along: x, min: 0.5 N/mm}");
        (_, string output, _) = Run("check", SpecPath);
        string[] lines = output.ReplaceLineEndings("\n").Split('\n');
        Assert.All(lines, l => Assert.Equal(l.TrimEnd(), l));
        Assert.All(lines, l => Assert.InRange(l.Length, 0, 80));
        Assert.DoesNotContain("\n\n\n", output.ReplaceLineEndings("\n"), StringComparison.Ordinal);
        string large = Assert.Single(lines, l => l.Contains("displacement:", StringComparison.Ordinal));
        string small = Assert.Single(lines, l => l.Contains("stiffness:", StringComparison.Ordinal));
        Assert.Equal(large.IndexOf('.', StringComparison.Ordinal), small.IndexOf('.', StringComparison.Ordinal));

        // Movements, however small, have three digits.
        string moves = lines.SkipWhile(l => !l.StartsWith("Load cases", StringComparison.Ordinal)).First(l => l.StartsWith(" push", StringComparison.Ordinal));
        Assert.Matches(@"^ push +(0\.0*[1-9]\d\d|[1-9]\.\d\d|[1-9]\d\.\d) ", moves);
    }

    [Fact]
    public void Quiet_prints_nothing_when_all_is_well() =>
        Assert.Equal((0, string.Empty, string.Empty), Run("build", SpecPath, "-o", Out, "-q"));

    [Fact]
    public void Papers_are_the_same_however_the_spec_was_named()
    {
        Run("build", SpecPath, "-o", Out);
        Run("build", Path.Join(_scratch.Path, "lists", "..", "jobs", "stand.yaml"), "-o", _scratch["again"]);
        Assert.Equal(File.ReadAllBytes(Path.Join(Out, "manifest.json")), File.ReadAllBytes(_scratch["again/manifest.json"]));
    }

    private static (int Code, string Output, string Error) Run(params string[] args)
    {
        using var output = new StringWriter();
        using var error = new StringWriter();
        int code = CommandLine.Run(args, output, error);
        return (code, output.ToString(), error.ToString());
    }

    private void Spec(string limit, string more = "") =>
        _scratch.Write("jobs/stand.yaml", Stand.Replace("LIMIT", limit, StringComparison.Ordinal) + more);
}
