using FrameGen.Mechanics.Materials;
using FrameGen.Stock;
using Xunit;

namespace FrameGen.Tests.Stock;

public sealed class BuiltInMaterialsTests
{
    // E GPa, G GPa, density kg/m³, yield, ultimate and welded yield MPa as printed (0: none given). Sources: EN 1993-1-1 Table 3.1 and
    // 3.2.6 (S235, S275, S355); EN 10305-1 Table 4 (E235, E355; from memory); MIL-HDBK-5J Tables 2.3.1.0 and 5.4.1.0 (4130, Ti-6Al-4V;
    // from memory); ASTM A513 (1020; from memory); EN 1993-1-4 Table 2.1 (1.4301; from memory); EN 1999-1-1 Table 3.2b
    // (aluminium; its heat-affected zone as welded yield); SAE AMS 4943 (Ti-3Al-2.5V; from memory).
    // Welded yields of steels: common practice, no source.
    [Theory]
    [InlineData("S235", 210, 80.77, 7850, 235, 360, 235)]
    [InlineData("S275", 210, 80.77, 7850, 275, 430, 275)]
    [InlineData("S355", 210, 80.77, 7850, 355, 490, 355)]
    [InlineData("E235+N", 210, 80.77, 7850, 235, 340, 235)]
    [InlineData("E235+SR", 210, 80.77, 7850, 350, 420, 235)]
    [InlineData("E355+N", 210, 80.77, 7850, 355, 490, 355)]
    [InlineData("E355+SR", 210, 80.77, 7850, 450, 580, 355)]
    [InlineData("4130-N", 199.9, 75.8, 7833, 517, 655, 0)]
    [InlineData("1020-DOM", 205, 80, 7850, 414, 483, 0)]
    [InlineData("1.4301", 200, 76.9, 7900, 210, 520, 210)]
    [InlineData("6061-T6", 70, 27, 2700, 240, 260, 115)]
    [InlineData("6082-T6", 70, 27, 2700, 250, 290, 125)]
    [InlineData("6060-T66", 70, 27, 2700, 160, 215, 65)]
    [InlineData("6005A-T6", 70, 27, 2700, 215, 255, 115)]
    [InlineData("7020-T6", 70, 27, 2780, 290, 350, 205)]
    [InlineData("Ti-3Al-2.5V", 103, 44, 4480, 517, 621, 0)]
    [InlineData("Ti-6Al-4V", 110.3, 42.7, 4430, 869, 924, 0)]
    public void Carries_the_printed_values(string name, double e, double g, double density, double yield, double ultimate, double welded)
    {
        Material material = BuiltInMaterials.Find(name)!;

        Assert.Equal(name, material.Name);
        Assert.Equal(e * 1000, material.E, 1e-6);
        Assert.InRange(material.G / 1000, g - HalfOfTheLastDigit(g), g + HalfOfTheLastDigit(g));
        Assert.Equal(density, material.Density * 1e9, 1e-6);
        Assert.Equal(yield, material.Yield);
        Assert.Equal(ultimate, material.Ultimate);
        Assert.Equal(welded == 0 ? null : welded, material.YieldWelded);
        Assert.NotEmpty(material.Source);
    }

    [Fact]
    public void Holds_the_seventeen_materials_of_the_format_and_no_name_twice()
    {
        Assert.Equal(17, BuiltInMaterials.All.Count);
        Assert.Equal(17, BuiltInMaterials.All.Select(m => m.Name).Distinct(StringComparer.OrdinalIgnoreCase).Count());
    }

    // EN 1993-1-1, 3.2.6: ν = 0.3 and G ≈ 81 000 N/mm².
    [Fact]
    public void Gives_steel_the_shear_modulus_of_its_poisson_ratio() =>
        Assert.Equal(0.3, BuiltInMaterials.Find("S235")!.PoissonRatio, 1e-12);

    [Fact]
    public void Knows_no_other_names() => Assert.Null(BuiltInMaterials.Find("S9000"));

    private static double HalfOfTheLastDigit(double printed)
    {
        for (double unit = 1; ; unit /= 10)
        {
            if (Math.Abs((printed / unit) - Math.Round(printed / unit)) < 1e-6)
            {
                return (unit / 2) + 1e-9;
            }
        }
    }
}
