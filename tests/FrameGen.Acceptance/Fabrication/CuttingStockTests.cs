using System.Globalization;
using System.Text;
using FrameGen.Fabrication.Cutting;
using Xunit;

namespace FrameGen.Acceptance.Fabrication;

public class CuttingStockTests
{
    // Optima and relaxations as printed; sources in Instances/README.md.
    [Theory]
    [InlineData("u120_00.txt", 48, 47.266, 0.0005)]
    [InlineData("u120_08.txt", 50, 49.912, 0.0005)]
    [InlineData("u120_19.txt", 49, 48.864, 0.0005)]
    [InlineData("paper_5600.csp.txt", 73, 72.917, 0.0005)]
    [InlineData("chvatal_100.csp.txt", 453, 452.25, 0.005)]
    [InlineData("teaching_110.csp.txt", 47, 46.25, 0.005)]
    public void Published_instances_are_solved_to_their_optimum(string file, int optimum, double relaxation, double halfDigit)
    {
        CuttingProblem problem = CuttingInstance.Published(file);
        CuttingPlan plan = CuttingSolver.Solve(problem);
        Assert.Equal(optimum, plan.Bought);
        Assert.True(plan.IsOptimal);
        RequireEveryPieceOnce(problem, plan);
        PatternRelaxation relaxed = PatternRelaxation.Solve(problem, problem.Counts, problem.RackCounts, [], new StepBudget(long.MaxValue));
        Assert.InRange(relaxed.Bound, relaxation - halfDigit, relaxation + halfDigit);
    }

    // (73 x 5600 - 407 160) / (73 x 5600), the waste printed as 0.401 %.
    [Fact]
    public void The_paper_mill_wastes_what_is_printed()
    {
        CuttingProblem problem = CuttingInstance.Published("paper_5600.csp.txt");
        CuttingPlan plan = CuttingSolver.Solve(problem);
        double used = plan.Bars.Sum(b => b.Counts.Zip(problem.Sizes, (count, size) => (double)count * size).Sum());
        double bought = (double)plan.Bought * problem.Bar;
        Assert.InRange(100 * (bought - used) / bought, 0.4005, 0.4015);
    }

    // The pieces' length alone asks for so many bars, so a plan with as many is an optimum whatever made it. Steps, not time:
    // a whole list takes fewer than a single bar's search may.
    [Theory]
    [InlineData("60-pieces-tight", 9)]
    [InlineData("60-pieces", 12)]
    [InlineData("200-pieces", 34)]
    [InlineData("200-pieces-tight", 38)]
    [InlineData("500-pieces", 89)]
    [InlineData("500-pieces-tight", 91)]
    public void Lists_of_a_shop_reach_their_bound(string name, int bound)
    {
        CuttingProblem problem = CuttingInstance.ShopList(name);
        var steps = new StepBudget(long.MaxValue);
        CuttingPlan plan = CuttingSolver.Solve(problem, steps);
        Assert.Equal((bound, bound), (plan.Bought, plan.LowerBound));
        RequireEveryPieceOnce(problem, plan);
        TestContext.Current.TestOutputHelper?.WriteLine($"{name}: {steps.Used} steps");
    }

    // Pieces fit with kerfs between them exactly when they fit with a kerf on each and one on the bar.
    [Theory]
    [InlineData("teaching_110.csp.txt", 7)]
    [InlineData("chvatal_100.csp.txt", 3)]
    public void A_kerf_on_every_piece_and_on_the_bar_changes_which_patterns_fit_and_nothing_else(string file, int kerf)
    {
        CuttingProblem problem = CuttingInstance.Published(file);
        var wider = new CuttingProblem(
            problem.Bar + kerf, problem.Sizes.Select((s, i) => new PieceSize(s + kerf, problem.Counts[i])), []);
        foreach (Pattern bar in CuttingSolver.Solve(wider).Bars)
        {
            long length = bar.Counts.Zip(problem.Sizes, (count, size) => count * size).Sum();
            Assert.True(length + (kerf * (bar.Counts.Sum() - 1)) <= problem.Bar);
        }
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void The_relaxation_is_what_another_program_finds_over_all_patterns(int seed)
    {
        CuttingProblem problem = Random(seed);
        PatternRelaxation ours = PatternRelaxation.Solve(problem, problem.Counts, problem.RackCounts, [], new StepBudget(long.MaxValue));
        using var folder = new ScratchFolder();
        string model = folder.Write("patterns.lp", Model(problem, isWhole: false));
        ForeignProgram.Find("glpsol").Run("--lp", model, "--write", folder["patterns.sol"]);

        // "s bas ROWS COLUMNS f f VALUE"
        string line = File.ReadLines(folder["patterns.sol"]).Single(l => l.StartsWith("s bas ", StringComparison.Ordinal));
        double theirs = double.Parse(line.Split(' ')[^1], CultureInfo.InvariantCulture);
        Assert.InRange(ours.Bound, theirs - 1e-6, theirs + 1e-6);
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void As_few_bars_are_bought_as_another_program_needs(int seed)
    {
        CuttingProblem problem = Random(seed);
        CuttingPlan ours = CuttingSolver.Solve(problem);
        RequireEveryPieceOnce(problem, ours);
        using var folder = new ScratchFolder();
        string model = folder.Write("patterns.lp", Model(problem, isWhole: true));
        ForeignProgram.Find("cbc").Run(model, "solve", "solution", folder["patterns.sol"]);

        // "Optimal - objective value 12.00000000"
        string line = File.ReadLines(folder["patterns.sol"]).First();
        Assert.StartsWith("Optimal", line, StringComparison.Ordinal);
        double theirs = double.Parse(line.Split(' ')[^1], CultureInfo.InvariantCulture);
        Assert.InRange(ours.LowerBound, 0, theirs + 1e-6);
        Assert.Equal(theirs, ours.Bought, 1e-6);
    }

    public static TheoryData<int> Seeds() => [.. Enumerable.Range(1, 12)];

    // Few sizes, so that all patterns can be written out; every third with lengths on the rack.
    private static CuttingProblem Random(int seed)
    {
        var random = new Random(seed);
        int bar = random.Next(2_000, 6_000);
        PieceSize[] pieces =
        [
            .. Enumerable.Range(0, random.Next(5, 9)).Select(_ => new PieceSize(random.Next(bar / 6, bar * 2 / 3), random.Next(1, 9))),
        ];
        long[] rack = seed % 3 == 0 ? [.. Enumerable.Range(0, 5).Select(_ => 100L * random.Next(bar / 400, bar / 100))] : [];
        return new CuttingProblem(bar, pieces, rack);
    }

    /// <summary>Every way to cut a bar as a column, in the LP format that both programs read.</summary>
    private static string Model(CuttingProblem problem, bool isWhole)
    {
        var columns = new List<(long Length, int[] Counts)>();
        foreach (long length in problem.RackLengths.Append(-problem.Bar))
        {
            AddPatterns(problem, length, new int[problem.Sizes.Length], 0, Math.Abs(length), columns);
        }

        var text = new StringBuilder("Minimize\n bars:");
        foreach (int column in Enumerable.Range(0, columns.Count).Where(c => columns[c].Length < 0))
        {
            text.Append(CultureInfo.InvariantCulture, $" + x{column}\n");
        }

        text.Append("Subject To\n");
        for (int size = 0; size < problem.Sizes.Length; size++)
        {
            text.Append(CultureInfo.InvariantCulture, $" s{size}:");
            foreach (int column in Enumerable.Range(0, columns.Count).Where(c => columns[c].Counts[size] > 0))
            {
                text.Append(CultureInfo.InvariantCulture, $" + {columns[column].Counts[size]} x{column}\n");
            }

            text.Append(CultureInfo.InvariantCulture, $" >= {problem.Counts[size]}\n");
        }

        foreach ((long length, int count) in problem.RackLengths.Zip(problem.RackCounts).Where(r => columns.Any(c => c.Length == r.First)))
        {
            text.Append(CultureInfo.InvariantCulture, $" r{length}:");
            foreach (int column in Enumerable.Range(0, columns.Count).Where(c => columns[c].Length == length))
            {
                text.Append(CultureInfo.InvariantCulture, $" + x{column}\n");
            }

            text.Append(CultureInfo.InvariantCulture, $" <= {count}\n");
        }

        if (isWhole)
        {
            text.Append("General\n");
            text.AppendJoin('\n', Enumerable.Range(0, columns.Count).Select(c => $" x{c}")).Append('\n');
        }

        return text.Append("End\n").ToString();
    }

    private static void AddPatterns(
        CuttingProblem problem, long length, int[] counts, int size, long free, List<(long Length, int[] Counts)> columns)
    {
        if (size == counts.Length)
        {
            if (counts.Any(c => c > 0))
            {
                columns.Add((length, [.. counts]));
            }

            return;
        }

        for (int count = 0; count <= problem.Counts[size] && count * problem.Sizes[size] <= free; count++)
        {
            counts[size] = count;
            AddPatterns(problem, length, counts, size + 1, free - (count * problem.Sizes[size]), columns);
        }

        counts[size] = 0;
    }

    private static void RequireEveryPieceOnce(CuttingProblem problem, CuttingPlan plan)
    {
        Assert.Equal(plan.Bought, plan.Bars.Count(b => b.RackKind is null));
        Assert.All(problem.RackCounts, (count, kind) => Assert.InRange(plan.Bars.Count(b => b.RackKind == kind), 0, count));
        Assert.All(plan.Unplaced, count => Assert.Equal(0, count));
        for (int size = 0; size < problem.Sizes.Length; size++)
        {
            Assert.Equal(problem.Counts[size], plan.Bars.Sum(b => b.Counts[size]));
        }

        foreach (Pattern bar in plan.Bars)
        {
            long length = bar.Counts.Zip(problem.Sizes, (count, size) => count * size).Sum();
            Assert.InRange(length, 1, bar.RackKind is { } kind ? problem.RackLengths[kind] : problem.Bar);
        }
    }
}
