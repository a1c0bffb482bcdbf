namespace FrameGen.Fabrication.Cutting;

/// <summary>The most valuable pieces that fit a length, each size at most so often: depth first, the most valuable per length first.</summary>
/// <remarks>
/// Branch and bound as in Gilmore and Gomory, Operations Research 11 (1963): fill greedily, then take back the last piece and go on,
/// cutting off where even the best of the remaining sizes, in fractions, can't reach the best value so far.
/// Not for use by two threads at once: it keeps its working arrays.
/// </remarks>
/// <param name="sizes">What a piece of each kind takes up; positive.</param>
internal sealed class BoundedKnapsack(long[] sizes)
{
    /// <summary>Values nearer to each other than this are the same.</summary>
    private const double Same = 1e-9;

    private readonly int[] _order = new int[sizes.Length];
    private readonly double[] _density = new double[sizes.Length];
    private readonly double[] _suffix = new double[sizes.Length + 1];
    private readonly int[] _taken = new int[sizes.Length];

    /// <summary>No filling is worth more than this; the value found, or more where the search was given up.</summary>
    public double Ceiling { get; private set; }

    /// <summary>Looks for the most valuable filling.</summary>
    /// <param name="length">What can be filled.</param>
    /// <param name="values">By kind; a kind without a positive value is left out.</param>
    /// <param name="limits">How many of each kind there are.</param>
    /// <param name="floor">Only a filling worth more than this is of use.</param>
    /// <param name="steps">Given up after so many.</param>
    /// <param name="budget">Steps are taken from this.</param>
    /// <param name="counts">Out: the filling, by kind; untouched where none is worth more than the floor.</param>
    /// <returns>True where a filling worth more was found.</returns>
    public bool Fill(
        long length, ReadOnlySpan<double> values, ReadOnlySpan<int> limits, double floor, long steps, StepBudget budget, Span<int> counts)
    {
        int kinds = Sort(length, values, limits);
        double best = floor;
        bool found = false;
        double value = 0;
        long rest = length;
        int level = 0;
        long taken = 0;
        while (true)
        {
            while (level < kinds && taken < steps
                && value + Math.Min(rest * _density[level], _suffix[level]) > best + Same)
            {
                int kind = _order[level];
                int count = (int)Math.Min(limits[kind], rest / sizes[kind]);
                _taken[level++] = count;
                rest -= count * sizes[kind];
                value += count * values[kind];
                taken++;
            }

            if (level == kinds && value > best + Same)
            {
                best = value;
                found = true;
                counts.Clear();
                for (int i = 0; i < kinds; i++)
                {
                    counts[_order[i]] = _taken[i];
                }
            }

            if (taken >= steps)
            {
                // What the open branches might still hold.
                Ceiling = Math.Max(best, OpenValue(level, kinds, value, rest, values));
                break;
            }

            while (level > 0 && _taken[level - 1] == 0)
            {
                level--;
            }

            if (level == 0)
            {
                Ceiling = best;
                break;
            }

            int last = _order[level - 1];
            _taken[level - 1]--;
            rest += sizes[last];
            value -= values[last];
        }

        budget.Take(taken);
        return found;
    }

    private int Sort(long length, ReadOnlySpan<double> values, ReadOnlySpan<int> limits)
    {
        int kinds = 0;
        for (int kind = 0; kind < sizes.Length; kind++)
        {
            if (values[kind] > 0 && limits[kind] > 0 && sizes[kind] <= length)
            {
                _order[kinds] = kind;
                _density[kinds++] = -values[kind] / sizes[kind];
            }
        }

        // Equal densities stay in the order of the kinds: a sort of pairs would not promise that, so the kind breaks ties.
        Span<int> order = _order.AsSpan(0, kinds);
        Span<double> density = _density.AsSpan(0, kinds);
        InsertionSort(order, density);
        _suffix[kinds] = 0;
        for (int i = kinds - 1; i >= 0; i--)
        {
            density[i] = -density[i];
            _suffix[i] = _suffix[i + 1] + (limits[order[i]] * values[order[i]]);
        }

        return kinds;
    }

    // Stable, and quick on lists that are nearly sorted already, as those of successive prices are.
    private static void InsertionSort(Span<int> order, Span<double> keys)
    {
        for (int i = 1; i < keys.Length; i++)
        {
            (double key, int kind) = (keys[i], order[i]);
            int j = i - 1;
            for (; j >= 0 && keys[j] > key; j--)
            {
                keys[j + 1] = keys[j];
                order[j + 1] = order[j];
            }

            keys[j + 1] = key;
            order[j + 1] = kind;
        }
    }

    private double OpenValue(int level, int kinds, double value, long rest, ReadOnlySpan<double> values)
    {
        double most = level < kinds ? value + Math.Min(rest * _density[level], _suffix[level]) : value;
        for (int i = level - 1; i >= 0; i--)
        {
            int kind = _order[i];
            if (_taken[i] > 0)
            {
                // One piece fewer of this kind, and anything of the kinds after it.
                double fewer = value - values[kind];
                long room = rest + sizes[kind];
                most = Math.Max(most, i + 1 < kinds ? fewer + Math.Min(room * _density[i + 1], _suffix[i + 1]) : fewer);
            }

            rest += _taken[i] * sizes[kind];
            value -= _taken[i] * values[kind];
        }

        return most;
    }
}
