namespace FrameGen.Sizing.Analysis;

/// <summary>
/// How far from a joint's point the heat of its weld reaches along a tube's axis. r is the tube's half width, R the other's, φ the
/// angle between the two axes, each pointing away from the node.
/// </summary>
internal static class WeldReach
{
    /// <summary>Beyond the joint itself, mm.</summary>
    public const double HeatAffected = 30;

    /// <summary>(R + r |cos φ|)/sin φ + 30 mm, on a cut tube from its end's point, on its mate to both sides: one formula, since on
    /// the mate r and R change places.</summary>
    public static double Cope(double r, double other, double sin, double cos) => ((other + (r * Math.Abs(cos))) / sin) + HeatAffected;

    /// <summary>r tan(ψ/2) + 30 mm at a miter, ψ = 180° − φ the turn.</summary>
    public static double Miter(double r, double sin, double cos) => (r * (1 + cos) / sin) + HeatAffected;

    /// <summary>
    /// Two tubes that are both cut to others before them end at the node at the latest, each on the plane through its own end point
    /// square to its axis. Beyond a right angle they therefore meet no farther out than r |tan φ|, however long the two round
    /// surfaces would run on into each other; opposite each other (φ = 180°) they only come together at the node.
    /// </summary>
    public static double BothCut(double r, double other, double sin, double cos)
    {
        double square = cos < 0 ? r * sin / -cos : double.PositiveInfinity;
        return Math.Min(square + HeatAffected, Cope(r, other, sin, cos));
    }
}
