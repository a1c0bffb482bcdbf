using FrameGen.Geometry;
using FrameGen.Joints;

namespace FrameGen.Fabrication;

/// <summary>Everything the shop's papers say, before it is laid out.</summary>
/// <param name="Cut">The cut frame.</param>
/// <param name="Parts">Distinct parts, in the order of the cut list.</param>
/// <param name="Totals">Of the whole frame.</param>
/// <param name="Stock">Bars to buy and how each is cut.</param>
public sealed record ShopPackage(CutFrame Cut, IReadOnlyList<Part> Parts, Totals Totals, StockPlan Stock);

/// <summary>One distinct part.</summary>
/// <param name="Mark">Its short name on every paper and in file names.</param>
/// <param name="Tubes">Indices of the tubes that are this part; the papers are drawn for the first.</param>
/// <param name="Drawn">The tube the papers are drawn for.</param>
/// <param name="TwistDegrees">Clock angle of the to end's seat less that of the from end's, degrees; null where an end has no seat.</param>
/// <param name="Note">For the shop; may be empty.</param>
public sealed record Part(string Mark, IReadOnlyList<int> Tubes, CutTube Drawn, double? TwistDegrees, string Note)
{
    /// <summary>How many to make.</summary>
    public int Quantity => Tubes.Count;
}

/// <summary>Sums over the frame.</summary>
/// <param name="MassKg">Of the cut tubes, without carried masses.</param>
/// <param name="CentreOfMass">Of the cut tubes, mm, global.</param>
/// <param name="WeldLength">Outer curves of coped and mitred ends, a miter once, mm.</param>
/// <param name="OuterArea">Outer surface of the cut tubes, mm².</param>
public sealed record Totals(double MassKg, Vector3 CentreOfMass, double WeldLength, double OuterArea);
