using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Targets;
using FrameGen.Spec;

namespace FrameGen.Sizing;

/// <summary>Writes down the design that was settled on: everything that later stages and people read.</summary>
internal static class SizingFinish
{
    /// <summary>Numbers whose relative error is above this are refused.</summary>
    public const double LargestError = 1e-9;

    /// <summary>Describes the design that the analysis stands at.</summary>
    /// <param name="analysis">The analysis.</param>
    /// <param name="status">How sure the choice is.</param>
    /// <param name="analyses">Designs analysed on the way.</param>
    /// <param name="checks">The targets.</param>
    /// <param name="diagnostics">Takes warnings, and errors where the numbers can't be trusted.</param>
    /// <param name="bound">Units that no design comes below; null where this one is proven.</param>
    /// <returns>Null when its numbers can't be trusted: an error was reported.</returns>
    public static SizedFrame? Describe(
        DesignAnalysis analysis, SizingStatus status, long analyses, IReadOnlyList<TargetCheck> checks, DiagnosticList diagnostics, long? bound = null)
    {
        FrameModel model = analysis.Space.Model;
        List<CaseResult> cases = [.. model.Cases.Select((_, c) => DescribeCase(analysis, c))];
        if (!IsSound(analysis, diagnostics))
        {
            return null;
        }

        List<TargetResult> targets = [.. checks.Select(c => c.Result(analysis) with { ByTube = ByTube(analysis, c) })];
        if (status == SizingStatus.Unmet && model.Groups.All(g => g.IsFixed))
        {
            UnmetReport.ExplainFixed(targets, checks, diagnostics);
        }

        BucklingWarning.Look(model, cases, diagnostics);
        LiftWarning.Look(model, cases, diagnostics);
        var chosen = new Candidate[analysis.Space.Groups];
        for (int g = 0; g < chosen.Length; g++)
        {
            chosen[g] = analysis.Space[g][analysis.Choice[g]].Candidate;
        }

        double mass = analysis.Space.MassOf(analysis.Choice);
        bool byCost = model.Sizing.Objective == SizingObjective.Cost;
        double cost = analysis.Space.UnitsOf(analysis.Choice) / DesignSpace.UnitsPerMoney;
        return new SizedFrame(
            model,
            chosen,
            status,
            mass,
            status == SizingStatus.Unmet || byCost ? null : bound is { } kg ? kg / DesignSpace.UnitsPerKg : mass,
            analyses,
            targets,
            cases,
            [.. Enumerable.Range(0, model.Nodes.Count).Select(n => JointOrder.At(model, n, analysis.Sections))])
        {
            Cost = byCost ? cost : null,
            BoundCost = status == SizingStatus.Unmet || !byCost ? null : bound is { } money ? money / DesignSpace.UnitsPerMoney : cost,
            Frequencies = analysis.Structure?.VibrationSolver is null ? null : [.. analysis.Stability.Modes().Select(m => m.Hertz)],
        };
    }

    private static double?[] ByTube(DesignAnalysis analysis, TargetCheck check)
    {
        double?[] ratios = [.. analysis.Space.Model.Tubes.Select((_, t) => check.RatioOf(analysis, t))];
        return Array.Exists(ratios, r => r is not null) ? ratios : [];
    }

    private static CaseResult DescribeCase(DesignAnalysis analysis, int loadCase)
    {
        FrameModel model = analysis.Space.Model;
        FrameSolution solution = analysis.Case(loadCase);
        IReadOnlyList<int> joints = analysis.Structure!.Topology.JointOfNode;
        return new CaseResult(
            loadCase,
            [.. joints.Select(j => j < 0 ? (Vector3?)null : solution.Displacement(j))],
            [.. joints.Select(j => j < 0 ? (Vector3?)null : solution.Rotation(j))],
            [.. model.Cases[loadCase].Supports.Select(s => solution.Reaction(joints[model.Supports[s].Node]))],
            [.. model.Tubes.Select((_, t) => TubeScan.Describe(analysis, loadCase, t))],
            solution.EquilibriumError,
            solution.BackwardError)
        {
            BucklingFactor = analysis.Stability.Case(loadCase)?.Factor,
            BucklesAt = analysis.Stability.WhereBuckling(loadCase),
            Axes = [.. model.Tubes.Select((_, t) => DeflectedTube.Describe(analysis, loadCase, t))],
        };
    }

    private static bool IsSound(DesignAnalysis analysis, DiagnosticList diagnostics)
    {
        bool sound = true;
        for (int c = 0; c < (analysis.Structure?.Cases.Count ?? 0); c++)
        {
            Ask(analysis.Case(c), $"case {analysis.Space.Model.Cases[c].Name}", analysis.Space.Model.Cases[c].At);
        }

        for (int u = 0; u < (analysis.Structure?.Units.Count ?? 0); u++)
        {
            Ask(analysis.Unit(u), "the unit load of a stiffness target", analysis.Structure!.Units[u].Target.At);
        }

        return sound && StabilityErrors.None(analysis, diagnostics);

        void Ask(FrameSolution solution, string what, SourcePlace at)
        {
            // "Not within", so that NaN is refused as well.
            double error = Math.Max(solution.EquilibriumError, solution.BackwardError);
            if (!(error <= LargestError))
            {
                diagnostics.Error(
                    at,
                    $"the numbers of {what} can't be trusted: loads and reactions, or stiffness and loads, disagree by {Wording.Number(error)} of their size "
                    + $"(allowed {Wording.Number(LargestError)}); {StiffnessContrast.Describe(analysis, solution.WorstNode)}");
                sound = false;
            }
        }
    }
}
