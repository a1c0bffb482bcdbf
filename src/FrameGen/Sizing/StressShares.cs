using FrameGen.Mechanics.Sections;

namespace FrameGen.Sizing;

/// <summary>
/// What a stress comes from: the von Mises stress that each of the internal forces would cause alone, as shares of their sum. They do not add up to
/// the stress itself, whose worst point has not the worst of each.
/// </summary>
/// <param name="Axial">Of the axial force.</param>
/// <param name="Bending">Of both bending moments.</param>
/// <param name="Torsion">Of the torque.</param>
/// <param name="Shear">Of both shear forces.</param>
public readonly record struct StressShares(double Axial, double Bending, double Torsion, double Shear)
{
    /// <summary>Of the forces at one place of a tube; all zero where there is no stress.</summary>
    public static StressShares Of(Section section, in SectionForces forces)
    {
        ArgumentNullException.ThrowIfNull(section);
        double axial = section.VonMises(new SectionForces(forces.N, 0, 0, 0, 0, 0));
        double bending = section.VonMises(new SectionForces(0, 0, 0, 0, forces.My, forces.Mz));
        double torsion = section.VonMises(new SectionForces(0, 0, 0, forces.T, 0, 0));
        double shear = section.VonMises(new SectionForces(0, forces.Vy, forces.Vz, 0, 0, 0));
        double sum = axial + bending + torsion + shear;
        return sum > 0 ? new StressShares(axial / sum, bending / sum, torsion / sum, shear / sum) : default;
    }

    /// <summary>The shares by name, largest first.</summary>
    public IReadOnlyList<(string Name, double Share)> Ordered =>
        [.. new (string Name, double Share)[] { ("bending", Bending), ("axial", Axial), ("torsion", Torsion), ("shear", Shear) }.OrderByDescending(s => s.Share)];
}
