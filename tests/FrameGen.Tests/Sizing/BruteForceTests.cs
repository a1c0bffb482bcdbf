using System.Globalization;
using FrameGen.Diagnostics;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Program;
using FrameGen.Sizing.Search;
using FrameGen.Sizing.Targets;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>What is called proven against every design of random frames, looked at one by one.</summary>
public sealed class BruteForceTests(ITestOutputHelper output)
{
    // A larger run: FRAMEGEN_SIZING_SEEDS=24 FRAMEGEN_SIZING_DESIGNS=5000.
    private static readonly int _seeds = Setting("FRAMEGEN_SIZING_SEEDS", 8);
    private static readonly int _mostDesigns = Setting("FRAMEGEN_SIZING_DESIGNS", 300);

    public static TheoryData<int> Seeds => [.. Enumerable.Range(1, _seeds)];

    [Theory]
    [MemberData(nameof(Seeds))]
    public void A_proven_design_is_the_first_that_a_look_at_all_of_them_finds(int seed)
    {
        FrameModel model = RandomFrames.Make(seed, _mostDesigns);
        ExpectFirstOfAll(model);
    }

    // Springs of the feet's own size at two corners.
    [Theory]
    [InlineData(3)]
    [InlineData(8)]
    public void Also_on_springs(int seed) =>
        ExpectFirstOfAll(RandomFrames.Make(seed, 200, f => f.Spring("b1", 40, 60, 0, 0, 0, 2e6).Spring("a3", 100, 0, 80, 0, 0, 0)));

    [Theory]
    [InlineData(3)]
    [InlineData(8)]
    public void Also_with_hinges(int seed) =>
        ExpectFirstOfAll(RandomFrames.Make(seed, 100, f => f.Hinge("t4", Hinges.StartY | Hinges.StartZ | Hinges.EndY | Hinges.EndZ).Hinge("t3", Hinges.EndZ | Hinges.EndX)));

    [Theory]
    [InlineData(2)]
    [InlineData(5)]
    [InlineData(7)]
    [InlineData(12)]
    public void The_cheapest_is_found_with_its_ties_settled_by_mass(int seed)
    {
        // Prices in whole money a metre by the outer size: many sizes cost the same.
        FrameModel model = RandomFrames.Make(seed, 200);
        model = model with
        {
            Groups = [.. model.Groups.Select(g => g with { Candidates = [.. g.Candidates.Select(c => c with { PricePerMetre = Math.Ceiling(c.Section.OuterSize / 8) })] })],
            Sizing = new SizingSpec(SizingObjective.Cost, null, null),
        };
        ExpectFirstOfAll(model);
    }

    [Theory]
    [InlineData(1, 1)]
    [InlineData(2, 2)]
    [InlineData(4, 2)]
    [InlineData(6, 3)]
    [InlineData(9, 2)]
    public void No_more_different_sizes_than_allowed(int seed, int most)
    {
        // Sizes in common, so that groups can share them.
        FrameModel model = RandomFrames.Make(seed, 200);
        IReadOnlyList<Candidate> shared = [.. model.Groups[0].Candidates.Take(3)];
        model = model with
        {
            Groups = [.. model.Groups.Select(g => g with { Candidates = [.. shared.Concat(g.Candidates).DistinctBy(c => c.Section).OrderBy(c => c.Section.Area).Take(4)] })],
            Sizing = new SizingSpec(SizingObjective.Mass, most, null),
        };
        ExpectFirstOfAll(model);
    }

    private static int Setting(string name, int usual) =>
        int.TryParse(Environment.GetEnvironmentVariable(name), NumberStyles.None, CultureInfo.InvariantCulture, out int value) ? value : usual;

    private void ExpectFirstOfAll(FrameModel model)
    {
        EveryDesign all = EveryDesign.Of(model);
        DiagnosticList diagnostics = [];
        SizedFrame? sized = SectionSizer.Size(model, diagnostics, null, 2);
        if (all.First is not { } first)
        {
            Assert.True(sized is null || sized.Status == SizingStatus.Unmet);
            return;
        }

        Assert.NotNull(sized);
        output.WriteLine($"{all.Space.Count} designs, {sized.Analyses} analyses");
        Assert.Equal(SizingStatus.ProvenLightest, sized.Status);
        Assert.Equal(Enumerable.Range(0, all.Space.Groups).Select(g => all.Space[g][first[g]].Section.Name), sized.Sections.Select(s => s.Name));
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void No_row_refuses_a_design_that_meets_the_target_it_is_made_from(int seed)
    {
        EveryDesign all = EveryDesign.Of(RandomFrames.Make(seed, Math.Min(400, _mostDesigns)));
        var random = new Random(seed);
        ChoiceProgram program = new SizingProgram(all.Space).Program;
        var cuts = new TargetCuts(all.Space, all.Structure, all.Welds);
        var rows = new List<(TargetCheck Check, ProgramRow Row)>();
        DesignAnalysis analysis = all.NewAnalysis();
        for (int i = 0; i < 6; i++)
        {
            int[] design = [.. Enumerable.Range(0, all.Space.Groups).Select(g => random.Next(all.Space[g].Length))];
            analysis.Set(design);
            foreach (TargetCheck check in all.Checks.Where(c => c.NeedsFrame))
            {
                rows.AddRange(cuts.From(analysis, check, 0).Select(r => (check, r)));
            }
        }

        int refused = 0;
        var choice = new int[all.Space.Groups];
        for (int d = 0; d < all.Space.Count; d += 1 + random.Next(5))
        {
            all.Space.Decode(d, choice);
            analysis.Set(choice);
            foreach (IGrouping<TargetCheck, (TargetCheck Check, ProgramRow Row)> of in rows.GroupBy(r => r.Check))
            {
                bool met = of.Key.IsMet(analysis);
                foreach ((_, ProgramRow row) in of)
                {
                    bool keeps = row.Keeps(program, choice);
                    Assert.False(met && !keeps, $"design {d} meets the {of.Key.Kind} target (ratio {of.Key.Ratio(analysis)}) and breaks its row");
                    refused += keeps ? 0 : 1;
                }
            }
        }

        output.WriteLine($"{rows.Count} rows refused {refused} times");
    }
}
