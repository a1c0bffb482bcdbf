namespace FrameGen.Mechanics.Frames;

/// <summary>
/// A part of a large frame, a whole subtree of the elimination, whose rows of the factor beyond itself are not kept: where a solve needs them it takes
/// the stiffness between the part and the rest, and goes through the part's own factor twice (implicit storage: A. George, J. Liu, Computer
/// Solution of Large Sparse Positive Definite Systems (1981), chapter 6).
/// </summary>
internal sealed class Domain
{
    private Domain(Front[] fronts, int first, int end)
    {
        (FirstFront, EndFront) = (first, end);
        FirstColumn = fronts[first].First;
        EndColumn = fronts[end - 1].First + fronts[end - 1].Columns;
        Kept = new Front[end - first];
        for (int k = 0; k < Kept.Length; k++)
        {
            Front whole = fronts[first + k];
            Kept[k] = new Front(whole.First, whole.Columns, Array.FindAll(whole.Below, row => row < EndColumn));
            Saved += whole.PanelLength - Kept[k].PanelLength;
            KeptLength += Kept[k].PanelLength;
            PassingLength += whole.PanelLength;
        }

        Outside = fronts[end - 1].Below;
        Boundary = new Front(0, Outside.Length, []);
        PassingLength += Boundary.PanelLength;
    }

    /// <summary>The first of its fronts.</summary>
    public int FirstFront { get; }

    /// <summary>One past the last of its fronts.</summary>
    public int EndFront { get; }

    /// <summary>First column, in nodes.</summary>
    public int FirstColumn { get; }

    /// <summary>One past the last column, in nodes.</summary>
    public int EndColumn { get; }

    /// <summary>Its fronts without the rows beyond: what is kept of the factor.</summary>
    public Front[] Kept { get; }

    /// <summary>Columns beyond that it reaches into, in nodes, ascending.</summary>
    public int[] Outside { get; }

    /// <summary>What the part does to <see cref="Outside"/>, as a front of these columns alone.</summary>
    public Front Boundary { get; }

    /// <summary>From its fronts to the boundary.</summary>
    public FrontUpdate[] ToBoundary { get; set; } = [];

    /// <summary>From the boundary to later fronts.</summary>
    public FrontUpdate[] Onward { get; set; } = [];

    /// <summary>Doubles that need not be kept.</summary>
    public long Saved { get; }

    /// <summary>Doubles that are kept.</summary>
    public long KeptLength { get; }

    /// <summary>Doubles needed while the part is factored.</summary>
    public long PassingLength { get; }

    /// <summary>Cuts a frame into parts of about the size that needs the least memory.</summary>
    /// <param name="fronts">Fronts, children before parents.</param>
    /// <param name="frontOf">Front of each column.</param>
    public static Domain[] Choose(Front[] fronts, int[] frontOf)
    {
        // Smaller frames have memory enough, and solves to save.
        const int LargeFrame = 1000;
        Domain[] best = [];
        long most = 0;
        for (int parts = 8; parts <= 64 && frontOf.Length >= LargeFrame; parts *= 2)
        {
            Domain[] domains = OfSize(frontOf.Length / parts, fronts, frontOf);
            long saved = domains.Sum(domain => domain.Saved) - (domains.Length == 0 ? 0 : domains.Max(domain => domain.PassingLength));
            (best, most) = saved > most ? (domains, saved) : (best, most);
        }

        return best;
    }

    private static Domain[] OfSize(int most, Front[] fronts, int[] frontOf)
    {
        int[] size = new int[fronts.Length];
        int[] first = new int[fronts.Length];
        var domains = new List<Domain>();
        for (int s = 0; s < fronts.Length; s++)
        {
            first[s] = size[s] == 0 ? s : first[s];
            size[s] += fronts[s].Columns;
            int parent = fronts[s].Below.Length == 0 ? -1 : frontOf[fronts[s].Below[0]];
            if (parent >= 0)
            {
                first[parent] = size[parent] == 0 ? first[s] : first[parent];
                size[parent] += size[s];
            }
        }

        // The largest subtrees that are small enough, where going twice through what is kept costs no more than it saves.
        int[] top = new int[fronts.Length];
        for (int s = fronts.Length - 1; s >= 0; s--)
        {
            int parent = fronts[s].Below.Length == 0 ? -1 : frontOf[fronts[s].Below[0]];
            top[s] = size[s] > most ? -1 : parent >= 0 && top[parent] >= 0 ? top[parent] : s;
        }

        for (int s = 0; s < fronts.Length; s++)
        {
            if (top[s] == s && new Domain(fronts, first[s], s + 1) is var domain && domain.Saved > domain.KeptLength)
            {
                domains.Add(domain);
            }
        }

        return [.. domains];
    }
}
