using System.Globalization;
using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using FrameGen.Output;
using Xunit;

namespace FrameGen.Tests.Fabrication;

/// <summary>Loose posts of a fence, all square: their cut lengths are their axes, so that every number can be worked out by hand.</summary>
public class StockPlannerTests
{
    private const string Prices = "stock: {shop: {material: S235, bar: 1000 mm, price_per_m: 4, sizes: [round 30 x 2 mm]}}";

    // 400 + 2 + 300 + 2 + 290 = 994 of 1000: one bar; the rest a second.
    [Fact]
    public void Pieces_are_parted_by_one_kerf_each_and_marked_from_the_bar_s_end()
    {
        StockPlan plan = Plan([400, 300, 290, 200], Prices).Stock;
        StockLot lot = Assert.Single(plan.Lots);
        Assert.Equal((2, 2, true), (lot.Bars.Count, lot.LowerBound, lot.IsOptimal));
        Assert.Equal([(0.0, 400.0), (402, 702), (704, 994)], Marks(lot.Bars[0]));
        Assert.Equal(6, lot.Bars[0].Offcut, 1e-9);
        Assert.Equal([(0.0, 200.0)], Marks(lot.Bars[1]));
        Assert.Equal(800, lot.Bars[1].Offcut, 1e-9);
    }

    [Fact]
    public void Trim_comes_off_both_ends_and_not_twice_between_pieces()
    {
        // 10 + 488 + 4 + 488 + 10: full to the last, no kerf after the last piece.
        StockLot lot = Assert.Single(Plan([488, 488], Prices + "\nfabrication: {kerf: 4 mm, bar_trim: 10 mm}").Stock.Lots);
        StockBar bar = Assert.Single(lot.Bars);
        Assert.Equal([(10.0, 498.0), (502, 990)], Marks(bar));
        Assert.Equal(0, bar.Offcut, 1e-9);

        // A little more than the tolerance of one part, and two bars are needed.
        Assert.Equal(2, Plan([488, 488.03], Prices + "\nfabrication: {kerf: 4 mm, bar_trim: 10 mm}").Stock.BarsToBuy);
    }

    [Fact]
    public void Cost_and_mass_are_of_whole_bars()
    {
        StockPlan plan = Plan([400, 300, 290, 200], Prices).Stock;
        Assert.Equal(2 * 1.0 * 4, plan.Cost!.Value, 1e-12);
        Assert.Equal(2 * 1000 * Math.PI * 2 * 28 * 7.85e-6, plan.BoughtMassKg, 1e-9);
        Assert.Null(Plan([400], string.Empty).Stock.Cost);
    }

    [Fact]
    public void A_section_that_no_list_holds_comes_in_bars_of_six_metres() =>
        Assert.Equal(6000, Assert.Single(Plan([400], string.Empty).Stock.Lots).BarLength);

    [Fact]
    public void The_rack_is_cut_first_and_costs_nothing()
    {
        StockPlan plan = Plan([600, 500, 300], Prices + "\nhave: [{section: round 30 x 2 mm, material: S235, lengths: [850 mm, 310 mm]}]").Stock;
        Assert.Equal([(310.0, true), (850, true), (1000, false)], plan.Lots.Select(l => (l.BarLength, l.IsRack)).ToArray());
        Assert.Equal([0, 0, 1], plan.Lots.Select(l => l.LowerBound).ToArray());
        Assert.Equal(["R1", "R2", "1"], plan.Lots.Select(l => Assert.Single(l.Bars).Label).ToArray());
        Assert.Equal((1, 4.0), (plan.BarsToBuy, plan.Cost));
    }

    // Filled fullest, 700 would take 445 + 250 and leave 690, 555, 400 and 350, which two bars can't hold; with 690 in it
    // they are 555 + 445 and 400 + 350 + 250.
    [Fact]
    public void What_is_cut_from_the_rack_is_chosen_so_that_fewer_bars_are_bought()
    {
        const string Rack = "\nhave: [{section: round 30 x 2 mm, material: S235, lengths: [700 mm]}]\nfabrication: {kerf: 0 mm}";
        StockPlan plan = Plan([690, 555, 445, 400, 350, 250], Prices + Rack).Stock;
        Assert.Equal(2, plan.BarsToBuy);
        Assert.All(plan.Lots, l => Assert.True(l.IsOptimal));
    }

    [Fact]
    public void A_piece_longer_than_the_bar_is_an_error_that_names_tube_length_and_bar()
    {
        DiagnosticList diagnostics = [];
        Assert.Null(Run([400, 1200.5], Prices, diagnostics));
        string error = Assert.Single(diagnostics).ToString();
        Assert.StartsWith("fence.yaml:7:3: error: tube post-2: its piece is 1200.5 mm long, and a bar of round 30 x 2 mm has 1000 mm;", error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_piece_longer_than_the_bar_may_come_from_the_rack()
    {
        StockPlan plan = Plan([1200, 400], Prices + "\nhave: [{section: round 30 x 2 mm, material: S235, lengths: [1500 mm, 1250 mm]}]").Stock;
        Assert.Equal(0, plan.BarsToBuy);
        Assert.Equal([1250.0, 1500.0], plan.Lots.Select(l => l.BarLength).ToArray());
    }

    [Fact]
    public void What_the_frame_can_t_use_of_the_rack_is_told()
    {
        DiagnosticList diagnostics = [];
        Run([400], Prices + "\nhave: [{section: round 30 x 1.5 mm, material: S235, lengths: [1500 mm]}]", diagnostics);
        Assert.Contains("note: have: no tube of this frame is round 30 x 1.5 mm of S235", Assert.Single(diagnostics).ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Papers_tell_each_bar_its_marks_and_what_is_left()
    {
        ShopPackage package = Plan([400, 300, 290, 200], Prices + "\nfabrication: {kerf: 2 mm}");
        string[] csv = StockPlanCsv.Write(package).Split('\n');
        Assert.Equal("material,section,bar,bar_mm,position,mark,length_mm,from_mm,to_mm,offcut_mm", csv[0]);
        Assert.Equal($"S235,round 30 x 2 mm,1,1000.000,2,{GateFrame.PartOf(package, "post-2")},300.000,402.000,702.000,6.000", csv[2]);
        string text = TextTemplate.Render("stock-plan.md", StockPlanModel.From(package));
        Assert.Contains($"| **1** | 1000.0 | {GateFrame.PartOf(package, "post-1")} |  400.0 |   0.0 | 400.0 |", text, StringComparison.Ordinal);
        Assert.Contains("|       |        | *offcut*    |    6.0 |       |       |", text, StringComparison.Ordinal);
        SelfCheck.Stock(package);
    }

    [Fact]
    public void The_self_check_misses_no_piece()
    {
        ShopPackage package = Plan([400, 300], Prices);
        StockLot lot = package.Stock.Lots[0];
        StockBar bar = lot.Bars[0];
        StockLot once = lot with { Bars = [bar with { Cuts = [bar.Cuts[0]] }] };
        Assert.Throws<SelfCheckException>(() => SelfCheck.Stock(package with { Stock = new StockPlan([once]) }));
        StockLot twice = lot with { Bars = [bar with { Cuts = [bar.Cuts[0], bar.Cuts[0]] }] };
        Assert.Throws<SelfCheckException>(() => SelfCheck.Stock(package with { Stock = new StockPlan([twice]) }));
    }

    private static (double From, double To)[] Marks(StockBar bar) => [.. bar.Cuts.Select(c => (c.From, c.To))];

    private static ShopPackage Plan(double[] lengths, string more)
    {
        DiagnosticList diagnostics = [];
        ShopPackage? package = Run(lengths, more, diagnostics);
        Assert.False(diagnostics.HasErrors, string.Join('\n', diagnostics));
        return package!;
    }

    private static ShopPackage? Run(double[] lengths, string more, DiagnosticList diagnostics)
    {
        var tubes = new StringBuilder();
        var nodes = new StringBuilder("nodes: {");
        for (int i = 0; i < lengths.Length; i++)
        {
            nodes.Append(CultureInfo.InvariantCulture, $"a{i}: [{i * 500} mm, 0 mm, 0 mm], b{i}: [{i * 500} mm, 0 mm, {lengths[i]} mm], ");
            tubes.Append(CultureInfo.InvariantCulture, $"  post-{i + 1}: {{from: a{i}, to: b{i}, group: posts}}\n");
        }

        nodes.Append('}');
        string text = $$$"""
            framegen: 1
            groups: {posts: {material: S235, section: round 30 x 2 mm}}
            # the fence's posts

            tubes:
            {{{tubes.ToString().TrimEnd()}}}
            {{{nodes}}}
            {{{more}}}

            """;
        return PlannedText.Run(text, diagnostics, "fence.yaml");
    }
}
