using FrameGen.Formats.Drawings;
using FrameGen.Spec;

namespace FrameGen.Output.Drawings;

/// <summary>A sheet with several pieces on it.</summary>
/// <param name="Width">mm.</param>
/// <param name="Height">mm.</param>
/// <param name="Pieces">By position in the list that was packed; where the upper left corner stands, mm from the left and from the top of the window.</param>
internal sealed record PackedSheet(double Width, double Height, IReadOnlyList<(int Piece, double Left, double Down)> Pieces)
{
    /// <summary>The part of the sheet that pieces may cover.</summary>
    public Box2 Window => PageTiling.WindowOf(Width, Height);
}

/// <summary>Lays pieces that fit on a sheet next to each other, so that few sheets are printed.</summary>
/// <remarks>
/// High pieces first, each to the highest free place of the first sheet that has one (a skyline from the top). Sheets stand upright, or
/// lie where a piece is too wide; where starting with lying ones takes fewer, they all lie. The same pieces always give the same sheets.
/// </remarks>
internal sealed class SheetPacking
{
    /// <summary>Between two pieces, mm: room for scissors.</summary>
    public const double Apart = 5;

    /// <summary>A sheet this far back is full enough.</summary>
    private const int OpenSheets = 32;

    private readonly List<Skyline> _sheets = [];
    private readonly IReadOnlyList<(double Width, double Height)> _pieces;
    private readonly (double Width, double Height) _first;

    private SheetPacking(IReadOnlyList<(double Width, double Height)> pieces, (double Width, double Height) first)
    {
        (_pieces, _first) = (pieces, first);
        foreach (int piece in Enumerable.Range(0, pieces.Count).OrderByDescending(i => pieces[i].Height).ThenBy(i => i))
        {
            Place(piece);
        }
    }

    /// <summary>Packs pieces, in the order of each sheet's first piece.</summary>
    /// <param name="pieces">Sizes, mm; each fits on a sheet one way or the other.</param>
    /// <param name="page">Of the sheets.</param>
    public static IReadOnlyList<PackedSheet> Pack(IReadOnlyList<(double Width, double Height)> pieces, PageSize page)
    {
        (double width, double height) = PageFrame.Paper(page);
        var upright = new SheetPacking(pieces, (width, height));
        var lying = new SheetPacking(pieces, (height, width));
        SheetPacking best = lying._sheets.Count < upright._sheets.Count ? lying : upright;
        return
        [
            .. best._sheets
                .Select(s => new PackedSheet(s.Paper.Width, s.Paper.Height, [.. s.Pieces.OrderBy(p => p.Piece)]))
                .OrderBy(s => s.Pieces[0].Piece),
        ];
    }

    private void Place(int piece)
    {
        (double width, double height) = _pieces[piece];
        for (int i = Math.Max(0, _sheets.Count - OpenSheets); i < _sheets.Count; i++)
        {
            if (_sheets[i].TryPlace(piece, width, height))
            {
                return;
            }
        }

        var sheet = new Skyline(_first);
        if (!sheet.TryPlace(piece, width, height))
        {
            sheet = new Skyline((_first.Height, _first.Width));
            if (!sheet.TryPlace(piece, width, height))
            {
                throw new ArgumentOutOfRangeException(nameof(piece), (width, height), "The piece is larger than a sheet.");
            }
        }

        _sheets.Add(sheet);
    }

    /// <summary>What is covered of one sheet: a step from place to place along its width, seen from the top.</summary>
    private sealed class Skyline
    {
        private readonly Box2 _window;
        private readonly List<(double Left, double Down)> _steps = [(0, 0)];

        public Skyline((double Width, double Height) paper)
        {
            Paper = paper;
            _window = PageTiling.WindowOf(paper.Width, paper.Height);
        }

        public (double Width, double Height) Paper { get; }

        public List<(int Piece, double Left, double Down)> Pieces { get; } = [];

        public bool TryPlace(int piece, double width, double height)
        {
            (double Left, double Down)? best = null;
            for (int i = 0; i < _steps.Count; i++)
            {
                double left = _steps[i].Left;
                double down = DownAt(i, left + width + Apart);
                if (left + width <= _window.Width && down + height <= _window.Height && (best is null || down < best.Value.Down))
                {
                    best = (left, down);
                }
            }

            if (best is not { } place)
            {
                return false;
            }

            Pieces.Add((piece, place.Left, place.Down));
            Cover(place.Left, place.Left + width + Apart, place.Down + height + Apart);
            return true;
        }

        private double DownAt(int first, double right)
        {
            double down = 0;
            for (int i = first; i < _steps.Count && _steps[i].Left < right; i++)
            {
                down = Math.Max(down, _steps[i].Down);
            }

            return down;
        }

        private void Cover(double left, double right, double down)
        {
            double after = _steps.FindLast(s => s.Left <= right).Down;
            _steps.RemoveAll(s => s.Left >= left && s.Left <= right);
            int at = _steps.FindIndex(s => s.Left > right);
            _steps.InsertRange(at < 0 ? _steps.Count : at, [(left, down), (right, after)]);
        }
    }
}
