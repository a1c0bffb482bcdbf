namespace FrameGen.Joints;

/// <summary>The circles in the wall along which a cut face is meshed, outer skin first, and the cut's line on each.</summary>
internal sealed class EndRings
{
    private const int MostTubeRings = 16;
    private const int MostRodRings = 64;

    /// <summary>Share of its radius at which a radially cut rod's face is closed by a cone.</summary>
    private const double ConeShare = 0.02;

    private readonly CutSurface _surface;
    private readonly double _inner;

    private EndRings(CutSurface surface, double inner, IReadOnlyList<double> radii, IReadOnlyList<EndCurve> curves) =>
        (_surface, _inner, Radii, Curves) = (surface, inner, radii, curves);

    /// <summary>From the outer skin inwards, mm; the last is the inner skin, or for a rod the ring round its axis.</summary>
    public IReadOnlyList<double> Radii { get; }

    /// <summary>The cut on each ring, within the mesh's sag.</summary>
    public IReadOnlyList<EndCurve> Curves { get; }

    /// <summary>Rings of an end.</summary>
    public static EndRings Of(EndCut cut, double inner, double outer, double sag)
    {
        CutSurface surface = cut.Surface as CutSurface
            ?? throw new ArgumentException("A mesh needs the cut of a coped frame.", nameof(cut));
        CurveSampler sampler = new();
        List<double> radii = Choose(surface, inner, outer, sag);
        EndCurve[] curves = new EndCurve[radii.Count];
        for (int i = 0; i < curves.Length; i++)
        {
            curves[i] = surface.IsRadial && i > 0 ? curves[0] : sampler.Sample(surface, radii[i], outer, sag);
        }

        return new EndRings(surface, inner, radii, curves);
    }

    /// <summary>The rings as vertices of a mesh.</summary>
    /// <param name="columns">The mesh's columns.</param>
    /// <param name="builder">Takes the vertices.</param>
    /// <param name="along">From t to the distance along the tube.</param>
    public EndLoops Loops(Columns columns, MeshBuilder builder, Func<double, double> along)
    {
        Loop[] rings = new Loop[Radii.Count];
        for (int i = 0; i < rings.Length; i++)
        {
            double radius = Radii[i];
            (double[] before, double[] after) = columns.Values(Curves[i], clock => _surface.At(clock, radius));
            rings[i] = builder.AddLoop(radius, before, after, along);
        }

        int? apex = _inner > 0 ? null : builder.AddOnAxis(along(_surface.At(0, 0)));
        return new EndLoops(rings, apex);
    }

    private static List<double> Choose(CutSurface surface, double inner, double outer, double sag)
    {
        if (surface is PlaneCut)
        {
            return inner > 0 ? [outer, inner] : [outer];
        }

        if (surface.IsRadial)
        {
            return [outer, inner > 0 ? inner : ConeShare * outer];
        }

        // Twice as many panels leave a quarter of the bulge; a rod keeps its innermost ring for the cone to its axis.
        int most = inner > 0 ? MostTubeRings : MostRodRings;
        int panels = 1;
        while (panels < most && Bulge(surface, inner, outer, panels) > sag)
        {
            panels *= 2;
        }

        List<double> radii = [];
        for (int i = 0; i < panels || (inner > 0 && i == panels); i++)
        {
            radii.Add(i == panels ? inner : outer - ((outer - inner) * i / panels));
        }

        return radii;
    }

    // Farthest distance of the face from straight lines through the wall, measured square to them.
    private static double Bulge(CutSurface surface, double inner, double outer, int panels)
    {
        const int Looks = 96;
        double worst = 0;
        for (int k = 0; k < Looks; k++)
        {
            (double sin, double cos) = Math.SinCos(2 * Math.PI * (k + 0.5) / Looks);
            double low = inner;
            double atLow = surface.Cut(sin, cos, low, out int lowPiece);
            for (int i = 1; i <= panels; i++)
            {
                double high = inner + ((outer - inner) * i / panels);
                double atHigh = surface.Cut(sin, cos, high, out int highPiece);
                double atMiddle = surface.Cut(sin, cos, (low + high) / 2, out int piece);
                if (piece == lowPiece && piece == highPiece)
                {
                    double slope = (atHigh - atLow) / (high - low);
                    worst = Math.Max(worst, Math.Abs(atMiddle - ((atLow + atHigh) / 2)) / Math.Sqrt(1 + (slope * slope)));
                }
                else if (i == 1 && inner <= 0)
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
