using FrameGen.Diagnostics;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Program;
using FrameGen.Sizing.Search;
using FrameGen.Sizing.Targets;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>What is called proven against every design of random frames, looked at one by one.</summary>
public sealed class BruteForceTests(ITestOutputHelper output)
{
    private const long MostDesigns = 5_000;

    public static TheoryData<int> Seeds => [.. Enumerable.Range(1, 24)];

    [Theory]
    [MemberData(nameof(Seeds))]
    public void A_proven_design_is_the_first_that_a_look_at_all_of_them_finds(int seed)
    {
        FrameModel model = RandomFrames.Make(seed, MostDesigns);
        ExpectFirstOfAll(model);
    }

    // Springs of the feet's own size at two corners.
    [Theory]
    [InlineData(3)]
    [InlineData(8)]
    [InlineData(11)]
    [InlineData(17)]
    public void Also_on_springs(int seed) =>
        ExpectFirstOfAll(RandomFrames.Make(seed, 1_000, f => f.Spring("b1", 40, 60, 0, 0, 0, 2e6).Spring("a3", 100, 0, 80, 0, 0, 0)));

    [Theory]
    [InlineData(3)]
    [InlineData(8)]
    [InlineData(11)]
    public void Also_with_hinges(int seed) =>
        ExpectFirstOfAll(RandomFrames.Make(seed, 300, f => f.Hinge("t4", Hinges.StartY | Hinges.StartZ | Hinges.EndY | Hinges.EndZ).Hinge("t3", Hinges.EndZ | Hinges.EndX)));

    private void ExpectFirstOfAll(FrameModel model)
    {
        Everything all = Everything.Of(model);
        DiagnosticList diagnostics = [];
        SizedFrame? sized = SectionSizer.Size(model, diagnostics, null, 2);
        if (all.First is not { } first)
        {
            Assert.True(sized is null || sized.Status == SizingStatus.Unmet);
            return;
        }

        Assert.NotNull(sized);
        output.WriteLine($"{all.Space.Count} designs, the answer is number {all.Rank + 1}: {sized.Analyses} analyses");
        Assert.Equal(SizingStatus.ProvenLightest, sized.Status);
        Assert.Equal(Enumerable.Range(0, all.Space.Groups).Select(g => all.Space[g][first[g]].Section.Name), sized.Sections.Select(s => s.Name));
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void No_row_refuses_a_design_that_meets_the_target_it_is_made_from(int seed)
    {
        Everything all = Everything.Of(RandomFrames.Make(seed, 400));
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
        for (int d = 0; d < all.Space.Count; d += 1 + random.Next(3))
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

    /// <summary>All designs of a frame, and the first in order of mass that meets the targets.</summary>
    private sealed record Everything(DesignSpace Space, IReadOnlyList<TargetCheck> Checks, StructuralModel Structure, JointTable Joints, WeldPairs Welds)
    {
        public int[]? First { get; private init; }

        public int Rank { get; private init; }

        public DesignAnalysis NewAnalysis() => new(Space, Joints, Welds, Structure);

        public static Everything Of(FrameModel model)
        {
            IReadOnlyList<TargetCheck> checks = TargetCheck.All(model);
            DesignSpace space = DesignSpace.Create(model, (_, _) => true, out _);
            var structure = StructuralModel.Build(model);
            var joints = new JointTable(space);
            var welds = WeldPairs.Build(joints, model);
            var all = new Everything(space, checks, structure, joints, welds);
            int[] order = space.InOrder();
            DesignAnalysis analysis = all.NewAnalysis();
            TargetCheck[] cheapFirst = [.. checks.OrderBy(c => c.Cost)];
            var choice = new int[space.Groups];
            for (int rank = 0; rank < order.Length; rank++)
            {
                space.Decode(order[rank], choice);
                analysis.Set(choice);
                if (space.IsAllowed(choice) && joints.Fits(choice, analysis.Sections) && cheapFirst.All(c => c.Ratio(analysis) <= 1))
                {
                    return all with { First = [.. choice], Rank = rank };
                }
            }

            return all;
        }
    }
}
