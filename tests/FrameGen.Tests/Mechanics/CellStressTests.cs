using CsCheck;
using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Tests.Mechanics;

public class CellStressTests
{
    private static readonly CellTube[] Tubes =
    [
        new FlatSidedTube(60, 40, 3),
        new FlatSidedTube(40, 60, 3),
        new FlatSidedTube(40, 40, 2, 0),
        new FlatSidedTube(40, 40, 3.2, 4.8, 3.2),
        new FlatSidedTube(60, 40, 4, 20),
        new FlatSidedTube(120, 30, 2),
        new EllipseTube(45, 28, 1.5),
        new EllipseTube(28, 45, 4),
        new EllipseTube(40, 40, 3),
        new EllipseTube(100, 30, 2),
    ];

    [Fact]
    public void Axial_force_and_bending_add_at_the_farthest_point()
    {
        var tube = new FlatSidedTube(60, 40, 3);
        Assert.Equal(5000 / tube.Area, tube.VonMises(new(-5000, 0, 0, 0, 0, 0)), 1e-11);
        Assert.Equal(3e5 / tube.ElasticModulusY, tube.VonMises(new(0, 0, 0, 0, -3e5, 0)), 1e-10);
        Assert.Equal(3e5 / tube.ElasticModulusZ, tube.VonMises(new(0, 0, 0, 0, 0, 3e5)), 1e-10);

        // Both moments meet on the corner: at its centre (14, 24) and 6 mm on, the way the stress grows.
        (double perZ, double perY) = (3e5 / tube.Iy, 2e5 / tube.Iz);
        double corner = (24 * perZ) + (14 * perY) + (6 * Math.Sqrt((perZ * perZ) + (perY * perY)));
        Assert.Equal(corner + (5000 / tube.Area), tube.VonMises(new(5000, 0, 0, 0, 3e5, -2e5)), 1e-10);

        // Sharp corners: the sum of both.
        var sharp = new FlatSidedTube(60, 40, 3, 0);
        Assert.Equal((3e5 / sharp.ElasticModulusY) + (2e5 / sharp.ElasticModulusZ), sharp.VonMises(new(0, 0, 0, 0, 3e5, 2e5)), 1e-10);
    }

    [Fact]
    public void Torsion_counts_by_the_root_of_three() => Assert.All(Tubes, tube =>
        Assert.Equal(Math.Sqrt(3) * 2e5 / tube.TorsionModulus, tube.VonMises(new(0, 0, 0, -2e5, 0, 0)), 1e-10));

    // A box of sharp corners, middle line 57 x 37, worked by hand: q = V S/I per wall, S = 57/2 x 37/2 + (57/2)2/2 and I = 2 x 57^3/12 + 2 x 37 x 28.5^2.
    [Fact]
    public void Shear_is_highest_in_the_middle_of_the_walls_along_it()
    {
        var tube = new FlatSidedTube(60, 40, 3, 0);
        double first = (28.5 * 18.5) + (28.5 * 28.5 / 2);
        double second = (2 * Math.Pow(57, 3) / 12) + (2 * 37 * 28.5 * 28.5);
        Assert.Equal(Math.Sqrt(3) * 9000 * first / (second * 3), tube.VonMises(new(0, 0, 9000, 0, 0, 0)), 1e-10);
        double across = (18.5 * 28.5) + (18.5 * 18.5 / 2);
        double secondAcross = (2 * Math.Pow(37, 3) / 12) + (2 * 57 * 18.5 * 18.5);
        Assert.Equal(Math.Sqrt(3) * 9000 * across / (secondAcross * 3), tube.VonMises(new(0, -9000, 0, 0, 0, 0)), 1e-10);
    }

    // The flow of a wall element (dy, dz) carries tau t (dy, dz): round the wall it has to add up to the shear force, and to no other.
    [Fact]
    public void The_flow_of_shear_adds_up_to_the_force() => Assert.All(Tubes, tube =>
    {
        (double alongY, double alongZ) = (0, 0);
        const int Steps = 4000;
        for (int piece = 0; piece < tube.Pieces; piece++)
        {
            (WallPoint o, WallPoint i) = (tube.At(piece, 0, inner: false), tube.At(piece, 0, inner: true));
            for (int k = 1; k <= Steps; k++)
            {
                (WallPoint nextO, WallPoint nextI) = (tube.At(piece, (double)k / Steps, inner: false), tube.At(piece, (double)k / Steps, inner: true));
                double dy = (nextO.Y + nextI.Y - o.Y - i.Y) / 2;
                double dz = (nextO.Z + nextI.Z - o.Z - i.Z) / 2;
                alongY += 4 * tube.Wall * dy * (o.Qy + nextO.Qy) / 2;
                alongZ -= 4 * tube.Wall * dz * (o.Qz + nextO.Qz) / 2;
                (o, i) = (nextO, nextI);
            }
        }

        Assert.Equal(1, alongY, 1e-6);
        Assert.Equal(1, alongZ, 1e-6);
    });

    // The slopes of what a place has, against differences.
    [Fact]
    public void Slopes_are_those_of_the_places() => Assert.All(Tubes, tube =>
    {
        const double Step = 1e-5;
        foreach (bool inner in (ReadOnlySpan<bool>)[false, true])
        {
            for (int piece = 0; piece < tube.Pieces; piece++)
            {
                foreach (double u in (ReadOnlySpan<double>)[0.1, 0.5, 0.9])
                {
                    (WallPoint a, WallPoint p, WallPoint b) = (tube.At(piece, u - Step, inner), tube.At(piece, u, inner), tube.At(piece, u + Step, inner));
                    Assert.Equal((b.Y - a.Y) / (2 * Step), p.SlopeY, 1e-6);
                    Assert.Equal((b.Z - a.Z) / (2 * Step), p.SlopeZ, 1e-6);
                    Assert.Equal((b.Qy - a.Qy) / (2 * Step), p.SlopeQy, 1e-8);
                    Assert.Equal((b.Qz - a.Qz) / (2 * Step), p.SlopeQz, 1e-8);
                }
            }
        }
    });

    // A plain second method: the stress at very many points of both skins.
    [Fact]
    public void No_point_of_the_skins_is_worse()
    {
        Gen<double> any = Gen.Double[-1, 1];
        Gen<SectionForces> gen = Gen.Select(
            any, any, any, any, any, any, (n, vy, vz, t, my, mz) => new SectionForces(2e4 * n, 1e4 * vy, 1e4 * vz, 2e5 * t, 2e5 * my, 2e5 * mz));
        var pcg = new PCG(1, 42UL);
        for (int k = 0; k < 120; k++)
        {
            SectionForces any6 = gen.Generate(pcg, null, out _);
            foreach (SectionForces forces in Some(any6, k))
            {
                foreach (CellTube tube in Tubes)
                {
                    double worst = WorstBySampling(forces, tube);
                    double ours = tube.VonMises(forces);
                    Assert.True(ours >= worst * (1 - 1e-12), $"{tube.Name}: {forces}: {ours:R} below {worst:R}");
                    Assert.True(ours <= worst * (1 + 1e-5), $"{tube.Name}: {forces}: {ours:R} above {worst:R}");
                }
            }
        }

        // All forces; shear and torque prevailing; one shear only.
        static SectionForces[] Some(SectionForces f, int k) =>
            [f, f with { N = 0, My = f.My / 10, Mz = f.Mz / 10 }, k % 2 == 0 ? f with { Vy = 0 } : f with { Vz = 0, T = 0 }];
    }

    [Fact]
    public void Without_shear_the_search_agrees_with_the_closed_form() => Assert.All(Tubes, tube =>
    {
        var forces = new SectionForces(-4000, 0, 0, 7e4, 2e5, -1e5);
        double exact = tube.VonMises(forces);
        Assert.Equal(exact, tube.VonMises(forces with { Vy = 1e-9 }), 1e-9 * exact);
    });

    [Fact]
    public void Turning_section_and_forces_together_changes_nothing()
    {
        CellTube[] turned = [new FlatSidedTube(60, 40, 3), new FlatSidedTube(40, 60, 3), new EllipseTube(45, 28, 1.5), new EllipseTube(28, 45, 1.5)];
        var f = new SectionForces(3000, 4000, -6000, 1.5e5, 2e5, 1e5);

        // A quarter turn about x takes y to z and z to -y.
        var g = new SectionForces(f.N, -f.Vz, f.Vy, f.T, -f.Mz, f.My);
        Assert.Equal(turned[0].VonMises(f), turned[1].VonMises(g), 1e-9);
        Assert.Equal(turned[2].VonMises(f), turned[3].VonMises(g), 1e-9);

        // Half a turn; the mirror image in the plane of x and z; all signs changed.
        Assert.All(Tubes, tube =>
        {
            double stress = tube.VonMises(f);
            Assert.Equal(stress, tube.VonMises(new(f.N, -f.Vy, -f.Vz, f.T, -f.My, -f.Mz)), 1e-9);
            Assert.Equal(stress, tube.VonMises(new(f.N, -f.Vy, f.Vz, -f.T, f.My, -f.Mz)), 1e-9);
            Assert.Equal(stress, tube.VonMises(new(-f.N, -f.Vy, -f.Vz, -f.T, -f.My, -f.Mz)), 1e-9);
        });
    }

    // The round tube's closed form spreads shear over a thick wall; the two agree to t/r.
    [Theory]
    [InlineData(0.001)]
    [InlineData(0.1)]
    public void A_thin_ellipse_with_equal_axes_is_stressed_like_a_round_tube(double wall)
    {
        var forces = new SectionForces(30, 40, -60, 150, 200, 100);
        double round = new RoundTube(40, wall).VonMises(forces);
        Assert.Equal(round, new EllipseTube(40, 40, wall).VonMises(forces), round * wall / 20);
    }

    [Fact]
    public void No_forces_no_stress() => Assert.All(Tubes, tube => Assert.Equal(0, tube.VonMises(default)));

    [Fact]
    public void Looking_allocates_nothing()
    {
        var forces = new SectionForces(3000, 4000, -6000, 1.5e5, 2e5, 1e5);
        foreach (CellTube tube in Tubes)
        {
            tube.VonMises(forces);
            long before = GC.GetAllocatedBytesForCurrentThread();
            for (int k = 0; k < 100; k++)
            {
                tube.VonMises(forces);
            }

            Assert.Equal(before, GC.GetAllocatedBytesForCurrentThread());
        }
    }

    private static double WorstBySampling(in SectionForces forces, CellTube tube)
    {
        const int Samples = 300;
        double worst = 0;
        (double torsionOuter, double torsionInner) = tube.TorsionStress();
        for (int piece = 0; piece < tube.Pieces; piece++)
        {
            for (int k = 0; k <= Samples; k++)
            {
                Look(tube.At(piece, (double)k / Samples, inner: false), forces, forces.T * torsionOuter);
                Look(tube.At(piece, (double)k / Samples, inner: true), forces, forces.T * torsionInner);
            }
        }

        return Math.Sqrt(worst);

        void Look(WallPoint p, SectionForces f, double torsion)
        {
            foreach ((int sy, int sz) in (ReadOnlySpan<(int, int)>)[(1, 1), (1, -1), (-1, 1), (-1, -1)])
            {
                // Counterclockwise about x: Vz > 0 flows up on the y > 0 side, Vy > 0 clockwise over the top.
                double sigma = (f.N / tube.Area) + (f.My * sz * p.Z / tube.Iy) - (f.Mz * sy * p.Y / tube.Iz);
                double tau = torsion + (f.Vz * sy * p.Qz) - (f.Vy * sz * p.Qy);
                worst = Math.Max(worst, (sigma * sigma) + (3 * tau * tau));
            }
        }
    }
}
