using FrameGen.Diagnostics;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing;

/// <summary>Says in words how a frame moves that nothing holds.</summary>
internal static class Mechanisms
{
    // About a 40 × 2 mm steel tube.
    private static readonly BeamProfile AnyTube = new(210_000, 80_000, 240, 43_000, 43_000, 86_000, 120, 120);

    /// <summary>
    /// Tries every set of supports with the same tube everywhere, so that what moves does so for want of a support or a tube, and
    /// not for sizes too far apart for the arithmetic; reports each motion without strain.
    /// </summary>
    /// <returns>True when the frame stands still.</returns>
    public static bool StandsStill(StructuralModel structure, DiagnosticList diagnostics)
    {
        BeamProfile[] same = [.. structure.Model.Groups.Select(_ => AnyTube)];
        bool still = true;
        for (int solver = 0; solver < structure.Solvers.Count; solver++)
        {
            try
            {
                structure.Solvers[solver].Factor(same);
            }
            catch (MechanismException mechanism)
            {
                still = false;
                (SourcePlace? at, string when) = FirstUse(structure, solver);
                foreach (Mechanism motion in mechanism.Motions)
                {
                    diagnostics.Error(at, Describe(structure, motion) + when);
                }
            }
        }

        return still;
    }

    // One motion: what moves, how, and that nothing stops it.
    private static string Describe(StructuralModel structure, Mechanism motion)
    {
        (string subject, bool one) = Moved(structure, motion);
        if (motion.Slides is { } along)
        {
            string axis = Wording.Axis(along);
            return $"{subject} can slide along {axis}: no support or tube stops it; hold a node along {axis} or add a tube";
        }

        if (motion.TurnsAbout is { } about)
        {
            string axis = Wording.Axis(about);
            string where = motion.Centre is { } centre && !one
                ? $" through ({Wording.Number(Clean(centre.X))}, {Wording.Number(Clean(centre.Y))}, {Wording.Number(Clean(centre.Z))}) mm"
                : "";
            return $"{subject} can turn about {axis}{where}: no support or tube stops it; hold a node against it or add a tube";
        }

        return $"{subject} can move without strain: no support or tube stops it; add a support or a tube";
    }

    /// <summary>What moves: the whole frame, or its nodes by name.</summary>
    public static string Subject(StructuralModel structure, Mechanism motion) => Moved(structure, motion).Text;

    private static (string Text, bool One) Moved(StructuralModel structure, Mechanism motion)
    {
        Topology topology = structure.Topology;
        List<string> names = [.. motion.Nodes.Order().Where(j => topology.NodeOfJoint[j] >= 0).Select(j => structure.Model.Nodes[topology.NodeOfJoint[j]].Name)];
        int all = topology.NodeOfJoint.Count(n => n >= 0);
        return names.Count switch
        {
            0 => ("a loaded place on a tube", true),
            _ when names.Count == all => ("the frame", false),
            1 => (names[0], true),
            _ => (Wording.List(names), false),
        };
    }

    private static (SourcePlace? At, string When) FirstUse(StructuralModel structure, int solver)
    {
        FrameModel model = structure.Model;
        List<LoadCase> cases = [.. model.Cases.Where((_, i) => structure.Cases[i].Solver == solver)];
        if (cases.Count == model.Cases.Count && cases.Count > 0 && structure.Solvers.Count == 1)
        {
            return (cases[0].At, "");
        }

        return cases.Count > 0
            ? (cases[0].At, $" (with the supports of {(cases.Count == 1 ? "case" : "cases")} {Wording.List([.. cases.Select(c => c.Name)])})")
            : structure.Units.FirstOrDefault(u => u.Solver == solver) is { } unit
                ? (unit.Target.At, " (with the supports of this stiffness target)")
                : (model.Targets.OfType<FrequencyTarget>().First().At, " (with all supports, for the frequency target)");
    }

    private static double Clean(double value) => Math.Abs(value) < 1e-6 ? 0 : value;
}
