using System.Text.RegularExpressions;
using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>What the README shows works as it stands there.</summary>
public class ReadmeTests
{
    private static readonly string Text = File.ReadAllText(Repository.PathOf("README.md"));

    [Fact]
    public void The_spec_of_the_tour_builds()
    {
        Match spec = YamlBlock().Match(Text);
        Assert.True(spec.Success);
        using BuiltFrame built = BuiltFrame.FromText(spec.Groups["spec"].Value).Succeeded();
        Assert.Contains("Proven lightest", built.Stdout, StringComparison.Ordinal);
    }

    [Fact]
    public void Files_it_points_to_are_there()
    {
        MatchCollection links = Link().Matches(Text);
        Assert.NotEmpty(links);
        Assert.All(links, link => Assert.True(File.Exists(Repository.PathOf(link.Groups["file"].Value)), link.Value));
        Assert.Contains("-- build specs/quayside-trailer.yaml", Text, StringComparison.Ordinal);
    }

    private static Regex YamlBlock() => new("```yaml\n(?<spec>.*?)```", RegexOptions.Singleline | RegexOptions.ExplicitCapture, TimeSpan.FromSeconds(5));

    private static Regex Link() => new(@"\]\((?<file>[^)]+)\)", RegexOptions.ExplicitCapture, TimeSpan.FromSeconds(5));
}
