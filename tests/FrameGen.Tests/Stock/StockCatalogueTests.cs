using FrameGen.Mechanics.Sections;
using FrameGen.Stock;
using Xunit;

namespace FrameGen.Tests.Stock;

public sealed class StockCatalogueTests
{
    // Different sizes a list holds, counted in the files with a spreadsheet's filter on shape and standard.
    [Theory]
    [InlineData("en10305", 144)]
    [InlineData("en10305-square", 20)]
    [InlineData("en10219", 60 + 60 + 75)]
    [InlineData("en10210", 44 + 49 + 50)]
    [InlineData("iso4200", 65)]
    [InlineData("nps40", 8)]
    [InlineData("aircraft-4130", 113)]
    [InlineData("wwt700-6061", 64)]
    [InlineData("en755", 24 + 20)]
    [InlineData("en1127", 84)]
    [InlineData("stainless-square", 18)]
    public void Reads_every_row_of_a_list_once(string name, int sizes)
    {
        StockList list = StockCatalogue.Find(name)!;

        Assert.Equal(sizes, list.Sizes.Count);
        Assert.Equal(sizes, list.Sizes.Select(s => s.Section.Name).Distinct(StringComparer.Ordinal).Count());
    }

    [Fact]
    public void Holds_the_eleven_lists_of_the_format() =>
        Assert.Equal(
            "en10305 en10305-square en10219 en10210 iso4200 nps40 aircraft-4130 wwt700-6061 en755 en1127 stainless-square",
            string.Join(' ', StockCatalogue.Names));

    // ASME B36.10M, schedule 40, metric listing (from memory): NPS 1 is 33.4 x 3.38 mm, NPS 2 is 60.3 x 3.91 mm.
    // EN 10219-2 (public section tables): 48.3 x 3 mm, 6 m bars. Inch sizes are exact: 1 in x 0.035 in is 25.4 x 0.889 mm.
    [Theory]
    [InlineData("nps40", 33.4, 3.38, 6000)]
    [InlineData("nps40", 60.3, 3.91, 6000)]
    [InlineData("en10219", 48.3, 3, 6000)]
    [InlineData("en10210", 48.3, 3.2, 12000)]
    [InlineData("aircraft-4130", 25.4, 0.889, 5486)]
    [InlineData("wwt700-6061", 25.4, 0.889, 3658)]
    public void Holds_well_known_sizes(string name, double diameter, double wall, double bar)
    {
        var wanted = new RoundTube(diameter, wall);

        StockSize size = Assert.Single(StockCatalogue.Find(name)!.Sizes, s => s.Section.Equals(wanted));

        Assert.Equal(bar, size.BarLength);
        Assert.Null(size.PricePerMetre);
    }

    // Corners as the standards calculate with: EN 10219-2 2.0 T outside up to 6 mm and the same centre inside, EN 10210-2 1.5 T and 1.0 T.
    [Theory]
    [InlineData("en10219", 60, 40, 3, 6, 3, 6000)]
    [InlineData("en10219", 120, 120, 8, 20, 12, 6000)]
    [InlineData("en10210", 60, 40, 4, 6, 4, 12000)]
    [InlineData("en10305-square", 40, 40, 2, 4, 2, 6000)]
    [InlineData("stainless-square", 40, 40, 2, 4, 2, 6000)]
    public void Holds_well_known_flat_sided_sizes(string name, double height, double width, double wall, double outer, double inner, double bar)
    {
        var wanted = new FlatSidedTube(height, width, wall, outer, inner);

        StockSize size = Assert.Single(StockCatalogue.Find(name)!.Sizes, s => s.Section.Equals(wanted));

        Assert.Equal(bar, size.BarLength);
    }

    [Fact]
    public void Sells_only_materials_that_exist() =>
        Assert.All(
            StockCatalogue.Names.SelectMany(name => StockCatalogue.Find(name)!.Materials),
            material => Assert.NotNull(BuiltInMaterials.Find(material)));

    [Fact]
    public void Says_where_a_material_is_sold() =>
        Assert.Equal("en10219 en10210 iso4200 nps40", string.Join(' ', StockCatalogue.NamesSoldIn("S355")));
}
