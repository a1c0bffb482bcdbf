using System.Globalization;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>Compares a number with a printed one: right when within half a unit of the last printed digit.</summary>
internal static class Printed
{
    /// <summary>Compares one number.</summary>
    /// <param name="printed">The number as the source prints it, like <c>-2.352e-3</c>.</param>
    /// <param name="actual">Ours.</param>
    public static void Equal(string printed, double actual) => Within(0.5, printed, actual);

    /// <summary>For a source that rounds from numbers it has already rounded: within one unit of its last digit.</summary>
    /// <param name="printed">Numbers as the source prints them, with blanks between.</param>
    /// <param name="actual">Ours, as many.</param>
    public static void EqualToOneUnit(string printed, params double[] actual)
    {
        string[] numbers = printed.Split(' ', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal(numbers.Length, actual.Length);
        for (int i = 0; i < actual.Length; i++)
        {
            Within(1, numbers[i], actual[i]);
        }
    }

    /// <summary>Compares a row of numbers.</summary>
    /// <param name="printed">Numbers as the source prints them, with blanks between.</param>
    /// <param name="actual">Ours, as many.</param>
    public static void Equal(string printed, params double[] actual)
    {
        string[] numbers = printed.Split(' ', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal(numbers.Length, actual.Length);
        for (int i = 0; i < actual.Length; i++)
        {
            Equal(numbers[i], actual[i]);
        }
    }

    private static void Within(double units, string printed, double actual)
    {
        string[] parts = printed.Split('e');
        int point = parts[0].IndexOf('.', StringComparison.Ordinal);
        int decimals = point < 0 ? 0 : parts[0].Length - point - 1;
        int exponent = parts.Length > 1 ? int.Parse(parts[1], CultureInfo.InvariantCulture) : 0;
        double tolerance = units * Math.Pow(10, exponent - decimals);
        double expected = double.Parse(printed, CultureInfo.InvariantCulture);
        Assert.True(
            Math.Abs(actual - expected) <= tolerance * (1 + 1e-9),
            string.Create(CultureInfo.InvariantCulture, $"printed {printed}, got {actual:R}"));
    }
}
