using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>
/// Puts every node in its place, whatever the order in which the spec lists them: each after those it depends on. A twin's
/// place is the mirror image of its original's.
/// </summary>
internal sealed class NodePlacement
{
    /// <summary>Places nearer than this are taken for one, and a node this near to an axis for lying on it, mm.</summary>
    public const double Near = 0.1;

    private readonly FrameDraft _frame;
    private readonly Reflection? _mirror;
    private readonly SpecValues _values;
    private readonly int?[][] _needs;
    private readonly Vector3?[] _positions;
    private readonly (int Tube, double Distance)?[] _through;
    private readonly BendPlacement _bends;

    private NodePlacement(FrameDraft frame, Reflection? mirror, SpecValues values)
    {
        int count = frame.Nodes.Count;
        (_frame, _mirror, _values) = (frame, mirror, values);
        _needs = new int?[count][];
        _positions = new Vector3?[count];
        _through = new (int, double)?[count];
        _bends = new BendPlacement(frame, values);
    }

    private DiagnosticList Diagnostics => _values.Diagnostics;

    /// <summary>Places all nodes.</summary>
    public static NodePlacement Of(FrameDraft frame, Reflection? mirror, SpecValues values)
    {
        var placement = new NodePlacement(frame, mirror, values);
        for (int node = 0; node < frame.Nodes.Count; node++)
        {
            placement._needs[node] = placement.NeedsOf(node);
        }

        DependencyOrder.Visit(placement._needs, placement.Place, (way, _) => placement.ReportCircle(way));
        return placement;
    }

    /// <summary>A node's place, mm; null after an error.</summary>
    public Vector3? PositionOf(int node) => _positions[node];

    /// <summary>The tube a node lies on and its distance from that tube's start, mm; null for none.</summary>
    public (int Tube, double Distance)? ThroughOf(int node) => _through[node];

    /// <summary>Both ends of a tube's axis, mm; null after an error.</summary>
    public (Vector3 From, Vector3 To)? AxisOf(int tube)
    {
        TubeDraft draft = _frame.Tubes[tube];
        return draft is { From: { } from, To: { } to, FromOffset: { } fromOffset, ToOffset: { } toOffset }
            && _positions[from] is { } start && _positions[to] is { } stop
                ? (start + fromOffset, stop + toOffset)
                : null;
    }

    // Binds the names of a position: numbers of the nodes that must be placed first, null for a name that is unknown.
    private int?[] NeedsOf(int node)
    {
        NodeDraft draft = _frame.Nodes[node];
        if (draft.Original is { } original)
        {
            return ImageOfTubeUnder(original) is { } tube ? [original, .. EndsOf(tube)] : [original];
        }

        string whose = $"node {draft.Name}";
        NameIndex nodes = _frame.NodeNames;
        switch (draft.Position)
        {
            case BetweenPositionSpec between:
                return [nodes.Find(between.A, whose, Diagnostics), nodes.Find(between.B, whose, Diagnostics)];
            case OffsetPositionSpec offset:
                return [nodes.Find(offset.From, whose, Diagnostics)];
            case OnTubePositionSpec on:
                return _frame.TubeNames.Find(on.Tube, whose, Diagnostics) is { } tube ? EndsOf(tube) : [null];
            default:
                return [];
        }
    }

    /// <summary>The axis of a bent tube; null for a straight one, and after an error.</summary>
    public TubePath? BentAxisOf(int tube) => _bends.PathOf(tube, AxisOf(tube), PositionOf);

    private int?[] EndsOf(int tube) => [_frame.Tubes[tube].From, _frame.Tubes[tube].To, .. _frame.Tubes[tube].Via];

    // The tube that the twin of a node on a tube lies on: the mirror image of that tube.
    private int? ImageOfTubeUnder(int original) =>
        _mirror is not null && _frame.Nodes[original].Position is OnTubePositionSpec on && _frame.TubeNames.Find(on.Tube.Value) is { } tube
            ? _frame.ImageOfTube(tube, _mirror)
            : null;

    private void ReportCircle(IReadOnlyList<int> way)
    {
        NodeDraft first = _frame.Nodes[way[0]];
        Diagnostics.Error(
            first.At, $"node {first.Name}: its place depends on itself: {string.Join(" -> ", way.Select(Described))}; give one of them coordinates");
    }

    private string Described(int node) =>
        _frame.Nodes[node] is { Original: null, Position: OnTubePositionSpec on } draft
            ? $"{draft.Name} (on {on.Tube.Value})"
            : _frame.Nodes[node].Name;

    private void Place(int node)
    {
        NodeDraft draft = _frame.Nodes[node];
        if (draft.Original is { } original)
        {
            PlaceTwin(node, original);
            return;
        }

        _positions[node] = draft.Position switch
        {
            PointPositionSpec point => _values.Of(point.Point),
            BetweenPositionSpec between => Between(node, between),
            OffsetPositionSpec offset => _values.Of(offset.Offset) is { } by && Needed(node, 0) is { } from ? from + by : null,
            OnTubePositionSpec on => OnTube(node, on),
            _ => throw new InvalidOperationException($"Node {draft.Name} has a position of an unknown kind."),
        };
    }

    private Vector3? Needed(int node, int which) => _needs[node][which] is { } needed ? _positions[needed] : null;

    private Vector3? Between(int node, BetweenPositionSpec between) =>
        _values.Of(between.Share) is { } share && Needed(node, 0) is { } a && Needed(node, 1) is { } b
            ? ((1 - share) * a) + (share * b)
            : null;

    private Vector3? OnTube(int node, OnTubePositionSpec on)
    {
        double? share = on.Share is null ? null : _values.Of(on.Share);
        double? distance = on.Distance is null ? null : _values.Of(on.Distance);
        if (_frame.TubeNames.Find(on.Tube.Value) is not { } tube || AxisOf(tube) is not { } axis || (share ?? distance) is null)
        {
            return null;
        }

        bool isBent = _frame.Tubes[tube].Spec.Bend is not null;
        TubePath? bent = isBent ? BentAxisOf(tube) : null;
        double length = bent?.Length ?? (axis.To - axis.From).Length;
        if (!(length > Near) || (isBent && bent is null))
        {
            return null;
        }

        double along = share * length ?? distance!.Value;
        if (!IsInside(along, length))
        {
            SayWhichEnd(node, tube, along, length, on.Tube.At);
            return null;
        }

        if (bent is not null && bent.PieceAt(along) is { IsArc: true } arc)
        {
            SayInBend(node, tube, along, arc, bent, on.Tube.At);
            return null;
        }

        _through[node] = (tube, along);
        return bent?.PointAt(along) ?? Along(axis, along / length);
    }

    private void SayInBend(int node, int tube, double along, PathPiece arc, TubePath bent, SourcePlace at)
    {
        string straights = string.Join(", ", bent.Pieces.Where(p => !p.IsArc && p.Length > 0).Select(p => $"{p.Start:0.#} to {p.Start + p.Length:0.#} mm"));
        Diagnostics.Error(
            at,
            $"node {_frame.Nodes[node].Name} lies in a bend of tube {_frame.Tubes[tube].Name}: at {along:0.#} mm along it, and the bend goes from {arc.Start:0.#} to "
            + $"{arc.Start + arc.Length:0.#} mm; joints are made on its straights: {straights}");
    }

    private void PlaceTwin(int node, int original)
    {
        if (_mirror is null || _positions[original] is not { } position)
        {
            return;
        }

        Vector3 image = _mirror.Of(position);
        if (_through[original] is not { } through || ImageOfTubeUnder(original) is not { } tube)
        {
            _positions[node] = image;
            return;
        }

        if (AxisOf(tube) is not { } axis || !((axis.To - axis.From).Length > Near))
        {
            return;
        }

        if (BentAxisOf(tube) is not null || BentAxisOf(through.Tube) is not null)
        {
            PlaceTwinOnBend(node, original, tube, image);
            return;
        }

        // A tube on the other side need not be a mirror image: it, or a node it ends at, may be written out by hand.
        double length = (axis.To - axis.From).Length;
        double along = (image - axis.From).Dot(axis.To - axis.From) / length;
        Vector3 onAxis = Along(axis, along / length);
        double miss = (image - onAxis).Length;
        SourcePlace at = _frame.Nodes[node].At;
        if (miss > Near)
        {
            Diagnostics.Error(
                at,
                $"node {_frame.Nodes[node].Name}, the twin of {_frame.Nodes[original].Name}, would lie {miss:0.###} mm beside tube "
                + $"{_frame.Tubes[tube].Name}, which is not the mirror image of {_frame.Tubes[through.Tube].Name}; write the node out");
            return;
        }

        if (!IsInside(along, length))
        {
            SayWhichEnd(node, tube, along, length, at);
            return;
        }

        bool isMirrorImage = _frame.AreTwins(through.Tube, tube) && Math.Abs(along - through.Distance) <= Lengths.Same;
        _through[node] = (tube, isMirrorImage ? through.Distance : along);
        _positions[node] = miss <= Lengths.Same ? image : onAxis;
    }

    // A bent tube that is the mirror image has the twin's place at the same distance from its start, or from its end where it runs the other way: so does
    // one that is its own image.
    private void PlaceTwinOnBend(int node, int original, int tube, Vector3 image)
    {
        (int Tube, double Distance) through = _through[original]!.Value;
        if (BentAxisOf(tube) is { } bent)
        {
            foreach (double distance in (ReadOnlySpan<double>)[through.Distance, bent.Length - through.Distance])
            {
                if (IsInside(distance, bent.Length) && (bent.PointAt(distance) - image).Length <= Near)
                {
                    _through[node] = (tube, distance);
                    _positions[node] = image;
                    return;
                }
            }
        }

        Diagnostics.Error(
            _frame.Nodes[node].At,
            $"node {_frame.Nodes[node].Name}, the twin of {_frame.Nodes[original].Name}, has no place on tube {_frame.Tubes[tube].Name}, which is not the mirror image "
            + $"of the bent tube {_frame.Tubes[through.Tube].Name}; write the node out");
    }

    private static bool IsInside(double along, double length) => along > Near && length - along > Near;

    private static Vector3 Along((Vector3 From, Vector3 To) axis, double share) => ((1 - share) * axis.From) + (share * axis.To);

    private void SayWhichEnd(int node, int tube, double along, double length, SourcePlace at)
    {
        TubeDraft draft = _frame.Tubes[tube];
        int? end = along < length / 2 ? draft.From : draft.To;
        string name = end is { } number ? _frame.Nodes[number].Name : "its end node";
        Diagnostics.Error(
            at,
            $"node {_frame.Nodes[node].Name} is not inside tube {draft.Name}: it lies at {along:0.###} mm of {length:0.###} mm; "
            + $"use {name} there, or a place between the ends");
    }
}
