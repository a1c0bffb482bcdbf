using FrameGen.Diagnostics;

namespace FrameGen.Spec;

/// <summary>A held node.</summary>
/// <param name="Node">Its name.</param>
/// <param name="Held">Six flags: x, y, z, rx, ry, rz.</param>
/// <param name="Mirror">False where it has no twin.</param>
public sealed record SupportSpec(Placed<string> Node, IReadOnlyList<bool> Held, bool Mirror)
{
    /// <summary>Rates of the springs it stands on, in the same order; null where there is none.</summary>
    public IReadOnlyList<SpecQuantity?> Springs { get; init; } = new SpecQuantity?[6];
}

/// <summary>A carried mass: on a node, or spread along a tube; one of the two is given.</summary>
public sealed record MassSpec(Placed<string>? Node, Placed<string>? Tube, SpecQuantity Mass, bool Mirror, SourcePlace At);

/// <summary>A load case as written.</summary>
/// <param name="Name">Unique.</param>
/// <param name="SelfWeight">Multiples of g; null for none.</param>
/// <param name="Loads">Loads.</param>
/// <param name="Add">Other cases with a factor each.</param>
/// <param name="Supports">Names of the nodes whose supports act; null for all.</param>
/// <param name="Mirror">False where its loads have no twins.</param>
public sealed record CaseSpec(
    Placed<string> Name,
    SpecVector? SelfWeight,
    IReadOnlyList<LoadSpec> Loads,
    IReadOnlyList<(Placed<string> Case, SpecQuantity Factor)> Add,
    IReadOnlyList<Placed<string>>? Supports,
    bool Mirror);

/// <summary>A load as written.</summary>
public abstract record LoadSpec(bool Mirror, SourcePlace At);

/// <summary>On a node.</summary>
public sealed record NodeLoadSpec(Placed<string> Node, SpecVector? Force, SpecVector? Moment, bool Mirror, SourcePlace At)
    : LoadSpec(Mirror, At);

/// <summary>Along a whole tube.</summary>
public sealed record LineLoadSpec(Placed<string> Tube, SpecVector PerLength, bool Mirror, SourcePlace At) : LoadSpec(Mirror, At);

/// <summary>At a place on a tube: a share or a distance, one of the two.</summary>
public sealed record PointLoadSpec(
    Placed<string> Tube,
    SpecQuantity? Share,
    SpecQuantity? Distance,
    SpecVector? Force,
    SpecVector? Moment,
    bool Mirror,
    SourcePlace At) : LoadSpec(Mirror, At);
