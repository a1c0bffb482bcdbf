using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Sizing.Analysis;

/// <summary>
/// One design at a time, analysed as far as it is asked about: nothing is factored, solved or looked up before a target needs it.
/// For one thread; reused from design to design.
/// </summary>
internal sealed class DesignAnalysis
{
    private readonly int[] _choice;
    private readonly Section[] _sections;
    private readonly BeamProfile[] _profiles;
    private readonly double[] _massPerLength;
    private readonly double[] _halfWidths;

    // Memory is kept from design to design; what a design has asked for already is marked.
    private readonly FactoredFrame?[] _factored;
    private readonly FrameSolution?[] _cases;
    private readonly FrameSolution?[] _units;
    private readonly bool[] _isFactored;
    private readonly bool[] _caseSolved;
    private readonly bool[] _unitSolved;
    private readonly ElementLoad[][] _elementLoads;
    private readonly BeamLoads[] _loads;
    private readonly WeldZones _welds;
    private bool _weldsKnown;

    public DesignAnalysis(DesignSpace space, JointTable joints, WeldPairs welds, StructuralModel? structure)
    {
        (Space, Joints, Structure) = (space, joints, structure);
        _choice = new int[space.Groups];
        _sections = new Section[space.Groups];
        _profiles = new BeamProfile[space.Groups];
        _massPerLength = new double[space.Groups];
        _halfWidths = new double[space.Groups];
        _factored = new FactoredFrame?[structure?.Solvers.Count ?? 0];
        _cases = new FrameSolution?[structure?.Cases.Count ?? 0];
        _units = new FrameSolution?[structure?.Units.Count ?? 0];
        _isFactored = new bool[_factored.Length];
        _caseSolved = new bool[_cases.Length];
        _unitSolved = new bool[_units.Length];
        _elementLoads = [.. (structure?.Cases ?? []).Select(c => new ElementLoad[c.Elements.Count])];
        _loads = [.. (structure?.Cases ?? []).Select((c, i) => new BeamLoads(c.Nodal, _elementLoads[i]))];
        _welds = new WeldZones(welds);
        Stability = new StabilityAnalysis(this);
        Set(new int[space.Groups]);
    }

    public DesignSpace Space { get; }

    public JointTable Joints { get; }

    /// <summary>Null when nothing asks for the frame's statics.</summary>
    public StructuralModel? Structure { get; }

    /// <summary>The design: a position in each group's options.</summary>
    public ReadOnlySpan<int> Choice => _choice;

    /// <summary>By group.</summary>
    public Section[] Sections => _sections;

    /// <summary>By group.</summary>
    public BeamProfile[] Profiles => _profiles;

    /// <summary>Buckling and vibration of the design.</summary>
    public StabilityAnalysis Stability { get; }

    /// <summary>Turns to another design.</summary>
    public void Set(ReadOnlySpan<int> choice)
    {
        for (int g = 0; g < _choice.Length; g++)
        {
            Option option = Space[g][choice[g]];
            _choice[g] = choice[g];
            _sections[g] = option.Section;
            _profiles[g] = option.Profile;
            _massPerLength[g] = option.MassPerLength;
            _halfWidths[g] = option.HalfWidth;
        }

        Array.Clear(_isFactored);
        Array.Clear(_caseSolved);
        Array.Clear(_unitSolved);
        _weldsKnown = false;
        Stability.Clear();
    }

    /// <summary>The frame under a load case.</summary>
    /// <returns>Good until the next design.</returns>
    /// <exception cref="MechanismException">The frame can move without strain.</exception>
    public FrameSolution Case(int index)
    {
        if (!_caseSolved[index])
        {
            CaseLoads loads = Structure!.Cases[index];
            loads.Combine(_massPerLength, _elementLoads[index]);
            _cases[index] = Factored(loads.Solver).Solve(_loads[index], _cases[index]);
            _caseSolved[index] = true;
        }

        return _cases[index]!;
    }

    /// <summary>The frame under the unit push or couple of a stiffness target, by its position among them.</summary>
    /// <returns>Good until the next design.</returns>
    /// <exception cref="MechanismException">The frame can move without strain.</exception>
    public FrameSolution Unit(int index)
    {
        if (!_unitSolved[index])
        {
            UnitLoad unit = Structure!.Units[index];
            _units[index] = Factored(unit.Solver).Solve(unit.Loads, _units[index]);
            _unitSolved[index] = true;
        }

        return _units[index]!;
    }

    /// <summary>Factors the frame under one set of supports.</summary>
    /// <exception cref="MechanismException">The frame can move without strain.</exception>
    public FactoredFrame Factored(int solver)
    {
        if (!_isFactored[solver])
        {
            _factored[solver] = Structure!.Solvers[solver].Factor(_profiles, _factored[solver]);
            _isFactored[solver] = true;
        }

        return _factored[solver]!;
    }

    /// <summary>Where welds soften the tubes.</summary>
    public WeldZones Welds()
    {
        if (!_weldsKnown)
        {
            _welds.Fill(Joints, _choice, _sections, _halfWidths);
            _weldsKnown = true;
        }

        return _welds;
    }
}
