using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Search;

/// <summary>
/// Loads as work on a displaced frame: what is given, and what a kg/mm of each group's tubes adds. And, once for every case, how much energy the weight of a group
/// can put into the frame at most: in the softest of all designs.
/// </summary>
internal sealed class Weights
{
    private readonly DesignSpace _space;
    private readonly StructuralModel _structure;
    private readonly double[]?[] _softest;
    private readonly FactoredFrame?[] _factored;

    public Weights(DesignSpace space, StructuralModel structure)
    {
        (_space, _structure) = (space, structure);
        _softest = new double[]?[structure.Cases.Count];
        _factored = new FactoredFrame?[structure.Solvers.Count];
        Varying = Enumerable.Range(0, space.Groups).Count(g => space[g].Length > 1);
    }

    /// <summary>Groups with something to choose.</summary>
    public int Varying { get; }

    /// <summary>Work of a load set's given loads on a displaced frame, N·mm.</summary>
    public double Given(LoadSet load, FrameSolution field)
    {
        double work = 0;
        foreach (NodalLoad nodal in load.IsCase ? _structure.Cases[load.Index].Nodal : _structure.Units[load.Index].Loads.NodalLoads)
        {
            work += nodal.Force.Dot(field.Displacement(nodal.Node)) + nodal.Moment.Dot(field.Rotation(nodal.Node));
        }

        if (load.IsCase)
        {
            foreach (LoadedElement element in _structure.Cases[load.Index].Elements)
            {
                work += OnElement(element.Element, element.Stretch * element.Given, field);
            }
        }

        return work;
    }

    /// <summary>Work of each group's own weight in a case, by group: N·mm for 1 kg/mm of its tubes.</summary>
    public double[] Own(LoadSet load, FrameSolution field)
    {
        var work = new double[_space.Groups];
        if (load.IsCase && _structure.Cases[load.Index].WeightPerKg != Vector3.Zero)
        {
            foreach (LoadedElement element in _structure.Cases[load.Index].Elements)
            {
                work[element.Group] += OnElement(element.Element, element.Stretch * _structure.Cases[load.Index].WeightPerKg, field);
            }
        }

        return work;
    }

    /// <summary>hᵀK⁻¹h by group, h the weight of 1 kg/mm of its tubes, K the stiffness with every property the least of all options: no design has more.</summary>
    public double[] SoftestEnergy(int loadCase)
    {
        if (_softest[loadCase] is { } known)
        {
            return known;
        }

        var energies = new double[_space.Groups];
        CaseLoads loads = _structure.Cases[loadCase];
        if (loads.WeightPerKg != Vector3.Zero)
        {
            FactoredFrame factored = _factored[loads.Solver] ??= _structure.Solvers[loads.Solver].Factor(SoftestProfiles());
            FrameSolution? solution = null;
            for (int g = 0; g < energies.Length; g++)
            {
                if (_space[g].Length > 1)
                {
                    int group = g;
                    solution = factored.Solve(
                        new BeamLoads([], [.. loads.Elements.Where(e => e.Group == group).Select(e => new ElementLoad(e.Element, e.Stretch * loads.WeightPerKg))]), solution);
                    energies[g] = Math.Max(0, Own(LoadSet.Case(loadCase), solution)[g]);
                }
            }
        }

        return _softest[loadCase] = energies;
    }

    private BeamProfile[] SoftestProfiles()
    {
        var profiles = new BeamProfile[_space.Groups];
        for (int g = 0; g < profiles.Length; g++)
        {
            BeamProfile least = _space[g][0].Profile;
            foreach (Option option in _space[g])
            {
                BeamProfile p = option.Profile;
                least = least with
                {
                    Area = Math.Min(least.Area, p.Area),
                    Iy = Math.Min(least.Iy, p.Iy),
                    Iz = Math.Min(least.Iz, p.Iz),
                    J = Math.Min(least.J, p.J),
                    ShearAreaY = Math.Min(least.ShearAreaY, p.ShearAreaY),
                    ShearAreaZ = Math.Min(least.ShearAreaZ, p.ShearAreaZ),
                };
            }

            profiles[g] = least;
        }

        return profiles;
    }

    // The equivalents at the nodes of an even load along an element: half each, and ±pL²/12.
    private double OnElement(int index, Vector3 perLength, FrameSolution field)
    {
        if (perLength == Vector3.Zero)
        {
            return 0;
        }

        BeamElement element = _structure.Topology.Frame.Elements[index];
        Vector3 along = _structure.Topology.Frame.Nodes[element.End] + element.EndOffset - _structure.Topology.Frame.Nodes[element.Start] - element.StartOffset;
        double length = along.Length;
        Vector3 half = 0.5 * length * perLength;
        Vector3 moment = length * length / 12 * element.Axes.X.Cross(perLength);
        return half.Dot(field.Displacement(element.Start) + field.Displacement(element.End))
            + (moment + element.StartOffset.Cross(half)).Dot(field.Rotation(element.Start))
            + (element.EndOffset.Cross(half) - moment).Dot(field.Rotation(element.End));
    }
}

/// <summary>A load case, or the unit load of a stiffness target.</summary>
/// <param name="IsCase">True for a case.</param>
/// <param name="Index">Its position among them.</param>
internal readonly record struct LoadSet(bool IsCase, int Index)
{
    public static LoadSet Case(int index) => new(true, index);

    public static LoadSet Unit(int index) => new(false, index);
}
