using FrameGen.Cli.Reports;
using FrameGen.Comparison;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Sizing.Explanation;
using FrameGen.Spec;

namespace FrameGen.Cli;

/// <summary><c>framegen explain</c>: why a tube has its size, and what cuts its ends.</summary>
internal sealed class ExplainCommand(Terminal terminal, string spec, string tube, bool json)
{
    private readonly Job _job = new(terminal);

    /// <summary>Runs it.</summary>
    /// <exception cref="WrongInputException">The spec has no such tube.</exception>
    public int Run()
    {
        SpecFile.Require(spec);
        FrameSpec? read = _job.With(p => p.Read(spec));
        FrameModel? model = _job.With(p => p.Resolve(read));

        // A wrong name is told before the long search.
        int named = model is null ? 0 : TubeName.Find(model, spec, tube);
        SizedFrame? sized = _job.With(p => p.Size(model));
        _job.PrintDiagnostics(string.Empty);
        int code = _job.CodeFor(sized);
        if (sized is null)
        {
            if (json)
            {
                JsonReport.Print(terminal, "explain", code, _job.Diagnostics, sized: null, package: null, folder: null);
            }

            return code;
        }

        Candidate chosen = sized.ChosenFor(named);
        TubeGroup group = sized.Model.Groups[sized.Model.Tubes[named].Group];
        var explanation = TubeExplainer.Explain(sized, named, Supply.Of(read).InPlaceOf(chosen, group.Material));
        if (json)
        {
            ExplanationJson.Print(terminal, code, explanation);
        }
        else
        {
            new ExplanationReport(terminal, explanation).Print();
        }

        return code;
    }
}
