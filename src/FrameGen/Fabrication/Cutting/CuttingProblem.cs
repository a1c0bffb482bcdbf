namespace FrameGen.Fabrication.Cutting;

/// <summary>Pieces of one size.</summary>
/// <param name="Size">What one takes up of a bar; positive.</param>
/// <param name="Count">How many are wanted; not negative.</param>
internal readonly record struct PieceSize(long Size, int Count);

/// <summary>Pieces to be cut from as few bought bars as possible, with lengths on the rack that cost nothing. Whole numbers in any unit.</summary>
/// <remarks>
/// Pieces fit a bar when their sizes add up to no more than it. A saw's kerf k needs no word of its own: n pieces parted by n − 1
/// kerfs fit L exactly when Σ(l + k) ≤ L + k, so k is added to every piece, to the bar and to the lengths on the rack.
/// </remarks>
internal sealed record CuttingProblem
{
    /// <summary>Merges pieces of one size, and puts large ones first.</summary>
    /// <param name="bar">A bought bar; positive, at most 2^52 so that sums of sizes stay exact.</param>
    /// <param name="pieces">In any order; a size may come again.</param>
    /// <param name="rack">Lengths on the rack, one entry a length; may be empty.</param>
    /// <exception cref="ArgumentOutOfRangeException">A size is not positive, or a count negative.</exception>
    public CuttingProblem(long bar, IEnumerable<PieceSize> pieces, IReadOnlyList<long> rack)
    {
        const long Largest = 1L << 52;
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(bar);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(bar, Largest);
        var sorted = new SortedDictionary<long, int>();
        foreach (PieceSize piece in pieces)
        {
            ArgumentOutOfRangeException.ThrowIfNegativeOrZero(piece.Size, nameof(pieces));
            ArgumentOutOfRangeException.ThrowIfGreaterThan(piece.Size, Largest, nameof(pieces));
            ArgumentOutOfRangeException.ThrowIfNegative(piece.Count, nameof(pieces));
            if (piece.Count > 0)
            {
                sorted[piece.Size] = sorted.GetValueOrDefault(piece.Size) + piece.Count;
            }
        }

        Bar = bar;
        RackLengths = [.. rack.Distinct().Order()];
        RackCounts = [.. RackLengths.Select(length => rack.Count(l => l == length))];
        Sizes = [.. sorted.Keys.Reverse()];
        Counts = [.. sorted.Values.Reverse()];
    }

    /// <summary>Length of a bought bar.</summary>
    public long Bar { get; }

    /// <summary>The different lengths on the rack, short ones first.</summary>
    public long[] RackLengths { get; }

    /// <summary>How many of each of them.</summary>
    public int[] RackCounts { get; }

    /// <summary>Sizes of the pieces, each once, large ones first.</summary>
    public long[] Sizes { get; }

    /// <summary>How many of each size.</summary>
    public int[] Counts { get; }
}

/// <summary>A way to cut one bar.</summary>
/// <param name="RackKind">Index into <see cref="CuttingProblem.RackLengths"/>; null for a bought bar.</param>
/// <param name="Counts">Pieces by size, as <see cref="CuttingProblem.Sizes"/>.</param>
internal sealed record Pattern(int? RackKind, int[] Counts)
{
    /// <summary>True where it holds no more pieces than are wanted.</summary>
    public bool Fits(ReadOnlySpan<int> wanted)
    {
        for (int size = 0; size < Counts.Length; size++)
        {
            if (Counts[size] > wanted[size])
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Takes its pieces from those that are left.</summary>
    public void TakeFrom(Span<int> left)
    {
        for (int size = 0; size < Counts.Length; size++)
        {
            left[size] -= Counts[size];
        }
    }
}

/// <summary>How every piece is cut.</summary>
/// <param name="Bars">Lengths of the rack that are used, short ones first, then bought bars.</param>
/// <param name="LowerBound">No plan buys fewer bars.</param>
/// <param name="Unplaced">By size: pieces longer than a bought bar that found no place on the rack; they stand in no bar.</param>
internal sealed record CuttingPlan(IReadOnlyList<Pattern> Bars, int LowerBound, int[] Unplaced)
{
    /// <summary>How many bars to buy.</summary>
    public int Bought { get; } = Bars.Count(b => b.RackKind is null);

    /// <summary>True where no plan buys fewer bars: proven.</summary>
    public bool IsOptimal => Bought == LowerBound;
}

/// <summary>Steps that a search may take: counted, never timed, so that every machine stops at the same place.</summary>
/// <param name="steps">How many.</param>
internal sealed class StepBudget(long steps)
{
    /// <summary>Steps taken.</summary>
    public long Used { get; private set; }

    /// <summary>True when all are taken.</summary>
    public bool IsSpent => Used >= steps;

    /// <summary>Takes some.</summary>
    public void Take(long count) => Used += count;
}
