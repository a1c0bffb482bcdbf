using FrameGen.Joints;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Sizing;
using FrameGen.Sizing.Explanation;
using Spectre.Console;
using static FrameGen.Output.SizingModel;

namespace FrameGen.Cli.Reports;

/// <summary>Why a tube has its size, and what cuts its ends, for a terminal: the answer first, then what it stands on.</summary>
internal sealed class ExplanationReport(Terminal terminal, TubeExplanation explanation)
{
    private static readonly ForceKind[] Forces = [ForceKind.N, ForceKind.Vy, ForceKind.Vz, ForceKind.My, ForceKind.Mz, ForceKind.T];

    private readonly SizedFrame _sized = explanation.Sized;
    private readonly FrameModel _model = explanation.Sized.Model;
    private readonly DisplayFormat _display = new(explanation.Sized.Model.Display);

    /// <summary>Prints it.</summary>
    public void Print()
    {
        PrintAnswer();
        PrintSizes();
        PrintTargets();
        PrintForces();
        PrintStress();
        PrintEnds();
        CautionsReport.Print(terminal);
    }

    private void PrintAnswer()
    {
        TubeGroup group = explanation.GroupOfTube;
        Candidate chosen = _sized.ChosenFor(explanation.Tube);
        int tubes = _model.Tubes.Count(t => t.Group == explanation.Group);
        string shared = tubes switch
        {
            1 => $"the only tube of group {group.Name}",
            2 => $"both tubes of group {group.Name}",
            _ => $"all {ExplanationWords.Whole(tubes)} tubes of group {group.Name}",
        };
        string mass = $"{_display.MassPerLengthNumber(chosen.Section.MassPerMetre(group.Material.Density))} {_display.MassPerLengthUnitName}";
        Line($"{_model.Tubes[explanation.Tube].Name}: {_display.Section(chosen)}, {group.Material.Name}, {mass}, {shared}");
        foreach (string line in ExplanationWords.Why(explanation, _display))
        {
            Line(line);
        }
    }

    private void PrintSizes()
    {
        if (explanation.Lighter.Count + explanation.Heavier.Count == 0)
        {
            return;
        }

        string count = explanation.LighterInAll > explanation.Lighter.Count
            ? $"The next {ExplanationWords.Whole(explanation.Lighter.Count)} of {ExplanationWords.Whole(explanation.LighterInAll)} {ExplanationWords.Lighter(explanation)} sizes"
            : $"The {ExplanationWords.Lighter(explanation)} sizes";
        string title = explanation.Heavier.Count > 0 ? "The nearest sizes in stock" : count;
        var table = new ReportTable($"{title}, all other groups as they are", "=section", explanation.IsByCost ? ">saves" : ">saves " + _display.MassUnitName, "what comes of it", ">value", ">limit", "unit");
        foreach (TriedSize size in (TriedSize[])[.. explanation.Heavier, .. explanation.Lighter])
        {
            (double value, double limit, string unit) = ExplanationWords.Measure(size, _display);
            int decimals = Decimals(limit, 3);
            bool measured = double.IsFinite(limit);
            table.Row(
                _display.Section(size.Candidate.Nominal),
                explanation.IsByCost ? ExplanationWords.Money(size.SavesCost) : _display.MassNumber(size.SavesKg),
                ExplanationWords.Outcome(_model, size),
                measured ? Fixed(value, decimals) : "",
                measured ? Fixed(limit, decimals) : "",
                unit);
        }

        table.Draw(terminal);
    }

    private void PrintTargets()
    {
        TargetDrive[] shown = [.. explanation.Targets.Where(t => t.IsActive || t.Drives).OrderByDescending(t => t.Result.Ratio).ThenBy(t => t.Result.Index)];
        if (shown.Length == 0)
        {
            if (explanation.Targets.Count > 0)
            {
                TargetDrive nearest = explanation.Targets.MaxBy(t => t.Result.Ratio)!;
                terminal.Out.WriteLine();
                Line($"{(explanation.Lighter.Count > 0 ? "These sizes break no target, and no" : "No")} target is near its limit; most used is {ExplanationWords.Name(nearest.Result)}, {Percent(nearest.Result.Ratio).Replace(' ', Terminal.TiedBlank)}.");
            }

            return;
        }

        string group = explanation.GroupOfTube.Name;
        var table = new ReportTable(
            $"Targets that drive {group}, or are near their limit", "target", ">used", "drives", ">1 % stiffer", ">1 % heavier", "its walls weigh");
        foreach (TargetDrive drive in shown)
        {
            (double scale, string unit) = _display.TargetUnit(drive.Result.Unit);
            table.Row(
                $"{ExplanationWords.Name(drive.Result)}{(drive.Result.Met ? "" : ": MISSED")}",
                Percent(drive.Result.Ratio),
                drive.Drives ? "yes" : "no",
                Slope(drive.PerStiffness),
                Slope(drive.PerMass),
                drive.KgPerUnit is { } kg ? $"{_display.MassNumber(kg / scale)} {_display.MassUnitName} per {(unit.Length > 0 ? unit : "1")}" : "-");
        }

        table.Draw(terminal);
        foreach (TargetResult target in shown.Select(s => s.Result).Where(t => t.Where.Length > 0))
        {
            Line($"{ExplanationWords.Name(target)} is decided by {target.Where}.");
        }

        Line(
            $"1 % stiffer, 1 % heavier: by how many percent of the limit the share used changes when {group} are 1 % stiffer in every way, or have 1 % more mass in "
            + "their walls. The last column: what moving the limit by one unit costs in their walls alone. Central differences of exact reanalyses.");
    }

    private void PrintForces()
    {
        if (_sized.Cases.Count == 0)
        {
            return;
        }

        string f = _display.ForceUnitName;
        string m = _display.MomentUnitName;
        string l = _display.LengthUnitName;
        var table = new ReportTable("Forces along it, tension positive; places from its start", "case", "force", ">lowest", ">at " + l, ">highest", ">at " + l);
        foreach (CaseResult result in _sized.Cases)
        {
            string name = _model.Cases[result.Case].Name;
            TubeDiagram diagram = result.Tubes[explanation.Tube].Diagram;
            foreach (ForceKind kind in Forces)
            {
                bool force = kind is ForceKind.N or ForceKind.Vy or ForceKind.Vz;
                ForceExtreme low = diagram.Lowest(kind);
                ForceExtreme high = diagram.Highest(kind);
                string lowest = force ? _display.ForceNumber(low.Value) : _display.MomentNumber(low.Value);
                string highest = force ? _display.ForceNumber(high.Value) : _display.MomentNumber(high.Value);
                if (IsZero(lowest) && IsZero(highest))
                {
                    continue;
                }

                table.Row(name, $"{kind} {(force ? f : m)}", lowest, _display.LengthNumber(low.At), highest, _display.LengthNumber(high.At));
                name = "";
            }

            if (name.Length > 0)
            {
                table.Row(name, "none", "", "", "", "");
            }
        }

        table.Draw(terminal);
    }

    private static bool IsZero(string number) => number.AsSpan().IndexOfAnyInRange('1', '9') < 0;

    private void PrintStress()
    {
        if (_sized.Cases.Count == 0)
        {
            return;
        }

        int decimals = Decimals(_sized.Cases.Max(c => c.Tubes[explanation.Tube].MaxStress), 4);
        var table = new ReportTable("Stress in it", "case", ">MPa", ">of yield", ">used", "where", "from");
        foreach (CaseResult result in _sized.Cases)
        {
            TubeForces forces = result.Tubes[explanation.Tube];
            table.Row(
                _model.Cases[result.Case].Name,
                Fixed(forces.Use?.Stress ?? forces.MaxStress, decimals),
                forces.Use is { } use ? Fixed(use.Yield, 0) : "-",
                forces.Use is { } used ? Percent(used.Share) : "-",
                forces.Use is { Share: > 0 } at ? CaseRow.Place(_model, explanation.Tube, at, _display) : "-",
                forces.Use is { Share: > 0 } from ? Tied(CaseRow.Shares(from.Shares)) : "-");
        }

        table.Draw(terminal);
    }

    // Lines break between the shares only.
    private static string Tied(string shares) => shares.Replace(' ', Terminal.TiedBlank).Replace($",{Terminal.TiedBlank}", ", ", StringComparison.Ordinal);

    private void PrintEnds()
    {
        const double Visible = 0.05;
        var table = new ReportTable("What cuts its ends", "end", "node", "cut", "fits", ">angle deg", ">clock deg", ">offset " + _display.LengthUnitName);
        foreach (ExplainedEnd end in explanation.Ends)
        {
            string[] head = [EndText.Name(end.End), _model.Nodes[end.Joint.Node].Name, EndText.Kind(end.Kind)];
            if (end.Contacts.Count == 0)
            {
                table.Row([.. head, end.RunsOut > Visible ? $"runs out {_display.Length(end.RunsOut)}" : "-", "-", "-", "-"]);
            }

            foreach (Contact contact in end.Contacts)
            {
                table.Row([
                    .. head,
                    _model.Tubes[contact.Tube].Name,
                    FixedDigits.Tenths(double.RadiansToDegrees(contact.Angle)),
                    contact.Clock is { } clock ? FixedDigits.Tenths(Math.Round(double.RadiansToDegrees(clock), 1) % (contact.SquareCrossing ? 180 : 360)) : "-",
                    contact.Offset >= Visible ? _display.MeasuredNumber(contact.Offset) : "-",
                ]);
                head = ["", "", ""];
            }
        }

        table.Draw(terminal);
        foreach (ExplainedEnd end in explanation.Ends)
        {
            Line(ExplanationWords.Order(_model, end));
        }
    }

    private static string Slope(double? slope) => slope is { } s ? $"{(Math.Round(100 * s, 3) > 0 ? "+" : "")}{Fixed(s, 3)}" : "-";

    private void Line(string text) => terminal.Draw(new Text(text));
}
