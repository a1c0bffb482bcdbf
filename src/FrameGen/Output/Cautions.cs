namespace FrameGen.Output;

/// <summary>What everybody who builds from the papers has to know; the one place where these sentences stand.</summary>
public static class Cautions
{
    /// <summary>Stamped on every paper of a frame that misses a target.</summary>
    public const string NotMeetingTargets = "NOT MEETING TARGETS";

    /// <summary>Said once on a paper that gives lengths.</summary>
    public const string WeldShrinkage = "Weld shrinkage is not allowed for.";

    /// <summary>In one line, for drawings and templates.</summary>
    public const string OnDrawings =
        "An aid to design, not a proof of safety: loads, supports, welds and tests before use are yours. Check the fit before cutting metal.";

    /// <summary>In full sentences, for papers.</summary>
    public static IReadOnlyList<string> All { get; } =
    [
        "A frame carries people and loads: these results are an aid to design, not a proof that it is safe.",
        "Loads, supports and targets are the user's; check that they are the worst the frame will meet.",
        "Not checked: fatigue, weld size, crushing or punching of a mate's wall, imperfect columns, "
            + "and joints softer than rigid (joints of thin-walled tubes are).",
        "Buckling factors are those of straight, perfect, elastic tubes on their axes: real ones buckle sooner.",
        WeldShrinkage,
        "Local codes and licensed practice decide. Test the frame before use.",
    ];

    /// <summary>In few words, for a terminal.</summary>
    public const string Brief =
        "An aid to design, not a proof of safety. Not checked: fatigue, welds, crushing or punching of walls, imperfect columns, "
        + "soft joints; buckling factors are those of perfect tubes; weld shrinkage is not allowed for. Local codes and licensed practice decide; test before use.";
}
