using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>A small frame written down as a book would: nodes, members, supports, loads.</summary>
internal sealed class FrameCase(params Vector3[] nodes)
{
    private readonly List<BeamElement> elements = [];
    private readonly List<BeamProfile> profiles = [];
    private readonly List<Restraint> restraints = [];
    private readonly List<NodalLoad> nodalLoads = [];
    private readonly List<ElementLoad> elementLoads = [];

    public FrameCase Profile(
        double e, double g, double area, double iy, double iz, double j, double shearArea = double.PositiveInfinity)
    {
        profiles.Add(new BeamProfile(e, g, area, iy, iz, j, shearArea, shearArea));
        return this;
    }

    public FrameCase Member(int start, int end, Vector3? up = null)
    {
        var axes = TubeAxes.Along(nodes[end] - nodes[start], up);
        elements.Add(new BeamElement(start, end, Vector3.Zero, Vector3.Zero, axes, profiles.Count - 1));
        return this;
    }

    /// <summary>Holds freedoms written as digits: "111000" holds the three displacements.</summary>
    public FrameCase Hold(int node, string freedoms)
    {
        restraints.Add(new Restraint(node, [.. freedoms.Select(c => c == '1')]));
        return this;
    }

    /// <summary>Hinges the last member.</summary>
    public FrameCase Hinge(Hinges hinges)
    {
        elements[^1] = elements[^1] with { Hinges = hinges };
        return this;
    }

    /// <summary>Stands a node on springs: six rates, along x, y, z and about x, y, z.</summary>
    public FrameCase Spring(int node, params double[] rates)
    {
        restraints.Add(new Restraint(node, new bool[6]) { Springs = rates });
        return this;
    }

    public FrameCase Load(int node, Vector3 force, Vector3 moment = default)
    {
        nodalLoads.Add(new NodalLoad(node, force, moment));
        return this;
    }

    public FrameCase LoadAlong(int element, Vector3 perLength)
    {
        elementLoads.Add(new ElementLoad(element, perLength));
        return this;
    }

    public FrameSolution Solve()
    {
        var solver = new FrameSolver(new BeamFrame(nodes, elements), restraints);
        FrameSolution solution = solver.Factor(profiles).Solve(new BeamLoads(nodalLoads, elementLoads));
        Assert.InRange(solution.BackwardError, 0, 1e-11);
        Assert.InRange(solution.EquilibriumError, 0, 1e-9);
        return solution;
    }
}
