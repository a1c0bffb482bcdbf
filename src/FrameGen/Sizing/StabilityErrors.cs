using FrameGen.Diagnostics;
using FrameGen.Mechanics.Stability;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing;

/// <summary>Refuses buckling factors and frequencies that rounding has spoilt.</summary>
internal static class StabilityErrors
{
    // By this a factor can be wrong at most, relative; it is about the square of this.
    private const double LargestResidual = 1e-5;

    /// <summary>Reports every factor and frequency whose error is too large.</summary>
    /// <returns>True when there is none.</returns>
    public static bool None(DesignAnalysis analysis, DiagnosticList diagnostics)
    {
        FrameModel model = analysis.Space.Model;
        bool sound = true;
        for (int c = 0; c < (analysis.Structure?.Cases.Count ?? 0); c++)
        {
            Ask(analysis.Stability.Case(c)?.Residual ?? 0, $"the buckling factor of case {model.Cases[c].Name}", model.Cases[c].At);
        }

        if (analysis.Structure?.VibrationSolver is not null)
        {
            foreach (VibrationMode mode in analysis.Stability.Modes())
            {
                Ask(mode.Residual, "a frequency", model.Targets.OfType<FrequencyTarget>().FirstOrDefault()?.At);
            }
        }

        return sound;

        void Ask(double error, string what, SourcePlace? at)
        {
            // "Not within", so that NaN is refused as well.
            if (!(error <= LargestResidual))
            {
                diagnostics.Error(
                    at,
                    $"{what} can't be trusted: it is off by up to {Wording.Number(error)} of itself (allowed {Wording.Number(LargestResidual)}); very stiff and "
                    + "very soft tubes, or very short and very long ones, are joined: bring them closer together");
                sound = false;
            }
        }
    }
}
