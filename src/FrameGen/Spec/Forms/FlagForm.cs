using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>True or false.</summary>
internal sealed class FlagForm : Form<bool>
{
    /// <inheritdoc/>
    public override string Words => "true or false";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out bool value)
    {
        value = node is YamlScalar { IsPlain: true, Text: "true" or "True" or "TRUE" };
        return value || node is YamlScalar { IsPlain: true, Text: "false" or "False" or "FALSE" } || Refuse(node, reading, out value);
    }
}
