using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>Frames small enough to solve by hand, read from the sized frame's results.</summary>
public sealed class HandSolvedFramesTests
{
    private const double E = 210_000;
    private const double G = E / 2.6;
    private const double L = 1500;
    private static readonly RoundTube Section = Round(48.3, 3.2);

    // κ of Cowper (1966) for this section at ν = 0.3.
    private static double ShearArea
    {
        get
        {
            double m = Section.InsideDiameter / Section.OutsideDiameter;
            double q = (1 + (m * m)) * (1 + (m * m));
            return Section.Area * 6 * 1.3 * q / ((8.8 * q) + (23.6 * m * m));
        }
    }

    private static double Inertia => Math.PI / 64 * (Math.Pow(48.3, 4) - Math.Pow(41.9, 4));

    private static FrameBuilder Beam() => new FrameBuilder()
        .Node("a", 0, 0, 0)
        .Node("b", L, 0, 0)
        .Fixed("beams", Section)
        .Tube("beam", "a", "b", "beams");

    [Fact]
    public void Cantilever_with_a_force_at_its_end()
    {
        FrameBuilder builder = Beam().Clamp("a");
        builder.Case("push", default, builder.Force("b", 0, 0, -1000))
            .Displacement("push", "b", Vector3.UnitZ, 50)
            .Rotation("push", "b", Vector3.UnitY, 0.1)
            .Strength(0.7);
        SizedFrame sized = builder.Size();

        double bending = 1000 * L * L * L / (3 * E * Inertia);
        double shear = 1000 * L / (G * ShearArea);
        Assert.Equal(bending + shear, sized.Targets[0].Value, 9);
        Assert.Equal((bending + shear) / 50, sized.Targets[0].Ratio, 10);
        Assert.Equal("b along z, case push", sized.Targets[0].Label);
        Assert.Equal(1000 * L * L / (2 * E * Inertia) * 180 / Math.PI, sized.Targets[1].Value, 10);
        Assert.Equal("deg", sized.Targets[1].Unit);
        double stress = 1000 * L * 24.15 / Inertia;
        Assert.Equal(235 / stress, sized.Targets[2].Value, 9);
        Assert.Equal(0.7 * stress / 235, sized.Targets[2].Ratio, 9);
        Assert.Equal(stress, sized.Cases[0].Tubes[0].MaxStress, 7);
        Assert.Equal(0, sized.Cases[0].Tubes[0].MaxStressAt, 9);
        (Vector3 force, Vector3 moment) = sized.Cases[0].Reactions[0];
        Assert.Equal(1000, force.Z, 8);
        Assert.Equal(-1000 * L, moment.Y, 5);
        Assert.Equal(SizingStatus.Fixed, sized.Status);
        Assert.Equal(1, sized.Analyses);
        Assert.Equal(7850e-9 * Section.Area * L, sized.MassKg, 12);
        Assert.Equal(sized.MassKg, sized.BoundKg);
    }

    [Fact]
    public void Simply_supported_beam_with_an_even_load_is_stressed_most_in_its_middle()
    {
        FrameBuilder builder = Beam().Hold("a", "x", "y", "z", "rx").Hold("b", "y", "z");
        builder.Case("even", default, builder.Line("beam", 0, 0, -1)).Rotation("even", "a", null, 1);
        SizedFrame sized = builder.Size();

        // wL²/8 in the middle, where the shear is zero; end slope wL³/24EI.
        Assert.Equal(L * L / 8 * 24.15 / Inertia, sized.Cases[0].Tubes[0].MaxStress, 8);
        Assert.Equal(L / 2, sized.Cases[0].Tubes[0].MaxStressAt, 6);
        Assert.Equal(L * L * L / (24 * E * Inertia) * 180 / Math.PI, sized.Targets[0].Value, 9);
        Assert.Equal(750, sized.Cases[0].Reactions[1].Force.Z, 7);
    }

    [Fact]
    public void Load_at_a_place_on_a_tube()
    {
        // One load at a = L/3: P b/L and P a/L at the supports, PL·2/9 under the load.
        FrameBuilder builder = Beam().Hold("a", "x", "y", "z", "rx").Hold("b", "y", "z");
        builder.Case("point", default, builder.Point("beam", 500, 0, 0, -1000));
        SizedFrame sized = builder.Size();
        Assert.Equal(1000 * 2.0 / 3, sized.Cases[0].Reactions[0].Force.Z, 8);
        Assert.Equal(1000 / 3.0, sized.Cases[0].Reactions[1].Force.Z, 8);
        Assert.Equal(500, sized.Cases[0].Tubes[0].MaxStressAt, 6);
        Assert.InRange(sized.Cases[0].Tubes[0].MaxStress, 1000 * L * 2 / 9 * 24.15 / Inertia, 1.01 * 1000 * L * 2 / 9 * 24.15 / Inertia);
        Assert.Equal(2, sized.Cases[0].Displacements.Count);
    }

    [Fact]
    public void Self_weight_acts_on_tubes_and_on_what_they_carry()
    {
        double own = 7850e-9 * Section.Area * 9.80665;
        FrameBuilder builder = Beam().Clamp("a").MassAlong("beam", 30).MassOnNode("b", 5)
            .Case("rest", new Vector3(0, 0, -1))
            .Case("bump", new Vector3(0, 0, -3))
            .Displacement("rest", "b", new Vector3(0, 0, -1), 100)
            .Displacement("bump", "b", null, 100);
        SizedFrame sized = builder.Size();

        double even = own + (30 * 9.80665 / L);
        double end = 5 * 9.80665;
        double sag = (even * Math.Pow(L, 4) / (8 * E * Inertia)) + (even * L * L / (2 * G * ShearArea))
            + (end * L * L * L / (3 * E * Inertia)) + (end * L / (G * ShearArea));
        Assert.Equal(sag, sized.Targets[0].Value, 9);
        Assert.Equal(3 * sag, sized.Targets[1].Value, 8);
        Assert.Equal((even * L) + end, sized.Cases[0].Reactions[0].Force.Z, 8);
    }

    [Fact]
    public void An_axis_beside_its_node_is_carried_by_a_rigid_link()
    {
        // The load at node b stands 100 mm beside the axis: it twists the tube by P·100·L/GJ.
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", L, 100, 0)
            .Fixed("beams", Section)
            .Tube("beam", "a", "b", "beams", toOffset: new Vector3(0, -100, 0))
            .Clamp("a");
        builder.Case("push", default, builder.Force("b", 0, 0, -1000)).Rotation("push", "b", Vector3.UnitX, 1);
        SizedFrame sized = builder.Size();
        Assert.Equal(1000 * 100 * L / (G * 2 * Inertia) * 180 / Math.PI, sized.Targets[0].Value, 9);
        Assert.Equal(-1000 * 100, -sized.Cases[0].Reactions[0].Moment.X, 6);
    }

    [Fact]
    public void A_point_load_at_the_end_of_an_offset_axis_acts_on_the_axis()
    {
        // The same frame, the load on the axis' end: no twist, however far the node stands beside it.
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", L, 100, 0)
            .Fixed("beams", Section)
            .Tube("beam", "a", "b", "beams", toOffset: new Vector3(0, -100, 0))
            .Clamp("a");
        builder.Case("push", default, builder.Point("beam", L, 0, 0, -1000)).Rotation("push", "b", Vector3.UnitX, 1)
            .Displacement("push", "b", Vector3.UnitZ, 50);
        SizedFrame sized = builder.Size();
        Assert.Equal(0, sized.Targets[0].Value, 12);
        Assert.Equal((1000 * L * L * L / (3 * E * Inertia)) + (1000 * L / (G * ShearArea)), sized.Targets[1].Value, 8);
    }

    [Fact]
    public void Turning_a_tube_round_turns_its_results_round()
    {
        FrameBuilder builder = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", 900, 300, 200).Node("c", 200, 800, -100)
            .Fixed("beams", Section)
            .Tube("there", "a", "b", "beams").Tube("back", "c", "a", "beams")
            .Clamp("b").Clamp("c");
        builder.Case("push", new Vector3(0, 0.3, -1), builder.Force("a", 300, -200, -500), builder.Point("there", 400, 0, 100, -300));
        FrameBuilder turned = new FrameBuilder()
            .Node("a", 0, 0, 0).Node("b", 900, 300, 200).Node("c", 200, 800, -100)
            .Fixed("beams", Section)
            .Tube("there", "b", "a", "beams").Tube("back", "c", "a", "beams")
            .Clamp("b").Clamp("c");
        double length = Math.Sqrt((900 * 900) + (300 * 300) + (200 * 200));
        turned.Case("push", new Vector3(0, 0.3, -1), turned.Force("a", 300, -200, -500), turned.Point("there", length - 400, 0, 100, -300));
        SizedFrame one = builder.Size();
        SizedFrame other = turned.Size();
        TubeForces there = one.Cases[0].Tubes[0];
        TubeForces round = other.Cases[0].Tubes[0];
        Assert.Equal(there.MaxStress, round.MaxStress, 7);
        Assert.Equal(there.MaxStressAt, length - round.MaxStressAt, 6);
        Assert.Equal(there.AxialFrom, round.AxialTo, 7);
        Assert.Equal(there.AxialTo, round.AxialFrom, 7);
        Assert.Equal(there.MinAxial, round.MinAxial, 7);
        Assert.Equal(one.Cases[0].Tubes[1].MaxStress, other.Cases[0].Tubes[1].MaxStress, 7);
    }

    [Fact]
    public void A_case_without_loads_strains_nothing()
    {
        SizedFrame sized = Beam().Clamp("a").Case("idle").Strength(2).Displacement("idle", "b", null, 1).Size();
        Assert.Equal(double.PositiveInfinity, sized.Targets[0].Value);
        Assert.Equal(0, sized.Targets[0].Ratio);
        Assert.Equal(0, sized.Targets[1].Ratio);
        Assert.Equal(0, sized.Cases[0].Tubes[0].MaxStress);
    }

    [Fact]
    public void Stiffness_is_a_unit_push_over_its_movement()
    {
        FrameBuilder builder = Beam().Clamp("a")
            .Stiffness("b", Vector3.UnitZ, 20)
            .Stiffness("b", Vector3.UnitX, 1, turning: true)
            .Stiffness("a", Vector3.UnitZ, 1000)
            .Stiffness("b", Vector3.UnitX, 1, from: "a");
        SizedFrame sized = builder.Size();
        double push = 1 / ((L * L * L / (3 * E * Inertia)) + (L / (G * ShearArea)));
        Assert.Equal(push, sized.Targets[0].Value, 9);
        Assert.Equal(20 / push, sized.Targets[0].Ratio, 10);
        Assert.Equal("N/mm", sized.Targets[0].Unit);
        Assert.Equal(G * 2 * Inertia / L * Math.PI / 180 / 1000, sized.Targets[1].Value, 8);
        Assert.Equal("N.m/deg", sized.Targets[1].Unit);
        Assert.Equal(double.PositiveInfinity, sized.Targets[2].Value);
        Assert.Equal(0, sized.Targets[2].Ratio);
        Assert.True(sized.Targets[2].Met);
        Assert.Equal(E * Section.Area / L, sized.Targets[3].Value, 6);
        Assert.Equal("b against a along x", sized.Targets[3].Label);
    }

    [Fact]
    public void A_tube_with_nodes_on_it_stays_one_piece()
    {
        // A clamped tube with a node on it bends as one without; the branch there carries its tip load into it.
        FrameBuilder builder = Beam().NodeOn("mid", "beam", 600).Node("tip", 600, 0, 300)
            .Tube("branch", "mid", "tip", "beams")
            .Clamp("a");
        builder.Case("push", default, builder.Force("b", 0, 0, -1000)).Displacement("push", "b", Vector3.UnitZ, 100)
            .Displacement("push", "tip", Vector3.UnitX, 100);
        SizedFrame sized = builder.Size();
        double bending = 1000 * L * L * L / (3 * E * Inertia);
        double shear = 1000 * L / (G * ShearArea);
        Assert.Equal(bending + shear, sized.Targets[0].Value, 8);

        // The branch is not loaded: its tip goes 300 mm × the slope at 600 mm, P(Lx − x²/2)/EI.
        Assert.Equal(300 * 1000 * ((L * 600) - (600 * 600 / 2.0)) / (E * Inertia), sized.Targets[1].Value, 8);
    }

    [Fact]
    public void Says_which_node_moves_most_and_which_tube_works_hardest()
    {
        FrameBuilder builder = Beam().Node("c", 0, 500, 0).Tube("short", "a", "c", "beams").Clamp("a");
        builder.Case("push", default, builder.Force("b", 0, 0, -1000), builder.Force("c", 0, 0, -1000));
        SizedFrame sized = builder.Size();
        (int node, Vector3 moved) = sized.Cases[0].LargestDisplacement();
        Assert.Equal("b", sized.Model.Nodes[node].Name);
        Assert.True(moved.Z < -46);
        Assert.Equal(["beam", "short"], sized.Model.Tubes.Select(t => t.Name));
        TubeUse use = sized.Cases[0].Tubes[0].Use!.Value;
        Assert.Equal(1000 * L * 24.15 / Inertia / 235, use.Share, 8);
        Assert.Equal((0.0, 235.0, true), (use.At, use.Yield, use.NearWeld));
        Assert.True(sized.Cases[0].Tubes[1].Use!.Value.Share < use.Share);
    }
}
