using FrameGen.Mechanics.Sections;

namespace FrameGen.Stock;

/// <summary>Sizes that can be bought in some materials.</summary>
/// <param name="Name">As written in specs.</param>
/// <param name="Materials">Names of the materials it is sold in.</param>
/// <param name="Sizes">One a section; of two rows with one section the first stands.</param>
public sealed record StockList(string Name, IReadOnlyList<string> Materials, IReadOnlyList<StockSize> Sizes)
{
    /// <summary>True where the list is sold in the material; names are compared without regard to case.</summary>
    public bool IsSoldIn(string material) => Materials.Contains(material, StringComparer.OrdinalIgnoreCase);
}

/// <summary>A size in a stock list.</summary>
/// <param name="Section">The section.</param>
/// <param name="BarLength">Usual bar, mm.</param>
/// <param name="PricePerMetre">In the shop's own money; null where unknown.</param>
public sealed record StockSize(Section Section, double BarLength, double? PricePerMetre);
