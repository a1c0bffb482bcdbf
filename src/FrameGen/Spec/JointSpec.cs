using FrameGen.Diagnostics;

namespace FrameGen.Spec;

/// <summary>The order in which tubes of a node are fitted, and which two are mitred.</summary>
public sealed record JointSpec(
    Placed<string> Node, IReadOnlyList<Placed<string>>? Miter, IReadOnlyList<Placed<string>>? Order, bool Mirror, SourcePlace At);
