using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Mechanics.Stability;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>Natural frequencies with published answers.</summary>
public class FrequencyTests
{
    private static readonly RoundTube Tube = new(48.3, 3.2);

    /// <summary>
    /// f = (βL)²/(2πL²) √(EI/μ) with the roots of R. Blevins, Formulas for Natural Frequency and Mode Shape (1979): tube 48.3 x 3.2 mm of steel,
    /// 7850 kg/m³, L 1.5 m, without shear and rotary inertia. Round, so each comes twice.
    /// </summary>
    [Theory]
    [InlineData("111111", "000000", "20.56294", "128.8657")]
    [InlineData("111001", "110001", "57.72105", "")]
    [InlineData("111111", "111111", "130.8471", "")]
    public void Uniform_beams(string start, string end, string first, string second)
    {
        // Pinned at both ends along x as the axis: what turns freely is y and z; the twist is held at one end.
        string Held(string held) => held switch
        {
            "111001" => "111100",
            "110001" => "011000",
            _ => held,
        };
        double[] hertz = Beam(64, Held(start), Held(end)).Frequencies(second.Length > 0 ? 4 : 2, 7.85e-6);
        Printed.Equal(first, hertz[0]);
        Printed.Equal(first, hertz[1]);
        if (second.Length > 0)
        {
            Printed.Equal(second, hertz[2]);
            Printed.Equal(second, hertz[3]);
        }
    }

    /// <summary>
    /// The first four roots of each frequency equation of a uniform beam (R. Blevins; D. Young, R. Felgar): cosh x cos x = -1, sin x = 0, cosh x cos x = 1, tan x = tanh x.
    /// </summary>
    [Theory]
    [InlineData("111111", "001110", 1.8751041, 4.6940911, 7.8547574, 10.9955407)]
    [InlineData("111110", "111110", 3.1415927, 6.2831853, 9.4247780, 12.5663706)]
    [InlineData("111111", "111111", 4.7300407, 7.8532046, 10.9956078, 14.1371655)]
    [InlineData("111111", "111110", 3.9266023, 7.0685827, 10.2101761, 13.3517688)]
    public void Roots_of_the_frequency_equations(string start, string end, params double[] roots)
    {
        const int Elements = 64;
        const double Length = 1500;
        var beam = new DividedFrame(Elements, "101110", Vector3.Zero, new Vector3(Length, 0, 0));
        beam.Profile(Profile(Tube, 210_000, double.PositiveInfinity)).Member(0, 1).Hold(0, start).Hold(1, end);
        double[] hertz = beam.Frequencies(4, 7.85e-6);
        double unit = Math.Sqrt(1000 * 210_000 * Tube.Iz / (7.85e-6 * Tube.Area)) / (2 * Math.PI * Length * Length);
        for (int i = 0; i < roots.Length; i++)
        {
            // Half of the last printed digit, and what the modes' own tolerance leaves.
            Assert.Equal(roots[i], Math.Sqrt(hertz[i] / unit), 1e-7);
        }
    }

    [Fact]
    public void A_rod_along_itself()
    {
        // f = √(E/ρ)/4L, clamped and free; bending and twist are held. A row of n elements is (π/2n)²/24 too high.
        var rod = new DividedFrame(1024, "011111", Vector3.Zero, new Vector3(1500, 0, 0));
        double hertz = rod.Profile(Profile(Tube, 210_000, double.PositiveInfinity)).Member(0, 1).Hold(0, "111111").Frequencies(1, 7.85e-6)[0];
        Printed.Equal("862.032", hertz);
    }

    [Fact]
    public void A_bar_that_twists()
    {
        // f = √(G/ρ)/4L for a circle, where J is the polar moment.
        var rod = new DividedFrame(64, "111011", Vector3.Zero, new Vector3(1500, 0, 0));
        double hertz = rod.Profile(Profile(Tube, 210_000, double.PositiveInfinity)).Member(0, 1).Hold(0, "111111").Frequencies(1, 7.85e-6)[0];
        double exact = Math.Sqrt(1000 * 210_000 / 2.6 / 7.85e-6) / 6000;
        Assert.Equal(exact * (1 + (Math.Pow(Math.PI / 128, 2) / 24)), hertz, 1e-6 * exact);
    }

    [Fact]
    public void Shear_and_rotary_inertia_slow_a_stocky_beam()
    {
        // S. Timoshenko, Phil. Mag. 41 (1921) 744: pinned ends, first mode, with k = π/L the smaller root ω² of
        // ρ²/(κG E) ω⁴ − (ρA/(EI) + k²ρ(1/E + 1/(κG))) ω² + k⁴ = 0, in each case over the bending term.
        const double length = 200;
        const double e = 210_000;
        const double rho = 7.85e-6;
        (double shear, _) = Tube.ShearAreas(0.3);
        double g = e / 2.6;
        double kappa = shear / Tube.Area;
        double k2 = Math.Pow(Math.PI / length, 2);
        double a = rho * rho / (kappa * g * e);
        double b = (rho * Tube.Area / (e * Tube.Iy)) + (k2 * rho * ((1 / e) + (1 / (kappa * g))));
        double omega2 = (b - Math.Sqrt((b * b) - (4 * a * k2 * k2))) / (2 * a);
        double exact = Math.Sqrt(1000 * omega2) / (2 * Math.PI);
        var beam = new DividedFrame(32, "100101", Vector3.Zero, new Vector3(length, 0, 0));
        beam.Profile(Profile(Tube, e, shear)).Member(0, 1).Hold(0, "011100").Hold(1, "011000");
        double hertz = beam.Frequencies(1, rho, rotaryInertia: true)[0];
        Assert.Equal(exact, hertz, 1e-4 * exact);
    }

    [Fact]
    public void A_plane_frame_of_two_storeys()
    {
        // AFNOR, Guide de validation des progiciels de calcul de structures (1990), SDLX01/89: its own values, and those of 16 elements a
        // member computed apart from this project without what happens between the nodes: up to (kL/16)⁴/1440 higher, kL up to 8.
        const double width = 29;
        const double thickness = 4.8;
        double second = width * Math.Pow(thickness, 3) / 12;
        var frame = new DividedFrame(
            16,
            DividedFrame.InPlane,
            new Vector3(-300, 0, 0),
            new Vector3(300, 0, 0),
            new Vector3(-300, 360, 0),
            new Vector3(300, 360, 0),
            new Vector3(-300, 810, 0),
            new Vector3(300, 810, 0));
        frame.Profile(new BeamProfile(
            210_000, 210_000 / 2.6, width * thickness, second, second, second, double.PositiveInfinity, double.PositiveInfinity));
        frame.Member(0, 2).Member(1, 3).Member(2, 4).Member(3, 5).Member(2, 3).Member(4, 5).Hold(0, "111111").Hold(1, "111111");
        double[] hertz = frame.Frequencies(9, 7.85e-6);
        double[] apart = [8.7535, 29.3462, 43.7078, 56.1214, 95.8783, 102.3702, 146.6440, 174.3894, 178.3560];
        Assert.All(apart, (a, i) => Assert.InRange(hertz[i], (1 - 5e-5) * a, a + 5e-5));
        double[] printed = [8.75, 29.34, 43.71, 56.12, 95.86, 102.37, 146.64, 174.39, 178.36];
        for (int i = 0; i < printed.Length; i++)
        {
            // The guide's own reference is a numerical mean: it agrees to two hundredths of a per cent.
            Assert.Equal(printed[i], hertz[i], Math.Max(0.005, 2.5e-4 * printed[i]));
        }
    }

    [Theory]
    [InlineData(4)]
    [InlineData(8)]
    public void A_pin_ended_cross(int arms)
    {
        // NAFEMS, Selected Benchmarks for Natural Frequency Analysis (R0015, 1987), FV1 and FV2, in the plane: targets. Two modes
        // of each row move the hub; the targets neglect that the arms stretch.
        Vector3[] nodes = [Vector3.Zero, .. Enumerable.Range(0, arms).Select(i => 5000 * Direction(2 * Math.PI * i / arms))];
        var cross = new DividedFrame(8, DividedFrame.InPlane, nodes);
        const double side = 125;
        double second = Math.Pow(side, 4) / 12;
        cross.Profile(new BeamProfile(
            200_000, 200_000 / 2.6, side * side, second, second, 2 * second, double.PositiveInfinity, double.PositiveInfinity));
        for (int i = 1; i <= arms; i++)
        {
            cross.Member(0, i).Hold(i, "110000");
        }

        double[] hertz = cross.Frequencies(2 * arms, 8e-6);
        Near(11.336, 0.002, hertz[0]);
        Near(45.345, 0.002, hertz[arms]);
        for (int i = 1; i < arms; i++)
        {
            Near(17.709, i < 3 ? 0.006 : 0.002, hertz[i]);
            Near(57.390, i < 3 ? 0.006 : 0.002, hertz[arms + i]);
        }

        // What only bends is there to the last printed digit, in the second wave of an arm to one unit of it.
        Printed.Equal("11.336 45.345", hertz[0], hertz[arms]);
        Assert.All(hertz[3..arms], f => Printed.Equal("17.709", f));
        Assert.All(hertz[(arms + 3)..], f => Printed.EqualToOneUnit("57.390", f));

        static Vector3 Direction(double angle) => new(Math.Cos(angle), Math.Sin(angle), 0);
        static void Near(double target, double share, double actual) => Assert.Equal(target, actual, share * target);
    }

    [Fact]
    public void A_cantilever_with_masses_off_its_axis()
    {
        // NAFEMS R0015, FV4: targets 1.723, 1.727, 7.413, 9.972, 18.155, 26.957 Hz; ten elements computed apart from this project are within 0.15 %.
        const double diameter = 500;
        double area = Math.PI * diameter * diameter / 4;
        double second = Math.PI * Math.Pow(diameter, 4) / 64;
        var bar = new DividedFrame(10, "000000", Vector3.Zero, new Vector3(10_000, 0, 0));
        bar.Profile(new BeamProfile(
            200_000, 200_000 / 2.6, area, second, second, 2 * second, double.PositiveInfinity, double.PositiveInfinity));
        double[] hertz = bar.Member(0, 1).Hold(0, "111111").Frequencies(
            6, 8e-6, rotaryInertia: false, new PointMass(1, 10_000, new Vector3(0, 2000, 0)), new PointMass(1, 1000, new Vector3(0, -2000, 0)));
        double[] targets = [1.723, 1.727, 7.413, 9.972, 18.155, 26.957];
        for (int i = 0; i < targets.Length; i++)
        {
            Assert.Equal(targets[i], hertz[i], 0.0015 * targets[i]);
        }
    }

    private static DividedFrame Beam(int divisions, string start, string end)
    {
        var beam = new DividedFrame(divisions, "000000", Vector3.Zero, new Vector3(1500, 0, 0));
        return beam.Profile(Profile(Tube, 210_000, double.PositiveInfinity)).Member(0, 1).Hold(0, start).Hold(1, end);
    }

    private static BeamProfile Profile(RoundTube tube, double e, double shearArea) =>
        new(e, e / 2.6, tube.Area, tube.Iy, tube.Iz, tube.J, shearArea, shearArea);
}
