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
    /// <param name="first">Axis of the first tube, from its end point into it.</param>
    /// <param name="firstRadius">R, mm, outside, without gap.</param>
    /// <param name="coped">Axis of the coped tube, from its end point into it.</param>
    /// <param name="copedRadius">r, mm, outside: no line further in asks for more.</param>
    /// <returns>Minus infinity where no wall line meets the first tube's side.</returns>
    /// <remarks>
    /// A wall line at y across the plane of the axes and x in it meets the side at
    /// z = c + (x + cos φ √(R² − (y + e)²)) / sin φ along the first tube, with c where the common normal of the axes
    /// stands and e its length. The least z is at x = −√(r² − y²), on the outer skin. With e = 0 it is at y = 0:
    /// (r − R cos φ) / sin φ; or, for a tube wider than its mate, at the lines that just graze it.
    /// </remarks>
    public static double Needed(Line3 first, double firstRadius, Line3 coped, double copedRadius)
    {
        Vector3 normal = first.Direction.Cross(coped.Direction);
        double sine = normal.Length;
        if (sine < Line3.ParallelSine)
        {
            return double.NegativeInfinity;
        }

        double cosine = first.Direction.Dot(coped.Direction);
        Vector3 between = coped.Point - first.Point;
        double offset = Math.Abs(between.Dot(normal)) / sine;
        double stand = between.Cross(coped.Direction).Dot(normal) / (sine * sine);
        double low = Math.Max(-copedRadius, -firstRadius - offset);
        double high = Math.Min(copedRadius, firstRadius - offset);
        if (low > high)
        {
            return double.NegativeInfinity;
        }

        double Reach(double y) =>
            Root(copedRadius, y) - (cosine * Root(firstRadius, y + offset));

        double reach = offset <= RoundOutline.Graze
            ? Math.Max(Reach(0), Reach(high))
            : Largest(Reach, low, high);
        return (reach / sine) - stand;
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
