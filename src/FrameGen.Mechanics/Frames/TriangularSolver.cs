using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace FrameGen.Mechanics.Frames;

/// <summary>Solves with the triangles of a factor, front by front; holds the factor's own values, not copies. For one thread.</summary>
internal sealed class TriangularSolver
{
    private const int Six = SymbolicFactor.Six;
    private const int Lanes = SymbolicFactor.Lanes;

    private readonly StiffnessBlocks _stiffness;
    private readonly double[] _panels;
    private readonly double[] _inversePivots;
    private readonly double[] _work;
    private readonly double[] _inside;
    private readonly Step[] _steps;

    /// <summary>Makes room for one right-hand side.</summary>
    /// <param name="layout">Layout of the frame.</param>
    /// <param name="stiffness">The blocks of K, those of the factored design.</param>
    /// <param name="panels">L, in the fronts' panels.</param>
    /// <param name="inversePivots">D⁻¹, by freedom in elimination order.</param>
    public TriangularSolver(FrameLayout layout, StiffnessBlocks stiffness, double[] panels, double[] inversePivots)
    {
        (_stiffness, _panels, _inversePivots) = (stiffness, panels, inversePivots);
        SymbolicFactor symbolic = layout.Symbolic;
        _work = new double[symbolic.WidestFront + Lanes];
        _inside = new double[symbolic.Domains.Length == 0 ? 0 : inversePivots.Length];
        var steps = new List<Step>();
        int next = 0;
        for (int d = 0; d < symbolic.Domains.Length; d++)
        {
            Domain domain = symbolic.Domains[d];
            steps.AddRange(symbolic.Fronts[next..domain.FirstFront].Select(front => new Step([front], null, [])));
            steps.Add(new Step(domain.Kept, domain, layout.Crossings[d]));
            next = domain.EndFront;
        }

        steps.AddRange(symbolic.Fronts[next..].Select(front => new Step([front], null, [])));
        _steps = [.. steps];
    }

    /// <summary>Solves L D Lᵀ x = b in place, in elimination order.</summary>
    public void Solve(Span<double> x)
    {
        foreach (Step step in _steps)
        {
            Forward(step, x);
        }

        Divide(x, 0, x.Length);
        Backward(x);
    }

    /// <summary>Solves L D Lᵀ x = b in place for several b, each to the same digits as alone; every panel is fetched from memory but once for all.</summary>
    public void Solve(ReadOnlySpan<double[]> all)
    {
        foreach (Step step in _steps)
        {
            foreach (double[] x in all)
            {
                Forward(step, x);
            }
        }

        foreach (double[] x in all)
        {
            Divide(x, 0, x.Length);
        }

        for (int s = _steps.Length - 1; s >= 0; s--)
        {
            foreach (double[] x in all)
            {
                Backward(_steps[s], x);
            }
        }
    }

    /// <summary>Solves Lᵀ x = b in place, in elimination order.</summary>
    public void Backward(Span<double> x)
    {
        for (int s = _steps.Length - 1; s >= 0; s--)
        {
            Backward(_steps[s], x);
        }
    }

    /// <summary>With A the stiffness between a domain and the rest, its rows of L beyond itself are A L⁻ᵀ D⁻¹.</summary>
    private void Forward(Step step, Span<double> x)
    {
        foreach (Front front in step.Fronts)
        {
            Forward(front, x);
        }

        if (step.Domain is { } domain)
        {
            (int start, int length) = RangeOf(domain);
            x.Slice(start, length).CopyTo(_inside.AsSpan(start));
            Divide(_inside, start, length);
            BackwardInside(step, _inside);
            _stiffness.SubtractProduct(step.Crossings, _inside, x);
        }
    }

    private void Backward(Step step, Span<double> x)
    {
        if (step.Domain is { } domain)
        {
            (int start, int length) = RangeOf(domain);
            _inside.AsSpan(start, length).Clear();
            _stiffness.AddTransposed(step.Crossings, x, _inside);
            foreach (Front front in step.Fronts)
            {
                Forward(front, _inside);
            }

            Divide(_inside, start, length);
            for (int k = start; k < start + length; k++)
            {
                x[k] -= _inside[k];
            }
        }

        BackwardInside(step, x);
    }

    private void BackwardInside(Step step, Span<double> x)
    {
        for (int s = step.Fronts.Length - 1; s >= 0; s--)
        {
            Backward(step.Fronts[s], x);
        }
    }

    private static (int Start, int Length) RangeOf(Domain domain) =>
        (Six * domain.FirstColumn, Six * (domain.EndColumn - domain.FirstColumn));

    private void Divide(Span<double> x, int start, int length)
    {
        for (int k = start; k < start + length; k++)
        {
            x[k] *= _inversePivots[k];
        }
    }

    private void Backward(Front front, Span<double> x)
    {
        ref double p = ref MemoryMarshal.GetReference(front.PanelIn(_panels));
        Span<double> mine = x.Slice(Six * front.First, Six * front.Columns);
        Span<double> rows = _work.AsSpan(0, front.Stride);
        rows.Clear();
        for (int a = 0; a < front.Below.Length; a++)
        {
            x.Slice(Six * front.Below[a], Six).CopyTo(rows[(front.OwnRows + (Six * a))..]);
        }

        for (int k = mine.Length - Six; k >= 0; k -= Six)
        {
            // The first group may begin among these six rows: they are still zero.
            int group = (k + Six) / Lanes;
            int stride = front.SliceStride(k / Front.SliceWidth);
            Span<double> six = mine.Slice(k, Six);
            FrontKernels.SubtractTransposed(
                ref Unsafe.Add(ref p, front.OffsetOf(Lanes * group, k)), (nuint)stride, six, ref _work[Lanes * group], (front.Stride / Lanes) - group);
            for (int c = Six - 2; c >= 0; c--)
            {
                ref double column = ref Unsafe.Add(ref p, front.OffsetOf(k, k + c));
                for (int i = c + 1; i < Six; i++)
                {
                    six[c] -= Unsafe.Add(ref column, i) * six[i];
                }
            }

            six.CopyTo(rows[k..]);
        }
    }

    private void Forward(Front front, Span<double> x)
    {
        ref double p = ref MemoryMarshal.GetReference(front.PanelIn(_panels));
        Span<double> mine = x.Slice(Six * front.First, Six * front.Columns);
        Span<double> rows = _work.AsSpan(0, front.Stride);
        rows.Clear();
        mine.CopyTo(rows);
        for (int k = 0; k < mine.Length; k += Six)
        {
            Span<double> six = mine.Slice(k, Six);
            rows.Slice(k, Six).CopyTo(six);
            for (int c = 0; c < Six - 1; c++)
            {
                ref double column = ref Unsafe.Add(ref p, front.OffsetOf(k, k + c));
                for (int i = c + 1; i < Six; i++)
                {
                    six[i] -= Unsafe.Add(ref column, i) * six[c];
                }
            }

            // The first group may begin among these six rows, which are done with.
            int group = (k + Six) / Lanes;
            int stride = front.SliceStride(k / Front.SliceWidth);
            FrontKernels.SubtractProduct(
                ref Unsafe.Add(ref p, front.OffsetOf(Lanes * group, k)), (nuint)stride, six, ref _work[Lanes * group], (front.Stride / Lanes) - group);
        }

        for (int a = 0; a < front.Below.Length; a++)
        {
            Span<double> target = x.Slice(Six * front.Below[a], Six);
            ReadOnlySpan<double> source = rows.Slice(front.OwnRows + (Six * a), Six);
            for (int i = 0; i < Six; i++)
            {
                target[i] += source[i];
            }
        }
    }

    /// <summary>One front, or the fronts of a domain with the blocks of K between it and the rest.</summary>
    private readonly record struct Step(Front[] Fronts, Domain? Domain, int[] Crossings);
}
