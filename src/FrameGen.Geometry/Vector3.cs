namespace FrameGen.Geometry;

/// <summary>A point or a direction in space; mm where it is a point, no unit where it is a direction.</summary>
/// <param name="X">Component along global x.</param>
/// <param name="Y">Component along global y.</param>
/// <param name="Z">Component along global z.</param>
public readonly record struct Vector3(double X, double Y, double Z)
{
    /// <summary>The zero vector.</summary>
    public static readonly Vector3 Zero;

    /// <summary>Unit vector along x.</summary>
    public static readonly Vector3 UnitX = new(1, 0, 0);

    /// <summary>Unit vector along y.</summary>
    public static readonly Vector3 UnitY = new(0, 1, 0);

    /// <summary>Unit vector along z.</summary>
    public static readonly Vector3 UnitZ = new(0, 0, 1);

    /// <summary>Euclidean length.</summary>
    public double Length => Math.Sqrt(Dot(this));

    /// <summary>Sum by components.</summary>
    public static Vector3 operator +(Vector3 a, Vector3 b) => new(a.X + b.X, a.Y + b.Y, a.Z + b.Z);

    /// <summary>Difference by components.</summary>
    public static Vector3 operator -(Vector3 a, Vector3 b) => new(a.X - b.X, a.Y - b.Y, a.Z - b.Z);

    /// <summary>The opposite vector.</summary>
    public static Vector3 operator -(Vector3 a) => new(-a.X, -a.Y, -a.Z);

    /// <summary>Scaled by a factor.</summary>
    public static Vector3 operator *(double factor, Vector3 a) => new(factor * a.X, factor * a.Y, factor * a.Z);

    /// <summary>Scaled by a factor.</summary>
    public static Vector3 operator *(Vector3 a, double factor) => factor * a;

    /// <summary>Divided by a number.</summary>
    public static Vector3 operator /(Vector3 a, double divisor) => new(a.X / divisor, a.Y / divisor, a.Z / divisor);

    /// <summary>Scalar product.</summary>
    public double Dot(Vector3 other) => (X * other.X) + (Y * other.Y) + (Z * other.Z);

    /// <summary>Vector product, right-handed.</summary>
    public Vector3 Cross(Vector3 other) =>
        new((Y * other.Z) - (Z * other.Y), (Z * other.X) - (X * other.Z), (X * other.Y) - (Y * other.X));

    /// <summary>The unit vector of the same direction.</summary>
    /// <exception cref="InvalidOperationException">The vector has no length, or is not finite.</exception>
    public Vector3 Normalized()
    {
        double length = Length;
        if (!(length > 0 && double.IsFinite(length)))
        {
            throw new InvalidOperationException($"The vector {this} has no direction.");
        }

        return this / length;
    }

    /// <summary>Angle to another vector, rad, 0 to π; accurate near 0 and π too.</summary>
    public double AngleTo(Vector3 other) => Math.Atan2(Cross(other).Length, Dot(other));
}
