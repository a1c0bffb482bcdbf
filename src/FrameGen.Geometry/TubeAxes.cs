namespace FrameGen.Geometry;

/// <summary>
/// Local axes of a tube: x along it from its <c>from</c> end to its <c>to</c> end, z the top line, y = z × x.
/// Clock angle 0 is the top line; it grows right-handed about x, so that it runs clockwise seen along the tube.
/// </summary>
public sealed record TubeAxes
{
    private static readonly double CosineOfOneDegree = Math.Cos(Math.PI / 180);

    private TubeAxes(Vector3 x, Vector3 y, Vector3 z) => (X, Y, Z) = (x, y, z);

    /// <summary>Unit vector along the tube.</summary>
    public Vector3 X { get; }

    /// <summary>Unit vector z × x.</summary>
    public Vector3 Y { get; }

    /// <summary>Unit vector towards the top line.</summary>
    public Vector3 Z { get; }

    /// <summary>Axes of a tube that runs along a direction.</summary>
    /// <param name="along">From the <c>from</c> end to the <c>to</c> end; any length but zero.</param>
    /// <param name="up">Direction of the top line, made square to the axis; null for the default: global z, or global x
    /// for tubes within 1 degree of vertical.</param>
    /// <exception cref="ArgumentException"><paramref name="up"/> is parallel to the tube, or a vector has no length.</exception>
    public static TubeAxes Along(Vector3 along, Vector3? up = null)
    {
        if (!(along.Length > 0))
        {
            throw new ArgumentException("A tube needs a length.", nameof(along));
        }

        Vector3 x = along.Normalized();
        Vector3 wanted = up ?? (Math.Abs(x.Z) >= CosineOfOneDegree ? Vector3.UnitX : Vector3.UnitZ);
        Vector3 across = wanted.Cross(x);
        if (!(across.Length > 1e-9 * wanted.Length))
        {
            throw new ArgumentException("The top line can't point along the tube.", nameof(up));
        }

        Vector3 y = across.Normalized();
        return new TubeAxes(x, y, x.Cross(y));
    }

    /// <summary>Unit vector from the axis to the wall at a clock angle.</summary>
    /// <param name="clock">Clock angle, rad.</param>
    public Vector3 Radial(double clock)
    {
        (double sin, double cos) = Math.SinCos(clock);
        return (cos * Z) - (sin * Y);
    }

    /// <summary>What of a vector lies in the plane of the section, as its outlines have it: X towards the top line, Y towards clock 90°.</summary>
    public Point2 InSection(Vector3 vector) => new(vector.Dot(Z), -vector.Dot(Y));

    /// <summary>Clock angle, rad in (−π, π], of a direction as seen along the tube; 0 for one parallel to the tube.</summary>
    public double ClockOf(Vector3 direction) => Math.Atan2(-direction.Dot(Y), direction.Dot(Z));
}
