using BenchmarkDotNet.Running;
using FrameGen.Benchmarks.Fabrication;
using FrameGen.Benchmarks.Mechanics;
using FrameGen.Benchmarks.Sizing;

if (args.Length > 0 && string.Equals(args[0], LatticeRun.Option, StringComparison.Ordinal))
{
    LatticeRun.Print(args, Console.Out);
}
else if (args.Contains(CuttingTimes.Option, StringComparer.Ordinal))
{
    CuttingTimes.Print(Console.Out);
}
else if (args.Contains("--sizing", StringComparer.Ordinal))
{
    SizingGrowth.Print(Console.Out);
}
else if (args.Contains("--ratios", StringComparer.Ordinal))
{
    int beside = Array.IndexOf(args, "--beside");
    FrameRatios.Print(Console.Out, beside >= 0 && beside + 1 < args.Length ? args[beside + 1] : null);
}
else
{
    BenchmarkSwitcher.FromAssembly(typeof(FrameRatios).Assembly).Run(args);
}
