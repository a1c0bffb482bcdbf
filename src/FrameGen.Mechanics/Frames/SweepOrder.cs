namespace FrameGen.Mechanics.Frames;

/// <summary>
/// Elimination order that sweeps through the frame from one end to the other, always on with the node of the sweep's edge that widens
/// it least (I. King, Int. J. Numer. Methods Eng. 2 (1970) 523): the best for long frames of even width.
/// </summary>
internal sealed class SweepOrder
{
    private readonly int[] _starts;
    private readonly int[] _neighbours;
    private readonly int[] _order;
    private readonly bool[] _isSeen;
    private readonly int[] _unseen;
    private readonly int[] _distance;
    private readonly int[] _reached;
    private int _done;

    private SweepOrder(int count, int[] starts, int[] neighbours)
    {
        (_starts, _neighbours) = (starts, neighbours);
        _order = new int[count];
        _isSeen = new bool[count];
        _unseen = new int[count];
        _distance = new int[count];
        _reached = new int[count];
        Array.Fill(_distance, -1);
        for (int i = 0; i < count; i++)
        {
            _unseen[i] = starts[i + 1] - starts[i];
        }
    }

    /// <summary>Nodes in the order of elimination.</summary>
    /// <param name="count">Number of nodes.</param>
    /// <param name="starts">count + 1 offsets: node i's neighbours are entries starts[i] to starts[i + 1] − 1.</param>
    /// <param name="neighbours">Symmetric, without the node itself and without repeats.</param>
    public static int[] Order(int count, int[] starts, int[] neighbours)
    {
        var sweep = new SweepOrder(count, starts, neighbours);
        for (int i = 0; i < count; i++)
        {
            if (!sweep._isSeen[i])
            {
                sweep.Run(sweep.EndOf(i));
            }
        }

        return sweep._order;
    }

    /// <summary>A node at an end of the part that a node lies in: as far as can be from another one (A. George, J. Liu, ACM Trans. Math. Softw. 5 (1979) 284).</summary>
    private int EndOf(int node)
    {
        int depth = -1;
        while (true)
        {
            (int last, int depthFromHere) = Farthest(node);
            if (depthFromHere <= depth)
            {
                return node;
            }

            (node, depth) = (last, depthFromHere);
        }
    }

    private (int Node, int Distance) Farthest(int from)
    {
        int count = 1;
        _reached[0] = from;
        _distance[from] = 0;
        for (int k = 0; k < count; k++)
        {
            int i = _reached[k];
            for (int a = _starts[i]; a < _starts[i + 1]; a++)
            {
                int j = _neighbours[a];
                if (_distance[j] < 0)
                {
                    _distance[j] = _distance[i] + 1;
                    _reached[count++] = j;
                }
            }
        }

        // Of the farthest nodes the one with the fewest neighbours: a corner.
        int best = _reached[count - 1];
        int farthest = _distance[best];
        for (int k = 0; k < count; k++)
        {
            int i = _reached[k];
            bool better = _distance[i] == farthest && _starts[i + 1] - _starts[i] < _starts[best + 1] - _starts[best];
            best = better ? i : best;
        }

        for (int k = 0; k < count; k++)
        {
            _distance[_reached[k]] = -1;
        }

        return (best, farthest);
    }

    private void Run(int start)
    {
        var edge = new List<int>();
        See(start, edge);
        while (edge.Count > 0)
        {
            // The least unseen neighbours; of several the one that waits longest.
            int at = 0;
            for (int k = 1; k < edge.Count && _unseen[edge[at]] > 0; k++)
            {
                at = _unseen[edge[k]] < _unseen[edge[at]] ? k : at;
            }

            int next = edge[at];
            edge.RemoveAt(at);
            _order[_done++] = next;
            for (int a = _starts[next]; a < _starts[next + 1]; a++)
            {
                if (!_isSeen[_neighbours[a]])
                {
                    See(_neighbours[a], edge);
                }
            }
        }
    }

    private void See(int node, List<int> edge)
    {
        _isSeen[node] = true;
        edge.Add(node);
        for (int a = _starts[node]; a < _starts[node + 1]; a++)
        {
            _unseen[_neighbours[a]]--;
        }
    }
}
