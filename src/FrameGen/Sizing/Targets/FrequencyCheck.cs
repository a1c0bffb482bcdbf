using FrameGen.Mechanics.Stability;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Targets;

/// <summary>The lowest natural frequency of the frame with its masses, on all its supports.</summary>
internal sealed class FrequencyCheck(FrameModel model, FrequencyTarget target) : TargetCheck(model, target)
{
    /// <inheritdoc/>
    public override string Kind => "frequency";

    /// <inheritdoc/>
    public override int Cost => 200;

    /// <inheritdoc/>
    public override double Ratio(DesignAnalysis analysis) => target.Min / Lowest(analysis);

    /// <inheritdoc/>
    public override TargetResult Result(DesignAnalysis analysis)
    {
        double lowest = Lowest(analysis);
        IReadOnlyList<VibrationMode> modes = analysis.Stability.Modes();
        string where = modes.Count == 0 ? "" : $"{analysis.Stability.Where(modes[0].Shape)} moving most";
        return new TargetResult(target.Index, Kind, "lowest of the frame with its masses", lowest, target.Min, "Hz", target.Min / lowest, where);
    }

    // A frame that can't move at all, held at every node, still has its tubes; so there is a mode but for a frame without any.
    private static double Lowest(DesignAnalysis analysis)
    {
        IReadOnlyList<VibrationMode> modes = analysis.Stability.Modes();
        return modes.Count == 0 ? double.PositiveInfinity : modes[0].Hertz;
    }
}
