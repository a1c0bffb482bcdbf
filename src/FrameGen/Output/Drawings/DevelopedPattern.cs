using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>
/// A part's outer surface laid flat, full length, seen from outside: x round the tube from the top line, growing with the clock angle,
/// y along the axis from the from point.
/// </summary>
internal static class DevelopedPattern
{
    /// <summary>Draws a part: one closed line on CUT.</summary>
    /// <param name="package">The frame's papers.</param>
    /// <param name="part">One of its parts.</param>
    public static Drawing Draw(ShopPackage package, Part part)
    {
        var pattern = new PartPattern(package, part);
        var shapes = new List<Shape>
        {
            new Polyline(PaperLayers.Cut, [.. pattern.From.Line, .. pattern.To.Line.Reverse()], Closed: true),
        };
        shapes.AddRange(pattern.From.Holes);
        shapes.AddRange(pattern.To.Holes);
        ScribeLines(pattern, shapes);
        BendMarks.Draw(pattern, shapes);
        Words(pattern, shapes);
        return new Drawing(PaperLayers.All, shapes);
    }

    private static void ScribeLines(PartPattern pattern, List<Shape> shapes)
    {
        double quarter = pattern.Perimeter / 4;
        foreach (double x in (ReadOnlySpan<double>)[-quarter, 0, quarter])
        {
            (double start, double stop) = (pattern.From.At(x), pattern.To.At(x));
            if (stop > start)
            {
                shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(x, start), new(x, stop)));
            }
        }

        foreach (PatternEnd end in (PatternEnd[])[pattern.From, pattern.To])
        {
            // On a short tube a datum line can lie past the other end's cut: no line there.
            if (end.IsFitted && end.Datum > pattern.From.Deepest && end.Datum < pattern.To.Deepest)
            {
                double half = pattern.Perimeter / 2;
                shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(-half, end.Datum), new(half, end.Datum)));
                FoldLines(pattern, end, shapes);
            }
        }
    }

    /// <summary>The middles of a flat-sided tube's corners, from the cut line to the datum line: where a paper is folded.</summary>
    private static void FoldLines(PartPattern pattern, PatternEnd end, List<Shape> shapes)
    {
        foreach (double x in pattern.FoldLines)
        {
            shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(x, end.At(x)), new(x, end.Datum)));
        }
    }

    /// <summary>
    /// Clock angles and the label in the longest stretch of the tube that no cut or datum line crosses; the label beside the pattern
    /// where it is too short.
    /// </summary>
    private static void Words(PartPattern pattern, List<Shape> shapes)
    {
        (double low, double high) = LongestClearStretch(pattern);
        double cell = pattern.Perimeter / 4;
        double text = pattern.TextHeight;
        double margin = 0.7 * text;
        double bottom = low + margin;
        double top = high - margin - text;
        if (top >= bottom)
        {
            double size = TemplatePieceSketch.BandText(text, cell);
            string[] angles = ["180", "270", "TOP 0", "90"];
            for (int i = 0; i < 4; i++)
            {
                double x = ((i - 2) * cell) + (0.5 * size);
                shapes.Add(new Text(PaperLayers.Text, new(x, bottom), size, 0, angles[i]));
                if (top > bottom + (3 * text))
                {
                    shapes.Add(new Text(PaperLayers.Text, new(x, top), size, 0, angles[i]));
                }

                // Which end is which, in the quarters that have no label.
                if (i is 0 or 3 && top > bottom + (6 * text))
                {
                    shapes.Add(new Text(PaperLayers.Text, new(x, bottom + (1.7 * text)), size, 0, "FROM"));
                    shapes.Add(new Text(PaperLayers.Text, new(x, top - (1.7 * text)), size, 0, "TO"));
                }
            }
        }

        // The label runs along the tube in the quarter left of the top line, the from end to the left of who reads it.
        List<string> words = Label(pattern);
        double start = bottom + text + margin;
        double length = Math.Min(top - margin - start, 60 * text);
        if (!Along(shapes, words, new(margin - cell, start), length, cell - (2 * margin), text))
        {
            var block = new LabelBlock([.. words.Select(w => new Paragraph(w))], 30 * text, text);
            shapes.AddRange(block.Place((pattern.Perimeter / 2) + 5, pattern.To.Tip));
        }
    }

    private static List<string> Label(PartPattern pattern)
    {
        var words = new List<string>();
        if (PartWords.IsUnmet(pattern.Sized))
        {
            words.Add(Cautions.NotMeetingTargets);
        }

        words.Add($"{pattern.Part.Name}: outside, {PartWords.Section(pattern)}, cut length {pattern.Display.Length(pattern.Part.Drawn.CutLength)}");
        words.Add(PartWords.Tubes(pattern));
        words.Add($"y counts along the axis from node {PartWords.NodeName(pattern, End.From)}; TOP faces {PartWords.TopFaces(pattern.Tube.Axes)} in the frame");
        words.Add(EndWords(pattern, pattern.From));
        words.Add(EndWords(pattern, pattern.To));
        words.AddRange(BendMarks.Words(pattern));
        if (pattern.FoldLines.Count > 0)
        {
            words.Add("Short lines between cut and datum: middles of the corners, to fold on");
        }

        words.Add(PartWords.Origin(pattern.Sized.Model));
        words.Add(Cautions.WeldShrinkage);
        words.Add(Cautions.OnDrawings);
        return words;
    }

    private static string EndWords(PartPattern pattern, PatternEnd end) =>
        $"{PartWords.Name(end.End)} end at {PartWords.NodeName(pattern, end.End)}: {PartWords.Mates(pattern, end.Cut)}, "
        + $"{(end.IsFitted ? "datum" : "cut")} at y{TextFit.Tie}{pattern.Display.MeasuredLength(end.Datum).Replace(' ', TextFit.Tie)}";

    private static (double Low, double High) LongestClearStretch(PartPattern pattern)
    {
        (double first, double last) = (pattern.From.Deepest, pattern.To.Deepest);
        double[] edges = [first, .. new[] { pattern.From.Datum, pattern.To.Datum }.Concat(BendMarks.Tangents(pattern)).Where(y => y > first && y < last).Order(), last];
        (double low, double high) = (edges[0], edges[1]);
        for (int i = 1; i + 1 < edges.Length; i++)
        {
            if (edges[i + 1] - edges[i] > high - low)
            {
                (low, high) = (edges[i], edges[i + 1]);
            }
        }

        return (low, high);
    }

    /// <summary>Sets lines along the tube, in smaller letters where they don't fit.</summary>
    /// <param name="shapes">Where the lines go.</param>
    /// <param name="words">In reading order.</param>
    /// <param name="corner">Upper left corner of the room as it is read: its least x and y.</param>
    /// <param name="length">Along the tube, mm.</param>
    /// <param name="depth">Round the tube, mm.</param>
    /// <param name="height">Of capitals, mm.</param>
    /// <returns>False where they don't fit at 1.2 mm.</returns>
    private static bool Along(List<Shape> shapes, List<string> words, Point2 corner, double length, double depth, double height)
    {
        for (double size = height; size >= 1.2; size *= 0.94)
        {
            List<string> lines = [.. words.SelectMany(w => TextFit.Wrap(w, size, length))];
            if (length < 24 * size || (lines.Count * 1.65 * size) - (0.65 * size) > depth)
            {
                continue;
            }

            // Turned a quarter, a line's capitals point to the left: its base line is its right-hand side.
            for (int i = 0; i < lines.Count; i++)
            {
                shapes.Add(new Text(PaperLayers.Text, new(corner.X + size + (1.65 * size * i), corner.Y), size, Math.PI / 2, lines[i]));
            }

            return true;
        }

        return false;
    }
}
