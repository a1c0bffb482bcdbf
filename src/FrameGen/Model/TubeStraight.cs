using FrameGen.Geometry;

namespace FrameGen.Model;

/// <summary>A straight of a tube, where joints are made: all of a straight tube, or what lies before, between or behind its bends.</summary>
/// <param name="Axis">Through it, from its own beginning along the tube.</param>
/// <param name="Axes">Local axes there.</param>
/// <param name="From">Where it begins: distance from the tube's start along its axis, mm.</param>
/// <param name="To">Where it ends, mm.</param>
/// <param name="BendsBefore">True where a bend comes before it.</param>
/// <param name="BendsBehind">True where a bend follows it.</param>
public sealed record TubeStraight(Line3 Axis, TubeAxes Axes, double From, double To, bool BendsBefore, bool BendsBehind)
{
    /// <summary>Distance of a point from the tube's start, measured along this straight as if it had no end, mm.</summary>
    public double Along(Vector3 point) => From + (point - Axis.Point).Dot(Axis.Direction);

    /// <summary>Where a point lies in the tube's section: X towards the top line, Y towards clock 90°, mm.</summary>
    public Point2 InSection(Vector3 point) => Axes.InSection(point - Axis.Point);

    /// <summary>By how much a place lies in one of the bends at its ends, mm; 0 or less where it does not.</summary>
    /// <param name="along">Distance from the tube's start, measured along this straight.</param>
    public double IntoBend(double along) => Math.Max(
        BendsBefore ? From - along : double.NegativeInfinity, BendsBehind ? along - To : double.NegativeInfinity);
}
