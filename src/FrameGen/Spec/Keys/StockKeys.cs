using FrameGen.Mechanics.Sections;
using FrameGen.Spec.Forms;
using FrameGen.Spec.Quantities;
using static FrameGen.Spec.Keys.CommonForms;

namespace FrameGen.Spec.Keys;

/// <summary>Groups, materials, stock lists, the rack, and how sizes are chosen.</summary>
internal static class StockKeys
{
    private static readonly Key<IReadOnlyList<Placed<string>>> Lists =
        new("stock", OneOrMore("stock lists", StockName), "the lists to choose from", "en10305") { IsRequired = true };

    private static readonly Key<Placed<string>> Shape = new("shape", new ShapeForm(), "only this shape", "round");

    private static readonly Key<RangeSpec> Od = new("od", LengthRange, "outside diameter, or the larger outer size", "25 mm .. 40 mm");

    private static readonly Key<RangeSpec> Height = new("height", LengthRange, "outer size along the top line", ".. 60 mm");

    private static readonly Key<RangeSpec> Width = new("width", LengthRange, "outer size across", ".. 40 mm");

    private static readonly Key<RangeSpec> Wall = new("wall", LengthRange, "wall thickness", "1.5 mm ..");

    private static readonly MapForm<ChooseSpec> ChooseForm = new(
        "a choice from stock",
        [Lists, Shape, Od, Height, Width, Wall],
        map => new ChooseSpec(
            map.Get(Lists), map.Find(Shape), map.Find(Od), map.Find(Height), map.Find(Width), map.Find(Wall), map.At));

    private static readonly Key<Placed<string>> GroupMaterial =
        new("material", MaterialName, "of all its tubes", "E235+N") { IsRequired = true };

    private static readonly Key<Placed<Section>> FixedSection = new("section", SectionSize, "the section, fixed", "round 28 x 2 mm");

    private static readonly Key<ChooseSpec> Choose =
        new("choose", ChooseForm, "what the section is chosen from", "{stock: en10305, od: 25 mm .. 40 mm}");

    private static readonly Key<bool> Welded = new("welded", Flag, "false for tubes joined without heat", "false");

    /// <summary>All groups.</summary>
    public static readonly NamedForm<GroupSpec> Groups = new(
        "group",
        GroupName,
        new MapForm<GroupSpec>(
            "a group",
            [GroupMaterial, FixedSection, Choose, Welded],
            map => new GroupSpec(
                map.Owner, map.Get(GroupMaterial), map.Find(FixedSection), map.Find(Choose), map.FindValue(Welded) ?? true),
            map => map.ExactlyOne(FixedSection, Choose)),
        least: 1);

    private static readonly Key<SpecQuantity> E =
        new("E", Positive(QuantityKind.Stress), "Young's modulus", "210 GPa") { IsRequired = true };

    private static readonly Key<SpecQuantity> G = new("G", Positive(QuantityKind.Stress), "shear modulus", "81 GPa");

    private static readonly Key<SpecQuantity> Poisson = new(
        "poisson",
        new QuantityForm(new ValueRange(-1, 0.5, true, "between -1 and 0.5"), QuantityKind.Number),
        "Poisson's ratio, instead of G",
        "0.3");

    private static readonly Key<SpecQuantity> Density =
        new("density", Positive(QuantityKind.Density), "mass per volume", "7.85 g/cm3") { IsRequired = true };

    private static readonly Key<SpecQuantity> Yield = new("yield", Positive(QuantityKind.Stress), "yield or proof strength", "235 MPa");

    private static readonly Key<SpecQuantity> Ultimate = new("ultimate", Positive(QuantityKind.Stress), "tensile strength", "340 MPa");

    private static readonly Key<SpecQuantity> YieldWelded =
        new("yield_welded", Positive(QuantityKind.Stress), "yield strength within reach of a weld", "235 MPa");

    /// <summary>Materials of the spec.</summary>
    public static readonly NamedForm<MaterialSpec> Materials = new(
        "material",
        MaterialName,
        new MapForm<MaterialSpec>(
            "a material",
            [E, G, Poisson, Density, Yield, Ultimate, YieldWelded],
            map => new MaterialSpec(
                map.Owner,
                map.Get(E),
                map.Find(G),
                map.Find(Poisson),
                map.Get(Density),
                map.Find(Yield),
                map.Find(Ultimate),
                map.Find(YieldWelded)),
            map => map.ExactlyOne(G, Poisson)));

    private static readonly Key<IReadOnlyList<Placed<string>>> StockMaterial =
        new("material", OneOrMore("materials", MaterialName), "what it is sold in", "[S235]") { IsRequired = true };

    private static readonly Key<SpecQuantity> Bar = new("bar", Positive(QuantityKind.Length), "length of a bar", "6000 mm");

    private static readonly Key<double> PricePerMetre =
        new("price_per_m", new PlainNumberForm("a price per metre such as 4.2", isWhole: false), "price of a metre, in your own money", "4.2");

    private static readonly Key<IReadOnlyList<Placed<Section>>> Sizes =
        new("sizes", new ListForm<Placed<Section>>("sections", SectionSize, 1), "the sections sold", "[round 25 x 1.5 mm]") { IsRequired = true };

    /// <summary>Stock lists of the spec.</summary>
    public static readonly NamedForm<StockListSpec> Stock = new(
        "stock list",
        StockName,
        new MapForm<StockListSpec>(
            "a stock list",
            [StockMaterial, Bar, PricePerMetre, Sizes],
            map => new StockListSpec(
                map.Owner, map.Get(StockMaterial), map.Find(Bar), map.FindValue(PricePerMetre), map.Get(Sizes))));

    private static readonly Key<Placed<Section>> RackSection = new("section", SectionSize, "its section", "round 28 x 2 mm") { IsRequired = true };

    private static readonly Key<Placed<string>> RackMaterial = new("material", MaterialName, "its material", "E235+N") { IsRequired = true };

    private static readonly Key<IReadOnlyList<SpecQuantity>> RackLengths = new(
        "lengths",
        new ListForm<SpecQuantity>("lengths", Positive(QuantityKind.Length), 1),
        "of the pieces on the rack",
        "[1850 mm, 920 mm]")
    {
        IsRequired = true,
    };

    /// <summary>Tubes on the rack.</summary>
    public static readonly ListForm<RackSpec> Have = new(
        "tubes on the rack",
        new MapForm<RackSpec>(
            "a tube on the rack",
            [RackSection, RackMaterial, RackLengths],
            map => new RackSpec(map.Get(RackSection), map.Get(RackMaterial), map.Get(RackLengths), map.At)));

    private static readonly Key<SpecQuantity> MeasuredOd = new("od", Positive(QuantityKind.Length), "outside diameter as measured", "38.06 mm");

    private static readonly Key<SpecQuantity> MeasuredHeight = new("height", Positive(QuantityKind.Length), "height as measured", "60.1 mm");

    private static readonly Key<SpecQuantity> MeasuredWidth = new("width", Positive(QuantityKind.Length), "width as measured", "40.1 mm");

    private static readonly Key<SpecQuantity> MeasuredWall = new("wall", Positive(QuantityKind.Length), "wall as measured", "1.47 mm");

    /// <summary>Sizes of the tubes in hand.</summary>
    public static readonly NamedForm<MeasuredSpec> Measured = new(
        "measured group",
        GroupName,
        new MapForm<MeasuredSpec>(
            "a measured size",
            [MeasuredOd, MeasuredHeight, MeasuredWidth, MeasuredWall],
            map => new MeasuredSpec(
                map.Owner, map.Find(MeasuredOd), map.Find(MeasuredHeight), map.Find(MeasuredWidth), map.Find(MeasuredWall)),
            map => map.AtLeastOne(MeasuredOd, MeasuredHeight, MeasuredWidth, MeasuredWall)));

    private static readonly Key<SizingObjective> Objective = new(
        "objective",
        new WordForm<SizingObjective>([("mass", SizingObjective.Mass), ("cost", SizingObjective.Cost)]),
        "what is made least",
        "mass");

    private static readonly Key<double> DifferentSizes = new(
        "different_sizes",
        new PlainNumberForm("a whole number such as 3", isWhole: true),
        "at most so many different tubes to buy",
        "3");

    /// <summary>How sizes are chosen.</summary>
    public static readonly MapForm<SizingSpec> Sizing = new(
        "sizing",
        [Objective, DifferentSizes],
        map => new SizingSpec(
            map.FindValue(Objective) ?? SizingObjective.Mass,
            map.FindValue(DifferentSizes) is { } most ? (int)Math.Min(most, int.MaxValue) : null,
            map.Owner.At));
}
