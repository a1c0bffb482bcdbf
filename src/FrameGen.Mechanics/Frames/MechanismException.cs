using FrameGen.Geometry;

namespace FrameGen.Mechanics.Frames;

/// <summary>The frame can move without strain: a support or a tube is missing.</summary>
public sealed class MechanismException : Exception
{
    /// <summary>Says how the frame can move.</summary>
    /// <param name="motions">Independent motions, at least one.</param>
    public MechanismException(IReadOnlyList<Mechanism> motions)
        : base("The frame can move without strain.") => Motions = motions;

    /// <summary>Independent motions without strain.</summary>
    public IReadOnlyList<Mechanism> Motions { get; }
}

/// <summary>One motion without strain.</summary>
/// <param name="Nodes">Nodes that move.</param>
/// <param name="Slides">Unit direction, when the nodes all slide the same way; else null.</param>
/// <param name="TurnsAbout">Unit direction of the axis, when they turn as one body; else null.</param>
/// <param name="Centre">A point on that axis, mm; null when it does not turn as one body.</param>
public sealed record Mechanism(IReadOnlyList<int> Nodes, Vector3? Slides, Vector3? TurnsAbout, Vector3? Centre);
