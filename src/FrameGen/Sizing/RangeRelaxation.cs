using FrameGen.Diagnostics;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Search;
using FrameGen.Sizing.Targets;
using FrameGen.Spec;

namespace FrameGen.Sizing;

/// <summary>Where no design meets the targets: the ranges of a group that would do if they went a little farther, tried out on the next sizes of its stock lists.</summary>
internal static class RangeRelaxation
{
    // Sizes beyond a range's end that are tried.
    private const int MostSteps = 4;
    private const int MostShown = 3;

    // Of all trials together.
    private const int MostAnalyses = 3000;

    private static readonly SearchBudget _each = new() { Analyses = 256, Parts = 1_000 };

    /// <summary>Notes the smallest that would do, of one group or else of all; or that none would.</summary>
    public static void Suggest(FrameModel model, DiagnosticList diagnostics)
    {
        if (model.Groups.All(g => g.IsFixed || g.Beyond.Count == 0))
        {
            return;
        }

        int left = MostAnalyses;
        var found = new List<(double By, int Group, string Words)>();
        for (int g = 0; g < model.Groups.Count; g++)
        {
            foreach (IGrouping<(string Key, bool IsAbove), BeyondRange> end in model.Groups[g].Beyond.GroupBy(b => (b.Key, b.By > 0)))
            {
                if (!model.Groups[g].IsFixed && Smallest(model, g, [.. end], ref left) is { } smallest)
                {
                    found.Add(smallest);
                }
            }
        }

        if (found.Count > 0)
        {
            IEnumerable<string> words = found.OrderBy(f => f.By).ThenBy(f => f.Group).Take(MostShown).Select(f => f.Words);
            diagnostics.Note(null, $"a wider range of one group would do: {string.Join("; or ", words)}");
            return;
        }

        FrameModel all = model with { Groups = [.. model.Groups.Select(g => g.IsFixed ? g : Widen(g, g.Beyond, model))] };
        if (left > 0)
        {
            Trial trial = Try(all, ref left);
            if (trial.Design is { } design)
            {
                IEnumerable<string> sizes = Enumerable.Range(0, design.Count).Where(g => !model.Groups[g].IsFixed && !model.Groups[g].Candidates.Contains(design[g]))
                    .Select(g => $"{model.Groups[g].Name} {design[g].Section.Name}");
                diagnostics.Note(null, $"no wider range of one group alone would do, of {MostSteps} sizes more; several would: {string.Join(", ", sizes)} ({Wording.Number(trial.MassKg)} kg in all)");
            }
            else if (trial.IsProven)
            {
                diagnostics.Note(null, "no wider range of od, height, width or wall would do: no size of the stock lists meets the targets; change the layout, the lists or the targets");
            }
        }
    }

    private static (double By, int Group, string Words)? Smallest(FrameModel model, int group, IReadOnlyList<BeyondRange> beyond, ref int left)
    {
        List<double> steps = [.. beyond.Select(b => Math.Abs(b.By)).Distinct().Order().Take(MostSteps)];
        (Trial Trial, double By)? smallest = null;

        // The widest first: where that does not do, nothing narrower does.
        for (int step = steps.Count - 1; step >= 0 && left > 0; step--)
        {
            double by = steps[step];
            TubeGroup[] groups = [.. model.Groups];
            groups[group] = Widen(groups[group], [.. beyond.Where(b => Math.Abs(b.By) <= by)], model);
            Trial trial = Try(model with { Groups = groups }, ref left);
            if (trial.Design is null)
            {
                break;
            }

            smallest = (trial, by);
        }

        if (smallest is not { } best)
        {
            return null;
        }

        BeyondRange edge = beyond.First(b => Math.Abs(b.By) == best.By);
        string words = $"{edge.Key} of {model.Groups[group].Name} {(edge.By > 0 ? "up to" : "down to")} {Wording.Number(edge.Size)} mm "
            + $"(then {best.Trial.Design![group].Section.Name}; {Wording.Number(best.Trial.MassKg)} kg in all)";
        return (best.By / edge.Size, group, words);
    }

    private static TubeGroup Widen(TubeGroup group, IReadOnlyList<BeyondRange> with, FrameModel model)
    {
        bool needsPrice = model.Sizing.Objective == SizingObjective.Cost;
        IEnumerable<Candidate> more = with.Select(b => b.Candidate).Where(c => !needsPrice || c.PricePerMetre is not null);
        return group with { Candidates = [.. group.Candidates.Concat(more).OrderBy(c => c.Section.Area).ThenBy(c => c.Section.Name, StringComparer.Ordinal)] };
    }

    private static Trial Try(FrameModel model, ref int left)
    {
        IReadOnlyList<TargetCheck> checks = TargetCheck.All(model);
        DesignSpace space = DesignSpace.Create(model, (group, section) => checks.All(c => c.Allows(group, section)), out IReadOnlyList<int> emptied);
        if (emptied.Count > 0)
        {
            return new Trial(null, 0, true);
        }

        StructuralModel? structure = model.Cases.Count > 0 || checks.Any(c => c.NeedsFrame) ? StructuralModel.Build(model) : null;
        var joints = new JointTable(space);
        var welds = WeldPairs.Build(joints, model);
        var search = new LightestSearch(space, new DesignAnalysis(space, joints, welds, structure), checks, welds);
        _ = search.Run(_each with { Analyses = Math.Min(_each.Analyses, left) });
        left -= Math.Max(1, search.Analyses);
        return search.Best is { } best
            ? new Trial([.. Enumerable.Range(0, space.Groups).Select(g => space[g][best[g]].Candidate)], space.MassOf(best), true)
            : new Trial(null, 0, search.Bound == long.MaxValue);
    }

    /// <summary>What came of a trial.</summary>
    /// <param name="Design">By group; null where none was found.</param>
    /// <param name="MassKg">Of it.</param>
    /// <param name="IsProven">True where it is settled whether there is any.</param>
    private readonly record struct Trial(IReadOnlyList<Candidate>? Design, double MassKg, bool IsProven);
}
