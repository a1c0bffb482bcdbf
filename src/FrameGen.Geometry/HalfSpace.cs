namespace FrameGen.Geometry;

/// <summary>All points on one side of a plane.</summary>
/// <param name="Point">On the plane, mm.</param>
/// <param name="Inward">Unit normal into the half-space.</param>
public readonly record struct HalfSpace(Vector3 Point, Vector3 Inward)
{
    /// <summary>Distance of a point from the plane, mm, positive inside.</summary>
    public double Depth(Vector3 point) => Inward.Dot(point - Point);
}
