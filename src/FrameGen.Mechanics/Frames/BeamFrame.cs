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
public sealed record BeamElement(int Start, int End, Vector3 StartOffset, Vector3 EndOffset, TubeAxes Axes, int Profile)
{
    /// <summary>Moments that its ends do not carry.</summary>
    public Hinges Hinges { get; init; }
}

/// <summary>Moments that an element's ends do not carry, about its local axes, at the ends of its axis.</summary>
[Flags]
public enum Hinges
{
    /// <summary>Both ends are rigid.</summary>
    None = 0,

    /// <summary>No torque at the start.</summary>
    StartX = 1,

    /// <summary>No moment about y at the start.</summary>
    StartY = 2,

    /// <summary>No moment about z at the start.</summary>
    StartZ = 4,

    /// <summary>No torque at the end.</summary>
    EndX = 8,

    /// <summary>No moment about y at the end.</summary>
    EndY = 16,

    /// <summary>No moment about z at the end.</summary>
    EndZ = 32,

    /// <summary>All of the start.</summary>
    Start = StartX | StartY | StartZ,

    /// <summary>All of the end.</summary>
    End = EndX | EndY | EndZ,
}

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

/// <summary>Which of a node's six freedoms are held: x, y, z, rotations about x, y, z; and what springs it stands on.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Held">Six flags, in the order ux, uy, uz, rx, ry, rz.</param>
public sealed record Restraint(int Node, IReadOnlyList<bool> Held)
{
    /// <summary>Six rates of springs to the ground, N/mm and N·mm/rad, global axes, 0 for none; null for none at all. One on a held
    /// freedom does nothing.</summary>
    public IReadOnlyList<double>? Springs { get; init; }
}

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
