using FrameGen.Diagnostics;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class GroupTests
{
    [Fact]
    public void Lists_candidates_within_the_ranges_by_mass()
    {
        TubeGroup group = Chosen("E235+N", ["en10305"], od: ("25 mm", "28 mm"), wall: ("1.5 mm", "2 mm")).Model().Groups[0];

        Assert.False(group.IsFixed);
        Assert.NotEmpty(group.Candidates);
        Assert.All(group.Candidates, c => Assert.InRange(c.Section.OuterSize, 25, 28));
        Assert.All(group.Candidates, c => Assert.InRange(c.Section.Wall, 1.5, 2));
        Assert.Equal(group.Candidates.Select(c => c.Section.Area).Order(), group.Candidates.Select(c => c.Section.Area));
        Assert.Equal("round 25 x 1.5 mm", group.Candidates[0].Section.Name);
        Assert.All(group.Candidates, c => Assert.Equal(("en10305", 6000), (c.StockList, c.BarLength)));
    }

    [Fact]
    public void Takes_both_ends_of_a_range_in_whatever_unit_they_are_written()
    {
        TubeGroup group = Chosen("4130-N", ["aircraft-4130"], od: ("1.5 in", "1.5 in"), wall: ("0.065 in", "0.065 in")).Model().Groups[0];

        Assert.Equal("round 38.1 x 1.651 mm", Assert.Single(group.Candidates).Section.Name);
    }

    [Fact]
    public void Buys_a_size_from_the_cheaper_of_two_lists()
    {
        FrameModel model = Chosen("S235", ["corner-shop", "mill", "kiosk"])
            .Stock("corner-shop", ["S235"], "3000 mm", 9, new RoundTube(30, 2), new RoundTube(35, 2))
            .Stock("mill", ["S235", "S355"], "6000 mm", 4, new RoundTube(30, 2), new RoundTube(25, 2))
            .Stock("kiosk", ["S235"], null, null, new RoundTube(30, 2))
            .Model();

        Assert.Equal(
            [
                new Candidate(new RoundTube(25, 2), "mill", 6000, 4),
                new Candidate(new RoundTube(30, 2), "mill", 6000, 4),
                new Candidate(new RoundTube(35, 2), "corner-shop", 3000, 9),
            ],
            model.Groups[0].Candidates);
    }

    [Fact]
    public void Buys_a_fixed_size_where_it_is_sold()
    {
        TubeGroup sold = Fixed("S235", new RoundTube(48.3, 3.2)).Model().Groups[0];
        TubeGroup odd = Fixed("S235", new RoundTube(47.1, 3.3)).Model().Groups[0];

        Assert.True(sold.IsFixed);
        Assert.Equal(new Candidate(new RoundTube(48.3, 3.2), "en10219", 6000, null), Assert.Single(sold.Candidates));
        Assert.Equal(new Candidate(new RoundTube(47.1, 3.3), string.Empty, 6000, null), Assert.Single(odd.Candidates));
    }

    [Fact]
    public void Says_what_is_nearest_when_no_size_is_left()
    {
        string error = Chosen("E235+N", ["en10305"], od: ("25 mm", "25 mm"), wall: ("11 mm", null)).Error();

        Assert.Contains("en10305 holds nothing with od 25 mm .. 25 mm and wall 11 mm ..", error, StringComparison.Ordinal);
        Assert.Contains("nearest: round 25 x", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_list_that_is_not_sold_in_the_material()
    {
        string error = Chosen("4130-N", ["en10305"]).Error();

        Assert.Contains("en10305 is not sold in 4130-N but in E235+N, E235+SR, E355+N, E355+SR", error, StringComparison.Ordinal);
        Assert.Contains("4130-N is sold in: aircraft-4130", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_built_in_list_for_a_material_of_the_spec()
    {
        string error = Chosen("pier-steel", ["en10305"]).Material("pier-steel", "205 GPa", null, "0.29", "7800 kg/m3").Error();

        Assert.Contains("pier-steel is a material of this spec", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Takes_a_list_of_the_spec_for_a_material_of_the_spec()
    {
        FrameModel model = Chosen("pier-steel", ["yard"])
            .Material("pier-steel", "205 GPa", null, "0.25", "7800 kg/m3", "300 MPa")
            .Stock("yard", ["pier-steel"], null, null, new Rod(16))
            .Model();
        Material material = model.Groups[0].Material;

        // G = E / 2(1 + ν) = 205 000 / 2.5.
        Assert.Equal(82_000, material.G, 1e-9);
        Assert.Equal(7.8e-6, material.Density, 1e-18);
        Assert.Equal((300.0, null), (material.Yield, material.YieldWelded));
        Assert.Equal("rod 16 mm", model.Groups[0].Candidates[0].Section.Name);
    }

    [Fact]
    public void Lets_g_win_over_poisson_and_asks_for_one_of_them()
    {
        SpecBuilder spec = Fixed("own", new RoundTube(30, 2)).Material("own", "200 GPa", "70 GPa", "0.3", "7800 kg/m3");

        Assert.Equal(70_000, spec.Model().Groups[0].Material.G, 1e-9);
        Assert.Contains(
            "material own needs G or poisson",
            Fixed("own", new RoundTube(30, 2)).Material("own", "200 GPa", null, null, "7800 kg/m3").Error(),
            StringComparison.Ordinal);
    }

    [Fact]
    public void Lets_a_material_of_the_spec_win_over_a_built_in_one_with_a_note()
    {
        SpecBuilder spec = Chosen("4130-N", ["aircraft-4130"], od: ("1 in", "1 in"))
            .Material("4130-N", "205 GPa", "80 GPa", null, "7850 kg/m3", "460 MPa", "400 MPa");

        Assert.Equal(400, spec.Model().Groups[0].Material.YieldWelded);
        Assert.Equal("material 4130-N of this spec is used in place of the built-in one", Assert.Single(spec.Said(Severity.Note)));
    }

    [Theory]
    [InlineData("E235+N", "en10305", "square", "en10305 holds no square sizes; choose another list or shape")]
    [InlineData("E235+N", "en10305", "rod", "en10305 holds no rod sizes")]
    [InlineData("E235+N", "en10350", null, "there is no stock list en10350; did you mean 'en10305'?")]
    [InlineData("E235", "en10305", null, "there is no material E235; did you mean")]
    public void Says_what_can_not_be_chosen_from(string material, string list, string? shape, string expected)
    {
        string error = Chosen(material, [list], shape).Error();

        Assert.Contains(expected, error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("round")]
    [InlineData("square")]
    [InlineData("rect")]
    public void Offers_one_shape_of_a_list_where_one_is_asked_for(string shape) =>
        Assert.All(Chosen("S355", ["en10219"], shape).Model().Groups[0].Candidates, c => Assert.Equal(shape, c.Section.Shape));

    [Fact]
    public void Offers_all_shapes_of_a_list_where_none_is_asked_for() => Assert.Equal(
        ["rect", "round", "square"],
        Chosen("S355", ["en10219"], od: ("40 mm", "60.3 mm")).Model().Groups[0].Candidates.Select(c => c.Section.Shape).Distinct().Order(StringComparer.Ordinal));

    // Height along the top line, width across: each has a range of its own.
    [Fact]
    public void Takes_height_and_width_apart()
    {
        TubeGroup group = SpecBuilder.New()
            .Choose("main", "S355", ["en10219"], height: ("60 mm", "60 mm"), width: ("35 mm", "40 mm"))
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Tube("beam", "a", "b").Model().Groups[0];
        Assert.All(group.Candidates, c => Assert.StartsWith("rect 60 x 40 x ", c.Section.Name, StringComparison.Ordinal));
        Assert.NotEmpty(group.Candidates);
    }

    // Hot-finished corners, EN 10210-2: 1.5 T outside, 1.0 T inside; a name of its own, so that the cold-formed one is another size.
    [Fact]
    public void Hot_finished_tube_has_its_own_corners()
    {
        TubeGroup group = Chosen("S355", ["en10210"], "square", od: ("40 mm", "40 mm"), wall: ("3.2 mm", "3.2 mm")).Model().Groups[0];
        Assert.Equal("square 40 x 3.2 mm corner 4.8 mm inner 3.2 mm", Assert.Single(group.Candidates).Section.Name);
    }

    [Fact]
    public void Takes_flat_sided_sizes_of_the_specs_own_list()
    {
        TubeGroup group = Chosen("S235", ["yard"])
            .Stock("yard", ["S235"], null, null, new FlatSidedTube(60, 40, 2), new EllipseTube(45, 28, 1.5), new RoundTube(30, 2))
            .Model().Groups[0];
        Assert.Equal(["ellipse 45 x 28 x 1.5 mm", "round 30 x 2 mm", "rect 60 x 40 x 2 mm"], group.Candidates.Select(c => c.Section.Name));
    }

    [Fact]
    public void Refuses_a_range_that_ends_below_its_beginning()
    {
        string error = Chosen("E235+N", ["en10305"], od: ("40 mm", "25 mm")).Error();

        Assert.Contains("the range od 40 mm .. 25 mm ends below its beginning", error, StringComparison.Ordinal);
    }

    // EN 1999-1-1 Table 3.2b gives 6060-T66 these strengths up to 3 mm of wall.
    [Theory]
    [InlineData(3, 0)]
    [InlineData(4, 1)]
    public void Warns_of_a_wall_thicker_than_the_materials_strengths_hold_for(double wall, int warnings)
    {
        SpecBuilder spec = Fixed("6060-T66", new RoundTube(40, wall));
        spec.Model();

        Assert.Equal(warnings, spec.Said(Severity.Warning).Length);
    }

    [Theory]
    [InlineData("-0.1 mm")]
    [InlineData("2 mm")]
    public void Refuses_a_tolerance_that_makes_no_template(string tolerance)
    {
        string error = Fixed("S235", new RoundTube(30, 2)).Tolerance(tolerance).Error();

        Assert.StartsWith("fabrication: tolerance", error, StringComparison.Ordinal);
    }

    private static SpecBuilder Fixed(string material, Section section) => Beam(SpecBuilder.New().Fixed("main", material, section));

    private static SpecBuilder Chosen(
        string material, string[] lists, string? shape = null, (string?, string?)? od = null, (string?, string?)? wall = null) =>
        Beam(SpecBuilder.New().Choose("main", material, lists, shape, od, wall));

    private static SpecBuilder Beam(SpecBuilder spec) => spec.Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Tube("beam", "a", "b");
}
