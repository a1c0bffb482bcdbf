using System.Globalization;
using FrameGen.Geometry;

namespace FrameGen.Mechanics.Sections;

/// <summary>Solid round bar.</summary>
public sealed record Rod : Section
{
    /// <summary>Diameter.</summary>
    /// <param name="diameter">D, mm; positive.</param>
    /// <exception cref="ArgumentOutOfRangeException">The diameter is not positive and finite.</exception>
    public Rod(double diameter)
    {
        if (!(diameter > 0 && double.IsFinite(diameter)))
        {
            throw new ArgumentOutOfRangeException(nameof(diameter), diameter, "A rod needs a positive diameter.");
        }

        Diameter = diameter;
        (Outline, Bore) = (new RoundOutline(diameter / 2), new RoundOutline(0));
    }

    /// <summary>D, mm.</summary>
    public double Diameter { get; }

    /// <inheritdoc/>
    public override Outline Outline { get; }

    /// <inheritdoc/>
    public override Outline Bore { get; }

    /// <inheritdoc/>
    public override string Name => string.Create(CultureInfo.InvariantCulture, $"rod {Diameter:0.####} mm");

    /// <inheritdoc/>
    public override string Shape => "rod";

    /// <inheritdoc/>
    public override double Height => Diameter;

    /// <inheritdoc/>
    public override double Width => Diameter;

    /// <inheritdoc/>
    public override double Wall => Diameter / 2;

    /// <summary>A = πD²/4, mm².</summary>
    public override double Area => Math.PI * Diameter * Diameter / 4;

    /// <summary>I = πD⁴/64, mm⁴.</summary>
    public override double Iy => Area * Diameter * Diameter / 16;

    /// <inheritdoc/>
    public override double Iz => Iy;

    /// <summary>J = 2I, mm⁴.</summary>
    public override double J => 2 * Iy;

    /// <inheritdoc/>
    public override double Perimeter => Math.PI * Diameter;

    /// <summary>Wpl = D³/6, mm³.</summary>
    public override double PlasticModulusY => Diameter * Diameter * Diameter / 6;

    /// <inheritdoc/>
    public override double PlasticModulusZ => PlasticModulusY;

    /// <inheritdoc/>
    public override double TorsionModulus => 2 * J / Diameter;

    /// <summary>κA with κ = 6(1+ν)/(7+6ν) (Cowper, J. Appl. Mech. 33 (1966) 335), the same both ways, mm².</summary>
    /// <param name="poissonRatio">ν of the material; −1 &lt; ν ≤ 0.5.</param>
    /// <exception cref="ArgumentOutOfRangeException">ν is outside its range.</exception>
    public override (double Y, double Z) ShearAreas(double poissonRatio)
    {
        double area = Area * RoundStress.CowperCoefficient(0, poissonRatio);
        return (area, area);
    }

    /// <inheritdoc/>
    public override double VonMises(in SectionForces forces) => RoundStress.VonMises(forces, Diameter / 2, 0, Area, Iy);
}
