using FrameGen.Diagnostics;
using FrameGen.Geometry;

namespace FrameGen.Model.Resolving;

/// <summary>Finds what lies too near without being joined: nodes on nodes, nodes on tubes' axes, tubes on tubes.</summary>
internal static class NearnessCheck
{
    // Nobody mends more at a time, and thousands of nodes in one place would be compared each with each.
    private const int MostOfAKind = 100;

    /// <summary>Reports everything found.</summary>
    public static void Run(FrameDraft frame, NodePlacement nodes, PlacedTube?[] tubes, Reflection? mirror, DiagnosticList diagnostics)
    {
        // Nodes with errors of their own have no place.
        int[] placed = [.. Enumerable.Range(0, frame.Nodes.Count).Where(n => nodes.PositionOf(n) is not null)];
        var tree = new PointTree([.. placed.Select(n => nodes.PositionOf(n)!.Value)]);
        if (CheckNodes(frame, nodes, placed, tree, diagnostics) < MostOfAKind)
        {
            CheckAxes(frame, nodes, tubes, placed, tree, diagnostics);
        }

        CheckTubes(frame, tubes, mirror, diagnostics);
    }

    private static int CheckNodes(FrameDraft frame, NodePlacement nodes, int[] placed, PointTree tree, DiagnosticList diagnostics)
    {
        var near = new List<int>();
        int found = 0;
        for (int i = 0; i < placed.Length && found < MostOfAKind; i++)
        {
            Vector3 place = nodes.PositionOf(placed[i])!.Value;
            tree.FindNear(place, place, NodePlacement.Near, near);
            int first = placed[near[0]];
            NodeDraft node = frame.Nodes[placed[i]];

            // One error a node; a twin on its own original was reported when the original was found on the mirror plane.
            if (near[0] < i && node.Original != first)
            {
                found++;
                diagnostics.Error(
                    node.At,
                    $"nodes {frame.Nodes[first].Name} and {node.Name} are at the same place (within {NodePlacement.Near} mm); "
                    + "keep one of them and let both tubes end there");
            }
        }

        return found;
    }

    private static void CheckAxes(
        FrameDraft frame, NodePlacement nodes, PlacedTube?[] tubes, int[] placed, PointTree tree, DiagnosticList diagnostics)
    {
        var near = new List<int>();
        int found = 0;
        for (int tube = 0; tube < tubes.Length && found < MostOfAKind; tube++)
        {
            if (tubes[tube] is not { } axis)
            {
                continue;
            }

            foreach ((int number, PathPiece chord) in NodesNear(axis, tree, near))
            {
                int node = placed[number];
                Vector3 place = nodes.PositionOf(node)!.Value;
                double distance = chord.Start + (place - chord.Origin).Dot(chord.Along);
                bool joined = node == axis.From.Node || node == axis.To.Node || nodes.ThroughOf(node)?.Tube == tube || frame.Tubes[tube].Via.Contains(node);
                bool isAtAnEndNode = IsNear(place, nodes.PositionOf(axis.From.Node)) || IsNear(place, nodes.PositionOf(axis.To.Node));
                bool isSaidOfOriginals = frame.Nodes[node].Original is not null && frame.Tubes[tube].Original is not null;
                if (!joined && !isAtAnEndNode && !isSaidOfOriginals)
                {
                    found++;
                    string? through = nodes.ThroughOf(node) is { } other ? frame.Tubes[other.Tube].Name : null;
                    SayOnAxis(frame.Nodes[node], frame.Tubes[tube].Name, distance, through, diagnostics);
                }
            }
        }
    }

    // Nodes near an axis, each with the straight that it is near to: in its bends as chords of a degree, which stay within 0.05 mm of an arc of 1 m.
    private static List<(int Number, PathPiece Chord)> NodesNear(PlacedTube axis, PointTree tree, List<int> near)
    {
        var found = new List<(int Number, PathPiece Chord)>();
        IReadOnlyList<PathPiece> pieces = axis.Bent?.Pieces ?? [new PathPiece(0, axis.Length, axis.From.Point, axis.Axes.X, Vector3.Zero, 0)];
        foreach (PathPiece piece in pieces.Where(p => p.Length > 0))
        {
            int chords = piece.IsArc ? (int)Math.Ceiling(piece.Length / piece.Radius * 180 / Math.PI) : 1;
            for (int i = 0; i < chords; i++)
            {
                double start = i * piece.Length / chords;
                Vector3 from = piece.PointAt(start);
                Vector3 to = piece.PointAt((i + 1) * piece.Length / chords);
                tree.FindNear(from, to, NodePlacement.Near, near);
                var chord = new PathPiece(piece.Start + start, piece.Length / chords, from, (to - from).Normalized(), Vector3.Zero, 0);
                int before = found.Count;
                found.AddRange(near.Where(n => !found.Take(before).Any(f => f.Number == n)).Select(n => (n, chord)).ToList());
            }
        }

        return found;
    }

    private static bool IsNear(Vector3 place, Vector3? other) => other is { } o && (place - o).Length <= NodePlacement.Near;

    private static void SayOnAxis(NodeDraft node, string tube, double distance, string? through, DiagnosticList diagnostics)
    {
        string advice = through is null
            ? $"write {node.Name}: {{on: {tube}, distance: {distance:0.###} mm}} to join them, or move the node"
            : $"only one tube can run through a node, and {through} does: let {tube} end there, as two tubes, or give it an offset";
        diagnostics.Error(node.At, $"node {node.Name} lies on the axis of tube {tube} without being joined to it; {advice}");
    }

    private static void CheckTubes(FrameDraft frame, PlacedTube?[] tubes, Reflection? mirror, DiagnosticList diagnostics)
    {
        // Only tubes between the same two nodes are compared: others that overlap have a node on an axis.
        var between = new Dictionary<(int, int), List<int>>();
        for (int tube = 0; tube < tubes.Length; tube++)
        {
            if (tubes[tube] is not { } placed)
            {
                continue;
            }

            (int, int) pair = (Math.Min(placed.From.Node, placed.To.Node), Math.Max(placed.From.Node, placed.To.Node));
            if (!between.TryGetValue(pair, out List<int>? others))
            {
                between.Add(pair, [tube]);
                continue;
            }

            int same = others.FindIndex(other => Coincide(placed, tubes[other]!));
            if (same >= 0)
            {
                SayCoincident(frame, others[same], tube, mirror, diagnostics);
            }

            others.Add(tube);
        }
    }

    private static bool Coincide(PlacedTube a, PlacedTube b)
    {
        (Vector3 from, Vector3 to) = a.From.Node == b.From.Node ? (b.From.Point, b.To.Point) : (b.To.Point, b.From.Point);
        bool sameWay = Math.Abs(a.Length - b.Length) <= NodePlacement.Near && (a.Bent is null) == (b.Bent is null)
            && (a.Bent is null || IsNear(a.PointAt(a.Length / 2), b.PointAt(b.Length / 2)));
        return sameWay && IsNear(a.From.Point, from) && IsNear(a.To.Point, to);
    }

    private static void SayCoincident(FrameDraft frame, int first, int second, Reflection? mirror, DiagnosticList diagnostics)
    {
        TubeDraft tube = frame.Tubes[second];
        diagnostics.Error(
            tube.At,
            tube.Original == first && mirror is not null
                ? $"tube {frame.Tubes[first].Name} is its own mirror image, so that its twin {tube.Name} would lie on it; "
                    + $"name it without the ending {mirror.Ending}"
                : $"tubes {frame.Tubes[first].Name} and {tube.Name} have the same axis; leave one of them out, or give it an offset");
    }
}
