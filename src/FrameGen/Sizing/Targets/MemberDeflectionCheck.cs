using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Spec;

namespace FrameGen.Sizing.Targets;

/// <summary>
/// Deflection of a tube thought of alone, plain bending over its axis length (<see cref="SpanStiffness"/>).
/// </summary>
internal sealed class MemberDeflectionCheck(FrameModel model, MemberDeflectionTarget target) : MemberCheck(model, target)
{
    /// <inheritdoc/>
    public override double Ratio(Tube tube, Section section) => Deflection(tube, section) / target.Max;

    /// <inheritdoc/>
    public override TargetResult Result(DesignAnalysis analysis)
    {
        int worst = WorstTube(analysis.Sections);
        string held = target.As switch
        {
            SpanKind.Cantilever => "a cantilever",
            SpanKind.SimplySupported => "a simply supported span",
            _ => "a span clamped at both ends",
        };
        double deflection = Deflection(Model.Tubes[worst], analysis.Sections[Model.Tubes[worst].Group]);
        return new TargetResult(
            target.Index,
            Kind,
            $"{target.Subject} as {held} under {Wording.Number(target.Load)} N",
            deflection,
            target.Max,
            "mm",
            deflection / target.Max,
            Where(worst));
    }

    private double Deflection(Tube tube, Section section)
    {
        double length = tube.Length;
        return Math.Abs(target.Load) * length * length * length / (SpanStiffness.Share(target.As) * MaterialOf(tube).E * Bending(section));
    }
}
