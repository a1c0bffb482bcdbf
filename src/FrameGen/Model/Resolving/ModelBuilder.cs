namespace FrameGen.Model.Resolving;

/// <summary>Makes the model's nodes and tubes once nothing is wrong with them.</summary>
internal static class ModelBuilder
{
    /// <summary>All nodes.</summary>
    public static IReadOnlyList<Node> Nodes(Frame frame)
    {
        var nodes = new Node[frame.Draft.Nodes.Count];
        for (int node = 0; node < nodes.Length; node++)
        {
            NodeDraft draft = frame.Draft.Nodes[node];
            (int Tube, double Distance)? through = frame.Nodes.ThroughOf(node);
            nodes[node] = new Node(draft.Name, frame.Nodes.PositionOf(node)!.Value, through?.Tube, through?.Distance ?? 0, draft.At);
        }

        return nodes;
    }

    /// <summary>All tubes, each with the nodes on it by distance from its start.</summary>
    public static IReadOnlyList<Tube> Tubes(Frame frame, UsedGroups groups)
    {
        var on = new List<(double Distance, int Node)>[frame.Draft.Tubes.Count];
        for (int node = 0; node < frame.Draft.Nodes.Count; node++)
        {
            if (frame.Nodes.ThroughOf(node) is { } through)
            {
                (on[through.Tube] ??= []).Add((through.Distance, node));
            }
        }

        var tubes = new Tube[on.Length];
        for (int tube = 0; tube < tubes.Length; tube++)
        {
            TubeDraft draft = frame.Draft.Tubes[tube];
            PlacedTube placed = frame.Tubes[tube]!;
            int[] nodesOn = [.. (on[tube] ?? []).Order().Select(n => n.Node)];
            tubes[tube] = new Tube(draft.Name, placed.From, placed.To, groups.OfTube(tube), placed.Axes, nodesOn, draft.Original, draft.At)
            {
                Bent = placed.Bent,

                // The local axes of a mirror image may point the other way; what they carry is the same.
                Hinges = draft.Spec.Hinges,
            };
        }

        return tubes;
    }
}
