using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>The ending of a name.</summary>
internal sealed class SuffixForm : Form<Placed<string>>
{
    /// <inheritdoc/>
    public override string Words => "an ending of names such as -l";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out Placed<string> value)
    {
        // A letter before it makes a name of any ending that a name can have.
        if (node is not YamlScalar { IsNothing: false } scalar || scalar.Text.Length == 0 || !SpecName.IsName($"a{scalar.Text}"))
        {
            return Refuse(node, reading, out value);
        }

        value = new Placed<string>(scalar.Text, scalar.At);
        return true;
    }
}
