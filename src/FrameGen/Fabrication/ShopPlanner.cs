using System.Globalization;
using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Fabrication;

/// <summary>Turns a cut frame into the shop's parts and totals.</summary>
public static class ShopPlanner
{
    /// <summary>Plans the shop's work.</summary>
    /// <remarks>
    /// Tubes of one shape are one part (<see cref="PartSorter"/>). Parts stand in the order a shop cuts them: by section (shape,
    /// then size), by material, long ones first, then by mark and hand. Lengths are compared as the cut list prints them, so that
    /// rounding noise does not decide.
    /// </remarks>
    /// <param name="cut">The frame.</param>
    /// <param name="diagnostics">A piece longer than any bar: an error.</param>
    /// <returns>The package, or null when an error was reported.</returns>
    public static ShopPackage? Plan(CutFrame cut, DiagnosticList diagnostics)
    {
        SizedFrame sized = cut.Sized;
        FrameModel model = sized.Model;
        IReadOnlyList<PartGroup> groups = PartSorter.Sort(cut);
        IReadOnlyList<string> marks = Marks.Of(model, groups);
        IReadOnlyList<Part> parts =
        [
            .. groups.SelectMany((g, i) => Hands(sized, g, marks[i]))
                .OrderBy(p => sized.SectionOf(p.Drawn.Tube).Shape, StringComparer.Ordinal)
                .ThenBy(p => sized.SectionOf(p.Drawn.Tube).Height)
                .ThenBy(p => sized.SectionOf(p.Drawn.Tube).Width)
                .ThenBy(p => sized.SectionOf(p.Drawn.Tube).Wall)
                .ThenBy(p => model.Groups[model.Tubes[p.Drawn.Tube].Group].Material.Name, StringComparer.Ordinal)
                .ThenByDescending(p => Math.Round(p.Drawn.CutLength, 3))
                .ThenBy(p => p.Mark, StringComparer.Ordinal)
                .ThenBy(p => p.Hand, StringComparer.Ordinal),
        ];
        return new StockPlanner(sized, diagnostics).Plan(parts) is { } stock ? new ShopPackage(cut, parts, Sum(cut), stock) : null;
    }

    /// <summary>One part, or two that are opposite hands. Which is A lies in the shape, so that it stays when tubes are added.</summary>
    private static IEnumerable<Part> Hands(SizedFrame sized, PartGroup group, string mark)
    {
        if (group.Opposite is not { } opposite)
        {
            return [Make(group, string.Empty)];
        }

        (string first, string second) = group.Shape.Chirality < 0 ? ("B", "A") : ("A", "B");
        return [Make(group, first), Make(opposite, second)];

        Part Make(PartGroup of, string hand) =>
            new(mark, hand, of.Placed, of.Shape.Cut, SeatTwist.Degrees(of.Shape.Cut), Note(sized, of.Shape.Cut));
    }

    private static Totals Sum(CutFrame cut)
    {
        double mass = 0;
        double weld = 0;
        double area = 0;
        Vector3 moment = Vector3.Zero;
        foreach (CutTube tube in cut.Tubes)
        {
            mass += tube.MassKg;
            moment += tube.MassKg * tube.Centroid;
            area += tube.OuterArea;
            weld += WeldPlanner.LengthOf(tube.Tube, tube.From) + WeldPlanner.LengthOf(tube.Tube, tube.To);
        }

        return new Totals(mass, mass > 0 ? moment / mass : Vector3.Zero, weld, area);
    }

    private static string Note(SizedFrame sized, CutTube tube)
    {
        var notes = new List<string>();
        int bends = TubeBend.Of(sized.Model.Tubes[tube.Tube]).Count;
        if (bends > 0)
        {
            notes.Add(bends == 1 ? "1 bend; cut length is straightened" : string.Create(CultureInfo.InvariantCulture, $"{bends} bends; cut length is straightened"));
        }

        if (sized.Model.Fabrication.Cut == CutMode.Contour && (tube.From.Kind == CutKind.Cope || tube.To.Kind == CutKind.Cope))
        {
            notes.Add("contour cut");
        }

        if (WiderThanSeat(sized, tube, End.From))
        {
            notes.Add("from end wider than its seat: fill by hand");
        }

        if (WiderThanSeat(sized, tube, End.To))
        {
            notes.Add("to end wider than its seat: fill by hand");
        }

        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            if (tube[end].Vent is { } vent)
            {
                double clock = double.RadiansToDegrees(vent.Clock);
                double along = end == End.From ? vent.T : sized.Model.Tubes[tube.Tube].Length - vent.T;
                notes.Add(string.Create(
                    CultureInfo.InvariantCulture,
                    $"{(end == End.From ? "from" : "to")} end: drill {vent.Diameter:0.###} mm vent at y {along:0.0} mm, clock {(clock < 0 ? clock + 360 : clock):0}"));
            }
        }

        return string.Join("; ", notes);
    }

    /// <summary>True where half the tube's width and the offset reach past the seat's side, by more than rounding.</summary>
    private static bool WiderThanSeat(SizedFrame sized, CutTube cut, End which)
    {
        (int tube, EndCut end) = (cut.Tube, cut[which]);
        if (end.Kind != CutKind.Cope || end.Contacts.Count == 0)
        {
            return false;
        }

        FrameModel model = sized.Model;
        Contact seat = end.Contacts[0];
        (double own, double allowed) = JointFit.HalfWidths(
            model.Tubes[tube], which, sized.SectionOf(tube), model.StraightAt(seat.Tube, model.Tubes[tube][which].Node), sized.SectionOf(seat.Tube));
        return own + seat.Offset > allowed + Lengths.Same;
    }
}
