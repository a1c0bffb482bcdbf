using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Targets;

/// <summary>A floor for a tube's bending stiffness EI, its torsional stiffness GJ, or both (then the nearer to its floor is reported); N·m².</summary>
internal sealed class MemberStiffnessCheck(FrameModel model, MemberStiffnessTarget target) : MemberCheck(model, target)
{
    private const double SquareMetre = 1e6;

    /// <inheritdoc/>
    public override double Ratio(Tube tube, Section section)
    {
        (double bending, double torsion) = Ratios(tube, section);
        return Math.Max(bending, torsion);
    }

    /// <inheritdoc/>
    public override TargetResult Result(DesignAnalysis analysis)
    {
        int worst = WorstTube(analysis.Sections);
        Tube tube = Model.Tubes[worst];
        Section section = analysis.Sections[tube.Group];
        Material material = MaterialOf(tube);
        (double bending, double torsion) = Ratios(tube, section);
        (string what, double value, double limit, double ratio) = bending >= torsion
            ? ("bending stiffness EI", material.E * Bending(section), target.MinBendingStiffness ?? 0, bending)
            : ("torsional stiffness GJ", material.G * section.J, target.MinTorsionalStiffness ?? 0, torsion);
        return new TargetResult(
            target.Index, Kind, $"{target.Subject}, {what}", value / SquareMetre, limit / SquareMetre, "N.m2", ratio, Where(worst));
    }

    private (double Bending, double Torsion) Ratios(Tube tube, Section section)
    {
        Material material = MaterialOf(tube);
        return (
            (target.MinBendingStiffness ?? 0) / (material.E * Bending(section)),
            (target.MinTorsionalStiffness ?? 0) / (material.G * section.J));
    }
}
