using System.Runtime.Intrinsics;

namespace FrameGen.Mechanics.Sections;

/// <summary>The worst von Mises stress of a <see cref="CellTube"/> under all internal forces together.</summary>
/// <remarks>
/// <para>At a point of a skin σ = N/A + My z/Iy − Mz y/Iz, and along the skin τ = T (K/t ± t)/J, outer and inner, plus the flow of
/// transverse shear in a thin wall, q = V S/I, S the first moment of the wall's middle line from the axis of symmetry on (Jourawski), I that
/// line's own second moment, so that the flow adds up to V. σ and τ are linear through the wall, so the worst point is on a skin.</para>
/// <para>A quarter of each skin is looked at from place to place, four quadrants at a time: at the mirrored points the same numbers come
/// with other signs. Where σ² + 3τ² rises at one place and falls at the next, its top between them is found from its slope. No
/// allocation.</para>
/// </remarks>
internal sealed class CellStress
{
    private const int Numbers = 8;
    private const int MostSteps = 40;

    // A top rises less than a tenth above the ends of its part, in squares, so lower parts can't hold the highest.
    private const double Near = 0.9;

    // Signs of y and z in the four quadrants.
    private static readonly Vector256<double> SignY = Vector256.Create(1.0, -1, -1, 1);
    private static readonly Vector256<double> SignZ = Vector256.Create(1.0, 1, -1, -1);

    private readonly CellTube _tube;
    private readonly double _area;
    private readonly double _iy;
    private readonly double _iz;
    private readonly double _torsionOuter;
    private readonly double _torsionInner;

    // Eight numbers a place, in the order of WallPoint; outer skin first, piece by piece, both ends of a piece included.
    private readonly double[] _places;
    private readonly Part[] _parts;

    public CellStress(CellTube tube)
    {
        _tube = tube;
        (_area, _iy, _iz) = (tube.Area, tube.Iy, tube.Iz);
        (_torsionOuter, _torsionInner) = tube.TorsionStress();
        var places = new List<double>();
        var parts = new List<Part>();
        foreach (bool inner in (ReadOnlySpan<bool>)[false, true])
        {
            for (int piece = 0; piece < tube.Pieces; piece++)
            {
                int count = tube.PartsOf(piece);
                for (int i = 0; i <= count; i++)
                {
                    WallPoint p = tube.At(piece, (double)i / count, inner);
                    parts.Add(new Part(piece, i == count ? -1 : (double)i / count, 1.0 / count, inner));
                    places.AddRange([p.Y, p.Z, p.Qy, p.Qz, p.SlopeY, p.SlopeZ, p.SlopeQy, p.SlopeQz]);
                }
            }
        }

        _places = [.. places];
        _parts = [.. parts];
    }

    /// <summary>The highest von Mises stress, MPa.</summary>
    public double Worst(in SectionForces forces)
    {
        double axial = forces.N / _area;
        double perZ = forces.My / _iy;
        double perY = -forces.Mz / _iz;

        // Squares of the stress at every place and half their slopes, quadrant by quadrant.
        Span<Vector256<double>> squares = stackalloc Vector256<double>[_parts.Length];
        Span<Vector256<double>> slopes = stackalloc Vector256<double>[_parts.Length];
        Vector256<double> highest = Vector256<double>.Zero;
        Vector256<double> bendZ = perZ * SignZ;
        Vector256<double> bendY = perY * SignY;
        Vector256<double> shearZ = forces.Vz * SignY;
        Vector256<double> shearY = -forces.Vy * SignZ;
        ReadOnlySpan<double> places = _places;
        for (int i = 0; i < _parts.Length; i++)
        {
            ReadOnlySpan<double> p = places.Slice(Numbers * i, Numbers);
            double torsion = forces.T * (_parts[i].Inner ? _torsionInner : _torsionOuter);
            Vector256<double> sigma = Vector256.Create(axial) + (p[1] * bendZ) + (p[0] * bendY);
            Vector256<double> tau = Vector256.Create(torsion) + (p[3] * shearZ) + (p[2] * shearY);
            Vector256<double> square = (sigma * sigma) + (3 * tau * tau);
            squares[i] = square;
            slopes[i] = (sigma * ((p[5] * bendZ) + (p[4] * bendY))) + (3 * tau * ((p[7] * shearZ) + (p[6] * shearY)));
            highest = Vector256.Max(highest, square);
        }

        double best = Math.Max(Math.Max(highest[0], highest[1]), Math.Max(highest[2], highest[3]));
        for (int i = 0; i < _parts.Length - 1; i++)
        {
            if (_parts[i].Start < 0)
            {
                continue;
            }

            // Tops inside a part: it rises at its start and falls at its end.
            Vector256<double> isTop = Vector256.GreaterThan(slopes[i], Vector256<double>.Zero)
                & Vector256.LessThan(slopes[i + 1], Vector256<double>.Zero)
                & Vector256.GreaterThan(Vector256.Max(squares[i], squares[i + 1]), Vector256.Create(Near * best));
            uint tops = isTop.ExtractMostSignificantBits();
            for (int quadrant = 0; tops != 0; quadrant++, tops >>= 1)
            {
                if ((tops & 1) != 0)
                {
                    var line = new Stresses(
                        axial,
                        perZ * SignZ[quadrant],
                        perY * SignY[quadrant],
                        forces.T * (_parts[i].Inner ? _torsionInner : _torsionOuter),
                        forces.Vz * SignY[quadrant],
                        -forces.Vy * SignZ[quadrant]);
                    best = Math.Max(best, Top(_parts[i], line, slopes[i][quadrant], slopes[i + 1][quadrant]));
                }
            }
        }

        return Math.Sqrt(best);
    }

    // The highest square inside a part whose slope changes sign: regula falsi, halving the end that stays (Illinois).
    private double Top(in Part part, in Stresses stresses, double slopeStart, double slopeEnd)
    {
        (double a, double b) = (part.Start, part.Start + part.Width);
        (double atA, double atB) = (slopeStart, slopeEnd);
        double best = 0;
        int side = 0;
        for (int step = 0; step < MostSteps; step++)
        {
            double u = Math.Clamp(((a * atB) - (b * atA)) / (atB - atA), a, b);
            (double square, double slope) = stresses.At(_tube.At(part.Piece, u, part.Inner));
            best = Math.Max(best, square);

            // What is left to gain is about half the slope times the bracket.
            if (Math.Abs(slope) * (b - a) <= 1e-14 * best || slope == 0)
            {
                break;
            }

            if (slope > 0)
            {
                (a, atA) = (u, slope);
                atB = side == 1 ? atB / 2 : atB;
                side = 1;
            }
            else
            {
                (b, atB) = (u, slope);
                atA = side == -1 ? atA / 2 : atA;
                side = -1;
            }
        }

        return best;
    }

    /// <summary>From a place to the next.</summary>
    /// <param name="Piece">Which piece of the wall.</param>
    /// <param name="Start">Where on it, 0 to 1; negative at its last place, where no part begins.</param>
    /// <param name="Width">Up to the next place.</param>
    /// <param name="Inner">On the inner skin.</param>
    private readonly record struct Part(int Piece, double Start, double Width, bool Inner);

    /// <summary>Stresses along one quarter of a skin, linear in what a place has.</summary>
    private readonly record struct Stresses(double Axial, double PerZ, double PerY, double Torsion, double ShearZ, double ShearY)
    {
        /// <summary>σ² + 3τ² and half its slope.</summary>
        public (double Square, double Slope) At(in WallPoint p)
        {
            double sigma = Axial + (p.Z * PerZ) + (p.Y * PerY);
            double tau = Torsion + (p.Qz * ShearZ) + (p.Qy * ShearY);
            return (
                (sigma * sigma) + (3 * tau * tau),
                (sigma * ((p.SlopeZ * PerZ) + (p.SlopeY * PerY))) + (3 * tau * ((p.SlopeQz * ShearZ) + (p.SlopeQy * ShearY))));
        }
    }
}
