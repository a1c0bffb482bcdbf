using System.Text.Json;
using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>frame.json: everything computed.</summary>
public static class FrameJson
{
    private const int StepDegrees = 5;

    /// <summary>Writes the file.</summary>
    public static byte[] Write(ShopPackage package) => JsonText.Bytes(json => WriteObject(json, package));

    /// <summary>Writes the whole as one object.</summary>
    public static void WriteObject(Utf8JsonWriter json, ShopPackage package)
    {
        json.WriteStartObject();
        json.WriteString("format", "framegen-frame/1");
        SizingJson.WriteProperties(json, package.Cut.Sized);
        WriteTubes(json, package);
        WriteParts(json, package);
        WriteStockPlan(json, package.Stock);
        WriteTotals(json, package);
        json.WriteEndObject();
    }

    /// <summary>Writes what is known before the ends are cut, as one object.</summary>
    public static void WriteObject(Utf8JsonWriter json, SizedFrame sized)
    {
        json.WriteStartObject();
        json.WriteString("format", "framegen-frame/1");
        SizingJson.WriteProperties(json, sized);
        json.WriteEndObject();
    }

    private static void WriteTubes(Utf8JsonWriter json, ShopPackage package)
    {
        SizedFrame sized = package.Cut.Sized;
        string[] marks = PartMarks.ByTube(package);
        json.WriteStartObject("tubes");
        foreach (CutTube cut in package.Cut.Tubes)
        {
            Tube tube = sized.Model.Tubes[cut.Tube];
            json.WriteStartObject(tube.Name);
            json.WriteString("mark", marks[cut.Tube]);
            json.WriteString("group", sized.Model.Groups[tube.Group].Name);
            json.Number("axis_length_mm", tube.Length);
            json.Number("cut_length_mm", cut.CutLength);
            json.Number("volume_mm3", cut.Volume);
            json.Number("mass_kg", cut.MassKg);
            json.Vector("top", tube.Axes.Z, 1);
            WriteBends(json, sized.Model, cut);
            json.WriteStartObject("ends");
            WriteEnd(json, sized, cut, End.From);
            WriteEnd(json, sized, cut, End.To);
            json.WriteEndObject();
            json.WriteEndObject();
        }

        json.WriteEndObject();
    }

    // Of bent tubes only.
    private static void WriteBends(Utf8JsonWriter json, FrameModel model, CutTube cut)
    {
        IReadOnlyList<BendStep> steps = BendStep.Of(model, cut);
        if (steps.Count == 0)
        {
            return;
        }

        json.WriteStartArray("bends");
        foreach (BendStep step in steps)
        {
            json.WriteStartObject();
            json.Number("straight_mm", step.Straight);
            json.Number("start_mm", step.Start);
            json.Number("rotation_deg", JsonText.Quiet(double.RadiansToDegrees(step.Bend.Rotation), 1));
            json.Number("angle_deg", double.RadiansToDegrees(step.Bend.Angle));
            json.Number("machine_angle_deg", double.RadiansToDegrees(step.MachineAngle));
            json.Number("radius_mm", step.Bend.Radius);
            json.Number("clock_deg", JsonText.Quiet(double.RadiansToDegrees(step.Bend.Clock), 1));
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteEnd(Utf8JsonWriter json, SizedFrame sized, CutTube tube, End end)
    {
        EndCut cut = tube[end];
        json.WriteStartObject(EndText.Name(end));
        json.WriteString("cut", EndText.Kind(cut.Kind));
        json.WriteStartArray("by");
        foreach (Contact mate in cut.Contacts)
        {
            json.WriteStartObject();
            json.WriteString("tube", sized.Model.Tubes[mate.Tube].Name);
            json.Number("angle_deg", double.RadiansToDegrees(mate.Angle));
            json.Number("offset_mm", mate.Offset);
            json.Number("clock_deg", mate.Clock is { } clock ? ClockDegrees(clock, mate.SquareCrossing ? 180 : 360) : null);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.NumberRows("curve", Curve(sized, tube, end));
        json.WriteEndObject();
    }

    /// <summary>In [0, <paramref name="turn"/>): what nine digits round to a whole turn is 0.</summary>
    private static double ClockDegrees(double clock, double turn)
    {
        double degrees = double.RadiansToDegrees(clock);
        return degrees > turn - 5e-7 ? 0 : degrees;
    }

    /// <summary>Rows of clock angle in degrees, outer y and inner y, every 5 degrees from −180 to 175.</summary>
    private static IEnumerable<double[]> Curve(SizedFrame sized, CutTube tube, End end)
    {
        EndSurface surface = tube[end].Surface;
        Section section = sized.SectionOf(tube.Tube);
        double length = sized.Model.Tubes[tube.Tube].Length;
        double Y(double t) => JsonText.Quiet(end == End.From ? t : length - t, section.OuterSize / 2);
        for (int degrees = -180; degrees < 180; degrees += StepDegrees)
        {
            double clock = double.DegreesToRadians(degrees);
            double outerY = Y(surface.At(clock, section.Outline));
            double innerY = Y(surface.At(clock, section.Bore));
            yield return [degrees, outerY, innerY];
        }
    }

    private static void WriteParts(Utf8JsonWriter json, ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        json.WriteStartArray("parts");
        foreach (Part part in package.Parts)
        {
            json.WriteStartObject();
            json.WriteString("mark", part.Mark);
            json.WriteNumber("quantity", part.Quantity);
            json.Strings("tubes", part.Tubes.Select(t => model.Tubes[t].Name));
            json.WriteString("hand", part.Hand);
            json.Number("cut_length_mm", part.Drawn.CutLength);
            json.Number("mass_kg", part.Drawn.MassKg);
            json.WriteStartArray("placed");
            foreach (Placement placed in part.Placed)
            {
                json.WriteStartObject();
                json.WriteString("tube", model.Tubes[placed.Tube].Name);
                json.Number("turn_deg", double.RadiansToDegrees(placed.Turn));
                json.WriteBoolean("swapped", placed.Swapped);
                json.WriteEndObject();
            }

            json.WriteEndArray();
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteStockPlan(Utf8JsonWriter json, StockPlan plan)
    {
        json.WriteStartArray("stock_plan");
        foreach (StockLot lot in plan.Lots)
        {
            json.WriteStartObject();
            json.WriteString("material", lot.Material);
            json.WriteString("section", lot.Section.Name);
            json.Number("bar_mm", lot.BarLength);
            json.WriteNumber("bars", lot.Bars.Count);
            json.WriteNumber("lower_bound", lot.LowerBound);
            json.StringRows("cuts", lot.Bars.Select(b => b.Cuts.Select(c => c.Part.Mark)));
            json.Numbers("offcut_mm", [.. lot.Bars.Select(b => b.Offcut)]);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteTotals(Utf8JsonWriter json, ShopPackage package)
    {
        Totals totals = package.Totals;
        Vector3 centre = totals.CentreOfMass;
        json.WriteStartObject("totals");
        json.Number("mass_kg", totals.MassKg);
        json.Vector("centre_of_mass_mm", centre, Math.Max(1, centre.Length));
        json.Number("weld_length_mm", totals.WeldLength);
        json.Number("outer_area_m2", totals.OuterArea / 1e6);
        json.Number("cost", package.Stock.Cost);
        json.WriteEndObject();
    }
}
