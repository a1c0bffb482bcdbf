using System.Text.Json;
using FrameGen.Geometry;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Sizing;

namespace FrameGen.Cli.Reports;

/// <summary>
/// What <c>check</c> prints of the analysis, as <c>analysis</c> beside <c>frame</c>: <c>{"cases": {NAME: {"largest_displacement": {"node", "mm"}, "most_used": {"tube", "at_mm",
/// "near_node", "from_node_mm", "stress_mpa", "yield_mpa", "used", "near_weld", "shares": {"axial", "bending", "torsion", "shear"}}, "buckling_factor", "buckles_at",
/// "residual_below"}}, "frequencies_hz"}</c>.
/// </summary>
internal static class AnalysisJson
{
    /// <summary>Writes the property into an object that is open.</summary>
    public static void Write(Utf8JsonWriter json, SizedFrame sized)
    {
        json.WriteStartObject("analysis");
        json.WriteStartObject("cases");
        foreach (CaseResult result in sized.Cases)
        {
            json.WriteStartObject(sized.Model.Cases[result.Case].Name);
            WriteMost(json, sized.Model, result);
            json.Number("buckling_factor", result.BucklingFactor);
            json.WriteString("buckles_at", result.BucklesAt);
            json.Number("residual_below", Above(Math.Max(result.EquilibriumError, result.BackwardError)));
            json.WriteEndObject();
        }

        json.WriteEndObject();
        if (sized.Frequencies is { } frequencies)
        {
            json.Numbers("frequencies_hz", [.. frequencies]);
        }

        json.WriteEndObject();
    }

    private static void WriteMost(Utf8JsonWriter json, FrameModel model, CaseResult result)
    {
        (int node, Vector3 shift) = result.LargestDisplacement();
        json.WriteStartObject("largest_displacement");
        json.WriteString("node", model.Nodes[node].Name);
        json.Number("mm", shift.Length);
        json.WriteEndObject();

        int tube = result.MostUsedTube();
        TubeForces forces = result.Tubes[tube];
        double at = forces.Use?.At ?? forces.MaxStressAt;
        (int near, double distance) = model.NearestNode(tube, at);
        json.WriteStartObject("most_used");
        json.WriteString("tube", model.Tubes[tube].Name);
        json.Number("at_mm", at);
        json.WriteString("near_node", model.Nodes[near].Name);
        json.Number("from_node_mm", distance);
        json.Number("stress_mpa", forces.Use?.Stress ?? forces.MaxStress);
        json.Number("yield_mpa", forces.Use?.Yield);
        json.Number("used", forces.Use?.Share);
        if (forces.Use is { } use)
        {
            json.WriteBoolean("near_weld", use.NearWeld);
            WriteShares(json, use.Shares);
        }

        json.WriteEndObject();
    }

    /// <summary>Writes what a stress comes from as <c>shares</c>.</summary>
    public static void WriteShares(Utf8JsonWriter json, StressShares shares)
    {
        json.WriteStartObject("shares");
        json.Number("axial", JsonText.Quiet(shares.Axial, 1));
        json.Number("bending", JsonText.Quiet(shares.Bending, 1));
        json.Number("torsion", JsonText.Quiet(shares.Torsion, 1));
        json.Number("shear", JsonText.Quiet(shares.Shear, 1));
        json.WriteEndObject();
    }

    /// <summary>The power of ten that an error is below: its digits are rounding.</summary>
    private static double Above(double error) => error > 0 ? Math.Pow(10, Math.Ceiling(Math.Log10(error))) : 0;
}
