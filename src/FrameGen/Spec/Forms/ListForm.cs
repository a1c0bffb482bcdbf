using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A list.</summary>
/// <param name="words">What its items are: <c>tubes</c>.</param>
/// <param name="item">What an item is.</param>
/// <param name="least">Fewest items.</param>
/// <param name="most">Most items.</param>
/// <param name="identity">Gives the name by which no two items may be the same, without regard to case; null where they may.</param>
internal sealed class ListForm<T>(string words, Form<T> item, int least = 0, int most = int.MaxValue, Func<T, string>? identity = null)
    : Form<IReadOnlyList<T>>
{
    /// <summary>Fewest items.</summary>
    public int Least => least;

    /// <summary>Most items.</summary>
    public int Most => most;

    /// <inheritdoc/>
    public override IReadOnlyList<Form> Parts => [item];

    /// <inheritdoc/>
    public override string Words => $"a list [..] of {words}";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out IReadOnlyList<T> value)
    {
        if (node is not YamlSequence list)
        {
            return Refuse(node, reading, out value);
        }

        bool isSound = HasRightCount(list, reading);
        var items = new List<T>(list.Items.Count);
        var names = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        foreach (YamlNode entry in list.Items)
        {
            if (!item.TryRead(entry, reading, out T? read))
            {
                isSound = false;
                continue;
            }

            items.Add(read);
            if (identity?.Invoke(read) is { } name && !names.Add(name))
            {
                reading.Error(entry.At, $"'{name}' is named twice; name it once");
                isSound = false;
            }
        }

        value = isSound ? items : null;
        return isSound;
    }

    private bool HasRightCount(YamlSequence list, Reading reading)
    {
        int count = list.Items.Count;
        if (count >= least && count <= most)
        {
            return true;
        }

        string wanted = least == most ? $"{least}" : count >= least ? $"at most {most}" : least == 1 ? "one or more" : $"at least {least}";
        reading.Error(list.At, $"expected {wanted} {words}, got {(count == 0 ? "none" : count)}");
        return false;
    }
}
