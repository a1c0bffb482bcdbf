namespace FrameGen.Diagnostics;

/// <summary>How grave a diagnostic is.</summary>
public enum Severity
{
    /// <summary>Worth knowing.</summary>
    Note,

    /// <summary>The builder should look at it; the build goes on.</summary>
    Warning,

    /// <summary>The stage can't give a result.</summary>
    Error,
}

/// <summary>A place in a spec's text.</summary>
/// <param name="File">The file as the user named it, or as the including file named it.</param>
/// <param name="Line">From 1.</param>
/// <param name="Column">From 1.</param>
public sealed record SourcePlace(string File, int Line, int Column)
{
    /// <inheritdoc/>
    public override string ToString() => $"{File}:{Line}:{Column}";
}

/// <summary>Something to tell the spec's author: where, what, why, what to do.</summary>
/// <param name="Severity">How grave.</param>
/// <param name="At">Where in the spec; null where it concerns the whole.</param>
/// <param name="Message">In the user's words.</param>
public sealed record Diagnostic(Severity Severity, SourcePlace? At, string Message)
{
    /// <inheritdoc/>
    public override string ToString() =>
        At is null
            ? $"{Severity.ToString().ToLowerInvariant()}: {Message}"
            : $"{At}: {Severity.ToString().ToLowerInvariant()}: {Message}";
}
