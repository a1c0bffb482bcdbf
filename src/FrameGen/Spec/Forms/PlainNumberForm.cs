using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Quantities;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A plain number, in no unit and no expression: a price, a count.</summary>
/// <param name="words">What it is, with its article.</param>
/// <param name="isWhole">True for counts.</param>
internal sealed class PlainNumberForm(string words, bool isWhole) : Form<double>
{
    /// <inheritdoc/>
    public override string Words => words;

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out double value)
    {
        value = 0;
        if (node is not YamlScalar { IsNothing: false } scalar)
        {
            return Refuse(node, reading, out value);
        }

        if (Values.Read(scalar, words, reading) is not { } expression)
        {
            return false;
        }

        if (expression is not LiteralExpression { Unit: null } literal || Values.IsExpression(scalar))
        {
            return Refuse(node, reading, out value);
        }

        string? wrong = QuantityCheck.WrongSize(QuantityKind.Number, literal.Value, ValueRange.Positive, literal.Text);
        if (wrong is null && isWhole && literal.Value != Math.Floor(literal.Value))
        {
            wrong = $"`{literal.Text}` must be a whole number";
        }

        value = literal.Value;
        if (wrong is not null)
        {
            reading.Error(scalar.At, wrong);
        }

        return wrong is null;
    }
}
