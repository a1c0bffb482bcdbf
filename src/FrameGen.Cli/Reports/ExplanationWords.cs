using System.Globalization;
using FrameGen.Joints;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Sizing;
using FrameGen.Sizing.Explanation;
using static FrameGen.Output.SizingModel;

namespace FrameGen.Cli.Reports;

/// <summary>The sentences of an explanation.</summary>
internal static class ExplanationWords
{
    /// <summary>Why the tube has its size: what the next lighter one would break, and how sure that is.</summary>
    public static IEnumerable<string> Why(TubeExplanation explanation, DisplayFormat display)
    {
        SizedFrame sized = explanation.Sized;
        TubeGroup group = explanation.GroupOfTube;
        string? given = explanation.Origin switch
        {
            SizeOrigin.Given => "Why: the spec gives it.",
            SizeOrigin.Frozen => $"Why: {sized.Model.Frozen!.FileName} pins it{(explanation.Today is { } today ? $"; {display.Section(today.Nominal)} would be chosen today" : "")}.",
            SizeOrigin.OnlyOne => "Why: its group has no other size to choose from.",
            _ => null,
        };
        string next = Next(explanation, display);
        if (given is not null)
        {
            yield return next.Length > 0 ? $"{given} {next}" : given;
            yield break;
        }

        if (sized.Status == SizingStatus.Unmet)
        {
            yield return "Why: no choice of sizes meets every target; this is the one of the least bad choice.";
            yield return next;
            yield break;
        }

        yield return explanation.Lighter.Count == 0
            ? $"Why: it is the {(explanation.IsByCost ? "cheapest" : "lightest")} of the {Whole(group.Candidates.Count)} sizes that {group.Name} may have."
            : $"Why: {next[..1].ToLowerInvariant()}{next[1..]}";
        if (sized.Status == SizingStatus.ProvenLightest && explanation.Lighter.Count > 0)
        {
            bool others = sized.Model.Groups.Any(g => !ReferenceEquals(g, group) && !g.IsFixed && g.Candidates.Count > 1);
            string lighter = Lighter(explanation);
            string all = explanation.IsByCost ? $"cost no less than its {Money(sized.Cost)}" : $"weigh no less than its {display.Mass(sized.MassKg)}";
            yield return !others
                ? $"Proven: no {lighter} size will do."
                : $"Proven: with a {lighter} size here some other group would have to be {(explanation.IsByCost ? "dearer" : "heavier")}, and the frame would {all}.";
        }
        else if (sized.Status == SizingStatus.BestFound)
        {
            yield return "The best choice that was found, not proven: another combination may be " + Lighter(explanation) + ".";
        }
    }

    // What comes of the next lighter size, as a sentence.
    private static string Next(TubeExplanation explanation, DisplayFormat display)
    {
        if (explanation.Lighter.Count == 0)
        {
            return explanation.Origin switch
            {
                SizeOrigin.Given when explanation.Heavier.Count == 0 => "No stock list holds a size like it, so there is none to compare it with.",
                SizeOrigin.Given => $"No stock list holds a {Lighter(explanation)} one.",
                SizeOrigin.Frozen => $"There is no {Lighter(explanation)} size to compare it with.",
                _ => "",
            };
        }

        TriedSize next = explanation.Lighter[0];
        string name = $"The next {Lighter(explanation)}, {display.Section(next.Candidate.Nominal)},";
        return next.Verdict switch
        {
            SizeVerdict.BreaksTarget => $"{name} breaks {Name(next.Broken[0])}: {Amount(next.Broken[0], display)}.",
            SizeVerdict.DoesNotFit => $"{name} can't be joined: {next.Refusal}.",
            SizeVerdict.CannotBeSolved => $"{name} is so soft beside the others that the frame can't be solved.",
            SizeVerdict.TooManySizes => $"{name} would be one different size more than the {Whole(explanation.Sized.Model.Sizing.DifferentSizes ?? 0)} that the spec allows.",
            _ => $"{name} would do as well, and save {(explanation.IsByCost ? Money(next.SavesCost) : display.Mass(next.SavesKg))}.",
        };
    }

    /// <summary>What comes of a size, for a table whose next columns have value and limit.</summary>
    public static string Outcome(FrameModel model, TriedSize size) => size.Verdict switch
    {
        SizeVerdict.BreaksTarget => $"breaks {Name(size.Broken[0])}{(size.Broken.Count > 1 ? $", and {Whole(size.Broken.Count - 1)} more" : "")}",
        SizeVerdict.DoesNotFit => $"can't be joined: {Refusal(model, size.Problem!)}",
        SizeVerdict.CannotBeSolved => "can't be solved: too soft beside the others",
        SizeVerdict.TooManySizes => "would be one different size too many",
        _ => "would do",
    };

    // Short, for a row that has the numbers.
    private static string Refusal(FrameModel model, FitProblem problem)
    {
        string tube = model.Tubes[problem.End.Tube].Name;
        string mate = model.Tubes[problem.Mate].Name;
        return problem.Kind switch
        {
            FitProblemKind.WiderThanSeat => $"{tube} is wider than {mate}, which it lands on (half widths)",
            FitProblemKind.RunOutTooLong => $"{tube} would run out too far to carry {mate}",
            _ => $"{tube} misses {mate}",
        };
    }

    /// <summary>What decides about a size, its limit and their unit, as papers print them; NaN where nothing is measured.</summary>
    public static (double Value, double Limit, string Unit) Measure(TriedSize size, DisplayFormat display)
    {
        (double value, double limit, string unit) = size switch
        {
            { Verdict: SizeVerdict.DoesNotFit, Problem: { } problem } => (problem.Needed, problem.Allowed, "mm"),
            { Verdict: SizeVerdict.BreaksTarget } => (size.Broken[0].Value, size.Broken[0].Limit, size.Broken[0].Unit),
            _ => (double.NaN, double.NaN, ""),
        };
        (double scale, string name) = display.TargetUnit(unit);
        return (scale * value, scale * limit, name);
    }

    /// <summary>A target by its name: <c>displacement of rear-l along z, case standing</c>.</summary>
    public static string Name(TargetResult target) => $"{target.Kind} of {target.Label}";

    /// <summary>How an end's joint is ordered, what stands before it there, and what is amiss.</summary>
    public static string Order(FrameModel model, ExplainedEnd end)
    {
        string[] names = [.. end.Joint.Tubes.Select(t => model.Tubes[t].Name)];
        if (names.Length < 2)
        {
            return $"{EndText.Name(end.End)}: stands alone at {model.Nodes[end.Joint.Node].Name}.";
        }

        string rule = end.OrderIsWritten ? "as the spec orders it" : end.Joint.Through is null ? "the larger first" : "the one that runs through first, then the larger";
        string cut = end.IsCut ? "" : " Its cut can't be drawn yet; all tubes before it are listed.";
        string problems = string.Concat(end.Problems.Select(p => $" {p}."));
        return $"{EndText.Name(end.End)}: joint {model.Nodes[end.Joint.Node].Name} in the order {string.Join(", ", names)}: {rule}; each is cut to fit those before it.{cut}{problems}";
    }

    /// <summary>What less of what is made least is called.</summary>
    public static string Lighter(TubeExplanation explanation) => explanation.IsByCost ? "cheaper" : "lighter";

    /// <summary>An amount in the shop's own money.</summary>
    public static string Money(double? amount) => amount is { } a ? Fixed(a, 2) : "-";

    /// <summary>A count.</summary>
    public static string Whole(int count) => count.ToString(CultureInfo.InvariantCulture);

    private static string Amount(TargetResult target, DisplayFormat display)
    {
        (double scale, string unit) = display.TargetUnit(target.Unit);
        double off = Math.Abs(target.Value - target.Limit) / target.Limit;
        string measure = target.Value < target.Limit ? $"{Wording.Percent(off)} below" : off < 3 ? $"{Wording.Percent(off)} over" : $"{Wording.Number(off + 1)} times";
        string where = target.Where.Length > 0 ? $" ({target.Where})" : "";
        return $"{Wording.Quantity(scale * target.Value, unit)}, {measure} the limit of {Wording.Quantity(scale * target.Limit, unit)}{where}";
    }
}
