namespace FrameGen.Joints;

/// <summary>The exact cut of an end: where each wall line stops.</summary>
public abstract class EndSurface
{
    /// <summary>t of the wall line at a clock angle and a distance from the axis, mm from the end's point into the tube.</summary>
    /// <param name="clock">rad.</param>
    /// <param name="radius">mm, from the inner to the outer skin.</param>
    public abstract double At(double clock, double radius);
}
