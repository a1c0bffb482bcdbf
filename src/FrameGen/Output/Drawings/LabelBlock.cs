using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Output.Drawings;

/// <summary>A paragraph of a label.</summary>
/// <param name="Content">Words.</param>
/// <param name="Scale">Height in heights of plain text.</param>
internal readonly record struct Paragraph(string Content, double Scale = 1);

/// <summary>Paragraphs set in columns of equal width, filled one after the other.</summary>
internal sealed class LabelBlock
{
    /// <summary>From one base line to the next, in heights of capitals.</summary>
    private const double Leading = 1.65;

    /// <summary>A column holds some 30 characters at least: shorter lines break too often.</summary>
    private const double NarrowestColumn = 25;

    /// <summary>Longer lines are hard to follow.</summary>
    private const double WidestColumn = 46;

    private readonly List<(int Column, double Top, double Height, string Line)> _lines = [];
    private readonly double _columnWidth;
    private readonly double _pitch;

    /// <summary>Sets paragraphs.</summary>
    /// <param name="paragraphs">In reading order.</param>
    /// <param name="width">Of the whole block, mm.</param>
    /// <param name="height">Of plain text, mm.</param>
    public LabelBlock(IReadOnlyList<Paragraph> paragraphs, double width, double height)
        : this(paragraphs, Math.Max(1, (int)(width / (NarrowestColumn * height))), width, height, areWhole: true)
    {
    }

    private LabelBlock(IReadOnlyList<Paragraph> paragraphs, int columns, double width, double height, bool areWhole)
    {
        _columnWidth = Math.Min((width - ((columns - 1) * 2 * height)) / columns, WidestColumn * height);
        _pitch = _columnWidth + (2 * height);
        var set = new List<(double Height, IReadOnlyList<string> Lines)>();
        foreach (Paragraph paragraph in paragraphs)
        {
            double size = paragraph.Scale * height;
            IReadOnlyList<string> lines = TextFit.Wrap(paragraph.Content, size, _columnWidth);
            set.AddRange(areWhole ? [(size, lines)] : lines.Select(l => (size, (IReadOnlyList<string>)[l])));
        }

        double target = set.Sum(p => Leading * p.Height * p.Lines.Count) / columns;
        while (!Fill(set, columns, target))
        {
            target += 0.5 * height;
        }

        int used = _lines.Max(l => l.Column) + 1;
        Width = (used * _pitch) - (2 * height);
        Height = _lines.Max(l => l.Top + l.Height) + (Helvetica.Descent * height);
    }

    /// <summary>Sets paragraphs in so many columns of long lines; one that does not fit into its column goes on in the next.</summary>
    /// <param name="paragraphs">In reading order.</param>
    /// <param name="columns">At least 1.</param>
    /// <param name="height">Of plain text, mm.</param>
    public static LabelBlock InColumns(IReadOnlyList<Paragraph> paragraphs, int columns, double height) =>
        new(paragraphs, columns, columns * (WidestColumn + 2) * height, height, areWhole: false);

    /// <summary>mm.</summary>
    public double Width { get; }

    /// <summary>From the top of the highest capitals to below the lowest descenders, mm.</summary>
    public double Height { get; }

    /// <summary>The lines as texts.</summary>
    /// <param name="left">x of the block's left side.</param>
    /// <param name="top">y of its upper side.</param>
    public IEnumerable<Text> Place(double left, double top) => _lines.Select(l => new Text(
        PaperLayers.Text, new Point2(left + (l.Column * _pitch), top - l.Top - l.Height), l.Height, 0, l.Line));

    /// <summary>The lines as texts that run upwards, the block's upper side to the left.</summary>
    /// <param name="left">x of the block's upper side.</param>
    /// <param name="bottom">y where its lines begin.</param>
    public IEnumerable<Text> PlaceAlong(double left, double bottom) => _lines.Select(l => new Text(
        PaperLayers.Text, new Point2(left + l.Top + l.Height, bottom + (l.Column * _pitch)), l.Height, Math.PI / 2, l.Line));

    /// <summary>Fills columns up to a height, each entry whole in one of them; false when they don't fit.</summary>
    private bool Fill(List<(double Height, IReadOnlyList<string> Lines)> set, int columns, double target)
    {
        _lines.Clear();
        (int column, double top) = (0, 0);
        foreach ((double size, IReadOnlyList<string> lines) in set)
        {
            if (top > 0 && top + (Leading * size * (lines.Count - 1)) + size > target + 1e-9)
            {
                (column, top) = (column + 1, 0);
                if (column == columns)
                {
                    return false;
                }
            }

            foreach (string line in lines)
            {
                _lines.Add((column, top, size, line));
                top += Leading * size;
            }
        }

        return true;
    }
}
