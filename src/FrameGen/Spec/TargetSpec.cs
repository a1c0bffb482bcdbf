using FrameGen.Diagnostics;

namespace FrameGen.Spec;

/// <summary>A target as written.</summary>
public abstract record TargetSpec(SourcePlace At);

/// <summary>Displacement of a node, or of one relative to another.</summary>
/// <param name="Case">Load case.</param>
/// <param name="Node">The node; null when from and to are given.</param>
/// <param name="From">Relative displacement: to less from.</param>
/// <param name="To">See <paramref name="From"/>.</param>
/// <param name="Along">Direction; null for any.</param>
/// <param name="Max">Limit, a length.</param>
/// <param name="At">Where.</param>
public sealed record DisplacementTargetSpec(
    Placed<string> Case, Placed<string>? Node, Placed<string>? From, Placed<string>? To, SpecVector? Along, SpecQuantity Max, SourcePlace At)
    : TargetSpec(At);

/// <summary>Rotation of a node, or of one relative to another.</summary>
public sealed record RotationTargetSpec(
    Placed<string> Case, Placed<string>? Node, Placed<string>? From, Placed<string>? To, SpecVector? About, SpecQuantity Max, SourcePlace At)
    : TargetSpec(At);

/// <summary>A unit push or couple, alone, over the movement it causes there.</summary>
/// <param name="Node">The node; null when from and to are given: equal and opposite pushes or couples.</param>
/// <param name="From">See <paramref name="Node"/>.</param>
/// <param name="To">See <paramref name="Node"/>.</param>
/// <param name="Along">Direction of the push; null for a couple.</param>
/// <param name="About">Axis of the couple; null for a push.</param>
/// <param name="Min">Limit: stiffness, or turning stiffness.</param>
/// <param name="Supports">Names of the nodes whose supports act; null for all.</param>
/// <param name="At">Where.</param>
public sealed record StiffnessTargetSpec(
    Placed<string>? Node,
    Placed<string>? From,
    Placed<string>? To,
    SpecVector? Along,
    SpecVector? About,
    SpecQuantity Min,
    IReadOnlyList<Placed<string>>? Supports,
    SourcePlace At) : TargetSpec(At);

/// <summary>Von Mises stress against yield.</summary>
public sealed record StrengthTargetSpec(
    IReadOnlyList<Placed<string>>? Cases, SpecQuantity SafetyFactor, IReadOnlyList<Placed<string>>? Groups, SourcePlace At) : TargetSpec(At);

/// <summary>The case times the factor does not buckle the frame.</summary>
public sealed record BucklingTargetSpec(IReadOnlyList<Placed<string>>? Cases, SpecQuantity MinFactor, SourcePlace At) : TargetSpec(At);

/// <summary>Length over radius of gyration; <paramref name="Wall"/> where the wall has its limit too.</summary>
public sealed record SlendernessTargetSpec(SpecQuantity Max, bool Wall, SourcePlace At) : TargetSpec(At);

/// <summary>The lowest natural frequency.</summary>
public sealed record FrequencyTargetSpec(SpecQuantity Min, SourcePlace At) : TargetSpec(At);

/// <summary>How a single tube is thought to be held.</summary>
public enum SpanKind
{
    /// <summary>Held at one end, loaded at the other.</summary>
    Cantilever,

    /// <summary>On two supports, loaded in the middle.</summary>
    SimplySupported,

    /// <summary>Clamped at both ends, loaded in the middle.</summary>
    FixedFixed,
}

/// <summary>Which bending axis a member target looks at.</summary>
public enum BendingDirection
{
    /// <summary>The smaller second moment.</summary>
    Weaker,

    /// <summary>Deflection towards the top line.</summary>
    Top,

    /// <summary>Deflection across.</summary>
    Side,
}

/// <summary>A closed-form target on one tube or on each tube of a group.</summary>
/// <param name="Tube">The tube; null when a group is given.</param>
/// <param name="Group">The group; null when a tube is given.</param>
/// <param name="As">How it is held; null for stiffness floors.</param>
/// <param name="Load">Force; null for stiffness floors.</param>
/// <param name="MaxDeflection">Limit; null for stiffness floors.</param>
/// <param name="MinBendingStiffness">EI; null where not written.</param>
/// <param name="MinTorsionalStiffness">GJ; null where not written.</param>
/// <param name="Along">Bending direction.</param>
/// <param name="At">Where.</param>
public sealed record MemberTargetSpec(
    Placed<string>? Tube,
    Placed<string>? Group,
    SpanKind? As,
    SpecQuantity? Load,
    SpecQuantity? MaxDeflection,
    SpecQuantity? MinBendingStiffness,
    SpecQuantity? MinTorsionalStiffness,
    BendingDirection Along,
    SourcePlace At) : TargetSpec(At);
