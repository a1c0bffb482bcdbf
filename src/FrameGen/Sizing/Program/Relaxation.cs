namespace FrameGen.Sizing.Program;

/// <summary>
/// The program with fractions allowed, at one place of the search: its optimum bounds every choice there. Solved by the dual simplex method on the
/// rows that matter; what is bounded is proven from the multipliers alone.
/// </summary>
/// <remarks>
/// For any multipliers λ ≥ 0, no choice costs less than L(λ) = Σ over sets of min over options (c + Σ λ a) − Σ λ b: the Lagrangian bound (M. Fisher,
/// Management Science 27 (1981) 1; for one row P. Sinha, A. Zoltners, Operations Research 27 (1979) 503). The simplex method only suggests good λ;
/// L is then summed afresh, with all that rounding can do to it taken off, so that no error of the simplex method can spoil a proof. That there is no choice at
/// all is proven in the same way from multipliers without costs. The start, the cheapest option of every set and all rows slack, is dual
/// feasible as it stands, so that there is one phase only.
/// </remarks>
internal sealed partial class Relaxation(ChoiceProgram program)
{
    private const double Feasible = 1e-9;
    private const double SmallestPivot = 1e-9;
    private const int RowsAtOnce = 12;
    private const int RefactorAfter = 50;
    private const double Unit = 1.2e-16;

    private readonly List<int> _variables = [];
    private readonly List<int> _rows = [];
    private readonly List<double[]> _weights = [];
    private double[] _costs = [];
    private double[] _reduced = [];
    private double[] _alpha = [];
    private double[] _inverse = [];
    private double[] _values = [];
    private double[] _column = [];
    private int[] _basis = [];
    private bool[] _isBasic = [];
    private int _stride;
    private int _pivots;
    private double _scale = 1;
    private bool _trouble;

    private int Sets => program.Sets;

    private int Size => Sets + _rows.Count;

    /// <summary>No choice here costs less, units; <see cref="long.MaxValue"/> where there is proven to be none.</summary>
    public long Bound { get; private set; }

    /// <summary>The fractions: variables that are not zero, ascending. Empty where the simplex method got stuck.</summary>
    public List<(int Variable, double Value)> Fractions { get; } = [];

    /// <summary>Rows with a multiplier: what is worth starting from below.</summary>
    public List<int> Tight { get; } = [];

    /// <summary>Solves it.</summary>
    /// <param name="open">Options that may be chosen: at least one of each set.</param>
    /// <param name="start">Rows to begin with.</param>
    /// <param name="cutoff">Costs above this are of no interest: it may stop there.</param>
    /// <param name="without">Out: options that no choice up to the cutoff takes are removed; null to leave them.</param>
    public void Solve(OptionSet open, IReadOnlyList<int> start, long cutoff, OptionSet? without = null)
    {
        Begin(open, start);
        bool none = !Optimise(cutoff);
        Fractions.Clear();
        Tight.Clear();
        if (none)
        {
            Bound = long.MaxValue;
            return;
        }

        double[] multipliers = Multipliers();
        Bound = SafeBound(multipliers, without, cutoff);
        for (int r = 0; r < multipliers.Length; r++)
        {
            if (multipliers[r] > 0)
            {
                Tight.Add(_rows[r]);
            }
        }

        if (!_trouble)
        {
            for (int i = 0; i < Size; i++)
            {
                if (_basis[i] < _variables.Count && _values[i] > Feasible)
                {
                    Fractions.Add((_variables[_basis[i]], _values[i]));
                }
            }

            Fractions.Sort((a, b) => a.Variable.CompareTo(b.Variable));
        }
    }

    // The multipliers of the rows are the reduced costs of their slacks.
    private double[] Multipliers()
    {
        var multipliers = new double[_rows.Count];
        for (int r = 0; r < multipliers.Length; r++)
        {
            int slack = _variables.Count + r;
            multipliers[r] = _isBasic[slack] ? 0 : Math.Max(0, _reduced[slack]) * _scale;
        }

        return multipliers;
    }

    private long SafeBound(double[] multipliers, OptionSet? without, long cutoff)
    {
        double[] priced = Priced(multipliers, withCosts: true);
        double[] least = LeastOfSets(priced);
        double bound = least.Sum();
        double size = 0;
        for (int r = 0; r < multipliers.Length; r++)
        {
            bound -= multipliers[r] * program.Rows[_rows[r]].Limit;
            size += multipliers[r] * (1 + Math.Abs(program.Rows[_rows[r]].Limit));
        }

        double margin = Unit * (multipliers.Length + Sets + 4) * Sets * (size + _scale);
        if (without is not null && cutoff < long.MaxValue)
        {
            for (int j = 0; j < priced.Length; j++)
            {
                if (bound - margin + (priced[j] - least[program.SetOf[_variables[j]]]) > cutoff)
                {
                    without.Remove(_variables[j]);
                }
            }
        }

        double safe = Math.Ceiling(bound - margin);
        return safe >= long.MaxValue / 2.0 ? long.MaxValue / 2 : (long)safe;
    }

    // By Farkas: multipliers under which even the least of every set together goes beyond the limits.
    private bool IsEmpty(int leaving)
    {
        var ray = new double[_rows.Count];
        for (int r = 0; r < ray.Length; r++)
        {
            ray[r] = Math.Max(0, _inverse[(leaving * _stride) + Sets + r]);
        }

        double over = LeastOfSets(Priced(ray, withCosts: false)).Sum();
        double size = 0;
        for (int r = 0; r < ray.Length; r++)
        {
            over -= ray[r] * program.Rows[_rows[r]].Limit;
            size += ray[r] * (1 + Math.Abs(program.Rows[_rows[r]].Limit));
        }

        return over > Unit * (ray.Length + Sets + 4) * Sets * size;
    }

    private double[] Priced(double[] multipliers, bool withCosts)
    {
        var priced = new double[_variables.Count];
        for (int j = 0; j < priced.Length; j++)
        {
            priced[j] = withCosts ? program.Costs[_variables[j]] : 0;
        }

        for (int r = 0; r < multipliers.Length; r++)
        {
            if (multipliers[r] > 0)
            {
                double[] weights = _weights[r];
                for (int j = 0; j < priced.Length; j++)
                {
                    priced[j] += multipliers[r] * weights[j];
                }
            }
        }

        return priced;
    }

    private double[] LeastOfSets(double[] priced)
    {
        var least = new double[Sets];
        Array.Fill(least, double.PositiveInfinity);
        for (int j = 0; j < priced.Length; j++)
        {
            int set = program.SetOf[_variables[j]];
            least[set] = Math.Min(least[set], priced[j]);
        }

        return least;
    }
}
