using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Binds closed-form targets on single tubes; a target on a tube covers its twin too.</summary>
internal sealed class MemberTargets
{
    private const string Whose = "member target";

    private readonly Frame _frame;
    private readonly NameIndex _groupNames;
    private readonly int?[] _groupOfTube;
    private readonly HashSet<(bool IsDeflection, int Tube)> _written = [];

    /// <summary>Notes which tubes have entries of their own.</summary>
    /// <param name="frame">What is bound to.</param>
    /// <param name="groupNames">Numbers of the groups.</param>
    /// <param name="groupOfTube">By tube: its group; null after an error.</param>
    /// <param name="specs">All targets of the spec.</param>
    public MemberTargets(Frame frame, NameIndex groupNames, int?[] groupOfTube, IReadOnlyList<TargetSpec> specs)
    {
        (_frame, _groupNames, _groupOfTube) = (frame, groupNames, groupOfTube);
        foreach (MemberTargetSpec spec in specs.OfType<MemberTargetSpec>())
        {
            if (spec.Tube is { } name && frame.Draft.TubeNames.Find(name.Value) is { } tube)
            {
                _written.Add((IsDeflection(spec), tube));
            }
        }
    }

    /// <summary>The target; null after an error.</summary>
    public MemberTarget? Resolve(int index, MemberTargetSpec spec)
    {
        (IReadOnlyList<int> Tubes, string Subject)? subject = Subject(spec);
        return IsDeflection(spec) ? Deflection(index, spec, subject) : Stiffness(index, spec, subject);
    }

    private static bool IsDeflection(MemberTargetSpec spec) => spec.As is not null || spec.Load is not null || spec.MaxDeflection is not null;

    private MemberDeflectionTarget? Deflection(int index, MemberTargetSpec spec, (IReadOnlyList<int> Tubes, string Subject)? subject)
    {
        if (spec is not { As: { } span, Load: { } load, MaxDeflection: { } max, MinBendingStiffness: null, MinTorsionalStiffness: null })
        {
            _frame.Diagnostics.Error(
                spec.At, $"{Whose} takes as, load and max_deflection together, or min_bending_stiffness and min_torsional_stiffness without them");
            return null;
        }

        double? force = _frame.Values.Positive(load, $"{Whose}: load");
        double? limit = _frame.Values.Positive(max, $"{Whose}: max_deflection");
        return subject is { } s && force is { } f && limit is { } d
            ? new MemberDeflectionTarget(index, s.Tubes, s.Subject, spec.Along, span, f, d, spec.At)
            : null;
    }

    private MemberStiffnessTarget? Stiffness(int index, MemberTargetSpec spec, (IReadOnlyList<int> Tubes, string Subject)? subject)
    {
        if (spec is { MinBendingStiffness: null, MinTorsionalStiffness: null })
        {
            _frame.Diagnostics.Error(spec.At, $"{Whose} asks for nothing; write max_deflection, min_bending_stiffness or min_torsional_stiffness");
            return null;
        }

        double? bending = spec.MinBendingStiffness is { } ei ? _frame.Values.Positive(ei, $"{Whose}: min_bending_stiffness") : null;
        double? torsional = spec.MinTorsionalStiffness is { } gj ? _frame.Values.Positive(gj, $"{Whose}: min_torsional_stiffness") : null;
        bool isSound = bending is null == spec.MinBendingStiffness is null && torsional is null == spec.MinTorsionalStiffness is null;
        return isSound && subject is { } s
            ? new MemberStiffnessTarget(index, s.Tubes, s.Subject, spec.Along, bending, torsional, spec.At)
            : null;
    }

    private (IReadOnlyList<int> Tubes, string Subject)? Subject(MemberTargetSpec spec)
    {
        if (spec.Tube is null == spec.Group is null)
        {
            _frame.Diagnostics.Error(spec.At, $"{Whose} takes either tube or group");
            return null;
        }

        return spec.Tube is { } tube ? OneTube(spec, tube) : OneGroup(spec, spec.Group!);
    }

    private (IReadOnlyList<int> Tubes, string Subject)? OneTube(MemberTargetSpec spec, Placed<string> name)
    {
        if (_frame.FindTube(name, Whose) is not { } tube)
        {
            return null;
        }

        int? twin = _frame.TwinOfTube(name.Value);
        bool coversTwin = twin is { } other && !_written.Contains((IsDeflection(spec), other));
        return (coversTwin ? [tube, twin!.Value] : [tube], $"tube {name.Value}");
    }

    private (IReadOnlyList<int> Tubes, string Subject)? OneGroup(MemberTargetSpec spec, Placed<string> name)
    {
        if (_groupNames.Find(name, Whose, _frame.Diagnostics) is not { } group)
        {
            return null;
        }

        int[] tubes = [.. Enumerable.Range(0, _groupOfTube.Length).Where(t => _groupOfTube[t] == group)];
        if (tubes.Length == 0)
        {
            _frame.Diagnostics.Error(spec.At, $"{Whose}: group {name.Value} has no tubes; leave the target out, or give the group some");
            return null;
        }

        return (tubes, $"group {name.Value}");
    }
}
