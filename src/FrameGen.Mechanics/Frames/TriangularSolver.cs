using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace FrameGen.Mechanics.Frames;

/// <summary>Solves with the triangles of a factor, front by front; holds the factor's own values, not copies. For one thread.</summary>
internal sealed class TriangularSolver
{
    private const int Six = SymbolicFactor.Six;
    private const int Lanes = SymbolicFactor.Lanes;

    private readonly SymbolicFactor _symbolic;
    private readonly double[] _panels;
    private readonly double[] _inversePivots;
    private readonly double[] _work;

    /// <summary>Makes room for one right-hand side.</summary>
    /// <param name="symbolic">Layout of the factor.</param>
    /// <param name="panels">L, in the fronts' panels.</param>
    /// <param name="inversePivots">D⁻¹, by freedom in elimination order.</param>
    public TriangularSolver(SymbolicFactor symbolic, double[] panels, double[] inversePivots)
    {
        (_symbolic, _panels, _inversePivots) = (symbolic, panels, inversePivots);
        _work = new double[symbolic.WidestFront + Lanes];
    }

    /// <summary>Solves L D Lᵀ x = b in place, in elimination order.</summary>
    public void Solve(Span<double> x)
    {
        foreach (Front front in _symbolic.Fronts)
        {
            Forward(front, x);
        }

        Divide(x);
        Backward(x);
    }

    /// <summary>Solves L D Lᵀ x = b in place for several b, each to the same digits as alone; every panel is fetched from memory but once for all.</summary>
    public void Solve(ReadOnlySpan<double[]> all)
    {
        Front[] fronts = _symbolic.Fronts;
        for (int s = 0; s < fronts.Length; s++)
        {
            foreach (double[] x in all)
            {
                Forward(fronts[s], x);
            }
        }

        foreach (double[] x in all)
        {
            Divide(x);
        }

        for (int s = fronts.Length - 1; s >= 0; s--)
        {
            foreach (double[] x in all)
            {
                Backward(fronts[s], x);
            }
        }
    }

    /// <summary>Solves Lᵀ x = b in place, in elimination order.</summary>
    public void Backward(Span<double> x)
    {
        Front[] fronts = _symbolic.Fronts;
        for (int s = fronts.Length - 1; s >= 0; s--)
        {
            Backward(fronts[s], x);
        }
    }

    private void Divide(Span<double> x)
    {
        for (int k = 0; k < x.Length; k++)
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
}
