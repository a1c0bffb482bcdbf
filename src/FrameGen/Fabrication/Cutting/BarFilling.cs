namespace FrameGen.Fabrication.Cutting;

/// <summary>Fills one length after the other as full as it goes: what the rack holds, then bought bars with the largest piece left always in it.</summary>
/// <remarks>
/// Where pieces are small beside the bar this wastes next to nothing until the last bar, which is why it meets the bound on most
/// lists of a shop; a first-fit list is left with odd ends in every bar.
/// </remarks>
/// <param name="problem">The problem.</param>
/// <param name="favour">
/// By how much a piece as long as the bar is worth more, length for length, than a short one: 0 fills fullest; a little more uses up
/// long pieces early and keeps short ones, which go in anywhere, for the last bars.
/// </param>
/// <param name="stepsABar">For one bar; the best filling found until then stands.</param>
/// <param name="budget">Steps are taken from this.</param>
internal sealed class BarFilling(CuttingProblem problem, double favour, long stepsABar, StepBudget budget)
{
    private readonly long[] _sizes = problem.Sizes;
    private readonly BoundedKnapsack _knapsack = new(problem.Sizes);
    private readonly double[] _values = [.. problem.Sizes.Select(s => s * (1 + (favour * s / problem.Bar)))];

    /// <summary>The better of two ways to cut what is left: short lengths of the rack first, which keeps the long ones whole where it can, or long ones first.</summary>
    /// <param name="left">Pieces by size.</param>
    /// <param name="there">Lengths on the rack, by kind.</param>
    public CuttingDraft Finish(ReadOnlySpan<int> left, ReadOnlySpan<int> there)
    {
        List<int> kinds = [];
        for (int kind = 0; kind < there.Length; kind++)
        {
            kinds.AddRange(Enumerable.Repeat(kind, there[kind]));
        }

        CuttingDraft shortFirst = Fill([.. left], kinds);
        kinds.Reverse();
        return kinds.Count > 1 ? CuttingDraft.Better(shortFirst, Fill([.. left], kinds)) : shortFirst;
    }

    private CuttingDraft Fill(int[] left, List<int> rack)
    {
        int[][] cuts = [.. rack.Select(_ => new int[_sizes.Length])];
        long[] free = [.. rack.Select(kind => problem.RackLengths[kind])];
        int[] unplaced = PlaceLong(left, cuts, free);
        var draft = new CuttingDraft([], unplaced);
        for (int i = 0; i < cuts.Length; i++)
        {
            FillUp(left, free[i], cuts[i]);
            if (Array.Exists(cuts[i], c => c > 0))
            {
                draft.Bars.Add(new Pattern(rack[i], cuts[i]));
            }
        }

        for (int size = 0; size < _sizes.Length; size++)
        {
            while (left[size] > 0)
            {
                int[] counts = new int[_sizes.Length];
                counts[size] = 1;
                left[size]--;
                FillUp(left, problem.Bar - _sizes[size], counts);
                draft.Bars.Add(new Pattern(null, counts));
            }
        }

        return draft;
    }

    // Pieces longer than a bar have no other place than the rack: each goes where it leaves least.
    private int[] PlaceLong(int[] left, int[][] cuts, long[] free)
    {
        int[] unplaced = new int[_sizes.Length];
        for (int size = 0; size < _sizes.Length && _sizes[size] > problem.Bar; size++)
        {
            for (; left[size] > 0; left[size]--)
            {
                int tightest = -1;
                for (int i = 0; i < free.Length; i++)
                {
                    if (free[i] >= _sizes[size] && (tightest < 0 || free[i] < free[tightest]))
                    {
                        tightest = i;
                    }
                }

                if (tightest < 0)
                {
                    unplaced[size]++;
                    continue;
                }

                cuts[tightest][size]++;
                free[tightest] -= _sizes[size];
            }
        }

        return unplaced;
    }

    private void FillUp(int[] left, long free, int[] counts)
    {
        int[] taken = new int[_sizes.Length];
        if (_knapsack.Fill(free, _values, left, 0, stepsABar, budget, taken))
        {
            for (int size = 0; size < _sizes.Length; size++)
            {
                counts[size] += taken[size];
                left[size] -= taken[size];
            }
        }
    }
}

/// <summary>A plan that may still be bettered.</summary>
/// <param name="Bars">In any order.</param>
/// <param name="Unplaced">By size: pieces longer than a bar that found no place.</param>
internal sealed record CuttingDraft(List<Pattern> Bars, int[] Unplaced)
{
    /// <summary>Bars to buy.</summary>
    public int Bought => Bars.Count(b => b.RackKind is null);

    /// <summary>The first, unless the second leaves fewer pieces out, or as many and buys fewer bars.</summary>
    public static CuttingDraft Better(CuttingDraft first, CuttingDraft second) =>
        (second.Unplaced.Sum(), second.Bought).CompareTo((first.Unplaced.Sum(), first.Bought)) < 0 ? second : first;
}
