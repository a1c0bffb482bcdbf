using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Tests.Mechanics;

public class FrameSolverTests
{
    // A tube of length L along x, its clamped end's node 60 mm below the axis, its far end's node 80 mm beyond and 50 mm aside,
    // loaded there by F down and H along: by hand, with M the moment at the tube's far end.
    [Fact]
    public void Eccentric_cantilever_worked_by_hand()
    {
        const double Length = 900;
        const double F = 300;
        var frame = new FrameSketch();
        frame.Node(0, 0, -60).Node(Length + 80, 50, 0);
        frame.Tube(0, 1, startOffset: new(0, 0, 60), endOffset: new(-80, -50, 0)).Hold(0, "111111");
        FrameSolution solution = frame.Solve(new NodalLoad(1, new(0, 0, -F), Vector3.Zero));
        BeamProfile p = FrameSketch.Profile(30, 2);
        (double ei, double gj) = (p.E * p.Iy, p.G * p.J);

        // On the tube's end: F down, a torque -50 F about x (r x F with r = (80, 50, 0)) and a moment +80 F about y.
        double slope = (F * Length * Length / (2 * ei)) + (80 * F * Length / ei);
        double twist = -50 * F * Length / gj;
        double sag = (F * Math.Pow(Length, 3) / (3 * ei)) + (F * Length / (p.G * p.ShearAreaZ)) + (80 * F * Length * Length / (2 * ei));
        Assert.Equal(slope, solution.Rotation(1).Y, 1e-12);
        Assert.Equal(twist, solution.Rotation(1).X, 1e-12);
        Assert.Equal(-sag - (80 * slope) + (50 * twist), solution.Displacement(1).Z, 1e-9);

        SectionForces start = solution.Forces(0).Start;
        Assert.Equal(-F, start.Vz, 1e-9);
        Assert.Equal(F * (Length + 80), start.My, 1e-6);
        Assert.Equal(-50 * F, start.T, 1e-6);
        Assert.Equal(80 * F, solution.Forces(0).At(Length).My, 1e-6);

        // The support is 60 mm under the axis: straight below it, so only the arms in plan count.
        (Vector3 force, Vector3 moment) = solution.Reaction(0);
        Assert.Equal(F, force.Z, 1e-9);
        Assert.Equal(50 * F, moment.X, 1e-6);
        Assert.Equal(-F * (Length + 80), moment.Y, 1e-6);
    }

    // Half the load at each end, wherever the nodes are; the fixed tube between stiff offsets keeps its own pL2/12 and pL2/24.
    [Fact]
    public void Even_load_on_an_eccentric_fixed_tube()
    {
        const double Length = 1200;
        const double Load = 0.8;
        var frame = new FrameSketch();
        frame.Node(-30, 0, 40).Node(Length + 25, 10, -15);
        frame.Tube(0, 1, startOffset: new(30, 0, -40), endOffset: new(-25, -10, 15)).Hold(0, "111111").Hold(1, "111111");
        FrameSolution solution = frame.Solver().Factor([FrameSketch.Profile(30, 2)])
            .Solve(new BeamLoads([], [new ElementLoad(0, new(0, 0, -Load))]));
        ElementForces forces = solution.Forces(0);
        Assert.Equal(Load * Length * Length / 12, forces.Start.My, 1e-6);
        Assert.Equal(-Load * Length * Length / 24, forces.At(Length / 2).My, 1e-6);
        Assert.Equal(0, forces.At(Length / 2).Vz, 1e-9);
        Assert.Equal(Load * Length * Length / 12, forces.At(Length).My, 1e-6);

        (Vector3 force, Vector3 moment) = solution.Reaction(0);
        double half = Load * Length / 2;
        Assert.Equal(half, force.Z, 1e-9);

        // Balances half the load 30 mm beyond the node (moment +30 half about y) and the tube's own end moment.
        Assert.Equal(-(30 * half) - (Load * Length * Length / 12), moment.Y, 1e-6);
        Assert.InRange(solution.EquilibriumError, 0, 1e-12);
    }

    // A tube in pieces is one tube: even loads are exact in each.
    [Fact]
    public void Cutting_a_tube_into_pieces_changes_nothing()
    {
        var whole = new FrameSketch().Node(0, 0, 0).Node(700, 500, 300).Tube(0, 1).Hold(0, "111111").Hold(1, "011000");
        var pieces = new FrameSketch();
        for (int k = 0; k <= 7; k++)
        {
            pieces.Node(100 * k, 500.0 * k / 7, 300.0 * k / 7);
            if (k > 0)
            {
                pieces.Tube(k - 1, k);
            }
        }

        pieces.Hold(0, "111111").Hold(7, "011000");
        var even = new Vector3(0.3, -0.2, -0.9);
        FrameSolution one = whole.Solver().Factor([FrameSketch.Profile(30, 2)]).Solve(new BeamLoads([], [new ElementLoad(0, even)]));
        FrameSolution many = pieces.Solver().Factor([FrameSketch.Profile(30, 2)])
            .Solve(new BeamLoads([], [.. Enumerable.Range(0, 7).Select(e => new ElementLoad(e, even))]));
        Assert.InRange((one.Rotation(1) - many.Rotation(7)).Length, 0, 1e-12);
        double third = one.Forces(0).Length * 3 / 7;
        SectionForces expected = one.Forces(0).At(third);
        SectionForces actual = many.Forces(3).Start;
        Assert.Equal(expected.My, actual.My, 1e-6);
        Assert.Equal(expected.Mz, actual.Mz, 1e-6);
        Assert.Equal(expected.N, actual.N, 1e-8);
        Assert.Equal(expected.Vz, actual.Vz, 1e-8);
    }

    [Fact]
    public void Forces_along_a_tube_follow_their_derivatives()
    {
        var forces = new ElementForces(new SectionForces(5, 7, -3, 2, 11, 13), 100, 0.1, -0.2, 0.3);
        const double H = 1e-3;
        (SectionForces a, SectionForces b) = (forces.At(40 - H), forces.At(40 + H));
        SectionForces mid = forces.At(40);
        Assert.Equal(-0.1, (b.N - a.N) / (2 * H), 1e-9);
        Assert.Equal(0.2, (b.Vy - a.Vy) / (2 * H), 1e-9);
        Assert.Equal(-0.3, (b.Vz - a.Vz) / (2 * H), 1e-9);
        Assert.Equal(mid.Vz, (b.My - a.My) / (2 * H), 1e-9);
        Assert.Equal(-mid.Vy, (b.Mz - a.Mz) / (2 * H), 1e-9);
        Assert.Equal(mid.T, forces.Start.T);
    }

    [Fact]
    public void Sideways_loads_bend_about_the_top_line()
    {
        // A cantilever along x pushed towards +y at its end: the +y side is pressed. sigma = -Mz y/Iz, so Mz is positive.
        FrameSolution solution = new FrameSketch().Node(0, 0, 0).Node(1000, 0, 0).Tube(0, 1).Hold(0, "111111")
            .Solve(new NodalLoad(1, new(0, 10, 0), Vector3.Zero));
        Assert.Equal(10, solution.Forces(0).Start.Vy, 1e-9);
        Assert.Equal(10_000, solution.Forces(0).Start.Mz, 1e-6);
        Assert.Equal(0, solution.Forces(0).At(1000).Mz, 1e-6);
    }

    [Fact]
    public void Reused_memory_and_other_threads_change_no_bit()
    {
        FrameSolver solver = SolverTestFrames.Random(7, 14).Solver();
        BeamProfile[][] designs = [.. Enumerable.Range(0, 40).Select(k => new[] { FrameSketch.Profile(20 + k, 1.5), FrameSketch.Profile(25, 2) })];
        BeamLoads loads = SolverTestFrames.Loads(solver.Frame);
        double[] alone = [.. designs.Select(d => solver.Factor(d).Solve(loads).Displacement(3).X)];

        FactoredFrame? factored = null;
        FrameSolution? solution = null;
        for (int k = 0; k < designs.Length; k++)
        {
            factored = solver.Factor(designs[k], factored);
            solution = factored.Solve(loads, solution);
            Assert.Equal(BitConverter.DoubleToInt64Bits(alone[k]), BitConverter.DoubleToInt64Bits(solution.Displacement(3).X));
        }

        double[] together = new double[designs.Length];
        Parallel.For(0, designs.Length, k => together[k] = solver.Factor(designs[k]).Solve(loads).Displacement(3).X);
        Assert.Equal(alone, together);
    }

    [Fact]
    public void Memory_of_another_solver_is_refused()
    {
        FrameSolver one = SolverTestFrames.Random(1, 8).Solver();
        FrameSolver other = SolverTestFrames.Random(1, 8).Solver();
        BeamProfile[] design = [FrameSketch.Profile(20, 2), FrameSketch.Profile(25, 2)];
        FactoredFrame factored = one.Factor(design);
        FrameSolution solution = factored.Solve(new BeamLoads([], []));
        Assert.Throws<ArgumentException>(() => other.Factor(design, factored));
        Assert.Throws<ArgumentException>(() => other.Factor(design).Solve(new BeamLoads([], []), solution));
    }

    [Fact]
    public void Unsound_input_is_refused()
    {
        FrameSketch sketch = new FrameSketch().Node(0, 0, 0).Node(1000, 0, 0).Tube(0, 1).Hold(0, "111111");
        FrameSolver solver = sketch.Solver();
        Assert.Throws<ArgumentException>(() => solver.Factor([]));
        Assert.Throws<ArgumentOutOfRangeException>(() => solver.Factor([FrameSketch.Profile(30, 2) with { E = double.NaN }]));
        FactoredFrame factored = solver.Factor([FrameSketch.Profile(30, 2)]);
        Assert.Throws<ArgumentOutOfRangeException>(
            () => factored.Solve(new BeamLoads([new NodalLoad(2, Vector3.UnitX, Vector3.Zero)], [])));
        Assert.Throws<ArgumentOutOfRangeException>(
            () => factored.Solve(new BeamLoads([], [new ElementLoad(0, new(double.NaN, 0, 0))])));

        BeamElement element = sketch.Elements[0];
        Assert.Throws<ArgumentException>(() => new FrameSolver(new BeamFrame(sketch.Nodes, [element with { End = 0 }]), []));
        Assert.Throws<ArgumentException>(() => new FrameSolver(new BeamFrame(sketch.Nodes, [element with { End = 5 }]), []));
        Assert.Throws<ArgumentException>(
            () => new FrameSolver(new BeamFrame(sketch.Nodes, [element with { Axes = TubeAxes.Along(Vector3.UnitY) }]), []));
        Assert.Throws<ArgumentException>(() => new FrameSolver(new BeamFrame(sketch.Nodes, [element]), [new Restraint(0, [true])]));
    }
}
