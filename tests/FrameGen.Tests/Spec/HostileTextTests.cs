using System.Diagnostics;
using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

/// <summary>A mebibyte of the worst that each part of the reader could be given is answered in time.</summary>
public class HostileTextTests
{
    private const int Full = (1 << 20) - 400;

    public static TheoryData<string, string, string> Texts => new()
    {
        { "nested lists", "nodes: ", "[" },
        { "nested maps", "nodes: ", "{a: " },
        { "nested dashes", "nodes:\n  ", "- " },
        { "nested question marks", "nodes:\n  ", "? " },
        { "one long word", "title: ", "x" },
        { "one long folded text", "title: ", "word\n  " },
        { "an open quote", "title: \"", "x\\n " },
        { "anchors", "nodes: ", "&a " },
        { "tags", "nodes: ", "!a " },
        { "unknown keys", string.Empty, "k#: 1\n" },
        { "keys written twice", string.Empty, "twice: 1\n" },
        { "long list of numbers", "have: [", "1," },
        { "section of many sizes", "have: [{material: S235, lengths: [1 m], section: round 1", "x1" },
        { "range of many points", "groups: {g: {material: S235, choose: {stock: a, od: 1 mm", ".." },
        { "number of many digits", "parameters: {a: 1", "1" },
        { "many feet", "parameters: {a: ", "1 ft " },
        { "unknown units", "parameters:\n", "  p#: 1 qqqq\n" },
        { "unknown parameters", "parameters:\n", "  p#: =q# + r#\n" },
        { "missing files", "include:\n", "  - f#.yaml\n" },
        { "colons", "title: ", ":" },
        { "comments", "title: a\n", "#\n" },
        { "ends of line", "title: a\n", "\n" },
        { "document marks", "title: a\n", "---\n" },
        { "directives", "%YAML 1.2\n", "%TAG ! tag#:\n" },
    };

    [Theory]
    [MemberData(nameof(Texts))]
    public void Is_answered_with_errors_in_time(string what, string start, string repeated)
    {
        var text = new StringBuilder($"framegen: 1\n{start}");
        for (int i = 0; text.Length < Full; i++)
        {
            text.Append(repeated.Replace("#", $"{i}", StringComparison.Ordinal));
        }

        var diagnostics = new DiagnosticList();
        var clock = Stopwatch.StartNew();
        byte[] bytes = Encoding.UTF8.GetBytes(text.ToString());
        FrameSpec? spec = SpecReader.Read("a.yaml", path => path is "a.yaml" ? bytes : null, diagnostics);

        // A second or so, more on a busy machine; what grows with the square of the text takes minutes.
        Assert.True(clock.Elapsed < TimeSpan.FromSeconds(60), $"{what}: {clock.Elapsed}");
        Assert.Null(spec);
        Assert.InRange(diagnostics.Count, 1, 201);
    }

    [Fact]
    public void Thousands_of_unknown_parameters_are_told_in_time_and_not_all()
    {
        string parameters = string.Concat(Enumerable.Range(0, 40_000).Select(i => $"  p{i}: =q{i}\n"));
        FrameSpec spec = SpecText.Sound(SpecText.Small + "parameters:\n" + parameters);
        var diagnostics = new DiagnosticList();
        var clock = Stopwatch.StartNew();
        ParameterTable.Evaluate(spec.Parameters, diagnostics);
        Assert.True(clock.Elapsed < TimeSpan.FromSeconds(60), $"{clock.Elapsed}");
        Assert.Equal(201, diagnostics.Count);
    }
}
