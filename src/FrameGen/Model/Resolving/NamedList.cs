using FrameGen.Diagnostics;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Binds a target's list of names: each once.</summary>
internal static class NamedList
{
    /// <summary>Numbers of the load cases named, all where none are; null after an error, which no cases at all is.</summary>
    /// <param name="names">As written; null for all.</param>
    /// <param name="cases">Numbers of the cases.</param>
    /// <param name="whose">What names them, to begin the message with.</param>
    /// <param name="at">Where that is written.</param>
    /// <param name="diagnostics">Where errors go.</param>
    public static IReadOnlyList<int>? Cases(
        IReadOnlyList<Placed<string>>? names, NameIndex cases, string whose, SourcePlace at, DiagnosticList diagnostics)
    {
        if (cases.Names.Count > 0)
        {
            return Of(names, cases, whose, diagnostics);
        }

        diagnostics.Error(at, $"{whose}: there are no load cases; write cases, for example: cases: {{standing: {{self_weight: [0, 0, -1]}}}}");
        return null;
    }

    /// <summary>Numbers of what is named, all where nothing is; null after an error.</summary>
    /// <param name="names">As written; null for all.</param>
    /// <param name="index">Numbers by name.</param>
    /// <param name="whose">What names them, to begin the message with.</param>
    /// <param name="diagnostics">Where errors go.</param>
    public static IReadOnlyList<int>? Of(IReadOnlyList<Placed<string>>? names, NameIndex index, string whose, DiagnosticList diagnostics)
    {
        if (names is null)
        {
            return [.. Enumerable.Range(0, index.Names.Count)];
        }

        var numbers = new List<int>();
        bool isSound = true;
        foreach (Placed<string> name in names)
        {
            if (index.Find(name, whose, diagnostics) is not { } number)
            {
                isSound = false;
            }
            else if (numbers.Contains(number))
            {
                diagnostics.Error(name.At, $"{whose} names {name.Value} twice; name each once");
                isSound = false;
            }
            else
            {
                numbers.Add(number);
            }
        }

        return isSound ? numbers : null;
    }
}
