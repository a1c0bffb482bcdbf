namespace FrameGen.Geometry;

/// <summary>
/// A flat-sided outline as parallel lines meet it. Its far side is made of two or three corner arcs and the flats between them: arc,
/// flat, arc, and so on, by growing u. A sharp corner is an arc without length.
/// </summary>
internal sealed class FlatSidedView : OutlineView
{
    // A flat that leans less than this against the lines has no width for them.
    private const double Narrowest = 1e-12;

    private readonly FlatSidedOutline _outline;
    private readonly Point2 _along, _across;
    private readonly double[] _breaks;
    private readonly Piece[] _pieces;

    /// <summary>A view.</summary>
    public FlatSidedView(FlatSidedOutline outline, Point2 along, Point2 across)
    {
        (_outline, _along, _across) = (outline, along, across);
        HalfWidth = outline.HalfWidthAlong(across);
        Flats = [new Point2(across.Y, along.Y), new Point2(across.X, along.X)];
        Point2[] normals =
        [
            .. new[] { new Point2(across.X, along.X), new Point2(across.Y, along.Y) }
                .Select(n => n.Y < 0 ? -1 * n : n)
                .Where(n => n.Y >= Narrowest)
                .OrderBy(n => n.X),
        ];
        _breaks = new double[2 * normals.Length];
        _pieces = new Piece[(2 * normals.Length) + 1];
        Point2 corner = CoreCorner(new Point2(-1, 0) + normals[0]);
        for (int i = 0; i < normals.Length; i++)
        {
            Point2 normal = normals[i];
            Point2 start = corner + (outline.Corner * normal);
            _pieces[2 * i] = new Piece(corner.X, corner.Y, double.NaN);
            _pieces[(2 * i) + 1] = new Piece(start.X, start.Y, -normal.X / normal.Y);
            corner = CoreCorner(normal + (i + 1 < normals.Length ? normals[i + 1] : new Point2(1, 0)));
            (_breaks[2 * i], _breaks[(2 * i) + 1]) = (start.X, corner.X + (outline.Corner * normal.X));
        }

        _pieces[^1] = new Piece(corner.X, corner.Y, double.NaN);
    }

    /// <inheritdoc/>
    public override double HalfWidth { get; }

    /// <inheritdoc/>
    public override IReadOnlyList<double> Breaks => _breaks;

    /// <inheritdoc/>
    public override IReadOnlyList<Point2> Flats { get; }

    /// <inheritdoc/>
    public override double Far(double u)
    {
        u = Math.Clamp(u, -HalfWidth, HalfWidth);
        ref readonly Piece piece = ref _pieces[BreaksBelow(u)];
        double from = u - piece.U;
        if (!double.IsNaN(piece.Slope))
        {
            return piece.V + (piece.Slope * from);
        }

        double corner = _outline.Corner;
        return piece.V + Math.Sqrt(Math.Max(0, (corner - from) * (corner + from)));
    }

    /// <inheritdoc/>
    public override int PieceAt(double u) => BreaksBelow(u - Outline.Graze);

    private int BreaksBelow(double u)
    {
        int piece = 0;
        while (piece < _breaks.Length && u > _breaks[piece])
        {
            piece++;
        }

        return piece;
    }

    /// <inheritdoc/>
    public override double Farthest(Point2 normal)
    {
        Point2 point = _outline.FarthestAlong((1 / normal.DistanceTo(default)) * Turned(normal));
        return (point.X * _across.X) + (point.Y * _across.Y);
    }

    /// <inheritdoc/>
    public override bool Cross(Point2 point, Point2 direction, out double enter, out double leave) =>
        _outline.Cross(Turned(point), Turned(direction), out enter, out leave);

    // From (u, v) to the section's plane.
    private Point2 Turned(Point2 point) => (point.X * _across) + (point.Y * _along);

    // Which of the core's corners, (u, v), lies farthest towards (u, v).
    private Point2 CoreCorner(Point2 towards)
    {
        Point2 there = Turned(towards);
        Point2 corner = new(Math.CopySign(_outline.CoreHalfHeight, there.X), Math.CopySign(_outline.CoreHalfWidth, there.Y));
        return new((corner.X * _across.X) + (corner.Y * _across.Y), (corner.X * _along.X) + (corner.Y * _along.Y));
    }

    /// <summary>An arc about (U, V), or a flat from (U, V) on.</summary>
    /// <param name="U">mm.</param>
    /// <param name="V">mm.</param>
    /// <param name="Slope">dv/du of a flat; NaN for an arc.</param>
    private readonly record struct Piece(double U, double V, double Slope);
}
