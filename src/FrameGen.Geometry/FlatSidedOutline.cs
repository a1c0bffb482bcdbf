namespace FrameGen.Geometry;

/// <summary>
/// A rectangle with corner arcs, or sharp corners: all points at a distance, the corner radius, from a smaller rectangle, its core.
/// </summary>
public sealed class FlatSidedOutline : Outline
{
    // Where a flat ends and its arc begins, both may think the other has a point: room for that rounding, as a share of the size.
    private const double Rounding = 1e-13;

    private readonly double[] _breaks;

    /// <summary>A rectangle with corner arcs.</summary>
    /// <param name="height">Along the top line, mm; positive.</param>
    /// <param name="width">Across, mm; positive.</param>
    /// <param name="corner">Corner radius, mm; 0 for sharp corners, at most half the smaller side.</param>
    /// <exception cref="ArgumentOutOfRangeException">A size outside its range, or not finite.</exception>
    public FlatSidedOutline(double height, double width, double corner)
    {
        if (!(height > 0 && double.IsFinite(height)))
        {
            throw new ArgumentOutOfRangeException(nameof(height), height, "A rectangle needs a height.");
        }

        if (!(width > 0 && double.IsFinite(width)))
        {
            throw new ArgumentOutOfRangeException(nameof(width), width, "A rectangle needs a width.");
        }

        // A corner that is half the smaller side but for rounding, as when both come from sums of sizes, is that.
        double half = Math.Min(height, width) / 2;
        if (!(corner >= 0 && corner <= half + Graze))
        {
            throw new ArgumentOutOfRangeException(nameof(corner), corner, "A corner radius goes from 0 to half the smaller side.");
        }

        (HalfHeight, HalfWidth, Corner) = (height / 2, width / 2, Math.Min(corner, half));
        (CoreHalfHeight, CoreHalfWidth) = (HalfHeight - Corner, HalfWidth - Corner);
        _breaks = FindBreaks();
    }

    /// <summary>Corner radius, mm; 0 for sharp corners.</summary>
    public double Corner { get; }

    /// <summary>Half the length of the flats that run towards the top line, mm.</summary>
    public double CoreHalfHeight { get; }

    /// <summary>Half the length of the flats that run across, mm.</summary>
    public double CoreHalfWidth { get; }

    /// <summary>Distances round the outline, mm, of the middles of its four corners, growing.</summary>
    public IReadOnlyList<double> CornerMiddles
    {
        get
        {
            double first = CoreHalfWidth + (Corner * Math.PI / 4);
            return [first - (Perimeter / 2), -first, first, (Perimeter / 2) - first];
        }
    }

    /// <inheritdoc/>
    public override double HalfHeight { get; }

    /// <inheritdoc/>
    public override double HalfWidth { get; }

    /// <inheritdoc/>
    public override double Perimeter => (4 * (CoreHalfHeight + CoreHalfWidth)) + (2 * Math.PI * Corner);

    /// <inheritdoc/>
    public override double Area => (4 * HalfHeight * HalfWidth) - ((4 - Math.PI) * Corner * Corner);

    /// <inheritdoc/>
    public override double SecondMomentX => SecondMoment(HalfHeight, HalfWidth, CoreHalfHeight, Corner);

    /// <inheritdoc/>
    public override double SecondMomentY => SecondMoment(HalfWidth, HalfHeight, CoreHalfWidth, Corner);

    /// <inheritdoc/>
    public override IReadOnlyList<double> Breaks => _breaks;

    /// <inheritdoc/>
    public override double RadiusAt(double sin, double cos)
    {
        (double x, double y) = (Math.Abs(cos), Math.Abs(sin));
        if (y * HalfHeight <= CoreHalfWidth * x)
        {
            return HalfHeight / x;
        }

        if (x * HalfWidth <= CoreHalfHeight * y)
        {
            return HalfWidth / y;
        }

        // The far one of the two places where the ray meets the corner's circle.
        double along = (CoreHalfHeight * x) + (CoreHalfWidth * y);
        double off = (CoreHalfHeight * y) - (CoreHalfWidth * x);
        return along + Math.Sqrt(Math.Max(0, (Corner - off) * (Corner + off)));
    }

    /// <inheritdoc/>
    public override double DistanceAt(double clock, double sin, double cos)
    {
        (double x, double y) = (Math.Abs(cos), Math.Abs(sin));
        double round;
        if (y * HalfHeight <= CoreHalfWidth * x)
        {
            round = HalfHeight * y / x;
        }
        else if (x * HalfWidth <= CoreHalfHeight * y)
        {
            round = CoreHalfWidth + (Corner * Math.PI / 2) + (CoreHalfHeight - (HalfWidth * x / y));
        }
        else
        {
            double radius = RadiusAt(sin, cos);
            round = CoreHalfWidth + (Corner * Math.Atan2((radius * y) - CoreHalfWidth, (radius * x) - CoreHalfHeight));
        }

        return Math.CopySign(cos >= 0 ? round : (Perimeter / 2) - round, clock);
    }

    /// <inheritdoc/>
    public override double SpeedAt(double sin, double cos)
    {
        (double x, double y) = (Math.Abs(cos), Math.Abs(sin));
        if (y * HalfHeight <= CoreHalfWidth * x)
        {
            return HalfHeight / (x * x);
        }

        if (x * HalfWidth <= CoreHalfHeight * y)
        {
            return HalfWidth / (y * y);
        }

        // The tangent is square to the arc's own radius.
        double radius = RadiusAt(sin, cos);
        double tangent = Corner + ((CoreHalfHeight * ((radius * x) - CoreHalfHeight)) + (CoreHalfWidth * ((radius * y) - CoreHalfWidth))) / Corner;
        return radius * radius / tangent;
    }

    /// <inheritdoc/>
    public override double ClockAt(double distance)
    {
        double half = Perimeter / 2;
        double round = Math.Min(Math.Abs(distance), half);
        bool below = round > half / 2;
        if (below)
        {
            round = half - round;
        }

        double arc = Corner * Math.PI / 2;
        double clock;
        if (round <= CoreHalfWidth)
        {
            clock = Math.Atan2(round, HalfHeight);
        }
        else if (round >= CoreHalfWidth + arc)
        {
            clock = Math.Atan2(HalfWidth, CoreHalfHeight - (round - CoreHalfWidth - arc));
        }
        else
        {
            (double sin, double cos) = Math.SinCos((round - CoreHalfWidth) / Corner);
            clock = Math.Atan2(CoreHalfWidth + (Corner * sin), CoreHalfHeight + (Corner * cos));
        }

        return Math.CopySign(below ? Math.PI - clock : clock, distance);
    }

    /// <inheritdoc/>
    public override double HalfWidthAlong(Point2 direction) =>
        (CoreHalfHeight * Math.Abs(direction.X)) + (CoreHalfWidth * Math.Abs(direction.Y)) + Corner;

    /// <inheritdoc/>
    public override Point2 FarthestAlong(Point2 direction) =>
        new((Side(direction.X) * CoreHalfHeight) + (Corner * direction.X), (Side(direction.Y) * CoreHalfWidth) + (Corner * direction.Y));

    /// <inheritdoc/>
    public override bool Cross(Point2 point, Point2 direction, out double enter, out double leave)
    {
        (enter, leave) = (double.PositiveInfinity, double.NegativeInfinity);
        double room = Rounding * (HalfHeight + HalfWidth);
        for (int side = -1; side <= 1; side += 2)
        {
            if (direction.X != 0)
            {
                double at = ((side * HalfHeight) - point.X) / direction.X;
                Take(at, Math.Abs(point.Y + (at * direction.Y)) <= CoreHalfWidth + room, ref enter, ref leave);
            }

            if (direction.Y != 0)
            {
                double at = ((side * HalfWidth) - point.Y) / direction.Y;
                Take(at, Math.Abs(point.X + (at * direction.X)) <= CoreHalfHeight + room, ref enter, ref leave);
            }
        }

        for (int corner = 0; Corner > 0 && corner < 4; corner++)
        {
            (int right, int up) = (corner % 2 == 0 ? 1 : -1, corner < 2 ? 1 : -1);
            CrossArc(point, direction, right, up, room, ref enter, ref leave);
        }

        return enter <= leave;
    }

    /// <inheritdoc/>
    /// <remarks>Moved in by more than the corner radius, the corners are sharp.</remarks>
    public override Outline Grown(double by) =>
        by == 0 ? this : new FlatSidedOutline(2 * (HalfHeight + by), 2 * (HalfWidth + by), Math.Max(0, Corner + by));

    /// <inheritdoc/>
    public override Outline Towards(Outline inner, double share)
    {
        var to = (FlatSidedOutline)inner;
        return new FlatSidedOutline(
            2 * (HalfHeight - ((HalfHeight - to.HalfHeight) * share)),
            2 * (HalfWidth - ((HalfWidth - to.HalfWidth) * share)),
            Corner - ((Corner - to.Corner) * share));
    }

    /// <inheritdoc/>
    public override OutlineView Seen(Point2 along, Point2 across) => new FlatSidedView(this, along, across);

    /// <inheritdoc/>
    public override bool Equals(object? obj) =>
        obj is FlatSidedOutline other && (other.HalfHeight, other.HalfWidth, other.Corner) == (HalfHeight, HalfWidth, Corner);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(HalfHeight, HalfWidth, Corner);

    /// <summary>+1 or −1 on either side, 0 for a direction along a flat, whose middle stands for it.</summary>
    private static int Side(double component) => Math.Abs(component) < 1e-15 ? 0 : Math.Sign(component);

    // A rectangle less, at each corner, the square that holds the arc, plus the quarter disc.
    private static double SecondMoment(double half, double across, double core, double corner)
    {
        double rectangle = 4 * across * half * half * half / 3;
        double square = corner * ((half * half * half) - (core * core * core)) / 3;
        double quarter = corner * corner * ((Math.PI * core * core / 4) + (2 * core * corner / 3) + (Math.PI * corner * corner / 16));
        return rectangle - (4 * (square - quarter));
    }

    private static void Take(double at, bool counts, ref double enter, ref double leave)
    {
        if (counts)
        {
            (enter, leave) = (Math.Min(enter, at), Math.Max(leave, at));
        }
    }

    private void CrossArc(Point2 point, Point2 direction, int right, int up, double room, ref double enter, ref double leave)
    {
        (double x, double y) = (point.X - (right * CoreHalfHeight), point.Y - (up * CoreHalfWidth));
        double a = (direction.X * direction.X) + (direction.Y * direction.Y);
        double b = (x * direction.X) + (y * direction.Y);
        double c = (x * x) + (y * y) - (Corner * Corner);
        double discriminant = (b * b) - (a * c);
        if (!(discriminant >= 0))
        {
            return;
        }

        double root = Math.Sqrt(discriminant);
        foreach (double at in (ReadOnlySpan<double>)[(-b - root) / a, (-b + root) / a])
        {
            bool onArc = right * (x + (at * direction.X)) >= -room && up * (y + (at * direction.Y)) >= -room;
            Take(at, onArc, ref enter, ref leave);
        }
    }

    private double[] FindBreaks()
    {
        double first = Math.Atan2(CoreHalfWidth, HalfHeight);
        double second = Math.Atan2(HalfWidth, CoreHalfHeight);
        double[] all =
        [
            first, second, Math.PI - second, Math.PI - first, -first, -second, second - Math.PI, first == 0 ? Math.PI : first - Math.PI,
        ];
        Array.Sort(all);
        var breaks = new List<double>(all.Length);
        foreach (double clock in all)
        {
            if (breaks.Count == 0 || clock - breaks[^1] > 1e-12)
            {
                breaks.Add(clock);
            }
        }

        return [.. breaks];
    }
}
