using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Stability;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>A small frame for stability and vibration: members between nodes, each divided, all held in the same freedoms where it is plane.</summary>
/// <param name="divisions">Elements a member.</param>
/// <param name="heldEverywhere">Freedoms held at every node, as digits: "001110" leaves a frame in the x-y plane.</param>
/// <param name="nodes">mm.</param>
internal sealed class DividedFrame(int divisions, string heldEverywhere, params Vector3[] nodes)
{
    /// <summary>Plane frames in the x-y plane: no z, no rotations out of it.</summary>
    public const string InPlane = "001110";

    private readonly List<BeamElement> elements = [];
    private readonly List<BeamProfile> profiles = [];
    private readonly List<(int Node, string Held)> held = [];
    private readonly List<Restraint> springs = [];
    private readonly List<NodalLoad> loads = [];
    private readonly List<ElementLoad> elementLoads = [];

    /// <summary>Of a frequency, relative.</summary>
    public double LargestResidual { get; init; } = 1e-8;

    public DividedFrame Profile(BeamProfile profile)
    {
        profiles.Add(profile);
        return this;
    }

    public DividedFrame Member(int start, int end)
    {
        Vector3 along = nodes[end] - nodes[start];
        elements.Add(new BeamElement(start, end, Vector3.Zero, Vector3.Zero, TubeAxes.Along(along), profiles.Count - 1));
        return this;
    }

    /// <summary>Hinges the last member.</summary>
    public DividedFrame Hinge(Hinges hinges)
    {
        elements[^1] = elements[^1] with { Hinges = hinges };
        return this;
    }

    /// <summary>Stands a node on springs: six rates, along x, y, z and about x, y, z.</summary>
    public DividedFrame Spring(int node, params double[] rates)
    {
        springs.Add(new Restraint(node, new bool[6]) { Springs = rates });
        return this;
    }

    public DividedFrame Hold(int node, string freedoms)
    {
        held.Add((node, freedoms));
        return this;
    }

    public DividedFrame Load(int node, Vector3 force)
    {
        loads.Add(new NodalLoad(node, force, Vector3.Zero));
        return this;
    }

    public DividedFrame LoadAlong(int member, Vector3 perLength)
    {
        elementLoads.Add(new ElementLoad(member, perLength));
        return this;
    }

    public BucklingMode? Buckling()
    {
        var coarse = new BeamFrame(nodes, elements);
        FrameSolution statics = new FrameSolver(coarse, Restraints(nodes.Length)).Factor(profiles).Solve(new BeamLoads(loads, elementLoads));
        var fine = RefinedFrame.Divide(coarse, divisions);
        FactoredFrame factored = new FrameSolver(fine.Frame, Restraints(fine.Frame.Nodes.Count)).Factor(profiles);
        BucklingMode? mode = LinearBuckling.Lowest(factored, fine.AxialForces(statics));
        if (mode is not null)
        {
            Assert.InRange(mode.Residual, 0, 1e-7);
        }

        return mode;
    }

    /// <summary>Frequencies, Hz.</summary>
    /// <param name="count">How many.</param>
    /// <param name="density">kg/mm³.</param>
    /// <param name="rotaryInertia">Whether sections resist being turned by bending.</param>
    /// <param name="points">Point masses.</param>
    public double[] Frequencies(int count, double density, bool rotaryInertia = false, params PointMass[] points)
    {
        var fine = RefinedFrame.Divide(new BeamFrame(nodes, elements), divisions);
        FactoredFrame factored = new FrameSolver(fine.Frame, Restraints(fine.Frame.Nodes.Count)).Factor(profiles);
        List<BeamInertia> inertias = [.. fine.Frame.Elements.Select(e => BeamInertia.Of(profiles[e.Profile], density))];
        if (!rotaryInertia)
        {
            inertias = [.. inertias.Select(i => i with { RotaryY = 0, RotaryZ = 0 })];
        }

        IReadOnlyList<VibrationMode> modes = NaturalFrequencies.Lowest(factored, new FrameMass(inertias, points), count);
        Assert.Equal(count, modes.Count);
        Assert.All(modes, m => Assert.InRange(m.Residual, 0, LargestResidual));
        return [.. modes.Select(m => m.Hertz)];
    }

    private List<Restraint> Restraints(int count)
    {
        List<Restraint> restraints = [.. held.Select(h => Held(h.Node, h.Held)), .. springs];
        restraints.AddRange(Enumerable.Range(0, count).Select(n => Held(n, heldEverywhere)));
        return restraints;
    }

    private static Restraint Held(int node, string freedoms) => new(node, [.. freedoms.Select(c => c == '1')]);
}
