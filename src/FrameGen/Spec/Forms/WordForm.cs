using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>One of a few words.</summary>
/// <param name="choices">The words and what they stand for; words of one meaning may repeat it.</param>
/// <param name="notYet">Words of the format that have no effect yet.</param>
/// <param name="notYetName">How such a word is named: <c>objective: cost</c>.</param>
internal sealed class WordForm<T>(
    IReadOnlyList<(string Word, T Value)> choices, IReadOnlyList<string>? notYet = null, Func<string, string>? notYetName = null) : Form<T>
{
    /// <summary>The words.</summary>
    public IReadOnlyList<string> Choices { get; } = [.. choices.Select(choice => choice.Word), .. notYet ?? []];

    /// <inheritdoc/>
    public override string Words => Choices.Count == 1
        ? $"'{Choices[0]}'"
        : $"{string.Join(", ", Choices.SkipLast(1))} or {Choices[^1]}";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out T value)
    {
        value = default;
        if (node is not YamlScalar { IsNothing: false } scalar)
        {
            return Refuse(node, reading, out value);
        }

        foreach ((string word, T meaning) in choices)
        {
            if (string.Equals(word, scalar.Text, StringComparison.Ordinal))
            {
                value = meaning;
                return true;
            }
        }

        if (notYet?.Contains(scalar.Text, StringComparer.Ordinal) == true)
        {
            reading.Error(scalar.At, NotYet.Message(notYetName?.Invoke(scalar.Text) ?? scalar.Text));
            return false;
        }

        reading.Error(scalar.At, $"expected {Words}, got {scalar.Words}{NearestName.Suggest(scalar.Text, Choices)}");
        return false;
    }
}
