using System.Text.Json;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Output;

/// <summary>The part of frame.json that sizing decides: what it was made from, sections, targets, load cases.</summary>
internal static class SizingJson
{
    /// <summary>Writes the properties into an object that is open.</summary>
    public static void WriteProperties(Utf8JsonWriter json, SizedFrame sized)
    {
        WriteOrigin(json, sized.Model.Spec);
        WriteSizing(json, sized);
        WriteGroups(json, sized);
        WriteTargets(json, sized);
        WriteCases(json, sized);
        if (sized.Frequencies is { } frequencies && sized.Model.Targets.Any(t => t is FrequencyTarget))
        {
            json.Numbers("frequencies_hz", [.. frequencies]);
        }
    }

    /// <summary>The word for a status: <c>proven-lightest</c>, <c>best-found</c>, <c>fixed</c>, <c>unmet</c>.</summary>
    public static string StatusWord(SizingStatus status) => status switch
    {
        SizingStatus.ProvenLightest => "proven-lightest",
        SizingStatus.BestFound => "best-found",
        SizingStatus.Fixed => "fixed",
        _ => "unmet",
    };

    private static void WriteOrigin(Utf8JsonWriter json, SpecIdentity spec)
    {
        json.WriteStartObject("spec");
        json.WriteString("file", spec.FileName);
        json.WriteString("title", spec.Title);
        json.WriteString("revision", spec.Revision);
        json.WriteString("sha256", spec.Sha256);
        json.WriteEndObject();
        json.WriteStartObject("tool");
        json.WriteString("name", ToolIdentity.Name);
        json.WriteString("version", ToolIdentity.Version);
        json.WriteEndObject();
    }

    private static void WriteSizing(Utf8JsonWriter json, SizedFrame sized)
    {
        json.WriteStartObject("sizing");
        json.WriteString("status", StatusWord(sized.Status));
        json.WriteString("objective", sized.Model.Sizing.Objective == SizingObjective.Cost ? "cost" : "mass");
        json.Number("mass_kg", sized.MassKg);
        json.Number("bound_kg", sized.BoundKg);
        if (sized.Model.Sizing.Objective == SizingObjective.Cost)
        {
            json.Number("cost", sized.Cost);
            json.Number("bound_cost", sized.BoundCost);
        }

        json.WriteNumber("analyses", sized.Analyses);
        if (sized.Fits is { } fits)
        {
            WriteFits(json, sized.Model, fits);
        }

        if (sized.Model.Frozen is { } frozen)
        {
            WriteFrozen(json, sized, frozen);
        }

        json.WriteEndObject();
    }

    private static void WriteFits(Utf8JsonWriter json, FrameModel model, FitCost fits)
    {
        json.WriteStartObject("fits");
        json.Number("lighter_kg", fits.LighterKg);
        if (fits.Cheaper is { } cheaper)
        {
            json.Number("cheaper", cheaper);
        }

        json.WriteStartArray("joints");
        foreach (FitRule rule in fits.Rules)
        {
            json.WriteStartObject();
            json.WriteString("node", model.Nodes[rule.Node].Name);
            json.WriteString("group", rule.Group);
            json.WriteString("seat_group", rule.SeatGroup);
            json.WriteString("text", rule.Text);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void WriteFrozen(Utf8JsonWriter json, SizedFrame sized, FrozenSizes frozen)
    {
        json.WriteStartObject("frozen");
        json.WriteString("file", frozen.FileName);
        json.WriteString("sha256", frozen.Sha256);
        json.WriteString("tool", frozen.Tool);
        if (sized.Today is { } today)
        {
            json.WriteStartObject("today");
            json.WriteString("status", StatusWord(today.Status));
            json.Number("mass_kg", today.MassKg);
            json.WriteStartObject("groups");
            for (int g = 0; g < today.Chosen.Count; g++)
            {
                json.WriteString(today.Model.Groups[g].Name, today.Chosen[g].Nominal.Name);
            }

            json.WriteEndObject();
            json.WriteEndObject();
        }

        json.WriteEndObject();
    }

    private static void WriteGroups(Utf8JsonWriter json, SizedFrame sized)
    {
        json.WriteStartObject("groups");
        for (int i = 0; i < sized.Model.Groups.Count; i++)
        {
            TubeGroup group = sized.Model.Groups[i];
            Section section = sized.Sections[i];
            json.WriteStartObject(group.Name);
            json.WriteString("material", group.Material.Name);
            json.WriteString("section", sized.Chosen[i].Nominal.Name);
            json.WriteString("shape", section.Shape);
            if (section is RoundTube or Rod)
            {
                json.Number("od_mm", section.OuterSize);
            }
            else
            {
                json.Number("height_mm", section.Height);
                json.Number("width_mm", section.Width);
            }

            json.Number("wall_mm", section.Wall);
            json.Number("area_mm2", section.Area);
            json.Number("iy_mm4", section.Iy);
            json.Number("iz_mm4", section.Iz);
            json.Number("j_mm4", section.J);
            json.Number("mass_kg_per_m", section.MassPerMetre(group.Material.Density));
            json.WriteNumber("candidates", group.Candidates.Count);
            json.WriteEndObject();
        }

        json.WriteEndObject();
    }

    private static void WriteTargets(Utf8JsonWriter json, SizedFrame sized)
    {
        json.WriteStartArray("targets");
        foreach (TargetResult target in sized.Targets)
        {
            json.WriteStartObject();
            json.WriteNumber("id", target.Index + 1);
            json.WriteString("kind", target.Kind);
            json.WriteString("text", target.Where.Length > 0 ? $"{target.Label} ({target.Where})" : target.Label);
            json.Number("value", target.Value);
            json.Number("limit", target.Limit);
            json.WriteString("unit", target.Unit);
            json.Number("ratio", target.Ratio);
            json.WriteBoolean("met", target.Met);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteCases(Utf8JsonWriter json, SizedFrame sized)
    {
        json.WriteStartObject("cases");
        foreach (CaseResult result in sized.Cases)
        {
            LoadCase loadCase = sized.Model.Cases[result.Case];
            json.WriteStartObject(loadCase.Name);
            WriteMovements(json, sized.Model, result);
            WriteReactions(json, sized.Model, loadCase, result);
            WriteForces(json, sized.Model, result);
            json.Number("buckling_factor", result.BucklingFactor);
            json.WriteEndObject();
        }

        json.WriteEndObject();
    }

    private static void WriteForces(Utf8JsonWriter json, FrameModel model, CaseResult result)
    {
        // Where all axial forces are noise, what the supports carry tells it.
        double force = Largest([.. result.Reactions.Select(r => (Vector3?)r.Force)]);
        double stress = 0;
        foreach (TubeForces tube in result.Tubes)
        {
            force = Math.Max(force, Math.Max(Math.Abs(tube.AxialFrom), Math.Abs(tube.AxialTo)));
            stress = Math.Max(stress, tube.MaxStress);
        }

        json.WriteStartObject("tubes");
        for (int i = 0; i < result.Tubes.Count; i++)
        {
            TubeForces tube = result.Tubes[i];
            json.WriteStartObject(model.Tubes[i].Name);
            json.Number("max_stress_mpa", JsonText.Quiet(tube.MaxStress, stress));
            json.Numbers("axial_n", JsonText.Quiet(tube.AxialFrom, force), JsonText.Quiet(tube.AxialTo, force));
            json.WriteEndObject();
        }

        json.WriteEndObject();
    }

    private static void WriteMovements(Utf8JsonWriter json, FrameModel model, CaseResult result)
    {
        double shift = Largest(result.Displacements);
        double turn = Largest(result.Rotations);
        json.WriteStartObject("nodes");
        for (int i = 0; i < model.Nodes.Count; i++)
        {
            if (result.Displacements[i] is { } displacement && result.Rotations[i] is { } rotation)
            {
                json.WriteStartObject(model.Nodes[i].Name);
                json.Vector("displacement_mm", displacement, shift);
                json.Vector("rotation_rad", rotation, turn);
                json.WriteEndObject();
            }
        }

        json.WriteEndObject();
    }

    private static void WriteReactions(Utf8JsonWriter json, FrameModel model, LoadCase loadCase, CaseResult result)
    {
        double force = Largest([.. result.Reactions.Select(r => (Vector3?)r.Force)]);
        double moment = Largest([.. result.Reactions.Select(r => (Vector3?)r.Moment)]);
        json.WriteStartObject("reactions");
        for (int i = 0; i < result.Reactions.Count; i++)
        {
            json.WriteStartObject(model.Nodes[model.Supports[loadCase.Supports[i]].Node].Name);
            json.Vector("force_n", result.Reactions[i].Force, force);
            json.Vector("moment_nmm", result.Reactions[i].Moment, moment);
            json.WriteEndObject();
        }

        json.WriteEndObject();
    }

    private static double Largest(IReadOnlyList<Vector3?> vectors)
    {
        double largest = 0;
        foreach (Vector3? vector in vectors)
        {
            largest = Math.Max(largest, vector?.Length ?? 0);
        }

        return largest;
    }
}
