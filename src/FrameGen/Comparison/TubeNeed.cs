using FrameGen.Mechanics.Materials;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Comparison;

/// <summary>The stiffness that a tube of a frame has to have.</summary>
public static class TubeNeed
{
    /// <summary>What of a tube's stiffness is kept where no target of its own says so.</summary>
    public enum Kept
    {
        /// <summary>EI.</summary>
        Bending,

        /// <summary>GJ.</summary>
        Torsion,

        /// <summary>EI and GJ.</summary>
        Both,
    }

    /// <summary>What the member targets on the tube ask for; where there are none, what it has with its section.</summary>
    /// <param name="sized">The frame with its sizes.</param>
    /// <param name="tube">Index of the tube.</param>
    /// <param name="kept">What is kept where no target names the tube.</param>
    /// <param name="along">Which way it is bent; null for what its targets say, or the weaker way.</param>
    public static StiffnessNeed Of(SizedFrame sized, int tube, Kept kept, BendingDirection? along)
    {
        MemberTarget[] targets = [.. sized.Model.Targets.OfType<MemberTarget>().Where(t => t.Tubes.Contains(tube))];
        return targets.Length > 0 ? OfTargets(sized.Model.Tubes[tube], targets, along) : OfSection(sized, tube, kept, along ?? BendingDirection.Weaker);
    }

    private static StiffnessNeed OfTargets(Tube tube, MemberTarget[] targets, BendingDirection? along)
    {
        double bending = 0;
        double torsion = 0;
        foreach (MemberTarget target in targets)
        {
            bending = Math.Max(bending, target switch
            {
                MemberDeflectionTarget span => SpanStiffness.LeastBending(span.As, span.Load, tube.Length, span.Max),
                MemberStiffnessTarget floor => floor.MinBendingStiffness ?? 0,
                _ => 0,
            });
            torsion = Math.Max(torsion, target is MemberStiffnessTarget { MinTorsionalStiffness: { } least } ? least : 0);
        }

        BendingDirection[] ways = [.. targets.Select(t => t.Along).Distinct()];
        return new StiffnessNeed(
            bending > 0 ? bending : null,
            torsion > 0 ? torsion : null,
            along ?? (ways.Length == 1 ? ways[0] : BendingDirection.Weaker),
            $"what the member targets on {tube.Name} ask for");
    }

    private static StiffnessNeed OfSection(SizedFrame sized, int tube, Kept kept, BendingDirection along)
    {
        Material material = sized.Model.Groups[sized.Model.Tubes[tube].Group].Material;
        Profile own = Profile.Of(sized.SectionOf(tube));
        double second = new StiffnessNeed(1, null, along, string.Empty).SecondMoment(own);
        return new StiffnessNeed(
            kept == Kept.Torsion ? null : material.E * second,
            kept == Kept.Bending ? null : material.G * own.J,
            along,
            $"what {sized.Model.Tubes[tube].Name} has as {sized.SectionOf(tube).Name} of {material.Name}");
    }
}
