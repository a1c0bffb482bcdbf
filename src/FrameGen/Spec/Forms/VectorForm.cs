using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Quantities;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>Three components.</summary>
/// <param name="kind">Of each.</param>
/// <param name="isDirection">True where not all may be 0.</param>
internal sealed class VectorForm(QuantityKind kind, bool isDirection = false) : Form<SpecVector>
{
    private readonly QuantityForm _component = new(ValueRange.Any, kind);

    /// <inheritdoc/>
    public override IReadOnlyList<Form> Parts => [_component];

    /// <inheritdoc/>
    public override string Words => $"three values [x, y, z], each {_component.Words}";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out SpecVector value)
    {
        if (node is not YamlSequence list)
        {
            return Refuse(node, reading, out value);
        }

        value = null;
        var components = new List<SpecQuantity>(3);
        bool isSound = true;
        foreach (YamlNode item in list.Items)
        {
            if (_component.TryRead(item, reading, out SpecQuantity? component))
            {
                components.Add(component);
            }
            else
            {
                isSound = false;
            }
        }

        if (list.Items.Count != 3)
        {
            string advice = list.Items.Count > 3 ? " (a decimal comma splits a value in two: write a point)" : string.Empty;
            reading.Error(list.At, $"expected {Words}, got {list.Items.Count}{advice}");
            return false;
        }

        if (isSound && isDirection && components.TrueForAll(component => component.Value is LiteralExpression { Value: 0 }))
        {
            reading.Error(list.At, "a direction can't be [0, 0, 0]; at least one component must differ from 0");
            return false;
        }

        value = isSound ? new SpecVector(components[0], components[1], components[2], list.At) : null;
        return isSound;
    }
}
