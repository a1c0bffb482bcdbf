namespace FrameGen.Geometry;

/// <summary>
/// A closed convex curve about a tube's axis, symmetric about the top line and about the line across it: the outer skin of a
/// section, its bore, or either of them moved in or out. Points of the section's plane have X towards the top line (clock 0)
/// and Y towards clock 90 degrees; a clock angle is the polar angle of a point, since a wall line belongs to the ray that
/// leads to it from the axis.
/// </summary>
/// <remarks>
/// The pattern laid flat has the distance round the curve from the top line as its x, growing with the clock angle. Sines and cosines
/// of clock angles are passed in, where a caller has them already. Nothing here allocates but what makes another outline or a view. Two outlines of one kind and size are equal.
/// </remarks>
public abstract class Outline
{
    /// <summary>
    /// A line that passes outside by no more than this still grazes the outline, mm: a tube as wide as its seat must
    /// not fall off it by a rounding error. Coordinates of 10 m carry errors near 1e-12 mm.
    /// </summary>
    public const double Graze = 1e-9;

    private protected Outline()
    {
    }

    /// <summary>Half the outer size along the top line, mm.</summary>
    public abstract double HalfHeight { get; }

    /// <summary>Half the outer size across, mm.</summary>
    public abstract double HalfWidth { get; }

    /// <summary>Length of the curve, mm.</summary>
    public abstract double Perimeter { get; }

    /// <summary>Enclosed area, mm².</summary>
    public abstract double Area { get; }

    /// <summary>∫ x² dA over what is enclosed, x towards the top line, mm⁴: bends towards the top line.</summary>
    public abstract double SecondMomentX { get; }

    /// <summary>∫ y² dA over what is enclosed, y across, mm⁴.</summary>
    public abstract double SecondMomentY { get; }

    /// <summary>
    /// Clock angles, rad in (−π, π], growing, between which the curve is smooth: where flats meet corner arcs, or sharp corners.
    /// </summary>
    public abstract IReadOnlyList<double> Breaks { get; }

    /// <summary>True where nothing is enclosed: the bore of a rod.</summary>
    public bool IsPoint => HalfHeight <= 0;

    /// <summary>Distance of the curve from the axis, mm.</summary>
    /// <param name="sin">Sine of the clock angle.</param>
    /// <param name="cos">Cosine of the clock angle.</param>
    public abstract double RadiusAt(double sin, double cos);

    /// <summary>Distance round the curve from the top line, mm, from minus to plus half the perimeter.</summary>
    /// <param name="clock">rad, −π to π.</param>
    /// <param name="sin">Its sine.</param>
    /// <param name="cos">Its cosine.</param>
    public abstract double DistanceAt(double clock, double sin, double cos);

    /// <summary>Distance round the curve from the top line, mm, from minus to plus half the perimeter.</summary>
    /// <param name="clock">rad, −π to π.</param>
    public double DistanceAt(double clock)
    {
        (double sin, double cos) = Math.SinCos(clock);
        return DistanceAt(clock, sin, cos);
    }

    /// <summary>How fast the distance round grows with the clock angle, mm/rad: radius² over the distance of the tangent from the axis.</summary>
    /// <param name="sin">Sine of the clock angle.</param>
    /// <param name="cos">Cosine of the clock angle.</param>
    public abstract double SpeedAt(double sin, double cos);

    /// <summary>The clock angle at a distance round the curve from the top line, rad, −π to π: the inverse of <see cref="DistanceAt(double)"/>.</summary>
    /// <param name="distance">mm, from minus to plus half the perimeter.</param>
    public abstract double ClockAt(double distance);

    /// <summary>Half the width measured along a direction, mm: how far out the tangent line square to it stands.</summary>
    /// <param name="direction">Unit vector.</param>
    public abstract double HalfWidthAlong(Point2 direction);

    /// <summary>The point whose tangent line is square to a direction, mm; the middle of a flat that is.</summary>
    /// <param name="direction">Unit vector.</param>
    public abstract Point2 FarthestAlong(Point2 direction);

    /// <summary>Where a line crosses the curve.</summary>
    /// <param name="point">On the line.</param>
    /// <param name="direction">Of the line; any length but zero.</param>
    /// <param name="enter">How many times <paramref name="direction"/> past <paramref name="point"/> it comes in.</param>
    /// <param name="leave">How many times <paramref name="direction"/> past <paramref name="point"/> it goes out.</param>
    /// <returns>False where it misses.</returns>
    public abstract bool Cross(Point2 point, Point2 direction, out double enter, out double leave);

    /// <summary>The curve at a distance outside of it, corners rounded about the old ones; inside for a negative distance.</summary>
    /// <param name="by">mm.</param>
    /// <exception cref="ArgumentOutOfRangeException">Nothing, or no smooth curve, is left.</exception>
    public abstract Outline Grown(double by);

    /// <summary>A curve of the same kind between this one and one inside it, as its bore.</summary>
    /// <param name="inner">Of the same kind; from the same ellipse, if that.</param>
    /// <param name="share">0 for this one, 1 for the inner one.</param>
    public abstract Outline Towards(Outline inner, double share);

    /// <summary>The curve as lines of one direction meet it.</summary>
    /// <param name="along">Unit vector along the lines, in the section's plane.</param>
    /// <param name="across">Unit vector square to it: which way distances of the lines from the axis grow.</param>
    public abstract OutlineView Seen(Point2 along, Point2 across);

    /// <summary>Whether a point lies inside or on the curve, or outside of it by no more than a distance along its ray.</summary>
    /// <param name="point">mm.</param>
    /// <param name="margin">mm.</param>
    public bool Contains(Point2 point, double margin)
    {
        double distance = Math.Sqrt((point.X * point.X) + (point.Y * point.Y));
        return distance <= margin || distance <= margin + RadiusAt(point.Y / distance, point.X / distance);
    }
}
