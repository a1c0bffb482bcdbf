using FrameGen.Mechanics.Materials;

namespace FrameGen.Mechanics.Sections;

/// <summary>How slender a tube's wall is, against the limits of the section classes of EN 1993-1-1:2005, table 5.2, for a wall pressed all over.</summary>
/// <remarks>
/// <para>Round (sheet 3): D/t no more than 50, 70, 90 ε². Flat sides (sheet 1): c/t no more than 33, 38, 42 ε, c the flat of the longer side
/// between its outer corners, or between the walls where corners are sharper than that: for hot-finished tube the table's usual h − 3t.
/// Ellipse: as a round tube of twice its largest radius of curvature, larger size squared over the smaller (L. Gardner and T. M. Chan, Steel
/// and Composite Structures 7 (2007) 185; from memory).</para>
/// <para>ε² = 235 MPa/fy for steels; for softer metals times E/210 000 MPa, as EN 1993-1-4 has it.</para>
/// </remarks>
/// <param name="Value">D/t or c/t.</param>
/// <param name="Class1">Largest value of class 1.</param>
/// <param name="Class2">Largest value of class 2.</param>
/// <param name="Class3">Largest value of class 3: a slenderer wall buckles before the metal yields.</param>
public readonly record struct WallSlenderness(double Value, double Class1, double Class2, double Class3)
{
    private const double ReferenceYield = 235;
    private const double ReferenceModulus = 210_000;
    private const double SoftestSteel = 190_000;

    /// <summary>1 to 4.</summary>
    public int Class => Value <= Class1 ? 1 : Value <= Class2 ? 2 : Value <= Class3 ? 3 : 4;

    /// <summary>Of a section in a metal; null for a rod, which has no wall, and for a metal without a yield.</summary>
    /// <param name="section">The section.</param>
    /// <param name="material">Its metal; the higher of its yields counts: where welds soften it, the sheet away from them has to reach that.</param>
    public static WallSlenderness? Of(Section section, Material material)
    {
        if (section is Rod || material.Yield is not { } yield)
        {
            return null;
        }

        double softness = material.E >= SoftestSteel ? 1 : material.E / ReferenceModulus;
        double square = ReferenceYield / yield * softness;
        if (section is FlatSidedTube flat)
        {
            double side = flat.OuterSize - (2 * Math.Max(flat.OuterCorner, flat.Wall));
            double epsilon = Math.Sqrt(square);
            return new WallSlenderness(side / flat.Wall, 33 * epsilon, 38 * epsilon, 42 * epsilon);
        }

        double diameter = section is RoundTube ? section.OuterSize : section.OuterSize * section.OuterSize / Math.Min(section.Height, section.Width);
        return new WallSlenderness(diameter / section.Wall, 50 * square, 70 * square, 90 * square);
    }
}
