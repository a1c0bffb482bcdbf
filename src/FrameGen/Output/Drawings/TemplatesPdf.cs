using System.Globalization;
using System.Text;
using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Formats.Pdf;
using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>All wrapped pieces at 1:1 on pages: small ones side by side, one that is larger than a page spread over several.</summary>
internal static class TemplatesPdf
{
    /// <summary>Marks named above the pieces of one page, at most.</summary>
    private const int MostNamed = 4;

    /// <summary>Writes the pieces of all parts, near the order of the cut list; one page that says so where there is none.</summary>
    /// <param name="package">The frame's papers.</param>
    /// <returns>The file.</returns>
    public static byte[] Write(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        (double Width, double Height) paper = PageFrame.Paper(model.Fabrication.Page);
        List<PaperPiece> pieces =
        [
            .. from part in package.Parts
               from piece in TemplatePieces.Of(package, part)
               select new PaperPiece(part, piece, PageTiling.For(piece.Bounds.Width, piece.Bounds.Height, paper)),
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

        List<int> small = [.. Enumerable.Range(0, pieces.Count).Where(i => pieces[i].Tiling.Count == 1)];
        IReadOnlyList<PackedSheet> sheets =
            SheetPacking.Pack([.. small.Select(i => (pieces[i].Piece.Bounds.Width, pieces[i].Piece.Bounds.Height))], model.Fabrication.Page);
        int count = sheets.Count + pieces.Sum(p => p.Tiling.Count > 1 ? p.Tiling.Count : 0);
        var pages = new List<PdfPage>();
        int next = 0;
        for (int i = 0; i < pieces.Count; i++)
        {
            if (pieces[i].Tiling.Count > 1)
            {
                AddPages(pages, frame, pieces[i], count);
            }
            else if (next < sheets.Count && small[sheets[next].Pieces[0].Piece] == i)
            {
                PackedSheet sheet = sheets[next++];
                pages.Add(Page(frame, sheet, [.. sheet.Pieces.Select(p => pieces[small[p.Piece]])], pages.Count + 1, count));
            }
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

    /// <summary>A page of pieces that lie side by side; one alone stands in the middle.</summary>
    private static PdfPage Page(PageFrame frame, PackedSheet sheet, IReadOnlyList<PaperPiece> pieces, int number, int count)
    {
        Box2 window = sheet.Window;
        var views = new List<PdfView>(pieces.Count + 1);
        for (int i = 0; i < pieces.Count; i++)
        {
            Box2 bounds = pieces[i].Piece.Bounds;
            (double left, double down) = pieces.Count > 1
                ? (sheet.Pieces[i].Left, sheet.Pieces[i].Down)
                : ((window.Width - bounds.Width) / 2, (window.Height - bounds.Height) / 2);
            views.Add(new PdfView(
                pieces[i].Piece.Drawing, new Point2(window.Left + left - bounds.Left, window.Top - down - bounds.Top), Clip(window)));
        }

        string subject = string.Join(",  ", pieces.Take(MostNamed).Select(p => p.Name));
        if (pieces.Count > MostNamed)
        {
            subject += string.Create(CultureInfo.InvariantCulture, $"  and {pieces.Count - MostNamed} more");
        }

        var tiling = new PageTiling(sheet.Width, sheet.Height, 1, 1);
        views.Add(new PdfView(PageFrame.ToDrawing(frame.Draw(tiling, subject, number, count)), default, null));
        return new PdfPage(sheet.Width, sheet.Height, views);
    }

    /// <summary>Half a heavy line's width more, so that a line on the window's edge keeps its width.</summary>
    private static Box2 Clip(Box2 window) => new(window.Left - 0.3, window.Bottom - 0.3, window.Right + 0.3, window.Top + 0.3);

    /// <summary>The pages of a piece that is larger than one.</summary>
    private static void AddPages(List<PdfPage> pages, PageFrame frame, PaperPiece paper, int count)
    {
        (TemplatePiece piece, PageTiling tiling, string subject) = (paper.Piece, paper.Tiling, paper.Name);
        Box2 window = tiling.Window;
        Box2 bounds = piece.Bounds;
        int first = pages.Count + 1;

        Box2 clip = Clip(window);

        // It begins in the left corner that has its label, so that the label is not spread over two pages; where one row or column is
        // enough it stands in its middle.
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
                string where = $"{subject}, sheet {pages.Count - first + 2} of {tiling.Count}";
                List<Shape> around = frame.Draw(tiling, where, pages.Count + 1, count);
                PageFrame.JoinMarks(around, tiling, column, row, first);
                pages.Add(new PdfPage(
                    tiling.PageWidth,
                    tiling.PageHeight,
                    [new PdfView(Seen(piece.Drawing, origin, clip), origin, clip), new PdfView(PageFrame.ToDrawing(around), default, null)]));
            }
        }
    }

    /// <summary>A piece, whose it is, and the pages it would take alone.</summary>
    private sealed record PaperPiece(Part Part, TemplatePiece Piece, PageTiling Tiling)
    {
        public string Name => $"{Part.Name}  {PartWords.Name(Piece.End)} END";
    }
}
