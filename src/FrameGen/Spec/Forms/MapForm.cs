using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A map of known keys.</summary>
/// <typeparam name="T">What it is read into.</typeparam>
/// <param name="words">What it is, with its article: <c>a tube</c>.</param>
/// <param name="keys">Its keys.</param>
/// <param name="build">Makes the result; called only when nothing was wrong.</param>
/// <param name="check">Rules between keys; called also when a value could not be read.</param>
internal sealed class MapForm<T>(string words, IReadOnlyList<Key> keys, Func<MapReading, T> build, Action<MapReading>? check = null)
    : Form<T>
{
    /// <inheritdoc/>
    public override IReadOnlyList<Key> Keys => keys;

    /// <inheritdoc/>
    public override string Words => $"{words} ({{{string.Join(", ", keys.Select(key => key.Name))}}})";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out T value)
    {
        if (node is not YamlMapping map)
        {
            return Refuse(node, reading, out value);
        }

        MapReading read = ReadKeys(map, reading);
        value = read.IsSound ? build(read) : default;
        return read.IsSound;
    }

    /// <summary>Reads what the keys hold, for those who want it in spite of errors.</summary>
    public MapReading ReadKeys(YamlMapping map, Reading reading)
    {
        var read = new MapReading(map, reading);
        foreach (YamlEntry entry in map.Entries)
        {
            if (keys.FirstOrDefault(key => string.Equals(key.Name, entry.Key.Text, StringComparison.Ordinal)) is { } known)
            {
                read.Take(known, entry);
            }
            else
            {
                read.Error(entry.Key.At, UnknownKey(entry.Key));
            }
        }

        foreach (Key missing in keys.Where(key => key.IsRequired && !read.Has(key)))
        {
            read.Error(map.At, $"{words} needs the key '{missing.Name}': {missing.Description} (`{missing.Name}: {missing.Example}`)");
        }

        check?.Invoke(read);
        return read;
    }

    private string UnknownKey(YamlScalar key)
    {
        string advice = NearestName.Suggest(key.Text, keys.Select(known => known.Name));
        return advice.Length > 0
            ? $"unknown key {key.Words} in {words}{advice}"
            : $"unknown key {key.Words} in {words}; it takes {string.Join(", ", keys.Select(known => known.Name))}";
    }
}
