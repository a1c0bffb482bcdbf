using FrameGen.Diagnostics;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>The names of one kind of thing, numbered in the order in which they are added; compared without regard to case.</summary>
/// <param name="kind">The spec's word: <c>node</c>, <c>tube</c>.</param>
internal sealed class NameIndex(string kind)
{
    // Every name against every other takes long; nobody reads more of it than this.
    private const int MostSuggestions = 100;

    private readonly Dictionary<string, int> _numbers = new(StringComparer.OrdinalIgnoreCase);
    private readonly List<string> _names = [];
    private int _unknown;

    /// <summary>The names in order.</summary>
    public IReadOnlyList<string> Names => _names;

    /// <summary>An index of names that were found good already.</summary>
    public static NameIndex Of(string kind, IEnumerable<Placed<string>> names, DiagnosticList diagnostics)
    {
        var index = new NameIndex(kind);
        foreach (Placed<string> name in names)
        {
            index.Add(name.Value, name.At, diagnostics);
        }

        return index;
    }

    /// <summary>The names that a spec writes out, to ask whether a twin is among them; the ones not given are left out.</summary>
    public static HashSet<string> Written(IEnumerable<Placed<string>?> names) =>
        new(names.OfType<Placed<string>>().Select(n => n.Value), StringComparer.OrdinalIgnoreCase);

    /// <summary>Gives a name the next number; a name that stands already keeps its first one, and is an error.</summary>
    public void Add(string name, SourcePlace at, DiagnosticList diagnostics)
    {
        if (!_numbers.TryAdd(name, _names.Count))
        {
            diagnostics.Error(
                at, $"{kind} {name} is named twice (as {_names[_numbers[name]]}; capitals don't count); give one of them another name");
        }

        _names.Add(name);
    }

    /// <summary>The number of a name; null where there is none.</summary>
    public int? Find(string name) => _numbers.TryGetValue(name, out int number) ? number : null;

    /// <summary>The number of a name; an unknown one is an error with the nearest known name.</summary>
    /// <param name="name">As written.</param>
    /// <param name="whose">What names it, to begin the message with: <c>tube rail-l</c>.</param>
    /// <param name="diagnostics">Takes the error.</param>
    public int? Find(Placed<string> name, string whose, DiagnosticList diagnostics)
    {
        int? number = Find(name.Value);
        if (number is null)
        {
            string suggestion = _unknown++ < MostSuggestions ? Suggestion(name.Value, _names) : string.Empty;
            diagnostics.Error(name.At, $"{whose}: there is no {kind} {name.Value}{suggestion}");
        }

        return number;
    }

    /// <summary>The end of a message about an unknown name: the nearest known one, else all where there are few, and an advice.</summary>
    public static string Suggestion(string name, IReadOnlyList<string> known, string advice = "")
    {
        string nearest = NearestName.Suggest(name, known);
        if (nearest.Length > 0)
        {
            return nearest;
        }

        string all = known.Count switch
        {
            0 => "; there are none at all",
            <= 20 => $"; there are {string.Join(", ", known)}",
            _ => string.Empty,
        };
        return advice.Length > 0 ? $"{all}; {advice}" : all;
    }
}
