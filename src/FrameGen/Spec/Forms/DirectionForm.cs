using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A direction; null for any, where that is allowed.</summary>
/// <param name="Vector">Its components.</param>
internal sealed record Direction(SpecVector? Vector);

/// <summary>A direction: an axis' letter, with or without a sign, a vector, or <c>any</c>.</summary>
/// <param name="allowsAny">True where <c>any</c> is allowed.</param>
internal sealed class DirectionForm(bool allowsAny) : Form<Direction>
{
    private static readonly VectorForm Vector = new(QuantityKind.Number, isDirection: true);

    private static readonly string[] Axes = ["x", "y", "z"];

    /// <inheritdoc/>
    public override string Words => allowsAny
        ? "a direction such as x, -z, [0, 1, 1], or any"
        : "a direction such as x, -z or [0, 1, 1]";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out Direction value)
    {
        value = null;
        if (node is YamlSequence)
        {
            bool isRead = Vector.TryRead(node, reading, out SpecVector? vector);
            value = isRead ? new Direction(vector) : null;
            return isRead;
        }

        if (node is not YamlScalar scalar)
        {
            return Refuse(node, reading, out value);
        }

        if (allowsAny && scalar.Text is "any")
        {
            value = new Direction(null);
            return true;
        }

        double sign = scalar.Text.StartsWith('-') ? -1 : 1;
        int axis = Array.IndexOf(Axes, scalar.Text is ['-' or '+', .. string letter] ? letter : scalar.Text);
        if (axis < 0)
        {
            return Refuse(node, reading, out value);
        }

        SpecQuantity[] parts = [.. Axes.Select((_, i) => Values.Number(scalar, i == axis ? sign : 0))];
        value = new Direction(new SpecVector(parts[0], parts[1], parts[2], scalar.At));
        return true;
    }
}
