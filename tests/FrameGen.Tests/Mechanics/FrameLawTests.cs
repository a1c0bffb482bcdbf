using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using Xunit;

namespace FrameGen.Tests.Mechanics;

/// <summary>Laws that hold for any frame, sampled repeatably.</summary>
public class FrameLawTests
{
    private static readonly BeamProfile[] Design = [FrameSketch.Profile(35, 2), FrameSketch.Profile(25, 1.5)];

    public static TheoryData<ulong, int> Samples()
    {
        var samples = new TheoryData<ulong, int>();
        for (int k = 0; k < 12; k++)
        {
            samples.Add((ulong)(100 + k), 4 + (3 * k));
        }

        return samples;
    }

    [Theory]
    [MemberData(nameof(Samples))]
    public void Reactions_balance_loads(ulong seed, int nodes)
    {
        FrameSolver solver = SolverTestFrames.Random(seed, nodes).Solver();
        BeamLoads loads = SolverTestFrames.Loads(solver.Frame);
        FrameSolution solution = solver.Factor(Design).Solve(loads);
        Vector3 sum = Vector3.Zero;
        Vector3 moment = Vector3.Zero;
        for (int node = 0; node < nodes; node++)
        {
            (Vector3 f, Vector3 m) = solution.Reaction(node);
            NodalLoad load = loads.NodalLoads[node];
            sum += f + load.Force;
            moment += m + load.Moment + solver.Frame.Nodes[node].Cross(f + load.Force);
        }

        foreach (ElementLoad load in loads.ElementLoads)
        {
            BeamElement e = solver.Frame.Elements[load.Element];
            Vector3 start = solver.Frame.Nodes[e.Start] + e.StartOffset;
            Vector3 end = solver.Frame.Nodes[e.End] + e.EndOffset;
            Vector3 total = (end - start).Length * load.PerLength;
            sum += total;
            moment += (0.5 * (start + end)).Cross(total);
        }

        Assert.InRange(sum.Length, 0, 1e-7);
        Assert.InRange(moment.Length, 0, 1e-3);
        Assert.InRange(solution.EquilibriumError, 0, 1e-11);
        Assert.InRange(solution.BackwardError, 0, 1e-11);
    }

    // Each property adds to the stiffness matrix what no motion can make negative, so the loads' work, f u, only falls as it grows.
    [Theory]
    [MemberData(nameof(Samples))]
    public void No_property_of_a_section_makes_a_frame_softer_as_it_grows(ulong seed, int nodes)
    {
        FrameSolver solver = SolverTestFrames.Random(seed, nodes).Solver();
        var loads = new BeamLoads(SolverTestFrames.Loads(solver.Frame).NodalLoads, []);
        double before = Work(Design);
        BeamProfile one = Design[0];
        BeamProfile[] stouter =
        [
            one with { Area = 1.3 * one.Area },
            one with { Iy = 1.3 * one.Iy },
            one with { Iz = 1.3 * one.Iz },
            one with { J = 1.3 * one.J },
            one with { ShearAreaY = 1.3 * one.ShearAreaY },
            one with { ShearAreaZ = 1.3 * one.ShearAreaZ },
        ];
        Assert.All(stouter, profile => Assert.InRange(Work([profile, Design[1]]), 0, before * (1 + 1e-12)));
        Assert.InRange(Work([one with { Iy = 1.3 * one.Iy, Iz = 1.3 * one.Iz }, Design[1]]), 0, before * (1 - 1e-6));

        // All of them together, in every tube: the whole matrix grows by that factor.
        Assert.Equal(before / 1.3, Work([.. Design.Select(p => p with { E = 1.3 * p.E, G = 1.3 * p.G })]), 1e-9 * before);

        double Work(BeamProfile[] design)
        {
            FrameSolution solution = solver.Factor(design).Solve(loads);
            return loads.NodalLoads.Sum(l => l.Force.Dot(solution.Displacement(l.Node)) + l.Moment.Dot(solution.Rotation(l.Node)));
        }
    }

    [Theory]
    [MemberData(nameof(Samples))]
    public void Held_freedoms_stay_and_free_ones_get_no_reaction(ulong seed, int nodes)
    {
        FrameSolver solver = SolverTestFrames.Random(seed, nodes).Solver();
        FrameSolution solution = solver.Factor(Design).Solve(SolverTestFrames.Loads(solver.Frame));
        Assert.Equal(Vector3.Zero, solution.Displacement(0));
        Assert.Equal(Vector3.Zero, solution.Reaction(0).Moment);
        Assert.NotEqual(Vector3.Zero, solution.Reaction(0).Force);
        Assert.Equal((0.0, 0.0, 0.0), (solution.Displacement(1).Y, solution.Displacement(1).Z, solution.Rotation(1).X));
        Assert.Equal((0.0, 0.0), (solution.Reaction(1).Force.X, solution.Reaction(1).Moment.Y));
        Assert.Equal((Vector3.Zero, Vector3.Zero), (solution.Displacement(2), solution.Rotation(2)));
        Assert.Equal((Vector3.Zero, Vector3.Zero), solution.Reaction(3));
    }

    [Theory]
    [MemberData(nameof(Samples))]
    public void Load_sets_add_up(ulong seed, int nodes)
    {
        FrameSolver solver = SolverTestFrames.Random(seed, nodes).Solver();
        BeamLoads all = SolverTestFrames.Loads(solver.Frame);
        FactoredFrame factored = solver.Factor(Design);
        FrameSolution both = factored.Solve(all);
        FrameSolution onNodes = factored.Solve(all with { ElementLoads = [] });
        FrameSolution onTubes = factored.Solve(all with { NodalLoads = [] });
        for (int node = 0; node < nodes; node++)
        {
            Vector3 sum = onNodes.Displacement(node) + onTubes.Displacement(node);
            Assert.InRange((both.Displacement(node) - sum).Length, 0, 1e-9 * Math.Max(1, sum.Length));
        }
    }

    // Maxwell and Betti: A moves at B's place under B as far as B moves at A's place under A.
    [Theory]
    [MemberData(nameof(Samples))]
    public void Displacements_are_reciprocal(ulong seed, int nodes)
    {
        FrameSolver solver = SolverTestFrames.Random(seed, nodes).Solver();
        FactoredFrame factored = solver.Factor(Design);
        (Vector3 along, Vector3 about) = (new Vector3(1, -2, 0.5), new Vector3(3, 1, 2));
        int last = nodes - 1;
        FrameSolution pushed = factored.Solve(new BeamLoads([new NodalLoad(last, 1000 * along, Vector3.Zero)], []));
        FrameSolution turned = factored.Solve(new BeamLoads([new NodalLoad(3, Vector3.Zero, 1000 * about)], []));
        double a = pushed.Rotation(3).Dot(about);
        double b = turned.Displacement(last).Dot(along);
        Assert.Equal(a, b, 1e-10 * Math.Max(1, Math.Abs(a)));
    }

    // The whole frame turned by an arbitrary rotation, its top lines, offsets and loads with it; supports held altogether.
    [Theory]
    [MemberData(nameof(Samples))]
    public void Turning_the_whole_frame_turns_the_answer(ulong seed, int nodes)
    {
        FrameSketch sketch = SolverTestFrames.Random(seed, nodes);
        sketch.Restraints.Clear();
        sketch.Hold(0, "111111").Hold(1, "111111").Hold(2, "111111");
        FrameSolver solver = sketch.Solver();
        BeamLoads loads = SolverTestFrames.Loads(solver.Frame);
        var turnedFrame = new BeamFrame(
            [.. sketch.Nodes.Select(p => Turn(p) + new Vector3(300, -200, 100))],
            [.. sketch.Elements.Select(e => e with
            {
                StartOffset = Turn(e.StartOffset), EndOffset = Turn(e.EndOffset), Axes = TubeAxes.Along(Turn(e.Axes.X), Turn(e.Axes.Z)),
            })]);
        var turnedLoads = new BeamLoads(
            [.. loads.NodalLoads.Select(l => new NodalLoad(l.Node, Turn(l.Force), Turn(l.Moment)))],
            [.. loads.ElementLoads.Select(l => new ElementLoad(l.Element, Turn(l.PerLength)))]);
        FrameSolution before = solver.Factor(Design).Solve(loads);
        FrameSolution after = new FrameSolver(turnedFrame, sketch.Restraints).Factor(Design).Solve(turnedLoads);
        double largest = Enumerable.Range(0, nodes).Max(k => before.Displacement(k).Length);
        for (int node = 0; node < nodes; node++)
        {
            Assert.InRange((Turn(before.Displacement(node)) - after.Displacement(node)).Length, 0, 1e-9 * largest);
        }

        for (int e = 0; e < sketch.Elements.Count; e++)
        {
            Assert.Equal(before.Forces(e).Start.My, after.Forces(e).Start.My, 1e-3);
            Assert.Equal(before.Forces(e).Start.N, after.Forces(e).Start.N, 1e-5);
        }
    }

    // Round tubes have no favourite direction: where the top line is makes no difference to displacements.
    [Theory]
    [MemberData(nameof(Samples))]
    public void The_top_line_of_round_tubes_does_not_matter(ulong seed, int nodes)
    {
        FrameSketch sketch = SolverTestFrames.Random(seed, nodes);
        BeamElement[] rolled = [.. sketch.Elements.Select((e, k) => e with { Axes = TubeAxes.Along(e.Axes.X, e.Axes.Radial(0.7 * k)) })];
        BeamLoads loads = SolverTestFrames.Loads(new BeamFrame(sketch.Nodes, sketch.Elements));
        FrameSolution one = sketch.Solver().Factor(Design).Solve(loads);
        FrameSolution two = new FrameSolver(new BeamFrame(sketch.Nodes, rolled), sketch.Restraints).Factor(Design).Solve(loads);
        for (int node = 0; node < nodes; node++)
        {
            Assert.InRange((one.Displacement(node) - two.Displacement(node)).Length, 0, 1e-9 * Math.Max(1, one.Displacement(node).Length));
        }
    }

    // The same tube drawn from its other end.
    [Theory]
    [MemberData(nameof(Samples))]
    public void Swapping_a_tubes_ends_changes_nothing(ulong seed, int nodes)
    {
        FrameSketch sketch = SolverTestFrames.Random(seed, nodes);
        BeamElement[] swapped =
        [
            .. sketch.Elements.Select(e => new BeamElement(
                e.End, e.Start, e.EndOffset, e.StartOffset, TubeAxes.Along(-e.Axes.X, e.Axes.Z), e.Profile)),
        ];
        BeamLoads loads = SolverTestFrames.Loads(new BeamFrame(sketch.Nodes, sketch.Elements));
        FrameSolution one = sketch.Solver().Factor(Design).Solve(loads);
        FrameSolution two = new FrameSolver(new BeamFrame(sketch.Nodes, swapped), sketch.Restraints).Factor(Design).Solve(loads);
        for (int e = 0; e < swapped.Length; e++)
        {
            ElementForces forward = one.Forces(e);
            ElementForces backward = two.Forces(e);
            Assert.Equal(forward.Start.N, backward.At(backward.Length).N, 1e-5);
            Assert.Equal(forward.Start.T, backward.At(backward.Length).T, 1e-3);

            // Local y turns round with x; the other part's action changes sides: My keeps its sign with z, Mz turns twice.
            Assert.Equal(forward.Start.My, backward.At(backward.Length).My, 1e-3);
            Assert.Equal(forward.Start.Mz, -backward.At(backward.Length).Mz, 1e-3);
        }
    }

    // Stiffer tubes never let the loads sink further: work f·u falls with every property.
    [Theory]
    [MemberData(nameof(Samples))]
    public void Compliance_falls_with_every_stiffness(ulong seed, int nodes)
    {
        FrameSolver solver = SolverTestFrames.Random(seed, nodes).Solver();
        BeamLoads loads = SolverTestFrames.Loads(solver.Frame) with { ElementLoads = [] };
        double before = Work(Design[0]);
        BeamProfile p = Design[0];
        BeamProfile[] stiffer =
        [
            p with { Area = 1.1 * p.Area }, p with { Iy = 1.1 * p.Iy }, p with { Iz = 1.1 * p.Iz },
            p with { J = 1.1 * p.J }, p with { ShearAreaY = 1.1 * p.ShearAreaY }, p with { ShearAreaZ = 1.1 * p.ShearAreaZ },
        ];
        Assert.All(stiffer, s => Assert.True(Work(s) <= before * (1 + 1e-12)));

        double Work(BeamProfile first)
        {
            FrameSolution solution = solver.Factor([first, Design[1]]).Solve(loads);
            return loads.NodalLoads.Sum(l => l.Force.Dot(solution.Displacement(l.Node)) + l.Moment.Dot(solution.Rotation(l.Node)));
        }
    }

    /// <summary>A turn by 1.1 rad about (2, -1, 2)/3 (Rodrigues' formula).</summary>
    private static Vector3 Turn(Vector3 v)
    {
        Vector3 axis = new Vector3(2, -1, 2) / 3;
        (double sin, double cos) = Math.SinCos(1.1);
        return (cos * v) + (sin * axis.Cross(v)) + ((1 - cos) * axis.Dot(v) * axis);
    }
}
