using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Formats.Pdf;

/// <summary>A page of a PDF file.</summary>
/// <param name="Width">mm.</param>
/// <param name="Height">mm.</param>
/// <param name="Views">Drawings on it, in drawing order.</param>
public sealed record PdfPage(double Width, double Height, IReadOnlyList<PdfView> Views);

/// <summary>A drawing at full size on a page.</summary>
/// <param name="Drawing">What is drawn.</param>
/// <param name="Origin">Where the drawing's origin stands, mm from the page's lower left corner.</param>
/// <param name="Window">The part of the page it may cover, mm from the same corner; null for all of it.</param>
public sealed record PdfView(Drawing Drawing, Point2 Origin, Box2? Window);
