using FrameGen.Output.Drawings;
using Xunit;

namespace FrameGen.Tests.Output.Drawings;

public class PageTilingTests
{
    private static readonly (double Width, double Height) A4 = (210, 297);

    [Fact]
    public void A_small_piece_takes_one_upright_page() => Assert.Equal(new PageTiling(210, 297, 1, 1), PageTiling.For(120, 100, A4));

    [Fact]
    public void A_wide_piece_lies_on_its_side() => Assert.Equal(new PageTiling(297, 210, 1, 1), PageTiling.For(250, 100, A4));

    [Theory]
    [InlineData(540, 150)]
    [InlineData(300, 700)]
    [InlineData(1000, 1000)]
    public void Pages_cover_the_whole_piece_and_neighbours_share_the_overlap(double width, double height)
    {
        PageTiling tiling = PageTiling.For(width, height, A4);
        (double left, double bottom) = tiling.Corner(tiling.Columns - 1, tiling.Rows - 1);
        Assert.InRange(left + tiling.Window.Width, width, width + tiling.Window.Width);
        Assert.InRange(bottom + tiling.Window.Height, height, height + tiling.Window.Height);
        Assert.Equal(PageTiling.Overlap, tiling.Window.Width - tiling.Corner(1, 0).Left, 9);
    }

    [Fact]
    public void Fewer_pages_win()
    {
        // Upright: three columns of 190 - 10 mm; on its side: two of 277 - 10 mm.
        PageTiling tiling = PageTiling.For(540, 120, A4);
        Assert.Equal((297, 2, 1), (tiling.PageWidth, tiling.Columns, tiling.Rows));
    }
}
