using FrameGen.Diagnostics;
using FrameGen.Geometry;

namespace FrameGen.Model;

/// <summary>A node.</summary>
/// <param name="Name">Unique without regard to case.</param>
/// <param name="Position">mm, global.</param>
/// <param name="Through">The tube it lies on, which runs through it; null for none.</param>
/// <param name="ThroughDistance">Distance from that tube's start along its axis, mm.</param>
/// <param name="At">Where it is written.</param>
public sealed record Node(string Name, Vector3 Position, int? Through, double ThroughDistance, SourcePlace At);
