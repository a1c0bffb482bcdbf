using FrameGen.Diagnostics;
using FrameGen.Model;

namespace FrameGen.Sizing;

/// <summary>Sizes a frame whose sizes may be pinned: then the targets are checked with the pinned ones, and what would be chosen today is told.</summary>
public static class FrozenSizing
{
    /// <summary>Sizes a frame.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="diagnostics">Errors and warnings of the frame as it is; a note on what would be chosen today.</param>
    /// <param name="progress">Told now and then; may be null.</param>
    /// <returns>The sized frame; null when an error was reported.</returns>
    public static SizedFrame? Size(FrameModel model, DiagnosticList diagnostics, IProgress<SizingProgress>? progress = null)
    {
        SizedFrame? sized = SectionSizer.Size(model, diagnostics, progress);
        if (sized is null || model.Frozen is not { } frozen)
        {
            return sized;
        }

        string since = Since(frozen);
        if (frozen.Free.Groups.All(g => g.IsFixed))
        {
            diagnostics.Note(null, $"{frozen.FileName}: {since}; the spec gives all of them today");
            return sized;
        }

        // What is wrong with a choice that is not used is nobody's concern but this note's.
        var aside = new DiagnosticList();
        SizedFrame? today = SectionSizer.Size(frozen.Free, aside, progress);
        diagnostics.Note(null, $"{frozen.FileName}: {since}; {Words(sized, today, aside)}");
        return sized with { Today = today };
    }

    private static string Since(FrozenSizes frozen)
    {
        var changed = new List<string>();
        if (frozen.SpecChanged)
        {
            changed.Add("the spec");
        }

        changed.AddRange(frozen.ChangedStock.Select(s => $"stock list {s}"));
        string since = changed.Count switch
        {
            0 => "nothing has changed since",
            1 => $"{changed[0]} has changed since",
            _ => $"{string.Join(", ", changed.SkipLast(1))} and {changed[^1]} have changed since",
        };
        return $"sizes frozen by {frozen.Tool}, {since}";
    }

    private static string Words(SizedFrame sized, SizedFrame? today, DiagnosticList aside)
    {
        if (today is null)
        {
            string why = aside.FirstOrDefault(d => d.Severity == Severity.Error)?.Message ?? "it gave no answer";
            return $"no sizes could be chosen today: {why}";
        }

        var other = new List<string>();
        for (int g = 0; g < sized.Chosen.Count; g++)
        {
            if (!today.Chosen[g].Nominal.Equals(sized.Chosen[g].Nominal))
            {
                other.Add($"{sized.Model.Groups[g].Name} {today.Chosen[g].Nominal.Name} for {sized.Chosen[g].Nominal.Name}");
            }
        }

        string unmet = today.Status == SizingStatus.Unmet ? ", and would not meet the targets" : string.Empty;
        return other.Count == 0
            ? $"sizing would choose the same today{unmet}"
            : $"sizing would choose {string.Join(", ", other)} today, {Wording.Number(today.MassKg)} kg for {Wording.Number(sized.MassKg)} kg{unmet}";
    }
}
