using FrameGen.Diagnostics;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Program;
using FrameGen.Sizing.Targets;

namespace FrameGen.Sizing.Search;

/// <summary>
/// A good design where the proof is out of reach: up from a light one until the targets are met, then down by exchanges of one group and of two, each looked at exactly, until none
/// helps. Rows known to hold for every design that meets the targets spare most looks.
/// </summary>
/// <param name="space">The designs.</param>
/// <param name="analysis">Turned to design after design.</param>
/// <param name="checks">The targets.</param>
/// <param name="rows">Rows of every design that meets the targets; those of designs looked at here are added.</param>
/// <param name="cuts">Makes them; null where the frame is not looked at.</param>
internal sealed class ExchangeSearch(
    DesignSpace space, DesignAnalysis analysis, IReadOnlyList<TargetCheck> checks, SizingProgram rows, TargetCuts? cuts)
{
    // More rows than this cost more than the looks they spare.
    private const int MostRows = 600;

    // Sizes looked at beyond the one a group has, by mass.
    private const int Reach = 4;

    private readonly TargetCheck[] _checks = [.. checks.OrderBy(c => c.Cost)];
    private int _left;
    private int[] _leastBad = [];
    private double _least = double.PositiveInfinity;

    /// <summary>True to choose as if every joint could be made.</summary>
    public bool IgnoresFits { get; init; }

    /// <summary>Designs analysed.</summary>
    public int Analyses { get; private set; }

    /// <summary>The best found.</summary>
    /// <param name="start">Where to begin: any design.</param>
    /// <param name="budget">Analyses at most.</param>
    /// <returns>A design that meets all targets; null where none was found.</returns>
    public int[]? Run(int[] start, int budget)
    {
        _left = budget;
        int[] design = [.. start];
        if (!Climb(design))
        {
            return null;
        }

        bool better = true;
        while (better && _left > 0)
        {
            better = DropOne(design) || ExchangeTwo(design);
        }

        return design;
    }

    /// <summary>Turns to the least bad design met with, and says what it misses.</summary>
    /// <param name="diagnostics">Takes the warnings.</param>
    /// <param name="proven">True where no design can do better.</param>
    public void Describe(DiagnosticList diagnostics, bool proven)
    {
        analysis.Set(_leastBad);
        string sure = proven ? "no design meets all targets (proven)" : "no design was found that meets all targets";
        foreach (TargetCheck check in checks)
        {
            analysis.Set(_leastBad);
            TargetResult result = check.Result(analysis);
            if (result.Met)
            {
                continue;
            }

            // With the limits eased to what the least bad design has, it would do.
            string eased = $"{sure}; the least bad found misses {result.Kind} {result.Label}: {UnmetReport.Amount(result)}; {UnmetReport.Reachable(result)} could be met";
            TurnToBest(check);
            TargetResult best = check.Result(analysis);
            diagnostics.Warning(
                check.Target.At,
                best.Met
                    ? $"{eased}; alone it can be met"
                    : $"{eased}; the best found for it alone is {Wording.Quantity(best.Value, best.Unit)}; {UnmetReport.Limits(check, analysis)}");
        }

        analysis.Set(_leastBad);
    }

    // The best design for one target alone that a sweep over the groups comes to, from the heaviest that can be made.
    private void TurnToBest(TargetCheck check)
    {
        int[] design = [.. _leastBad];
        int[] heaviest = [.. Enumerable.Range(0, space.Groups).Select(g => space[g].Length - 1)];
        double least = Of(design);
        double atTop = IsBuildable(heaviest) ? Of(heaviest) : double.PositiveInfinity;
        (design, least) = atTop < least ? (heaviest, atTop) : (design, least);
        for (int g = 0; g < design.Length; g++)
        {
            int best = design[g];
            for (int c = space[g].Length - 1; c >= 0; c--)
            {
                design[g] = c;
                double ratio = c != best && IsBuildable(design) ? Of(design) : double.PositiveInfinity;
                (best, least) = ratio < least ? (c, ratio) : (best, least);
            }

            design[g] = best;
        }

        analysis.Set(design);

        double Of(int[] tried)
        {
            Count(tried);
            return check.Ratio(analysis);
        }
    }

    // Along the rows of the design itself, analysed afresh after each way up; where they lead nowhere, step by step.
    private bool Climb(int[] design)
    {
        while (_left > 0)
        {
            double worst = Worst(design);
            if (worst <= 1)
            {
                return true;
            }

            List<ProgramRow> own = [.. _checks.Where(c => c.Ratio(analysis) > 1).SelectMany(OwnRows)];
            own.ForEach(rows.AddTargetRow);
            if (!double.IsFinite(worst) || !RowClimb.Run(space, rows.Program, own, design, IsBuildable))
            {
                return ClimbStepwise(design, worst);
            }
        }

        return false;
    }

    private IEnumerable<ProgramRow> OwnRows(TargetCheck check) => cuts is null || !check.NeedsFrame ? [] : cuts.From(analysis, check, 1);

    // The step of one group that makes the worst target least bad for its mass, again and again.
    private bool ClimbStepwise(int[] design, double worst)
    {
        while (!(worst <= 1) && _left > 0)
        {
            (double gain, double ratio, int group, int option) = (double.NegativeInfinity, worst, -1, -1);
            for (int g = 0; g < design.Length; g++)
            {
                int kept = design[g];
                for (int c = kept + 1; c < space[g].Length && c <= kept + Reach; c++)
                {
                    design[g] = c;
                    double now = IsBuildable(design) ? Worst(design) : double.PositiveInfinity;
                    double each = double.IsFinite(worst) ? (worst - now) / Math.Max(1, space[g][c].Units - space[g][kept].Units) : now < worst ? 1 : -1;
                    if (now < worst && each > gain)
                    {
                        (gain, ratio, group, option) = (each, now, g, c);
                    }
                }

                design[g] = kept;
            }

            if (group < 0)
            {
                return ToTheTop(design);
            }

            design[group] = option;
            worst = ratio;
        }

        return worst <= 1;
    }

    // Where no single step helps, all groups at their heaviest, if those go together.
    private bool ToTheTop(int[] design)
    {
        for (int g = 0; g < design.Length; g++)
        {
            design[g] = space[g].Length - 1;
        }

        return IsBuildable(design) && Worst(design) <= 1;
    }

    private bool DropOne(int[] design)
    {
        foreach ((int group, int option, _) in Moves(design, saving: true))
        {
            if (Accept(design, [(group, option)]))
            {
                return true;
            }
        }

        return false;
    }

    // One group lighter, another heavier, together lighter: the most saved first.
    private bool ExchangeTwo(int[] design)
    {
        List<(int Group, int Option, long Units)> down = [.. Moves(design, saving: true)];
        List<(int Group, int Option, long Units)> up = [.. Moves(design, saving: false)];
        var pairs = new List<(long Units, int Down, int Up)>();
        for (int d = 0; d < down.Count; d++)
        {
            for (int u = 0; u < up.Count; u++)
            {
                if (down[d].Group != up[u].Group && down[d].Units + up[u].Units < 0)
                {
                    pairs.Add((down[d].Units + up[u].Units, d, u));
                }
            }
        }

        pairs.Sort();
        foreach ((_, int d, int u) in pairs)
        {
            if (_left <= 0)
            {
                return false;
            }

            if (Accept(design, [(down[d].Group, down[d].Option), (up[u].Group, up[u].Option)]))
            {
                return true;
            }
        }

        return false;
    }

    private List<(int Group, int Option, long Units)> Moves(int[] design, bool saving)
    {
        var moves = new List<(int Group, int Option, long Units)>();
        for (int g = 0; g < design.Length; g++)
        {
            for (int c = 0; c < space[g].Length; c++)
            {
                long units = space[g][c].Units - space[g][design[g]].Units;
                if (c != design[g] && (saving ? units < 0 : units >= 0))
                {
                    moves.Add((g, c, units));
                }
            }
        }

        moves.Sort((a, b) => a.Units != b.Units ? a.Units.CompareTo(b.Units) : a.Group != b.Group ? a.Group.CompareTo(b.Group) : a.Option.CompareTo(b.Option));
        return moves;
    }

    private bool Accept(int[] design, ReadOnlySpan<(int Group, int Option)> changes)
    {
        int[] tried = [.. design];
        foreach ((int group, int option) in changes)
        {
            tried[group] = option;
        }

        if (_left <= 0 || !rows.Allows(tried) || !IsBuildable(tried))
        {
            return false;
        }

        Count(tried);
        foreach (TargetCheck check in _checks)
        {
            if (!check.IsMet(analysis))
            {
                // What refuses this one is likely to refuse its neighbours.
                if (rows.Program.Rows.Count < MostRows)
                {
                    foreach (ProgramRow row in OwnRows(check))
                    {
                        rows.AddTargetRow(row);
                    }
                }

                return false;
            }
        }

        tried.CopyTo(design, 0);
        return true;
    }

    private bool IsBuildable(int[] design)
    {
        analysis.Set(design);
        return space.IsAllowed(design) && (IgnoresFits || analysis.Joints.Fits(design, analysis.Sections));
    }

    private double Worst(int[] design)
    {
        Count(design);
        double worst = _checks.Max(c => c.Ratio(analysis));
        if (worst < _least || _leastBad.Length == 0)
        {
            (_leastBad, _least) = ([.. design], worst);
        }

        return worst;
    }

    private void Count(int[] design)
    {
        analysis.Set(design);
        Analyses++;
        _left--;
    }
}
