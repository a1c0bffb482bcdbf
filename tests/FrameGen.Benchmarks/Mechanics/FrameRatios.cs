using System.Diagnostics;
using System.Globalization;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>
/// Quick stopwatch tables of the frame solver: how time and memory grow with members, what modes and a reanalysis cost; if wanted, another
/// program's figures for the same lattices beside them.
/// </summary>
internal static class FrameRatios
{
    private static readonly int[] Sizes = [100, 1000, 10_000, 50_000];

    private static readonly (string Shape, string Title, (int X, int Y, int Z)[] Cells)[] Families =
    [
        ("box", "boxes, growing every way", [(2, 2, 3), (5, 5, 6), (11, 11, 12), (19, 19, 20)]),
        ("tower", "towers of bounded width", [(1, 1, 7), (2, 2, 26), (3, 3, 124), (4, 4, 370)]),
        ("even", "towers of one width", [(3, 3, 2), (3, 3, 13), (3, 3, 124), (3, 3, 617)]),
    ];

    /// <summary>Prints all tables.</summary>
    /// <param name="output">Where to.</param>
    /// <param name="beside">A command line to run for every lattice, or null: {members}, {x}, {y}, {z} (cells), {shape} (box, tower, even) and {task}
    /// (solve, modes) in it are replaced. It prints seconds=… and peak_mb=…, else its wall time and largest memory are taken.</param>
    public static void Print(TextWriter output, string? beside)
    {
        output.WriteLine("Times in ms, memory of the whole process in MB, each lattice in a process of its own. first: with compilation and fresh");
        output.WriteLine("memory; again: the best of some more, which order, factor and solve are parts of. Exponent: of again, from line to line.");
        foreach ((string shape, string title, (int X, int Y, int Z)[] cells) in Families)
        {
            PrintFamily(output, shape, title, cells, beside);
        }

        PrintModes(output, beside);
        PrintReanalysis(output);
        PrintStress(output);
    }

    private static void PrintFamily(TextWriter output, string shape, string title, (int X, int Y, int Z)[] cells, string? beside)
    {
        output.WriteLine();
        output.WriteLine(
            $"{title,-26}{"members",8}{"order",9}{"factor",9}{"solve",9}{"again",9}{"first",9}{"exponent",10}{"MB",7}{"error",9}{BesideHeading(beside)}");
        var points = new List<(double Members, double Time)>();
        for (int k = 0; k < cells.Length; k++)
        {
            var run = MeasuredProcess.Self(LatticeRun.Arguments(LatticeRun.Statics, cells[k]));
            points.Add((run["members"], run["seconds"]));
            double exponent = k == 0 ? double.NaN : Exponent(points[k - 1], points[k]);
            (int x, int y, int z) = cells[k];
            output.Write(string.Create(
                CultureInfo.InvariantCulture,
                $"{x + " x " + y + " x " + z,-26}{run["members"],8}{1e3 * run["order"],9:0.00}{1e3 * run["factor"],9:0.00}{1e3 * run["solve"],9:0.00}{1e3 * run["seconds"],9:0.00}{1e3 * run["first"],9:0.00}{exponent,10:0.00}{run["peak_mb"],7:0}{run["error"],9:0e+0}"));
            output.WriteLine(BesideText(beside, shape, LatticeRun.Statics, Sizes[k], cells[k], run));
        }

        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"exponent from the first line to the last: {Exponent(points[0], points[^1]):0.00}"));
    }

    private static void PrintModes(TextWriter output, string? beside)
    {
        output.WriteLine();
        output.WriteLine($"{"three modes, one buckling factor",-34}{"again",9}{"first",9}{"Hz",12}{"factor",12}{BesideHeading(beside)}");
        foreach ((string shape, _, (int X, int Y, int Z)[] cells) in Families)
        {
            (int x, int y, int z) = cells[2];
            var run = MeasuredProcess.Self(LatticeRun.Arguments(LatticeRun.Modes, cells[2]));
            output.Write(string.Create(
                CultureInfo.InvariantCulture,
                $"{x + " x " + y + " x " + z,-26}{run["members"],8}{1e3 * run["seconds"],9:0.00}{1e3 * run["first"],9:0.00}{run["hertz"],12:0.000000}{run["buckling"],12:0.000000}"));
            output.WriteLine(BesideText(beside, shape, LatticeRun.Modes, Sizes[2], cells[2], run));
        }

        output.WriteLine();
    }

    private static string BesideHeading(string? beside) =>
        beside is null ? string.Empty : $"  | {"beside",9}{"MB",7}{"again/",8}{"first/",8}{"MB/",6}";

    /// <summary>The other program's time and memory, and ours in parts of them.</summary>
    private static string BesideText(string? beside, string shape, string task, int size, (int X, int Y, int Z) cells, MeasuredProcess ours)
    {
        if (beside is null)
        {
            return string.Empty;
        }

        string[] words = [.. beside.Split(' ', StringSplitOptions.RemoveEmptyEntries).Select(Fill)];
        var other = MeasuredProcess.Run(words[0], words[1..]);
        double time = other["seconds"];
        return string.Create(
            CultureInfo.InvariantCulture,
            $"  | {1e3 * time,9:0.00}{other["peak_mb"],7:0}{ours["seconds"] / time,8:0.00}{ours["first"] / time,8:0.00}{ours["peak_mb"] / other["peak_mb"],6:0.00}");

        string Fill(string word) => word
            .Replace("{members}", Text(size), StringComparison.Ordinal)
            .Replace("{x}", Text(cells.X), StringComparison.Ordinal)
            .Replace("{y}", Text(cells.Y), StringComparison.Ordinal)
            .Replace("{z}", Text(cells.Z), StringComparison.Ordinal)
            .Replace("{shape}", shape, StringComparison.Ordinal)
            .Replace("{task}", task, StringComparison.Ordinal);
    }

    private static string Text(int value) => value.ToString(CultureInfo.InvariantCulture);

    private static double Exponent((double Members, double Time) from, (double Members, double Time) to) =>
        Math.Log(to.Time / from.Time) / Math.Log(to.Members / from.Members);

    private static void PrintReanalysis(TextWriter output)
    {
        (BeamFrame frame, Restraint[] restraints, BeamLoads[] loads) = SmallFrame.Build();
        var solver = new FrameSolver(frame, restraints);
        BeamProfile[][] designs = [SmallFrame.Profiles(30), SmallFrame.Profiles(35), SmallFrame.Profiles(40)];
        FactoredFrame? factored = null;
        FrameSolution? solution = null;
        double bestFactor = double.MaxValue;
        double best = double.MaxValue;
        const int Designs = 2000;
        for (int round = 0; round < 15; round++)
        {
            long start = Stopwatch.GetTimestamp();
            for (int k = 0; k < Designs; k++)
            {
                factored = solver.Factor(designs[k % 3], factored);
            }

            long middle = Stopwatch.GetTimestamp();
            for (int k = 0; k < Designs; k++)
            {
                factored = solver.Factor(designs[k % 3], factored);
                foreach (BeamLoads set in loads)
                {
                    solution = factored.Solve(set, solution);
                }
            }

            bestFactor = Math.Min(bestFactor, Milliseconds(start, middle) * 1e3 / Designs);
            best = Math.Min(best, Milliseconds(middle, Stopwatch.GetTimestamp()) * 1e3 / Designs);
        }

        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"reanalysis of {frame.Elements.Count} tubes, {loads.Length} load sets: {best:0.0} us a design, of which {bestFactor:0.0} us assembly and factor"));
    }

    private static void PrintStress(TextWriter output)
    {
        var tube = new RoundTube(30, 2);
        double best = double.MaxValue;
        double sum = 0;
        const int Calls = 100_000;
        for (int round = 0; round < 15; round++)
        {
            long start = Stopwatch.GetTimestamp();
            for (int k = 0; k < Calls; k++)
            {
                sum += tube.VonMises(new SectionForces(1200 - k, 300, k - 500, 40_000, 90_000, k - 60_000));
            }

            best = Math.Min(best, Milliseconds(start, Stopwatch.GetTimestamp()) * 1e6 / Calls);
        }

        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"worst von Mises stress of a round tube: {best:0} ns (mean {sum / 15 / Calls:0.0} MPa)"));
    }

    private static double Milliseconds(long from, long to) => Stopwatch.GetElapsedTime(from, to).TotalMilliseconds;
}
