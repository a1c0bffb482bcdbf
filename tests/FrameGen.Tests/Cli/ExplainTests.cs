using System.Text.Json;
using FrameGen.Cli;
using FrameGen.Tests.Output.Folders;
using Xunit;

namespace FrameGen.Tests.Cli;

/// <summary>Explanations from the command line.</summary>
public sealed class ExplainTests : IDisposable
{
    // A beam of 2 m on two ends under 1 N/mm, and a post of 1 m on its middle. wL²/8 = 500 N·m in its middle, wL/2 = 1000 N at its ends.
    private const string Spec = """
        framegen: 1
        title: Beam and post
        nodes:
          west: [0 mm, 0 mm, 0 mm]
          east: [2000 mm, 0 mm, 0 mm]
          middle: {on: beam, at: 50 %}
          top: [1000 mm, 0 mm, 1000 mm]
        tubes:
          beam: {from: west, to: east, group: beams}
          post: {from: middle, to: top, group: posts}
        groups:
          beams: {material: S235, choose: {stock: rack}}
          posts: {material: S235, section: round 30 x 2 mm}
        stock:
          rack: {material: S235, sizes: [round 28 x 2 mm, round 50 x 2 mm, round 60 x 2 mm, round 30 x 2 mm, round 30 x 1.5 mm]}
        supports:
          west: {hold: [x, y, z, rx]}
          east: {hold: [y, z]}
        cases:
          even:
            loads:
              - {tube: beam, line: [0 N/m, 0 N/m, -1000 N/m]}
        targets:
          - displacement: {case: even, node: middle, along: z, max: 10 mm}

        """;

    private readonly ScratchFolder _scratch = new();

    public ExplainTests() => _scratch.Write("beam.yaml", Spec);

    public void Dispose() => _scratch.Dispose();

    // 5wL⁴/384EI: I of 50 x 2 is π(50⁴ − 46⁴)/64 = 87 009 mm⁴, 11.4 mm with 210 GPa; of 60 x 2 153 436 mm⁴, 6.5 mm.
    [Fact]
    public void The_first_lines_say_why()
    {
        (int code, string output, string error) = Run("explain", _scratch["beam.yaml"], "BEAM");
        Assert.Equal((0, string.Empty), (code, error));
        string[] lines = output.Split('\n');
        Assert.StartsWith("beam: round 60 x 2 mm, S235, 2.861 kg/m, the only tube of group beams", lines[0], StringComparison.Ordinal);
        Assert.StartsWith("Why: the next lighter, round 50 x 2 mm, breaks displacement of middle along z,", lines[1], StringComparison.Ordinal);
        Assert.Contains("over the limit of 10 mm", lines[2], StringComparison.Ordinal);
        Assert.All(lines, line => Assert.InRange(line.Length, 0, 80));
        Assert.Contains("Cautions:", output, StringComparison.Ordinal);
    }

    [Fact]
    public void Json_has_sizes_slopes_forces_and_ends()
    {
        JsonElement root = Json("beam");
        Assert.Equal("framegen-explain/1", root.GetProperty("format").GetString());
        Assert.Equal(("chosen", "proven-lightest", 4), (root.GetProperty("origin").GetString(), root.GetProperty("status").GetString(), root.GetProperty("lighter_in_all").GetInt32()));
        JsonElement next = root.GetProperty("lighter")[0];
        Assert.Equal(("round 50 x 2 mm", "breaks-target"), (next.GetProperty("section").GetString(), next.GetProperty("verdict").GetString()));

        // Shear adds wL²/8GAs, about 0.5 % here.
        double bending = 5.0 * Math.Pow(2000, 4) / (384 * 210_000 * Math.PI / 64 * (Math.Pow(50, 4) - Math.Pow(46, 4)));
        Assert.InRange(next.GetProperty("broken")[0].GetProperty("value").GetDouble(), bending, 1.01 * bending);

        JsonElement forces = root.GetProperty("cases").GetProperty("even").GetProperty("forces");
        Assert.Equal(-500_000, forces.GetProperty("my").GetProperty("lowest").GetDouble(), 1e-3);
        Assert.Equal(1000, forces.GetProperty("my").GetProperty("lowest_at_mm").GetDouble(), 1e-6);
        Assert.Equal(1000, Math.Abs(forces.GetProperty("vz").GetProperty("lowest").GetDouble()), 1e-6);
        Assert.Equal(0, forces.GetProperty("n").GetProperty("highest").GetDouble(), 1e-6);

        // The movement of the beam's middle is all its own.
        JsonElement target = root.GetProperty("targets")[0];
        Assert.Equal(-target.GetProperty("ratio").GetDouble(), target.GetProperty("per_stiffness").GetDouble(), 1e-5);
        Assert.Equal("square", root.GetProperty("ends").GetProperty("from").GetProperty("cut").GetString());
    }

    [Fact]
    public void A_given_size_is_compared_with_what_the_list_has_and_its_cope_is_named()
    {
        (int code, string output, _) = Run("explain", _scratch["beam.yaml"], "post");
        Assert.Equal(0, code);
        Assert.Contains("Why: the spec gives it. The next lighter, round 28 x 2 mm, would do as well", output, StringComparison.Ordinal);
        JsonElement end = Json("post").GetProperty("ends").GetProperty("from");
        Assert.Equal(("cope", true), (end.GetProperty("cut").GetString(), end.GetProperty("cut_made").GetBoolean()));
        JsonElement fit = end.GetProperty("fits")[0];
        Assert.Equal(("beam", 90.0), (fit.GetProperty("tube").GetString(), Math.Round(fit.GetProperty("angle_deg").GetDouble(), 6)));
    }

    [Fact]
    public void A_size_of_no_list_has_nothing_beside_it()
    {
        _scratch.Write("odd.yaml", Spec.Replace("section: round 30 x 2 mm", "section: round 31 x 2 mm", StringComparison.Ordinal));
        Assert.Contains("No stock list holds a size like it", Run("explain", _scratch["odd.yaml"], "post").Output.ReplaceLineEndings(" "), StringComparison.Ordinal);
    }

    [Fact]
    public void A_frozen_size_names_its_file_and_what_would_be_chosen_today()
    {
        Run("freeze", _scratch["beam.yaml"]);
        _scratch.Write("beam.yaml", Spec.Replace("max: 10 mm", "max: 15 mm", StringComparison.Ordinal));
        (int code, string output, _) = Run("explain", _scratch["beam.yaml"], "beam");
        Assert.Equal(0, code);
        Assert.Contains("Why: beam.frozen.yaml pins it; round 50 x 2 mm would be chosen today.", output.ReplaceLineEndings(" "), StringComparison.Ordinal);
        Assert.Equal(("frozen", "round 50 x 2 mm"), (Json("beam").GetProperty("origin").GetString(), Json("beam").GetProperty("today").GetString()));
    }

    [Fact]
    public void A_measured_size_is_what_is_explained()
    {
        _scratch.Write("held.yaml", Spec + "measured: {posts: {od: 30.1 mm, wall: 1.9 mm}}\n");
        Assert.StartsWith(
            "post: round 30 x 2 mm (measured 30.1 x 1.9 mm), S235", Run("explain", _scratch["held.yaml"], "post").Output, StringComparison.Ordinal);
    }

    [Fact]
    public void Targets_out_of_reach_return_1_and_are_said()
    {
        _scratch.Write("soft.yaml", Spec.Replace("max: 10 mm", "max: 1 mm", StringComparison.Ordinal));
        (int code, string output, _) = Run("explain", _scratch["soft.yaml"], "beam");
        Assert.Equal(1, code);
        Assert.Contains("Why: no choice of sizes meets every target", output, StringComparison.Ordinal);
        Assert.Contains("MISSED", output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("beem", "has no tube beem; did you mean 'beam'?")]
    [InlineData("zzzzzzzz", "has no tube zzzzzzzz. It has beam, post")]
    public void A_tube_that_is_not_there_returns_2(string tube, string message)
    {
        (int code, string output, string error) = Run("explain", _scratch["beam.yaml"], tube);
        Assert.Equal((2, string.Empty), (code, output));
        Assert.Contains(message, error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_spec_with_a_mistake_returns_2_with_its_diagnostics_in_json()
    {
        _scratch.Write("wrong.yaml", Spec.Replace("{material: S235, choose", "{material: S23, choose", StringComparison.Ordinal));
        (int code, string output, string error) = Run("explain", _scratch["wrong.yaml"], "beam", "--json");
        Assert.Equal(2, code);
        Assert.Contains("S23", error, StringComparison.Ordinal);
        using JsonDocument document = JsonDocument.Parse(output);
        Assert.Equal("error", document.RootElement.GetProperty("diagnostics")[0].GetProperty("severity").GetString());
    }

    private JsonElement Json(string tube)
    {
        (int code, string output, _) = Run("explain", _scratch["beam.yaml"], tube, "--json");
        Assert.Equal(0, code);
        using JsonDocument document = JsonDocument.Parse(output);
        return document.RootElement.Clone();
    }

    private static (int Code, string Output, string Error) Run(params string[] arguments)
    {
        using var output = new StringWriter();
        using var error = new StringWriter();
        int code = CommandLine.Run(arguments, output, error);
        return (code, output.ToString(), error.ToString());
    }
}
