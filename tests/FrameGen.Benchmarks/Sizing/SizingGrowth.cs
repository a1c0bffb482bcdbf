using System.Diagnostics;
using System.Globalization;
using FrameGen.Diagnostics;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Benchmarks.Sizing;

/// <summary>How sizing grows with groups, candidates and tubes: time, analyses and what is proven.</summary>
internal static class SizingGrowth
{
    private static readonly (int Storeys, int Groups, int Candidates)[] Towers = [(3, 3, 10), (5, 6, 20), (10, 12, 40), (25, 30, 40)];

    // What the lightest sizes reach, times the factor, is asked for.
    private static readonly (string Name, (string Target, double Factor)[] Targets)[] Aims =
    [
        ("stiffness", [("stiffness: {node: aTOP, along: x, min: LIMIT N/mm}", 3), ("stiffness: {from: aTOP, to: cTOP, along: y, min: LIMIT N/mm}", 2)]),
        ("stiffness and frequency", [("stiffness: {node: aTOP, along: x, min: LIMIT N/mm}", 3), ("frequency: {min: LIMIT Hz}", 1.2)]),
        ("displacement and strength", [("displacement: {case: wind, node: bTOP, along: x, max: LIMIT mm}", 1 / 3.0), ("strength: {safety_factor: LIMIT}", 2)]),
    ];

    public static void Print(TextWriter output)
    {
        foreach ((string name, (string Target, double Factor)[] targets) in Aims)
        {
            output.WriteLine(string.Create(
                CultureInfo.InvariantCulture, $"{name,-28}{"tubes",6}{"groups",8}{"options",8}{"seconds",9}{"analyses",9}{"status",16}{"kg",10}{"bound kg",10}"));
            foreach ((int storeys, int groups, int candidates) in Towers)
            {
                FrameModel model = Make(storeys, groups, candidates, targets);
                DiagnosticList diagnostics = [];
                long start = Stopwatch.GetTimestamp();
                SizedFrame? sized = SectionSizer.Size(model, diagnostics);
                double seconds = Stopwatch.GetElapsedTime(start).TotalSeconds;
                output.WriteLine(sized is null
                    ? string.Join('\n', diagnostics)
                    : string.Create(
                        CultureInfo.InvariantCulture,
                        $"{"",-28}{model.Tubes.Count,6}{groups,8}{candidates,8}{seconds,9:0.0}{sized.Analyses,9}{sized.Status,16}{sized.MassKg,10:0.000}{sized.BoundKg,10:0.000}"));
            }
        }
    }

    private static FrameModel Make(int storeys, int groups, int candidates, (string Target, double Factor)[] targets)
    {
        string[] easy = [.. targets.Select(t => t.Target.Replace("LIMIT", t.Factor < 1 ? "100000" : "0.0001", StringComparison.Ordinal))];
        SizedFrame lightest = SectionSizer.Size(InventedTower.Make(storeys, groups, candidates, easy), []) ?? throw new InvalidOperationException("The lightest sizes do not fit.");
        string[] hard = [.. targets.Select((t, i) => t.Target.Replace(
            "LIMIT", (t.Factor * lightest.Targets[i].Value).ToString("0.######", CultureInfo.InvariantCulture), StringComparison.Ordinal))];
        return InventedTower.Make(storeys, groups, candidates, hard);
    }
}
