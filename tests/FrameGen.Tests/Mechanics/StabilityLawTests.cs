using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Stability;
using Xunit;

namespace FrameGen.Tests.Mechanics;

/// <summary>Laws that every buckling factor and every frequency keeps, whatever the frame.</summary>
public class StabilityLawTests
{
    private const double Density = 7.85e-6;

    private static readonly BeamProfile[] Profiles = [FrameSketch.Profile(38, 2), FrameSketch.Profile(20, 1.5)];

    [Fact]
    public void Eight_elements_a_span_have_converged_to_a_thousandth()
    {
        (double[] Factor, double[] Hertz) fine = (Factors(Tower(Identity), 32), Hertz(Tower(Identity), 32));
        (double[] Factor, double[] Hertz) used = (Factors(Tower(Identity), RefinedFrame.ElementsPerSpan), Hertz(Tower(Identity), RefinedFrame.ElementsPerSpan));
        Assert.All(fine.Factor.Zip(used.Factor), pair => Assert.InRange(pair.Second / pair.First, 1 - 1e-5, 1.001));
        Assert.All(fine.Hertz.Zip(used.Hertz), pair => Assert.InRange(pair.Second / pair.First, 1 - 1e-5, 1.001));

        // Fewer would not do: one is off by more.
        Assert.True(Factors(Tower(Identity), 1)[0] / fine.Factor[0] > 1.001);
    }

    // Clamped and pinned beams from slender to stout, the first frequency both ways.
    [Theory]
    [InlineData(4)]
    [InlineData(6)]
    [InlineData(10)]
    [InlineData(30)]
    public void Eight_elements_are_enough_for_stout_spans_too(double diameters)
    {
        foreach (string far in new[] { "111111", "111000", "000000" })
        {
            FrameSketch span = new FrameSketch().Node(0, 0, 0).Node(38 * diameters, 0, 0).Tube(0, 1).Hold(0, "111111").Hold(1, far);
            double[] fine = Modes(span, 64, 2, Density, []);
            double[] used = Modes(span, RefinedFrame.ElementsPerSpan, 2, Density, []);
            Assert.All(fine.Zip(used), pair => Assert.InRange(pair.Second / pair.First, 1 - 1e-6, 1.001));
        }
    }

    [Fact]
    public void Turning_the_frame_changes_nothing()
    {
        double[] upright = [.. Factors(Tower(Identity), 8), .. Hertz(Tower(Identity), 8)];
        double[] turned = [.. Factors(Tower(Turned), 8), .. Hertz(Tower(Turned), 8)];
        Assert.All(upright.Zip(turned), pair => Assert.Equal(pair.First, pair.Second, 1e-7 * pair.First));
    }

    [Fact]
    public void Twice_the_load_halves_the_factor_and_the_other_sign_has_its_own()
    {
        double once = Factor(Tower(Identity), 8, 1)!.Value;
        Assert.Equal(once / 2, Factor(Tower(Identity), 8, 2)!.Value, 1e-8 * once);
        Assert.NotEqual(once, Factor(Tower(Identity), 8, -1)!.Value, 0.01 * once);
    }

    [Fact]
    public void More_mass_is_slower_and_four_times_all_of_it_halves_it()
    {
        double bare = Hertz(Tower(Identity), 8)[0];
        Assert.True(Hertz(Tower(Identity), 8, kg: 5)[0] < bare);
        Assert.Equal(bare / 2, Hertz(Tower(Identity), 8, density: 4 * Density)[0], 1e-8 * bare);
    }

    [Fact]
    public void A_mass_on_an_arm_is_one_on_a_node_at_the_arms_end()
    {
        // A node hung on by an eccentric end, and the same mass with an offset from the node it hangs on.
        Vector3 arm = new(30, -20, 50);
        FrameSketch plain = new FrameSketch().Node(0, 0, 0).Node(600, 0, 0).Tube(0, 1).Hold(0, "111111");
        double withArm = Lowest(plain, new PointMass(1, 3, arm));
        FrameSketch moved = new FrameSketch().Node(0, 0, 0).Node(600 + arm.X, arm.Y, arm.Z).Tube(0, 1, endOffset: -arm).Hold(0, "111111");
        Assert.Equal(withArm, Lowest(moved, new PointMass(1, 3)), 1e-9 * withArm);
        Assert.True(withArm < Lowest(plain, new PointMass(1, 3)));
    }

    [Fact]
    public void A_shape_that_buckles_is_found_where_the_weak_strut_is()
    {
        // Two struts side by side under the same load, one of half the size: it alone bends.
        FrameSketch pair = new FrameSketch().Node(0, 0, 0).Node(0, 0, 1000).Node(300, 0, 0).Node(300, 0, 1000)
            .Tube(0, 1, 0).Tube(2, 3, 1).Hold(0, "111111").Hold(2, "111111");
        var coarse = new BeamFrame(pair.Nodes, pair.Elements);
        FrameSolution statics = pair.Solver().Factor(Profiles).Solve(new BeamLoads([Push(1, -10), Push(3, -10)], []));
        var fine = RefinedFrame.Divide(coarse, 8);
        BucklingMode mode = LinearBuckling.Lowest(
            new FrameSolver(fine.Frame, pair.Restraints).Factor(Profiles), fine.AxialForces(statics))!;
        Assert.Equal(1, mode.Shape.Displacement(3).Length, 1e-9);
        Assert.InRange(mode.Shape.Displacement(1).Length, 0, 1e-6);
    }

    private static NodalLoad Push(int node, double z) => new(node, new Vector3(0, 0, z), Vector3.Zero);

    private static double Lowest(FrameSketch frame, PointMass mass) => Modes(frame, 8, 1, Density, [mass])[0];

    private static Vector3 Identity(Vector3 v) => v;

    // A rotation by three angles, so that no axis stays what it was.
    private static Vector3 Turned(Vector3 v)
    {
        (double s, double c) = Math.SinCos(0.7);
        var first = new Vector3((c * v.X) - (s * v.Y), (s * v.X) + (c * v.Y), v.Z);
        var second = new Vector3(first.X, (c * first.Y) - (s * first.Z), (s * first.Y) + (c * first.Z));
        return new Vector3((c * second.X) + (s * second.Z), second.Y, (c * second.Z) - (s * second.X));
    }

    /// <summary>A small tower on three feet, braced on one side only, one brace past its nodes.</summary>
    private static FrameSketch Tower(Func<Vector3, Vector3> turn)
    {
        var tower = new FrameSketch();
        Vector3[] points =
        [
            new(0, 0, 0), new(500, 0, 0), new(200, 450, 0), new(50, 30, 800), new(450, 30, 800), new(220, 400, 800),
        ];
        foreach (Vector3 point in points.Select(turn))
        {
            tower.Node(point.X, point.Y, point.Z);
        }

        Vector3 beside = turn(new Vector3(0, 25, 0));
        tower.Tube(0, 3).Tube(1, 4).Tube(2, 5).Tube(3, 4, 1).Tube(4, 5, 1).Tube(5, 3, 1);
        return tower.Tube(0, 4, 1, beside, beside).Hold(0, "111111").Hold(1, "111111").Hold(2, "111111");
    }

    private static double[] Factors(FrameSketch tower, int divisions) => [Factor(tower, divisions, 1)!.Value, Factor(tower, divisions, -1)!.Value];

    /// <summary>Pushed down on one corner and sideways on another: some tubes are pressed, some pulled.</summary>
    private static double? Factor(FrameSketch tower, int divisions, double times)
    {
        // The load goes with the tower: its own down is from its top to its foot.
        Vector3 down = (tower.Nodes[0] - tower.Nodes[1]).Cross(tower.Nodes[2] - tower.Nodes[1]).Normalized();
        Vector3 sideways = (tower.Nodes[1] - tower.Nodes[0]).Normalized();
        FrameSolution statics = tower.Solver().Factor(Profiles).Solve(new BeamLoads(
            [new NodalLoad(3, times * 100 * down, Vector3.Zero), new NodalLoad(5, times * 40 * sideways, Vector3.Zero)], []));
        var fine = RefinedFrame.Divide(new BeamFrame(tower.Nodes, tower.Elements), divisions);
        FactoredFrame factored = new FrameSolver(fine.Frame, tower.Restraints).Factor(Profiles);
        BucklingMode? mode = LinearBuckling.Lowest(factored, fine.AxialForces(statics));
        Assert.InRange(mode?.Residual ?? 0, 0, 1e-8);
        return mode?.Factor;
    }

    private static double[] Hertz(FrameSketch tower, int divisions, double kg = 0, double density = Density) =>
        Modes(tower, divisions, 3, density, [new PointMass(5, kg)]);

    private static double[] Modes(FrameSketch frame, int divisions, int count, double density, PointMass[] points)
    {
        var fine = RefinedFrame.Divide(new BeamFrame(frame.Nodes, frame.Elements), divisions);
        FactoredFrame factored = new FrameSolver(fine.Frame, frame.Restraints).Factor(Profiles);
        var mass = new FrameMass([.. fine.Frame.Elements.Select(e => BeamInertia.Of(Profiles[e.Profile], density))], points);
        IReadOnlyList<VibrationMode> modes = NaturalFrequencies.Lowest(factored, mass, count);
        Assert.All(modes, m => Assert.InRange(m.Residual, 0, 1e-8));
        return [.. modes.Select(m => m.Hertz)];
    }
}
