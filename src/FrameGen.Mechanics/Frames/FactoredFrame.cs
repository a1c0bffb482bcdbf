namespace FrameGen.Mechanics.Frames;

/// <summary>A frame whose stiffness is factored: solves load sets. For one thread at a time.</summary>
public sealed class FactoredFrame
{
    private const int Six = SymbolicFactor.Six;

    private readonly FrameLayout _layout;
    private readonly StiffnessBlocks _stiffness;
    private readonly NumericFactor _factor;
    private readonly double[] _unknowns;

    internal FactoredFrame(FrameLayout layout)
    {
        _layout = layout;
        _stiffness = new StiffnessBlocks(layout);
        _factor = new NumericFactor(layout, _stiffness);
        _unknowns = new double[Six * layout.NodeAt.Length];
    }

    /// <summary>Solves one load set.</summary>
    /// <param name="loads">Loads; those on held freedoms go straight into the support.</param>
    /// <exception cref="ArgumentOutOfRangeException">A load names a node or an element that is not there, or is not finite.</exception>
    public FrameSolution Solve(BeamLoads loads) => Solve(loads, reuse: null);

    /// <summary>Solves one load set in the memory of an earlier solution.</summary>
    /// <param name="loads">Loads; those on held freedoms go straight into the support.</param>
    /// <param name="reuse">A solution of the same solver that is not needed any more: it is overwritten and returned. Null makes a new one.</param>
    /// <exception cref="ArgumentOutOfRangeException">A load names a node or an element that is not there, or is not finite.</exception>
    /// <exception cref="ArgumentException"><paramref name="reuse"/> is of another solver.</exception>
    public FrameSolution Solve(BeamLoads loads, FrameSolution? reuse)
    {
        ArgumentNullException.ThrowIfNull(loads);
        if (reuse is not null && !reuse.IsOf(_layout))
        {
            throw new ArgumentException("Only a solution of the same solver can be overwritten.", nameof(reuse));
        }

        FrameSolution solution = reuse ?? new FrameSolution(_layout);
        solution.Apply(loads);
        double largestLoad = Gather(solution.Residuals);
        _factor.Solve(_unknowns);
        Scatter(solution.Displacements);
        solution.Recover(_stiffness.OfModes);
        solution.BackwardError = BackwardErrorOf(solution, largestLoad);
        solution.EquilibriumError = Equilibrium.ErrorOf(_layout, loads, solution.Residuals);
        return solution;
    }

    /// <summary>The frame's pattern.</summary>
    internal FrameLayout Layout => _layout;

    /// <summary>Six stiffnesses an element, in the order of its modes.</summary>
    internal double[] OfModes => _stiffness.OfModes;

    /// <summary>Solves K x = b in place: six values an active node in elimination order, zero in held freedoms.</summary>
    internal void Solve(Span<double> x) => _factor.Solve(x);

    /// <summary>Solves K x = b in place for several b at once, each to the same digits as alone.</summary>
    internal void Solve(ReadOnlySpan<double[]> all) => _factor.Solve(all);

    internal bool IsOf(FrameLayout other) => ReferenceEquals(_layout, other);

    internal void Factor(IReadOnlyList<BeamProfile> profiles)
    {
        _stiffness.Assemble(profiles);
        _factor.Factor(isFixed: null);
        if (_factor.Suspects.Count > 0)
        {
            IReadOnlyList<Mechanism> motions = new MechanismFinder(_layout, _stiffness, _factor).Find();
            if (motions.Count > 0)
            {
                throw new MechanismException(motions);
            }
        }
    }

    /// <summary>Loads on the free freedoms, in elimination order; the largest of them.</summary>
    private double Gather(double[] minusLoads)
    {
        double largest = 0;
        for (int place = 0; place < _layout.NodeAt.Length; place++)
        {
            int node = _layout.NodeAt[place];
            for (int i = 0; i < Six; i++)
            {
                double load = _layout.Held[(Six * node) + i] ? 0 : -minusLoads[(Six * node) + i];
                _unknowns[(Six * place) + i] = load;
                largest = Math.Max(largest, Math.Abs(load));
            }
        }

        return largest;
    }

    private void Scatter(double[] displacements)
    {
        for (int place = 0; place < _layout.NodeAt.Length; place++)
        {
            _unknowns.AsSpan(Six * place, Six).CopyTo(displacements.AsSpan(Six * _layout.NodeAt[place], Six));
        }
    }

    private double BackwardErrorOf(FrameSolution solution, double largestLoad)
    {
        double unbalance = 0;
        double displacement = 0;
        for (int k = 0; k < _layout.Held.Length; k++)
        {
            if (!_layout.Held[k])
            {
                unbalance = Math.Max(unbalance, Math.Abs(solution.Residuals[k]));
                displacement = Math.Max(displacement, Math.Abs(solution.Displacements[k]));
            }
        }

        double scale = (_stiffness.Norm * displacement) + largestLoad;
        return unbalance == 0 ? 0 : unbalance / scale;
    }
}
