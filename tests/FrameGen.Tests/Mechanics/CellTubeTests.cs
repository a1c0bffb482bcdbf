using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Tests.Mechanics;

public class CellTubeTests
{
    // A square tube with sharp corners and one with half round sides, by the closed forms of a schoolbook.
    [Fact]
    public void Sharp_corners_are_the_difference_of_two_rectangles()
    {
        var tube = new FlatSidedTube(60, 40, 3, 0);
        Assert.Equal((60 * 40) - (54 * 34), tube.Area, 1e-9);
        Assert.Equal(((40 * Math.Pow(60, 3)) - (34 * Math.Pow(54, 3))) / 12, tube.Iy, 1e-6);
        Assert.Equal(((60 * Math.Pow(40, 3)) - (54 * Math.Pow(34, 3))) / 12, tube.Iz, 1e-6);
        Assert.Equal(((40 * 60 * 60) - (34 * 54 * 54)) / 4.0, tube.PlasticModulusY, 1e-7);
        Assert.Equal(200, tube.Perimeter, 1e-12);

        // Bredt and the open wall's share: 4 Ah2 t/h + t3 h/3.
        Assert.Equal((4 * 57 * 57 * 37 * 37 * 3 / 188.0) + (27 * 188 / 3.0), tube.J, 1e-6);
    }

    // R. Bredt (1896); W. Young, R. Budynas, Roark's Formulas, table 10.1: 50 x 50 x 3 with sharp corners, 2Am t = 13 254 mm³, J = 311 469 mm⁴ and under
    // 100 N.m shear of 7.54489 MPa, 3.975019e-3 rad a metre; the wall's own t³h/3 comes on top.
    [Fact]
    public void A_square_tube_twists_as_bredt_has_it()
    {
        var tube = new FlatSidedTube(50, 50, 3, 0);
        double closed = tube.J - (27 * 188 / 3.0);
        Assert.Equal(311_469.0, closed, 0.05);
        Assert.Equal(3.975019e-3, 1e5 * 1000 / (closed * 210_000 / 2.6), 5e-10);

        // Von Mises of pure shear at the outer skin, less the part T t/J that changes sign through the wall, is Bredt's flow for the closed cell's share of J.
        double outer = tube.VonMises(new SectionForces(0, 0, 0, 1e5, 0, 0)) / Math.Sqrt(3);
        Assert.Equal(7.54489, (outer - (1e5 * 3 / tube.J)) * tube.J / closed, 5e-6);
    }

    [Fact]
    public void Corners_of_half_the_side_make_a_round_tube()
    {
        var tube = new FlatSidedTube(40, 40, 2.5, 20, 17.5);
        var round = new RoundTube(40, 2.5);
        Assert.Equal(round.Area, tube.Area, 1e-9);
        Assert.Equal(round.Iy, tube.Iy, 1e-8 * round.Iy);
        Assert.Equal(round.PlasticModulusZ, tube.PlasticModulusZ, 1e-8 * round.PlasticModulusZ);
        Assert.Equal(round.Perimeter, tube.Perimeter, 1e-10);

        // The rule's t3 h/3 stands where the ring has t3 h/4.
        Assert.Equal(round.J + (Math.Pow(2.5, 3) * Math.PI * 37.5 / 12), tube.J, 1e-8 * round.J);
    }

    [Theory]
    [InlineData(40, 2.5)]
    [InlineData(40, 12)]
    [InlineData(16, 0.1)]
    public void An_ellipse_with_equal_axes_is_a_round_tube(double diameter, double wall)
    {
        var tube = new EllipseTube(diameter, diameter, wall);
        var round = new RoundTube(diameter, wall);
        Assert.Equal(round.Area, tube.Area, 1e-12 * round.Area);
        Assert.Equal(round.Iy, tube.Iy, 1e-12 * round.Iy);
        Assert.Equal(round.Iz, tube.Iz, 1e-12 * round.Iz);
        Assert.Equal(round.Perimeter, tube.Perimeter, 1e-12 * round.Perimeter);
        Assert.Equal(round.PlasticModulusY, tube.PlasticModulusY, 1e-11 * round.PlasticModulusY);
        Assert.Equal(round.PlasticModulusZ, tube.PlasticModulusZ, 1e-11 * round.PlasticModulusZ);
        Assert.Equal(round.ShearAreas(0.3).Y, tube.ShearAreas(0.3).Y, 1e-11 * round.Area);
        Assert.Equal(round.ShearAreas(0.3).Z, tube.ShearAreas(0.3).Z, 1e-11 * round.Area);
        Assert.Equal(round.J + (Math.Pow(wall, 3) * Math.PI * (diameter - wall) / 12), tube.J, 1e-11 * round.J);
    }

    // Ramanujan's second formula of 1914 for the perimeter errs by less than 3/2^17 h^5 of it, h = ((a - b)/(a + b))2 = 1/9 here squared down.
    [Fact]
    public void The_perimeter_of_an_ellipse_agrees_with_ramanujan()
    {
        var tube = new EllipseTube(45, 28, 1.5);
        double h = Math.Pow((45.0 - 28) / (45 + 28), 2);
        double ramanujan = Math.PI * (45 + 28) / 2 * (1 + (3 * h / (10 + Math.Sqrt(4 - (3 * h)))));
        Assert.Equal(ramanujan, tube.Perimeter, 1e-7 * ramanujan);
    }

    // The 2:1 ellipse: perimeter 4 a E(e), E(sqrt 0.75) = 1.211056027568459 (Abramowitz and Stegun, table 17.1, m = 0.75; from memory).
    [Fact]
    public void The_perimeter_of_the_two_to_one_ellipse_is_the_elliptic_integral() =>
        Assert.Equal(4 * 30 * 1.211056027568459, new EllipseTube(30, 60, 2).Perimeter, 1e-11);

    // The second moments of the region between the ellipse and the curve beside it, by summing thin trapezia of both outlines.
    [Theory]
    [InlineData(45, 28, 1.5)]
    [InlineData(28, 45, 4)]
    [InlineData(60, 20, 3)]
    public void The_ellipse_agrees_with_polygons(double height, double width, double wall)
    {
        const int Corners = 200_000;
        var tube = new EllipseTube(height, width, wall);
        (double area, double iy, double iz) = Polygon(0);
        (double bore, double boreY, double boreZ) = Polygon(wall);
        Assert.Equal(area - bore, tube.Area, 1e-8 * tube.Area);
        Assert.Equal(iy - boreY, tube.Iy, 1e-8 * tube.Iy);
        Assert.Equal(iz - boreZ, tube.Iz, 1e-8 * tube.Iz);

        (double Area, double Iy, double Iz) Polygon(double depth)
        {
            (double sum, double y2, double z2) = (0, 0, 0);
            (double y, double z) = Point(0);
            for (int i = 1; i <= Corners; i++)
            {
                (double nextY, double nextZ) = Point(i);
                double cross = (nextY * z) - (y * nextZ);
                sum += cross / 2;
                y2 += cross * ((y * y) + (y * nextY) + (nextY * nextY)) / 12;
                z2 += cross * ((z * z) + (z * nextZ) + (nextZ * nextZ)) / 12;
                (y, z) = (nextY, nextZ);
            }

            return (sum, z2, y2);

            (double Y, double Z) Point(int i)
            {
                (double sin, double cos) = Math.SinCos(2 * Math.PI * i / Corners);
                (double ny, double nz) = (height * sin, width * cos);
                double length = Math.Sqrt((ny * ny) + (nz * nz));
                return ((width / 2 * sin) - (depth * ny / length), (height / 2 * cos) - (depth * nz / length));
            }
        }
    }

    // Thin walls: I about y tends to t times the integral of z2 along the ellipse; torsion to Bredt's 4 (pi a b)2 t/P.
    [Fact]
    public void A_thin_ellipse_tends_to_the_line()
    {
        const double Wall = 1e-5;
        var tube = new EllipseTube(45, 28, Wall);
        Assert.Equal(tube.Perimeter * Wall, tube.Area, 1e-6 * tube.Area);
        double cell = Math.PI * 22.5 * 14;
        Assert.Equal(4 * cell * cell * Wall / tube.Perimeter, tube.J, 2e-6 * tube.J);
        (double y, double z) = tube.ShearAreas(0);

        // Shear goes the stiffer way along the longer axis, and both ways together like two half walls.
        Assert.True(z > tube.Area / 2 && y < tube.Area / 2);
    }

    [Fact]
    public void Turned_by_a_right_angle_height_and_width_change_places()
    {
        Assert.All(Pairs(), pair =>
        {
            (Section one, Section other) = pair;
            Assert.Equal(one.Iy, other.Iz, 1e-12 * one.Iy);
            Assert.Equal(one.Iz, other.Iy, 1e-12 * one.Iz);
            Assert.Equal(one.PlasticModulusY, other.PlasticModulusZ, 1e-12 * one.PlasticModulusY);
            Assert.Equal(one.J, other.J, 1e-12 * one.J);
            Assert.Equal(one.Area, other.Area, 1e-12 * one.Area);
            Assert.Equal(one.ShearAreas(0.3).Y, other.ShearAreas(0.3).Z, 1e-12 * one.Area);
            Assert.Equal(one.ShearAreas(0.3).Z, other.ShearAreas(0.3).Y, 1e-12 * one.Area);
        });

        static IEnumerable<(Section One, Section Other)> Pairs() =>
        [
            (new FlatSidedTube(60, 40, 3), new FlatSidedTube(40, 60, 3)),
            (new FlatSidedTube(60, 40, 3, 4.5, 3), new FlatSidedTube(40, 60, 3, 4.5, 3)),
            (new EllipseTube(45, 28, 1.5), new EllipseTube(28, 45, 1.5)),
        ];
    }

    // Shear areas of box shapes: the two walls along the shear, 2t(h - t) and 2t(b - t).
    [Fact]
    public void The_walls_along_the_shear_carry_it()
    {
        (double y, double z) = new FlatSidedTube(60, 40, 3).ShearAreas(0.3);
        Assert.Equal(2 * 3 * 57, z, 1e-12);
        Assert.Equal(2 * 3 * 37, y, 1e-12);
    }

    // EN 10219-2: 2T up to 6 mm, 2.5T up to 10 mm, 3T above.
    [Theory]
    [InlineData(6, 12, 6)]
    [InlineData(6.3, 15.75, 9.45)]
    [InlineData(10, 25, 15)]
    [InlineData(12.5, 37.5, 25)]
    public void Corners_follow_the_rule_for_the_wall(double wall, double outer, double inner)
    {
        var tube = new FlatSidedTube(180, 180, wall);
        Assert.Equal(outer, tube.OuterCorner, 1e-12);
        Assert.Equal(inner, tube.InnerCorner, 1e-12);
    }

    [Fact]
    public void Names_are_what_a_spec_writes()
    {
        Assert.Equal("square 40 x 2 mm", new FlatSidedTube(40, 40, 2).Name);
        Assert.Equal("rect 60 x 40 x 2 mm", new FlatSidedTube(60, 40, 2).Name);
        Assert.Equal("rect 40 x 60 x 2 mm corner 5 mm", new FlatSidedTube(40, 60, 2, 5).Name);
        Assert.Equal("square 40 x 3 mm corner 0 mm", new FlatSidedTube(40, 40, 3, 0).Name);
        Assert.Equal("square 40 x 3.2 mm corner 4.8 mm inner 3.2 mm", new FlatSidedTube(40, 40, 3.2, 4.8, 3.2).Name);
        Assert.Equal("rect 60 x 40 x 2 mm corner 4 mm inner 3 mm", new FlatSidedTube(60, 40, 2, 4, 3).Name);
        Assert.Equal("ellipse 45 x 28 x 1.5 mm", new EllipseTube(45, 28, 1.5).Name);
        Assert.Equal("square", new FlatSidedTube(40, 40, 2).Shape);
        Assert.Equal("rect", new FlatSidedTube(60, 40, 2).Shape);
    }

    [Fact]
    public void Equal_sizes_are_equal_sections()
    {
        Section tube = new FlatSidedTube(60, 40, 2);
        Section same = new FlatSidedTube(60, 40, 2, 4, 2);
        tube.VonMises(new(0, 1, 1, 0, 0, 0));
        Assert.Equal(same, tube);
        Assert.Equal(same.GetHashCode(), tube.GetHashCode());
        Assert.NotEqual(tube, new FlatSidedTube(60, 40, 2, 5));
        Assert.Equal<Section>(new EllipseTube(45, 28, 1.5), new EllipseTube(45, 28, 1.5));
    }

    [Theory]
    [InlineData(40, 40, 20, 0, 0)]
    [InlineData(40, 40, double.NaN, 0, 0)]
    [InlineData(40, 40, 2, 21, 19)]
    [InlineData(40, 40, 2, -1, 0)]
    [InlineData(40, 40, 2, 4, 19)]
    [InlineData(40, 40, 2, 15, 1)]
    [InlineData(40, double.PositiveInfinity, 2, 4, 2)]
    public void Refuses_flat_sided_sizes_that_are_no_tube(double h, double b, double t, double outer, double inner) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new FlatSidedTube(h, b, t, outer, inner));

    // Smallest radius of curvature b2/a: 14 x 14/22.5 = 8.7111 mm.
    [Theory]
    [InlineData(45, 28, 8.72)]
    [InlineData(28, 45, 8.72)]
    [InlineData(45, 28, 0)]
    [InlineData(45, 28, double.NaN)]
    [InlineData(-45, 28, 1)]
    [InlineData(double.NaN, 28, 1)]
    public void Refuses_an_ellipse_whose_bore_would_have_a_corner(double h, double b, double t) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new EllipseTube(h, b, t));

    [Fact]
    public void Takes_an_ellipse_with_a_wall_just_below_its_smallest_radius() => Assert.True(new EllipseTube(45, 28, 8.71).Area > 0);
}
