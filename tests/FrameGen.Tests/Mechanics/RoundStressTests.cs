using CsCheck;
using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Tests.Mechanics;

public class RoundStressTests
{
    private static readonly RoundTube Tube = new(40, 2.5);

    // sigma = N/A + My z/Iy - Mz y/Iz, each alone.
    [Fact]
    public void Axial_force_and_bending_add_at_the_skin()
    {
        double modulus = Tube.Iy / 20;
        Assert.Equal(5000 / Tube.Area, Tube.VonMises(new(5000, 0, 0, 0, 0, 0)), 1e-12);
        Assert.Equal(5000 / Tube.Area, Tube.VonMises(new(-5000, 0, 0, 0, 0, 0)), 1e-12);
        Assert.Equal(3e5 / modulus, Tube.VonMises(new(0, 0, 0, 0, -3e5, 0)), 1e-11);
        Assert.Equal(5e5 / modulus, Tube.VonMises(new(0, 0, 0, 0, 3e5, 4e5)), 1e-11);
        Assert.Equal((5000 / Tube.Area) + (5e5 / modulus), Tube.VonMises(new(-5000, 0, 0, 0, 3e5, 4e5)), 1e-11);
    }

    [Fact]
    public void Torsion_counts_by_the_root_of_three()
    {
        // tau = T R/J; sigma_v = sqrt(sigma2 + 3 tau2).
        double tau = 2e5 * 20 / Tube.J;
        double sigma = 3e5 * 20 / Tube.Iy;
        Assert.Equal(Math.Sqrt(3) * tau, Tube.VonMises(new(0, 0, 0, -2e5, 0, 0)), 1e-11);
        Assert.Equal(Math.Sqrt((sigma * sigma) + (3 * tau * tau)), Tube.VonMises(new(0, 0, 0, 2e5, 0, 3e5)), 1e-11);
    }

    // Jourawski: 4V/3A for the solid bar, 2V/A for a thin tube, V Q/(I 2t) with Q = 2 (R3 - r3)/3 in between.
    [Fact]
    public void Transverse_shear_is_highest_on_the_diameter_across()
    {
        var rod = new Rod(18);
        Assert.Equal(Math.Sqrt(3) * 4 * 900 / (3 * rod.Area), rod.VonMises(new(0, 900, 0, 0, 0, 0)), 1e-10);
        double q = 2 * (Math.Pow(20, 3) - Math.Pow(17.5, 3)) / 3;
        double tau = 900 * q / (Tube.Iy * 2 * 2.5);
        Assert.Equal(Math.Sqrt(3) * tau, Tube.VonMises(new(0, 0, 900, 0, 0, 0)), 1e-10);
        var thin = new RoundTube(400, 0.01);
        Assert.Equal(Math.Sqrt(3) * 2 * 900 / thin.Area, thin.VonMises(new(0, 0, -900, 0, 0, 0)), 1e-6);
    }

    [Fact]
    public void Torsion_and_shear_add_on_one_side()
    {
        double torsion = 2e5 * 20 / Tube.J;
        double shear = Tube.VonMises(new(0, 0, 900, 0, 0, 0)) / Math.Sqrt(3);
        Assert.Equal(Math.Sqrt(3) * (torsion + shear), Tube.VonMises(new(0, 0, 900, 2e5, 0, 0)), 1e-10);
    }

    // A tube on its side, loaded down at its end, pulled and twisted: on the y > 0 side a torque pushes the skin up, which is against
    // a downward shear. Worked by hand at the three points.
    [Fact]
    public void Torsion_and_shear_cancel_on_the_other_side()
    {
        // Pull is highest on the y > 0 side (Mz < 0), where T > 0 pushes towards +z and Vz < 0 towards -z.
        double shear = Tube.VonMises(new(0, 0, 900, 0, 0, 0)) / Math.Sqrt(3);
        double torque = shear * Tube.J / 20;
        double sigma = 60;
        double bending = sigma * Tube.Iy / 20;
        double pull = sigma * Tube.Area;
        double onTheRight = 2 * sigma;
        double value = Tube.VonMises(new(pull, 0, -900, torque, 0, -bending));
        Assert.True(value >= onTheRight * (1 - 1e-12));

        // With the torque turned round, both shears meet the highest pull.
        Assert.Equal(
            Math.Sqrt((4 * sigma * sigma) + (12 * shear * shear)), Tube.VonMises(new(pull, 0, -900, -torque, 0, -bending)), 1e-9);
    }

    // A plain second method: the stress at many points of the skin, refined round the best of them.
    [Fact]
    public void No_point_of_the_skin_is_worse()
    {
        Gen<double> any = Gen.Double[-1, 1];
        Gen<SectionForces> gen = Gen.Select(
            any, any, any, any, any, any, (n, vy, vz, t, my, mz) => new SectionForces(2e4 * n, 8e3 * vy, 8e3 * vz, 1e5 * t, 1e5 * my, 1e5 * mz));
        var pcg = new PCG(1, 42UL);
        for (int k = 0; k < 300; k++)
        {
            SectionForces forces = gen.Generate(pcg, null, out _);
            double worst = WorstBySearch(forces, Tube);
            Assert.Equal(worst, Tube.VonMises(forces), 1e-9 * worst);
        }
    }

    // Planar cases, where the two candidates are level and the quadratic has no preferred side.
    [Theory]
    [InlineData(0, 900, 0, 0, 0, 3e5)]
    [InlineData(0, 900, 0, 0, 3e5, 0)]
    [InlineData(0, 9000, 0, 0, 1e5, 0)]
    [InlineData(4000, 0, 900, 0, 3e5, 0)]
    [InlineData(0, 5e3, 0, 1e-9, 0, 1e5)]
    [InlineData(1e-9, 5e3, 5e3, 1e-9, 1e5, 1e5)]
    [InlineData(-3e4, 1e-7, 0, 2e5, 0, 1e5)]
    public void Plane_cases_agree_with_the_search(double n, double vy, double vz, double t, double my, double mz)
    {
        var forces = new SectionForces(n, vy, vz, t, my, mz);
        double worst = WorstBySearch(forces, Tube);
        Assert.Equal(worst, Tube.VonMises(forces), 1e-9 * worst);
    }

    [Fact]
    public void No_forces_no_stress() => Assert.Equal(0, Tube.VonMises(default));

    [Theory]
    [InlineData(-1.0)]
    [InlineData(0.51)]
    [InlineData(double.NaN)]
    public void Refuses_an_impossible_poisson_ratio(double ratio)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Tube.ShearAreas(ratio));
        Assert.Throws<ArgumentOutOfRangeException>(() => new Rod(10).ShearAreas(ratio));
    }

    private static double WorstBySearch(in SectionForces forces, RoundTube tube)
    {
        SectionForces f = forces;
        (double outer, double inner) = (tube.OutsideDiameter / 2, tube.InsideDiameter / 2);
        double q = 2 * (Math.Pow(outer, 3) - Math.Pow(inner, 3)) / 3;
        double shear = q / (tube.Iy * 2 * tube.Wall);

        double Stress(double angle)
        {
            (double y, double z) = (Math.Cos(angle), Math.Sin(angle));
            double sigma = (f.N / tube.Area) + (f.My * outer * z / tube.Iy) - (f.Mz * outer * y / tube.Iz);

            // Along the skin, towards growing angle: (-z, y). The transverse part is V's share in that direction.
            double tau = (f.T * outer / tube.J) + (shear * ((f.Vz * y) - (f.Vy * z)));
            return Math.Sqrt((sigma * sigma) + (3 * tau * tau));
        }

        const int Points = 2000;
        double best = Enumerable.Range(0, Points).MaxBy(k => Stress(2 * Math.PI * k / Points)) * 2 * Math.PI / Points;
        double width = 2 * Math.PI / Points;
        for (int round = 0; round < 60; round++)
        {
            best = new[] { best - width, best, best + width }.MaxBy(Stress);
            width *= 0.6;
        }

        return Stress(best);
    }
}
