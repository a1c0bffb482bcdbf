using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>
/// Beam formulas of Roark (8th ed., Table 8.1), Gere &amp; Goodno (App. G) and the AISC Manual (Table 3-23) with numbers: tube 48.3 x 3.2 mm,
/// E 210 000 MPa, L 1500 mm, P 1000 N or w 1 N/mm. Deflections down (-z), beams along x; the numbers are of beams without shear deformation.
/// </summary>
public class BeamFormulaTests
{
    private const double E = 210_000;
    private const double G = E / 2.6;
    private const double Span = 1500;
    private const double P = 1000;

    private static readonly RoundTube Tube = new(48.3, 3.2);

    [Fact]
    public void Cantilever_with_an_end_load()
    {
        FrameSolution s = Beam(2).Hold(0, "111111").Load(2, Down(P)).Solve();
        Printed.Equal("46.239467", -s.Displacement(2).Z);
        Printed.Equal("0.04623947", s.Rotation(2).Y);
        ExpectMoment("1500000.0", "312.6713", s.Forces(0).Start);

        // The top is pulled: My positive at the clamp. What the outer part does to the inner one is the load, downwards.
        Assert.Equal(P * Span, s.Forces(0).Start.My, 1e-3);
        Assert.Equal(-P, s.Forces(0).Start.Vz, 1e-6);
        Assert.Equal(P, s.Reaction(0).Force.Z, 1e-6);
        Assert.Equal(-P * Span, s.Reaction(0).Moment.Y, 1e-3);
    }

    [Fact]
    public void Cantilever_with_an_even_load()
    {
        FrameSolution s = Beam(2).Hold(0, "111111").LoadAlong(0, Down(1)).LoadAlong(1, Down(1)).Solve();
        Printed.Equal("26.009700", -s.Displacement(2).Z);
        ExpectMoment("1125000.0", "234.5035", s.Forces(0).Start);
    }

    [Fact]
    public void Simple_beam_with_a_load_in_the_middle()
    {
        FrameSolution s = Simple(2).Load(1, Down(P)).Solve();
        Printed.Equal("2.889967", -s.Displacement(1).Z);
        Printed.Equal("0.00577993", s.Rotation(0).Y);
        ExpectMoment("375000.0", "78.1678", s.Forces(1).Start);
    }

    [Fact]
    public void Simple_beam_with_two_loads_at_the_thirds()
    {
        FrameSolution s = Simple(6).Load(2, Down(P)).Load(4, Down(P)).Solve();
        Printed.Equal("4.923647", -s.Displacement(3).Z);
        ExpectMoment("500000.0", "104.2238", s.Forces(3).Start);
    }

    [Fact]
    public void Simple_beam_with_one_load_at_a_third()
    {
        // The largest deflection is at sqrt((L2 - a2)/3) from the other support.
        double far = Math.Sqrt((Span * Span * (1 - (1.0 / 9))) / 3);
        FrameSolution s = BeamAt(0, Span / 3, Span - far, Span).Hold(0, "111100").Hold(3, "011000").Load(1, Down(P)).Solve();
        Printed.Equal("2.485884", -s.Displacement(2).Z);
        ExpectMoment("333333.3", "69.4825", s.Forces(1).Start);
    }

    [Fact]
    public void Simple_beam_with_an_even_load()
    {
        FrameSolution s = Simple(2).LoadAlong(0, Down(1)).LoadAlong(1, Down(1)).Solve();
        Printed.Equal("2.709344", -s.Displacement(1).Z);
        ExpectMoment("281250.0", "58.6259", s.Forces(1).Start);
    }

    [Fact]
    public void Fixed_beam_with_a_load_in_the_middle()
    {
        FrameSolution s = Beam(2).Hold(0, "111111").Hold(2, "111111").Load(1, Down(P)).Solve();
        Printed.Equal("0.722492", -s.Displacement(1).Z);
        ExpectMoment("187500.0", "39.0839", s.Forces(0).Start);
        ExpectMoment("187500.0", "39.0839", s.Forces(1).Start);
    }

    [Fact]
    public void Fixed_beam_with_an_even_load()
    {
        FrameSolution s = Beam(2).Hold(0, "111111").Hold(2, "111111").LoadAlong(0, Down(1)).LoadAlong(1, Down(1)).Solve();
        Printed.Equal("0.541869", -s.Displacement(1).Z);
        ExpectMoment("187500.0", "39.0839", s.Forces(0).Start);
        ExpectMoment("93750.0", "19.5420", s.Forces(1).Start);
    }

    [Fact]
    public void Propped_cantilever_with_a_load_in_the_middle()
    {
        // Largest deflection P L3/(48 sqrt 5 E I), at L/sqrt 5 from the pin, where the load's own place has 7 P L3/768 E I.
        FrameSolution s = BeamAt(0, Span / 2, Span - (Span / Math.Sqrt(5)), Span)
            .Hold(0, "111111").Hold(3, "011000").Load(1, Down(P)).Solve();
        Printed.Equal("1.292432", -s.Displacement(2).Z);
        Assert.Equal(7 * P * Math.Pow(Span, 3) / (768 * E * Tube.Iy), -s.Displacement(1).Z, 1e-9);
        ExpectMoment("281250.0", "58.6259", s.Forces(0).Start);
    }

    [Fact]
    public void Propped_cantilever_with_an_even_load()
    {
        // Largest at x = (1 + sqrt 33)/16 L = 0.4215 L from the pin, of w x (L3 - 3 L x2 + 2 x3)/48EI: 0.0054161 w L4/EI.
        double x = (1 + Math.Sqrt(33)) / 16;
        FrameSolution s = BeamAt(0, Span * (1 - x), Span)
            .Hold(0, "111111").Hold(2, "011000").LoadAlong(0, Down(1)).LoadAlong(1, Down(1)).Solve();
        double part = x * (1 - (3 * x * x) + (2 * x * x * x)) / 48;
        Printed.Equal("0.0054161", part);
        Assert.Equal(part * Math.Pow(Span, 4) / (E * Tube.Iy), -s.Displacement(1).Z, 1e-9);
        ExpectMoment("281250.0", "58.6259", s.Forces(0).Start);
    }

    [Fact]
    public void Fixed_and_guided_beam()
    {
        FrameSolution s = Beam(1).Hold(0, "111111").Hold(1, "000111").Load(1, Down(P)).Solve();
        Printed.Equal("11.559867", -s.Displacement(1).Z);
        ExpectMoment("750000.0", "156.3356", s.Forces(0).Start);
    }

    [Fact]
    public void End_moment_turns_the_near_end_twice_as_far_as_the_far_end()
    {
        const double Moment = 1e5;
        FrameSolution s = Simple(1).Load(0, Vector3.Zero, new(0, Moment, 0)).Solve();
        Assert.Equal(Moment * Span / (3 * E * Tube.Iy), s.Rotation(0).Y, 1e-12);
        Assert.Equal(-Moment * Span / (6 * E * Tube.Iy), s.Rotation(1).Y, 1e-12);
    }

    [Fact]
    public void Stiffnesses_as_sizing_sees_them()
    {
        Printed.Equal("21.6265", P / -Beam(1).Hold(0, "111111").Load(1, Down(P)).Solve().Displacement(1).Z);
        Printed.Equal("346.0248", P / -Simple(2).Load(1, Down(P)).Solve().Displacement(1).Z);
        Printed.Equal(
            "1384.0990", P / -Beam(2).Hold(0, "111111").Hold(2, "111111").Load(1, Down(P)).Solve().Displacement(1).Z);
        FrameSolution pulled = Beam(1).Hold(0, "111111").Load(1, new(P, 0, 0)).Solve();
        Printed.Equal("63475.25", P / pulled.Displacement(1).X);
        Assert.Equal(P, pulled.Forces(0).Start.N, 1e-9);

        const double Torque = 1e6;
        FrameSolution twisted = Beam(1).Hold(0, "111111").Load(1, Vector3.Zero, new(Torque, 0, 0)).Solve();
        Printed.Equal("12476.8541", Torque / 1e3 / twisted.Rotation(1).X);
        Assert.Equal(Torque, twisted.Forces(0).Start.T, 1e-6);
    }

    // delta = P L3/3EI + P L/(kappa G A), kappa = 0.534892 of Cowper (1966) for 48.3 x 3.2 at nu = 0.3; with an even load
    // w L4/8EI + w L2/(2 kappa G A).
    [Fact]
    public void Shear_deformation_adds_to_bending()
    {
        double shearArea = Tube.ShearAreas(0.3).Z;
        Assert.Equal(0.534892, shearArea / Tube.Area, 5e-7);
        FrameCase tip = new FrameCase(new(0, 0, 0), new(Span, 0, 0))
            .Profile(E, G, Tube.Area, Tube.Iy, Tube.Iz, Tube.J, shearArea).Member(0, 1).Hold(0, "111111");
        Assert.Equal(
            (P * Math.Pow(Span, 3) / (3 * E * Tube.Iy)) + (P * Span / (G * shearArea)),
            -tip.Load(1, Down(P)).Solve().Displacement(1).Z,
            1e-9);

        FrameCase even = new FrameCase(new(0, 0, 0), new(0, Span, 0))
            .Profile(E, G, Tube.Area, Tube.Iy, Tube.Iz, Tube.J, shearArea).Member(0, 1).Hold(0, "111111");
        Assert.Equal(
            (Math.Pow(Span, 4) / (8 * E * Tube.Iy)) + (Span * Span / (2 * G * shearArea)),
            -even.LoadAlong(0, Down(1)).Solve().Displacement(1).Z,
            1e-9);
    }

    // A bracket in plan: arm a along x from the clamp, arm b along y, load down at its end:
    // P a3/3EI + P b3/3EI + P b2 a/(GJ).
    [Fact]
    public void L_bracket_bends_and_twists()
    {
        const double A = 700;
        const double B = 450;
        FrameSolution s = new FrameCase(new(0, 0, 0), new(A, 0, 0), new(A, B, 0))
            .Profile(E, G, Tube.Area, Tube.Iy, Tube.Iz, Tube.J).Member(0, 1).Member(1, 2)
            .Hold(0, "111111").Load(2, Down(P)).Solve();
        double bending = P * (Math.Pow(A, 3) + Math.Pow(B, 3)) / (3 * E * Tube.Iy);
        Assert.Equal(bending + (P * B * B * A / (G * Tube.J)), -s.Displacement(2).Z, 1e-9);

        // The load is at +y of the first arm: seen along x it turns the part beyond clockwise, a negative torque.
        Assert.Equal(-P * B, s.Forces(0).Start.T, 1e-6);
    }

    private static Vector3 Down(double size) => new(0, 0, -size);

    private static FrameCase Simple(int parts) => Beam(parts).Hold(0, "111100").Hold(parts, "011000");

    private static FrameCase Beam(int parts) => BeamAt([.. Enumerable.Range(0, parts + 1).Select(k => Span * k / parts)]);

    private static FrameCase BeamAt(params double[] places)
    {
        FrameCase beam = new FrameCase([.. places.Select(x => new Vector3(x, 0, 0))])
            .Profile(E, G, Tube.Area, Tube.Iy, Tube.Iz, Tube.J);
        for (int k = 0; k + 1 < places.Length; k++)
        {
            beam.Member(k, k + 1);
        }

        return beam;
    }

    private static void ExpectMoment(string moment, string stress, SectionForces forces)
    {
        Printed.Equal(moment, Math.Abs(forces.My));
        Printed.Equal(stress, Math.Abs(forces.My) / Tube.ElasticModulusY);
    }
}
