using FrameGen.Diagnostics;
using FrameGen.Mechanics.Materials;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Binds strength targets, and sees to it that every material they meet has the yields they need.</summary>
/// <param name="frame">What is bound to.</param>
/// <param name="cases">Numbers of the cases.</param>
/// <param name="specs">The groups as written.</param>
/// <param name="groups">The groups; null for one with an error.</param>
/// <param name="groupNames">Numbers of the groups.</param>
/// <param name="groupOfTube">By tube: its group; null after an error.</param>
internal sealed class StrengthTargets(
    Frame frame, NameIndex cases, IReadOnlyList<GroupSpec> specs, TubeGroup?[] groups, NameIndex groupNames, int?[] groupOfTube)
{
    private const string Whose = "strength target";

    private readonly bool[] _hasWelds = GroupsWithWelds(frame, specs, groupOfTube);
    private readonly HashSet<int> _used = [.. groupOfTube.OfType<int>()];

    /// <summary>The target, its groups by their number among all groups of the spec; null after an error.</summary>
    public StrengthTarget? Resolve(int index, StrengthTargetSpec spec)
    {
        IReadOnlyList<int>? looked = NamedList.Cases(spec.Cases, cases, Whose, spec.At, frame.Diagnostics);
        IReadOnlyList<int>? wanted = spec.Groups is null ? UsedGroups() : NamedList.Of(spec.Groups, groupNames, Whose, frame.Diagnostics);
        double? factor = frame.Values.Positive(spec.SafetyFactor, $"{Whose}: safety_factor");
        bool isSound = true;
        foreach (int group in wanted ?? [])
        {
            isSound &= HasTubes(group, spec.At) && HasYields(group, spec.At);
        }

        return isSound && looked is not null && wanted is not null && factor is { } f
            ? new StrengthTarget(index, looked, f, wanted, spec.At)
            : null;
    }

    // A joint is welded when both its tubes are: which groups have a tube with such a joint.
    private static bool[] GroupsWithWelds(Frame frame, IReadOnlyList<GroupSpec> specs, int?[] groupOfTube)
    {
        var weldedTubesAt = new List<int>[frame.Draft.Nodes.Count];
        for (int node = 0; node < weldedTubesAt.Length; node++)
        {
            weldedTubesAt[node] = [];
            if (frame.Nodes.ThroughOf(node) is { } through && IsWelded(through.Tube))
            {
                weldedTubesAt[node].Add(through.Tube);
            }
        }

        for (int tube = 0; tube < groupOfTube.Length; tube++)
        {
            TubeDraft draft = frame.Draft.Tubes[tube];
            if (IsWelded(tube) && draft is { From: { } from, To: { } to })
            {
                weldedTubesAt[from].Add(tube);
                weldedTubesAt[to].Add(tube);
            }
        }

        var hasWelds = new bool[specs.Count];
        foreach (List<int> tubes in weldedTubesAt.Where(t => t.Count > 1))
        {
            foreach (int tube in tubes)
            {
                hasWelds[groupOfTube[tube]!.Value] = true;
            }
        }

        return hasWelds;

        bool IsWelded(int tube) => groupOfTube[tube] is { } group && specs[group].Welded;
    }

    private List<int> UsedGroups() => [.. Enumerable.Range(0, specs.Count).Where(_used.Contains)];

    private bool HasTubes(int group, SourcePlace at)
    {
        if (_used.Contains(group))
        {
            return true;
        }

        frame.Diagnostics.Error(at, $"{Whose}: group {specs[group].Name.Value} has no tubes; leave it out, or give it some");
        return false;
    }

    private bool HasYields(int group, SourcePlace at)
    {
        if (groups[group] is not { } resolved)
        {
            return false;
        }

        Material material = resolved.Material;
        bool lacksYield = material.Yield is null;
        bool lacksWelded = _hasWelds[group] && material.YieldWelded is null;
        if (!lacksYield && !lacksWelded)
        {
            return true;
        }

        string lacking = lacksYield ? lacksWelded ? "yield and no yield_welded" : "yield" : "yield_welded";
        string others = lacksWelded ? "; for a group that is joined without heat write welded: false" : string.Empty;
        frame.Diagnostics.Error(
            at,
            $"{Whose}: group {resolved.Name} is of {material.Name}, which has no {lacking}; write the material out: "
            + $"materials: {{{WithGaps(material, lacksWelded)}}}{others}");
        return false;
    }

    // The material as a spec writes it, with dots where the author has to put a number.
    private static string WithGaps(Material m, bool asksForWelded)
    {
        string yield = m.Yield is { } y ? $"{y:G6} MPa" : "...";
        string ultimate = m.Ultimate is { } u ? $", ultimate: {u:G6} MPa" : string.Empty;
        string welded = asksForWelded ? ", yield_welded: ..." : string.Empty;
        return $"{m.Name}: {{E: {m.E:G6} MPa, G: {m.G:G6} MPa, density: {m.Density * 1e9:G6} kg/m3, yield: {yield}{ultimate}{welded}}}";
    }
}
