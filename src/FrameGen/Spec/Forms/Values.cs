using FrameGen.Spec.Quantities;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>Reads values and expressions.</summary>
internal static class Values
{
    /// <summary>True where the value is an expression.</summary>
    public static bool IsExpression(YamlScalar scalar) => scalar.Text.StartsWith('=');

    /// <summary>Longest plain value, range or section, characters; an expression may be longer.</summary>
    public const int LongestPlain = 200;

    /// <summary>The source of a single value.</summary>
    public static ExpressionSource SourceOf(YamlScalar scalar) => new(scalar.Text, scalar.At, scalar.FirstColumn);

    /// <summary>True, with an error, for a value too long to be looked at.</summary>
    public static bool IsTooLong(YamlScalar scalar, Reading reading)
    {
        bool isTooLong = scalar.Text.Length > LongestPlain && !IsExpression(scalar);
        if (isTooLong)
        {
            reading.Error(scalar.At, $"{scalar.Words} has {scalar.Text.Length} characters, too many for a value (at most {LongestPlain})");
        }

        return isTooLong;
    }

    /// <summary>Parses a value.</summary>
    /// <param name="scalar">The value.</param>
    /// <param name="words">What is expected.</param>
    /// <param name="reading">Where errors go.</param>
    /// <param name="kinds">What is expected, for advice on units; empty where anything may be meant.</param>
    /// <returns>Null after an error.</returns>
    public static Expression? Read(YamlScalar scalar, string words, Reading reading, params IReadOnlyList<QuantityKind> kinds)
    {
        if (IsTooLong(scalar, reading))
        {
            return null;
        }

        ExpressionSource source = SourceOf(scalar);
        bool isExpression = IsExpression(scalar);
        try
        {
            return isExpression ? ExpressionParser.Parse(source) : PlainValue.Read(source, kinds);
        }
        catch (ValueException wrong)
        {
            reading.Error(source.PlaceOf(wrong.Offset), isExpression ? wrong.Message : $"{Sentence(wrong.Message)} expected {words}");
            return null;
        }
    }

    /// <summary>A literal in the place of a word: 1 for <c>x</c>, −1 for <c>-z</c>.</summary>
    public static SpecQuantity Number(YamlScalar scalar, double number) =>
        new(QuantityKind.Number, new LiteralExpression(SourceOf(scalar), 0, scalar.Text.Length, number, null), scalar.At);

    /// <summary>True for a literal that was written as an expression: <c>=5 N</c>.</summary>
    public static bool IsExpression(LiteralExpression literal) => literal.Source.Text.StartsWith('=');

    private static string Sentence(string message) => message.EndsWith('?') ? message : $"{message};";
}
