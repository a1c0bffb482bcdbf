using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>Text for people: any characters but control characters.</summary>
internal sealed class TextForm : Form<string>
{
    /// <inheritdoc/>
    public override string Words => "text";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out string value)
    {
        if (node is not YamlScalar scalar)
        {
            return Refuse(node, reading, out value);
        }

        value = scalar.IsNothing ? string.Empty : scalar.Text.ReplaceLineEndings("\n");
        foreach (char c in value)
        {
            if (char.IsControl(c) && c is not ('\n' or '\t'))
            {
                reading.Error(scalar.At, $"the control character U+{(int)c:X4} can't be printed; remove it");
                return false;
            }
        }

        return true;
    }
}
