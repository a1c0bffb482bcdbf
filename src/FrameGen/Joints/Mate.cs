using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>
/// What a tube's end is cut to, seen from that end: an endless prism, cut off where the mate ends. Directions square to
/// the mate's axis: e₂ along the common normal of the two axes, e₁ the tube's own direction projected. A wall line runs
/// along e₁ there, so that its distance across, w₂, is the same all along and the prism is met at the ends of one chord
/// of the mate's outline: t = (v − w₁) / sin φ with v its near or far end; for a round mate v = ±√(R² − w₂²), the classic
/// saddle.
/// </summary>
internal sealed partial class Mate
{
    /// <summary>Breaks of a curve nearer together than this are one, rad.</summary>
    private const double SingleGraze = 1e-7;

    private readonly Outline _outline;
    private readonly OutlineView _view;
    private readonly Point2 _along, _across;
    private readonly HalfSpace? _limit;
    private readonly double _sine;
    private readonly double _w1, _w1Cos, _w1Sin;
    private readonly double _w2, _w2Cos, _w2Sin;
    private readonly double _depth, _depthCos, _depthSin, _depthSlope;

    /// <summary>A mate as the tube's end sees it.</summary>
    /// <param name="source">The mate.</param>
    /// <param name="gap">Kept clear of it, mm.</param>
    /// <param name="frame">The end that is cut.</param>
    public Mate(MateSource source, double gap, in EndFrame frame)
    {
        (Tube, Axis, Axes, _limit) = (source.Tube, source.Axis, source.Axes, source.Limit);
        _outline = source.Outline.Grown(gap);
        Vector3 normal = Axis.Direction.Cross(frame.Into);
        _sine = normal.Length;
        IsParallel = _sine < Line3.ParallelSine;
        Vector3 e2 = IsParallel ? AnyNormal(Axis.Direction) : normal / _sine;
        Vector3 e1 = e2.Cross(Axis.Direction);
        (_along, _across) = (source.Axes.InSection(e1), source.Axes.InSection(e2));
        _view = _outline.Seen(_along, _across);
        Vector3 offset = frame.Point - Axis.Point;
        (_w1, _w1Cos, _w1Sin) = (offset.Dot(e1), frame.Axes.Z.Dot(e1), -frame.Axes.Y.Dot(e1));
        (_w2, _w2Cos, _w2Sin) = (offset.Dot(e2), frame.Axes.Z.Dot(e2), -frame.Axes.Y.Dot(e2));
        if (_limit is { } plane)
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

    /// <summary>Its local axes there.</summary>
    public TubeAxes Axes { get; }

    /// <summary>True where it runs through the node.</summary>
    public bool IsThrough => _limit is null;

    /// <summary>True where its axis runs along the tube's.</summary>
    public bool IsParallel { get; }

    /// <summary>Half its width along the common normal of the two axes, gap included, mm; meaningless where they run along each other.</summary>
    public double HalfWidth => _view.HalfWidth;

    /// <summary>True where a wall line inside this mate never leaves it: the tube runs along within its mate.</summary>
    public bool Swallows => IsParallel && !(_limit is not null && _depthSlope < 0);

    /// <summary>True where it ends at the node.</summary>
    public bool IsLimited => _limit is not null;

    /// <summary>Distance between the axes, mm; meaningless where they run along each other.</summary>
    public double Offset => Math.Abs(_w2);

    /// <summary>The wall lines at one clock angle, against this mate.</summary>
    public HalfPlane At(double sin, double cos) => new(
        this, (_w1Cos * cos) + (_w1Sin * sin), (_w2Cos * cos) + (_w2Sin * sin), (_depthCos * cos) + (_depthSin * sin));

    /// <summary>Adds the clock angles, rad in (−π, π], of the wall lines of a skin that graze this mate.</summary>
    public void AddTangents(Outline skin, List<double> clocks)
    {
        for (int side = -1; side <= 1; side += 2)
        {
            AddLinesAcross(skin, side * _view.HalfWidth, clocks);
        }
    }

    /// <summary>
    /// Adds the clock angles, rad in (−π, π], of the wall lines of a skin that leave this mate where a flat of it meets a corner.
    /// </summary>
    public void AddBreaks(Outline skin, List<double> clocks)
    {
        foreach (double across in _view.Breaks)
        {
            AddLinesAcross(skin, across, clocks);
        }
    }

    /// <summary>Adds the clock angles, rad in (−π, π], at which a ray from the tube's axis runs along a flat of this mate.</summary>
    public void AddFlats(List<double> clocks)
    {
        foreach (Point2 flat in _view.Flats)
        {
            double cos = (_w1Cos * flat.X) - (_w2Cos * flat.Y);
            double sin = (_w1Sin * flat.X) - (_w2Sin * flat.Y);
            if (!IsParallel && (cos * cos) + (sin * sin) > 1e-20)
            {
                double clock = Math.Atan2(-cos, sin);
                clocks.Add(clock);
                clocks.Add(clock > 0 ? clock - Math.PI : clock + Math.PI);
            }
        }
    }

    // Where w₂ + (c, s) · p = across on a skin; at parallel axes that is not along one line but all along.
    private void AddLinesAcross(Outline skin, double across, List<double> clocks)
    {
        double amplitude = Math.Sqrt((_w2Cos * _w2Cos) + (_w2Sin * _w2Sin));
        if (IsParallel || amplitude <= 0 || skin.IsPoint)
        {
            return;
        }

        Point2 normal = new(_w2Cos / amplitude, _w2Sin / amplitude);
        double distance = (across - _w2) / amplitude;
        double half = skin.HalfWidthAlong(normal);
        double share = distance / half;
        if (Math.Abs(share) > 1 + (Outline.Graze / (amplitude * half)))
        {
            return;
        }

        if (skin is RoundOutline circle)
        {
            AddLinesAcross((across - _w2) / (circle.Radius * amplitude), clocks);
            return;
        }

        // Tubes as wide as their mate graze it once: two roots a rounding error apart are one.
        if (Math.Acos(Math.Clamp(Math.Abs(share), 0, 1)) < SingleGraze)
        {
            Point2 place = skin.FarthestAlong(share < 0 ? -1 * normal : normal);
            clocks.Add(Math.Atan2(place.Y, place.X));
            return;
        }

        Point2 point = distance * normal;
        Point2 along = new(-normal.Y, normal.X);
        if (skin.Cross(point, along, out double enter, out double leave))
        {
            clocks.Add(Math.Atan2(point.Y + (leave * along.Y), point.X + (leave * along.X)));
            clocks.Add(Math.Atan2(point.Y + (enter * along.Y), point.X + (enter * along.X)));
        }
    }

    // A circle's, by the cosine of the angle from where the lines' distance grows fastest.
    private void AddLinesAcross(double cosine, List<double> clocks)
    {
        double phase = Math.Atan2(_w2Sin, _w2Cos);
        double half = Math.Acos(Math.Clamp(cosine, -1, 1));
        bool single = half < SingleGraze || half > Math.PI - SingleGraze;
        half = single ? Math.Round(half / Math.PI) * Math.PI : half;
        clocks.Add(Math.IEEERemainder(phase + half, 2 * Math.PI));
        if (!single)
        {
            clocks.Add(Math.IEEERemainder(phase - half, 2 * Math.PI));
        }
    }

    // By how much a point of the mate's section, given across and along, lies outside of it on its ray.
    private double DistanceOutside(double across, double along)
    {
        Point2 point = (across * _across) + (along * _along);
        double distance = point.DistanceTo(default);
        return distance - _outline.RadiusAt(point.Y / distance, point.X / distance);
    }

    private static Vector3 AnyNormal(Vector3 direction) =>
        direction.Cross(Math.Abs(direction.X) < 0.6 ? Vector3.UnitX : Vector3.UnitY).Normalized();
}

/// <summary>The end of a tube that is cut: its axis point, the direction into the tube, and the tube's axes for clock angles.</summary>
/// <param name="Point">End of the axis, mm, global.</param>
/// <param name="Into">Unit direction into the tube.</param>
/// <param name="Axes">The tube's local axes.</param>
internal readonly record struct EndFrame(Vector3 Point, Vector3 Into, TubeAxes Axes)
{
    /// <summary>The tube's axis, from its end into it.</summary>
    public Line3 Axis => new(Point, Into);
}

/// <summary>A tube as others are cut to it.</summary>
/// <param name="Tube">Its index.</param>
/// <param name="Axis">Its axis; at an end of it the direction points into it.</param>
/// <param name="Axes">Its local axes.</param>
/// <param name="Outline">Its outer skin.</param>
/// <param name="Limit">Where it ends; null where it runs through the node.</param>
internal sealed record MateSource(int Tube, Line3 Axis, TubeAxes Axes, Outline Outline, HalfSpace? Limit);
