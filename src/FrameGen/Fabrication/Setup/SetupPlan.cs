using FrameGen.Model;

namespace FrameGen.Fabrication.Setup;

/// <summary>What it takes to set the frame up in a jig. Coordinates are the spec's own: its origin is the datum, and the table is square to z.</summary>
/// <param name="TableZ">z of the lowest skin at any node, mm: the table that the frame stands on.</param>
/// <param name="Nodes">By node.</param>
/// <param name="Tubes">By tube.</param>
/// <param name="Measures">What to measure for squareness, and what it must read.</param>
/// <param name="Joints">Joints of two tubes and more, by node.</param>
public sealed record SetupPlan(
    double TableZ, IReadOnlyList<JigNode> Nodes, IReadOnlyList<JigTube> Tubes, IReadOnlyList<SquaringMeasure> Measures, IReadOnlyList<JointSetup> Joints);

/// <summary>A node in the jig.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Height">Of its centre above the table, mm.</param>
/// <param name="Block">Height of a flat block under the tube that stands first there, mm; null where that tube is not level or there is none.</param>
public sealed record JigNode(int Node, double Height, double? Block);

/// <summary>A tube in the jig.</summary>
/// <param name="Tube">Index of the tube.</param>
/// <param name="Length">Of its axis, mm.</param>
/// <param name="Rise">Angle to the table, rad, positive where it rises from <c>from</c> to <c>to</c>.</param>
/// <param name="Bearing">Angle of its plan from x towards y, rad in [0, 2π); null for an upright tube.</param>
public sealed record JigTube(int Tube, double Length, double Rise, double? Bearing);

/// <summary>Why two nodes are measured.</summary>
public enum SquaringKind
{
    /// <summary>One of the two diagonals of a flat four-sided bay.</summary>
    Diagonal,

    /// <summary>A node and its mirrored twin.</summary>
    Twins,

    /// <summary>A node that no other measure holds, and one far from it.</summary>
    Across,
}

/// <summary>A distance between two nodes, centre to centre.</summary>
/// <param name="Kind">Why it is measured.</param>
/// <param name="A">Index of a node.</param>
/// <param name="B">Index of the other.</param>
/// <param name="Distance">What it must read, mm.</param>
/// <param name="Bay">Corners of the bay in their order round it; empty but for diagonals. Two measures that follow each other share one.</param>
public sealed record SquaringMeasure(SquaringKind Kind, int A, int B, double Distance, IReadOnlyList<int> Bay);

/// <summary>A joint in the order of fitting.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Steps">One a tube.</param>
public sealed record JointSetup(int Node, IReadOnlyList<JointStep> Steps);

/// <summary>A tube as it comes to a joint.</summary>
/// <param name="Tube">Index of the tube.</param>
/// <param name="End">Which end; null where it runs through.</param>
/// <param name="Angles">To each tube that stands there already, in their order: between the axes as they leave the node, rad, 0 to π; to or of a tube that runs through 0 to π/2.</param>
public sealed record JointStep(int Tube, End? End, IReadOnlyList<double> Angles);
