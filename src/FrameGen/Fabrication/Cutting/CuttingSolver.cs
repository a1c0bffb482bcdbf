namespace FrameGen.Fabrication.Cutting;

/// <summary>Cuts pieces from as few bought bars as it can, and says whether fewer would do.</summary>
/// <remarks>
/// What is quick comes first, and the first plan that meets a bound ends the work: filling each bar fullest; column generation for
/// the bound and its rounding; then a search that closes the gap from either side. All of it in whole numbers but for the
/// prices of the relaxation, all of it limited by counted steps: the same plan on every machine.
/// </remarks>
internal static class CuttingSolver
{
    private const long StepsABar = 50_000;
    private const long StepsOfRelaxation = 40_000_000;
    private const long StepsOfRounding = 20_000_000;
    private const long StepsOfSearch = 5_000_000;

    // A bound of 47.0000001 may be 47 that rounding has lifted.
    private const double BoundRounding = 1e-6;

    /// <summary>Solves a problem.</summary>
    public static CuttingPlan Solve(CuttingProblem problem) => Solve(problem, new StepBudget(long.MaxValue));

    /// <summary>Solves a problem and tells how many steps it took.</summary>
    /// <param name="problem">The problem.</param>
    /// <param name="counter">Counts the steps.</param>
    public static CuttingPlan Solve(CuttingProblem problem, StepBudget counter)
    {
        int bound = MaterialBound(problem);
        CuttingDraft best = Fill(problem, bound, counter);
        if (best.Bought > bound)
        {
            var budget = new StepBudget(StepsOfRelaxation);
            PatternRelaxation relaxation = PatternRelaxation.Solve(problem, problem.Counts, problem.RackCounts, best.Bars, budget);
            counter.Take(budget.Used);
            bound = Math.Max(bound, (int)Math.Ceiling(relaxation.Bound - BoundRounding));

            budget = new StepBudget(StepsOfRounding);
            best = new PatternRounding(problem, budget).Better(best, relaxation, bound);
            counter.Take(budget.Used);
            (best, bound) = Search(problem, best, bound, counter);
        }

        return new CuttingPlan(
            [.. best.Bars.OrderBy(b => b.RackKind ?? int.MaxValue)], Math.Min(bound, best.Bought), best.Unplaced);
    }

    private static CuttingDraft Fill(CuttingProblem problem, int bound, StepBudget counter)
    {
        CuttingDraft? best = null;
        foreach (double favour in (ReadOnlySpan<double>)[0, 0.01, 0.03, 0.1])
        {
            CuttingDraft draft = new BarFilling(problem, favour, StepsABar, counter).Finish(problem.Counts, problem.RackCounts);
            best = best is null ? draft : CuttingDraft.Better(best, draft);
            if (best.Bought <= bound)
            {
                break;
            }
        }

        return best!;
    }

    private static (CuttingDraft Best, int Bound) Search(CuttingProblem problem, CuttingDraft best, int bound, StepBudget counter)
    {
        var budget = new StepBudget(StepsOfSearch);
        var search = new BarSearch(problem, budget);
        while (best.Bought > bound && best.Bought - 1 + problem.RackCounts.Sum() <= BarSearch.MostBars)
        {
            List<Pattern> found = [];
            SearchOutcome outcome = search.Run(problem.Counts, best.Bought - 1, found);
            if (outcome == SearchOutcome.Found)
            {
                best = new CuttingDraft(found, new int[problem.Sizes.Length]);
                continue;
            }

            bound = outcome == SearchOutcome.Closed ? best.Bought : bound;
            break;
        }

        counter.Take(budget.Used);
        return (best, bound);
    }

    /// <summary>Bars that the pieces' length alone asks for beyond what is on the rack; pieces longer than a bar may all be on the rack.</summary>
    private static int MaterialBound(CuttingProblem problem)
    {
        Int128 length = 0;
        for (int size = 0; size < problem.Sizes.Length; size++)
        {
            length += (Int128)problem.Sizes[size] * problem.Counts[size];
        }

        for (int kind = 0; kind < problem.RackLengths.Length; kind++)
        {
            length -= (Int128)problem.RackLengths[kind] * problem.RackCounts[kind];
        }

        return (int)Int128.Max(0, (length + problem.Bar - 1) / problem.Bar);
    }
}
