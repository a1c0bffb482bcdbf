using FrameGen.Diagnostics;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing;

/// <summary>Says which joints leave no design that can be made.</summary>
internal static class FitReport
{
    private const long MostLooked = 1 << 16;

    /// <summary>Reports the joints that no choice of sizes suits; where each could be made alone, those that forbid something.</summary>
    public static void Explain(DesignAnalysis analysis, DiagnosticList diagnostics)
    {
        var partly = new List<(NodeEntries Node, FitProblem Problem, Section[] Sections)>();
        bool told = false;
        foreach (NodeEntries node in analysis.Joints.Nodes)
        {
            (bool some, FitProblem? nearest, Section[] sections) = Look(analysis, node);
            if (nearest is null)
            {
                continue;
            }

            if (some)
            {
                partly.Add((node, nearest, sections));
                continue;
            }

            told = true;
            diagnostics.Error(
                analysis.Space.Model.Nodes[node.Node].At,
                $"no choice of sizes fits joint {analysis.Space.Model.Nodes[node.Node].Name}: at best {Words(analysis.Space.Model, nearest, sections)}; {Advice(analysis.Space.Model, nearest)}");
        }

        if (!told)
        {
            FrameModel model = analysis.Space.Model;
            string joints = string.Join("; ", partly.Take(4).Select(p => $"{model.Nodes[p.Node.Node].Name}: {Words(model, p.Problem, p.Sections)}"));
            diagnostics.Error(
                null,
                $"no choice of sizes fits every joint at once, though each fits alone; what is in the way, for instance: {joints}; "
                + "widen the groups' ranges, or change the order of a joint (`joints`)");
        }
    }

    // Whether some combination fits, and of those that don't the one that misses by least.
    private static (bool Some, FitProblem? Nearest, Section[] Sections) Look(DesignAnalysis analysis, NodeEntries node)
    {
        DesignSpace space = analysis.Space;
        var choice = new int[space.Groups];
        var sections = new Section[space.Groups];
        bool some = false;
        FitProblem? nearest = null;
        Section[] at = sections;
        for (long cell = 0; cell < Math.Min(node.Combinations, MostLooked); cell++)
        {
            node.Decode(cell, choice);
            for (int g = 0; g < sections.Length; g++)
            {
                sections[g] = space[g][choice[g]].Section;
            }

            if (analysis.Joints.At(node, choice, sections).Fits)
            {
                some = true;
                continue;
            }

            FitProblem worst = analysis.Joints.ProblemsAt(node, sections).MaxBy(p => p.Needed - p.Allowed)!;
            if (nearest is null || worst.Needed - worst.Allowed < nearest.Needed - nearest.Allowed)
            {
                (nearest, at) = (worst, [.. sections]);
            }
        }

        return (some, nearest, at);
    }

    /// <summary>A joint that can't be made, in a builder's words.</summary>
    public static string Words(FrameModel model, FitProblem problem, IReadOnlyList<Section> sections)
    {
        Tube tube = model.Tubes[problem.End.Tube];
        Tube mate = model.Tubes[problem.Mate];
        string cut = $"{tube.Name} ({model.Groups[tube.Group].Name}, {sections[tube.Group].Name})";
        string seat = $"{mate.Name} ({model.Groups[mate.Group].Name}, {sections[mate.Group].Name})";
        string needed = Wording.Number(problem.Needed);
        string allowed = Wording.Number(problem.Allowed);
        return problem.Kind switch
        {
            FitProblemKind.WiderThanSeat => $"{cut} is wider than the {seat} it lands on: half its width and offset {needed} mm, its seat's half {allowed} mm",
            FitProblemKind.RunOutTooLong => $"{cut} would run out by {needed} mm to carry {seat}, more than its own size of {allowed} mm",
            _ => $"{cut} misses {seat} by {needed} mm",
        };
    }

    private static string Advice(FrameModel model, FitProblem problem)
    {
        string tube = model.Groups[model.Tubes[problem.End.Tube].Group].Name;
        string mate = model.Groups[model.Tubes[problem.Mate].Group].Name;
        return problem.Kind switch
        {
            FitProblemKind.WiderThanSeat when !string.Equals(tube, mate, StringComparison.Ordinal) =>
                $"let {mate} be larger or {tube} smaller, change the joint's `order`, or allow it with `wrap: true` on that end",
            FitProblemKind.WiderThanSeat => "change the joint's `order` or the offset, or allow it with `wrap: true` on that end",
            FitProblemKind.RunOutTooLong => "use `miter`, another `order`, or `extend` on that end",
            _ => "change the offsets, or let the sizes be larger",
        };
    }
}
