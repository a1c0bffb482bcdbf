using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>How a mate lies to an end.</summary>
internal static class Contacts
{
    private const double SquareCosine = 1e-9;
    private const double ClockRounding = 1e-12;

    /// <summary>The contact with a mate.</summary>
    /// <param name="frame">The end.</param>
    /// <param name="mate">Index of the mate.</param>
    /// <param name="axis">Its axis; at an end of the mate the direction points into it.</param>
    /// <param name="isThrough">True where it runs through.</param>
    public static Contact Of(in EndFrame frame, int mate, Line3 axis, bool isThrough)
    {
        double cosine = frame.Into.Dot(axis.Direction);
        Line3 own = new(frame.Point, frame.Into);
        double sine = frame.Into.Cross(axis.Direction).Length;
        double angle = Math.Atan2(sine, isThrough ? Math.Abs(cosine) : cosine);
        bool square = isThrough && Math.Abs(cosine) < SquareCosine;
        double? clock = null;
        if (sine >= Line3.ParallelSine)
        {
            Vector3 leaving = isThrough && cosine < 0 ? -axis.Direction : axis.Direction;
            double turn = square ? Math.PI : 2 * Math.PI;
            double raw = frame.Axes.ClockOf(leaving);
            double wrapped = raw - (turn * Math.Floor(raw / turn));

            // A hair below a whole turn is rounding: the builder reads 0.
            clock = wrapped > turn - ClockRounding ? 0 : wrapped;
        }

        return new Contact(mate, angle, own.DistanceTo(axis), clock, square);
    }
}
