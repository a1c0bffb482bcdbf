using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Spec;

namespace FrameGen.Sizing.Targets;

/// <summary>
/// Deflection of a tube thought of alone, plain bending over its axis length: PL³/3EI as a cantilever loaded at its end, PL³/48EI simply
/// supported and PL³/192EI clamped at both ends, loaded in the middle (Roark, Formulas for Stress and Strain, table 8.1).
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
        double share = target.As switch
        {
            SpanKind.Cantilever => 3,
            SpanKind.SimplySupported => 48,
            SpanKind.FixedFixed => 192,
            _ => throw new ArgumentOutOfRangeException(nameof(tube), target.As, "Not a kind of span."),
        };
        return Math.Abs(target.Load) * length * length * length / (share * MaterialOf(tube).E * Bending(section));
    }
}
