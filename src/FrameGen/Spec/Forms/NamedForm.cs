using System.Diagnostics.CodeAnalysis;
using FrameGen.Diagnostics;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A map from names to values of one form: nodes, tubes, cases. No two names are equal without regard to case.</summary>
/// <param name="what">What one of them is, without article: <c>tube</c>.</param>
/// <param name="name">What the names may be.</param>
/// <param name="item">What a value is; its reading knows the name as owner.</param>
/// <param name="least">Fewest of them.</param>
/// <param name="most">Most of them.</param>
internal sealed class NamedForm<T>(string what, NameForm name, Form<T> item, int least = 0, int most = int.MaxValue)
    : Form<IReadOnlyList<T>>
{
    /// <summary>Most of them.</summary>
    public int Most => most;

    /// <inheritdoc/>
    public override IReadOnlyList<Form> Parts => [name, item];

    /// <inheritdoc/>
    public override string Words => $"names, each with what the {what} is (`NAME: ...`)";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out IReadOnlyList<T> value)
    {
        if (node is not YamlMapping map)
        {
            return Refuse(node, reading, out value);
        }

        bool isSound = true;
        if (map.Entries.Count < least)
        {
            reading.Error(map.At, $"at least one {what} is needed");
            isSound = false;
        }

        var items = new List<T>(map.Entries.Count);
        var places = new Dictionary<string, (string Name, SourcePlace At)>(StringComparer.OrdinalIgnoreCase);
        foreach (YamlEntry entry in map.Entries)
        {
            if (items.Count == most)
            {
                reading.Error(entry.Key.At, $"more than {most} {what}s; split the frame into several specs");
                isSound = false;
                break;
            }

            if (!name.TryRead(entry.Key, reading, out Placed<string>? owner))
            {
                isSound = false;
                owner = new Placed<string>(entry.Key.Text, entry.Key.At);
            }

            if (!places.TryAdd(owner.Value, (owner.Value, owner.At)))
            {
                (string first, SourcePlace at) = places[owner.Value];
                reading.Error(
                    owner.At, $"{what} '{owner.Value}' is '{first}' of line {at.Line} again: names are compared without regard to case; rename one");
                isSound = false;
            }

            if (item.TryRead(entry.Value, reading with { Owner = owner }, out T? read))
            {
                items.Add(read);
            }
            else
            {
                isSound = false;
            }
        }

        value = isSound ? items : null;
        return isSound;
    }
}
