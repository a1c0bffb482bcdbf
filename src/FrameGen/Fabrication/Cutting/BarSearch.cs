namespace FrameGen.Fabrication.Cutting;

/// <summary>What a search for a plan of so many bars came to.</summary>
internal enum SearchOutcome
{
    /// <summary>There is such a plan.</summary>
    Found,

    /// <summary>There is none: every way was looked at.</summary>
    Closed,

    /// <summary>Its steps ran out.</summary>
    GivenUp,
}

/// <summary>Looks for a plan that needs so many bars and no more, bar by bar.</summary>
/// <remarks>
/// The lengths on the rack come first, then bars, each of which gets the largest piece left; every way to fill one up so that no piece left
/// would still go in, and that wastes no more than all together may, is tried, the fullest first. What was found hopeless once is
/// remembered.
/// </remarks>
/// <param name="problem">The problem.</param>
/// <param name="budget">Steps are taken from this.</param>
internal sealed class BarSearch(CuttingProblem problem, StepBudget budget)
{
    /// <summary>Deeper than this the search would need more of the stack than a thread is sure to have.</summary>
    public const int MostBars = 500;

    private const int MostWays = 2_000;
    private const int MostRemembered = 100_000;

    private readonly long[] _sizes = problem.Sizes;
    private readonly int[] _rack = [.. problem.RackCounts.SelectMany((count, kind) => Enumerable.Repeat(kind, count)).Reverse()];
    private readonly HashSet<int[]> _hopeless = new(CountsComparer.Instance);
    private readonly List<int[]> _filled = [];
    private bool _skipped;

    /// <summary>Searches.</summary>
    /// <param name="wanted">Pieces by size.</param>
    /// <param name="bars">How many bars to buy; with the rack's at most <see cref="MostBars"/>.</param>
    /// <param name="found">Out: the plan, where there is one.</param>
    public SearchOutcome Run(ReadOnlySpan<int> wanted, int bars, List<Pattern> found)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(bars, MostBars - _rack.Length);
        _hopeless.Clear();
        _filled.Clear();
        _skipped = false;
        int[] left = wanted.ToArray();
        Int128 waste = (Int128)problem.Bar * bars;
        foreach (int kind in _rack)
        {
            waste += problem.RackLengths[kind];
        }

        for (int size = 0; size < _sizes.Length; size++)
        {
            waste -= (Int128)_sizes[size] * left[size];
        }

        if (waste < 0)
        {
            return SearchOutcome.Closed;
        }

        if (!Place(left, (long)Int128.Min(waste, long.MaxValue)))
        {
            return _skipped ? SearchOutcome.GivenUp : SearchOutcome.Closed;
        }

        found.AddRange(_filled.Select((counts, i) => new Pattern(i < _rack.Length ? _rack[i] : null, counts)).Where(p => Array.Exists(p.Counts, c => c > 0)));
        return SearchOutcome.Found;
    }

    private bool Place(int[] left, long waste)
    {
        int largest = Array.FindIndex(left, c => c > 0);
        if (largest < 0)
        {
            return true;
        }

        if (budget.IsSpent)
        {
            _skipped = true;
            return false;
        }

        // The same pieces may be left after more bars or fewer.
        int[] state = [.. left, _filled.Count];
        if (_hopeless.Contains(state))
        {
            return false;
        }

        foreach ((long over, int[] way) in Ways(left, largest, waste))
        {
            new Pattern(null, way).TakeFrom(left);
            _filled.Add(way);
            bool found = Place(left, waste - over);
            if (found)
            {
                return true;
            }

            _filled.RemoveAt(_filled.Count - 1);
            for (int size = 0; size < way.Length; size++)
            {
                left[size] += way[size];
            }

            if (budget.IsSpent)
            {
                _skipped = true;
                return false;
            }
        }

        if (_hopeless.Count < MostRemembered)
        {
            _hopeless.Add(state);
        }

        return false;
    }

    /// <summary>Ways to fill the next length, the fullest first; a bought bar holds the largest piece.</summary>
    private List<(long Over, int[] Counts)> Ways(int[] left, int largest, long waste)
    {
        var ways = new List<(long Over, int[] Counts)>();
        int[] counts = new int[_sizes.Length];
        bool isRack = _filled.Count < _rack.Length;
        long free = isRack ? problem.RackLengths[_rack[_filled.Count]] : problem.Bar - _sizes[largest];
        if (free < 0)
        {
            return ways;
        }

        if (!isRack)
        {
            counts[largest] = 1;
            left[largest]--;
        }

        long[] after = new long[_sizes.Length + 1];
        for (int size = _sizes.Length - 1; size >= 0; size--)
        {
            after[size] = after[size + 1] + (left[size] * _sizes[size]);
        }

        Extend(ways, left, counts, after, largest, free, waste);
        left[largest] += isRack ? 0 : 1;

        // Equal waste keeps the order of finding, large pieces first.
        return [.. ways.OrderBy(w => w.Over)];
    }

    private void Extend(List<(long Over, int[] Counts)> ways, int[] left, int[] counts, long[] after, int size, long free, long waste)
    {
        budget.Take(1);
        if (free - after[size] > waste)
        {
            return;
        }

        if (ways.Count >= MostWays)
        {
            _skipped = true;
            return;
        }

        while (size < _sizes.Length && (left[size] == 0 || _sizes[size] > free))
        {
            size++;
        }

        if (size == _sizes.Length)
        {
            if (free <= waste && IsFull(left, free))
            {
                ways.Add((free, [.. counts]));
            }

            return;
        }

        int most = (int)Math.Min(left[size], free / _sizes[size]);
        int before = counts[size];
        for (int count = most; count >= 0; count--)
        {
            counts[size] = before + count;
            left[size] -= count;
            Extend(ways, left, counts, after, size + 1, free - (count * _sizes[size]), waste);
            left[size] += count;
        }

        counts[size] = before;
    }

    // Whatever plan there is, a piece that would still go in could be moved here: only full bars need be looked at.
    private bool IsFull(int[] left, long free)
    {
        for (int size = _sizes.Length - 1; size >= 0 && _sizes[size] <= free; size--)
        {
            if (left[size] > 0)
            {
                return false;
            }
        }

        return true;
    }

    private sealed class CountsComparer : IEqualityComparer<int[]>
    {
        public static readonly CountsComparer Instance = new();

        public bool Equals(int[]? x, int[]? y) => x.AsSpan().SequenceEqual(y);

        public int GetHashCode(int[] obj)
        {
            uint hash = 2166136261;
            foreach (int count in obj)
            {
                hash = (hash ^ (uint)count) * 16777619;
            }

            return (int)hash;
        }
    }
}
