using FrameGen.Diagnostics;
using YamlDotNet.Core;

namespace FrameGen.Spec.Yaml;

/// <summary>Turns the YAML parser's complaints into places and words that help.</summary>
internal static class YamlSyntax
{
    /// <summary>The problem behind a parser's exception.</summary>
    public static YamlProblem Explain(string file, string text, YamlException wrong)
    {
        int line = Math.Max(1, (int)wrong.Start.Line);
        int column = Math.Max(1, (int)wrong.Start.Column);
        if (IndentingTab(text, (line, column) == (1, 1) ? null : line) is { } tab)
        {
            return new YamlProblem(new SourcePlace(file, tab.Line, tab.Column), "a tab in the indent; YAML indents with spaces only");
        }

        string message = wrong.Message.Trim().TrimEnd('.');
        if (message.Length > 0)
        {
            message = char.ToLowerInvariant(message[0]) + message[1..];
        }

        return NotYaml(file, line, column, message);
    }

    /// <summary>The problem of a place at which the text makes no sense.</summary>
    public static YamlProblem NotYaml(string file, int line, int column, string message) => new(
        new SourcePlace(file, line, column), $"this is not YAML: {message}; look at the indent, colons, quotes and brackets here and in the lines before");

    /// <summary>The first tab that indents a line with something on it: of one line, or of the file, since the parser may not say which.</summary>
    private static (int Line, int Column)? IndentingTab(string text, int? onlyLine)
    {
        int line = 0;
        foreach (ReadOnlySpan<char> content in text.AsSpan().EnumerateLines())
        {
            line++;
            if (onlyLine is { } only && only != line)
            {
                continue;
            }

            ReadOnlySpan<char> rest = content.TrimStart(" \t");
            int tab = content[..^rest.Length].IndexOf('\t');
            if (tab >= 0 && rest is not [] and not ['#', ..])
            {
                return (line, tab + 1);
            }
        }

        return null;
    }
}
