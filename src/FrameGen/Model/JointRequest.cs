using FrameGen.Diagnostics;

namespace FrameGen.Model;

/// <summary>What a spec asks of a joint.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Miter">Two tubes to be mitred, which then stand first; null for none.</param>
/// <param name="Order">Tubes in the order written, the mitred ones not included; may leave tubes out.</param>
/// <param name="At">Where it is written.</param>
public sealed record JointRequest(int Node, (int A, int B)? Miter, IReadOnlyList<int> Order, SourcePlace At);
