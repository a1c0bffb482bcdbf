using System.Buffers;
using System.Text;

namespace FrameGen.Output;

/// <summary>A table in the form of RFC 4180, with LF line ends.</summary>
internal sealed class CsvTable
{
    private static readonly SearchValues<char> NeedQuotes = SearchValues.Create(",\"\r\n");
    private static readonly SearchValues<char> StartFormulas = SearchValues.Create("=+-@\t\r");

    private readonly StringBuilder _text = new();

    /// <summary>Begins with the head row.</summary>
    public CsvTable(params ReadOnlySpan<string> columns) => Row(columns);

    /// <summary>Adds a row of cells, quoted where they have to be.</summary>
    public void Row(params ReadOnlySpan<string> cells)
    {
        for (int i = 0; i < cells.Length; i++)
        {
            _text.Append(i == 0 ? string.Empty : ",");
            if (cells[i].AsSpan().ContainsAny(NeedQuotes))
            {
                _text.Append('"').Append(cells[i].Replace("\"", "\"\"", StringComparison.Ordinal)).Append('"');
            }
            else
            {
                _text.Append(cells[i]);
            }
        }

        _text.Append('\n');
    }

    /// <summary>A cell of a user's words: one that a spreadsheet would take for a formula gets an apostrophe before it.</summary>
    public static string Words(string text) =>
        text.Length > 0 && StartFormulas.Contains(text[0]) ? "'" + text : text;

    /// <inheritdoc/>
    public override string ToString() => _text.ToString();
}
