using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Program;
using FrameGen.Sizing.Targets;

namespace FrameGen.Sizing.Search;

/// <summary>What an analysed design tells of all others: rows that every design satisfies which meets the targets.</summary>
internal sealed class TargetCuts
{
    private readonly StructuralModel _structure;
    private readonly ResponseCut _cut;
    private readonly StressResponses _stresses;
    private readonly ModeCuts _modes;

    public TargetCuts(DesignSpace space, StructuralModel structure, WeldPairs welds)
    {
        _structure = structure;
        var table = new StiffnessTable(space, structure);
        _cut = new ResponseCut(space, structure, table, new Weights(space, structure));
        _stresses = new StressResponses(space, structure, table, welds);
        _modes = new ModeCuts(space, structure, table);
    }

    /// <summary>The rows of one target.</summary>
    /// <param name="design">An analysed design.</param>
    /// <param name="check">The target.</param>
    /// <param name="above">Only from what uses more of its limit than this share.</param>
    public IEnumerable<ProgramRow> From(DesignAnalysis design, TargetCheck check, double above)
    {
        // What a hinge makes of a load along its tube depends on the section: no rows then, designs are only excluded one by one.
        if (!_structure.IsLinearInSections)
        {
            yield break;
        }

        IEnumerable<Response> responses = check.Target switch
        {
            DisplacementTarget t => [Movement(design, t.Case, t.From, t.To, t.Along, t.Max, turning: false)],
            RotationTarget t => [Movement(design, t.Case, t.From, t.To, t.About, t.Max, turning: true)],
            StiffnessTarget t => [Compliance(t)],
            StrengthTarget t => _stresses.Of(design, t, above),
            BucklingTarget t => _modes.Buckling(design, t, above),
            _ => [],
        };
        if (check.Target is FrequencyTarget frequency && _modes.Frequency(design, frequency) is { } modal)
        {
            yield return modal;
        }

        foreach (Response response in responses)
        {
            if (_cut.Make(design, response) is { } row)
            {
                yield return row;
            }
        }
    }

    private Response Compliance(StiffnessTarget target)
    {
        int unit = 0;
        while (!ReferenceEquals(_structure.Units[unit].Target, target))
        {
            unit++;
        }

        return new Response(LoadSet.Unit(unit), 1 / target.Min, _structure.Units[unit].Loads.NodalLoads);
    }

    // Along the direction asked for, or the one it moves in, in the sense it moves in.
    private Response Movement(DesignAnalysis design, int loadCase, int? from, int to, Vector3? along, double max, bool turning)
    {
        FrameSolution solution = design.Case(loadCase);
        IReadOnlyList<int> joints = _structure.Topology.JointOfNode;
        Vector3 moved = Of(joints[to]);
        if (from is { } other)
        {
            moved -= Of(joints[other]);
        }

        Vector3 direction = along is { } given
            ? moved.Dot(given) < 0 ? -given : given
            : moved.Length > 0 ? 1 / moved.Length * moved : Vector3.UnitX;
        List<NodalLoad> loads = [Unit(joints[to], direction)];
        if (from is { } reference)
        {
            loads.Add(Unit(joints[reference], -direction));
        }

        return new Response(LoadSet.Case(loadCase), max, loads);

        Vector3 Of(int joint) => turning ? solution.Rotation(joint) : solution.Displacement(joint);

        NodalLoad Unit(int joint, Vector3 d) => turning ? new NodalLoad(joint, Vector3.Zero, d) : new NodalLoad(joint, d, Vector3.Zero);
    }
}
