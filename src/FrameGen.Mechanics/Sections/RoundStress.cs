namespace FrameGen.Mechanics.Sections;

/// <summary>Shear coefficient and worst von Mises stress of solid and hollow circles.</summary>
internal static class RoundStress
{
    /// <summary>
    /// Cowper's shear coefficient κ of a thick hollow circle: 6(1+ν)(1+m²)² / ((7+6ν)(1+m²)² + (20+12ν)m²);
    /// for m = 0 it is the solid circle's 6(1+ν)/(7+6ν). G. R. Cowper, J. Appl. Mech. 33 (1966) 335.
    /// </summary>
    /// <param name="boreRatio">m, inside over outside diameter; 0 ≤ m &lt; 1.</param>
    /// <param name="poissonRatio">ν; −1 &lt; ν ≤ 0.5.</param>
    /// <exception cref="ArgumentOutOfRangeException">ν is outside its range.</exception>
    public static double CowperCoefficient(double boreRatio, double poissonRatio)
    {
        if (!(poissonRatio > -1 && poissonRatio <= 0.5))
        {
            throw new ArgumentOutOfRangeException(
                nameof(poissonRatio), poissonRatio, "Poisson's ratio of an isotropic metal lies above -1 and is at most 0.5.");
        }

        double m2 = boreRatio * boreRatio;
        double q = (1 + m2) * (1 + m2);
        return 6 * (1 + poissonRatio) * q / (((7 + (6 * poissonRatio)) * q) + ((20 + (12 * poissonRatio)) * m2));
    }

    /// <summary>
    /// The highest von Mises stress of a solid or hollow circle, MPa.
    /// </summary>
    /// <param name="forces">Internal forces, N and N·mm.</param>
    /// <param name="outer">Outer radius R, mm.</param>
    /// <param name="inner">Inner radius r, mm; 0 for a solid bar.</param>
    /// <param name="area">A, mm².</param>
    /// <param name="secondMoment">I, mm⁴.</param>
    /// <remarks>
    /// <para>At the skin point R·u, u = (u_y, u_z) a unit vector: σ = N/A + (My u_z − Mz u_y) R/I, and along the skin
    /// τ = T R/2I + k (Vz u_y − Vy u_z), where k V is Jourawski's mean shear on the diameter square to V:
    /// k = 4 (R² + R r + r²) / (3 A (R² + r²)); away from that diameter it falls off as a sine.</para>
    /// <para>On any diameter σ and the torsion's τ are linear and the transverse τ is even, so σ² + 3τ² is convex there: the
    /// worst point is on the outer skin. Round the skin it is a convex quadratic c + 2 g·u + u·H u on the unit circle,
    /// whose largest value has no gap to its dual: min over μ ≥ h1 of c + μ + g1²/(μ − h1) + g2²/(μ − h2), with h1 ≥ h2 the
    /// eigenvalues of H. The dual is solved by Newton's steps on its secular equation, rising from the left
    /// (Moré &amp; Sorensen, SIAM J. Sci. Stat. Comput. 4 (1983) 553); any μ on the way bounds the stress from above.</para>
    /// </remarks>
    public static double VonMises(in SectionForces forces, double outer, double inner, double area, double secondMoment)
    {
        double bending = outer / secondMoment;
        double axial = forces.N / area;
        double torsion = 0.5 * forces.T * bending;
        (double by, double bz) = (-forces.Mz * bending, forces.My * bending);

        if (forces.Vy == 0 && forces.Vz == 0)
        {
            double sigma = Math.Abs(axial) + Math.Sqrt((by * by) + (bz * bz));
            return Math.Sqrt((sigma * sigma) + (3 * torsion * torsion));
        }

        double shear = 4 * ((outer * outer) + (outer * inner) + (inner * inner))
            / (3 * area * ((outer * outer) + (inner * inner)));
        (double sy, double sz) = (shear * forces.Vz, -shear * forces.Vy);

        double c = (axial * axial) + (3 * torsion * torsion);
        (double gy, double gz) = ((axial * by) + (3 * torsion * sy), (axial * bz) + (3 * torsion * sz));
        double hyy = (by * by) + (3 * sy * sy);
        double hzz = (bz * bz) + (3 * sz * sz);
        double hyz = (by * bz) + (3 * sy * sz);
        return Math.Sqrt(LargestOnCircle(c, gy, gz, hyy, hzz, hyz));
    }

    /// <summary>The largest c + 2 g·u + u·H u over unit vectors u, for H positive semidefinite.</summary>
    private static double LargestOnCircle(double c, double gy, double gz, double hyy, double hzz, double hyz)
    {
        double mean = 0.5 * (hyy + hzz);
        double half = 0.5 * (hyy - hzz);
        double radius = Math.Sqrt((half * half) + (hyz * hyz));

        // Unit eigenvector (ey, ez) of the larger eigenvalue, from the half angle, without cancellation.
        double ey = 1;
        double ez = 0;
        if (radius > 0)
        {
            double larger = Math.Sqrt(0.5 * (1 + (Math.Abs(half) / radius)));
            double smaller = hyz / (2 * radius * larger);
            (ey, ez) = half >= 0 ? (larger, smaller) : (smaller, larger);
        }

        double g1 = Math.Abs((gy * ey) + (gz * ez));
        double g2 = Math.Abs((gz * ey) - (gy * ez));
        double h1 = mean + radius;
        double gap = 2 * radius;

        // shift = μ − h1. At either start one coordinate of u alone has length 1, so the root is not further left.
        double shift = Math.Max(g1, g2 - gap);
        for (int step = 0; step < 50 && shift > 0; step++)
        {
            double x1 = g1 / shift;
            double x2 = g2 / (shift + gap);
            double square = (x1 * x1) + (x2 * x2);
            double length = Math.Sqrt(square);

            // The value is stationary in μ: a length right to 1e-9 gives the stress to the last digit.
            if (length < 1 + 1e-9)
            {
                break;
            }

            shift += square * (length - 1) / ((x1 * x1 / shift) + (x2 * x2 / (shift + gap)));
        }

        double dual = c + h1 + shift;
        if (g1 > 0)
        {
            dual += g1 * g1 / shift;
        }

        return g2 > 0 ? dual + (g2 * g2 / (shift + gap)) : dual;
    }
}
