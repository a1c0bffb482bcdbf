using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

/// <summary>A mebibyte of the worst that each part of the reader could be given is answered with errors, a bounded number of them.</summary>
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
    public void Is_answered_with_errors(string what, string start, string repeated)
    {
        var text = new StringBuilder($"framegen: 1\n{start}");
        for (int i = 0; text.Length < Full; i++)
        {
            text.Append(repeated.Replace("#", $"{i}", StringComparison.Ordinal));
        }

        var diagnostics = new DiagnosticList();
        byte[] bytes = Encoding.UTF8.GetBytes(text.ToString());
        FrameSpec? spec = SpecReader.Read("a.yaml", path => path is "a.yaml" ? bytes : null, diagnostics);

        // No clock here: what grows with the square of such a text takes minutes, and shows in how long the tests take.
        Assert.True(spec is null, what);
        Assert.InRange(diagnostics.Count, 1, 201);
    }

    [Fact]
    public void Of_thousands_of_unknown_parameters_not_all_are_told()
    {
        string parameters = string.Concat(Enumerable.Range(0, 40_000).Select(i => $"  p{i}: =q{i}\n"));
        FrameSpec spec = SpecText.Sound(SpecText.Small + "parameters:\n" + parameters);
        var diagnostics = new DiagnosticList();
        ParameterTable.Evaluate(spec.Parameters, diagnostics);
        Assert.Equal(201, diagnostics.Count);
    }
}
