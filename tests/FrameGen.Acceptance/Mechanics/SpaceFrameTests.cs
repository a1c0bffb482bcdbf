using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

public class SpaceFrameTests
{
    // D. Logan, A First Course in the Finite Element Method, 4th ed., Example 5.8; kip, inch. Its -0.014 is a rounding of -1.3995e-2.
    [Fact]
    public void Logan_example_5_8()
    {
        FrameSolution solution = new FrameCase(new(0, 0, 0), new(-100, 0, 0), new(0, 0, -100), new(0, -100, 0))
            .Profile(30_000, 10_000, 10, 100, 100, 50)
            .Member(0, 1).Member(0, 2).Member(0, 3)
            .Hold(1, "111111").Hold(2, "111111").Hold(3, "111111")
            .Load(0, new(0, -50, 0), new(-1000, 0, 0))
            .Solve();
        Expect(solution, 0, "7.098e-5 -0.014 -2.352e-3 -3.996e-3 1.78e-5 -1.033e-4");

        // More digits of the same frame, and its reactions, from an independent 3-D frame program.
        Expect(solution, 0, "7.09825755e-5 -1.39951349e-2 -2.35188934e-3 -3.99609044e-3 1.78006916e-5 -1.03342904e-4");
        ExpectReaction(solution, 1, "-0.212948 0.317808 0.0526268 19.98045 -3.165359 18.990669");
        ExpectReaction(solution, 2, "0.0294859 7.696788 7.055668 -264.956669 0.940273 0.516715");
        ExpectReaction(solution, 3, "0.183462 41.985405 -7.108295 -235.532026 -0.089003 -6.072806");
    }

    // W. Weaver, Computer Programs for Structural Analysis, p. 146, problem 8; kip, inch. G = 12 000 ksi reproduces the printed digits.
    [Fact]
    public void Weaver_problem_8()
    {
        const double Span = 120;
        FrameSolution solution = new FrameCase(new(0, 0, 0), new(0, Span, 0), new(2 * Span, Span, 0), new(3 * Span, 0, Span))
            .Profile(30_000, 12_000, 11, 56, 56, 83)
            .Member(0, 1).Member(1, 2).Member(2, 3)
            .Hold(0, "111111").Hold(3, "111111")
            .Load(1, new(2, 0, 0)).Load(2, new(0, -1, 0), new(0, 0, -120))
            .Solve();
        Expect(solution, 1, "0.22267 0.00016 -0.17182 -0.00255 0.00217 -0.00213");
        Expect(solution, 2, "0.22202 -0.48119 -0.70161 -0.00802 0.00101 -0.00435");

        // From an independent 3-D frame program.
        ExpectReaction(solution, 0, "-1.104122 -0.432217 0.217311 48.784510 -17.973012 96.121550");
    }

    // W. Weaver, J. Gere, Matrix Analysis of Framed Structures, space frame in SI units; N, m.
    [Fact]
    public void Weaver_and_Gere_space_frame()
    {
        const double Span = 3;
        const double P = 60_000;
        FrameSolution solution = new FrameCase(
                new(0, 0, 0), new(0, Span, 0), new(Span, Span, 0), new(2 * Span, Span, 0), new(3 * Span, 0, Span))
            .Profile(200e9, 80e9, 0.01, 1e-3, 1e-3, 2e-3)
            .Member(0, 1).Member(1, 2).Member(2, 3).Member(3, 4)
            .Hold(0, "111111").Hold(4, "111111")
            .Load(1, new(2 * P, 0, 0)).Load(2, new(0, 0, 4 * P)).Load(3, new(0, -P, 0), new(0, 0, -P * Span))
            .Solve();
        Expect(solution, 1, "-8.59409726e-4 5.77635277e-5 5.00764459e-3 2.39333188e-3 -1.62316861e-3 6.81331291e-4");
        Expect(solution, 3, "-1.17605e-3 3.25316e-3 5.25552e-3 1.28843e-3 1.72094e-3 -7.7147e-4");
        ExpectReaction(solution, 0, "-14452.196 -38509.018 -126013.046 -348575.028 86568.993 -23743.791");
        ExpectReaction(solution, 4, "-105547.804 98509.018 -113986.954 -75897.916 -75808.167 37162.625");
    }

    // A. Kassimali, Matrix Analysis of Structures, 2nd ed., Example 8.4; kip, inch; inputs and answers from memory, the answers
    // reproduced by an independent program. The book's local y is our top line z, its z is our -y.
    [Fact]
    public void Kassimali_example_8_4()
    {
        FrameSolution solution = new FrameCase(new(0, 0, 0), new(-240, 0, 0), new(0, -240, 0), new(0, 0, -240))
            .Profile(29_000, 11_500, 32.9, 716, 236, 15.1)
            .Member(1, 0, new(0, 1, 0)).Member(2, 0, new(0, 0, 1)).Member(3, 0, new(-0.5, Math.Sqrt(0.75), 0))
            .Hold(1, "111111").Hold(2, "111111").Hold(3, "111111")
            .LoadAlong(0, new(0, -0.25, 0)).Load(0, Vector3.Zero, new(-1800, 0, 1800))
            .Solve();
        Expect(solution, 0, "-1.3522e-3 -2.7965e-3 -1.8120e-3 -3.0021e-3 1.0569e-3 6.4986e-3");
        ExpectReaction(solution, 1, "5.3757 44.106 -0.74272 2.1722 58.987 2330.5");
        ExpectReaction(solution, 2, "-4.6249 11.117 -6.4607 -515.55 -0.76472 369.67");
        ExpectReaction(solution, 3, "-0.75082 4.7763 7.2034 -383.50 -60.166 -4.7020");
    }

    // W. McGuire, R. Gallagher, R. Ziemian, Matrix Structural Analysis, 2nd ed., Example 5.4, a truss of four bars; kN, mm.
    // Bars of almost no bending stiffness stand in for its pins.
    [Fact]
    public void McGuire_example_5_4()
    {
        const double Slight = 1e-3;
        FrameSolution solution = new FrameCase(
                new(2000, 4000, 8000), new(0, 0, 0), new(8000, 0, 0), new(8000, 6000, 0), new(0, 6000, 0))
            .Profile(200, 80, 20_000, Slight, Slight, Slight).Member(0, 1)
            .Profile(200, 80, 30_000, Slight, Slight, Slight).Member(0, 2)
            .Profile(200, 80, 40_000, Slight, Slight, Slight).Member(0, 3)
            .Profile(200, 80, 30_000, Slight, Slight, Slight).Member(0, 4)
            .Hold(1, "111111").Hold(2, "111111").Hold(3, "111111").Hold(4, "111111")
            .Load(0, new(200, 600, -800))
            .Solve();
        Vector3 u = solution.Displacement(0);
        Printed.Equal("0.178 2.722 -0.487", u.X, u.Y, u.Z);

        // Bar forces from an independent program.
        Printed.Equal(
            "350.067 306.645 -800.253 -748.363",
            solution.Forces(0).Start.N, solution.Forces(1).Start.N, solution.Forces(2).Start.N, solution.Forces(3).Start.N);
    }

    // G. Sennett, Matrix Analysis of Structures, section 3.8: two spans of 120 in, EI = 2.9e6, clamped on the left, on rollers in the middle, which settles by
    // 0.25 in, and on the right. The settlement is what a push in the middle of the beam without that roller makes; more digits, and the
    // rotations, from an independent program.
    [Fact]
    public void Sennett_settlement_of_a_support()
    {
        const double Span = 120;
        const double Settlement = 0.25;
        FrameCase Beam(double push) => new FrameCase(new(0, 0, 0), new(Span, 0, 0), new(2 * Span, 0, 0))
            .Profile(2.9e4, 1e4, 1e3, 1e2, 1e2, 1e2).Member(0, 1).Member(1, 2)
            .Hold(0, "111111").Hold(2, "011000").Load(1, new(0, 0, push));
        double push = -Settlement / Beam(1).Solve().Displacement(1).Z;
        FrameSolution solution = Beam(push).Solve();
        Assert.Equal(-Settlement, solution.Displacement(1).Z, 1e-12);
        ElementForces left = solution.Forces(0);
        ElementForces right = solution.Forces(1);
        Printed.Equal("3.9558", TruncatedAt(4, Math.Abs(left.Start.Vz)));
        Printed.Equal("258.92857 215.7738", Math.Abs(left.Start.My), Math.Abs(right.Start.My));
        Printed.Equal("1.7981", Math.Abs(right.Start.Vz));
        Printed.Equal(
            "3.95585317 258.928571 1.79811508 215.773810", Math.Abs(left.Start.Vz), Math.Abs(left.Start.My), Math.Abs(right.Start.Vz), Math.Abs(right.Start.My));

        // Turned clockwise in the x-z plane, seen from -y, is a positive turn about y.
        Printed.Equal("8.92857e-4 -3.57143e-3", solution.Rotation(1).Y, solution.Rotation(2).Y);

        // The book cuts the digits it does not print.
        static double TruncatedAt(int decimals, double value) => Math.Floor(value * Math.Pow(10, decimals)) / Math.Pow(10, decimals);
    }

    // AFNOR, Guide de validation des progiciels de calcul de structures (1990), SSLL06/89: quarter circle R = 1 m, tube 20 x 2 mm,
    // loaded square to its plane at the free end. Chords, from an independent program; the closed form is 134.6187 mm.
    [Theory]
    [InlineData(14, "134.328")]
    [InlineData(30, "134.555")]
    [InlineData(60, "134.603")]
    public void Quarter_circle_of_chords(int chords, string printed)
    {
        const double Radius = 1000;
        const double E = 2e5;
        const double Poisson = 0.3;
        var tube = new RoundTube(20, 2);
        var points = new Vector3[chords + 1];
        for (int k = 0; k <= chords; k++)
        {
            (double sin, double cos) = Math.SinCos(Math.PI / 2 * k / chords);
            points[k] = new Vector3(Radius * cos, Radius * sin, 0);
        }

        FrameCase arc = new FrameCase(points).Profile(E, E / (2 * (1 + Poisson)), tube.Area, tube.Iy, tube.Iz, tube.J)
            .Hold(0, "111111").Load(chords, new(0, 0, 100));
        for (int k = 0; k < chords; k++)
        {
            arc.Member(k, k + 1);
        }

        FrameSolution solution = arc.Solve();
        Printed.Equal(printed, solution.Displacement(chords).Z);

        // At 15 degrees from the clamp: torsion F R (1 - cos 75) = 74.118 N m, bending F R sin 75 = 96.593 N m; a chord's moments
        // are those of the arc at its ends, along and across a direction half a chord away.
        if (chords == 30)
        {
            ElementForces before = solution.Forces(4);
            ElementForces after = solution.Forces(5);
            SectionForces end = before.At(before.Length);
            Assert.Equal(74.118, Math.Abs(end.T + after.Start.T) / 2e3, 0.1);
            Assert.Equal(96.593, Math.Abs(end.My + after.Start.My) / 2e3, 0.1);
        }
    }

    private static void Expect(FrameSolution solution, int node, string printed)
    {
        (Vector3 u, Vector3 r) = (solution.Displacement(node), solution.Rotation(node));
        Printed.Equal(printed, u.X, u.Y, u.Z, r.X, r.Y, r.Z);
    }

    private static void ExpectReaction(FrameSolution solution, int node, string printed)
    {
        (Vector3 f, Vector3 m) = solution.Reaction(node);
        Printed.Equal(printed, f.X, f.Y, f.Z, m.X, m.Y, m.Z);
    }
}
