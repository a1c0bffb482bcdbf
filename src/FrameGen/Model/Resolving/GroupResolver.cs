using FrameGen.Diagnostics;
using FrameGen.Mechanics.Materials;
using FrameGen.Spec;
using FrameGen.Stock;

namespace FrameGen.Model.Resolving;

/// <summary>Gives groups their materials and candidates.</summary>
internal static class GroupResolver
{
    /// <summary>All groups by number; null for one with an error.</summary>
    public static TubeGroup?[] Resolve(IReadOnlyList<GroupSpec> specs, MaterialTable materials, StockTable stock, SpecValues values)
    {
        var lister = new CandidateList(stock, values);
        return [.. specs.Select(spec => Resolve(spec, materials, stock, lister, values.Diagnostics))];
    }

    private static TubeGroup? Resolve(
        GroupSpec spec, MaterialTable materials, StockTable stock, CandidateList lister, DiagnosticList diagnostics)
    {
        string whose = $"group {spec.Name.Value}";
        if (spec.Section is null == spec.Choose is null)
        {
            diagnostics.Error(spec.Name.At, $"{whose} takes either section, for a fixed size, or choose, from stock");
            return null;
        }

        Material? material = materials.Find(spec.Material, whose);
        IReadOnlyList<BeyondRange> beyond = [];
        IReadOnlyList<Candidate>? candidates = spec.Choose is null
            ? material is null ? null : [stock.Buy(spec.Section!.Value, material)]
            : lister.Of(spec.Choose, material, whose, out beyond);
        if (material is null || candidates is null)
        {
            return null;
        }

        WarnOfThickWalls(spec, material, candidates, diagnostics);
        return new TubeGroup(spec.Name.Value, material, candidates, spec.Choose is null, spec.Choose, spec.Welded, spec.Name.At) { Beyond = beyond };
    }

    private static void WarnOfThickWalls(
        GroupSpec spec, Material material, IReadOnlyList<Candidate> candidates, DiagnosticList diagnostics)
    {
        if (BuiltInMaterials.MaxWall(material) is { } limit
            && candidates.FirstOrDefault(c => c.Section.Wall > limit + Lengths.Same) is { } thick)
        {
            diagnostics.Warning(
                spec.Name.At,
                $"group {spec.Name.Value}: the built-in strengths of {material.Name} hold for walls up to {limit:0.###} mm, and {thick.Section.Name} "
                + "is thicker; give the material's values for it under materials, or limit the wall");
        }
    }
}
