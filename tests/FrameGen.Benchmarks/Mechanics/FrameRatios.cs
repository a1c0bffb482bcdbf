using System.Diagnostics;
using System.Globalization;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>Quick stopwatch tables of the frame solver: how time grows with members, and what a reanalysis costs.</summary>
internal static class FrameRatios
{
    private static readonly (int X, int Y, int Z)[] Boxes = [(2, 2, 3), (5, 5, 6), (11, 11, 12), (19, 19, 20)];
    private static readonly (int X, int Y, int Z)[] Towers = [(1, 1, 7), (2, 2, 26), (3, 3, 124), (4, 4, 370)];

    public static void Print(TextWriter output)
    {
        PrintLattices(output, "box lattices", Boxes);
        PrintLattices(output, "towers (bounded width)", Towers);
        PrintReanalysis(output);
        PrintStress(output);
    }

    private static void PrintLattices(TextWriter output, string title, (int X, int Y, int Z)[] sizes)
    {
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"{title,-24}{"members",8}{"order ms",10}{"factor ms",10}{"solve ms",10}{"total ms",10}{"exponent",10}{"MB",8}  backward error"));
        (double Members, double Time) last = default;
        foreach ((int x, int y, int z) in sizes)
        {
            (BeamFrame frame, Restraint[] restraints, BeamLoads loads) = Lattice.Build(x, y, z);
            BeamProfile[] profiles = Lattice.Profiles();
            double[] best = [double.MaxValue, double.MaxValue, double.MaxValue];
            double error = 0;
            for (int round = 0; round < (frame.Elements.Count > 20_000 ? 1 : 5); round++)
            {
                long t0 = Stopwatch.GetTimestamp();
                var solver = new FrameSolver(frame, restraints);
                long t1 = Stopwatch.GetTimestamp();
                FactoredFrame factored = solver.Factor(profiles);
                long t2 = Stopwatch.GetTimestamp();
                FrameSolution solution = factored.Solve(loads);
                long t3 = Stopwatch.GetTimestamp();
                best[0] = Math.Min(best[0], Milliseconds(t0, t1));
                best[1] = Math.Min(best[1], Milliseconds(t1, t2));
                best[2] = Math.Min(best[2], Milliseconds(t2, t3));
                error = solution.BackwardError;
            }

            (double Members, double Time) now = (frame.Elements.Count, best.Sum());
            double exponent = last.Time > 0 ? Math.Log(now.Time / last.Time) / Math.Log(now.Members / last.Members) : double.NaN;
            output.WriteLine(string.Create(
                CultureInfo.InvariantCulture,
                $"{x + " x " + y + " x " + z,-24}{now.Members,8}{best[0],10:0.00}{best[1],10:0.00}{best[2],10:0.00}{now.Time,10:0.00}{exponent,10:0.00}{Process.GetCurrentProcess().PeakWorkingSet64 >> 20,8}  {error:0.0e+0}"));
            last = now;
        }
    }

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
