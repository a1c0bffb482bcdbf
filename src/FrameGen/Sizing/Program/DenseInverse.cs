namespace FrameGen.Sizing.Program;

/// <summary>Inverse of a small full matrix.</summary>
internal static class DenseInverse
{
    /// <summary>By Gauss and Jordan with the largest pivot of each column.</summary>
    /// <param name="matrix">By rows; overwritten.</param>
    /// <param name="size">Rows.</param>
    /// <returns>By rows; null where it is singular to rounding.</returns>
    public static double[]? Of(double[] matrix, int size)
    {
        const double Singular = 1e-11;
        var inverse = new double[size * size];
        for (int i = 0; i < size; i++)
        {
            inverse[(i * size) + i] = 1;
        }

        for (int column = 0; column < size; column++)
        {
            int best = column;
            for (int i = column + 1; i < size; i++)
            {
                best = Math.Abs(matrix[(i * size) + column]) > Math.Abs(matrix[(best * size) + column]) ? i : best;
            }

            double pivot = matrix[(best * size) + column];
            if (!(Math.Abs(pivot) > Singular))
            {
                return null;
            }

            Span<double> row = matrix.AsSpan(column * size, size);
            Span<double> inverseRow = inverse.AsSpan(column * size, size);
            Swap(row, matrix.AsSpan(best * size, size));
            Swap(inverseRow, inverse.AsSpan(best * size, size));
            for (int k = 0; k < size; k++)
            {
                row[k] /= pivot;
                inverseRow[k] /= pivot;
            }

            for (int i = 0; i < size; i++)
            {
                double factor = matrix[(i * size) + column];
                if (i == column || factor == 0)
                {
                    continue;
                }

                Subtract(matrix.AsSpan(i * size, size), factor, row);
                Subtract(inverse.AsSpan(i * size, size), factor, inverseRow);
            }
        }

        return inverse;
    }

    private static void Swap(Span<double> a, Span<double> b)
    {
        for (int k = 0; k < a.Length; k++)
        {
            (a[k], b[k]) = (b[k], a[k]);
        }
    }

    private static void Subtract(Span<double> from, double factor, ReadOnlySpan<double> row)
    {
        for (int k = 0; k < row.Length; k++)
        {
            from[k] -= factor * row[k];
        }
    }
}
