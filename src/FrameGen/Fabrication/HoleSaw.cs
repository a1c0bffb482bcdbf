using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;

namespace FrameGen.Fabrication;

/// <summary>The hole saw for a coped end.</summary>
internal static class HoleSaw
{
    /// <summary>Diameter of a round seat and the gap left round it, mm; null where the end is not coped to a round seat.</summary>
    public static double? Of(SizedFrame sized, EndCut end) =>
        end.Kind == CutKind.Cope && end.Contacts is [var seat, ..] && sized.SectionOf(seat.Tube) is RoundTube or Rod
            ? sized.SectionOf(seat.Tube).OuterSize + (2 * end.Gap)
            : null;
}
