using System.Globalization;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Sizing;
using Spectre.Console;

namespace FrameGen.Cli.Reports;

/// <summary>What sizing and analysis found, as tables for a terminal.</summary>
internal sealed class FrameReport(Terminal terminal, SizedFrame sized)
{
    private readonly FrameModel _model = sized.Model;
    private readonly DisplayFormat _display = new(sized.Model.Display);

    /// <summary>Which frame, from which spec.</summary>
    public void PrintTitle()
    {
        SpecIdentity spec = _model.Spec;
        string revision = spec.Revision.Length > 0 ? $", revision {spec.Revision}" : string.Empty;
        terminal.Draw(new Text($"{spec.Title}{revision}"));
        terminal.Out.WriteLine($"{spec.FileName} {spec.Sha256[..8]}: {_model.Nodes.Count} nodes, {_model.Tubes.Count} tubes");
    }

    /// <summary>The chosen section of each group, and how sure the choice is.</summary>
    public void PrintSizes()
    {
        bool measured = sized.Chosen.Any(c => c.IsMeasured);
        string[] inHand = measured ? ["=measured"] : [];
        var table = new ReportTable(
            "Sizes", ["group", "material", "=section", .. inHand, ">" + _display.MassPerLengthUnitName, ">tubes", "from"]);
        for (int i = 0; i < _model.Groups.Count; i++)
        {
            TubeGroup group = _model.Groups[i];
            Section section = sized.Sections[i];
            inHand = measured ? [_display.Measured(sized.Chosen[i])] : [];
            table.Row([
                group.Name,
                group.Material.Name,
                _display.Section(sized.Chosen[i].Nominal),
                .. inHand,
                _display.MassPerLengthNumber(section.MassPerMetre(group.Material.Density)),
                Whole(_model.Tubes.Count(t => t.Group == i)),
                group.IsFrozen ? "frozen" : group.IsFixed ? "the spec" : $"{Whole(group.Candidates.Count)} in {sized.Chosen[i].StockList}",
            ]);
        }

        table.Draw(terminal);
        terminal.Draw(new Text(Verdict()));
    }

    /// <summary>Each target with its value, limit, share used and margin.</summary>
    public void PrintTargets()
    {
        if (sized.Targets.Count == 0)
        {
            terminal.Out.WriteLine();
            terminal.Out.WriteLine("No targets: nothing limits the sizes.");
            return;
        }

        var table = new ReportTable("Targets", "target", ">value", ">limit", "unit", ">used", ">margin", string.Empty);
        foreach (TargetResult target in sized.Targets)
        {
            // One row, one precision: that of its limit.
            (double scale, string unit) = _display.TargetUnit(target.Unit);
            int decimals = Decimals(scale * target.Limit, 3);
            string[] cells =
            [
                $"{target.Kind}: {target.Label}",
                Fixed(scale * target.Value, decimals),
                Fixed(scale * target.Limit, decimals),
                unit,
                Percent(target.Ratio),
                (target.Met ? string.Empty : "-") + Fixed(scale * Math.Abs(target.Value - target.Limit), decimals),
                target.Met ? "met" : "MISSED",
            ];
            if (target.Met)
            {
                table.Row(cells);
            }
            else
            {
                table.AlarmRow(cells);
            }
        }

        table.Draw(terminal);
    }

    /// <summary>Which targets are nearest to their limit, and where they are decided.</summary>
    public void PrintWhy()
    {
        const int Most = 5;
        terminal.Out.WriteLine();
        foreach (TargetResult target in sized.Targets.OrderByDescending(t => t.Ratio).ThenBy(t => t.Index).Take(Most))
        {
            string where = target.Where.Length > 0 ? $" ({target.Where})" : string.Empty;
            terminal.Out.WriteLine($"{Percent(target.Ratio),6} used: {target.Kind} of {target.Label}{where}");
        }
    }

    /// <summary>For each case the node that moves most and the most used tube, with what its stress comes from.</summary>
    public void PrintCases()
    {
        if (sized.Cases.Count == 0)
        {
            return;
        }

        // Stress with the decimals that give the largest of them four digits.
        int decimals = Decimals(sized.Cases.Max(c => c.Tubes.Max(t => t.MaxStress)), 4);
        var table = new ReportTable(
            "Load cases", "case", ">moves " + _display.LengthUnitName, "at node", ">stress MPa", ">used", "in tube", ">at " + _display.LengthUnitName);
        var why = new List<string>();
        foreach (CaseResult result in sized.Cases)
        {
            (int node, Vector3 shift) = result.LargestDisplacement();
            int tube = result.MostUsedTube();
            TubeForces forces = result.Tubes[tube];
            string name = _model.Cases[result.Case].Name;
            table.Row(
                name,
                _display.SmallLengthNumber(shift.Length),
                _model.Nodes[node].Name,
                Fixed(forces.Use?.Stress ?? forces.MaxStress, decimals),
                forces.Use is { } used ? Percent(used.Share) : "-",
                _model.Tubes[tube].Name,
                _display.LengthNumber(forces.Use?.At ?? forces.MaxStressAt));
            if (forces.Use is { Share: > 0 } use)
            {
                why.Add($"{name}: {_model.Tubes[tube].Name} {Place(tube, use)}, yield {Fixed(use.Yield, 0)} MPa there; {Shares(use.Shares)}");
            }
        }

        table.Draw(terminal);
        foreach (string line in why)
        {
            terminal.Draw(new Text(line));
        }

        double error = sized.Cases.Max(c => Math.Max(c.EquilibriumError, c.BackwardError));
        terminal.Out.WriteLine(
            error > 0
                ? $"Loads, inner forces and reactions balance to within 1e{Whole((int)Math.Ceiling(Math.Log10(error)))} of their size."
                : "Loads, inner forces and reactions balance.");
    }

    private string Place(int tube, TubeUse use)
    {
        (int node, double distance) = _model.NearestNode(tube, use.At);
        string near = distance < 0.5 ? $"at node {_model.Nodes[node].Name}" : $"{_display.Length(distance)} from node {_model.Nodes[node].Name}";
        return use.NearWeld ? $"{near}, in reach of a weld" : near;
    }

    private static string Shares(StressShares shares) =>
        string.Join(", ", shares.Ordered.Where(s => s.Share >= 0.005).Select(s => $"{s.Name} {(100 * s.Share).ToString("0", CultureInfo.InvariantCulture)} %"));

    /// <summary>What every support puts on the frame, case by case.</summary>
    public void PrintReactions()
    {
        if (sized.Cases.Count == 0)
        {
            return;
        }

        bool turns = _model.Supports.Any(s => s.ResistsTurning);
        string f = _display.ForceUnitName;
        string m = _display.MomentUnitName;
        string title = turns ? $"Supports push on the frame, {f} and {m}" : $"Supports push on the frame, {f}";
        ReportTable table = turns
            ? new ReportTable(title, "case", "node", ">x", ">y", ">z", ">about x", ">about y", ">about z")
            : new ReportTable(title, "case", "node", ">x", ">y", ">z", ">in all");
        foreach (CaseResult result in sized.Cases)
        {
            LoadCase loadCase = _model.Cases[result.Case];
            for (int i = 0; i < result.Reactions.Count; i++)
            {
                (Vector3 force, Vector3 moment) = result.Reactions[i];
                string[] forces = [_display.ForceNumber(force.X), _display.ForceNumber(force.Y), _display.ForceNumber(force.Z)];
                string[] rest = turns
                    ? [_display.MomentNumber(moment.X), _display.MomentNumber(moment.Y), _display.MomentNumber(moment.Z)]
                    : [_display.ForceNumber(force.Length)];
                table.Row([loadCase.Name, _model.Nodes[_model.Supports[loadCase.Supports[i]].Node].Name, .. forces, .. rest]);
            }
        }

        table.Draw(terminal);
    }

    /// <summary>At every node where tubes meet, the order in which they are fitted.</summary>
    public void PrintJoints()
    {
        var table = new ReportTable("Joints: each tube is cut to fit those before it", "node", "order", "the first");
        foreach (NodeJoint joint in sized.Joints)
        {
            string first = (joint.Through, joint.Corner) switch
            {
                ({ }, _) => "runs through",
                (_, Corner.RunOut) => "runs out",
                (_, Corner.Miter) => "two are mitred",
                (_, Corner.InLine) => "two in line",
                _ => "ends square",
            };
            if (joint.Ends.Count > (joint.Through is null ? 1 : 0))
            {
                table.Row(
                    _model.Nodes[joint.Node].Name,
                    string.Join(", ", joint.Tubes.Select(t => _model.Tubes[t].Name)),
                    first);
            }
        }

        table.Draw(terminal);
    }

    private string Verdict()
    {
        string mass = $"{_display.Mass(sized.MassKg)} on axis lengths";
        string looked = sized.Analyses == 1 ? "1 analysis" : string.Create(CultureInfo.InvariantCulture, $"{sized.Analyses:N0} analyses");
        return sized.Status switch
        {
            SizingStatus.Fixed when _model.Frozen is { } frozen => $"Frozen by {frozen.FileName}: {mass}",
            SizingStatus.Fixed => $"Given by the spec: {mass}",
            SizingStatus.ProvenLightest => $"Proven lightest: {mass} ({looked})",
            SizingStatus.BestFound => $"Best found: {mass}; nothing lighter than {_display.Mass(sized.BoundKg ?? 0)} can do ({looked})",
            _ when _model.Frozen is { } frozen => $"NOT MEETING TARGETS with the sizes that {frozen.FileName} pins: {mass}",
            _ when _model.Groups.All(g => g.IsFixed) => $"NOT MEETING TARGETS with the sections that the spec gives: {mass}",
            _ => $"NOT MEETING TARGETS; the least bad: {mass} ({looked})",
        };
    }

    private static string Whole(int count) => count.ToString(CultureInfo.InvariantCulture);

    private static string Percent(double ratio) => (100 * ratio).ToString("0.0", CultureInfo.InvariantCulture) + " %";

    /// <summary>How many decimals give a value so many significant digits; none for more than six.</summary>
    private static int Decimals(double value, int digits) =>
        double.IsFinite(value) && value != 0 ? Math.Clamp(digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 6) : 0;

    /// <summary>So many decimals, without an exponent and without a negative zero.</summary>
    private static string Fixed(double value, int decimals) =>
        !double.IsFinite(value) ? "inf" : (Math.Round(value, decimals) + 0.0).ToString("F" + Whole(decimals), CultureInfo.InvariantCulture);
}
