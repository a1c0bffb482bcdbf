using FrameGen.Diagnostics;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Binds targets on buckling, slenderness and vibration.</summary>
/// <param name="frame">What is bound to.</param>
/// <param name="cases">Numbers of the cases.</param>
/// <param name="supports">The supports.</param>
/// <param name="groups">The groups; null for one with an error.</param>
/// <param name="groupOfTube">By tube: its group; null after an error.</param>
internal sealed class StabilityTargets(Frame frame, NameIndex cases, SupportResolver supports, TubeGroup?[] groups, int?[] groupOfTube)
{
    private DiagnosticList Diagnostics => frame.Diagnostics;

    /// <summary>The target; null after an error.</summary>
    public BucklingTarget? Buckling(int index, BucklingTargetSpec spec)
    {
        const string Whose = "buckling target";
        IReadOnlyList<int>? looked = NamedList.Cases(spec.Cases, cases, Whose, spec.At, Diagnostics);
        double? factor = frame.Values.Positive(spec.MinFactor, $"{Whose}: min_factor");
        return looked is not null && factor is { } f ? new BucklingTarget(index, looked, f, spec.At) : null;
    }

    /// <summary>The target; null after an error.</summary>
    public FrequencyTarget? Frequency(int index, FrequencyTargetSpec spec)
    {
        const string Whose = "frequency target";
        IReadOnlyList<int>? acting = supports.Acting(names: null, withTwins: false, Whose, spec.At);
        double? min = frame.Values.Positive(spec.Min, $"{Whose}: min");
        return acting is not null && min is { } hertz ? new FrequencyTarget(index, hertz, acting, spec.At) : null;
    }

    /// <summary>The target; null after an error.</summary>
    public SlendernessTarget? Slenderness(int index, SlendernessTargetSpec spec)
    {
        const string Whose = "slenderness target";
        double? max = frame.Values.Positive(spec.Max, $"{Whose}: max");
        bool isSound = true;
        foreach (int group in groupOfTube.OfType<int>().Distinct().Order().Where(_ => spec.Wall))
        {
            if (groups[group] is { Material: { Yield: null } material } without)
            {
                Diagnostics.Error(spec.At, $"{Whose}: wall: true needs the yield of {material.Name}, the material of group {without.Name}; give it one");
                isSound = false;
            }
        }

        return isSound && max is { } limit ? new SlendernessTarget(index, limit, spec.Wall, spec.At) : null;
    }
}
