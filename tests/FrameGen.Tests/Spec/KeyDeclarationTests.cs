using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Spec;
using FrameGen.Spec.Forms;
using FrameGen.Spec.Keys;
using FrameGen.Spec.Yaml;
using Xunit;

namespace FrameGen.Tests.Spec;

/// <summary>The keys are data: what they say of themselves must be true.</summary>
public class KeyDeclarationTests
{
    /// <summary>All keys of a spec file and of the pinned sizes beside it, with the way to each.</summary>
    public static TheoryData<string> Ways => [.. All().Select(found => found.Way).Distinct(StringComparer.Ordinal)];

    [Theory]
    [MemberData(nameof(Ways))]
    public void The_example_of_a_key_is_read_by_it(string way)
    {
        foreach ((_, Key key) in All().Where(found => string.Equals(found.Way, way, StringComparison.Ordinal)))
        {
            var problems = new ProblemList();
            YamlNode map = YamlComposer.Compose("a.yaml", $"{key.Name}: {key.Example}\n", problems);
            YamlNode value = Assert.IsType<YamlMapping>(map).Entries[0].Value;
            key.TryRead(value, new Reading(problems, new Placed<string>("owner", value.At)), out _);
            var diagnostics = new DiagnosticList();
            problems.TellInOrder(["a.yaml"], diagnostics);
            Assert.DoesNotContain(diagnostics, error => !error.Message.StartsWith("not supported yet: ", StringComparison.Ordinal));
        }
    }

    [Theory]
    [MemberData(nameof(Ways))]
    public void A_key_is_described(string way)
    {
        foreach ((_, Key key) in All().Where(found => string.Equals(found.Way, way, StringComparison.Ordinal)))
        {
            Assert.InRange(key.Description.Length, 4, 200);
            Assert.False(key.Description.EndsWith('.'), key.Description);
        }
    }

    // In the order of the format's description; `loads` stands in a case, not at the root.
    [Fact]
    public void The_root_has_the_keys_of_the_format() => Assert.Equal(
        "framegen title revision notes display include parameters mirror nodes tubes groups materials stock have measured sizing supports masses cases targets joints fabrication",
        string.Join(' ', FileKeys.Spec.Keys.Select(key => key.Name)));

    private static List<(string Way, Key Key)> All()
    {
        var found = new List<(string Way, Key Key)>();
        Walk(FileKeys.Spec, string.Empty, found);
        Walk(FrozenKeys.File, "frozen", found);
        return found;
    }

    private static void Walk(Form form, string way, List<(string Way, Key Key)> found)
    {
        foreach (Key key in form.Keys)
        {
            string step = new StringBuilder(way).Append(way.Length > 0 ? "." : string.Empty).Append(key.Name).ToString();
            found.Add((step, key));
            Walk(key.Form, step, found);
        }

        foreach (Form part in form.Parts)
        {
            Walk(part, way, found);
        }
    }
}
