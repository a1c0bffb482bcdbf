namespace FrameGen.Geometry;

/// <summary>A circle; of radius 0 the bore of a rod.</summary>
public sealed class RoundOutline : Outline
{
    private readonly View _view;

    /// <summary>A circle.</summary>
    /// <param name="radius">mm; 0 or more.</param>
    /// <exception cref="ArgumentOutOfRangeException">The radius is negative or not finite.</exception>
    public RoundOutline(double radius)
    {
        if (!(radius >= 0 && double.IsFinite(radius)))
        {
            throw new ArgumentOutOfRangeException(nameof(radius), radius, "A circle's radius is 0 or more.");
        }

        Radius = radius;
        _view = new View(radius);
    }

    /// <summary>mm.</summary>
    public double Radius { get; }

    /// <inheritdoc/>
    public override double HalfHeight => Radius;

    /// <inheritdoc/>
    public override double HalfWidth => Radius;

    /// <inheritdoc/>
    public override double Perimeter => 2 * Math.PI * Radius;

    /// <inheritdoc/>
    public override double Area => Math.PI * Radius * Radius;

    /// <inheritdoc/>
    public override double SecondMomentX => Area * Radius * Radius / 4;

    /// <inheritdoc/>
    public override double SecondMomentY => SecondMomentX;

    /// <inheritdoc/>
    public override IReadOnlyList<double> Breaks => [];

    /// <inheritdoc/>
    public override double RadiusAt(double sin, double cos) => Radius;

    /// <inheritdoc/>
    public override double DistanceAt(double clock, double sin, double cos) => Radius * clock;

    /// <inheritdoc/>
    public override double SpeedAt(double sin, double cos) => Radius;

    /// <inheritdoc/>
    public override double ClockAt(double distance) => distance / Radius;

    /// <inheritdoc/>
    public override double HalfWidthAlong(Point2 direction) => Radius;

    /// <inheritdoc/>
    public override Point2 FarthestAlong(Point2 direction) => Radius * direction;

    /// <inheritdoc/>
    public override bool Cross(Point2 point, Point2 direction, out double enter, out double leave) =>
        _view.Cross(point, direction, out enter, out leave);

    /// <inheritdoc/>
    public override Outline Grown(double by) => by == 0 ? this : new RoundOutline(Radius + by);

    /// <inheritdoc/>
    public override Outline Towards(Outline inner, double share) =>
        new RoundOutline(Radius - ((Radius - ((RoundOutline)inner).Radius) * share));

    /// <inheritdoc/>
    public override OutlineView Seen(Point2 along, Point2 across) => _view;

    /// <summary>Half the chord that a line cuts off, mm; 0 where it grazes; negative where it misses.</summary>
    /// <param name="across">Signed distance of the line from the centre, mm.</param>
    public double HalfChord(double across) => _view.Reaches(across) ? _view.Far(across) : -1;

    /// <inheritdoc/>
    public override bool Equals(object? obj) => obj is RoundOutline other && other.Radius == Radius;

    /// <inheritdoc/>
    public override int GetHashCode() => Radius.GetHashCode();

    private sealed class View(double radius) : OutlineView
    {
        public override double HalfWidth => radius;

        public override IReadOnlyList<double> Breaks => [];

        public override IReadOnlyList<Point2> Flats => [];

        public override double Far(double u)
        {
            double distance = Math.Abs(u);
            return distance < radius ? Math.Sqrt((radius - distance) * (radius + distance)) : 0;
        }

        public override double Near(double u) => -Far(u);

        public override (double Near, double Far) Chord(double u)
        {
            double half = Far(u);
            return (-half, half);
        }

        public override int PieceAt(double u) => 0;

        public override double Farthest(Point2 normal) =>
            radius * normal.X / Math.Sqrt((normal.X * normal.X) + (normal.Y * normal.Y));

        public override bool Cross(Point2 point, Point2 direction, out double enter, out double leave)
        {
            double a = (direction.Y * direction.Y) + (direction.X * direction.X);
            double b = (point.Y * direction.Y) + (point.X * direction.X);
            double c = (point.Y * point.Y) + (point.X * point.X) - (radius * radius);
            double discriminant = (b * b) - (a * c);
            (enter, leave) = (0, 0);
            if (!(a > 0 && discriminant >= 0))
            {
                return false;
            }

            // The root whose terms do not cancel first; the other from their product.
            double root = Math.Sqrt(discriminant);
            double far = b >= 0 ? -b - root : -b + root;
            double one = far / a;
            double other = far == 0 ? 0 : c / far;
            (enter, leave) = one <= other ? (one, other) : (other, one);
            return true;
        }
    }
}
