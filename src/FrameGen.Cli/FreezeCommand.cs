using FrameGen.Cli.Reports;
using FrameGen.Fabrication;
using FrameGen.Output;
using FrameGen.Output.Folders;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Cli;

/// <summary><c>framegen freeze</c>: pins the sizes of a frame that is built, in a file beside its spec.</summary>
/// <param name="terminal">Where results and messages go.</param>
/// <param name="spec">Path of the spec.</param>
/// <param name="add">True to keep the sizes that are pinned already, and pin those of new groups.</param>
/// <param name="replace">True to pin all anew; the old file is kept beside.</param>
/// <param name="anyway">True to pin sizes that miss a target.</param>
/// <param name="json">True for JSON.</param>
internal sealed class FreezeCommand(Terminal terminal, string spec, bool add, bool replace, bool anyway, bool json)
{
    private readonly Job _job = new(terminal);
    private readonly string _path = FrozenSpec.PathBeside(spec);

    private enum Outcome
    {
        Nothing,
        Written,
        Unchanged,
    }

    /// <summary>Runs it.</summary>
    /// <exception cref="WrongInputException">There is a file of pinned sizes and nobody said what to do with it, or none to add to.</exception>
    public int Run()
    {
        SpecFile.Require(spec);
        if (add && replace)
        {
            throw new WrongInputException("--add keeps the sizes that are frozen, --replace chooses all anew; write one of them");
        }

        bool exists = File.Exists(_path);
        if (add && !exists)
        {
            throw new WrongInputException($"there is no {_path} to add to; leave --add out");
        }

        SizedFrame? sized = _job.With(p => p.Size(p.Resolve(add ? p.Read(spec) : p.ReadUnfrozen(spec), newGroupsChoose: add)));
        bool refused = sized?.Status == SizingStatus.Unmet && !anyway;
        ShopPackage? package = sized is null || refused || !FramePipeline.CanCope(sized) ? null : _job.With(p => p.Plan(p.Cope(sized)));
        _job.PrintDiagnostics("; nothing was frozen");
        Outcome outcome = sized is null || refused || _job.Diagnostics.HasErrors ? Outcome.Nothing : Write(FrozenText.Write(sized, package), exists);
        int code = _job.CodeFor(sized);
        if (json)
        {
            JsonReport.Print(terminal, "freeze", code, _job.Diagnostics, sized, package: null, folder: null);
        }
        else if (sized is not null)
        {
            var report = new FrameReport(terminal, sized);
            report.PrintTitle();
            report.PrintSizes();
        }

        if (refused)
        {
            terminal.Error.WriteLine("error: a target is not met; nothing was frozen (--anyway does it all the same)");
        }
        else if (outcome != Outcome.Nothing && !json)
        {
            terminal.Out.WriteLine($"Frozen: {_path} ({(outcome == Outcome.Written ? "written" : "unchanged")}); keep it with the spec");
        }

        return code;
    }

    private Outcome Write(byte[] bytes, bool exists)
    {
        if (exists && File.ReadAllBytes(_path).AsSpan().SequenceEqual(bytes))
        {
            return Outcome.Unchanged;
        }

        if (exists && !add && !replace)
        {
            throw new WrongInputException(
                $"{_path} is there already, and these sizes are not the same. --add keeps what is frozen and chooses sizes for new groups only; "
                + "--replace chooses all anew, and moves the old file aside. Nothing was written.");
        }

        // Whole or not at all: a file cut short would pin half a frame.
        string fresh = _path + ".new";
        File.WriteAllBytes(fresh, bytes);
        if (exists && replace)
        {
            string folder = Path.GetDirectoryName(Path.GetFullPath(_path))!;
            var kept = new KeptFiles(Path.Join(folder, Path.GetFileNameWithoutExtension(spec) + ".kept"));
            terminal.Error.WriteLine($"kept: {kept.Take(folder, Path.GetFileName(_path))}");
        }

        File.Move(fresh, _path, overwrite: true);
        return Outcome.Written;
    }
}
