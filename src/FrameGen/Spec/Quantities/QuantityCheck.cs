using FrameGen.Diagnostics;

namespace FrameGen.Spec.Quantities;

/// <summary>Whether a value is of the kind, size and range that its place asks for.</summary>
internal static class QuantityCheck
{
    /// <summary>What is wrong with a literal where these kinds are allowed; null where nothing is.</summary>
    public static string? WrongKind(LiteralExpression literal, IReadOnlyList<QuantityKind> kinds)
    {
        foreach (QuantityKind kind in kinds)
        {
            // Of one dimension but not of one form: a share is written with %, a number without.
            bool fits = (kind, literal.Unit?.Kind) switch
            {
                (QuantityKind.Number, null) => true,
                (QuantityKind.Number, _) or (_, null) => false,
                (QuantityKind.Share, QuantityKind.Share) => true,
                (QuantityKind.Share, _) or (_, QuantityKind.Share) => false,
                _ => literal.Unit!.Dimension == KindInfo.Of(kind).Dimension,
            };
            if (fits)
            {
                return null;
            }
        }

        return $"{Expected(kinds)}, got {Got(literal, kinds[0])}";
    }

    /// <summary>What the place asks for: <c>expected a length such as `38 mm` or `1.5 in`</c>.</summary>
    public static string Expected(IReadOnlyList<QuantityKind> kinds) =>
        $"expected {string.Join(" or ", kinds.Select(kind => KindInfo.Of(kind).WithExamples))}";

    /// <summary>What is wrong with the size of a value of the right kind; null where nothing is.</summary>
    public static string? WrongSize(QuantityKind kind, double value, ValueRange range, string written)
    {
        KindInfo info = KindInfo.Of(kind);
        double largest = kind == QuantityKind.Length ? KindInfo.LargestLength : KindInfo.LargestOther;
        if (!double.IsFinite(value))
        {
            return $"`{written}` is too large or no number at all";
        }

        if (Math.Abs(value) > largest)
        {
            return $"`{written}` is {InUnit(value, info)}, larger than any frame needs (at most {InUnit(largest, info)})";
        }

        return range.Holds(value) ? null : $"`{written}` must be {range.Words}";
    }

    /// <summary>A value in its kind's working unit.</summary>
    public static string InUnit(double value, KindInfo info) => info.Kind switch
    {
        QuantityKind.Number => SpecNumber.Text(value),
        QuantityKind.Share => $"{SpecNumber.Text(value * 100)} %",
        _ => $"{SpecNumber.Text(value)} {info.WorkingUnit}",
    };

    /// <summary>The value of an evaluated expression in the working unit of the kind asked for.</summary>
    /// <returns>Null after an error.</returns>
    public static double? Convert(Measure measure, SpecQuantity quantity, DiagnosticList diagnostics)
    {
        KindInfo info = KindInfo.Of(quantity.Kind);
        if (!measure.Dimension.Agrees(info.Dimension))
        {
            string unit = measure.Dimension.ToString();
            string got = unit.Length == 0
                ? $"the plain number {SpecNumber.Text(measure.Value)}"
                : $"{KindInfo.WordsFor(measure.Dimension)}: {SpecNumber.Text(measure)}";
            diagnostics.Error(quantity.At, $"expected {info.WithExamples}, got {got} from `{quantity.Value.Source.Text}`");
            return null;
        }

        double value = measure.Value * info.WorkingPerBase;
        if (WrongSize(quantity.Kind, value, quantity.Range, quantity.Value.Source.Text) is { } wrong)
        {
            diagnostics.Error(quantity.At, $"{wrong}; it comes to {InUnit(value, info)}");
            return null;
        }

        return value;
    }

    private static string Got(LiteralExpression literal, QuantityKind wanted)
    {
        if (literal.Unit is not { } unit)
        {
            string unitToAdd = KindInfo.Of(wanted).WorkingUnit;
            return $"the bare number {literal.Text}; write `{literal.Text} {unitToAdd}` if that is meant";
        }

        return $"{KindInfo.Of(unit.Kind).Words} ({unit.Name})";
    }
}
