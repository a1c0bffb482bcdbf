using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A value that may be a single one, a list or a map.</summary>
/// <param name="words">What it is, with its article.</param>
/// <param name="scalar">For a single value; null where that is wrong.</param>
/// <param name="sequence">For a list; null where that is wrong.</param>
/// <param name="mapping">For a map; null where that is wrong.</param>
internal sealed class ByShapeForm<T>(string words, Form<T>? scalar = null, Form<T>? sequence = null, Form<T>? mapping = null) : Form<T>
{
    /// <inheritdoc/>
    public override IReadOnlyList<Form> Parts => [.. new[] { scalar, sequence, mapping }.OfType<Form>()];

    /// <inheritdoc/>
    public override string Words => words;

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out T value)
    {
        Form<T>? form = node switch
        {
            YamlScalar { IsNothing: true } => null,
            YamlScalar => scalar,
            YamlSequence => sequence,
            _ => mapping,
        };
        return form?.TryRead(node, reading, out value) ?? Refuse(node, reading, out value);
    }
}
