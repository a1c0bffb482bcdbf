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

    private const int Depth = Front.SliceWidth;
    private const int GroupStride = Lanes * Depth;

    private readonly SymbolicFactor _symbolic;
    private readonly double[] _panels;
    private readonly double[] _scaled;
    private readonly double[] _product;
    private readonly double[] _pivots;
    private readonly double[] _inversePivots;
    private readonly TriangularSolver _solver;
    private readonly List<int> _suspects = [];

    /// <summary>Makes room for the values.</summary>
    public NumericFactor(SymbolicFactor symbolic)
    {
        _symbolic = symbolic;

        // Whole groups of rows are read, the last one of the last panel past its end.
        _panels = GC.AllocateUninitializedArray<double>((int)symbolic.PanelLength + Lanes);
        _scaled = new double[(Depth * symbolic.WidestFront) + GroupStride];
        _product = GC.AllocateUninitializedArray<double>(Depth * (symbolic.WidestFront + Lanes));
        _pivots = new double[Six * symbolic.Order.Length];
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
            panel.Clear();
            stiffness.AddTo(s, panel);
            foreach (FrontUpdate update in front.Updates)
            {
                Add(update, front, panel);
            }

            Eliminate(front, panel, stiffness.Diagonal, isFixed);
        }
    }

    /// <summary>Solves L D Lᵀ x = b in place, in elimination order.</summary>
    public void Solve(Span<double> x) => _solver.Solve(x);

    /// <summary>Solves L D Lᵀ x = b in place for several b, in elimination order, each to the same digits as alone.</summary>
    public void Solve(ReadOnlySpan<double[]> all) => _solver.Solve(all);

    /// <summary>Solves Lᵀ x = b in place, in elimination order.</summary>
    public void Backward(Span<double> x) => _solver.Backward(x);

    private Span<double> PanelOf(Front front) => front.PanelIn(_panels);

    /// <summary>Brings a front up to date with an earlier one, as many columns as a slice has at a time.</summary>
    private void Add(FrontUpdate update, Front front, Span<double> panel)
    {
        const int Nodes = Depth / Six;
        Front source = update.Source;
        ref double from = ref MemoryMarshal.GetReference(PanelOf(source));
        for (int start = update.Start; start < update.End; start += Nodes)
        {
            int end = Math.Min(start + Nodes, update.End);
            int row = source.OwnRows + (Six * start);
            int groups = (source.Rows - row + Lanes - 1) / Lanes;
            int stride = Lanes * groups;
            Span<double> product = _product.AsSpan(0, stride * Six * (end - start));
            product.Clear();
            for (int slice = 0; Depth * slice < source.OwnRows; slice++)
            {
                int before = Depth * slice;
                int depth = Math.Min(Depth, source.OwnRows - before);
                nuint sourceStride = (nuint)source.SliceStride(slice);
                ref double l = ref Unsafe.Add(ref from, source.SliceStart(slice) + row - before);
                ReadOnlySpan<double> pivots = _pivots.AsSpan((Six * source.First) + before, depth);
                FrontKernels.Scale(ref l, sourceStride, pivots, ref _scaled[0], GroupStride, groups);
                for (int j = 0; j < Six * (end - start); j += Six)
                {
                    int group = j / Lanes;
                    FrontKernels.AddProduct(
                        ref product[(j * stride) + (Lanes * group)],
                        (nuint)stride,
                        ref _scaled[group * GroupStride],
                        GroupStride,
                        groups - group,
                        ref Unsafe.Add(ref l, j),
                        sourceStride,
                        depth);
                }
            }

            Scatter(update, start, end, product, stride, front, panel);
        }
    }

    /// <summary>Adds columns of a product to the front they reach into, from the diagonal down.</summary>
    private static void Scatter(
        FrontUpdate update, int start, int end, ReadOnlySpan<double> product, int stride, Front front, Span<double> panel)
    {
        FrontUpdate.Run[] runs = update.Runs;
        int first = 0;
        for (int b = start; b < end; b++)
        {
            while (runs[first].End <= b)
            {
                first++;
            }

            int column = Six * (update.Source.Below[b] - front.First);
            int targetStride = front.SliceStride(column / Depth);
            Span<double> target = panel[front.OffsetOf(column, column)..];
            for (int c = 0; c < Six; c++)
            {
                ReadOnlySpan<double> source = product.Slice(((Six * (b - start)) + c) * stride, stride);
                for (int r = first; r < runs.Length; r++)
                {
                    FrontUpdate.Run run = runs[r];
                    int from = Math.Max(run.Start, b);
                    FrontKernels.Add(
                        source.Slice(Six * (from - start), Six * (run.End - from)),
                        target[((c * targetStride) + run.Row + (Six * (from - run.Start)) - column)..]);
                }
            }
        }
    }

    /// <summary>Eliminates the front's own columns.</summary>
    private void Eliminate(Front front, Span<double> panel, double[] diagonal, bool[]? isFixed)
    {
        int own = front.OwnRows;
        Span<double> block = stackalloc double[Six * Six];
        for (int outer = 0; outer < own; outer += Depth)
        {
            int end = Math.Min(outer + Depth, own);
            for (int k = outer; k < end; k += Six)
            {
                FactorBlock(front, panel, k, block, diagonal, isFixed);
                SolveBelow(front, panel, outer, k, block);
                for (int j = k + Six; j < end; j += Six)
                {
                    UpdateColumns(front, panel, j, k - outer, k, Six);
                }
            }

            for (int j = end; j < own; j += Six)
            {
                UpdateColumns(front, panel, j, 0, outer, end - outer);
            }
        }
    }

    private void SolveBelow(Front front, Span<double> panel, int outer, int k, ReadOnlySpan<double> block)
    {
        int stride = front.SliceStride(outer / Depth);
        int firstGroup = (k + Six) / Lanes;
        ref double p = ref MemoryMarshal.GetReference(panel);
        FrontKernels.SolveBelow(
            ref Unsafe.Add(ref p, front.OffsetOf(firstGroup * Lanes, k)),
            (nuint)stride,
            ref _scaled[(firstGroup * GroupStride) + ((k - outer) * Lanes)],
            GroupStride,
            (front.Stride / Lanes) - firstGroup,
            block,
            _inversePivots.AsSpan((Six * front.First) + k, Six));

        // The block's own L; the first group of eight rows may have begun inside of it.
        ref double own = ref Unsafe.Add(ref p, front.OffsetOf(k, k));
        for (int c = 0; c < Six; c++)
        {
            for (int i = c + 1; i < Six; i++)
            {
                Unsafe.Add(ref own, (c * stride) + i) = block[(Six * c) + i];
            }
        }
    }

    /// <summary>Six columns of the panel, brought up to date with some columns of one slice before them.</summary>
    private void UpdateColumns(Front front, Span<double> panel, int j, int firstScaled, int firstColumn, int depth)
    {
        ref double p = ref MemoryMarshal.GetReference(panel);
        int group = j / Lanes;
        FrontKernels.AddProduct(
            ref Unsafe.Add(ref p, front.OffsetOf(group * Lanes, j)),
            (nuint)front.SliceStride(j / Depth),
            ref _scaled[(group * GroupStride) + (firstScaled * Lanes)],
            GroupStride,
            (front.Stride / Lanes) - group,
            ref Unsafe.Add(ref p, front.OffsetOf(j, firstColumn)),
            (nuint)front.SliceStride(firstColumn / Depth),
            depth);
    }

    /// <summary>LDLᵀ of one node's 6 × 6 diagonal block; D⁻¹ goes to the inverse pivots.</summary>
    private void FactorBlock(Front front, Span<double> panel, int k, Span<double> block, double[] diagonal, bool[]? isFixed)
    {
        int freedom = (Six * front.First) + k;
        int offset = front.OffsetOf(k, k);
        int stride = front.SliceStride(k / Depth);
        for (int c = 0; c < Six; c++)
        {
            panel.Slice(offset + (c * stride), Six).CopyTo(block.Slice(Six * c, Six));
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

            _pivots[freedom + c] = inverse == 0 ? 0 : pivot;
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
