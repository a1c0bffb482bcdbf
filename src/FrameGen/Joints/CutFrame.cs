using FrameGen.Geometry;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Joints;

/// <summary>A frame with every tube end cut.</summary>
/// <param name="Sized">The frame and its sections.</param>
/// <param name="Tubes">By tube.</param>
public sealed record CutFrame(SizedFrame Sized, IReadOnlyList<CutTube> Tubes);

/// <summary>A tube with both ends cut.</summary>
/// <param name="Tube">Index of the tube.</param>
/// <param name="From">The cut at the from end.</param>
/// <param name="To">The cut at the to end.</param>
/// <param name="Start">Least y of the part, mm from the from point along the axis; negative beyond it.</param>
/// <param name="Stop">Greatest y of the part, mm.</param>
/// <param name="Volume">Of metal, mm³, relative error below 1e-6.</param>
/// <param name="MassKg">Density × volume.</param>
/// <param name="Centroid">Centre of mass, mm, global.</param>
/// <param name="OuterArea">Of the outer surface, mm².</param>
public sealed record CutTube(
    int Tube, EndCut From, EndCut To, double Start, double Stop, double Volume, double MassKg, Vector3 Centroid, double OuterArea)
{
    /// <summary>Long point to long point, mm: the shortest straight piece the part can be cut from.</summary>
    public double CutLength => Stop - Start;

    /// <summary>The end asked for.</summary>
    public EndCut this[End end] => end == End.From ? From : To;
}

/// <summary>How an end is cut.</summary>
public enum CutKind
{
    /// <summary>To fit the tubes before it.</summary>
    Cope,

    /// <summary>On the plane that halves the angle between two tubes.</summary>
    Miter,

    /// <summary>Square to the axis.</summary>
    Square,

    /// <summary>On a plane that the spec gives.</summary>
    Plane,
}

/// <summary>One cut end. Distances t run from the end's point into the tube, mm; clock angles are the tube's own.</summary>
/// <param name="Kind">How it is cut.</param>
/// <param name="Contacts">The tubes that cut it, in the joint's order; the first is the seat. Empty at a square or plane end.</param>
/// <param name="Gap">Left between it and its mates, mm; 0 where it is not coped.</param>
/// <param name="Surface">Exact place of every wall line's cut.</param>
/// <param name="Outer">The cut on the outer skin, within the tolerance, with every corner.</param>
/// <param name="Inner">The cut on the inner skin; at a rod's axis one constant line.</param>
/// <param name="OuterLength">True length of the outer curve, mm.</param>
public sealed record EndCut(
    CutKind Kind,
    IReadOnlyList<Contact> Contacts,
    double Gap,
    EndSurface Surface,
    EndCurve Outer,
    EndCurve Inner,
    double OuterLength)
{
    /// <summary>A breathing hole near it; null for none. Volume and mass leave it out.</summary>
    public Vent? Vent { get; init; }
}

/// <summary>A tube that cuts an end.</summary>
/// <param name="Tube">Index of the mate.</param>
/// <param name="Angle">Between the axes, rad, each pointing away from the node, 0 to π; 0 to π/2 for a through mate.</param>
/// <param name="Offset">Distance between the axes, mm.</param>
/// <param name="Clock">Where the mate's axis leaves, rad in [0, 2π) ([0, π) at a square crossing); null where the axes are parallel.</param>
/// <param name="SquareCrossing">True for a through mate at 90 degrees, which leaves on two sides.</param>
public sealed record Contact(int Tube, double Angle, double Offset, double? Clock, bool SquareCrossing);

/// <summary>A cut line on a skin, from clock −π to π.</summary>
/// <param name="Points">By clock; two of equal clock where the line steps. The first is at −π, the last at π, at the same t.</param>
public sealed record EndCurve(IReadOnlyList<CurvePoint> Points)
{
    /// <summary>Least t, mm.</summary>
    public double Min { get; } = Points.Min(p => p.T);

    /// <summary>Greatest t, mm.</summary>
    public double Max { get; } = Points.Max(p => p.T);
}

/// <summary>A vertex of a cut line.</summary>
/// <param name="Clock">rad.</param>
/// <param name="T">mm from the end's point into the tube.</param>
public readonly record struct CurvePoint(double Clock, double T);
