using FrameGen.Output;
using FrameGen.Output.Folders;

namespace FrameGen.Cli;

/// <summary><c>framegen verify</c>: are these papers whole, unchanged, and what the spec gives?</summary>
internal sealed class VerifyCommand(Terminal terminal, string path, string? spec, bool json)
{
    private readonly Job _job = new(terminal);

    /// <summary>Runs it.</summary>
    public int Run()
    {
        if (spec is not null)
        {
            SpecFile.Require(spec);
        }

        var folder = new OutputFolder(path);
        folder.Recover();
        if (!Directory.Exists(folder.FullPath))
        {
            throw new WrongInputException($"there is no folder {path}; name an output folder, for instance out/NAME");
        }

        VerifyResult result = _job.With(p => FolderVerifier.Verify(folder, spec, p, _job.Diagnostics));
        bool wrongSpec = spec is not null && _job.Diagnostics.HasErrors;
        int code = wrongSpec ? ExitCode.WrongInput : result.Matches ? ExitCode.Done : ExitCode.Unmet;
        if (json)
        {
            PrintJson(result, code);
        }
        else
        {
            Print(result, wrongSpec);
        }

        if (_job.Diagnostics.HasErrors)
        {
            _job.PrintDiagnostics(string.Empty);
        }

        return code;
    }

    private void Print(VerifyResult result, bool wrongSpec)
    {
        foreach (Difference difference in result.Differences)
        {
            terminal.Out.WriteLine($"{Words(difference.Kind)}: {difference.Path}");
        }

        if (result.Remark.Length > 0)
        {
            terminal.Out.WriteLine($"Not rebuilt: {result.Remark}");
        }

        string rebuilt = result.Rebuilt ? ", rebuilt from the spec in it: the same bytes" : string.Empty;
        string asked = spec is null ? string.Empty
            : wrongSpec ? $"; {spec} gives no papers to compare them with"
            : $"; what {spec} gives today";
        terminal.Out.WriteLine(result.Matches
            ? $"{path}: {result.Files} files, all as the manifest says{rebuilt}{asked}"
            : $"{path}: does not match, {result.Differences.Count} differences");
    }

    private void PrintJson(VerifyResult result, int code)
    {
        byte[] bytes = JsonText.Bytes(writer =>
        {
            writer.WriteStartObject();
            writer.WriteString("format", "framegen-verify/1");
            writer.WriteNumber("exit_code", code);
            writer.WriteString("folder", path);
            writer.WriteBoolean("matches", code == ExitCode.Done);
            writer.WriteBoolean("rebuilt", result.Rebuilt);
            writer.WriteString("remark", result.Remark);
            writer.WriteStartArray("differences");
            foreach (Difference difference in result.Differences)
            {
                writer.WriteStartObject();
                writer.WriteString("path", difference.Path);
                writer.WriteString("kind", difference.Kind);
                writer.WriteEndObject();
            }

            writer.WriteEndArray();
            writer.WriteEndObject();
        });
        terminal.Out.Write(System.Text.Encoding.UTF8.GetString(bytes));
    }

    private static string Words(string kind) => kind switch
    {
        "rebuilt" => "differs from what its spec gives",
        "spec" => "differs from what the named spec gives",
        _ => kind,
    };
}
