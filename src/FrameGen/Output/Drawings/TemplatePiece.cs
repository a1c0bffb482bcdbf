using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>
/// The paper that is wrapped round one cut end to mark it. Bands from the end inwards: waste, cut line, KEEP with the clock angles and
/// arrows, datum line, label, base edge.
/// </summary>
/// <param name="End">Which end it is for.</param>
/// <param name="Drawing">At full size, where it stands in the part's template drawing.</param>
/// <param name="Bounds">Box round it, tab included.</param>
/// <param name="Scale">x on the paper by x of the developed pattern: the perimeter of the mid-paper surface by that of the tube.</param>
/// <param name="Shift">From the pattern (x scaled) to the drawing, whole mm.</param>
internal sealed record TemplatePiece(End End, Drawing Drawing, Box2 Bounds, double Scale, Point2 Shift);
