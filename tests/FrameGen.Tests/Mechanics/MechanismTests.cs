using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using Xunit;

namespace FrameGen.Tests.Mechanics;

public class MechanismTests
{
    [Fact]
    public void A_free_frame_slides_and_turns_six_ways()
    {
        IReadOnlyList<Mechanism> motions = MotionsOf(Tripod());
        Assert.Equal(6, motions.Count);
        Assert.Equal([Vector3.UnitX, Vector3.UnitY, Vector3.UnitZ], motions.Take(3).Select(m => m.Slides));
        Assert.Equal([Vector3.UnitX, Vector3.UnitY, Vector3.UnitZ], motions.Skip(3).Select(m => m.TurnsAbout));
        Assert.All(motions, m => Assert.Equal([0, 1, 2, 3], m.Nodes));
        Assert.All(motions.Skip(3), m => Assert.NotNull(m.Centre));
    }

    [Fact]
    public void A_frame_on_a_ball_turns_about_it()
    {
        IReadOnlyList<Mechanism> motions = MotionsOf(Tripod().Hold(1, "111000"));
        Assert.Equal(3, motions.Count);
        Assert.Equal([Vector3.UnitX, Vector3.UnitY, Vector3.UnitZ], motions.Select(m => m.TurnsAbout));
        Assert.All(motions, m => Assert.Equal(new Vector3(1000, 0, 0), m.Centre));
    }

    [Fact]
    public void A_frame_on_two_hinges_turns_about_their_line()
    {
        Mechanism motion = Assert.Single(MotionsOf(Tripod().Hold(1, "111000").Hold(2, "111000")));
        Vector3 axis = Assert.NotNull(motion.TurnsAbout);
        Assert.Null(motion.Slides);

        // Nodes 1 and 2 are at (1000, 0, 0) and (0, 800, 0).
        Vector3 line = new Vector3(1000, -800, 0).Normalized();
        Assert.InRange((axis - line).Length, 0, 1e-9);
        Assert.Equal(new Vector3(1000, 0, 0), motion.Centre);
    }

    [Fact]
    public void A_table_without_a_stop_slides()
    {
        Mechanism motion = Assert.Single(MotionsOf(Tripod().Hold(1, "101000").Hold(2, "101000").Hold(3, "001000")));
        Assert.Equal(Vector3.UnitY, motion.Slides);
        Assert.Null(motion.TurnsAbout);
    }

    [Fact]
    public void A_table_on_ice_slides_two_ways_and_turns()
    {
        IReadOnlyList<Mechanism> motions = MotionsOf(Tripod().Hold(1, "001000").Hold(2, "001000").Hold(3, "001000"));
        Assert.Equal(3, motions.Count);
        Assert.Equal([Vector3.UnitX, Vector3.UnitY], motions.Take(2).Select(m => m.Slides));
        Assert.Equal(Vector3.UnitZ, motions[2].TurnsAbout);
    }

    [Fact]
    public void A_tube_between_balls_spins_about_its_own_axis()
    {
        FrameSketch tube = new FrameSketch().Node(0, 0, 0).Node(300, 400, 500).Tube(0, 1).Hold(0, "111000").Hold(1, "111000");
        Mechanism motion = Assert.Single(MotionsOf(tube));
        Vector3 along = new Vector3(300, 400, 500).Normalized();
        Assert.InRange((Assert.NotNull(motion.TurnsAbout) - along).Length, 0, 1e-9);
    }

    [Fact]
    public void A_loose_part_is_found_beside_a_sound_one()
    {
        FrameSketch frame = Tripod().Hold(1, "111111").Hold(2, "111111").Hold(3, "111111")
            .Node(5000, 0, 0).Node(5000, 300, 0).Tube(4, 5).Hold(4, "111011");
        Mechanism motion = Assert.Single(MotionsOf(frame));
        Assert.Equal([4, 5], motion.Nodes);
        Assert.Equal(Vector3.UnitX, motion.TurnsAbout);
        Assert.Equal(new Vector3(5000, 0, 0), motion.Centre);
    }

    [Fact]
    public void Two_loose_parts_are_told_apart()
    {
        FrameSketch frame = new FrameSketch().Node(0, 0, 0).Node(400, 0, 0).Tube(0, 1).Hold(0, "011111")
            .Node(0, 900, 0).Node(400, 900, 0).Tube(2, 3).Hold(2, "110111");
        IReadOnlyList<Mechanism> motions = MotionsOf(frame);
        Assert.Equal(2, motions.Count);
        Assert.Equal((Vector3.UnitX, Vector3.UnitZ), (motions[0].Slides, motions[1].Slides));
        Assert.Equal([0, 1], motions[0].Nodes);
        Assert.Equal([2, 3], motions[1].Nodes);
    }

    [Fact]
    public void A_node_without_tubes_is_loose()
    {
        FrameSketch frame = Tripod().Hold(1, "111111").Node(0, 0, 2000);
        IReadOnlyList<Mechanism> motions = MotionsOf(frame);
        Assert.Equal(6, motions.Count);
        Assert.All(motions, m => Assert.Equal([4], m.Nodes));
    }

    [Fact]
    public void A_tilted_slide_keeps_its_direction()
    {
        // A post on a slope of 3 in 4, guided so that only the slope's own direction is free, cannot be held by global freedoms alone:
        // two tubes in one line, free along it, are.
        Vector3 along = new Vector3(4, 0, 3).Normalized();
        FrameSketch frame = new FrameSketch().Node(0, 0, 0);
        frame.Nodes.Add(800 * along);
        frame.Tube(0, 1).Hold(0, "010111");
        IReadOnlyList<Mechanism> motions = MotionsOf(frame);
        Assert.Equal([Vector3.UnitX, Vector3.UnitZ], motions.Select(m => m.Slides));
    }

    // The stiffness at the tip of n chained tubes falls with 1/n3, to a part in 1e10 of a single tube's; nothing moves freely.
    [Theory]
    [InlineData(50)]
    [InlineData(1000)]
    public void A_long_cantilever_of_many_pieces_is_no_mechanism(int pieces)
    {
        var frame = new FrameSketch();
        Vector3 along = new Vector3(1, 2, -0.5).Normalized();
        const double Length = 3000;
        for (int k = 0; k <= pieces; k++)
        {
            frame.Nodes.Add(Length * k / pieces * along);
            if (k > 0)
            {
                frame.Tube(k - 1, k);
            }
        }

        FrameSolution solution = frame.Hold(0, "111111").Solve(new NodalLoad(pieces, new(2, -1, 0), Vector3.Zero));
        BeamProfile p = FrameSketch.Profile(30, 2);
        Vector3 across = new Vector3(2, -1, 0);
        double flexibility = (Math.Pow(Length, 3) / (3 * p.E * p.Iy)) + (Length / (p.G * p.ShearAreaY));
        Assert.Equal(flexibility * across.Length, solution.Displacement(pieces).Dot(across.Normalized()), 1e-6 * flexibility * across.Length);
        Assert.InRange(solution.BackwardError, 0, 1e-11);
    }

    // Ten metres long, thin tubes, far from the origin, in skew directions: rounding must not hide the free turn.
    [Fact]
    public void A_big_frame_free_to_turn_is_found()
    {
        var frame = new FrameSketch();
        for (int k = 0; k <= 40; k++)
        {
            frame.Node(50_000 + (250 * k), 20_000 + (150 * (k % 2)), 1000 + (90 * (k % 3)));
            if (k > 0)
            {
                frame.Tube(k - 1, k);
            }

            if (k > 1)
            {
                frame.Tube(k - 2, k);
            }
        }

        frame.Hold(20, "111000");
        IReadOnlyList<Mechanism> motions = MotionsOf(frame);
        Assert.Equal([Vector3.UnitX, Vector3.UnitY, Vector3.UnitZ], motions.Select(m => m.TurnsAbout));
        Assert.All(motions, m => Assert.Equal(frame.Nodes[20], m.Centre));
    }

    [Fact]
    public void A_tube_that_cannot_resist_twist_is_a_motion_without_a_name()
    {
        // Without a torsion constant the middle node of a straight tube spins between clamped ends.
        FrameSketch frame = new FrameSketch().Node(0, 0, 0).Node(0, 500, 0).Node(0, 1000, 0).Tube(0, 1).Tube(1, 2)
            .Hold(0, "111111").Hold(2, "111111");
        BeamProfile profile = FrameSketch.Profile(30, 2) with { J = 0 };
        MechanismException thrown = Assert.Throws<MechanismException>(() => frame.Solver().Factor([profile]));
        Mechanism motion = Assert.Single(thrown.Motions);
        Assert.Equal([1], motion.Nodes);
        Assert.Equal(Vector3.UnitY, motion.TurnsAbout);
    }

    private static FrameSketch Tripod() => new FrameSketch()
        .Node(0, 0, 600).Node(1000, 0, 0).Node(0, 800, 0).Node(-500, -500, 0).Tube(0, 1).Tube(0, 2).Tube(0, 3);

    private static IReadOnlyList<Mechanism> MotionsOf(FrameSketch frame) =>
        Assert.Throws<MechanismException>(() => frame.Solver().Factor([FrameSketch.Profile(30, 2)])).Motions;
}
