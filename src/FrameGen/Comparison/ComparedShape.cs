using FrameGen.Mechanics.Sections;

namespace FrameGen.Comparison;

/// <summary>A family of cross-sections that differ in size and wall only.</summary>
/// <param name="Name">As people read it.</param>
/// <param name="StockShape">The spec's word for the shape, by which stock has it; null for what no list can hold.</param>
/// <param name="LargestWall">Walls must be below this share of the outer size; null for a solid bar.</param>
/// <param name="Make">The profile of an outer size and a wall, mm; the wall means nothing for a solid bar.</param>
public sealed record ComparedShape(string Name, string? StockShape, double? LargestWall, Func<double, double, Profile> Make)
{
    /// <summary>Solid square bar: the yardstick of the classic comparison.</summary>
    public static readonly ComparedShape SquareBar = new("square bar", null, null, (a, _) => Square(a));

    /// <summary>Solid round bar.</summary>
    public static readonly ComparedShape Rod = new("rod", "rod", null, (d, _) => Profile.Of(new Rod(d)));

    /// <summary>Round tube.</summary>
    public static readonly ComparedShape Round = new("round", "round", 1.0 / 2, (d, t) => Profile.Of(new RoundTube(d, t)));

    /// <summary>Round tube by the thin-wall formulas, A = πdt and I = πd³t/8 with d the mean diameter.</summary>
    public static readonly ComparedShape ThinRound = new("round, thin-wall", "round", 1.0 / 2, ThinTube);

    /// <summary>Square tube with outer corners of twice the wall, which EN 10219-2 calculates with up to 6 mm.</summary>
    public static readonly ComparedShape SquareTube = new("square", "square", 1.0 / 4, (h, t) => Profile.Of(new FlatSidedTube(h, h, t, 2 * t)));

    /// <summary>Rectangular tube, upright, half as wide as high, corners as the square tube's.</summary>
    public static readonly ComparedShape Rect = new("rect", "rect", 1.0 / 8, (h, t) => Profile.Of(new FlatSidedTube(h, h / 2, t, 2 * t)));

    /// <summary>Elliptic tube, upright, half as wide as high; its smallest radius of curvature is an eighth of its height.</summary>
    public static readonly ComparedShape Ellipse = new("ellipse", "ellipse", 1.0 / 8, (h, t) => Profile.Of(new EllipseTube(h, h / 2, t)));

    /// <summary>True for a tube.</summary>
    public bool IsTube => LargestWall is not null;

    /// <summary>All shapes, solid ones first.</summary>
    /// <param name="thinWall">True for the round tube by its thin-wall formulas.</param>
    public static IReadOnlyList<ComparedShape> All(bool thinWall = false) => [SquareBar, Rod, thinWall ? ThinRound : Round, SquareTube, Rect, Ellipse];

    private static Profile ThinTube(double diameter, double wall)
    {
        double mean = diameter - wall;
        double second = Math.PI * mean * mean * mean * wall / 8;
        return new Profile(diameter, diameter, wall, Math.PI * mean * wall, second, second, 2 * second, new RoundTube(diameter, wall));
    }

    // J = a⁴/3 (1 − 192/π⁵ Σ tanh(nπ/2)/n⁵), n odd (Timoshenko and Goodier, Theory of Elasticity, article 109).
    private static Profile Square(double side)
    {
        double sum = 0;
        for (int n = 99; n > 0; n -= 2)
        {
            sum += Math.Tanh(n * Math.PI / 2) / Math.Pow(n, 5);
        }

        double fourth = side * side * side * side;
        double torsion = fourth / 3 * (1 - (192 / Math.Pow(Math.PI, 5) * sum));
        return new Profile(side, side, null, side * side, fourth / 12, fourth / 12, torsion);
    }
}
