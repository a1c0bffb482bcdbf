namespace FrameGen.Mechanics.Materials;

/// <summary>An isotropic metal.</summary>
/// <param name="Name">As written in specs.</param>
/// <param name="E">Young's modulus, MPa.</param>
/// <param name="G">Shear modulus, MPa.</param>
/// <param name="Density">Density, kg/mm³.</param>
/// <param name="Yield">Yield or 0.2 % proof stress, MPa; null where unknown.</param>
/// <param name="Ultimate">Tensile strength, MPa; null where unknown.</param>
/// <param name="YieldWelded">Yield within reach of a weld, MPa; null where unknown: there is no silent default.</param>
/// <param name="Source">Where the values come from.</param>
public sealed record Material(
    string Name, double E, double G, double Density, double? Yield, double? Ultimate, double? YieldWelded, string Source)
{
    /// <summary>Poisson's ratio, ν = E/2G − 1.</summary>
    public double PoissonRatio => (E / (2 * G)) - 1;
}
