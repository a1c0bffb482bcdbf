using FrameGen.Diagnostics;
using FrameGen.Sizing;

namespace FrameGen.Cli;

/// <summary>One run of the pipeline for a command: its progress line and what it has to say.</summary>
internal sealed class Job(Terminal terminal)
{
    /// <summary>What the stages reported.</summary>
    public DiagnosticList Diagnostics { get; } = [];

    /// <summary>Reads, resolves and sizes a spec.</summary>
    /// <returns>Null when an error was reported.</returns>
    /// <exception cref="WrongInputException">There is no such file, or it is a folder.</exception>
    public SizedFrame? Size(string spec)
    {
        SpecFile.Require(spec);
        return With(p => p.Size(p.Resolve(p.Read(spec))));
    }

    /// <summary>What a command that sized a frame returns to the shell.</summary>
    public int CodeFor(SizedFrame? sized)
    {
        if (Diagnostics.HasErrors || sized is null)
        {
            return ExitCode.WrongInput;
        }

        return sized.Status == SizingStatus.Unmet ? ExitCode.Unmet : ExitCode.Done;
    }

    /// <summary>Runs stages with a progress line that is wiped before anything else is printed.</summary>
    public T With<T>(Func<FramePipeline, T> stages)
    {
        using var progress = new ProgressLine(terminal);
        return stages(new FramePipeline(Diagnostics, progress));
    }

    /// <summary>Prints what was reported, and how much of it.</summary>
    /// <param name="ending">Said after the count of errors.</param>
    public void PrintDiagnostics(string ending)
    {
        int errors = 0;
        int warnings = 0;
        foreach (Diagnostic diagnostic in Diagnostics)
        {
            errors += diagnostic.Severity == Severity.Error ? 1 : 0;
            warnings += diagnostic.Severity == Severity.Warning ? 1 : 0;
            terminal.Error.WriteLine(diagnostic);
        }

        if (errors > 0)
        {
            string also = warnings > 0 ? $" and {Count(warnings, "warning")}" : string.Empty;
            terminal.Error.WriteLine($"{Count(errors, "error")}{also}{ending}");
        }
        else if (warnings > 1)
        {
            terminal.Error.WriteLine(Count(warnings, "warning"));
        }
    }

    private static string Count(int count, string what) => count == 1 ? $"1 {what}" : $"{count} {what}s";
}
