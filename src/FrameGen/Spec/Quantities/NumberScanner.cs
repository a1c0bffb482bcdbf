using System.Globalization;

namespace FrameGen.Spec.Quantities;

/// <summary>Reads the numbers of a value: decimals, and in plain values fractions as a tape measure has them.</summary>
internal static class NumberScanner
{
    /// <summary>A number, as a double and, where a decimal holds it, exactly.</summary>
    internal readonly record struct Scanned(double Value, decimal? Exact);

    /// <summary>True where a number begins: a digit, or a point and a digit.</summary>
    public static bool IsAt(string text, int i) =>
        i < text.Length
        && (char.IsAsciiDigit(text[i]) || (text[i] == '.' && i + 1 < text.Length && char.IsAsciiDigit(text[i + 1])));

    /// <summary>Reads <c>12</c>, <c>1.5</c>, <c>.5</c>, <c>2e-3</c>, without a sign, and moves behind it.</summary>
    /// <exception cref="ValueException">A decimal comma.</exception>
    public static Scanned Decimal(string text, ref int i)
    {
        int start = i;
        SkipDigits(text, ref i);
        if (i < text.Length && text[i] == '.')
        {
            i++;
            SkipDigits(text, ref i);
        }

        if (i < text.Length && text[i] is 'e' or 'E')
        {
            int exponent = i + 1;
            if (exponent < text.Length && text[exponent] is '+' or '-')
            {
                exponent++;
            }

            if (exponent < text.Length && char.IsAsciiDigit(text[exponent]))
            {
                i = exponent;
                SkipDigits(text, ref i);
            }
        }

        ReadOnlySpan<char> digits = text.AsSpan(start, i - start);
        double value = double.Parse(digits, NumberStyles.Float, CultureInfo.InvariantCulture);

        // Twenty characters and this range stay well inside a decimal's 28 digits, so that it holds them exactly.
        decimal? exact = digits.Length <= 20 && value is 0 or (>= 1e-8 and <= 1e12)
            ? decimal.Parse(digits, NumberStyles.Float, CultureInfo.InvariantCulture)
            : null;
        return new Scanned(value, exact);
    }

    /// <summary>Reads <c>1.5</c>, <c>3/8</c>, <c>1-1/2</c> or <c>1 1/2</c>, without a sign, and moves behind it.</summary>
    /// <exception cref="ValueException">A fraction that is none: <c>1/0</c>, <c>1-5/4</c>.</exception>
    public static Scanned WithFraction(string text, ref int i)
    {
        int start = i;
        Scanned first = Decimal(text, ref i);
        bool isWhole = IsDigits(text, start, i);
        if (isWhole && Fraction(text, i, start, first) is { } plain)
        {
            i = plain.End;
            return plain.Number;
        }

        if (isWhole && i < text.Length && text[i] is '-' or ' ')
        {
            int next = i + 1;
            while (next < text.Length && text[next] == ' ')
            {
                next++;
            }

            int numeratorAt = next;
            if (next < text.Length && char.IsAsciiDigit(text[next]))
            {
                SkipDigits(text, ref next);
                int afterNumerator = numeratorAt;
                Scanned numerator = Decimal(text, ref afterNumerator);
                if (afterNumerator == next && Fraction(text, next, numeratorAt, numerator) is { } part)
                {
                    if (part.Number.Value >= 1)
                    {
                        throw new ValueException(
                            numeratorAt, $"'{text[numeratorAt..part.End]}' beside a whole number must be less than one");
                    }

                    i = part.End;
                    return new Scanned(first.Value + part.Number.Value, first.Exact + part.Number.Exact);
                }
            }
        }

        return first;
    }

    private static (Scanned Number, int End)? Fraction(string text, int slash, int start, Scanned numerator)
    {
        int i = slash + 1;
        if (slash >= text.Length || text[slash] != '/' || i >= text.Length || !char.IsAsciiDigit(text[i]))
        {
            return null;
        }

        Scanned denominator = Decimal(text, ref i);
        if (denominator.Value == 0)
        {
            throw new ValueException(start, $"'{text[start..i]}' divides by zero");
        }

        return (new Scanned(numerator.Value / denominator.Value, numerator.Exact / denominator.Exact), i);
    }

    private static bool IsDigits(string text, int start, int end) =>
        !text.AsSpan(start, end - start).ContainsAnyExceptInRange('0', '9');

    private static void SkipDigits(string text, ref int i)
    {
        while (i < text.Length && char.IsAsciiDigit(text[i]))
        {
            i++;
        }
    }
}
