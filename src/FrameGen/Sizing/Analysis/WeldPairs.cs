using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Sizing.Analysis;

/// <summary>The pairs of tubes that are welded to each other at the nodes of a frame: the same in every design.</summary>
internal sealed class WeldPairs
{
    private WeldPairs(FrameModel model, IReadOnlyList<IReadOnlyList<WeldPair>> byNode)
    {
        (Model, ByNode) = (model, byNode);
        var most = new int[model.Tubes.Count];
        foreach (WeldPair pair in byNode.SelectMany(p => p))
        {
            most[pair.A.Tube]++;
            most[pair.B.Tube]++;
        }

        MostZones = most;
    }

    public FrameModel Model { get; }

    /// <summary>By position in <see cref="JointTable.Nodes"/>.</summary>
    public IReadOnlyList<IReadOnlyList<WeldPair>> ByNode { get; }

    /// <summary>By tube: how many pairs it is in.</summary>
    public IReadOnlyList<int> MostZones { get; }

    public static WeldPairs Build(JointTable joints, FrameModel model)
    {
        var byNode = new List<IReadOnlyList<WeldPair>>();
        foreach (NodeEntries node in joints.Nodes)
        {
            var members = new List<WeldMember>();
            var pairs = new List<WeldPair>();
            for (int e = 0; e < node.Ends.Count; e++)
            {
                (int t, End end) = node.Ends[e];
                members.Add(new WeldMember(t, e, end == End.From ? 0 : model.Tubes[t].Length));
            }

            if (node.Through is { } through)
            {
                members.Add(new WeldMember(through, -1, model.Nodes[node.Node].ThroughDistance));
            }

            for (int b = 1; b < members.Count; b++)
            {
                for (int a = 0; a < b; a++)
                {
                    if (IsWelded(members[a]) && IsWelded(members[b]) && members[a].Tube != members[b].Tube)
                    {
                        double angle = Away(members[a]).AngleTo(Away(members[b]));
                        (double sin, double cos) = Math.SinCos(angle);
                        pairs.Add(new WeldPair(members[a], members[b], sin, cos));
                    }
                }
            }

            byNode.Add(pairs);
        }

        return new WeldPairs(model, byNode);

        bool IsWelded(WeldMember member) => model.Groups[model.Tubes[member.Tube].Group].Welded;

        Vector3 Away(WeldMember member) =>
            member.Slot < 0 ? model.Tubes[member.Tube].AxesAt(member.At).X : model.Tubes[member.Tube].Into(member.At > 0 ? End.To : End.From);
    }
}

/// <summary>A tube at a node.</summary>
/// <param name="Tube">Index of the tube.</param>
/// <param name="Slot">Position of its end in <see cref="NodeEntries.Ends"/>; −1 for the tube that runs through.</param>
/// <param name="At">The node's place on it, mm from its start.</param>
internal readonly record struct WeldMember(int Tube, int Slot, double At);

/// <summary>Two welded tubes at a node.</summary>
/// <param name="A">One tube.</param>
/// <param name="B">The other; the one that runs through, where there is one.</param>
/// <param name="Sin">Of the angle φ between their axes, each pointing away from the node.</param>
/// <param name="Cos">Of φ.</param>
internal readonly record struct WeldPair(WeldMember A, WeldMember B, double Sin, double Cos);
