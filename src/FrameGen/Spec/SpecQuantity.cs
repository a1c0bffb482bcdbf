using FrameGen.Diagnostics;
using FrameGen.Spec.Quantities;

namespace FrameGen.Spec;

/// <summary>What a value measures: two kinds are never mixed, even where their dimensions agree.</summary>
public enum QuantityKind
{
    /// <summary>No unit.</summary>
    Number,

    /// <summary>mm.</summary>
    Length,

    /// <summary>mm².</summary>
    Area,

    /// <summary>rad.</summary>
    Angle,

    /// <summary>kg.</summary>
    Mass,

    /// <summary>N.</summary>
    Force,

    /// <summary>MPa.</summary>
    Stress,

    /// <summary>N/mm along a tube.</summary>
    LineLoad,

    /// <summary>N·mm.</summary>
    Moment,

    /// <summary>N/mm of displacement.</summary>
    Stiffness,

    /// <summary>N·mm/rad.</summary>
    TurningStiffness,

    /// <summary>kg/mm³.</summary>
    Density,

    /// <summary>mm/s².</summary>
    Acceleration,

    /// <summary>Hz.</summary>
    Frequency,

    /// <summary>N·mm²: EI or GJ.</summary>
    BendingStiffness,

    /// <summary>A part of a whole: 0.4 for 40 %.</summary>
    Share,
}

/// <summary>A value as written: a literal or an expression, checked against its kind when it is evaluated.</summary>
/// <param name="Kind">What it must measure.</param>
/// <param name="Value">What was written.</param>
/// <param name="At">Where.</param>
public sealed record SpecQuantity(QuantityKind Kind, Expression Value, SourcePlace At)
{
    /// <summary>Values it may have; checked when it is read, for a literal, or when it is evaluated.</summary>
    internal ValueRange Range { get; init; } = ValueRange.Any;
}

/// <summary>Three components of one kind.</summary>
/// <param name="X">Along global x.</param>
/// <param name="Y">Along global y.</param>
/// <param name="Z">Along global z.</param>
/// <param name="At">Where it begins.</param>
public sealed record SpecVector(SpecQuantity X, SpecQuantity Y, SpecQuantity Z, SourcePlace At);

/// <summary>A word or other plain value with its place.</summary>
/// <typeparam name="T">Type of the value.</typeparam>
/// <param name="Value">The value.</param>
/// <param name="At">Where it stands.</param>
public sealed record Placed<T>(T Value, SourcePlace At);
