using FrameGen.Fabrication;
using FrameGen.Output;
using Xunit;

namespace FrameGen.Tests.Fabrication;

public class WeldPlannerTests
{
    private const double R = GateFrame.Rail;
    private const double Post = GateFrame.Post;

    // Post r on rail R, square: the post's normal and the rail's at the seam have r sin^2 / R for a cosine, so the surfaces meet at
    // 180 degrees less its arc cosine: 90 on the rail's line, most at its sides; a fillet up to 120, where r sin^2 = R/2.
    [Fact]
    public void A_square_saddle_is_a_fillet_up_to_where_its_sides_lie_too_flat()
    {
        ShopPackage package = GateFrame.CopedPackage();
        WeldSeam seam = WeldPlanner.Plan(package.Cut).Seams[0];
        double side = Math.Asin(Math.Sqrt(R / (2 * Post)));
        double whole = 4 * Integral(Speed, 0, Math.PI / 2);
        double fillet = 4 * Integral(Speed, 0, side);
        Assert.Equal(whole, seam.Length, 0.01);
        Assert.Equal(fillet, seam.Fillet, 0.02);
        Assert.Equal(whole - fillet, seam.Butt, 0.02);
        Assert.Equal(Math.PI / 2, seam.Least, 1e-4);
        Assert.Equal(Math.PI - Math.Acos(Post / R), seam.Most, 1e-4);

        // Walls 1.5 and 2: legs of 1.5; z^2/2 sin along the fillet, z^2/2 beyond it.
        Assert.Equal(1.5, seam.Leg);
        double filler = 4 * ((Integral(a => Speed(a) * Math.Sqrt(1 - Squared(Post * Squared(Math.Sin(a)) / R)), 0, side)
            + Integral(Speed, side, Math.PI / 2)) * 1.5 * 1.5 / 2);
        Assert.Equal(filler * GateFrame.Density, seam.FillerKg, 1e-3 * filler * GateFrame.Density);
    }

    // An ellipse of half axes r and r sqrt 2, cut at 45 degrees: perimeter by integral; no fillet in a miter.
    [Fact]
    public void A_miter_is_one_butt_weld()
    {
        WeldList welds = WeldPlanner.Plan(GateFrame.CopedPackage().Cut);
        Assert.Equal(2, welds.Seams.Count);
        double ellipse = 4 * Integral(a => Post * Math.Sqrt(1 + Squared(Math.Sin(a))), 0, Math.PI / 2);
        Assert.Equal(ellipse, welds.Seams[1].Length, 0.01);
        Assert.Equal(0, welds.Seams[1].Fillet);
        Assert.Equal(welds.Seams[1].Length * 1.5 * 1.5 / 2 * GateFrame.Density, welds.Seams[1].FillerKg, 1e-12);
    }

    // A square post narrower than the flat it stands on: its whole outline, walls square to the flat. EN 10219-2: corners of 2 x 2 mm.
    [Fact]
    public void A_square_post_on_a_flat_is_a_fillet_all_round()
    {
        const string Square = """
            framegen: 1
            nodes: {a: [0 mm, 0 mm, 0 mm], b: [0 mm, 900 mm, 0 mm], mid: {on: sill, at: 50 %}, top: [0 mm, 450 mm, 400 mm]}
            tubes: {sill: {from: a, to: b, group: all}, post: {from: mid, to: top, group: thin}}
            groups: {all: {material: S235, section: square 60 x 3 mm}, thin: {material: S235, section: square 30 x 2 mm}}
            """;
        WeldSeam seam = Assert.Single(WeldPlanner.Plan(PlannedText.Cut(Square)).Seams);
        double outline = (4 * (30 - (2 * 4))) + (2 * Math.PI * 4);
        Assert.Equal(outline, seam.Length, 1e-6);
        Assert.Equal(outline, seam.Fillet, 1e-6);
        Assert.Equal(Math.PI / 2, seam.Least, 1e-6);
        Assert.Equal(Math.PI / 2, seam.Most, 1e-6);
        Assert.Equal(2, seam.Leg);
    }

    [Fact]
    public void Tubes_joined_without_heat_take_no_filler()
    {
        const string Brazed = """
            framegen: 1
            nodes: {a: [0 mm, 0 mm, 0 mm], b: [0 mm, 900 mm, 0 mm], mid: {on: sill, at: 50 %}, top: [0 mm, 450 mm, 400 mm]}
            tubes: {sill: {from: a, to: b, group: all}, post: {from: mid, to: top, group: thin}}
            groups: {all: {material: S235, section: round 40 x 2 mm}, thin: {material: S235, section: round 20 x 2 mm, welded: false}}
            """;
        ShopPackage package = PlannedText.Of(Brazed);
        WeldSeam seam = Assert.Single(WeldPlanner.Plan(package.Cut).Seams);
        Assert.Equal((false, 0.0), (seam.IsWelded, seam.FillerKg));
        Assert.True(seam.Length > 0);
    }

    [Fact]
    public void Papers_list_every_seam_and_the_sum()
    {
        ShopPackage package = GateFrame.CopedPackage();
        WeldList welds = WeldPlanner.Plan(package.Cut);
        string[] csv = WeldsCsv.Write(package.Cut, welds).Split('\n');
        Assert.Equal("node,tube,end,cut,mates,length_mm,fillet_mm,butt_mm,least_deg,most_deg,leg_mm,filler_kg", csv[0]);
        Assert.StartsWith("m,post,from,cope,rail,", csv[1], StringComparison.Ordinal);
        Assert.StartsWith("top,post,to,miter,arm,", csv[2], StringComparison.Ordinal);
        string text = TextTemplate.Render("welds.md", WeldsModel.From(package, welds));
        Assert.Contains("cope to rail", text, StringComparison.Ordinal);
        SelfCheck.Welds(package, welds);
        Assert.Throws<SelfCheckException>(() => SelfCheck.Welds(package, new WeldList([welds.Seams[0]])));
    }

    // Length of the saddle's line a radian: t = sqrt(R^2 - r^2 sin^2).
    private static double Speed(double a)
    {
        double slope = Squared(Post) * Math.Sin(a) * Math.Cos(a) / Math.Sqrt(Squared(R) - Squared(Post * Math.Sin(a)));
        return Math.Sqrt(Squared(Post) + Squared(slope));
    }

    private static double Squared(double x) => x * x;

    private static double Integral(Func<double, double> f, double from, double to)
    {
        const int Parts = 2000;
        double h = (to - from) / Parts;
        double sum = f(from) + f(to);
        for (int i = 1; i < Parts; i++)
        {
            sum += f(from + (i * h)) * (i % 2 == 0 ? 2 : 4);
        }

        return sum * h / 3;
    }
}
