using FrameGen.Formats.Drawings;

namespace FrameGen.Output.Drawings;

/// <summary>Fits words into a width.</summary>
internal static class TextFit
{
    /// <summary>Holds two words together in a text that is wrapped; printed as a space.</summary>
    public const char Tie = '\u00A0';

    /// <summary>Room kept beyond Helvetica's own widths, for look-alikes that differ in a few letters.</summary>
    private const double Reserve = 1.04;

    /// <summary>Advance of every character in heights of capitals where a CAD program puts a face of even pitch in Arial's place.</summary>
    private const double EvenPitch = 0.83;

    /// <summary>Width that a line takes in Helvetica or in a face of even pitch, whichever is wider, mm.</summary>
    public static double Width(ReadOnlySpan<char> text, double height) =>
        Math.Max(Reserve * Helvetica.Width(text, height), EvenPitch * text.Length * height);

    /// <summary>Breaks a text into lines between words, inside a word only where it alone is too long.</summary>
    /// <param name="text">Words parted by white space.</param>
    /// <param name="height">Of capitals, mm.</param>
    /// <param name="width">Of a line, mm; at least one character goes on each line.</param>
    public static IReadOnlyList<string> Wrap(string text, double height, double width)
    {
        var lines = new List<string>();
        string line = string.Empty;
        foreach (string word in text.Split([' ', '\t', '\r', '\n'], StringSplitOptions.RemoveEmptyEntries))
        {
            string longer = line.Length == 0 ? word : $"{line} {word}";
            if (Width(longer, height) <= width)
            {
                line = longer;
                continue;
            }

            if (line.Length > 0)
            {
                lines.Add(line);
            }

            line = word;
            while (Width(line, height) > width && line.Length > 1)
            {
                int head = Head(line, height, width);
                lines.Add(line[..head]);
                line = line[head..];
            }
        }

        if (line.Length > 0)
        {
            lines.Add(line);
        }

        return [.. lines.Select(l => l.Replace(Tie, ' '))];
    }

    /// <summary>The largest height up to a wanted one at which a line fits a width, mm.</summary>
    public static double HeightFor(string text, double wanted, double width) =>
        Math.Min(wanted, width / Math.Max(Width(text, 1), 1e-9));

    /// <summary>How many characters of a word fit, better up to a hyphen or underscore in its later half.</summary>
    private static int Head(string word, double height, double width)
    {
        int fits = 1;
        while (fits + 1 < word.Length && Width(word.AsSpan(0, fits + 1), height) <= width)
        {
            fits++;
        }

        if (char.IsHighSurrogate(word[fits - 1]) && fits + 1 < word.Length)
        {
            fits++;
        }

        int hyphen = word.AsSpan(0, fits).LastIndexOfAny('-', '_');
        return hyphen + 1 > fits / 2 ? hyphen + 1 : fits;
    }
}
