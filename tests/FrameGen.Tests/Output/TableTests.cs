using FrameGen.Fabrication;
using FrameGen.Output;
using FrameGen.Tests.Fabrication;
using Xunit;

namespace FrameGen.Tests.Output;

public class TableTests
{
    [Fact]
    public void Quotes_what_has_to_be_quoted()
    {
        var table = new CsvTable("a", "b");
        table.Row("one, two", "say \"hi\"");
        table.Row("line\nbreak", string.Empty);
        Assert.Equal("a,b\n\"one, two\",\"say \"\"hi\"\"\"\n\"line\nbreak\",\n", table.ToString());
    }

    [Theory]
    [InlineData("=1+1", "'=1+1")]
    [InlineData("@cmd", "'@cmd")]
    [InlineData("-5", "'-5")]
    [InlineData("S235", "S235")]
    [InlineData("", "")]
    public void Words_are_never_formulas(string text, string expected) => Assert.Equal(expected, CsvTable.Words(text));

    [Theory]
    [InlineData(359.9996, 360, "0.000")]
    [InlineData(359.9994, 360, "359.999")]
    [InlineData(-0.0001, 360, "0.000")]
    [InlineData(-90, 360, "270.000")]
    [InlineData(179.9999, 180, "0.000")]
    public void Clock_angles_stay_in_one_turn(double degrees, double turn, string expected) =>
        Assert.Equal(expected, FixedDigits.Clock(degrees, turn));

    [Fact]
    public void Cut_list_has_the_agreed_columns_and_digits()
    {
        ShopPackage package = GateFrame.Package();
        string[] lines = CutListCsv.Write(package).Split('\n');
        Assert.Equal(
            "mark,quantity,tubes,material,section,cut_length_mm,node_length_mm,mass_each_kg,mass_total_kg,hand,from_end,to_end,twist_deg,note",
            lines[0]);

        // The post: shortest at the saddle's sides, sqrt(20^2 - 15^2) = 13.2288 from the rail's axis; longest 15 past the miter's point.
        string[] post = lines[1].Split(',');
        Assert.Equal([GateFrame.PartOf(package, "post"), "1", "post", "S235", "round 30 x 1.5 mm", "601.771", "600.000"], post[..7]);
        Assert.Equal(["", "cope rail", "miter arm", "0.000", "contour cut"], post[9..]);
        string[] rail = lines[3].Split(',');
        Assert.Equal([GateFrame.PartOf(package, "rail"), "1", "rail", "S235", "round 40 x 2 mm", "1000.000", "1000.000"], rail[..7]);

        // 7.85e-6 x pi x 2 x 38 x 1000 = 1.87427 kg
        Assert.Equal(["1.8743", "1.8743", "", "square", "square", "", ""], rail[7..]);
        Assert.Equal(string.Empty, lines[4]);
    }

    [Fact]
    public void Ends_have_a_row_a_mate_and_one_where_nothing_cuts()
    {
        ShopPackage package = GateFrame.Package();
        (string post, string arm, string rail) =
            (GateFrame.PartOf(package, "post"), GateFrame.PartOf(package, "arm"), GateFrame.PartOf(package, "rail"));
        string[] lines = EndsCsv.Write(package).Split('\n');
        Assert.Equal(
            [
                "tube,end,mark,cut,mate,angle_deg,offset_mm,clock_deg,saw_mm,gap_mm",
                $"rail,from,{rail},square,,,,,,",
                $"rail,to,{rail},square,,,,,,",
                $"post,from,{post},cope,rail,90.000,0.000,0.000,40.000,0.000",
                $"post,to,{post},miter,arm,90.000,0.000,0.000,,",
                $"arm,from,{arm},miter,post,90.000,0.000,180.000,,",
                $"arm,to,{arm},square,,,,,,",
                string.Empty,
            ],
            lines);
    }

    [Fact]
    public void Set_up_lists_nodes_with_their_tubes_in_the_order_of_fitting()
    {
        string[] lines = SetupCsv.Write(GateFrame.Package()).Split('\n');
        Assert.Equal("node,x_mm,y_mm,z_mm,tubes", lines[0]);
        Assert.Equal("m,400.000,0.000,0.000,rail post", lines[3]);
        Assert.Equal("top,400.000,0.000,600.000,post arm", lines[4]);
    }
}
