using System.Globalization;
using FrameGen.Geometry;

namespace FrameGen.Sizing;

/// <summary>Numbers, directions and lists as messages print them.</summary>
internal static class Wording
{
    /// <summary>Four significant digits, never fewer than the whole units, no exponent for what a frame holds.</summary>
    public static string Number(double value)
    {
        if (double.IsPositiveInfinity(value))
        {
            return "unlimited";
        }

        double size = Math.Abs(value);
        if (size == 0)
        {
            return "0";
        }

        if (size is < 1e-6 or >= 1e9)
        {
            return value.ToString("0.###e0", CultureInfo.InvariantCulture);
        }

        int decimals = Math.Max(0, 3 - (int)Math.Floor(Math.Log10(size)));
        return Math.Round(value, decimals).ToString("0.#########", CultureInfo.InvariantCulture);
    }

    /// <summary>A count with thousands set apart, as in 200,000.</summary>
    public static string Count(long value) => value.ToString("#,0", CultureInfo.InvariantCulture);

    /// <summary>A share as a percentage: 0.934 is <c>93 %</c>.</summary>
    public static string Percent(double share)
    {
        double percent = 100 * share;
        return (percent < 10 ? percent.ToString("0.#", CultureInfo.InvariantCulture) : percent.ToString("0", CultureInfo.InvariantCulture)) + " %";
    }

    /// <summary>A value with its unit, if it has one.</summary>
    public static string Quantity(double value, string unit) => unit.Length == 0 ? Number(value) : $"{Number(value)} {unit}";

    /// <summary>A unit direction: <c>x</c>, <c>-z</c>, or its components.</summary>
    public static string Direction(Vector3 direction)
    {
        const double Close = 1e-9;
        (string Name, Vector3 Axis)[] axes = [("x", Vector3.UnitX), ("y", Vector3.UnitY), ("z", Vector3.UnitZ)];
        foreach ((string name, Vector3 axis) in axes)
        {
            if ((direction - axis).Length < Close)
            {
                return name;
            }

            if ((direction + axis).Length < Close)
            {
                return "-" + name;
            }
        }

        return $"({Component(direction.X)}, {Component(direction.Y)}, {Component(direction.Z)})";
    }

    /// <summary>A direction whose sign does not matter, as of a motion that can go both ways.</summary>
    public static string Axis(Vector3 direction)
    {
        const double Close = 1e-6;
        double size = direction.Length;
        Vector3 unit = new(Clean(direction.X / size), Clean(direction.Y / size), Clean(direction.Z / size));
        bool flip = unit.X < 0 || (unit.X == 0 && (unit.Y < 0 || (unit.Y == 0 && unit.Z < 0)));
        return Direction(flip ? -unit : unit);

        static double Clean(double component) =>
            Math.Abs(component) < Close ? 0 : Math.Abs(Math.Abs(component) - 1) < Close ? Math.Sign(component) : component;
    }

    /// <summary>A list for people: <c>a</c>, <c>a and b</c>, <c>a, b and c</c>, <c>a, b, c and 4 more</c>.</summary>
    public static string List(IReadOnlyList<string> names, int most = 4)
    {
        if (names.Count == 1)
        {
            return names[0];
        }

        if (names.Count > most)
        {
            return $"{string.Join(", ", names.Take(most - 1))} and {names.Count - most + 1} more";
        }

        return $"{string.Join(", ", names.Take(names.Count - 1))} and {names[^1]}";
    }

    private static string Component(double value)
    {
        double rounded = Math.Round(value, 3);
        return (rounded == 0 ? 0 : rounded).ToString("0.###", CultureInfo.InvariantCulture);
    }
}
