using FrameGen.Diagnostics;

namespace FrameGen.Spec;

/// <summary>What is wrong with a spec's files, in the order found; told in the order of the text.</summary>
internal sealed class ProblemList
{
    /// <summary>Most errors told of one spec: nobody reads more, and the first ones explain the rest.</summary>
    public const int MostTold = 200;

    private readonly DiagnosticList _problems = [];

    /// <summary>How many there are.</summary>
    public int Count => _problems.Count;

    /// <summary>Adds an error, once.</summary>
    public void Error(SourcePlace at, string message) => _problems.Error(at, message);

    /// <summary>Hands them over, sorted by file, line and column.</summary>
    /// <param name="files">The files' names in their order.</param>
    /// <param name="diagnostics">Where they go.</param>
    public void TellInOrder(IReadOnlyList<string> files, DiagnosticList diagnostics)
    {
        foreach (Diagnostic problem in TextOrder.Sort(_problems, files).Take(MostTold))
        {
            diagnostics.Add(problem);
        }

        if (_problems.Count > MostTold)
        {
            diagnostics.Error(null, $"and {_problems.Count - MostTold} more errors; mend these first");
        }
    }
}
