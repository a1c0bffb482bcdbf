namespace FrameGen.Geometry;

/// <summary>A point or a direction in a plane, mm.</summary>
/// <param name="X">To the right.</param>
/// <param name="Y">Up.</param>
public readonly record struct Point2(double X, double Y)
{
    /// <summary>Sum by components.</summary>
    public static Point2 operator +(Point2 a, Point2 b) => new(a.X + b.X, a.Y + b.Y);

    /// <summary>Difference by components.</summary>
    public static Point2 operator -(Point2 a, Point2 b) => new(a.X - b.X, a.Y - b.Y);

    /// <summary>Scaled by a factor.</summary>
    public static Point2 operator *(double factor, Point2 a) => new(factor * a.X, factor * a.Y);

    /// <summary>Distance to another point, mm.</summary>
    public double DistanceTo(Point2 other) => Math.Sqrt(((X - other.X) * (X - other.X)) + ((Y - other.Y) * (Y - other.Y)));
}
