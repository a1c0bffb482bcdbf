using CsCheck;
using FrameGen.Geometry;
using Xunit;

namespace FrameGen.Tests.Geometry;

public class OutlineTests
{
    /// <summary>Outlines of every kind, in and out of the one they come from.</summary>
    public static TheoryData<Outline> All =>
    [
        new RoundOutline(19),
        new FlatSidedOutline(40, 40, 0),
        new FlatSidedOutline(60, 40, 5),
        new FlatSidedOutline(30, 80, 15),
        new FlatSidedOutline(40, 40, 4).Grown(-2),
        new FlatSidedOutline(40, 40, 2).Grown(-3),
        new FlatSidedOutline(40, 60, 0).Grown(0.5),
        new EllipseOutline(45, 28, 0),
        new EllipseOutline(28, 45, -1.5),
        new EllipseOutline(60, 20, -3),
        new EllipseOutline(45, 28, 0.8),
    ];

    // The definition: a flat-sided outline keeps its corner radius from its core; another ellipse's outline its distance from it.
    [Theory]
    [InlineData(60.0, 40.0, 5.0)]
    [InlineData(40.0, 40.0, 0.0)]
    [InlineData(30.0, 80.0, 15.0)]
    public void A_flat_sided_outline_stands_its_corner_radius_off_its_core(double height, double width, double corner)
    {
        var outline = new FlatSidedOutline(height, width, corner);
        for (int i = 0; i < 1000; i++)
        {
            Point2 point = At(outline, 2 * Math.PI * (i + 0.3) / 1000);
            double x = Math.Max(0, Math.Abs(point.X) - ((height / 2) - corner));
            double y = Math.Max(0, Math.Abs(point.Y) - ((width / 2) - corner));
            double off = corner > 0 ? Math.Sqrt((x * x) + (y * y)) : Math.Max(x, y);
            Assert.Equal(corner, off, 1e-10);
        }
    }

    [Theory]
    [InlineData(45.0, 28.0, -1.5)]
    [InlineData(28.0, 45.0, 0.8)]
    [InlineData(60.0, 20.0, -3.0)]
    public void An_ellipse_s_neighbour_keeps_its_distance(double height, double width, double offset)
    {
        var outline = new EllipseOutline(height, width, offset);
        for (int i = 0; i < 200; i++)
        {
            Point2 point = At(outline, 2 * Math.PI * (i + 0.3) / 200);
            double Off(double angle) => point.DistanceTo(new(height / 2 * Math.Cos(angle), width / 2 * Math.Sin(angle)));
            double best = Enumerable.Range(0, 720).Select(k => Math.PI * k / 360).MinBy(Off);
            for (double step = 0.01; step > 1e-10; step /= 2)
            {
                best = new[] { best - step, best, best + step }.MinBy(Off);
            }

            Assert.Equal(Math.Abs(offset), Off(best), 1e-9);
        }
    }

    [Theory]
    [MemberData(nameof(All))]
    public void Distances_round_are_the_sums_of_short_chords(Outline outline)
    {
        // Midpoint chords with two step sizes, extrapolated; flats are straight, so nothing is lost at their ends but at corners.
        foreach (double clock in (double[])[0.3, 1.1, Math.PI / 2, 2.4, Math.PI])
        {
            double coarse = Chords(outline, clock, 200_000);
            Assert.Equal(coarse, outline.DistanceAt(clock), 2e-7);
            Assert.Equal(-coarse, outline.DistanceAt(-clock), 2e-7);
        }

        Assert.Equal(outline.Perimeter / 2, outline.DistanceAt(Math.PI), 1e-11);
        Assert.Equal(-outline.Perimeter / 2, outline.DistanceAt(-Math.PI), 1e-11);
    }

    [Theory]
    [MemberData(nameof(All))]
    public void A_clock_angle_comes_back_from_its_distance(Outline outline) =>
        Gen.Double[-Math.PI, Math.PI].Sample(
            clock => Math.Abs(outline.ClockAt(outline.DistanceAt(clock)) - clock) * outline.SpeedAt(Math.Sin(clock), Math.Cos(clock)) < 1e-10,
            iter: 400);

    [Theory]
    [MemberData(nameof(All))]
    public void The_distance_s_speed_is_its_slope(Outline outline)
    {
        for (int i = 0; i < 50; i++)
        {
            double clock = -3.1 + (6.2 * (i + 0.37) / 50);
            double slope = (outline.DistanceAt(clock + 1e-6) - outline.DistanceAt(clock - 1e-6)) / 2e-6;
            Assert.Equal(slope, outline.SpeedAt(Math.Sin(clock), Math.Cos(clock)), 1e-4 * slope);
        }
    }

    [Theory]
    [MemberData(nameof(All))]
    public void Half_widths_are_those_of_the_points(Outline outline)
    {
        Point2[] points = Polygon(outline, 20_000);
        for (int i = 0; i < 40; i++)
        {
            (double sin, double cos) = Math.SinCos(2 * Math.PI * (i + 0.2) / 40);
            double reach = points.Max(p => (p.X * cos) + (p.Y * sin));
            Assert.InRange(outline.HalfWidthAlong(new(cos, sin)), reach - 1e-12, reach + 1e-4);
            Point2 farthest = outline.FarthestAlong(new(cos, sin));
            Assert.Equal(outline.HalfWidthAlong(new(cos, sin)), (farthest.X * cos) + (farthest.Y * sin), 1e-11);
            Assert.Equal(outline.RadiusAt(Math.Sin(Clock(farthest)), Math.Cos(Clock(farthest))), farthest.DistanceTo(default), 1e-10);
        }
    }

    [Theory]
    [MemberData(nameof(All))]
    public void Areas_and_second_moments_are_the_polygon_s(Outline outline)
    {
        (double area, double momentX, double momentY) = (0, 0, 0);
        Point2[] points = Polygon(outline, 400_000);
        for (int i = 0; i < points.Length; i++)
        {
            (Point2 a, Point2 b) = (points[i], points[(i + 1) % points.Length]);
            double cross = (a.X * b.Y) - (a.Y * b.X);
            area += cross / 2;
            momentX += cross * ((a.X * a.X) + (a.X * b.X) + (b.X * b.X)) / 12;
            momentY += cross * ((a.Y * a.Y) + (a.Y * b.Y) + (b.Y * b.Y)) / 12;
        }

        Assert.Equal(1, outline.Area / area, 1e-8);
        Assert.Equal(1, outline.SecondMomentX / momentX, 1e-8);
        Assert.Equal(1, outline.SecondMomentY / momentY, 1e-8);
    }

    [Theory]
    [MemberData(nameof(All))]
    public void Lines_come_in_and_leave_on_the_outline(Outline outline) =>
        Gen.Select(Gen.Double[-Math.PI, Math.PI], Gen.Double[-0.999, 0.999]).Sample(
            (angle, share) =>
            {
                Point2 along = new(Math.Cos(angle), Math.Sin(angle));
                Point2 across = new(along.Y, -along.X);
                OutlineView view = outline.Seen(along, across);
                double u = share * view.HalfWidth;
                (double near, double far) = view.Chord(u);
                Point2 leave = (u * across) + (far * along);
                Point2 enter = (u * across) + (near * along);
                bool crossed = outline.Cross(u * across, along, out double first, out double second);
                Point2 normal = new(0.6, 0.8);
                return Math.Abs(outline.HalfWidthAlong(across) - view.HalfWidth) < 1e-12
                    && IsOn(outline, leave) && IsOn(outline, enter) && near < far
                    && crossed && Math.Abs(first - near) < 1e-9 && Math.Abs(second - far) < 1e-9
                    && IsHighest(outline, view, normal, along, across);
            },
            iter: 300);

    [Theory]
    [MemberData(nameof(All))]
    public void A_view_s_breaks_are_the_outline_s_on_the_far_side(Outline outline)
    {
        Point2 along = new(Math.Cos(0.7), Math.Sin(0.7));
        Point2 across = new(along.Y, -along.X);
        OutlineView view = outline.Seen(along, across);
        double[] expected =
        [
            .. outline.Breaks
                .Select(clock => At(outline, clock))
                .Where(p => Math.Abs(((p.X * across.X) + (p.Y * across.Y)) - outline.HalfWidthAlong(across)) > 1e-9
                    && Math.Abs(((p.X * across.X) + (p.Y * across.Y)) + outline.HalfWidthAlong(across)) > 1e-9
                    && Math.Abs(view.Far((p.X * across.X) + (p.Y * across.Y)) - ((p.X * along.X) + (p.Y * along.Y))) < 1e-9)
                .Select(p => (p.X * across.X) + (p.Y * across.Y))
                .Order(),
        ];
        double[] found = [.. view.Breaks.Where(u => Math.Abs(u) < view.HalfWidth - 1e-9)];

        // A sharp corner is a break before its arc without length and one after.
        Assert.All(expected, e => Assert.Contains(found, f => Math.Abs(f - e) < 1e-9));
        Assert.All(found, f => Assert.Contains(expected, e => Math.Abs(f - e) < 1e-9));
    }

    [Theory]
    [InlineData(2.0, 1.0, 9.6884482205)] // 8 E(m = 3/4), E = 1.2110560276: Abramowitz and Stegun, table 17.1; from memory
    [InlineData(2.0, 2.0, 6.2831853072)]
    public void An_ellipse_is_as_long_round_as_the_table_says(double height, double width, double printed)
    {
        // Semi-axes 2 and 1 for the first: sizes are whole axes here.
        double scale = height == width ? 1 : 2;
        Assert.Equal(printed, new EllipseOutline(scale * height, scale * width, 0).Perimeter, 5e-11 * scale * 10);
    }

    [Fact]
    public void Refuses_a_bore_that_would_cross_itself()
    {
        // Least radius of curvature of 40 x 20: 10² / 20 = 5.
        Assert.Throws<ArgumentOutOfRangeException>(() => new EllipseOutline(40, 20, -5));
        Assert.Equal(5, EllipseOutline.LeastRadiusOfCurvature(40, 20), 1e-12);
        Assert.Throws<ArgumentOutOfRangeException>(() => new FlatSidedOutline(40, 20, 10.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => new FlatSidedOutline(40, 20, 3).Grown(-10));
    }

    private static bool IsHighest(Outline outline, OutlineView view, Point2 normal, Point2 along, Point2 across)
    {
        double u = view.Farthest(normal);
        double reach = (u * normal.X) + (view.Far(u) * normal.Y);
        return Math.Abs(reach - outline.HalfWidthAlong((normal.X * across) + (normal.Y * along))) < 1e-9;
    }

    private static bool IsOn(Outline outline, Point2 point)
    {
        double clock = Clock(point);
        return Math.Abs(point.DistanceTo(default) - outline.RadiusAt(Math.Sin(clock), Math.Cos(clock))) < 1e-9;
    }

    private static double Clock(Point2 point) => Math.Atan2(point.Y, point.X);

    private static Point2 At(Outline outline, double clock)
    {
        (double sin, double cos) = Math.SinCos(clock);
        double radius = outline.RadiusAt(sin, cos);
        return new(radius * cos, radius * sin);
    }

    private static Point2[] Polygon(Outline outline, int sides) =>
    [
        .. Enumerable.Range(0, sides)
            .Select(i => -Math.PI + (2 * Math.PI * i / sides))
            .Concat(outline.Breaks)
            .Order()
            .Select(clock => At(outline, clock)),
    ];

    private static double Chords(Outline outline, double until, int parts)
    {
        double[] stops = [0, .. outline.Breaks.Where(b => b > 0 && b < until), until];
        double sum = 0;
        for (int k = 1; k < stops.Length; k++)
        {
            Point2 before = At(outline, stops[k - 1]);
            for (int i = 1; i <= parts; i++)
            {
                Point2 next = At(outline, stops[k - 1] + ((stops[k] - stops[k - 1]) * i / parts));
                sum += before.DistanceTo(next);
                before = next;
            }
        }

        return sum;
    }
}
