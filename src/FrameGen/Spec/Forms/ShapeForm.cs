using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A section's shape.</summary>
internal sealed class ShapeForm : Form<Placed<string>>
{
    /// <summary>The words.</summary>
    public static readonly WordForm<string> Shapes = new([.. SectionForm.Shapes.Select(s => (s.Shape, s.Shape))]);

    /// <inheritdoc/>
    public override string Words => $"a shape: {Shapes.Words}";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out Placed<string> value)
    {
        bool isRead = Shapes.TryRead(node, reading, out string? shape);
        value = isRead ? new Placed<string>(shape!, node.At) : null;
        return isRead;
    }
}
