using System.Numerics;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Fabrication;

/// <summary>Whether a piece lies on another one, turned about the axis, its ends swapped, or in a mirror.</summary>
/// <remarks>
/// The outer curves of both ends of the drawn piece and of the other share one turn. It is looked for where a mate of one falls on a
/// mate of the other, then at the peaks of the circular cross-correlation of the curves; of bent tubes the first bends give it. What
/// counts is the check at that turn, on the exact cuts, over the whole wall.
/// </remarks>
/// <param name="drawn">The piece that is drawn.</param>
/// <param name="other">The piece that may be the same.</param>
/// <param name="tolerance">Of curves, mm.</param>
internal readonly struct PartMatch(PartShape drawn, PartShape other, double tolerance)
{
    private const int Peaks = 6;
    private const int Grid = 720;

    /// <summary>How the other piece is the drawn one; null where it is not.</summary>
    /// <param name="mirrored">True to ask for the drawn one's mirror image.</param>
    public Placement? Find(bool mirrored) => Find(mirrored, swapped: false) ?? Find(mirrored, swapped: true);

    private Placement? Find(bool mirrored, bool swapped)
    {
        if (!LooksAlike(swapped))
        {
            return null;
        }

        // The ends of a piece change their sense of turning when they are swapped, and in a mirror.
        bool negated = mirrored != swapped;
        var seen = new List<double>();
        foreach (double turn in Turns(negated, swapped))
        {
            double allowed = Allowed(turn);
            if (seen.Exists(t => Math.Abs(Math.IEEERemainder(t - allowed, 2 * Math.PI)) < 1e-9))
            {
                continue;
            }

            seen.Add(allowed);
            if (Agrees(allowed, negated, swapped) && VentsAgree(allowed, negated, swapped))
            {
                return new Placement(other.Cut.Tube, allowed, swapped);
            }
        }

        return null;
    }

    private bool VentsAgree(double turn, bool negated, bool swapped)
    {
        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            (Vent? a, Vent? b) = (drawn.Cut[Source(end, swapped)].Vent, other.Cut[end].Vent);
            if (a is null && b is null)
            {
                continue;
            }

            if (a is null || b is null || a.Diameter != b.Diameter || Math.Abs(a.T - b.T) > tolerance
                || Math.Abs(Math.IEEERemainder((negated ? -a.Clock : a.Clock) + turn - b.Clock, 2 * Math.PI)) > 1e-6)
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Lengths and extents that no turn changes.</summary>
    private bool LooksAlike(bool swapped)
    {
        if (Math.Abs(drawn.Length - other.Length) > tolerance
            || Math.Abs(drawn.Cut.Volume - other.Cut.Volume) > 2 * tolerance * drawn.Section.Area)
        {
            return false;
        }

        if (!BendsLookAlike(swapped))
        {
            return false;
        }

        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            (EndCut a, EndCut b) = (drawn.Cut[Source(end, swapped)], other.Cut[end]);

            // Both lines are within the tolerance of the exact ones, which may differ by as much again.
            if (Math.Abs(a.Outer.Max - b.Outer.Max) > 3 * tolerance || Math.Abs(a.Outer.Min - b.Outer.Min) > 3 * tolerance)
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Bends of the same angles and radii at the same places.</summary>
    private bool BendsLookAlike(bool swapped)
    {
        if (drawn.Bends.Count != other.Bends.Count)
        {
            return false;
        }

        for (int i = 0; i < other.Bends.Count; i++)
        {
            (TubeBend a, TubeBend b) = (Bend(i, swapped), other.Bends[i]);
            double start = swapped ? drawn.Length - a.Stop : a.Start;
            if (Math.Abs(a.Radius - b.Radius) > tolerance
                || Math.Abs(start - b.Start) > tolerance
                || Math.Abs(a.Angle - b.Angle) * drawn.Length > tolerance)
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Bends in the same planes at a turn; so far off that no place of the tube moves by more than the tolerance.</summary>
    private bool BendsAgree(double turn, bool negated, bool swapped)
    {
        for (int i = 0; i < other.Bends.Count; i++)
        {
            double clock = Bend(i, swapped).Clock;
            double off = Math.IEEERemainder((negated ? -clock : clock) + turn - other.Bends[i].Clock, 2 * Math.PI);
            if (Math.Abs(off) * drawn.Length > tolerance)
            {
                return false;
            }
        }

        return true;
    }

    private TubeBend Bend(int index, bool swapped) => drawn.Bends[swapped ? drawn.Bends.Count - 1 - index : index];

    private IEnumerable<double> Turns(bool negated, bool swapped)
    {
        // A bent tube lies on another in one way only: bend in bend.
        if (other.Bends.Count > 0)
        {
            double clock = Bend(0, swapped).Clock;
            yield return other.Bends[0].Clock - (negated ? -clock : clock);
            yield break;
        }

        yield return 0;
        foreach (double turn in MateTurns(negated, swapped))
        {
            yield return turn;
        }

        foreach (double turn in CorrelationPeaks(negated, swapped))
        {
            yield return turn;
        }
    }

    /// <summary>Turns that bring a mate of the drawn piece to a mate of the other.</summary>
    private List<double> MateTurns(bool negated, bool swapped)
    {
        var turns = new List<double>();
        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            foreach (Contact a in drawn.Cut[Source(end, swapped)].Contacts)
            {
                foreach (Contact b in other.Cut[end].Contacts)
                {
                    if (a.Clock is { } start && b.Clock is { } stop && a.SquareCrossing == b.SquareCrossing)
                    {
                        double turn = stop - (negated ? -start : start);
                        turns.Add(turn);
                        if (a.SquareCrossing)
                        {
                            turns.Add(turn + Math.PI);
                        }
                    }
                }
            }
        }

        return turns;
    }

    /// <summary>The highest peaks of C(τ) = Σ Re(P(k) exp(ikτ)), P from both ends; the highest first, of equals the nearest to 0.</summary>
    private List<double> CorrelationPeaks(bool negated, bool swapped)
    {
        Span<Complex> products = stackalloc Complex[PartShape.Harmonics];
        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            ReadOnlySpan<Complex> a = drawn.Spectrum(Source(end, swapped));
            ReadOnlySpan<Complex> b = other.Spectrum(end);
            for (int k = 1; k < PartShape.Harmonics; k++)
            {
                products[k] += b[k] * (negated ? a[k] : Complex.Conjugate(a[k]));
            }
        }

        double[] heights = new double[Grid];
        for (int i = 0; i < Grid; i++)
        {
            heights[i] = Height(products, 2 * Math.PI * i / Grid).Value;
        }

        double noise = 1e-9 * heights.Max(Math.Abs);
        var peaks = new List<(double Height, double Turn)>();
        for (int i = 0; i < Grid; i++)
        {
            if (heights[i] >= heights[(i + Grid - 1) % Grid] && heights[i] > heights[(i + 1) % Grid] + noise)
            {
                peaks.Add((heights[i], Refined(products, 2 * Math.PI * i / Grid)));
            }
        }

        peaks.Sort((p, q) => Math.Abs(p.Height - q.Height) > noise ? q.Height.CompareTo(p.Height) : Near(p.Turn).CompareTo(Near(q.Turn)));
        return [.. peaks.Take(Peaks).Select(p => p.Turn)];

        static double Near(double turn) => Math.Abs(Math.IEEERemainder(turn, 2 * Math.PI));
    }

    /// <summary>Newton's method on the slope of C.</summary>
    private static double Refined(ReadOnlySpan<Complex> products, double turn)
    {
        double start = turn;
        for (int step = 0; step < 8; step++)
        {
            (_, double slope, double bend) = Height(products, turn);
            if (!(bend < 0) || Math.Abs(turn - start) > 2 * Math.PI / Grid)
            {
                return start;
            }

            turn -= slope / bend;
        }

        return turn;
    }

    private static (double Value, double Slope, double Bend) Height(ReadOnlySpan<Complex> products, double turn)
    {
        (double value, double slope, double bend) = (0, 0, 0);
        for (int k = 1; k < products.Length; k++)
        {
            Complex term = products[k] * Complex.FromPolarCoordinates(1, k * turn);
            value += term.Real;
            slope -= k * term.Imaginary;
            bend -= k * k * term.Real;
        }

        return (value, slope, bend);
    }

    /// <summary>The turn, in (−π, π], that maps the outline onto itself and is nearest to a wanted one.</summary>
    private double Allowed(double turn)
    {
        double rest = Math.IEEERemainder(turn, 2 * Math.PI);
        int fold = Fold(drawn.Section);
        if (fold > 0)
        {
            double step = 2 * Math.PI / fold;
            rest = Math.IEEERemainder(step * Math.Round(rest / step), 2 * Math.PI);
        }

        // Rounding must not choose between 180 and −180 degrees, nor show as 1e-17.
        return Math.Abs(rest) < 1e-9 ? 0 : rest <= -Math.PI + 1e-9 ? Math.PI : rest;
    }

    /// <summary>How many rotations map an outline onto itself; 0 for all of them.</summary>
    private static int Fold(Section section) => section.Shape switch
    {
        "round" or "rod" => 0,
        "square" => 4,
        _ => 2,
    };

    private bool Agrees(double turn, bool negated, bool swapped)
    {
        if (!BendsAgree(turn, negated, swapped))
        {
            return false;
        }

        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            (EndCut a, EndCut b) = (drawn.Cut[Source(end, swapped)], other.Cut[end]);
            if (!OnSkin(a.Surface, b.Outer, 0, turn, negated)
                || !OnSkin(b.Surface, a.Outer, 0, negated ? turn : -turn, negated))
            {
                return false;
            }

            // A radial cut is the same through the wall; a rod's axis belongs to every clock angle.
            bool isRadial = a.Surface is CutSurface { IsRadial: true } && b.Surface is CutSurface { IsRadial: true };
            if (!isRadial
                && ((!drawn.Section.Bore.IsPoint && !OnSkin(a.Surface, b.Inner, 1, turn, negated)) || !InWall(a, b, turn, negated)))
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Whether a line lies on a cut within the tolerance, where the line's clock angle is the cut's (or its negative) + turn.</summary>
    private bool OnSkin(EndSurface cut, EndCurve line, double depth, double turn, bool negated)
    {
        foreach (CurvePoint point in line.Points)
        {
            if (!Near(cut, negated ? turn - point.Clock : point.Clock - turn, depth, point.T))
            {
                return false;
            }
        }

        return true;
    }

    private bool InWall(EndCut a, EndCut b, double turn, bool negated)
    {
        const int Looks = 48;
        for (int i = 0; i < Looks; i++)
        {
            double clock = 2 * Math.PI * i / Looks;
            if (!Near(a.Surface, negated ? turn - clock : clock - turn, 0.5, b.Surface.At(clock, other.Radius(clock, 0.5))))
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>True where a cut passes a place within the tolerance; beside it too, where the cut is steep or steps.</summary>
    private bool Near(EndSurface cut, double clock, double depth, double t)
    {
        double here = At(cut, clock, depth);
        if (Math.Abs(here - t) <= tolerance)
        {
            return true;
        }

        double aside = 2 * tolerance / drawn.Section.OuterSize;
        (double left, double right) = (At(cut, clock - aside, depth), At(cut, clock + aside, depth));
        return t >= Math.Min(here, Math.Min(left, right)) - tolerance && t <= Math.Max(here, Math.Max(left, right)) + tolerance;
    }

    private double At(EndSurface cut, double clock, double depth) => cut.At(clock, drawn.Radius(clock, depth));

    private static End Source(End end, bool swapped) => swapped == (end == End.From) ? End.To : End.From;
}
