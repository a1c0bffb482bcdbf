using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing;

/// <summary>What is very stiff next to what is very soft, where the arithmetic could not bear it.</summary>
internal static class StiffnessContrast
{
    /// <summary>Names the stiffest tube at the joint that does not balance, and the softest of the frame.</summary>
    /// <param name="analysis">The design.</param>
    /// <param name="joint">The solver's joint with the largest unbalance; −1 where none is known.</param>
    public static string Describe(DesignAnalysis analysis, int joint)
    {
        Topology topology = analysis.Structure!.Topology;
        FrameModel model = analysis.Structure.Model;
        var stiffest = new Stretch(-1, 0, double.NegativeInfinity);
        var softest = new Stretch(-1, 0, double.PositiveInfinity);
        for (int t = 0; t < topology.Tubes.Count; t++)
        {
            TubeElements tube = topology.Tubes[t];
            for (int i = 0; i < tube.Count; i++)
            {
                BeamElement element = topology.Frame.Elements[tube.First + i];
                double length = tube.Stations[i + 1].Distance - tube.Stations[i].Distance;
                BeamProfile profile = analysis.Profiles[element.Profile];

                // Along the tube and across it: the stiffest way of the one stands beside the softest of the other.
                double along = profile.E * profile.Area / length;
                double across = 12 * profile.E * Math.Min(profile.Iy, profile.Iz) / (length * length * length);
                bool isThere = joint < 0 || element.Start == joint || element.End == joint;
                if (isThere && Math.Max(along, across) > stiffest.Stiffness)
                {
                    stiffest = new Stretch(t, length, Math.Max(along, across));
                }

                if (Math.Min(along, across) < softest.Stiffness)
                {
                    softest = new Stretch(t, length, Math.Min(along, across));
                }
            }
        }

        string where = joint >= 0 && topology.NodeOfJoint[joint] is >= 0 and var node ? $" at node {model.Nodes[node].Name}" : "";
        return stiffest.Tube < 0
            ? "very stiff and very soft tubes are joined: bring them closer together"
            : $"worst{where}, where {Name(stiffest)} resists with {Wording.Number(stiffest.Stiffness)} N/mm, and {Name(softest)} with "
                + $"{Wording.Number(softest.Stiffness)} N/mm: bring them closer together, or join what is so near together in one node";

        string Name(Stretch stretch) => $"{Wording.Number(stretch.Length)} mm of tube {model.Tubes[stretch.Tube].Name}";
    }

    private readonly record struct Stretch(int Tube, double Length, double Stiffness);
}
