using System.Text.Json;
using FrameGen.Cli;
using FrameGen.Diagnostics;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Acceptance.Builds;

/// <summary>A spec built into a temporary folder through the command line, and what a reader of its papers needs.</summary>
internal sealed class BuiltFrame : IDisposable
{
    private readonly string _place;

    private BuiltFrame(string place, string specPath)
    {
        _place = place;
        SpecPath = specPath;
        Folder = Path.Combine(_place, "papers");
        var stdout = new StringWriter();
        var stderr = new StringWriter();
        ExitCode = CommandLine.Run(["build", specPath, "-o", Folder], stdout, stderr);
        Stdout = stdout.ToString();
        Stderr = stderr.ToString();
    }

    public string SpecPath { get; }

    public string Folder { get; }

    public int ExitCode { get; }

    public string Stdout { get; }

    public string Stderr { get; }

    /// <summary>Builds a spec of the checkout.</summary>
    public static BuiltFrame FromFile(string specPath) => new(NewPlace(), specPath);

    /// <summary>Builds a spec given as text.</summary>
    public static BuiltFrame FromText(string text)
    {
        string place = NewPlace();
        string path = Path.Combine(place, "frame.yaml");
        File.WriteAllText(path, text);
        return new BuiltFrame(place, path);
    }

    /// <summary>Stops the test with the build's own words when it failed.</summary>
    public BuiltFrame Succeeded()
    {
        if (ExitCode != 0)
        {
            Dispose();
        }

        Xunit.Assert.True(ExitCode == 0, $"exit {ExitCode}\n{Stdout}\n{Stderr}");
        return this;
    }

    public string PathOf(params string[] parts) => Path.Combine([Folder, .. parts]);

    public JsonElement FrameJson() => JsonDocument.Parse(File.ReadAllBytes(PathOf("frame.json"))).RootElement;

    /// <summary>The part that a tube is: its name in files, and how the tube takes what is drawn.</summary>
    public static (string File, double TurnDegrees, bool Swapped) PartOf(JsonElement frame, string tube)
    {
        foreach (JsonElement part in frame.GetProperty("parts").EnumerateArray())
        {
            foreach (JsonElement placed in part.GetProperty("placed").EnumerateArray())
            {
                if (placed.GetProperty("tube").GetString() == tube)
                {
                    return (FileOf(part), placed.GetProperty("turn_deg").GetDouble(), placed.GetProperty("swapped").GetBoolean());
                }
            }
        }

        throw new InvalidOperationException($"{tube} is no part");
    }

    /// <summary>A part's name in files: its mark, with its hand where it has one.</summary>
    public static string FileOf(JsonElement part)
    {
        string hand = part.GetProperty("hand").GetString()!;
        return part.GetProperty("mark").GetString() + (hand.Length == 0 ? string.Empty : "-" + hand);
    }

    /// <summary>Rows of a CSV file by column name; the files hold no quoted commas in these tests.</summary>
    public IReadOnlyList<IReadOnlyDictionary<string, string>> Csv(string file)
    {
        string[] lines = File.ReadAllLines(PathOf(file));
        string[] names = lines[0].Split(',');
        return [.. lines.Skip(1).Select(line => names.Zip(line.Split(',')).ToDictionary(p => p.First, p => p.Second, StringComparer.Ordinal))];
    }

    /// <summary>The model behind the papers: which nodes each tube runs between, and where.</summary>
    public FrameModel Model()
    {
        var diagnostics = new DiagnosticList();
        FrameSpec? spec = SpecReader.Read(SpecPath, diagnostics);
        FrameModel? model = spec is null ? null : ModelResolver.Resolve(spec, diagnostics);
        return model ?? throw new InvalidOperationException(string.Join('\n', diagnostics));
    }

    public void Dispose() => Directory.Delete(_place, recursive: true);

    private static string NewPlace() => Directory.CreateTempSubdirectory("framegen-").FullName;
}
