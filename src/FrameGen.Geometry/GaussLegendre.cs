using System.Collections.Immutable;

namespace FrameGen.Geometry;

/// <summary>Gauss–Legendre rules on [0, 1], and the change of variable that tames square roots at a panel's ends.</summary>
public static class GaussLegendre
{
    /// <summary>Eight nodes, exact for polynomials of degree 15.</summary>
    public static readonly GaussRule Eight = Rule(8);

    /// <summary>Twelve nodes, exact for polynomials of degree 23.</summary>
    public static readonly GaussRule Twelve = Rule(12);

    /// <summary>
    /// x = u²(3 − 2u) maps [0, 1] onto itself and is flat at both ends, so that an integrand with a square root at an
    /// end (a wall line that just grazes its mate) becomes smooth in u.
    /// </summary>
    /// <returns>x and dx/du.</returns>
    public static (double X, double Slope) Smooth(double u) => (u * u * (3 - (2 * u)), 6 * u * (1 - u));

    // Newton's method on the Legendre polynomial, from the usual cosine guess (Abramowitz and Stegun 25.4.29-30).
    private static GaussRule Rule(int count)
    {
        double[] nodes = new double[count];
        double[] weights = new double[count];
        for (int i = 0; i < count; i++)
        {
            double x = Math.Cos(Math.PI * (i + 0.75) / (count + 0.5));
            double slope = 1;
            for (int step = 0; step < 12; step++)
            {
                (double p, double before) = (x, 1);
                for (int k = 2; k <= count; k++)
                {
                    (p, before) = (((((2 * k) - 1) * x * p) - ((k - 1) * before)) / k, p);
                }

                slope = count * ((x * p) - before) / ((x * x) - 1);
                x -= p / slope;
            }

            nodes[count - 1 - i] = (1 + x) / 2;
            weights[count - 1 - i] = 1 / ((1 - (x * x)) * slope * slope);
        }

        return new GaussRule([.. nodes], [.. weights]);
    }
}

/// <summary>Nodes and weights of a rule on [0, 1].</summary>
/// <param name="Nodes">Growing.</param>
/// <param name="Weights">Their sum is 1.</param>
public sealed record GaussRule(ImmutableArray<double> Nodes, ImmutableArray<double> Weights);
