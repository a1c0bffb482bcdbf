namespace FrameGen.Sizing.Program;

/// <summary>
/// Branch and bound on a choice program, the part with the least bound first: choices come out in the order of their costs. Between two of them rows
/// may be added and choices excluded; what was found out before stays true. The order, and so everything, is the same on every run.
/// </summary>
internal sealed class ProgramTree
{
    private readonly ChoiceProgram _program;
    private readonly Relaxation _relaxation;
    private readonly PriorityQueue<Part, (long Bound, long Age)> _open = new();
    private Part? _current;
    private long _made;

    public ProgramTree(ChoiceProgram program)
    {
        (_program, _relaxation) = (program, new Relaxation(program));
        Put(OptionSet.All(program.Variables), [], long.MinValue);
    }

    /// <summary>Costs above this are of no interest.</summary>
    public long Cutoff { get; set; } = long.MaxValue / 4;

    /// <summary>Parts looked at.</summary>
    public long Parts { get; private set; }

    /// <summary>No choice that is left costs less; <see cref="long.MaxValue"/> where none is left.</summary>
    public long Bound => Math.Min(_current?.Bound ?? long.MaxValue, _open.TryPeek(out _, out (long Bound, long Age) key) ? key.Bound : long.MaxValue);

    /// <summary>The cheapest choice left that keeps all rows and costs no more than the cutoff; of equals any.</summary>
    /// <param name="mostParts">It gives up after looking at so many parts more.</param>
    /// <returns>Null where there is none, or the parts were not enough: then <see cref="Bound"/> is not above the cutoff.</returns>
    public int[]? Next(long mostParts)
    {
        PutBack();
        while (_open.TryPeek(out Part? part, out (long Bound, long Age) key) && key.Bound <= Cutoff && mostParts-- > 0)
        {
            _open.Dequeue();
            Parts++;
            if (part.Rows < _program.Rows.Count)
            {
                Renew(part);
                continue;
            }

            if (part.Choice is { } choice)
            {
                _current = part;
                return choice;
            }

            Split(part);
        }

        return null;
    }

    /// <summary>Takes the choice that came last out of the search.</summary>
    public void Exclude()
    {
        Part part = _current ?? throw new InvalidOperationException("No choice to exclude.");
        _current = null;

        // What is left: the same in the first sets, and another in the next.
        OptionSet open = part.Open;
        for (int set = 0; set < _program.Sets; set++)
        {
            int taken = _program.First(set) + part.Choice![set];
            if (open.CountIn(_program.First(set), _program.First(set + 1)) > 1)
            {
                OptionSet others = open.Copy();
                others.Remove(taken);
                Put(others, part.Tight, part.Bound);
            }

            open = open.Copy();
            for (int v = _program.First(set); v < _program.First(set + 1); v++)
            {
                if (v != taken)
                {
                    open.Remove(v);
                }
            }
        }
    }

    private void PutBack()
    {
        if (_current is { } part)
        {
            _current = null;
            _open.Enqueue(part, (part.Bound, part.Age));
        }
    }

    private void Renew(Part part)
    {
        if (part.IsExact && _program.Keeps(part.Choice))
        {
            // Rows only take away: what was cheapest still is.
            part.Rows = _program.Rows.Count;
            _open.Enqueue(part, (part.Bound, part.Age));
            return;
        }

        Put(part.Open, part.Tight, part.Bound);
    }

    private void Put(OptionSet options, IReadOnlyList<int> start, long atLeast)
    {
        OptionSet open = options.Copy();
        if (!Propagate(open))
        {
            return;
        }

        _relaxation.Solve(open, start, Cutoff, open);
        long bound = Math.Max(atLeast, _relaxation.Bound);
        if (bound > Cutoff)
        {
            return;
        }

        int[]? choice = Choice(open);
        if (choice is not null)
        {
            if (!_program.Keeps(choice))
            {
                // A row broken by less than the simplex method sees: the choice is out all the same.
                _current = new Part(open, bound, _made++) { Choice = choice, Tight = [.. _relaxation.Tight] };
                Exclude();
                return;
            }

            long cost = _program.CostOf(choice);
            if (cost > bound)
            {
                // The bound is a rounding below it: only the choice itself is known to cost as much.
                var alone = new Part(open, cost, _made++) { Choice = choice, Rows = _program.Rows.Count, IsExact = true };
                _current = new Part(open, bound, _made) { Choice = choice, Tight = [.. _relaxation.Tight] };
                Exclude();
                alone.Open = Only(choice);
                if (cost <= Cutoff)
                {
                    _open.Enqueue(alone, (cost, alone.Age));
                }

                return;
            }
        }

        var part = new Part(open, bound, _made++)
        {
            Choice = choice,
            IsExact = choice is not null,
            Fractions = [.. _relaxation.Fractions],
            Tight = [.. _relaxation.Tight],
            Rows = _program.Rows.Count,
        };
        _open.Enqueue(part, (bound, part.Age));
    }

    private OptionSet Only(int[] choice)
    {
        var only = OptionSet.All(_program.Variables);
        for (int set = 0; set < _program.Sets; set++)
        {
            for (int v = _program.First(set); v < _program.First(set + 1); v++)
            {
                if (v != _program.First(set) + choice[set])
                {
                    only.Remove(v);
                }
            }
        }

        return only;
    }

    // A choice where the relaxation has no fractions, or nothing is left to choose.
    private int[]? Choice(OptionSet open)
    {
        const double Whole = 1 - 1e-7;
        var choice = new int[_program.Sets];
        Array.Fill(choice, -1);
        foreach ((int variable, double value) in _relaxation.Fractions)
        {
            if (value > Whole && open[variable])
            {
                int set = _program.SetOf[variable];
                choice[set] = variable - _program.First(set);
            }
        }

        for (int set = 0; set < choice.Length; set++)
        {
            if (choice[set] >= 0)
            {
                continue;
            }

            if (open.CountIn(_program.First(set), _program.First(set + 1)) > 1)
            {
                return null;
            }

            for (int v = _program.First(set); v < _program.First(set + 1); v++)
            {
                choice[set] = open[v] ? v - _program.First(set) : choice[set];
            }
        }

        return choice;
    }

    private void Split(Part part)
    {
        (int set, double at) = Fork(part);
        OptionSet low = part.Open.Copy();
        OptionSet high = part.Open.Copy();
        for (int v = _program.First(set); v < _program.First(set + 1); v++)
        {
            (_program.Costs[v] + (1e-3 * (v - _program.First(set))) <= at ? high : low).Remove(v);
        }

        Put(high, part.Tight, part.Bound);
        Put(low, part.Tight, part.Bound);
    }

    // The set whose fractions are farthest apart in cost, and their mean: options of equal costs stand apart by their places.
    private (int Set, double At) Fork(Part part)
    {
        (int Set, double At, double Spread) best = (-1, 0, 0);
        for (int i = 0; i < part.Fractions.Count;)
        {
            int set = _program.SetOf[part.Fractions[i].Variable];
            (double weight, double mean, double square) = (0, 0, 0);
            double first = Place(part.Fractions[i].Variable, set);
            for (; i < part.Fractions.Count && _program.SetOf[part.Fractions[i].Variable] == set; i++)
            {
                double place = Place(part.Fractions[i].Variable, set) - first;
                double value = part.Fractions[i].Value;
                weight += value;
                mean += value * place;
                square += value * place * place;
            }

            mean /= weight;
            double spread = (square / weight) - (mean * mean);
            if (spread > best.Spread && HasBothSides(part.Open, set, first + mean))
            {
                best = (set, first + mean, spread);
            }
        }

        if (best.Set >= 0)
        {
            return (best.Set, best.At);
        }

        // Nothing to go by: the largest set, in the middle.
        int largest = 0;
        int most = 0;
        for (int set = 0; set < _program.Sets; set++)
        {
            int count = part.Open.CountIn(_program.First(set), _program.First(set + 1));
            (largest, most) = count > most ? (set, count) : (largest, most);
        }

        List<double> places = [.. Enumerable.Range(_program.First(largest), _program.First(largest + 1) - _program.First(largest))
            .Where(v => part.Open[v]).Select(v => Place(v, largest)).Order()];
        return (largest, places[(places.Count - 1) / 2]);
    }

    private double Place(int variable, int set) => _program.Costs[variable] + (1e-3 * (variable - _program.First(set)));

    private bool HasBothSides(OptionSet open, int set, double at)
    {
        (bool low, bool high) = (false, false);
        for (int v = _program.First(set); v < _program.First(set + 1); v++)
        {
            if (open[v])
            {
                low |= Place(v, set) <= at;
                high |= Place(v, set) > at;
            }
        }

        return low && high;
    }

    // Options that every open option of another set excludes are out.
    private bool Propagate(OptionSet open)
    {
        bool changed = true;
        while (changed)
        {
            changed = false;
            foreach (PairRule pair in _program.Pairs)
            {
                (int a0, int a1) = (_program.First(pair.SetA), _program.First(pair.SetA + 1));
                (int b0, int b1) = (_program.First(pair.SetB), _program.First(pair.SetB + 1));
                for (int a = a0; a < a1; a++)
                {
                    if (open[a] && !Some(b0, b1, b => open[b] && !pair.Excluded[a - a0][b - b0]))
                    {
                        open.Remove(a);
                        changed = true;
                    }
                }

                for (int b = b0; b < b1; b++)
                {
                    if (open[b] && !Some(a0, a1, a => open[a] && !pair.Excluded[a - a0][b - b0]))
                    {
                        open.Remove(b);
                        changed = true;
                    }
                }
            }
        }

        for (int set = 0; set < _program.Sets; set++)
        {
            if (open.CountIn(_program.First(set), _program.First(set + 1)) == 0)
            {
                return false;
            }
        }

        return true;

        static bool Some(int first, int stop, Func<int, bool> holds)
        {
            for (int v = first; v < stop; v++)
            {
                if (holds(v))
                {
                    return true;
                }
            }

            return false;
        }
    }

    /// <summary>Choices that agree in their open options.</summary>
    private sealed class Part(OptionSet open, long bound, long number)
    {
        public OptionSet Open { get; set; } = open;

        public long Bound { get; } = bound;

        // Newer parts of equal bounds come first: they are nearer to a choice.
        public long Age { get; } = -number;

        /// <summary>Rows that were known when it was looked at.</summary>
        public int Rows { get; set; }

        /// <summary>The cheapest of it, where that is known.</summary>
        public int[]? Choice { get; init; }

        /// <summary>True where the choice costs what the bound says.</summary>
        public bool IsExact { get; init; }

        public IReadOnlyList<(int Variable, double Value)> Fractions { get; init; } = [];

        public IReadOnlyList<int> Tight { get; init; } = [];
    }
}
