namespace FrameGen.Geometry;

/// <summary>
/// The curve at a constant distance from an ellipse: the ellipse itself, the bore of a tube of constant wall, or what keeps a gap to it.
/// Its points are counted by the angle ψ of their outward normal: E(ψ) + d n(ψ), with n = (cos ψ, sin ψ) and
/// E = (a² cos ψ, b² sin ψ) / √(a² cos² ψ + b² sin² ψ).
/// </summary>
/// <remarks>
/// Radius of curvature a²b²/(a² cos² ψ + b² sin² ψ)^(3/2) + d. Its integral, the distance round, is a Fourier series whose terms fall
/// off as ((a − b)/(a + b))^k: summed to rounding. Places asked by clock angle or by distance are found by Newton's method, to rounding.
/// </remarks>
public sealed class EllipseOutline : Outline
{
    private const int Samples = 512;

    private readonly double _a, _b, _offset;
    private readonly double _a2, _b2;
    private readonly double _meanRadius;
    private readonly double[] _series;

    /// <summary>A curve along an ellipse.</summary>
    /// <param name="height">Of the ellipse along the top line, mm; positive.</param>
    /// <param name="width">Of the ellipse across, mm; positive; at most 20 times the height, or the other way round.</param>
    /// <param name="offset">Distance of the curve from the ellipse, mm, positive outside.</param>
    /// <exception cref="ArgumentOutOfRangeException">A size outside its range, or a curve so far inside that it would cross itself: the
    /// distance is then at least the ellipse's least radius of curvature, half the smaller size squared over half the larger.</exception>
    public EllipseOutline(double height, double width, double offset)
    {
        double larger = Math.Max(height, width), smaller = Math.Min(height, width);
        if (!(smaller > 0 && double.IsFinite(larger) && larger <= MostSlender * smaller))
        {
            throw new ArgumentOutOfRangeException(nameof(height), height, $"An ellipse of {height} x {width} mm can't be measured.");
        }

        if (!(offset > -LeastRadiusOfCurvature(height, width) && double.IsFinite(offset)))
        {
            throw new ArgumentOutOfRangeException(nameof(offset), offset, "The curve would cross itself.");
        }

        (_a, _b, _offset) = (height / 2, width / 2, offset);
        (_a2, _b2) = (_a * _a, _b * _b);
        (HalfHeight, HalfWidth) = (_a + offset, _b + offset);
        (_meanRadius, _series) = Series();
        Perimeter = 2 * Math.PI * _meanRadius;
        (SecondMomentX, SecondMomentY) = SecondMoments();
    }

    /// <summary>Largest ratio of the two sizes.</summary>
    public static double MostSlender => 20;

    /// <summary>How far inside the ellipse the curve can go, mm: no thicker may a constant wall be.</summary>
    /// <param name="height">Of the ellipse, mm.</param>
    /// <param name="width">Of the ellipse, mm.</param>
    public static double LeastRadiusOfCurvature(double height, double width)
    {
        double larger = Math.Max(height, width), smaller = Math.Min(height, width);
        return smaller * smaller / (2 * larger);
    }

    /// <inheritdoc/>
    public override double HalfHeight { get; }

    /// <inheritdoc/>
    public override double HalfWidth { get; }

    /// <inheritdoc/>
    public override double Perimeter { get; }

    /// <summary>By Steiner's formula, π a b + d P + π d² with the ellipse's own perimeter P, mm².</summary>
    public override double Area =>
        (Math.PI * _a * _b) + (_offset * (Perimeter - (2 * Math.PI * _offset))) + (Math.PI * _offset * _offset);

    /// <inheritdoc/>
    public override double SecondMomentX { get; }

    /// <inheritdoc/>
    public override double SecondMomentY { get; }

    /// <inheritdoc/>
    public override IReadOnlyList<double> Breaks => [];

    /// <inheritdoc/>
    public override double RadiusAt(double sin, double cos)
    {
        if (_offset == 0)
        {
            return _a * _b / Math.Sqrt((_b2 * cos * cos) + (_a2 * sin * sin));
        }

        (double normalSin, double normalCos) = NormalAt(sin, cos);
        Point2 point = At(normalSin, normalCos);
        return (point.X * cos) + (point.Y * sin);
    }

    /// <inheritdoc/>
    public override double DistanceAt(double clock, double sin, double cos)
    {
        (double normalSin, double normalCos) = NormalAt(sin, cos);
        double normal = Math.Atan2(normalSin, normalCos);

        // At the seam the clock angle's sign says which side is meant.
        return Math.CopySign(Round(Math.Abs(normal)), clock);
    }

    /// <inheritdoc/>
    public override double SpeedAt(double sin, double cos)
    {
        (double normalSin, double normalCos) = NormalAt(sin, cos);
        Point2 point = At(normalSin, normalCos);
        return ((point.X * point.X) + (point.Y * point.Y)) / ((point.X * normalCos) + (point.Y * normalSin));
    }

    /// <inheritdoc/>
    public override double ClockAt(double distance)
    {
        double wanted = Math.Min(Math.Abs(distance), Perimeter / 2);
        double normal = wanted / _meanRadius;
        (double low, double high) = (0, Math.PI);
        for (int i = 0; i < 80; i++)
        {
            // Newton's step where it stays between what is known to be too little and too much; halfway otherwise.
            (double s, double c) = Math.SinCos(normal);
            double missing = wanted - Round(normal);
            (low, high) = missing > 0 ? (normal, high) : (low, normal);
            double next = normal + (missing / Curvature(s, c));
            next = next >= low && next <= high ? next : low + ((high - low) / 2);
            if (Math.Abs(next - normal) < 1e-15)
            {
                break;
            }

            normal = next;
        }

        (double sin, double cos) = Math.SinCos(normal);
        Point2 point = At(sin, cos);
        return Math.CopySign(Math.Atan2(Math.Max(0, point.Y), point.X), distance);
    }

    /// <inheritdoc/>
    public override double HalfWidthAlong(Point2 direction) =>
        Math.Sqrt((_a2 * direction.X * direction.X) + (_b2 * direction.Y * direction.Y)) + _offset;

    /// <inheritdoc/>
    public override Point2 FarthestAlong(Point2 direction) => At(direction.Y, direction.X);

    /// <inheritdoc/>
    public override bool Cross(Point2 point, Point2 direction, out double enter, out double leave)
    {
        double length = Math.Sqrt((direction.X * direction.X) + (direction.Y * direction.Y));
        (enter, leave) = (0, 0);
        if (length <= 0)
        {
            return false;
        }

        Point2 along = (1 / length) * direction;
        Point2 across = new(along.Y, -along.X);
        double u = (point.X * across.X) + (point.Y * across.Y);
        double v = (point.X * along.X) + (point.Y * along.Y);
        double half = HalfWidthAlong(across);
        if (Math.Abs(u) > half)
        {
            return false;
        }

        (enter, leave) = ((-Far(-u, half, along, across) - v) / length, (Far(u, half, along, across) - v) / length);
        return true;
    }

    /// <inheritdoc/>
    public override Outline Grown(double by) => by == 0 ? this : new EllipseOutline(2 * _a, 2 * _b, _offset + by);

    /// <inheritdoc/>
    public override Outline Towards(Outline inner, double share) =>
        Grown((((EllipseOutline)inner)._offset - _offset) * share);

    /// <inheritdoc/>
    public override OutlineView Seen(Point2 along, Point2 across) => new View(this, along, across);

    /// <inheritdoc/>
    public override bool Equals(object? obj) =>
        obj is EllipseOutline other && (other._a, other._b, other._offset) == (_a, _b, _offset);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(_a, _b, _offset);

    /// <summary>The place along a line, mm, where it leaves, u across from the axis.</summary>
    private double Far(double u, double half, Point2 along, Point2 across)
    {
        if (Math.Abs(u) >= half)
        {
            Point2 end = FarthestAlong(u < 0 ? -1 * across : across);
            return (end.X * along.X) + (end.Y * along.Y);
        }

        // On an ellipse: v = (c u + a b √(h² − u²)) / h², with h² = a² ux² + b² uy², c = a² ux vx + b² uy vy.
        double whole = half - _offset;
        double squared = whole * whole;
        double mixed = (_a2 * across.X * along.X) + (_b2 * across.Y * along.Y);
        if (_offset == 0)
        {
            return ((mixed * u) + (_a * _b * Math.Sqrt((whole - u) * (whole + u)))) / squared;
        }

        // Normal angle χ from the line's direction, (sin χ, cos χ) in (u, v): u grows with it at the rate (radius of curvature) × cos χ.
        (double low, double high) = (-Math.PI / 2, Math.PI / 2);
        double angle = Math.Asin(u / half);
        Point2 point = default;
        for (int i = 0; i < 80; i++)
        {
            (double sin, double cos) = Math.SinCos(angle);
            Point2 normal = (sin * across) + (cos * along);
            point = At(normal.Y, normal.X);
            double error = (point.X * across.X) + (point.Y * across.Y) - u;
            (low, high) = error > 0 ? (low, angle) : (angle, high);
            double next = angle - (error / (Curvature(normal.Y, normal.X) * cos));
            if (!(next > low && next < high))
            {
                next = low + ((high - low) / 2);
            }

            if (Math.Abs(error) < 1e-14 * half || Math.Abs(next - angle) < 1e-16)
            {
                break;
            }

            angle = next;
        }

        return (point.X * along.X) + (point.Y * along.Y);
    }

    private Point2 At(double normalSin, double normalCos)
    {
        double size = Math.Sqrt((_a2 * normalCos * normalCos) + (_b2 * normalSin * normalSin));
        return new(((_a2 / size) + _offset) * normalCos, ((_b2 / size) + _offset) * normalSin);
    }

    private double Curvature(double normalSin, double normalCos)
    {
        double size = (_a2 * normalCos * normalCos) + (_b2 * normalSin * normalSin);
        return (_a2 * _b2 / (size * Math.Sqrt(size))) + _offset;
    }

    /// <summary>Sine and cosine of the normal's angle where a ray meets the curve.</summary>
    private (double Sin, double Cos) NormalAt(double sin, double cos)
    {
        // On the ellipse itself the normal is (x/a², y/b²). Beside it that is a first guess, better with the sizes moved too.
        (double x, double y) = (cos * HalfWidth * HalfWidth, sin * HalfHeight * HalfHeight);
        double length = Math.Sqrt((x * x) + (y * y));
        (double s, double c) = (y / length, x / length);
        if (_offset == 0)
        {
            return (s, c);
        }

        for (int i = 0; i < 30; i++)
        {
            // Turned until the point lies on the ray: it moves along the tangent (−s, c) at the radius of curvature.
            Point2 point = At(s, c);
            double off = (point.Y * cos) - (point.X * sin);
            double step = -off / (Curvature(s, c) * ((c * cos) + (s * sin)));
            step = Math.Clamp(step, -0.3, 0.3);
            (double turnedSin, double turnedCos) = ((s + (step * c)), (c - (step * s)));
            double turned = 1 / Math.Sqrt((turnedSin * turnedSin) + (turnedCos * turnedCos));
            (s, c) = (turnedSin * turned, turnedCos * turned);
            if (Math.Abs(step) < 1e-15)
            {
                break;
            }
        }

        return (s, c);
    }

    /// <summary>Distance round from the top line by normal angle: mean radius × ψ + Σ cₖ sin 2kψ, summed by Clenshaw's rule.</summary>
    private double Round(double normal)
    {
        (double sin, double cos) = Math.SinCos(2 * normal);
        double twice = 2 * cos;
        double next = 0, afterNext = 0;
        for (int k = _series.Length - 1; k >= 0; k--)
        {
            (next, afterNext) = (_series[k] + (twice * next) - afterNext, next);
        }

        return (_meanRadius * normal) + (next * sin);
    }

    // Equal steps integrate a periodic function to rounding once its harmonics are resolved.
    private (double Mean, double[] Series) Series()
    {
        var radii = new double[Samples];
        double mean = 0;
        for (int i = 0; i < Samples; i++)
        {
            (double sin, double cos) = Math.SinCos(Math.PI * i / Samples);
            radii[i] = Curvature(sin, cos);
            mean += radii[i] / Samples;
        }

        double[] cosines = [.. Enumerable.Range(0, Samples).Select(i => Math.Cos(2 * Math.PI * i / Samples))];
        var series = new List<double>();
        for (int k = 1; k < Samples / 2; k++)
        {
            double sum = 0;
            for (int i = 0; i < Samples; i++)
            {
                sum += radii[i] * cosines[k * i % Samples];
            }

            double term = 2 * sum / Samples / (2 * k);
            if (Math.Abs(term) < 1e-16 * mean)
            {
                break;
            }

            series.Add(term);
        }

        return (mean, [.. series]);
    }

    // Round the curve, ∫ x² dA = ⅓ ∮ x³ nx ds and likewise for y.
    private (double X, double Y) SecondMoments()
    {
        (double sumX, double sumY) = (0, 0);
        for (int i = 0; i < Samples; i++)
        {
            (double sin, double cos) = Math.SinCos(2 * Math.PI * i / Samples);
            Point2 point = At(sin, cos);
            double length = Curvature(sin, cos) * 2 * Math.PI / Samples;
            sumX += point.X * point.X * point.X * cos * length / 3;
            sumY += point.Y * point.Y * point.Y * sin * length / 3;
        }

        return (sumX, sumY);
    }

    private sealed class View : OutlineView
    {
        private readonly EllipseOutline _outline;
        private readonly Point2 _along, _across;

        public View(EllipseOutline outline, Point2 along, Point2 across)
        {
            (_outline, _along, _across) = (outline, along, across);
            HalfWidth = outline.HalfWidthAlong(across);
        }

        public override double HalfWidth { get; }

        public override IReadOnlyList<double> Breaks => [];

        public override IReadOnlyList<Point2> Flats => [];

        public override double Far(double u) => _outline.Far(u, HalfWidth, _along, _across);

        public override int PieceAt(double u) => 0;

        public override double Farthest(Point2 normal)
        {
            Point2 point = _outline.FarthestAlong((1 / normal.DistanceTo(default)) * Turned(normal));
            return (point.X * _across.X) + (point.Y * _across.Y);
        }

        public override bool Cross(Point2 point, Point2 direction, out double enter, out double leave) =>
            _outline.Cross(Turned(point), Turned(direction), out enter, out leave);

        private Point2 Turned(Point2 point) => (point.X * _across) + (point.Y * _along);
    }
}
