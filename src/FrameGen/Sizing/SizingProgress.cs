namespace FrameGen.Sizing;

/// <summary>Progress of a long search.</summary>
/// <param name="Done">Designs looked at.</param>
/// <param name="Total">Designs in all.</param>
public readonly record struct SizingProgress(long Done, long Total);
