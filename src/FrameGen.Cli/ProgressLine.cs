using System.Globalization;

namespace FrameGen.Cli;

/// <summary>One line on the terminal that says what is being done, once a job has taken a second.</summary>
internal sealed class ProgressLine : IProgress<PipelineProgress>, IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(1);
    private static readonly TimeSpan Beat = TimeSpan.FromMilliseconds(200);

    private readonly Lock _gate = new();
    private readonly TextWriter _error;
    private readonly Timer? _timer;
    private PipelineProgress _last;
    private int _shown;

    /// <summary>Begins to wait; shows nothing where messages don't go to a terminal.</summary>
    public ProgressLine(Terminal terminal)
    {
        _error = terminal.Error;
        _timer = terminal.ErrorIsTerminal ? new Timer(_ => Show(), state: null, Patience, Beat) : null;
    }

    /// <inheritdoc/>
    public void Report(PipelineProgress value)
    {
        lock (_gate)
        {
            _last = value;
        }
    }

    /// <summary>Wipes the line.</summary>
    public void Dispose()
    {
        if (_timer is null)
        {
            return;
        }

        using var done = new ManualResetEvent(initialState: false);
        if (_timer.Dispose(done))
        {
            done.WaitOne();
        }

        if (_shown > 0)
        {
            _error.Write($"\r{new string(' ', _shown)}\r");
        }
    }

    private void Show()
    {
        lock (_gate)
        {
            string text = _last.Total > 0
                ? string.Create(CultureInfo.InvariantCulture, $"{_last.Doing}: {_last.Done:N0} of {_last.Total:N0}")
                : $"{_last.Doing} ...";
            _error.Write($"\r{text.PadRight(_shown)}");
            _shown = Math.Max(_shown, text.Length);
        }
    }
}
