namespace FrameGen.Geometry;

/// <summary>
/// The axis of a bent tube: straights, and arcs that touch them where it bends. Places on it are distances along the axis from its start,
/// round the bends, mm.
/// </summary>
public sealed class TubePath
{
    private TubePath(IReadOnlyList<PathPiece> pieces) => Pieces = pieces;

    /// <summary>Straights and arcs in turn, a straight first and last; a straight between two arcs may have no length.</summary>
    public IReadOnlyList<PathPiece> Pieces { get; }

    /// <summary>Length of the axis, mm.</summary>
    public double Length => Pieces[^1].Start + Pieces[^1].Length;

    /// <summary>Rounds the corners of a polygon.</summary>
    /// <param name="corners">The two ends and the corners between them, mm; at least three, no three that follow each other in line.</param>
    /// <param name="radius">Of the axis in every bend, mm; positive.</param>
    /// <exception cref="ArgumentException">A side is too short for the bends at its ends (<see cref="Tangent"/>), or there is nothing to bend.</exception>
    public static TubePath Through(IReadOnlyList<Vector3> corners, double radius)
    {
        ArgumentNullException.ThrowIfNull(corners);
        ArgumentOutOfRangeException.ThrowIfLessThan(corners.Count, 3, nameof(corners));
        var pieces = new List<PathPiece>();
        Vector3 from = corners[0];
        double start = 0;
        for (int i = 1; i + 1 < corners.Count; i++)
        {
            Vector3 along = (corners[i] - corners[i - 1]).Normalized();
            Vector3 next = (corners[i + 1] - corners[i]).Normalized();
            double angle = along.AngleTo(next);
            double tangent = Tangent(radius, angle);
            Add(corners[i] - (tangent * along), along);
            pieces.Add(new PathPiece(start, radius * angle, from, along, along.Cross(next).Normalized(), radius));
            from = corners[i] + (tangent * next);
            start += radius * angle;
        }

        Add(corners[^1], (corners[^1] - corners[^2]).Normalized());
        return new TubePath(pieces);

        void Add(Vector3 to, Vector3 along)
        {
            double length = (to - from).Dot(along);
            if (!(length >= -1e-9))
            {
                throw new ArgumentException($"A side of the path is {-length} mm too short for the bends at its ends.", nameof(corners));
            }

            pieces.Add(new PathPiece(start, Math.Max(0, length), from, along, Vector3.Zero, 0));
            start += Math.Max(0, length);
            from = to;
        }
    }

    /// <summary>How far from a corner its bend begins and ends, mm: r tan(θ/2).</summary>
    /// <param name="radius">r, mm.</param>
    /// <param name="angle">θ, by which the tube turns there, rad; 0 &lt; θ &lt; π.</param>
    public static double Tangent(double radius, double angle) => radius * Math.Tan(0.5 * angle);

    /// <summary>The piece that a place lies on; the earlier of two.</summary>
    public PathPiece PieceAt(double distance)
    {
        int last = Pieces.Count - 1;
        for (int i = 0; i < last; i++)
        {
            if (distance <= Pieces[i].Start + Pieces[i].Length && Pieces[i].Length > 0)
            {
                return Pieces[i];
            }
        }

        return Pieces[last];
    }

    /// <summary>The straight that a place lies on, or is nearest to; the earlier of two.</summary>
    public PathPiece StraightAt(double distance) =>
        Pieces.Where(p => !p.IsArc).MinBy(p => Math.Max(0, Math.Max(p.Start - distance, distance - p.Start - p.Length)))!;

    /// <summary>The point at a place, mm.</summary>
    public Vector3 PointAt(double distance)
    {
        PathPiece piece = PieceAt(distance);
        return piece.PointAt(distance - piece.Start);
    }

    /// <summary>Local axes at a place: those of the start, carried round each bend with the tube.</summary>
    /// <param name="first">Of the first straight.</param>
    /// <param name="distance">The place.</param>
    public TubeAxes Carry(TubeAxes first, double distance)
    {
        ArgumentNullException.ThrowIfNull(first);
        Vector3 top = first.Z;
        Vector3 along = first.X;
        foreach (PathPiece piece in Pieces)
        {
            if (piece.IsArc && distance > piece.Start)
            {
                double turn = Math.Min(distance - piece.Start, piece.Length) / piece.Radius;
                (along, top) = (Turned(along, piece.About, turn), Turned(top, piece.About, turn));
            }
        }

        return TubeAxes.Along(along, top);
    }

    // Rodrigues' formula.
    private static Vector3 Turned(Vector3 v, Vector3 about, double angle)
    {
        (double sin, double cos) = Math.SinCos(angle);
        return (cos * v) + (sin * about.Cross(v)) + ((1 - cos) * about.Dot(v) * about);
    }
}

/// <summary>A straight or an arc of a tube's axis.</summary>
/// <param name="Start">Distance along the axis at which it begins, mm.</param>
/// <param name="Length">Along the axis, mm.</param>
/// <param name="Origin">Where it begins, mm.</param>
/// <param name="Along">Unit direction there.</param>
/// <param name="About">Unit axis of the bend, right-handed; zero for a straight.</param>
/// <param name="Radius">Of the bend, mm; 0 for a straight.</param>
public sealed record PathPiece(double Start, double Length, Vector3 Origin, Vector3 Along, Vector3 About, double Radius)
{
    /// <summary>True for a bend.</summary>
    public bool IsArc => Radius > 0;

    /// <summary>The point at a distance from its own start, mm.</summary>
    public Vector3 PointAt(double x)
    {
        if (!IsArc)
        {
            return Origin + (x * Along);
        }

        (double sin, double cos) = Math.SinCos(x / Radius);
        return Origin + (Radius * ((sin * Along) + ((1 - cos) * About.Cross(Along))));
    }
}
