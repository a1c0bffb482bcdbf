namespace FrameGen.Formats.Drawings;

/// <summary>
/// Advance widths of Helvetica, to fit text before it is written. PDF readers print with these widths; CAD programs do
/// so too where the drawing's text style (Arial, made to the same widths) is at hand.
/// </summary>
/// <remarks>
/// Widths in thousandths of the font size from Adobe's font metrics for the standard Helvetica (WinAnsi order, codes 32
/// to 255; 350, the width of a bullet, where WinAnsi has no character of its own). Capitals are 718, descenders 207.
/// </remarks>
public static class Helvetica
{
    /// <summary>Height of capitals in thousandths of the font size.</summary>
    public const double CapHeight = 718;

    /// <summary>How far letters such as g reach below the base line, as a share of the height of capitals.</summary>
    public const double Descent = 207 / CapHeight;

    private static readonly short[] Widths =
    [
        278, 278, 355, 556, 556, 889, 667, 191, 333, 333, 389, 584, 278, 333, 278, 278,
        556, 556, 556, 556, 556, 556, 556, 556, 556, 556, 278, 278, 584, 584, 584, 556,
        1015, 667, 667, 722, 722, 667, 611, 778, 722, 278, 500, 667, 556, 833, 722, 778,
        667, 778, 722, 667, 611, 722, 667, 944, 667, 667, 611, 278, 278, 278, 469, 556,
        333, 556, 556, 500, 556, 556, 278, 556, 556, 222, 222, 500, 222, 833, 556, 556,
        556, 556, 333, 500, 278, 556, 500, 722, 500, 500, 500, 334, 260, 334, 584, 350,
        556, 350, 222, 556, 333, 1000, 556, 556, 333, 1000, 667, 333, 1000, 350, 611, 350,
        350, 222, 222, 333, 333, 350, 556, 1000, 333, 1000, 500, 333, 944, 350, 500, 667,
        278, 333, 556, 556, 556, 556, 260, 556, 333, 737, 370, 556, 584, 333, 737, 333,
        400, 584, 333, 333, 333, 556, 537, 278, 333, 333, 365, 556, 834, 834, 834, 611,
        667, 667, 667, 667, 667, 667, 1000, 722, 667, 667, 667, 667, 278, 278, 278, 278,
        722, 722, 778, 778, 778, 778, 778, 584, 778, 722, 722, 722, 722, 667, 667, 611,
        556, 556, 556, 556, 556, 556, 889, 500, 556, 556, 556, 556, 278, 278, 278, 278,
        556, 556, 556, 556, 556, 556, 556, 584, 611, 556, 556, 556, 556, 500, 556, 500,
    ];

    // Windows code page 1252, codes 128 to 159; '\0' where it has no character.
    private const string HighControls = "\u20AC\0\u201A\u0192\u201E\u2026\u2020\u2021\u02C6\u2030\u0160\u2039\u0152\0\u017D\0\0\u2018\u2019\u201C\u201D\u2022\u2013\u2014\u02DC\u2122\u0161\u203A\u0153\0\u017E\u0178";

    /// <summary>Length of a line of text along its base line, mm.</summary>
    /// <param name="text">Characters that Helvetica lacks count as wide as a capital M.</param>
    /// <param name="height">Of capitals, mm.</param>
    public static double Width(ReadOnlySpan<char> text, double height)
    {
        int thousandths = 0;
        foreach (char c in text)
        {
            thousandths += TryEncode(c, out byte code) ? Widths[code - 32] : 833;
        }

        return thousandths / CapHeight * height;
    }

    /// <summary>The WinAnsi code of a character; false where there is none, and for control characters.</summary>
    public static bool TryEncode(char c, out byte code)
    {
        if (c is >= ' ' and <= '~' or >= '\u00A0' and <= '\u00FF')
        {
            code = (byte)c;
            return true;
        }

        int high = c == '\0' ? -1 : HighControls.IndexOf(c, StringComparison.Ordinal);
        code = (byte)(128 + high);
        return high >= 0;
    }
}
