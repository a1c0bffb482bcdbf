using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Sizing.Analysis;

/// <summary>The highest von Mises stress on a stretch of an element.</summary>
/// <param name="Stress">MPa.</param>
/// <param name="At">Distance from the element's start, mm.</param>
internal readonly record struct StressPeak(double Stress, double At)
{
    /// <summary>Looks at the stretch's ends, and inside it where a shear force vanishes or the bending moment is extreme.</summary>
    /// <param name="forces">Internal forces of the element.</param>
    /// <param name="section">Its section.</param>
    /// <param name="from">Start of the stretch, mm from the element's start.</param>
    /// <param name="to">End of the stretch, mm.</param>
    /// <remarks>
    /// Without a load across the element, axial force, shear and torque are constant and My² + Mz² is a convex parabola, so the peak
    /// is at an end. Otherwise, with x from the element's start, Vy = Vy0 − py x, Vz = Vz0 − pz x, My = My0 + Vz0 x − pz x²/2 and
    /// Mz = Mz0 − Vy0 x + py x²/2, and half the slope of My² + Mz² is My Vz − Mz Vy: a cubic. A section with corners is looked at where the
    /// bending stress of a corner is extreme, too.
    /// </remarks>
    public static StressPeak Find(in ElementForces forces, Section section, double from, double to)
    {
        StressPeak peak = new StressPeak(double.NegativeInfinity, from).Or(forces, section, from).Or(forces, section, to);
        if (forces.Py == 0 && forces.Pz == 0)
        {
            return peak;
        }

        SectionForces start = forces.Start;
        peak = peak.OrInside(forces, section, start.Vy / forces.Py, from, to);
        peak = peak.OrInside(forces, section, start.Vz / forces.Pz, from, to);

        Span<double> roots = stackalloc double[3];
        int count = Cubic.Roots(
            ((forces.Py * forces.Py) + (forces.Pz * forces.Pz)) / 2,
            -1.5 * ((start.Vy * forces.Py) + (start.Vz * forces.Pz)),
            (start.Vy * start.Vy) + (start.Vz * start.Vz) + (start.Mz * forces.Py) - (start.My * forces.Pz),
            (start.My * start.Vz) - (start.Mz * start.Vy),
            roots);
        for (int i = 0; i < count; i++)
        {
            peak = peak.OrInside(forces, section, roots[i], from, to);
        }

        // The bending stress z My/Iy − y Mz/Iz of a corner is extreme where z Vz/Iy + y Vy/Iz vanishes.
        if (section is CellTube)
        {
            double towardsZ = section.Height / section.Iy;
            foreach (double towardsY in (ReadOnlySpan<double>)[section.Width / section.Iz, -section.Width / section.Iz])
            {
                peak = peak.OrInside(
                    forces,
                    section,
                    ((towardsZ * start.Vz) + (towardsY * start.Vy)) / ((towardsZ * forces.Pz) + (towardsY * forces.Py)),
                    from,
                    to);
            }
        }

        return peak;
    }

    /// <summary>Looks at a stretch of a tube. Places are distances from the tube's start.</summary>
    /// <param name="piece">The piece of the tube that it is on.</param>
    /// <param name="section">Its section.</param>
    /// <param name="from">Start of the stretch.</param>
    /// <param name="to">End of the stretch.</param>
    /// <remarks>In a bend the ends and the middle of each chord are looked at: 1.5 degrees apart no stress changes by more than 0.04 %.</remarks>
    public static StressPeak Find(in DiagramPiece piece, Section section, double from, double to)
    {
        if (piece.Arc is null)
        {
            StressPeak peak = Find(piece.Forces, section, from - piece.From, to - piece.From);
            return peak with { At = piece.From + peak.At };
        }

        var highest = new StressPeak(double.NegativeInfinity, from);
        foreach (double at in (ReadOnlySpan<double>)[from, 0.5 * (from + to), to])
        {
            SectionForces there = piece.At(at);
            double stress = section.VonMises(in there);
            highest = stress > highest.Stress ? new StressPeak(stress, at) : highest;
        }

        return highest;
    }

    private StressPeak OrInside(in ElementForces forces, Section section, double x, double from, double to) =>
        x > from && x < to ? Or(forces, section, x) : this; // a shear that never vanishes gives ±∞ or NaN, which is not inside

    private StressPeak Or(in ElementForces forces, Section section, double x)
    {
        SectionForces there = forces.At(x);
        double stress = section.VonMises(in there);
        return stress > Stress ? new StressPeak(stress, x) : this;
    }
}
