using BenchmarkDotNet.Attributes;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Stability;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>Buckling and vibration of a small frame, eight elements a span: factor included, ordering left out, as in sizing.</summary>
[MemoryDiagnoser]
public class StabilityBenchmarks
{
    private FrameSolver solver = null!;
    private BeamProfile[] profiles = [];
    private IReadOnlyList<AxialForce> forces = [];
    private FrameMass mass = new([], []);
    private FactoredFrame? factored;

    [GlobalSetup]
    public void Prepare()
    {
        (BeamFrame frame, Restraint[] restraints, BeamLoads[] loads) = SmallFrame.Build();
        profiles = SmallFrame.Profiles(30);
        var fine = RefinedFrame.Divide(frame, RefinedFrame.ElementsPerSpan);
        solver = new FrameSolver(fine.Frame, restraints);
        forces = fine.AxialForces(new FrameSolver(frame, restraints).Factor(profiles).Solve(loads[0]));
        mass = new FrameMass([.. fine.Frame.Elements.Select(e => BeamInertia.Of(profiles[e.Profile], 7850e-9))], [new PointMass(12, 20)]);
    }

    [Benchmark]
    public double BucklingFactor()
    {
        factored = solver.Factor(profiles, factored);
        return LinearBuckling.Lowest(factored, forces)!.Factor;
    }

    [Benchmark]
    public double ThreeFrequencies()
    {
        factored = solver.Factor(profiles, factored);
        return NaturalFrequencies.Lowest(factored, mass, 3)[0].Hertz;
    }

    [Benchmark]
    public FactoredFrame FactorAlone() => factored = solver.Factor(profiles, factored);
}
