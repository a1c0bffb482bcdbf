using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Mechanics.Stability;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>
/// Columns and frames with known buckling loads. Columns: Euler, π²EI/(KL)², tube 48.3 x 3.2 mm, E 210 000 MPa, L 1500 mm; the fixed-pinned one
/// by the exact root of tan x = x. Without shear deformation, as the formulas are.
/// </summary>
public class BucklingTests
{
    private const double E = 210_000;
    private const double G = E / 2.6;
    private const double Height = 1500;

    // A half-wave has at most half of a span's elements; with 32 the printed digits are reached.
    private const int Fine = 32;

    private static readonly RoundTube Tube = new(48.3, 3.2);

    [Theory]
    [InlineData("111001", "110001", 106722.73)]
    [InlineData("111111", "000000", 26680.68)]
    [InlineData("111111", "110111", 426890.93)]
    [InlineData("111111", "110001", 218327.87)]
    public void Euler_columns(string foot, string head, double load)
    {
        BucklingMode mode = Column(Fine, foot, head, slender: true)!;
        Assert.Equal(load, mode.Factor, load * 3e-6);

        // Eight elements, which frames get, are within a thousandth.
        Assert.InRange(Column(RefinedFrame.ElementsPerSpan, foot, head, slender: true)!.Factor / load, 1, 1.001);
    }

    [Fact]
    public void Shear_softens_a_column()
    {
        // F. Engesser: P = PE/(1 + PE/(G As)) with pinned ends.
        const double shortHeight = 300;
        (double shear, _) = Tube.ShearAreas(0.3);
        double euler = Math.PI * Math.PI * E * Tube.Iy / (shortHeight * shortHeight);
        double expected = euler / (1 + (euler / (G * shear)));
        var column = new DividedFrame(4 * Fine, "000000", Vector3.Zero, new Vector3(0, 0, shortHeight));
        column.Profile(Profile(shear)).Member(0, 1).Hold(0, "111001").Hold(1, "110001").Load(1, new Vector3(0, 0, -1));
        Assert.True(euler / expected > 1.1, "shear should count here");
        Assert.Equal(expected, column.Buckling()!.Factor, expected * 1e-5);
    }

    // F. Engesser's columns from slender to stout, with the elements that a frame gets: within a thousandth, clamped ends, where the waves are shortest, included.
    [Theory]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(6)]
    [InlineData(10)]
    [InlineData(20)]
    [InlineData(40)]
    public void The_elements_of_a_span_are_enough_for_stout_columns_too(double diameters)
    {
        double length = diameters * Tube.OutsideDiameter;
        double shear = Tube.ShearAreas(0.3).Y;
        Check("111111", "110111", 0.5);
        Check("111001", "110001", 1);
        Check("111111", "000000", 2);

        void Check(string foot, string head, double buckling)
        {
            double euler = Math.PI * Math.PI * E * Tube.Iy / (buckling * buckling * length * length);
            double expected = euler / (1 + (euler / (G * shear)));
            var column = new DividedFrame(RefinedFrame.ElementsPerSpan, "000000", Vector3.Zero, new Vector3(0, 0, length));
            column.Profile(Profile(shear)).Member(0, 1).Hold(0, foot).Hold(1, head).Load(1, new Vector3(0, 0, -1));
            Assert.InRange(column.Buckling()!.Factor / expected, 1 - 1e-6, 1.001);
        }
    }

    [Fact]
    public void A_column_under_its_own_weight()
    {
        // S. Timoshenko, J. Gere, Theory of Elastic Stability (1961), section 2.12: (qL) = 7.837 EI/L², clamped below, free above.
        var column = new DividedFrame(16, "000000", Vector3.Zero, new Vector3(0, 0, Height));
        column.Profile(Profile(double.PositiveInfinity)).Member(0, 1).Hold(0, "111111").LoadAlong(0, new Vector3(0, 0, -1));
        Printed.Equal("7.837", column.Buckling()!.Factor * Height * Height * Height / (E * Tube.Iy));
    }

    [Theory]
    [InlineData(1000, 1200, 1)]
    [InlineData(1500, 900, 3)]
    [InlineData(800, 2500, 0.2)]
    public void A_portal_on_pins_sways(double height, double span, double beam)
    {
        // Each column: EI y'' = −P y from the pin up, so y = sin kx; its head is turned back by the beam, bent into an S, with 6 EIb/l.
        // So kh tan kh = 6 Ib h/(Ic l); S. Timoshenko, J. Gere, Theory of Elastic Stability (1961), section 2.4, has such frames.
        double stiffness = 6 * beam * height / span;
        double root = Root(x => (x * Math.Sin(x)) - (stiffness * Math.Cos(x)), 1e-9, Math.PI / 2);
        Assert.Equal(Load(root, height), Portal(height, span, beam, "110000").Buckling()!.Factor, 1e-5 * Load(root, height));
    }

    [Theory]
    [InlineData(1000, 1200, 1)]
    [InlineData(800, 2500, 0.2)]
    public void A_portal_with_clamped_feet_sways(double height, double span, double beam)
    {
        // The same from a clamped foot: kh cot kh = −6 Ib h/(Ic l), between π/2 and π.
        double stiffness = 6 * beam * height / span;
        double root = Root(x => (x * Math.Cos(x)) + (stiffness * Math.Sin(x)), Math.PI / 2, Math.PI);
        Assert.Equal(Load(root, height), Portal(height, span, beam, "110001").Buckling()!.Factor, 1e-5 * Load(root, height));
    }

    [Fact]
    public void Nothing_compressed_has_no_factor()
    {
        var tie = new DividedFrame(8, "000000", Vector3.Zero, new Vector3(0, 0, Height));
        tie.Profile(Profile(double.PositiveInfinity)).Member(0, 1).Hold(0, "111111").Load(1, new Vector3(0, 0, 1000));
        Assert.Null(tie.Buckling());
    }

    [Fact]
    public void A_tie_holds_the_head_of_a_strut()
    {
        // Clamped at both ends and guided in the middle, pushed there along itself: one half is pressed, the other pulled by as much. The
        // halves' stiffnesses against turning at the middle, with the stability functions of R. Livesley, D. Chandler, Stability Functions for
        // Structural Frameworks (1956), add up to nothing: between the fixed-pinned and the fixed-fixed column.
        double root = Root(x => Pressed(x) + Pulled(x), 4.494, 6.28);
        var rod = new DividedFrame(16, "000000", Vector3.Zero, new Vector3(0, 0, Height), new Vector3(0, 0, 2 * Height));
        rod.Profile(Profile(double.PositiveInfinity)).Member(0, 1).Member(1, 2).Hold(0, "111111").Hold(1, "110000").Hold(2, "111111");
        Assert.Equal(Load(root, Height), rod.Load(1, new Vector3(0, 0, -2)).Buckling()!.Factor, 3e-5 * Load(root, Height));

        static double Pressed(double u) => u * (Math.Sin(u) - (u * Math.Cos(u))) / ((2 * (1 - Math.Cos(u))) - (u * Math.Sin(u)));
        static double Pulled(double u) => u * ((u * Math.Cosh(u)) - Math.Sinh(u)) / ((2 * (1 - Math.Cosh(u))) + (u * Math.Sinh(u)));
    }

    private static double Load(double kh, double height) => kh * kh * E * Tube.Iy / (height * height);

    private static BucklingMode? Column(int divisions, string foot, string head, bool slender)
    {
        var column = new DividedFrame(divisions, "000000", Vector3.Zero, new Vector3(0, 0, Height));
        column.Profile(Profile(slender ? double.PositiveInfinity : Tube.ShearAreas(0.3).Y)).Member(0, 1).Hold(0, foot).Hold(1, head);
        return column.Load(1, new Vector3(0, 0, -1)).Buckling();
    }

    /// <summary>Members that hardly stretch, as the closed form has them.</summary>
    private static DividedFrame Portal(double height, double span, double beam, string feet)
    {
        var portal = new DividedFrame(
            16, DividedFrame.InPlane, Vector3.Zero, new Vector3(0, height, 0), new Vector3(span, height, 0), new Vector3(span, 0, 0));
        BeamProfile column = Profile(double.PositiveInfinity) with { Area = 1e3 * Tube.Area };
        portal.Profile(column).Member(0, 1).Member(3, 2);
        portal.Profile(column with { Iy = beam * column.Iy, Iz = beam * column.Iz }).Member(1, 2);
        return portal.Hold(0, feet).Hold(3, feet).Load(1, new Vector3(0, -1, 0)).Load(2, new Vector3(0, -1, 0));
    }

    private static BeamProfile Profile(double shearArea) => new(E, G, Tube.Area, Tube.Iy, Tube.Iz, Tube.J, shearArea, shearArea);

    private static double Root(Func<double, double> f, double low, double high)
    {
        bool rising = f(high) > 0;
        for (int i = 0; i < 100; i++)
        {
            double middle = 0.5 * (low + high);
            (low, high) = f(middle) > 0 == rising ? (low, middle) : (middle, high);
        }

        return 0.5 * (low + high);
    }
}
