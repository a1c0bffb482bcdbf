using System.Text.RegularExpressions;
using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>The reference of the format says what the program does.</summary>
public class ReferenceTests
{
    private static readonly string Text = File.ReadAllText(Repository.PathOf("specs/REFERENCE.md"));

    [Fact]
    public void Its_examples_are_one_spec_that_builds()
    {
        string spec = string.Concat(Blocks().Matches(Text).Select(m => m.Groups["spec"].Value));
        using BuiltFrame built = BuiltFrame.FromText(spec).Succeeded();
        Assert.Contains("Proven lightest", built.Stdout, StringComparison.Ordinal);
    }

    [Fact]
    public void Its_contents_lead_to_its_headings()
    {
        string[] anchors = [.. Headings().Matches(Text).Select(m => Anchor(m.Groups["title"].Value))];
        string[] links = [.. Links().Matches(Text).Select(m => m.Groups["anchor"].Value)];
        Assert.NotEmpty(links);
        Assert.All(links, l => Assert.Contains(l, anchors));
    }

    private static string Anchor(string title) => title.ToLowerInvariant().Replace(' ', '-');

    private static Regex Blocks() => new("```yaml\n(?<spec>.*?)```", RegexOptions.Singleline | RegexOptions.ExplicitCapture, TimeSpan.FromSeconds(5));

    private static Regex Headings() => new("^##+ (?<title>.+)$", RegexOptions.Multiline | RegexOptions.ExplicitCapture, TimeSpan.FromSeconds(5));

    private static Regex Links() => new(@"\]\(#(?<anchor>[^)]+)\)", RegexOptions.ExplicitCapture, TimeSpan.FromSeconds(5));
}
