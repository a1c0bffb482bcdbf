using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>Path of another file, relative to the one it is written in, with <c>/</c> between folders.</summary>
internal sealed class PathForm : Form<Placed<string>>
{
    /// <inheritdoc/>
    public override string Words => "a path relative to this file, such as ../lists/tube-rack.yaml";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out Placed<string> value)
    {
        if (node is not YamlScalar { IsNothing: false } scalar || scalar.Text.Length == 0)
        {
            return Refuse(node, reading, out value);
        }

        value = new Placed<string>(scalar.Text, scalar.At);
        if (Wrong(scalar.Text) is not { } wrong)
        {
            return true;
        }

        reading.Error(scalar.At, $"{scalar.Words} {wrong}; write {Words}");
        return false;
    }

    private static string? Wrong(string path)
    {
        if (path.Length > 500)
        {
            return "is too long for a path";
        }

        if (path.Any(char.IsControl))
        {
            return "holds a control character";
        }

        if (path.Contains('\\', StringComparison.Ordinal))
        {
            return "has a backslash, which is no separator everywhere";
        }

        // A colon makes a drive, a stream or an address; none of them is a path relative to this file.
        return path.StartsWith('/') || path.Contains(':', StringComparison.Ordinal) ? "is no relative path" : null;
    }
}
