using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using Xunit;

namespace FrameGen.Tests.Mechanics;

/// <summary>Very stiff next to very soft: what the solver says of its own error, and what it still gets right.</summary>
public class ResidualTests
{
    private const double L = 700;

    private static readonly Vector3 Axis = new Vector3(2, 1, 2).Normalized();

    private static readonly Vector3 Load = new(30, -50, -5);

    // A cantilever of a soft tube that carries a stiff one with the load at its end. The whole is statically determinate, so that the forces are
    // known, and the displacement is the soft tube's, (1/3 + 1 + 1) PL³/EI, and a sliver of the stiff one's.
    [Theory]
    [InlineData(1e3)]
    [InlineData(1e6)]
    [InlineData(1e9)]
    public void A_stiff_arm_on_a_soft_one_keeps_its_forces(double ratio)
    {
        FrameSolution solution = StiffOnSoft(ratio);
        Assert.InRange(solution.BackwardError, 0, 1e-11);
        Assert.InRange(solution.EquilibriumError, 0, 1e-10);
        ExpectRight(solution, ratio);
    }

    // Beyond what doubles hold an answer is right, or says that it isn't, or there is none.
    [Theory]
    [InlineData(1e10)]
    [InlineData(1e11)]
    [InlineData(1e12)]
    [InlineData(1e14)]
    [InlineData(1e18)]
    public void No_wrong_answer_passes_for_a_right_one(double ratio)
    {
        FrameSolution solution;
        try
        {
            solution = StiffOnSoft(ratio);
        }
        catch (MechanismException)
        {
            return;
        }

        if (solution.BackwardError <= 1e-9 && solution.EquilibriumError <= 1e-9)
        {
            ExpectRight(solution, ratio);
        }
        else
        {
            Assert.InRange(solution.WorstNode, 1, 2);
        }
    }

    private static FrameSolution StiffOnSoft(double ratio)
    {
        BeamProfile soft = FrameSketch.Profile(20, 1.5) with { ShearAreaY = double.PositiveInfinity, ShearAreaZ = double.PositiveInfinity };
        BeamProfile stiff = soft with { E = ratio * soft.E, G = ratio * soft.G };
        Vector3 along = L * Axis;
        var sketch = new FrameSketch().Node(0, 0, 0).Node(along.X, along.Y, along.Z).Node(2 * along.X, 2 * along.Y, 2 * along.Z);
        sketch.Tube(0, 1, 0).Tube(1, 2, 1).Hold(0, "111111");
        return sketch.Solver().Factor([soft, stiff]).Solve(new BeamLoads([new NodalLoad(2, Load, Vector3.Zero)], []));
    }

    private static void ExpectRight(FrameSolution solution, double ratio)
    {
        BeamProfile soft = FrameSketch.Profile(20, 1.5);
        Vector3 across = Load - (Load.Dot(Axis) * Axis);
        double k = L * L * L / (soft.E * soft.Iy);
        Vector3 bent = k * ((7.0 / 3) + (1 / (3 * ratio))) * across;
        Vector3 stretched = L / (soft.E * soft.Area) * (1 + (1 / ratio)) * Load.Dot(Axis) * Axis;
        Assert.InRange((solution.Displacement(2) - bent - stretched).Length / bent.Length, 0, 1e-9);

        ElementForces inStiff = solution.Forces(1);
        Assert.Equal(Load.Dot(Axis), inStiff.Start.N, 1e-7);
        Assert.Equal(L * across.Length, Math.Sqrt((inStiff.Start.My * inStiff.Start.My) + (inStiff.Start.Mz * inStiff.Start.Mz)), 1e-6 * L);
        Assert.Equal(0, inStiff.Start.T, 1e-6);
    }

    // A beam on springs so soft that it all but floats: what the springs carry is known, and the beam bends as one on two supports does.
    [Theory]
    [InlineData(1)]
    [InlineData(1e-4)]
    [InlineData(1e-6)]
    public void A_frame_that_all_but_floats_balances(double rate)
    {
        var sketch = new FrameSketch().Node(0, 0, 0).Node(500, 0, 0).Node(1000, 0, 0).Tube(0, 1).Tube(1, 2);
        foreach (int node in new[] { 0, 2 })
        {
            sketch.Restraints.Add(new Restraint(node, new bool[6]) { Springs = [rate, rate, rate, 1e6 * rate, 0, 0] });
        }

        FrameSolution solution = sketch.Solve(new NodalLoad(1, new Vector3(0, 0, -100), Vector3.Zero));
        Assert.InRange(solution.BackwardError, 0, 1e-9);
        Assert.Equal(50, solution.Reaction(0).Force.Z, 1e-6);
        Assert.Equal(-25_000, solution.Forces(0).At(500).My, 1e-3);
    }

    [Fact]
    public void Springs_on_held_freedoms_do_nothing()
    {
        var sketch = new FrameSketch().Node(0, 0, 0).Node(400, 0, 0).Tube(0, 1).Hold(0, "111111");
        sketch.Restraints.Add(new Restraint(0, new bool[6]) { Springs = [1, 1, 1, 1, 1, 1] });
        FrameSolution solution = sketch.Solve(new NodalLoad(1, new Vector3(0, 0, -10), Vector3.Zero));
        Assert.Equal(10, solution.Reaction(0).Force.Z, 1e-9);
    }

    [Theory]
    [InlineData(-1.0)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void Refuses_a_rate_that_is_no_spring(double rate)
    {
        var sketch = new FrameSketch().Node(0, 0, 0).Node(400, 0, 0).Tube(0, 1);
        sketch.Restraints.Add(new Restraint(0, new bool[6]) { Springs = [rate, 1, 1, 1, 1, 1] });
        Assert.Throws<ArgumentException>(sketch.Solver);
    }

    [Fact]
    public void A_joint_that_every_tube_is_hinged_to_can_turn()
    {
        var sketch = new FrameSketch().Node(0, 0, 0).Node(400, 0, 0).Node(800, 0, 0).Tube(0, 1).Tube(1, 2).Hold(0, "111111").Hold(2, "111111");
        sketch.Elements[0] = sketch.Elements[0] with { Hinges = Hinges.EndY };
        sketch.Elements[1] = sketch.Elements[1] with { Hinges = Hinges.StartY };
        MechanismException mechanism = Assert.Throws<MechanismException>(() => sketch.Solver().Factor([FrameSketch.Profile(30, 2)]));
        Mechanism motion = Assert.Single(mechanism.Motions);
        Assert.Equal([1], motion.Nodes);
        Assert.Equal(1, Math.Abs(motion.TurnsAbout!.Value.Y), 1e-9);
    }

    [Fact]
    public void Three_hinges_in_line_can_sag()
    {
        var sketch = new FrameSketch().Node(0, 0, 0).Node(400, 0, 0).Node(800, 0, 0).Tube(0, 1).Tube(1, 2).Hold(0, "110111").Hold(2, "011111");
        sketch.Elements[0] = sketch.Elements[0] with { Hinges = Hinges.StartY };
        sketch.Elements[1] = sketch.Elements[1] with { Hinges = Hinges.StartY | Hinges.EndY };
        MechanismException mechanism = Assert.Throws<MechanismException>(() => sketch.Solver().Factor([FrameSketch.Profile(30, 2)]));
        Assert.NotEmpty(mechanism.Motions);
        Assert.Contains(mechanism.Motions, m => m.Nodes.Contains(1));
    }
}
