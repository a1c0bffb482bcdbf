using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>Invented towers of two storeys on four feet, 3 to 8 groups: every number follows from a seed.</summary>
internal static class RandomFrames
{
    private static readonly string[] Names = ["legs", "rings", "braces", "posts", "crown", "ties", "cross", "struts"];
    private static readonly string[] Kinds = ["displacement", "any", "rotation", "relative", "stiffness", "strength", "buckling", "frequency", "member", "slenderness"];

    /// <summary>A frame with targets that are about as hard as a middling choice of sizes can meet.</summary>
    /// <param name="seed">Any.</param>
    /// <param name="mostDesigns">Groups get 5 to 12 candidates, or fewer where there would be more designs than this.</param>
    /// <param name="edit">Has a last word on the frame; null for none.</param>
    public static FrameModel Make(int seed, long mostDesigns, Func<FrameBuilder, FrameBuilder>? edit = null)
    {
        var random = new Random(seed);
        int groups = random.Next(3, 9);
        Section[][] candidates = [.. Enumerable.Range(0, groups).Select(_ => Candidates(random, random.Next(5, 13)))];
        while (candidates.Aggregate(1L, (n, c) => n * c.Length) > mostDesigns)
        {
            int largest = Enumerable.Range(0, groups).MaxBy(g => candidates[g].Length);
            candidates[largest] = [.. candidates[largest].Take(candidates[largest].Length - 1)];
        }

        string[] kinds = [.. Kinds.Where(_ => random.NextDouble() < 0.45)];
        kinds = kinds.Length == 0 ? ["stiffness"] : kinds;
        int shape = random.Next();
        double[] ease = [.. Kinds.Select(_ => 0.6 + (0.9 * random.NextDouble()))];

        // Limits as they come out with one design from the upper middle, times how easy each is.
        Section[][] middling = [.. candidates.Select(c => new[] { c.OrderBy(s => s.Area).ElementAt(c.Length * 3 / 5) })];
        double[] limits = [.. Kinds.Select(_ => 1.0)];
        SizedFrame trial = Targets(Layout(shape, middling, true), Kinds, limits).Size();
        for (int k = 0; k < Kinds.Length; k++)
        {
            TargetResult result = trial.Targets[k];
            limits[k] = result.Ratio * result.Limit / result.Value == 1 ? result.Value * ease[k] : result.Value / ease[k];
        }

        FrameBuilder frame = Targets(Layout(shape, candidates, false), kinds, [.. kinds.Select(k => limits[Array.IndexOf(Kinds, k)])]);
        return (edit?.Invoke(frame) ?? frame).Build();
    }

    private static Section[] Candidates(Random random, int count)
    {
        var all = new List<Section>();
        foreach (double od in (ReadOnlySpan<double>)[16, 20, 22, 25, 28, 30, 32, 35, 38, 42])
        {
            foreach (double wall in (ReadOnlySpan<double>)[1, 1.5, 2, 2.5, 3])
            {
                all.Add(Round(od, wall));
            }
        }

        return [.. all.OrderBy(_ => random.Next()).Take(count)];
    }

    private static FrameBuilder Layout(int shape, Section[][] candidates, bool given)
    {
        var random = new Random(shape);
        var builder = new FrameBuilder();
        for (int g = 0; g < candidates.Length; g++)
        {
            _ = given ? builder.Fixed(Names[g], candidates[g][0]) : builder.Choose(Names[g], candidates[g]);
        }

        (double X, double Y)[] corners = [(0, 0), (700, 0), (700, 500), (0, 500)];
        for (int i = 0; i < 4; i++)
        {
            builder.Node($"f{i}", corners[i].X * 1.3, corners[i].Y * 1.2, 0);
            builder.Node($"a{i}", corners[i].X + Shift(), corners[i].Y + Shift(), 600 + Shift());
            builder.Node($"b{i}", corners[i].X + Shift(), corners[i].Y + Shift(), 1100 + Shift());
        }

        int made = 0;
        void Add(int group, string from, string to) => builder.Tube($"t{made++}", from, to, Names[group % candidates.Length], wrap: true);
        for (int i = 0; i < 4; i++)
        {
            int next = (i + 1) % 4;
            Add(0, $"f{i}", $"a{i}");
            Add(3, $"a{i}", $"b{i}");
            Add(1, $"a{i}", $"a{next}");
            Add(4, $"b{i}", $"b{next}");
            if (i % 2 == 0)
            {
                Add(2, $"f{i}", $"a{next}");
                Add(5, $"a{next}", $"b{i}");
            }
        }

        Add(6, "b0", "b2");
        Add(7, "a1", "a3");
        for (int i = 0; i < 4; i++)
        {
            _ = random.Next(3) == 0 ? builder.Hold($"f{i}", "x", "y", "z") : builder.Clamp($"f{i}");
        }

        builder.MassOnNode("b1", 5 + (20 * random.NextDouble())).MassAlong("t3", 8);
        builder.Case("rest", new Vector3(0, 0, -1), builder.Force("b0", 0, 0, -400 - Shift()), builder.Line("t3", 0, 0, -0.4));
        builder.Case("side", new Vector3(0, 0, -1), builder.Force("b0", 250 + Shift(), 0, 0), builder.Force("a2", 0, 200, -300), builder.Point("t8", 200, 0, 0, -250));
        builder.Case("twist", default, builder.Force("b0", 0, 180, 0), builder.Force("b2", 0, -180, -900), builder.Moment("b1", 0, 0, 20_000));
        return builder;

        double Shift() => (random.NextDouble() * 80) - 40;
    }

    private static FrameBuilder Targets(FrameBuilder builder, string[] kinds, double[] limits)
    {
        for (int k = 0; k < kinds.Length; k++)
        {
            double limit = limits[k];
            _ = kinds[k] switch
            {
                "displacement" => builder.Displacement("side", "b1", Vector3.UnitX, limit),
                "any" => builder.Displacement("rest", "b0", null, limit),
                "rotation" => builder.Rotation("twist", "b0", Vector3.UnitZ, limit * Math.PI / 180),
                "relative" => builder.Displacement("twist", "b2", Vector3.UnitY, limit, "a0"),
                "stiffness" => builder.Stiffness("b2", Vector3.UnitX, limit),
                "strength" => builder.Strength(limit),
                "buckling" => builder.Buckling(limit),
                "frequency" => builder.Frequency(limit),
                "member" => builder.MemberDeflection("rings", SpanKind.SimplySupported, 500, limit),
                "slenderness" => builder.Slenderness(limit),
                _ => throw new ArgumentOutOfRangeException(nameof(kinds), kinds[k], "No such kind."),
            };
        }

        return builder;
    }
}
