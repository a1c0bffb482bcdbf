using System.Buffers;
using System.Text;

namespace FrameGen.Output;

/// <summary>Plain text inside Markdown.</summary>
internal static class MarkdownText
{
    private static readonly SearchValues<char> EntityLetters =
        SearchValues.Create("#0123456789abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ");

    /// <summary>
    /// Writes a text so that it prints as it stands, on one line, also in a table's cell. Only what Markdown would read as its own is
    /// escaped, so that the file reads well as plain text too.
    /// </summary>
    /// <param name="text">Any text. Line breaks and control characters become spaces, backticks apostrophes: no escape reaches into code.</param>
    public static string Escape(string? text)
    {
        string line = OneLine(text ?? string.Empty).Replace('`', '\'');
        int opening = OpeningMark(line);
        var escaped = new StringBuilder(line.Length + 16);
        for (int i = 0; i < line.Length; i++)
        {
            if (i == opening || IsMark(line, i))
            {
                escaped.Append('\\');
            }

            escaped.Append(line[i]);
        }

        return escaped.ToString();
    }

    /// <summary>Sets the cells of every table of a Markdown text under each other: the same text for a program, a table for an eye.</summary>
    /// <param name="markdown">Lines ended by a line feed.</param>
    public static string AlignTables(string markdown)
    {
        string[] lines = markdown.Split('\n');
        for (int first = 0; first < lines.Length; first++)
        {
            int end = first;
            while (end < lines.Length && lines[end].StartsWith('|'))
            {
                end++;
            }

            if (end > first + 1)
            {
                Align(lines.AsSpan(first..end));
                first = end;
            }
        }

        return string.Join('\n', lines);
    }

    private static void Align(Span<string> rows)
    {
        const int RuleRow = 1;
        var cells = new List<List<string>>();
        foreach (string row in rows)
        {
            cells.Add(Cells(row));
        }

        int columns = cells.Max(c => c.Count);
        string[] rules = [.. Enumerable.Range(0, columns).Select(c => cells[RuleRow].ElementAtOrDefault(c) ?? "---")];
        int[] widths = [.. Enumerable.Range(0, columns).Select(c => cells.Where((_, r) => r != RuleRow).Max(r => r.ElementAtOrDefault(c)?.Length ?? 0)).Select(w => Math.Max(w, 3))];
        for (int r = 0; r < rows.Length; r++)
        {
            var line = new StringBuilder("|");
            for (int c = 0; c < columns; c++)
            {
                string cell = cells[r].ElementAtOrDefault(c) ?? string.Empty;
                bool right = rules[c].EndsWith(':');
                string set = r == RuleRow ? new string('-', widths[c] - (right ? 1 : 0)) + (right ? ":" : string.Empty)
                    : right ? cell.PadLeft(widths[c])
                    : cell.PadRight(widths[c]);
                line.Append(' ').Append(set).Append(" |");
            }

            rows[r] = line.ToString();
        }
    }

    /// <summary>The cells of a row; an escaped bar belongs to its cell.</summary>
    private static List<string> Cells(string row)
    {
        var cells = new List<string>();
        int start = 1;
        for (int i = 1; i < row.Length; i++)
        {
            if (row[i] == '\\')
            {
                i++;
            }
            else if (row[i] == '|')
            {
                cells.Add(row[start..i].Trim(' '));
                start = i + 1;
            }
        }

        return cells;
    }

    /// <summary>True where Markdown would read a sign as its own; the signs at a line's beginning apart.</summary>
    private static bool IsMark(string line, int i)
    {
        char before = i > 0 ? line[i - 1] : ' ';
        char after = i + 1 < line.Length ? line[i + 1] : ' ';
        return line[i] switch
        {
            '|' => true,
            '\\' => i + 1 == line.Length || char.IsPunctuation(after) || char.IsSymbol(after),
            '*' => i == 0 || before != ' ' || after != ' ',
            '_' => !(char.IsLetterOrDigit(before) && char.IsLetterOrDigit(after)),
            ']' => after is '(' or '[' or ':',
            '<' => char.IsLetter(after) || after is '/' or '!' or '?',
            '~' => before != ' ' || after is ' ' or '~',
            '&' => line.AsSpan(i + 1).IndexOfAnyExcept(EntityLetters) is > 0 and int end && line[i + 1 + end] == ';',
            '$' => line.AsSpan().Count('$') > 1,
            '#' => line.AsSpan(i).IndexOfAnyExcept('#') < 0,
            _ => false,
        };
    }

    /// <summary>Index of the sign that would open a heading, a list, a quote or an underline; −1 where the line begins as plain text.</summary>
    private static int OpeningMark(string line)
    {
        if (line.Length > 0 && "+-=>#".Contains(line[0], StringComparison.Ordinal))
        {
            return 0;
        }

        int digits = line.AsSpan().IndexOfAnyExceptInRange('0', '9');
        return digits > 0 && line[digits] is '.' or ')' ? digits : -1;
    }

    private static string OneLine(string text)
    {
        var line = new StringBuilder(text.Length);
        foreach (char c in text)
        {
            char plain = char.IsControl(c) || char.IsWhiteSpace(c) ? ' ' : c;
            if (plain != ' ' || (line.Length > 0 && line[^1] != ' '))
            {
                line.Append(plain);
            }
        }

        return line.ToString().TrimEnd(' ');
    }
}
