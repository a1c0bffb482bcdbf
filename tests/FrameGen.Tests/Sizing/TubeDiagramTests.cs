using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>Internal forces along tubes against statics by hand: span 1200 mm along x, 3 N/mm down over all of it and 600 N down at 300 mm.</summary>
public class TubeDiagramTests
{
    private const double L = 1200;

    [Fact]
    public void A_simple_beam_has_its_largest_moment_where_the_shear_vanishes()
    {
        TubeDiagram diagram = Beam().Cases[0].Tubes[0].Diagram;

        // Left support 3·600 + 600·900/1200 = 2250 N. Shear vanishes at 300 + (2250 − 900 − 600)/3 = 550 mm, where the moment is
        // 2250·550 − 3·550²/2 − 600·250 = 633 750 N·mm, pressing on the top line.
        Assert.Equal([0, 300, L], diagram.Stations);
        ForceExtreme lowest = diagram.Lowest(ForceKind.My);
        Assert.Equal(550, lowest.At, 1e-6);
        Assert.Equal(-633_750, lowest.Value, 1e-4);
        Assert.Equal(2250, Math.Abs(diagram.At(0).Vz), 1e-7);
        Assert.Equal(1350, Math.Abs(diagram.At(300).Vz), 1e-7);
        Assert.Equal(750, Math.Abs(diagram.JustAfter(300).Vz), 1e-7);
        Assert.Equal(1950, Math.Abs(diagram.At(L).Vz), 1e-7);
        Assert.Equal(2250, Math.Max(diagram.Highest(ForceKind.Vz).Value, -diagram.Lowest(ForceKind.Vz).Value), 1e-7);
        Assert.Equal(0, diagram.At(L).My, 1e-4);
        Assert.Equal(0, diagram.Highest(ForceKind.N).Value, 1e-7);
    }

    // A drop of the shear, from one sign convention: dMy/dx = Vz.
    [Fact]
    public void Moment_is_the_sum_of_the_shear()
    {
        TubeDiagram diagram = Beam().Cases[0].Tubes[0].Diagram;
        for (double x = 10; x < L; x += 37)
        {
            if (Math.Abs(x - 300) > 2)
            {
                double slope = (diagram.At(x + 0.5).My - diagram.At(x - 0.5).My) / 1;
                Assert.Equal(diagram.At(x).Vz, slope, 1e-6 * L);
            }
        }
    }

    [Fact]
    public void A_hinged_end_carries_no_moment_and_its_clamp_an_eighth()
    {
        FrameBuilder builder = new FrameBuilder().Fixed("tubes", new RoundTube(30, 2))
            .Node("a", 0, 0, 0).Node("b", L, 0, 0).Tube("beam", "a", "b", "tubes").Hinge("beam", Hinges.EndY | Hinges.EndZ).Clamp("a").Clamp("b");
        SizedFrame sized = builder.Case("line", Vector3.Zero, builder.Line("beam", 0, 0, -3)).Size();
        TubeDiagram diagram = sized.Cases[0].Tubes[0].Diagram;
        (double shear, double inertia) = (new RoundTube(30, 2).ShearAreas(0.3).Z, new RoundTube(30, 2).Iy);
        double prop = ((3 * Math.Pow(L, 4) / (8 * 210_000 * inertia)) + (3 * L * L / (2 * 210_000 / 2.6 * shear)))
            / ((Math.Pow(L, 3) / (3 * 210_000 * inertia)) + (L / (210_000 / 2.6 * shear)));
        Assert.Equal(0, diagram.At(L).My, 1e-4);
        Assert.Equal((1.5 * L * L) - (prop * L), diagram.At(0).My, 1e-3);
        Assert.Equal(L - (prop / 3), diagram.Lowest(ForceKind.My).At, 1e-5);
    }

    [Fact]
    public void A_case_stands_on_the_springs_it_names()
    {
        FrameBuilder builder = new FrameBuilder().Fixed("tubes", new RoundTube(30, 2)).Node("a", 0, 0, 0).Node("b", L, 0, 0).Tube("beam", "a", "b", "tubes")
            .Hold("a", "x", "y", "z", "rx").Hold("b", "y").Spring("b", 0, 0, 5, 0, 0, 0);
        SizedFrame sized = builder.Case("line", Vector3.Zero, builder.Line("beam", 0, 0, -3)).Size();
        Assert.Equal(3 * L / 2, sized.Cases[0].Reactions[2].Force.Z, 1e-7);
        Assert.Equal(-3 * L / 2 / 5, sized.Cases[0].Displacements[1]!.Value.Z, 1e-7);
    }

    [Fact]
    public void A_stay_hinged_at_a_foot_of_its_own_is_no_mechanism()
    {
        // A cantilever held up at its end by a stay under 45 degrees: hinged at both ends the stay bends nowhere.
        FrameBuilder builder = new FrameBuilder().Fixed("tubes", new RoundTube(30, 2)).Node("a", 0, 0, 0).Node("b", L, 0, 0).Node("foot", L + 500, 0, -500)
            .Tube("beam", "a", "b", "tubes").Tube("stay", "b", "foot", "tubes").Hinge("stay", Hinges.StartY | Hinges.StartZ | Hinges.EndY | Hinges.EndZ)
            .Clamp("a").Hold("foot", "x", "y", "z");
        SizedFrame sized = builder.Case("tip", Vector3.Zero, builder.Force("b", 0, 0, -400)).Size();
        TubeDiagram stay = sized.Cases[0].Tubes[1].Diagram;
        Assert.Equal(0, stay.At(0).My, 1e-6);
        Assert.Equal(0, stay.At(stay.Length).My, 1e-6);
        Assert.Equal(0, stay.At(100).Vz, 1e-8);
        Assert.InRange(stay.At(0).N, -600, -300);
        (Vector3 force, _) = sized.Cases[0].Reactions[1];
        Assert.Equal(-force.X, force.Z, 1e-6);
    }

    [Fact]
    public void Two_hinges_at_one_joint_are_named()
    {
        FrameBuilder builder = new FrameBuilder().Fixed("tubes", new RoundTube(30, 2)).Node("a", 0, 0, 0).Node("b", L, 0, 0).Node("c", 2 * L, 0, 0)
            .Tube("one", "a", "b", "tubes").Hinge("one", Hinges.EndY).Tube("two", "b", "c", "tubes").Hinge("two", Hinges.StartY).Clamp("a").Clamp("c");
        string error = Assert.Single(builder.Case("tip", Vector3.Zero, builder.Force("b", 0, 0, -400)).Errors());
        Assert.Equal("b can turn about y: tubes one and two have hinges there, and nothing else stops it; leave one of the hinges out, add a tube or hold the frame there", error);
    }

    private static SizedFrame Beam()
    {
        FrameBuilder builder = new FrameBuilder().Fixed("tubes", new RoundTube(30, 2)).Node("a", 0, 0, 0).Node("b", L, 0, 0).Tube("beam", "a", "b", "tubes")
            .Hold("a", "x", "y", "z", "rx").Hold("b", "y", "z");
        return builder.Case("down", Vector3.Zero, builder.Line("beam", 0, 0, -3), builder.Point("beam", 300, 0, 0, -600)).Size();
    }
}
