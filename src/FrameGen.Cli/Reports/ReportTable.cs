using System.Globalization;
using Spectre.Console;

namespace FrameGen.Cli.Reports;

/// <summary>A plain table with a title; long ones end with a line that says how much is left out.</summary>
internal sealed class ReportTable
{
    private const int MostRows = 60;

    private readonly string _title;
    private readonly string[] _heads;
    private readonly List<(Style? Style, string[] Cells)> _rows = [];

    /// <summary>Begins with the head row.</summary>
    /// <param name="title">Above the table.</param>
    /// <param name="columns">
    /// Heads; one that begins with <c>&gt;</c> is a column of numbers, never wrapped, set to the right with their decimal points under
    /// each other; <c>=</c>: a column that is not wrapped.
    /// </param>
    public ReportTable(string title, params ReadOnlySpan<string> columns) => (_title, _heads) = (title, columns.ToArray());

    /// <summary>Adds a row of plain texts.</summary>
    public void Row(params ReadOnlySpan<string> cells) => _rows.Add((null, cells.ToArray()));

    /// <summary>Adds a row that wants attention. Its words say so too: colour is never alone.</summary>
    public void AlarmRow(params ReadOnlySpan<string> cells) => _rows.Add((new Style(Color.Red), cells.ToArray()));

    /// <summary>Draws it, with a blank line before.</summary>
    public void Draw(Terminal terminal)
    {
        var table = new Table { Border = TableBorder.Simple, UseSafeBorder = true };
        for (int i = 0; i < _heads.Length; i++)
        {
            bool right = _heads[i].StartsWith('>');
            bool whole = right || _heads[i].StartsWith('=');
            var head = new TableColumn(new Text(whole ? _heads[i][1..] : _heads[i]))
            {
                Alignment = right ? Justify.Right : Justify.Left,
                Padding = new Padding(0, 0, i + 1 < _heads.Length ? 1 : 0, 0),
            };
            table.AddColumn(whole ? head.NoWrap() : head);
            if (right)
            {
                AlignPoints(i);
            }
        }

        foreach ((Style? style, string[] cells) in _rows.Take(MostRows))
        {
            table.AddRow(cells.Select(c => new Text(c, style)));
        }

        terminal.Out.WriteLine();
        terminal.Draw(new Text(_title));
        terminal.Draw(table);
        if (_rows.Count > MostRows)
        {
            terminal.Out.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  and {_rows.Count - MostRows} more; --json prints all"));
        }
    }

    /// <summary>Sets a column's decimal points under each other where its numbers have different numbers of decimals.</summary>
    private void AlignPoints(int column)
    {
        int most = _rows.Max(r => (int?)AfterPoint(r.Cells[column])) ?? 0;
        foreach ((_, string[] cells) in _rows)
        {
            if (cells[column].Length > 0 && most > 0 && !cells[column].Contains('%', StringComparison.Ordinal))
            {
                cells[column] += new string(Terminal.TiedBlank, most - AfterPoint(cells[column]));
            }
        }
    }

    /// <summary>Characters from the decimal point on.</summary>
    private static int AfterPoint(string number) => number.IndexOf('.', StringComparison.Ordinal) is >= 0 and int at ? number.Length - at : 0;
}
