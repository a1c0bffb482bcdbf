namespace FrameGen.Mechanics.Frames;

/// <summary>
/// Fill-reducing elimination order by approximate minimum degree on a quotient graph, with element absorption, mass elimination
/// and merging of indistinguishable nodes (P. Amestoy, T. Davis, I. Duff, SIAM J. Matrix Anal. Appl. 17 (1996) 886).
/// Ties go to the node that reached its degree last, then to the lower index, so the order is the same everywhere.
/// </summary>
internal sealed class MinimumDegree
{
    private readonly int _count;

    // Of a variable: its live neighbours and the elements it lies on, as far as the counts go. Of an element: its variables.
    private readonly int[][] _variables;
    private readonly int[] _variableCounts;
    private readonly int[][] _elements;
    private readonly int[] _elementCounts;
    private readonly int[][] _members;

    // A variable may stand for several nodes, chained from the first; an element's weight is that of its variables.
    private readonly State[] _state;
    private readonly int[] _weight;
    private readonly int[] _nextMerged;
    private readonly int[] _lastMerged;
    private readonly bool[] _absorbed;
    private readonly int[] _elementWeight;
    private readonly DegreeLists _byDegree;

    // Scratch marks: what they hold counts only where it is the mark in use.
    private readonly int[] _mark;
    private readonly long[] _outside;
    private readonly Dictionary<int, int> _firstOfHash = [];
    private readonly int[] _nextOfHash;
    private int _markValue;
    private long _outsideMark = 1;

    private MinimumDegree(int count, int[] starts, int[] neighbours)
    {
        _count = count;
        _variables = new int[count][];
        _variableCounts = new int[count];
        _elements = new int[count][];
        _elementCounts = new int[count];
        _members = new int[count][];
        _state = new State[count];
        _weight = new int[count];
        _nextMerged = new int[count];
        _lastMerged = new int[count];
        _absorbed = new bool[count];
        _elementWeight = new int[count];
        _byDegree = new DegreeLists(count);
        _mark = new int[count];
        _outside = new long[count];
        _nextOfHash = new int[count];
        Array.Fill(_nextMerged, -1);
        for (int i = 0; i < count; i++)
        {
            _variables[i] = neighbours[starts[i]..starts[i + 1]];
            _variableCounts[i] = _variables[i].Length;
            _elements[i] = new int[4]; // grows; most nodes lie on no more
            _members[i] = [];
            _weight[i] = 1;
            _lastMerged[i] = i;
        }

        for (int i = count - 1; i >= 0; i--)
        {
            _byDegree.Insert(i, _variableCounts[i]);
        }
    }

    private enum State : byte
    {
        Live,
        Eliminated,
        Merged,
    }

    /// <summary>Nodes in the order of elimination.</summary>
    /// <param name="count">Number of nodes.</param>
    /// <param name="starts">count + 1 offsets: node i's neighbours are entries starts[i] to starts[i + 1] − 1.</param>
    /// <param name="neighbours">Symmetric, without the node itself and without repeats.</param>
    public static int[] Order(int count, int[] starts, int[] neighbours) => new MinimumDegree(count, starts, neighbours).Run();

    private int[] Run()
    {
        int[] order = new int[_count];
        int done = 0;
        int lowest = 0;
        while (done < _count)
        {
            int pivot = _byDegree.First(ref lowest);
            _byDegree.Remove(pivot);
            int[] boundary = FormElement(pivot);
            done = Emit(pivot, order, done);
            MeasureOutside(boundary);
            lowest = Math.Min(lowest, UpdateDegrees(pivot, boundary, _count - done, order, ref done));
            MergeIndistinguishable(pivot);
        }

        return order;
    }

    /// <summary>Turns the pivot into an element and returns its live variables.</summary>
    private int[] FormElement(int pivot)
    {
        _markValue++;
        _mark[pivot] = _markValue;
        var boundary = new List<int>();
        int boundaryWeight = 0;

        void Add(int j)
        {
            if (_state[j] == State.Live && _mark[j] != _markValue)
            {
                _mark[j] = _markValue;
                boundary.Add(j);
                boundaryWeight += _weight[j];
            }
        }

        for (int a = 0; a < _variableCounts[pivot]; a++)
        {
            Add(_variables[pivot][a]);
        }

        for (int a = 0; a < _elementCounts[pivot]; a++)
        {
            int e = _elements[pivot][a];
            if (!_absorbed[e])
            {
                foreach (int j in _members[e])
                {
                    Add(j);
                }

                _absorbed[e] = true;
                _members[e] = [];
            }
        }

        _state[pivot] = State.Eliminated;
        _variables[pivot] = [];
        _elements[pivot] = [];
        _members[pivot] = [.. boundary];
        _elementWeight[pivot] = boundaryWeight;
        return _members[pivot];
    }

    private int Emit(int i, int[] order, int done)
    {
        for (int j = i; j >= 0; j = _nextMerged[j])
        {
            order[done++] = j;
        }

        return done;
    }

    /// <summary>For every element met on the boundary: how much of it lies outside of the new element.</summary>
    private void MeasureOutside(int[] boundary)
    {
        _outsideMark += _count + 1L;
        foreach (int i in boundary)
        {
            for (int a = 0; a < _elementCounts[i]; a++)
            {
                int e = _elements[i][a];
                if (!_absorbed[e])
                {
                    if (_outside[e] < _outsideMark)
                    {
                        _outside[e] = _outsideMark + _elementWeight[e];
                    }

                    _outside[e] -= _weight[i];
                }
            }
        }
    }

    private int UpdateDegrees(int pivot, int[] boundary, int remaining, int[] order, ref int done)
    {
        int lowest = _count;
        _firstOfHash.Clear();
        int boundaryWeight = _elementWeight[pivot];
        foreach (int i in boundary)
        {
            _byDegree.Remove(i);
            int bound = boundaryWeight - _weight[i];
            int hash = pivot;
            int estimate = bound + PruneElements(i, pivot, ref hash) + PruneNeighbours(i, ref hash);
            if (_variableCounts[i] == 0 && _elementCounts[i] == 1)
            {
                // Nothing but the new element around it: eliminated with the pivot, without any fill.
                _state[i] = State.Eliminated;
                _elementWeight[pivot] -= _weight[i];
                done = Emit(i, order, done);
                continue;
            }

            int degree = Math.Max(0, Math.Min(Math.Min(estimate, _byDegree.DegreeOf(i) + bound), remaining - _weight[i]));
            _nextOfHash[i] = _firstOfHash.TryGetValue(hash, out int other) ? other : -1;
            _firstOfHash[hash] = i;
            _byDegree.Insert(i, degree);
            lowest = Math.Min(lowest, degree);
        }

        _members[pivot] = Array.FindAll(boundary, i => _state[i] == State.Live);
        return lowest;
    }

    /// <summary>Drops absorbed elements, adds the new one; returns the weight the others have beyond the new one.</summary>
    private int PruneElements(int i, int pivot, ref int hash)
    {
        int weightBeyond = 0;
        int kept = 0;
        for (int a = 0; a < _elementCounts[i]; a++)
        {
            int e = _elements[i][a];
            if (_absorbed[e])
            {
                continue;
            }

            int beyond = (int)(_outside[e] - _outsideMark);
            if (beyond == 0)
            {
                // Nothing of it lies outside of the new element: it says nothing more.
                _absorbed[e] = true;
                _members[e] = [];
                continue;
            }

            _elements[i][kept++] = e;
            weightBeyond += beyond;
            hash += e;
        }

        if (kept == _elements[i].Length)
        {
            Array.Resize(ref _elements[i], 2 * kept);
        }

        _elements[i][kept++] = pivot;
        _elementCounts[i] = kept;
        return weightBeyond;
    }

    /// <summary>Drops neighbours that are gone or that the new element speaks for; returns the weight of the others.</summary>
    private int PruneNeighbours(int i, ref int hash)
    {
        int weightOfOthers = 0;
        int kept = 0;
        for (int a = 0; a < _variableCounts[i]; a++)
        {
            int j = _variables[i][a];
            if (_state[j] == State.Live && _mark[j] != _markValue)
            {
                _variables[i][kept++] = j;
                weightOfOthers += _weight[j];
                hash += j;
            }
        }

        _variableCounts[i] = kept;
        return weightOfOthers;
    }

    /// <summary>Variables of the new element with the same neighbours become one.</summary>
    /// <remarks>Its degree may fall below the lowest known; it is found again when a neighbour of it is eliminated.</remarks>
    private void MergeIndistinguishable(int pivot)
    {
        bool merged = false;
        foreach (int i in _members[pivot])
        {
            if (_state[i] != State.Live)
            {
                continue;
            }

            for (int j = _nextOfHash[i]; j >= 0; j = _nextOfHash[j])
            {
                if (_state[j] == State.Live && SameSurroundings(i, j))
                {
                    _byDegree.Remove(j);
                    _byDegree.Remove(i);
                    _byDegree.Insert(i, Math.Max(0, _byDegree.DegreeOf(i) - _weight[j]));
                    _weight[i] += _weight[j];
                    _nextMerged[_lastMerged[i]] = j;
                    _lastMerged[i] = _lastMerged[j];
                    _state[j] = State.Merged;
                    merged = true;
                }
            }
        }

        if (merged)
        {
            _members[pivot] = Array.FindAll(_members[pivot], i => _state[i] == State.Live);
        }
    }

    private bool SameSurroundings(int i, int j) =>
        _variableCounts[i] == _variableCounts[j]
        && _elementCounts[i] == _elementCounts[j]
        && SameMembers(_variables[i].AsSpan(0, _variableCounts[i]), _variables[j].AsSpan(0, _variableCounts[j]))
        && SameMembers(_elements[i].AsSpan(0, _elementCounts[i]), _elements[j].AsSpan(0, _elementCounts[j]));

    /// <summary>Whether two lists of one length, without repeats, hold the same.</summary>
    private bool SameMembers(ReadOnlySpan<int> one, ReadOnlySpan<int> other)
    {
        _markValue++;
        foreach (int member in one)
        {
            _mark[member] = _markValue;
        }

        foreach (int member in other)
        {
            if (_mark[member] != _markValue)
            {
                return false;
            }
        }

        return true;
    }
}
