using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace FrameGen.Mechanics.Stability;

/// <summary>
/// Sums over long vectors, four lanes at a time whatever the machine has, so that every machine adds in the same order and comes to the
/// same digits.
/// </summary>
internal static class VectorKernels
{
    private const int Lanes = 4;

    /// <summary>Σ a b.</summary>
    public static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        ref double x = ref MemoryMarshal.GetReference(a);
        ref double y = ref MemoryMarshal.GetReference(b[..a.Length]);
        Vector256<double> s0 = Vector256<double>.Zero;
        Vector256<double> s1 = s0;
        Vector256<double> s2 = s0;
        Vector256<double> s3 = s0;
        nuint k = 0;
        nuint length = (nuint)a.Length;
        for (; k + (4 * Lanes) <= length; k += 4 * Lanes)
        {
            s0 = Vector256.FusedMultiplyAdd(Vector256.LoadUnsafe(ref x, k), Vector256.LoadUnsafe(ref y, k), s0);
            s1 = Vector256.FusedMultiplyAdd(Vector256.LoadUnsafe(ref x, k + 4), Vector256.LoadUnsafe(ref y, k + 4), s1);
            s2 = Vector256.FusedMultiplyAdd(Vector256.LoadUnsafe(ref x, k + 8), Vector256.LoadUnsafe(ref y, k + 8), s2);
            s3 = Vector256.FusedMultiplyAdd(Vector256.LoadUnsafe(ref x, k + 12), Vector256.LoadUnsafe(ref y, k + 12), s3);
        }

        Vector256<double> four = (s0 + s1) + (s2 + s3);
        double sum = (four[0] + four[1]) + (four[2] + four[3]);
        for (int i = (int)k; i < a.Length; i++)
        {
            sum = Math.FusedMultiplyAdd(a[i], b[i], sum);
        }

        return sum;
    }

    /// <summary>sum += factor · term.</summary>
    public static void AddTimes(Span<double> sum, double factor, ReadOnlySpan<double> term)
    {
        ref double x = ref MemoryMarshal.GetReference(sum);
        ref double y = ref MemoryMarshal.GetReference(term[..sum.Length]);
        Vector256<double> times = Vector256.Create(factor);
        nuint k = 0;
        for (; k + Lanes <= (nuint)sum.Length; k += Lanes)
        {
            Vector256.FusedMultiplyAdd(times, Vector256.LoadUnsafe(ref y, k), Vector256.LoadUnsafe(ref x, k)).StoreUnsafe(ref x, k);
        }

        for (int i = (int)k; i < sum.Length; i++)
        {
            sum[i] = Math.FusedMultiplyAdd(factor, term[i], sum[i]);
        }
    }
}
