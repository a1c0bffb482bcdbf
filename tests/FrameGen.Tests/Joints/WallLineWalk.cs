using FrameGen.Geometry;

namespace FrameGen.Tests.Joints;

/// <summary>
/// The plain second method: walks a wall line from the tube's middle towards its end in small steps until a point lies
/// inside a solid, then halves the last step. Solids are a cylinder and at most one half-space, nothing else is shared
/// with the product.
/// </summary>
internal sealed record Solid(Vector3 Point, Vector3 Axis, double Radius, Vector3? End = null)
{
    public bool Holds(Vector3 p)
    {
        Vector3 from = p - Point;
        Vector3 across = from - (from.Dot(Axis) * Axis);
        return across.Length <= Radius && (End is not { } end || (p - end).Dot(Axis) >= 0);
    }

    /// <summary>t at which the walk stops; null where it meets nothing on the way to <paramref name="last"/>.</summary>
    public static double? Walk(IReadOnlyList<Solid> solids, Vector3 start, Vector3 into, double middle, double last, double step)
    {
        for (double t = middle; t >= last; t -= step)
        {
            if (!Inside(t))
            {
                continue;
            }

            (double inside, double outside) = (t, t + step);
            for (int i = 0; i < 50; i++)
            {
                double half = (inside + outside) / 2;
                (inside, outside) = Inside(half) ? (half, outside) : (inside, half);
            }

            return inside;
        }

        return null;

        bool Inside(double t) => solids.Any(s => s.Holds(start + (t * into)));
    }
}
