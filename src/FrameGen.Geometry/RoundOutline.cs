namespace FrameGen.Geometry;

/// <summary>
/// The outer outline of a round section, bore filled, seen along its axis: what a line of another tube runs into. The
/// line lies across the outline at a distance from its centre and is asked for the half chord it cuts off.
/// </summary>
/// <param name="Radius">mm; positive.</param>
public readonly record struct RoundOutline(double Radius)
{
    /// <summary>
    /// A line that passes outside by no more than this still grazes the outline, mm: a tube as wide as its seat must
    /// not fall off it by a rounding error. Coordinates of 10 m carry errors near 1e-12 mm.
    /// </summary>
    public const double Graze = 1e-9;

    /// <summary>Half the chord that a line cuts off, mm; 0 where it grazes; negative where it misses.</summary>
    /// <param name="across">Signed distance of the line from the centre, mm.</param>
    public double HalfChord(double across)
    {
        double distance = Math.Abs(across);
        if (distance < Radius)
        {
            return Math.Sqrt((Radius - distance) * (Radius + distance));
        }

        return distance <= Radius + Graze ? 0 : -1;
    }
}
