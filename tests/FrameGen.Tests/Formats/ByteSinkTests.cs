using System.Text;
using FrameGen.Formats;
using Xunit;

namespace FrameGen.Tests.Formats;

public class ByteSinkTests
{
    [Theory]
    [InlineData(0, 6, "0")]
    [InlineData(-4e-7, 6, "0")]
    [InlineData(-6e-7, 6, "-0.000001")]
    [InlineData(12.5, 3, "12.5")]
    [InlineData(-12.5, 3, "-12.5")]
    [InlineData(0.05, 3, "0.05")]
    [InlineData(0.9996, 3, "1")]
    [InlineData(119.38052083641213, 6, "119.380521")]
    [InlineData(1e9, 6, "1000000000")]
    public void Prints_decimals_without_needless_zeros(double value, int decimals, string printed)
    {
        Assert.Equal(printed, Print(value, decimals));
    }

    [Fact]
    public void Keeps_the_point_where_asked()
    {
        Assert.Equal("2.0", Encoding.ASCII.GetString(new ByteSink(1).Decimal(2, 6, keepPoint: true).Written));
    }

    [Fact]
    public void Agrees_with_decimal_arithmetic()
    {
        var random = new Random(1);
        for (int i = 0; i < 2000; i++)
        {
            double value = (random.NextDouble() - 0.5) * Math.Pow(10, random.Next(1, 7));
            decimal rounded = Math.Round((decimal)value, 6, MidpointRounding.AwayFromZero);
            decimal printed = decimal.Parse(Print(value, 6), System.Globalization.CultureInfo.InvariantCulture);

            // decimal holds 15 digits of a double: a value on a rounding edge may go either way.
            Assert.InRange(Math.Abs(printed - rounded), 0m, 0.000001m);
        }
    }

    private static string Print(double value, int decimals) => Encoding.ASCII.GetString(new ByteSink(1).Decimal(value, decimals).Written);
}
