using System.Diagnostics;
using System.Globalization;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Stability;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>
/// One lattice in a process of its own, so that its memory is its own and its first solve pays for everything: compilation, fresh memory.
/// </summary>
internal static class LatticeRun
{
    public const string Option = "--lattice";

    /// <summary>Statics of the lattice.</summary>
    public const string Statics = "solve";

    /// <summary>Three modes and one buckling factor, the factored lattice given.</summary>
    public const string Modes = "modes";

    private const double Density = 7850e-9;
    private const double EnoughSeconds = 2;
    private const int MostRounds = 6;

    /// <summary>Arguments for a run.</summary>
    public static string[] Arguments(string task, (int X, int Y, int Z) cells) =>
        [Option, task, Text(cells.X), Text(cells.Y), Text(cells.Z)];

    /// <summary>Measures and prints one line.</summary>
    public static void Print(string[] args, TextWriter output)
    {
        int[] cells = [.. args.Skip(2).Select(a => int.Parse(a, CultureInfo.InvariantCulture))];
        (BeamFrame frame, Restraint[] restraints, BeamLoads loads) = Lattice.Build(cells[0], cells[1], cells[2]);
        output.WriteLine(args[1] == Modes ? MeasureModes(frame, restraints, loads) : MeasureStatics(frame, restraints, loads));
    }

    private static string MeasureStatics(BeamFrame frame, Restraint[] restraints, BeamLoads loads)
    {
        BeamProfile[] profiles = Lattice.Profiles();
        double[] best = [];
        double first = 0;
        double error = 0;
        long peak = 0;
        double spent = 0;
        for (int round = 0; round < MostRounds && spent < EnoughSeconds; round++)
        {
            long t0 = Stopwatch.GetTimestamp();
            var solver = new FrameSolver(frame, restraints);
            long t1 = Stopwatch.GetTimestamp();
            FactoredFrame factored = solver.Factor(profiles);
            long t2 = Stopwatch.GetTimestamp();
            FrameSolution solution = factored.Solve(loads);
            long t3 = Stopwatch.GetTimestamp();
            double[] times = [Seconds(t0, t1), Seconds(t1, t2), Seconds(t2, t3)];
            spent += times.Sum();
            if (round == 0)
            {
                (first, error, peak) = (times.Sum(), solution.BackwardError, Process.GetCurrentProcess().PeakWorkingSet64);
            }

            best = round == 0 || times.Sum() < best.Sum() ? times : best;
        }

        return string.Create(
            CultureInfo.InvariantCulture,
            $"members={frame.Elements.Count} first={first:0.000000} order={best[0]:0.000000} factor={best[1]:0.000000} solve={best[2]:0.000000} seconds={best.Sum():0.000000} peak_mb={peak / 1048576.0:0.0} error={error:0.0e+0}");
    }

    private static string MeasureModes(BeamFrame frame, Restraint[] restraints, BeamLoads loads)
    {
        BeamProfile[] profiles = Lattice.Profiles();
        FactoredFrame factored = new FrameSolver(frame, restraints).Factor(profiles);
        FrameSolution solution = factored.Solve(loads);
        double first = 0;
        double best = double.MaxValue;
        double spent = 0;
        double hertz = 0;
        double buckling = 0;
        for (int round = 0; round < MostRounds && spent < EnoughSeconds; round++)
        {
            long start = Stopwatch.GetTimestamp();
            var mass = new FrameMass(
                [.. frame.Elements.Select(e => BeamInertia.Of(profiles[e.Profile], Density) with { RotaryY = 0, RotaryZ = 0 })], []);
            hertz = NaturalFrequencies.Lowest(factored, mass, 3)[0].Hertz;
            AxialForce[] forces = [.. Enumerable.Range(0, frame.Elements.Count).Select(e => AxialForceOf(solution.Forces(e)))];
            buckling = LinearBuckling.Lowest(factored, forces)!.Factor;
            double time = Seconds(start, Stopwatch.GetTimestamp());
            spent += time;
            first = round == 0 ? time : first;
            best = Math.Min(best, time);
        }

        return string.Create(
            CultureInfo.InvariantCulture,
            $"members={frame.Elements.Count} first={first:0.000000} seconds={best:0.000000} hertz={hertz:0.000000} buckling={buckling:0.000000}");
    }

    private static AxialForce AxialForceOf(ElementForces forces) => new(forces.At(0).N, forces.At(forces.Length).N);

    private static double Seconds(long from, long to) => Stopwatch.GetElapsedTime(from, to).TotalSeconds;

    private static string Text(int value) => value.ToString(CultureInfo.InvariantCulture);
}
