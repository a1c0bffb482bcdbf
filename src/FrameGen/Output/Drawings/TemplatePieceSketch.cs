using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>Draws one wrapped piece.</summary>
internal sealed class TemplatePieceSketch
{
    private const double WidestLabel = 168;

    /// <summary>Narrower pieces have their label along the tube, in small print; heights of plain text.</summary>
    private const double NarrowestLabel = 16;

    /// <summary>Small print on a thin rod, mm.</summary>
    private const double SmallPrint = 1.25;

    /// <summary>Of small print, however many names there are.</summary>
    private const int MostColumns = 50;

    /// <summary>Kept at the base edge for the ends of the top and quarter lines, heights of plain text.</summary>
    private const double BaseBand = 2.1;

    private readonly PartPattern _pattern;
    private readonly PatternEnd _end;
    private readonly double _scale;
    private readonly double _half;
    private readonly double _text;
    private readonly int _inward;
    private readonly List<Shape> _shapes = [];

    /// <summary>Measures a piece.</summary>
    public TemplatePieceSketch(PartPattern pattern, PatternEnd end)
    {
        (_pattern, _end, _inward, _text) = (pattern, end, end.Inward, pattern.TextHeight);
        _scale = (pattern.Radius + (pattern.Sized.Model.Fabrication.Paper / 2)) / pattern.Radius;
        _half = _scale * pattern.Perimeter / 2;
        TabWidth = Math.Clamp(_half / 4, 6, 10);
    }

    /// <summary>Width of the glue tab, mm.</summary>
    public double TabWidth { get; }

    /// <summary>Half the width that wraps round the tube, mm.</summary>
    public double HalfWidth => _half;

    /// <summary>y of the paper's edge beyond the long point.</summary>
    public double WasteEdge => _end.Tip - (_inward * 2.4 * _text);

    /// <summary>Draws the piece.</summary>
    /// <param name="shift">From the pattern to the drawing.</param>
    public TemplatePiece Draw(Point2 shift)
    {
        _shapes.Clear();
        double mark = 1.1 * _text;
        double inset = mark + (0.6 * _text);

        // On a piece wider than a sheet the label stays together at the left, where the first sheet holds all of it.
        double room = (2 * _half) - (2 * inset);
        bool isAlong = room < NarrowestLabel * _text;
        LabelBlock block = isAlong ? AlongTheTube(Paragraphs(shift), room) : new LabelBlock(Paragraphs(shift), Math.Min(room, WidestLabel), _text);
        (double width, double height) = isAlong ? (block.Height, block.Width) : (block.Width, block.Height);
        double left = room > WidestLabel ? inset - _half : -width / 2;

        // Beyond the datum line: a row that names it, then the label, then the base edge.
        double row = _end.Datum + (_inward * 2 * _text);
        double baseEdge = row + (_inward * (height + ((1.4 + BaseBand) * _text)));
        double blockBottom = _inward > 0 ? row + (0.7 * _text) : baseEdge + ((0.7 + BaseBand) * _text);

        Outline(baseEdge);
        Tab(baseEdge);
        ScribeLines(baseEdge);
        BendLines(baseEdge);
        Bands();
        MatchMarks(row + (_inward * height / 2), mark);
        NameDatum(Math.Max(left, inset - _half), room);
        _shapes.AddRange(isAlong ? block.PlaceAlong(left, blockBottom) : block.Place(left, blockBottom + height));

        Shape[] moved = [.. _shapes.Select(s => Move(s, shift))];
        var drawing = new Drawing(PaperLayers.All, moved);
        return new TemplatePiece(_end.End, drawing, drawing.Bounds()!.Value, _scale, shift);
    }

    private static Shape Move(Shape shape, Point2 shift) => shape switch
    {
        Polyline line => line with { Points = [.. line.Points.Select(p => p + shift)] },
        Text text => text with { At = text.At + shift },
        _ => throw new InvalidOperationException($"A piece holds no {shape.GetType().Name}."),
    };

    /// <summary>The shortest label along the tube that a narrow piece has room for.</summary>
    private static LabelBlock AlongTheTube(List<Paragraph> paragraphs, double room)
    {
        LabelBlock block;
        int columns = 1;
        do
        {
            block = LabelBlock.InColumns(paragraphs, columns, SmallPrint);
            columns++;
        }
        while (block.Height > room && columns < MostColumns);

        return block;
    }

    /// <summary>Which line the datum line is; from which node y counts too, where there is room for it.</summary>
    /// <summary>Names the datum line's place on the row beside it, from the left edge where the label's own margin leaves too little.</summary>
    private void NameDatum(double left, double room)
    {
        string words = $"DATUM at y {_pattern.Display.Length(_end.Datum)}";
        string longer = $"{words} from {PartWords.NodeName(_pattern, End.From)}";
        string datum = TextFit.Width(longer, _text) <= room ? longer : words;
        double margin = 0.6 * _text;
        double height = TextFit.HeightFor(datum, _text, 2 * (_half - margin));
        double start = Math.Min(left, _half - margin - TextFit.Width(datum, height));
        Write(start, _end.Datum + (_inward > 0 ? 0.7 * _text : (-0.7 * _text) - height), height, datum);
    }

    private List<Paragraph> Paragraphs(Point2 shift)
    {
        // What has to be measured is printed larger than what has to be read once.
        double main = 1.15;
        double small = _text >= 1.8 ? 0.85 : 1;
        FrameModel model = _pattern.Sized.Model;
        PatternEnd other = _pattern[PartWords.Other(_end.End)];
        double blank = _pattern.Part.Drawn.CutLength;
        double nearer = Math.Min(_end.Datum - _pattern.Part.Drawn.Start, _pattern.Part.Drawn.Stop - _end.Datum);
        double apart = _end.End == End.From ? other.Datum - _end.Datum : _end.Datum - other.Datum;
        string otherName = PartWords.Name(other.End);
        string otherDatum = other.IsFitted ? $"the {otherName} end's datum" : $"the square {otherName} end";
        var words = new List<Paragraph>();
        if (PartWords.IsUnmet(_pattern.Sized))
        {
            words.Add(new(Cautions.NotMeetingTargets, 1.4));
        }

        words.Add(new($"{_pattern.Part.Name}  {PartWords.Name(_end.End)} END", 1.9));
        words.Add(new("THIS SIDE OUT", 1.4));
        words.Add(new(
            apart > 0 ? $"Datum to {otherDatum}: {Measure(apart)}" : $"Datum lies {Measure(-apart)} beyond {otherDatum}", main));
        words.Add(new($"Datum to the nearer end of a square-sawn {Measure(blank)} blank: {Measure(nearer)}", main));
        words.Add(new($"At {PartWords.NodeName(_pattern, _end.End)}: {PartWords.Mates(_pattern, _end.Cut)}"));
        words.Add(new(PartWords.Mode(_pattern, _end.Cut)));
        words.Add(new($"Edges 180 meet, tab under. TOP lies on the tube's top line, which faces {PartWords.TopFaces(_pattern.Tube.AxesAt(_end.End))} in the frame: one line for both ends"));
        if (BendMarks.EndWords(_pattern, _end.End) is { } bends)
        {
            words.Add(new(bends));
        }

        if (_pattern.FoldLines.Count > 0)
        {
            words.Add(new("Lines between TOP and the quarters: the corners, to fold on"));
        }

        if (_end.Cut.Vent is { } vent)
        {
            words.Add(new(string.Create(CultureInfo.InvariantCulture, $"Small circle: drill {vent.Diameter:0.###}{TextFit.Tie}mm vent through this wall")));
        }

        words.Add(new($"Arrows point to the {otherName} end, at {PartWords.NodeName(_pattern, other.End)}"));
        words.Add(new(PartWords.Section(_pattern)));
        words.Add(new(PartWords.Tubes(_pattern)));
        words.Add(new(PartWords.Origin(model), small));
        words.Add(new(
            string.Create(
                CultureInfo.InvariantCulture,
                $"Paper {_pattern.Sized.Model.Fabrication.Paper:0.###}{TextFit.Tie}mm: x scale {_scale:0.000000}; shift x{TextFit.Tie}{shift.X:0}{TextFit.Tie}mm, y{TextFit.Tie}{shift.Y:0}{TextFit.Tie}mm"),
            small));
        words.Add(new(Cautions.WeldShrinkage, small));
        words.Add(new(Cautions.OnDrawings, small));
        return words;
    }

    /// <summary>A length whose number and unit stay on one line.</summary>
    private string Measure(double mm) => _pattern.Display.MeasuredLength(mm).Replace(' ', TextFit.Tie);

    /// <summary>KEEP side and vents on CUT, the paper's other edges on TRIM; they share no segment.</summary>
    private void Outline(double baseEdge)
    {
        List<Point2> line = Wrapped(_end.Line);
        Point2 left = line[0];
        Point2 right = line[^1];
        _shapes.Add(new Polyline(PaperLayers.Cut, [.. line, new(_half, baseEdge), new(-_half, baseEdge)], Closed: true));
        _shapes.Add(new Polyline(PaperLayers.Trim, [left, new(-_half, WasteEdge), new(_half, WasteEdge), right], Closed: false));
        _shapes.AddRange(_end.Holes.Select(h => h with { Points = Wrapped(h.Points) }));
    }

    /// <summary>Widened round the tube for the paper's thickness.</summary>
    private List<Point2> Wrapped(IReadOnlyList<Point2> points) => [.. points.Select(p => p with { X = _scale * p.X })];

    /// <summary>The glue tab on the right-hand edge; it goes under the left-hand one, where it must not reach over the cut line.</summary>
    private void Tab(double baseEdge)
    {
        double reach = Math.Min(TabWidth, 2 * _half) / _scale;
        double start = _end.Line[0].Y;
        foreach (Point2 p in _end.Line)
        {
            if (p.X <= (-_half / _scale) + reach)
            {
                start = _end.Deeper(start, p.Y);
            }
        }

        start = _end.Deeper(start, _end.At((-_half / _scale) + reach)) + (_inward * 1);
        double stop = baseEdge - (_inward * 1);
        double bevel = Math.Min(TabWidth / 3, Math.Abs(stop - start) / 4);
        double outer = _half + TabWidth;
        _shapes.Add(new Polyline(
            PaperLayers.Tab,
            [new(_half, start), new(outer, start + (_inward * bevel)), new(outer, stop - (_inward * bevel)), new(_half, stop)],
            Closed: false));

        // The words run along the tab, between the datum line and the base edge.
        double room = Math.Abs(stop - _end.Datum) - (2 * bevel) - _text;
        double height = TextFit.HeightFor("GLUE TAB, GOES UNDER", Math.Min(_text, TabWidth / 3), room);
        if (height > 0.5)
        {
            double length = Helvetica.Width("GLUE TAB, GOES UNDER", height);
            double middle = (_end.Datum + stop) / 2;
            _shapes.Add(new Text(
                PaperLayers.Text, new(_half + ((TabWidth + height) / 2), middle - (length / 2)), height, Math.PI / 2, "GLUE TAB, GOES UNDER"));
        }
    }

    /// <summary>Top, quarter and fold lines from the cut to the datum, and their ends at the base edge; the datum from edge to edge and across the tab.</summary>
    private void ScribeLines(double baseEdge)
    {
        double size = BandText(_text, _half / 2);
        double tick = baseEdge - (_inward * 1.6 * _text);

        foreach (int quarter in (ReadOnlySpan<int>)[-1, 0, 1])
        {
            double x = quarter * _half / 2;
            _shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(x, _end.At(x / _scale)), new(x, _end.Datum)));
            _shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(x, baseEdge), new(x, tick)));
        }

        foreach (double corner in _pattern.FoldLines)
        {
            double x = corner * _scale;
            _shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(x, _end.At(corner)), new(x, _end.Datum)));
            _shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(x, baseEdge), new(x, tick)));
        }

        Write(0.5 * size, _inward > 0 ? baseEdge - (0.6 * _text) - size : baseEdge + (0.6 * _text), size, "TOP");
        _shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(-_half, _end.Datum), new(_half + TabWidth, _end.Datum)));
    }

    /// <summary>The line along the inside of the first bend, and at the to end of the last, from the cut to the datum, and its end at the base edge.</summary>
    private void BendLines(double baseEdge)
    {
        double size = BandText(_text, _half / 2);
        double line = _inward > 0 ? baseEdge - (0.6 * _text) - size : baseEdge + (0.6 * _text);
        double top = (0.5 * size) + TextFit.Width("TOP", size);
        foreach (BendStep step in BendMarks.AtEnd(_pattern, _end.End))
        {
            double x = BendMarks.Inside(_pattern, step);
            _shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(_scale * x, _end.At(x)), new(_scale * x, _end.Datum)));
            _shapes.Add(Polyline.Segment(PaperLayers.Scribe, new(_scale * x, baseEdge), new(_scale * x, baseEdge - (_inward * 1.6 * _text))));

            string name = string.Create(CultureInfo.InvariantCulture, $"BEND {step.Bend.Number}");
            double width = TextFit.Width(name, size);

            // Right of the line, left of it where TOP or the edge is there, or right of TOP.
            double[] places = [(_scale * x) + (0.5 * size), (_scale * x) - (0.5 * size) - width, top + (0.5 * size)];
            double place = places.FirstOrDefault(p => p > -_half && p + width < _half && (p > top || p + width < 0), places[0]);
            Write(place, line, size, name);
        }
    }

    /// <summary>WASTE beyond the long point; KEEP, clock angles and arrows between the deepest place and the datum.</summary>
    private void Bands()
    {
        double quarter = _half / 2;
        double size = BandText(_text, quarter);
        double inset = 0.5 * size;
        double waste = _inward > 0 ? WasteEdge + (0.7 * _text) : WasteEdge - (0.7 * _text) - size;
        double labels = _inward > 0 ? _end.Datum - (0.7 * _text) - size : _end.Datum + (0.7 * _text);
        double keep = labels - (_inward * 1.7 * _text);
        double low = Math.Min(labels, keep);
        double high = Math.Max(labels, keep) + size;

        // On a thin tube an arrow takes the place of a KEEP, and stands clear of the longest clock angle.
        bool isNarrow = quarter < 7 * _text;
        string[] angles = ["180", "270", "TOP 0", "90"];
        for (int i = 0; i < 4; i++)
        {
            double x = -_half + (i * quarter) + inset;
            bool hasArrow = isNarrow ? i is 0 or 1 : i is 1 or 2;
            Write(x, labels, size, angles[i]);
            Write(x, waste, size, "WASTE");
            if (!(isNarrow && hasArrow))
            {
                Write(x, keep, size, "KEEP");
            }

            if (hasArrow)
            {
                Arrow(-_half + ((i + 0.82) * quarter), low, high, 0.6 * size);
            }
        }

        Write(_half - inset - TextFit.Width("180", size), labels, size, "180");
    }

    /// <summary>Height at which the longest words of a quarter stand between two quarter lines, mm.</summary>
    internal static double BandText(double wanted, double quarter) =>
        Math.Min(TextFit.HeightFor("TOP 0 ", wanted, quarter), TextFit.HeightFor("WASTE ", wanted, quarter));

    /// <summary>An arrow to the other end.</summary>
    private void Arrow(double x, double bottom, double top, double barb)
    {
        (double tail, double tip) = _inward > 0 ? (bottom, top) : (top, bottom);
        _shapes.Add(Polyline.Segment(PaperLayers.Text, new(x, tail), new(x, tip)));
        _shapes.Add(new Polyline(
            PaperLayers.Text,
            [new(x - barb, tip - (_inward * 2 * barb)), new(x, tip), new(x + barb, tip - (_inward * 2 * barb))],
            Closed: false));
    }

    /// <summary>Half a diamond on each closing edge: they make a whole one where the edges meet.</summary>
    private void MatchMarks(double y, double size)
    {
        foreach (int side in (ReadOnlySpan<int>)[-1, 1])
        {
            double x = side * _half;
            _shapes.Add(new Polyline(
                PaperLayers.Text, [new(x, y - size), new(x - (side * size), y), new(x, y + size)], Closed: false));
        }
    }

    private void Write(double x, double y, double height, string words) =>
        _shapes.Add(new Text(PaperLayers.Text, new(x, y), height, 0, words));
}
