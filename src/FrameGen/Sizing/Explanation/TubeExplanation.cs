using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Sizing.Explanation;

/// <summary>Who settled a tube's size.</summary>
public enum SizeOrigin
{
    /// <summary>Sizing chose it.</summary>
    Chosen,

    /// <summary>Sizing had no other to choose from.</summary>
    OnlyOne,

    /// <summary>The spec gives it.</summary>
    Given,

    /// <summary>The file beside the spec pins it.</summary>
    Frozen,
}

/// <summary>Why a tube has its size, and what cuts its ends.</summary>
/// <param name="Sized">The frame.</param>
/// <param name="Tube">Index of the tube.</param>
/// <param name="Origin">Who settled its size.</param>
/// <param name="Lighter">The next lighter sizes of its group, or cheaper ones where cost is made least, nearest first, each tried with all other groups as they are.</param>
/// <param name="LighterInAll">How many lighter, or cheaper, ones there are.</param>
/// <param name="Targets">One a target, in the spec's order.</param>
/// <param name="Ends">What cuts it at its from end and at its to end.</param>
public sealed record TubeExplanation(
    SizedFrame Sized,
    int Tube,
    SizeOrigin Origin,
    IReadOnlyList<TriedSize> Lighter,
    int LighterInAll,
    IReadOnlyList<TargetDrive> Targets,
    IReadOnlyList<ExplainedEnd> Ends)
{
    /// <summary>True where "lighter" is cheaper: cost is made least, and the prices are known.</summary>
    public bool IsByCost { get; init; }

    /// <summary>The next heavier sizes in stock, farthest first, where the spec gives the size; else empty.</summary>
    public IReadOnlyList<TriedSize> Heavier { get; init; } = [];

    /// <summary>Index of its group.</summary>
    public int Group => Sized.Model.Tubes[Tube].Group;

    /// <summary>Its group.</summary>
    public TubeGroup GroupOfTube => Sized.Model.Groups[Group];

    /// <summary>What sizing would choose for the group today, where its size is pinned and another would be chosen; else null.</summary>
    public Candidate? Today { get; init; }

    /// <summary>True where a lighter size would do alone: never where sizing chose.</summary>
    public bool LighterWouldDo => Lighter.Any(l => l.Verdict == SizeVerdict.WouldDo);
}

/// <summary>What comes of a size.</summary>
public enum SizeVerdict
{
    /// <summary>Every target is met and every joint can be made.</summary>
    WouldDo,

    /// <summary>It breaks a target.</summary>
    BreaksTarget,

    /// <summary>A joint can't be made with it.</summary>
    DoesNotFit,

    /// <summary>It would be one different size more than the spec allows.</summary>
    TooManySizes,

    /// <summary>The frame can't be solved with it.</summary>
    CannotBeSolved,
}

/// <summary>A size tried in place of the chosen one, all other groups as they are.</summary>
/// <param name="Candidate">The size.</param>
/// <param name="SavesKg">What the frame would be lighter by, on axis lengths; negative where it would be heavier.</param>
/// <param name="Verdict">What comes of it.</param>
/// <param name="Broken">Targets that it breaks, the farthest over its limit first; also where a joint refuses it.</param>
/// <param name="Refusal">The joint that refuses it, in words; empty where none does.</param>
public sealed record TriedSize(
    Candidate Candidate, double SavesKg, SizeVerdict Verdict, IReadOnlyList<TargetResult> Broken, string Refusal)
{
    /// <summary>The joint that refuses it; null where none does.</summary>
    public FitProblem? Problem { get; init; }

    /// <summary>What the frame would cost less, in the shop's own money, on axis lengths; null where a price is unknown.</summary>
    public double? SavesCost { get; init; }
}

/// <summary>What a target has to do with a group's size.</summary>
/// <param name="Result">The target in the chosen design.</param>
/// <param name="Breaks">How many of the lighter sizes tried break it.</param>
/// <param name="PerStiffness">
/// By how many percent of its limit the share used grows where the group's tubes are one percent stiffer in bending, stretch and twist, all else the same; negative
/// where that helps. Null where the frame can't be solved so.
/// </param>
/// <param name="PerMass">
/// The same where the group has one percent more mass in its walls, outer sizes the same, for a rod in its diameter: stiffness, strength and weight change. Null where
/// there is no such section, or the order of a joint would change.
/// </param>
/// <param name="KgPerUnit">
/// Mass that the group's walls take to move the limit by one of its units with the same share used, kg, all else the same; null where more wall does not help.
/// </param>
/// <remarks>Central differences of exact reanalyses, <see cref="Sensitivities.Step"/> to either side.</remarks>
public sealed record TargetDrive(TargetResult Result, int Breaks, double? PerStiffness, double? PerMass, double? KgPerUnit)
{
    /// <summary>A share of the limit from which a target is active.</summary>
    public const double ActiveFrom = 0.95;

    /// <summary>True where the target is near its limit or over it.</summary>
    public bool IsActive => Result.Ratio >= ActiveFrom;

    /// <summary>True where the target keeps the group from being lighter.</summary>
    public bool Drives => Breaks > 0;
}

/// <summary>What cuts one end of a tube.</summary>
/// <param name="End">Which end.</param>
/// <param name="Joint">The joint it stands in, with its order.</param>
/// <param name="Kind">How it is cut.</param>
/// <param name="Contacts">The tubes that cut it, in the joint's order; the first is its seat. Empty at a square end.</param>
/// <param name="IsCut">True where the cut was made and shows what touches; false where this version can't cut it and every tube before it is listed.</param>
/// <param name="RunsOut">How far a square end stands past the end of the axis, mm.</param>
/// <param name="OrderIsWritten">True where the spec gives the joint's order.</param>
/// <param name="Problems">What is amiss with the end, in words.</param>
public sealed record ExplainedEnd(
    End End,
    NodeJoint Joint,
    CutKind Kind,
    IReadOnlyList<Contact> Contacts,
    bool IsCut,
    double RunsOut,
    bool OrderIsWritten,
    IReadOnlyList<string> Problems);
