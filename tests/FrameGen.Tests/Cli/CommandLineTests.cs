using FrameGen.Cli;
using FrameGen.Tests.Output.Folders;
using Xunit;

namespace FrameGen.Tests.Cli;

public sealed class CommandLineTests : IDisposable
{
    private readonly ScratchFolder _scratch = new();

    public void Dispose() => _scratch.Dispose();

    [Theory]
    [InlineData("buidl", "there is no command 'buidl'; did you mean 'build'?")]
    [InlineData("build a.yaml --relpace", "did you mean '--replace'?")]
    [InlineData("build", "SPEC")]
    [InlineData("build a.yaml -o", "-o")]
    [InlineData("check no-such-file.yaml", "there is no file no-such-file.yaml")]
    [InlineData("size .", ". is a folder")]
    [InlineData("verify no-such-folder", "there is no folder no-such-folder")]
    [InlineData("check @arguments", "there is no file @arguments")]
    public void What_is_wrong_is_said_on_stderr_with_code_2(string line, string message)
    {
        (int code, string output, string error) = Run(line.Split(' '));
        Assert.Equal(2, code);
        Assert.Empty(output);
        Assert.Contains(message, error, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Without_arguments_it_says_what_it_can_do()
    {
        (int code, string output, string error) = Run();
        Assert.Equal(2, code);
        Assert.Empty(output);
        Assert.Contains("framegen build specs/quayside-trailer.yaml", error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("build")]
    [InlineData("check")]
    [InlineData("size")]
    [InlineData("explain")]
    [InlineData("verify")]
    public void Every_command_has_help_with_an_example_in_80_columns(string command)
    {
        (int code, string output, string error) = Run(command, "--help");
        Assert.Equal(0, code);
        Assert.Empty(error);
        Assert.Contains($"\n  framegen {command} ", output, StringComparison.Ordinal);
        Assert.All(output.Split('\n'), l => Assert.InRange(l.Length, 0, 80));
    }

    [Fact]
    public void Tells_its_version()
    {
        (int code, string output, _) = Run("--version");
        Assert.Equal(0, code);
        Assert.Matches(@"^FrameGen \d+\.\d+\.\d+\r?\n$", output);
    }

    [Fact]
    public void The_output_folder_can_t_hold_the_spec()
    {
        _scratch.Write("jobs/x.yaml", "framegen: 1\n");
        (int code, _, string error) = Run("build", _scratch["jobs/x.yaml"], "-o", _scratch["jobs"]);
        Assert.Equal(2, code);
        Assert.Contains("holds the spec", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Verify_names_what_is_not_as_it_was()
    {
        new FrameGen.Output.Folders.OutputFolder(_scratch["out"]).Write(
            ScratchFolder.Papers(("a.csv", "one"), ("b.csv", "two"), ("spec/x.yaml", "?")), replace: false);
        File.Delete(_scratch["out/a.csv"]);
        _scratch.Write("out/b.csv", "TWO");
        _scratch.Write("out/c.csv", "three");
        _scratch.Write("out/spec/x.yaml", "changed, so that there is nothing to rebuild from");
        (int code, string output, _) = Run("verify", _scratch["out"]);
        Assert.Equal(1, code);
        Assert.Contains("missing: a.csv\nchanged: b.csv\nchanged: spec/x.yaml\nextra: c.csv\n", output.ReplaceLineEndings("\n"), StringComparison.Ordinal);
    }

    private static (int Code, string Output, string Error) Run(params string[] args)
    {
        using var output = new StringWriter();
        using var error = new StringWriter();
        int code = CommandLine.Run(args, output, error);
        return (code, output.ToString(), error.ToString());
    }
}
