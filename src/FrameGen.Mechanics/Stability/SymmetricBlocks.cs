using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>
/// A symmetric matrix with the pattern of a frame's stiffness, in 6 × 6 blocks by columns: one a node, one a pair of joined nodes. Held freedoms
/// take no part in its products.
/// </summary>
internal sealed class SymmetricBlocks
{
    /// <summary>Values of an element's matrix, 12 × 12.</summary>
    public const int ElementSize = ElementModes.Freedoms * ElementModes.Freedoms;

    private const int Six = SymbolicFactor.Six;
    private const int BlockSize = Six * Six;
    private const int Twelve = ElementModes.Freedoms;

    private readonly FrameLayout _layout;
    private readonly double[] _own;
    private readonly double[] _pairs;

    /// <summary>A matrix of zeros.</summary>
    public SymmetricBlocks(FrameLayout layout)
    {
        _layout = layout;
        _own = new double[BlockSize * layout.NodeAt.Length];
        _pairs = new double[BlockSize * layout.PairRows.Length];
    }

    /// <summary>matrix += weight · field fieldᵀ, for an element's matrix or a node's.</summary>
    public static void AddSquare(Span<double> matrix, double weight, ReadOnlySpan<double> field)
    {
        int size = field.Length;
        for (int c = 0; c < size; c++)
        {
            double factor = weight * field[c];
            Span<double> column = matrix.Slice(size * c, size);
            for (int r = 0; r < size; r++)
            {
                column[r] += factor * field[r];
            }
        }
    }

    /// <summary>Adds an element's symmetric matrix.</summary>
    public void AddElement(int element, ReadOnlySpan<double> matrix)
    {
        (int i, int j) = (_layout.Starts[element], _layout.Ends[element]);
        if (i >= 0)
        {
            AddBlock(matrix, 0, 0, _own.AsSpan(BlockSize * i, BlockSize));
        }

        if (j >= 0)
        {
            AddBlock(matrix, Six, Six, _own.AsSpan(BlockSize * j, BlockSize));
        }

        if (_layout.Pairs[element] >= 0)
        {
            // Rows are the later node's.
            (int row, int column) = i < j ? (Six, 0) : (0, Six);
            AddBlock(matrix, row, column, _pairs.AsSpan(BlockSize * _layout.Pairs[element], BlockSize));
        }
    }

    /// <summary>weight · field fieldᵀ on one of the frame's nodes; nothing for one that is held altogether.</summary>
    public void AddNode(int node, double weight, ReadOnlySpan<double> field)
    {
        if (_layout.PlaceOf[node] is >= 0 and var place)
        {
            AddSquare(_own.AsSpan(BlockSize * place, BlockSize), weight, field);
        }
    }

    /// <summary>y = A x, in elimination order; x is zero in held freedoms, and so is y.</summary>
    public void Multiply(ReadOnlySpan<double> x, Span<double> y)
    {
        y.Clear();
        for (int place = 0; place < _layout.NodeAt.Length; place++)
        {
            AddProduct(_own.AsSpan(BlockSize * place, BlockSize), x.Slice(Six * place, Six), y.Slice(Six * place, Six));
        }

        for (int pair = 0; pair < _layout.PairRows.Length; pair++)
        {
            ReadOnlySpan<double> block = _pairs.AsSpan(BlockSize * pair, BlockSize);
            (int row, int column) = (Six * _layout.PairRows[pair], Six * _layout.PairColumns[pair]);
            AddProduct(block, x.Slice(column, Six), y.Slice(row, Six));
            AddTransposed(block, x.Slice(row, Six), y.Slice(column, Six));
        }

        for (int k = 0; k < y.Length; k++)
        {
            y[k] = _layout.HeldAt[k] ? 0 : y[k];
        }
    }

    private static void AddBlock(ReadOnlySpan<double> matrix, int row, int column, Span<double> block)
    {
        for (int c = 0; c < Six; c++)
        {
            ReadOnlySpan<double> source = matrix.Slice((Twelve * (column + c)) + row, Six);
            for (int r = 0; r < Six; r++)
            {
                block[(Six * c) + r] += source[r];
            }
        }
    }

    private static void AddProduct(ReadOnlySpan<double> block, ReadOnlySpan<double> x, Span<double> y)
    {
        for (int c = 0; c < Six; c++)
        {
            double factor = x[c];
            ReadOnlySpan<double> column = block.Slice(Six * c, Six);
            for (int r = 0; r < Six; r++)
            {
                y[r] += column[r] * factor;
            }
        }
    }

    private static void AddTransposed(ReadOnlySpan<double> block, ReadOnlySpan<double> x, Span<double> y)
    {
        for (int c = 0; c < Six; c++)
        {
            ReadOnlySpan<double> column = block.Slice(Six * c, Six);
            double sum = 0;
            for (int r = 0; r < Six; r++)
            {
                sum += column[r] * x[r];
            }

            y[c] += sum;
        }
    }
}
