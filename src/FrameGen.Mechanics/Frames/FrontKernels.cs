using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace FrameGen.Mechanics.Frames;

/// <summary>
/// The dense inner loops of the factor. Every element sees the same operations in the same order however wide the machine's vectors
/// are, so the bits don't depend on it.
/// </summary>
internal static class FrontKernels
{
    private const int Six = SymbolicFactor.Six;
    private const int Lanes = SymbolicFactor.Lanes;
    private const int WorthGathering = 12;

    // A command solves a frame once: it has no time to find out which methods are worth their compilation.
    private const MethodImplOptions Compiled = MethodImplOptions.AggressiveOptimization;

    /// <summary>C += W Lᵀ on rows in groups of eight and six columns.</summary>
    /// <param name="c">First row of the first column.</param>
    /// <param name="stride">From one column of C to the next.</param>
    /// <param name="w">W's first group: for each k eight rows side by side.</param>
    /// <param name="groupStride">From one group of W to the next.</param>
    /// <param name="groups">Number of groups.</param>
    /// <param name="l">L's first of six rows, first column k.</param>
    /// <param name="lStride">From one column of L to the next.</param>
    /// <param name="depth">Number of columns k.</param>
    [MethodImpl(Compiled)]
    public static void AddProduct(
        ref double c, nuint stride, ref double w, nuint groupStride, int groups, ref double l, nuint lStride, int depth)
    {
        scoped ref double six = ref l;

        // Many groups read the same L: gathered once, its columns can't push each other out of the nearest cache.
        Span<double> gathered = stackalloc double[groups >= WorthGathering ? Six * depth : 0];
        if (gathered.Length > 0)
        {
            for (int k = 0; k < depth; k++)
            {
                MemoryMarshal.CreateReadOnlySpan(ref Unsafe.Add(ref l, (nuint)k * lStride), Six).CopyTo(gathered[(Six * k)..]);
            }

            six = ref MemoryMarshal.GetReference(gathered);
            lStride = Six;
        }

        int group = 0;
        for (; group + 1 < groups; group += 2)
        {
            AddTwo(ref c, stride, ref w, ref Unsafe.Add(ref w, groupStride), ref six, lStride, depth);
            c = ref Unsafe.Add(ref c, 2 * Lanes);
            w = ref Unsafe.Add(ref w, 2 * groupStride);
        }

        if (group < groups)
        {
            AddOne(ref c, stride, ref w, ref six, lStride, depth);
        }
    }

    [MethodImpl(Compiled)]
    private static void AddTwo(
        ref double c, nuint stride, ref double w, ref double v, scoped ref double l, nuint lStride, int depth)
    {
        Vector512<double> a0 = default, a1 = default, a2 = default, a3 = default, a4 = default, a5 = default;
        Vector512<double> b0 = default, b1 = default, b2 = default, b3 = default, b4 = default, b5 = default;
        nuint at = 0;
        for (int k = 0; k < depth; k++)
        {
            Vector512<double> wk = Vector512.LoadUnsafe(ref w, at);
            Vector512<double> vk = Vector512.LoadUnsafe(ref v, at);
            at += Lanes;
            Vector512<double> factor = Vector512.Create(l);
            a0 = Vector512.FusedMultiplyAdd(wk, factor, a0);
            b0 = Vector512.FusedMultiplyAdd(vk, factor, b0);
            factor = Vector512.Create(Unsafe.Add(ref l, 1));
            a1 = Vector512.FusedMultiplyAdd(wk, factor, a1);
            b1 = Vector512.FusedMultiplyAdd(vk, factor, b1);
            factor = Vector512.Create(Unsafe.Add(ref l, 2));
            a2 = Vector512.FusedMultiplyAdd(wk, factor, a2);
            b2 = Vector512.FusedMultiplyAdd(vk, factor, b2);
            factor = Vector512.Create(Unsafe.Add(ref l, 3));
            a3 = Vector512.FusedMultiplyAdd(wk, factor, a3);
            b3 = Vector512.FusedMultiplyAdd(vk, factor, b3);
            factor = Vector512.Create(Unsafe.Add(ref l, 4));
            a4 = Vector512.FusedMultiplyAdd(wk, factor, a4);
            b4 = Vector512.FusedMultiplyAdd(vk, factor, b4);
            factor = Vector512.Create(Unsafe.Add(ref l, 5));
            a5 = Vector512.FusedMultiplyAdd(wk, factor, a5);
            b5 = Vector512.FusedMultiplyAdd(vk, factor, b5);
            l = ref Unsafe.Add(ref l, lStride);
        }

        AddTo(ref c, a0, b0);
        AddTo(ref Unsafe.Add(ref c, stride), a1, b1);
        AddTo(ref Unsafe.Add(ref c, 2 * stride), a2, b2);
        AddTo(ref Unsafe.Add(ref c, 3 * stride), a3, b3);
        AddTo(ref Unsafe.Add(ref c, 4 * stride), a4, b4);
        AddTo(ref Unsafe.Add(ref c, 5 * stride), a5, b5);
    }

    [MethodImpl(Compiled)]
    private static void AddOne(ref double c, nuint stride, ref double w, scoped ref double l, nuint lStride, int depth)
    {
        Vector512<double> a0 = default, a1 = default, a2 = default, a3 = default, a4 = default, a5 = default;
        nuint at = 0;
        for (int k = 0; k < depth; k++)
        {
            Vector512<double> wk = Vector512.LoadUnsafe(ref w, at);
            at += Lanes;
            a0 = Vector512.FusedMultiplyAdd(wk, Vector512.Create(l), a0);
            a1 = Vector512.FusedMultiplyAdd(wk, Vector512.Create(Unsafe.Add(ref l, 1)), a1);
            a2 = Vector512.FusedMultiplyAdd(wk, Vector512.Create(Unsafe.Add(ref l, 2)), a2);
            a3 = Vector512.FusedMultiplyAdd(wk, Vector512.Create(Unsafe.Add(ref l, 3)), a3);
            a4 = Vector512.FusedMultiplyAdd(wk, Vector512.Create(Unsafe.Add(ref l, 4)), a4);
            a5 = Vector512.FusedMultiplyAdd(wk, Vector512.Create(Unsafe.Add(ref l, 5)), a5);
            l = ref Unsafe.Add(ref l, lStride);
        }

        AddTo(ref c, a0);
        AddTo(ref Unsafe.Add(ref c, stride), a1);
        AddTo(ref Unsafe.Add(ref c, 2 * stride), a2);
        AddTo(ref Unsafe.Add(ref c, 3 * stride), a3);
        AddTo(ref Unsafe.Add(ref c, 4 * stride), a4);
        AddTo(ref Unsafe.Add(ref c, 5 * stride), a5);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static void AddTo(ref double c, Vector512<double> a) => (Vector512.LoadUnsafe(ref c) + a).StoreUnsafe(ref c);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static void AddTo(ref double c, Vector512<double> a, Vector512<double> b)
    {
        AddTo(ref c, a);
        AddTo(ref Unsafe.Add(ref c, Lanes), b);
    }

    /// <summary>W = −L D on groups of eight rows; rows past the end give what is not asked.</summary>
    /// <param name="l">First row, first column.</param>
    /// <param name="stride">From one column of L to the next.</param>
    /// <param name="pivots">D, one a column.</param>
    /// <param name="w">First group: for each column eight rows side by side.</param>
    /// <param name="groupStride">From one group of W to the next.</param>
    /// <param name="groups">Number of groups.</param>
    [MethodImpl(Compiled)]
    public static void Scale(
        ref double l, nuint stride, ReadOnlySpan<double> pivots, ref double w, nuint groupStride, int groups)
    {
        for (int k = 0; k < pivots.Length; k++)
        {
            Vector512<double> factor = Vector512.Create(-pivots[k]);
            ref double to = ref Unsafe.Add(ref w, k * Lanes);
            for (nuint group = 0; group < (nuint)groups; group++)
            {
                (Vector512.LoadUnsafe(ref l, group * Lanes) * factor).StoreUnsafe(ref to, group * groupStride);
            }

            l = ref Unsafe.Add(ref l, stride);
        }
    }

    /// <summary>
    /// Rows below a factored 6 × 6 diagonal block: W = −A L⁻ᵀ, then A := −W D⁻¹, on groups of eight rows.
    /// </summary>
    /// <param name="a">First row of the first of six columns.</param>
    /// <param name="stride">From one column to the next.</param>
    /// <param name="w">Where W goes: first group, first of the six columns.</param>
    /// <param name="groupStride">From one group of W to the next.</param>
    /// <param name="groups">Number of groups.</param>
    /// <param name="block">The diagonal block's L, 36 values by columns, below the diagonal.</param>
    /// <param name="inverse">Six values of D⁻¹.</param>
    [MethodImpl(Compiled)]
    public static void SolveBelow(
        ref double a, nuint stride, ref double w, nuint groupStride, int groups, ReadOnlySpan<double> block, ReadOnlySpan<double> inverse)
    {
        for (int group = 0; group < groups; group++)
        {
            Vector512<double> w0 = Vector512.LoadUnsafe(ref a);
            Vector512<double> w1 = Vector512.FusedMultiplyAdd(-w0, Vector512.Create(block[1]), Vector512.LoadUnsafe(ref a, stride));
            Vector512<double> w2 = Vector512.FusedMultiplyAdd(-w0, Vector512.Create(block[2]), Vector512.LoadUnsafe(ref a, 2 * stride));
            Vector512<double> w3 = Vector512.FusedMultiplyAdd(-w0, Vector512.Create(block[3]), Vector512.LoadUnsafe(ref a, 3 * stride));
            Vector512<double> w4 = Vector512.FusedMultiplyAdd(-w0, Vector512.Create(block[4]), Vector512.LoadUnsafe(ref a, 4 * stride));
            Vector512<double> w5 = Vector512.FusedMultiplyAdd(-w0, Vector512.Create(block[5]), Vector512.LoadUnsafe(ref a, 5 * stride));
            w2 = Vector512.FusedMultiplyAdd(-w1, Vector512.Create(block[Six + 2]), w2);
            w3 = Vector512.FusedMultiplyAdd(-w1, Vector512.Create(block[Six + 3]), w3);
            w4 = Vector512.FusedMultiplyAdd(-w1, Vector512.Create(block[Six + 4]), w4);
            w5 = Vector512.FusedMultiplyAdd(-w1, Vector512.Create(block[Six + 5]), w5);
            w3 = Vector512.FusedMultiplyAdd(-w2, Vector512.Create(block[(2 * Six) + 3]), w3);
            w4 = Vector512.FusedMultiplyAdd(-w2, Vector512.Create(block[(2 * Six) + 4]), w4);
            w5 = Vector512.FusedMultiplyAdd(-w2, Vector512.Create(block[(2 * Six) + 5]), w5);
            w4 = Vector512.FusedMultiplyAdd(-w3, Vector512.Create(block[(3 * Six) + 4]), w4);
            w5 = Vector512.FusedMultiplyAdd(-w3, Vector512.Create(block[(3 * Six) + 5]), w5);
            w5 = Vector512.FusedMultiplyAdd(-w4, Vector512.Create(block[(4 * Six) + 5]), w5);
            (-w0).StoreUnsafe(ref w);
            (-w1).StoreUnsafe(ref w, Lanes);
            (-w2).StoreUnsafe(ref w, 2 * Lanes);
            (-w3).StoreUnsafe(ref w, 3 * Lanes);
            (-w4).StoreUnsafe(ref w, 4 * Lanes);
            (-w5).StoreUnsafe(ref w, 5 * Lanes);
            (w0 * inverse[0]).StoreUnsafe(ref a);
            (w1 * inverse[1]).StoreUnsafe(ref a, stride);
            (w2 * inverse[2]).StoreUnsafe(ref a, 2 * stride);
            (w3 * inverse[3]).StoreUnsafe(ref a, 3 * stride);
            (w4 * inverse[4]).StoreUnsafe(ref a, 4 * stride);
            (w5 * inverse[5]).StoreUnsafe(ref a, 5 * stride);
            a = ref Unsafe.Add(ref a, Lanes);
            w = ref Unsafe.Add(ref w, groupStride);
        }
    }

    /// <summary>y += x.</summary>
    [MethodImpl(Compiled)]
    public static void Add(ReadOnlySpan<double> x, Span<double> y)
    {
        ref double from = ref MemoryMarshal.GetReference(x);
        ref double to = ref MemoryMarshal.GetReference(y);
        nuint i = 0;
        nuint length = (nuint)x.Length;
        for (; i + 4 <= length; i += 4)
        {
            (Vector256.LoadUnsafe(ref from, i) + Vector256.LoadUnsafe(ref to, i)).StoreUnsafe(ref to, i);
        }

        for (; i < length; i++)
        {
            Unsafe.Add(ref to, i) += Unsafe.Add(ref from, i);
        }
    }

    /// <summary>y −= A x for six columns of A, on groups of eight rows.</summary>
    /// <param name="a">First row of the first column.</param>
    /// <param name="stride">From one column to the next.</param>
    /// <param name="x">Six values.</param>
    /// <param name="y">First row.</param>
    /// <param name="groups">Number of groups.</param>
    [MethodImpl(Compiled)]
    public static void SubtractProduct(ref double a, nuint stride, ReadOnlySpan<double> x, ref double y, int groups)
    {
        Vector512<double> x0 = Vector512.Create(-x[0]);
        Vector512<double> x1 = Vector512.Create(-x[1]);
        Vector512<double> x2 = Vector512.Create(-x[2]);
        Vector512<double> x3 = Vector512.Create(-x[3]);
        Vector512<double> x4 = Vector512.Create(-x[4]);
        Vector512<double> x5 = Vector512.Create(-x[5]);
        for (int group = 0; group < groups; group++)
        {
            Vector512<double> even = Vector512.FusedMultiplyAdd(x0, Vector512.LoadUnsafe(ref a), Vector512.LoadUnsafe(ref y));
            Vector512<double> odd = x1 * Vector512.LoadUnsafe(ref a, stride);
            even = Vector512.FusedMultiplyAdd(x2, Vector512.LoadUnsafe(ref a, 2 * stride), even);
            odd = Vector512.FusedMultiplyAdd(x3, Vector512.LoadUnsafe(ref a, 3 * stride), odd);
            even = Vector512.FusedMultiplyAdd(x4, Vector512.LoadUnsafe(ref a, 4 * stride), even);
            odd = Vector512.FusedMultiplyAdd(x5, Vector512.LoadUnsafe(ref a, 5 * stride), odd);
            (even + odd).StoreUnsafe(ref y);
            a = ref Unsafe.Add(ref a, Lanes);
            y = ref Unsafe.Add(ref y, Lanes);
        }
    }

    /// <summary>x −= Aᵀ y for six columns of A, over groups of eight rows.</summary>
    /// <param name="a">First row of the first column.</param>
    /// <param name="stride">From one column to the next.</param>
    /// <param name="x">Six values.</param>
    /// <param name="y">First row.</param>
    /// <param name="groups">Number of groups.</param>
    [MethodImpl(Compiled)]
    public static void SubtractTransposed(ref double a, nuint stride, Span<double> x, ref double y, int groups)
    {
        Vector512<double> s0 = default, s1 = default, s2 = default, s3 = default, s4 = default, s5 = default;
        for (int group = 0; group < groups; group++)
        {
            Vector512<double> rows = Vector512.LoadUnsafe(ref y);
            s0 = Vector512.FusedMultiplyAdd(rows, Vector512.LoadUnsafe(ref a), s0);
            s1 = Vector512.FusedMultiplyAdd(rows, Vector512.LoadUnsafe(ref a, stride), s1);
            s2 = Vector512.FusedMultiplyAdd(rows, Vector512.LoadUnsafe(ref a, 2 * stride), s2);
            s3 = Vector512.FusedMultiplyAdd(rows, Vector512.LoadUnsafe(ref a, 3 * stride), s3);
            s4 = Vector512.FusedMultiplyAdd(rows, Vector512.LoadUnsafe(ref a, 4 * stride), s4);
            s5 = Vector512.FusedMultiplyAdd(rows, Vector512.LoadUnsafe(ref a, 5 * stride), s5);
            a = ref Unsafe.Add(ref a, Lanes);
            y = ref Unsafe.Add(ref y, Lanes);
        }

        x[0] -= SumOf(s0);
        x[1] -= SumOf(s1);
        x[2] -= SumOf(s2);
        x[3] -= SumOf(s3);
        x[4] -= SumOf(s4);
        x[5] -= SumOf(s5);
    }

    /// <summary>Sum of eight lanes, in one fixed order.</summary>
    private static double SumOf(Vector512<double> lanes)
    {
        Vector256<double> four = lanes.GetLower() + lanes.GetUpper();
        Vector128<double> two = four.GetLower() + four.GetUpper();
        return two[0] + two[1];
    }
}
