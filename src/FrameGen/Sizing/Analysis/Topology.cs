using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;

namespace FrameGen.Sizing.Analysis;

/// <summary>Joints and elements: a tube with nodes or point loads on it is several elements of one piece, a bend a chain of chords.</summary>
/// <param name="Frame">For the solver; an element's profile is its tube's group.</param>
/// <param name="JointOfNode">Joint of each node of the frame; −1 for a node that no tube meets.</param>
/// <param name="NodeOfJoint">Node of each joint; −1 where only a load stands, or chords of a bend meet.</param>
/// <param name="Tubes">By tube: its stations and elements.</param>
internal sealed record Topology(
    BeamFrame Frame, IReadOnlyList<int> JointOfNode, IReadOnlyList<int> NodeOfJoint, IReadOnlyList<TubeElements> Tubes)
{
    /// <summary>Builds it.</summary>
    /// <param name="model">Resolved: no two nodes of a tube are at one place.</param>
    public static Topology Build(FrameModel model)
    {
        var jointOfNode = new int[model.Nodes.Count];
        Array.Fill(jointOfNode, -1);
        var positions = new List<Vector3>();
        var nodeOfJoint = new List<int>();
        for (int n = 0; n < jointOfNode.Length; n++)
        {
            if (model.MeetsATube(n))
            {
                jointOfNode[n] = positions.Count;
                positions.Add(model.Nodes[n].Position);
                nodeOfJoint.Add(n);
            }
        }

        var elements = new List<BeamElement>();
        var tubes = new List<TubeElements>();
        List<double>[] places = PlacesOfPointLoads(model);
        for (int t = 0; t < places.Length; t++)
        {
            places[t].AddRange(ArcChord.Places(model.Tubes[t]));
        }

        for (int t = 0; t < model.Tubes.Count; t++)
        {
            Tube tube = model.Tubes[t];
            List<Station> stations = NodeStations(model, tube, jointOfNode);
            foreach (double place in places[t].Where(p => stations.TrueForAll(s => Math.Abs(s.Distance - p) >= Lengths.Same)))
            {
                stations.Add(new Station(place, positions.Count, -1, Vector3.Zero));
                positions.Add(tube.PointAt(place));
                nodeOfJoint.Add(-1);
            }

            stations.Sort((a, b) => a.Distance.CompareTo(b.Distance));
            Hinges hinges = HingesOf(model, tube);
            var arcs = new ArcChord?[stations.Count - 1];
            tubes.Add(new TubeElements(elements.Count, stations, arcs));
            for (int i = 1; i < stations.Count; i++)
            {
                ArcChord? arc = ArcChord.Of(tube, stations[i - 1].Distance, stations[i].Distance);
                arcs[i - 1] = arc;
                Hinges ends = (i == 1 ? Hinges.Start : Hinges.None) | (i + 1 == stations.Count ? Hinges.End : Hinges.None);
                elements.Add(new BeamElement(
                    stations[i - 1].Joint,
                    stations[i].Joint,
                    stations[i - 1].Offset,
                    stations[i].Offset,
                    arc?.Axes ?? tube.AxesAt(0.5 * (stations[i - 1].Distance + stations[i].Distance)),
                    tube.Group)
                {
                    Hinges = hinges & ends,
                });
            }
        }

        return new Topology(new BeamFrame(positions, elements), jointOfNode, nodeOfJoint, tubes);
    }

    // Where a tube ends alone at a node that nothing turns or keeps from turning, the node turns with the tube, hinge or not: a pinned foot.
    private static Hinges HingesOf(FrameModel model, Tube tube)
    {
        Hinges hinges = tube.Hinges;
        if (hinges != Hinges.None)
        {
            hinges &= TurnsFreely(model, tube.From.Node) ? ~Hinges.Start : hinges;
            hinges &= TurnsFreely(model, tube.To.Node) ? ~Hinges.End : hinges;
        }

        return hinges;
    }

    private static bool TurnsFreely(FrameModel model, int node) =>
        model.EndsAt[node].Count == 1
        && model.Nodes[node].Through is null
        && !model.Supports.Any(s => s.Node == node && s.ResistsTurning)
        && !model.Cases.Any(c => c.NodeLoads.Any(l => l.Node == node && l.Moment != Vector3.Zero))
        && !model.Targets.OfType<StiffnessTarget>().Any(t => t.Turning && (t.To == node || t.From == node));

    private static List<Station> NodeStations(FrameModel model, Tube tube, int[] jointOfNode)
    {
        List<Station> stations = [At(0, tube.From.Node, tube.From.Point)];
        stations.AddRange(tube.NodesOn.OrderBy(n => model.Nodes[n].ThroughDistance).Select(n =>
            At(model.Nodes[n].ThroughDistance, n, tube.PointAt(model.Nodes[n].ThroughDistance))));
        stations.Add(At(tube.Length, tube.To.Node, tube.To.Point));
        return stations;

        Station At(double distance, int node, Vector3 point)
        {
            // A node on a tube lies on its axis but for rounding, which is no offset.
            Vector3 offset = point - model.Nodes[node].Position;
            return new Station(distance, jointOfNode[node], node, offset.Length < Lengths.Same ? Vector3.Zero : offset);
        }
    }

    private static List<double>[] PlacesOfPointLoads(FrameModel model)
    {
        List<double>[] places = [.. model.Tubes.Select(_ => new List<double>())];
        foreach (PointLoad load in model.Cases.SelectMany(c => c.PointLoads))
        {
            if (places[load.Tube].TrueForAll(p => Math.Abs(p - load.Distance) >= Lengths.Same))
            {
                places[load.Tube].Add(load.Distance);
            }
        }

        foreach (List<double> tube in places)
        {
            tube.Sort();
        }

        return places;
    }
}

/// <summary>A place of a tube where elements meet.</summary>
/// <param name="Distance">From the tube's start, mm.</param>
/// <param name="Joint">The solver's joint.</param>
/// <param name="Node">The frame's node; −1 where only a load stands.</param>
/// <param name="Offset">From the joint to the axis, mm, global.</param>
internal readonly record struct Station(double Distance, int Joint, int Node, Vector3 Offset);

/// <summary>The elements of one tube: element First + i lies between stations i and i + 1.</summary>
/// <param name="First">Its first element.</param>
/// <param name="Stations">Where its elements meet, from its start.</param>
/// <param name="Arcs">By element: the piece of a bend that it is a chord of; null on a straight.</param>
internal sealed record TubeElements(int First, IReadOnlyList<Station> Stations, IReadOnlyList<ArcChord?> Arcs)
{
    public int Count => Stations.Count - 1;

    /// <summary>Length of the tube's axis over that of an element: more than 1 in a bend.</summary>
    public double StretchOf(int i) => Arcs[i]?.Stretch ?? 1;

    /// <summary>The station at a distance from the tube's start.</summary>
    public Station At(double distance) => Stations.MinBy(s => Math.Abs(s.Distance - distance));
}
