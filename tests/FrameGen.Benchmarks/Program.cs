using BenchmarkDotNet.Running;
using FrameGen.Benchmarks.Mechanics;

if (args.Contains("--ratios", StringComparer.Ordinal))
{
    FrameRatios.Print(Console.Out);
}
else
{
    BenchmarkSwitcher.FromAssembly(typeof(FrameRatios).Assembly).Run(args);
}
