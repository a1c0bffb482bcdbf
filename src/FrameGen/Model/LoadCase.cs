using FrameGen.Diagnostics;
using FrameGen.Geometry;

namespace FrameGen.Model;

/// <summary>A node that is held or stands on springs.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Held">Six flags: x, y, z, rx, ry, rz.</param>
/// <param name="At">Where it is written.</param>
public sealed record Support(int Node, IReadOnlyList<bool> Held, SourcePlace At)
{
    /// <summary>Rates of the springs it stands on, in the same order, N/mm and N·mm/rad; 0 for none.</summary>
    public IReadOnlyList<double> Springs { get; init; } = new double[6];

    /// <summary>Whether something works against a freedom, 0 to 5.</summary>
    public bool Resists(int freedom) => Held[freedom] || Springs[freedom] > 0;

    /// <summary>Whether something works against turning.</summary>
    public bool ResistsTurning => Resists(3) || Resists(4) || Resists(5);
}

/// <summary>A mass on a node, or spread evenly along a tube's axis; one of the two is given.</summary>
public sealed record CarriedMass(int? Node, int? Tube, double Kg);

/// <summary>A load case, flat: its own loads and those of all it adds, times their factors.</summary>
/// <param name="Name">Unique.</param>
/// <param name="SelfWeight">Multiples of g, of all it adds too.</param>
/// <param name="NodeLoads">Forces N and moments N·mm on nodes.</param>
/// <param name="LineLoads">N/mm along whole tubes.</param>
/// <param name="PointLoads">Forces and moments at places on tubes.</param>
/// <param name="Supports">Indices into <see cref="FrameModel.Supports"/> of those that act.</param>
/// <param name="At">Where it is written.</param>
public sealed record LoadCase(
    string Name,
    Vector3 SelfWeight,
    IReadOnlyList<NodeLoad> NodeLoads,
    IReadOnlyList<LineLoad> LineLoads,
    IReadOnlyList<PointLoad> PointLoads,
    IReadOnlyList<int> Supports,
    SourcePlace At);

/// <summary>A load on a node, global.</summary>
public readonly record struct NodeLoad(int Node, Vector3 Force, Vector3 Moment);

/// <summary>An even load along a tube's axis, N/mm, global.</summary>
public readonly record struct LineLoad(int Tube, Vector3 PerLength);

/// <summary>A load at a distance from a tube's start, mm, global.</summary>
public readonly record struct PointLoad(int Tube, double Distance, Vector3 Force, Vector3 Moment);
