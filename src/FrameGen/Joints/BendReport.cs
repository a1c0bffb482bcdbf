using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Joints;

/// <summary>Says in a builder's words what is wrong with the bends of a cut frame.</summary>
internal static class BendReport
{
    /// <summary>A seat that bends away from a cut by less is filled by the weld, mm (common practice, no source).</summary>
    private const double Filled = 0.5;

    /// <summary>Outer sizes that the radius of a bend should have (common practice, no source).</summary>
    private const double EasyRadius = 2;

    /// <summary>Looks at every bent tube and at every end that lands on one.</summary>
    /// <param name="sized">The frame.</param>
    /// <param name="tubes">Its cut tubes.</param>
    /// <param name="diagnostics">Bends that can't be made, cuts that reach into bends: errors; tight bends: warnings.</param>
    /// <returns>True after an error.</returns>
    public static bool Report(SizedFrame sized, IReadOnlyList<CutTube> tubes, DiagnosticList diagnostics)
    {
        var found = new DiagnosticList();
        foreach (CutTube cut in tubes)
        {
            if (sized.Model.Tubes[cut.Tube].Bent is not null)
            {
                ReportBends(sized, cut, found);
                ReportEnd(sized.Model, cut, End.From, found);
                ReportEnd(sized.Model, cut, End.To, found);
            }

            ReportSeats(sized, cut, End.From, found);
            ReportSeats(sized, cut, End.To, found);
        }

        foreach (Diagnostic diagnostic in found)
        {
            diagnostics.Add(diagnostic);
        }

        return found.HasErrors;
    }

    // What is wrong with the original need not be said of its twin again.
    private static void ReportBends(SizedFrame sized, CutTube cut, DiagnosticList found)
    {
        Tube tube = sized.Model.Tubes[cut.Tube];
        if (tube.Original is not null)
        {
            return;
        }

        double size = sized.SectionOf(cut.Tube).OuterSize;
        IReadOnlyList<TubeBend> bends = TubeBend.Of(tube);
        if (bends[0].Radius <= size / 2)
        {
            found.Error(tube.At, $"tube {tube.Name}: can't be bent to a radius of {bends[0].Radius:0.##} mm, no more than half of its size of {size:0.##} mm; give a larger bend_radius, from {EasyRadius * size:0.##} mm up");
        }
        else if (bends[0].Radius < EasyRadius * size)
        {
            found.Warning(tube.At, $"tube {tube.Name}: its bend_radius of {bends[0].Radius:0.##} mm is less than {EasyRadius} x its size of {size:0.##} mm, so that its wall may fold inside the bend and thin outside; ask who bends it, or give {EasyRadius * size:0.##} mm or more");
        }

        double grip = sized.Model.Fabrication.Grip;
        foreach (TubeBend bend in bends)
        {
            // The first straight counts from the end of the sawn blank.
            double straight = bend.Number == 1 ? bend.Start - cut.Start : bend.Straight;
            if (straight < grip - Lengths.Same)
            {
                string where = bend.Number == 1 ? "before its first bend" : $"between its bends {bend.Number - 1} and {bend.Number}";
                string swap = bend.Number == 1 ? ", or change `from` and `to` where the other end has room" : string.Empty;
                found.Error(tube.At, $"tube {tube.Name}: has {straight:0.0##} mm of straight {where}, and the bender grips {grip:0.###} mm (fabrication: grip); move the corners of `via` apart, or give a smaller bend_radius{swap}");
            }
        }
    }

    private static void ReportEnd(FrameModel model, CutTube cut, End end, DiagnosticList found)
    {
        Tube tube = model.Tubes[cut.Tube];
        TubeStraight straight = tube.StraightAt(end);
        double room = straight.To - straight.From;
        double deepest = Math.Max(cut[end].Outer.Max, cut[end].Inner.Max);
        if (deepest > room + Lengths.Same)
        {
            found.Error(tube[end].At, $"{Name(model, cut.Tube, end)}: its cut reaches {deepest:0.0##} mm along the tube, and its bend begins {room:0.0##} mm from the node, so that {deepest - room:0.0##} mm of the cut would lie in the bend; move that corner of `via` away from the node, or give a smaller bend_radius");
        }
    }

    private static void ReportSeats(SizedFrame sized, CutTube cut, End end, DiagnosticList found)
    {
        if (cut[end].Kind != CutKind.Cope)
        {
            return;
        }

        FrameModel model = sized.Model;
        Tube tube = model.Tubes[cut.Tube];
        foreach (Contact contact in cut[end].Contacts.Where(c => model.Tubes[c.Tube].Bent is not null))
        {
            TubeStraight seat = model.StraightAt(contact.Tube, tube[end].Node);
            double into = IntoBend(tube, cut[end], end, sized.SectionOf(cut.Tube), seat, sized.SectionOf(contact.Tube).Outline);
            if (!(into > 0))
            {
                continue;
            }

            double radius = TubeBend.Of(model.Tubes[contact.Tube])[0].Radius;
            double away = radius * (1 - Math.Cos(Math.Min(into / radius, Math.PI)));
            string words = $"{Name(model, cut.Tube, end)}: its cut reaches {into:0.0##} mm into a bend of {model.Tubes[contact.Tube].Name}, which turns away there by {away:0.00#} mm from the straight that it is cut to";
            if (away > Filled)
            {
                found.Error(tube[end].At, $"{words}; move the node along {model.Tubes[contact.Tube].Name} away from the bend");
            }
            else if (away > model.Fabrication.Tolerance)
            {
                found.Warning(tube[end].At, $"{words}; file it to fit, or move the node away from the bend");
            }
        }
    }

    // How far the curve on the outer skin reaches past the end of its seat's straight, mm.
    private static double IntoBend(Tube tube, EndCut cut, End end, Section section, TubeStraight seat, Outline wall)
    {
        TubeAxes axes = tube.AxesAt(end);

        // A radial cut stands off the mate by no more than the wall.
        double reach = cut.Gap + section.Wall;
        double into = double.NegativeInfinity;
        foreach (CurvePoint point in cut.Outer.Points)
        {
            (double sin, double cos) = Math.SinCos(point.Clock);
            Vector3 place = tube[end].Point + (point.T * tube.Into(end)) + (section.Outline.RadiusAt(sin, cos) * axes.Radial(point.Clock));
            if (wall.Contains(seat.InSection(place), reach))
            {
                into = Math.Max(into, seat.IntoBend(seat.Along(place)));
            }
        }

        return into;
    }

    private static string Name(FrameModel model, int tube, End end) =>
        $"tube {model.Tubes[tube].Name}, {(end == End.From ? "from" : "to")} end at node {model.Nodes[model.Tubes[tube][end].Node].Name}";
}
