using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>One of several maps; the first marking key that is written tells which.</summary>
/// <param name="words">What it is, with its article.</param>
/// <param name="alternatives">The marking key of each, and the map.</param>
internal sealed class ChoiceForm<T>(string words, IReadOnlyList<(string Marker, MapForm<T> Form)> alternatives) : Form<T>
{
    /// <inheritdoc/>
    public override IReadOnlyList<Form> Parts => [.. alternatives.Select(alternative => alternative.Form)];

    /// <inheritdoc/>
    public override string Words => words;

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out T value)
    {
        if (node is not YamlMapping map)
        {
            return Refuse(node, reading, out value);
        }

        foreach ((string marker, MapForm<T> form) in alternatives)
        {
            if (map.Entries.Any(entry => string.Equals(entry.Key.Text, marker, StringComparison.Ordinal)))
            {
                return form.TryRead(node, reading, out value);
            }
        }

        string[] known = [.. alternatives.SelectMany(alternative => alternative.Form.Keys).Select(key => key.Name).Distinct(StringComparer.Ordinal)];
        foreach (YamlEntry entry in map.Entries.Where(entry => !known.Contains(entry.Key.Text, StringComparer.Ordinal)))
        {
            reading.Error(entry.Key.At, $"unknown key {entry.Key.Words}{NearestName.Suggest(entry.Key.Text, known)}");
        }

        string markers = string.Join(", ", alternatives.Select(alternative => $"'{alternative.Marker}'"));
        reading.Error(map.At, $"expected {words}: one of the keys {markers} is missing");
        value = default;
        return false;
    }
}
