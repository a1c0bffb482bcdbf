using System.Globalization;
using FrameGen.Sizing;

namespace FrameGen.Cli.Reports;

/// <summary>How far every case is from buckling the frame, and how it vibrates where that was asked.</summary>
internal static class StabilityReport
{
    /// <summary>Prints both; nothing where nothing was analysed.</summary>
    public static void Print(Terminal terminal, SizedFrame sized)
    {
        if (sized.Cases.Count > 0)
        {
            var table = new ReportTable("Linear buckling of perfect tubes", "case", ">times its loads", "moving most");
            foreach (CaseResult result in sized.Cases)
            {
                table.Row(
                    sized.Model.Cases[result.Case].Name,
                    result.BucklingFactor is { } factor ? Significant(factor) : "-",
                    result.BucklingFactor is null ? "nothing is compressed" : result.BucklesAt);
            }

            table.Draw(terminal);
        }

        if (sized.Frequencies is { Count: > 0 } frequencies)
        {
            terminal.Out.WriteLine($"Natural frequencies with the masses: {string.Join(", ", frequencies.Select(Significant))} Hz");
        }
    }

    /// <summary>Four significant digits, whole from a thousand on.</summary>
    private static string Significant(double value)
    {
        int decimals = value >= 1000 ? 0 : Math.Clamp(3 - (int)Math.Floor(Math.Log10(value)), 0, 6);
        return value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
    }
}
