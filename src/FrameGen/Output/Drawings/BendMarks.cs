using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>A bent part's marks on its papers: where bends begin and end, and the line along the inside of each.</summary>
internal static class BendMarks
{
    /// <summary>The bends of the drawn part; none of a straight one.</summary>
    public static IReadOnlyList<BendStep> Of(PartPattern pattern) => BendStep.Of(pattern.Sized.Model, pattern.Part.Drawn);

    /// <summary>y of the lines across the developed pattern at which bends begin and end.</summary>
    public static IEnumerable<double> Tangents(PartPattern pattern) => Of(pattern).SelectMany(s => (double[])[s.Bend.Start, s.Bend.Stop]);

    /// <summary>Bends whose inside is marked at an end: the first, and at the to end also the last where it lies in another plane.</summary>
    public static IEnumerable<BendStep> AtEnd(PartPattern pattern, End end)
    {
        const double Same = 1e-6;
        IReadOnlyList<BendStep> steps = Of(pattern);
        return steps.Where((s, i) => i == 0
            || (end == End.To && i == steps.Count - 1 && Math.Abs(Math.IEEERemainder(s.Bend.Clock - steps[0].Bend.Clock, 2 * Math.PI)) > Same));
    }

    /// <summary>x of the inside of a bend on the outer surface.</summary>
    public static double Inside(PartPattern pattern, BendStep step) => pattern.Section.Outline.DistanceAt(step.Bend.Clock);

    /// <summary>Lines on the developed pattern: across at each tangent, along the inside of each bend; of the first from the from end on.</summary>
    public static void Draw(PartPattern pattern, List<Shape> shapes)
    {
        double half = pattern.Perimeter / 2;
        double text = pattern.TextHeight;
        foreach (BendStep step in Of(pattern))
        {
            double inside = Inside(pattern, step);
            (double start, double stop) = (step.Bend.Start, step.Bend.Stop);
            shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(-half, start), new(half, start)));
            shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(-half, stop), new(half, stop)));
            shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(inside, step.Bend.Number == 1 ? pattern.From.At(inside) : start), new(inside, stop)));

            // Names stand inside the bend, where they have room.
            if (stop - start < 5 * text)
            {
                continue;
            }

            string number = step.Bend.Number.ToString(CultureInfo.InvariantCulture);
            string name = $"BEND {number} INSIDE";
            double height = TextFit.HeightFor($"BEND {number} y 10000.0", text, half / 2);
            double width = TextFit.Width(name, height);
            double x = inside + (0.5 * height) + width > half ? inside - (0.5 * height) - width : inside + (0.5 * height);
            shapes.Add(new Text(PaperLayers.Text, new(x, ((start + stop) / 2) - (height / 2)), height, 0, name));
            Place(start, start + (0.7 * height));
            Place(stop, stop - (1.7 * height));

            void Place(double y, double line) => shapes.Add(new Text(
                PaperLayers.Text, new((0.5 * height) - half, line), height, 0, $"BEND {number} y {pattern.Display.MeasuredNumber(y)}"));
        }
    }

    /// <summary>What the label of the developed pattern says of the bends.</summary>
    public static IEnumerable<string> Words(PartPattern pattern)
    {
        IReadOnlyList<BendStep> steps = Of(pattern);
        if (steps.Count == 0)
        {
            yield break;
        }

        yield return "The pattern is that of the straight tube, before bending; lines across are where bends touch the straights";
        foreach (BendStep step in steps)
        {
            string rotate = step.Bend.Number == 1
                ? $"inside at clock {BendRow.ClockText(step.Bend)}"
                : $"rotate {Degrees(step.Bend.Rotation)}";
            string set = step.MachineAngle > step.Bend.Angle ? $" (machine {Degrees(step.MachineAngle)})" : string.Empty;
            yield return string.Create(
                CultureInfo.InvariantCulture,
                $"Bend {step.Bend.Number}: {pattern.Display.MeasuredLength(step.Start)} from the FROM end of a square-sawn blank, {rotate}, {Degrees(step.Bend.Angle)}{set}, radius {pattern.Display.MeasuredLength(step.Bend.Radius)}");
        }
    }

    /// <summary>What a wrapped piece says of the lines along the insides of bends; null on a straight tube.</summary>
    public static string? EndWords(PartPattern pattern, End end)
    {
        string[] lines = [.. AtEnd(pattern, end).Select(s =>
            string.Create(CultureInfo.InvariantCulture, $"BEND {s.Bend.Number} at clock {BendRow.ClockText(s.Bend)}"))];
        return lines.Length == 0 ? null : $"Inside of bends: {string.Join(", ", lines)}; TOP is carried round the bends with the tube";
    }

    private static string Degrees(double radians) => $"{FixedDigits.Tenths(double.RadiansToDegrees(radians))} deg";
}
