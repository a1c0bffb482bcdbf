using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Joints;

/// <summary>Says in a builder's words what is wrong with a joint.</summary>
internal static class JointReport
{
    private static readonly double FeatherAngle = (15 - 0.0005) * Math.PI / 180;

    /// <summary>What can be said before anything is cut.</summary>
    /// <returns>Ends wider than their seats, which <see cref="ReportCut"/> tells of once it is known what of them lands.</returns>
    public static IReadOnlyList<FitProblem> Report(
        FrameModel model, NodeJoint joint, JointPlan plan, IReadOnlyList<Section> sections, DiagnosticList diagnostics)
    {
        string node = model.Nodes[joint.Node].Name;
        foreach (EndPlan end in plan.Ends)
        {
            Tube tube = model.Tubes[end.Id.Tube];
            TubeEnd place = tube[end.Id.End];
            string name = $"tube {tube.Name}, {Word(end.Id.End)} end at node {node}";
            if (end.Kind is CutKind.Cope or CutKind.Miter && place.Extend is { } extend)
            {
                string to = end.Kind == CutKind.Miter
                    ? $"mitred with {model.Tubes[end.Partner!.Value.Tube].Name}"
                    : $"coped to {Names(model, end.Mates)}";
                diagnostics.Error(place.At, $"{name}: `extend` ({extend:0.###} mm) can't be obeyed, since this end is {to}; remove `extend`, or give the end `cut: square`");
            }

            if (end.Kind == CutKind.Square && place.Cut == RequestedCut.Cope)
            {
                diagnostics.Warning(place.At, $"{name}: is asked to be coped, but no tube stands before it here, so it ends square; name the joint's `order` to have it fitted to another");
            }

            if (end.Partner is { } partner)
            {
                ReportMiter(model, end, partner, name, sections, diagnostics);
            }

            foreach (Mate mate in end.Mates)
            {
                (double own, double other) = JointFit.HalfWidths(
                    end.Frame, sections[tube.Group], mate.Axis, mate.Axes, sections[model.Tubes[mate.Tube].Group]);
                double distance = mate.Axis.DistanceTo(end.Frame.Axis);
                if (mate.Swallows && distance < own + other + place.Gap)
                {
                    diagnostics.Error(place.At, $"{name}: runs along inside {model.Tubes[mate.Tube].Name}, to which it should be coped; one of the two has to go another way");
                }
            }
        }

        if (diagnostics.HasErrors)
        {
            return [];
        }

        List<FitProblem> wide = [];
        foreach (FitProblem problem in JointFit.Check(model, plan, sections))
        {
            if (problem.Kind == FitProblemKind.WiderThanSeat)
            {
                wide.Add(problem);
            }
            else
            {
                ReportFit(model, node, problem, diagnostics);
            }
        }

        return wide;
    }

    /// <summary>What shows once an end is cut.</summary>
    public static void ReportCut(FrameModel model, EndPlan end, CutterEnd cut, FitProblem? wide, DiagnosticList diagnostics)
    {
        Tube tube = model.Tubes[end.Id.Tube];
        TubeEnd place = tube[end.Id.End];
        string name = $"tube {tube.Name}, {Word(end.Id.End)} end at node {model.Nodes[place.Node].Name}";
        double length = cut.Cut.Outer.Max - cut.Cut.Outer.Min;
        if (end.Kind == CutKind.Plane && Math.Asin(Math.Abs(end.Limit.Inward.Dot(end.Frame.Into))) is var slant && slant < FeatherAngle)
        {
            diagnostics.Warning(place.At, $"{name}: its plane crosses the tube at only {Degrees(slant)} degrees, so that its cut runs out in a feather edge {length:0.#} mm long; from 15 degrees up it can be welded sensibly");
        }

        if (end.Kind != CutKind.Cope)
        {
            return;
        }

        const string Open = "part of its wall meets nothing and stops square at the node";
        const string Remedy = "choose a smaller tube or a larger seat, or allow it with `wrap: true`";
        if (wide is not null)
        {
            string seat = model.Tubes[wide.Mate].Name;
            double beside = wide.Needed - wide.Allowed;
            string open = beside < model.Fabrication.Tolerance ? $"; the wall it leaves beside the seat is {beside:0.0###} mm thick, less than the tolerance of {model.Fabrication.Tolerance:0.0###} mm"
                : cut.PartlyMissing ? $"; {Open}" : string.Empty;
            diagnostics.Warning(place.At, $"{name}: is wider than its seat {seat}: half its width and the axes' offset make {wide.Needed:0.0##} mm, half the seat's width is {wide.Allowed:0.0##} mm{open}; {Remedy}");
        }
        else if (cut.PartlyMissing && place.Wrap)
        {
            diagnostics.Note(place.At, $"{name}: {Open}, as `wrap` allows");
        }
        else if (cut.PartlyMissing)
        {
            diagnostics.Warning(place.At, $"{name}: {Open}, since it reaches past the end of {model.Tubes[cut.Cut.Contacts[0].Tube].Name}; let that one run out farther with `extend`, change the `order`, or allow it with `wrap: true`");
        }

        foreach (Contact contact in cut.Cut.Contacts)
        {
            double angle = Math.Min(contact.Angle, Math.PI - contact.Angle);
            if (angle < FeatherAngle)
            {
                diagnostics.Warning(place.At, $"{name}: meets {model.Tubes[contact.Tube].Name} at only {Degrees(angle)} degrees, so that its cut runs out in a feather edge {length:0.#} mm long; from 15 degrees up it can be welded sensibly");
            }
        }
    }

    /// <summary>A tube of which the cuts leave nothing on some wall line: it lies within its mates, or its ends run into each other.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="index">The tube.</param>
    /// <param name="left">The least length left of a wall line, mm; negative where the cuts overlap.</param>
    /// <param name="first">Its from end.</param>
    /// <param name="last">Its to end.</param>
    /// <param name="diagnostics">Takes the error.</param>
    public static void ReportOverlap(FrameModel model, int index, double left, EndCut first, EndCut last, DiagnosticList diagnostics)
    {
        Tube tube = model.Tubes[index];
        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            EndCut cut = end == End.From ? first : last;
            double least = Math.Min(cut.Outer.Min, cut.Inner.Min);
            if (cut.Contacts.Count > 0 && least >= tube.Length)
            {
                string mates = string.Join(" and ", cut.Contacts.Select(c => model.Tubes[c.Tube].Name));
                string how = cut.Contacts.Count == 1 ? "is swallowed whole by" : "lies hidden inside";
                diagnostics.Error(tube[end].At, $"tube {tube.Name}, {Word(end)} end at node {model.Nodes[tube[end].Node].Name}: {how} {mates}: it would come out {least:0.0##} mm from the node, and is only {tube.Length:0.0##} mm long; make it longer, the tubes round it smaller, or leave it out");
                return;
            }
        }

        string from = model.Nodes[tube.From.Node].Name;
        string to = model.Nodes[tube.To.Node].Name;
        diagnostics.Error(tube.At, left > 0
            ? $"tube {tube.Name}: between its cuts at nodes {from} and {to} only {left:0.0###} mm of its wall is left on one side, less than the tolerance of {model.Fabrication.Tolerance:0.0###} mm; move the nodes apart, or change the `order` at one of them"
            : $"tube {tube.Name}: its cuts at nodes {from} and {to} overlap by {-left:0.0##} mm, so that nothing is left of it on one side; move the nodes apart, or change the `order` at one of them");
    }

    /// <summary>Breathing holes that can't be drilled.</summary>
    /// <returns>True where one can't.</returns>
    public static bool ReportVents(FrameModel model, int index, Section section, EndCut from, EndCut to, DiagnosticList diagnostics)
    {
        Tube tube = model.Tubes[index];
        bool failed = false;
        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            (EndCut own, EndCut other) = end == End.From ? (from, to) : (to, from);
            if (own.Vent is not { } vent)
            {
                continue;
            }

            string name = $"tube {tube.Name}, {Word(end)} end at node {model.Nodes[tube[end].Node].Name}";
            double most = Vent.Largest(section.Outline);
            double room = tube.Length - Math.Max(other.Outer.Max, other.Vent?.T + (other.Vent?.Diameter / 2) ?? double.NegativeInfinity);
            string? wrong = section is Rod
                ? "a rod is solid and has nothing to vent; remove `vent`"
                : vent.Diameter > most ? $"a vent of {vent.Diameter:0.###} mm is too large for {section.Name}, which takes {most:0.#} mm at most; give a smaller one"
                : vent.T + (vent.Diameter / 2) > room ? $"the tube is too short for a vent here: the hole would end {vent.T + (vent.Diameter / 2):0.#} mm from the node and the other end begins at {room:0.#} mm; vent the other end"
                : null;
            if (wrong is not null)
            {
                diagnostics.Error(tube[end].At, $"{name}: {wrong}");
                failed = true;
            }
        }

        return failed;
    }

    /// <summary>An end that reaches past the end of the tube it lands on.</summary>
    public static void ReportOverhang(FrameModel model, TubeEndId id, int through, double past, DiagnosticList diagnostics)
    {
        Tube tube = model.Tubes[id.Tube];
        TubeEnd end = tube[id.End];
        string seat = model.Tubes[through].Name;
        diagnostics.Warning(end.At, $"tube {tube.Name}, {Word(id.End)} end at node {model.Nodes[end.Node].Name}: reaches {past:0.0##} mm past the end of {seat}, so that part of its cut meets no metal; move the node along {seat}, or let {seat} run out farther with `extend`");
    }

    private static void ReportMiter(
        FrameModel model, EndPlan end, TubeEndId other, string name, IReadOnlyList<Section> sections, DiagnosticList diagnostics)
    {
        Tube tube = model.Tubes[end.Id.Tube];
        Tube partner = model.Tubes[other.Tube];
        Line3 axis = new(partner[other.End].Point, partner.Into(other.End));
        double angle = end.Frame.Into.AngleTo(axis.Direction);
        SourcePlace at = tube[end.Id.End].At;
        if (angle < Line3.ParallelSine)
        {
            diagnostics.Error(at, $"{name}: can't be mitred with {partner.Name}, which leaves the node in the same direction");
            return;
        }

        (double own, double others) = JointFit.HalfWidths(
            end.Frame, sections[tube.Group], axis, partner.AxesAt(other.End), sections[partner.Group]);
        double distance = end.Frame.Axis.DistanceTo(axis);
        double reach = own + others;
        Vector3 inPlane = end.Frame.Into.Cross(axis.Direction).Cross(end.Frame.Into).Normalized();
        double half = sections[tube.Group].Outline.HalfWidthAlong(end.Frame.Axes.InSection(inPlane));
        if (distance > reach)
        {
            diagnostics.Error(at, $"{name}: can't be mitred with {partner.Name}: the two miss each other by {distance - reach:0.0##} mm");
        }
        else if (angle < FeatherAngle)
        {
            diagnostics.Warning(at, $"{name}: is mitred with {partner.Name} at only {Degrees(angle)} degrees, so that its cut runs out in a feather edge {2 * half / Math.Tan(angle / 2):0.#} mm long");
        }
    }

    private static void ReportFit(FrameModel model, string node, FitProblem problem, DiagnosticList diagnostics)
    {
        Tube tube = model.Tubes[problem.End.Tube];
        string mate = model.Tubes[problem.Mate].Name;
        SourcePlace at = tube[problem.End.End].At;
        string name = $"tube {tube.Name}, {Word(problem.End.End)} end at node {node}";
        diagnostics.Error(at, problem.Kind == FitProblemKind.RunOutTooLong
            ? $"{name}: would have to run out {problem.Needed:0.0} mm past the node for {mate} to land on its side, more than its own width of {problem.Allowed:0.##} mm; mitre the two (`miter: [{tube.Name}, {mate}]`), give the joint another `order`, or set the end's `extend`"
            : $"{name}: should be coped to {mate} but misses it by {problem.Needed:0.0##} mm and meets nothing else; move an axis or a node, or give the end `cut: square`");
    }

    private static string Names(FrameModel model, IReadOnlyList<Mate> mates) =>
        string.Join(", ", mates.Select(m => model.Tubes[m.Tube].Name));

    private static string Word(End end) => end == End.From ? "from" : "to";

    private static string Degrees(double angle) => (angle * 180 / Math.PI).ToString("0.0##");
}
