using System.Text;
using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Formats.Pdf;
using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>All wrapped pieces at 1:1 on pages, one piece a page, or spread over several where it is larger.</summary>
internal static class TemplatesPdf
{
    /// <summary>Writes the pieces of all parts, in the order of the cut list; one page that says so where there is none.</summary>
    /// <param name="package">The frame's papers.</param>
    /// <returns>The file.</returns>
    public static byte[] Write(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        (double Width, double Height) paper = PageFrame.Paper(model.Fabrication.Page);
        List<(Part Part, TemplatePiece Piece, PageTiling Tiling)> pieces =
        [
            .. from part in package.Parts
               from piece in TemplatePieces.Of(package, part)
               select (part, piece, PageTiling.For(piece.Bounds.Width, piece.Bounds.Height, paper)),
        ];

        var frame = new PageFrame(package.Cut.Sized);
        string title = $"Templates: {PartWords.Origin(model)}";
        if (pieces.Count == 0)
        {
            var tiling = new PageTiling(paper.Width, paper.Height, 1, 1);
            List<Shape> shapes = frame.Draw(tiling, "Templates", 1, 1);
            PageFrame.NothingToWrap(shapes, tiling);
            return PdfWriter.Write([new PdfPage(paper.Width, paper.Height, [new PdfView(PageFrame.ToDrawing(shapes), default, null)])], title);
        }

        var pages = new List<PdfPage>();
        int count = pieces.Sum(p => p.Tiling.Count);
        foreach ((Part part, TemplatePiece piece, PageTiling tiling) in pieces)
        {
            AddPages(pages, frame, $"{part.Name}  {PartWords.Name(piece.End)} END", piece, tiling, count);
        }

        return PdfWriter.Write(pages, title);
    }

    /// <summary>The characters of the title and revision that the file's font lacks, each once; <c>?</c> is printed for them.</summary>
    public static IReadOnlyList<Rune> Unprinted(FrameModel model) =>
        [.. PartWords.Origin(model).EnumerateRunes().Where(r => !r.IsBmp || !Helvetica.TryEncode((char)r.Value, out _)).Distinct()];

    /// <summary>What a window shows of a drawing: words that it hides are left out, so that no reader finds them.</summary>
    private static Drawing Seen(Drawing drawing, Point2 origin, Box2 window)
    {
        var seen = new Box2(window.Left - origin.X, window.Bottom - origin.Y, window.Right - origin.X, window.Top - origin.Y);
        return drawing with { Shapes = [.. drawing.Shapes.Where(s => s is not Text || s.Bounds().Overlaps(seen))] };
    }

    private static void AddPages(List<PdfPage> pages, PageFrame frame, string subject, TemplatePiece piece, PageTiling tiling, int count)
    {
        Box2 window = tiling.Window;
        Box2 bounds = piece.Bounds;
        int first = pages.Count + 1;

        // Half a heavy line's width more, so that a line on the window's edge keeps its width.
        var clip = new Box2(window.Left - 0.3, window.Bottom - 0.3, window.Right + 0.3, window.Top + 0.3);

        // A piece that fits stands in the middle of its page; one that does not begins in the left corner that has its label, so that
        // the label is not spread over two pages.
        double restX = tiling.Columns == 1 ? (window.Width - bounds.Width) / 2 : 0;
        double spareY = (tiling.Rows * window.Height) - ((tiling.Rows - 1) * PageTiling.Overlap) - bounds.Height;
        double restY = tiling.Rows == 1 ? spareY / 2 : piece.End == End.From ? spareY : 0;

        // Pages follow one another as they lie on the table: from the upper left.
        for (int row = tiling.Rows - 1; row >= 0; row--)
        {
            for (int column = 0; column < tiling.Columns; column++)
            {
                (double left, double bottom) = tiling.Corner(column, row);
                var origin = new Point2(window.Left + restX - left - bounds.Left, window.Bottom + restY - bottom - bounds.Bottom);
                string where = tiling.Count == 1 ? subject : $"{subject}, sheet {pages.Count - first + 2} of {tiling.Count}";
                List<Shape> around = frame.Draw(tiling, where, pages.Count + 1, count);
                PageFrame.JoinMarks(around, tiling, column, row, first);
                pages.Add(new PdfPage(
                    tiling.PageWidth,
                    tiling.PageHeight,
                    [new PdfView(Seen(piece.Drawing, origin, clip), origin, clip), new PdfView(PageFrame.ToDrawing(around), default, null)]));
            }
        }
    }
}
