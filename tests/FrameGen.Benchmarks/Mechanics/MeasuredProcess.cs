using System.Diagnostics;
using System.Globalization;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>What a process said about itself, or what could be seen of it.</summary>
internal sealed class MeasuredProcess
{
    private readonly Dictionary<string, double> _values;

    private MeasuredProcess(Dictionary<string, double> values) => _values = values;

    /// <summary>A value the process printed; not a number where it didn't.</summary>
    public double this[string key] => _values.GetValueOrDefault(key, double.NaN);

    /// <summary>Runs this program again.</summary>
    public static MeasuredProcess Self(string[] arguments)
    {
        string program = Environment.ProcessPath ?? "dotnet";
        bool isHost = string.Equals(Path.GetFileNameWithoutExtension(program), "dotnet", StringComparison.Ordinal);
        return Run(program, isHost ? [typeof(MeasuredProcess).Assembly.Location, .. arguments] : arguments);
    }

    /// <summary>
    /// Runs a program to its end. Of what it prints, words of the form key=number are its values; for seconds and peak_mb that it does not
    /// print, its wall time and its largest resident memory stand in.
    /// </summary>
    /// <exception cref="InvalidOperationException">The program ended with an error.</exception>
    public static MeasuredProcess Run(string program, string[] arguments)
    {
        var start = new ProcessStartInfo(program, arguments) { RedirectStandardOutput = true, UseShellExecute = false };
        long began = Stopwatch.GetTimestamp();
        using Process process = Process.Start(start) ?? throw new InvalidOperationException($"{program} did not start.");
        Task<string> printed = process.StandardOutput.ReadToEndAsync();
        long peak = 0;
        while (!process.WaitForExit(5))
        {
            try
            {
                process.Refresh();
                peak = Math.Max(peak, process.PeakWorkingSet64);
            }
            catch (InvalidOperationException)
            {
                // It ended between two looks; the largest so far stands.
            }
        }

        double seconds = Stopwatch.GetElapsedTime(began).TotalSeconds;
        if (process.ExitCode != 0)
        {
            throw new InvalidOperationException($"{program} {string.Join(' ', arguments)} ended with {process.ExitCode}.");
        }

        var values = new Dictionary<string, double>(StringComparer.Ordinal) { ["seconds"] = seconds, ["peak_mb"] = peak / 1048576.0 };
        foreach (string word in printed.Result.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries))
        {
            string[] pair = word.Split('=');
            if (pair.Length == 2 && double.TryParse(pair[1], NumberStyles.Float, CultureInfo.InvariantCulture, out double value))
            {
                values[pair[0]] = value;
            }
        }

        return new MeasuredProcess(values);
    }
}
