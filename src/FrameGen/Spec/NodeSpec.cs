namespace FrameGen.Spec;

/// <summary>A node as written.</summary>
public sealed record NodeSpec(Placed<string> Name, NodePositionSpec Position);

/// <summary>Where a node is.</summary>
public abstract record NodePositionSpec;

/// <summary>At coordinates.</summary>
public sealed record PointPositionSpec(SpecVector Point) : NodePositionSpec;

/// <summary>On a tube, at a share of its axis or a distance from its <c>from</c> end; one of the two is given.</summary>
public sealed record OnTubePositionSpec(Placed<string> Tube, SpecQuantity? Share, SpecQuantity? Distance) : NodePositionSpec;

/// <summary>Between two nodes, at a share of the way.</summary>
public sealed record BetweenPositionSpec(Placed<string> A, Placed<string> B, SpecQuantity Share) : NodePositionSpec;

/// <summary>At an offset from another node.</summary>
public sealed record OffsetPositionSpec(Placed<string> From, SpecVector Offset) : NodePositionSpec;
