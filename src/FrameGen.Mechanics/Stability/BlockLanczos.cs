using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>
/// The algebraically largest θ of S φ = θ K φ, K the factored stiffness: shift-invert Lanczos about zero, in blocks, so that modes as many times
/// as the block is wide are all found. Vectors are kept square to each other in the inner product of K, in full; a basis that grows too
/// long is cut down to its best vectors (thick restart: K. Wu, H. Simon, SIAM J. Matrix Anal. Appl. 22 (2000) 602).
/// </summary>
/// <remarks>
/// S may be indefinite and singular. K v is kept beside each v, so no product with K is needed. The start is fixed numbers: the same frame gives the
/// same digits always.
/// </remarks>
internal sealed class BlockLanczos
{
    // Of the residual K⁻¹S φ − θ φ in the norm of K, relative to θ: by it an eigenvalue can be wrong at most, by about its square it is.
    private const double Tolerance = 1e-9;

    // Rounding leaves this much of the largest θ on every one.
    private const double RoundingFloor = 1e-14;

    private const double Dependent = 1e-10;
    private const int MostRounds = 2000;
    private const int FirstLook = 8;

    private readonly FactoredFrame _frame;
    private readonly SymmetricBlocks _s;
    private readonly int _count;
    private readonly int _most;
    private readonly List<double[]> _vectors = [];
    private readonly List<double[]> _products = [];
    private readonly double[] _projected;
    private readonly double[] _coupling;
    private int _settled;

    /// <summary>Prepares a search.</summary>
    /// <param name="frame">K, factored.</param>
    /// <param name="s">S.</param>
    /// <param name="count">Eigenvalues wanted, at least 1.</param>
    /// <param name="block">Vectors that go together.</param>
    public BlockLanczos(FactoredFrame frame, SymmetricBlocks s, int count, int block)
    {
        (_frame, _s, _count) = (frame, s, count);
        Block = block;
        _most = (2 * count) + (4 * block) + 40;
        _projected = new double[(_most + block) * (_most + block)];
        _coupling = new double[block * block];
    }

    private int Block { get; }

    private int Size => SymbolicFactor.Six * _frame.Layout.NodeAt.Length;

    private int Stride => _most + Block;

    /// <summary>Finds the pairs: largest first; fewer than wanted where S has not as many that are not zero.</summary>
    public IReadOnlyList<(double Theta, double Residual, double[] Vector)> Largest()
    {
        Start();
        double[] values = [];
        double[] small = [];
        int nextLook = Math.Max(FirstLook, _count + Block);
        for (int round = 0; _vectors.Count > _settled && round < MostRounds; round++)
        {
            int before = _settled;
            Expand();
            bool isFull = _settled + Block > _most;
            bool isWhole = _vectors.Count == _settled;
            if (!isFull && !isWhole && _settled < nextLook)
            {
                continue;
            }

            // The small problem costs as the cube of its size: it is not looked at every round.
            nextLook = _settled + Math.Max(Block, _settled / 4);
            SmallEigen.Solve(Projected(), _settled, out values, out small);
            if (isWhole || IsConverged(values, small, before))
            {
                break;
            }

            if (isFull)
            {
                Restart(values, small, before);
                nextLook = _settled + (2 * Block);
            }
        }

        return Describe(values, small);
    }

    /// <summary>Fixed numbers between −1 and 1, the frame's nodes in their own order: a fair mixture of every mode.</summary>
    private void Start()
    {
        FrameLayout layout = _frame.Layout;
        uint state = 12345;
        double[][] products = new double[Block][];
        for (int b = 0; b < Block; b++)
        {
            double[] mixed = new double[Size];
            for (int node = 0; node < layout.PlaceOf.Length; node++)
            {
                for (int i = 0; i < SymbolicFactor.Six; i++)
                {
                    // Linear congruential generator of Numerical Recipes, section 7.1.
                    state = unchecked((1664525 * state) + 1013904223);
                    int place = layout.PlaceOf[node];
                    int k = (SymbolicFactor.Six * place) + i;
                    if (place >= 0 && !layout.HeldAt[k])
                    {
                        double scale = i < 3 ? 1 : 1 / layout.Size;
                        mixed[k] = ((state / (double)uint.MaxValue * 2) - 1) * scale;
                    }
                }
            }

            products[b] = new double[Size];
            _s.Multiply(mixed, products[b]);
        }

        double[][] vectors = Solved(products);
        for (int b = 0; b < Block; b++)
        {
            Append(vectors[b], products[b], -1);
        }
    }

    /// <summary>One step for each vector of the last block; what is new in it is the next block.</summary>
    private void Expand()
    {
        int first = _settled;
        int last = _vectors.Count;
        Array.Clear(_coupling);
        double[][] products = new double[last - first][];
        for (int j = first; j < last; j++)
        {
            products[j - first] = new double[Size];
            _s.Multiply(_vectors[j], products[j - first]);
        }

        double[][] vectors = Solved(products);
        for (int j = first; j < last; j++)
        {
            for (int i = 0; i < last; i++)
            {
                double h = VectorKernels.Dot(_vectors[i], products[j - first]);
                _projected[(Stride * j) + i] = h;
                _projected[(Stride * i) + j] = h;
            }

            _settled = last;
            Append(vectors[j - first], products[j - first], j - first);
        }

        _settled = last;
    }

    /// <summary>K⁻¹ of some vectors.</summary>
    private double[][] Solved(double[][] products)
    {
        double[][] vectors = Array.ConvertAll(products, product => (double[])product.Clone());
        _frame.Solve(vectors);
        return vectors;
    }

    /// <summary>Takes a vector into the basis, unless it has nothing new.</summary>
    /// <param name="vector">The vector.</param>
    /// <param name="product">Its product with K.</param>
    /// <param name="column">Of <see cref="_coupling"/>, where it is noted what of it went to the next block; −1 for the start.</param>
    private void Append(double[] vector, double[] product, int column)
    {
        double whole = Norm(vector, product);
        for (int pass = 0; pass < 2; pass++)
        {
            for (int i = 0; i < _vectors.Count; i++)
            {
                double h = VectorKernels.Dot(_vectors[i], product);
                VectorKernels.AddTimes(vector, -h, _vectors[i]);
                VectorKernels.AddTimes(product, -h, _products[i]);
                if (column >= 0 && i >= _settled)
                {
                    _coupling[(Block * column) + i - _settled] += h;
                }
            }
        }

        double rest = Norm(vector, product);
        if (!(rest > Dependent * whole))
        {
            return;
        }

        Scale(vector, 1 / rest);
        Scale(product, 1 / rest);
        if (column >= 0)
        {
            _coupling[(Block * column) + _vectors.Count - _settled] = rest;
        }

        _vectors.Add(vector);
        _products.Add(product);
    }

    private double[] Projected()
    {
        double[] matrix = new double[_settled * _settled];
        for (int j = 0; j < _settled; j++)
        {
            _projected.AsSpan(Stride * j, _settled).CopyTo(matrix.AsSpan(_settled * j));
        }

        return matrix;
    }

    private bool IsConverged(double[] values, double[] small, int lastBlock)
    {
        if (_settled < _count)
        {
            return false;
        }

        double floor = RoundingFloor * Math.Max(Math.Abs(values[0]), Math.Abs(values[^1]));
        for (int k = 0; k < _count; k++)
        {
            if (Leftover(small, k, lastBlock) > Math.Max(Tolerance * Math.Abs(values[k]), floor))
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>K norm of what K⁻¹S makes of a Ritz vector beyond the basis.</summary>
    private double Leftover(double[] small, int pair, int lastBlock)
    {
        double sum = 0;
        for (int a = 0; a < _vectors.Count - _settled; a++)
        {
            double part = 0;
            for (int j = lastBlock; j < _settled; j++)
            {
                part += _coupling[(Block * (j - lastBlock)) + a] * small[(_settled * pair) + j];
            }

            sum += part * part;
        }

        return Math.Sqrt(sum);
    }

    private void Restart(double[] values, double[] small, int lastBlock)
    {
        int kept = Math.Min(_count + Block + 8, lastBlock);
        var best = new List<double[]>();
        var bestProducts = new List<double[]>();
        for (int k = 0; k < kept; k++)
        {
            best.Add(Combine(_vectors, small, k));
            bestProducts.Add(Combine(_products, small, k));
        }

        best.AddRange(_vectors.Skip(_settled));
        bestProducts.AddRange(_products.Skip(_settled));
        _vectors.Clear();
        _products.Clear();
        _vectors.AddRange(best);
        _products.AddRange(bestProducts);
        Array.Clear(_projected);
        for (int k = 0; k < kept; k++)
        {
            _projected[(Stride * k) + k] = values[k];
        }

        _settled = kept;
    }

    private double[] Combine(List<double[]> basis, double[] small, int pair)
    {
        double[] sum = new double[Size];
        for (int j = 0; j < _settled; j++)
        {
            VectorKernels.AddTimes(sum, small[(_settled * pair) + j], basis[j]);
        }

        return sum;
    }

    private List<(double Theta, double Residual, double[] Vector)> Describe(double[] values, double[] small)
    {
        var pairs = new List<(double Theta, double Residual, double[] Vector)>();
        for (int k = 0; k < Math.Min(_count, values.Length); k++)
        {
            double[] vector = Combine(_vectors, small, k);
            pairs.Add((values[k], ResidualOf(vector, values[k]), vector));
        }

        return pairs;
    }

    /// <summary>Asked anew, with the stiffness of the elements themselves: ‖K⁻¹S φ − θ φ‖ / (|θ| ‖φ‖) in the norm of K.</summary>
    private double ResidualOf(double[] vector, double theta)
    {
        double[] rest = new double[Size];
        _s.Multiply(vector, rest);
        double[] stiff = StiffnessProduct.Of(_frame, vector);
        double energy = VectorKernels.Dot(vector, stiff);
        VectorKernels.AddTimes(rest, -theta, stiff);
        double[] solved = (double[])rest.Clone();
        _frame.Solve(solved);
        return Norm(solved, rest) / (Math.Abs(theta) * Math.Sqrt(energy));
    }

    private static double Norm(double[] vector, double[] product) => Math.Sqrt(Math.Max(0, VectorKernels.Dot(vector, product)));

    private static void Scale(double[] vector, double factor)
    {
        for (int k = 0; k < vector.Length; k++)
        {
            vector[k] *= factor;
        }
    }
}
