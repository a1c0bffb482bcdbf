using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Joints;

/// <summary>Puts two cut ends together to a tube: length, volume, centre of mass, surface.</summary>
internal static class TubeMeasure
{
    /// <summary>Measures a cut tube.</summary>
    /// <remarks>
    /// V = ∫ (L − t_to − t_from) dA over the metal of the section, and likewise its moments. A bend has the volume and the skin of a
    /// straight as long as its axis (Pappus), since the centres of the section and of its outline lie on the axis.
    /// </remarks>
    public static CutTube Measure(FrameModel model, int index, Section section, CutterEnd from, CutterEnd to)
    {
        Tube tube = model.Tubes[index];
        double length = tube.Length;
        double area = section.Outline.Area - section.Bore.Area;
        (EndMoments a, EndMoments b) = (from.Moments, to.Moments);
        double volume = (area * length) - a.T - b.T;
        Vector3 moment = Uncut(tube, section) - Taken(tube, End.From, a) - Taken(tube, End.To, b);
        double surface = (section.Outline.Perimeter * length) - a.Skin - b.Skin;
        double start = Least(from.Cut, section.Bore);
        double stop = length - Least(to.Cut, section.Bore);
        return new CutTube(
            index,
            from.Cut,
            to.Cut,
            start,
            stop,
            volume,
            volume * model.Groups[tube.Group].Material.Density,
            tube.From.Point + (moment / volume),
            surface);
    }

    // ∫ (p − start) dV between the end points of the axis, cut square there.
    private static Vector3 Uncut(Tube tube, Section section)
    {
        double area = section.Outline.Area - section.Bore.Area;
        if (tube.Bent is not { } bent)
        {
            return area * tube.Length * tube.Length / 2 * tube.Axes.X;
        }

        double secondZ = section.Outline.SecondMomentX - section.Bore.SecondMomentX;
        double secondY = section.Outline.SecondMomentY - section.Bore.SecondMomentY;
        Vector3 moment = Vector3.Zero;
        foreach (PathPiece piece in bent.Pieces)
        {
            Vector3 origin = piece.Origin - tube.From.Point;
            moment += piece.IsArc
                ? OfArc(piece, origin, bent.Carry(tube.Axes, piece.Start), area, secondZ, secondY)
                : area * piece.Length * (origin + (piece.Length / 2 * piece.Along));
        }

        return moment;
    }

    // A place x outside of the axis and w along the bend's own axis: p = c + (R + x) u(φ) + w n, dV = (R + x) dφ dA.
    private static Vector3 OfArc(PathPiece arc, Vector3 origin, TubeAxes axes, double area, double secondZ, double secondY)
    {
        double angle = arc.Length / arc.Radius;
        (double sin, double cos) = Math.SinCos(angle);
        Vector3 outward = arc.Along.Cross(arc.About);
        Vector3 centre = origin - (arc.Radius * outward);
        Vector3 turned = (sin * outward) + ((1 - cos) * arc.Along);
        (Point2 x, Point2 w) = (axes.InSection(outward), axes.InSection(arc.About));
        double square = (x.X * x.X * secondZ) + (x.Y * x.Y * secondY);
        double product = (x.X * w.X * secondZ) + (x.Y * w.Y * secondY);
        return (area * arc.Length * centre) + (((area * arc.Radius * arc.Radius) + square) * turned) + (product * angle * arc.About);
    }

    // What an end's cut takes of that: the end stands on a straight, along which t runs.
    private static Vector3 Taken(Tube tube, End end, in EndMoments moments)
    {
        TubeAxes axes = tube.AxesAt(end);
        return (moments.T * (tube[end].Point - tube.From.Point))
            + (moments.HalfSquare * tube.Into(end)) + (moments.Cos * axes.Z) - (moments.Sin * axes.Y);
    }

    // A radially cut rod reaches no farther at its axis than round it.
    private static double Least(EndCut cut, Outline inner) =>
        inner.IsPoint && cut.Surface is RadialCope ? cut.Outer.Min : Math.Min(cut.Outer.Min, cut.Inner.Min);
}
