using FrameGen.Output;
using Spectre.Console;

namespace FrameGen.Cli.Reports;

/// <summary>The cautions, in short, at the end of a report.</summary>
internal static class CautionsReport
{
    /// <summary>Prints them.</summary>
    public static void Print(Terminal terminal)
    {
        terminal.Out.WriteLine();
        terminal.Draw(new Text($"Cautions: {Cautions.Brief}\n"));
    }
}
