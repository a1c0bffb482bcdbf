using FrameGen.Diagnostics;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>A cost can only be made least where every candidate has a price.</summary>
internal static class PriceCheck
{
    /// <summary>Reports the groups whose candidates lack a price, with the lists to write it in.</summary>
    public static void Run(SizingSpec sizing, IReadOnlyList<TubeGroup?> groups, int?[] groupOfTube, DiagnosticList diagnostics)
    {
        if (sizing.Objective != SizingObjective.Cost)
        {
            return;
        }

        for (int g = 0; g < groups.Count; g++)
        {
            if (groups[g] is not { } group || !groupOfTube.Contains(g))
            {
                continue;
            }

            List<Candidate> without = [.. group.Candidates.Where(c => c.PricePerMetre is null)];
            if (without.Count > 0)
            {
                string[] lists = [.. without.Select(c => c.StockList).Where(l => l.Length > 0).Distinct(StringComparer.Ordinal)];
                string where = lists.Length > 0 ? $" in {string.Join(", ", lists)}" : "";
                diagnostics.Error(
                    sizing.At,
                    $"objective: cost needs the price of every candidate, and {without.Count} of {group.Candidates.Count} of group {group.Name}{where} have none "
                    + $"(the first: {without[0].Section.Name}); give them in a list of your own with price_per_m, as in stock: {{mine: {{material: [{group.Material.Name}], "
                    + $"price_per_m: 4.2, sizes: [{without[0].Section.Name}]}}}}");
            }
        }
    }
}
