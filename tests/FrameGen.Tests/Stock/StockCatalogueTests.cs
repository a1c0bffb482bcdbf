using FrameGen.Mechanics.Sections;
using FrameGen.Stock;
using Xunit;

namespace FrameGen.Tests.Stock;

public sealed class StockCatalogueTests
{
    // Different round sizes a list holds, counted in the files with a spreadsheet's filter on shape and standard.
    [Theory]
    [InlineData("en10305", 144)]
    [InlineData("en10305-square", 0)]
    [InlineData("en10219", 60)]
    [InlineData("en10210", 44)]
    [InlineData("iso4200", 65)]
    [InlineData("nps40", 8)]
    [InlineData("aircraft-4130", 113)]
    [InlineData("wwt700-6061", 64)]
    [InlineData("en755", 24)]
    [InlineData("en1127", 84)]
    [InlineData("stainless-square", 0)]
    public void Reads_every_round_row_of_a_list_once(string name, int sizes)
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

    [Theory]
    [InlineData("en10219", "square rectangular")]
    [InlineData("en10305-square", "square")]
    [InlineData("en755", "square")]
    [InlineData("en10305", "")]
    [InlineData("en1127", "")]
    public void Says_which_shapes_it_can_not_offer_yet(string name, string shapes) =>
        Assert.Equal(shapes, string.Join(' ', StockCatalogue.Find(name)!.OtherShapes));

    [Fact]
    public void Sells_only_materials_that_exist() =>
        Assert.All(
            StockCatalogue.Names.SelectMany(name => StockCatalogue.Find(name)!.Materials),
            material => Assert.NotNull(BuiltInMaterials.Find(material)));

    [Fact]
    public void Says_where_a_material_is_sold() =>
        Assert.Equal("en10219 en10210 iso4200 nps40", string.Join(' ', StockCatalogue.NamesSoldIn("S355")));
}
