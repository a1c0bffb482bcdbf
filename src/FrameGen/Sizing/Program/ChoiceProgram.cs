namespace FrameGen.Sizing.Program;

/// <summary>
/// A multiple-choice integer program: of every set one option is chosen, the sum of the options' costs is least, and linear rows hold.
/// Rows may be added while it is being solved; none is ever taken away.
/// </summary>
internal sealed class ChoiceProgram
{
    private readonly int[] _first;
    private readonly long[] _costs;
    private readonly int[] _setOf;
    private readonly List<ProgramRow> _rows = [];
    private readonly List<PairRule> _pairs = [];

    /// <summary>Sets without rows.</summary>
    /// <param name="costs">By set and option: whole units, so that costs of choices are equal or not, and never nearly so.</param>
    /// <exception cref="ArgumentOutOfRangeException">A set without options, or a cost whose size a double would round.</exception>
    public ChoiceProgram(IReadOnlyList<IReadOnlyList<long>> costs)
    {
        const long LargestExact = 1L << 50;
        _first = new int[costs.Count + 1];
        for (int set = 0; set < costs.Count; set++)
        {
            ArgumentOutOfRangeException.ThrowIfZero(costs[set].Count, nameof(costs));
            _first[set + 1] = _first[set] + costs[set].Count;
        }

        _costs = new long[_first[^1]];
        _setOf = new int[_costs.Length];
        for (int set = 0; set < costs.Count; set++)
        {
            for (int option = 0; option < costs[set].Count; option++)
            {
                long cost = costs[set][option];
                ArgumentOutOfRangeException.ThrowIfGreaterThan(Math.Abs(cost), LargestExact / costs.Count, nameof(costs));
                (_costs[_first[set] + option], _setOf[_first[set] + option]) = (cost, set);
            }
        }
    }

    public int Sets => _first.Length - 1;

    /// <summary>Options of all sets together: each is a variable, 1 where it is chosen.</summary>
    public int Variables => _costs.Length;

    /// <summary>Units, by variable.</summary>
    public ReadOnlySpan<long> Costs => _costs;

    /// <summary>The set of each variable.</summary>
    public ReadOnlySpan<int> SetOf => _setOf;

    public IReadOnlyList<ProgramRow> Rows => _rows;

    /// <summary>Pairs of options that exclude each other, told a second time so that what is left of a set can be read off at once.</summary>
    public IReadOnlyList<PairRule> Pairs => _pairs;

    /// <summary>The first variable of a set; for the number of sets, the number of variables.</summary>
    public int First(int set) => _first[set];

    public void Add(ProgramRow row) => _rows.Add(row);

    /// <summary>
    /// Forbids pairs of options of two sets. With N(c) the options of the other set that c excludes, at most one is chosen of N(c) and of all
    /// options that exclude no fewer: where the N are nested, as of sizes that must not be larger than others, these rows leave no fractions.
    /// </summary>
    /// <param name="setA">One set.</param>
    /// <param name="setB">The other.</param>
    /// <param name="excludes">Whether an option of the first and one of the second exclude each other.</param>
    public void Forbid(int setA, int setB, Func<int, int, bool> excludes)
    {
        int countA = _first[setA + 1] - _first[setA];
        int countB = _first[setB + 1] - _first[setB];
        var excluded = new bool[countA][];
        for (int a = 0; a < countA; a++)
        {
            excluded[a] = [.. Enumerable.Range(0, countB).Select(b => excludes(a, b))];
        }

        _pairs.Add(new PairRule(setA, setB, excluded));
        var told = new HashSet<string>(StringComparer.Ordinal);
        for (int a = 0; a < countA; a++)
        {
            bool[] n = excluded[a];
            if (!n.Contains(true) || !told.Add(string.Concat(n.Select(x => x ? '1' : '0'))))
            {
                continue;
            }

            List<int> variables = [.. Enumerable.Range(0, countB).Where(b => n[b]).Select(b => _first[setB] + b)];
            variables.AddRange(Enumerable.Range(0, countA)
                .Where(other => Enumerable.Range(0, countB).All(b => !n[b] || excluded[other][b])).Select(other => _first[setA] + other));
            variables.Sort();
            _rows.Add(ProgramRow.AtMost(1, variables));
        }
    }

    /// <summary>Cost of a choice.</summary>
    /// <param name="choice">An option of each set.</param>
    public long CostOf(ReadOnlySpan<int> choice)
    {
        long cost = 0;
        for (int set = 0; set < choice.Length; set++)
        {
            cost += _costs[_first[set] + choice[set]];
        }

        return cost;
    }

    /// <summary>Whether a choice keeps all rows.</summary>
    public bool Keeps(ReadOnlySpan<int> choice)
    {
        foreach (ProgramRow row in _rows)
        {
            if (!row.Keeps(this, choice))
            {
                return false;
            }
        }

        return true;
    }
}

/// <summary>Options of two sets that exclude each other.</summary>
/// <param name="SetA">One set.</param>
/// <param name="SetB">The other.</param>
/// <param name="Excluded">By option of the first, by option of the second.</param>
internal sealed record PairRule(int SetA, int SetB, bool[][] Excluded);
