using FrameGen.Cli.Reports;
using FrameGen.Fabrication;
using FrameGen.Output;
using FrameGen.Output.Folders;
using FrameGen.Sizing;

namespace FrameGen.Cli;

/// <summary><c>framegen build</c>: from the spec to a folder of papers.</summary>
internal sealed class BuildCommand(
    Terminal terminal, string spec, string? output, bool replace, bool anyway, PaperOptions options, bool json, bool quiet)
{
    private readonly Job _job = new(terminal);

    /// <summary>Runs it.</summary>
    public int Run()
    {
        SpecFile.Require(spec);
        (string shown, OutputFolder folder) = SpecFile.Output(spec, output);
        SizedFrame? sized = _job.Size(spec);
        bool unmet = sized?.Status == SizingStatus.Unmet;
        ShopPackage? package = unmet && !anyway ? null : _job.With(p => p.Plan(p.Cope(sized)));
        IReadOnlyList<OutputFile>? files = _job.With(p => p.Papers(package, options));
        _job.PrintDiagnostics("; nothing was written");
        WriteResult? written = files is null ? null : folder.Write(files, replace);
        int code = _job.CodeFor(sized);
        if (json)
        {
            JsonReport.Print(terminal, "build", code, _job.Diagnostics, sized, package, written is null ? null : shown);
        }
        else if (sized is not null && !quiet)
        {
            Print(sized, package);
        }

        Conclude(sized, written, files, shown);
        return code;
    }

    private void Print(SizedFrame sized, ShopPackage? package)
    {
        FrameReport report = new(terminal, sized);
        report.PrintTitle();
        report.PrintSizes();
        report.PrintTargets();
        StabilityReport.Print(terminal, sized);
        report.PrintReactions();
        if (package is not null)
        {
            new PartsReport(terminal, package).Print();
        }
    }

    private void Conclude(SizedFrame? sized, WriteResult? written, IReadOnlyList<OutputFile>? files, string shown)
    {
        bool talks = !json && !quiet;
        foreach (string kept in written?.Kept ?? [])
        {
            terminal.Error.WriteLine($"kept: {kept}");
        }

        if (written?.Leftover is { } leftover)
        {
            terminal.Error.WriteLine($"warning: the old papers could not be cleared away ({leftover}); the next build tries again");
        }

        if (sized?.Status == SizingStatus.Unmet && !_job.Diagnostics.HasErrors)
        {
            terminal.Error.WriteLine(written is null
                ? "error: a target is not met; no papers were written (--anyway writes them, stamped)"
                : $"error: a target is not met; the papers are stamped {Cautions.NotMeetingTargets}");
        }

        if (written is not null && talks)
        {
            string done = written.Changed ? "written" : "unchanged";
            terminal.Out.WriteLine($"Papers: {shown} ({files!.Count} files, {done})");
            CautionsReport.Print(terminal);
        }
    }
}
