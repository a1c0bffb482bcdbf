using FrameGen.Diagnostics;

namespace FrameGen.Spec.Quantities;

/// <summary>The text of one value and where it stands.</summary>
/// <param name="text">As the YAML reader gives it.</param>
/// <param name="at">Where the value begins.</param>
/// <param name="firstColumn">
/// Column of the text's first character where the value stands on one line, character for character as in
/// <paramref name="text"/>; null where it doesn't (escapes, folded lines): then every part has the place of the whole.
/// </param>
internal sealed class ExpressionSource(string text, SourcePlace at, int? firstColumn)
{
    private readonly List<NameExpression> _names = [];

    /// <summary>What was written.</summary>
    public string Text => text;

    /// <summary>Where the whole begins.</summary>
    public SourcePlace At => at;

    /// <summary>Names of parameters it uses, in the order written, repeats too.</summary>
    public IReadOnlyList<NameExpression> Names => _names;

    /// <summary>Place of the character at an offset.</summary>
    public SourcePlace PlaceOf(int offset) => firstColumn is { } column ? at with { Column = column + offset } : at;

    /// <summary>Notes that the value uses a parameter.</summary>
    public void AddName(NameExpression name) => _names.Add(name);
}
