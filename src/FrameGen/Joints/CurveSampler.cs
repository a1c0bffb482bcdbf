using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>
/// Samples the line that a cut draws on a skin. The skin is first looked at every 5.6 degrees and at every line that
/// grazes a mate, and on both sides of every place where an outline, a mate's or the tube's own, has a corner; where the piece changes
/// between two looks the corner is found by bisection; between corners the curve is halved until its chords are within the tolerance. Not for use by two threads at once: it keeps its working lists.
/// </summary>
internal sealed partial class CurveSampler
{
    /// <summary>Clock angles within this of each other are one corner, rad.</summary>
    public const double CornerWidth = 4e-13;

    /// <summary>A jump of t up to this is no step, and vertices this near to each other are one, mm.</summary>
    public const double Coincident = 1e-6;

    /// <summary>Vertices no farther than this from the line of their neighbours are left out, mm.</summary>
    private const double Straight = 1e-6;

    /// <summary>Pieces shorter than this are not looked for, rad: rounding alone can make such.</summary>
    private const double ShortestPiece = 1e-9;

    /// <summary>Places this near to each other where outlines have corners are one, rad.</summary>
    private const double SameBreak = 1e-11;

    private const int Looks = 64;
    private const int LooksAPanel = 4;
    private const int DeepestHalving = 46;

    /// <summary>No true cut needs as many; should rounding flicker between pieces along a whole flat, the search ends here.</summary>
    private const int MostSamples = 50_000;

    /// <summary>(3 − √5)/2: where the golden section looks next.</summary>
    private const double Golden = 0.38196601125010515;

    private readonly List<double> _clocks = new(Looks + 8);
    private readonly List<double> _breaks = [];
    private readonly List<double> _across = new(256);
    private readonly List<CutSample> _looks = new(Looks + 8);
    private readonly List<CutSample> _trace = new(256);
    private readonly List<CutSample> _polished = new(256);
    private double[] _margins = [];

    private CutSurface _surface = PlaneCut.Square(0);
    private Outline _skin = new RoundOutline(1);
    private Outline _outer = new RoundOutline(1);
    private double _tolerance;

    /// <summary>
    /// The samples of the last curve, growing; where neighbours lie on different pieces there is a corner between them,
    /// less than <see cref="CornerWidth"/> wide.
    /// </summary>
    public IReadOnlyList<CutSample> Trace => _trace;

    /// <summary>Samples a curve.</summary>
    /// <param name="surface">The cut.</param>
    /// <param name="skin">The skin; a point for a rod's axis.</param>
    /// <param name="outer">The outer skin, round which x of the developed pattern is measured.</param>
    /// <param name="tolerance">Of chords in the developed pattern, mm.</param>
    public EndCurve Sample(CutSurface surface, Outline skin, Outline outer, double tolerance)
    {
        if (skin.IsPoint)
        {
            double t = surface.At(0, 0);
            return new EndCurve([new CurvePoint(-Math.PI, t), new CurvePoint(Math.PI, t)]);
        }

        Run(surface, skin, outer, tolerance);
        Polish();
        return new EndCurve(Vertices());
    }

    /// <summary>Finds the corners of a curve alone; <see cref="Trace"/> holds them.</summary>
    public void FindPieces(CutSurface surface, Outline skin) => Run(surface, skin, skin, double.PositiveInfinity);

    private void Run(CutSurface surface, Outline skin, Outline outer, double tolerance)
    {
        // A part is kept back for what the three places looked at on a chord do not show.
        (_surface, _skin, _outer, _tolerance) = (surface, skin, outer, 0.7 * tolerance);
        _trace.Clear();
        Look();
        AddShortPieces();
        _trace.Add(_looks[0]);
        int first = 0;
        while (first < _looks.Count - 1)
        {
            int last = first + LooksAPanel;
            if (IsPlainPanel(first, last))
            {
                Halve(_looks[first], _looks[first + 1], _looks[first + 2], _looks[first + 3], _looks[last], 0);
                first = last;
            }
            else
            {
                Connect(_looks[first], _looks[first + 1], 0);
                first++;
            }
        }
    }

    private bool IsPlainPanel(int first, int last)
    {
        if (last >= _looks.Count || !_looks[first].OnGrid)
        {
            return false;
        }

        for (int i = first + 1; i <= last; i++)
        {
            if (!_looks[i].Continues(_looks[first]) || !_looks[i].OnGrid)
            {
                return false;
            }
        }

        return true;
    }

    private CutSample Evaluate(double clock)
    {
        (double sin, double cos) = Math.SinCos(clock);
        double t = _surface.Cut(sin, cos, _skin.RadiusAt(sin, cos), out int piece);
        return new CutSample(clock, _outer.DistanceAt(clock, sin, cos), t, piece, OnGrid: false, AfterBreak: false);
    }

    // Adds everything after a up to b; where the piece changes between them, the corner too.
    private void Connect(in CutSample a, in CutSample b, int depth)
    {
        if (b.AfterBreak || _trace.Count > MostSamples)
        {
            _trace.Add(b);
            return;
        }

        if (a.Piece == b.Piece)
        {
            double quarter = (b.Clock - a.Clock) / 4;
            Halve(a, Evaluate(a.Clock + quarter), Evaluate(a.Clock + (2 * quarter)), Evaluate(b.Clock - quarter), b, depth);
            return;
        }

        (CutSample low, CutSample high) = (a, b);
        while (high.Clock - low.Clock > CornerWidth)
        {
            CutSample middle = Evaluate(low.Clock + ((high.Clock - low.Clock) / 2));
            if (middle.Piece == low.Piece)
            {
                low = middle;
            }
            else if (middle.Piece == high.Piece || b.Clock - a.Clock < ShortestPiece)
            {
                high = middle;
            }
            else
            {
                ConnectSamePiece(a, low, depth);
                Connect(low, middle, depth);
                Connect(middle, high, depth);
                ConnectSamePiece(high, b, depth);
                return;
            }
        }

        ConnectSamePiece(a, low, depth);
        _trace.Add(high);
        if (high.Piece == b.Piece)
        {
            ConnectSamePiece(high, b, depth);
        }
        else
        {
            _trace.Add(b);
        }
    }

    private void ConnectSamePiece(in CutSample a, in CutSample b, int depth)
    {
        if (b.Clock - a.Clock > ShortestPiece)
        {
            Connect(a, b, depth);
        }
        else if (b.Clock > a.Clock)
        {
            _trace.Add(b);
        }
    }

    // Halves the curve between a and b until the chord is near enough to the three places between.
    private void Halve(in CutSample a, in CutSample first, in CutSample middle, in CutSample third, in CutSample b, int depth)
    {
        bool samePiece = first.Piece == a.Piece && middle.Piece == a.Piece && third.Piece == a.Piece;
        if (depth >= DeepestHalving || b.Clock - a.Clock < ShortestPiece || _trace.Count > MostSamples ||
            (samePiece && IsNear(a, first, b) && IsNear(a, middle, b) && IsNear(a, third, b)))
        {
            _trace.Add(b);
            return;
        }

        if (!samePiece)
        {
            Connect(a, first, depth + 2);
            Connect(first, middle, depth + 2);
            Connect(middle, third, depth + 2);
            Connect(third, b, depth + 2);
            return;
        }

        double eighth = (b.Clock - a.Clock) / 8;
        Halve(a, Evaluate(a.Clock + eighth), first, Evaluate(middle.Clock - eighth), middle, depth + 1);
        Halve(middle, Evaluate(middle.Clock + eighth), third, Evaluate(b.Clock - eighth), b, depth + 1);
    }

    // Distance of a point from a chord in the developed pattern.
    private bool IsNear(in CutSample a, in CutSample point, in CutSample b)
    {
        double x = b.Across - a.Across;
        double y = b.T - a.T;
        double px = point.Across - a.Across;
        double py = point.T - a.T;
        double cross = (x * py) - (y * px);
        return cross * cross <= _tolerance * _tolerance * ((x * x) + (y * y));
    }

    private List<CurvePoint> Vertices()
    {
        List<CurvePoint> points = new(_trace.Count + 1);
        _across.Clear();
        foreach (CutSample sample in _trace)
        {
            double clock = Math.Abs(Math.Abs(sample.Clock) - Math.PI) < 1e-9 ? Math.CopySign(Math.PI, sample.Clock) : sample.Clock;
            Append(points, new CurvePoint(clock, sample.T), sample.Across);
        }

        // The seam: the curve closes on itself, by a step where one falls there.
        Append(points, new CurvePoint(Math.PI, points[0].T), _outer.Perimeter / 2);
        if (points.Count > 2 && points[^2].Clock == points[^1].Clock)
        {
            points[^2] = new CurvePoint(Math.PI, points[^2].T);
        }

        points[^1] = new CurvePoint(Math.PI, points[0].T);
        return _skin.Breaks.Count > 0 ? WithoutStraightOnes(points) : points;
    }

    private void Append(List<CurvePoint> points, CurvePoint point, double across)
    {
        if (points.Count == 0 || across - _across[^1] > Coincident)
        {
            points.Add(point);
            _across.Add(across);
            return;
        }

        double clock = points[^1].Clock;
        bool afterStep = points.Count > 1 && points[^2].Clock == clock;
        if (Math.Abs(point.T - points[^1].T) <= Coincident)
        {
            return;
        }

        if (afterStep)
        {
            points[^1] = new CurvePoint(clock, point.T);
        }
        else
        {
            points.Add(new CurvePoint(clock, point.T));
            _across.Add(_across[^1]);
        }
    }

    // Flats that meet flats give straight lines: what lies on one says nothing.
    private List<CurvePoint> WithoutStraightOnes(List<CurvePoint> points)
    {
        List<CurvePoint> kept = [points[0]];
        int last = 0;
        for (int i = 1; i < points.Count - 1; i++)
        {
            bool straight = true;
            for (int k = last + 1; k <= i && straight; k++)
            {
                double x = _across[i + 1] - _across[last], y = points[i + 1].T - points[last].T;
                double px = _across[k] - _across[last], py = points[k].T - points[last].T;
                double cross = (x * py) - (y * px);
                straight = cross * cross <= Straight * Straight * ((x * x) + (y * y));
            }

            if (!straight)
            {
                kept.Add(points[i]);
                last = i;
            }
        }

        kept.Add(points[^1]);
        return kept;
    }
}

/// <summary>A wall line's cut and the piece it lies on.</summary>
/// <param name="Clock">rad.</param>
/// <param name="Across">x in the developed pattern, mm.</param>
/// <param name="T">mm.</param>
/// <param name="Piece">As <see cref="CutSurface.Cut"/> names it.</param>
/// <param name="OnGrid">True at the regular looks.</param>
/// <param name="AfterBreak">True right after a place where an outline has a corner.</param>
internal readonly record struct CutSample(double Clock, double Across, double T, int Piece, bool OnGrid, bool AfterBreak)
{
    /// <summary>True where the curve is smooth from the sample before it to this one.</summary>
    public bool Continues(in CutSample before) => Piece == before.Piece && !AfterBreak;
}
