using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Quantities;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A value with a unit, or an expression.</summary>
internal sealed class QuantityForm : Form<SpecQuantity>
{
    /// <summary>A quantity.</summary>
    /// <param name="range">Values it may have.</param>
    /// <param name="kinds">What it may measure; where there are several, an expression counts as the first.</param>
    public QuantityForm(ValueRange range, params IReadOnlyList<QuantityKind> kinds)
    {
        (Range, Kinds) = (range, kinds);
    }

    /// <summary>Values it may have, in the working unit.</summary>
    public ValueRange Range { get; }

    /// <summary>What it may measure.</summary>
    public IReadOnlyList<QuantityKind> Kinds { get; }

    /// <inheritdoc/>
    public override string Words => string.Join(" or ", Kinds.Select(kind => KindInfo.Of(kind).WithExamples));

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out SpecQuantity value)
    {
        if (node is not YamlScalar { IsNothing: false } scalar)
        {
            return Refuse(node, reading, out value);
        }

        value = null;
        if (Values.Read(scalar, Words, reading, Kinds) is not { } expression)
        {
            return false;
        }

        QuantityKind kind = Kinds[0];
        if (expression is LiteralExpression literal && !Values.IsExpression(scalar))
        {
            if (QuantityCheck.WrongKind(literal, Kinds) is { } wrongKind)
            {
                reading.Error(literal.At, wrongKind);
                return false;
            }

            kind = Kinds.First(k => QuantityCheck.WrongKind(literal, [k]) is null);
            if (QuantityCheck.WrongSize(kind, literal.Value, Range, literal.Text) is { } wrongSize)
            {
                reading.Error(literal.At, wrongSize);
                return false;
            }
        }

        value = new SpecQuantity(kind, expression, scalar.At) { Range = Range };
        return true;
    }
}
