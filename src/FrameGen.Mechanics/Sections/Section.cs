using FrameGen.Geometry;

namespace FrameGen.Mechanics.Sections;

/// <summary>
/// A tube's cross-section. Local axes as in <see cref="TubeAxes"/>: z towards the top line, y across.
/// Lengths mm, areas mm², second moments mm⁴.
/// </summary>
public abstract record Section
{
    /// <summary>Canonical text in millimetres, as a spec would write it: <c>round 38 x 1.5 mm</c>, <c>rod 16 mm</c>.</summary>
    public abstract string Name { get; }

    /// <summary>The shape's word in a spec: <c>round</c>, <c>rod</c>.</summary>
    public abstract string Shape { get; }

    /// <summary>Outer size along the top line, mm.</summary>
    public abstract double Height { get; }

    /// <summary>Outer size across, mm.</summary>
    public abstract double Width { get; }

    /// <summary>Wall thickness, mm; the radius for a rod.</summary>
    public abstract double Wall { get; }

    /// <summary>The outer skin, seen along the tube.</summary>
    public abstract Outline Outline { get; }

    /// <summary>The bore; a point for a rod.</summary>
    public abstract Outline Bore { get; }

    /// <summary>Area of metal, mm².</summary>
    public abstract double Area { get; }

    /// <summary>Second moment for bending about local y (deflection towards the top line), mm⁴.</summary>
    public abstract double Iy { get; }

    /// <summary>Second moment for bending about local z, the top line, mm⁴.</summary>
    public abstract double Iz { get; }

    /// <summary>St Venant torsion constant J, mm⁴.</summary>
    public abstract double J { get; }

    /// <summary>Length of the outer outline, mm.</summary>
    public abstract double Perimeter { get; }

    /// <summary>Elastic section modulus for bending about local y, Iy over half the height, mm³.</summary>
    public double ElasticModulusY => 2 * Iy / Height;

    /// <summary>Elastic section modulus for bending about local z, Iz over half the width, mm³.</summary>
    public double ElasticModulusZ => 2 * Iz / Width;

    /// <summary>Plastic section modulus for bending about local y, mm³.</summary>
    public abstract double PlasticModulusY { get; }

    /// <summary>Plastic section modulus for bending about local z, mm³.</summary>
    public abstract double PlasticModulusZ { get; }

    /// <summary>Torsion section modulus: torque over the highest shear stress it causes, mm³.</summary>
    public abstract double TorsionModulus { get; }

    /// <summary>Radius of gyration for bending about local y, √(Iy/A), mm.</summary>
    public double RadiusOfGyrationY => Math.Sqrt(Iy / Area);

    /// <summary>Radius of gyration for bending about local z, √(Iz/A), mm.</summary>
    public double RadiusOfGyrationZ => Math.Sqrt(Iz / Area);

    /// <summary>Mass of one metre, kg/m.</summary>
    /// <param name="density">Density of the metal, kg/mm³.</param>
    public double MassPerMetre(double density) => 1000 * density * Area;

    /// <summary>The larger of height and width, mm: the size the joint order goes by.</summary>
    public double OuterSize => Math.Max(Height, Width);

    /// <summary>Shear areas, mm², for shear along local y and along local z.</summary>
    /// <param name="poissonRatio">ν of the material.</param>
    public abstract (double Y, double Z) ShearAreas(double poissonRatio);

    /// <summary>
    /// The highest von Mises stress anywhere in the section, MPa, transverse shear included; how the forces' signs meet the
    /// section is written at <see cref="SectionForces"/>.
    /// </summary>
    /// <param name="forces">Internal forces at that place, N and N·mm, in the tube's local axes.</param>
    public abstract double VonMises(in SectionForces forces);
}
