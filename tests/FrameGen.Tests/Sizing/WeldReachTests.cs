using FrameGen.Mechanics.Materials;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Sizing.Analysis;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>Reach of welds by hand: r 10 mm on the cut tube, R 20 mm on its mate, unless said otherwise.</summary>
public sealed class WeldReachTests
{
    private static readonly Material Soft = Steel with { Name = "soft", Yield = 200, YieldWelded = 100 };

    private static FrameBuilder Chord() => new FrameBuilder()
        .Fixed("chords", Round(40, 2)).Fixed("struts", Round(20, 2)).Fixed("bolted", Round(20, 2), welded: false)
        .Node("a", 0, 0, 0).Node("b", 2000, 0, 0)
        .Tube("chord", "a", "b", "chords");

    private static (double From, double To)[] Zones(FrameBuilder builder, string tube)
    {
        FrameModel model = builder.Build();
        DesignSpace space = DesignSpace.Create(model, (_, _) => true, out _);
        var joints = new JointTable(space);
        var analysis = new DesignAnalysis(space, joints, WeldPairs.Build(joints, model), null);
        var zones = new List<(double, double)>();
        foreach (WeldZone zone in analysis.Welds().Of(builder.TubeIndex(tube)))
        {
            zones.Add((zone.From, zone.To));
        }

        return [.. zones];
    }

    [Fact]
    public void Square_tee()
    {
        // sin φ = 1, cos φ = 0: R + 30 = 50 mm on the strut, r + 30 = 40 mm to both sides on the chord.
        FrameBuilder builder = Chord().NodeOn("n", "chord", 500).Node("top", 500, 0, 800).Tube("strut", "top", "n", "struts");
        Equal(Zones(builder, "strut"), (750, 800));
        Equal(Zones(builder, "chord"), (460, 540));
    }

    [Fact]
    public void Strut_at_45_degrees()
    {
        // (20 + 10 cos 45°)/sin 45° + 30 = 68.284 on the strut; (10 + 20 cos 45°)/sin 45° + 30 = 64.142 on the chord.
        FrameBuilder builder = Chord().NodeOn("n", "chord", 500).Node("top", 1000, 0, 500).Tube("strut", "n", "top", "struts");
        Equal(Zones(builder, "strut"), (0, (20 * Math.Sqrt(2)) + 10 + 30));
        Equal(Zones(builder, "chord"), (500 - 44.14213562 - 20, 500 + 44.14213562 + 20));
    }

    [Fact]
    public void Tubes_joined_without_heat_have_none()
    {
        FrameBuilder builder = Chord().NodeOn("n", "chord", 500).Node("top", 500, 0, 800).Tube("strut", "top", "n", "bolted");
        Assert.Empty(Zones(builder, "strut"));
        Assert.Empty(Zones(builder, "chord"));
    }

    [Fact]
    public void Miter()
    {
        // φ = 90°: ψ = 90°, r tan 45° + 30.
        FrameBuilder builder = Chord().Node("c", 0, 700, 0).Tube("other", "a", "c", "chords").Miter("a", "chord", "other");
        Equal(Zones(builder, "chord"), (0, 50));
        Equal(Zones(builder, "other"), (0, 50));
    }

    [Fact]
    public void Equal_tubes_130_degrees_apart_are_mitred()
    {
        // ψ = 50°: 20 tan 25° + 30.
        double angle = 130 * Math.PI / 180;
        FrameBuilder builder = Chord()
            .Node("c", 700 * Math.Cos(angle), 700 * Math.Sin(angle), 0).Tube("other", "c", "a", "chords");
        Equal(Zones(builder, "chord"), (0, 20 * Math.Tan(25 * Math.PI / 180) + 30));
        Equal(Zones(builder, "other"), (700 - (20 * Math.Tan(25 * Math.PI / 180)) - 30, 700));
    }

    [Fact]
    public void Butt_of_tubes_in_line()
    {
        FrameBuilder builder = Chord().Node("c", -700, 0, 0).Tube("other", "c", "a", "struts");
        Equal(Zones(builder, "chord"), (0, 30));
        Equal(Zones(builder, "other"), (670, 700));
    }

    [Fact]
    public void Struts_on_opposite_sides_of_a_chord_only_come_together_at_the_node()
    {
        // Each by the chord: R + 30 = 50. By the other strut, 180 degrees away: 30.
        FrameBuilder builder = Chord().NodeOn("n", "chord", 500)
            .Node("up", 500, 0, 800).Node("down", 500, 0, -800)
            .Tube("upper", "n", "up", "struts").Tube("lower", "n", "down", "struts");
        Equal(Zones(builder, "upper"), (0, 50));
        Equal(Zones(builder, "lower"), (0, 50));
    }

    [Fact]
    public void Struts_side_by_side_reach_into_each_other()
    {
        // Two struts 30 degrees apart, each by the other: (10 + 10 cos 30°)/sin 30° + 30 = 67.32 mm, beyond the chord's 50.4.
        double lean = 15 * Math.PI / 180;
        FrameBuilder builder = Chord().NodeOn("n", "chord", 500)
            .Node("one", 500 + (800 * Math.Sin(lean)), 0, 800 * Math.Cos(lean)).Node("two", 500 - (800 * Math.Sin(lean)), 0, 800 * Math.Cos(lean))
            .Tube("first", "n", "one", "struts").Tube("second", "n", "two", "struts");
        Equal(Zones(builder, "first"), (0, (10 + (10 * Math.Cos(Math.PI / 6))) / 0.5 + 30));
    }

    [Fact]
    public void Zones_that_overlap_are_one_and_end_with_the_tube()
    {
        FrameBuilder builder = Chord().NodeOn("n", "chord", 30).NodeOn("m", "chord", 90).NodeOn("k", "chord", 1000)
            .Node("n1", 30, 0, 500).Node("m1", 90, 0, 500).Node("k1", 1000, 0, 500)
            .Tube("s1", "n", "n1", "struts").Tube("s2", "m", "m1", "struts").Tube("s3", "k", "k1", "struts");
        Equal(Zones(builder, "chord"), (0, 130), (960, 1040));
    }

    [Fact]
    public void Strength_takes_the_welded_yield_within_reach_and_the_parent_yield_beyond()
    {
        // A cantilever of two tubes butted in line at 1000 mm, pushed at 2000 mm. The moment is P·2000 at the clamp, where no weld is,
        // and P·1030 where the weld's reach begins: at half the yield it decides.
        FrameBuilder builder = new FrameBuilder()
            .Fixed("tubes", Round(40, 2), Soft)
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Node("c", 2000, 0, 0)
            .Tube("inner", "a", "b", "tubes").Tube("outer", "b", "c", "tubes")
            .Clamp("a");
        builder.Case("push", default, builder.Force("c", 0, 0, -10)).Strength(1.5);
        SizedFrame sized = builder.Size();

        double inertia = Math.PI / 64 * (Math.Pow(40, 4) - Math.Pow(36, 4));
        double bending = 10 * 1030 * 20 / inertia;

        // Shear counts, but at the fibre of the greatest bending stress there is none.
        Assert.Equal(100 / bending, sized.Targets[0].Value, 6);
        Assert.StartsWith("inner at 970 mm, near a weld, case push", sized.Targets[0].Where, StringComparison.Ordinal);
        TubeUse use = sized.Cases[0].Tubes[0].Use!.Value;
        Assert.Equal(970, use.At, 9);
        Assert.True(use.NearWeld);
        Assert.Equal(10 * 2000 * 20 / inertia, sized.Cases[0].Tubes[0].MaxStress, 6);
        Assert.Equal(0, sized.Cases[0].Tubes[0].MaxStressAt);
    }

    private static void Equal((double From, double To)[] zones, params (double From, double To)[] expected)
    {
        Assert.Equal(expected.Length, zones.Length);
        for (int i = 0; i < expected.Length; i++)
        {
            Assert.Equal(expected[i].From, zones[i].From, 6);
            Assert.Equal(expected[i].To, zones[i].To, 6);
        }
    }
}
