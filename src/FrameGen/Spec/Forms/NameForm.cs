using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>Which names may stand in a place.</summary>
internal enum NameRule
{
    /// <summary>Any name.</summary>
    Any,

    /// <summary>Becomes a file's name: not one that Windows gives to a device.</summary>
    File,

    /// <summary>A material's, which may hold <c>.</c> and <c>+</c>.</summary>
    Material,
}

/// <summary>A name.</summary>
/// <param name="words">Whose, with its article: <c>a tube's name</c>.</param>
/// <param name="rule">Which names may stand here.</param>
/// <param name="reserved">A word that means something else in this place; null for none.</param>
internal sealed class NameForm(string words, NameRule rule = NameRule.Any, string? reserved = null) : Form<Placed<string>>
{
    /// <summary>Which names may stand here.</summary>
    public NameRule Rule => rule;

    /// <inheritdoc/>
    public override string Words => words;

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out Placed<string> value)
    {
        if (node is not YamlScalar scalar || (scalar.IsNothing && scalar.Text.Length == 0))
        {
            return Refuse(node, reading, out value);
        }

        string? wrong = Wrong(scalar);
        value = new Placed<string>(scalar.Text, scalar.At);
        if (wrong is not null)
        {
            reading.Error(scalar.At, wrong);
        }

        return wrong is null;
    }

    private string? Wrong(YamlScalar scalar)
    {
        string text = scalar.Text;
        if (rule == NameRule.Material)
        {
            return SpecName.IsMaterialName(text)
                ? null
                : $"{scalar.Words} is no name of a material; write letters, digits, '_', '-', '.' or '+', 64 at most, a letter or digit first";
        }

        if (!SpecName.IsName(text))
        {
            return $"{scalar.Words} is no name; write {SpecName.Rule}";
        }

        if (rule == NameRule.File && SpecName.IsDeviceName(text))
        {
            return $"'{text}' can't be a name here: names become file names, and Windows keeps this one for a device; choose another";
        }

        return string.Equals(text, reserved, StringComparison.OrdinalIgnoreCase)
            ? $"'{text}' can't be a name here: it is a word of the format; choose another"
            : null;
    }
}
