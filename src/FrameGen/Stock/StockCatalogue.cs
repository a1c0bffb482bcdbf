using System.Globalization;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Stock;

/// <summary>The built-in stock lists. Sizes and their sources: <c>Stock/Data/README.md</c>.</summary>
public static class StockCatalogue
{
    private static readonly string[] StructuralSteels = ["S235", "S275", "S355"];

    private static readonly BuiltInList[] Lists =
    [
        new("en10305", "en10305_precision.csv", ["EN 10305-1", "EN 10305-2", "EN 10305-3"], ["E235+N", "E235+SR", "E355+N", "E355+SR"]),
        new("en10305-square", "en10305_precision.csv", ["EN 10305-5"], ["E235+N", "E235+SR", "E355+N", "E355+SR"]),
        new("en10219", "en10219_en10210_hollow.csv", ["EN 10219-2"], StructuralSteels),
        new("en10210", "en10219_en10210_hollow.csv", ["EN 10210-2"], StructuralSteels),
        new("iso4200", "iso4200_pipe.csv", ["ISO 4200 / EN 10220"], StructuralSteels),
        new("nps40", "iso4200_pipe.csv", ["ASME B36.10M"], StructuralSteels),
        new("aircraft-4130", "4130_aircraft.csv", ["AMS-T-6736 (4130 N)"], ["4130-N"]),
        new("wwt700-6061", "aluminium.csv", ["WW-T-700/6 (6061-T6 drawn)"], ["6061-T6"]),
        new("en755", "aluminium.csv", ["EN 755-7 (6060/6082 extruded)", "EN 755-8 (6060/6082 extruded)"], ["6060-T66", "6082-T6", "6005A-T6"]),
        new("en1127", "stainless.csv", ["EN ISO 1127 (1.4301)"], ["1.4301"]),
        new("stainless-square", "stainless.csv", ["EN 10219-2 sizes in 1.4301 (EN 10296-2)"], ["1.4301"]),
    ];

    /// <summary>Names of all built-in lists.</summary>
    public static IReadOnlyList<string> Names { get; } = [.. Lists.Select(l => l.Name)];

    /// <summary>The list of a name, read when it is first asked for; null where there is none.</summary>
    /// <param name="name">Compared without regard to case.</param>
    public static StockList? Find(string name) =>
        Array.Find(Lists, l => string.Equals(l.Name, name, StringComparison.OrdinalIgnoreCase))?.Content;

    /// <summary>Names of the lists sold in a material.</summary>
    /// <param name="material">Name of a built-in material; compared without regard to case.</param>
    public static IEnumerable<string> NamesSoldIn(string material) =>
        Lists.Where(l => l.Materials.Contains(material, StringComparer.OrdinalIgnoreCase)).Select(l => l.Name);

    // Rows of the standards, in the file's order; of two rows with one section the first stands.
    private static StockList Read(BuiltInList list)
    {
        var sizes = new List<StockSize>();
        var seen = new HashSet<string>(StringComparer.Ordinal);
        foreach (string[] row in Rows(list.File).Where(r => list.Standards.Contains(r[6], StringComparer.Ordinal)))
        {
            Section section = SectionOf(row);
            if (seen.Add(section.Name))
            {
                sizes.Add(new StockSize(section, Number(row[5]), PricePerMetre: null));
            }
        }

        return new StockList(list.Name, list.Materials, sizes);
    }

    private static Section SectionOf(string[] row)
    {
        double size = Number(row[1]);
        double wall = Number(row[3]);
        if (string.Equals(row[0], "CHS", StringComparison.Ordinal))
        {
            return new RoundTube(size, wall);
        }

        double width = Number(row[2]);
        if (row[4].Length == 0)
        {
            return new FlatSidedTube(size, width, wall);
        }

        // The corners of hot-finished tube do not share a centre: EN 10210-2 calculates with 1.5 T outside and 1.0 T inside.
        double corner = Number(row[4]);
        return string.Equals(row[6], "EN 10210-2", StringComparison.Ordinal)
            ? new FlatSidedTube(size, width, wall, corner, wall)
            : new FlatSidedTube(size, width, wall, corner);
    }

    // Columns: shape, outer size, width, wall, corner radius, bar length, standard, note. Only the note is ever quoted.
    private static IEnumerable<string[]> Rows(string file)
    {
        using Stream stream = typeof(StockCatalogue).Assembly.GetManifestResourceStream($"stock/{file}")
            ?? throw new InvalidOperationException($"The stock file {file} is not embedded.");
        using var reader = new StreamReader(stream);
        reader.ReadLine();
        while (reader.ReadLine() is { } line)
        {
            if (line.Length > 0)
            {
                yield return line.Split(',', 8);
            }
        }
    }

    private static double Number(string text) => double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);

    private sealed record BuiltInList(string Name, string File, string[] Standards, string[] Materials)
    {
        private readonly Lock _reading = new();
        private StockList? _content;

        public StockList Content
        {
            get
            {
                lock (_reading)
                {
                    return _content ??= Read(this);
                }
            }
        }
    }
}
