using FrameGen.Mechanics.Sections;

namespace FrameGen.Comparison;

/// <summary>A cross-section as a comparison sees it; unlike a <see cref="Mechanics.Sections.Section"/> it may be one that no spec can name.</summary>
/// <param name="Height">Outer size along the load, mm.</param>
/// <param name="Width">Outer size across, mm.</param>
/// <param name="Wall">Wall, mm; null for a solid bar.</param>
/// <param name="Area">mm².</param>
/// <param name="Iy">Second moment for bending along the height, mm⁴.</param>
/// <param name="Iz">Second moment for bending across, mm⁴.</param>
/// <param name="J">St Venant torsion constant, mm⁴.</param>
/// <param name="Section">The same as a section; null where there is none.</param>
public sealed record Profile(
    double Height, double Width, double? Wall, double Area, double Iy, double Iz, double J, Section? Section = null)
{
    /// <summary>The larger of height and width, mm.</summary>
    public double OuterSize => Math.Max(Height, Width);

    /// <summary>Outer size over wall; null for a solid bar.</summary>
    public double? Slenderness => OuterSize / Wall;

    /// <summary>Of a section.</summary>
    public static Profile Of(Section section) => new(
        section.Height, section.Width, section is Rod ? null : section.Wall, section.Area, section.Iy, section.Iz, section.J, section);
}
