using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>Cuts against the plain walk, on scattered nodes of four tubes.</summary>
public class WalkTests
{
    private const double Middle = 200;

    public static TheoryData<int, bool> Nodes
    {
        get
        {
            TheoryData<int, bool> data = [];
            for (int seed = 1; seed <= 6; seed++)
            {
                data.Add(seed, false);
                data.Add(seed, true);
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Nodes))]
    public void Contour_lines_stop_where_the_walk_first_meets_something(int seed, bool through)
    {
        Cluster cluster = Cluster.Scatter(seed, CutMode.Contour, through);
        CutFrame cut = cluster.Frame.Cut();
        foreach ((int index, TubeEnd end, End side, List<Solid> solids) in Ends(cluster, cut, through))
        {
            Tube tube = cut.Sized.Model.Tubes[index];
            Section section = cut.Sized.SectionOf(index);
            for (int i = 0; i < 24; i++)
            {
                double clock = (0.1 + i) * Math.PI / 12;
                foreach (double radius in (double[])[section.OuterSize / 2, (section.OuterSize / 2) - section.Wall, (section.OuterSize - section.Wall) / 2])
                {
                    double expected = Solid.Walk(
                        solids, end.Point + (radius * tube.Axes.Radial(clock)), tube.Into(side), Middle, -200, 0.25) ?? 0;
                    Assert.Equal(expected, cut.Tubes[index][side].Surface.At(clock, radius), 1e-6);
                }
            }
        }
    }

    [Theory]
    [MemberData(nameof(Nodes))]
    public void Radial_cuts_take_the_largest_t_over_the_wall(int seed, bool through)
    {
        Cluster cluster = Cluster.Scatter(seed, CutMode.Radial, through);
        CutFrame radial = cluster.Frame.Cut();
        CutFrame contour = Cluster.Scatter(seed, CutMode.Contour, through).Frame.Cut();
        foreach ((int index, TubeEnd _, End side, List<Solid> _) in Ends(cluster, radial, through))
        {
            Section section = radial.Sized.SectionOf(index);
            double outer = section.OuterSize / 2;
            for (int i = 0; i < 90; i++)
            {
                double clock = (0.3 + i) * Math.PI / 45;
                double largest = double.NegativeInfinity;
                for (int k = 0; k <= 2000; k++)
                {
                    largest = Math.Max(largest, contour.Tubes[index][side].Surface.At(clock, outer - (section.Wall * k / 2000)));
                }

                // Never short of any line: no interference; and not beyond the largest but for what 2000 steps miss.
                double t = radial.Tubes[index][side].Surface.At(clock, outer);
                Assert.InRange(t, largest - 1e-8, largest + 1e-3);
            }
        }
    }

    // Where part of the wall falls past its seat: those lines count with t = 0, and the rest is never cut too short.
    [Theory]
    [InlineData(22, 90, 0)]
    [InlineData(22, 50, 0)]
    [InlineData(22, 115, 7)]
    [InlineData(12, 60, 9)]
    [InlineData(12, 60, -26)]
    public void A_wide_tubes_radial_cut_never_reaches_into_its_seat(double radius, double degrees, double offset)
    {
        RoundTube branch = new(2 * radius, 4);
        double angle = degrees * Math.PI / 180;
        CutTube contour = Tee.Cut(15, branch, angle, offset);
        CutTube radial = Tee.Cut(15, branch, angle, offset, CutMode.Radial);
        for (int i = 0; i < 180; i++)
        {
            double clock = (0.3 + i) * Math.PI / 90;
            double largest = double.NegativeInfinity;
            for (int k = 0; k <= 4000; k++)
            {
                largest = Math.Max(largest, contour.From.Surface.At(clock, radius - (4.0 * k / 4000)));
            }

            Assert.InRange(radial.From.Surface.At(clock, radius), largest - 1e-8, largest + 5e-3);
        }

        AssertFollows(radial.From.Outer, radial.From.Surface, radius, radius);
        AssertFollows(contour.From.Outer, contour.From.Surface, radius, radius);
        AssertFollows(contour.From.Inner, contour.From.Surface, radius - 4, radius);
    }

    [Theory]
    [MemberData(nameof(Nodes))]
    public void Curves_stay_within_the_tolerance_everywhere(int seed, bool through)
    {
        foreach (CutMode mode in (CutMode[])[CutMode.Contour, CutMode.Radial])
        {
            Cluster cluster = Cluster.Scatter(seed, mode, through);
            CutFrame cut = cluster.Frame.Cut();
            foreach ((int index, TubeEnd _, End side, List<Solid> _) in Ends(cluster, cut, through))
            {
                Section section = cut.Sized.SectionOf(index);
                double outer = section.OuterSize / 2;
                AssertFollows(cut.Tubes[index][side].Outer, cut.Tubes[index][side].Surface, outer, outer);
                if (section.Wall < outer)
                {
                    AssertFollows(cut.Tubes[index][side].Inner, cut.Tubes[index][side].Surface, outer - section.Wall, outer);
                }
            }
        }
    }

    private static void AssertFollows(EndCurve curve, EndSurface surface, double radius, double outer)
    {
        Assert.Equal(-Math.PI, curve.Points[0].Clock);
        Assert.Equal(Math.PI, curve.Points[^1].Clock);
        Assert.Equal(curve.Points[0].T, curve.Points[^1].T);
        for (int i = 1; i < curve.Points.Count; i++)
        {
            (CurvePoint a, CurvePoint b) = (curve.Points[i - 1], curve.Points[i]);
            if (a.Clock == b.Clock)
            {
                Assert.True(Math.Abs(a.T - b.T) > 1e-6, "a vertex is doubled");
                continue;
            }

            double width = outer * (b.Clock - a.Clock);
            Assert.True(width > 1e-6, $"vertices at {a.Clock} and {b.Clock} nearly coincide");
            double length = Math.Sqrt((width * width) + ((b.T - a.T) * (b.T - a.T)));
            for (int k = 1; k < 10; k++)
            {
                double share = k / 10.0;
                double t = surface.At(a.Clock + (share * (b.Clock - a.Clock)), radius);
                double off = Math.Abs(t - (a.T + (share * (b.T - a.T)))) * width / length;
                Assert.True(off <= 0.02, $"{off} mm off at {a.Clock}");
            }
        }
    }

    // What each coped end is cut to, as the rules say it: earlier tubes end square at the node, the first runs out by
    // (r − R cos φ) / sin φ, the most over those coped to it.
    private static IEnumerable<(int Index, TubeEnd End, End Side, List<Solid> Solids)> Ends(Cluster cluster, CutFrame cut, bool through)
    {
        List<Solid> solids = [];
        for (int i = 0; i < cluster.Directions.Count; i++)
        {
            Vector3 direction = cluster.Directions[i];
            double radius = cluster.Sections[i].OuterSize / 2;
            if (i == 0)
            {
                double runOut = 0;
                for (int j = 1; j < cluster.Directions.Count; j++)
                {
                    double phi = direction.AngleTo(cluster.Directions[j]);
                    runOut = Math.Max(runOut, ((cluster.Sections[j].OuterSize / 2) - (radius * Math.Cos(phi))) / Math.Sin(phi));
                }

                solids.Add(new Solid(Vector3.Zero, direction, radius, through ? null : -runOut * direction));
                continue;
            }

            End side = i % 2 == 1 ? End.To : End.From;
            yield return (i, cut.Sized.Model.Tubes[i][side], side, [.. solids]);
            solids.Add(new Solid(Vector3.Zero, direction, radius, Vector3.Zero));
        }
    }
}
