using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>Shop preferences.</summary>
/// <param name="Cut">How cut ends are made.</param>
/// <param name="Paper">Thickness of a wrapped template, mm.</param>
/// <param name="Tolerance">Of curves, mm.</param>
/// <param name="Kerf">mm.</param>
/// <param name="BarTrim">Cut off both ends of a bar, mm.</param>
/// <param name="Page">Paper size.</param>
public sealed record Fabrication(CutMode Cut, double Paper, double Tolerance, double Kerf, double BarTrim, PageSize Page);
