namespace FrameGen.Sizing.Analysis;

/// <summary>Real roots of a x³ + b x² + c x + d.</summary>
internal static class Cubic
{
    /// <summary>Finds the real roots; a leading coefficient of zero lowers the degree.</summary>
    /// <param name="a">Of x³.</param>
    /// <param name="b">Of x².</param>
    /// <param name="c">Of x.</param>
    /// <param name="d">Constant.</param>
    /// <param name="roots">Out: up to three roots, in no order; a double root, where the sign does not change, may be missing.</param>
    /// <returns>How many.</returns>
    /// <remarks>Depressed to s³ + p s + q with x = s − b/3a: Viète's cosines for three real roots, Cardano's sum for one.</remarks>
    public static int Roots(double a, double b, double c, double d, Span<double> roots)
    {
        if (a == 0)
        {
            return Quadratic(b, c, d, roots);
        }

        double shift = b / (3 * a);
        double p = (c / a) - (3 * shift * shift);
        double q = (2 * shift * shift * shift) - (shift * c / a) + (d / a);
        double inside = (q * q / 4) + (p * p * p / 27);
        if (inside > 0)
        {
            // Of the two cube roots, first the one without cancellation; their product is −p/3.
            double large = Math.Cbrt((-q / 2) - Math.CopySign(Math.Sqrt(inside), q));
            roots[0] = (large == 0 ? 0 : large - (p / (3 * large))) - shift;
            return 1;
        }

        double radius = 2 * Math.Sqrt(-p / 3);
        if (radius == 0)
        {
            roots[0] = -shift;
            return 1;
        }

        double angle = Math.Acos(Math.Clamp(3 * q / (p * radius), -1, 1)) / 3;
        for (int k = 0; k < 3; k++)
        {
            roots[k] = (radius * Math.Cos(angle - (2 * Math.PI * k / 3))) - shift;
        }

        return 3;
    }

    private static int Quadratic(double b, double c, double d, Span<double> roots)
    {
        if (b == 0)
        {
            roots[0] = -d / c;
            return c == 0 ? 0 : 1;
        }

        double inside = (c * c) - (4 * b * d);
        if (inside < 0)
        {
            return 0;
        }

        double large = -0.5 * (c + Math.CopySign(Math.Sqrt(inside), c));
        roots[0] = large / b;
        roots[1] = large == 0 ? 0 : d / large;
        return 2;
    }
}
