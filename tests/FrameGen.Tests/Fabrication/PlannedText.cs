using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Sizing;
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

    /// <summary>The frame with its ends cut, be it of shapes that have no papers yet.</summary>
    public static CutFrame Cut(string text)
    {
        DiagnosticList diagnostics = [];
        var pipeline = new FramePipeline(diagnostics);
        SizedFrame? sized = pipeline.Size(pipeline.Resolve(pipeline.Read("frame.yaml", Only("frame.yaml", text))));
        CutFrame? cut = sized is null ? null : EndCoper.Cope(sized, diagnostics);
        Assert.False(diagnostics.HasErrors, string.Join('\n', diagnostics));
        return cut!;
    }

    public static ShopPackage? Run(string text, DiagnosticList diagnostics, string file)
    {
        var pipeline = new FramePipeline(diagnostics);
        return pipeline.Plan(pipeline.Cope(pipeline.Size(pipeline.Resolve(pipeline.Read(file, Only(file, text))))));
    }

    private static Func<string, byte[]?> Only(string file, string text)
    {
        byte[] bytes = Encoding.UTF8.GetBytes(text);
        return path => string.Equals(path, file, StringComparison.Ordinal) ? bytes : null;
    }
}
