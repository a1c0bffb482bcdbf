using FrameGen.Mechanics.Sections;
using FrameGen.Spec.Forms;
using static FrameGen.Spec.Keys.CommonForms;

namespace FrameGen.Spec.Keys;

/// <summary>The keys of a file of pinned sizes.</summary>
internal static class FrozenKeys
{
    private static readonly Key<string> SpecName =
        new("spec", Text, "the spec's file", "quayside-trailer.yaml") { IsRequired = true };

    private static readonly Key<string> Sha256 = new("sha256", Text, "of the spec when it was frozen", "9f86d081884c7d65") { IsRequired = true };

    private static readonly Key<string> Tool = new("tool", Text, "what froze it", "FrameGen 0.1.0") { IsRequired = true };

    /// <summary>Where the sizes come from.</summary>
    public static readonly Key<FrozenOriginSpec> Freezes = new(
        "freezes",
        new MapForm<FrozenOriginSpec>(
            "what was frozen",
            [SpecName, Sha256, Tool],
            map => new FrozenOriginSpec(map.Get(SpecName), map.Get(Sha256), map.Get(Tool), map.At)),
        "what was frozen, and by what",
        "{spec: stand.yaml, sha256: 9f86d081884c7d65, tool: FrameGen 0.1.0}")
    {
        IsRequired = true,
    };

    /// <summary>The lists that the sizes came from.</summary>
    public static readonly Key<IReadOnlyList<FrozenStockSpec>> Stock = new(
        "stock",
        new NamedForm<FrozenStockSpec>(
            "stock list", StockName, new OwnedForm<string, FrozenStockSpec>(Text, (name, version) => new FrozenStockSpec(name, version))),
        "the stock lists of that time, each with what its contents are known by",
        "{en10305: 9f86d081884c}");

    private static readonly Key<Placed<string>> Material = new("material", MaterialName, "of all its tubes", "E235+N") { IsRequired = true };

    private static readonly Key<Placed<Section>> Size = new("section", SectionSize, "its size", "round 28 x 2 mm") { IsRequired = true };

    private static readonly Key<Placed<string>> From = new("stock", StockName, "the list it came from", "en10305");

    /// <summary>The sizes.</summary>
    public static readonly Key<IReadOnlyList<FrozenGroupSpec>> Groups = new(
        "groups",
        new NamedForm<FrozenGroupSpec>(
            "group",
            GroupName,
            new MapForm<FrozenGroupSpec>(
                "a pinned size",
                [Material, Size, From],
                map => new FrozenGroupSpec(map.Owner, map.Get(Material), map.Get(Size), map.Find(From))),
            least: 1),
        "the size of each group",
        "{rails: {material: E235+N, section: round 30 x 2 mm, stock: en10305}}")
    {
        IsRequired = true,
    };

    /// <summary>The parts of that time.</summary>
    public static readonly Key<IReadOnlyList<FrozenMarkSpec>> Marks = new(
        "marks",
        new NamedForm<FrozenMarkSpec>(
            "tube", TubeName, new OwnedForm<string, FrozenMarkSpec>(Text, (tube, mark) => new FrozenMarkSpec(tube, mark))),
        "the mark of the part that each tube was",
        "{rail-l: rails-1200kt}");

    /// <summary>A file of pinned sizes.</summary>
    public static readonly MapForm<MapReading> File = new("a file of pinned sizes", [FileKeys.FrameGen, Freezes, Stock, Groups, Marks], map => map);
}
