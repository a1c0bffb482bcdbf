using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>
/// A frame with every name bound and every value a number: mm, N, MPa, kg, rad. Indices are positions in these lists.
/// Twins of a mirrored spec stand right after their originals. What is looked up by node is made with the model: a copy by
/// <c>with</c> keeps the original's, so make a new model where tubes or joints differ.
/// </summary>
/// <param name="Spec">Which spec it was made from.</param>
/// <param name="Display">How papers print quantities.</param>
/// <param name="Nodes">All nodes.</param>
/// <param name="Tubes">All tubes.</param>
/// <param name="Groups">All groups.</param>
/// <param name="Supports">At most one a node.</param>
/// <param name="Masses">Masses carried.</param>
/// <param name="Cases">Load cases with all that they add taken in.</param>
/// <param name="Targets">One a spec entry, in its order.</param>
/// <param name="Joints">What the spec asks of joints, at most one a node.</param>
/// <param name="Fabrication">Shop preferences.</param>
public sealed record FrameModel(
    SpecIdentity Spec,
    DisplaySpec Display,
    IReadOnlyList<Node> Nodes,
    IReadOnlyList<Tube> Tubes,
    IReadOnlyList<TubeGroup> Groups,
    IReadOnlyList<Support> Supports,
    IReadOnlyList<CarriedMass> Masses,
    IReadOnlyList<LoadCase> Cases,
    IReadOnlyList<Target> Targets,
    IReadOnlyList<JointRequest> Joints,
    Fabrication Fabrication)
{
    /// <summary>Tubes on the rack, in the order written.</summary>
    public IReadOnlyList<RackTube> Have { get; init; } = [];

    /// <summary>The stock lists that candidates come from, by the order of the groups.</summary>
    public IReadOnlyList<StockVersion> Stock { get; init; } = [];

    /// <summary>Where the sizes are pinned; null where they are free.</summary>
    public FrozenSizes? Frozen { get; init; }

    /// <summary>How sizes are chosen.</summary>
    public SizingSpec Sizing { get; init; } = SizingSpec.Default;

    /// <summary>By node: the tube ends there, in the order of <see cref="Tubes"/>; a through tube has none there.</summary>
    public IReadOnlyList<IReadOnlyList<TubeEndId>> EndsAt { get; } = EndsByNode(Nodes.Count, Tubes);

    /// <summary>By node: what the spec asks of the joint there; null for nothing.</summary>
    public IReadOnlyList<JointRequest?> JointAt { get; } = RequestByNode(Nodes.Count, Joints);

    /// <summary>True where a tube ends at a node or runs through it.</summary>
    public bool MeetsATube(int node) => EndsAt[node].Count > 0 || Nodes[node].Through is not null;

    /// <summary>The node of a tube, at its ends or on it, that is nearest to a place; the earlier of two.</summary>
    /// <param name="tube">Index of the tube.</param>
    /// <param name="at">Distance from its start along its axis, mm.</param>
    /// <returns>The node and how far it is along the axis, mm.</returns>
    public (int Node, double Distance) NearestNode(int tube, double at)
    {
        Tube along = Tubes[tube];
        (int Node, double Distance) nearest = (along.From.Node, at);
        foreach ((int node, double place) in along.NodesOn.Select(n => (n, Nodes[n].ThroughDistance)).Append((along.To.Node, along.Length)))
        {
            double distance = Math.Abs(at - place);
            nearest = distance < nearest.Distance ? (node, distance) : nearest;
        }

        return nearest;
    }

    /// <summary>The straight of a tube at a node which it ends at or runs through.</summary>
    /// <param name="tube">Index of the tube.</param>
    /// <param name="node">Index of the node.</param>
    public TubeStraight StraightAt(int tube, int node)
    {
        Tube along = Tubes[tube];
        return along.StraightAt(node == along.From.Node ? 0 : node == along.To.Node ? along.Length : Nodes[node].ThroughDistance);
    }

    private static List<TubeEndId>[] EndsByNode(int nodes, IReadOnlyList<Tube> tubes)
    {
        var ends = new List<TubeEndId>[nodes];
        for (int node = 0; node < nodes; node++)
        {
            ends[node] = [];
        }

        for (int tube = 0; tube < tubes.Count; tube++)
        {
            ends[tubes[tube].From.Node].Add(new TubeEndId(tube, End.From));
            ends[tubes[tube].To.Node].Add(new TubeEndId(tube, End.To));
        }

        return ends;
    }

    private static JointRequest?[] RequestByNode(int nodes, IReadOnlyList<JointRequest> joints)
    {
        var requests = new JointRequest?[nodes];
        foreach (JointRequest joint in joints)
        {
            requests[joint.Node] = joint;
        }

        return requests;
    }
}
