using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Stability;
using FrameGen.Model;

namespace FrameGen.Sizing.Analysis;

/// <summary>Buckling and vibration of the design that an analysis stands at, as far as they are asked about. For one thread.</summary>
internal sealed class StabilityAnalysis
{
    /// <summary>Frequencies that are looked for.</summary>
    public const int Frequencies = 3;

    private readonly DesignAnalysis _analysis;
    private readonly FactoredFrame?[] _factored;
    private readonly bool[] _isFactored;
    private readonly BucklingMode?[] _cases;
    private readonly bool[] _caseKnown;
    private IReadOnlyList<VibrationMode>? _modes;

    public StabilityAnalysis(DesignAnalysis analysis)
    {
        _analysis = analysis;
        _factored = new FactoredFrame?[analysis.Structure?.Solvers.Count ?? 0];
        _isFactored = new bool[_factored.Length];
        _cases = new BucklingMode?[analysis.Structure?.Cases.Count ?? 0];
        _caseKnown = new bool[_cases.Length];
    }

    /// <summary>Forgets the design.</summary>
    public void Clear()
    {
        Array.Clear(_isFactored);
        Array.Clear(_caseKnown);
        _modes = null;
    }

    /// <summary>The lowest way to buckle in a load case; null when nothing is compressed.</summary>
    /// <exception cref="MechanismException">The frame can move without strain.</exception>
    public BucklingMode? Case(int index)
    {
        if (!_caseKnown[index])
        {
            StructuralModel structure = _analysis.Structure!;
            FrameSolution solution = _analysis.Case(index);
            _cases[index] = LinearBuckling.Lowest(
                Factored(structure.Cases[index].Solver), structure.Fine.Refined.AxialForces(solution), LargestForce(structure, solution));
            _caseKnown[index] = true;
        }

        return _cases[index];
    }

    /// <summary>The lowest ways to vibrate with the masses; fewer than <see cref="Frequencies"/> only where the frame has fewer.</summary>
    /// <exception cref="MechanismException">The frame can move without strain.</exception>
    public IReadOnlyList<VibrationMode> Modes() =>
        _modes ??= NaturalFrequencies.Lowest(Factored(_analysis.Structure!.VibrationSolver!.Value), Mass(), Frequencies);

    /// <summary>What moves most when the frame buckles in a case, in words; empty when nothing is compressed.</summary>
    public string WhereBuckling(int index) => Case(index) is { } mode ? Where(mode.Shape) : "";

    /// <summary>What moves most in a shape: <c>node top</c>, <c>tube strut</c>.</summary>
    public string Where(ModeShape shape)
    {
        StructuralModel structure = _analysis.Structure!;
        FrameModel model = structure.Model;
        int most = 0;
        double largest = 0;
        for (int node = 0; node < structure.Fine.Refined.Frame.Nodes.Count; node++)
        {
            // Twins move alike but for rounding: the first of them is named.
            double moved = shape.Displacement(node).Length;
            if (moved > largest * (1 + 1e-6))
            {
                (most, largest) = (node, moved);
            }
        }

        return structure.Fine.TubeOf(most) is >= 0 and var tube
            ? $"tube {model.Tubes[tube].Name}"
            : $"node {model.Nodes[structure.Topology.NodeOfJoint[most]].Name}";
    }

    /// <summary>Axial forces that are nothing beside this are rounding: a beam's that only bends.</summary>
    private static double LargestForce(StructuralModel structure, FrameSolution solution)
    {
        double largest = 0;
        for (int e = 0; e < structure.Topology.Frame.Elements.Count; e++)
        {
            ElementForces forces = solution.Forces(e);
            double turning = (Math.Abs(forces.Start.My) + Math.Abs(forces.Start.Mz) + Math.Abs(forces.Start.T)) / forces.Length;
            largest = Math.Max(largest, Math.Max(Math.Max(Math.Abs(forces.Start.Vy), Math.Abs(forces.Start.Vz)), turning));
        }

        return largest;
    }

    private FactoredFrame Factored(int solver)
    {
        if (!_isFactored[solver])
        {
            _factored[solver] = _analysis.Structure!.Fine.Solver(solver).Factor(_analysis.Profiles, _factored[solver]);
            _isFactored[solver] = true;
        }

        return _factored[solver]!;
    }

    /// <summary>What is carried along each tube, kg/mm.</summary>
    public double[] CarriedPerLength()
    {
        FrameModel model = _analysis.Space.Model;
        var carried = new double[model.Tubes.Count];
        foreach (CarriedMass mass in model.Masses)
        {
            if (mass.Tube is { } tube)
            {
                carried[tube] += mass.Kg / model.Tubes[tube].Length;
            }
        }

        return carried;
    }

    /// <summary>All the mass of the design.</summary>
    public FrameMass Mass()
    {
        StructuralModel structure = _analysis.Structure!;
        FrameModel model = structure.Model;
        double[] carried = CarriedPerLength();
        var points = new List<PointMass>();
        foreach (CarriedMass mass in model.Masses)
        {
            if (mass.Node is { } node)
            {
                points.Add(new PointMass(structure.Topology.JointOfNode[node], mass.Kg));
            }
        }

        RefinedFrame refined = structure.Fine.Refined;
        var elements = new BeamInertia[refined.Frame.Elements.Count];
        for (int t = 0; t < model.Tubes.Count; t++)
        {
            int group = model.Tubes[t].Group;
            var inertia = BeamInertia.Of(_analysis.Profiles[group], model.Groups[group].Material.Density, carried[t]);
            TubeElements tube = structure.Topology.Tubes[t];
            for (int i = 0; i < tube.Count; i++)
            {
                int first = refined.First(tube.First + i);
                Array.Fill(elements, inertia.Stretched(tube.StretchOf(i)), first, refined.First(tube.First + i + 1) - first);
            }
        }

        return new FrameMass(elements, points);
    }
}
