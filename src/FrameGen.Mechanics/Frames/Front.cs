namespace FrameGen.Mechanics.Frames;

/// <summary>
/// One front of the factor (a supernode): neighbouring columns with one pattern; places and sizes only, no values.
/// </summary>
/// <remarks>
/// Its panel holds the rows of its own columns, then the rows below, column by column in slices of <see cref="SliceWidth"/> columns: a slice begins
/// at its own first row, so that little is held above the diagonal. Columns are padded to whole groups of <see cref="SymbolicFactor.Lanes"/> rows.
/// </remarks>
internal sealed class Front
{
    /// <summary>Columns of a slice, in freedoms: deep enough to be worth the memory traffic, small enough for six rows of L and eight
    /// of W to stay in the nearest cache.</summary>
    public const int SliceWidth = 48;

    private const int Six = SymbolicFactor.Six;

    /// <summary>Own columns and the rows below them.</summary>
    /// <param name="first">First column, in nodes.</param>
    /// <param name="columns">Number of columns, in nodes.</param>
    /// <param name="below">Rows below the last column, in nodes, ascending.</param>
    public Front(int first, int columns, int[] below)
    {
        (First, Columns, Below) = (first, columns, below);
        Stride = (Rows + SymbolicFactor.Lanes - 1) / SymbolicFactor.Lanes * SymbolicFactor.Lanes;
        int last = OwnRows / SliceWidth;
        PanelLength = SliceStart(last) + ((OwnRows - (SliceWidth * last)) * SliceStride(last));
    }

    /// <summary>First own column, in nodes.</summary>
    public int First { get; }

    /// <summary>Number of own columns, in nodes.</summary>
    public int Columns { get; }

    /// <summary>Rows below, in nodes, ascending.</summary>
    public int[] Below { get; }

    /// <summary>Own columns, and their rows, in freedoms.</summary>
    public int OwnRows => Six * Columns;

    /// <summary>All rows, in freedoms.</summary>
    public int Rows => Six * (Columns + Below.Length);

    /// <summary>Rows with their padding: the column stride of the first slice.</summary>
    public int Stride { get; }

    /// <summary>Where the panel starts among all panels of its kind.</summary>
    public long PanelStart { get; set; }

    /// <summary>Whether the panel is needed only while its domain is factored.</summary>
    public bool IsPassing { get; set; }

    /// <summary>Doubles of the panel.</summary>
    public int PanelLength { get; }

    /// <summary>Earlier fronts that reach into this one's columns, in their order.</summary>
    public FrontUpdate[] Updates { get; set; } = [];

    /// <summary>Where a slice starts in the panel.</summary>
    public int SliceStart(int slice) => SliceWidth * ((Stride * slice) - (SliceWidth * (slice * (slice - 1) / 2)));

    /// <summary>From one column of a slice to the next.</summary>
    public int SliceStride(int slice) => Stride - (SliceWidth * slice);

    /// <summary>Where a value stands in the panel.</summary>
    /// <param name="row">Row, in freedoms; not above the column's slice.</param>
    /// <param name="column">Own column, in freedoms, from 0.</param>
    public int OffsetOf(int row, int column)
    {
        int slice = column / SliceWidth;
        int before = SliceWidth * slice;
        return SliceStart(slice) + ((column - before) * SliceStride(slice)) + row - before;
    }

    /// <summary>Row, in freedoms, of the front's own column or row below; −1 for one that is not in this front.</summary>
    /// <param name="column">A column of the factor, in nodes.</param>
    public int RowOf(int column)
    {
        if (column < First + Columns)
        {
            return column < First ? -1 : Six * (column - First);
        }

        int place = Array.BinarySearch(Below, column);
        return place < 0 ? -1 : OwnRows + (Six * place);
    }

    /// <summary>The front's panel.</summary>
    /// <param name="panels">All panels of its kind.</param>
    public Span<double> PanelIn(double[] panels) => panels.AsSpan((int)PanelStart, PanelLength);
}
