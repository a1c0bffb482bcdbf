using FrameGen.Diagnostics;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>What supports, masses, loads, targets and joints are bound to: nodes and tubes in their places.</summary>
/// <param name="Draft">Names and numbers.</param>
/// <param name="Nodes">Where nodes are.</param>
/// <param name="Tubes">Where tubes are; null for one with an error.</param>
/// <param name="Mirror">The mirror plane, if any.</param>
/// <param name="Values">Evaluates; takes the errors.</param>
internal sealed record Frame(FrameDraft Draft, NodePlacement Nodes, PlacedTube?[] Tubes, Reflection? Mirror, SpecValues Values)
{
    private readonly bool[] _meetsATube = NodesWithTubes(Draft, Nodes);

    /// <summary>Where errors go.</summary>
    public DiagnosticList Diagnostics => Values.Diagnostics;

    /// <summary>Number of a node; null after an error.</summary>
    public int? FindNode(Placed<string> name, string whose) => Draft.NodeNames.Find(name, whose, Diagnostics);

    /// <summary>Number of a node that some tube meets; an error where none does.</summary>
    public int? FindJoinedNode(Placed<string> name, string whose)
    {
        int? node = FindNode(name, whose);
        if (node is { } number && !_meetsATube[number])
        {
            Diagnostics.Error(
                name.At, $"{whose}: no tube meets node {name.Value}; let a tube end there, or write the node {{on: TUBE, at: ..}}");
            return null;
        }

        return node;
    }

    /// <summary>Number of a tube; null after an error.</summary>
    public int? FindTube(Placed<string> name, string whose) => Draft.TubeNames.Find(name, whose, Diagnostics);

    /// <summary>Number of a node's twin where its name has one; null for a single node or without a mirror.</summary>
    public int? TwinOfNode(string name) => Mirror is not null && Mirror.HasTwin(name) ? Draft.NodeNames.Find(Mirror.TwinOf(name)) : null;

    /// <summary>Number of a tube's twin where its name has one; null for a single tube or without a mirror.</summary>
    public int? TwinOfTube(string name) => Mirror is not null && Mirror.HasTwin(name) ? Draft.TubeNames.Find(Mirror.TwinOf(name)) : null;

    private static bool[] NodesWithTubes(FrameDraft draft, NodePlacement nodes)
    {
        var meets = new bool[draft.Nodes.Count];

        // The misspelt end of a tube may be any node's.
        if (draft.Tubes.Any(tube => tube.From is null || tube.To is null))
        {
            Array.Fill(meets, value: true);
            return meets;
        }

        foreach (TubeDraft tube in draft.Tubes)
        {
            meets[tube.From!.Value] = true;
            meets[tube.To!.Value] = true;
        }

        for (int node = 0; node < meets.Length; node++)
        {
            // A node that is written on a tube and could not be placed has its error already.
            meets[node] |= nodes.ThroughOf(node) is not null || draft.Nodes[node].Position is OnTubePositionSpec;
        }

        return meets;
    }
}
