using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using Xunit;

namespace FrameGen.Tests.Fabrication;

/// <summary>Takes a spec's text the whole way to the shop's package.</summary>
internal static class PlannedText
{
    public static ShopPackage Of(string text)
    {
        DiagnosticList diagnostics = [];
        ShopPackage? package = Run(text, diagnostics, "frame.yaml");
        Assert.False(diagnostics.HasErrors, string.Join('\n', diagnostics));
        return package!;
    }

    public static ShopPackage? Run(string text, DiagnosticList diagnostics, string file)
    {
        byte[] bytes = Encoding.UTF8.GetBytes(text);
        var pipeline = new FramePipeline(diagnostics);
        return pipeline.Plan(pipeline.Cope(pipeline.Size(pipeline.Resolve(
            pipeline.Read(file, path => string.Equals(path, file, StringComparison.Ordinal) ? bytes : null)))));
    }
}
