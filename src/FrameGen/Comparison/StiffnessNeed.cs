using FrameGen.Mechanics.Materials;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Comparison;

/// <summary>The stiffness that everything in a comparison has.</summary>
public sealed record StiffnessNeed
{
    /// <summary>A need.</summary>
    /// <param name="bending">Least EI, N·mm²; null where bending does not matter.</param>
    /// <param name="torsion">Least GJ, N·mm²; null where twist does not matter.</param>
    /// <param name="along">Which way it is bent.</param>
    /// <param name="reason">Where it comes from, in words.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is not positive and finite, or both are null.</exception>
    public StiffnessNeed(double? bending, double? torsion, BendingDirection along, string reason)
    {
        if (!((bending ?? torsion) is { } any && any > 0 && double.IsFinite(any) && (torsion ?? any) > 0 && double.IsFinite(torsion ?? any)))
        {
            throw new ArgumentOutOfRangeException(nameof(bending), bending, "A comparison needs a positive bending or torsional stiffness.");
        }

        (Bending, Torsion, Along, Reason) = (bending, torsion, along, reason);
    }

    /// <summary>Least EI, N·mm²; null where bending does not matter.</summary>
    public double? Bending { get; }

    /// <summary>Least GJ, N·mm²; null where twist does not matter.</summary>
    public double? Torsion { get; }

    /// <summary>Which way it is bent.</summary>
    public BendingDirection Along { get; }

    /// <summary>Where it comes from, in words.</summary>
    public string Reason { get; }

    /// <summary>The share of the need that a profile has, the less of bending and torsion: 1 for just enough.</summary>
    public double ShareOf(Profile profile, Material material) => Math.Min(
        Bending is { } bending ? material.E * SecondMoment(profile) / bending : double.PositiveInfinity,
        Torsion is { } torsion ? material.G * profile.J / torsion : double.PositiveInfinity);

    /// <summary>The second moment that bends, mm⁴.</summary>
    public double SecondMoment(Profile profile) => Along switch
    {
        BendingDirection.Top => profile.Iy,
        BendingDirection.Side => profile.Iz,
        _ => Math.Min(profile.Iy, profile.Iz),
    };

    /// <summary>In words: <c>EI of 1389 N.m2</c>, <c>EI of 300 N.m2 and GJ of 180 N.m2</c>.</summary>
    public override string ToString()
    {
        const double SquareMetre = 1e6;
        string bending = Bending is { } ei ? $"EI of {Wording.Number(ei / SquareMetre)} N.m2" : string.Empty;
        string torsion = Torsion is { } gj ? $"GJ of {Wording.Number(gj / SquareMetre)} N.m2" : string.Empty;
        return bending.Length > 0 && torsion.Length > 0 ? $"{bending} and {torsion}" : bending + torsion;
    }
}
