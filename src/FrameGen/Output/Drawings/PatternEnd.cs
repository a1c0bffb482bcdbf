using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>One end of a part laid flat.</summary>
internal sealed class PatternEnd
{
    /// <summary>Two places nearer than this are one, mm: what a DXF file can tell apart.</summary>
    private const double Near = 1.5e-6;

    /// <summary>Lays one end flat.</summary>
    public PatternEnd(PartPattern pattern, End end)
    {
        End = end;
        Cut = pattern.Part.Drawn[end];
        double length = pattern.Tube.Length;
        var line = new List<Point2>(Cut.Outer.Points.Count);
        foreach (CurvePoint point in Cut.Outer.Points)
        {
            var next = new Point2(pattern.Section.Outline.DistanceAt(point.Clock), end == End.From ? point.T : length - point.T);
            if (line.Count == 0 || Math.Abs(next.X - line[^1].X) > Near || Math.Abs(next.Y - line[^1].Y) > Near)
            {
                line.Add(next);
            }
        }

        // The seam's two sides are exactly half the perimeter from the top line, whatever the last bit of the clock angle is.
        line[0] = line[0] with { X = -pattern.Perimeter / 2 };
        line[^1] = line[^1] with { X = pattern.Perimeter / 2 };
        Line = line;
        Holes = Cut.Vent is { } vent
            ? [new Polyline(PaperLayers.Cut, [.. vent.Developed(pattern.Section.Outline).Select(p => end == End.From ? p : new Point2(p.X, length - p.Y))], Closed: true)]
            : [];
        Deepest = end == End.From ? Cut.Outer.Max : length - Cut.Outer.Max;
        Tip = end == End.From ? Cut.Outer.Min : length - Cut.Outer.Min;
        double step = pattern.DatumStep;

        // A vent stands clear of the words between it and the datum line.
        double cleared = Holes.SelectMany(h => h.Points).Select(p => p.Y).Aggregate(Deepest, Deeper);
        double wanted = cleared + (Inward * KeepBand * pattern.TextHeight);
        Datum = !IsFitted ? Deepest : step * (end == End.From ? Math.Ceiling(wanted / step) : Math.Floor(wanted / step));
    }

    /// <summary>Least height of the band between a cut line and its datum line, in heights of plain text: two rows of it.</summary>
    public const double KeepBand = 4.4;

    /// <summary>Breathing holes near it, as closed lines to cut.</summary>
    public IReadOnlyList<Polyline> Holes { get; }

    /// <summary>Which end.</summary>
    public End End { get; }

    /// <summary>How it is cut.</summary>
    public EndCut Cut { get; }

    /// <summary>True for an end cut to another tube, which gets a template.</summary>
    public bool IsFitted => Cut.Kind != CutKind.Square;

    /// <summary>+1 where the tube lies at growing y, −1 where it lies at falling y.</summary>
    public int Inward => End == End.From ? 1 : -1;

    /// <summary>The cut line from x = −half to +half the perimeter.</summary>
    public IReadOnlyList<Point2> Line { get; }

    /// <summary>y of the place of the cut line that lies deepest in the tube.</summary>
    public double Deepest { get; }

    /// <summary>y of the long point.</summary>
    public double Tip { get; }

    /// <summary>y of the datum line; of the cut itself at a square end.</summary>
    public double Datum { get; }

    /// <summary>y of the cut line at an x; where it steps, the place deeper in the tube.</summary>
    public double At(double x)
    {
        double? best = null;
        for (int i = 1; i < Line.Count; i++)
        {
            (Point2 a, Point2 b) = (Line[i - 1], Line[i]);
            if (x < a.X - Near || x > b.X + Near)
            {
                continue;
            }

            double share = b.X - a.X > Near ? Math.Clamp((x - a.X) / (b.X - a.X), 0, 1) : double.NaN;
            double y = double.IsNaN(share) ? Deeper(a.Y, b.Y) : a.Y + (share * (b.Y - a.Y));
            best = best is { } known ? Deeper(known, y) : y;
        }

        return best ?? Deepest;
    }

    /// <summary>Of two y the one deeper in the tube.</summary>
    public double Deeper(double a, double b) => Inward * a >= Inward * b ? a : b;
}
