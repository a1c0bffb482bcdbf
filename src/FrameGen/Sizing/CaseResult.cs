using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;

namespace FrameGen.Sizing;

/// <summary>What one load case does.</summary>
/// <param name="Case">Index of the case.</param>
/// <param name="Displacements">By node, mm; null for a node that no tube meets.</param>
/// <param name="Rotations">By node, rad; null likewise.</param>
/// <param name="Reactions">By entry of <see cref="FrameGen.Model.LoadCase.Supports"/>: on the frame, N and N·mm.</param>
/// <param name="Tubes">By tube.</param>
/// <param name="EquilibriumError">Loads against reactions, relative.</param>
/// <param name="BackwardError">Of the solve.</param>
public sealed record CaseResult(
    int Case,
    IReadOnlyList<Vector3?> Displacements,
    IReadOnlyList<Vector3?> Rotations,
    IReadOnlyList<(Vector3 Force, Vector3 Moment)> Reactions,
    IReadOnlyList<TubeForces> Tubes,
    double EquilibriumError,
    double BackwardError)
{
    /// <summary>Times the case, the frame buckles: linear, perfect members; null when nothing is compressed.</summary>
    public double? BucklingFactor { get; init; }

    /// <summary>Where it then moves most: <c>node top</c>, <c>tube strut</c>; empty when nothing is compressed.</summary>
    public string BucklesAt { get; init; } = "";

    /// <summary>By tube: how its axis moves, place by place from its start; empty where that was not asked for.</summary>
    public IReadOnlyList<IReadOnlyList<AxisPlace>> Axes { get; init; } = [];

    /// <summary>The tube nearest its yield, the first of equals; by the highest stress where the yield of some tube is not known.</summary>
    public int MostUsedTube()
    {
        bool known = Tubes.All(t => t.Use is not null);
        int most = 0;
        for (int tube = 1; tube < Tubes.Count; tube++)
        {
            // Twins are used alike but for rounding: the first of them is named.
            (double before, double here) = known
                ? (Tubes[most].Use!.Value.Share, Tubes[tube].Use!.Value.Share)
                : (Tubes[most].MaxStress, Tubes[tube].MaxStress);
            most = here > before * (1 + 1e-9) ? tube : most;
        }

        return most;
    }

    /// <summary>The node that moves most, the first of equals, and its displacement, mm.</summary>
    public (int Node, Vector3 Displacement) LargestDisplacement()
    {
        (int Node, Vector3 Displacement) largest = (0, Vector3.Zero);
        for (int node = 0; node < Displacements.Count; node++)
        {
            if (Displacements[node] is { } moved && moved.Length > largest.Displacement.Length)
            {
                largest = (node, moved);
            }
        }

        return largest;
    }
}

/// <summary>How a place on a tube's axis moves in a case.</summary>
/// <param name="Distance">From the tube's start, mm.</param>
/// <param name="Motion">Displacement and rotation there, global axes.</param>
public readonly record struct AxisPlace(double Distance, AxisMotion Motion);

/// <summary>What one load case does to one tube.</summary>
/// <param name="MaxStress">Highest von Mises stress, MPa.</param>
/// <param name="MaxStressAt">Distance of its place from the tube's start, mm.</param>
/// <param name="AxialFrom">Axial force at the from end, N, tension positive.</param>
/// <param name="AxialTo">Axial force at the to end, N.</param>
/// <param name="MinAxial">Lowest axial force along the tube, N: the greatest compression when negative.</param>
public sealed record TubeForces(double MaxStress, double MaxStressAt, double AxialFrom, double AxialTo, double MinAxial)
{
    /// <summary>Its internal forces from end to end.</summary>
    public required TubeDiagram Diagram { get; init; }

    /// <summary>Where the tube is nearest its yield; null where its material's yield is not known.</summary>
    public TubeUse? Use { get; init; }
}

/// <summary>The place of a tube that is nearest its yield in a case: not always that of the highest stress, since a weld softens some metals.</summary>
/// <param name="Share">Von Mises stress over yield.</param>
/// <param name="At">Distance from the tube's start, mm.</param>
/// <param name="Stress">Von Mises stress there, MPa.</param>
/// <param name="Yield">Yield there, MPa.</param>
/// <param name="NearWeld">True within reach of a weld, where the welded yield holds.</param>
public readonly record struct TubeUse(double Share, double At, double Stress, double Yield, bool NearWeld)
{
    /// <summary>What the stress comes from.</summary>
    public StressShares Shares { get; init; }
}
