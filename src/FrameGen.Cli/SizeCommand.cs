using FrameGen.Cli.Reports;
using FrameGen.Sizing;

namespace FrameGen.Cli;

/// <summary><c>framegen size</c>: the sections and the targets that ask for them.</summary>
internal sealed class SizeCommand(Terminal terminal, string spec, bool json)
{
    private readonly Job _job = new(terminal);

    /// <summary>Runs it.</summary>
    public int Run()
    {
        SizedFrame? sized = _job.Size(spec);
        _job.PrintDiagnostics(string.Empty);
        int code = _job.CodeFor(sized);
        if (json)
        {
            JsonReport.Print(terminal, "size", code, _job.Diagnostics, sized, package: null, folder: null);
        }
        else if (sized is not null)
        {
            FrameReport report = new(terminal, sized);
            report.PrintTitle();
            report.PrintSizes();
            report.PrintTargets();
            report.PrintWhy();
        }

        return code;
    }
}
