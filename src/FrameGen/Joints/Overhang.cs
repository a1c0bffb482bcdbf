using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Joints;

/// <summary>
/// A tube that runs through a node cuts as if it had no end. Where the node stands near its end, part of a coped tube is cut to fit
/// a wall that is not there.
/// </summary>
internal static class Overhang
{
    /// <summary>How far the cut line of a coped end reaches past the end of the tube that runs through, mm along that tube.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="coped">The cut tube.</param>
    /// <param name="end">Which end of it.</param>
    /// <param name="section">Its section.</param>
    /// <param name="through">The cut tube that runs through.</param>
    /// <param name="throughSection">Its section.</param>
    /// <returns>Millimetres past the long point of the end in question; 0 or less where all that touches it lands on metal.</returns>
    public static double Of(FrameModel model, CutTube coped, End end, Section section, CutTube through, Section throughSection)
    {
        Tube tube = model.Tubes[coped.Tube];
        TubeStraight seat = model.StraightAt(through.Tube, tube[end].Node);
        TubeAxes axes = tube.AxesAt(end);
        Vector3 start = tube[end].Point;
        Vector3 into = tube.Into(end);
        EndCut cut = coped[end];

        // A radial cut stands off the mate by no more than the wall.
        double reach = cut.Gap + section.Wall;
        double past = double.NegativeInfinity;
        foreach (CurvePoint point in cut.Outer.Points)
        {
            (double sin, double cos) = Math.SinCos(point.Clock);
            Vector3 wall = section.Outline.RadiusAt(sin, cos) * axes.Radial(point.Clock);
            Vector3 place = start + wall + (point.T * into);
            double along = seat.Along(place);
            if (throughSection.Outline.Contains(seat.InSection(place), reach))
            {
                past = Math.Max(past, Math.Max(through.Start - along, along - through.Stop));
            }
        }

        return past;
    }
}
