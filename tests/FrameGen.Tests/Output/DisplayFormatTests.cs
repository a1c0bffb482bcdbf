using FrameGen.Mechanics.Sections;
using FrameGen.Output;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Output;

public class DisplayFormatTests
{
    private static readonly DisplayFormat Metric = new(DisplaySpec.Metric);
    private static readonly DisplayFormat Imperial = new(new DisplaySpec(LengthUnit.Inch, 16, MassUnit.Pound, ForceUnit.PoundForce));

    [Theory]
    [InlineData(412.3, "412.3 mm")]
    [InlineData(-0.04, "0.0 mm")]
    [InlineData(-3.26, "-3.3 mm")]
    [InlineData(1234567, "1234567.0 mm")]
    public void Prints_millimetres_with_one_decimal(double mm, string expected) => Assert.Equal(expected, Metric.Length(mm));

    [Fact]
    public void Prints_centimetres() =>
        Assert.Equal("41.23 cm", new DisplayFormat(DisplaySpec.Metric with { Length = LengthUnit.Centimetre }).Length(412.3));

    // 1 in = 25.4 mm exactly (international inch, 1959).
    [Theory]
    [InlineData(412.75, 16, "16-1/4 in")]
    [InlineData(406.4, 16, "16 in")]
    [InlineData(9.525, 8, "3/8 in")]
    [InlineData(0.1, 16, "0 in")]
    [InlineData(-0.1, 16, "0 in")]
    [InlineData(-412.75, 16, "-16-1/4 in")]
    [InlineData(25.39, 64, "1 in")]
    [InlineData(412.75, null, "16.250 in")]
    [InlineData(100, null, "3.937 in")]
    public void Prints_inches(double mm, int? fraction, string expected) =>
        Assert.Equal(expected, new DisplayFormat(new DisplaySpec(LengthUnit.Inch, fraction, MassUnit.Pound, ForceUnit.PoundForce)).Length(mm));

    // 1 lb = 0.45359237 kg, 1 lbf = 4.4482216152605 N, 1 lbf.ft = 1.3558179483314004 N.m, all exact.
    [Fact]
    public void Prints_pounds()
    {
        var imperial = new DisplayFormat(new DisplaySpec(LengthUnit.Inch, 16, MassUnit.Pound, ForceUnit.PoundForce));
        Assert.Equal("2.000 lb", imperial.Mass(0.90718474));
        Assert.Equal("10.0 lbf", imperial.Force(44.482216152605));
        Assert.Equal("2.0 lbf.ft", imperial.Moment(2711.6358966628));
        Assert.Equal("1.000", imperial.MassPerLengthNumber(0.45359237 / 0.3048));
        Assert.Equal(("in", "lb", "lbf", "lb/ft"), (imperial.LengthUnitName, imperial.MassUnitName, imperial.ForceUnitName, imperial.MassPerLengthUnitName));
    }

    [Fact]
    public void Prints_metric_masses_and_forces()
    {
        Assert.Equal("1.204 kg", Metric.Mass(1.2041));
        Assert.Equal("812.5 N", Metric.Force(812.49));
        Assert.Equal("12.4 N.m", Metric.Moment(12400));
        Assert.Equal("0.812 kN", new DisplayFormat(DisplaySpec.Metric with { Force = ForceUnit.Kilonewton }).Force(812.49));
    }

    [Theory]
    [InlineData(0.03124, "0.0312")]
    [InlineData(1.6449, "1.64")]
    [InlineData(0.99961, "1.00")]
    [InlineData(9.996, "10.0")]
    [InlineData(0.000034, "0.000034")]
    [InlineData(412.3, "412")]
    [InlineData(1999.6, "2000")]
    [InlineData(0, "0")]
    public void Prints_small_movements_with_three_digits(double mm, string expected) => Assert.Equal(expected, Metric.SmallLengthNumber(mm));

    [Fact]
    public void Prints_small_movements_in_decimal_inches_even_where_lengths_are_fractions() =>
        Assert.Equal("0.0500", Imperial.SmallLengthNumber(1.27));

    // 1.5 in = 38.1 mm, 0.083 in = 2.1082 mm, 5/8 in = 15.875 mm.
    [Theory]
    [InlineData(38.1, 2.1082, "round 1.5 x 0.083 in")]
    [InlineData(38.1, 2, "round 38.1 x 2 mm")]
    [InlineData(33.7, 2.3, "round 33.7 x 2.3 mm")]
    public void Names_inch_sizes_in_inches_on_papers_in_inches(double od, double wall, string expected)
    {
        Assert.Equal(expected, Imperial.Section(new RoundTube(od, wall)));
        Assert.Equal(new RoundTube(od, wall).Name, Metric.Section(new RoundTube(od, wall)));
    }

    [Fact]
    public void Names_inch_rods_in_inches()
    {
        Assert.Equal("rod 0.625 in", Imperial.Section(new Rod(15.875)));
        Assert.Equal("rod 16 mm", Imperial.Section(new Rod(16)));
    }

    // 2 in = 50.8 mm, 3 in = 76.2 mm, 1/8 in = 3.175 mm with the rule's corner of 1/4 in, 3/16 in = 4.7625 mm.
    [Fact]
    public void Names_other_inch_shapes_in_inches()
    {
        Assert.Equal("square 2 x 0.125 in", Imperial.Section(new FlatSidedTube(50.8, 50.8, 3.175)));
        Assert.Equal("rect 3 x 2 x 0.125 in", Imperial.Section(new FlatSidedTube(76.2, 50.8, 3.175)));
        Assert.Equal("square 2 x 0.125 in corner 0.1875 in", Imperial.Section(new FlatSidedTube(50.8, 50.8, 3.175, 4.7625)));
        Assert.Equal("square 2 x 0.125 in corner 0 in", Imperial.Section(new FlatSidedTube(50.8, 50.8, 3.175, 0)));
        Assert.Equal("square 2 x 0.125 in corner 0.1875 in inner 0.125 in", Imperial.Section(new FlatSidedTube(50.8, 50.8, 3.175, 4.7625, 3.175)));
        Assert.Equal("square 2 x 0.125 in corner 5 mm", Imperial.Section(new FlatSidedTube(50.8, 50.8, 3.175, 5)));
        Assert.Equal("square 50 x 3 mm", Imperial.Section(new FlatSidedTube(50, 50, 3)));
        Assert.Equal("ellipse 2 x 1 x 0.0625 in", Imperial.Section(new EllipseTube(50.8, 25.4, 1.5875)));
        Assert.Equal("ellipse 45 x 28 x 1.5 mm", Imperial.Section(new EllipseTube(45, 28, 1.5)));
    }

    // 1 lbf/in = 4.4482216152605 N / 25.4 mm = 0.1751268 N/mm; 1 lbf.ft = 1.3558179 N.m.
    [Fact]
    public void Shows_targets_in_the_units_of_the_papers()
    {
        Assert.Equal((1.0, "mm"), Metric.TargetUnit("mm"));
        Assert.Equal((1.0, "N/mm"), Metric.TargetUnit("N/mm"));
        Assert.Equal((1.0, "deg"), Imperial.TargetUnit("deg"));
        (double length, string inch) = Imperial.TargetUnit("mm");
        (double stiffness, string poundsPerInch) = Imperial.TargetUnit("N/mm");
        (double turning, string poundFeet) = Imperial.TargetUnit("N.m/deg");
        Assert.Equal(("in", "lbf/in", "lbf.ft/deg"), (inch, poundsPerInch, poundFeet));
        Assert.Equal(1, 25.4 * length, 12);
        Assert.Equal(1, 4.4482216152605 / 25.4 * stiffness, 12);
        Assert.Equal(1, 1.3558179483314004 * turning, 12);
    }
}
