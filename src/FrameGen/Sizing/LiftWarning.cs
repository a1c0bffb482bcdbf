using FrameGen.Diagnostics;
using FrameGen.Model;

namespace FrameGen.Sizing;

/// <summary>
/// A support that has to pull the frame down where a case lifts it: a wheel or a foot can't. A support that holds a rotation too is
/// bolted or welded down, and can pull.
/// </summary>
internal static class LiftWarning
{
    // Pulls below this share of the largest force at any support of the case are rounding.
    private const double Noise = 1e-6;

    /// <summary>Warns of each such support once, at its worst case.</summary>
    public static void Look(FrameModel model, IReadOnlyList<CaseResult> cases, DiagnosticList diagnostics)
    {
        for (int support = 0; support < model.Supports.Count; support++)
        {
            Support held = model.Supports[support];
            if (!held.Resists(2) || held.ResistsTurning)
            {
                continue;
            }

            var pulled = new List<(int Case, double Pull)>();
            foreach (CaseResult result in cases)
            {
                double largest = result.Reactions.Count == 0 ? 0 : result.Reactions.Max(r => r.Force.Length);
                IReadOnlyList<int> acting = model.Cases[result.Case].Supports;
                for (int i = 0; i < acting.Count; i++)
                {
                    double pull = -result.Reactions[i].Force.Z;
                    if (acting[i] == support && pull > Noise * largest)
                    {
                        pulled.Add((result.Case, pull));
                    }
                }
            }

            if (pulled.Count > 0)
            {
                (int worst, double pull) = pulled.MaxBy(p => p.Pull);
                string others = pulled.Count == 1
                    ? ""
                    : $" (also in {Wording.List([.. pulled.Where(p => p.Case != worst).Select(p => model.Cases[p.Case].Name)])})";
                diagnostics.Warning(
                    held.At,
                    $"support {model.Nodes[held.Node].Name} has to pull the frame down with {Wording.Number(pull)} N in case "
                    + $"{model.Cases[worst].Name}{others}: a wheel or a foot can't; bolt it down, or leave it out of that case's `supports`");
            }
        }
    }
}
