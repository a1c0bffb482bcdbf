using System.Globalization;

namespace FrameGen.Spec.Quantities;

/// <summary>Numbers as messages print them.</summary>
internal static class SpecNumber
{
    /// <summary>Up to nine digits, a point for the decimal sign.</summary>
    public static string Text(double value) => value.ToString("G9", CultureInfo.InvariantCulture);

    /// <summary>With its unit.</summary>
    public static string Text(Measure measure)
    {
        string unit = measure.Dimension.ToString();
        return unit.Length == 0 ? Text(measure.Value) : $"{Text(measure.Value)} {unit}";
    }
}
