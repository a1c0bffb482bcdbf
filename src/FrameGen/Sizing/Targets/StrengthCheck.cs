using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Targets;

/// <summary>Von Mises stress against yield, the welded yield within reach of a weld: the value is the safety factor reached.</summary>
internal sealed class StrengthCheck : TargetCheck
{
    // A share so far above 1/factor that no rounding makes it meet the target again.
    private const double ClearlyAbove = 1 + 1e-12;

    private readonly StrengthTarget _target;
    private readonly int[] _tubes;

    public StrengthCheck(FrameModel model, StrengthTarget target)
        : base(model, target)
    {
        _target = target;
        var looked = new bool[model.Groups.Count];
        foreach (int group in target.Groups)
        {
            looked[group] = true;
        }

        _tubes = [.. Enumerable.Range(0, model.Tubes.Count).Where(t => looked[model.Tubes[t].Group])];
    }

    /// <inheritdoc/>
    public override string Kind => "strength";

    /// <inheritdoc/>
    public override int Cost => 3;

    /// <inheritdoc/>
    public override double Ratio(DesignAnalysis analysis) => _target.SafetyFactor * Worst(analysis, double.PositiveInfinity).Use.Share;

    /// <inheritdoc/>
    public override bool IsMet(DesignAnalysis analysis) =>
        _target.SafetyFactor * Worst(analysis, ClearlyAbove / _target.SafetyFactor).Use.Share <= 1;

    /// <inheritdoc/>
    public override TargetResult Result(DesignAnalysis analysis)
    {
        (TubeUse use, int tube, int loadCase) = Worst(analysis, double.PositiveInfinity);
        string where = tube < 0
            ? ""
            : $"{Model.Tubes[tube].Name} at {Wording.Number(use.At)} mm{(use.NearWeld ? ", near a weld" : "")}, case {Model.Cases[loadCase].Name}: "
                + $"{Wording.Number(use.Stress)} of {Wording.Number(use.Yield)} MPa";
        return new TargetResult(
            _target.Index,
            Kind,
            $"{Subject()}, {Cases()}",
            use.Share > 0 ? 1 / use.Share : double.PositiveInfinity,
            _target.SafetyFactor,
            "",
            _target.SafetyFactor * use.Share,
            where);
    }

    /// <inheritdoc/>
    public override double? RatioOf(DesignAnalysis analysis, int tube) => Array.IndexOf(_tubes, tube) < 0
        ? null
        : _target.SafetyFactor * _target.Cases.Max(c => TubeScan.MostUsed(analysis, c, tube).Share);

    private (TubeUse Use, int Tube, int Case) Worst(DesignAnalysis analysis, double enough)
    {
        (TubeUse Use, int Tube, int Case) worst = (default, -1, -1);
        for (int c = 0; c < _target.Cases.Count; c++)
        {
            foreach (int tube in _tubes)
            {
                TubeUse use = TubeScan.MostUsed(analysis, _target.Cases[c], tube, enough);
                if (!(use.Share <= worst.Use.Share))
                {
                    worst = (use, tube, _target.Cases[c]);
                    if (use.Share > enough)
                    {
                        return worst;
                    }
                }
            }
        }

        return worst;
    }

    private string Subject() => _tubes.Length == Model.Tubes.Count
        ? "all tubes"
        : Wording.List([.. _target.Groups.Select(g => Model.Groups[g].Name)]);

    private string Cases() => _target.Cases.Count == Model.Cases.Count
        ? "all cases"
        : (_target.Cases.Count == 1 ? "case " : "cases ") + Wording.List([.. _target.Cases.Select(c => Model.Cases[c].Name)]);
}
