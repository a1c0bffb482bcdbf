using FrameGen.Diagnostics;
using FrameGen.Mechanics.Materials;
using FrameGen.Model;
using FrameGen.Model.Resolving;
using FrameGen.Spec;

namespace FrameGen.Comparison;

/// <summary>The metals and sizes that can be had: the built-in ones, and those of a spec.</summary>
public sealed class Supply
{
    private readonly MaterialTable _materials;
    private readonly StockTable _stock;
    private readonly DiagnosticList _diagnostics = [];

    private Supply(FrameSpec? spec)
    {
        // What is wrong with a spec has been said by whoever resolved it.
        var values = new SpecValues(ParameterTable.Evaluate(spec?.Parameters ?? [], _diagnostics), _diagnostics);
        _materials = new MaterialTable(spec?.Materials ?? [], values);
        _stock = new StockTable(spec?.Stock ?? [], _materials, values);
    }

    /// <summary>The built-in metals and lists, and those of a spec that has no errors.</summary>
    public static Supply Of(FrameSpec? spec) => new(spec);

    /// <summary>The metal of a name.</summary>
    /// <param name="name">Compared without regard to case.</param>
    /// <param name="error">What to tell where there is none.</param>
    public Material? Material(string name, out string error)
    {
        Material? material = _materials.Find(new Placed<string>(name, new SourcePlace(string.Empty, 1, 1)), "compare");
        error = material is null ? _diagnostics.Last(d => d.Severity == Severity.Error).Message : string.Empty;
        return material;
    }

    /// <summary>Sizes that could stand in for one: of its shape, from the list that it comes from; empty where it comes from none.</summary>
    public IReadOnlyList<Candidate> InPlaceOf(Candidate candidate, Material material) =>
    [
        .. _stock.SoldIn(material.Name)
            .Where(list => string.Equals(list.Name, candidate.StockList, StringComparison.Ordinal))
            .SelectMany(list => list.Sizes)
            .Where(size => string.Equals(size.Section.Shape, candidate.Nominal.Shape, StringComparison.Ordinal))
            .Select(size => new Candidate(size.Section, candidate.StockList, size.BarLength, size.PricePerMetre)),
    ];

    /// <summary>The lightest size of a shape that is stiff enough, with a wall no thinner than a rule has it; of equal ones the cheaper, then the first by name.</summary>
    /// <returns>Null where no list has one.</returns>
    public StockMatch? Lightest(ComparedShape shape, Material material, StiffnessNeed need, WallRule walls)
    {
        if (shape.StockShape is not { } word)
        {
            return null;
        }

        return _stock.SoldIn(material.Name)
            .SelectMany(list => list.Sizes.Select(size => (List: list.Name, Size: size, Profile: Profile.Of(size.Section))))
            .Where(s => string.Equals(s.Size.Section.Shape, word, StringComparison.Ordinal)
                && need.ShareOf(s.Profile, material) >= 1 - 1e-9
                && walls.Allows(s.Profile))
            .OrderBy(s => Math.Round(s.Profile.Area, 9))
            .ThenBy(s => s.Size.PricePerMetre ?? double.PositiveInfinity)
            .ThenBy(s => s.Size.Section.Name, StringComparer.Ordinal)
            .Select(s => new StockMatch(s.Size.Section, s.List, s.Size.Section.MassPerMetre(material.Density), s.Size.PricePerMetre))
            .FirstOrDefault();
    }
}
