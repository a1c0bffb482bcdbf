using FrameGen.Geometry;

namespace FrameGen.Mechanics.Frames;

/// <summary>
/// The layout of the factor, made once a topology: columns with the same pattern are gathered in fronts (supernodes), each a dense
/// panel, and every front knows which earlier ones reach into it (the left-looking supernodal method: E. Ng, B. Peyton, SIAM J. Sci. Comput.
/// 14 (1993) 1034). Nothing is held beside the factor itself, whose memory is what limits large frames; of their <see cref="Domains"/> not even all of it.
/// </summary>
internal sealed class SymbolicFactor
{
    /// <summary>Freedoms a node.</summary>
    public const int Six = 6;

    /// <summary>Doubles a vector.</summary>
    public const int Lanes = 8;

    // Below this many nodes minimum degree is as good as any order.
    private const int SmallFrame = 100;

    private SymbolicFactor(int[] order, Front[] fronts, Domain[] domains)
    {
        Order = order;
        Place = EliminationTree.Inverse(order);
        Fronts = fronts;
        Domains = domains;
        KeptFronts = [.. fronts];
        foreach (Domain domain in domains)
        {
            domain.Kept.CopyTo(KeptFronts, domain.FirstFront);
            long passing = 0;
            for (int s = domain.FirstFront; s < domain.EndFront; s++)
            {
                (fronts[s].IsPassing, fronts[s].PanelStart) = (true, passing);
                passing += fronts[s].PanelLength;
            }

            (domain.Boundary.IsPassing, domain.Boundary.PanelStart) = (true, passing);
            PassingLength = Math.Max(PassingLength, domain.PassingLength);
            WidestFront = Math.Max(WidestFront, domain.Boundary.Stride);
        }

        for (int s = 0; s < fronts.Length; s++)
        {
            KeptFronts[s].PanelStart = PanelLength;
            PanelLength += KeptFronts[s].PanelLength;
            WidestFront = Math.Max(WidestFront, fronts[s].Stride);
        }

        if (PanelLength + Lanes > Array.MaxLength)
        {
            throw new InvalidOperationException("The frame's factor does not fit into one array.");
        }
    }

    /// <summary>Node at each place of the elimination order.</summary>
    public int[] Order { get; }

    /// <summary>Place of each node.</summary>
    public int[] Place { get; }

    /// <summary>Fronts, children before parents.</summary>
    public Front[] Fronts { get; }

    /// <summary>The fronts with the rows that solves go through: those of a domain without the rows beyond it.</summary>
    public Front[] KeptFronts { get; }

    /// <summary>Parts whose rows beyond are not kept, in their order; none in a frame of usual size.</summary>
    public Domain[] Domains { get; }

    /// <summary>Doubles of the panels needed only while a domain is factored.</summary>
    public long PassingLength { get; }

    /// <summary>Doubles of all panels.</summary>
    public long PanelLength { get; }

    /// <summary>The largest <see cref="Front.Stride"/>.</summary>
    public int WidestFront { get; }

    /// <summary>Orders the nodes and lays out the fronts.</summary>
    /// <param name="positions">Of the nodes, mm.</param>
    /// <param name="starts">One offset into <paramref name="neighbours"/> more than nodes.</param>
    /// <param name="neighbours">Symmetric adjacency, without the node itself and without repeats.</param>
    public static SymbolicFactor Build(Vector3[] positions, int[] starts, int[] neighbours)
    {
        int count = positions.Length;
        int[] order = MinimumDegree.Order(count, starts, neighbours);
        double work = EliminationTree.WorkOf(order, starts, neighbours);
        if (count > SmallFrame)
        {
            // Solid lattices are better cut in two, long ones swept from end to end, most others neither. The pattern tells.
            Try(NestedDissection.Order(positions, starts, neighbours));
            Try(SweepOrder.Order(count, starts, neighbours));
        }

        var tree = EliminationTree.Build(order, starts, neighbours);
        (Front[] fronts, Domain[] domains) = Gather(tree);
        return new SymbolicFactor(tree.Order, fronts, domains);

        void Try(int[] other)
        {
            double workOfOther = EliminationTree.WorkOf(other, starts, neighbours);
            (order, work) = workOfOther < work ? (other, workOfOther) : (order, work);
        }
    }

    private static (Front[] Fronts, Domain[] Domains) Gather(EliminationTree tree)
    {
        int n = tree.Order.Length;
        var ends = new List<int>();
        for (int k = 0; k < n; k++)
        {
            // A column joins the one before when that one's pattern is this column and its pattern.
            bool joins = k > 0 && tree.Parents[k - 1] == k && tree.Rows[k - 1].Length == tree.Rows[k].Length + 1;
            if (joins)
            {
                ends[^1] = k + 1;
            }
            else
            {
                ends.Add(k + 1);
            }
        }

        // A front also takes in its last child where that costs few zeros: fewer, fuller fronts are faster.
        var kept = new List<(int First, int End, double Zeros)>();
        int first = 0;
        foreach (int end in ends)
        {
            (int First, int End, double Zeros) front = (first, end, 0);
            first = end;
            while (kept.Count > 0 && tree.Parents[kept[^1].End - 1] is int parent && parent >= front.First && parent < front.End)
            {
                (int First, int End, double Zeros) child = kept[^1];
                int childColumns = child.End - child.First;
                int columns = front.End - child.First;
                int below = tree.Rows[front.End - 1].Length;
                double zeros = front.Zeros + child.Zeros
                    + ((double)childColumns * (front.End - front.First + below - tree.Rows[child.End - 1].Length));
                double size = columns * (((columns + 1) / 2.0) + below);
                double allowed = columns <= 3 ? 0.5 : columns <= 8 ? 0.2 : 0.04;
                if (zeros > allowed * size)
                {
                    break;
                }

                front = (child.First, front.End, zeros);
                kept.RemoveAt(kept.Count - 1);
            }

            kept.Add(front);
        }

        return Connect(tree, kept);
    }

    private static (Front[] Fronts, Domain[] Domains) Connect(EliminationTree tree, List<(int First, int End, double Zeros)> kept)
    {
        var fronts = new Front[kept.Count];
        int[] frontOf = new int[tree.Order.Length];
        for (int s = 0; s < fronts.Length; s++)
        {
            fronts[s] = new Front(kept[s].First, kept[s].End - kept[s].First, tree.Rows[kept[s].End - 1]);
            Array.Fill(frontOf, s, fronts[s].First, fronts[s].Columns);
        }

        Domain[] domains = Domain.Choose(fronts, frontOf);
        FrontConnector.Connect(fronts, frontOf, domains);
        return (fronts, domains);
    }
}
