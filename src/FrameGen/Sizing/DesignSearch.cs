using System.Runtime.ExceptionServices;
using FrameGen.Mechanics.Frames;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Search;
using FrameGen.Sizing.Targets;

namespace FrameGen.Sizing;

/// <summary>
/// Goes through designs in their order on several threads. What it finds depends on the order alone: every design before the one
/// found has been looked at, and each look depends on nothing but its own design.
/// </summary>
internal sealed class DesignSearch
{
    // Few enough that threads end together, many enough that they seldom meet at the counter.
    private const int BatchSize = 16;
    private const int ReportEvery = 1024;

    private readonly DesignSpace _space;
    private readonly int[] _order;
    private readonly TargetCheck[] _cheapFirst;
    private readonly Func<DesignAnalysis> _newAnalysis;
    private readonly JointTable _joints;
    private readonly int _threads;
    private readonly IProgress<SizingProgress>? _progress;
    private readonly Lock _reporting = new();
    private long _reported;

    public DesignSearch(
        DesignSpace space,
        int[] order,
        IReadOnlyList<TargetCheck> checks,
        JointTable joints,
        Func<DesignAnalysis> newAnalysis,
        int threads,
        IProgress<SizingProgress>? progress)
    {
        (_space, _order, _joints, _newAnalysis, _progress) = (space, order, joints, newAnalysis, progress);
        _cheapFirst = [.. checks.OrderBy(c => c.Cost)];
        Checks = checks;
        _threads = Math.Clamp(threads, 1, ((order.Length - 1) / BatchSize) + 1);
    }

    private enum Verdict : byte
    {
        Unseen,
        IsOut,
        Fails,
        Meets,
        Moves,
    }

    public IReadOnlyList<TargetCheck> Checks { get; }

    /// <summary>Rows that every design satisfies which meets the targets: what breaks one needs no analysis.</summary>
    public SizingProgram? Rows { get; init; }

    /// <summary>The first design in the order that fits and meets every target.</summary>
    /// <exception cref="MechanismException">A design before it can move without strain.</exception>
    public SearchResult FindFirst()
    {
        var verdicts = new Verdict[_order.Length];
        int first = int.MaxValue;
        Walk(() => 0, (analysis, lastRefusal, rank) =>
        {
            Verdict verdict = Judge(analysis, ref lastRefusal);
            verdicts[rank] = verdict;
            if (verdict is Verdict.Meets or Verdict.Moves)
            {
                InterlockedMin(ref first, rank);
            }

            return lastRefusal;
        }, rank => rank < Volatile.Read(ref first));

        int last = Math.Min(first, _order.Length - 1);
        long analysed = 0;
        for (int rank = 0; rank <= last; rank++)
        {
            analysed += verdicts[rank] == Verdict.IsOut ? 0 : 1;
        }

        if (first == int.MaxValue)
        {
            return new SearchResult(null, analysed);
        }

        if (verdicts[first] == Verdict.Moves)
        {
            // Once more, for the exception that says how it moves.
            DesignAnalysis analysis = _newAnalysis();
            Turn(analysis, first);
            _ = IsMet(analysis, 0);
            throw new InvalidOperationException("A design moved without strain once and not again.");
        }

        return new SearchResult(first, analysed);
    }

    /// <summary>Looks at every design that fits: the least bad one, and for each target the best that can be had.</summary>
    /// <exception cref="MechanismException">A design can move without strain.</exception>
    public SearchSurvey Survey()
    {
        var merged = new Tally(2 * Checks.Count);
        Walk(() => new Tally(2 * Checks.Count), (analysis, tally, rank) =>
        {
            if (_space.IsAllowed(analysis.Choice) && _joints.Fits(analysis.Choice, analysis.Sections))
            {
                double worst = 0;
                (int missed, int which, double by) = (0, -1, 0);
                for (int t = 0; t < Checks.Count; t++)
                {
                    double ratio = Checks[t].Ratio(analysis);
                    worst = Math.Max(worst, ratio);
                    tally.Offer(t, ratio, rank);
                    (missed, which, by) = ratio <= 1 ? (missed, which, by) : (missed + 1, t, ratio);
                }

                tally.Offer(2 * Checks.Count, worst, rank);
                if (missed == 1)
                {
                    tally.Offer(Checks.Count + which, by, rank);
                }
            }

            return tally;
        }, _ => true, tally => merged.Take(tally));
        return new SearchSurvey(
            [.. merged.Ranks.Take(Checks.Count)],
            merged.Ranks[^1],
            [.. merged.Ranks.Skip(Checks.Count).Take(Checks.Count).Select(rank => rank == int.MaxValue ? (int?)null : rank)]);
    }

    /// <summary>Turns an analysis to the design at a place in the order.</summary>
    public void Turn(DesignAnalysis analysis, int rank)
    {
        Span<int> choice = stackalloc int[_space.Groups];
        _space.Decode(_order[rank], choice);
        analysis.Set(choice);
    }

    private static void InterlockedMin(ref int target, int value)
    {
        int seen = Volatile.Read(ref target);
        while (value < seen)
        {
            int before = Interlocked.CompareExchange(ref target, value, seen);
            if (before == seen)
            {
                return;
            }

            seen = before;
        }
    }

    private Verdict Judge(DesignAnalysis analysis, ref int lastRefusal)
    {
        if (Rows?.Allows(analysis.Choice) == false || !_joints.Fits(analysis.Choice, analysis.Sections))
        {
            return Verdict.IsOut;
        }

        try
        {
            // What refused the design before is likely to refuse this one.
            if (_cheapFirst.Length > 0 && !IsMet(analysis, lastRefusal))
            {
                return Verdict.Fails;
            }

            for (int t = 0; t < _cheapFirst.Length; t++)
            {
                if (t != lastRefusal && !IsMet(analysis, t))
                {
                    lastRefusal = t;
                    return Verdict.Fails;
                }
            }

            return Verdict.Meets;
        }
        catch (MechanismException)
        {
            return Verdict.Moves;
        }
    }

    private bool IsMet(DesignAnalysis analysis, int check) => _cheapFirst[check].IsMet(analysis);

    // Threads take batches in ascending order, so that whatever stands before a design that is wanted has been taken already.
    private void Walk<TState>(
        Func<TState> start, Func<DesignAnalysis, TState, int, TState> look, Func<int, bool> wanted, Action<TState>? finish = null)
    {
        int next = 0;
        _reported = 0;
        try
        {
            Parallel.For(0, _threads, new ParallelOptions { MaxDegreeOfParallelism = _threads }, _ => Work());
        }
        catch (AggregateException several)
        {
            // What went wrong is what a caller knows by name, whichever thread met it.
            ExceptionDispatchInfo.Throw(several.InnerExceptions[0]);
        }

        void Work()
        {
            DesignAnalysis analysis = _newAnalysis();
            TState state = start();
            long done = 0;
            while (true)
            {
                int from = Interlocked.Add(ref next, BatchSize) - BatchSize;
                if (from >= _order.Length || !wanted(from))
                {
                    break;
                }

                int to = Math.Min(from + BatchSize, _order.Length);
                for (int rank = from; rank < to && wanted(rank); rank++)
                {
                    Turn(analysis, rank);
                    state = look(analysis, state, rank);
                }

                done += to - from;
                if (_progress is not null && done >= ReportEvery)
                {
                    Report(done);
                    done = 0;
                }
            }

            lock (_reporting)
            {
                finish?.Invoke(state);
            }
        }
    }

    private void Report(long done)
    {
        lock (_reporting)
        {
            _reported += done;
            _progress!.Report(new SizingProgress(_reported, _order.Length));
        }
    }

    /// <summary>The best place for each target, and for the worst of all targets; earlier in the order wins a tie.</summary>
    private sealed class Tally(int targets)
    {
        private readonly double[] _ratios = [.. Enumerable.Repeat(double.PositiveInfinity, targets + 1)];

        public int[] Ranks { get; } = [.. Enumerable.Repeat(int.MaxValue, targets + 1)];

        public void Offer(int target, double ratio, int rank)
        {
            // Rounded, so that designs that a target can't tell apart tie, and the order decides.
            double rounded = ratio < 1e6 ? Math.Round(ratio, 9) : ratio;
            if (rounded < _ratios[target] || (rounded == _ratios[target] && rank < Ranks[target]))
            {
                (_ratios[target], Ranks[target]) = (rounded, rank);
            }
        }

        public void Take(Tally other)
        {
            for (int t = 0; t <= targets; t++)
            {
                if (other.Ranks[t] != int.MaxValue)
                {
                    Offer(t, other._ratios[t], other.Ranks[t]);
                }
            }
        }
    }
}

/// <summary>What a search found.</summary>
/// <param name="Rank">Place in the order of the first design that meets every target; null for none.</param>
/// <param name="Looked">Designs analysed, up to and including it.</param>
internal readonly record struct SearchResult(int? Rank, long Looked);

/// <summary>What a survey of all designs found.</summary>
/// <param name="Best">For each target, the place in the order of the design that serves it best.</param>
/// <param name="LeastBad">The place of the design whose worst target is the least bad.</param>
/// <param name="Alone">For each target, the place of the design that serves it best of those that miss no other; null where there is none.</param>
internal readonly record struct SearchSurvey(IReadOnlyList<int> Best, int LeastBad, IReadOnlyList<int?> Alone);
