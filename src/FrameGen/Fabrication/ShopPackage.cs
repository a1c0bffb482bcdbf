using FrameGen.Geometry;
using FrameGen.Joints;

namespace FrameGen.Fabrication;

/// <summary>Everything the shop's papers say, before it is laid out.</summary>
/// <param name="Cut">The cut frame.</param>
/// <param name="Parts">Distinct parts, in the order of the cut list.</param>
/// <param name="Totals">Of the whole frame.</param>
/// <param name="Stock">Bars to buy and how each is cut.</param>
public sealed record ShopPackage(CutFrame Cut, IReadOnlyList<Part> Parts, Totals Totals, StockPlan Stock);

/// <summary>Sums over the frame.</summary>
/// <param name="MassKg">Of the cut tubes, without carried masses.</param>
/// <param name="CentreOfMass">Of the cut tubes, mm, global.</param>
/// <param name="WeldLength">Outer curves of coped and mitred ends, a miter once, mm.</param>
/// <param name="OuterArea">Outer surface of the cut tubes, mm².</param>
public sealed record Totals(double MassKg, Vector3 CentreOfMass, double WeldLength, double OuterArea);
