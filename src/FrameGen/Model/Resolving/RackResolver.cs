using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Gives the tubes on the rack their materials and lengths.</summary>
internal static class RackResolver
{
    /// <summary>All tubes on the rack; those with an error are left out.</summary>
    public static IReadOnlyList<RackTube> Resolve(IReadOnlyList<RackSpec> specs, MaterialTable materials, SpecValues values)
    {
        var rack = new List<RackTube>();
        foreach (RackSpec spec in specs)
        {
            string? material = materials.Find(spec.Material, "have")?.Name;
            double?[] lengths = [.. spec.Lengths.Select(length => values.Positive(length, "have: a length"))];
            if (material is not null && lengths.All(l => l is not null))
            {
                rack.Add(new RackTube(spec.Section.Value, material, [.. lengths.Select(l => l!.Value)], spec.At));
            }
        }

        return rack;
    }
}
