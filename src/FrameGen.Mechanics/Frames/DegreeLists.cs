namespace FrameGen.Mechanics.Frames;

/// <summary>Nodes by their degree: for each degree a doubly linked list, the one inserted last at its head.</summary>
internal sealed class DegreeLists
{
    private readonly int[] _degree;
    private readonly int[] _next;
    private readonly int[] _previous;
    private readonly int[] _heads;

    /// <summary>Empty lists.</summary>
    /// <param name="count">Number of nodes; degrees go from 0 to this.</param>
    public DegreeLists(int count)
    {
        (_degree, _next, _previous) = (new int[count], new int[count], new int[count]);
        _heads = new int[count + 1];
        Array.Fill(_heads, -1);
    }

    /// <summary>Degree a node was inserted with last; kept when it is removed.</summary>
    public int DegreeOf(int node) => _degree[node];

    /// <summary>The node inserted last of those with the lowest degree from one on.</summary>
    /// <param name="from">In: where to begin. Out: the degree found. There must be one.</param>
    public int First(ref int from)
    {
        while (_heads[from] < 0)
        {
            from++;
        }

        return _heads[from];
    }

    /// <summary>Inserts a node that is on no list.</summary>
    public void Insert(int node, int degree)
    {
        _degree[node] = degree;
        int head = _heads[degree];
        (_next[node], _previous[node]) = (head, -1);
        if (head >= 0)
        {
            _previous[head] = node;
        }

        _heads[degree] = node;
    }

    /// <summary>Takes a node off its list.</summary>
    public void Remove(int node)
    {
        if (_previous[node] >= 0)
        {
            _next[_previous[node]] = _next[node];
        }
        else
        {
            _heads[_degree[node]] = _next[node];
        }

        if (_next[node] >= 0)
        {
            _previous[_next[node]] = _previous[node];
        }
    }
}
