using CsCheck;
using FrameGen.Formats.Drawings;
using FrameGen.Output.Drawings;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Output.Drawings;

/// <summary>Pieces on sheets: each once, inside the printable part, clear of one another.</summary>
public class SheetPackingTests
{
    // 190 x 239 mm is what an upright A4 sheet leaves for pieces, 277 x 152 mm a lying one.
    private static readonly Gen<(double, double)> Piece = Gen.Select(Gen.Double[8, 190], Gen.Double[8, 152]);

    [Fact]
    public void Pieces_lie_on_their_sheets_and_clear_of_one_another() => Piece.List[1, 60].Sample(pieces =>
    {
        IReadOnlyList<PackedSheet> sheets = SheetPacking.Pack(pieces, PageSize.A4);
        Assert.Equal(Enumerable.Range(0, pieces.Count), sheets.SelectMany(s => s.Pieces.Select(p => p.Piece)).Order());
        foreach (PackedSheet sheet in sheets)
        {
            Box2 window = sheet.Window;
            for (int i = 0; i < sheet.Pieces.Count; i++)
            {
                (int piece, double left, double down) = sheet.Pieces[i];
                (double width, double height) = pieces[piece];
                Assert.InRange(left, 0, window.Width - width + 1e-9);
                Assert.InRange(down, 0, window.Height - height + 1e-9);
                for (int k = 0; k < i; k++)
                {
                    (int other, double otherLeft, double otherDown) = sheet.Pieces[k];
                    bool clear = left >= otherLeft + pieces[other].Item1 + 4.999 || otherLeft >= left + width + 4.999
                        || down >= otherDown + pieces[other].Item2 + 4.999 || otherDown >= down + height + 4.999;
                    Assert.True(clear, $"{piece} lies on {other}");
                }
            }
        }
    });

    [Fact]
    public void Small_pieces_share_a_sheet()
    {
        // Three columns of 60 mm and two rows of 110 mm, with room for scissors between them.
        PackedSheet sheet = Assert.Single(SheetPacking.Pack([.. Enumerable.Repeat((60.0, 110.0), 6)], PageSize.A4));
        Assert.Equal((210.0, 297.0), (sheet.Width, sheet.Height));
        Assert.Equal(2, SheetPacking.Pack([.. Enumerable.Repeat((60.0, 110.0), 7)], PageSize.A4).Count);
    }

    [Fact]
    public void A_wide_piece_lies_on_a_lying_sheet()
    {
        PackedSheet sheet = Assert.Single(SheetPacking.Pack([(250, 100)], PageSize.A4));
        Assert.Equal((297.0, 210.0), (sheet.Width, sheet.Height));
    }

    [Fact]
    public void A_piece_larger_than_a_sheet_is_refused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => SheetPacking.Pack([(300, 300)], PageSize.A4));
}
