using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>A spec that is wrong, or a frame that can't be made: said in the user's words with its place, and nothing written.</summary>
public class RefusedSpecTests
{
    private const string Good = """
        framegen: 1
        title: Stand
        nodes:
          foot: [0 mm, 0 mm, 0 mm]
          head: [0 mm, 0 mm, 600 mm]
          arm:  [400 mm, 0 mm, 600 mm]
        tubes:
          post: {from: foot, to: head, group: main}
          boom: {from: head, to: arm, group: main}
        groups:
          main: {material: S235, section: round 42.4 x 2.6 mm}
        supports:
          foot: {hold: [x, y, z, rx, ry, rz]}
        cases:
          hung:
            self_weight: [0, 0, -1]
            loads:
              - {node: arm, force: [0 N, 0 N, -300 N]}
        targets:
          - displacement: {case: hung, node: arm, along: z, max: 20 mm}

        """;

    [Fact]
    public void The_spec_the_others_are_made_from_builds()
    {
        using BuiltFrame built = BuiltFrame.FromText(Good).Succeeded();
        Assert.True(File.Exists(built.PathOf("manifest.json")));
    }

    // Old text, new text, exit code, line of the error, words that must be said.
    [Theory]
    [InlineData("600 mm]", "600]", 2, 5, "write `600 mm`")]
    [InlineData("[400 mm,", "[1e300 mm,", 2, 6, "1e")]
    [InlineData("x 2.6 mm", "x 30 mm", 2, 11, "bore")]
    [InlineData("group: main}\n  boom", "group: mian}\n  boom", 2, 8, "main")]
    [InlineData("to: arm,", "to: head,", 2, 9, "boom")]
    [InlineData("title:", "titel:", 2, 2, "title")]
    [InlineData("hold: [x, y, z, rx, ry, rz]", "hold: [x, y, z, ry, rz]", 2, null, "turn")]
    [InlineData("foot: {hold", "fot: {hold", 2, 13, "foot")]
    [InlineData("max: 20 mm", "max: 20 kg", 2, 20, "mass")]
    [InlineData("material: S235", "material: S234", 2, 11, "S235")]
    [InlineData("post:", "../post:", 2, 8, "../post")]
    [InlineData("max: 20 mm", "max: 0.01 mm", 1, null, "displacement")]
    public void Says_what_is_wrong_where_and_writes_nothing(string old, string text, int exit, int? line, string words)
    {
        Assert.Contains(old, Good, StringComparison.Ordinal);
        using BuiltFrame built = BuiltFrame.FromText(Good.Replace(old, text, StringComparison.Ordinal));
        Assert.True(built.ExitCode == exit, $"exit {built.ExitCode}\n{built.Stderr}");
        Assert.Contains(words, built.Stderr, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", built.Stderr, StringComparison.Ordinal);
        if (line is { } number)
        {
            Assert.Contains($"frame.yaml:{number}:", built.Stderr, StringComparison.Ordinal);
        }

        Assert.False(Directory.Exists(built.Folder), "a refused spec left papers");
    }

    [Fact]
    public void All_errors_of_a_spec_are_said_at_once()
    {
        using BuiltFrame built = BuiltFrame.FromText(Good
            .Replace("600 mm]", "600]", StringComparison.Ordinal)
            .Replace("titel", "title", StringComparison.Ordinal)
            .Replace("x 2.6 mm", "x 30 mm", StringComparison.Ordinal)
            .Replace("max: 20 mm", "max: 20 kg", StringComparison.Ordinal));
        foreach (int line in new[] { 5, 6, 11, 20 })
        {
            Assert.Contains($"frame.yaml:{line}:", built.Stderr, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Text_with_control_characters_of_a_format_is_printed_as_text()
    {
        using BuiltFrame built = BuiltFrame.FromText(Good.Replace("title: Stand", "title: \"%%d {{ 1 + 1 }} | \\\\P (x) <b>\"", StringComparison.Ordinal)).Succeeded();
        Assert.Contains("{{ 1 + 1 }}", File.ReadAllText(built.PathOf("frame.json")), StringComparison.Ordinal);
        const string ReadText = """
            import sys, ezdxf
            doc = ezdxf.readfile(sys.argv[1])
            print("\n".join(e.plain_text() for e in doc.modelspace().query("TEXT")))
            """;
        string text = ForeignProgram.Python("ezdxf").Run("-c", ReadText, built.PathOf("developed", BuiltFrame.PartOf(built.FrameJson(), "boom").File + ".dxf"));
        Assert.Contains("{{ 1 + 1 }}", text, StringComparison.Ordinal);
        Assert.Contains("<b>", text, StringComparison.Ordinal);
        Assert.DoesNotContain("°", text.Split('\n').First(l => l.Contains("<b>", StringComparison.Ordinal)), StringComparison.Ordinal);
    }
}
