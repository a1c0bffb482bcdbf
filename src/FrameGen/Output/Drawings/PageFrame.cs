using System.Globalization;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Output.Drawings;

/// <summary>What stands on every page round the piece: title and page number above, check ruler and cautions below.</summary>
internal sealed class PageFrame
{
    private const string Line = "LINE";
    private const string Words = "WORDS";
    private const string Join = "JOIN";
    private const double Size = 2;
    private const double EndTick = 5;

    private static readonly IReadOnlyList<Layer> Layers =
    [
        new(Line, 7, Pen.Black(0.2)),
        new(Words, 7, Pen.Black(0.2)),
        new(Join, 7, new Pen(0.15, Ink.Grey(0.35), [])),
    ];

    private readonly SizedFrame _sized;
    private readonly bool _inches;

    /// <summary>Prepares the frame of a document's pages.</summary>
    public PageFrame(SizedFrame sized)
    {
        _sized = sized;
        _inches = sized.Model.Display.Length == LengthUnit.Inch
            || sized.Model.Fabrication.Page is PageSize.Letter or PageSize.Tabloid;
    }

    /// <summary>A page size in portrait, mm.</summary>
    public static (double Width, double Height) Paper(PageSize size) => size switch
    {
        PageSize.A4 => (210, 297),
        PageSize.A3 => (297, 420),
        PageSize.Letter => (8.5 * 25.4, 11 * 25.4),
        PageSize.Tabloid => (11 * 25.4, 17 * 25.4),
        _ => throw new ArgumentOutOfRangeException(nameof(size), size, "Not a paper size."),
    };

    /// <summary>Draws the frame of one page.</summary>
    /// <param name="tiling">The page and its window.</param>
    /// <param name="subject">What is on the page.</param>
    /// <param name="number">From 1.</param>
    /// <param name="count">Pages in the file.</param>
    public List<Shape> Draw(PageTiling tiling, string subject, int number, int count)
    {
        var shapes = new List<Shape>();
        const double edge = PageTiling.Margin;
        double right = tiling.PageWidth - edge;
        double width = right - edge;
        string page = string.Create(CultureInfo.InvariantCulture, $"page {number} of {count}");

        // Above: subject and page number, then the title.
        double line = tiling.PageHeight - edge - 3.4;
        Fitted(shapes, subject, edge, line, 3.4, width - 40);
        Right(shapes, page, right, line, Size + 0.4);
        FrameModel model = _sized.Model;
        double room = PartWords.IsUnmet(_sized) ? width - 62 : width;
        Fitted(shapes, PartWords.ShortOrigin(model, Size, room), edge, line - 5, Size + 0.4, room);
        if (PartWords.IsUnmet(_sized))
        {
            Right(shapes, Cautions.NotMeetingTargets, right, line - 5.4, 3.2);
        }

        Segment(shapes, Line, edge, line - 7.6, right, line - 7.6);

        // Below: the ruler with what to do with it, then the cautions.
        IReadOnlyList<string> cautions = TextFit.Wrap(Cautions.OnDrawings, Size - 0.3, width);
        double bottom = edge + 0.6;
        for (int i = 0; i < cautions.Count; i++)
        {
            Write(shapes, cautions[^(i + 1)], edge, bottom + (3.1 * i), Size - 0.3);
        }

        double ruler = bottom + (3.1 * cautions.Count) + 2.2 + (_inches ? EndTick : 0);
        double rulerEnd = Ruler(shapes, edge + 1, ruler);
        double beside = rulerEnd + 12;
        Fitted(shapes, "Print at 100 %, check the ruler", beside, ruler + 4.2, Size + 0.4, right - beside);
        Fitted(shapes, "before cutting: no scaling, no fit to page", beside, ruler + 0.2, Size, right - beside);
        return shapes;
    }

    /// <summary>A drawing of frame shapes.</summary>
    public static Drawing ToDrawing(List<Shape> shapes) => new(Layers, shapes);

    /// <summary>Says that there is nothing to wrap.</summary>
    public static void NothingToWrap(List<Shape> shapes, PageTiling tiling)
    {
        double y = tiling.Window.Top - 20;
        string[] words =
        [
            "No end of any part is cut to another tube: there is nothing to wrap.",
            "Every part is a square-sawn length; the lengths are in the cut list.",
            Cautions.WeldShrinkage,
        ];
        foreach (string line in words)
        {
            Write(shapes, line, tiling.Window.Left, y, 3);
            y -= 6.5;
        }
    }

    /// <summary>A line with crosses in the middle of each overlap, on the same places of the piece on both pages, and outside the piece the page that joins.</summary>
    public static void JoinMarks(List<Shape> shapes, PageTiling tiling, int column, int row, int firstPage)
    {
        Box2 window = tiling.Window;
        const double half = PageTiling.Overlap / 2;
        int PageAt(int c, int r) => firstPage + ((tiling.Rows - 1 - r) * tiling.Columns) + c;
        foreach ((int dc, double x) in (ReadOnlySpan<(int, double)>)[(-1, window.Left + half), (1, window.Right - half)])
        {
            if (column + dc < 0 || column + dc >= tiling.Columns)
            {
                continue;
            }

            Segment(shapes, Join, x, window.Bottom, x, window.Top);
            Cross(shapes, x, window.Bottom + (window.Height / 4));
            Cross(shapes, x, window.Top - (window.Height / 4));
            string words = string.Create(CultureInfo.InvariantCulture, $"joins page {PageAt(column + dc, row)}");
            if (dc < 0)
            {
                Write(shapes, words, window.Left, window.Bottom - 3, Size - 0.2);
            }
            else
            {
                Right(shapes, words, window.Right, window.Bottom - 3, Size - 0.2);
            }
        }

        foreach ((int dr, double y) in (ReadOnlySpan<(int, double)>)[(-1, window.Bottom + half), (1, window.Top - half)])
        {
            if (row + dr < 0 || row + dr >= tiling.Rows)
            {
                continue;
            }

            Segment(shapes, Join, window.Left, y, window.Right, y);
            Cross(shapes, window.Left + (window.Width / 4), y);
            Cross(shapes, window.Right - (window.Width / 4), y);
            string words = string.Create(CultureInfo.InvariantCulture, $"joins page {PageAt(column, row + dr)}");
            double middle = (window.Left + window.Right - Helvetica.Width(words, Size - 0.2)) / 2;
            Write(shapes, words, middle, dr < 0 ? window.Bottom - 3 : window.Top + 0.8, Size - 0.2);
        }
    }

    private static void Cross(List<Shape> shapes, double x, double y)
    {
        Segment(shapes, Line, x - 4, y, x + 4, y);
        Segment(shapes, Line, x, y - 4, x, y + 4);
    }

    /// <summary>100 mm with a tick every 5; under the same line 4 in with a tick every 1/4 where inches are read.</summary>
    /// <returns>x of its right end.</returns>
    private double Ruler(List<Shape> shapes, double left, double y)
    {
        Scale(shapes, left, y, new(5, 20, 2, 1), "100 mm");
        if (!_inches)
        {
            return left + 100;
        }

        Scale(shapes, left, y, new(25.4 / 4, 16, 4, -1), "4 in");
        return left + 101.6;
    }

    private static void Scale(List<Shape> shapes, double left, double y, Ticks ticks, string full)
    {
        double end = left + (ticks.Unit * ticks.Count);
        Segment(shapes, Line, left, y, end, y);
        for (int i = 0; i <= ticks.Count; i++)
        {
            double height = i == 0 || i == ticks.Count ? EndTick : i % ticks.Major == 0 ? 3 : 1.6;
            double x = left + (i * ticks.Unit);
            Segment(shapes, Line, x, y, x, y + (ticks.Up * height));
        }

        double word = y + (ticks.Up * 3.2) - (ticks.Up < 0 ? Size - 0.2 : 0);
        Write(shapes, "0", left + 1, word, Size - 0.4);
        Write(shapes, full, end + 1, word, Size - 0.2);
    }

    private static void Segment(List<Shape> shapes, string layer, double x1, double y1, double x2, double y2) =>
        shapes.Add(Polyline.Segment(layer, new Point2(x1, y1), new Point2(x2, y2)));

    private static void Write(List<Shape> shapes, string words, double x, double y, double height) =>
        shapes.Add(new Text(Words, new(x, y), height, 0, words));

    private static void Right(List<Shape> shapes, string words, double right, double y, double height) =>
        Write(shapes, words, right - Helvetica.Width(words, height), y, height);

    private static void Fitted(List<Shape> shapes, string words, double x, double y, double height, double width) =>
        Write(shapes, words, x, y, TextFit.HeightFor(words, height, width));

    /// <summary>Marks along a ruler: mm from one to the next, how many, every how many a longer one, and the side they stand on (1 above, −1 below).</summary>
    private readonly record struct Ticks(double Unit, int Count, int Major, int Up);
}
