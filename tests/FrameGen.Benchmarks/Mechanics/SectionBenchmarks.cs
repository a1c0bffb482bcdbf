using BenchmarkDotNet.Attributes;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>The worst stress of a section under all six forces: what the stress scan asks at every station.</summary>
[MemoryDiagnoser]
public class SectionBenchmarks
{
    private readonly SectionForces _forces = new(3000, 4000, -6000, 1.5e5, 2e5, 1e5);
    private readonly Section _round = new RoundTube(40, 2);
    private readonly Section _rect = new FlatSidedTube(60, 40, 3);
    private readonly Section _ellipse = new EllipseTube(45, 28, 1.5);

    [Benchmark(Baseline = true)]
    public double Round() => _round.VonMises(_forces);

    [Benchmark]
    public double Rect() => _rect.VonMises(_forces);

    [Benchmark]
    public double Ellipse() => _ellipse.VonMises(_forces);
}
