using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;

namespace FrameGen.Sizing.Analysis;

/// <summary>
/// A frame as the solver sees it, the same for every design: joints where tubes meet or a load stands, elements between them, the
/// supports that act together, and the loads of every case split into what is given and what the tubes' own weight adds.
/// </summary>
internal sealed class StructuralModel
{
    internal StructuralModel(FrameModel model, Topology topology, IReadOnlyList<FrameSolver> solvers, IReadOnlyList<CaseLoads> cases, IReadOnlyList<UnitLoad> units) =>
        (Model, Topology, Solvers, Cases, Units, Fine) = (model, topology, solvers, cases, units, FineModel.Build(topology, solvers));

    public FrameModel Model { get; }

    public Topology Topology { get; }

    /// <summary>One a distinct set of supports.</summary>
    public IReadOnlyList<FrameSolver> Solvers { get; }

    /// <summary>By load case.</summary>
    public IReadOnlyList<CaseLoads> Cases { get; }

    /// <summary>One a stiffness target, in the order of the targets.</summary>
    public IReadOnlyList<UnitLoad> Units { get; }

    /// <summary>For buckling and vibration.</summary>
    public FineModel Fine { get; }

    /// <summary>Position in <see cref="Solvers"/> of the supports that the frame vibrates on; null when there are none.</summary>
    public int? VibrationSolver { get; private init; }

    /// <summary>True where stiffness and loads are sums over the groups, of what each one's section gives: no hinges.</summary>
    public bool IsLinearInSections { get; private init; }

    /// <summary>Builds it.</summary>
    /// <param name="model">Resolved: supports, loads, masses and targets stand on nodes that tubes meet.</param>
    public static StructuralModel Build(FrameModel model)
    {
        var topology = Topology.Build(model);
        var solvers = new List<FrameSolver>();
        var sets = new List<int[]>();
        List<CaseLoads> cases = [.. model.Cases.Select(c => CaseLoads.Build(model, topology, c, SolverFor(c.Supports)))];
        List<UnitLoad> units = [.. model.Targets.OfType<StiffnessTarget>().Select(t => UnitLoad.Build(topology, t, SolverFor(t.Supports)))];
        int? vibration = model.Targets.OfType<FrequencyTarget>().FirstOrDefault() is { } frequency ? SolverFor(frequency.Supports)
            : model.Supports.Count > 0 ? SolverFor([.. Enumerable.Range(0, model.Supports.Count)])
            : null;
        return new StructuralModel(model, topology, solvers, cases, units)
        {
            VibrationSolver = vibration,
            IsLinearInSections = !topology.Frame.Elements.Any(e => e.Hinges != Hinges.None),
        };

        int SolverFor(IReadOnlyList<int> supports)
        {
            int[] set = [.. supports.Distinct().Order()];
            int known = sets.FindIndex(s => s.AsSpan().SequenceEqual(set));
            if (known >= 0)
            {
                return known;
            }

            sets.Add(set);
            solvers.Add(new FrameSolver(
                topology.Frame,
                [.. set.Select(s => new Restraint(topology.JointOfNode[model.Supports[s].Node], model.Supports[s].Held) { Springs = model.Supports[s].Springs })]));
            return sets.Count - 1;
        }
    }
}

/// <summary>The push or couple of a stiffness target.</summary>
/// <param name="Target">The target.</param>
/// <param name="Solver">Position in <see cref="StructuralModel.Solvers"/>.</param>
/// <param name="Loads">1 N or 1 N·mm, opposite at the other node where there is one.</param>
internal sealed record UnitLoad(StiffnessTarget Target, int Solver, BeamLoads Loads)
{
    public static UnitLoad Build(Topology topology, StiffnessTarget target, int solver)
    {
        List<NodalLoad> loads = [Push(target.To, target.Direction)];
        if (target.From is { } from)
        {
            loads.Add(Push(from, -target.Direction));
        }

        return new UnitLoad(target, solver, new BeamLoads(loads, []));

        NodalLoad Push(int node, Vector3 along) => target.Turning
            ? new NodalLoad(topology.JointOfNode[node], Vector3.Zero, along)
            : new NodalLoad(topology.JointOfNode[node], along, Vector3.Zero);
    }
}
