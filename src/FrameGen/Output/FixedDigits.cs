using System.Globalization;

namespace FrameGen.Output;

/// <summary>Numbers with a fixed count of decimals, <c>.</c> as decimal sign, never a negative zero.</summary>
internal static class FixedDigits
{
    /// <summary>0.001 mm.</summary>
    public static string Length(double mm) => Print(mm, "0.000");

    /// <summary>0.1 g.</summary>
    public static string Mass(double kg) => Print(kg, "0.0000");

    /// <summary>0.001 degree, as it stands.</summary>
    /// <param name="degrees">Angle, degrees.</param>
    public static string Angle(double degrees) => Print(degrees, "0.000");

    /// <summary>0.1 degree, for papers that people read.</summary>
    /// <param name="degrees">Angle, degrees.</param>
    public static string Tenths(double degrees) => Print(degrees, "0.0");

    /// <summary>0.001 degree in [0, <paramref name="turn"/>): an angle that rounds to a whole turn prints as 0.</summary>
    /// <param name="degrees">Angle, degrees.</param>
    /// <param name="turn">180 or 360.</param>
    public static string Clock(double degrees, double turn)
    {
        double rounded = Math.Round(degrees, 3);
        return Print(rounded - (turn * Math.Floor(rounded / turn)), "0.000");
    }

    /// <summary>A number in a format such as <c>0.000</c>.</summary>
    /// <param name="value">Any number.</param>
    /// <param name="format">A custom numeric format of fixed decimals.</param>
    public static string Print(double value, string format)
    {
        string text = value.ToString(format, CultureInfo.InvariantCulture);
        return text.StartsWith('-') && text.AsSpan().IndexOfAnyInRange('1', '9') < 0 ? text[1..] : text;
    }
}
