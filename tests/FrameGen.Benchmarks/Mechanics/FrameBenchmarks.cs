using BenchmarkDotNet.Attributes;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>Reanalysis of a small frame, as sizing does it thousands of times: factor, five load sets, internal forces.</summary>
[MemoryDiagnoser]
public class FrameBenchmarks
{
    private readonly RoundTube tube = new(30, 2);
    private readonly SectionForces forces = new(1200, 300, -500, 40_000, 90_000, -60_000);
    private FrameSolver solver = null!;
    private BeamLoads[] loads = [];
    private BeamProfile[] profiles = [];
    private FactoredFrame? factored;
    private FrameSolution? solution;

    [GlobalSetup]
    public void Prepare()
    {
        (BeamFrame frame, Restraint[] restraints, loads) = SmallFrame.Build();
        (solver, profiles) = (new FrameSolver(frame, restraints), SmallFrame.Profiles(30));
    }

    [Benchmark]
    public double Reanalysis()
    {
        factored = solver.Factor(profiles, factored);
        foreach (BeamLoads set in loads)
        {
            solution = factored.Solve(set, solution);
        }

        return solution!.Displacement(12).Z;
    }

    [Benchmark]
    public double WorstStress() => tube.VonMises(forces);
}
