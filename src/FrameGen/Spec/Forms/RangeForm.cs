using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Quantities;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A range of lengths: <c>25 mm .. 40 mm</c>, <c>1.5 mm ..</c>, <c>.. 30 mm</c>.</summary>
internal sealed class RangeForm : Form<RangeSpec>
{
    private const string Separator = "..";

    /// <inheritdoc/>
    public override string Words => "a range of lengths such as `25 mm .. 40 mm`, `1.5 mm ..` or `.. 30 mm`";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out RangeSpec value)
    {
        if (node is not YamlScalar { IsNothing: false } scalar)
        {
            return Refuse(node, reading, out value);
        }

        value = null;
        if (Values.IsTooLong(scalar, reading))
        {
            return false;
        }

        ExpressionSource source = Values.SourceOf(scalar);
        string text = scalar.Text;
        int separator = text.IndexOf(Separator, StringComparison.Ordinal);
        string rest = separator < 0 ? string.Empty : text[(separator + Separator.Length)..];
        if (separator < 0 || rest.StartsWith('.') || rest.Contains(Separator, StringComparison.Ordinal) || text.Trim().Length == Separator.Length)
        {
            string advice = separator < 0 ? $"; for one size alone write `{text} .. {text}`" : string.Empty;
            reading.Error(scalar.At, $"expected {Words}, got {scalar.Words}{advice}");
            return false;
        }

        try
        {
            // The upper end is read first: its unit serves a lower end without one, `25 .. 40 mm`.
            SpecQuantity? max = End(source, separator + Separator.Length, text.Length, null);
            SpecQuantity? min = End(source, 0, separator, (max?.Value as LiteralExpression)?.Unit);
            if (min?.Value is LiteralExpression low && max?.Value is LiteralExpression high && low.Value > high.Value)
            {
                throw new ValueException(0, $"the range '{text}' begins above its end; swap the two");
            }

            value = new RangeSpec(min, max, text, scalar.At);
            return true;
        }
        catch (ValueException wrong)
        {
            reading.Error(source.PlaceOf(wrong.Offset), wrong.Message);
            return false;
        }
    }

    private static SpecQuantity? End(ExpressionSource source, int start, int end, Unit? unitOfOther)
    {
        if (source.Text.AsSpan(start, end - start).IsWhiteSpace())
        {
            return null;
        }

        LiteralExpression literal = PlainValue.Read(source, start, end, unitOfOther, QuantityKind.Length);
        string? wrong = QuantityCheck.WrongKind(literal, [QuantityKind.Length])
            ?? QuantityCheck.WrongSize(QuantityKind.Length, literal.Value, ValueRange.NotNegative, literal.Text);
        return wrong is null
            ? new SpecQuantity(QuantityKind.Length, literal, literal.At) { Range = ValueRange.NotNegative }
            : throw new ValueException(literal.Start, wrong);
    }
}
