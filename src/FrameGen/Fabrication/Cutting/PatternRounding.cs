namespace FrameGen.Fabrication.Cutting;

/// <summary>Whole bars from bars in fractions: keeps what is whole, rounds one pattern up where nothing is, and solves what is left anew.</summary>
/// <param name="problem">The problem.</param>
/// <param name="budget">Steps are taken from this; when it is spent, what is left is filled bar by bar.</param>
internal sealed class PatternRounding(CuttingProblem problem, StepBudget budget)
{
    private const double Whole = 1e-6;
    private const long StepsABar = 5_000;

    private readonly BarFilling _filling = new(problem, 0, StepsABar, budget);
    private readonly List<Pattern> _kept = [];
    private readonly int[] _there = [.. problem.RackCounts];

    /// <summary>Cuts all pieces.</summary>
    /// <param name="best">The plan so far.</param>
    /// <param name="relaxation">Of the whole problem.</param>
    /// <param name="target">Fewer bars than this can't be: the first plan that buys as many is taken.</param>
    /// <returns>A better plan, or the one so far.</returns>
    public CuttingDraft Better(CuttingDraft best, PatternRelaxation relaxation, int target)
    {
        int[] left = [.. problem.Counts];
        while (best.Bought > target && !budget.IsSpent && Keep(relaxation.Solution, left))
        {
            // What is kept so far and a plain filling of the rest come to: often there before the rounding is.
            CuttingDraft rest = _filling.Finish(left, _there);
            best = CuttingDraft.Better(best, rest with { Bars = [.. _kept, .. rest.Bars] });
            relaxation = PatternRelaxation.Solve(problem, left, _there, relaxation.Patterns, budget);
        }

        return best;
    }

    // False where no pattern is left to keep.
    private bool Keep(IReadOnlyList<(Pattern Pattern, double Bars)> solution, int[] left)
    {
        int before = _kept.Count;
        foreach ((Pattern pattern, double bars) in solution)
        {
            for (int times = (int)Math.Floor(bars + Whole); times > 0 && IsPossible(pattern, left); times--)
            {
                Take(pattern, left);
            }
        }

        if (_kept.Count == before && solution.Where(s => IsPossible(s.Pattern, left)).DefaultIfEmpty().MaxBy(s => s.Bars).Pattern is { } nearest)
        {
            Take(nearest, left);
        }

        return _kept.Count > before;
    }

    private bool IsPossible(Pattern pattern, int[] left)
    {
        if (pattern.RackKind is { } kind)
        {
            return _there[kind] > 0 && pattern.Fits(left);
        }

        // A piece longer than a bar has a pattern of its own that can't be cut.
        long length = 0;
        for (int size = 0; size < left.Length; size++)
        {
            length += pattern.Counts[size] * problem.Sizes[size];
        }

        return length > 0 && length <= problem.Bar && pattern.Fits(left);
    }

    private void Take(Pattern pattern, int[] left)
    {
        pattern.TakeFrom(left);
        _kept.Add(pattern);
        if (pattern.RackKind is { } kind)
        {
            _there[kind]--;
        }
    }
}
