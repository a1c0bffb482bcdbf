using FrameGen.Formats.Drawings;
using Xunit;

namespace FrameGen.Tests.Formats;

public class HelveticaTests
{
    // Adobe Font Metrics of Helvetica (Core 14): WX of space 278, A 667, W 944, i 222, m 833, degree 400, germandbls 611, Euro 556; CapHeight 718.
    [Theory]
    [InlineData(" ", 278)]
    [InlineData("A", 667)]
    [InlineData("W", 944)]
    [InlineData("i", 222)]
    [InlineData("m", 833)]
    [InlineData("\u00B0", 400)]
    [InlineData("\u00DF", 611)]
    [InlineData("\u20AC", 556)]
    [InlineData("Ai", 889)]
    public void Widths_are_those_of_the_font_metrics(string text, double thousandths)
    {
        Assert.Equal(thousandths, Helvetica.Width(text, 718), 9);
    }

    [Theory]
    [InlineData('\u0130')]
    [InlineData('\n')]
    [InlineData('\u0085')]
    [InlineData('\0')]
    public void Characters_outside_WinAnsi_have_no_code(char c)
    {
        Assert.False(Helvetica.TryEncode(c, out _));
    }

    // Windows code page 1252.
    [Theory]
    [InlineData('\u20AC', 0x80)]
    [InlineData('\u0178', 0x9F)]
    [InlineData('\u2022', 0x95)]
    [InlineData('\u00D7', 0xD7)]
    public void Codes_are_those_of_code_page_1252(char c, byte code)
    {
        Assert.True(Helvetica.TryEncode(c, out byte written));
        Assert.Equal(code, written);
    }
}
