using FrameGen.Diagnostics;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Search;
using FrameGen.Sizing.Targets;

namespace FrameGen.Sizing;

/// <summary>What it costs that joints have to fit: a design that meets every target and is refused by nothing else.</summary>
/// <param name="LighterKg">By how much that design is lighter, kg; negative where it is heavier and only cheaper.</param>
/// <param name="Cheaper">By how much it costs less; null where cost is not what is made least.</param>
/// <param name="Rules">What refuses it, joint by joint: one a pair of groups.</param>
public sealed record FitCost(double LighterKg, double? Cheaper, IReadOnlyList<FitRule> Rules)
{
    private const int MostAnalyses = 256;
    private const long MostParts = 2_000;

    /// <summary>Looks for it; null where there is none, or none was found within a small budget.</summary>
    internal static FitCost? Look(
        DesignSpace space, DesignAnalysis analysis, IReadOnlyList<TargetCheck> checks, WeldPairs welds, LightestSearch lightest, int[] found)
    {
        if (!lightest.FitsRefused)
        {
            return null;
        }

        var free = new LightestSearch(space, analysis, checks, welds) { IgnoresFits = true, Cutoff = space.UnitsOf(found) - 1 };
        foreach (Program.ProgramRow row in lightest.Rows.TargetRows)
        {
            free.Rows.AddTargetRow(row);
        }

        _ = free.Run(new SearchBudget { Analyses = MostAnalyses, Parts = MostParts });
        if (free.Best is not { } better || space.UnitsOf(better) >= space.UnitsOf(found))
        {
            return null;
        }

        analysis.Set(better);
        var rules = new List<FitRule>();
        foreach (NodeEntries node in analysis.Joints.Nodes)
        {
            if (analysis.Joints.At(node, better, analysis.Sections).Fits)
            {
                continue;
            }

            foreach (FitProblem problem in analysis.Joints.ProblemsAt(node, analysis.Sections))
            {
                FitRule rule = Rule(space.Model, node.Node, problem, analysis.Sections);
                if (!rules.Any(r => string.Equals(r.Group, rule.Group, StringComparison.Ordinal) && string.Equals(r.SeatGroup, rule.SeatGroup, StringComparison.Ordinal)))
                {
                    rules.Add(rule);
                }
            }
        }

        double? cheaper = space.Model.Sizing.Objective == Spec.SizingObjective.Cost ? (space.UnitsOf(found) - space.UnitsOf(better)) / DesignSpace.UnitsPerMoney : null;
        return rules.Count == 0 ? null : new FitCost(space.MassOf(found) - space.MassOf(better), cheaper, rules);
    }

    /// <summary>Notes it, with what can be done.</summary>
    internal void Say(FrameModel model, DiagnosticList diagnostics)
    {
        string gain = Cheaper is { } money ? $"cheaper by {Wording.Number(money)}" : $"lighter by {Wording.Number(LighterKg)} kg";
        string wrap = Rules.Any(r => r.IsWidth) ? ", or allow it with `wrap: true` on that end" : "";
        diagnostics.Note(
            model.Nodes[Rules[0].Node].At,
            $"joints bind the sizes: a design {gain} meets every target and is refused only because {string.Join("; ", Rules.Select(r => r.Text))}; "
            + $"change the joint's `order`{wrap}");
    }

    private static FitRule Rule(FrameModel model, int node, FitProblem problem, Section[] sections)
    {
        TubeGroup group = model.Groups[model.Tubes[problem.End.Tube].Group];
        TubeGroup seat = model.Groups[model.Tubes[problem.Mate].Group];
        Section section = sections[model.Tubes[problem.End.Tube].Group];
        string where = $"at joint {model.Nodes[node].Name}";
        string text = problem.Kind switch
        {
            FitProblemKind.WiderThanSeat when Math.Abs((2 * problem.Needed) - section.OuterSize) < 1e-6 =>
                $"{group.Name} can't be wider than {seat.Name}, {Wording.Number(2 * problem.Allowed)} mm ({section.Name} {where})",
            FitProblemKind.WiderThanSeat =>
                $"{group.Name} has to land on {seat.Name}: half its width and offset can't be more than {Wording.Number(problem.Allowed)} mm ({section.Name} {where})",
            FitProblemKind.RunOutTooLong =>
                $"{group.Name} can't run out by more than its own size, {Wording.Number(problem.Allowed)} mm, to carry {seat.Name} ({section.Name} {where})",
            _ => $"{group.Name} would miss {seat.Name} by {Wording.Number(problem.Needed)} mm ({section.Name} {where})",
        };
        return new FitRule(node, group.Name, seat.Name, problem.Kind == FitProblemKind.WiderThanSeat, text);
    }
}

/// <summary>What a joint refuses.</summary>
/// <param name="Node">Index of its node.</param>
/// <param name="Group">Group of the tube that is cut.</param>
/// <param name="SeatGroup">Group of the tube it lands on, misses, or would have to carry.</param>
/// <param name="IsWidth">True where it is about width: what `wrap` allows.</param>
/// <param name="Text">For people: <c>cross can't be wider than rails, 30 mm (round 35 x 1 mm at joint n)</c>.</param>
public sealed record FitRule(int Node, string Group, string SeatGroup, bool IsWidth, string Text);
