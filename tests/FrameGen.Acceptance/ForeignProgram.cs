using System.Collections.Concurrent;
using System.ComponentModel;
using System.Diagnostics;
using Xunit;

namespace FrameGen.Acceptance;

/// <summary>
/// A program that this project did not write, to read its files back. Where it is missing the test skips and names it; with
/// FRAMEGEN_REQUIRE_FOREIGN=1 it fails instead.
/// </summary>
internal sealed class ForeignProgram
{
    private static readonly bool IsRequired =
        string.Equals(Environment.GetEnvironmentVariable("FRAMEGEN_REQUIRE_FOREIGN"), "1", StringComparison.Ordinal);

    private static readonly ConcurrentDictionary<string, bool> Modules = new(StringComparer.Ordinal);

    private readonly string _file;

    private ForeignProgram(string file) => _file = file;

    /// <summary>The program, found through PATH unless it has a path of its own.</summary>
    public static ForeignProgram Find(string name)
    {
        bool isThere = name.Contains('/', StringComparison.Ordinal)
            ? File.Exists(name)
            : (Environment.GetEnvironmentVariable("PATH") ?? string.Empty)
                .Split(Path.PathSeparator).Any(folder => folder.Length > 0 && File.Exists(Path.Combine(folder, name)));
        if (!isThere)
        {
            Missing(name);
        }

        return new ForeignProgram(name);
    }

    /// <summary>The system's Python with modules that a test needs.</summary>
    public static ForeignProgram Python(params ReadOnlySpan<string> modules)
    {
        ForeignProgram python = Find("/usr/bin/python3");
        foreach (string module in modules)
        {
            if (!Modules.GetOrAdd(module, name => python.Start(["-c", $"import {name}"]).ExitCode == 0))
            {
                Missing($"the Python module {module}");
            }
        }

        return python;
    }

    /// <summary>Runs it; its standard output. Fails the test where it ends with another code than 0.</summary>
    public string Run(params string[] arguments) => RunIn(string.Empty, arguments);

    /// <summary>Runs it in a folder of its own, for a program that leaves files where it stands.</summary>
    public string RunIn(string folder, params string[] arguments)
    {
        (int exitCode, string output, string errors) = Start(arguments, folder);
        Assert.True(exitCode == 0, $"{_file} {string.Join(' ', arguments)} ended with {exitCode}:\n{output}\n{errors}");
        return output;
    }

    private (int ExitCode, string Output, string Errors) Start(string[] arguments, string folder = "")
    {
        var start = new ProcessStartInfo(_file, arguments) { WorkingDirectory = folder, UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true };
        start.Environment["LC_ALL"] = "C.UTF-8";
        try
        {
            using Process process = Process.Start(start)!;
            Task<string> errors = process.StandardError.ReadToEndAsync(TestContext.Current.CancellationToken);
            string output = process.StandardOutput.ReadToEnd();
            process.WaitForExit();
            return (process.ExitCode, output, errors.GetAwaiter().GetResult());
        }
        catch (Win32Exception)
        {
            Missing(_file);
            throw;
        }
    }

    private static void Missing(string name)
    {
        string message = $"{name} is not installed";
        if (IsRequired)
        {
            Assert.Fail(message);
        }

        Assert.Skip(message);
    }
}

/// <summary>A folder for files that foreign programs read; gone when disposed.</summary>
internal sealed class ScratchFolder : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory("framegen-test-");

    /// <summary>Path of a file in it.</summary>
    public string this[string name] => Path.Combine(_folder.FullName, name);

    /// <summary>Its own path.</summary>
    public string Place => _folder.FullName;

    /// <summary>Writes a file; its path.</summary>
    public string Write(string name, byte[] content)
    {
        File.WriteAllBytes(this[name], content);
        return this[name];
    }

    /// <summary>Writes a text; its path.</summary>
    public string Write(string name, string content)
    {
        File.WriteAllText(this[name], content);
        return this[name];
    }

    public void Dispose() => _folder.Delete(recursive: true);
}
