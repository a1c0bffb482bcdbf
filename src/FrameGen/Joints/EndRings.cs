using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>The rings in the wall along which a cut face is meshed, outer skin first, and the cut's line on each.</summary>
internal sealed class EndRings
{
    private const int MostTubeRings = 16;
    private const int MostRodRings = 64;

    /// <summary>Share of its radius at which a radially cut rod's face is closed by a cone.</summary>
    private const double ConeShare = 0.02;

    private readonly CutSurface _surface;
    private readonly Outline _inner;

    private EndRings(CutSurface surface, Outline inner, IReadOnlyList<Outline> rings, IReadOnlyList<EndCurve> curves) =>
        (_surface, _inner, Rings, Curves) = (surface, inner, rings, curves);

    /// <summary>From the outer skin inwards; the last is the bore, or for a rod the ring round its axis.</summary>
    public IReadOnlyList<Outline> Rings { get; }

    /// <summary>The cut on each ring, within the mesh's sag.</summary>
    public IReadOnlyList<EndCurve> Curves { get; }

    /// <summary>Rings of an end.</summary>
    public static EndRings Of(EndCut cut, Outline inner, Outline outer, double sag)
    {
        CutSurface surface = cut.Surface as CutSurface
            ?? throw new ArgumentException("A mesh needs the cut of a coped frame.", nameof(cut));
        CurveSampler sampler = new();
        List<Outline> rings = Choose(surface, inner, outer, sag);
        EndCurve[] curves = new EndCurve[rings.Count];
        for (int i = 0; i < curves.Length; i++)
        {
            curves[i] = surface.IsRadial && i > 0 ? curves[0] : sampler.Sample(surface, rings[i], outer, sag);
        }

        return new EndRings(surface, inner, rings, curves);
    }

    /// <summary>The rings as vertices of a mesh.</summary>
    /// <param name="columns">The mesh's columns.</param>
    /// <param name="builder">Takes the vertices.</param>
    /// <param name="along">From t to the distance along the tube.</param>
    public EndLoops Loops(Columns columns, MeshBuilder builder, Func<double, double> along)
    {
        Loop[] rings = new Loop[Rings.Count];
        for (int i = 0; i < rings.Length; i++)
        {
            Outline ring = Rings[i];
            (double[] before, double[] after) = columns.Values(Curves[i], clock => _surface.At(clock, ring));
            rings[i] = builder.AddLoop(ring, before, after, along);
        }

        int? apex = !_inner.IsPoint ? null : builder.AddOnAxis(along(_surface.At(0, 0)));
        return new EndLoops(rings, apex);
    }

    private static List<Outline> Choose(CutSurface surface, Outline inner, Outline outer, double sag)
    {
        if (surface is PlaneCut)
        {
            return inner.IsPoint ? [outer] : [outer, inner];
        }

        if (surface.IsRadial)
        {
            return [outer, inner.IsPoint ? new RoundOutline(ConeShare * outer.HalfHeight) : inner];
        }

        // Twice as many panels leave a quarter of the bulge; a rod keeps its innermost ring for the cone to its axis.
        int most = inner.IsPoint ? MostRodRings : MostTubeRings;
        int panels = 1;
        while (panels < most && Bulge(surface, inner, outer, panels) > sag)
        {
            panels *= 2;
        }

        List<Outline> rings = [outer];
        for (int i = 1; i < panels || (!inner.IsPoint && i == panels); i++)
        {
            rings.Add(i == panels ? inner : outer.Towards(inner, (double)i / panels));
        }

        return rings;
    }

    // Farthest distance of the face from straight lines through the wall, measured square to them.
    private static double Bulge(CutSurface surface, Outline inner, Outline outer, int panels)
    {
        const int Looks = 96;
        double worst = 0;
        for (int k = 0; k < Looks; k++)
        {
            (double sin, double cos) = Math.SinCos(2 * Math.PI * (k + 0.5) / Looks);
            (double from, double to) = (inner.RadiusAt(sin, cos), outer.RadiusAt(sin, cos));
            double low = from;
            double atLow = surface.Cut(sin, cos, low, out int lowPiece);
            for (int i = 1; i <= panels; i++)
            {
                double high = from + ((to - from) * i / panels);
                double atHigh = surface.Cut(sin, cos, high, out int highPiece);
                double atMiddle = surface.Cut(sin, cos, (low + high) / 2, out int piece);
                if (piece == lowPiece && piece == highPiece)
                {
                    double slope = (atHigh - atLow) / (high - low);
                    worst = Math.Max(worst, Math.Abs(atMiddle - ((atLow + atHigh) / 2)) / Math.Sqrt(1 + (slope * slope)));
                }
                else if (i == 1 && from <= 0)
                {
                    // A corner or a step beside a rod's axis, where the face is closed by a cone: keep that small.
                    return double.PositiveInfinity;
                }

                (low, atLow, lowPiece) = (high, atHigh, highPiece);
            }
        }

        return worst;
    }
}

/// <summary>The vertices of an end's rings, outer first, and of a rod's centre.</summary>
internal sealed record EndLoops(IReadOnlyList<Loop> Rings, int? Apex)
{
    /// <summary>On the outer skin.</summary>
    public Loop Outer => Rings[0];

    /// <summary>On the inner skin; null for a rod.</summary>
    public Loop? Inner => Apex is null ? Rings[^1] : null;
}
