using System.Globalization;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>What sizing and analysis found, in words and numbers for people: the terminal and the report say the same.</summary>
/// <param name="Groups">In the order of the spec.</param>
/// <param name="Targets">In the order of the spec.</param>
/// <param name="Cases">In the order of the spec.</param>
/// <param name="Verdict">How sure the choice is, with the frame's mass.</param>
public sealed record SizingModel(
    IReadOnlyList<GroupSize> Groups, IReadOnlyList<TargetRow> Targets, IReadOnlyList<CaseRow> Cases, string Verdict)
{
    /// <summary>Takes it from a sized frame.</summary>
    public static SizingModel From(SizedFrame sized)
    {
        var display = new DisplayFormat(sized.Model.Display);
        return new SizingModel(
            [.. sized.Model.Groups.Select((_, g) => GroupSize.From(sized, g, display))],
            [.. sized.Targets.Select(t => TargetRow.From(t, display))],
            CaseRow.Of(sized, display),
            VerdictOn(sized, display));
    }

    internal static string Percent(double ratio) => (100 * ratio).ToString("0.0", CultureInfo.InvariantCulture) + " %";

    /// <summary>How many decimals give a value so many significant digits; none for more than six.</summary>
    internal static int Decimals(double value, int digits) =>
        double.IsFinite(value) && value != 0 ? Math.Clamp(digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 6) : 0;

    /// <summary>So many decimals, without an exponent and without a negative zero.</summary>
    internal static string Fixed(double value, int decimals) =>
        !double.IsFinite(value) ? "inf" : (Math.Round(value, decimals) + 0.0).ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    private static string VerdictOn(SizedFrame sized, DisplayFormat display)
    {
        FrameModel model = sized.Model;
        string mass = $"{display.Mass(sized.MassKg)} on axis lengths";
        string looked = sized.Analyses == 1 ? "1 analysis" : string.Create(CultureInfo.InvariantCulture, $"{sized.Analyses:N0} analyses");
        return sized.Status switch
        {
            SizingStatus.Fixed when model.Frozen is { } frozen => $"Frozen by {frozen.FileName}: {mass}",
            SizingStatus.Fixed => $"Given by the spec: {mass}",
            SizingStatus.ProvenLightest => $"Proven lightest: {mass} ({looked})",
            SizingStatus.BestFound => $"Best found: {mass}; nothing lighter than {display.Mass(sized.BoundKg ?? 0)} can do ({looked})",
            _ when model.Frozen is { } frozen => $"{Cautions.NotMeetingTargets} with the sizes that {frozen.FileName} pins: {mass}",
            _ when model.Groups.All(g => g.IsFixed) => $"{Cautions.NotMeetingTargets} with the sections that the spec gives: {mass}",
            _ => $"{Cautions.NotMeetingTargets}; the least bad: {mass} ({looked})",
        };
    }
}

/// <summary>The section of a group.</summary>
/// <param name="Group">Its name.</param>
/// <param name="Material">Name.</param>
/// <param name="Section">As a shop asks for it.</param>
/// <param name="Measured">Size of the tube in hand; empty where it was not measured.</param>
/// <param name="MassPerLength">In the unit of the paper.</param>
/// <param name="Tubes">How many.</param>
/// <param name="Source">Where the size comes from: <c>12 in iso4200</c>, <c>the spec</c>, <c>frozen</c>.</param>
public sealed record GroupSize(
    string Group, string Material, string Section, string Measured, string MassPerLength, int Tubes, string Source)
{
    internal static GroupSize From(SizedFrame sized, int index, DisplayFormat display)
    {
        TubeGroup group = sized.Model.Groups[index];
        Section section = sized.Sections[index];
        return new GroupSize(
            group.Name,
            group.Material.Name,
            display.Section(sized.Chosen[index].Nominal),
            display.Measured(sized.Chosen[index]),
            display.MassPerLengthNumber(section.MassPerMetre(group.Material.Density)),
            sized.Model.Tubes.Count(t => t.Group == index),
            group.IsFrozen ? "frozen"
                : group.IsFixed ? "the spec"
                : string.Create(CultureInfo.InvariantCulture, $"{group.Candidates.Count} in {sized.Chosen[index].StockList}"));
    }
}

/// <summary>A target and what the frame does; value, limit and margin with one count of decimals, that of the limit.</summary>
/// <param name="Name">Kind and what is looked at.</param>
/// <param name="Where">What decides; may be empty.</param>
/// <param name="Value">Reached.</param>
/// <param name="Limit">Asked for.</param>
/// <param name="Unit">Of both; empty for a safety factor.</param>
/// <param name="Used">Share of the limit used, as a percentage.</param>
/// <param name="Margin">What is left of it; negative where it is missed.</param>
/// <param name="Met">True when it holds.</param>
/// <param name="Ratio">Share of the limit used, for drawing: 1 at the limit.</param>
public sealed record TargetRow(
    string Name, string Where, string Value, string Limit, string Unit, string Used, string Margin, bool Met, double Ratio)
{
    internal static TargetRow From(TargetResult target, DisplayFormat display)
    {
        (double scale, string unit) = display.TargetUnit(target.Unit);
        int decimals = SizingModel.Decimals(scale * target.Limit, 3);
        return new TargetRow(
            $"{target.Kind}: {target.Label}",
            target.Where,
            SizingModel.Fixed(scale * target.Value, decimals),
            SizingModel.Fixed(scale * target.Limit, decimals),
            unit,
            SizingModel.Percent(target.Ratio),
            (target.Met ? string.Empty : "-") + SizingModel.Fixed(scale * Math.Abs(target.Value - target.Limit), decimals),
            target.Met,
            target.Ratio);
    }
}

/// <summary>What a load case does at most.</summary>
/// <param name="Case">Its name.</param>
/// <param name="Moves">Displacement of the node that moves most.</param>
/// <param name="Node">That node.</param>
/// <param name="Stress">Von Mises stress where a tube is nearest its yield, MPa; the highest where a yield is not known.</param>
/// <param name="Used">Share of yield there; empty where it is not known.</param>
/// <param name="Tube">Where it is.</param>
/// <param name="At">How far along that tube.</param>
/// <param name="Why">The place in words, the yield there, and what the stress comes from; empty where the yield is not known.</param>
/// <param name="Buckles">Times the case, the perfect frame buckles; empty where nothing is compressed.</param>
public sealed record CaseRow(
    string Case, string Moves, string Node, string Stress, string Used, string Tube, string At, string Why, string Buckles)
{
    internal static IReadOnlyList<CaseRow> Of(SizedFrame sized, DisplayFormat display)
    {
        if (sized.Cases.Count == 0)
        {
            return [];
        }

        // Stress with the decimals that give the largest of them four digits.
        int decimals = SizingModel.Decimals(sized.Cases.Max(c => c.Tubes.Max(t => t.MaxStress)), 4);
        return [.. sized.Cases.Select(c => From(sized, c, decimals, display))];
    }

    private static CaseRow From(SizedFrame sized, CaseResult result, int decimals, DisplayFormat display)
    {
        (int node, Vector3 shift) = result.LargestDisplacement();
        int tube = result.MostUsedTube();
        TubeForces forces = result.Tubes[tube];
        return new CaseRow(
            sized.Model.Cases[result.Case].Name,
            display.SmallLengthNumber(shift.Length),
            sized.Model.Nodes[node].Name,
            SizingModel.Fixed(forces.Use?.Stress ?? forces.MaxStress, decimals),
            forces.Use is { } used ? SizingModel.Percent(used.Share) : string.Empty,
            sized.Model.Tubes[tube].Name,
            display.LengthNumber(forces.Use?.At ?? forces.MaxStressAt),
            forces.Use is { Share: > 0 } use ? $"{Place(sized.Model, tube, use, display)}, yield {SizingModel.Fixed(use.Yield, 0)} MPa there; {Shares(use.Shares)}" : string.Empty,
            result.BucklingFactor is { } factor ? SizingModel.Fixed(factor, SizingModel.Decimals(factor, 3)) : string.Empty);
    }

    /// <summary>The place by the nearest node: <c>at node hub-l, in reach of a weld</c>.</summary>
    internal static string Place(FrameModel model, int tube, TubeUse use, DisplayFormat display)
    {
        (int node, double distance) = model.NearestNode(tube, use.At);
        string near = distance < 0.5 ? $"at node {model.Nodes[node].Name}" : $"{display.Length(distance)} from node {model.Nodes[node].Name}";
        return use.NearWeld ? $"{near}, in reach of a weld" : near;
    }

    /// <summary>What a stress comes from, largest first: <c>bending 83 %, axial 15 %</c>.</summary>
    internal static string Shares(StressShares shares) =>
        string.Join(", ", shares.Ordered.Where(s => s.Share >= 0.005).Select(s => $"{s.Name} {(100 * s.Share).ToString("0", CultureInfo.InvariantCulture)} %"));
}
