namespace FrameGen.Spec.Quantities;

/// <summary>Values that a quantity may have, in its working unit.</summary>
/// <param name="Min">Lowest.</param>
/// <param name="Max">Highest.</param>
/// <param name="IsOpen">True where the limits themselves are not allowed.</param>
/// <param name="Words">What it must be: <c>more than 0</c>.</param>
internal sealed record ValueRange(double Min, double Max, bool IsOpen, string Words)
{
    /// <summary>No limit.</summary>
    public static readonly ValueRange Any = new(double.NegativeInfinity, double.PositiveInfinity, false, "any value");

    /// <summary>More than 0.</summary>
    public static readonly ValueRange Positive = new(0, double.PositiveInfinity, true, "more than 0");

    /// <summary>0 or more.</summary>
    public static readonly ValueRange NotNegative = new(0, double.PositiveInfinity, false, "0 or more");

    /// <summary>A share of a tube's or a way's length.</summary>
    public static readonly ValueRange WholeShare = new(0, 1, false, "from 0 % to 100 %");

    /// <summary>True for an allowed value.</summary>
    public bool Holds(double value) => IsOpen ? value > Min && value < Max : value >= Min && value <= Max;
}
