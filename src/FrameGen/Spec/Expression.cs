using FrameGen.Diagnostics;
using FrameGen.Spec.Quantities;

namespace FrameGen.Spec;

/// <summary>A parsed value: a literal with its unit, or an expression of parameters. Nodes carry their place.</summary>
public abstract record Expression
{
    private protected Expression(ExpressionSource source, int start, int end)
    {
        (Source, Start, End) = (source, start, end);
    }

    /// <summary>What was written, from its first to its last character.</summary>
    public string Text => Source.Text[Start..End];

    /// <summary>Where it begins in the spec.</summary>
    public SourcePlace At => Source.PlaceOf(Start);

    /// <summary>The value it is a part of.</summary>
    internal ExpressionSource Source { get; }

    /// <summary>Offset of its first character in the value.</summary>
    internal int Start { get; init; }

    /// <summary>Offset behind its last character in the value.</summary>
    internal int End { get; init; }
}
