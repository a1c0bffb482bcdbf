using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Binds targets: names, directions and limits. Each entry of the spec stays one target.</summary>
internal sealed class TargetResolver(Frame frame, NameIndex cases, SupportResolver supports, MemberTargets members, StrengthTargets strengths, StabilityTargets stability)
{
    private DiagnosticList Diagnostics => frame.Diagnostics;

    /// <summary>The target; null after an error.</summary>
    /// <param name="index">Position in the spec's list.</param>
    /// <param name="spec">As written.</param>
    public Target? Resolve(int index, TargetSpec spec) => spec switch
    {
        DisplacementTargetSpec displacement => Displacement(index, displacement),
        RotationTargetSpec rotation => Rotation(index, rotation),
        StiffnessTargetSpec stiffness => Stiffness(index, stiffness),
        StrengthTargetSpec strength => strengths.Resolve(index, strength),
        BucklingTargetSpec buckling => stability.Buckling(index, buckling),
        SlendernessTargetSpec slenderness => stability.Slenderness(index, slenderness),
        FrequencyTargetSpec frequency => stability.Frequency(index, frequency),
        MemberTargetSpec member => members.Resolve(index, member),
        _ => throw new InvalidOperationException($"The target at {spec.At} is of an unknown kind."),
    };

    private DisplacementTarget? Displacement(int index, DisplacementTargetSpec spec) =>
        Bind(spec.Case, (spec.Node, spec.From, spec.To), (spec.Along, "along"), spec.Max, "displacement target", spec.At) is { } m
            ? new DisplacementTarget(index, m.Case, m.From, m.To, m.Direction, m.Max, spec.At)
            : null;

    private RotationTarget? Rotation(int index, RotationTargetSpec spec) =>
        Bind(spec.Case, (spec.Node, spec.From, spec.To), (spec.About, "about"), spec.Max, "rotation target", spec.At) is { } m
            ? new RotationTarget(index, m.Case, m.From, m.To, m.Direction, m.Max, spec.At)
            : null;

    // A movement in a case, be it a displacement or a rotation.
    private Movement? Bind(
        Placed<string> loadCase,
        (Placed<string>? Node, Placed<string>? From, Placed<string>? To) names,
        (SpecVector? Vector, string Key) direction,
        SpecQuantity max,
        string whose,
        SourcePlace at)
    {
        int? number = cases.Find(loadCase, whose, Diagnostics);
        (int? From, int To)? nodes = Nodes(names.Node, names.From, names.To, whose, at);
        Vector3? unit = direction.Vector is null ? null : frame.Values.Direction(direction.Vector, $"{whose}: {direction.Key}");
        double? limit = frame.Values.Positive(max, $"{whose}: max");
        return number is { } c && nodes is { } n && limit is { } most && (direction.Vector is null || unit is not null)
            ? new Movement(c, n.From, n.To, unit, most)
            : null;
    }

    private StiffnessTarget? Stiffness(int index, StiffnessTargetSpec spec)
    {
        const string Whose = "stiffness target";
        (int? From, int To)? nodes = Nodes(spec.Node, spec.From, spec.To, Whose, spec.At);
        double? min = frame.Values.Positive(spec.Min, $"{Whose}: min");

        // A target is looked at as it is written, without a mirror image: the supports it names are those it means.
        IReadOnlyList<int>? acting = supports.Acting(spec.Supports, withTwins: false, Whose, spec.At);
        if (spec.Along is null == spec.About is null)
        {
            Diagnostics.Error(spec.At, $"{Whose} takes either along, for a push, or about, for a couple");
            return null;
        }

        bool isTurning = spec.Along is null;
        Vector3? direction = frame.Values.Direction(spec.Along ?? spec.About!, isTurning ? $"{Whose}: about" : $"{Whose}: along");
        return nodes is { } n && min is { } limit && acting is { } held && direction is { } d
            ? new StiffnessTarget(index, n.From, n.To, d, isTurning, limit, held, spec.At)
            : null;
    }

    // One node, or one relative to another.
    private (int? From, int To)? Nodes(Placed<string>? node, Placed<string>? from, Placed<string>? to, string whose, SourcePlace at)
    {
        if (node is null ? from is null || to is null : from is not null || to is not null)
        {
            Diagnostics.Error(at, $"{whose} takes either node, or both from and to for a movement between two nodes");
            return null;
        }

        if (node is not null)
        {
            return frame.FindJoinedNode(node, whose) is { } single ? (null, single) : null;
        }

        int? start = frame.FindJoinedNode(from!, whose);
        int? stop = frame.FindJoinedNode(to!, whose);
        if (start is null || stop is not { } end)
        {
            return null;
        }

        if (start == end)
        {
            Diagnostics.Error(at, $"{whose}: from and to are both node {to!.Value}, which does not move against itself; name two nodes");
            return null;
        }

        return (start, end);
    }

    private sealed record Movement(int Case, int? From, int To, Vector3? Direction, double Max);
}
