namespace FrameGen.Mechanics.Frames;

/// <summary>One front of the factor: neighbouring columns with one pattern; places and sizes only, no values.</summary>
internal sealed class Front
{
    /// <summary>Own columns and the rows below them.</summary>
    /// <param name="first">First column, in nodes.</param>
    /// <param name="columns">Number of columns, in nodes.</param>
    /// <param name="below">Rows below the last column, in nodes, ascending.</param>
    public Front(int first, int columns, int[] below)
    {
        (First, Columns, Below) = (first, columns, below);
        OwnStride = RoundUp(SymbolicFactor.Six * columns);
        BelowStride = RoundUp(SymbolicFactor.Six * below.Length);
    }

    /// <summary>First own column, in nodes.</summary>
    public int First { get; }

    /// <summary>Number of own columns, in nodes.</summary>
    public int Columns { get; }

    /// <summary>Rows below, in nodes, ascending.</summary>
    public int[] Below { get; }

    /// <summary>Padded rows of the own columns.</summary>
    public int OwnStride { get; }

    /// <summary>Padded rows below; the leftover's column stride.</summary>
    public int BelowStride { get; }

    /// <summary>The panel's column stride.</summary>
    public int Stride => OwnStride + BelowStride;

    /// <summary>Where the panel starts among all panels.</summary>
    public long PanelStart { get; set; }

    /// <summary>Which stack the leftover is on.</summary>
    public int Stack { get; set; }

    /// <summary>Where the leftover starts on its stack.</summary>
    public long LeftoverStart { get; set; }

    /// <summary>Fronts whose leftovers are added here.</summary>
    public Front[] Children { get; set; } = [];

    /// <summary>For each row below, in nodes: its place among the parent's own columns (from 0) and rows below (after those).</summary>
    public int[] InParent { get; private set; } = [];

    /// <summary>Rows below that follow one another in the parent too.</summary>
    public Run[] Runs { get; private set; } = [];

    /// <summary>Row, in freedoms, of the front's own column or row below; −1 for one that is not in this front.</summary>
    /// <param name="column">A column of the factor, in nodes.</param>
    public int RowOf(int column)
    {
        if (column < First + Columns)
        {
            return column < First ? -1 : SymbolicFactor.Six * (column - First);
        }

        int place = Array.BinarySearch(Below, column);
        return place < 0 ? -1 : OwnStride + (SymbolicFactor.Six * place);
    }

    /// <summary>The front's panel: <see cref="Stride"/> rows for each of its own freedoms, column by column.</summary>
    /// <param name="panels">All fronts' panels.</param>
    public Span<double> PanelIn(double[] panels) => panels.AsSpan((int)PanelStart, Stride * SymbolicFactor.Six * Columns);

    /// <summary>Works out where the leftover goes.</summary>
    public void ConnectTo(Front parent)
    {
        InParent = new int[Below.Length];
        var runs = new List<Run>();
        for (int a = 0; a < Below.Length; a++)
        {
            int row = parent.RowOf(Below[a]);
            InParent[a] = row < parent.OwnStride
                ? row / SymbolicFactor.Six
                : parent.Columns + ((row - parent.OwnStride) / SymbolicFactor.Six);
            if (runs.Count > 0 && runs[^1] is var last && last.ParentRow + (SymbolicFactor.Six * (a - last.Start)) == row)
            {
                runs[^1] = last with { End = a + 1 };
            }
            else
            {
                runs.Add(new Run(a, a + 1, row));
            }
        }

        Runs = [.. runs];
    }

    private static int RoundUp(int rows) => (rows + SymbolicFactor.Lanes - 1) / SymbolicFactor.Lanes * SymbolicFactor.Lanes;

    /// <summary>Rows below, in nodes, from Start to End, that stand in the parent's front from ParentRow (in freedoms) on.</summary>
    internal readonly record struct Run(int Start, int End, int ParentRow);
}
