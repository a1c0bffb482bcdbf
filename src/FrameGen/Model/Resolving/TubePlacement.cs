using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>A tube in its place, before its group is known.</summary>
/// <param name="From">End at x = 0.</param>
/// <param name="To">The other end.</param>
/// <param name="Axes">Local axes.</param>
internal sealed record PlacedTube(TubeEnd From, TubeEnd To, TubeAxes Axes)
{
    /// <summary>Its axis where it bends; null for a straight tube.</summary>
    public TubePath? Bent { get; init; }

    /// <summary>Length of the axis, mm.</summary>
    public double Length => Bent?.Length ?? (To.Point - From.Point).Length;

    /// <summary>The point of the axis at a distance along it, mm.</summary>
    public Vector3 PointAt(double distance) => Bent?.PointAt(distance) ?? From.Point + (distance * Axes.X);

    /// <summary>Unit direction from an end into the tube.</summary>
    public Vector3 Into(End end) => end == End.From ? Axes.X : -(Bent?.Pieces[^1].Along ?? Axes.X);

    /// <summary>The end asked for.</summary>
    public TubeEnd At(End end) => end == End.From ? From : To;
}

/// <summary>Gives tubes their axes and ends.</summary>
internal static class TubePlacement
{
    // Sine of the smallest angle between a tube and its top line that still tells where the top is.
    private const double LeastSine = 1e-6;

    /// <summary>All tubes by number; null for one with an error.</summary>
    /// <param name="frame">The tubes.</param>
    /// <param name="nodes">Where their nodes are.</param>
    /// <param name="mirror">The mirror plane, if any.</param>
    /// <param name="gap">The general gap, mm.</param>
    /// <param name="values">Evaluates; takes the errors.</param>
    public static PlacedTube?[] Of(FrameDraft frame, NodePlacement nodes, Reflection? mirror, double gap, SpecValues values)
    {
        var tubes = new PlacedTube?[frame.Tubes.Count];
        for (int tube = 0; tube < tubes.Length; tube++)
        {
            TubeDraft draft = frame.Tubes[tube];

            // What is wrong with the original need not be said of its twin again.
            if (draft.Original is { } original && tubes[original] is null)
            {
                continue;
            }

            tubes[tube] = Place(draft, tube, frame, nodes, mirror, gap, values);
        }

        return tubes;
    }

    private static PlacedTube? Place(
        TubeDraft draft, int tube, FrameDraft frame, NodePlacement nodes, Reflection? mirror, double gap, SpecValues values)
    {
        // Every value is looked at, whatever else is wrong.
        Vector3? up = draft.Spec.Up is null ? null : values.Direction(draft.Spec.Up, $"tube {draft.Name}: up");
        bool sound = draft.Spec.Up is null || up is not null;
        up = draft.Original is not null && up is { } written ? mirror!.Of(written) : up;

        EndRequest? from = Request(draft, draft.Spec.From.Cut, "from", gap, mirror, values);
        EndRequest? to = Request(draft, draft.Spec.To.Cut, "to", gap, mirror, values);
        if (draft is not { From: { } fromNode, To: { } toNode })
        {
            return null;
        }

        if (fromNode == toNode)
        {
            values.Diagnostics.Error(
                draft.At, $"tube {draft.Name} begins and ends at node {frame.Nodes[fromNode].Name}; give it two nodes");
            return null;
        }

        if (nodes.AxisOf(tube) is not { } axis)
        {
            return null;
        }

        if (draft.Via.Any(v => v == fromNode || v == toNode))
        {
            values.Diagnostics.Error(draft.At, $"tube {draft.Name}: via names the node it begins or ends at; name only the corners between");
            return null;
        }

        TubePath? bent = nodes.BentAxisOf(tube);
        if (draft.Spec.Bend is not null && bent is null)
        {
            return null;
        }

        Vector3 along = bent?.Pieces[0].Along ?? axis.To - axis.From;
        if (bent is null && !(along.Length > NodePlacement.Near))
        {
            values.Diagnostics.Error(
                draft.At,
                $"tube {draft.Name} has no length: its axis from {frame.Nodes[fromNode].Name} to {frame.Nodes[toNode].Name} measures "
                + $"{along.Length:0.###} mm; move one of the nodes, or leave the tube out");
            return null;
        }

        if (up is { } top && !(top.Cross(along).Length > LeastSine * along.Length))
        {
            values.Diagnostics.Error(
                draft.Spec.Up!.At, $"tube {draft.Name}: up points along the tube, and must point to one side of it; choose another direction");
            return null;
        }

        return sound && from is not null && to is not null
            && from.IsAcross(along, values) & to.IsAcross(along, values)
            ? new PlacedTube(from.At(fromNode, axis.From), to.At(toNode, axis.To), TubeAxes.Along(along, up)) { Bent = bent }
            : null;
    }

    private static EndRequest? Request(TubeDraft draft, EndCutSpec spec, string end, double gap, Reflection? mirror, SpecValues values)
    {
        string whose = $"tube {draft.Name}, {end} end";
        double? extend = spec.Extend is null ? null : values.Of(spec.Extend);
        double? endGap = values.NotNegative(spec.Gap, $"{whose}: gap", gap);
        if (spec is { Cut: RequestedCut.Cope, Extend: not null })
        {
            values.Diagnostics.Error(
                spec.At, $"{whose}: extend moves a square end, and this one is to be coped; leave out extend, or write cut: square");
            return null;
        }

        double? vent = spec.Vent is null ? null : values.Positive(spec.Vent, $"{whose}: vent");
        if (spec.Vent is not null && vent is null)
        {
            return null;
        }

        Vector3? plane = spec.Plane is null ? null : values.Direction(spec.Plane, $"{whose}: plane");
        if (spec.Plane is not null && plane is null)
        {
            return null;
        }

        plane = plane is { } written && draft.Original is not null ? mirror!.Of(written) : plane;
        return endGap is { } g && (spec.Extend is null || extend is not null) ? new EndRequest(whose, spec, extend, g, plane, vent) : null;
    }

    private sealed record EndRequest(string Whose, EndCutSpec Spec, double? Extend, double Gap, Vector3? Plane, double? Vent)
    {
        public TubeEnd At(int node, Vector3 point) => new(node, point, Spec.Cut, Extend, Gap, Spec.Wrap, Spec.At) { Plane = Plane, Vent = Vent };

        // A plane along the tube never crosses it.
        public bool IsAcross(Vector3 along, SpecValues values)
        {
            if (Plane is not { } normal || Math.Abs(normal.Dot(along)) > LeastSine * along.Length)
            {
                return true;
            }

            values.Diagnostics.Error(
                Spec.Plane!.At, $"{Whose}: the plane it is to be cut on runs along the tube and never crosses it; give the plane another normal");
            return false;
        }
    }
}
