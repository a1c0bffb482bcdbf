using FrameGen.Joints;

namespace FrameGen.Fabrication;

/// <summary>How far a part's two ends are turned against each other.</summary>
internal static class SeatTwist
{
    /// <summary>
    /// Clock angle of the <c>to</c> end's seat less that of the <c>from</c> end's, degrees, in (−180, 180], or in (−90, 90]
    /// where either crossing is square, since such a seat leaves on two sides; null where an end has no seat or its seat no
    /// clock angle.
    /// </summary>
    public static double? Degrees(CutTube tube)
    {
        Contact? from = tube.From.Contacts.Count > 0 ? tube.From.Contacts[0] : null;
        Contact? to = tube.To.Contacts.Count > 0 ? tube.To.Contacts[0] : null;
        if (from?.Clock is not { } start || to?.Clock is not { } stop)
        {
            return null;
        }

        double turn = from.SquareCrossing || to.SquareCrossing ? 180 : 360;
        return Between(double.RadiansToDegrees(stop - start), turn);
    }

    /// <summary>
    /// The angle brought into (−turn/2, turn/2] by whole turns. One that the papers' 0.001 degree rounds to the open end is
    /// the closed end, so that noise can't flip the sign.
    /// </summary>
    internal static double Between(double degrees, double turn)
    {
        double rest = Math.IEEERemainder(degrees, turn);
        return Math.Round(rest, 3) <= -turn / 2 ? turn / 2 : rest;
    }
}
