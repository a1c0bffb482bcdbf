using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using Xunit;

namespace FrameGen.Tests.Mechanics;

public class AxisMotionTests
{
    private const double Length = 900;

    private static readonly BeamProfile Profile = FrameSketch.Profile(30, 2);

    // Closed forms of the Timoshenko cantilever: w = p x² (6L² − 4Lx + x²)/(24 EI) + p (Lx − x²/2)/(G A), slope p x (3L² − 3Lx + x²)/(6 EI);
    // a rod that hangs from its end: u = p (Lx − x²/2)/(E A). From the beam's equations, by hand.
    [Theory]
    [InlineData(0)]
    [InlineData(0.2)]
    [InlineData(0.5)]
    [InlineData(0.85)]
    [InlineData(1)]
    public void A_cantilever_under_an_even_load_bends_as_the_closed_form(double share)
    {
        const double P = 0.7;
        FrameSketch sketch = new FrameSketch().Node(0, 0, 0).Node(Length, 0, 0).Tube(0, 1).Hold(0, "111111");
        FactoredFrame frame = sketch.Solver().Factor([Profile]);
        double x = share * Length;
        double saddle = (Length * x) - (0.5 * x * x);
        double bending = P * x * x * ((6 * Length * Length) - (4 * Length * x) + (x * x)) / (24 * Profile.E * Profile.Iy);
        double slope = P * x * ((3 * Length * Length) - (3 * Length * x) + (x * x)) / (6 * Profile.E * Profile.Iy);

        AxisMotion down = At(sketch, frame.Solve(Even(new Vector3(0, 0, -P))), 0, share);
        Near(new Vector3(0, 0, -bending - (P * saddle / (Profile.G * Profile.ShearAreaZ))), down.Shift);
        Near(new Vector3(0, slope, 0), down.Turn);

        AxisMotion aside = At(sketch, frame.Solve(Even(new Vector3(0, P, 0))), 0, share);
        Near(new Vector3(0, bending + (P * saddle / (Profile.G * Profile.ShearAreaY)), 0), aside.Shift);
        Near(new Vector3(0, 0, slope), aside.Turn);

        AxisMotion along = At(sketch, frame.Solve(Even(new Vector3(P, 0, 0))), 0, share);
        Near(new Vector3(P * saddle / (Profile.E * Profile.Area), 0, 0), along.Shift);
    }

    [Fact]
    public void A_place_within_an_element_moves_as_the_node_that_divides_it()
    {
        const double Share = 0.3;
        Vector3 load = new(0.1, -0.4, 0.3);
        Vector3 middle = Share * new Vector3(500, 300, 200);
        FrameSketch whole = new FrameSketch().Node(0, 0, 0).Node(500, 300, 200).Node(500, 300, 900).Tube(0, 1).Tube(1, 2).Hold(0, "111111");
        FrameSketch divided = new FrameSketch().Node(0, 0, 0).Node(500, 300, 200).Node(500, 300, 900).Node(middle.X, middle.Y, middle.Z)
            .Tube(1, 2).Tube(0, 3).Tube(3, 1).Hold(0, "111111");
        NodalLoad[] pull = [new(2, new Vector3(100, 50, -80), new Vector3(2e4, 1e4, -3e4))];
        FrameSolution one = Solve(whole, new BeamLoads(pull, [new(0, load)]));
        FrameSolution two = Solve(divided, new BeamLoads(pull, [new(1, load), new(2, load)]));

        AxisMotion motion = At(whole, one, 0, Share);
        Near(two.Displacement(3), motion.Shift);
        Near(two.Rotation(3), motion.Turn);
        Near(one.Displacement(1), At(whole, one, 0, 1).Shift);
        Near(one.Rotation(1), At(whole, one, 0, 1).Turn);
    }

    // A span hinged at both of its ends to stiff stubs sags as a simple beam, 5 p L⁴/(384 EI) + p L²/(8 GA) in the middle, p L³/(24 EI) steep at its ends
    // (Roark's Formulas for Stress and Strain, table of beams, from memory; the shear term by hand), whatever the stubs' ends do.
    [Fact]
    public void A_hinged_element_bends_between_its_hinges()
    {
        const double P = 0.7;
        FrameSketch sketch = new FrameSketch().Node(0, 0, 0).Node(Length, 0, 0).Hold(0, "111111").Hold(1, "111111");
        var hinged = new BeamElement(0, 1, Vector3.Zero, Vector3.Zero, TubeAxes.Along(Vector3.UnitX), 0) { Hinges = Hinges.StartY | Hinges.StartZ | Hinges.EndY | Hinges.EndZ };
        sketch.Elements.Add(hinged);
        FrameSolution solution = Solve(sketch, Even(new Vector3(0, 0, -P)));
        double sag = (5 * P * Math.Pow(Length, 4) / (384 * Profile.E * Profile.Iy)) + (P * Length * Length / (8 * Profile.G * Profile.ShearAreaZ));
        Near(new Vector3(0, 0, -sag), At(sketch, solution, 0, 0.5).Shift);
        Near(new Vector3(0, P * Math.Pow(Length, 3) / (24 * Profile.E * Profile.Iy), 0), At(sketch, solution, 0, 0).Turn);
    }

    [Fact]
    public void An_offset_end_moves_with_its_node_as_a_rigid_arm()
    {
        Vector3 arm = new(0, 25, -40);
        FrameSketch sketch = new FrameSketch().Node(0, 0, 0).Node(Length, 0, 0).Tube(0, 1, endOffset: arm).Hold(0, "111111");
        FrameSolution solution = Solve(sketch, new BeamLoads([new(1, new Vector3(10, -20, 30), new Vector3(1e4, 2e4, -1e4))], []));
        AxisMotion end = At(sketch, solution, 0, 1);
        Near(solution.Displacement(1) + solution.Rotation(1).Cross(arm), end.Shift);
        Near(solution.Rotation(1), end.Turn);
    }

    [Fact]
    public void Places_beyond_the_element_are_refused()
    {
        FrameSketch sketch = new FrameSketch().Node(0, 0, 0).Node(0, 0, 100).Tube(0, 1).Hold(0, "111111");
        FrameSolution solution = Solve(sketch, new BeamLoads([], []));
        Assert.Throws<ArgumentOutOfRangeException>(() => At(sketch, solution, 0, 1.01));
        Assert.Throws<ArgumentOutOfRangeException>(() => At(sketch, solution, 0, double.NaN));
    }

    private static FrameSolution Solve(FrameSketch sketch, BeamLoads loads) => sketch.Solver().Factor([Profile]).Solve(loads);

    private static AxisMotion At(FrameSketch sketch, FrameSolution solution, int element, double share) =>
        AxisMotion.At(new BeamFrame(sketch.Nodes, sketch.Elements), solution, element, in Profile, share);

    private static BeamLoads Even(Vector3 perLength) => new([], [new ElementLoad(0, perLength)]);

    private static void Near(Vector3 expected, Vector3 actual) =>
        Assert.True((expected - actual).Length <= 1e-9 * Math.Max(1, expected.Length), $"{expected} and {actual}");
}
