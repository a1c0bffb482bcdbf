using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace FrameGen.Mechanics.Frames;

/// <summary>The values of one LDLᵀ factor and the buffers to make it; reusable for every design of one topology, by one thread.</summary>
internal sealed class NumericFactor
{
    /// <summary>A pivot below this part of the freedom's own stiffness is looked at more closely.</summary>
    public const double SuspectPivot = 1e-6;

    /// <summary>A pivot below this part of the freedom's own stiffness is rounding: the freedom is fixed to go on.</summary>
    private const double LostPivot = 1e-14;

    private const int Six = SymbolicFactor.Six;
    private const int Lanes = SymbolicFactor.Lanes;

    // Columns eliminated before the rest of the front is brought up to date: deep enough to be worth the memory traffic, small
    // enough for six rows of L and eight of W to stay in the nearest cache.
    private const int Depth = 48;
    private const int GroupStride = Lanes * Depth;

    private readonly SymbolicFactor _symbolic;
    private readonly double[] _panels;
    private readonly double[][] _stacks;
    private readonly double[] _scaled;
    private readonly double[] _inversePivots;
    private readonly TriangularSolver _solver;
    private readonly List<int> _suspects = [];

    /// <summary>Makes room for the values.</summary>
    public NumericFactor(SymbolicFactor symbolic)
    {
        _symbolic = symbolic;
        _panels = GC.AllocateUninitializedArray<double>((int)symbolic.PanelLength);
        _stacks =
        [
            GC.AllocateUninitializedArray<double>(checked((int)symbolic.StackLengths[0])),
            GC.AllocateUninitializedArray<double>(checked((int)symbolic.StackLengths[1])),
        ];
        _scaled = new double[(Depth * symbolic.WidestFront) + GroupStride];
        _inversePivots = new double[Six * symbolic.Order.Length];
        _solver = new TriangularSolver(symbolic, _panels, _inversePivots);
    }

    /// <summary>Freedoms, in elimination order, whose pivots were small beside their own stiffness; ascending.</summary>
    public IReadOnlyList<int> Suspects => _suspects;

    /// <summary>Whether a freedom's pivot was nothing but rounding.</summary>
    public bool IsLost(int freedom) => _inversePivots[freedom] == 0;

    /// <summary>Assembles and factors.</summary>
    /// <param name="stiffness">The blocks of K.</param>
    /// <param name="isFixed">Freedoms, in elimination order, to leave out; null for none.</param>
    public void Factor(StiffnessBlocks stiffness, bool[]? isFixed)
    {
        _suspects.Clear();
        Front[] fronts = _symbolic.Fronts;
        for (int s = 0; s < fronts.Length; s++)
        {
            Front front = fronts[s];
            Span<double> panel = PanelOf(front);
            Span<double> leftover = LeftoverOf(front);
            panel.Clear();
            leftover.Clear();
            stiffness.AddTo(s, panel);
            foreach (Front child in front.Children)
            {
                Extend(child, LeftoverOf(child), front, panel, leftover);
            }

            Eliminate(front, panel, leftover, stiffness.Diagonal, isFixed);
        }
    }

    /// <summary>Solves L D Lᵀ x = b in place, in elimination order.</summary>
    public void Solve(Span<double> x) => _solver.Solve(x);

    /// <summary>Solves Lᵀ x = b in place, in elimination order.</summary>
    public void Backward(Span<double> x) => _solver.Backward(x);

    private Span<double> PanelOf(Front front) => front.PanelIn(_panels);

    private Span<double> LeftoverOf(Front front) =>
        _stacks[front.Stack].AsSpan((int)front.LeftoverStart, front.BelowStride * Six * front.Below.Length);

    /// <summary>Adds a child's leftover to its parent's front.</summary>
    private static void Extend(Front child, ReadOnlySpan<double> from, Front parent, Span<double> panel, Span<double> leftover)
    {
        int next = 0;
        for (int b = 0; b < child.Below.Length; b++)
        {
            while (child.Runs[next].End <= b)
            {
                next++;
            }

            int place = child.InParent[b];
            bool own = place < parent.Columns;
            Span<double> target = own ? panel : leftover;
            int stride = own ? parent.Stride : parent.BelowStride;
            int shift = own ? 0 : parent.OwnStride;
            int column = Six * (own ? place : place - parent.Columns);
            for (int c = 0; c < Six; c++)
            {
                ReadOnlySpan<double> source = from.Slice(((Six * b) + c) * child.BelowStride, child.BelowStride);
                Span<double> destination = target.Slice((column + c) * stride, stride);
                for (int r = next; r < child.Runs.Length; r++)
                {
                    Front.Run run = child.Runs[r];
                    int start = Math.Max(run.Start, b);
                    FrontKernels.Add(
                        source.Slice(Six * start, Six * (run.End - start)),
                        destination[(run.ParentRow + (Six * (start - run.Start)) - shift)..]);
                }
            }
        }
    }

    /// <summary>Eliminates the front's own columns and leaves the Schur complement in the leftover.</summary>
    private void Eliminate(Front front, Span<double> panel, Span<double> leftover, double[] diagonal, bool[]? isFixed)
    {
        int own = Six * front.Columns;
        int stride = front.Stride;
        Span<double> block = stackalloc double[Six * Six];
        for (int outer = 0; outer < own; outer += Depth)
        {
            int end = Math.Min(outer + Depth, own);
            for (int k = outer; k < end; k += Six)
            {
                FactorBlock(panel, stride, k, (Six * front.First) + k, block, diagonal, isFixed);
                SolveBelow(front, panel, outer, k, block);
                for (int j = k + Six; j < end; j += Six)
                {
                    UpdateColumns(panel, stride, j, k - outer, k, Six);
                }
            }

            for (int j = end; j < own; j += Six)
            {
                UpdateColumns(panel, stride, j, 0, outer, end - outer);
            }

            UpdateLeftover(front, panel, leftover, outer, end);
        }
    }

    private void SolveBelow(Front front, Span<double> panel, int outer, int k, ReadOnlySpan<double> block)
    {
        int stride = front.Stride;
        int firstGroup = (k + Six) / Lanes;
        ref double p = ref MemoryMarshal.GetReference(panel);
        FrontKernels.SolveBelow(
            ref Unsafe.Add(ref p, (k * stride) + (firstGroup * Lanes)),
            (nuint)stride,
            ref _scaled[(firstGroup * GroupStride) + ((k - outer) * Lanes)],
            GroupStride,
            (stride / Lanes) - firstGroup,
            block,
            _inversePivots.AsSpan((Six * front.First) + k, Six));

        // The block's own L; the first group of eight rows may have begun inside of it.
        for (int c = 0; c < Six; c++)
        {
            for (int i = c + 1; i < Six; i++)
            {
                Unsafe.Add(ref p, ((k + c) * stride) + k + i) = block[(Six * c) + i];
            }
        }
    }

    /// <summary>Six columns of the panel, brought up to date with some columns before them.</summary>
    private void UpdateColumns(Span<double> panel, int stride, int j, int firstScaled, int firstColumn, int depth)
    {
        ref double p = ref MemoryMarshal.GetReference(panel);
        int group = j / Lanes;
        FrontKernels.AddProduct(
            ref Unsafe.Add(ref p, (j * stride) + (group * Lanes)),
            (nuint)stride,
            ref _scaled[(group * GroupStride) + (firstScaled * Lanes)],
            GroupStride,
            (stride / Lanes) - group,
            ref Unsafe.Add(ref p, (firstColumn * stride) + j),
            (nuint)stride,
            depth);
    }

    private void UpdateLeftover(Front front, Span<double> panel, Span<double> leftover, int outer, int end)
    {
        int rows = Six * front.Below.Length;
        int stride = front.BelowStride;
        ref double p = ref MemoryMarshal.GetReference(panel);
        ref double q = ref MemoryMarshal.GetReference(leftover);
        for (int j = 0; j < rows; j += Six)
        {
            int group = j / Lanes;
            FrontKernels.AddProduct(
                ref Unsafe.Add(ref q, (j * stride) + (group * Lanes)),
                (nuint)stride,
                ref _scaled[((front.OwnStride / Lanes) + group) * GroupStride],
                GroupStride,
                (stride / Lanes) - group,
                ref Unsafe.Add(ref p, (outer * front.Stride) + front.OwnStride + j),
                (nuint)front.Stride,
                end - outer);
        }
    }

    /// <summary>LDLᵀ of one node's 6 × 6 diagonal block; D⁻¹ goes to the inverse pivots.</summary>
    private void FactorBlock(
        Span<double> panel, int stride, int k, int freedom, Span<double> block, double[] diagonal, bool[]? isFixed)
    {
        for (int c = 0; c < Six; c++)
        {
            panel.Slice(((k + c) * stride) + k, Six).CopyTo(block.Slice(Six * c, Six));
        }

        for (int c = 0; c < Six; c++)
        {
            double pivot = block[(Six * c) + c];
            double whole = diagonal[freedom + c];
            double inverse = 1 / pivot;
            if (isFixed is not null && isFixed[freedom + c])
            {
                inverse = 0;
            }
            else if (!(pivot > SuspectPivot * whole))
            {
                _suspects.Add(freedom + c);
                inverse = pivot > LostPivot * whole ? inverse : 0;
            }

            _inversePivots[freedom + c] = inverse;
            for (int j = c + 1; j < Six; j++)
            {
                double factor = block[(Six * c) + j] * inverse;
                for (int i = j; i < Six; i++)
                {
                    block[(Six * j) + i] -= factor * block[(Six * c) + i];
                }
            }

            for (int i = c + 1; i < Six; i++)
            {
                block[(Six * c) + i] *= inverse;
            }
        }
    }
}
