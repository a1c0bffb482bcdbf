namespace FrameGen.Comparison;

/// <summary>
/// What keeps a comparison of tubes from ending at a foil: a wall no thinner than a part of the outer size, no thinner than a length, or both. At equal
/// stiffness the lightest tube of a shape has just that wall.
/// </summary>
public sealed record WallRule
{
    /// <summary>A rule.</summary>
    /// <param name="slenderness">Outer size over wall, at most; null for no limit.</param>
    /// <param name="least">Wall, mm, at least; null for no limit.</param>
    /// <exception cref="ArgumentOutOfRangeException">Both are null, or one is outside its range.</exception>
    public WallRule(double? slenderness, double? least)
    {
        if (slenderness is null && least is null)
        {
            throw new ArgumentOutOfRangeException(nameof(slenderness), slenderness, "Without a limit the lightest tube is infinitely large and thin.");
        }

        if (!(slenderness is null or (> 2 and < double.PositiveInfinity)) || !(least is null or (> 0 and < double.PositiveInfinity)))
        {
            throw new ArgumentOutOfRangeException(nameof(slenderness), slenderness, "A wall's slenderness is above 2, a wall above 0.");
        }

        (Slenderness, Least) = (slenderness, least);
    }

    /// <summary>Outer size over wall, at most; null for no limit.</summary>
    public double? Slenderness { get; }

    /// <summary>Wall, mm, at least; null for no limit.</summary>
    public double? Least { get; }

    /// <summary>The thinnest wall, mm, of a tube of an outer size, mm.</summary>
    public double WallOf(double outerSize) => Math.Max(Least ?? 0, outerSize / (Slenderness ?? double.PositiveInfinity));

    /// <summary>True for a profile whose wall is not thinner, but for rounding.</summary>
    public bool Allows(Profile profile) => profile.Wall is not { } wall || wall >= WallOf(profile.OuterSize) * (1 - 1e-9);
}
