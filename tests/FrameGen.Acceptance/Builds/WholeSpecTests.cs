using System.Globalization;
using System.Text;
using System.Text.Json;
using FrameGen.Geometry;
using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>Laws that hold for any frame: moving, turning or mirroring a whole spec, or swapping a tube's ends, changes no part.</summary>
public class WholeSpecTests
{
    private static readonly (string Name, Vector3 At)[] Nodes =
    [
        ("a", new(0, 0, 0)), ("b", new(620, 40, 30)), ("c", new(580, 430, -20)), ("d", new(-40, 400, 10)), ("e", new(300, 210, 340)),
    ];

    private static readonly (string Name, string From, string To, string Group)[] Tubes =
    [
        ("base-1", "a", "b", "big"), ("base-2", "b", "c", "big"), ("base-3", "c", "d", "big"), ("base-4", "d", "a", "big"),
        ("leg-1", "a", "e", "small"), ("leg-2", "b", "e", "small"), ("leg-3", "c", "e", "small"), ("leg-4", "e", "m", "small"),
    ];

    [Fact]
    public void Moving_and_turning_a_whole_spec_changes_no_part_and_no_result()
    {
        // A turn about a slanted axis, then a shift: no coordinate survives it.
        Vector3 axis = new Vector3(0.3, -0.5, 0.8).Normalized();
        Vector3 Turn(Vector3 v)
        {
            (double sin, double cos) = Math.SinCos(0.7);
            return (cos * v) + (sin * axis.Cross(v)) + ((1 - cos) * axis.Dot(v) * axis);
        }

        using BuiltFrame still = BuiltFrame.FromText(Text(v => v, v => v)).Succeeded();
        using BuiltFrame turned = BuiltFrame.FromText(Text(v => Turn(v) + new Vector3(1234.5, -777, 90), Turn)).Succeeded();
        SameParts(still, turned, (_, _) => { });

        JsonElement a = still.FrameJson();
        JsonElement b = turned.FrameJson();
        Assert.Equal(
            a.GetProperty("targets").EnumerateArray().Select(t => Math.Round(t.GetProperty("value").GetDouble(), 5)),
            b.GetProperty("targets").EnumerateArray().Select(t => Math.Round(t.GetProperty("value").GetDouble(), 5)));
    }

    [Fact]
    public void Mirroring_a_whole_spec_gives_every_part_s_opposite_hand()
    {
        static Vector3 Mirror(Vector3 v) => v with { Y = -v.Y };
        using BuiltFrame one = BuiltFrame.FromText(Text(v => v, v => v)).Succeeded();
        using BuiltFrame other = BuiltFrame.FromText(Text(Mirror, Mirror)).Succeeded();
        bool differs = false;
        SameParts(one, other, (first, second) =>
        {
            // The top line is global z in both, so a clock angle turns into its opposite and the distance along the axis stays.
            foreach (string end in new[] { "from", "to" })
            {
                double[][] curve = Curve(first, end);
                double[][] mirrored = Curve(second, end);
                for (int i = 0; i < 72; i++)
                {
                    int opposite = i == 0 ? 0 : 72 - i;
                    Assert.Equal(curve[i][1], mirrored[opposite][1], 1e-5);
                    Assert.Equal(curve[i][2], mirrored[opposite][2], 1e-5);
                    differs |= Math.Abs(curve[i][1] - mirrored[i][1]) > 1;
                }
            }
        });
        Assert.True(differs, "every part is its own mirror image: the test shows nothing");
    }

    [Fact]
    public void Swapping_a_tube_s_ends_turns_its_drawing_round_and_changes_nothing_else()
    {
        using BuiltFrame one = BuiltFrame.FromText(Text(v => v, v => v)).Succeeded();
        using BuiltFrame other = BuiltFrame.FromText(
            Text(v => v, v => v).Replace("leg-3: {from: c, to: e", "leg-3: {from: e, to: c", StringComparison.Ordinal)).Succeeded();
        JsonElement before = one.FrameJson().GetProperty("tubes").GetProperty("leg-3");
        JsonElement after = other.FrameJson().GetProperty("tubes").GetProperty("leg-3");
        Assert.Equal(before.GetProperty("volume_mm3").GetDouble(), after.GetProperty("volume_mm3").GetDouble(), before.GetProperty("volume_mm3").GetDouble() * 1e-8);
        Assert.Equal(before.GetProperty("cut_length_mm").GetDouble(), after.GetProperty("cut_length_mm").GetDouble(), 1e-6);
        double length = before.GetProperty("axis_length_mm").GetDouble();
        double[][] curve = Curve(before, "from");
        double[][] swapped = Curve(after, "to");
        for (int i = 0; i < 72; i++)
        {
            Assert.Equal(curve[i][1], length - swapped[i == 0 ? 0 : 72 - i][1], 1e-5);
        }
    }

    private static double[][] Curve(JsonElement tube, string end) =>
        [.. tube.GetProperty("ends").GetProperty(end).GetProperty("curve").EnumerateArray().Select(p => p.EnumerateArray().Select(v => v.GetDouble()).ToArray())];

    private static void SameParts(BuiltFrame one, BuiltFrame other, Action<JsonElement, JsonElement> more)
    {
        JsonElement first = one.FrameJson().GetProperty("tubes");
        JsonElement second = other.FrameJson().GetProperty("tubes");
        foreach (JsonProperty tube in first.EnumerateObject())
        {
            JsonElement twin = second.GetProperty(tube.Name);
            foreach (string key in new[] { "axis_length_mm", "cut_length_mm", "volume_mm3", "mass_kg" })
            {
                double value = tube.Value.GetProperty(key).GetDouble();
                Assert.True(Math.Abs(value - twin.GetProperty(key).GetDouble()) <= 1e-7 * value, $"{tube.Name} {key}: {value} and {twin.GetProperty(key)}");
            }

            more(tube.Value, twin);
        }
    }

    private static string Text(Func<Vector3, Vector3> place, Func<Vector3, Vector3> direct)
    {
        static string Triple(Vector3 v, string unit) => string.Create(CultureInfo.InvariantCulture, $"[{v.X:0.##########}{unit}, {v.Y:0.##########}{unit}, {v.Z:0.##########}{unit}]");
        Vector3 down = direct(new Vector3(0, 0, -1));
        var text = new StringBuilder("framegen: 1\ntitle: Leaning stand\nnodes:\n  m: {on: base-3, at: 40 %}\n");
        foreach ((string name, Vector3 at) in Nodes)
        {
            text.Append(CultureInfo.InvariantCulture, $"  {name}: {Triple(place(at), " mm")}\n");
        }

        text.Append("tubes:\n");
        foreach ((string name, string from, string to, string group) in Tubes)
        {
            text.Append(CultureInfo.InvariantCulture, $"  {name}: {{from: {from}, to: {to}, group: {group}}}\n");
        }

        text.Append(CultureInfo.InvariantCulture, $$"""
            groups:
              big:   {material: S235, section: round 42.4 x 2.6 mm}
              small: {material: S235, section: round 33.7 x 2.6 mm}
            supports:
              a: {hold: [x, y, z, rx, ry, rz]}
              c: {hold: [x, y, z]}
            cases:
              load:
                self_weight: {{Triple(down, "")}}
                loads:
                  - {node: e, force: {{Triple(800 * down, " N")}}}
            targets:
              - displacement: {case: load, node: e, along: any, max: 5 mm}
              - rotation:     {case: load, node: b, about: any, max: 1 deg}
              - stiffness:    {node: e, along: {{Triple(down, "")}}, min: 10 N/mm}
              - strength:     {safety_factor: 1.5}

            """);
        return text.ToString();
    }
}
