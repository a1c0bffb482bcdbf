using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using FrameGen.Output;
using FrameGen.Sizing;

namespace FrameGen.Cli.Reports;

/// <summary>
/// What <c>--json</c> prints: <c>{"format": "framegen-run/1", "command", "exit_code", "folder", "diagnostics": [{"severity",
/// "file", "line", "column", "message"}], "frame"}</c>. <c>frame</c> is frame.json, without tubes, parts and totals where the
/// ends were not cut, and null where there is no frame; <c>folder</c> is null where nothing was written. <c>check</c> adds <see cref="AnalysisJson"/>.
/// </summary>
internal static class JsonReport
{
    /// <summary>Prints the object on standard output.</summary>
    public static void Print(
        Terminal terminal,
        string command,
        int exitCode,
        DiagnosticList diagnostics,
        SizedFrame? sized,
        ShopPackage? package,
        string? folder)
    {
        byte[] bytes = JsonText.Bytes(json =>
        {
            json.WriteStartObject();
            json.WriteString("format", "framegen-run/1");
            json.WriteString("command", command);
            json.WriteNumber("exit_code", exitCode);
            json.WriteString("folder", folder);
            json.WriteStartArray("diagnostics");
            foreach (Diagnostic diagnostic in diagnostics)
            {
                json.WriteStartObject();
                json.WriteString("severity", diagnostic.Severity.ToString().ToLowerInvariant());
                json.WriteString("file", diagnostic.At?.File);
                json.Number("line", diagnostic.At?.Line);
                json.Number("column", diagnostic.At?.Column);
                json.WriteString("message", diagnostic.Message);
                json.WriteEndObject();
            }

            json.WriteEndArray();
            json.WritePropertyName("frame");
            if (package is not null)
            {
                FrameJson.WriteObject(json, package);
            }
            else if (sized is not null)
            {
                FrameJson.WriteObject(json, sized);
            }
            else
            {
                json.WriteNullValue();
            }

            if (command is "check" && sized is not null)
            {
                AnalysisJson.Write(json, sized);
            }

            json.WriteEndObject();
        });
        terminal.Out.Write(Encoding.UTF8.GetString(bytes));
    }
}
