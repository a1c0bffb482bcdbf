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

    /// <summary>
    /// Unit vector square to two lines; for lines that run along each other the one from the first to the second, square to the first;
    /// null for lines that lie on each other.
    /// </summary>
    public static Vector3? CommonNormal(Line3 one, Line3 other)
    {
        Vector3 normal = one.Direction.Cross(other.Direction);
        if (normal.Length >= ParallelSine)
        {
            return normal.Normalized();
        }

        Vector3 between = other.Point - one.Point;
        Vector3 apart = between - (between.Dot(one.Direction) * one.Direction);
        return apart.Length > 1e-9 ? apart.Normalized() : null;
    }
}
