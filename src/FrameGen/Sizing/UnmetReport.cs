using FrameGen.Diagnostics;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Targets;
using FrameGen.Spec;

namespace FrameGen.Sizing;

/// <summary>Says why no design meets the targets: what can be had, and which limits of the groups stand in the way.</summary>
internal static class UnmetReport
{
    /// <summary>Warns of every target out of reach, with the best that can be had; else of those that can't be met together.</summary>
    public static void Explain(DesignSearch search, SearchSurvey survey, DesignAnalysis analysis, DiagnosticList diagnostics)
    {
        FrameModel model = analysis.Space.Model;
        if (model.Groups.All(g => g.IsFixed))
        {
            return; // told with the design itself
        }

        bool outOfReach = false;
        for (int t = 0; t < search.Checks.Count; t++)
        {
            TargetCheck check = search.Checks[t];
            search.Turn(analysis, survey.Best[t]);
            TargetResult best = check.Result(analysis);
            if (best.Met)
            {
                continue;
            }

            outOfReach = true;
            diagnostics.Warning(
                check.Target.At,
                $"{best.Kind} {best.Label}: out of reach; the best of all sizes is {Amount(best)}, with {Sizes(analysis)}; "
                + $"{Relaxed(search, survey, analysis, t, best)}; {Limits(check, survey.Best[t], search, analysis)}");
        }

        search.Turn(analysis, survey.LeastBad);
        List<TargetResult> failing = [.. search.Checks.Select(c => c.Result(analysis)).Where(r => !r.Met)];
        if (!outOfReach)
        {
            diagnostics.Warning(
                search.Checks[failing[0].Index].Target.At,
                $"each target can be met alone, but no design meets all of them; the least bad, {Sizes(analysis)}, misses "
                + string.Join("; ", failing.Select(r => $"{r.Kind} {r.Label}: {Amount(r)}"))
                + OneLimit(search, survey, analysis));
            search.Turn(analysis, survey.LeastBad);
        }
    }

    /// <summary>Warns of every target that a frame of given sections misses.</summary>
    public static void ExplainFixed(IReadOnlyList<TargetResult> targets, IReadOnlyList<TargetCheck> checks, DiagnosticList diagnostics)
    {
        string advice = checks.Any(c => c.Model.Frozen is not null)
            ? "the sizes are frozen: change the target or the layout, or choose anew (framegen freeze --replace)"
            : "the sections are fixed: give a group stouter ones, or let it `choose`";
        for (int t = 0; t < targets.Count; t++)
        {
            if (!targets[t].Met)
            {
                string where = targets[t].Where.Length == 0 ? "" : $" ({targets[t].Where})";
                diagnostics.Warning(
                    checks[t].Target.At,
                    $"{targets[t].Kind} {targets[t].Label}: {Amount(targets[t])}{where}; {advice}");
            }
        }
    }

    // 4.2 mm, 40 % over the limit of 3 mm; 120 mm, 40 times the limit of 3 mm.
    public static string Amount(TargetResult result)
    {
        bool isMinimum = result.Value < result.Limit;
        double off = Math.Abs(result.Value - result.Limit) / result.Limit;
        string measure = isMinimum ? $"{Wording.Percent(off)} below" : off < 3 ? $"{Wording.Percent(off)} over" : $"{Wording.Number(off + 1)} times";
        return $"{Wording.Quantity(result.Value, result.Unit)}, {measure} the limit of {Wording.Quantity(result.Limit, result.Unit)}";
    }

    /// <summary>The value of a missed target that would be within reach, three digits of it: 52.3 N/mm of 52.34, 4.22 mm of 4.213.</summary>
    public static string Reachable(TargetResult missed)
    {
        bool isMinimum = missed.Value < missed.Limit;
        if (!(missed.Value > 0) || !double.IsFinite(missed.Value))
        {
            return Wording.Quantity(missed.Value, missed.Unit);
        }

        double step = Math.Pow(10, Math.Floor(Math.Log10(missed.Value)) - 2);
        double steps = missed.Value / step;
        double rounded = step * (isMinimum ? Math.Floor(steps + 1e-6) : Math.Ceiling(steps - 1e-6));
        return Wording.Quantity(rounded, missed.Unit);
    }

    // What could be asked for instead: of this target alone, and together with all others.
    private static string Relaxed(DesignSearch search, SearchSurvey survey, DesignAnalysis analysis, int target, TargetResult best)
    {
        string alone = Reachable(best);
        if (survey.Alone[target] is not { } rank)
        {
            return search.Checks.Count == 1 ? $"{alone} could be met" : $"{alone} could be met, though not with all other targets";
        }

        search.Turn(analysis, rank);
        string together = Reachable(search.Checks[target].Result(analysis));
        return search.Checks.Count == 1 ? $"{alone} could be met"
            : string.Equals(alone, together, StringComparison.Ordinal) ? $"{alone} could be met, and all other targets with it"
            : $"{alone} could be met, and {together} with all other targets, by {Sizes(analysis)}";
    }

    // Of the targets that can't be met together, the one whose limit has to give way by the smallest share, with all others met.
    private static string OneLimit(DesignSearch search, SearchSurvey survey, DesignAnalysis analysis)
    {
        (double Ratio, string Words) least = (double.PositiveInfinity, "");
        for (int t = 0; t < search.Checks.Count; t++)
        {
            if (survey.Alone[t] is not { } rank)
            {
                continue;
            }

            search.Turn(analysis, rank);
            TargetResult result = search.Checks[t].Result(analysis);
            if (result.Ratio < least.Ratio)
            {
                least = (result.Ratio, $"; the smallest change of one limit that would do: {result.Kind} {result.Label}, {Reachable(result)} in place of "
                    + $"{Wording.Quantity(result.Limit, result.Unit)}, with {Sizes(analysis)}");
            }
        }

        return least.Words;
    }

    private static string Sizes(DesignAnalysis analysis)
    {
        var sizes = new List<string>();
        for (int g = 0; g < analysis.Space.Groups; g++)
        {
            if (!analysis.Space.Model.Groups[g].IsFixed)
            {
                sizes.Add($"{analysis.Space.Model.Groups[g].Name} {analysis.Sections[g].Name}");
            }
        }

        return string.Join(", ", sizes);
    }

    // The groups that matter to the target and stand at the end of their range in its best design.
    private static string Limits(TargetCheck check, int bestRank, DesignSearch search, DesignAnalysis analysis)
    {
        search.Turn(analysis, bestRank);
        return Limits(check, analysis);
    }

    /// <summary>The groups' limits that stand in the way of a target in the design that the analysis stands at, its best.</summary>
    public static string Limits(TargetCheck check, DesignAnalysis analysis)
    {
        int[] best = [.. analysis.Choice];
        double ratio = check.Ratio(analysis);
        var limits = new List<string>();
        for (int g = 0; g < best.Length; g++)
        {
            if (analysis.Space.Model.Groups[g].IsFixed || !Matters(check, analysis, best, g, ratio))
            {
                continue;
            }

            analysis.Set(best);
            List<string> group = LimitsOf(analysis, g);
            if (Blocked(check, analysis, best, g, ratio) is { } blocked)
            {
                group.Add(blocked);
            }

            if (group.Count > 0)
            {
                limits.Add($"{analysis.Space.Model.Groups[g].Name}: {string.Join(", ", group)}");
            }
        }

        analysis.Set(best);
        return limits.Count == 0
            ? "no range of a group stands in the way: change the layout, or the target"
            : $"in the way stand {string.Join("; ", limits)}: widen them, change the layout, or the target";
    }

    private static bool Matters(TargetCheck check, DesignAnalysis analysis, int[] best, int group, double ratio)
    {
        int options = analysis.Space[group].Length;
        if (options == 1)
        {
            // Nothing to compare with; what a target on the frame owes to it can't be told.
            return check is not MemberCheck member || member.Concerns(group);
        }

        int[] other = [.. best];
        other[group] = best[group] == options - 1 ? 0 : options - 1;
        analysis.Set(other);
        return Math.Abs(check.Ratio(analysis) - ratio) > 1e-6 * ratio;
    }

    // A size of the group that would serve the target better, and the joint that it does not fit; null for none.
    private static string? Blocked(TargetCheck check, DesignAnalysis analysis, int[] best, int group, double ratio)
    {
        int[] other = [.. best];
        for (int option = analysis.Space[group].Length - 1; option >= 0; option--)
        {
            other[group] = option;
            analysis.Set(other);
            foreach (NodeEntries node in analysis.Joints.Nodes)
            {
                if (!analysis.Joints.At(node, other, analysis.Sections).Fits && check.Ratio(analysis) < ratio)
                {
                    return $"{analysis.Sections[group].Name} does not fit joint {analysis.Space.Model.Nodes[node.Node].Name}";
                }
            }
        }

        return null;
    }

    private static List<string> LimitsOf(DesignAnalysis analysis, int group)
    {
        TubeGroup of = analysis.Space.Model.Groups[group];
        Section section = analysis.Sections[group];
        var limits = new List<string>();
        if (section.Height == section.Width)
        {
            Add("od", s => s.OuterSize, of.Choose?.Od);
        }
        else
        {
            Add("height", s => s.Height, of.Choose?.Height ?? of.Choose?.Od);
            Add("width", s => s.Width, of.Choose?.Width ?? of.Choose?.Od);
        }

        Add("wall", s => s.Wall, of.Choose?.Wall);
        return limits;

        void Add(string what, Func<Section, double> size, RangeSpec? range)
        {
            const double Same = 1e-9;
            double value = size(section);
            double least = of.Candidates.Min(c => size(c.Section));
            double most = of.Candidates.Max(c => size(c.Section));
            if (value >= most - Same)
            {
                limits.Add($"{what} at {(range?.Max is null ? "stock's largest" : "its largest")} {Wording.Number(most)} mm");
            }
            else if (value <= least + Same)
            {
                limits.Add($"{what} at {(range?.Min is null ? "stock's smallest" : "its smallest")} {Wording.Number(least)} mm");
            }
        }
    }
}
