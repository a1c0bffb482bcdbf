using System.Globalization;

namespace FrameGen.Spec.Quantities;

/// <summary>A unit a spec may use.</summary>
/// <param name="Name">With <c>2</c> and <c>3</c> for powers and <c>.</c> for the dot.</param>
/// <param name="Kind">What it measures; N/mm stands for loads per length and stiffnesses alike.</param>
/// <param name="Factor">Working units in one of it are Factor·Times/Per; this part is exact.</param>
/// <param name="Times">The part that no decimal holds (π), 1 for most.</param>
/// <param name="Per">Its divisor, 1 for most.</param>
internal sealed record Unit(string Name, QuantityKind Kind, decimal Factor, double Times = 1, double Per = 1)
{
    /// <summary>Its exponents.</summary>
    public Dimension Dimension => KindInfo.Of(Kind).Dimension;

    /// <summary>So many of this unit in working units, rounded once where the number and the factor are decimals.</summary>
    /// <param name="number">As read.</param>
    /// <param name="exact">The same as a decimal; null where a decimal does not hold it.</param>
    public double ToWorking(double number, decimal? exact)
    {
        double value = number;
        if (Factor != 1)
        {
            // 1.5 in is 38.1 mm to the last bit, not 38.099999999999994: a size in inches finds its twin in millimetres.
            // A decimal keeps 28 places, so below 1e-10 it holds fewer digits than a double; there the double multiplies.
            decimal product = exact is { } e ? e * Factor : 0;
            value = Math.Abs(product) > 1e-10m
                ? double.Parse(product.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture)
                : number * (double)Factor;
        }

        return value * Times / Per;
    }
}
