using System.Globalization;
using System.Security.Cryptography;
using System.Text;
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

    /// <summary>What the list's contents are known by: changes with any material, size, bar or price.</summary>
    public string Version()
    {
        const int Characters = 12;
        var text = new StringBuilder().AppendJoin(' ', Materials).Append('\n');
        foreach (StockSize size in Sizes)
        {
            text.Append(CultureInfo.InvariantCulture, $"{size.Section.Name} {size.BarLength:R} {size.PricePerMetre:R}\n");
        }

        return Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text.ToString())))[..Characters];
    }
}

/// <summary>A size in a stock list.</summary>
/// <param name="Section">The section.</param>
/// <param name="BarLength">Usual bar, mm.</param>
/// <param name="PricePerMetre">In the shop's own money; null where unknown.</param>
public sealed record StockSize(Section Section, double BarLength, double? PricePerMetre);
