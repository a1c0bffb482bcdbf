using System.Globalization;
using FrameGen.Geometry;

namespace FrameGen.Mechanics.Sections;

/// <summary>Elliptic tube of constant wall: outside an ellipse, inside the curve that runs beside it at the wall's distance.</summary>
/// <remarks>
/// <para>The inside is no ellipse; what a mill makes by drawing a round tube flat has the same wall everywhere. With P the perimeter of the
/// ellipse, A = P t − π t², exact for a curve beside another as long as t stays below the smallest radius of curvature. P is the
/// outline's, the second moments are integrated numerically, to 1e-13; what has a closed form is used so.</para>
/// <para>Points of the ellipse by the angle θ from the top line: y = b sin θ, z = a cos θ, a half the height, b half the width;
/// q = √(a² sin² θ + b² cos² θ) is dl/dθ, (a sin θ, b cos θ)/q the normal, ab/q³ the curvature.</para>
/// <para>Torsion is the closed-cell rule of the flat-sided tubes (<see cref="CellTube"/>); for equal axes it is above the round tube's 2I by no
/// more than a part t²/12r² of it, r the middle radius.</para>
/// </remarks>
public sealed record EllipseTube : CellTube
{
    private const double Converged = 1e-13;
    private const int MostPanels = 1 << 12;

    // Second moments of the wall's middle line, per wall, mm³; the thin wall's shear areas, mm².
    private readonly double _midSecondY;
    private readonly double _midSecondZ;
    private readonly double _thinShearY;
    private readonly double _thinShearZ;

    /// <summary>Outer sizes and wall.</summary>
    /// <param name="height">Along the top line, mm.</param>
    /// <param name="width">Across, mm.</param>
    /// <param name="wall">t, mm; less than the ellipse's smallest radius of curvature.</param>
    /// <exception cref="ArgumentOutOfRangeException">A size is not positive and finite, one more than <see cref="EllipseOutline.MostSlender"/> times the
    /// other, or the wall is outside its range.</exception>
    public EllipseTube(double height, double width, double wall)
        : base(height, width, wall)
    {
        Outline = new EllipseOutline(height, width, 0);
        double sharpest = EllipseOutline.LeastRadiusOfCurvature(height, width);

        // "Not inside the range", so that NaN is refused as well.
        if (!(wall > 0 && wall < sharpest))
        {
            throw new ArgumentOutOfRangeException(
                nameof(wall), wall, $"A {height} x {width} mm ellipse takes a wall between 0 and its smallest radius, {sharpest} mm.");
        }

        Bore = Outline.Grown(-wall);
        Iy = 4 * Quarter(angle => WallMoment(angle, HalfHeight, HalfWidth));
        Iz = height == width ? Iy : 4 * Quarter(angle => WallMoment(angle, HalfWidth, HalfHeight));
        _midSecondY = 4 * Quarter(angle => MidMoment(angle, HalfHeight, HalfWidth));
        _midSecondZ = 4 * Quarter(angle => MidMoment(angle, HalfWidth, HalfHeight));
        _thinShearZ = wall * _midSecondY * _midSecondY / (4 * Quarter(angle => FlowEnergy(angle, HalfHeight, HalfWidth)));
        _thinShearY = wall * _midSecondZ * _midSecondZ / (4 * Quarter(angle => FlowEnergy(angle, HalfWidth, HalfHeight)));
    }

    /// <inheritdoc/>
    public override string Name => string.Create(CultureInfo.InvariantCulture, $"ellipse {Height:0.####} x {Width:0.####} x {Wall:0.####} mm");

    /// <inheritdoc/>
    public override string Shape => "ellipse";

    /// <inheritdoc/>
    public override Outline Outline { get; }

    /// <inheritdoc/>
    public override Outline Bore { get; }

    /// <summary>A = P t − π t², mm².</summary>
    public override double Area => Wall * (Perimeter - (Math.PI * Wall));

    /// <inheritdoc/>
    public override double Iy { get; }

    /// <inheritdoc/>
    public override double Iz { get; }

    /// <inheritdoc/>
    public override double Perimeter => Outline.Perimeter;

    /// <inheritdoc/>
    public override double PlasticModulusY => 4 * QuarterMoment(HalfHeight, HalfWidth);

    /// <inheritdoc/>
    public override double PlasticModulusZ => 4 * QuarterMoment(HalfWidth, HalfHeight);

    /// <summary>P − π t, mm.</summary>
    public override double MidLineLength => Perimeter - (Math.PI * Wall);

    /// <summary>πab − P t/2 + π t²/4, mm².</summary>
    public override double MidLineArea => (Math.PI * HalfHeight * HalfWidth) - (Perimeter * Wall / 2) + (Math.PI * Wall * Wall / 4);

    /// <inheritdoc/>
    internal override int Pieces => 1;

    private double HalfHeight => Height / 2;

    private double HalfWidth => Width / 2;

    /// <summary>
    /// The thin wall's I²/∮(S²/t) dl, by the energy of its shear flow, times what Cowper's coefficient of the round tube of the same wall and mean
    /// size has over the thin round tube's 1/2: with equal axes the round tube's shear area.
    /// </summary>
    /// <param name="poissonRatio">ν of the material; −1 &lt; ν ≤ 0.5.</param>
    /// <exception cref="ArgumentOutOfRangeException">ν is outside its range.</exception>
    public override (double Y, double Z) ShearAreas(double poissonRatio)
    {
        double thick = 2 * RoundStress.CowperCoefficient(1 - (4 * Wall / (Height + Width)), poissonRatio);
        return (thick * _thinShearY, thick * _thinShearZ);
    }

    /// <summary>True for the same sizes.</summary>
    public bool Equals(EllipseTube? other) => other is not null && Height == other.Height && Width == other.Width && Wall == other.Wall;

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Height, Width, Wall);

    /// <inheritdoc/>
    internal override int PartsOf(int piece) => 16;

    /// <inheritdoc/>
    internal override WallPoint At(int piece, double u, bool inner)
    {
        const double Turn = Math.PI / 2;
        (double sin, double cos) = Math.SinCos(u * Turn);
        (double a, double b) = (HalfHeight, HalfWidth);
        double q = Length(a * sin, b * cos);
        double depth = inner ? Wall : 0;
        double bend = a * b * depth / (q * q * q);
        double alongMid = q - (a * b * Wall / (2 * q * q));
        double perY = 1 / (Wall * _midSecondZ);
        double perZ = 1 / (Wall * _midSecondY);
        return new WallPoint(
            (b * sin) - (depth * a * sin / q),
            (a * cos) - (depth * b * cos / q),
            perY * FirstMoment(cos, b, a),
            perZ * FirstMoment(sin, a, b),
            Turn * b * cos * (1 - bend),
            -Turn * a * sin * (1 - bend),
            -Turn * perY * alongMid * ((b * sin) - (Wall * a * sin / (2 * q))),
            Turn * perZ * alongMid * ((a * cos) - (Wall * b * cos / (2 * q))));
    }

    /// <inheritdoc/>
    private protected override double Farthest(double y, double z) => Length(HalfWidth * y, HalfHeight * z);

    private static double Length(double x, double y) => Math.Sqrt((x * x) + (y * y));

    // Over the quarter, with twice as many panels until nothing changes: the integrands are smooth, the rule of degree 23.
    private static double Quarter(Func<double, double> integrand)
    {
        double before = double.NaN;
        for (int panels = 2; ; panels *= 2)
        {
            double width = Math.PI / 2 / panels;
            double sum = 0;
            for (int panel = 0; panel < panels; panel++)
            {
                for (int i = 0; i < GaussLegendre.Twelve.Nodes.Length; i++)
                {
                    sum += GaussLegendre.Twelve.Weights[i] * integrand((panel + GaussLegendre.Twelve.Nodes[i]) * width);
                }
            }

            sum *= width;
            if (Math.Abs(sum - before) <= Converged * Math.Abs(sum) || panels >= MostPanels)
            {
                return sum;
            }

            before = sum;
        }
    }

    // ∫ z² (1 − κs) ds through the wall, times dl/dθ; a along z.
    private double WallMoment(double angle, double a, double b)
    {
        (double sin, double cos) = Math.SinCos(angle);
        double q = Length(a * sin, b * cos);
        double turn = a * b / (q * q);
        double z = a * cos;
        double n = b * cos / q;
        double t = Wall;
        double straight = (z * z) - (z * n * t) + (n * n * t * t / 3);
        double bent = (z * z / 2) - (2 * z * n * t / 3) + (n * n * t * t / 4);
        return t * ((q * straight) - (turn * t * bent));
    }

    // z² of the middle line times its dl/dθ.
    private double MidMoment(double angle, double a, double b)
    {
        (double sin, double cos) = Math.SinCos(angle);
        double q = Length(a * sin, b * cos);
        double z = (a * cos) - (Wall * b * cos / (2 * q));
        return z * z * (q - (a * b * Wall / (2 * q * q)));
    }

    private double FlowEnergy(double angle, double a, double b)
    {
        (double sin, double cos) = Math.SinCos(angle);
        double q = Length(a * sin, b * cos);
        double moment = FirstMoment(sin, a, b);
        return moment * moment * (q - (a * b * Wall / (2 * q * q)));
    }

    // First moment of the middle line from the end of the axis a on, per wall, mm²; v is the sine of θ counted from there.
    private double FirstMoment(double v, double a, double b)
    {
        double q = Math.Sqrt((b * b) + ((a - b) * (a + b) * v * v));
        (double height, double bent) = Integrals(v, q, a, b);
        double half = Wall / 2;
        return height - (half * ((b * v) + bent)) + (half * half * a * v / q);
    }

    // First moment of a quarter of the wall, ∫∫ (z − n s)(1 − κs) ds dl, mm³.
    private double QuarterMoment(double a, double b)
    {
        (double height, double bent) = Integrals(1, a, a, b);
        return Wall * (height - (Wall * (b + bent) / 2) + (Wall * Wall / 3));
    }

    // ∫ z dl and ∫ κ z dl from the end of the axis a to sin θ = v.
    private static (double Height, double Bent) Integrals(double v, double q, double a, double b)
    {
        double x = (a - b) * (a + b) * v * v / (b * b);
        return (a * v * (q + (b * ArsinhShare(x))) / 2, a * a * v * ArctanShare(x) / b);
    }

    // arsinh(√x)/√x, and arcsin(√−x)/√−x for x < 0.
    private static double ArsinhShare(double x)
    {
        if (Math.Abs(x) < 1e-3)
        {
            return 1 - (x * ((1.0 / 6) - (x * ((3.0 / 40) - (x * ((5.0 / 112) - (x * ((35.0 / 1152) - (x * 63 / 2816)))))))));
        }

        double root = Math.Sqrt(Math.Abs(x));
        return x > 0 ? Math.Asinh(root) / root : Math.Asin(Math.Min(root, 1)) / root;
    }

    // arctan(√x)/√x, and artanh(√−x)/√−x for x < 0.
    private static double ArctanShare(double x)
    {
        if (Math.Abs(x) < 1e-3)
        {
            return 1 - (x * ((1.0 / 3) - (x * ((1.0 / 5) - (x * ((1.0 / 7) - (x * ((1.0 / 9) - (x / 11)))))))));
        }

        double root = Math.Sqrt(Math.Abs(x));
        return x > 0 ? Math.Atan(root) / root : Math.Atanh(root) / root;
    }
}
