namespace FrameGen.Joints;

/// <content>The first looks at a skin, close enough together that no piece hides between them.</content>
internal sealed partial class CurveSampler
{
    private void Look()
    {
        _clocks.Clear();
        _surface.AddTangents(_skin, _clocks);
        _clocks.Sort();
        FindBreaks();
        _looks.Clear();
        int next = 0;
        for (int i = 0; i <= Looks; i++)
        {
            double clock = Math.PI * (((2.0 * i) / Looks) - 1);
            for (; next < _clocks.Count && _clocks[next] < clock - CornerWidth; next++)
            {
                if (_looks.Count > 0 && _clocks[next] > _looks[^1].Clock + CornerWidth)
                {
                    _looks.Add(Evaluate(_clocks[next]));
                }
            }

            _looks.Add(Evaluate(clock) with { OnGrid = true });
        }

        AddLooksAtBreaks();
    }

    private void FindBreaks()
    {
        _breaks.Clear();
        _breaks.AddRange(_skin.Breaks);
        _surface.AddBreaks(_skin, _breaks);
        _breaks.Sort();
    }

    // Right before and right after each place where an outline has a corner, so that what lies on either side is known.
    private void AddLooksAtBreaks()
    {
        double last = -Math.PI;
        foreach (double clock in _breaks)
        {
            if (clock - last < SameBreak || Math.PI - clock < SameBreak)
            {
                continue;
            }

            _looks.RemoveAll(look => Math.Abs(look.Clock - clock) < SameBreak);
            _looks.Add(Evaluate(clock - (CornerWidth / 2)));
            _looks.Add(Evaluate(clock + (CornerWidth / 2)) with { AfterBreak = true });
            last = clock;
        }

        if (last > -Math.PI)
        {
            SortLooks();
        }
    }

    // A piece shorter than the looks are apart: an extreme of a margin that crosses zero between them.
    private void AddShortPieces()
    {
        int width = _surface.MarginCount;
        if (width == 0)
        {
            return;
        }

        FindMargins(width);
        AddLimitCrossings(width);
        AddLooksBesideBreaks();
        FindMargins(width);
        int count = _looks.Count;
        for (int i = 0; i < count - 1; i++)
        {
            // The first look is the last one too, a turn earlier.
            (int before, double turn) = i == 0 ? (count - 2, 2 * Math.PI) : (i - 1, 0);
            for (int k = 0; k < width; k++)
            {
                double here = _margins[(i * width) + k];
                double left = _margins[(before * width) + k];
                double right = _margins[((i + 1) * width) + k];
                if (MayCross(left, here, right))
                {
                    SeekCrossing(_looks[before].Clock - turn, _looks[i].Clock, _looks[i + 1].Clock, k, Math.Sign(here));
                }
            }
        }

        SortLooks();
    }

    private void FindMargins(int width)
    {
        int count = _looks.Count;
        if (_margins.Length < count * width)
        {
            _margins = new double[2 * count * width];
        }

        for (int i = 0; i < count; i++)
        {
            (double sin, double cos) = Math.SinCos(_looks[i].Clock);
            _surface.Margins(sin, cos, _skin.RadiusAt(sin, cos), _margins.AsSpan(i * width, width));
        }
    }

    private void SortLooks() => _looks.Sort(static (a, b) => a.Clock.CompareTo(b.Clock));

    // Where a mate's limit begins or ceases to count, seen from both sides: from there on its other margins are smooth.
    private void AddLimitCrossings(int width)
    {
        Span<double> margins = stackalloc double[width];
        int count = _looks.Count;
        for (int i = 1; i < count; i++)
        {
            for (int k = 0; k < _surface.LimitMarginCount; k++)
            {
                double atLow = _margins[((i - 1) * width) + k];
                if (!(atLow * _margins[(i * width) + k] < 0))
                {
                    continue;
                }

                (double low, double high) = (_looks[i - 1].Clock, _looks[i].Clock);
                while (high - low > 1e-11)
                {
                    double middle = low + ((high - low) / 2);
                    (double sin, double cos) = Math.SinCos(middle);
                    _surface.Margins(sin, cos, _skin.RadiusAt(sin, cos), margins);
                    (low, high) = margins[k] * atLow > 0 ? (middle, high) : (low, middle);
                }

                _looks.Add(Evaluate(low - 1e-11));
                _looks.Add(Evaluate(high + 1e-11));
            }
        }

        SortLooks();
    }

    // Beside a line that grazes a mate, or a limit, margins run steeply: looks closer and closer to it on both sides.
    private void AddLooksBesideBreaks()
    {
        int count = _looks.Count;
        for (int i = 1; i < count - 1; i++)
        {
            if (_looks[i].OnGrid)
            {
                continue;
            }

            double here = _looks[i].Clock;
            foreach (double neighbour in (ReadOnlySpan<double>)[_looks[i - 1].Clock, _looks[i + 1].Clock])
            {
                if (Math.Abs(neighbour - here) > 1e-6)
                {
                    _looks.Add(Evaluate(here + ((neighbour - here) / 4)));
                    _looks.Add(Evaluate(here + ((neighbour - here) / 16)));
                }
            }
        }

        SortLooks();
    }

    private static bool MayCross(double left, double here, double right)
    {
        double size = Math.Abs(here);
        if (!(left * here > 0 && right * here > 0 && size <= Math.Abs(left) && size <= Math.Abs(right)))
        {
            return false;
        }

        // The parabola through the three: its extreme lies below half of what is seen.
        double curvature = left + right - (2 * here);
        double slope = right - left;
        return Math.Abs(curvature) > 0 && slope * slope / (8 * Math.Abs(curvature)) >= 0.5 * size;
    }

    // Golden section towards the extreme, until the sign changes.
    private void SeekCrossing(double left, double here, double right, int margin, int sign)
    {
        Span<double> margins = stackalloc double[_surface.MarginCount];
        double best = double.PositiveInfinity;
        for (int step = 0; step < 30; step++)
        {
            double clock = right - here > here - left ? here + (Golden * (right - here)) : here - (Golden * (here - left));
            (double sin, double cos) = Math.SinCos(clock);
            _surface.Margins(sin, cos, _skin.RadiusAt(sin, cos), margins);
            double value = sign * margins[margin];
            if (double.IsNaN(value))
            {
                return;
            }

            if (value < 0)
            {
                _looks.Add(Evaluate(Math.IEEERemainder(clock, 2 * Math.PI)));
                return;
            }

            if (value < best)
            {
                (left, right) = clock > here ? (here, right) : (left, here);
                (best, here) = (value, clock);
            }
            else if (clock > here)
            {
                right = clock;
            }
            else
            {
                left = clock;
            }
        }
    }
}
