using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Spec.Quantities;

namespace FrameGen.Sizing.Analysis;

/// <summary>
/// The loads of a case on the solver's joints and elements: those that no design changes, and where the tubes' own weight acts,
/// which a design scales by its mass per length.
/// </summary>
/// <param name="Solver">Position in <see cref="StructuralModel.Solvers"/>.</param>
/// <param name="Nodal">Node loads, point loads and the weight of masses on nodes, summed by joint.</param>
/// <param name="Elements">Elements that are loaded in this case, each with its group and the given load along it.</param>
/// <param name="WeightPerKg">Self weight's force on 1 kg, N, global.</param>
internal sealed record CaseLoads(
    int Solver, IReadOnlyList<NodalLoad> Nodal, IReadOnlyList<LoadedElement> Elements, Vector3 WeightPerKg)
{
    /// <summary>g, m/s² (3rd CGPM, 1901), so that a force in N is kg times it.</summary>
    public const double StandardGravity = (double)UnitTable.StandardGravity;

    public static CaseLoads Build(FrameModel model, Topology topology, LoadCase loadCase, int solver)
    {
        Vector3 weightPerKg = StandardGravity * loadCase.SelfWeight;
        var forces = new Vector3[topology.Frame.Nodes.Count];
        var moments = new Vector3[forces.Length];
        foreach (NodeLoad load in loadCase.NodeLoads)
        {
            forces[topology.JointOfNode[load.Node]] += load.Force;
            moments[topology.JointOfNode[load.Node]] += load.Moment;
        }

        foreach (PointLoad load in loadCase.PointLoads)
        {
            Station station = topology.Tubes[load.Tube].At(load.Distance);
            forces[station.Joint] += load.Force;
            moments[station.Joint] += load.Moment + station.Offset.Cross(load.Force);
        }

        var along = new Vector3[model.Tubes.Count];
        foreach (LineLoad load in loadCase.LineLoads)
        {
            along[load.Tube] += load.PerLength;
        }

        foreach (CarriedMass mass in model.Masses)
        {
            if (mass.Node is { } node)
            {
                forces[topology.JointOfNode[node]] += mass.Kg * weightPerKg;
            }
            else if (mass.Tube is { } tube)
            {
                along[tube] += mass.Kg / model.Tubes[tube].Length * weightPerKg;
            }
        }

        var nodal = new List<NodalLoad>();
        for (int joint = 0; joint < forces.Length; joint++)
        {
            if (forces[joint] != Vector3.Zero || moments[joint] != Vector3.Zero)
            {
                nodal.Add(new NodalLoad(joint, forces[joint], moments[joint]));
            }
        }

        var elements = new List<LoadedElement>();
        for (int t = 0; t < along.Length; t++)
        {
            for (int i = 0; i < topology.Tubes[t].Count && (along[t] != Vector3.Zero || weightPerKg != Vector3.Zero); i++)
            {
                elements.Add(new LoadedElement(topology.Tubes[t].First + i, model.Tubes[t].Group, along[t], topology.Tubes[t].StretchOf(i)));
            }
        }

        return new CaseLoads(solver, nodal, elements, weightPerKg);
    }

    /// <summary>The loads along elements in one design.</summary>
    /// <param name="massPerLength">By group, kg/mm.</param>
    /// <param name="loads">Out: one an entry of <see cref="Elements"/>.</param>
    public void Combine(ReadOnlySpan<double> massPerLength, Span<ElementLoad> loads)
    {
        for (int i = 0; i < Elements.Count; i++)
        {
            LoadedElement element = Elements[i];
            loads[i] = new ElementLoad(element.Element, element.Stretch * (element.Given + (massPerLength[element.Group] * WeightPerKg)));
        }
    }
}

/// <summary>An element with a load along it.</summary>
/// <param name="Element">Index of the element.</param>
/// <param name="Group">Index of its group.</param>
/// <param name="Given">The load that no design changes, N per mm of the tube's axis, global.</param>
/// <param name="Stretch">Length of the tube's axis over that of the element: more than 1 in a bend.</param>
internal readonly record struct LoadedElement(int Element, int Group, Vector3 Given, double Stretch);
