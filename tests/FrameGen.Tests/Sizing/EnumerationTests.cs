using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>The search against a plain second method: every design of a random small frame as a frame of given sections, one by one.</summary>
public sealed class EnumerationTests
{
    private static readonly RoundTube[] Stock =
    [
        Round(16, 1), Round(16, 1.5), Round(20, 1), Round(20, 2), Round(25, 1.5), Round(25, 2.5), Round(30, 1.5), Round(30, 3), Round(38, 2),
    ];

    private static readonly string[] Groups = ["legs", "beams", "braces"];

    [Theory]
    [InlineData(1, 0.7)]
    [InlineData(2, 0.8)]
    [InlineData(3, 0.9)]
    [InlineData(4, 1.0)]
    [InlineData(5, 1.1)]
    [InlineData(6, 1.3)]
    [InlineData(7, 1.6)]
    [InlineData(8, 2.0)]
    [InlineData(9, 0.3)]
    public void Finds_what_trying_every_design_finds(int seed, double ease)
    {
        var random = new Random(seed);
        Section[][] candidates = [.. Groups.Select(_ => Stock.OrderBy(_ => random.Next()).Take(4).OrderBy(s => s.Area).ToArray<Section>())];
        int shape = random.Next();

        // Limits as they would come out with middling sizes, times how easy the seed makes it.
        SizedFrame middling = Frame(shape, [.. candidates.Select(c => new[] { c[2] })], true, 1, 1, 0.1).Size();
        double sag = middling.Targets[0].Value * ease;
        double stiffness = middling.Targets[1].Value / ease;
        double safety = middling.Targets[2].Value / (1.3 * ease);

        DiagnosticList diagnostics = [];
        SizedFrame? found = SectionSizer.Size(Frame(shape, candidates, false, sag, stiffness, safety).Build(), diagnostics, null, 2);
        List<Trial> trials = Trials(shape, candidates, sag, stiffness, safety);
        if (trials.Count == 0)
        {
            Assert.Null(found);
            Assert.Contains(diagnostics, d => d.Message.Contains("no choice of sizes fits", StringComparison.Ordinal));
            return;
        }

        Assert.NotNull(found);
        trials.Sort(Trial.Compare);
        int best = trials.FindIndex(t => t.Worst <= 1);
        if (best >= 0)
        {
            Assert.Equal(SizingStatus.ProvenLightest, found.Status);
            Assert.Equal(trials[best].Sections, found.Sections);
            Assert.InRange(found.Analyses, 1, best + 1);
            Assert.All(found.Targets, t => Assert.True(t.Met));
            Assert.Equal(trials[best].Mass, found.MassKg, 12);
        }
        else
        {
            Assert.Equal(SizingStatus.Unmet, found.Status);
            Assert.Equal(trials.Min(t => t.Worst), found.Targets.Max(t => t.Ratio), 9);
            Assert.InRange(found.Analyses, 1, trials.Count);
        }
    }

    private static List<Trial> Trials(int shape, Section[][] candidates, double sag, double stiffness, double safety)
    {
        var trials = new List<Trial>();
        foreach (Section legs in candidates[0])
        {
            foreach (Section beams in candidates[1])
            {
                foreach (Section braces in candidates[2])
                {
                    Section[] sections = [legs, beams, braces];
                    SizedFrame frame = Frame(shape, [.. sections.Select(s => new[] { s })], true, sag, stiffness, safety).Size();
                    bool fits = frame.Joints.All(j => JointFit.Check(frame.Model, j, sections).Count == 0);
                    if (fits)
                    {
                        double mass = frame.Model.Tubes.Sum(t => t.Length * 7850e-9 * sections[t.Group].Area);
                        trials.Add(new Trial(sections, mass, frame.Targets.Max(t => t.Ratio)));
                    }
                }
            }
        }

        return trials;
    }

    // Four legs that lean, a ring of beams on them, a brace on each of two sides; loads on two corners of the ring.
    private static FrameBuilder Frame(int shape, Section[][] candidates, bool given, double sag, double stiffness, double safety)
    {
        var random = new Random(shape);
        var builder = new FrameBuilder();
        for (int g = 0; g < Groups.Length; g++)
        {
            _ = given ? builder.Fixed(Groups[g], candidates[g][0]) : builder.Choose(Groups[g], candidates[g]);
        }

        (double X, double Y)[] corners = [(0, 0), (800, 0), (800, 600), (0, 600)];
        for (int i = 0; i < 4; i++)
        {
            builder.Node($"f{i}", corners[i].X * 1.2, corners[i].Y * 1.3, 0);
            builder.Node($"t{i}", corners[i].X + Shift(), corners[i].Y + Shift(), 700 + Shift());
        }

        for (int i = 0; i < 4; i++)
        {
            builder.Tube($"leg{i}", $"f{i}", $"t{i}", "legs");
        }

        for (int i = 0; i < 4; i++)
        {
            builder.Tube($"beam{i}", $"t{i}", $"t{(i + 1) % 4}", "beams");
        }

        builder.NodeOn("m", "leg0", 350).NodeOn("n", "leg1", 300).Tube("brace0", "m", "n", "braces");
        for (int i = 0; i < 4; i++)
        {
            builder.Clamp($"f{i}");
        }

        builder.Case("rest", new Vector3(0, 0, -1), builder.Force("t0", 0, 0, -300 - Shift()), builder.Line("beam1", 0, 0, -0.3))
            .Case("side", new Vector3(0, 0, -1), builder.Force("t0", 200 + Shift(), 0, 0), builder.Force("t2", 0, 150, 0), builder.Point("beam0", 300, 0, 0, -200));
        return builder.Displacement("side", "t0", null, sag).Stiffness("t2", Vector3.UnitX, stiffness).Strength(safety);

        double Shift() => (random.NextDouble() * 80) - 40;
    }

    private sealed record Trial(Section[] Sections, double Mass, double Worst)
    {
        public static int Compare(Trial a, Trial b)
        {
            int order = Math.Abs(a.Mass - b.Mass) < 1e-9 ? 0 : a.Mass.CompareTo(b.Mass);
            order = order != 0 ? order : a.Sections.Distinct().Count().CompareTo(b.Sections.Distinct().Count());
            return order != 0 ? order : string.CompareOrdinal(a.Names, b.Names);
        }

        private string Names => string.Join('\n', Sections.Select(s => s.Name));
    }
}
