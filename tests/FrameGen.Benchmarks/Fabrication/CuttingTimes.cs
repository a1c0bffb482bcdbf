using System.Diagnostics;
using System.Globalization;
using System.Text.Json;
using FrameGen.Fabrication.Cutting;

namespace FrameGen.Benchmarks.Fabrication;

/// <summary>What stock plans of shop lists cost: time, counted steps, and how near to the bound they come.</summary>
internal static class CuttingTimes
{
    /// <summary>The word on the command line.</summary>
    public const string Option = "--cutting";

    /// <summary>Prints the table: the shop's lists in whole millimetres, then lists of lengths that share no measure, without and with a rack.</summary>
    public static void Print(TextWriter output)
    {
        output.WriteLine($"{"list",-28}{"pieces",8}{"bars",7}{"bound",7}{"steps",14}{"ms",10}");
        CuttingSolver.Solve(Irregular(20, 0, 0)); // compiles
        foreach ((string name, CuttingProblem problem) in ShopLists())
        {
            Row(output, name, problem);
        }

        foreach (int pieces in (int[])[20, 60, 200, 500])
        {
            for (int seed = 1; seed <= 3; seed++)
            {
                Row(output, $"irregular {seed}", Irregular(pieces, seed, 0));
                Row(output, $"irregular {seed}, rack of 12", Irregular(pieces, seed, 12));
            }
        }
    }

    private static void Row(TextWriter output, string name, CuttingProblem problem)
    {
        var steps = new StepBudget(long.MaxValue);
        long start = Stopwatch.GetTimestamp();
        CuttingPlan plan = CuttingSolver.Solve(problem, steps);
        double ms = Stopwatch.GetElapsedTime(start).TotalMilliseconds;
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"{name,-28}{problem.Counts.Sum(),8}{plan.Bought,7}{plan.LowerBound,7}{steps.Used,14:N0}{ms,10:0.0}"));
    }

    private static IEnumerable<(string Name, CuttingProblem Problem)> ShopLists()
    {
        using Stream stream = typeof(CuttingTimes).Assembly.GetManifestResourceStream("shop-lists.json")!;
        using JsonDocument document = JsonDocument.Parse(stream);
        foreach (JsonElement list in document.RootElement.GetProperty("instances").EnumerateArray())
        {
            long kerf = list.GetProperty("kerf").GetInt64();
            IEnumerable<PieceSize> pieces = list.GetProperty("pieces").EnumerateArray().Select(
                p => new PieceSize((p.GetProperty("length").GetInt64() + kerf) * 1000, p.GetProperty("qty").GetInt32()));
            yield return (list.GetProperty("name").GetString()!, new CuttingProblem((list.GetProperty("stock").GetInt64() + kerf) * 1000, pieces, []));
        }
    }

    // Lengths to the micrometre, as coped tubes have them; half of them in pairs, as mirrored frames do.
    private static CuttingProblem Irregular(int pieces, int seed, int racked)
    {
        var random = new Random((seed * 1000) + pieces);
        const long Bar = 6_002_000;
        var sizes = new List<PieceSize>();
        for (int left = pieces; left > 0;)
        {
            int count = Math.Min(left, random.Next(1, 3));
            sizes.Add(new PieceSize(random.Next(200_000, 2_500_000), count));
            left -= count;
        }

        return new CuttingProblem(Bar, sizes, [.. Enumerable.Range(0, racked).Select(_ => (long)random.Next(400_000, 3_000_000))]);
    }
}
