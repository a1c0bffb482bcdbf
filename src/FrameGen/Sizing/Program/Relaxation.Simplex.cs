namespace FrameGen.Sizing.Program;

/// <content>
/// The dual simplex method with the inverse of the basis kept in full: a row for every set, Σ x = 1, and one for every row of the program that matters, with its slack.
/// </content>
internal sealed partial class Relaxation
{
    private void Begin(OptionSet open, IReadOnlyList<int> start)
    {
        _variables.Clear();
        _rows.Clear();
        _weights.Clear();
        for (int v = 0; v < program.Variables; v++)
        {
            if (open[v])
            {
                _variables.Add(v);
            }
        }

        int count = _variables.Count;
        if (_costs.Length < count)
        {
            (_costs, _reduced, _alpha) = (new double[count], new double[count + 512], new double[count + 512]);
        }

        _scale = 1;
        for (int j = 0; j < count; j++)
        {
            _scale = Math.Max(_scale, Math.Abs((double)program.Costs[_variables[j]]));
        }

        Reserve(Sets + start.Count + RowsAtOnce);
        Array.Fill(_basis, -1, 0, Sets);
        for (int j = 0; j < count; j++)
        {
            _costs[j] = program.Costs[_variables[j]] / _scale;
            int set = program.SetOf[_variables[j]];
            if (_basis[set] < 0 || _costs[j] < _costs[_basis[set]])
            {
                _basis[set] = j;
            }
        }

        Array.Clear(_inverse);
        for (int set = 0; set < Sets; set++)
        {
            _inverse[(set * _stride) + set] = 1;
            _values[set] = 1;
        }

        _isBasic = _isBasic.Length < count + _stride ? new bool[count + _stride + 512] : _isBasic;
        Array.Clear(_isBasic);
        for (int set = 0; set < Sets; set++)
        {
            _isBasic[_basis[set]] = true;
        }

        for (int j = 0; j < count; j++)
        {
            _reduced[j] = _costs[j] - _costs[_basis[program.SetOf[_variables[j]]]];
        }

        (_pivots, _trouble) = (0, false);
        foreach (int row in start)
        {
            AddRow(row);
        }
    }

    private void Reserve(int size)
    {
        if (size <= _stride)
        {
            return;
        }

        int stride = Math.Max(size, _stride + (_stride / 2) + 16);
        var inverse = new double[stride * stride];
        for (int i = 0; i < Math.Min(Size, _stride); i++)
        {
            Array.Copy(_inverse, i * _stride, inverse, i * stride, _stride);
        }

        _inverse = inverse;
        Array.Resize(ref _values, stride);
        Array.Resize(ref _column, stride);
        Array.Resize(ref _basis, stride);
        _stride = stride;
        int all = _variables.Count + stride;
        if (_reduced.Length < all)
        {
            Array.Resize(ref _reduced, all + 512);
            Array.Resize(ref _alpha, all + 512);
        }

        if (_isBasic.Length < all)
        {
            Array.Resize(ref _isBasic, all + 512);
        }
    }

    // The new row's slack joins the basis: B⁻¹ grows by the row −a B⁻¹ and a 1.
    private void AddRow(int row)
    {
        Reserve(Size + 1);
        ProgramRow added = program.Rows[row];
        var weights = new double[_variables.Count];
        for (int j = 0; j < weights.Length; j++)
        {
            weights[j] = added[_variables[j]];
        }

        int last = Size;
        Span<double> inverse = _inverse.AsSpan(last * _stride, _stride);
        inverse.Clear();
        double value = added.Limit;
        for (int i = 0; i < last; i++)
        {
            _inverse[(i * _stride) + last] = 0;
            double a = _basis[i] < weights.Length ? weights[_basis[i]] : 0;
            if (a != 0)
            {
                value -= a * _values[i];
                ReadOnlySpan<double> other = _inverse.AsSpan(i * _stride, last);
                for (int k = 0; k < last; k++)
                {
                    inverse[k] -= a * other[k];
                }
            }
        }

        inverse[last] = 1;
        _values[last] = value;
        int slack = _variables.Count + _rows.Count;
        _basis[last] = slack;
        _isBasic[slack] = true;
        _reduced[slack] = 0;
        _rows.Add(row);
        _weights.Add(weights);
    }

    /// <summary>False where no choice is proven to be left.</summary>
    private bool Optimise(long cutoff)
    {
        int most = 2000 + (40 * Size);
        for (int step = 0; step < most; step++)
        {
            int leaving = Leaving();
            if (leaving < 0)
            {
                if (!AddViolated())
                {
                    return true;
                }

                continue;
            }

            int entering = Entering(leaving);
            if (entering < 0)
            {
                if (IsEmpty(leaving))
                {
                    return false;
                }

                // Rounding: afresh once, else what there is has to do.
                if (_pivots == 0 || !Refactor())
                {
                    _trouble = true;
                    return true;
                }

                continue;
            }

            if (!Pivot(leaving, entering))
            {
                if (_pivots == 0 || !Refactor())
                {
                    _trouble = true;
                    return true;
                }

                continue;
            }

            if (_pivots >= RefactorAfter && !Refactor())
            {
                _trouble = true;
                return true;
            }

            if ((step & 7) == 7 && Objective() * _scale > cutoff * (1 + 1e-12))
            {
                _trouble = true; // beyond all interest: its fractions say nothing
                return true;
            }
        }

        _trouble = true;
        return true;
    }

    private double Objective()
    {
        double sum = 0;
        for (int i = 0; i < Size; i++)
        {
            sum += _basis[i] < _variables.Count ? _costs[_basis[i]] * _values[i] : 0;
        }

        return sum;
    }

    private int Leaving()
    {
        int leaving = -1;
        double least = -Feasible;
        for (int i = 0; i < Size; i++)
        {
            if (_values[i] < least)
            {
                (leaving, least) = (i, _values[i]);
            }
        }

        return leaving;
    }

    private int Entering(int leaving)
    {
        ReadOnlySpan<double> beta = _inverse.AsSpan(leaving * _stride, Size);
        int count = _variables.Count;
        for (int j = 0; j < count; j++)
        {
            _alpha[j] = beta[program.SetOf[_variables[j]]];
        }

        for (int r = 0; r < _rows.Count; r++)
        {
            double factor = beta[Sets + r];
            _alpha[count + r] = factor;
            if (factor != 0)
            {
                double[] weights = _weights[r];
                for (int j = 0; j < count; j++)
                {
                    _alpha[j] += factor * weights[j];
                }
            }
        }

        int entering = -1;
        double best = double.PositiveInfinity;
        for (int j = 0; j < count + _rows.Count; j++)
        {
            if (_isBasic[j] || _alpha[j] > -SmallestPivot)
            {
                continue;
            }

            double ratio = Math.Max(0, _reduced[j]) / -_alpha[j];
            if (ratio < best - 1e-13 || (ratio <= best + 1e-13 && _alpha[j] < _alpha[entering]))
            {
                (entering, best) = (j, ratio);
            }
        }

        return entering;
    }

    private bool Pivot(int leaving, int entering)
    {
        int size = Size;
        int count = _variables.Count;
        TakeColumn(entering);
        double pivot = _column[leaving];
        if (!(pivot < -SmallestPivot) || Math.Abs(pivot - _alpha[entering]) > 1e-6 * (1 + Math.Abs(pivot)))
        {
            return false;
        }

        double step = _reduced[entering] / _alpha[entering];
        for (int j = 0; j < count + _rows.Count; j++)
        {
            if (!_isBasic[j])
            {
                _reduced[j] -= step * _alpha[j];
            }
        }

        int left = _basis[leaving];
        (_isBasic[left], _isBasic[entering]) = (false, true);
        (_reduced[left], _reduced[entering]) = (-step, 0);
        _basis[leaving] = entering;

        Eliminate(leaving, pivot);
        _pivots++;
        return true;
    }

    // B⁻¹ times the column of a variable.
    private void TakeColumn(int entering)
    {
        int count = _variables.Count;
        for (int i = 0; i < Size; i++)
        {
            ReadOnlySpan<double> row = _inverse.AsSpan(i * _stride, Size);
            if (entering >= count)
            {
                _column[i] = row[Sets + entering - count];
                continue;
            }

            double value = row[program.SetOf[_variables[entering]]];
            for (int r = 0; r < _rows.Count; r++)
            {
                value += row[Sets + r] * _weights[r][entering];
            }

            _column[i] = value;
        }
    }

    private void Eliminate(int leaving, double pivot)
    {
        int size = Size;
        double moved = _values[leaving] / pivot;
        Span<double> pivotRow = _inverse.AsSpan(leaving * _stride, size);
        for (int k = 0; k < size; k++)
        {
            pivotRow[k] /= pivot;
        }

        for (int i = 0; i < size; i++)
        {
            double factor = _column[i];
            if (i == leaving || factor == 0)
            {
                continue;
            }

            _values[i] -= moved * factor;
            Span<double> row = _inverse.AsSpan(i * _stride, size);
            for (int k = 0; k < size; k++)
            {
                row[k] -= factor * pivotRow[k];
            }
        }

        _values[leaving] = moved;
    }

    // B⁻¹, values and reduced costs afresh from the basis.
    private bool Refactor()
    {
        int size = Size;
        double[]? inverse = DenseInverse.Of(Basis(), size);
        if (inverse is null)
        {
            return false;
        }

        for (int i = 0; i < size; i++)
        {
            inverse.AsSpan(i * size, size).CopyTo(_inverse.AsSpan(i * _stride, size));
            double value = 0;
            for (int k = 0; k < size; k++)
            {
                value += inverse[(i * size) + k] * (k < Sets ? 1 : program.Rows[_rows[k - Sets]].Limit);
            }

            _values[i] = value;
        }

        Reprice(inverse);
        _pivots = 0;
        return true;
    }

    private double[] Basis()
    {
        int size = Size;
        var matrix = new double[size * size];
        for (int k = 0; k < size; k++)
        {
            int variable = _basis[k];
            if (variable >= _variables.Count)
            {
                matrix[((Sets + variable - _variables.Count) * size) + k] = 1;
                continue;
            }

            matrix[(program.SetOf[_variables[variable]] * size) + k] = 1;
            for (int r = 0; r < _rows.Count; r++)
            {
                matrix[((Sets + r) * size) + k] = _weights[r][variable];
            }
        }

        return matrix;
    }

    private void Reprice(double[] inverse)
    {
        int size = Size;
        var prices = new double[size];
        for (int i = 0; i < size; i++)
        {
            double cost = _basis[i] < _variables.Count ? _costs[_basis[i]] : 0;
            for (int k = 0; k < size && cost != 0; k++)
            {
                prices[k] += cost * inverse[(i * size) + k];
            }
        }

        for (int j = 0; j < _variables.Count; j++)
        {
            double reduced = _costs[j] - prices[program.SetOf[_variables[j]]];
            for (int r = 0; r < _rows.Count; r++)
            {
                reduced -= prices[Sets + r] * _weights[r][j];
            }

            _reduced[j] = _isBasic[j] ? 0 : reduced;
        }

        for (int r = 0; r < _rows.Count; r++)
        {
            int slack = _variables.Count + r;
            _reduced[slack] = _isBasic[slack] ? 0 : -prices[Sets + r];
        }
    }

    private bool AddViolated()
    {
        const int MostRows = 400;
        if (_rows.Count >= MostRows)
        {
            return false;
        }

        var violated = new List<(double By, int Row)>();
        for (int row = 0; row < program.Rows.Count; row++)
        {
            ProgramRow candidate = program.Rows[row];
            double over = -candidate.Limit;
            for (int i = 0; i < Size; i++)
            {
                over += _basis[i] < _variables.Count ? candidate[_variables[_basis[i]]] * _values[i] : 0;
            }

            if (over > 4 * Feasible && !_rows.Contains(row))
            {
                violated.Add((over, row));
            }
        }

        violated.Sort((a, b) => a.By != b.By ? b.By.CompareTo(a.By) : a.Row.CompareTo(b.Row));
        foreach ((_, int row) in violated.Take(RowsAtOnce))
        {
            AddRow(row);
        }

        return violated.Count > 0;
    }
}
