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
                if (FirstUse(structure, solver) is not var (at, when))
                {
                    // Frequencies that no target asks for: a case has said it.
                    continue;
                }

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
        string hinges = Hinged(structure, motion);
        if (hinges.Length > 0)
        {
            string how = motion.TurnsAbout is { } turn ? $"turn about {Wording.Axis(turn)}" : motion.Slides is { } slide ? $"slide along {Wording.Axis(slide)}" : "move without strain";
            return $"{subject} can {how}: {hinges}; leave one of the hinges out, add a tube or hold the frame there";
        }

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

    // Which hinges let it go: those of the tubes at the nodes that move, where not all of the frame does.
    private static string Hinged(StructuralModel structure, Mechanism motion)
    {
        FrameModel model = structure.Model;
        List<int> nodes = [.. motion.Nodes.Order().Select(j => structure.Topology.NodeOfJoint[j]).Where(n => n >= 0)];
        List<string> tubes = [.. model.Tubes.Where(t => t.Hinges != Hinges.None && (nodes.Contains(t.From.Node) || nodes.Contains(t.To.Node))).Select(t => t.Name)];
        return tubes.Count switch
        {
            0 => "",
            1 => $"tube {tubes[0]} has a hinge there, and nothing else stops it",
            _ => $"tubes {Wording.List(tubes)} have hinges there, and nothing else stops it",
        };
    }

    private static (string Text, bool One) Moved(StructuralModel structure, Mechanism motion)
    {
        Topology topology = structure.Topology;
        List<string> names = [.. motion.Nodes.Order().Where(j => topology.NodeOfJoint[j] >= 0).Select(j => structure.Model.Nodes[topology.NodeOfJoint[j]].Name)];
        int all = topology.NodeOfJoint.Count(n => n >= 0);
        return names.Count switch
        {
            0 => ("a place on a tube", true),
            _ when names.Count == all => ("the frame", false),
            1 => (names[0], true),
            _ => (Wording.List(names), false),
        };
    }

    private static (SourcePlace? At, string When)? FirstUse(StructuralModel structure, int solver)
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
                : model.Targets.OfType<FrequencyTarget>().FirstOrDefault() is { } frequency
                    ? (frequency.At, " (with all supports, for the frequency target)")
                    : null;
    }

    private static double Clean(double value) => Math.Abs(value) < 1e-6 ? 0 : value;
}
