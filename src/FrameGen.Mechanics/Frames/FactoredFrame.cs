namespace FrameGen.Mechanics.Frames;

/// <summary>A frame whose stiffness is factored: solves load sets. For one thread at a time.</summary>
public sealed class FactoredFrame
{
    private const int Six = SymbolicFactor.Six;

    // Far below what is refused, and far above what an ordinary frame leaves.
    private const double RefineAbove = 1e-11;
    private const int MostRefinements = 5;

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
        solution.Apply(loads, _stiffness.HingeShears);
        Gather(solution.Residuals);
        _factor.Solve(_unknowns);
        solution.Set(_unknowns);
        solution.Recover(_stiffness.OfModes, _stiffness.HingeShears);
        LookAtUnbalance(solution);
        if (solution.BackwardError > RefineAbove)
        {
            Refine(solution, loads);
        }

        solution.EquilibriumError = Equilibrium.ErrorOf(_layout, loads, solution);
        return solution;
    }

    // What is left unbalanced is solved for once more and added. The unbalance needs more digits of the displacements than a double has: the
    // strain of a stiff tube is a small difference of large displacements.
    private void Refine(FrameSolution solution, BeamLoads loads)
    {
        solution.KeepRest();
        LookAgain();
        for (int step = 0; step < MostRefinements && solution.BackwardError > RefineAbove; step++)
        {
            double before = solution.BackwardError;
            Gather(solution.Residuals);
            _factor.Solve(_unknowns);
            solution.Add(_unknowns);
            LookAgain();
            if (!(solution.BackwardError < 0.5 * before))
            {
                break;
            }
        }

        void LookAgain()
        {
            solution.Apply(loads, _stiffness.HingeShears);
            solution.Recover(_stiffness.OfModes, _stiffness.HingeShears);
            LookAtUnbalance(solution);
        }
    }

    /// <summary>The frame's pattern.</summary>
    internal FrameLayout Layout => _layout;

    /// <summary>Six stiffnesses an element, in the order of its modes.</summary>
    internal double[] OfModes => _stiffness.OfModes;

    /// <summary><see cref="StiffnessBlocks.HingeShears"/>.</summary>
    internal double[] HingeShears => _stiffness.HingeShears;

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

    /// <summary>Takes minus the unbalance of the free freedoms, at first the loads, in elimination order.</summary>
    private void Gather(double[] residuals)
    {
        for (int place = 0; place < _layout.NodeAt.Length; place++)
        {
            int node = _layout.NodeAt[place];
            for (int i = 0; i < Six; i++)
            {
                _unknowns[(Six * place) + i] = _layout.Held[(Six * node) + i] ? 0 : -residuals[(Six * node) + i];
            }
        }
    }

    private void LookAtUnbalance(FrameSolution solution)
    {
        // A truss has no moments but rounding, a pure twist no forces: neither must be measured against itself.
        double force = Math.Max(solution.LargestForce, solution.LargestMoment / _layout.LongestElement);
        double moment = force * _layout.LongestElement;
        double worst = 0;
        int freedom = -1;
        for (int k = 0; k < _layout.Held.Length && force > 0; k++)
        {
            double error = _layout.Held[k] ? 0 : Math.Abs(solution.Residuals[k]) / (k % Six < 3 ? force : moment);

            // "Not within", so that NaN shows.
            if (!(error <= worst))
            {
                (worst, freedom) = (error, k);
            }
        }

        solution.BackwardError = worst;
        solution.WorstNode = freedom < 0 ? -1 : freedom / Six;
    }
}
