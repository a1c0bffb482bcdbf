using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace FrameGen.Mechanics.Frames;

/// <summary>
/// The stiffness of one design in 6 × 6 blocks by columns: one a node and one a pair of joined nodes, in elimination order, held freedoms included.
/// </summary>
internal sealed class StiffnessBlocks
{
    private const int Six = SymbolicFactor.Six;
    private const int BlockSize = Six * Six;

    private readonly FrameLayout _layout;
    private readonly double[] _own;
    private readonly double[] _pairs;

    /// <summary>Makes room for the values.</summary>
    public StiffnessBlocks(FrameLayout layout)
    {
        _layout = layout;
        _own = new double[BlockSize * layout.NodeAt.Length];
        _pairs = new double[BlockSize * layout.PairRows.Length];
        Diagonal = new double[Six * layout.NodeAt.Length];
        OfModes = new double[ElementModes.Modes * layout.Profiles.Length];
        HingeShears = layout.Modes.HasHinges ? new double[2 * layout.Profiles.Length] : [];
    }

    /// <summary>What <see cref="ElementModes.Release(Hinges, double, Span{double})"/> gives for each element, about y, then about z; empty for a frame without
    /// hinges.</summary>
    public double[] HingeShears { get; }

    /// <summary>Six stiffnesses an element, in the order of its modes.</summary>
    public double[] OfModes { get; }

    /// <summary>The freedoms' own stiffnesses, N/mm and N·mm, in elimination order.</summary>
    public double[] Diagonal { get; }

    /// <summary>Assembles a design.</summary>
    public void Assemble(IReadOnlyList<BeamProfile> profiles)
    {
        Array.Clear(_own);
        Array.Clear(_pairs);
        double[] lengths = _layout.Modes.Lengths;
        double[] vectors = _layout.Modes.Vectors;
        for (int e = 0; e < lengths.Length; e++)
        {
            Span<double> stiffness = OfModes.AsSpan(ElementModes.Modes * e, ElementModes.Modes);
            ElementModes.Stiffness(profiles[_layout.Profiles[e]], lengths[e], stiffness);
            if (HingeShears.Length > 0 && _layout.Modes.Hinges[e] is not Hinges.None and var hinges)
            {
                (HingeShears[2 * e], HingeShears[(2 * e) + 1]) = ElementModes.Release(hinges, lengths[e], stiffness);
            }

            ref double start = ref vectors[ElementModes.Stride * e];
            ref double end = ref Unsafe.Add(ref start, Six);
            (int i, int j) = (_layout.Starts[e], _layout.Ends[e]);
            if (i >= 0)
            {
                AddBlock(ref start, ref start, stiffness, _own.AsSpan(BlockSize * i, BlockSize));
            }

            if (j >= 0)
            {
                AddBlock(ref end, ref end, stiffness, _own.AsSpan(BlockSize * j, BlockSize));
            }

            if (_layout.Pairs[e] >= 0)
            {
                Span<double> block = _pairs.AsSpan(BlockSize * _layout.Pairs[e], BlockSize);
                if (i < j)
                {
                    AddBlock(ref end, ref start, stiffness, block);
                }
                else
                {
                    AddBlock(ref start, ref end, stiffness, block);
                }
            }
        }

        foreach (FrameLayout.NodeSprings springs in _layout.Springs)
        {
            for (int i = 0; i < Six; i++)
            {
                _own[(BlockSize * springs.Place) + ((Six + 1) * i)] += springs.Rates[i];
            }
        }

        for (int k = 0; k < Diagonal.Length; k++)
        {
            Diagonal[k] = _own[(BlockSize * (k / Six)) + ((Six + 1) * (k % Six))];
        }
    }

    /// <summary>Adds a front's blocks to its panel; a held freedom's row is its own stiffness alone.</summary>
    /// <param name="front">Index of the front.</param>
    /// <param name="panel">Its panel.</param>
    public void AddTo(int front, Span<double> panel)
    {
        Front place = _layout.Symbolic.Fronts[front];
        foreach (FrameLayout.Placement placement in _layout.Placements[front])
        {
            bool diagonal = placement.Pair < 0;
            ReadOnlySpan<double> block = diagonal
                ? _own.AsSpan(BlockSize * placement.Column, BlockSize)
                : _pairs.AsSpan(BlockSize * placement.Pair, BlockSize);
            Span<double> target = panel[placement.Offset..];
            int stride = place.SliceStride(Six * (placement.Column - place.First) / Front.SliceWidth);
            for (int c = 0; c < Six; c++)
            {
                block.Slice(Six * c, Six).CopyTo(target.Slice(c * stride, Six));
            }

            if (_layout.PartlyHeld[placement.Row] || _layout.PartlyHeld[placement.Column])
            {
                Hold(placement, stride, target);
            }
        }
    }

    /// <summary>y −= A x over blocks between nodes, x at their columns, y at their rows; nothing in held rows.</summary>
    /// <param name="pairs">Which blocks.</param>
    /// <param name="x">In elimination order, zero in held freedoms.</param>
    /// <param name="y">In elimination order.</param>
    public void SubtractProduct(int[] pairs, ReadOnlySpan<double> x, Span<double> y)
    {
        foreach (int pair in pairs)
        {
            ReadOnlySpan<double> block = _pairs.AsSpan(BlockSize * pair, BlockSize);
            int row = Six * _layout.PairRows[pair];
            ReadOnlySpan<double> from = x.Slice(Six * _layout.PairColumns[pair], Six);
            Span<double> to = y.Slice(row, Six);
            for (int r = 0; r < Six; r++)
            {
                double sum = 0;
                for (int c = 0; c < Six; c++)
                {
                    sum += block[(Six * c) + r] * from[c];
                }

                to[r] -= _layout.HeldAt[row + r] ? 0 : sum;
            }
        }
    }

    /// <summary>y += Aᵀ x over blocks between nodes, x at their rows, y at their columns; nothing in held columns.</summary>
    /// <param name="pairs">Which blocks.</param>
    /// <param name="x">In elimination order, zero in held freedoms.</param>
    /// <param name="y">In elimination order.</param>
    public void AddTransposed(int[] pairs, ReadOnlySpan<double> x, Span<double> y)
    {
        foreach (int pair in pairs)
        {
            ReadOnlySpan<double> block = _pairs.AsSpan(BlockSize * pair, BlockSize);
            int column = Six * _layout.PairColumns[pair];
            ReadOnlySpan<double> from = x.Slice(Six * _layout.PairRows[pair], Six);
            Span<double> to = y.Slice(column, Six);
            for (int c = 0; c < Six; c++)
            {
                double sum = 0;
                for (int r = 0; r < Six; r++)
                {
                    sum += block[(Six * c) + r] * from[r];
                }

                to[c] += _layout.HeldAt[column + c] ? 0 : sum;
            }
        }
    }

    private void Hold(FrameLayout.Placement placement, int stride, Span<double> target)
    {
        for (int c = 0; c < Six; c++)
        {
            for (int r = 0; r < Six; r++)
            {
                bool heldColumn = _layout.HeldAt[(Six * placement.Column) + c];
                if (heldColumn || _layout.HeldAt[(Six * placement.Row) + r])
                {
                    bool itself = heldColumn && placement.Pair < 0 && r == c;
                    target[(c * stride) + r] = itself ? OwnStiffness(Diagonal[(Six * placement.Column) + c]) : 0;
                }
            }
        }
    }

    /// <summary>A held freedom that no element stiffens still needs a pivot.</summary>
    private static double OwnStiffness(double stiffness) => stiffness > 0 ? stiffness : 1;

    /// <summary>block += Σ s · rows columnsᵀ over the modes.</summary>
    private static void AddBlock(ref double rows, ref double columns, ReadOnlySpan<double> stiffness, Span<double> block)
    {
        ref double target = ref MemoryMarshal.GetReference(block);
        for (nuint c = 0; c < Six; c++)
        {
            Vector256<double> four = Vector256.LoadUnsafe(ref target, Six * c);
            Vector128<double> two = Vector128.LoadUnsafe(ref target, (Six * c) + 4);
            nuint at = 0;
            foreach (double s in stiffness)
            {
                double factor = s * Unsafe.Add(ref columns, at + c);
                four = Vector256.FusedMultiplyAdd(Vector256.Create(factor), Vector256.LoadUnsafe(ref rows, at), four);
                two = Vector128.FusedMultiplyAdd(Vector128.Create(factor), Vector128.LoadUnsafe(ref rows, at + 4), two);
                at += ElementModes.Freedoms;
            }

            four.StoreUnsafe(ref target, Six * c);
            two.StoreUnsafe(ref target, (Six * c) + 4);
        }
    }
}
