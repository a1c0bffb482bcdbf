using FrameGen.Geometry;

namespace FrameGen.Formats.Drawings;

/// <summary>A rectangle along the axes, mm.</summary>
/// <param name="Left">Least x.</param>
/// <param name="Bottom">Least y.</param>
/// <param name="Right">Greatest x.</param>
/// <param name="Top">Greatest y.</param>
public readonly record struct Box2(double Left, double Bottom, double Right, double Top)
{
    /// <summary>Right less left, mm.</summary>
    public double Width => Right - Left;

    /// <summary>Top less bottom, mm.</summary>
    public double Height => Top - Bottom;

    /// <summary>The smallest box round points; at least one.</summary>
    /// <exception cref="ArgumentException">No point.</exception>
    public static Box2 Around(IReadOnlyList<Point2> points)
    {
        if (points.Count == 0)
        {
            throw new ArgumentException("A box needs a point.", nameof(points));
        }

        Box2 box = new(points[0].X, points[0].Y, points[0].X, points[0].Y);
        for (int i = 1; i < points.Count; i++)
        {
            Point2 p = points[i];
            box = new Box2(Math.Min(box.Left, p.X), Math.Min(box.Bottom, p.Y), Math.Max(box.Right, p.X), Math.Max(box.Top, p.Y));
        }

        return box;
    }

    /// <summary>The smallest box round both.</summary>
    public Box2 Union(Box2 other) => new(
        Math.Min(Left, other.Left), Math.Min(Bottom, other.Bottom), Math.Max(Right, other.Right), Math.Max(Top, other.Top));

    /// <summary>True where the two share more than an edge.</summary>
    public bool Overlaps(Box2 other) => Left < other.Right && other.Left < Right && Bottom < other.Top && other.Bottom < Top;
}
