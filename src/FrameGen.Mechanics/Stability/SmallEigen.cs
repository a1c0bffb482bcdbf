namespace FrameGen.Mechanics.Stability;

/// <summary>All eigenpairs of a small dense symmetric matrix by cyclic Jacobi rotations (G. Golub, C. Van Loan, Matrix Computations, section 8.5).</summary>
internal static class SmallEigen
{
    private const int MostSweeps = 40;

    /// <summary>Eigenvalues, largest first, and their unit vectors.</summary>
    /// <param name="matrix">Symmetric, by columns; overwritten.</param>
    /// <param name="size">Rows and columns.</param>
    /// <param name="values">Out: one a column of <paramref name="vectors"/>.</param>
    /// <param name="vectors">Out: by columns.</param>
    public static void Solve(double[] matrix, int size, out double[] values, out double[] vectors)
    {
        double[] turned = new double[size * size];
        double norm = 0;
        for (int i = 0; i < size; i++)
        {
            turned[(size * i) + i] = 1;
            for (int j = 0; j < size; j++)
            {
                norm += matrix[(size * i) + j] * matrix[(size * i) + j];
            }
        }

        double negligible = 1e-30 * norm;
        for (int sweep = 0; sweep < MostSweeps && OffDiagonal(matrix, size) > negligible; sweep++)
        {
            for (int p = 0; p < size - 1; p++)
            {
                for (int q = p + 1; q < size; q++)
                {
                    Rotate(matrix, turned, size, p, q);
                }
            }
        }

        int[] order = new int[size];
        double[] diagonal = new double[size];
        for (int i = 0; i < size; i++)
        {
            (order[i], diagonal[i]) = (i, matrix[(size * i) + i]);
        }

        Array.Sort(order, (a, b) => diagonal[b] != diagonal[a] ? diagonal[b].CompareTo(diagonal[a]) : a.CompareTo(b));
        values = Array.ConvertAll(order, k => diagonal[k]);
        vectors = new double[size * size];
        for (int i = 0; i < size; i++)
        {
            turned.AsSpan(size * order[i], size).CopyTo(vectors.AsSpan(size * i));
        }
    }

    private static double OffDiagonal(double[] matrix, int size)
    {
        double sum = 0;
        for (int j = 1; j < size; j++)
        {
            for (int i = 0; i < j; i++)
            {
                sum += matrix[(size * j) + i] * matrix[(size * j) + i];
            }
        }

        return sum;
    }

    private static void Rotate(double[] a, double[] vectors, int size, int p, int q)
    {
        double off = a[(size * q) + p];
        if (off == 0)
        {
            return;
        }

        double half = (a[(size * q) + q] - a[(size * p) + p]) / (2 * off);
        double t = Math.CopySign(1, half) / (Math.Abs(half) + Math.Sqrt((half * half) + 1));
        double cos = 1 / Math.Sqrt((t * t) + 1);
        double sin = t * cos;
        TurnColumns(a.AsSpan(size * p, size), a.AsSpan(size * q, size), cos, sin);
        for (int k = 0; k < size; k++)
        {
            ref double atP = ref a[(size * k) + p];
            ref double atQ = ref a[(size * k) + q];
            (atP, atQ) = ((cos * atP) - (sin * atQ), (sin * atP) + (cos * atQ));
        }

        (a[(size * q) + p], a[(size * p) + q]) = (0, 0);
        TurnColumns(vectors.AsSpan(size * p, size), vectors.AsSpan(size * q, size), cos, sin);
    }

    private static void TurnColumns(Span<double> p, Span<double> q, double cos, double sin)
    {
        for (int k = 0; k < p.Length; k++)
        {
            (p[k], q[k]) = ((cos * p[k]) - (sin * q[k]), (sin * p[k]) + (cos * q[k]));
        }
    }
}
