using CsCheck;
using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using Xunit;

namespace FrameGen.Tests.Mechanics;

public class SparseSolverTests
{
    private static readonly BeamProfile[] Design = [FrameSketch.Profile(35, 2), FrameSketch.Profile(25, 1.5) with { Iz = 9000, ShearAreaY = 70 }];

    [Theory]
    [InlineData(1UL, 4)]
    [InlineData(2UL, 9)]
    [InlineData(3UL, 17)]
    [InlineData(4UL, 30)]
    [InlineData(5UL, 45)]
    public void Agrees_with_a_dense_solve_of_the_textbook_matrix(ulong seed, int nodes)
    {
        FrameSketch sketch = SolverTestFrames.Random(seed, nodes);
        BeamLoads loads = SolverTestFrames.Loads(new BeamFrame(sketch.Nodes, sketch.Elements)) with { ElementLoads = [] };
        FrameSolution solution = sketch.Solver().Factor(Design).Solve(loads);
        double[] dense = DenseFrame.Solve(sketch, Design, loads.NodalLoads);
        double largest = dense.Max(Math.Abs);
        for (int node = 0; node < nodes; node++)
        {
            (Vector3 u, Vector3 r) = (solution.Displacement(node), solution.Rotation(node));
            double[] ours = [u.X, u.Y, u.Z, r.X, r.Y, r.Z];
            for (int i = 0; i < 6; i++)
            {
                Assert.Equal(dense[(6 * node) + i], ours[i], 1e-9 * largest);
            }
        }
    }

    // A block of nodes: wide fronts, several slices in each, nested dissection against minimum degree; the larger one in domains.
    [Theory]
    [InlineData(9, false)]
    [InlineData(11, true)]
    public void A_solid_lattice_is_solved_to_rounding(int side, bool hasDomains)
    {
        FrameSolver solver = Block(side, isHeld: true).Solver();
        BeamLoads loads = SolverTestFrames.Loads(solver.Frame);
        FactoredFrame factored = solver.Factor(Design);
        FrameSolution solution = factored.Solve(loads);
        Assert.Equal(hasDomains, factored.Layout.Symbolic.Domains.Length > 0);
        Assert.InRange(solution.BackwardError, 0, 1e-11);
        Assert.InRange(solution.EquilibriumError, 0, 1e-10);
    }

    // What is not kept of a domain is made again for the motions too: six of a frame that nothing holds.
    [Fact]
    public void A_lattice_in_domains_that_nothing_holds_moves_in_six_ways()
    {
        FrameSolver solver = Block(11, isHeld: false).Solver();
        MechanismException free = Assert.Throws<MechanismException>(() => solver.Factor(Design));
        Assert.Equal(6, free.Motions.Count);
    }

    // Modes are looked for with several right-hand sides at a time: one alone comes to the same bits.
    [Fact]
    public void Right_hand_sides_solved_together_come_to_the_digits_of_each_alone()
    {
        FactoredFrame factored = Block(11, isHeld: true).Solver().Factor(Design);
        int size = 6 * factored.Layout.NodeAt.Length;
        var pcg = new PCG(1, 8UL);
        Gen<double> any = Gen.Double[-1, 1];
        double[][] together = [.. Enumerable.Range(0, 3).Select(_ => Enumerable.Range(0, size).Select(_ => any.Generate(pcg, null, out Size _)).ToArray())];
        double[][] alone = [.. together.Select(b => (double[])b.Clone())];
        factored.Solve(together);
        foreach (double[] x in alone)
        {
            factored.Solve(x);
        }

        Assert.Equal(alone, together);
    }

    [Fact]
    public void Orders_are_permutations_and_fill_no_more_than_a_band()
    {
        // A grid of 30 x 30: a band order fills 30 entries a column, dissection far fewer.
        const int Side = 30;
        const int Count = Side * Side;
        int[] starts = new int[Count + 1];
        var neighbours = new List<int>();
        for (int k = 0; k < Count; k++)
        {
            (int x, int y) = (k % Side, k / Side);
            neighbours.AddRange(((int[])[y > 0 ? k - Side : -1, x > 0 ? k - 1 : -1, x + 1 < Side ? k + 1 : -1, y + 1 < Side ? k + Side : -1]).Where(j => j >= 0));
            starts[k + 1] = neighbours.Count;
        }

        int[] list = [.. neighbours];
        Vector3[] positions = [.. Enumerable.Range(0, Count).Select(k => new Vector3(k % Side, k / Side, 0))];
        double band = Fill([.. Enumerable.Range(0, Count)]);
        double degree = Fill(MinimumDegree.Order(Count, starts, list));
        double dissection = Fill(NestedDissection.Order(positions, starts, list));
        Assert.InRange(degree, 1, 0.5 * band);
        Assert.InRange(dissection, 1, 0.5 * band);
        Assert.InRange(Fill(SweepOrder.Order(Count, starts, list)), 1, band);

        double Fill(int[] order)
        {
            Assert.Equal(Enumerable.Range(0, Count), order.Order());
            return EliminationTree.Build(order, starts, list).Rows.Sum(rows => (double)rows.Length);
        }
    }

    // On small random graphs: the order is complete whatever the shape, also with parts not joined to one another.
    [Fact]
    public void Orders_of_random_graphs_are_complete()
    {
        var pcg = new PCG(1, 7UL);
        Gen<int> any = Gen.Int[0, 39];
        for (int round = 0; round < 60; round++)
        {
            const int Count = 40;
            var joined = new SortedSet<(int, int)>();
            for (int edge = 0; edge < 3 * round; edge++)
            {
                (int i, int j) = (any.Generate(pcg, null, out _), any.Generate(pcg, null, out _));
                if (i != j)
                {
                    joined.Add((i, j));
                    joined.Add((j, i));
                }
            }

            int[] starts = [.. Enumerable.Range(0, Count + 1).Select(k => joined.Count(e => e.Item1 < k))];
            int[] neighbours = [.. joined.Select(e => e.Item2)];
            Vector3[] positions = [.. Enumerable.Range(0, Count).Select(k => new Vector3(k % 7, k % 3, k % 5))];
            Assert.Equal(Enumerable.Range(0, Count), MinimumDegree.Order(Count, starts, neighbours).Order());
            Assert.Equal(Enumerable.Range(0, Count), NestedDissection.Order(positions, starts, neighbours).Order());
            Assert.Equal(Enumerable.Range(0, Count), SweepOrder.Order(Count, starts, neighbours).Order());
        }
    }

    // A ladder whose nodes come in any order: a sweep along it is never more than two nodes wide.
    [Fact]
    public void A_sweep_finds_the_ends_of_a_ladder()
    {
        const int Rungs = 50;
        int[] number = [.. Enumerable.Range(0, 2 * Rungs).Select(k => 37 * k % (2 * Rungs))];
        var joined = new SortedSet<(int, int)>();
        for (int rung = 0; rung < Rungs; rung++)
        {
            Join(2 * rung, (2 * rung) + 1);
            for (int side = 0; side < 2 && rung + 1 < Rungs; side++)
            {
                Join((2 * rung) + side, (2 * rung) + side + 2);
            }
        }

        int[] starts = [.. Enumerable.Range(0, (2 * Rungs) + 1).Select(k => joined.Count(e => e.Item1 < k))];
        int[] neighbours = [.. joined.Select(e => e.Item2)];
        var tree = EliminationTree.Build(SweepOrder.Order(2 * Rungs, starts, neighbours), starts, neighbours);
        Assert.InRange(tree.Rows.Max(rows => rows.Length), 1, 2);

        void Join(int i, int j)
        {
            joined.Add((number[i], number[j]));
            joined.Add((number[j], number[i]));
        }
    }

    [Fact]
    public void Nodes_at_one_place_can_be_ordered()
    {
        const int Count = 60;
        int[] starts = [.. Enumerable.Range(0, Count + 1).Select(k => Math.Max(0, Math.Min((2 * k) - 1, (2 * Count) - 2)))];
        int[] neighbours = [.. Enumerable.Range(0, Count).SelectMany(k => new[] { k - 1, k + 1 }.Where(j => j >= 0 && j < Count))];
        Assert.Equal(Enumerable.Range(0, Count), NestedDissection.Order(new Vector3[Count], starts, neighbours).Order());
    }

    // A soft cantilever with a stub much stiffer at its end: the stub carries on straight.
    [Theory]
    [InlineData(1e6)]
    [InlineData(1e9)]
    public void Very_stiff_tubes_beside_soft_ones_are_no_mechanism(double ratio)
    {
        BeamProfile soft = FrameSketch.Profile(30, 2);
        FrameSolution solution = StubOnCantilever(soft, ratio);
        double ei = soft.E * soft.Iy;
        double sag = (100 * 1e9 / (3 * ei)) + (100 * 1000 / (soft.G * soft.ShearAreaZ)) + (100 * 250 * 1e6 / (2 * ei));
        double slope = (100 * 1e6 / (2 * ei)) + (100 * 250 * 1000 / ei);
        double tip = sag + (250 * slope);
        Assert.Equal(-tip, solution.Displacement(2).Z, 1e-6 * tip);
        Assert.InRange(solution.EquilibriumError, 0, 1e-10);
    }

    private static FrameSketch Block(int side, bool isHeld)
    {
        var sketch = new FrameSketch();
        for (int k = 0; k < side * side * side; k++)
        {
            (int x, int y, int z) = (k % side, k / side % side, k / (side * side));
            sketch.Node(400 * x, 300 * y, 500 * z);
            foreach (int before in (int[])[x > 0 ? 1 : 0, y > 0 ? side : 0, z > 0 ? side * side : 0, x > 0 && z > 0 ? 1 + (side * side) : 0])
            {
                if (before > 0)
                {
                    sketch.Tube(k - before, k, profile: (x + y) % 2);
                }
            }

            if (z == 0 && isHeld)
            {
                sketch.Hold(k, x == 0 ? "111111" : "101000");
            }
        }

        return sketch;
    }

    private static FrameSolution StubOnCantilever(BeamProfile soft, double ratio)
    {
        FrameSketch sketch = new FrameSketch().Node(0, 0, 0).Node(0, 1000, 0).Node(0, 1250, 0)
            .Tube(0, 1, 0).Tube(1, 2, 1).Hold(0, "111111");
        BeamProfile stiff = soft with { E = ratio * soft.E, G = ratio * soft.G };
        return sketch.Solver().Factor([soft, stiff]).Solve(new BeamLoads([new NodalLoad(2, new(0, 0, -100), Vector3.Zero)], []));
    }
}
