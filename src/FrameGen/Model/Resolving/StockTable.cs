using FrameGen.Diagnostics;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Spec;
using FrameGen.Stock;

namespace FrameGen.Model.Resolving;

/// <summary>The stock lists a spec can name: its own, which win, and the built-in ones, read only when asked for.</summary>
internal sealed class StockTable
{
    /// <summary>Bar of a size that no list holds, mm.</summary>
    public const double UsualBar = 6000;

    private readonly List<StockList> _written = [];
    private readonly DiagnosticList _diagnostics;

    /// <summary>Evaluates the spec's lists.</summary>
    public StockTable(IReadOnlyList<StockListSpec> specs, MaterialTable materials, SpecValues values)
    {
        _diagnostics = values.Diagnostics;
        foreach (StockListSpec spec in specs)
        {
            string name = spec.Name.Value;
            string whose = $"stock {name}";
            if (FindWritten(name) is not null)
            {
                _diagnostics.Error(spec.Name.At, $"{whose} is written twice; keep one of them");
                continue;
            }

            if (StockCatalogue.Find(name) is { } builtIn)
            {
                _diagnostics.Note(spec.Name.At, $"stock list {builtIn.Name} of this spec is used in place of the built-in one");
            }

            foreach (Placed<string> material in spec.Materials.Where(m => !materials.Knows(m.Value)))
            {
                materials.SayUnknown(material, whose);
            }

            _written.Add(Evaluate(spec, whose, values));
        }
    }

    /// <summary>The list of a name; null after an error.</summary>
    public StockList? Find(Placed<string> name, string whose)
    {
        StockList? list = FindWritten(name.Value) ?? StockCatalogue.Find(name.Value);
        if (list is null)
        {
            string[] known = [.. _written.Select(l => l.Name), .. StockCatalogue.Names];
            _diagnostics.Error(
                name.At, $"{whose}: there is no stock list {name.Value}{NameIndex.Suggestion(name.Value, known, "a list of your own goes under stock")}");
        }

        return list;
    }

    /// <summary>What a list's contents are known by; null where there is no such list.</summary>
    public string? VersionOf(string name) => (FindWritten(name) ?? StockCatalogue.Find(name))?.Version();

    /// <summary>True for a list that the spec writes out.</summary>
    public bool IsWritten(StockList list) => _written.Contains(list);

    /// <summary>The lists that are sold in a material: the spec's own first.</summary>
    public IEnumerable<StockList> SoldIn(string material) =>
        _written.Where(l => l.IsSoldIn(material))
            .Concat(StockCatalogue.NamesSoldIn(material).Where(n => FindWritten(n) is null).Select(n => StockCatalogue.Find(n)!));

    /// <summary>A section of the spec as it can be bought: from the cheapest list that holds it in that material.</summary>
    public Candidate Buy(Section section, Material material)
    {
        Candidate? best = null;
        foreach (StockList list in SoldIn(material.Name))
        {
            StockSize? size = list.Sizes.FirstOrDefault(s => string.Equals(s.Section.Name, section.Name, StringComparison.Ordinal));
            if (size is not null && (best is null || IsCheaper(size.PricePerMetre, best.PricePerMetre)))
            {
                best = new Candidate(section, list.Name, size.BarLength, size.PricePerMetre);
            }
        }

        return best ?? new Candidate(section, string.Empty, UsualBar, PricePerMetre: null);
    }

    /// <summary>True where one price is below another; a known price is cheaper than none.</summary>
    public static bool IsCheaper(double? price, double? than) => price is { } p && (than is not { } other || p < other);

    private static StockList Evaluate(StockListSpec spec, string whose, SpecValues values)
    {
        double bar = spec.Bar is null ? UsualBar : values.Positive(spec.Bar, $"{whose}: bar") ?? UsualBar;
        if (spec.PricePerMetre is { } price && !(price >= 0 && double.IsFinite(price)))
        {
            values.Diagnostics.Error(spec.Name.At, $"{whose}: price_per_m must not be negative, and is {price:G9}");
        }

        if (spec.Sizes.Count == 0)
        {
            values.Diagnostics.Error(spec.Name.At, $"{whose} holds no sizes; write for example sizes: [round 25 x 1.5 mm]");
        }

        if (spec.Materials.Count == 0)
        {
            values.Diagnostics.Error(spec.Name.At, $"{whose} is sold in no material; write for example material: [S235]");
        }

        var seen = new HashSet<string>(StringComparer.Ordinal);
        StockSize[] sizes =
        [
            .. spec.Sizes.Where(s => seen.Add(s.Value.Name)).Select(s => new StockSize(s.Value, bar, spec.PricePerMetre)),
        ];
        return new StockList(spec.Name.Value, [.. spec.Materials.Select(m => m.Value)], sizes);
    }

    private StockList? FindWritten(string name) =>
        _written.Find(l => string.Equals(l.Name, name, StringComparison.OrdinalIgnoreCase));
}
