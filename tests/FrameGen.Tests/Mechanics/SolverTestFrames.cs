using CsCheck;
using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;

namespace FrameGen.Tests.Mechanics;

/// <summary>Random sound frames: scattered nodes, each tied to two or three earlier ones, the first held; two profiles, offsets here and there.</summary>
internal static class SolverTestFrames
{
    public static FrameSketch Random(ulong seed, int nodes)
    {
        var pcg = new PCG(1, seed);
        var frame = new FrameSketch();
        for (int k = 0; k < nodes; k++)
        {
            frame.Node(Draw(pcg, 2000), Draw(pcg, 1500), Draw(pcg, 1000));
            foreach (int j in Enumerable.Range(1, 3).Select(_ => (int)(Draw(pcg, 1) * k)).Distinct().Where(j => j < k))
            {
                Vector3 offset = k % 3 == 0 ? new Vector3(Draw(pcg, 20), Draw(pcg, 20), Draw(pcg, 20)) : Vector3.Zero;
                frame.Tube(j, k, profile: k % 2, endOffset: offset);
            }
        }

        // Two supports that hold some freedoms, and one that holds all.
        return frame.Hold(0, "111000").Hold(1, "011100").Hold(2, "111111");
    }

    public static BeamLoads Loads(BeamFrame frame) => new(
        [.. Enumerable.Range(0, frame.Nodes.Count).Select(k => new NodalLoad(k, new(100 - (7 * k), 13 * k, -200), new(1e4, -500 * k, 3e3)))],
        [.. Enumerable.Range(0, frame.Elements.Count).Where(e => e % 2 == 0).Select(e => new ElementLoad(e, new(0.01 * e, 0.2, -0.3)))]);

    private static double Draw(PCG pcg, double top) => Gen.Double[0, top].Generate(pcg, null, out _);
}
