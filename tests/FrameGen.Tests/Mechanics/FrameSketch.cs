using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Tests.Mechanics;

/// <summary>Frames for the tests: tubes of steel between nodes.</summary>
internal sealed class FrameSketch
{
    public const double E = 210_000;
    public const double G = E / 2.6;

    public List<Vector3> Nodes { get; } = [];

    public List<BeamElement> Elements { get; } = [];

    public List<Restraint> Restraints { get; } = [];

    public static BeamProfile Profile(double diameter, double wall)
    {
        var tube = new RoundTube(diameter, wall);
        (double y, double z) = tube.ShearAreas(0.3);
        return new BeamProfile(E, G, tube.Area, tube.Iy, tube.Iz, tube.J, y, z);
    }

    public FrameSketch Node(double x, double y, double z)
    {
        Nodes.Add(new Vector3(x, y, z));
        return this;
    }

    public FrameSketch Tube(int start, int end, int profile = 0, Vector3 startOffset = default, Vector3 endOffset = default, Vector3? up = null)
    {
        Vector3 along = Nodes[end] + endOffset - Nodes[start] - startOffset;
        Elements.Add(new BeamElement(start, end, startOffset, endOffset, TubeAxes.Along(along, up), profile));
        return this;
    }

    /// <summary>Holds freedoms written as digits: "111000" holds the three displacements.</summary>
    public FrameSketch Hold(int node, string freedoms)
    {
        Restraints.Add(new Restraint(node, [.. freedoms.Select(c => c == '1')]));
        return this;
    }

    public FrameSolver Solver() => new(new BeamFrame(Nodes, Elements), Restraints);

    public FrameSolution Solve(params NodalLoad[] loads) => Solver().Factor([Profile(30, 2)]).Solve(new BeamLoads(loads, []));
}
