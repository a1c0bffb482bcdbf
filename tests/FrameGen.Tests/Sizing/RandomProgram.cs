using FrameGen.Sizing.Program;

namespace FrameGen.Tests.Sizing;

/// <summary>Invented choice programs: dearer options do more for every row, none of them in proportion.</summary>
internal static class RandomProgram
{
    public static ChoiceProgram Make(int seed, int sets, int options, int rows, int pairs)
    {
        var random = new Random(seed);
        var costs = new long[sets][];
        for (int s = 0; s < sets; s++)
        {
            double scale = 1 + (4 * random.NextDouble());
            costs[s] = [.. Enumerable.Range(0, options).Select(c => (long)(1e8 * scale * (c + 1 + random.NextDouble())))];
        }

        var program = new ChoiceProgram(costs);
        for (int r = 0; r < rows; r++)
        {
            program.Add(Row(random, program, 0.35 + (0.3 * random.NextDouble())));
        }

        for (int p = 0; p < pairs && p + 1 < sets; p++)
        {
            double[] a = [.. Enumerable.Range(0, options).Select(_ => random.NextDouble())];
            double[] b = [.. Enumerable.Range(0, options).Select(_ => random.NextDouble())];
            program.Forbid(p, p + 1, (x, y) => b[y] > a[x] + 0.2);
        }

        return program;
    }

    /// <summary>A row that asks for a share of the most that can be had.</summary>
    public static ProgramRow Row(Random random, ChoiceProgram program, double share)
    {
        var weights = new double[program.Variables];
        double most = 0;
        for (int s = 0; s < program.Sets; s++)
        {
            double importance = random.NextDouble() < 0.3 ? 0 : random.NextDouble();
            double best = 0;
            for (int v = program.First(s); v < program.First(s + 1); v++)
            {
                double use = importance * Math.Pow(v - program.First(s) + 1, 0.5 + random.NextDouble());
                weights[v] = -use;
                best = Math.Max(best, use);
            }

            most += best;
        }

        return new ProgramRow([.. Enumerable.Range(0, weights.Length)], weights, -share * most);
    }
}
