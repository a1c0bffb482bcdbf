using FrameGen.Formats.Drawings;

namespace FrameGen.Output.Drawings;

/// <summary>Layers of developed patterns and templates; on paper they differ without colour: heavy, thin and dashed lines.</summary>
internal static class PaperLayers
{
    /// <summary>What is cut: closed lines.</summary>
    public const string Cut = "CUT";

    /// <summary>Top, quarter and datum lines.</summary>
    public const string Scribe = "SCRIBE";

    /// <summary>Words, arrows and the marks of edges that meet.</summary>
    public const string Text = "TEXT";

    /// <summary>Glue overlap.</summary>
    public const string Tab = "TAB";

    /// <summary>Paper beyond the cut line.</summary>
    public const string Trim = "TRIM";

    /// <summary>The square that checks the scale; nothing of the part.</summary>
    public const string Check = "CHECK";

    /// <summary>All layers, in the order of the layer table.</summary>
    public static IReadOnlyList<Layer> All { get; } =
    [
        new(Cut, 1, Pen.Black(0.5)),
        new(Scribe, 5, Pen.Black(0.15)),
        new(Text, 7, Pen.Black(0.2)),
        new(Tab, 3, new Pen(0.2, Ink.Black, [0.8, 0.8])),
        new(Trim, 8, new Pen(0.25, Ink.Black, [3, 1.5])),
        new(Check, 6, Pen.Black(0.2)),
    ];
}
