using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Targets;

/// <summary>Linear buckling of the whole frame: the value is the lowest factor of the cases looked at.</summary>
internal sealed class BucklingCheck(FrameModel model, BucklingTarget target) : TargetCheck(model, target)
{
    /// <inheritdoc/>
    public override string Kind => "buckling";

    /// <inheritdoc/>
    public override int Cost => 100;

    /// <inheritdoc/>
    public override double Ratio(DesignAnalysis analysis) => target.MinFactor / Lowest(analysis).Factor;

    /// <inheritdoc/>
    public override bool IsMet(DesignAnalysis analysis)
    {
        // One case that buckles is enough.
        for (int c = 0; c < target.Cases.Count; c++)
        {
            if (!(target.MinFactor / Factor(analysis, target.Cases[c]) <= 1))
            {
                return false;
            }
        }

        return true;
    }

    /// <inheritdoc/>
    public override TargetResult Result(DesignAnalysis analysis)
    {
        (double factor, int loadCase) = Lowest(analysis);
        string where = loadCase < 0 ? "" : $"case {Model.Cases[loadCase].Name}, {analysis.Stability.WhereBuckling(loadCase)} moving most";
        return new TargetResult(target.Index, Kind, Cases(), factor, target.MinFactor, "", target.MinFactor / factor, where);
    }

    private static double Factor(DesignAnalysis analysis, int loadCase) =>
        analysis.Stability.Case(loadCase)?.Factor ?? double.PositiveInfinity;

    private (double Factor, int Case) Lowest(DesignAnalysis analysis)
    {
        (double Factor, int Case) lowest = (double.PositiveInfinity, -1);
        for (int c = 0; c < target.Cases.Count; c++)
        {
            double factor = Factor(analysis, target.Cases[c]);
            if (factor < lowest.Factor)
            {
                lowest = (factor, target.Cases[c]);
            }
        }

        return lowest;
    }

    private string Cases() => target.Cases.Count == Model.Cases.Count
        ? "all cases"
        : (target.Cases.Count == 1 ? "case " : "cases ") + Wording.List([.. target.Cases.Select(c => Model.Cases[c].Name)]);
}
