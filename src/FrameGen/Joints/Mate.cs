using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>
/// What a tube's end is cut to, seen from that end: an endless round prism, cut off where the mate ends. Directions
/// square to the mate's axis: e₂ along the common normal of the two axes, e₁ the tube's own direction projected. A wall
/// line runs along e₁ there, so that its distance across, w₂, is the same all along and the prism is met at the ends of
/// one chord: t = (−w₁ ± √(R² − w₂²)) / sin φ, the classic saddle.
/// </summary>
internal sealed partial class Mate
{
    private readonly RoundOutline _outline;
    private readonly HalfSpace? _limit;
    private readonly double _sine;
    private readonly double _w1, _w1Cos, _w1Sin;
    private readonly double _w2, _w2Cos, _w2Sin;
    private readonly double _depth, _depthCos, _depthSin, _depthSlope;

    /// <summary>A mate as the tube's end sees it.</summary>
    /// <param name="tube">Index of the mate.</param>
    /// <param name="axis">Its axis; at an end of the mate the direction points into it.</param>
    /// <param name="isThrough">True where it runs through the node.</param>
    /// <param name="outline">Its outer outline, grown by the gap.</param>
    /// <param name="limit">Where it ends; null where it runs through.</param>
    /// <param name="frame">The end that is cut.</param>
    public Mate(int tube, Line3 axis, bool isThrough, RoundOutline outline, HalfSpace? limit, in EndFrame frame)
    {
        (Tube, Axis, IsThrough, _outline, _limit) = (tube, axis, isThrough, outline, limit);
        Vector3 normal = axis.Direction.Cross(frame.Into);
        _sine = normal.Length;
        IsParallel = _sine < Line3.ParallelSine;
        Vector3 e2 = IsParallel ? AnyNormal(axis.Direction) : normal / _sine;
        Vector3 e1 = e2.Cross(axis.Direction);
        Vector3 offset = frame.Point - axis.Point;
        (_w1, _w1Cos, _w1Sin) = (offset.Dot(e1), frame.Axes.Z.Dot(e1), -frame.Axes.Y.Dot(e1));
        (_w2, _w2Cos, _w2Sin) = (offset.Dot(e2), frame.Axes.Z.Dot(e2), -frame.Axes.Y.Dot(e2));
        if (limit is { } plane)
        {
            _depth = plane.Depth(frame.Point);
            _depthCos = frame.Axes.Z.Dot(plane.Inward);
            _depthSin = -frame.Axes.Y.Dot(plane.Inward);
            _depthSlope = frame.Into.Dot(plane.Inward);
        }
    }

    /// <summary>Index of the mate.</summary>
    public int Tube { get; }

    /// <summary>Its axis; at an end of the mate the direction points into it.</summary>
    public Line3 Axis { get; }

    /// <summary>True where it runs through the node.</summary>
    public bool IsThrough { get; }

    /// <summary>True where its axis runs along the tube's.</summary>
    public bool IsParallel { get; }

    /// <summary>Its outside radius and the gap, mm.</summary>
    public double Radius => _outline.Radius;

    /// <summary>True where a wall line inside this mate never leaves it: the tube runs along within its mate.</summary>
    public bool Swallows => IsParallel && !(_limit is not null && _depthSlope < 0);

    /// <summary>True where it ends at the node.</summary>
    public bool IsLimited => _limit is not null;

    /// <summary>Distance between the axes, mm; meaningless where they run along each other.</summary>
    public double Offset => Math.Abs(_w2);

    /// <summary>The wall lines at one clock angle, against this mate.</summary>
    public HalfPlane At(double sin, double cos) => new(
        this, (_w1Cos * cos) + (_w1Sin * sin), (_w2Cos * cos) + (_w2Sin * sin), (_depthCos * cos) + (_depthSin * sin));

    /// <summary>Adds the clock angles, rad in (−π, π], at which the wall line at a distance from the axis grazes this mate.</summary>
    public void AddTangents(double radius, List<double> clocks)
    {
        // w₂ + radius (c cos θ + s sin θ) = ±R; at parallel axes grazing is not along one line but all along.
        double amplitude = radius * Math.Sqrt((_w2Cos * _w2Cos) + (_w2Sin * _w2Sin));
        if (IsParallel || amplitude <= 0)
        {
            return;
        }

        double phase = Math.Atan2(_w2Sin, _w2Cos);
        for (int side = -1; side <= 1; side += 2)
        {
            double cosine = ((side * Radius) - _w2) / amplitude;
            if (Math.Abs(cosine) <= 1 + (RoundOutline.Graze / amplitude))
            {
                // Tubes as wide as their mate graze it once: two roots a rounding error apart are one.
                double half = Math.Acos(Math.Clamp(cosine, -1, 1));
                bool single = half < 1e-7 || half > Math.PI - 1e-7;
                half = single ? Math.Round(half / Math.PI) * Math.PI : half;
                clocks.Add(Math.IEEERemainder(phase + half, 2 * Math.PI));
                if (!single)
                {
                    clocks.Add(Math.IEEERemainder(phase - half, 2 * Math.PI));
                }
            }
        }
    }

    private static Vector3 AnyNormal(Vector3 direction) =>
        direction.Cross(Math.Abs(direction.X) < 0.6 ? Vector3.UnitX : Vector3.UnitY).Normalized();
}

/// <summary>The end of a tube that is cut: its axis point, the direction into the tube, and the tube's axes for clock angles.</summary>
/// <param name="Point">End of the axis, mm, global.</param>
/// <param name="Into">Unit direction into the tube.</param>
/// <param name="Axes">The tube's local axes.</param>
internal readonly record struct EndFrame(Vector3 Point, Vector3 Into, TubeAxes Axes);
