using FrameGen.Geometry;

namespace FrameGen.Mechanics.Frames;

/// <summary>The topology of a frame for analysis: joints and the beams between them. Sizes come with each design.</summary>
/// <param name="Nodes">Positions, mm.</param>
/// <param name="Elements">Beams between nodes.</param>
public sealed record BeamFrame(IReadOnlyList<Vector3> Nodes, IReadOnlyList<BeamElement> Elements);

/// <summary>One straight two-node beam.</summary>
/// <param name="Start">Index of the node at x = 0.</param>
/// <param name="End">Index of the node at x = L.</param>
/// <param name="StartOffset">From the start node to the axis' own end, mm, global: a rigid link where not zero.</param>
/// <param name="EndOffset">From the end node to the axis' own end, mm, global.</param>
/// <param name="Axes">Local axes.</param>
/// <param name="Profile">Which of a design's profiles the beam has.</param>
public sealed record BeamElement(int Start, int End, Vector3 StartOffset, Vector3 EndOffset, TubeAxes Axes, int Profile);

/// <summary>The stiffness-giving properties of one profile in one design; mm, N, MPa.</summary>
/// <param name="E">Young's modulus, MPa.</param>
/// <param name="G">Shear modulus, MPa.</param>
/// <param name="Area">mm².</param>
/// <param name="Iy">About local y, mm⁴.</param>
/// <param name="Iz">About local z, mm⁴.</param>
/// <param name="J">Torsion constant, mm⁴.</param>
/// <param name="ShearAreaY">For shear along local y, mm²; positive infinity for no shear deformation.</param>
/// <param name="ShearAreaZ">For shear along local z, mm²; positive infinity for no shear deformation.</param>
public readonly record struct BeamProfile(
    double E, double G, double Area, double Iy, double Iz, double J, double ShearAreaY, double ShearAreaZ);

/// <summary>Which of a node's six freedoms are held: x, y, z, rotations about x, y, z.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Held">Six flags, in the order ux, uy, uz, rx, ry, rz.</param>
public sealed record Restraint(int Node, IReadOnlyList<bool> Held);

/// <summary>A force and a moment on a node, global axes.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Force">N.</param>
/// <param name="Moment">N·mm.</param>
public readonly record struct NodalLoad(int Node, Vector3 Force, Vector3 Moment);

/// <summary>An even load along a whole element, global axes.</summary>
/// <param name="Element">Index of the element.</param>
/// <param name="PerLength">N per mm of axis.</param>
public readonly record struct ElementLoad(int Element, Vector3 PerLength);

/// <summary>One set of loads that act together.</summary>
/// <param name="NodalLoads">On nodes.</param>
/// <param name="ElementLoads">Along elements; several on one element add up.</param>
public sealed record BeamLoads(IReadOnlyList<NodalLoad> NodalLoads, IReadOnlyList<ElementLoad> ElementLoads);
