using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Stability;

namespace FrameGen.Sizing.Analysis;

/// <summary>
/// The frame with every span between its nodes divided, for buckling and vibration: what tubes do between their nodes counts there. The
/// division is the same for every design.
/// </summary>
internal sealed class FineModel
{
    private readonly Lazy<FrameSolver>[] _solvers;
    private readonly int[] _tubeOfNode;

    private FineModel(RefinedFrame refined, Lazy<FrameSolver>[] solvers, int[] tubeOfNode) =>
        (Refined, _solvers, _tubeOfNode) = (refined, solvers, tubeOfNode);

    public RefinedFrame Refined { get; }

    public static FineModel Build(Topology topology, IReadOnlyList<FrameSolver> solvers)
    {
        var divisions = new int[topology.Frame.Elements.Count];
        foreach (TubeElements tube in topology.Tubes)
        {
            Divide(tube, divisions);
        }

        var refined = RefinedFrame.Divide(topology.Frame, divisions);
        var tubeOfNode = new int[refined.Frame.Nodes.Count];
        Array.Fill(tubeOfNode, -1);
        for (int t = 0; t < topology.Tubes.Count; t++)
        {
            TubeElements tube = topology.Tubes[t];
            for (int e = refined.First(tube.First); e < refined.First(tube.First + tube.Count); e++)
            {
                MarkBetween(refined.Frame.Elements[e].Start, t);
                MarkBetween(refined.Frame.Elements[e].End, t);
            }
        }

        // Made when first wanted: a set of supports that only a stiffness target has is never asked about.
        return new FineModel(
            refined, [.. solvers.Select(s => new Lazy<FrameSolver>(() => new FrameSolver(refined.Frame, s.Restraints)))], tubeOfNode);

        void MarkBetween(int node, int tube)
        {
            if (node >= topology.NodeOfJoint.Count || topology.NodeOfJoint[node] < 0)
            {
                tubeOfNode[node] = tube;
            }
        }
    }

    /// <summary>The solver of the fine frame under one set of supports.</summary>
    /// <param name="solver">Position in <see cref="StructuralModel.Solvers"/>.</param>
    public FrameSolver Solver(int solver) => _solvers[solver].Value;

    /// <summary>Tube of a fine node that lies between the nodes of the frame; −1 for those.</summary>
    public int TubeOf(int node) => _tubeOfNode[node];

    // A span runs from node to node; where only a load stands, its parts share the span's elements by their length.
    private static void Divide(TubeElements tube, int[] divisions)
    {
        for (int from = 0, to; from < tube.Count; from = to)
        {
            to = from + 1;
            while (tube.Stations[to].Node < 0)
            {
                to++;
            }

            double span = tube.Stations[to].Distance - tube.Stations[from].Distance;
            for (int i = from; i < to; i++)
            {
                double share = (tube.Stations[i + 1].Distance - tube.Stations[i].Distance) / span;
                divisions[tube.First + i] = Math.Max(1, (int)Math.Ceiling((RefinedFrame.ElementsPerSpan * share) - 1e-9));
            }
        }
    }
}
