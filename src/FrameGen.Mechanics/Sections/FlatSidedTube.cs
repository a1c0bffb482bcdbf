using System.Globalization;
using FrameGen.Geometry;

namespace FrameGen.Mechanics.Sections;

/// <summary>Square or rectangular tube with rounded corners.</summary>
/// <remarks>
/// Area, second moments, plastic moduli and torsion by EN 10219-2:2006 Annex B, which is EN 10210-2:2006 Annex B; the corners' radii need not
/// share a centre. H is the height along the top line, B the width, T the wall, ro and ri the corners' outer and inner radii.
/// </remarks>
public sealed record FlatSidedTube : CellTube
{
    /// <summary>Radii closer than this to the rule's are the rule's, mm.</summary>
    private const double SameRadius = 1e-6;

    // What a corner of radius r lacks of a square one: how far its centroid lies from the square corner's sides per r, its second
    // moment about its own centroid per r⁴, its area per r².
    private const double CentroidShare = (10 - (3 * Math.PI)) / (12 - (3 * Math.PI));
    private const double SpandrelMoment = (1.0 / 3) - (Math.PI / 16) - (1 / (3 * (12 - (3 * Math.PI))));
    private const double SpandrelArea = 1 - (Math.PI / 4);

    /// <summary>A cold-formed tube, with the corners that EN 10219-2 calculates with: <see cref="RuleOuterCorner"/>.</summary>
    /// <param name="height">H along the top line, mm.</param>
    /// <param name="width">B, mm.</param>
    /// <param name="wall">T, mm.</param>
    /// <exception cref="ArgumentOutOfRangeException">The wall leaves no bore, or the corners don't fit into the smaller side.</exception>
    public FlatSidedTube(double height, double width, double wall)
        : this(height, width, wall, RuleOuterCorner(wall))
    {
    }

    /// <summary>With an outer corner radius; the inner one has the same centre, or is sharp where the wall is thicker.</summary>
    /// <param name="height">H along the top line, mm.</param>
    /// <param name="width">B, mm.</param>
    /// <param name="wall">T, mm.</param>
    /// <param name="outerCorner">ro, mm; 0 for a sharp corner, at most half the smaller side.</param>
    /// <exception cref="ArgumentOutOfRangeException">The wall leaves no bore, or a radius is outside its range.</exception>
    public FlatSidedTube(double height, double width, double wall, double outerCorner)
        : this(height, width, wall, outerCorner, RuleInnerCorner(outerCorner, wall))
    {
    }

    /// <summary>With both corner radii.</summary>
    /// <param name="height">H along the top line, mm.</param>
    /// <param name="width">B, mm.</param>
    /// <param name="wall">T, mm; less than half the smaller side.</param>
    /// <param name="outerCorner">ro, mm; 0 for a sharp corner, at most half the smaller side.</param>
    /// <param name="innerCorner">ri, mm; at most half the smaller inner side, and large enough to leave metal at the corner.</param>
    /// <exception cref="ArgumentOutOfRangeException">The wall leaves no bore, or a radius is outside its range.</exception>
    public FlatSidedTube(double height, double width, double wall, double outerCorner, double innerCorner)
        : base(height, width, wall)
    {
        double half = Math.Min(height, width) / 2;

        // "Not inside the range", so that NaN is refused as well.
        if (!(wall > 0 && wall < half && double.IsFinite(height) && double.IsFinite(width)))
        {
            throw new ArgumentOutOfRangeException(
                nameof(wall), wall, $"A {height} x {width} mm tube takes a wall between 0 and half the smaller side.");
        }

        if (!(outerCorner >= 0 && outerCorner <= half))
        {
            throw new ArgumentOutOfRangeException(nameof(outerCorner), outerCorner, $"A corner radius goes from 0 to half the smaller side, {half} mm.");
        }

        (double least, double most) = InnerCornerRange(height, width, wall, outerCorner);
        if (!(innerCorner >= least && innerCorner <= most))
        {
            throw new ArgumentOutOfRangeException(nameof(innerCorner), innerCorner, $"This inner corner radius goes from {least} to {most} mm.");
        }

        (OuterCorner, InnerCorner) = (outerCorner, innerCorner);
        Outline = new FlatSidedOutline(height, width, outerCorner);
        Bore = new FlatSidedOutline(height - (2 * wall), width - (2 * wall), innerCorner);
    }

    /// <summary>ro, mm.</summary>
    public double OuterCorner { get; }

    /// <summary>ri, mm.</summary>
    public double InnerCorner { get; }

    /// <summary>True where ri is not <see cref="RuleInnerCorner"/>, as of hot-finished tube.</summary>
    public bool HasOwnInnerCorner => Math.Abs(InnerCorner - RuleInnerCorner(OuterCorner, Wall)) > SameRadius;

    /// <inheritdoc/>
    public override Outline Outline { get; }

    /// <inheritdoc/>
    public override Outline Bore { get; }

    /// <inheritdoc/>
    public override string Name
    {
        get
        {
            string size = Height == Width ? $"square {Height:0.####}" : $"rect {Height:0.####} x {Width:0.####}";
            bool inner = HasOwnInnerCorner;
            string corner = inner || Math.Abs(OuterCorner - RuleOuterCorner(Wall)) > SameRadius ? $" corner {OuterCorner:0.####} mm" : string.Empty;
            return string.Create(CultureInfo.InvariantCulture, $"{size} x {Wall:0.####} mm{corner}{(inner ? $" inner {InnerCorner:0.####} mm" : string.Empty)}");
        }
    }

    /// <inheritdoc/>
    public override string Shape => Height == Width ? "square" : "rect";

    /// <summary>A = 2T(B + H − 2T) − (4 − π)(ro² − ri²), mm².</summary>
    public override double Area =>
        (2 * Wall * (Width + Height - (2 * Wall))) - ((4 - Math.PI) * (OuterCorner - InnerCorner) * (OuterCorner + InnerCorner));

    /// <summary>Iyy = BH³/12 − (B − 2T)(H − 2T)³/12 − 4(Igg + Ag hg²) + 4(Iξξ + Aξ hξ²), mm⁴.</summary>
    public override double Iy => SecondMoment(Height, Width);

    /// <summary>Izz: the same with H and B swapped, mm⁴.</summary>
    public override double Iz => SecondMoment(Width, Height);

    /// <summary>2(B + H) − (8 − 2π) ro, mm.</summary>
    public override double Perimeter => Outline.Perimeter;

    /// <summary>Wpl,yy = BH²/4 − (B − 2T)(H − 2T)²/4 − 4 Ag hg + 4 Aξ hξ, mm³.</summary>
    public override double PlasticModulusY => PlasticModulus(Height, Width);

    /// <summary>Wpl,zz: the same with H and B swapped, mm³.</summary>
    public override double PlasticModulusZ => PlasticModulus(Width, Height);

    /// <summary>h = 2[(B − T) + (H − T)] − 2Rc(4 − π) with Rc = (ro + ri)/2, mm.</summary>
    public override double MidLineLength => (2 * (Width + Height - (2 * Wall))) - (2 * MidCorner * (4 - Math.PI));

    /// <summary>Ah = (B − T)(H − T) − Rc²(4 − π), mm².</summary>
    public override double MidLineArea => ((Width - Wall) * (Height - Wall)) - (MidCorner * MidCorner * (4 - Math.PI));

    /// <inheritdoc/>
    internal override int Pieces => 3;

    // Rc, mm.
    private double MidCorner => (OuterCorner + InnerCorner) / 2;

    /// <summary>The outer corner radius that EN 10219-2:2006 Annex B calculates with, mm: 2T up to 6 mm, 2.5T up to 10 mm, 3T above.</summary>
    /// <param name="wall">T, mm.</param>
    public static double RuleOuterCorner(double wall) => wall switch
    {
        <= 6 => 2 * wall,
        <= 10 => 2.5 * wall,
        _ => 3 * wall,
    };

    /// <summary>The inner corner radius that goes with an outer one unless another is given, mm: ro − T, or 0.</summary>
    /// <param name="outerCorner">ro, mm.</param>
    /// <param name="wall">T, mm.</param>
    public static double RuleInnerCorner(double outerCorner, double wall) => Math.Max(outerCorner - wall, 0);

    /// <summary>The inner corner radii that a tube can have, mm: metal is left at the corner, and the bore's sides are not used up.</summary>
    /// <param name="height">H, mm.</param>
    /// <param name="width">B, mm.</param>
    /// <param name="wall">T, mm; less than half the smaller side.</param>
    /// <param name="outerCorner">ro, mm; at most half the smaller side.</param>
    public static (double Least, double Most) InnerCornerRange(double height, double width, double wall, double outerCorner)
    {
        // On the corner's diagonal √2 T − (√2 − 1)(ro − ri) of metal is left: as much as half the wall at least.
        double least = Math.Max(0, outerCorner - (wall * (Math.Sqrt(2) - 0.5) / (Math.Sqrt(2) - 1)));
        return (least, Math.Max(0, Math.Min(height - (2 * wall), width - (2 * wall)) / 2));
    }

    /// <summary>2T(B − T) across and 2T(H − T) towards the top line, mm²: the two walls that lie along the shear, between the other two's middles.</summary>
    /// <param name="poissonRatio">Not used.</param>
    public override (double Y, double Z) ShearAreas(double poissonRatio) => (2 * Wall * (Width - Wall), 2 * Wall * (Height - Wall));

    /// <summary>True for the same sizes.</summary>
    public bool Equals(FlatSidedTube? other) =>
        other is not null && Height == other.Height && Width == other.Width && Wall == other.Wall
        && OuterCorner == other.OuterCorner && InnerCorner == other.InnerCorner;

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Height, Width, Wall, OuterCorner, InnerCorner);

    /// <inheritdoc/>
    internal override int PartsOf(int piece) => piece == 1 ? 6 : 4;

    /// <inheritdoc/>
    internal override WallPoint At(int piece, double u, bool inner)
    {
        double corner = inner ? InnerCorner : OuterCorner;
        double halfY = (Width / 2) - (inner ? Wall : 0);
        double halfZ = (Height / 2) - (inner ? Wall : 0);

        // The middle line, which carries the shear: straight to (my, mz), then round with r.
        double r = MidCorner;
        double my = ((Width - Wall) / 2) - r;
        double mz = ((Height - Wall) / 2) - r;
        double perY = 1 / (Wall * MidSecondMoment(mz, my, r));
        double perZ = 1 / (Wall * MidSecondMoment(my, mz, r));
        if (piece == 0)
        {
            double y = u * my;
            return new WallPoint(
                u * (halfY - corner),
                halfZ,
                perY * (FlatAndCorner(mz, my, r) + (((my * my) - (y * y)) / 2)),
                perZ * (mz + r) * y,
                halfY - corner,
                0,
                -perY * y * my,
                perZ * (mz + r) * my);
        }

        if (piece == 2)
        {
            double z = (1 - u) * mz;
            return new WallPoint(
                halfY,
                (1 - u) * (halfZ - corner),
                perY * (my + r) * z,
                perZ * (FlatAndCorner(my, mz, r) + (((mz * mz) - (z * z)) / 2)),
                0,
                -(halfZ - corner),
                -perY * (my + r) * mz,
                perZ * z * mz);
        }

        const double Turn = Math.PI / 2;
        double angle = u * Turn;
        (double sin, double cos) = Math.SinCos(angle);
        return new WallPoint(
            halfY - corner + (corner * sin),
            halfZ - corner + (corner * cos),
            perY * (((my + r) * mz) + (my * r * (Turn - angle)) + (r * r * cos)),
            perZ * (((mz + r) * my) + (mz * r * angle) + (r * r * sin)),
            Turn * corner * cos,
            -Turn * corner * sin,
            -Turn * perY * r * (my + (r * sin)),
            Turn * perZ * r * (mz + (r * cos)));
    }

    /// <inheritdoc/>
    private protected override double Farthest(double y, double z) =>
        (y * ((Width / 2) - OuterCorner)) + (z * ((Height / 2) - OuterCorner)) + (OuterCorner * Math.Sqrt((y * y) + (z * z)));

    // First moment of half a flat and a corner of the middle line about the axis along that flat, per wall.
    private static double FlatAndCorner(double along, double away, double r) =>
        ((away + r) * along) + (away * r * Math.PI / 2) + (r * r);

    // Second moment of the middle line about the axis along its flats of half length `along`, per wall.
    private static double MidSecondMoment(double along, double away, double r) => 4 * (
        (along * (away + r) * (away + r))
        + (r * ((away * away * Math.PI / 2) + (2 * away * r) + (r * r * Math.PI / 4)))
        + (away * away * away / 3));

    private double SecondMoment(double h, double b)
    {
        double inside = h - (2 * Wall);
        return (((b * h * h * h) - ((b - (2 * Wall)) * inside * inside * inside)) / 12)
            - (4 * Spandrels(h, OuterCorner)) + (4 * Spandrels(inside, InnerCorner));

        // What a rounded corner lacks of a square one, about the middle of a side h.
        static double Spandrels(double h, double r)
        {
            double away = (h / 2) - (CentroidShare * r);
            return r * r * ((SpandrelMoment * r * r) + (SpandrelArea * away * away));
        }
    }

    private double PlasticModulus(double h, double b)
    {
        double inside = h - (2 * Wall);
        return (((b * h * h) - ((b - (2 * Wall)) * inside * inside)) / 4)
            - (4 * Spandrels(h, OuterCorner)) + (4 * Spandrels(inside, InnerCorner));

        static double Spandrels(double h, double r) => SpandrelArea * r * r * ((h / 2) - (CentroidShare * r));
    }
}
