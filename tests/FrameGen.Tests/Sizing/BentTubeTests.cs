using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using FrameGen.Sizing.Analysis;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>
/// Bent tubes against the closed forms of curved bars (A. Castigliano): a quarter circle of R = 1000 mm, tube 20 x 2 mm, clamped at one end, F = 100 N at
/// the other; the straights at its ends are next to nothing. With shear and stretch: F∫(N²/EA + κV²/GA) besides bending and torsion.
/// </summary>
public class BentTubeTests
{
    private const double R = 1000;
    private const double F = 100;
    private const double Stub = 0.2;
    private const double E = 210_000;
    private const double G = E / 2.6;

    private static readonly RoundTube Tube = new(20, 2);

    // Half of what a stiffness may be off, since it is one of two figures that are compared.
    private const double Converged = 0.001;

    [Fact]
    public void A_quarter_circle_pushed_in_its_plane_square_to_its_end()
    {
        // From the free end at angle φ: M = FR sin φ, N and V of sizes F sin φ and F cos φ; each squared integral is π/4.
        double expected = F * R * Math.PI / 4 * ((R * R / (E * Tube.Iy)) + (1 / (E * Tube.Area)) + (1 / (G * Shear)));
        SizedFrame sized = Quarter(new Vector3(F, 0, 0));
        Assert.Equal(expected, sized.Cases[0].Displacements[1]!.Value.X, Converged * expected);
    }

    [Fact]
    public void A_quarter_circle_pushed_along_its_end()
    {
        // M = FR(1 − cos φ): ∫(1 − cos φ)² = 3π/4 − 2.
        double expected = (F * R * ((3 * Math.PI / 4) - 2) * R * R / (E * Tube.Iy)) + (F * R * Math.PI / 4 * ((1 / (E * Tube.Area)) + (1 / (G * Shear))));
        SizedFrame sized = Quarter(new Vector3(0, F, 0));
        Assert.Equal(expected, sized.Cases[0].Displacements[1]!.Value.Y, Converged * expected);
    }

    // AFNOR, Guide de validation des progiciels de calcul de structures (1990), SSLL06/89, with its own section and another steel: w = FR³ (π/4EI + (3π/4 − 2)/GJ).
    [Fact]
    public void A_quarter_circle_pushed_out_of_its_plane()
    {
        double expected = (F * R * R * R * ((Math.PI / (4 * E * Tube.Iy)) + (((3 * Math.PI / 4) - 2) / (G * Tube.J)))) + (F * R * Math.PI / 2 / (G * Shear));
        SizedFrame sized = Quarter(new Vector3(0, 0, F));
        Assert.Equal(expected, sized.Cases[0].Displacements[1]!.Value.Z, Converged * expected);

        // 15 degrees from the clamp: torsion FR(1 − cos 75°), bending FR sin 75°; published 74.1180 and 96.5925 N.m.
        TubeDiagram diagram = sized.Cases[0].Tubes[0].Diagram;
        var there = diagram.At(Stub + (R * Math.PI / 12));
        Assert.Equal(74.1181, Math.Abs(there.T) / 1000, 0.02);
        Assert.Equal(96.5926, Math.Abs(there.My) / 1000, 0.02);
        Assert.Equal(F, Math.Abs(there.Vz), 1e-6);
        Assert.Equal(0, there.Mz, 1e-3);
        Assert.Equal(0, there.N, 1e-6);
    }

    // Twice as many chords leave a quarter of the error; those in use are within a thousandth.
    [Theory]
    [InlineData(1, 0, 0)]
    [InlineData(0, 1, 0)]
    [InlineData(0, 0, 1)]
    public void Chords_close_on_the_arc(double x, double y, double z)
    {
        double inPlane = ((R * R / (E * Tube.Iy)) + (1 / (E * Tube.Area)) + (1 / (G * Shear))) * Math.PI / 4;
        double across = (((3 * Math.PI / 4) - 2) * R * R / (E * Tube.Iy)) + (((1 / (E * Tube.Area)) + (1 / (G * Shear))) * Math.PI / 4);
        double outOfPlane = (R * R * ((Math.PI / (4 * E * Tube.Iy)) + (((3 * Math.PI / 4) - 2) / (G * Tube.J)))) + (Math.PI / 2 / (G * Shear));
        double expected = F * R * ((x * inPlane) + (y * across) + (z * outOfPlane));
        Vector3 push = F * new Vector3(x, y, z);
        int used = (int)Math.Round(Math.PI / 2 / ArcChord.LargestAngle);
        double[] errors = [.. new[] { used / 2, used, 2 * used }.Select(n => (Chain(n).Dot(push) / F / expected) - 1)];
        Assert.InRange(Math.Abs(errors[1]), 0, 0.001);
        Assert.All(errors.Zip(errors.Skip(1)), pair => Assert.InRange(pair.First / pair.Second, 3.5, 4.5));

        // From the clamp at (0, 0) along x, round to y.
        Vector3 Chain(int chords)
        {
            Vector3[] points = [.. Enumerable.Range(0, chords + 1).Select(k => Math.PI / 2 * k / chords).Select(a => R * new Vector3(Math.Sin(a), 1 - Math.Cos(a), 0))];
            BeamElement[] elements =
                [.. Enumerable.Range(0, chords).Select(k => new BeamElement(k, k + 1, Vector3.Zero, Vector3.Zero, TubeAxes.Along(points[k + 1] - points[k]), 0))];
            var solver = new FrameSolver(new BeamFrame(points, elements), [new Restraint(0, [true, true, true, true, true, true])]);
            return solver.Factor([new BeamProfile(E, G, Tube.Area, Tube.Iy, Tube.Iz, Tube.J, Shear, Shear)])
                .Solve(new BeamLoads([new NodalLoad(chords, push, Vector3.Zero)], [])).Displacement(chords);
        }
    }

    [Fact]
    public void Along_a_bend_thrust_turns_into_shear()
    {
        // The push F at the free end is shear there and thrust at the clamp; at angle φ from the clamp N = −F sin... by components of one force.
        TubeDiagram diagram = Quarter(new Vector3(F, 0, 0)).Cases[0].Tubes[0].Diagram;
        foreach (double degrees in new[] { 1.5, 17, 44.2, 80 })
        {
            double angle = degrees * Math.PI / 180;
            var there = diagram.At(Stub + (R * angle));
            Assert.Equal(F * Math.Cos(angle), there.N, 1e-6);
            Assert.Equal(F * Math.Sin(angle), Math.Abs(there.Vy), 1e-6);
            Assert.Equal(F * R * Math.Cos(angle), Math.Abs(there.Mz), 0.3 * F);
        }
    }

    [Fact]
    public void The_worst_stress_of_a_bend_is_that_of_its_largest_moment()
    {
        // Clamp: M = FR and N = F, both at once.
        double expected = (F * R / Tube.ElasticModulusY) + (F / Tube.Area);
        TubeForces forces = Quarter(new Vector3(F, 0, 0)).Cases[0].Tubes[0];
        Assert.Equal(expected, forces.MaxStress, 0.001 * expected);
        Assert.InRange(forces.MaxStressAt, 0, Stub + 1);
        Assert.InRange(forces.Use!.Value.Shares.Bending, 0.98, 1);
    }

    [Fact]
    public void It_weighs_what_its_true_length_does()
    {
        FrameBuilder builder = Sketch().MassAlong("bow", 3);
        SizedFrame sized = builder.Case("weight", new Vector3(0, 0, -1)).Case("line", Vector3.Zero, builder.Line("bow", 0, -0.2, 0)).Size();
        double length = (R * Math.PI / 2) + (2 * Stub);
        double weight = 9.80665 * ((7850e-9 * Tube.Area * length) + 3);
        Assert.Equal(weight, sized.Cases[0].Reactions[0].Force.Z, 1e-9 * weight);
        Assert.Equal(0.2 * length, sized.Cases[1].Reactions[0].Force.Y, 1e-8);
        Assert.Equal(7850e-9 * Tube.Area * length, sized.MassKg, 1e-9);
    }

    [Fact]
    public void Loads_stand_at_places_along_the_axis()
    {
        // Half way round, in the bend: the arm to the clamp is R sin 45° one way and R (1 − cos 45°) the other.
        FrameBuilder builder = Sketch();
        SizedFrame sized = builder.Case("half", Vector3.Zero, builder.Point("bow", Stub + (R * Math.PI / 4), 0, 0, F)).Size();
        (Vector3 force, Vector3 moment) = sized.Cases[0].Reactions[0];
        Assert.Equal(-F, force.Z, 1e-8);
        Assert.Equal(-F * R * (1 - Math.Cos(Math.PI / 4)), moment.X, 0.01);
        Assert.Equal(F * ((R * Math.Sin(Math.PI / 4)) + Stub), moment.Y, 0.01);
    }

    // A ring pressed evenly from outside by loads that keep their direction buckles into two waves, w = cos 2φ with v = -sin 2φ/2 so that nothing stretches: bending
    // EI 9/R⁴ against N (3/2R)², N = 4EI/R², softened by shear as F. Engesser's column is. (A fluid's pressure turns with the wall and needs 3EI/R² only: S. Timoshenko,
    // J. Gere, Theory of Elastic Stability (1961), section 7.3.) Held at the ends of its four tubes along itself, where the waves have it stand still.
    [Fact]
    public void A_ring_of_bends_buckles_into_two_waves()
    {
        const int Loads = 30;
        const double Step = Math.PI / 2 / Loads;
        FrameBuilder builder = new FrameBuilder().Fixed("tubes", new FlatSidedTube(60, 20, 2));
        Vector3[] quarters = [Vector3.UnitX, Vector3.UnitZ, -Vector3.UnitX, -Vector3.UnitZ];
        for (int i = 0; i < 4; i++)
        {
            Vector3 place = R * quarters[i];
            builder.Node($"n{i}", place.X, place.Y, place.Z);
        }

        List<object> loads = [];
        for (int i = 0; i < 4; i++)
        {
            (Vector3 from, Vector3 to) = (quarters[i], quarters[(i + 1) % 4]);
            builder.Tube($"t{i}", $"n{i}", $"n{(i + 1) % 4}", "tubes").Bend($"t{i}", R - Stub, R * (from + to)).Up($"t{i}", Vector3.UnitY)
                .Hold($"n{i}", i % 2 == 0 ? ["z", "y", "rx", "rz"] : ["x", "y", "rx", "rz"]);
            for (int k = 0; k < Loads; k++)
            {
                double angle = (k + 0.5) * Step;
                Vector3 push = -R * Step * ((Math.Cos(angle) * from) + (Math.Sin(angle) * to));
                loads.Add(builder.Point($"t{i}", Stub + ((R - Stub) * angle), push.X, push.Y, push.Z));
            }
        }

        Section section = new FlatSidedTube(60, 20, 2);
        double bending = 4 * E * section.Iz / (R * R);
        double expected = bending / (1 + (bending / (G * section.ShearAreas(0.3).Y)));
        SizedFrame sized = builder.Case("pressure", Vector3.Zero, [.. loads]).Size();
        Assert.All(sized.Cases[0].Tubes, t => Assert.Equal(-R, t.AxialFrom, 1e-3 * R));
        Assert.Equal(expected, R * sized.Cases[0].BucklingFactor!.Value, Converged * expected);
    }

    private static double Shear => Tube.ShearAreas(0.3).Y;

    // From the clamp at (0, 0, 0) along x, round to y.
    private static FrameBuilder Sketch() => new FrameBuilder().Fixed("tubes", Tube)
        .Node("clamp", 0, 0, 0).Node("free", R + Stub, R + Stub, 0).Tube("bow", "clamp", "free", "tubes").Bend("bow", R, new Vector3(R + Stub, 0, 0)).Clamp("clamp");

    private static SizedFrame Quarter(Vector3 force)
    {
        FrameBuilder builder = Sketch();
        return builder.Case("push", Vector3.Zero, builder.Force("free", force.X, force.Y, force.Z)).Size();
    }
}
