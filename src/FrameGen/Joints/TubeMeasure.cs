using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Joints;

/// <summary>Puts two cut ends together to a tube: length, volume, centre of mass, surface.</summary>
internal static class TubeMeasure
{
    /// <summary>Measures a cut tube.</summary>
    /// <remarks>V = ∫ (L − t_to − t_from) dA over the metal of the section, and likewise its moments.</remarks>
    public static CutTube Measure(FrameModel model, int index, Section section, CutterEnd from, CutterEnd to)
    {
        Tube tube = model.Tubes[index];
        double length = tube.Length;
        double area = section.Outline.Area - section.Bore.Area;
        (EndMoments a, EndMoments b) = (from.Moments, to.Moments);
        double volume = (area * length) - a.T - b.T;
        double along = (area * length * length / 2) - (length * b.T) + b.HalfSquare - a.HalfSquare;
        Vector3 across = (-(a.Cos + b.Cos) * tube.Axes.Z) + ((a.Sin + b.Sin) * tube.Axes.Y);
        Vector3 centroid = tube.From.Point + (((along * tube.Axes.X) + across) / volume);
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
            centroid,
            surface);
    }

    // A radially cut rod reaches no farther at its axis than round it.
    private static double Least(EndCut cut, Outline inner) =>
        inner.IsPoint && cut.Surface is RadialCope ? cut.Outer.Min : Math.Min(cut.Outer.Min, cut.Inner.Min);
}
