using FrameGen.Mechanics.Materials;

namespace FrameGen.Stock;

/// <summary>
/// The built-in materials: minimum or characteristic values, each with its source. Welded yields: aluminium from
/// EN 1999-1-1 (heat-affected zone); normalised, hot-finished and annealed metals keep their yield, having no cold work to
/// lose; stress-relieved precision tubes fall back to the normalised state (both common practice, no source).
/// Where no value can be given it is null, and a strength target asks for one.
/// </summary>
public static class BuiltInMaterials
{
    private const double SteelE = 210_000;
    private const double SteelG = SteelE / 2.6; // ν = 0.3
    private const double SteelDensity = 7850e-9;
    private const double AluminiumE = 70_000;
    private const double AluminiumG = 27_000;
    private const double AluminiumDensity = 2700e-9;

    private const string Structural = "EN 1993-1-1:2005 Table 3.1 and 3.2.6; welded: no cold work to lose (common practice, no source)";
    private const string Normalised =
        "EN 10305-1:2016 Table 4 (from memory), E and ν of EN 1993-1-1 3.2.6; welded: no cold work to lose (common practice, no source)";

    private const string StressRelieved =
        "EN 10305-1:2016 Table 4 (from memory), E and ν of EN 1993-1-1 3.2.6; welded: as normalised (common practice, no source)";

    private const string EurocodeAluminium = "EN 1999-1-1 Table 3.2b and 3.2.5 (E, G and density from memory); welded: its heat-affected zone";

    private static readonly (Material Material, double? MaxWall)[] Table =
    [
        (Steel("S235", 235, 360, 235, Structural), 40),
        (Steel("S275", 275, 430, 275, Structural), 40),
        (Steel("S355", 355, 490, 355, Structural + "; tensile strength of EN 10025-2"), 40),
        (Steel("E235+N", 235, 340, 235, Normalised), null),
        (Steel("E235+SR", 350, 420, 235, StressRelieved), null),
        (Steel("E355+N", 355, 490, 355, Normalised), null),
        (Steel("E355+SR", 450, 580, 355, StressRelieved), null),
        (new("4130-N", 199_900, 75_800, 7833e-9, 517, 655, null,
            "MIL-HDBK-5J Table 2.3.1.0(c1), wall up to 0.188 in (from memory)"), 0.188 * 25.4),
        (new("1020-DOM", 205_000, 80_000, 7850e-9, 414, 483, null, "ASTM A513 type 5, 1020 as drawn (from memory)"), null),
        (new("1.4301", 200_000, 200_000 / 2.6, 7900e-9, 210, 520, 210,
            "EN 1993-1-4:2006 Table 2.1, hot-rolled strip, the lower of strip's two values; density EN 10088-1 (from memory); "
            + "welded: annealed, no cold work to lose (common practice, no source)"), null),
        (Aluminium("6061-T6", 240, 260, 115, EurocodeAluminium + "; wall up to 20 mm"), 20),
        (Aluminium("6082-T6", 250, 290, 125,
            EurocodeAluminium + "; the row for walls up to 5 mm, lower than that up to 15 mm (from memory)"), 15),
        (Aluminium("6060-T66", 160, 215, 65, EurocodeAluminium + "; wall up to 3 mm"), 3),
        (Aluminium("6005A-T6", 215, 255, 115, EurocodeAluminium + "; hollow, wall up to 5 mm"), 5),
        (new("7020-T6", AluminiumE, AluminiumG, 2780e-9, 290, 350, 205,
            "EN 1999-1-1 Table 3.2b, wall up to 15 mm (from memory); welded: its heat-affected zone"), 15),
        (new("Ti-3Al-2.5V", 103_000, 44_000, 4480e-9, 517, 621, null, "SAE AMS 4943, annealed (from memory)"), null),
        (new("Ti-6Al-4V", 110_300, 42_700, 4430e-9, 869, 924, null, "MIL-HDBK-5J Table 5.4.1.0, AMS 4911 annealed (from memory)"), null),
    ];

    /// <summary>All built-in materials.</summary>
    public static IReadOnlyList<Material> All { get; } = [.. Table.Select(row => row.Material)];

    /// <summary>The material of a name; null where there is none.</summary>
    /// <param name="name">Compared without regard to case.</param>
    public static Material? Find(string name) =>
        Table.FirstOrDefault(row => string.Equals(row.Material.Name, name, StringComparison.OrdinalIgnoreCase)).Material;

    /// <summary>The thickest wall that a built-in material's strengths hold for, mm; null where its source names none.</summary>
    /// <param name="material">A material of <see cref="All"/>; null for any other.</param>
    public static double? MaxWall(Material material) =>
        Table.FirstOrDefault(row => ReferenceEquals(row.Material, material)).MaxWall;

    private static Material Steel(string name, double yield, double ultimate, double welded, string source) =>
        new(name, SteelE, SteelG, SteelDensity, yield, ultimate, welded, source);

    private static Material Aluminium(string name, double yield, double ultimate, double welded, string source) =>
        new(name, AluminiumE, AluminiumG, AluminiumDensity, yield, ultimate, welded, source);
}
