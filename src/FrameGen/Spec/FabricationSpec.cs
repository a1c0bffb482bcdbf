using FrameGen.Diagnostics;

namespace FrameGen.Spec;

/// <summary>How cut ends are made.</summary>
public enum CutMode
{
    /// <summary>The cut face points at the axis: a saw, torch or grinder along a line round the skin.</summary>
    Radial,

    /// <summary>The cut face lies on the mate: a hole saw, mill or tilting laser.</summary>
    Contour,
}

/// <summary>Paper sizes.</summary>
public enum PageSize
{
    /// <summary>210 × 297 mm.</summary>
    A4,

    /// <summary>297 × 420 mm.</summary>
    A3,

    /// <summary>8.5 × 11 in.</summary>
    Letter,

    /// <summary>11 × 17 in.</summary>
    Tabloid,
}

/// <summary>Shop preferences as written; null where not.</summary>
public sealed record FabricationSpec(
    CutMode? Cut,
    SpecQuantity? Gap,
    SpecQuantity? Paper,
    SpecQuantity? Tolerance,
    SpecQuantity? Kerf,
    SpecQuantity? BarTrim,
    PageSize? Page,
    SpecQuantity? Grip,
    SpecQuantity? Springback,
    SourcePlace? At);
