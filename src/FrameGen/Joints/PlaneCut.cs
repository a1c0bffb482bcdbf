using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>A plane end: square to the axis, or a miter. t = t₀ + ρ (c cos θ + s sin θ).</summary>
internal sealed class PlaneCut : CutSurface
{
    private PlaneCut(double onAxis, double slopeCos, double slopeSin) =>
        (OnAxis, SlopeCos, SlopeSin) = (onAxis, slopeCos, slopeSin);

    /// <summary>t on the axis, mm.</summary>
    public double OnAxis { get; }

    /// <summary>Rise of t towards clock 0.</summary>
    public double SlopeCos { get; }

    /// <summary>Rise of t towards clock 90 degrees.</summary>
    public double SlopeSin { get; }

    /// <inheritdoc/>
    public override bool IsRadial => false;

    /// <summary>Square to the axis.</summary>
    /// <param name="extension">Past the end's point, mm.</param>
    public static PlaneCut Square(double extension) => new(-extension, 0, 0);

    /// <summary>On the face of a half-space that holds the tube.</summary>
    public static PlaneCut On(HalfSpace limit, in EndFrame frame)
    {
        double slope = limit.Inward.Dot(frame.Into);
        return new PlaneCut(
            -limit.Depth(frame.Point) / slope,
            -limit.Inward.Dot(frame.Axes.Z) / slope,
            limit.Inward.Dot(frame.Axes.Y) / slope);
    }

    /// <inheritdoc/>
    public override double Cut(double sin, double cos, double radius, out int piece)
    {
        piece = 0;
        return OnAxis + (radius * ((SlopeCos * cos) + (SlopeSin * sin)));
    }
}
