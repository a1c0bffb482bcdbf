using FrameGen.Joints;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Sizing.Explanation;

/// <summary>Says why a tube has its size, and what cuts its ends.</summary>
public static class TubeExplainer
{
    /// <summary>So many lighter sizes are tried.</summary>
    public const int MostLighter = 5;

    /// <summary>So many heavier ones are, in place of a size that the spec gives.</summary>
    public const int MostHeavier = 2;

    // Areas and prices closer than this, relative, are the same.
    private const double Same = 1e-9;

    private const double MillimetresPerMetre = 1000;

    // More wall that gives less than this share of the limit per percent gives nothing but rounding.
    private const double LeastSlope = 1e-6;

    /// <summary>Explains a tube.</summary>
    /// <param name="sized">The frame.</param>
    /// <param name="tube">Index of the tube.</param>
    /// <param name="inStock">Sizes that could stand in for one that the spec gives; empty where no stock list holds it.</param>
    /// <exception cref="ArgumentOutOfRangeException">The frame has no such tube.</exception>
    public static TubeExplanation Explain(SizedFrame sized, int tube, IReadOnlyList<Candidate> inStock)
    {
        ArgumentNullException.ThrowIfNull(sized);
        ArgumentOutOfRangeException.ThrowIfNegative(tube);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(tube, sized.Model.Tubes.Count);

        int group = sized.Model.Tubes[tube].Group;
        SizeOrigin origin = OriginOf(sized.Model.Groups[group]);
        Candidate[] others = Others(sized, group, inStock);
        bool byCost = sized.Model.Sizing.Objective == SizingObjective.Cost && others.Append(sized.Chosen[group]).All(c => c.PricePerMetre is not null);
        double own = Least(sized.Chosen[group]);
        others = [.. others.OrderBy(Least).ThenBy(c => c.Section.Area).ThenBy(c => c.Section.Name, StringComparer.Ordinal)];
        Candidate[] lighter = [.. others.Where(c => Least(c) < own * (1 - Same)).Reverse()];
        Candidate[] heavier = [.. origin == SizeOrigin.Given ? others.Where(c => Least(c) > own * (1 + Same)).Take(MostHeavier) : []];
        TriedSize[] tried = Try(sized, group, [.. heavier.Reverse(), .. lighter.Take(MostLighter)]);
        TriedSize[] lighterTried = [.. tried.Skip(heavier.Length)];
        return new TubeExplanation(
            sized,
            tube,
            origin,
            lighterTried,
            lighter.Length,
            Drives(sized, group, lighterTried),
            [EndExplainer.Explain(sized, tube, End.From), EndExplainer.Explain(sized, tube, End.To)])
        {
            IsByCost = byCost,
            Heavier = [.. tried.Take(heavier.Length)],
            Today = sized.Today?.Chosen[group] is { } today && !today.Nominal.Equals(sized.Chosen[group].Nominal) ? today : null,
        };

        double Least(Candidate candidate) => byCost ? candidate.PricePerMetre!.Value : candidate.Section.Area;
    }

    private static SizeOrigin OriginOf(TubeGroup group) => group switch
    {
        { IsFrozen: true } => SizeOrigin.Frozen,
        { IsFixed: true } => SizeOrigin.Given,
        { Candidates.Count: 1 } => SizeOrigin.OnlyOne,
        _ => SizeOrigin.Chosen,
    };

    // What the group could have instead: its candidates, those it had before it was pinned, or sizes in stock like one that the spec gives.
    private static Candidate[] Others(SizedFrame sized, int group, IReadOnlyList<Candidate> inStock)
    {
        TubeGroup free = sized.Model.Frozen?.Free.Groups[group] ?? sized.Model.Groups[group];
        return
        [
            .. (free.IsFixed ? inStock : free.Candidates)
                .Where(c => !c.Nominal.Equals(sized.Chosen[group].Nominal)),
        ];
    }

    private static TriedSize[] Try(SizedFrame sized, int group, Candidate[] sizes)
    {
        if (sizes.Length == 0)
        {
            return [];
        }

        // What is amiss with a joint already is not the lighter size's doing.
        var now = Reanalysis.With(sized, group, sized.Chosen[group]);
        double length = sized.Model.Tubes.Where(t => t.Group == group).Sum(t => t.Length);
        double density = sized.Model.Groups[group].Material.Density;
        return
        [
            .. sizes.Select(size =>
            {
                var with = Reanalysis.With(sized, group, size);
                FitProblem? refusal = with.Fits.FirstOrDefault(f => !now.Fits.Any(n => (n.Kind, n.End, n.Mate) == (f.Kind, f.End, f.Mate)));
                TargetResult[] broken = [.. (with.Targets ?? []).Where(t => !t.Met).OrderByDescending(t => t.Ratio).ThenBy(t => t.Index)];
                SizeVerdict verdict = refusal is not null ? SizeVerdict.DoesNotFit
                    : with.Targets is null ? SizeVerdict.CannotBeSolved
                    : broken.Length > 0 ? SizeVerdict.BreaksTarget
                    : with.HasTooManySizes && !now.HasTooManySizes ? SizeVerdict.TooManySizes
                    : SizeVerdict.WouldDo;
                double saves = density * (sized.Sections[group].Area - size.Section.Area) * length;
                return new TriedSize(size, saves, verdict, broken, refusal is null ? "" : FitReport.Words(sized.Model, refusal, with.Sections))
                {
                    Problem = refusal,
                    SavesCost = (sized.Chosen[group].PricePerMetre - size.PricePerMetre) * length / MillimetresPerMetre,
                };
            }),
        ];
    }

    private static TargetDrive[] Drives(SizedFrame sized, int group, TriedSize[] tried)
    {
        if (sized.Targets.Count == 0)
        {
            return [];
        }

        var slopes = Sensitivities.Of(sized, group);
        double mass = sized.Model.Groups[group].Material.Density * sized.Sections[group].Area * sized.Model.Tubes.Where(t => t.Group == group).Sum(t => t.Length);
        return
        [
            .. sized.Targets.Select((target, i) => new TargetDrive(
                target,
                tried.Count(t => t.Broken.Any(b => b.Index == target.Index)),
                slopes.PerStiffness(i),
                slopes.PerMass(i),

                // With the same share used, value and limit go together: d(mass)/mass = d(limit)/limit · ratio / slope.
                slopes.PerMass(i) is { } slope && slope < -LeastSlope && double.IsFinite(target.Ratio) ? mass * target.Ratio / (target.Limit * -slope) : null)),
        ];
    }
}
