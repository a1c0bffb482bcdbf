using System.Globalization;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Output.Drawings;

/// <summary>What papers say about a part and its ends.</summary>
internal static class PartWords
{
    /// <summary>More names than this are not listed on a piece of paper, but the first of them and how many more.</summary>
    private const int MostNames = 12;

    private const int FirstNames = 8;

    /// <summary>True when the frame misses a target.</summary>
    public static bool IsUnmet(SizedFrame sized) => sized.Status == SizingStatus.Unmet;

    /// <summary>FROM or TO.</summary>
    public static string Name(End end) => end == End.From ? "FROM" : "TO";

    /// <summary>The end opposite.</summary>
    public static End Other(End end) => end == End.From ? End.To : End.From;

    /// <summary>Name of the node at an end of the drawn tube.</summary>
    public static string NodeName(PartPattern pattern, End end) => pattern.Sized.Model.Nodes[pattern.Tube[end].Node].Name;

    /// <summary>The tubes that are this part, and how many.</summary>
    public static string Tubes(PartPattern pattern)
    {
        int count = pattern.Part.Quantity;
        int named = count <= MostNames ? count : FirstNames;
        string names = string.Join(", ", pattern.Part.Tubes.Take(named).Select(t => pattern.Sized.Model.Tubes[t].Name));
        string more = named < count ? string.Create(CultureInfo.InvariantCulture, $" and {count - named} more of the cut list") : string.Empty;
        return count == 1
            ? $"Tube {names}"
            : string.Create(CultureInfo.InvariantCulture, $"Tubes {names}{more} (make {count}, drawn for the first)");
    }

    /// <summary>Section and material.</summary>
    public static string Section(PartPattern pattern) =>
        $"{pattern.Display.Section(pattern.Sized.ChosenFor(pattern.Part.Drawn.Tube))}, {pattern.Sized.Model.Groups[pattern.Tube.Group].Material.Name}";

    /// <summary>What an end is cut to.</summary>
    public static string Mates(PartPattern pattern, EndCut cut)
    {
        if (cut.Kind is CutKind.Square or CutKind.Plane)
        {
            return cut.Kind == CutKind.Square ? "square" : "cut on a plane";
        }

        string mates = string.Join(", ", cut.Contacts.Select(c => pattern.Sized.Model.Tubes[c.Tube].Name + Crossing(pattern, c)));
        return cut.Kind == CutKind.Miter ? $"mitred with {mates}" : $"fits on {mates}";
    }

    /// <summary>How the cut face lies, and what the saw or hole saw is set to.</summary>
    public static string Mode(PartPattern pattern, EndCut cut)
    {
        if (cut.Kind is CutKind.Miter or CutKind.Plane)
        {
            // The plane halves the angle between the axes; a square cut is half of a straight angle.
            return cut.Contacts is [var mate, ..]
                ? $"Plane cut: saw straight through, {Degrees((Math.PI - mate.Angle) / 2)} from square"
                : "Plane cut: saw straight through";
        }

        string mode = "Radial cut: the cut face points at the tube's axis";
        if (pattern.Sized.Model.Fabrication.Cut != CutMode.Radial)
        {
            mode = "Contour cut: the cut face lies on the mate";
            if (cut.Contacts is [var seat, ..] && pattern.Sized.SectionOf(seat.Tube) is RoundTube or Rod)
            {
                mode += $"; hole saw {pattern.Display.MeasuredLength(pattern.Sized.SectionOf(seat.Tube).Height + (2 * cut.Gap))}";
            }
        }

        return cut.Gap > 0 ? $"{mode}; gap {pattern.Display.Length(cut.Gap)}" : mode;
    }

    /// <summary>The axis of the frame nearest to where the top line of a tube faces: <c>+z</c>, <c>-y</c>.</summary>
    public static string TopFaces(TubeAxes axes)
    {
        Vector3 top = axes.Z;
        (double size, string name) best = (Math.Abs(top.Z), top.Z >= 0 ? "+z" : "-z");
        foreach ((double value, string axis) in (ReadOnlySpan<(double, string)>)[(top.X, "x"), (top.Y, "y")])
        {
            // A top line that lies as much to one axis as to another is told by the first of z, x and y.
            if (Math.Abs(value) > best.size + 1e-9)
            {
                best = (Math.Abs(value), (value >= 0 ? "+" : "-") + axis);
            }
        }

        return best.name;
    }

    /// <summary>Angle to a mate and how far the axes miss each other, for whoever sets up a hole saw.</summary>
    private static string Crossing(PartPattern pattern, Contact mate)
    {
        const double Visible = 0.05;
        string offset = mate.Offset >= Visible ? $", axes {pattern.Display.MeasuredLength(mate.Offset)} apart" : string.Empty;
        return mate.Clock is null ? string.Empty : $" ({Degrees(mate.Angle)}{offset})";
    }

    private static string Degrees(double radians) => $"{FixedDigits.Tenths(radians * 180 / Math.PI)} deg";

    /// <summary>Title, revision and the beginning of the spec's hash.</summary>
    public static string Origin(FrameModel model) => $"{Titled(model)}, spec {Hash(model)}";

    /// <summary><see cref="Origin"/> with as much of the title as a line has room for at a readable size.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="height">Of capitals, mm.</param>
    /// <param name="width">Of the line, mm.</param>
    public static string ShortOrigin(FrameModel model, double height, double width)
    {
        string title = OneLine(model.Spec.Title);
        string rest = Origin(model)[title.Length..];
        string words = title + rest;
        for (int keep = title.Length - 1; keep > 0 && TextFit.Width(words, height) > width; keep--)
        {
            words = title[..keep].TrimEnd(' ', ',') + "..." + rest;
        }

        return words;
    }

    /// <summary>Title and revision, on one line.</summary>
    public static string Titled(FrameModel model)
    {
        string title = OneLine(model.Spec.Title);
        return model.Spec.Revision.Length == 0 ? title : $"{title}, revision {OneLine(model.Spec.Revision)}";
    }

    /// <summary>The first eight characters of the spec's hash.</summary>
    public static string Hash(FrameModel model) => model.Spec.Sha256[..Math.Min(8, model.Spec.Sha256.Length)];

    private static string OneLine(string words) =>
        string.Join(' ', words.Split([' ', '\t', '\r', '\n'], StringSplitOptions.RemoveEmptyEntries));
}
