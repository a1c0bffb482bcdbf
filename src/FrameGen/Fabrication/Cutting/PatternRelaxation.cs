namespace FrameGen.Fabrication.Cutting;

/// <summary>The cutting problem with bars in fractions, over all patterns, by column generation.</summary>
/// <remarks>
/// Gilmore and Gomory, A linear programming approach to the cutting-stock problem, Operations Research 9 (1961). A pattern holds no
/// more pieces of a size than are wanted, which makes the bound a little higher than without that rule.
/// </remarks>
internal sealed class PatternRelaxation
{
    private const double Better = 1e-9;
    private const long StepsAPrice = 200_000;
    private const int MostRounds = 20_000;

    private PatternRelaxation(double bound, IReadOnlyList<(Pattern Pattern, double Bars)> solution, IReadOnlyList<Pattern> patterns) =>
        (Bound, Solution, Patterns) = (bound, solution, patterns);

    /// <summary>No plan buys fewer bars than this; the optimum of the relaxation, or less where a search was given up.</summary>
    public double Bound { get; }

    /// <summary>Patterns and how many bars are cut by each, in fractions.</summary>
    public IReadOnlyList<(Pattern Pattern, double Bars)> Solution { get; }

    /// <summary>All patterns that were of use on the way.</summary>
    public IReadOnlyList<Pattern> Patterns { get; }

    /// <summary>Solves it.</summary>
    /// <param name="problem">The problem. A piece longer than a bar counts as if a bar of its length could be bought: the bound still holds.</param>
    /// <param name="wanted">Pieces of each size; may be fewer than the problem's.</param>
    /// <param name="there">Lengths on the rack, by kind; may be fewer than the problem's.</param>
    /// <param name="known">Patterns to begin with; those that hold more than is wanted are left out.</param>
    /// <param name="budget">Steps are taken from this; when it is spent, the bound reached so far stands.</param>
    public static PatternRelaxation Solve(CuttingProblem problem, int[] wanted, int[] there, IReadOnlyList<Pattern> known, StepBudget budget)
    {
        int[] first = [.. problem.Sizes.Select((size, i) => (int)Math.Clamp(problem.Bar / size, 1, Math.Max(1, wanted[i])))];
        var simplex = new CoverSimplex(wanted, first, there);
        Pattern[] pool = [.. known.Where(p => p.Fits(wanted))];
        var knapsack = new BoundedKnapsack(problem.Sizes);
        double bound = 0;
        for (int round = 0; round < MostRounds && !budget.IsSpent; round++)
        {
            budget.Take(simplex.StepsAPivot);
            if (simplex.EnterSlack())
            {
                continue;
            }

            if (BestOf(pool, simplex.Prices, problem.Sizes.Length) is { } pooled)
            {
                if (simplex.Enter(pooled))
                {
                    continue;
                }

                break;
            }

            (Pattern? next, double proven) = Price(problem, wanted, there, simplex.Prices, knapsack, budget);
            bound = Math.Max(bound, proven);
            if (next is null || !simplex.Enter(next))
            {
                break;
            }
        }

        return new PatternRelaxation(bound, [.. simplex.Solution()], simplex.Patterns);
    }

    private static Pattern? BestOf(Pattern[] pool, double[] prices, int sizes)
    {
        Pattern? best = null;
        double gain = Better;
        foreach (Pattern pattern in pool)
        {
            double worth = pattern.RackKind is { } kind ? prices[sizes + kind] : -1;
            for (int size = 0; size < sizes; size++)
            {
                worth += pattern.Counts[size] * prices[size];
            }

            if (worth > gain)
            {
                (best, gain) = (pattern, worth);
            }
        }

        return best;
    }

    // The pattern that is worth most beyond its cost, and what the prices prove: scaled so that no pattern is worth more than it
    // costs, they are a solution of the dual, and its value is a bound whatever rounding did to them.
    private static (Pattern? Next, double Bound) Price(
        CuttingProblem problem, int[] wanted, int[] there, double[] prices, BoundedKnapsack knapsack, StepBudget budget)
    {
        int sizes = problem.Sizes.Length;
        double[] worth = [.. prices.Take(sizes).Select(p => Math.Max(0, p))];
        int[] counts = new int[sizes];
        Pattern? next = knapsack.Fill(problem.Bar, worth, wanted, 1, StepsAPrice, budget, counts) ? new Pattern(null, counts) : null;
        double most = Math.Max(1, knapsack.Ceiling);
        for (int size = 0; size < sizes && problem.Sizes[size] > problem.Bar; size++)
        {
            most = Math.Max(most, worth[size]);
        }

        double bound = 0;
        for (int size = 0; size < sizes; size++)
        {
            bound += wanted[size] * worth[size];
        }

        for (int kind = 0; kind < there.Length; kind++)
        {
            double cost = Math.Max(0, -prices[sizes + kind]);
            int[] cuts = new int[sizes];
            if (knapsack.Fill(problem.RackLengths[kind], worth, wanted, cost, StepsAPrice, budget, cuts))
            {
                next ??= new Pattern(kind, cuts);
            }

            bound -= there[kind] * knapsack.Ceiling;
        }

        return (next, bound / most);
    }
}
