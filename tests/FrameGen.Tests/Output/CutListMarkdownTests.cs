using FrameGen.Output;
using FrameGen.Sizing;
using FrameGen.Tests.Fabrication;
using Xunit;

namespace FrameGen.Tests.Output;

public class CutListMarkdownTests
{
    private static readonly string Post = GateFrame.PartOf(GateFrame.Package(), "post");

    [Fact]
    public void Has_a_row_a_part_and_the_cautions()
    {
        string[] lines = Render().Split('\n');
        Assert.Equal("# Cut list: Garden gate, revision B", lines[0]);
        string[] row = Cells(lines.First(l => l.StartsWith($"| {Post} ", StringComparison.Ordinal)));

        // The post's mass is checked where it is computed.
        Assert.Equal([Post, "1", "post", "601.8"], row[..4]);
        Assert.Equal(["cope to rail", "miter with arm", "0.0", "contour cut"], row[6..]);
        Assert.All(lines, l => Assert.Equal(l.TrimEnd(), l));
        Assert.DoesNotContain("\n\n\n", string.Join('\n', lines), StringComparison.Ordinal);
        Assert.All(Cautions.All, c => Assert.Contains(lines, l => l.Equals("- " + c, StringComparison.Ordinal)));
        Assert.DoesNotContain(Cautions.NotMeetingTargets, string.Join('\n', lines), StringComparison.Ordinal);
    }

    [Fact]
    public void Adds_up_each_section_and_all()
    {
        string[] lines = Render().Split('\n');
        string[] totals = [.. lines.SkipWhile(l => !l.Equals("## Totals", StringComparison.Ordinal)).Skip(2).TakeWhile(l => l.Length > 0)];
        Assert.Equal(["section", "material", "pieces", "cut length", "spec mass", "cut mass"], Cells(totals[0]));

        // The rail is cut square at its nodes: 1000 mm of 40 x 2 weigh the same both ways.
        Assert.Equal(["round 40 x 2 mm", "S235", "1", "1000.0", "1.874", "1.874"], Cells(totals[^2]));
        Assert.Equal(["**all**", "", "3"], Cells(totals[^1])[..3]);
        Assert.Single(totals.Select(l => l.Length).Distinct());
    }

    // The post stands square on a rail of 40 with no gap; its miter halves a right angle.
    [Fact]
    public void Sets_out_each_end_for_the_saw()
    {
        string[] lines = Render().Split('\n');
        string[] ends = [.. lines.SkipWhile(l => !l.Equals("## Ends to shape", StringComparison.Ordinal)).Skip(4).TakeWhile(l => l.Length > 0)];
        int post = Array.FindIndex(ends, l => Cells(l)[0] == Post);
        Assert.Equal([Post, "from", "cope", "rail", "90.0", "0.0", "0.0", "", "40.0"], Cells(ends[post]));
        Assert.Equal(["", "to", "miter", "arm", "90.0", "45.0", "0.0", "", ""], Cells(ends[post + 1]));
        Assert.Equal(3, ends.Length);
    }

    [Fact]
    public void Tables_are_aligned_and_keep_their_cells()
    {
        const string Ragged = "text\n| a | b |\n| --- | ---: |\n| long cell | 1 |\n| x \\| y | 22.5 |\ntext";
        const string Aligned = "text\n| a         |    b |\n| --------- | ---: |\n| long cell |    1 |\n| x \\| y    | 22.5 |\ntext";
        Assert.Equal(Aligned, MarkdownText.AlignTables(Ragged));
        Assert.Equal(Aligned, MarkdownText.AlignTables(Aligned));
    }

    [Fact]
    public void Is_stamped_when_targets_are_not_met() =>
        Assert.StartsWith("> **NOT MEETING TARGETS**\n\n# Cut list", Render(status: SizingStatus.Unmet), StringComparison.Ordinal);

    [Fact]
    public void Template_code_in_a_title_is_text()
    {
        string text = Render("{{ tool }} | <b>", notes: "# not a heading\n- nor a list {{ 1 / 0 }}");
        Assert.Contains(@"# Cut list: {{ tool }} \| \<b>, revision B", text, StringComparison.Ordinal);
        Assert.Contains(@"\# not a heading - nor a list {{ 1 / 0 }}", text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("rail-l", "rail-l")]
    [InlineData("a_b*c", @"a_b\*c")]
    [InlineData("_a_ 2 * 3", @"\_a\_ 2 * 3")]
    [InlineData("* item", @"\* item")]
    [InlineData("run `x`, don't `y`", "run 'x', don't 'y'")]
    [InlineData("[text](http://x) [1]", @"[text\](http://x) [1]")]
    [InlineData("a <b> < 3 > 2", @"a \<b> < 3 > 2")]
    [InlineData("> said", @"\> said")]
    [InlineData("ends ##", @"ends \#\#")]
    [InlineData("no. #3 at ~5 mm, ~~not~~", @"no. #3 at ~5 mm, \~\~not\~\~")]
    [InlineData("R&D &amp; A&B", @"R&D \&amp; A&B")]
    [InlineData("$5", "$5")]
    [InlineData("$5$", @"\$5\$")]
    [InlineData(@"C:\x \* \", @"C:\x \\\* \\")]
    [InlineData("1. first", @"1\. first")]
    [InlineData("12) first", @"12\) first")]
    [InlineData("- item", @"\- item")]
    [InlineData("  two\r\n\tlines ", "two lines")]
    [InlineData("", "")]
    public void Escapes_markdown(string text, string expected) => Assert.Equal(expected, MarkdownText.Escape(text));

    private static string Render(string title = "Garden gate", string notes = "", SizingStatus status = SizingStatus.Fixed) =>
        TextTemplate.Render("cut-list.md", CutListModel.From(GateFrame.Package(title, notes, status)));

    private static string[] Cells(string row) => [.. row.Split('|')[1..^1].Select(c => c.Trim())];
}
