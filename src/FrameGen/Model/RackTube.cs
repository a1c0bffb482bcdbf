using FrameGen.Diagnostics;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Model;

/// <summary>Tubes on the shop's rack, which the stock plan cuts first.</summary>
/// <param name="Section">Their section.</param>
/// <param name="Material">Name of their material.</param>
/// <param name="Lengths">One a tube, mm, in the order written.</param>
/// <param name="At">Where they are written.</param>
public sealed record RackTube(Section Section, string Material, IReadOnlyList<double> Lengths, SourcePlace At);
