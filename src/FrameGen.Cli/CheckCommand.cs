using FrameGen.Cli.Reports;
using FrameGen.Fabrication;
using FrameGen.Sizing;

namespace FrameGen.Cli;

/// <summary><c>framegen check</c>: everything that a build does but writing.</summary>
internal sealed class CheckCommand(Terminal terminal, string spec, bool json)
{
    private readonly Job _job = new(terminal);

    /// <summary>Runs it.</summary>
    public int Run()
    {
        SizedFrame? sized = _job.Size(spec);
        ShopPackage? package = null;
        if (sized is null || FramePipeline.CanCope(sized))
        {
            package = _job.With(p => p.Plan(p.Cope(sized)));
        }
        else
        {
            _job.Diagnostics.Note(null, "not supported yet: cut ends of bent tubes that are not round; sizes, targets and cases are checked, joints are not");
        }

        _job.PrintDiagnostics(string.Empty);
        int code = _job.CodeFor(sized);
        if (json)
        {
            JsonReport.Print(terminal, "check", code, _job.Diagnostics, sized, package, folder: null);
        }
        else if (sized is not null)
        {
            Print(sized, package);
        }

        return code;
    }

    private void Print(SizedFrame sized, ShopPackage? package)
    {
        FrameReport report = new(terminal, sized);
        report.PrintTitle();
        report.PrintSizes();
        report.PrintTargets();
        report.PrintCases();
        StabilityReport.Print(terminal, sized);
        report.PrintReactions();
        report.PrintJoints();
        if (package is not null)
        {
            new PartsReport(terminal, package).Print();
        }

        CautionsReport.Print(terminal);
    }
}
