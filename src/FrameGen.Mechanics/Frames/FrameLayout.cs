namespace FrameGen.Mechanics.Frames;

/// <summary>
/// All of a frame's analysis that doesn't depend on the design: modes, held freedoms, elimination order, and where each block of the
/// stiffness goes. Nodes that are held altogether take no part in the elimination.
/// </summary>
internal sealed class FrameLayout
{
    private const int Six = SymbolicFactor.Six;

    /// <summary>Lays out a frame.</summary>
    /// <exception cref="ArgumentException">An element or a restraint is not sound.</exception>
    public FrameLayout(BeamFrame frame, IReadOnlyList<Restraint> restraints)
    {
        Frame = frame;
        Modes = new ElementModes(frame);
        Held = HeldFreedoms(frame.Nodes.Count, restraints);

        int nodes = frame.Nodes.Count;
        int[] number = new int[nodes];
        var active = new List<int>();
        for (int node = 0; node < nodes; node++)
        {
            bool moves = Held.AsSpan(Six * node, Six).Contains(false);
            number[node] = moves ? active.Count : -1;
            if (moves)
            {
                active.Add(node);
            }
        }

        (int[] starts, int[] neighbours) = Adjacency(frame, number, active.Count);
        Symbolic = SymbolicFactor.Build([.. active.Select(node => frame.Nodes[node])], starts, neighbours);
        NodeAt = Array.ConvertAll(Symbolic.Order, k => active[k]);
        PlaceOf = Array.ConvertAll(number, k => k < 0 ? -1 : Symbolic.Place[k]);

        HeldAt = new bool[Six * active.Count];
        PartlyHeld = new bool[active.Count];
        for (int place = 0; place < active.Count; place++)
        {
            Held.AsSpan(Six * NodeAt[place], Six).CopyTo(HeldAt.AsSpan(Six * place, Six));
            PartlyHeld[place] = HeldAt.AsSpan(Six * place, Six).Contains(true);
        }

        Starts = [.. frame.Elements.Select(e => PlaceOf[e.Start])];
        Ends = [.. frame.Elements.Select(e => PlaceOf[e.End])];
        StartNodes = [.. frame.Elements.Select(e => e.Start)];
        EndNodes = [.. frame.Elements.Select(e => e.End)];
        Profiles = [.. frame.Elements.Select(e => e.Profile)];
        ProfileCount = Profiles.Length == 0 ? 0 : Profiles.Max() + 1;
        Springs = SpringsOf(restraints);
        SprungNodes = Array.ConvertAll(Springs, s => s.Node);
        Supported = [.. Enumerable.Range(0, nodes).Where(
            node => Array.BinarySearch(SprungNodes, node) >= 0 || Held.AsSpan(Six * node, Six).Contains(true))];
        Size = SizeOf(frame);
        LongestElement = Modes.Lengths.Length == 0 ? 1 : Modes.Lengths.Max();
        Pairs = new int[Profiles.Length];
        (PairRows, PairColumns) = NumberPairs();
        Placements = Place();
        Crossings = Cross();
    }

    /// <summary>The frame.</summary>
    public BeamFrame Frame { get; }

    /// <summary>The elements' ways to strain.</summary>
    public ElementModes Modes { get; }

    /// <summary>Six flags a node, in the frame's order.</summary>
    public bool[] Held { get; }

    /// <summary>Six flags a node, in elimination order.</summary>
    public bool[] HeldAt { get; }

    /// <summary>Which nodes, in elimination order, have a held freedom.</summary>
    public bool[] PartlyHeld { get; }

    /// <summary>Order and pattern of the factor.</summary>
    public SymbolicFactor Symbolic { get; }

    /// <summary>The frame's node at each place of the elimination order.</summary>
    public int[] NodeAt { get; }

    /// <summary>Place of each of the frame's nodes; −1 for one that is held altogether.</summary>
    public int[] PlaceOf { get; }

    /// <summary>Each element's start node.</summary>
    public int[] StartNodes { get; }

    /// <summary>Each element's end node.</summary>
    public int[] EndNodes { get; }

    /// <summary>Place of each element's start node.</summary>
    public int[] Starts { get; }

    /// <summary>Place of each element's end node.</summary>
    public int[] Ends { get; }

    /// <summary>Springs to the ground on free freedoms, by node, in the frame's order.</summary>
    public NodeSprings[] Springs { get; }

    /// <summary>The nodes of <see cref="Springs"/>.</summary>
    public int[] SprungNodes { get; }

    /// <summary>Nodes with a held freedom or a spring, in the frame's order.</summary>
    public int[] Supported { get; }

    /// <summary>The longest side of the box round the nodes and of any element, mm; 1 for a frame without either.</summary>
    public double Size { get; }

    /// <summary>The longest element, mm; 1 for a frame without any.</summary>
    public double LongestElement { get; }

    /// <summary>Profile of each element.</summary>
    public int[] Profiles { get; }

    /// <summary>Profiles a design must have at least.</summary>
    public int ProfileCount { get; }

    /// <summary>Which block between two nodes each element adds to; −1 when an end is held altogether.</summary>
    public int[] Pairs { get; }

    /// <summary>Later place of each such block.</summary>
    public int[] PairRows { get; }

    /// <summary>Earlier place of each such block.</summary>
    public int[] PairColumns { get; }

    /// <summary>For each front, the blocks of K that go to its panel.</summary>
    public Placement[][] Placements { get; }

    /// <summary>For each domain of the factor, the blocks between it and the rest.</summary>
    public int[][] Crossings { get; }

    private double SizeOf(BeamFrame frame)
    {
        double size = Modes.Lengths.Length == 0 ? 0 : Modes.Lengths.Max();
        if (frame.Nodes.Count > 0)
        {
            size = Math.Max(size, frame.Nodes.Max(p => p.X) - frame.Nodes.Min(p => p.X));
            size = Math.Max(size, frame.Nodes.Max(p => p.Y) - frame.Nodes.Min(p => p.Y));
            size = Math.Max(size, frame.Nodes.Max(p => p.Z) - frame.Nodes.Min(p => p.Z));
        }

        return size > 0 ? size : 1;
    }

    private static bool[] HeldFreedoms(int nodes, IReadOnlyList<Restraint> restraints)
    {
        bool[] held = new bool[Six * nodes];
        foreach (Restraint restraint in restraints)
        {
            if (restraint.Node < 0 || restraint.Node >= nodes || restraint.Held.Count != Six)
            {
                throw new ArgumentException(
                    $"A restraint names node {restraint.Node} and {restraint.Held.Count} freedoms; the frame has {nodes} nodes of six.",
                    nameof(restraints));
            }

            for (int i = 0; i < Six; i++)
            {
                held[(Six * restraint.Node) + i] |= restraint.Held[i];
            }
        }

        return held;
    }

    private NodeSprings[] SpringsOf(IReadOnlyList<Restraint> restraints)
    {
        var rates = new SortedDictionary<int, double[]>();
        foreach (Restraint restraint in restraints)
        {
            if (restraint.Springs is not { } springs)
            {
                continue;
            }

            if (springs.Count != Six || springs.Any(rate => !(rate >= 0 && double.IsFinite(rate))))
            {
                throw new ArgumentException(
                    $"The springs of node {restraint.Node} are {string.Join(", ", springs)}; six rates are needed, none of them negative.", nameof(restraints));
            }

            rates.TryAdd(restraint.Node, new double[Six]);
            for (int i = 0; i < Six; i++)
            {
                rates[restraint.Node][i] += Held[(Six * restraint.Node) + i] ? 0 : springs[i];
            }
        }

        return [.. rates.Where(r => r.Value.Any(rate => rate > 0)).Select(r => new NodeSprings(r.Key, PlaceOf[r.Key], r.Value))];
    }

    private static (int[] Starts, int[] Neighbours) Adjacency(BeamFrame frame, int[] number, int count)
    {
        var lists = new List<int>[count];
        for (int i = 0; i < count; i++)
        {
            lists[i] = [];
        }

        foreach (BeamElement element in frame.Elements)
        {
            (int i, int j) = (number[element.Start], number[element.End]);
            if (i >= 0 && j >= 0)
            {
                lists[i].Add(j);
                lists[j].Add(i);
            }
        }

        int[] starts = new int[count + 1];
        var neighbours = new List<int>(2 * frame.Elements.Count);
        for (int i = 0; i < count; i++)
        {
            lists[i].Sort();
            int last = -1;
            foreach (int j in lists[i])
            {
                if (j != last)
                {
                    neighbours.Add(j);
                    last = j;
                }
            }

            starts[i + 1] = neighbours.Count;
        }

        return (starts, [.. neighbours]);
    }

    private (int[] Rows, int[] Columns) NumberPairs()
    {
        var rows = new List<int>();
        var columns = new List<int>();
        var numbers = new Dictionary<(int Row, int Column), int>();
        for (int e = 0; e < Pairs.Length; e++)
        {
            Pairs[e] = -1;
            if (Starts[e] >= 0 && Ends[e] >= 0)
            {
                (int Row, int Column) pair = (Math.Max(Starts[e], Ends[e]), Math.Min(Starts[e], Ends[e]));
                if (!numbers.TryGetValue(pair, out int number))
                {
                    number = rows.Count;
                    numbers.Add(pair, number);
                    rows.Add(pair.Row);
                    columns.Add(pair.Column);
                }

                Pairs[e] = number;
            }
        }

        return ([.. rows], [.. columns]);
    }

    private Placement[][] Place()
    {
        Front[] fronts = Symbolic.Fronts;
        int[] frontOf = new int[NodeAt.Length];
        int[] counts = new int[fronts.Length];
        for (int s = 0; s < fronts.Length; s++)
        {
            Array.Fill(frontOf, s, fronts[s].First, fronts[s].Columns);
            counts[s] = fronts[s].Columns;
        }

        foreach (int column in PairColumns)
        {
            counts[frontOf[column]]++;
        }

        // Counted first: lists that grow would leave as much again behind them.
        Placement[][] placements = Array.ConvertAll(counts, count => new Placement[count]);
        Array.Clear(counts);
        for (int column = 0; column < frontOf.Length; column++)
        {
            int s = frontOf[column];
            int offset = Six * (column - fronts[s].First);
            placements[s][counts[s]++] = new Placement(-1, fronts[s].OffsetOf(offset, offset), column, column);
        }

        for (int pair = 0; pair < PairRows.Length; pair++)
        {
            int s = frontOf[PairColumns[pair]];
            Front front = fronts[s];
            int offset = front.OffsetOf(front.RowOf(PairRows[pair]), Six * (PairColumns[pair] - front.First));
            placements[s][counts[s]++] = new Placement(pair, offset, PairRows[pair], PairColumns[pair]);
        }

        return placements;
    }

    private int[][] Cross()
    {
        Domain[] domains = Symbolic.Domains;
        int[] domainOf = new int[NodeAt.Length];
        Array.Fill(domainOf, -1);
        var lists = new List<int>[domains.Length];
        for (int d = 0; d < domains.Length; d++)
        {
            lists[d] = [];
            Array.Fill(domainOf, d, domains[d].FirstColumn, domains[d].EndColumn - domains[d].FirstColumn);
        }

        for (int pair = 0; pair < PairRows.Length; pair++)
        {
            int d = domainOf[PairColumns[pair]];
            if (d >= 0 && PairRows[pair] >= domains[d].EndColumn)
            {
                lists[d].Add(pair);
            }
        }

        return Array.ConvertAll(lists, list => list.ToArray());
    }

    /// <summary>The springs under a node.</summary>
    /// <param name="Node">The frame's node.</param>
    /// <param name="Place">Its place in elimination order.</param>
    /// <param name="Rates">Six, N/mm and N·mm/rad; 0 on held freedoms.</param>
    internal sealed record NodeSprings(int Node, int Place, double[] Rates);

    /// <summary>One block of K in a front's panel.</summary>
    /// <param name="Pair">The pair of nodes; −1 for a node's own block.</param>
    /// <param name="Offset">Of its first value in the panel.</param>
    /// <param name="Row">Place of the rows' node.</param>
    /// <param name="Column">Place of the columns' node.</param>
    internal readonly record struct Placement(int Pair, int Offset, int Row, int Column);
}
