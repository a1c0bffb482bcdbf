using FrameGen.Mechanics.Frames;

namespace FrameGen.Sizing.Analysis;

/// <summary>How a tube's axis bends in a case of a design, for pictures.</summary>
internal static class DeflectedTube
{
    /// <summary>Places on each straight stretch between nodes and loads; a parabola drawn with eight chords stands off by 1/64 of its sag.</summary>
    private const int Chords = 8;

    /// <summary>Describes it from the tube's start to its end; where two elements meet there is one place.</summary>
    public static IReadOnlyList<AxisPlace> Describe(DesignAnalysis analysis, int loadCase, int tube)
    {
        StructuralModel structure = analysis.Structure!;
        FrameSolution solution = analysis.Case(loadCase);
        BeamFrame frame = structure.Topology.Frame;
        TubeElements elements = structure.Topology.Tubes[tube];
        BeamProfile profile = analysis.Profiles[structure.Model.Tubes[tube].Group];
        var places = new List<AxisPlace> { new(elements.Stations[0].Distance, AxisMotion.At(frame, solution, elements.First, in profile, 0)) };
        for (int e = 0; e < elements.Count; e++)
        {
            double start = elements.Stations[e].Distance;
            double length = elements.Stations[e + 1].Distance - start;
            int chords = elements.Arcs[e] is null ? Chords : 1;
            for (int i = 1; i <= chords; i++)
            {
                double share = (double)i / chords;
                places.Add(new AxisPlace(start + (share * length), AxisMotion.At(frame, solution, elements.First + e, in profile, share)));
            }
        }

        return places;
    }
}
