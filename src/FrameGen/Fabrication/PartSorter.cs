using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Fabrication;

/// <summary>Tubes that are one part, and those that are its opposite hand.</summary>
/// <param name="Shape">Of the first tube.</param>
/// <param name="Placed">Tubes of this hand, the first as drawn.</param>
internal sealed record PartGroup(PartShape Shape, List<Placement> Placed)
{
    /// <summary>The opposite hand; null where there is none.</summary>
    public PartGroup? Opposite { get; set; }
}

/// <summary>Finds out which tubes are the same part.</summary>
/// <remarks>
/// A tube is compared with the first tube of each part of its section and material and of about its length, so the work grows with
/// the tubes and not with their square. Being the same within a tolerance does not carry over from one to the next: the first tube of
/// a part, in the order of the spec, is what all others are held against.
/// </remarks>
internal static class PartSorter
{
    /// <summary>Buckets of lengths, mm: far wider than any tolerance, narrow enough to hold few parts.</summary>
    private const double Bucket = 1;

    /// <summary>Sorts a frame's tubes into parts, in the order of their first tubes.</summary>
    public static IReadOnlyList<PartGroup> Sort(CutFrame cut)
    {
        FrameModel model = cut.Sized.Model;
        var groups = new List<PartGroup>();
        var buckets = new Dictionary<(Section Section, string Material, long Length), List<int>>();
        var near = new List<int>();
        foreach (CutTube tube in cut.Tubes)
        {
            var shape = new PartShape(cut, tube);
            string material = model.Groups[model.Tubes[tube.Tube].Group].Material.Name;
            long bucket = (long)Math.Floor(tube.CutLength / Bucket);
            near.Clear();
            for (long b = bucket - 1; b <= bucket + 1; b++)
            {
                near.AddRange(buckets.GetValueOrDefault((shape.Section, material, b)) ?? []);
            }

            near.Sort();
            if (!Join(groups, near, shape, model.Fabrication.Tolerance))
            {
                if (!buckets.TryGetValue((shape.Section, material, bucket), out List<int>? here))
                {
                    buckets.Add((shape.Section, material, bucket), here = []);
                }

                here.Add(groups.Count);
                groups.Add(new PartGroup(shape, [new Placement(tube.Tube, 0, Swapped: false)]));
            }
        }

        return groups;
    }

    private static bool Join(List<PartGroup> groups, List<int> near, PartShape shape, double tolerance)
    {
        foreach (int i in near)
        {
            foreach (PartGroup? hand in (ReadOnlySpan<PartGroup?>)[groups[i], groups[i].Opposite])
            {
                if (hand is not null && new PartMatch(hand.Shape, shape, tolerance).Find(mirrored: false) is { } placement)
                {
                    hand.Placed.Add(placement);
                    return true;
                }
            }
        }

        foreach (int i in near)
        {
            if (groups[i].Opposite is null && new PartMatch(groups[i].Shape, shape, tolerance).Find(mirrored: true) is not null)
            {
                groups[i].Opposite = new PartGroup(shape, [new Placement(shape.Cut.Tube, 0, Swapped: false)]);
                return true;
            }
        }

        return false;
    }
}
