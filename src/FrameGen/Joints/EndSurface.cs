using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>The exact cut of an end: where each wall line stops.</summary>
public abstract class EndSurface
{
    /// <summary>t of the wall line at a clock angle and a distance from the axis, mm from the end's point into the tube.</summary>
    /// <param name="clock">rad.</param>
    /// <param name="radius">mm, from the inner to the outer skin.</param>
    public abstract double At(double clock, double radius);

    /// <summary>t of a wall line of a skin, mm from the end's point into the tube.</summary>
    /// <param name="clock">rad.</param>
    /// <param name="skin">The outer skin, the bore, or one between them.</param>
    public double At(double clock, Outline skin)
    {
        (double sin, double cos) = Math.SinCos(clock);
        return At(clock, skin.RadiusAt(sin, cos));
    }
}
