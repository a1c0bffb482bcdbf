namespace FrameGen.Geometry;

/// <summary>An endless straight line in space: a tube's axis.</summary>
/// <param name="Point">On the line, mm.</param>
/// <param name="Direction">Unit vector.</param>
public readonly record struct Line3(Vector3 Point, Vector3 Direction)
{
    /// <summary>Below this sine two directions count as parallel: over 1 m they part by a millionth of a millimetre.</summary>
    public const double ParallelSine = 1e-9;

    /// <summary>Shortest distance to another line, mm: along the common normal, or between parallels.</summary>
    public double DistanceTo(Line3 other)
    {
        Vector3 between = other.Point - Point;
        Vector3 normal = Direction.Cross(other.Direction);
        double sine = normal.Length;
        return sine < ParallelSine
            ? Direction.Cross(between).Length
            : Math.Abs(between.Dot(normal)) / sine;
    }
}
