using System.Text;
using System.Text.Json;
using FrameGen.Joints;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Sizing;
using FrameGen.Sizing.Explanation;

namespace FrameGen.Cli.Reports;

/// <summary>
/// An explanation as JSON, in mm, N, N·mm, MPa, kg and degrees: <c>{"format": "framegen-explain/1", "exit_code", "tube", "group", "section", "origin", "status",
/// "today", "objective", "lighter_in_all", "lighter": [{"section", "list", "saves_kg", "saves_cost", "verdict", "refusal", "broken": [{"index", "kind", "label", "value", "limit", "unit",
/// "ratio"}]}], "heavier", "targets": [{"index", …, "active", "drives", "per_stiffness", "per_mass", "kg_per_unit"}], "cases": {NAME: {"forces": {"n": {"lowest",
/// "lowest_at_mm", "highest", "highest_at_mm"}, "vy", "vz", "t", "my", "mz"}, "stress_mpa", "at_mm", "yield_mpa", "used", "near_weld", "shares"}}, "ends": {"from":
/// {"node", "cut", "cut_made", "order", "order_written", "runs_out_mm", "fits": [{"tube", "angle_deg", "clock_deg", "offset_mm"}], "problems"}, "to"}}</c>.
/// </summary>
internal static class ExplanationJson
{
    /// <summary>Prints the object on standard output.</summary>
    public static void Print(Terminal terminal, int exitCode, TubeExplanation explanation)
    {
        SizedFrame sized = explanation.Sized;
        byte[] bytes = JsonText.Bytes(json =>
        {
            json.WriteStartObject();
            json.WriteString("format", "framegen-explain/1");
            json.WriteNumber("exit_code", exitCode);
            json.WriteString("tube", sized.Model.Tubes[explanation.Tube].Name);
            json.WriteString("group", explanation.GroupOfTube.Name);
            json.WriteString("section", sized.ChosenFor(explanation.Tube).Nominal.Name);
            json.WriteString("origin", Word(explanation.Origin));
            json.WriteString("status", SizingJson.StatusWord(sized.Status));
            json.WriteString("today", explanation.Today?.Nominal.Name);
            json.WriteString("objective", explanation.IsByCost ? "cost" : "mass");
            json.WriteNumber("lighter_in_all", explanation.LighterInAll);
            WriteSizes(json, "lighter", explanation.Lighter);
            WriteSizes(json, "heavier", explanation.Heavier);
            WriteTargets(json, explanation);
            json.WriteStartObject("cases");
            foreach (CaseResult result in sized.Cases)
            {
                WriteCase(json, sized.Model.Cases[result.Case].Name, result.Tubes[explanation.Tube]);
            }

            json.WriteEndObject();
            json.WriteStartObject("ends");
            foreach (ExplainedEnd end in explanation.Ends)
            {
                WriteEnd(json, sized.Model, end);
            }

            json.WriteEndObject();
            json.WriteEndObject();
        });
        terminal.Out.Write(Encoding.UTF8.GetString(bytes));
    }

    private static string Word(SizeOrigin origin) => origin switch
    {
        SizeOrigin.Chosen => "chosen",
        SizeOrigin.OnlyOne => "only-one",
        SizeOrigin.Frozen => "frozen",
        _ => "given",
    };

    private static string Word(SizeVerdict verdict) => verdict switch
    {
        SizeVerdict.WouldDo => "would-do",
        SizeVerdict.BreaksTarget => "breaks-target",
        SizeVerdict.DoesNotFit => "does-not-fit",
        SizeVerdict.TooManySizes => "too-many-sizes",
        _ => "cannot-be-solved",
    };

    private static void WriteSizes(Utf8JsonWriter json, string name, IReadOnlyList<TriedSize> sizes)
    {
        json.WriteStartArray(name);
        foreach (TriedSize size in sizes)
        {
            json.WriteStartObject();
            json.WriteString("section", size.Candidate.Nominal.Name);
            json.WriteString("list", size.Candidate.StockList);
            json.Number("saves_kg", size.SavesKg);
            json.Number("saves_cost", size.SavesCost);
            json.WriteString("verdict", Word(size.Verdict));
            json.WriteString("refusal", size.Refusal);
            json.WriteStartArray("broken");
            foreach (TargetResult target in size.Broken)
            {
                json.WriteStartObject();
                WriteTarget(json, target);
                json.WriteEndObject();
            }

            json.WriteEndArray();
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteTargets(Utf8JsonWriter json, TubeExplanation explanation)
    {
        json.WriteStartArray("targets");
        foreach (TargetDrive drive in explanation.Targets)
        {
            json.WriteStartObject();
            WriteTarget(json, drive.Result);
            json.WriteBoolean("active", drive.IsActive);
            json.WriteBoolean("drives", drive.Drives);
            json.Number("per_stiffness", drive.PerStiffness);
            json.Number("per_mass", drive.PerMass);
            json.Number("kg_per_unit", drive.KgPerUnit);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteTarget(Utf8JsonWriter json, TargetResult target)
    {
        json.WriteNumber("index", target.Index);
        json.WriteString("kind", target.Kind);
        json.WriteString("label", target.Label);
        json.Number("value", target.Value);
        json.Number("limit", target.Limit);
        json.WriteString("unit", target.Unit);
        json.Number("ratio", target.Ratio);
    }

    private static void WriteCase(Utf8JsonWriter json, string name, TubeForces forces)
    {
        json.WriteStartObject(name);
        json.WriteStartObject("forces");
        foreach (ForceKind kind in Enum.GetValues<ForceKind>())
        {
            ForceExtreme low = forces.Diagram.Lowest(kind);
            ForceExtreme high = forces.Diagram.Highest(kind);
            json.WriteStartObject(kind.ToString().ToLowerInvariant());
            json.Number("lowest", low.Value);
            json.Number("lowest_at_mm", low.At);
            json.Number("highest", high.Value);
            json.Number("highest_at_mm", high.At);
            json.WriteEndObject();
        }

        json.WriteEndObject();
        json.Number("stress_mpa", forces.Use?.Stress ?? forces.MaxStress);
        json.Number("at_mm", forces.Use?.At ?? forces.MaxStressAt);
        json.Number("yield_mpa", forces.Use?.Yield);
        json.Number("used", forces.Use?.Share);
        if (forces.Use is { } use)
        {
            json.WriteBoolean("near_weld", use.NearWeld);
            AnalysisJson.WriteShares(json, use.Shares);
        }

        json.WriteEndObject();
    }

    private static void WriteEnd(Utf8JsonWriter json, FrameModel model, ExplainedEnd end)
    {
        json.WriteStartObject(EndText.Name(end.End));
        json.WriteString("node", model.Nodes[end.Joint.Node].Name);
        json.WriteString("cut", EndText.Kind(end.Kind));
        json.WriteBoolean("cut_made", end.IsCut);
        json.Strings("order", end.Joint.Tubes.Select(t => model.Tubes[t].Name));
        json.WriteBoolean("order_written", end.OrderIsWritten);
        json.Number("runs_out_mm", end.RunsOut);
        json.WriteStartArray("fits");
        foreach (Contact contact in end.Contacts)
        {
            json.WriteStartObject();
            json.WriteString("tube", model.Tubes[contact.Tube].Name);
            json.Number("angle_deg", double.RadiansToDegrees(contact.Angle));
            json.Number("clock_deg", contact.Clock is { } clock ? double.RadiansToDegrees(clock) : null);
            json.Number("offset_mm", contact.Offset);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.Strings("problems", end.Problems);
        json.WriteEndObject();
    }
}
