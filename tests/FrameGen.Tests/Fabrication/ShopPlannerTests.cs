using FrameGen.Fabrication;
using FrameGen.Joints;
using Xunit;

namespace FrameGen.Tests.Fabrication;

public class ShopPlannerTests
{
    [Fact]
    public void Small_sections_stand_first_then_long_parts()
    {
        ShopPackage package = GateFrame.Package();
        Assert.Equal([1, 2, 0], package.Parts.Select(p => p.Drawn.Tube).ToArray());
        Assert.All(package.Parts, p => Assert.Equal(1, p.Quantity));
    }

    [Fact]
    public void Totals_are_the_sums_of_the_tubes()
    {
        ShopPackage package = GateFrame.Package(square: true);
        double rail = Math.PI / 4 * ((40 * 40) - (36 * 36)) * 1000 * GateFrame.Density;
        double posts = Math.PI / 4 * ((30 * 30) - (27 * 27)) * 1100 * GateFrame.Density;
        Assert.Equal(rail + posts, package.Totals.MassKg, 1e-9);
        Assert.Equal(Math.PI * ((40 * 1000) + (30 * 1100)), package.Totals.OuterArea, 1e-6);
        Assert.Equal(0, package.Totals.WeldLength);

        // Centre by hand: the rail's middle is at x 500, z 0; the post's at 400, 300; the arm's at 650, 600.
        double post = posts * 600 / 1100;
        double arm = posts * 500 / 1100;
        double mass = rail + posts;
        Assert.Equal(((500 * rail) + (400 * post) + (650 * arm)) / mass, package.Totals.CentreOfMass.X, 1e-9);
        Assert.Equal(((300 * post) + (600 * arm)) / mass, package.Totals.CentreOfMass.Z, 1e-9);
    }

    [Fact]
    public void A_miter_is_welded_once()
    {
        CutFrame cut = GateFrame.Cut();
        double expected = cut.Tubes[1].From.OuterLength + cut.Tubes[1].To.OuterLength;
        Assert.Equal(expected, GateFrame.Planned(cut).Totals.WeldLength, 1e-9);
    }

    [Theory]
    [InlineData(0, 90, 360, 90)]
    [InlineData(350, 10, 360, 20)]
    [InlineData(10, 350, 360, -20)]
    [InlineData(0, 180, 360, 180)]
    [InlineData(180, 0, 360, 180)]
    [InlineData(0, 180.0001, 360, 180)]
    [InlineData(170, 20, 180, 30)]
    [InlineData(0, 90, 180, 90)]
    [InlineData(90, 0, 180, 90)]
    public void Twist_is_to_less_from(double from, double to, double turn, double expected) =>
        Assert.Equal(expected, SeatTwist.Between(to - from, turn), 1e-9);

    [Fact]
    public void An_end_without_a_seat_has_no_twist()
    {
        ShopPackage package = GateFrame.Package();
        Assert.Null(package.Parts.Single(p => p.Drawn.Tube == 0).TwistDegrees);
        Assert.Equal(0, package.Parts.Single(p => p.Drawn.Tube == 1).TwistDegrees);
    }

    [Fact]
    public void A_tube_wider_than_its_seat_says_so()
    {
        CutFrame cut = GateFrame.Cut();
        EndCut seated = cut.Tubes[1].From;
        EndCut offset = seated with { Contacts = [seated.Contacts[0] with { Offset = 6 }] };
        CutTube[] tubes = [cut.Tubes[0], cut.Tubes[1] with { From = offset }, cut.Tubes[2]];
        Assert.Equal("contour cut; from end wider than its seat: fill by hand", GateFrame.Planned(cut with { Tubes = tubes }).Parts[0].Note);
        Assert.Equal("contour cut", GateFrame.Planned(cut).Parts[0].Note);
    }
}
