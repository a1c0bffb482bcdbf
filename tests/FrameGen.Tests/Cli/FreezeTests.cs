using System.Text.Json;
using FrameGen.Cli;
using FrameGen.Tests.Output.Folders;
using Xunit;

namespace FrameGen.Tests.Cli;

/// <summary>Pinned sizes, from freezing to the papers of a later build.</summary>
public sealed class FreezeTests : IDisposable
{
    // A cantilever of 500 mm under 100 N at its end: 3 mm at most is EI of 1.389 kN.m2, I of 6614 mm4. By I = pi/64 (D^4 - d^4) of the list's
    // sizes: 25 x 2 has 9628 and is lighter (1.134 kg/m) than 30 x 2 with 14494; 20 x 2 has 4637 and fails.
    private const string Spec = """
        framegen: 1
        title: Shelf arm
        nodes:
          wall: [0 mm, 0 mm, 0 mm]
          tip: [500 mm, 0 mm, 0 mm]
        tubes:
          arm: {from: wall, to: tip, group: arms}
        groups:
          arms: {material: S235, choose: {stock: rack}}
        stock:
          rack: {material: S235, sizes: [round 20 x 2 mm, round 25 x 2 mm, round 30 x 2 mm]}
        targets:
          - member: {tube: arm, as: cantilever, load: 100 N, max_deflection: 3 mm}

        """;

    private readonly ScratchFolder _scratch = new();

    public FreezeTests() => _scratch.Write("arm.yaml", Spec);

    private string SpecPath => _scratch["arm.yaml"];

    private string FrozenPath => _scratch["arm.frozen.yaml"];

    public void Dispose() => _scratch.Dispose();

    [Fact]
    public void Pins_the_sizes_in_a_file_beside_the_spec()
    {
        (int code, string output, string error) = Run("freeze", SpecPath);
        Assert.Equal((0, string.Empty), (code, error));
        Assert.Contains("arm.frozen.yaml (written)", output, StringComparison.Ordinal);
        Assert.Contains("  arms: {material: S235, section: round 25 x 2 mm, stock: rack}\n", File.ReadAllText(FrozenPath), StringComparison.Ordinal);
        Assert.Contains("(unchanged)", Run("freeze", SpecPath).Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_frozen_size_stays_when_the_targets_would_choose_another_and_says_which()
    {
        Run("freeze", SpecPath);
        Change("max_deflection: 3 mm", "max_deflection: 8 mm");
        (int code, string output, string error) = Run("size", SpecPath, "--json");
        using JsonDocument document = JsonDocument.Parse(output);
        JsonElement frame = document.RootElement.GetProperty("frame");

        Assert.Equal(0, code);
        Assert.Contains("the spec has changed since; sizing would choose arms round 20 x 2 mm for round 25 x 2 mm today", error, StringComparison.Ordinal);
        Assert.Equal("round 25 x 2 mm", frame.GetProperty("groups").GetProperty("arms").GetProperty("section").GetString());
        Assert.Equal("fixed", frame.GetProperty("sizing").GetProperty("status").GetString());
        JsonElement today = frame.GetProperty("sizing").GetProperty("frozen").GetProperty("today");
        Assert.Equal("round 20 x 2 mm", today.GetProperty("groups").GetProperty("arms").GetString());
    }

    [Fact]
    public void A_frozen_size_that_misses_a_target_is_unmet()
    {
        Run("freeze", SpecPath);
        Change("max_deflection: 3 mm", "max_deflection: 2 mm");
        (int code, string output, string error) = Run("check", SpecPath, "--json");
        using JsonDocument document = JsonDocument.Parse(output);

        Assert.Equal(1, code);
        Assert.Contains("the sizes are frozen", error, StringComparison.Ordinal);
        Assert.Equal("unmet", document.RootElement.GetProperty("frame").GetProperty("sizing").GetProperty("status").GetString());
    }

    [Fact]
    public void A_build_copies_the_pinned_sizes_and_verify_uses_them()
    {
        string papers = _scratch["papers"];
        Run("freeze", SpecPath);
        Change("max_deflection: 3 mm", "max_deflection: 8 mm");
        Assert.Equal(0, Run("build", SpecPath, "-o", papers).Code);

        Assert.Equal(File.ReadAllBytes(FrozenPath), File.ReadAllBytes(Path.Join(papers, "spec", "arm.frozen.yaml")));
        using JsonDocument manifest = JsonDocument.Parse(File.ReadAllBytes(Path.Join(papers, "manifest.json")));
        Assert.Equal("spec/arm.frozen.yaml", manifest.RootElement.GetProperty("spec").GetProperty("frozen").GetString());
        Assert.Contains("Sizes frozen by `arm.frozen.yaml`", File.ReadAllText(Path.Join(papers, "cut-list.md")), StringComparison.Ordinal);
        Assert.Contains("the same bytes", Run("verify", papers, "--spec", SpecPath).Output, StringComparison.Ordinal);

        // Without the file the spec gives other papers.
        File.Delete(FrozenPath);
        Assert.Equal((0, 1), (Run("verify", papers).Code, Run("verify", papers, "--spec", SpecPath).Code));
    }

    [Fact]
    public void A_changed_copy_of_the_pinned_sizes_is_named()
    {
        string papers = _scratch["papers"];
        Run("freeze", SpecPath);
        Run("build", SpecPath, "-o", papers);
        File.AppendAllText(Path.Join(papers, "spec", "arm.frozen.yaml"), "# a word\n");
        (int code, string output, _) = Run("verify", papers);
        Assert.Equal(1, code);
        Assert.Contains("changed: spec/arm.frozen.yaml", output, StringComparison.Ordinal);
    }

    [Fact]
    public void Does_not_overwrite_pinned_sizes_unless_asked_and_keeps_the_old_file_then()
    {
        Run("freeze", SpecPath);
        byte[] old = File.ReadAllBytes(FrozenPath);
        Change("max_deflection: 3 mm", "max_deflection: 8 mm");
        (int refused, _, string error) = Run("freeze", SpecPath);
        Assert.Equal(2, refused);
        Assert.Equal(old, File.ReadAllBytes(FrozenPath));
        Assert.Contains("--replace", error, StringComparison.Ordinal);

        Assert.Equal(0, Run("freeze", SpecPath, "--replace").Code);
        Assert.Contains("section: round 20 x 2 mm", File.ReadAllText(FrozenPath), StringComparison.Ordinal);
        Assert.Equal(old, File.ReadAllBytes(_scratch["arm.kept/arm.frozen.yaml"]));
    }

    [Fact]
    public void Freezes_nothing_that_misses_a_target_unless_asked()
    {
        Change("max_deflection: 3 mm", "max_deflection: 1 mm");
        Assert.Equal(1, Run("freeze", SpecPath).Code);
        Assert.False(File.Exists(FrozenPath));
        Assert.Equal(1, Run("freeze", SpecPath, "--anyway").Code);
        Assert.Contains("NOT MEETING TARGETS", File.ReadAllText(FrozenPath), StringComparison.Ordinal);
    }

    [Fact]
    public void A_new_group_is_added_beside_frozen_ones()
    {
        Run("freeze", SpecPath);
        Change("group: arms}", "group: arms}\n  stay: {from: low, to: tip, group: stays}");
        Change("nodes:", "nodes:\n  low: [0 mm, 0 mm, -300 mm]");
        Change("groups:", "groups:\n  stays: {material: S235, choose: {stock: rack}}");
        Change("max_deflection: 3 mm", "max_deflection: 8 mm");
        (int code, _, string error) = Run("size", SpecPath);
        Assert.Equal(2, code);
        Assert.Contains("group stays has no size in arm.frozen.yaml", error, StringComparison.Ordinal);

        Assert.Equal(0, Run("freeze", SpecPath, "--add").Code);
        string pinned = File.ReadAllText(FrozenPath);
        Assert.Contains("arms:  {material: S235, section: round 25 x 2 mm, stock: rack}", pinned, StringComparison.Ordinal);
        Assert.Contains("stays: {material: S235, section: round 20 x 2 mm, stock: rack}", pinned, StringComparison.Ordinal);
        Assert.Equal(0, Run("size", SpecPath).Code);
    }

    [Theory]
    [InlineData("arms: {material: S235, choose", "booms: {material: S235, choose", "group: arms}", "group: booms}", 2, "the spec has no group arms any more")]
    [InlineData("arms: {material: S235,", "arms: {material: S275,", "rack: {material: S235", "rack: {material: S275", 2, "was frozen in S235, and the spec has S275 now")]
    [InlineData("choose: {stock: rack}", "section: round 30 x 2 mm", "", "", 2, "was frozen as round 25 x 2 mm, and the spec gives it round 30 x 2 mm now")]
    [InlineData("round 25 x 2 mm, ", "", "", "", 0, "round 25 x 2 mm, as frozen, is not among what the group chooses from today")]
    [InlineData("round 25 x 2 mm, ", "", "", "", 0, "the spec and stock list rack have changed since")]
    [InlineData("choose: {stock: rack}", "section: round 25 x 2 mm", "", "", 0, "the spec gives all of them today")]
    public void Says_where_the_spec_has_moved_away_from_the_pinned_sizes(string old, string changed, string alsoOld, string alsoChanged, int code, string message)
    {
        Run("freeze", SpecPath);
        Change(old, changed);
        if (alsoOld.Length > 0)
        {
            Change(alsoOld, alsoChanged);
        }

        (int returned, _, string error) = Run("size", SpecPath);
        Assert.Equal(code, returned);
        Assert.Contains(message, error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("stock: rack}", "stok: rack}", "arm.frozen.yaml:", "unknown key 'stok'")]
    [InlineData("round 25 x 2 mm", "round 25 x 20 mm", "arm.frozen.yaml:", "no bore")]
    [InlineData("spec: arm.yaml", "spec: other.yaml", "arm.frozen.yaml:", "were frozen for other.yaml and lie beside arm.yaml")]
    public void The_file_is_read_as_carefully_as_a_spec(string old, string changed, string place, string message)
    {
        Run("freeze", SpecPath);
        File.WriteAllText(FrozenPath, File.ReadAllText(FrozenPath).Replace(old, changed, StringComparison.Ordinal));
        string error = Run("size", SpecPath).Error;
        Assert.Contains(place, error, StringComparison.Ordinal);
        Assert.Contains(message, error, StringComparison.Ordinal);
    }

    [Fact]
    public void Pieces_that_are_no_longer_those_that_were_cut_are_named()
    {
        Run("freeze", SpecPath);
        Assert.Contains("  arm: arms-500", File.ReadAllText(FrozenPath), StringComparison.Ordinal);
        Assert.DoesNotContain("pieces", Run("check", SpecPath).Error, StringComparison.Ordinal);
        Change("[500 mm,", "[480 mm,");
        string error = Run("check", SpecPath).Error;
        Assert.Contains("arm.frozen.yaml: these pieces have another length or other ends", error, StringComparison.Ordinal);
        Assert.Matches("arm was arms-500[a-z]+ and is arms-480[a-z]+", error);
    }

    [Fact]
    public void A_tube_of_a_frozen_group_can_be_measured()
    {
        Run("freeze", SpecPath);
        _scratch.Write("arm.yaml", Spec + "measured: {arms: {wall: 1.9 mm}}\n");
        (int code, string output, _) = Run("size", SpecPath);
        Assert.Equal(0, code);
        Assert.Contains("25 x 1.9 mm", output, StringComparison.Ordinal);
    }

    [Fact]
    public void Pinned_sizes_are_no_spec()
    {
        Run("freeze", SpecPath);
        (int code, _, string error) = Run("check", FrozenPath);
        Assert.Equal(2, code);
        Assert.Contains("name the spec that it lies beside", error, StringComparison.Ordinal);
    }

    private static (int Code, string Output, string Error) Run(params string[] arguments)
    {
        using var output = new StringWriter();
        using var error = new StringWriter();
        int code = CommandLine.Run(arguments, output, error);
        return (code, output.ToString(), error.ToString());
    }

    private void Change(string old, string changed)
    {
        string text = File.ReadAllText(SpecPath);
        Assert.Contains(old, text, StringComparison.Ordinal);
        _scratch.Write("arm.yaml", text.Replace(old, changed, StringComparison.Ordinal));
    }
}
