namespace FrameGen.Joints;

/// <content>Exact highest and lowest places of a curve, and its length.</content>
internal sealed partial class CurveSampler
{
    /// <summary>Length of the last curve in the developed pattern, on the outer skin its true one, mm, steps included, to 1e-6 relative.</summary>
    /// <remarks>Chords of each stretch, halved while that still shows, whole and halved, extrapolated (Richardson): what is left is of fourth order.</remarks>
    public double Length()
    {
        double length = Math.Abs(_trace[^1].T - _trace[0].T);
        for (int i = 1; i < _trace.Count; i++)
        {
            (CutSample a, CutSample b) = (_trace[i - 1], _trace[i]);
            length += b.Continues(a) ? Length(a, b, 0) : Chord(a, b);
        }

        return length;
    }

    private double Length(in CutSample a, in CutSample b, int depth)
    {
        const double Enough = 1e-4;
        CutSample middle = Evaluate(a.Clock + ((b.Clock - a.Clock) / 2));
        double halves = Chord(a, middle) + Chord(middle, b);
        double gained = halves - Chord(a, b);

        // A stretch that bends both ways looks straight from its middle: every one is halved once.
        return depth == 0 || (gained > Enough && depth < 8)
            ? Length(a, middle, depth + 1) + Length(middle, b, depth + 1)
            : halves + (gained / 3);
    }

    private static double Chord(in CutSample a, in CutSample b)
    {
        double x = b.Across - a.Across;
        double y = b.T - a.T;
        return Math.Sqrt((x * x) + (y * y));
    }

    // Puts the exact highest and lowest places of the curve in, so that a part's length is exact.
    private void Polish()
    {
        _polished.Clear();
        for (int i = 0; i < _trace.Count; i++)
        {
            CutSample here = _trace[i];
            bool joinsLeft = i > 0 && here.Continues(_trace[i - 1]);
            bool joinsRight = i < _trace.Count - 1 && _trace[i + 1].Continues(here);
            CutSample? extreme = (joinsLeft, joinsRight) switch
            {
                (true, true) => ExtremeAt(_trace[i - 1], here, _trace[i + 1]),
                (true, false) => ExtremeInside(_trace[i - 1], here),
                (false, true) => ExtremeInside(here, _trace[i + 1]),
                _ => null,
            };
            if (extreme is not { } found)
            {
                _polished.Add(here);
                continue;
            }

            double span = joinsLeft && joinsRight ? _trace[i + 1].Clock - _trace[i - 1].Clock : 0;
            if (Math.Abs(found.Clock - here.Clock) < 0.02 * span)
            {
                _polished.Add(found);
            }
            else if (found.Clock < here.Clock)
            {
                _polished.Add(found);
                _polished.Add(here);
            }
            else
            {
                _polished.Add(here);
                _polished.Add(found);
            }
        }

        _trace.Clear();
        _trace.AddRange(_polished);
    }

    private CutSample? ExtremeAt(in CutSample left, in CutSample here, in CutSample right)
    {
        const double Flat = 1e-9;
        bool highest = here.T >= left.T && here.T >= right.T && here.T > Math.Min(left.T, right.T) + Flat;
        bool lowest = here.T <= left.T && here.T <= right.T && here.T < Math.Max(left.T, right.T) - Flat;
        return highest || lowest ? Seek(left.Clock, here, right.Clock, highest ? -1 : 1) : null;
    }

    // At the end of a piece: an extreme between it and the next vertex shows halfway.
    private CutSample? ExtremeInside(in CutSample left, in CutSample right)
    {
        if (right.Clock - left.Clock < 1e-6)
        {
            return null;
        }

        CutSample middle = Evaluate(left.Clock + ((right.Clock - left.Clock) / 2));
        return middle.Piece == left.Piece && middle.Piece == right.Piece ? ExtremeAt(left, middle, right) : null;
    }

    // Least sign × t in a bracket: parabolas through three points, golden section where they do not help.
    private CutSample Seek(double left, in CutSample start, double right, int sign)
    {
        CutSample best = start, second = start, third = start;
        double step = right - left, stepBefore = step;
        for (int i = 0; i < 60 && right - left > 1e-9; i++)
        {
            double trial;
            double p = 0, q = 0;
            if (second.Clock != third.Clock && second.Clock != best.Clock && third.Clock != best.Clock)
            {
                double r = (best.Clock - second.Clock) * sign * (best.T - third.T);
                double s = (best.Clock - third.Clock) * sign * (best.T - second.T);
                p = ((best.Clock - third.Clock) * s) - ((best.Clock - second.Clock) * r);
                q = 2 * (s - r);
            }

            double move = q == 0 ? double.NaN : -p / q;
            if (Math.Abs(move) < Math.Abs(stepBefore) / 2 && best.Clock + move > left && best.Clock + move < right)
            {
                if (Math.Abs(move) < 1e-9)
                {
                    break;
                }

                (stepBefore, step) = (step, move);
                trial = best.Clock + move;
            }
            else
            {
                stepBefore = best.Clock - left > right - best.Clock ? left - best.Clock : right - best.Clock;
                step = Golden * stepBefore;
                trial = best.Clock + step;
            }

            CutSample there = Evaluate(trial);
            if (there.Piece != start.Piece)
            {
                break;
            }

            if (sign * there.T <= sign * best.T)
            {
                (left, right) = trial >= best.Clock ? (best.Clock, right) : (left, best.Clock);
                (third, second, best) = (second, best, there);
            }
            else
            {
                (left, right) = trial < best.Clock ? (trial, right) : (left, trial);
                (third, second) = (second, there);
            }
        }

        return best;
    }
}
