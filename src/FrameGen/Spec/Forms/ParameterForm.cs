using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Quantities;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A parameter's value: a quantity of any kind, a number, or an expression.</summary>
internal sealed class ParameterForm : Form<ParameterSpec>
{
    /// <inheritdoc/>
    public override string Words => "a quantity, a number or an expression such as `1200 mm`, `3` or `=deck/2`";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out ParameterSpec value)
    {
        if (node is not YamlScalar { IsNothing: false } scalar)
        {
            return Refuse(node, reading, out value);
        }

        value = null;
        if (Functions.Constant(reading.Owner.Value.ToLowerInvariant()) is not null)
        {
            reading.Error(reading.Owner.At, $"a parameter can't be called '{reading.Owner.Value}': in expressions that is a constant; choose another name");
            return false;
        }

        Expression? expression = Values.Read(scalar, Words, reading);
        value = expression is null ? null : new ParameterSpec(reading.Owner, expression, scalar.At);
        return value is not null;
    }
}
