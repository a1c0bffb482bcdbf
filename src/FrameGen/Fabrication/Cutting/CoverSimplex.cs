namespace FrameGen.Fabrication.Cutting;

/// <summary>
/// A small dense revised simplex for the cover of pieces by bars: least number of bought bars so that every size is cut often enough
/// and no length of the rack is used more often than it is there. Columns come one by one, as they are asked for.
/// </summary>
/// <remarks>
/// Rows are the sizes (cut at least the count), then the kinds of lengths on the rack (used at most so often). The inverse of the
/// basis is kept, row by row, m × m. Prices from it are not trusted further than they have to be: the bound that is told to people is
/// worked out from them anew (<see cref="PatternRelaxation"/>).
/// </remarks>
internal sealed class CoverSimplex
{
    private const double SmallestPivot = 1e-9;

    private readonly int _rows;
    private readonly int _sizes;
    private readonly double[] _inverse;
    private readonly double[] _amounts;
    private readonly int[] _basis;
    private readonly double[] _entering;
    private readonly double[] _direction;
    private readonly List<Pattern> _patterns = [];

    /// <summary>Begins with bars of one size each, and the rack untouched.</summary>
    /// <param name="counts">How many pieces of each size.</param>
    /// <param name="first">By size: how many of it one bar is cut into at the beginning; at least 1.</param>
    /// <param name="rack">How many lengths of each kind are on the rack.</param>
    public CoverSimplex(ReadOnlySpan<int> counts, ReadOnlySpan<int> first, ReadOnlySpan<int> rack)
    {
        (_sizes, _rows) = (counts.Length, counts.Length + rack.Length);
        _inverse = new double[_rows * _rows];
        _amounts = new double[_rows];
        _basis = new int[_rows];
        _entering = new double[_rows];
        _direction = new double[_rows];
        Prices = new double[_rows];
        for (int row = 0; row < _rows; row++)
        {
            bool isSize = row < _sizes;
            double pivot = isSize ? first[row] : 1;
            _inverse[(row * _rows) + row] = 1 / pivot;
            _amounts[row] = (isSize ? counts[row] : rack[row - _sizes]) / pivot;
            if (isSize)
            {
                int[] only = new int[_sizes];
                only[row] = first[row];
                _basis[row] = _patterns.Count;
                _patterns.Add(new Pattern(null, only));
            }
            else
            {
                _basis[row] = Slack(row);
            }
        }

        Reprice();
    }

    /// <summary>Price of a piece of each size, then of a length of each kind on the rack (not positive), at the present basis.</summary>
    public double[] Prices { get; }

    /// <summary>What an exchange costs, in steps of a search: it goes over the inverse three times.</summary>
    public long StepsAPivot => 1 + ((long)_rows * _rows / 8);

    /// <summary>All patterns that have entered, in the order they did.</summary>
    public IReadOnlyList<Pattern> Patterns => _patterns;

    /// <summary>The patterns in use and how many bars are cut by each; fractions.</summary>
    public IEnumerable<(Pattern Pattern, double Bars)> Solution()
    {
        for (int row = 0; row < _rows; row++)
        {
            if (_basis[row] >= 0 && _amounts[row] > 0)
            {
                yield return (_patterns[_basis[row]], _amounts[row]);
            }
        }
    }

    /// <summary>Lets in the slack of a row whose price has the wrong sign.</summary>
    /// <returns>False where there is none.</returns>
    public bool EnterSlack()
    {
        const double Wrong = 1e-9;
        int worst = -1;
        double by = Wrong;
        for (int row = 0; row < _rows; row++)
        {
            double wrong = row < _sizes ? -Prices[row] : Prices[row];
            if (wrong > by)
            {
                (worst, by) = (row, wrong);
            }
        }

        if (worst < 0)
        {
            return false;
        }

        Array.Clear(_entering);
        _entering[worst] = worst < _sizes ? -1 : 1;
        return Pivot(Slack(worst));
    }

    /// <summary>Lets in a pattern.</summary>
    /// <returns>False where rounding leaves nothing to exchange it for.</returns>
    public bool Enter(Pattern pattern)
    {
        Array.Clear(_entering);
        for (int size = 0; size < _sizes; size++)
        {
            _entering[size] = pattern.Counts[size];
        }

        if (pattern.RackKind is { } kind)
        {
            _entering[_sizes + kind] = 1;
        }

        _patterns.Add(pattern);
        return Pivot(_patterns.Count - 1);
    }

    private static int Slack(int row) => -1 - row;

    private bool Pivot(int column)
    {
        int leaving = -1;
        double least = double.PositiveInfinity;
        for (int row = 0; row < _rows; row++)
        {
            double sum = 0;
            ReadOnlySpan<double> inverse = _inverse.AsSpan(row * _rows, _rows);
            for (int i = 0; i < inverse.Length; i++)
            {
                sum += inverse[i] * _entering[i];
            }

            _direction[row] = sum;
            if (sum > SmallestPivot)
            {
                // Of rows that tie, the largest pivot: steadier, and less given to going round in circles.
                double ratio = Math.Max(0, _amounts[row]) / sum;
                if (ratio < least - 1e-12 || (ratio <= least + 1e-12 && leaving >= 0 && sum > _direction[leaving]))
                {
                    (leaving, least) = (row, Math.Min(ratio, least));
                }
            }
        }

        if (leaving < 0)
        {
            return false;
        }

        Exchange(leaving, least);
        _basis[leaving] = column;
        Reprice();
        return true;
    }

    private void Exchange(int leaving, double amount)
    {
        Span<double> pivotRow = _inverse.AsSpan(leaving * _rows, _rows);
        double pivot = _direction[leaving];
        for (int i = 0; i < pivotRow.Length; i++)
        {
            pivotRow[i] /= pivot;
        }

        for (int row = 0; row < _rows; row++)
        {
            double factor = _direction[row];
            if (row != leaving && factor != 0)
            {
                Span<double> target = _inverse.AsSpan(row * _rows, _rows);
                for (int i = 0; i < target.Length; i++)
                {
                    target[i] -= factor * pivotRow[i];
                }

                _amounts[row] = Math.Max(0, _amounts[row] - (factor * amount));
            }
        }

        _amounts[leaving] = amount;
    }

    // A bought bar costs 1, all else nothing: the prices are the sum of the inverse's rows that stand for bought bars.
    private void Reprice()
    {
        Array.Clear(Prices);
        for (int row = 0; row < _rows; row++)
        {
            if (_basis[row] >= 0 && _patterns[_basis[row]].RackKind is null)
            {
                ReadOnlySpan<double> inverse = _inverse.AsSpan(row * _rows, _rows);
                for (int i = 0; i < inverse.Length; i++)
                {
                    Prices[i] += inverse[i];
                }
            }
        }
    }
}
