using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>
/// How far the first tube of a corner runs out past its end point, so that the tubes coped to it land on its side and
/// not in its open end.
/// </summary>
internal static class RunOut
{
    private const int Looks = 64;

    /// <summary>The run-out one coped tube asks for, mm; negative where it lands short of the end point already.</summary>
    /// <param name="first">The end of the first tube.</param>
    /// <param name="firstSkin">Its outer skin, without gap.</param>
    /// <param name="coped">The end of the coped tube.</param>
    /// <param name="copedSkin">Its outer skin: no line further in asks for more.</param>
    /// <returns>Minus infinity where no wall line meets the first tube's side.</returns>
    /// <remarks>
    /// A wall line at y across the plane of the axes and x in it meets the side at z = c + (x + cos φ v(y + e)) / sin φ along the first
    /// tube, with c where the common normal of the axes stands, e its length and v the far side of the first tube's outline as those
    /// lines see it. The least z is at the least x of each y, on the outer skin. Round tubes: x = −√(r² − y²), v = √(R² − (y + e)²);
    /// with e = 0 the least is at y = 0, (r − R cos φ) / sin φ, or, for a tube wider than its mate, at the lines that just graze it.
    /// </remarks>
    public static double Needed(in EndFrame first, Outline firstSkin, in EndFrame coped, Outline copedSkin)
    {
        Vector3 normal = first.Into.Cross(coped.Into);
        double sine = normal.Length;
        if (sine < Line3.ParallelSine)
        {
            return double.NegativeInfinity;
        }

        double cosine = first.Into.Dot(coped.Into);
        Vector3 between = coped.Point - first.Point;
        double stand = between.Cross(coped.Into).Dot(normal) / (sine * sine);
        if (firstSkin is RoundOutline firstCircle && copedSkin is RoundOutline copedCircle)
        {
            double apart = Math.Abs(between.Dot(normal)) / sine;
            return (OfCircles(firstCircle.Radius, copedCircle.Radius, apart, cosine) / sine) - stand;
        }

        Vector3 across = normal / sine;
        double offset = between.Dot(across);
        OutlineView side = firstSkin.Seen(first.Axes.InSection(across.Cross(first.Into)), first.Axes.InSection(across));
        OutlineView skin = copedSkin.Seen(coped.Axes.InSection(across.Cross(coped.Into)), coped.Axes.InSection(across));
        double low = Math.Max(-skin.HalfWidth, -side.HalfWidth - offset);
        double high = Math.Min(skin.HalfWidth, side.HalfWidth - offset);
        if (low > high)
        {
            return double.NegativeInfinity;
        }

        // Between places where an outline has a corner the reach is smooth.
        List<double> stops = [low, high];
        stops.AddRange(skin.Breaks.Select(b => -b).Concat(skin.Breaks).Concat(side.Breaks.Select(b => b - offset)).Where(y => y > low && y < high));
        stops.Sort();
        double reach = double.NegativeInfinity;
        for (int i = 1; i < stops.Count; i++)
        {
            reach = Math.Max(reach, Largest(y => -skin.Near(y) - (cosine * side.Far(y + offset)), stops[i - 1], stops[i]));
        }

        return (reach / sine) - stand;
    }

    private static double OfCircles(double firstRadius, double copedRadius, double offset, double cosine)
    {
        double low = Math.Max(-copedRadius, -firstRadius - offset);
        double high = Math.Min(copedRadius, firstRadius - offset);
        if (low > high)
        {
            return double.NegativeInfinity;
        }

        double Reach(double y) =>
            Root(copedRadius, y) - (cosine * Root(firstRadius, y + offset));

        return offset <= Outline.Graze
            ? Math.Max(Reach(0), Reach(high))
            : Largest(Reach, low, high);
    }

    private static double Root(double radius, double across) =>
        Math.Sqrt(Math.Max(0, (radius - across) * (radius + across)));

    // Looks taken closer together towards the ends, where the square roots are steep; then golden section round the best.
    private static double Largest(Func<double, double> function, double low, double high)
    {
        double At(double angle) => function(low + ((high - low) * (1 - Math.Cos(angle)) / 2));

        double best = double.NegativeInfinity;
        int place = 0;
        for (int i = 0; i <= Looks; i++)
        {
            double value = At(Math.PI * i / Looks);
            if (value > best)
            {
                (best, place) = (value, i);
            }
        }

        const double Golden = 0.38196601125010515;
        double left = Math.PI * Math.Max(0, place - 1) / Looks;
        double right = Math.PI * Math.Min(Looks, place + 1) / Looks;
        double first = left + (Golden * (right - left));
        double second = right - (Golden * (right - left));
        (double atFirst, double atSecond) = (At(first), At(second));
        while (right - left > 1e-8)
        {
            if (atFirst >= atSecond)
            {
                (right, second, atSecond) = (second, first, atFirst);
                first = left + (Golden * (right - left));
                atFirst = At(first);
            }
            else
            {
                (left, first, atFirst) = (first, second, atSecond);
                second = right - (Golden * (right - left));
                atSecond = At(second);
            }
        }

        return Math.Max(best, Math.Max(atFirst, atSecond));
    }
}
