using System.Globalization;
using System.Text.RegularExpressions;

namespace FrameGen.Acceptance.Builds;

/// <summary>What admesh says of a mesh: edges that match, facets it would have to mend, volume.</summary>
internal sealed record StlReport(int Facets, int Unconnected, int Degenerate, int Reversed, int Backwards, double Volume)
{
    /// <summary>True when every facet has its three neighbours and nothing would have to be mended.</summary>
    public bool Clean => Facets > 0 && Unconnected == 0 && Degenerate == 0 && Reversed == 0 && Backwards == 0;

    public static StlReport Of(string file)
    {
        string text = ForeignProgram.Find("admesh").Run(file);
        return new StlReport(
            (int)Number(text, @"Number of facets\s*:\s*(\d+)"),
            (int)Number(text, @"Total disconnected facets\s*:\s*(\d+)"),
            (int)Number(text, @"Degenerate facets\s*:\s*(\d+)"),
            (int)Number(text, @"Facets reversed\s*:\s*(\d+)"),
            (int)Number(text, @"Backwards edges\s*:\s*(\d+)"),
            Number(text, @"Volume\s*:\s*(-?[\d.]+(?:e[+-]?\d+)?)"));
    }

    private static double Number(string text, string pattern)
    {
        Match match = Regex.Match(text, pattern, RegexOptions.None, TimeSpan.FromSeconds(5));
        return match.Success ? double.Parse(match.Groups[1].Value, CultureInfo.InvariantCulture) : throw new InvalidOperationException($"admesh did not say {pattern}:\n{text}");
    }
}
