using FrameGen.Formats.Drawings;
using FrameGen.Output.Drawings;
using Xunit;

namespace FrameGen.Tests.Output.Drawings;

public class TextFitTests
{
    [Theory]
    [InlineData(1.6, 45)]
    [InlineData(2.5, 60)]
    [InlineData(3, 8)]
    public void No_line_is_wider_than_its_room(double height, double width)
    {
        const string text = "Datum to the nearer end of a square-sawn blank, a-very-long-name-of-a-tube-that-no-line-holds-in-one-piece-0123456789 MMMMMMWWWW";
        IReadOnlyList<string> lines = TextFit.Wrap(text, height, width);
        Assert.All(lines, line => Assert.InRange(Helvetica.Width(line, height), 0, width));
        Assert.Equal(text.Replace(" ", string.Empty, StringComparison.Ordinal), string.Concat(lines).Replace(" ", string.Empty, StringComparison.Ordinal));
    }

    [Fact]
    public void Tied_words_stay_together_and_print_a_space()
    {
        IReadOnlyList<string> lines = TextFit.Wrap($"aaaa bbbb 12.5{TextFit.Tie}mm", 1, 11);
        Assert.Equal(["aaaa bbbb", "12.5 mm"], lines);
    }

    [Fact]
    public void Line_breaks_of_a_title_are_spaces() => Assert.Equal(["a b"], TextFit.Wrap("a\r\nb", 1, 100));

    [Fact]
    public void A_long_name_breaks_after_a_hyphen_where_it_can() =>
        Assert.Equal(["abcdef-", "ghijkl"], TextFit.Wrap("abcdef-ghijkl", 1, 7.5));
}
