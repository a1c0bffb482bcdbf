using FrameGen.Mechanics.Sections;

namespace FrameGen.Sizing.Search;

/// <summary>
/// A point of a section's skin and a mix of normal and shear stress there, as factors of the internal forces: whatever the forces are, von Mises' stress
/// somewhere in the section is no less than this sum, since √(σ² + 3τ²) ≥ σ cos α + √3 τ sin α.
/// </summary>
/// <param name="AcrossY">Component of the point's direction along local y; with the other of length 1.</param>
/// <param name="AcrossZ">Component along local z.</param>
/// <param name="Normal">cos α.</param>
/// <param name="Shear">sin α.</param>
internal readonly record struct StressPoint(double AcrossY, double AcrossZ, double Normal, double Shear)
{
    private const int Looks = 720;

    /// <summary>The point and mix that show most of the stress in one section.</summary>
    public static StressPoint Worst(Section section, in SectionForces forces)
    {
        bool isRound = section is RoundTube or Rod;
        int looks = isRound ? Looks : 4;
        StressPoint worst = default;
        double most = -1;
        for (int i = 0; i < looks; i++)
        {
            (double y, double z) = Math.SinCos(2 * Math.PI * i / looks);
            if (!isRound)
            {
                // The middles of the four sides, or the ends of the two axes: on the skin of every symmetrical shape.
                (y, z) = (Math.Round(y), Math.Round(z));
            }

            double normal = new StressPoint(y, z, 1, 0).Of(section, forces);
            double shear = isRound ? new StressPoint(y, z, 0, 1).Of(section, forces) : 0;
            double stress = Math.Sqrt((normal * normal) + (shear * shear));
            if (stress > most)
            {
                (worst, most) = (new StressPoint(y, z, normal / Math.Max(stress, 1e-300), shear / Math.Max(stress, 1e-300)), stress);
            }
        }

        return worst;
    }

    /// <summary>What the six internal forces are multiplied by, in the order of <see cref="SectionForces"/>, MPa per N and N·mm.</summary>
    public SectionForces Factors(Section section)
    {
        const double Root3 = 1.7320508075688772;
        double bendingY = Normal * AcrossZ * section.Height / 2 / section.Iy;
        double bendingZ = -Normal * AcrossY * section.Width / 2 / section.Iz;
        double axial = Normal / section.Area;
        if (section is not (RoundTube or Rod) || Shear == 0)
        {
            return new SectionForces(axial, 0, 0, 0, bendingY, bendingZ);
        }

        // Along the skin τ = T R/2I + k (Vz y − Vy z), k = 4 (R² + R r + r²) / (3 A (R² + r²)): as the section's own stress has it.
        double outer = section.OuterSize / 2;
        double inner = section is Rod ? 0 : outer - section.Wall;
        double k = 4 * ((outer * outer) + (outer * inner) + (inner * inner)) / (3 * section.Area * ((outer * outer) + (inner * inner)));
        double mix = Root3 * Shear;
        return new SectionForces(axial, -mix * k * AcrossZ, mix * k * AcrossY, mix * outer / (2 * section.Iy), bendingY, bendingZ);
    }

    private double Of(Section section, in SectionForces forces)
    {
        SectionForces f = Factors(section);
        return (f.N * forces.N) + (f.Vy * forces.Vy) + (f.Vz * forces.Vz) + (f.T * forces.T) + (f.My * forces.My) + (f.Mz * forces.Mz);
    }
}
