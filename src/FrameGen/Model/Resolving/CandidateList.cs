using FrameGen.Diagnostics;
using FrameGen.Mechanics.Materials;
using FrameGen.Spec;
using FrameGen.Stock;

namespace FrameGen.Model.Resolving;

/// <summary>Lists what a group may choose from.</summary>
internal sealed class CandidateList(StockTable stock, SpecValues values)
{
    private const int NearestShown = 3;

    private DiagnosticList Diagnostics => values.Diagnostics;

    /// <summary>The candidates by mass per metre, then by name; null after an error.</summary>
    /// <param name="choose">What the spec lets it choose from.</param>
    /// <param name="material">The group's material; null where that was an error.</param>
    /// <param name="whose"><c>group rails</c>.</param>
    /// <param name="beyond">Sizes that one range alone keeps out, in the same order.</param>
    public IReadOnlyList<Candidate>? Of(ChooseSpec choose, Material? material, string whose, out IReadOnlyList<BeyondRange> beyond)
    {
        beyond = [];
        bool isSound = true;
        SizeLimits? limits = SizeLimits.Of(choose, whose, values);
        var lists = new List<StockList>();
        foreach (Placed<string> name in choose.Lists)
        {
            if (stock.Find(name, whose) is { } list && IsUsable(list, name, material, whose))
            {
                lists.Add(list);
            }
            else
            {
                isSound = false;
            }
        }

        if (!isSound || limits is null || material is null || lists.Count == 0)
        {
            return null;
        }

        List<Candidate> offered = Offered(lists, choose.Shape?.Value);
        Candidate[] within = [.. offered.Where(c => !(limits.Miss(c.Section) > 0))];
        if (within.Length == 0)
        {
            SayNoneLeft(choose, lists, offered, limits, whose);
            return null;
        }

        // One material a group: by area is by mass per metre.
        beyond =
        [
            .. offered.OrderBy(c => c.Section.Area).ThenBy(c => c.Section.Name, StringComparer.Ordinal)
                .Select(c => limits.OnlyMiss(c.Section) is { } miss ? new BeyondRange(c, miss.Key, miss.Size, miss.By) : null).OfType<BeyondRange>(),
        ];
        return [.. within.OrderBy(c => c.Section.Area).ThenBy(c => c.Section.Name, StringComparer.Ordinal)];
    }

    private bool IsUsable(StockList list, Placed<string> name, Material? material, string whose)
    {
        // An empty list of the spec was an error already.
        if (list.Sizes.Count == 0)
        {
            return false;
        }

        if (material is null || list.IsSoldIn(material.Name))
        {
            return true;
        }

        bool isOwnMaterial = BuiltInMaterials.Find(material.Name) is null;
        string others = string.Join(", ", stock.SoldIn(material.Name).Select(l => l.Name));
        string advice = others.Length > 0
            ? $"{material.Name} is sold in: {others}"
            : $"no list holds {material.Name}; write one of your own: stock: {{my-list: {{material: [{material.Name}], sizes: [...]}}}}";
        Diagnostics.Error(
            name.At,
            isOwnMaterial && !stock.IsWritten(list)
                ? $"{whose}: {material.Name} is a material of this spec, and the built-in list {list.Name} is sold in "
                    + $"{string.Join(", ", list.Materials)} only; {advice}"
                : $"{whose}: {list.Name} is not sold in {material.Name} but in {string.Join(", ", list.Materials)}; {advice}");
        return false;
    }

    // One candidate a section: of two lists that hold it, the one with the cheaper price, else the first named.
    private static List<Candidate> Offered(List<StockList> lists, string? shape)
    {
        var places = new Dictionary<string, int>(StringComparer.Ordinal);
        var offered = new List<Candidate>();
        foreach (StockList list in lists)
        {
            foreach (StockSize size in list.Sizes.Where(s => shape is null || string.Equals(s.Section.Shape, shape, StringComparison.Ordinal)))
            {
                var candidate = new Candidate(size.Section, list.Name, size.BarLength, size.PricePerMetre);
                if (places.TryAdd(size.Section.Name, offered.Count))
                {
                    offered.Add(candidate);
                }
                else if (StockTable.IsCheaper(candidate.PricePerMetre, offered[places[size.Section.Name]].PricePerMetre))
                {
                    offered[places[size.Section.Name]] = candidate;
                }
            }
        }

        return offered;
    }

    private void SayNoneLeft(ChooseSpec choose, List<StockList> lists, List<Candidate> offered, SizeLimits limits, string whose)
    {
        string names = string.Join(", ", lists.Select(l => l.Name));
        if (offered.Count == 0)
        {
            Diagnostics.Error(choose.At, $"{whose}: {names} holds no {choose.Shape?.Value} sizes; choose another list or shape");
            return;
        }

        IEnumerable<string> nearest = offered
            .Select(c => c.Section)
            .OrderBy(limits.Miss)
            .ThenBy(s => s.Area)
            .ThenBy(s => s.Name, StringComparer.Ordinal)
            .Take(NearestShown)
            .Select(s => s.Name);
        Diagnostics.Error(
            choose.At, $"{whose}: {names} holds nothing with {limits.Text}; nearest: {string.Join(", ", nearest)}; widen a range or add a list");
    }
}
