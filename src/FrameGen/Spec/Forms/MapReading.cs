using FrameGen.Diagnostics;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A map as far as it could be read.</summary>
internal sealed class MapReading(YamlMapping map, Reading reading)
{
    private readonly Dictionary<Key, object> _values = new(ReferenceEqualityComparer.Instance);
    private readonly Dictionary<Key, YamlEntry> _entries = new(ReferenceEqualityComparer.Instance);

    /// <summary>False once something was wrong.</summary>
    public bool IsSound { get; private set; } = true;

    /// <summary>Where the map begins.</summary>
    public SourcePlace At => map.At;

    /// <summary>The name it stands under.</summary>
    public Placed<string> Owner => reading.Owner;

    /// <summary>True where the key is written, be its value right or wrong.</summary>
    public bool Has(Key key) => _entries.ContainsKey(key);

    /// <summary>Where the key is written; the map's place where it is not.</summary>
    public SourcePlace PlaceOf(Key key) => _entries.TryGetValue(key, out YamlEntry? entry) ? entry.Key.At : At;

    /// <summary>What the key holds; null where it is not written or could not be read.</summary>
    public T? Find<T>(Key<T> key)
        where T : class => _values.TryGetValue(key, out object? value) ? (T)value : null;

    /// <summary>What the key holds; null where it is not written or could not be read.</summary>
    public T? FindValue<T>(Key<T> key)
        where T : struct => _values.TryGetValue(key, out object? value) ? (T)value : null;

    /// <summary>What a required key holds.</summary>
    public T Get<T>(Key<T> key)
        where T : notnull => (T)_values[key];

    /// <summary>A list's items; none where the key is not written or could not be read.</summary>
    public IReadOnlyList<T> Items<T>(Key<IReadOnlyList<T>> key) => Find(key) ?? [];

    /// <summary>Reports an error: nothing is made of the map.</summary>
    public void Error(SourcePlace at, string message)
    {
        IsSound = false;
        reading.Error(at, message);
    }

    /// <summary>Demands one of these keys, and no more than one.</summary>
    public void ExactlyOne(params ReadOnlySpan<Key> keys)
    {
        Key[] written = [.. keys.ToArray().Where(Has).OrderBy(key => PlaceOf(key).Line).ThenBy(key => PlaceOf(key).Column)];
        foreach (Key key in written.Skip(1))
        {
            Error(PlaceOf(key), $"'{key.Name}' and '{written[0].Name}' exclude each other; keep one of them");
        }

        if (written.Length == 0)
        {
            Error(At, $"one of {Listed(keys)} is missing");
        }
    }

    /// <summary>Demands one of these keys or more.</summary>
    public void AtLeastOne(params ReadOnlySpan<Key> keys)
    {
        foreach (Key key in keys)
        {
            if (Has(key))
            {
                return;
            }
        }

        Error(At, $"one of {Listed(keys)} is missing");
    }

    /// <summary>Demands one key, or two others together: <c>node</c>, or <c>from</c> and <c>to</c>.</summary>
    public void OneOrPair(Key one, Key first, Key second)
    {
        if (Has(one))
        {
            foreach (Key key in new[] { first, second }.Where(Has))
            {
                Error(PlaceOf(key), $"'{key.Name}' does not go with '{one.Name}'; write '{one.Name}', or '{first.Name}' and '{second.Name}'");
            }
        }
        else if (!Has(first) && !Has(second))
        {
            Error(At, $"'{one.Name}' is missing, or '{first.Name}' and '{second.Name}'");
        }
        else if (!Has(first) || !Has(second))
        {
            (Key written, Key missing) = Has(first) ? (first, second) : (second, first);
            Error(PlaceOf(written), $"'{written.Name}' needs '{missing.Name}' beside it");
        }
    }

    /// <summary>Reads what a key holds, and refuses it where the key has no effect yet.</summary>
    public void Take(Key key, YamlEntry entry)
    {
        _entries.Add(key, entry);
        if (key.TryRead(entry.Value, reading, out object? value))
        {
            _values.Add(key, value);
        }
        else
        {
            IsSound = false;
        }

        if (key.IsNotSupportedYet)
        {
            Error(entry.Key.At, NotYet.Message(key.Name));
        }
    }

    private static string Listed(ReadOnlySpan<Key> keys)
    {
        var names = new List<string>();
        foreach (Key key in keys)
        {
            names.Add($"'{key.Name}'");
        }

        return string.Join(", ", names);
    }
}
