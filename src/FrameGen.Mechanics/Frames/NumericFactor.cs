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
    private readonly StiffnessBlocks _stiffness;
    private readonly double[] _panels;
    private readonly double[] _passing;
    private readonly double[] _scaled;
    private readonly double[] _product;
    private readonly double[] _pivots;
    private readonly double[] _inversePivots;
    private readonly TriangularSolver _solver;
    private readonly List<int> _suspects = [];

    /// <summary>Makes room for the values.</summary>
    /// <param name="layout">Layout of the frame.</param>
    /// <param name="stiffness">The blocks of K; solves take from them what large frames don't keep of the factor.</param>
    public NumericFactor(FrameLayout layout, StiffnessBlocks stiffness)
    {
        SymbolicFactor symbolic = layout.Symbolic;
        (_symbolic, _stiffness) = (symbolic, stiffness);

        // Whole groups of rows are read, the last one of the last panel past its end.
        _panels = GC.AllocateUninitializedArray<double>((int)symbolic.PanelLength + Lanes);
        _passing = GC.AllocateUninitializedArray<double>(checked((int)symbolic.PassingLength + Lanes));
        _scaled = new double[(Depth * symbolic.WidestFront) + GroupStride];
        _product = GC.AllocateUninitializedArray<double>(Depth * (symbolic.WidestFront + Lanes));
        _pivots = new double[Six * symbolic.Order.Length];
        _inversePivots = new double[Six * symbolic.Order.Length];
        _solver = new TriangularSolver(layout, stiffness, _panels, _inversePivots);
    }

    /// <summary>Freedoms, in elimination order, whose pivots were small beside their own stiffness; ascending.</summary>
    public IReadOnlyList<int> Suspects => _suspects;

    /// <summary>Whether a freedom's pivot was nothing but rounding.</summary>
    public bool IsLost(int freedom) => _inversePivots[freedom] == 0;

    /// <summary>Factors the assembled stiffness.</summary>
    /// <param name="isFixed">Freedoms, in elimination order, to leave out; null for none.</param>
    public void Factor(bool[]? isFixed)
    {
        _suspects.Clear();
        for (int s = 0; s < _symbolic.Fronts.Length; s++)
        {
            if (!_symbolic.Fronts[s].IsPassing)
            {
                Assemble(s);
            }
        }

        int next = 0;
        foreach (Domain domain in _symbolic.Domains)
        {
            Factor(next, domain.FirstFront, isFixed);
            Pass(domain, isFixed);
            next = domain.EndFront;
        }

        Factor(next, _symbolic.Fronts.Length, isFixed);
    }

    /// <summary>Solves L D Lᵀ x = b in place, in elimination order.</summary>
    public void Solve(Span<double> x) => _solver.Solve(x);

    /// <summary>Solves L D Lᵀ x = b in place for several b, in elimination order, each to the same digits as alone.</summary>
    public void Solve(ReadOnlySpan<double[]> all) => _solver.Solve(all);

    /// <summary>Solves Lᵀ x = b in place, in elimination order.</summary>
    public void Backward(Span<double> x) => _solver.Backward(x);

    private Span<double> PanelOf(Front front) => front.PanelIn(front.IsPassing ? _passing : _panels);

    private void Assemble(int s)
    {
        Span<double> panel = PanelOf(_symbolic.Fronts[s]);
        panel.Clear();
        _stiffness.AddTo(s, panel);
    }

    private void Factor(int first, int end, bool[]? isFixed)
    {
        for (int s = first; s < end; s++)
        {
            Front front = _symbolic.Fronts[s];
            foreach (FrontUpdate update in front.Updates)
            {
                Add(update);
            }

            Eliminate(front, PanelOf(front), _stiffness.Diagonal, isFixed);
        }
    }

    /// <summary>Factors a domain, passes on what it does to the rest, and keeps its own rows.</summary>
    private void Pass(Domain domain, bool[]? isFixed)
    {
        for (int s = domain.FirstFront; s < domain.EndFront; s++)
        {
            Assemble(s);
        }

        Factor(domain.FirstFront, domain.EndFront, isFixed);
        Span<double> boundary = PanelOf(domain.Boundary);
        boundary.Clear();
        foreach (FrontUpdate update in domain.ToBoundary)
        {
            Add(update);
        }

        foreach (FrontUpdate update in domain.Onward)
        {
            int first = 0;
            for (int b = update.Start; b < update.End; b++)
            {
                int column = Six * b;
                ReadOnlySpan<double> columns = boundary[domain.Boundary.OffsetOf(column, column)..];
                Scatter(update, ref first, b, columns, domain.Boundary.SliceStride(column / Depth));
            }
        }

        for (int k = 0; k < domain.Kept.Length; k++)
        {
            Keep(_symbolic.Fronts[domain.FirstFront + k], domain.Kept[k]);
        }
    }

    /// <summary>Copies the rows inside of its domain; the padding must be zero, not what else is in the whole panel.</summary>
    private void Keep(Front whole, Front kept)
    {
        Span<double> from = PanelOf(whole);
        Span<double> to = PanelOf(kept);
        for (int column = 0; column < kept.OwnRows; column++)
        {
            int row = column / Depth * Depth;
            int length = kept.Rows - row;
            Span<double> target = to.Slice(kept.OffsetOf(row, column), kept.Stride - row);
            from.Slice(whole.OffsetOf(row, column), length).CopyTo(target);
            target[length..].Clear();
        }
    }

    /// <summary>Brings a front up to date with an earlier one, as many columns as a slice has at a time.</summary>
    private void Add(FrontUpdate update)
    {
        const int Nodes = Depth / Six;
        Front source = update.Source;
        ref double from = ref MemoryMarshal.GetReference(PanelOf(source));
        int first = 0;
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

            for (int b = start; b < end; b++)
            {
                int column = Six * (b - start);
                Scatter(update, ref first, b, product[((column * stride) + column)..], stride);
            }
        }
    }

    /// <summary>Adds one node's columns of a product to the front they reach into, from the diagonal down.</summary>
    /// <param name="update">Where it goes.</param>
    /// <param name="first">In: a run not behind the node's. Out: the node's.</param>
    /// <param name="b">The node, by its row below in the source.</param>
    /// <param name="columns">Six columns from their diagonal down.</param>
    /// <param name="stride">From one of them to the next.</param>
    private void Scatter(FrontUpdate update, ref int first, int b, ReadOnlySpan<double> columns, int stride)
    {
        FrontUpdate.Run[] runs = update.Runs;
        while (runs[first].End <= b)
        {
            first++;
        }

        Front front = update.Target;
        int column = runs[first].Row + (Six * (b - runs[first].Start));
        int targetStride = front.SliceStride(column / Depth);
        Span<double> target = PanelOf(front)[front.OffsetOf(column, column)..];
        for (int c = 0; c < Six; c++)
        {
            for (int r = first; r < runs.Length; r++)
            {
                FrontUpdate.Run run = runs[r];
                int from = Math.Max(run.Start, b);
                FrontKernels.Add(
                    columns.Slice((c * stride) + (Six * (from - b)), Six * (run.End - from)),
                    target[((c * targetStride) + run.Row + (Six * (from - run.Start)) - column)..]);
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
