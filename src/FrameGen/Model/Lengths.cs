namespace FrameGen.Model;

/// <summary>When two lengths are one.</summary>
internal static class Lengths
{
    /// <summary>
    /// Sizes and places closer than this are the same, mm: far above rounding (1.5 in and 38.1 mm differ in the last bit), far
    /// below anything a shop can measure.
    /// </summary>
    public const double Same = 1e-6;
}
