using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>Which end of a tube.</summary>
public enum End
{
    /// <summary>At the <c>from</c> node.</summary>
    From,

    /// <summary>At the <c>to</c> node.</summary>
    To,
}

/// <summary>One end of one tube.</summary>
/// <param name="Tube">Index of the tube.</param>
/// <param name="End">Which end.</param>
public readonly record struct TubeEndId(int Tube, End End);

/// <summary>A tube, straight or bent.</summary>
/// <param name="Name">Unique without regard to case.</param>
/// <param name="From">End at x = 0.</param>
/// <param name="To">End at x = <see cref="Length"/>.</param>
/// <param name="Group">Index of its group.</param>
/// <param name="Axes">Local axes; of the first straight where it bends.</param>
/// <param name="NodesOn">Nodes that lie on it, by distance from its start.</param>
/// <param name="Original">Index of the tube it is the mirrored twin of; null for an original.</param>
/// <param name="At">Where it is written.</param>
public sealed record Tube(
    string Name,
    TubeEnd From,
    TubeEnd To,
    int Group,
    TubeAxes Axes,
    IReadOnlyList<int> NodesOn,
    int? Original,
    SourcePlace At)
{
    /// <summary>Its axis where it bends; null for a straight tube.</summary>
    public TubePath? Bent { get; init; }

    /// <summary>Moments that its ends do not carry, about local axes there.</summary>
    public Hinges Hinges { get; init; }

    /// <summary>Length of the axis between its own ends, round its bends, mm.</summary>
    public double Length => Bent?.Length ?? (To.Point - From.Point).Length;

    /// <summary>The point of the axis at a distance along it from its start, mm.</summary>
    public Vector3 PointAt(double distance) => Bent?.PointAt(distance) ?? From.Point + (distance * Axes.X);

    /// <summary>Local axes at a distance along its axis from its start: carried round the bends with the tube.</summary>
    public TubeAxes AxesAt(double distance) => Bent?.Carry(Axes, distance) ?? Axes;

    /// <summary>Local axes at an end.</summary>
    public TubeAxes AxesAt(End end) => end == End.From ? Axes : AxesAt(Length);

    /// <summary>The straight that a place lies on, or is nearest to: all of a straight tube.</summary>
    /// <param name="distance">From its start along its axis, mm.</param>
    public TubeStraight StraightAt(double distance)
    {
        if (Bent is null)
        {
            return new TubeStraight(new Line3(From.Point, Axes.X), Axes, 0, Length, false, false);
        }

        PathPiece piece = Bent.StraightAt(distance);
        TubeAxes axes = Bent.Carry(Axes, piece.Start);
        return new TubeStraight(
            new Line3(piece.Origin, piece.Along), axes, piece.Start, piece.Start + piece.Length, piece != Bent.Pieces[0], piece != Bent.Pieces[^1]);
    }

    /// <summary>The straight at an end.</summary>
    public TubeStraight StraightAt(End end) => StraightAt(end == End.From ? 0 : Length);

    /// <summary>How far into the tube a cut of an end may be looked for, mm: half its length, or all of the straight there where that is longer.</summary>
    public double Middle(End end) => Bent is null ? Length / 2 : Math.Max(Length / 2, StraightAt(end).To - StraightAt(end).From);

    /// <summary>The end asked for.</summary>
    public TubeEnd this[End end] => end == End.From ? From : To;

    /// <summary>Unit direction from an end into the tube.</summary>
    public Vector3 Into(End end) => end == End.From ? Axes.X : -(Bent?.Pieces[^1].Along ?? Axes.X);
}

/// <summary>One end of a tube.</summary>
/// <param name="Node">Index of its node.</param>
/// <param name="Point">End of the axis, mm: the node, or beside it where the axis passes at a distance.</param>
/// <param name="Cut">Kind of cut asked for.</param>
/// <param name="Extend">Past the end point, mm; null where not asked.</param>
/// <param name="Gap">Between a coped end and its mates, mm.</param>
/// <param name="Wrap">True where it may be wider than its seat.</param>
/// <param name="At">Where its cut is written.</param>
public sealed record TubeEnd(int Node, Vector3 Point, RequestedCut Cut, double? Extend, double Gap, bool Wrap, SourcePlace At)
{
    /// <summary>Unit normal of the plane of a plane cut, global, to either side of it; null for other cuts.</summary>
    public Vector3? Plane { get; init; }

    /// <summary>Diameter of a breathing hole near this end, mm; null for none.</summary>
    public double? Vent { get; init; }
}
