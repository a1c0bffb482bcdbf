using FrameGen.Geometry;

namespace FrameGen.Mechanics.Frames;

/// <summary>Loads against reactions, of the frame as one body; it knows nothing of how the frame was solved.</summary>
internal static class Equilibrium
{
    /// <summary>Largest unbalance of forces, and of moments about the origin, relative to the largest term.</summary>
    /// <param name="layout">The frame.</param>
    /// <param name="loads">Loads.</param>
    /// <param name="solution">The reactions.</param>
    public static double ErrorOf(FrameLayout layout, BeamLoads loads, FrameSolution solution)
    {
        var sum = default(Sum);
        for (int k = 0; k < loads.NodalLoads.Count; k++)
        {
            NodalLoad load = loads.NodalLoads[k];
            sum.Add(layout.Frame.Nodes[load.Node], load.Force, load.Moment);
        }

        for (int k = 0; k < loads.ElementLoads.Count; k++)
        {
            ElementLoad load = loads.ElementLoads[k];
            BeamElement element = layout.Frame.Elements[load.Element];
            double length = layout.Modes.Lengths[load.Element];
            Vector3 start = layout.Frame.Nodes[element.Start] + element.StartOffset;
            sum.Add(start + (0.5 * length * element.Axes.X), length * load.PerLength, Vector3.Zero);
        }

        foreach (int node in layout.Supported)
        {
            (Vector3 force, Vector3 moment) = solution.Reaction(node);
            sum.Add(layout.Frame.Nodes[node], force, moment);
        }

        // A pure twist has no forces but rounding, which must not be measured against itself.
        double forceScale = Math.Max(sum.LargestForce, sum.LargestMoment / layout.Size);
        double momentScale = Math.Max(sum.LargestMoment, sum.LargestForce * layout.Size);
        return forceScale > 0 ? Math.Max(Largest(sum.Force) / forceScale, Largest(sum.Moment) / momentScale) : 0;
    }

    private static double Largest(Vector3 v) => Math.Max(Math.Max(Math.Abs(v.X), Math.Abs(v.Y)), Math.Abs(v.Z));

    private struct Sum
    {
        public Vector3 Force { get; private set; }

        public Vector3 Moment { get; private set; }

        public double LargestForce { get; private set; }

        public double LargestMoment { get; private set; }

        public void Add(Vector3 place, Vector3 force, Vector3 moment)
        {
            Vector3 arm = place.Cross(force);
            Force += force;
            Moment += moment + arm;
            LargestForce = Math.Max(LargestForce, Largest(force));
            LargestMoment = Math.Max(LargestMoment, Math.Max(Largest(arm), Largest(moment)));
        }
    }
}
