using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>
/// Integrals of a cut over the metal of the cross-section, ∫ dA = ∫∫ ρ dρ dθ: what volume, centre of mass and surface
/// need from each end.
/// </summary>
/// <param name="T">∫ t dA, mm³.</param>
/// <param name="HalfSquare">∫ t²/2 dA, mm⁴.</param>
/// <param name="Cos">∫ t ρ cos θ dA, mm⁴.</param>
/// <param name="Sin">∫ t ρ sin θ dA, mm⁴.</param>
/// <param name="Skin">∫ t R dθ round the outer skin, mm².</param>
internal readonly record struct EndMoments(double T, double HalfSquare, double Cos, double Sin, double Skin)
{
    private const int DeepestHalving = 16;

    /// <summary>Of a plane: closed forms.</summary>
    public static EndMoments Of(PlaneCut plane, Outline inner, Outline outer)
    {
        double area = outer.Area - inner.Area;
        double secondX = outer.SecondMomentX - inner.SecondMomentX;
        double secondY = outer.SecondMomentY - inner.SecondMomentY;
        double squares = (plane.SlopeCos * plane.SlopeCos * secondX) + (plane.SlopeSin * plane.SlopeSin * secondY);
        return new EndMoments(
            plane.OnAxis * area,
            ((plane.OnAxis * plane.OnAxis * area) + squares) / 2,
            plane.SlopeCos * secondX,
            plane.SlopeSin * secondY,
            plane.OnAxis * outer.Perimeter);
    }

    /// <summary>Of any cut, by Gauss–Legendre panels between its corners, halved until two rules agree.</summary>
    /// <param name="surface">The cut.</param>
    /// <param name="inner">The bore.</param>
    /// <param name="outer">The outer skin.</param>
    /// <param name="corners">Clock angles of corners of the cut on either skin, rad; any order.</param>
    public static EndMoments Of(CutSurface surface, Outline inner, Outline outer, IEnumerable<double> corners)
    {
        // No panel longer than an eighth of a turn: a saddle is then smooth within each.
        List<double> breaks = [.. corners];
        for (int i = -4; i <= 4; i++)
        {
            breaks.Add(Math.PI * i / 4);
        }

        breaks.Sort();
        EndMoments sum = default;
        for (int i = 1; i < breaks.Count; i++)
        {
            if (breaks[i] - breaks[i - 1] > 1e-11)
            {
                sum += Panel(surface, inner, outer, breaks[i - 1], breaks[i], 0);
            }
        }

        return sum;
    }

    /// <summary>Sum.</summary>
    public static EndMoments operator +(in EndMoments a, in EndMoments b) =>
        new(a.T + b.T, a.HalfSquare + b.HalfSquare, a.Cos + b.Cos, a.Sin + b.Sin, a.Skin + b.Skin);

    private static EndMoments Panel(CutSurface surface, Outline inner, Outline outer, double from, double to, int depth)
    {
        EndMoments fine = Panel(surface, inner, outer, from, to, GaussLegendre.Twelve);
        EndMoments coarse = Panel(surface, inner, outer, from, to, GaussLegendre.Eight);

        // The coarse rule's error, held to 1e-8 of a ring as long as the tube is thick, bounds the fine one's with room.
        double half = Math.Max(outer.HalfHeight, outer.HalfWidth);
        double ring = (outer.Area - inner.Area) * half;
        double allowed = 1e-8 * ring * Math.Max((to - from) / (2 * Math.PI), 1e-3);
        double size = Math.Max(half, Math.Abs(fine.HalfSquare) / (ring + Math.Abs(fine.T)));
        if (depth >= DeepestHalving ||
            (Math.Abs(fine.T - coarse.T) <= allowed && Math.Abs(fine.HalfSquare - coarse.HalfSquare) <= allowed * size))
        {
            return fine;
        }

        double middle = from + ((to - from) / 2);
        return Panel(surface, inner, outer, from, middle, depth + 1) + Panel(surface, inner, outer, middle, to, depth + 1);
    }

    private static EndMoments Panel(CutSurface surface, Outline inner, Outline outer, double from, double to, GaussRule rule)
    {
        double width = to - from;
        (double t, double half, double cosSum, double sinSum, double skin) = (0, 0, 0, 0, 0);
        for (int i = 0; i < rule.Nodes.Length; i++)
        {
            (double x, double slope) = GaussLegendre.Smooth(rule.Nodes[i]);
            double weight = rule.Weights[i] * slope * width;
            (double sin, double cos) = Math.SinCos(from + (width * x));
            (double low, double high) = (inner.RadiusAt(sin, cos), outer.RadiusAt(sin, cos));
            double onSkin = surface.Cut(sin, cos, high, out _);
            WallMoments wall = surface.IsRadial ? WallMoments.Of(onSkin, low, high) : WallMoments.Of(surface, sin, cos, low, high);
            t += weight * wall.T;
            half += weight * wall.HalfSquare;
            cosSum += weight * cos * wall.Radius;
            sinSum += weight * sin * wall.Radius;
            skin += weight * outer.SpeedAt(sin, cos) * onSkin;
        }

        return new EndMoments(t, half, cosSum, sinSum, skin);
    }
}

/// <summary>Integrals through the wall at one clock angle.</summary>
/// <param name="T">∫ t ρ dρ.</param>
/// <param name="HalfSquare">∫ t²/2 ρ dρ.</param>
/// <param name="Radius">∫ t ρ² dρ.</param>
internal readonly record struct WallMoments(double T, double HalfSquare, double Radius)
{
    /// <summary>Of one t through the whole wall.</summary>
    public static WallMoments Of(double t, double inner, double outer)
    {
        double first = (outer - inner) * (outer + inner) / 2;
        double second = ((outer * outer * outer) - (inner * inner * inner)) / 3;
        return new WallMoments(t * first, t * t * first / 2, t * second);
    }

    /// <summary>Of a cut that differs through the wall, split where its piece changes.</summary>
    public static WallMoments Of(CutSurface surface, double sin, double cos, double inner, double outer)
    {
        // Thin walls are one panel; a rod, whose cut may bend strongly between axis and skin, several.
        const int Most = 4;
        int panels = inner < 0.5 * outer ? Most : 1;
        WallMoments sum = default;
        for (int i = 0; i < panels; i++)
        {
            double from = inner + ((outer - inner) * i / panels);
            double to = inner + ((outer - inner) * (i + 1) / panels);
            sum = sum.Plus(Split(surface, sin, cos, from, to));
        }

        return sum;
    }

    private static WallMoments Split(CutSurface surface, double sin, double cos, double from, double to)
    {
        const int Looks = 4;
        WallMoments sum = default;
        double start = from;
        surface.Cut(sin, cos, from, out int piece);
        for (int i = 1; i <= Looks; i++)
        {
            double low = from + ((to - from) * (i - 1) / Looks);
            double high = from + ((to - from) * i / Looks);
            surface.Cut(sin, cos, high, out int next);
            if (next == piece)
            {
                continue;
            }

            // One change between two looks is found to rounding; a second one hidden there is left to the outer halving.
            while (high - low > 1e-12 * to)
            {
                double middle = low + ((high - low) / 2);
                if (middle <= low || middle >= high)
                {
                    break;
                }

                surface.Cut(sin, cos, middle, out int there);
                (low, high) = there == piece ? (middle, high) : (low, middle);
            }

            sum = sum.Plus(Panel(surface, sin, cos, start, low));
            (start, piece) = (high, next);
        }

        return sum.Plus(Panel(surface, sin, cos, start, to));
    }

    private static WallMoments Panel(CutSurface surface, double sin, double cos, double from, double to)
    {
        if (to <= from)
        {
            return default;
        }

        GaussRule rule = GaussLegendre.Eight;
        (double t, double half, double radius) = (0, 0, 0);
        for (int i = 0; i < rule.Nodes.Length; i++)
        {
            (double x, double slope) = GaussLegendre.Smooth(rule.Nodes[i]);
            double at = from + ((to - from) * x);
            double value = surface.Cut(sin, cos, at, out _);
            double weight = rule.Weights[i] * slope * (to - from) * at;
            t += weight * value;
            half += weight * value * value / 2;
            radius += weight * value * at;
        }

        return new WallMoments(t, half, radius);
    }

    private WallMoments Plus(in WallMoments other) =>
        new(T + other.T, HalfSquare + other.HalfSquare, Radius + other.Radius);
}
