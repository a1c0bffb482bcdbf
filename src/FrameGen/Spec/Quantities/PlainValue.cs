namespace FrameGen.Spec.Quantities;

/// <summary>Reads a value that is no expression: <c>38 mm</c>, <c>1-1/2 in</c>, <c>5 ft 3 in</c>, <c>2.0</c>.</summary>
internal static class PlainValue
{
    /// <summary>Reads a value.</summary>
    /// <param name="source">The value.</param>
    /// <param name="kinds">What is expected, for advice on units; empty where anything may be meant.</param>
    /// <exception cref="ValueException">It is no number with a unit.</exception>
    public static LiteralExpression Read(ExpressionSource source, params IReadOnlyList<QuantityKind> kinds) =>
        Read(source, 0, source.Text.Length, null, kinds);

    /// <summary>Reads a part of a value.</summary>
    /// <param name="source">The value.</param>
    /// <param name="start">Where the part begins.</param>
    /// <param name="end">Behind its end.</param>
    /// <param name="unitOfOthers">The unit of a number written without one.</param>
    /// <param name="kinds">What is expected, for advice on units; empty where anything may be meant.</param>
    /// <exception cref="ValueException">It is no number with a unit.</exception>
    public static LiteralExpression Read(
        ExpressionSource source, int start, int end, Unit? unitOfOthers, params IReadOnlyList<QuantityKind> kinds)
    {
        string text = source.Text[..end];
        int i = SkipBlanks(text, start);
        start = i;
        bool isNegative = i < end && text[i] == '-';
        if (i < end && text[i] is '-' or '+')
        {
            i = SkipBlanks(text, i + 1);
        }

        if (!NumberScanner.IsAt(text, i))
        {
            throw new ValueException(start, NoNumber(text[start..].Trim()));
        }

        double value = 0;
        Unit? unit = null;
        bool isFirst = true;
        do
        {
            int numberAt = i;
            NumberScanner.Scanned number = NumberScanner.WithFraction(text, ref i);
            RefuseComma(text, numberAt, i);
            Unit? own = UnitAt(text, ref i, kinds);
            if (!isFirst && (own is null || !IsFeetThenInches(unit, own)))
            {
                throw new ValueException(numberAt, $"'{text[start..].Trim()}' is more than one value; only feet and inches go together (`5 ft 3 in`)");
            }

            unit = own ?? unitOfOthers;
            value += unit?.ToWorking(number.Value, number.Exact) ?? number.Value;
            isFirst = false;
            i = SkipBlanks(text, i);
        }
        while (NumberScanner.IsAt(text, i));

        if (i < end)
        {
            throw new ValueException(i, $"'{text[i..].Trim()}' after `{text[start..i].Trim()}` means nothing; write one number and its unit");
        }

        return new LiteralExpression(source, start, TrimmedEnd(text, start), isNegative ? -value : value, unit);
    }

    private static string NoNumber(string text)
    {
        if (text.Length == 0)
        {
            return "there is no number";
        }

        return text.Equals(".inf", StringComparison.OrdinalIgnoreCase) || text.Equals(".nan", StringComparison.OrdinalIgnoreCase)
            ? $"'{text}' is no finite number"
            : $"'{text}' does not begin with a number";
    }

    private static bool IsFeetThenInches(Unit? first, Unit second) =>
        first?.Name is "ft" && second.Name is "in" or "inch";

    private static void RefuseComma(string text, int numberAt, int end)
    {
        if (end + 1 < text.Length && text[end] == ',' && char.IsAsciiDigit(text[end + 1]))
        {
            int digits = end + 1;
            while (digits < text.Length && char.IsAsciiDigit(text[digits]))
            {
                digits++;
            }

            throw new ValueException(
                end,
                $"decimal comma in '{text[numberAt..digits]}'; write a point, as in {text[numberAt..end]}.{text[(end + 1)..digits]}, and nothing between thousands");
        }
    }

    private static Unit? UnitAt(string text, ref int i, IReadOnlyList<QuantityKind> kinds)
    {
        int start = SkipBlanks(text, i);
        int end = start;
        while (end < text.Length && UnitTable.IsUnitCharacter(text[end]))
        {
            end++;
        }

        // What no unit holds but people write for one: say what the unit is rather than where the text goes wrong.
        int written = end;
        while (written < text.Length && text[written] is '^' or '(' or ')' or '\'' or '"' or '°' or '-')
        {
            written++;
            while (written < text.Length && UnitTable.IsUnitCharacter(text[written]))
            {
                written++;
            }
        }

        if (written == start)
        {
            return null;
        }

        if (UnitTable.LongestAt(text, start) is { } found && (found.Length == end - start || NumberScanner.IsAt(text, start + found.Length)))
        {
            i = start + found.Length;
            if (written > end && found.Length == end - start)
            {
                throw new ValueException(start, UnitTable.Unknown(text[start..written], kinds));
            }

            return found.Unit;
        }

        // The number may be the first of feet and inches without a unit, or a second number: let the caller say so.
        if (NumberScanner.IsAt(text, start))
        {
            return null;
        }

        throw new ValueException(start, UnitTable.Unknown(text[start..written], kinds));
    }

    private static int SkipBlanks(string text, int i)
    {
        while (i < text.Length && text[i] is ' ' or '\t' or '\n' or '\u00a0')
        {
            i++;
        }

        return i;
    }

    private static int TrimmedEnd(string text, int start) => start + text[start..].TrimEnd().Length;
}
