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
    private const long MostPartsForTies = 20_000;

    // With fewer designs than this the first few choices settle it.
    private const long Many = SectionSizer.MostDesigns;

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

    /// <summary>True to choose as if every joint could be made.</summary>
    public bool IgnoresFits { get; init; }

    /// <summary>True once a design came up that some joint refused.</summary>
    public bool FitsRefused { get; private set; }

    /// <summary>Costs above this are of no interest, units.</summary>
    public long Cutoff
    {
        init => _tree.Cutoff = value;
    }

    /// <summary>Designs analysed.</summary>
    public int Analyses { get; private set; }

    /// <summary>Designs that fit were met with: where none was, no joint can be made.</summary>
    public bool SomeFit { get; private set; }

    /// <summary>The last design that could be made.</summary>
    public int[] Last { get; private set; } = [];

    /// <summary>Whether any design can be made.</summary>
    public bool Fits()
    {
        _ = Run(new SearchBudget { Analyses = 1 });
        return SomeFit;
    }

    /// <summary>Parts of the program's search looked at.</summary>
    public long Parts => _tree.Parts;

    /// <summary>No design that meets the targets costs less, units; the largest value where there is none.</summary>
    public long Bound { get; private set; }

    /// <summary>The lightest design met with that meets all targets; null for none.</summary>
    public int[]? Best { get; private set; }

    /// <summary>Makes rows, for whoever goes on.</summary>
    public TargetCuts? Cuts => _cuts;

    /// <summary>Searches until the answer is proven or so many designs are analysed.</summary>
    /// <returns>The answer, proven; null where there is none or the budget is spent: <see cref="Bound"/> tells.</returns>
    public int[]? Run(SearchBudget budget)
    {
        if (_cuts is not null && _space.Count > Many)
        {
            Prepare(budget.Analyses);
        }

        while (true)
        {
            bool isProven = Best is { } best && _tree.Bound >= _space.UnitsOf(best);
            if (_tree.Next(isProven ? MostPartsForTies : budget.Parts - _tree.Parts) is not { } found)
            {
                return Settle();
            }

            int[] choice = found[.._space.Groups];
            if (Best is not null && Compare(choice, Best) >= 0)
            {
                _tree.Exclude();
                continue;
            }

            _analysis.Set(choice);
            if (!IgnoresFits && !_fits.Look(choice, _analysis.Sections))
            {
                FitsRefused = true;
                continue;
            }

            SomeFit = true;
            Last = choice;
            if (Analyses >= budget.Analyses)
            {
                return Settle();
            }

            Analyses++;
            (bool met, bool cut) = Look(found, all: false);
            if (met)
            {
                Best = choice;
                _tree.Cutoff = Program.CostOf(found);
            }

            if (met || !cut)
            {
                _tree.Exclude();
            }
        }
    }

    private int[]? Settle()
    {
        long bound = _tree.Bound;
        if (Best is { } best && bound >= _space.UnitsOf(best))
        {
            Bound = _space.UnitsOf(best);
            return best;
        }

        Bound = bound;
        return null;
    }

    private int Compare(int[] a, int[] b)
    {
        int order = _space.UnitsOf(a).CompareTo(_space.UnitsOf(b));
        return order != 0 ? order : _space.CompareTies(a, b);
    }

    // Rows that make the first bound a good one, and a good design to cut off with: what costs more needs no looking at.
    private void Prepare(int budget)
    {
        var roots = new RootRows(_space, _analysis, Rows, IgnoresFits ? null : _fits, design =>
        {
            Analyses++;
            _ = Look(Rows.Whole(design), all: true);
        });
        if (roots.Run() is not { } start)
        {
            return;
        }

        (SomeFit, Last) = (true, start);
        var exchange = new ExchangeSearch(_space, _analysis, _checks, Rows, _cuts) { IgnoresFits = IgnoresFits };
        Best = exchange.Run(start, budget / 4);
        Analyses += exchange.Analyses;
        FitsRefused |= roots.FitsRefused;
        if (Best is not null)
        {
            _tree.Cutoff = Math.Min(_tree.Cutoff, _space.UnitsOf(Best));
        }
    }

    // Dear targets are asked only where no cheap one fails.
    private (bool Met, bool Cut) Look(int[] found, bool all)
    {
        bool met = true;
        bool cut = false;
        for (int t = 0; t < _checks.Count && (all || met || t < _cheap); t++)
        {
            double ratio = _checks[t].Ratio(_analysis);
            met &= ratio <= 1;
            if (ratio > Near)
            {
                foreach (ProgramRow row in _cuts!.From(_analysis, _checks[t], Near))
                {
                    Rows.AddTargetRow(row);
                    cut |= !row.Keeps(Program, found);
                }
            }
        }

        return (met, cut);
    }
}
