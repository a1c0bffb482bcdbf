using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Comparison;

/// <summary>Shapes and metals side by side at equal stiffness.</summary>
/// <param name="Need">The stiffness that all have.</param>
/// <param name="Reference">What masses are compared with: <c>a solid square bar of S235</c>.</param>
/// <param name="ReferenceMass">Its mass, kg/m.</param>
/// <param name="Materials">One a metal, in the order asked for.</param>
public sealed record ShapeComparison(
    StiffnessNeed Need, string Reference, double ReferenceMass, IReadOnlyList<MaterialComparison> Materials)
{
    /// <summary>Compares shapes and metals.</summary>
    /// <param name="need">The stiffness that all must have.</param>
    /// <param name="materials">The metals; one at least.</param>
    /// <param name="shapes">The shapes.</param>
    /// <param name="rules">Limits of the walls; each gives a row a tube shape.</param>
    /// <param name="supply">Where the nearest stock sizes are looked for.</param>
    /// <param name="own">A tube to compare with, in its metal; null for a solid square bar of the first metal.</param>
    public static ShapeComparison Of(
        StiffnessNeed need,
        IReadOnlyList<Material> materials,
        IReadOnlyList<ComparedShape> shapes,
        IReadOnlyList<WallRule> rules,
        Supply supply,
        (Section Section, Material Material)? own = null)
    {
        (string words, double mass) = own is { } tube
            ? ($"{tube.Section.Name} of {tube.Material.Name}", tube.Section.MassPerMetre(tube.Material.Density))
            : ($"a solid square bar of {materials[0].Name}", SolidMass(need, materials[0], rules[0]));
        return new ShapeComparison(
            need,
            words,
            mass,
            [.. materials.Select(m => new MaterialComparison(m, [.. shapes.SelectMany(s => Rows(s, m, need, rules, supply, mass))]))]);
    }

    private static double SolidMass(StiffnessNeed need, Material material, WallRule any) =>
        1000 * material.Density * EqualStiffness.Find(ComparedShape.SquareBar, material, need, any)!.Area;

    private static IEnumerable<ComparedTube> Rows(
        ComparedShape shape, Material material, StiffnessNeed need, IReadOnlyList<WallRule> rules, Supply supply, double reference)
    {
        foreach (WallRule rule in shape.IsTube ? rules : rules.Take(1))
        {
            if (EqualStiffness.Find(shape, material, need, rule) is { } size)
            {
                double mass = 1000 * material.Density * size.Area;
                yield return new ComparedTube(
                    shape,
                    shape.IsTube ? rule : null,
                    size,
                    mass,
                    mass / reference,
                    size.Section is null ? null : WallSlenderness.Of(size.Section, material),
                    supply.Lightest(shape, material, need, rule));
            }
        }
    }
}

/// <summary>The shapes in one metal.</summary>
/// <param name="Material">The metal.</param>
/// <param name="Tubes">One a shape and rule of the walls that gives one; solid bars once.</param>
public sealed record MaterialComparison(Material Material, IReadOnlyList<ComparedTube> Tubes);

/// <summary>A shape in a metal, just stiff enough.</summary>
/// <param name="Shape">The shape.</param>
/// <param name="Rule">The limits of its wall; null for a solid bar.</param>
/// <param name="Size">Its size.</param>
/// <param name="MassPerMetre">kg/m.</param>
/// <param name="Relative">Mass over that of the reference.</param>
/// <param name="Wall">How slender its wall is; null where there is no wall, or the metal has no yield.</param>
/// <param name="Stock">The lightest size that can be bought, is stiff enough and keeps to the rule; null for none.</param>
public sealed record ComparedTube(
    ComparedShape Shape, WallRule? Rule, Profile Size, double MassPerMetre, double Relative, WallSlenderness? Wall, StockMatch? Stock);

/// <summary>A size that can be bought.</summary>
/// <param name="Section">The size.</param>
/// <param name="List">The stock list that has it.</param>
/// <param name="MassPerMetre">kg/m.</param>
/// <param name="PricePerMetre">In the shop's own money; null where unknown.</param>
public sealed record StockMatch(Section Section, string List, double MassPerMetre, double? PricePerMetre);
