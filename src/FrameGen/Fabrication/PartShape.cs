using System.Numerics;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Fabrication;

/// <summary>A cut tube as a loose piece: what can be compared of it whatever way it lies on the bench.</summary>
internal sealed class PartShape
{
    /// <summary>Harmonics of an end curve that are kept, from 0.</summary>
    public const int Harmonics = 13;

    private const int Samples = 64;

    private static readonly Complex[] Roots =
        [.. Enumerable.Range(0, Samples).Select(i => Complex.FromPolarCoordinates(1, -2 * Math.PI * i / Samples))];

    private readonly Complex[] _from;
    private readonly Complex[] _to;

    /// <summary>Measures a tube of a frame.</summary>
    public PartShape(CutFrame cut, CutTube tube)
    {
        Tube own = cut.Sized.Model.Tubes[tube.Tube];
        Cut = tube;
        Section = cut.Sized.SectionOf(tube.Tube);
        Length = own.Length;
        Bends = TubeBend.Of(own);
        (_from, _to) = (Spectrum(tube.From.Surface), Spectrum(tube.To.Surface));
    }

    /// <summary>The cut tube.</summary>
    public CutTube Cut { get; }

    /// <summary>Its section.</summary>
    public Section Section { get; }

    /// <summary>Of the axis between its own ends, mm.</summary>
    public double Length { get; }

    /// <summary>Its bends; none of a straight tube.</summary>
    public IReadOnlyList<TubeBend> Bends { get; }

    /// <summary>Distance from the axis of a place in the wall, mm.</summary>
    /// <param name="clock">Its clock angle, rad.</param>
    /// <param name="depth">0 on the outer skin, 1 on the inner one.</param>
    public double Radius(double clock, double depth)
    {
        (double sin, double cos) = Math.SinCos(clock);
        double outer = Section.Outline.RadiusAt(sin, cos);
        return depth <= 0 || Section.Bore.IsPoint ? (1 - depth) * outer : outer - (depth * (outer - Section.Bore.RadiusAt(sin, cos)));
    }

    /// <summary>Fourier coefficients of an end's outer curve over the clock angle, mm: t = Σ c(k) exp(ikθ).</summary>
    public ReadOnlySpan<Complex> Spectrum(End end) => end == End.From ? _from : _to;

    /// <summary>
    /// Which hand it is: changes sign in a mirror, keeps it however the piece is turned or its ends are swapped. 0 where it is its own
    /// mirror image, or can't be told from it by the first harmonics.
    /// </summary>
    public int Chirality
    {
        get
        {
            if (BentHand() is var bent and not 0)
            {
                return bent;
            }

            // Between the two ends, then of each end by itself; a mirror conjugates every coefficient.
            for (int k = 1; k < Harmonics; k++)
            {
                if (SignOf(_from[k] * Complex.Conjugate(_to[k])) is var sign and not 0)
                {
                    return sign;
                }
            }

            for (int k = 1; 2 * k < Harmonics; k++)
            {
                Complex from = _from[k] * _from[k] * Complex.Conjugate(_from[2 * k]);
                Complex to = _to[k] * _to[k] * Complex.Conjugate(_to[2 * k]);
                if (SignOf(from + Complex.Conjugate(to)) is var sign and not 0)
                {
                    return sign;
                }
            }

            return 0;
        }
    }

    /// <summary>
    /// Whole numbers that tell the shape from others of its length: the same however it is turned, swapped or mirrored. Steps are far
    /// wider than any tolerance, and do not begin at the round numbers at which real sizes lie.
    /// </summary>
    public IEnumerable<long> Fingerprint()
    {
        yield return Step(Cut.Volume / Section.Area, 1);
        yield return Step(Math.Min(Cut.From.OuterLength, Cut.To.OuterLength), 1);
        yield return Step(Math.Max(Cut.From.OuterLength, Cut.To.OuterLength), 1);
        for (int k = 1; k <= 3; k++)
        {
            yield return Step((_from[k] * Complex.Conjugate(_to[k])).Real, 8);
        }

        if (Bends.Count > 0)
        {
            yield return Bends.Count;
            yield return Step(double.RadiansToDegrees(Bends.Sum(b => b.Angle)), 1);
            yield return Step(double.RadiansToDegrees(Bends.Sum(b => Math.Abs(b.Rotation))), 1);
            yield return Step(Math.Min(Bends[0].Start, Length - Bends[^1].Stop), 1);
        }
    }

    // A mirror turns every rotation the other way; ends changed round, it keeps its sign. Then how each end lies to the bend next to it.
    private int BentHand()
    {
        const double Visible = 1e-6;
        double turns = Bends.Sum(b => Math.Sin(b.Rotation));
        double twists = Bends.Sum(b => b.Straight * Math.Sin(b.Rotation));
        foreach (double sum in (ReadOnlySpan<double>)[turns, twists])
        {
            if (Math.Abs(sum) > Visible)
            {
                return Math.Sign(sum);
            }
        }

        for (int k = 1; k < Harmonics && Bends.Count > 0; k++)
        {
            Complex from = _from[k] * Complex.FromPolarCoordinates(1, k * Bends[0].Clock);
            Complex to = _to[k] * Complex.FromPolarCoordinates(1, k * Bends[^1].Clock);
            if (SignOf(from - to) is var sign and not 0)
            {
                return sign;
            }
        }

        return 0;
    }

    private static long Step(double value, double step) => (long)Math.Floor((value / step) + 0.237);

    private static int SignOf(Complex product)
    {
        // mm² and mm³: an end that is turned by a hundredth of a degree shows, rounding does not.
        const double Visible = 1e-4;
        return Math.Abs(product.Imaginary) <= Visible + (1e-6 * Complex.Abs(product)) ? 0 : Math.Sign(product.Imaginary);
    }

    private Complex[] Spectrum(EndSurface surface)
    {
        Span<double> samples = stackalloc double[Samples];
        for (int i = 0; i < Samples; i++)
        {
            double clock = 2 * Math.PI * i / Samples;
            samples[i] = surface.At(clock, Radius(clock, 0));
        }

        var spectrum = new Complex[Harmonics];
        for (int k = 0; k < Harmonics; k++)
        {
            Complex sum = Complex.Zero;
            for (int i = 0; i < Samples; i++)
            {
                sum += samples[i] * Roots[i * k % Samples];
            }

            spectrum[k] = sum / Samples;
        }

        return spectrum;
    }
}
