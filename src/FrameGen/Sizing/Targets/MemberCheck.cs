using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Spec;

namespace FrameGen.Sizing.Targets;

/// <summary>A closed-form limit on single tubes: settled group by group, before any frame is analysed.</summary>
internal abstract class MemberCheck(FrameModel model, MemberTarget target) : TargetCheck(model, target)
{
    /// <inheritdoc/>
    public override string Kind => "member";

    /// <inheritdoc/>
    public override int Cost => 0;

    /// <inheritdoc/>
    public override bool NeedsFrame => false;

    /// <summary>Share of the limit that a tube uses with a section.</summary>
    public abstract double Ratio(Tube tube, Section section);

    /// <inheritdoc/>
    public override double Ratio(DesignAnalysis analysis)
    {
        int worst = WorstTube(analysis.Sections);
        return Ratio(Model.Tubes[worst], analysis.Sections[Model.Tubes[worst].Group]);
    }

    /// <inheritdoc/>
    public override double? RatioOf(DesignAnalysis analysis, int tube) =>
        target.Tubes.Contains(tube) ? Ratio(Model.Tubes[tube], analysis.Sections[Model.Tubes[tube].Group]) : null;

    /// <inheritdoc/>
    public override bool Allows(int group, Section section)
    {
        for (int i = 0; i < target.Tubes.Count; i++)
        {
            Tube tube = Model.Tubes[target.Tubes[i]];
            if (tube.Group == group && !(Ratio(tube, section) <= 1))
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Whether the target names a tube of a group.</summary>
    public bool Concerns(int group) => target.Tubes.Any(t => Model.Tubes[t].Group == group);

    /// <summary>Second moment of area that bends, mm⁴.</summary>
    protected double Bending(Section section) => target.Along switch
    {
        BendingDirection.Top => section.Iy,
        BendingDirection.Side => section.Iz,
        _ => Math.Min(section.Iy, section.Iz),
    };

    protected Material MaterialOf(Tube tube) => Model.Groups[tube.Group].Material;

    /// <summary>Index of the tube that uses most of the limit, the first of equals.</summary>
    protected int WorstTube(Section[] sections)
    {
        int worst = target.Tubes[0];
        double most = double.NegativeInfinity;
        for (int i = 0; i < target.Tubes.Count; i++)
        {
            Tube tube = Model.Tubes[target.Tubes[i]];
            double ratio = Ratio(tube, sections[tube.Group]);
            if (ratio > most)
            {
                (worst, most) = (target.Tubes[i], ratio);
            }
        }

        return worst;
    }

    /// <summary>The deciding tube's name, where there is more than one.</summary>
    protected string Where(int tube) => target.Tubes.Count > 1 ? Model.Tubes[tube].Name : "";
}
