using System.Text;
using System.Text.Json;
using System.Text.RegularExpressions;
using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Output;
using FrameGen.Output.Report;
using FrameGen.Sizing;
using FrameGen.Tests.Fabrication;
using Xunit;

namespace FrameGen.Tests.Output;

public class ReportTests
{
    private const string Hostile = "</script><script>alert(1)</script> \"quoted\" & {{ 1 / 0 }} <img src=x onerror=alert(1)>";

    [Fact]
    public void A_hostile_title_is_text_everywhere()
    {
        string page = Page(GateFrame.Package(Hostile, Hostile));
        Assert.DoesNotContain("<img", page, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("alert(1)</script>", page, StringComparison.Ordinal);
        Assert.Contains("{{ 1 / 0 }}", page, StringComparison.Ordinal);

        // Only the page's own two: the data of the picture and the program.
        Assert.Equal(2, Regex.Count(page, "<script", RegexOptions.None, TimeSpan.FromSeconds(10)));
    }

    [Fact]
    public void Names_can_not_leave_the_picture_s_data()
    {
        ShopPackage package = GateFrame.Package();
        var model = package.Cut.Sized.Model;
        var named = model with
        {
            Nodes = [.. model.Nodes.Select(n => n with { Name = $"</script>{n.Name}" })],
            Tubes = [.. model.Tubes.Select(t => t with { Name = $"<u>{t.Name}" })],
            Groups = [.. model.Groups.Select(g => g with { Name = $"<!--{g.Name}" })],
        };
        string page = Page(package with { Cut = package.Cut with { Sized = package.Cut.Sized with { Model = named } } });
        JsonElement scene = Scene(page);
        Assert.Equal("<u>rail", scene.GetProperty("tubes")[0].GetProperty("name").GetString());
        Assert.Equal("</script>a", scene.GetProperty("frame").GetProperty("nodes")[0].GetProperty("name").GetString());
        Assert.DoesNotContain("<u>rail", page, StringComparison.Ordinal);
        Assert.DoesNotContain("<!--", page, StringComparison.Ordinal);
    }

    [Fact]
    public void Needs_nothing_from_outside_and_says_so_to_the_browser()
    {
        string page = Page(GateFrame.Package());
        Assert.Contains("content=\"default-src 'none';", page, StringComparison.Ordinal);

        // The name of a drawing's language is no address that is asked for anything.
        string rest = page.Replace("http://www.w3.org/2000/svg", string.Empty, StringComparison.Ordinal);
        Assert.DoesNotContain("http:", rest, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("https:", rest, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotMatch(@"<(?:link|script|img|iframe|object|embed)\b[^>]*\b(?:src|href)\s*=\s*[""'](?!data:,)", rest);
        Assert.DoesNotMatch(@"@import|url\(|fetch\(|XMLHttpRequest|WebSocket|\beval\(|innerHTML", rest);
    }

    [Fact]
    public void Answers_first_what_a_builder_asks()
    {
        string page = Page(GateFrame.Package());
        int answers = page.IndexOf("class=\"answers\"", StringComparison.Ordinal);
        Assert.InRange(answers, 0, page.IndexOf("id=\"frame\"", StringComparison.Ordinal));
        Assert.Contains("<strong>Yes</strong> Nearest its limit: displacement of tip along z, case standing, 50.0 % of its limit.", page, StringComparison.Ordinal);
        Assert.Contains("2 bars", page, StringComparison.Ordinal);
        Assert.All(Cautions.All, c => Assert.Contains($"<li>{c}</li>", page, StringComparison.Ordinal));
        Assert.DoesNotContain(Cautions.NotMeetingTargets, page, StringComparison.Ordinal);
    }

    [Fact]
    public void Is_stamped_when_targets_are_not_met()
    {
        string page = Page(GateFrame.Package(status: SizingStatus.Unmet));
        int stamp = page.IndexOf(Cautions.NotMeetingTargets, StringComparison.Ordinal);
        Assert.InRange(stamp, 0, page.IndexOf("<main", StringComparison.Ordinal));
        Assert.Contains("No, 1 of 1 missed", page, StringComparison.Ordinal);
        Assert.Contains("MISSED", page, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_label_and_heading_is_tied_up()
    {
        string page = Page(GateFrame.CopedPackage());
        string[] ids = [.. Regex.Matches(page, " id=\"(?<id>[^\"]+)\"", RegexOptions.None, TimeSpan.FromSeconds(10)).Select(m => m.Groups["id"].Value)];
        Assert.Equal(ids.Length, ids.Distinct(StringComparer.Ordinal).Count());
        foreach (Match link in Regex.Matches(page, "(?:href=\"#|aria-labelledby=\"|aria-describedby=\"|for=\")(?<id>[^\"]+)\"", RegexOptions.None, TimeSpan.FromSeconds(10)))
        {
            Assert.Contains(link.Groups["id"].Value, ids);
        }

        int[] levels = [.. Regex.Matches(page, "<h(?<level>[1-6])[ >]", RegexOptions.None, TimeSpan.FromSeconds(10)).Select(m => m.Groups["level"].Value[0] - '0')];
        Assert.Equal(1, levels[0]);
        Assert.All(levels.Zip(levels.Skip(1)), p => Assert.True(p.Second <= p.First + 1, $"h{p.First} then h{p.Second}"));
    }

    // The gate's post stands at x = 400 on a rail of radius 20: its lower end is the saddle z = √(20² − (15 sin c)²) at the skin, its upper the
    // miter t = 15 cos c; by hand.
    [Fact]
    public void The_picture_s_columns_are_the_true_cut_ends()
    {
        JsonElement post = Scene(Page(GateFrame.Package())).GetProperty("tubes")[1];
        double step = post.GetProperty("step").GetDouble();
        double[] values = [.. Shorts(post.GetProperty("columns").GetBytesFromBase64()).Select(n => n * step)];
        Assert.Equal(0, values.Length % 8);
        Assert.InRange(values.Length / 8, 41, 120);
        for (int i = 0; i < values.Length; i += 8)
        {
            (double x, double y) = (values[i], values[i + 1]);
            Assert.Equal(15, Math.Sqrt((x * x) + (y * y)), 0.02);
            Assert.Equal(Math.Sqrt((20 * 20) - (y * y)), values[i + 4], 0.05);
            Assert.Equal(600 - x, values[i + 5], 0.05);
        }
    }

    [Theory]
    [InlineData(-2, 1, 1)]
    [InlineData(-1, 2, 2)]
    [InlineData(0.5, 2.5, 2.5)]
    [InlineData(1, 3, 7)]
    [InlineData(1.5, 8, 8)]
    [InlineData(2, 9, 9)]
    public void A_curve_that_steps_is_read_from_both_sides(double clock, double before, double after)
    {
        CurvePoint[] points = [new(-2, 1), new(-1, 2), new(0, 2), new(1, 3), new(1, 5), new(1, 7), new(2, 9)];
        Assert.Equal((before, after), SceneColumns.At(points, clock));
    }

    [Fact]
    public void Stays_small()
    {
        Assert.InRange(Encoding.UTF8.GetByteCount(Page(GateFrame.CopedPackage())), 20_000, 150_000);
    }

    private static string Page(ShopPackage package) => TextTemplate.Render(
        "report.html",
        ReportModel.From(
            package,
            CutListModel.From(package),
            StockPlanModel.From(package),
            SetupModel.From(package),
            WeldsModel.From(package, WeldPlanner.Plan(package.Cut))));

    private static JsonElement Scene(string page)
    {
        const string Opening = "id=\"scene\">";
        int from = page.IndexOf(Opening, StringComparison.Ordinal) + Opening.Length;
        return JsonDocument.Parse(page[from..page.IndexOf("</script>", from, StringComparison.Ordinal)]).RootElement;
    }

    private static IEnumerable<short> Shorts(byte[] bytes) => Enumerable.Range(0, bytes.Length / 2).Select(i => BitConverter.ToInt16(bytes, 2 * i));
}
