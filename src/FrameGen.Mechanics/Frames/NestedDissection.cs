using FrameGen.Geometry;

namespace FrameGen.Mechanics.Frames;

/// <summary>
/// Fill-reducing elimination order by cutting the frame in two where it is thinnest, the cut's own nodes last, and so on
/// (A. George, SIAM J. Numer. Anal. 10 (1973) 345). Nodes have places in space, so cuts are planes square to a global axis.
/// </summary>
internal sealed class NestedDissection
{
    // Pieces of this many nodes are left to minimum degree.
    private const int SmallPiece = 8;

    private readonly Vector3[] _positions;
    private readonly int[] _starts;
    private readonly int[] _neighbours;

    // Which piece a node is in at the moment, and a mark for the two sides of a cut.
    private readonly int[] _pieceOf;
    private readonly int[] _sideOf;

    private NestedDissection(Vector3[] positions, int[] starts, int[] neighbours)
    {
        (_positions, _starts, _neighbours) = (positions, starts, neighbours);
        _pieceOf = new int[positions.Length];
        _sideOf = new int[positions.Length];
    }

    /// <summary>Nodes in the order of elimination.</summary>
    /// <param name="positions">Of the nodes, mm.</param>
    /// <param name="starts">Offsets into <paramref name="neighbours"/>, one more than nodes.</param>
    /// <param name="neighbours">Symmetric, without the node itself and without repeats.</param>
    public static int[] Order(Vector3[] positions, int[] starts, int[] neighbours) =>
        new NestedDissection(positions, starts, neighbours).Run();

    private int[] Run()
    {
        // Filled from the back: the last cut made is eliminated first.
        int[] order = new int[_positions.Length];
        int place = order.Length;
        int pieces = 0;
        var open = new Stack<int[]>();
        open.Push([.. Enumerable.Range(0, order.Length)]);
        while (open.Count > 0)
        {
            int[] piece = open.Pop();
            pieces++;
            foreach (int node in piece)
            {
                _pieceOf[node] = pieces;
            }

            int[] cut = [];
            if (piece.Length > SmallPiece)
            {
                cut = ThinnestCut(piece, pieces, out int[] before, out int[] behind);
                open.Push(before);
                open.Push(behind);
            }

            int[] last = cut.Length > 0 || piece.Length > SmallPiece ? cut : OrderSmall(piece);
            place -= last.Length;
            last.CopyTo(order, place);
        }

        return order;
    }

    /// <summary>The smallest of the cuts at the middle of each axis; at either side of the plane.</summary>
    private int[] ThinnestCut(int[] piece, int number, out int[] before, out int[] behind)
    {
        int[]? thinnest = null;
        (before, behind) = ([], []);
        foreach (Func<Vector3, double> along in (Func<Vector3, double>[])[p => p.X, p => p.Y, p => p.Z])
        {
            double[] places = Array.ConvertAll(piece, node => along(_positions[node]));
            Array.Sort(places);
            double middle = places[places.Length / 2];
            if (places[0] == places[^1])
            {
                continue;
            }

            // Nodes at the very middle count as behind; where nothing is before them, as before.
            bool open = middle > places[0];
            for (int k = 0; k < piece.Length; k++)
            {
                double at = along(_positions[piece[k]]);
                _sideOf[piece[k]] = (open ? at < middle : at <= middle) ? 0 : 1;
            }

            for (int side = 0; side < 2; side++)
            {
                int[] cut = Array.FindAll(piece, node => _sideOf[node] == side && Touches(node, number, 1 - side));
                if (thinnest is null || cut.Length < thinnest.Length)
                {
                    thinnest = cut;
                    var inCut = new HashSet<int>(cut);
                    before = Array.FindAll(piece, node => _sideOf[node] == 0 && !inCut.Contains(node));
                    behind = Array.FindAll(piece, node => _sideOf[node] == 1 && !inCut.Contains(node));
                }
            }
        }

        // All nodes at one place: nothing to cut.
        return thinnest ?? piece;
    }

    private bool Touches(int node, int piece, int side)
    {
        for (int a = _starts[node]; a < _starts[node + 1]; a++)
        {
            if (_pieceOf[_neighbours[a]] == piece && _sideOf[_neighbours[a]] == side)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>Minimum degree inside a piece.</summary>
    private int[] OrderSmall(int[] piece)
    {
        if (piece.Length < 2)
        {
            return piece;
        }

        var local = new Dictionary<int, int>();
        for (int k = 0; k < piece.Length; k++)
        {
            local[piece[k]] = k;
        }

        int[] localStarts = new int[piece.Length + 1];
        var localNeighbours = new List<int>();
        for (int k = 0; k < piece.Length; k++)
        {
            for (int a = _starts[piece[k]]; a < _starts[piece[k] + 1]; a++)
            {
                if (local.TryGetValue(_neighbours[a], out int other))
                {
                    localNeighbours.Add(other);
                }
            }

            localStarts[k + 1] = localNeighbours.Count;
        }

        int[] order = MinimumDegree.Order(piece.Length, localStarts, [.. localNeighbours]);
        return Array.ConvertAll(order, k => piece[k]);
    }
}
