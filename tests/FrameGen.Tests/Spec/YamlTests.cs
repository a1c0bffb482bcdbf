using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

/// <summary>What the file itself may be: places, bounds, aliases, text.</summary>
public class YamlTests
{
    [Theory]
    [InlineData("")]
    [InlineData("\n\n")]
    [InlineData("# nothing but a comment\n")]
    [InlineData("---\n")]
    [InlineData("~\n")]
    public void Refuses_an_empty_file(string text) =>
        Assert.Contains("the file is empty; a spec begins with `framegen: 1`", SpecText.OnlyError(text), StringComparison.Ordinal);

    [Theory]
    [InlineData("- framegen: 1\n", "specs/stand.yaml:1:1: error: expected keys with values (`framegen: 1`, `nodes: ...`), got a list")]
    [InlineData("framegen\n", "specs/stand.yaml:1:1: error: expected keys with values (`framegen: 1`, `nodes: ...`), got 'framegen'")]
    public void Refuses_a_root_that_is_no_map(string text, string expected) => Assert.Equal(expected, SpecText.OnlyError(text));

    [Fact]
    public void Refuses_a_second_document()
    {
        string text = SpecText.Small + "---\nframegen: 1\n";
        Assert.StartsWith("specs/stand.yaml:9:1: error: a second document begins here", SpecText.OnlyError(text), StringComparison.Ordinal);
    }

    [Fact]
    public void Takes_a_byte_order_mark_and_any_end_of_line()
    {
        Assert.Single(SpecText.Sound("\uFEFF" + SpecText.Small).Tubes);
        Assert.Single(SpecText.Sound(SpecText.Small.ReplaceLineEndings("\r\n")).Tubes);
        string wrong = SpecText.Small.Replace("900 mm", "900 mn", StringComparison.Ordinal).ReplaceLineEndings("\r\n");
        Assert.StartsWith("specs/stand.yaml:4:26: error: unknown unit 'mn'; did you mean 'mm'?", SpecText.OnlyError(wrong), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("nodes:\n\tfoot: [0 mm, 0 mm, 0 mm]", 3, 1)]
    [InlineData("nodes:\n  foot: [0 mm, 0 mm, 0 mm]\n  \thead: [0 mm, 0 mm, 9 mm]", 4, 3)]
    public void Points_to_a_tab_in_the_indent(string text, int line, int column) =>
        Assert.Equal(
            $"specs/stand.yaml:{line}:{column}: error: a tab in the indent; YAML indents with spaces only",
            SpecText.OnlyError($"framegen: 1\n{text}\n"));

    [Theory]
    [InlineData("framegen: 1\nnodes: {a: [0 mm, 0 mm, 0 mm}\n", 2)]
    [InlineData("framegen: 1\ntitle: \"never closed\nnodes: {}\n", 2)]
    [InlineData("framegen: 1\nnodes:\n  a: [0 mm, 0 mm, 0 mm]\n b: [0 mm, 0 mm, 0 mm]\n", 4)]
    [InlineData("framegen: 1\ntitle: a: b\n", 2)]
    [InlineData("framegen: 1\nnotes: @home\n", 2)]
    public void Says_where_the_text_is_no_yaml(string text, int line)
    {
        Diagnostic error = Assert.Single(SpecText.Errors(text));
        Assert.StartsWith("this is not YAML: ", error.Message, StringComparison.Ordinal);
        Assert.InRange(error.At!.Line, line, line + 1);
    }

    [Fact]
    public void Names_the_first_line_of_a_key_written_twice()
    {
        string text = SpecText.Small.Replace("  head:", "  foot: [1 mm, 0 mm, 0 mm]\n  head:", StringComparison.Ordinal);
        Assert.Equal("specs/stand.yaml:4:3: error: the key 'foot' is written twice; it stands already in line 3", SpecText.OnlyError(text));
    }

    [Fact]
    public void Follows_anchors_aliases_and_merges()
    {
        FrameSpec spec = SpecText.Sound("""
            framegen: 1
            nodes:
              foot: &origin [0 mm, 0 mm, 0 mm]
              head: {from: foot, offset: [0 mm, 0 mm, 900 mm]}
              arm: {from: head, offset: [400 mm, 0 mm, 0 mm]}
              base: *origin
            tubes:
              post: &kind {from: foot, to: head, group: posts}
              beam: {<<: *kind, from: head, to: arm}
              both: {<<: [{group: posts}, *kind], to: arm}
            groups:
              posts: {material: S235, section: round 38 x 1.5 mm}
            """);
        Assert.Equal(("head", "arm", "posts"), (spec.Tubes[1].From.Node.Value, spec.Tubes[1].To.Node.Value, spec.Tubes[1].Group.Value));
        Assert.Equal(("foot", "arm"), (spec.Tubes[2].From.Node.Value, spec.Tubes[2].To.Node.Value));
        Assert.Equal(new SourcePlace(SpecText.Root, 6, 9), Assert.IsType<PointPositionSpec>(spec.Nodes[3].Position).Point.At);
    }

    [Theory]
    [InlineData("base: *orign", "unknown anchor 'orign'; did you mean 'origin'?")]
    [InlineData("base: &self [*self, 0 mm, 0 mm]", "unknown anchor 'self'")]
    public void Refuses_an_alias_of_nothing(string line, string message)
    {
        string text = SpecText.Small.Replace("foot: [0", "foot: &origin [0", StringComparison.Ordinal).Replace("tubes:", $"  {line}\ntubes:", StringComparison.Ordinal);
        string error = SpecText.OnlyError(text);
        Assert.Contains(message, error, StringComparison.Ordinal);
        Assert.StartsWith("specs/stand.yaml:5:", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_tags_and_merges_of_what_is_no_map()
    {
        string text = SpecText.Small.Replace("foot: [", "foot: !!seq [", StringComparison.Ordinal).Replace("post: {", "post: {<<: [1], ", StringComparison.Ordinal);
        IReadOnlyList<Diagnostic> errors = SpecText.Errors(text);
        Assert.Contains("has no meaning in a spec", errors[0].Message, StringComparison.Ordinal);
        Assert.Contains("`<<` takes in keys with values", errors[1].Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_bomb_of_aliases_is_defused()
    {
        var text = new StringBuilder("framegen: 1\nnotes: x\nnodes:\n  a: &a0 [x, x, x, x, x, x, x, x, x, x]\n");
        for (int i = 1; i < 9; i++)
        {
            text.Append($"  b{i}: &a{i} [{string.Join(", ", Enumerable.Repeat($"*a{i - 1}", 10))}]\n");
        }

        Assert.Contains("aliases expand to more than 10000 values", SpecText.OnlyError(text.ToString()), StringComparison.Ordinal);
    }

    [Fact]
    public void Nests_32_deep_and_no_deeper()
    {
        // The root is the first level, `nodes` and the node's own list the next two.
        string deepest = $"framegen: 1\nnodes: {{a: {new string('[', 30)}{new string(']', 30)}}}\n";
        Assert.DoesNotContain(SpecText.Errors(deepest), error => error.Message.Contains("nested deeper", StringComparison.Ordinal));
        string deeper = $"framegen: 1\nnodes: {{a: {new string('[', 31)}{new string(']', 31)}}}\n";
        Assert.StartsWith("specs/stand.yaml:2:42: error: nested deeper than 32 levels", SpecText.OnlyError(deeper), StringComparison.Ordinal);
        Assert.Contains("nested deeper than 32 levels", SpecText.OnlyError("framegen: 1\nnodes: " + new string('[', 900_000)), StringComparison.Ordinal);
    }

    [Fact]
    public void Is_at_most_a_mebibyte()
    {
        string full = SpecText.Small + "#" + new string('-', (1 << 20) - SpecText.Small.Length - 1);
        Assert.Single(SpecText.Sound(full).Tubes);
        Assert.Equal(
            "specs/stand.yaml:1:1: error: the file is larger than 1048576 bytes (1 MiB); no frame needs so much", SpecText.OnlyError(full + "-"));
    }

    [Fact]
    public void Has_at_most_10000_tubes()
    {
        Assert.Equal(10_000, SpecText.Sound(Tubes(10_000)).Tubes.Count);
        Assert.StartsWith("specs/stand.yaml:10008:3: error: more than 10000 tubes", SpecText.OnlyError(Tubes(10_001)), StringComparison.Ordinal);

        static string Tubes(int count) =>
            $"framegen: 1\nnodes:\n  a: [0 mm, 0 mm, 0 mm]\n  b: [0 mm, 0 mm, 9 mm]\ngroups: {{g: {{material: S235, section: rod 9 mm}}}}\n#\ntubes:\n{string.Concat(Enumerable.Range(0, count).Select(i => $"  t{i}: {{from: a, to: b, group: g}}\n"))}";
    }

    [Fact]
    public void Refuses_bytes_that_are_no_text()
    {
        Assert.Contains("the file is UTF-16; save it as UTF-8", Only([0xFF, 0xFE, 0x66, 0]), StringComparison.Ordinal);
        Assert.StartsWith("a.yaml:2:8: error: this is not UTF-8 text", Only([.. "framegen: 1\ntitle: "u8, 0xE9, .. "\n"u8]), StringComparison.Ordinal);
        Assert.StartsWith("a.yaml:2:9: error: the control character U+0007", Only([.. "framegen: 1\ntitle: é"u8, 7, .. "\n"u8]), StringComparison.Ordinal);

        static string Only(byte[] bytes)
        {
            var diagnostics = new DiagnosticList();
            Assert.Null(SpecReader.Read("a.yaml", path => path == "a.yaml" ? bytes : null, diagnostics));
            return Assert.Single(diagnostics).ToString();
        }
    }

    [Fact]
    public void Tells_at_most_200_errors_and_how_many_more()
    {
        string text = SpecText.Small + string.Concat(Enumerable.Range(0, 300).Select(i => $"wrong-{i}: 1\n"));
        IReadOnlyList<Diagnostic> errors = SpecText.Errors(text);
        Assert.Equal(201, errors.Count);
        Assert.Equal("error: and 100 more errors; mend these first", errors[^1].ToString());
    }
}
