using FrameGen.Diagnostics;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Search;
using FrameGen.Sizing.Targets;

namespace FrameGen.Sizing;

/// <summary>Chooses one section a group: the lightest design that meets every target.</summary>
public static class SectionSizer
{
    /// <summary>So many designs are gone through one by one, and no more.</summary>
    public const long MostDesigns = 200_000;

    /// <summary>Sizes a frame.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="diagnostics">Errors: a mechanism, too many designs. Unmet targets are warnings here, and the status says so.</param>
    /// <param name="progress">Told now and then; may be null.</param>
    /// <returns>The sized frame, with the least bad design when targets can't be met; null when an error was reported.</returns>
    public static SizedFrame? Size(FrameModel model, DiagnosticList diagnostics, IProgress<SizingProgress>? progress = null) =>
        Size(model, diagnostics, progress, Environment.ProcessorCount);

    /// <summary>Sizes a frame on so many threads; the answer does not depend on them.</summary>
    internal static SizedFrame? Size(
        FrameModel model, DiagnosticList diagnostics, IProgress<SizingProgress>? progress, int threads, SearchBudget? budget = null)
    {
        IReadOnlyList<TargetCheck> checks = TargetCheck.All(model);
        DesignSpace space = DesignSpace.Create(
            model, (group, section) => checks.All(c => c.Allows(group, section)), out IReadOnlyList<int> emptied);
        bool needsFrame = model.Cases.Count > 0 || checks.Any(c => c.NeedsFrame);
        StructuralModel? structure = needsFrame ? StructuralModel.Build(model) : null;
        var joints = new JointTable(space);
        var welds = WeldPairs.Build(joints, model);
        DesignAnalysis NewAnalysis() => new(space, joints, welds, structure);
        if (structure is not null && !Mechanisms.StandsStill(structure, diagnostics))
        {
            return null;
        }

        try
        {
            return Choose(space, checks, welds, emptied.Count > 0, NewAnalysis, threads, budget ?? new SearchBudget(), progress, diagnostics);
        }
        catch (MechanismException mechanism)
        {
            // The layout stands still: what moves does so because sizes are too far apart for the arithmetic.
            diagnostics.Error(
                null,
                "the frame can't be solved reliably: some tubes are so much stiffer than others, or so much shorter, that to rounding "
                + $"{Mechanisms.Subject(structure!, mechanism.Motions[0])} can move as if nothing held it; bring their sizes closer together");
            return null;
        }
    }

    private static SizedFrame? Choose(
        DesignSpace space,
        IReadOnlyList<TargetCheck> checks,
        WeldPairs welds,
        bool hopeless,
        Func<DesignAnalysis> newAnalysis,
        int threads,
        SearchBudget budget,
        IProgress<SizingProgress>? progress,
        DiagnosticList diagnostics)
    {
        FrameModel model = space.Model;
        DesignAnalysis analysis = newAnalysis();
        var lightest = new LightestSearch(space, analysis, hopeless ? [] : checks, welds);
        int[]? found = lightest.Run(budget);
        int[] start = lightest.Best ?? lightest.Last;
        if (!lightest.SomeFit)
        {
            // The budget may have ended before a design came up that can be made.
            var any = new LightestSearch(space, analysis, [], welds);
            start = any.Fits() ? any.Last : [];
        }

        if (start.Length == 0)
        {
            SayNothingFits(space, analysis, welds, diagnostics);
            return null;
        }

        bool framed = checks.Any(c => c.NeedsFrame);
        if (found is not null && !hopeless)
        {
            FitCost? fits = FitCost.Look(space, analysis, checks, welds, lightest, found);
            fits?.Say(model, diagnostics);
            analysis.Set(found);
            return SizingFinish.Describe(
                analysis,
                model.Groups.All(g => g.IsFixed) ? SizingStatus.Fixed : SizingStatus.ProvenLightest,
                framed ? lightest.Analyses : analysis.Structure is null ? 0 : 1,
                checks,
                diagnostics) is { } sized ? sized with { Fits = fits } : null;
        }

        if (space.Count > budget.OneByOne)
        {
            return FinishLarge(space, checks, analysis, lightest, start, welds, budget, diagnostics);
        }

        // What the program could not settle within its budget is looked through one by one; its rows spare most of the work.
        var search = new DesignSearch(space, space.InOrder(), checks, analysis.Joints, newAnalysis, threads, progress) { Rows = lightest.Rows };
        if (!hopeless && lightest.Bound < long.MaxValue && search.FindFirst() is { Rank: { } rank } result)
        {
            search.Turn(analysis, rank);
            int[] first = [.. analysis.Choice];
            FitCost? fits = FitCost.Look(space, analysis, checks, welds, lightest, first);
            fits?.Say(model, diagnostics);
            analysis.Set(first);
            SizedFrame? sized = SizingFinish.Describe(analysis, SizingStatus.ProvenLightest, lightest.Analyses + result.Looked, checks, diagnostics);
            return sized is null ? null : sized with { Fits = fits };
        }

        SearchSurvey survey = search.Survey();
        UnmetReport.Explain(search, survey, analysis, diagnostics);
        RangeRelaxation.Suggest(model, diagnostics);
        search.Turn(analysis, survey.LeastBad);
        return SizingFinish.Describe(analysis, SizingStatus.Unmet, lightest.Analyses, search.Checks, diagnostics);
    }

    private static void SayNothingFits(DesignSpace space, DesignAnalysis analysis, WeldPairs welds, DiagnosticList diagnostics)
    {
        if (space.Model.Sizing.DifferentSizes is { } most && new LightestSearch(space.WithAnySizes(), analysis, [], welds).Fits())
        {
            diagnostics.Error(space.Model.Sizing.At, $"sizing: different_sizes: {most} is too few: no choice of so few sizes serves every group and fits every joint; allow more, or give groups more sizes in common");
        }
        else
        {
            FitReport.Explain(analysis, diagnostics);
        }
    }

    // Too many designs to look at each: exchanges from the lightest design that no row refuses, and what is proven is the bound.
    private static SizedFrame? FinishLarge(
        DesignSpace space,
        IReadOnlyList<TargetCheck> checks,
        DesignAnalysis analysis,
        LightestSearch lightest,
        int[] start,
        WeldPairs welds,
        SearchBudget budget,
        DiagnosticList diagnostics)
    {
        var exchange = new ExchangeSearch(space, analysis, checks, lightest.Rows, lightest.Cuts);
        int[]? found = exchange.Run(start, budget.Exchanges);
        long analyses = lightest.Analyses + exchange.Analyses;
        if (found is not null && lightest.Bound < long.MaxValue)
        {
            bool proven = lightest.Bound >= space.UnitsOf(found);
            FitCost? fits = FitCost.Look(space, analysis, checks, welds, lightest, found);
            fits?.Say(space.Model, diagnostics);
            analysis.Set(found);
            SizedFrame? sized = SizingFinish.Describe(
                analysis, proven ? SizingStatus.ProvenLightest : SizingStatus.BestFound, analyses, checks, diagnostics, proven ? null : lightest.Bound);
            return sized is null ? null : sized with { Fits = fits };
        }

        exchange.Describe(diagnostics, lightest.Bound == long.MaxValue);
        int[] leastBad = [.. analysis.Choice];
        RangeRelaxation.Suggest(space.Model, diagnostics);
        analysis.Set(leastBad);
        return SizingFinish.Describe(analysis, SizingStatus.Unmet, analyses, checks, diagnostics);
    }
}
