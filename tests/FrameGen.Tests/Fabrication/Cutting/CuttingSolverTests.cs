using CsCheck;
using FrameGen.Fabrication.Cutting;
using Xunit;

namespace FrameGen.Tests.Fabrication.Cutting;

public class CuttingSolverTests
{
    // The bars' 264 would hold the pieces' 259, with 5 to lose; but 44 and 44 leave 44, which 33 and 12 fill to 36 at most, and one 44
    // leaves 88, which they fill to 81 at most. (Known as a case where rounding the relaxation up is not enough; by hand here.)
    [Fact]
    public void Bars_that_hold_the_length_but_not_the_pieces_are_not_enough()
    {
        var problem = new CuttingProblem(132, [new(44, 2), new(33, 3), new(12, 6)], []);
        CuttingPlan plan = CuttingSolver.Solve(problem);
        Assert.Equal((3, true), (plan.Bought, plan.IsOptimal));
    }

    [Theory]
    [InlineData(2, SearchOutcome.Closed)]
    [InlineData(3, SearchOutcome.Found)]
    internal void The_search_closes_what_it_has_looked_through(int bars, SearchOutcome expected)
    {
        var problem = new CuttingProblem(132, [new(44, 2), new(33, 3), new(12, 6)], []);
        Assert.Equal(expected, new BarSearch(problem, new StepBudget(long.MaxValue)).Run(problem.Counts, bars, []));
    }

    [Fact]
    public void A_spent_budget_closes_nothing()
    {
        var problem = new CuttingProblem(132, [new(44, 2), new(33, 3), new(12, 6)], []);
        Assert.Equal(SearchOutcome.GivenUp, new BarSearch(problem, new StepBudget(0)).Run(problem.Counts, 2, []));
        PatternRelaxation unsolved = PatternRelaxation.Solve(problem, problem.Counts, problem.RackCounts, [], new StepBudget(0));
        Assert.InRange(unsolved.Bound, 0, 3);
    }

    // Lengths that share no measure, of which 11 go on a bar: the rounding cuts all pieces and is still above the bound.
    [Fact]
    public void Nothing_is_left_to_round_where_all_is_cut()
    {
        var random = new Random(990);
        PieceSize[] sizes = [.. Enumerable.Range(0, 165).Select(_ => new PieceSize(random.Next(480_000, 560_000), 1))];
        CuttingPlan plan = CuttingSolver.Solve(new CuttingProblem(6_002_000, sizes, []));
        Assert.Equal(165, plan.Bars.Sum(b => b.Counts.Sum()));
        Assert.InRange(plan.Bought, plan.LowerBound, plan.LowerBound + 1);
    }

    [Fact]
    public void Pieces_longer_than_bar_and_rack_are_handed_back()
    {
        CuttingPlan plan = CuttingSolver.Solve(new CuttingProblem(100, [new(150, 2), new(60, 1)], [160]));
        Assert.Equal([1, 0], plan.Unplaced);
        Assert.Equal(1, plan.Bought);
        Assert.Equal([1, 0], Assert.Single(plan.Bars, b => b.RackKind == 0).Counts);
    }

    [Fact]
    public void Equal_sizes_are_one_and_the_order_of_writing_does_not_matter()
    {
        var one = new CuttingProblem(100, [new(20, 2), new(50, 1), new(20, 3)], [70, 40, 70]);
        Assert.Equal([50L, 20], one.Sizes);
        Assert.Equal([1, 5], one.Counts);
        Assert.Equal([40L, 70], one.RackLengths);
        Assert.Equal([1, 2], one.RackCounts);
    }

    // Every way to fill, counted out: the plain second method.
    [Fact]
    public void The_knapsack_finds_what_counting_out_every_filling_finds() =>
        Gen.Select(Gen.Long[5, 40].Array[1, 5], Gen.Int[0, 3].Array[5], Gen.Double[0, 1].Array[5], Gen.Long[20, 120]).Sample(
            (sizes, limits, values, length) =>
            {
                int[] counts = new int[sizes.Length];
                double[] worth = values[..sizes.Length];
                var knapsack = new BoundedKnapsack(sizes);
                bool found = knapsack.Fill(length, worth, limits.AsSpan(0, sizes.Length), 0, long.MaxValue, new StepBudget(long.MaxValue), counts);
                double best = Best(sizes, limits, worth, 0, length);
                Assert.Equal(best, knapsack.Ceiling, 1e-8);
                Assert.Equal(found ? counts.Select((c, i) => c * worth[i]).Sum() : 0, best, 1e-8);
                Assert.True(counts.Select((c, i) => c * sizes[i]).Sum() <= length);
                Assert.All(counts, (c, i) => Assert.InRange(c, 0, limits[i]));
            });

    // However early it is given up, what it says of what it has not seen is never too little.
    [Fact]
    public void A_knapsack_given_up_still_bounds_what_it_has_not_seen() =>
        Gen.Select(Gen.Long[5, 40].Array[2, 5], Gen.Int[0, 3].Array[5], Gen.Double[0, 1].Array[5], Gen.Long[20, 120], Gen.Long[1, 8]).Sample(
            (sizes, limits, values, length, steps) =>
            {
                double[] worth = values[..sizes.Length];
                var knapsack = new BoundedKnapsack(sizes);
                knapsack.Fill(length, worth, limits.AsSpan(0, sizes.Length), 0, steps, new StepBudget(long.MaxValue), new int[sizes.Length]);
                Assert.True(knapsack.Ceiling >= Best(sizes, limits, worth, 0, length) - 1e-8);
            });

    private static double Best(long[] sizes, int[] limits, double[] worth, int kind, long length)
    {
        if (kind == sizes.Length)
        {
            return 0;
        }

        double best = 0;
        for (int count = 0; count <= limits[kind] && count * sizes[kind] <= length; count++)
        {
            best = Math.Max(best, (count * worth[kind]) + Best(sizes, limits, worth, kind + 1, length - (count * sizes[kind])));
        }

        return best;
    }
}
