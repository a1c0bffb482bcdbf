using FrameGen.Diagnostics;
using FrameGen.Model;

namespace FrameGen.Sizing;

/// <summary>No column passes in silence: a case that comes near to buckling the frame is pointed out where no target looks at that.</summary>
internal static class BucklingWarning
{
    /// <summary>Below this times its loads a case is said to be near: imperfect members buckle sooner than perfect ones.</summary>
    private const double Near = 3;

    /// <summary>Warns of each such case.</summary>
    public static void Look(FrameModel model, IReadOnlyList<CaseResult> cases, DiagnosticList diagnostics)
    {
        foreach (CaseResult result in cases)
        {
            bool covered = model.Targets.OfType<BucklingTarget>().Any(t => t.Cases.Contains(result.Case));
            if (!covered && result.BucklingFactor is { } factor && factor < Near)
            {
                string name = model.Cases[result.Case].Name;
                string when = factor < 1
                    ? $"buckles the frame: {Wording.Number(factor)} of its loads are enough"
                    : $"is near to buckling the frame: {Wording.Number(factor)} times its loads are enough";
                diagnostics.Warning(
                    model.Cases[result.Case].At,
                    $"case {name} {when}, {result.BucklesAt} moving most; real tubes, never quite straight, buckle sooner: take stouter tubes or hold them in "
                    + $"between, or set the margin yourself with a target: {{buckling: {{cases: [{name}], min_factor: {Wording.Number(Near)}}}}}");
            }
        }
    }
}
