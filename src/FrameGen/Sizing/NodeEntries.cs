using System.Collections.Concurrent;
using FrameGen.Model;

namespace FrameGen.Sizing;

/// <summary>A node's entries, one for each combination of the groups that meet there.</summary>
internal sealed class NodeEntries
{
    // More combinations than this are kept as they come up.
    private const long MostKept = 1 << 16;

    private readonly int[] _groups;
    private readonly long[] _strides;
    private readonly long[] _entries;
    private readonly ConcurrentDictionary<long, long> _rare = new();

    public NodeEntries(DesignSpace space, int node, int? through, IReadOnlyList<TubeEndId> ends)
    {
        (Node, Through, Ends) = (node, through, ends);
        IReadOnlyList<Tube> tubes = space.Model.Tubes;
        var all = new SortedSet<int>(ends.Select(e => tubes[e.Tube].Group));
        if (through is { } runs)
        {
            all.Add(tubes[runs].Group);
        }

        HasChosen = all.Any(g => !space.Model.Groups[g].IsFixed);
        _groups = [.. all.Where(g => space[g].Length > 1)];
        _strides = new long[_groups.Length];
        long cells = 1;
        for (int i = 0; i < _groups.Length; i++)
        {
            _strides[i] = cells;
            cells = checked(cells * space[_groups[i]].Length);
        }

        Combinations = cells;
        _entries = new long[cells <= MostKept ? cells : 0];
    }

    public int Node { get; }

    public int? Through { get; }

    /// <summary>Tube ends at the node, in the model's order.</summary>
    public IReadOnlyList<TubeEndId> Ends { get; }

    /// <summary>True where a group that meets here is not fixed by the spec.</summary>
    public bool HasChosen { get; }

    /// <summary>Groups that meet here and have more than one option.</summary>
    public IReadOnlyList<int> Groups => _groups;

    /// <summary>Combinations of the options that meet here.</summary>
    public long Combinations { get; }

    /// <summary>What was written for a combination; 0 for nothing.</summary>
    public long Read(long cell) => _entries.Length > 0 ? Volatile.Read(ref _entries[cell]) : _rare.GetValueOrDefault(cell);

    /// <summary>Writes an entry. Threads that write the same one write the same.</summary>
    public void Write(long cell, long entry)
    {
        if (_entries.Length > 0)
        {
            Volatile.Write(ref _entries[cell], entry);
        }
        else
        {
            _rare[cell] = entry;
        }
    }

    public long CellOf(ReadOnlySpan<int> choice)
    {
        long cell = 0;
        for (int i = 0; i < _groups.Length; i++)
        {
            cell += _strides[i] * choice[_groups[i]];
        }

        return cell;
    }

    /// <summary>Sets the groups that meet here to the combination of a cell.</summary>
    public void Decode(long cell, Span<int> choice)
    {
        for (int i = _groups.Length - 1; i >= 0; i--)
        {
            (choice[_groups[i]], cell) = ((int)(cell / _strides[i]), cell % _strides[i]);
        }
    }

    public int IndexOf(TubeEndId end)
    {
        for (int i = 0; i < Ends.Count; i++)
        {
            if (Ends[i] == end)
            {
                return i;
            }
        }

        throw new ArgumentOutOfRangeException(nameof(end), end, "Not an end at this node.");
    }
}
