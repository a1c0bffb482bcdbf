using FrameGen.Formats.Drawings;

namespace FrameGen.Output.Drawings;

/// <summary>How a piece is spread over pages: one window of the piece a page, neighbours overlapping.</summary>
/// <param name="PageWidth">mm.</param>
/// <param name="PageHeight">mm.</param>
/// <param name="Columns">Pages side by side.</param>
/// <param name="Rows">Pages above one another.</param>
internal sealed record PageTiling(double PageWidth, double PageHeight, int Columns, int Rows)
{
    /// <summary>Shared by two neighbours, mm.</summary>
    public const double Overlap = 10;

    /// <summary>Edge that printers leave white, mm.</summary>
    public const double Margin = 10;

    /// <summary>Kept for the words above the piece, mm.</summary>
    public const double Head = 14;

    /// <summary>Kept for ruler and words below the piece, mm.</summary>
    public const double Foot = 24;

    /// <summary>Pages in all.</summary>
    public int Count => Columns * Rows;

    /// <summary>The part of a page that a piece may cover.</summary>
    public Box2 Window => WindowOf(PageWidth, PageHeight);

    /// <summary>The tiling with the fewest pages; portrait where both ways need as many.</summary>
    /// <param name="width">Of the piece, mm.</param>
    /// <param name="height">Of the piece, mm.</param>
    /// <param name="paper">Portrait page, mm.</param>
    public static PageTiling For(double width, double height, (double Width, double Height) paper)
    {
        PageTiling portrait = On(paper.Width, paper.Height, width, height);
        PageTiling landscape = On(paper.Height, paper.Width, width, height);
        return landscape.Count < portrait.Count ? landscape : portrait;
    }

    /// <summary>The rectangle of the piece that a page shows, mm from the piece's lower left corner.</summary>
    /// <param name="column">0 is the left-most.</param>
    /// <param name="row">0 is the lowest.</param>
    public (double Left, double Bottom) Corner(int column, int row) =>
        (column * (Window.Width - Overlap), row * (Window.Height - Overlap));

    /// <summary>The part of a page of that size that a piece may cover.</summary>
    public static Box2 WindowOf(double width, double height) => new(Margin, Margin + Foot, width - Margin, height - Margin - Head);

    private static PageTiling On(double pageWidth, double pageHeight, double width, double height)
    {
        Box2 window = WindowOf(pageWidth, pageHeight);
        return new PageTiling(pageWidth, pageHeight, Tiles(width, window.Width), Tiles(height, window.Height));
    }

    private static int Tiles(double size, double window) =>
        size <= window ? 1 : 1 + (int)Math.Ceiling((size - window) / (window - Overlap));
}
