using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Fabrication;

/// <summary>Lists the seams of a cut frame.</summary>
public static class WeldPlanner
{
    private const double FilletFrom = Math.PI / 3;
    private const double FilletTo = 2 * Math.PI / 3;
    private const double Step = Math.PI / 720; // a quarter of a degree
    private const double Inside = 1e-3;
    private const double Nudge = 1e-6;

    /// <summary>All seams.</summary>
    public static WeldList Plan(CutFrame cut) =>
        new([.. cut.Sized.Joints.SelectMany(j => j.Ends.Where(e => IsSeam(cut, e)).Select(e => Seam(cut, j.Node, e)))]);

    private static bool IsSeam(CutFrame cut, TubeEndId id) => LengthOf(id.Tube, cut.Tubes[id.Tube][id.End]) > 0;

    /// <summary>The outer curve of a coped or mitred end, mm; a miter is counted at the first of its two tubes only.</summary>
    /// <param name="tube">Index of the tube.</param>
    /// <param name="end">One of its ends.</param>
    public static double LengthOf(int tube, EndCut end) => end.Kind switch
    {
        CutKind.Cope => end.OuterLength,
        CutKind.Miter when end.Contacts.All(c => c.Tube > tube) => end.OuterLength,
        _ => 0,
    };

    private static WeldSeam Seam(CutFrame cut, int node, TubeEndId id)
    {
        SizedFrame sized = cut.Sized;
        EndCut end = cut.Tubes[id.Tube][id.End];
        double leg = end.Contacts.Select(c => Thickness(sized.SectionOf(c.Tube))).Append(Thickness(sized.SectionOf(id.Tube))).Min();
        bool isWelded = IsWelded(sized, id.Tube) && end.Contacts.All(c => IsWelded(sized, c.Tube));
        (double fillet, double area, double least, double most) = end.Kind == CutKind.Cope
            ? Walk(cut, id, end, leg)
            : (0, leg * leg / 2, Math.PI, Math.PI);
        double density = sized.Model.Groups[sized.Model.Tubes[id.Tube].Group].Material.Density;
        return new WeldSeam(
            node, id, end.OuterLength, fillet * end.OuterLength, least, most, leg, isWelded ? area * end.OuterLength * density : 0, isWelded);
    }

    // A rod is no thicker to a weld than a heavy tube.
    private static double Thickness(Section section) => section is Rod rod ? rod.Diameter / 4 : section.Wall;

    private static bool IsWelded(SizedFrame sized, int tube) => sized.Model.Groups[sized.Model.Tubes[tube].Group].Welded;

    /// <summary>
    /// Walks along the curve: share of a fillet, mean area of the filler's cross-section, least and greatest angle. A fillet of
    /// equal legs z at an angle ψ has z² sin ψ / 2; a butt weld is taken for one at a right angle, z²/2 (common practice, no source).
    /// </summary>
    private static (double Fillet, double Area, double Least, double Most) Walk(CutFrame cut, TubeEndId id, EndCut end, double leg)
    {
        Outline own = cut.Sized.SectionOf(id.Tube).Outline;
        (double length, double fillet, double area) = (0, 0, 0);
        (double least, double most) = (Math.PI, 0);
        IReadOnlyList<CurvePoint> points = end.Outer.Points;
        for (int i = 1; i < points.Count; i++)
        {
            (CurvePoint from, CurvePoint to) = (points[i - 1], points[i]);
            int parts = (int)Math.Max(1, Math.Ceiling((to.Clock - from.Clock) / Step));
            double round = (own.DistanceAt(to.Clock) - own.DistanceAt(from.Clock)) / parts;
            double along = (to.T - from.T) / parts;
            double piece = Math.Sqrt((round * round) + (along * along));
            for (int part = 0; part < parts && piece > 0; part++)
            {
                // Just inside the piece: at a corner of the curve the mate changes, and the angle jumps.
                double first = At((part + Inside) / parts);
                double last = At((part + 1 - Inside) / parts);
                double share = FilletShare(first, last);
                double middle = (Math.Clamp(first, FilletFrom, FilletTo) + Math.Clamp(last, FilletFrom, FilletTo)) / 2;
                length += piece;
                fillet += piece * share;
                area += piece * leg * leg / 2 * ((share * Math.Sin(middle)) + 1 - share);
                (least, most) = (Math.Min(least, Math.Min(first, last)), Math.Max(most, Math.Max(first, last)));
            }

            double At(double share) => AngleAt(cut, id, end, from.Clock + (share * (to.Clock - from.Clock)), from.T + (share * (to.T - from.T)));
        }

        return length > 0 ? (fillet / length, area / length, least, most) : (0, leg * leg / 2, Math.PI, Math.PI);
    }

    // The angle runs straight from one to the other over so short a piece.
    private static double FilletShare(double first, double last)
    {
        (double low, double high) = first < last ? (first, last) : (last, first);
        double inside = Math.Min(high, FilletTo) - Math.Max(low, FilletFrom);
        return high - low < 1e-12 ? (inside >= 0 ? 1 : 0) : Math.Max(0, inside) / (high - low);
    }

    /// <summary>The angle between the tube's outer surface and that of the mate nearest to a point of its cut, measured in the open, rad.</summary>
    private static double AngleAt(CutFrame cut, TubeEndId id, EndCut end, double clock, double t)
    {
        Tube tube = cut.Sized.Model.Tubes[id.Tube];
        TubeAxes axes = tube.AxesAt(id.End);
        (double sin, double cos) = Math.SinCos(clock);
        Outline own = cut.Sized.SectionOf(id.Tube).Outline;
        Vector3 at = tube[id.End].Point + (t * tube.Into(id.End)) + (own.RadiusAt(sin, cos) * axes.Radial(clock));
        Vector3 normal = Normal(own, axes, clock);
        double nearest = double.PositiveInfinity;
        double angle = Math.PI;
        foreach (Contact contact in end.Contacts)
        {
            TubeStraight mate = cut.Sized.Model.StraightAt(contact.Tube, tube[id.End].Node);
            Outline skin = cut.Sized.SectionOf(contact.Tube).Outline;
            (double z, double y) = mate.InSection(at);
            double radius = Math.Sqrt((z * z) + (y * y));
            double off = radius > 0 ? Math.Abs(radius - skin.RadiusAt(y / radius, z / radius) - end.Gap) : double.PositiveInfinity;
            if (off < nearest)
            {
                nearest = off;
                angle = Math.PI - normal.AngleTo(Normal(skin, mate.Axes, Math.Atan2(y, z)));
            }
        }

        return angle;
    }

    // Square to the curve r(θ): r along the ray less dr/dθ along the way round.
    private static Vector3 Normal(Outline outline, TubeAxes axes, double clock)
    {
        double Radius(double at) => outline.RadiusAt(Math.Sin(at), Math.Cos(at));
        double slope = (Radius(clock + Nudge) - Radius(clock - Nudge)) / (2 * Nudge);
        return ((Radius(clock) * axes.Radial(clock)) - (slope * axes.Radial(clock + (Math.PI / 2)))).Normalized();
    }
}
