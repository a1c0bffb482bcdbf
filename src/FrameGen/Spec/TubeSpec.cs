using FrameGen.Diagnostics;
using FrameGen.Mechanics.Frames;

namespace FrameGen.Spec;

/// <summary>A tube as written.</summary>
/// <param name="Name">Unique.</param>
/// <param name="From">Where its axis begins.</param>
/// <param name="To">Where its axis ends.</param>
/// <param name="Group">The group whose section it has.</param>
/// <param name="Up">Direction of the top line; null for the default.</param>
public sealed record TubeSpec(Placed<string> Name, TubeEndSpec From, TubeEndSpec To, Placed<string> Group, SpecVector? Up)
{
    /// <summary>Moments that its ends do not carry.</summary>
    public Hinges Hinges { get; init; }

    /// <summary>Where it bends; null for a straight tube.</summary>
    public BendSpec? Bend { get; init; }
}

/// <summary>Where a tube bends, as written.</summary>
/// <param name="Via">Nodes at the corners, in their order along the tube.</param>
/// <param name="Radius">Of the axis in each bend.</param>
public sealed record BendSpec(IReadOnlyList<Placed<string>> Via, SpecQuantity Radius);

/// <summary>One end of a tube as written.</summary>
/// <param name="Node">The node it belongs to.</param>
/// <param name="Offset">From the node to the axis' end; null for none.</param>
/// <param name="Cut">What the spec asks of the cut.</param>
public sealed record TubeEndSpec(Placed<string> Node, SpecVector? Offset, EndCutSpec Cut);

/// <summary>How an end is asked to be cut.</summary>
public enum RequestedCut
{
    /// <summary>Not said: coped to what stands before it, else square or mitred.</summary>
    Default,

    /// <summary>Coped.</summary>
    Cope,

    /// <summary>Square to the axis.</summary>
    Square,

    /// <summary>On a plane through the end's point.</summary>
    Plane,
}

/// <summary>What a spec asks of one end.</summary>
/// <param name="Cut">Kind of cut.</param>
/// <param name="Extend">Past the node; null where not written.</param>
/// <param name="Gap">Between this end and its mates; null for the general one.</param>
/// <param name="Wrap">True where it may be wider than its seat.</param>
/// <param name="At">Where it is written; the tube's place where nothing is.</param>
public sealed record EndCutSpec(RequestedCut Cut, SpecQuantity? Extend, SpecQuantity? Gap, bool Wrap, SourcePlace At)
{
    /// <summary>Normal of the plane of a plane cut; null for other cuts.</summary>
    public SpecVector? Plane { get; init; }

    /// <summary>Diameter of a breathing hole near this end; null for none.</summary>
    public SpecQuantity? Vent { get; init; }
}
