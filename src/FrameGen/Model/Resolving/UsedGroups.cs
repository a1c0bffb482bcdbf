namespace FrameGen.Model.Resolving;

/// <summary>The groups that have tubes, renumbered: a model holds no others, so that sizing has no sections to choose for nothing.</summary>
internal sealed class UsedGroups
{
    private readonly int?[] _numbers;
    private readonly int?[] _groupOfTube;

    private UsedGroups(IReadOnlyList<TubeGroup> groups, int?[] numbers, int?[] groupOfTube) =>
        (Groups, _numbers, _groupOfTube) = (groups, numbers, groupOfTube);

    /// <summary>The groups in the spec's order.</summary>
    public IReadOnlyList<TubeGroup> Groups { get; }

    /// <summary>Leaves out the groups without tubes. There must be no errors left.</summary>
    public static UsedGroups Of(TubeGroup?[] groups, int?[] groupOfTube)
    {
        var used = new HashSet<int?>(groupOfTube);
        var kept = new List<TubeGroup>();
        var numbers = new int?[groups.Length];
        for (int group = 0; group < groups.Length; group++)
        {
            if (used.Contains(group))
            {
                numbers[group] = kept.Count;
                kept.Add(groups[group]!);
            }
        }

        return new UsedGroups(kept, numbers, groupOfTube);
    }

    /// <summary>Number of a tube's group.</summary>
    public int OfTube(int tube) => _numbers[_groupOfTube[tube]!.Value]!.Value;

    /// <summary>The target with its groups' new numbers.</summary>
    public Target Renumber(Target target) =>
        target is StrengthTarget strength ? strength with { Groups = [.. strength.Groups.Select(g => _numbers[g]!.Value)] } : target;
}
