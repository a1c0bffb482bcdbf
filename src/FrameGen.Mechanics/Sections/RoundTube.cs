using System.Globalization;
using FrameGen.Geometry;

namespace FrameGen.Mechanics.Sections;

/// <summary>Round tube: two concentric circles.</summary>
public sealed record RoundTube : Section
{
    /// <summary>Outside diameter and wall.</summary>
    /// <param name="outsideDiameter">D, mm.</param>
    /// <param name="wall">t, mm; must leave a bore.</param>
    /// <exception cref="ArgumentOutOfRangeException">The wall is not between 0 and half the diameter, or not finite.</exception>
    public RoundTube(double outsideDiameter, double wall)
    {
        // "Not inside the range", so that NaN is refused as well.
        if (!(wall > 0 && wall < outsideDiameter / 2 && double.IsFinite(outsideDiameter)))
        {
            throw new ArgumentOutOfRangeException(
                nameof(wall), wall, $"A {outsideDiameter} mm tube takes a wall between 0 and half of that.");
        }

        (OutsideDiameter, Wall) = (outsideDiameter, wall);
        (Outline, Bore) = (new RoundOutline(outsideDiameter / 2), new RoundOutline((outsideDiameter / 2) - wall));
    }

    /// <summary>D, mm.</summary>
    public double OutsideDiameter { get; }

    /// <summary>d = D − 2t, mm.</summary>
    public double InsideDiameter => OutsideDiameter - (2 * Wall);

    /// <inheritdoc/>
    public override double Wall { get; }

    /// <inheritdoc/>
    public override Outline Outline { get; }

    /// <inheritdoc/>
    public override Outline Bore { get; }

    /// <inheritdoc/>
    public override string Name => string.Create(CultureInfo.InvariantCulture, $"round {OutsideDiameter:0.####} x {Wall:0.####} mm");

    /// <inheritdoc/>
    public override string Shape => "round";

    /// <inheritdoc/>
    public override double Height => OutsideDiameter;

    /// <inheritdoc/>
    public override double Width => OutsideDiameter;

    /// <summary>A = πt(D − t), mm²: π(D² − d²)/4 without the cancellation.</summary>
    public override double Area => Math.PI * Wall * (OutsideDiameter - Wall);

    /// <summary>I = π(D⁴ − d⁴)/64 = A(D² + d²)/16, mm⁴.</summary>
    public override double Iy => Area * ((OutsideDiameter * OutsideDiameter) + (InsideDiameter * InsideDiameter)) / 16;

    /// <inheritdoc/>
    public override double Iz => Iy;

    /// <summary>J = 2I, mm⁴.</summary>
    public override double J => 2 * Iy;

    /// <inheritdoc/>
    public override double Perimeter => Math.PI * OutsideDiameter;

    /// <summary>Wpl = (D³ − d³)/6 = t(D² + Dd + d²)/3, mm³.</summary>
    public override double PlasticModulusY =>
        Wall * ((OutsideDiameter * OutsideDiameter) + (OutsideDiameter * InsideDiameter) + (InsideDiameter * InsideDiameter)) / 3;

    /// <inheritdoc/>
    public override double PlasticModulusZ => PlasticModulusY;

    /// <inheritdoc/>
    public override double TorsionModulus => 2 * J / OutsideDiameter;

    /// <summary>κA with Cowper's κ of the thick hollow circle (J. Appl. Mech. 33 (1966) 335), the same both ways, mm².</summary>
    /// <param name="poissonRatio">ν of the material; −1 &lt; ν ≤ 0.5.</param>
    /// <exception cref="ArgumentOutOfRangeException">ν is outside its range.</exception>
    public override (double Y, double Z) ShearAreas(double poissonRatio)
    {
        double area = Area * RoundStress.CowperCoefficient(InsideDiameter / OutsideDiameter, poissonRatio);
        return (area, area);
    }

    /// <inheritdoc/>
    public override double VonMises(in SectionForces forces) =>
        RoundStress.VonMises(forces, OutsideDiameter / 2, InsideDiameter / 2, Area, Iy);
}
