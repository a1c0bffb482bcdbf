using FrameGen.Diagnostics;
using FrameGen.Spec;
using FrameGen.Spec.Quantities;

namespace FrameGen.Cli;

/// <summary>Reads values with units, and words, off the command line: as a spec has them.</summary>
internal static class QuantityOption
{
    /// <summary>A value more than 0 in working units.</summary>
    /// <param name="option">The option, for messages.</param>
    /// <param name="text">As written: <c>600 mm</c>.</param>
    /// <param name="kind">What it measures.</param>
    /// <exception cref="WrongInputException">It is no such value.</exception>
    public static double Read(string option, string text, QuantityKind kind)
    {
        try
        {
            LiteralExpression literal = PlainValue.Read(new ExpressionSource(text, new SourcePlace(option, 1, 1), null), kind);
            return (QuantityCheck.WrongKind(literal, [kind]) ?? QuantityCheck.WrongSize(kind, literal.Value, ValueRange.Positive, text)) is { } wrong
                ? throw new WrongInputException($"{option}: {wrong}")
                : literal.Value;
        }
        catch (ValueException wrong)
        {
            throw new WrongInputException($"{option}: {wrong.Message}");
        }
    }

    /// <summary>A value that may be left out.</summary>
    public static double? Optional(string option, string? text, QuantityKind kind) => text is null ? null : Read(option, text, kind);

    /// <summary>A value that others make necessary.</summary>
    public static double Required(string option, string? text, QuantityKind kind) => text is null
        ? throw new WrongInputException($"{option} is missing: {QuantityCheck.Expected([kind])}")
        : Read(option, text, kind);

    /// <summary>One of a few words.</summary>
    public static T Word<T>(string option, string text, ReadOnlySpan<(string Word, T Value)> words)
    {
        var names = new List<string>();
        foreach ((string word, T value) in words)
        {
            if (string.Equals(word, text, StringComparison.Ordinal))
            {
                return value;
            }

            names.Add(word);
        }

        throw new WrongInputException($"{option} takes {string.Join(", ", names.SkipLast(1))} or {names[^1]}, and is {text}{NearestName.Suggest(text, names)}");
    }
}
