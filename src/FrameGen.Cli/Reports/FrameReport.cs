using System.Globalization;
using FrameGen.Geometry;
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
    private readonly SizingModel _found = SizingModel.From(sized);

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
        foreach (GroupSize group in _found.Groups)
        {
            inHand = measured ? [group.Measured] : [];
            table.Row([group.Group, group.Material, group.Section, .. inHand, group.MassPerLength, Whole(group.Tubes), group.Source]);
        }

        table.Draw(terminal);
        terminal.Draw(new Text(_found.Verdict));
    }

    /// <summary>Each target with its value, limit, share used and margin.</summary>
    public void PrintTargets()
    {
        if (_found.Targets.Count == 0)
        {
            terminal.Out.WriteLine();
            terminal.Out.WriteLine("No targets: nothing limits the sizes.");
            return;
        }

        var table = new ReportTable("Targets", "target", ">value", ">limit", "unit", ">used", ">margin", string.Empty);
        foreach (TargetRow target in _found.Targets)
        {
            string[] cells = [target.Name, target.Value, target.Limit, target.Unit, target.Used, target.Margin, target.Met ? "met" : "MISSED"];
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
            terminal.Out.WriteLine($"{SizingModel.Percent(target.Ratio),6} used: {target.Kind} of {target.Label}{where}");
        }
    }

    /// <summary>For each case the node that moves most and the most used tube, with what its stress comes from.</summary>
    public void PrintCases()
    {
        if (_found.Cases.Count == 0)
        {
            return;
        }

        var table = new ReportTable(
            "Load cases", "case", ">moves " + _display.LengthUnitName, "at node", ">stress MPa", ">used", "in tube", ">at " + _display.LengthUnitName);
        foreach (CaseRow row in _found.Cases)
        {
            table.Row(row.Case, row.Moves, row.Node, row.Stress, row.Used.Length > 0 ? row.Used : "-", row.Tube, row.At);
        }

        table.Draw(terminal);
        foreach (CaseRow row in _found.Cases.Where(r => r.Why.Length > 0))
        {
            terminal.Draw(new Text($"{row.Case}: {row.Tube} {row.Why}"));
        }

        double error = sized.Cases.Max(c => Math.Max(c.EquilibriumError, c.BackwardError));
        terminal.Out.WriteLine(
            error > 0
                ? $"Loads, inner forces and reactions balance to within 1e{Whole((int)Math.Ceiling(Math.Log10(error)))} of their size."
                : "Loads, inner forces and reactions balance.");
    }

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

    private static string Whole(int count) => count.ToString(CultureInfo.InvariantCulture);
}
