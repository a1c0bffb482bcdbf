using FrameGen.Diagnostics;

namespace FrameGen.Spec.Yaml;

/// <summary>A value of a YAML file and where it begins; an alias has the place of its use.</summary>
internal abstract record YamlNode(SourcePlace At)
{
    /// <summary>What it is, for messages: <c>a list</c>.</summary>
    public abstract string Words { get; }
}

/// <summary>A single value.</summary>
/// <param name="At">Where.</param>
/// <param name="Text">Without quotes, escapes resolved.</param>
/// <param name="IsPlain">True where it stands without quotes.</param>
/// <param name="FirstColumn">Column of the text's first character; null where text and file do not agree character for character.</param>
internal sealed record YamlScalar(SourcePlace At, string Text, bool IsPlain, int? FirstColumn) : YamlNode(At)
{
    /// <summary>True where nothing is written, or YAML's word for nothing.</summary>
    public bool IsNothing => IsPlain && Text is "" or "~" or "null" or "Null" or "NULL";

    /// <inheritdoc/>
    public override string Words => IsNothing ? "nothing" : $"'{Shortened(Text)}'";

    private static string Shortened(string text)
    {
        string line = new([.. text.Take(60).Select(c => char.IsControl(c) ? ' ' : c)]);
        return text.Length > 60 ? $"{line}…" : line;
    }
}

/// <summary>A list.</summary>
/// <param name="At">Where.</param>
/// <param name="Items">In the order written.</param>
internal sealed record YamlSequence(SourcePlace At, IReadOnlyList<YamlNode> Items) : YamlNode(At)
{
    /// <inheritdoc/>
    public override string Words => "a list";
}

/// <summary>Keys with their values.</summary>
/// <param name="At">Where.</param>
/// <param name="Entries">In the order written, what a merge takes in last; no key twice.</param>
internal sealed record YamlMapping(SourcePlace At, IReadOnlyList<YamlEntry> Entries) : YamlNode(At)
{
    /// <inheritdoc/>
    public override string Words => "keys with values";
}

/// <summary>A key and its value.</summary>
internal sealed record YamlEntry(YamlScalar Key, YamlNode Value);
