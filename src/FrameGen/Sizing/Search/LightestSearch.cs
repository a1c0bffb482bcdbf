using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Program;
using FrameGen.Sizing.Targets;

namespace FrameGen.Sizing.Search;

/// <summary>
/// The lightest design by outer approximation: the program gives the lightest that all rows so far allow, it is analysed, and if it misses targets its rows are
/// added. What the program gives bounds every design that is left, so the first that meets all targets is the answer (M. Duran, I. Grossmann, Mathematical Programming
/// 36 (1986) 307; R. Fletcher, S. Leyffer, Mathematical Programming 66 (1994) 327).
/// </summary>
internal sealed class LightestSearch
{
    private const long MostParts = 20_000;
    private const long MostPartsForTies = 20_000;

    // Rows of targets that are near their limit are worth having too.
    private const double Near = 0.8;

    private readonly DesignSpace _space;
    private readonly DesignAnalysis _analysis;
    private readonly IReadOnlyList<TargetCheck> _checks;
    private readonly TargetCuts? _cuts;
    private readonly FitRows _fits;
    private readonly ProgramTree _tree;
    private readonly int _cheap;

    public LightestSearch(DesignSpace space, DesignAnalysis analysis, IReadOnlyList<TargetCheck> checks, WeldPairs welds)
    {
        (_space, _analysis) = (space, analysis);
        _checks = [.. checks.Where(c => c.NeedsFrame).OrderBy(c => c.Cost)];
        _cheap = _checks.TakeWhile(c => c.Cost < 10).Count();
        _cuts = analysis.Structure is { } structure && _checks.Count > 0 ? new TargetCuts(space, structure, welds) : null;
        Rows = new SizingProgram(space);
        _fits = new FitRows(space, analysis.Joints, Program);
        _tree = new ProgramTree(Program);
    }

    /// <summary>All rows found so far.</summary>
    public SizingProgram Rows { get; }

    private ChoiceProgram Program => Rows.Program;

    /// <summary>Designs analysed.</summary>
    public int Analyses { get; private set; }

    /// <summary>Designs that fit were met with: where none was, no joint can be made.</summary>
    public bool SomeFit { get; private set; }

    /// <summary>The last design that could be made.</summary>
    public int[] Last { get; private set; } = [];

    /// <summary>Whether any design can be made.</summary>
    public bool Fits()
    {
        _ = Run(1);
        return SomeFit;
    }

    /// <summary>Parts of the program's search looked at.</summary>
    public long Parts => _tree.Parts;

    /// <summary>No design that meets the targets costs less, units; the largest value where there is none.</summary>
    public long Bound { get; private set; }

    /// <summary>Searches until the answer is proven or so many designs are analysed.</summary>
    /// <returns>The answer, proven; null where there is none or the budget is spent: <see cref="Bound"/> tells.</returns>
    public int[]? Run(int budget)
    {
        int[]? best = null;
        while (true)
        {
            long left = best is null ? MostParts - _tree.Parts : MostPartsForTies;
            if (_tree.Next(left) is not { } found)
            {
                Bound = best is null ? _tree.Bound : _space.UnitsOf(best);
                return best;
            }

            int[] choice = found[.._space.Groups];
            if (best is not null && _space.CompareTies(choice, best) >= 0)
            {
                _tree.Exclude();
                continue;
            }

            _analysis.Set(choice);
            if (!_fits.Look(choice, _analysis.Sections))
            {
                continue;
            }

            SomeFit = true;
            Last = choice;
            if (best is null && Analyses >= budget)
            {
                Bound = _tree.Bound;
                return null;
            }

            Analyses++;
            if (MeetsOrCuts(found))
            {
                best = choice;
                _tree.Cutoff = Program.CostOf(found);
                _tree.Exclude();
            }
        }
    }

    // Dear targets are asked only where no cheap one fails.
    private bool MeetsOrCuts(int[] found)
    {
        bool met = true;
        bool cut = false;
        for (int t = 0; t < _checks.Count && (met || t < _cheap); t++)
        {
            double ratio = _checks[t].Ratio(_analysis);
            met &= ratio <= 1;
            if (ratio > Near)
            {
                foreach (ProgramRow row in _cuts!.From(_analysis, _checks[t], Near))
                {
                    Program.Add(row);
                    cut |= !row.Keeps(Program, found);
                }
            }
        }

        if (!met && !cut)
        {
            _tree.Exclude();
        }

        return met;
    }
}
