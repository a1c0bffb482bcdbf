using System.Collections;

namespace FrameGen.Diagnostics;

/// <summary>Collects what a stage has to say; all errors of a stage are found before it gives up.</summary>
public sealed class DiagnosticList : IReadOnlyCollection<Diagnostic>
{
    private readonly List<Diagnostic> _items = [];
    private readonly HashSet<Diagnostic> _said = [];

    /// <inheritdoc/>
    public int Count => _items.Count;

    /// <summary>True once an error has been said.</summary>
    public bool HasErrors { get; private set; }

    /// <summary>Adds an error.</summary>
    public void Error(SourcePlace? at, string message) => Add(new Diagnostic(Severity.Error, at, message));

    /// <summary>Adds a warning.</summary>
    public void Warning(SourcePlace? at, string message) => Add(new Diagnostic(Severity.Warning, at, message));

    /// <summary>Adds a note.</summary>
    public void Note(SourcePlace? at, string message) => Add(new Diagnostic(Severity.Note, at, message));

    /// <summary>Adds a diagnostic unless the same one stands there already.</summary>
    public void Add(Diagnostic diagnostic)
    {
        HasErrors |= diagnostic.Severity == Severity.Error;
        if (_said.Add(diagnostic))
        {
            _items.Add(diagnostic);
        }
    }

    /// <inheritdoc/>
    public IEnumerator<Diagnostic> GetEnumerator() => _items.GetEnumerator();

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();
}
