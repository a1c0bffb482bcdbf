using System.Security.Cryptography;
using FrameGen.Mechanics.Sections;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Pins the groups of a spec to the sizes of the file beside it, and says where the two don't fit each other any more.</summary>
internal sealed class FrozenGroups(FrozenSpec frozen, StockTable stock, SpecValues values)
{
    private readonly string _file = Path.GetFileName(frozen.File.Path);

    /// <summary>The groups with their pinned sizes; null for one with an error.</summary>
    /// <param name="specs">The groups as the spec has them.</param>
    /// <param name="names">Of the groups.</param>
    /// <param name="groups">The groups as resolved from the spec; null for one with an error, of which nothing more is said.</param>
    /// <param name="used">Numbers of the groups that have tubes.</param>
    /// <param name="newOnesChoose">True where groups that have no pinned size may choose one; else that is an error.</param>
    public TubeGroup?[] Pin(
        IReadOnlyList<GroupSpec> specs, NameIndex names, IReadOnlyList<TubeGroup?> groups, IReadOnlySet<int?> used, bool newOnesChoose)
    {
        TubeGroup?[] pinned = [.. groups];
        var known = new bool[groups.Count];
        foreach (FrozenGroupSpec size in frozen.Groups)
        {
            if (names.Find(size.Name.Value) is not { } number)
            {
                values.Diagnostics.Warning(
                    size.Name.At,
                    $"the spec has no group {size.Name.Value} any more, and its frozen size is of no use; "
                    + "where the group has another name now, give it the same name here, else take it out");
                continue;
            }

            known[number] = true;
            pinned[number] = groups[number] is { } group ? Pin(size, group) : null;
        }

        for (int group = 0; group < pinned.Length && !newOnesChoose; group++)
        {
            if (!known[group] && used.Contains(group) && groups[group] is { IsFixed: false })
            {
                values.Diagnostics.Error(
                    specs[group].Name.At,
                    $"group {specs[group].Name.Value} has no size in {_file}; give it a section, or `framegen freeze --add` to choose one for it beside the "
                    + "sizes that are frozen");
            }
        }

        return pinned;
    }

    /// <summary>Where the sizes come from.</summary>
    /// <param name="spec">The spec today.</param>
    /// <param name="free">The frame without pinned sizes.</param>
    public FrozenSizes Describe(SourceFile spec, FrameModel free)
    {
        string name = Path.GetFileName(spec.Path);
        if (!string.Equals(frozen.Origin.Spec, name, StringComparison.Ordinal))
        {
            values.Diagnostics.Warning(
                frozen.Origin.At, $"these sizes were frozen for {frozen.Origin.Spec} and lie beside {name}; where they are its own, write its name here");
        }

        return new FrozenSizes(
            _file,
            Convert.ToHexStringLower(SHA256.HashData(frozen.File.Bytes.Span)),
            frozen.Origin.Tool,
            !string.Equals(frozen.Origin.Sha256, free.Spec.Sha256, StringComparison.Ordinal),
            [
                .. frozen.Stock
                    .Where(s => !string.Equals(stock.VersionOf(s.Name.Value), s.Version, StringComparison.Ordinal))
                    .Select(s => s.Name.Value),
            ],
            [.. frozen.Marks.Select(m => (m.Tube.Value, m.Mark))],
            free);
    }

    private TubeGroup? Pin(FrozenGroupSpec size, TubeGroup group)
    {
        if (!string.Equals(size.Material.Value, group.Material.Name, StringComparison.OrdinalIgnoreCase))
        {
            values.Diagnostics.Error(
                size.Material.At,
                $"group {group.Name} was frozen in {size.Material.Value}, and the spec has {group.Material.Name} now; set one of them right, or freeze "
                + "anew: framegen freeze --replace");
            return null;
        }

        Section section = size.Section.Value;
        Candidate? offered = group.Candidates.FirstOrDefault(c => string.Equals(c.Nominal.Name, section.Name, StringComparison.Ordinal));
        if (group.IsFixed && offered is null)
        {
            values.Diagnostics.Error(
                size.Section.At,
                $"group {group.Name} was frozen as {section.Name}, and the spec gives it {group.Candidates[0].Nominal.Name} now; set one of them right, "
                + "or freeze anew: framegen freeze --replace");
            return null;
        }

        if (offered is null)
        {
            values.Diagnostics.Warning(
                size.Section.At,
                $"group {group.Name}: {section.Name}, as frozen, is not among what the group chooses from today; it is used all the same");
        }

        return group with { Candidates = [offered ?? stock.Buy(section, group.Material)], IsFixed = true, IsFrozen = true };
    }
}
