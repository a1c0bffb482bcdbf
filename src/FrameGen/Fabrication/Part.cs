using FrameGen.Joints;

namespace FrameGen.Fabrication;

/// <summary>One distinct part.</summary>
/// <param name="Mark">Its short name on every paper; opposite hands share it.</param>
/// <param name="Hand"><c>A</c> or <c>B</c> where the part has an opposite hand, else empty.</param>
/// <param name="Placed">The tubes that are this part, the one that the papers are drawn for first.</param>
/// <param name="Drawn">The tube the papers are drawn for.</param>
/// <param name="TwistDegrees">Clock angle of the to end's seat less that of the from end's, degrees; null where an end has no seat.</param>
/// <param name="Note">For the shop; may be empty.</param>
public sealed record Part(
    string Mark, string Hand, IReadOnlyList<Placement> Placed, CutTube Drawn, double? TwistDegrees, string Note)
{
    /// <summary>How many to make.</summary>
    public int Quantity => Placed.Count;

    /// <summary>Indices of the tubes that are this part.</summary>
    public IEnumerable<int> Tubes => Placed.Select(p => p.Tube);

    /// <summary>The mark with the hand, as it stands on the piece and in file names: <c>braces-438kt-A</c>.</summary>
    public string Name => Hand.Length == 0 ? Mark : $"{Mark}-{Hand}";
}

/// <summary>How a part stands in the frame as one of its tubes.</summary>
/// <param name="Tube">Index of the tube.</param>
/// <param name="Turn">Clock angle on the tube less that on the drawing (negated where swapped), rad in (−π, π].</param>
/// <param name="Swapped">True where the drawing's from end is at the tube's to end.</param>
public readonly record struct Placement(int Tube, double Turn, bool Swapped);
