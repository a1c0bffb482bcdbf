using System.Globalization;
using System.Text;

namespace FrameGen.Spec.Quantities;

/// <summary>Exponents of length, mass, time and angle.</summary>
/// <remarks>
/// Base units are mm, kg, rad and, for time, √0.001 s: with it one newton is exactly 1 kg·mm/time², so that forces,
/// stresses, moments and stiffnesses in working units (N, MPa, N·mm, N/mm) are coherent with mm and kg without a factor.
/// Angle has an exponent of its own, or a moment could pass for a turning stiffness.
/// </remarks>
internal readonly record struct Dimension(int Length, int Mass, int Time, int Angle = 0)
{
    /// <summary>A plain number.</summary>
    public static readonly Dimension None;

    /// <summary>An angle.</summary>
    public static readonly Dimension OfAngle = new(0, 0, 0, 1);

    private bool IsWithoutLengthMassTime => Length == 0 && Mass == 0 && Time == 0;

    /// <summary>
    /// True where the two may be added or compared. Radius times angle is a length: beside other dimensions a positive
    /// exponent of angle counts as none; but an angle alone is not a number.
    /// </summary>
    public bool Agrees(Dimension other) =>
        (Length, Mass, Time) == (other.Length, other.Mass, other.Time)
        && (Angle == other.Angle
            || (!IsWithoutLengthMassTime && Math.Min(Angle, 0) == Math.Min(other.Angle, 0)));

    /// <summary>Of a product.</summary>
    public Dimension Times(Dimension other) =>
        new(Length + other.Length, Mass + other.Mass, Time + other.Time, Angle + other.Angle);

    /// <summary>Of a quotient.</summary>
    public Dimension Over(Dimension other) =>
        new(Length - other.Length, Mass - other.Mass, Time - other.Time, Angle - other.Angle);

    /// <summary>Of a power.</summary>
    /// <returns>Null where an exponent would not be whole, or beyond any use (over 100).</returns>
    public Dimension? Power(double exponent)
    {
        return Scaled(Length, exponent) is { } length
            && Scaled(Mass, exponent) is { } mass
            && Scaled(Time, exponent) is { } time
            && Scaled(Angle, exponent) is { } angle
                ? new Dimension(length, mass, time, angle)
                : null;
    }

    /// <summary>In N, mm, kg and rad, such as <c>N.mm3</c>; empty for a plain number.</summary>
    public override string ToString()
    {
        int newtons = Time % 2 == 0 ? -Time / 2 : 0;
        var text = new StringBuilder();
        Append(text, "N", newtons);
        Append(text, "kg", Mass - newtons);
        Append(text, "mm", Length - newtons);
        Append(text, "s", newtons == 0 ? Time : 0);
        Append(text, "rad", Angle);
        return text.ToString();
    }

    private static int? Scaled(int part, double exponent)
    {
        double scaled = part * exponent;
        double whole = Math.Round(scaled);

        // A third written as 1/3 is not exact; what differs by less than this is meant to be whole.
        return Math.Abs(scaled - whole) <= 1e-9 && Math.Abs(whole) <= 100 ? (int)whole : null;
    }

    private static void Append(StringBuilder text, string unit, int exponent)
    {
        if (exponent == 0)
        {
            return;
        }

        if (text.Length > 0)
        {
            text.Append('.');
        }

        text.Append(unit);
        if (exponent != 1)
        {
            text.Append(exponent < 0 ? "^" : string.Empty).Append(exponent.ToString(CultureInfo.InvariantCulture));
        }
    }
}
