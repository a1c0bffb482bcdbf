using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <content>Wall lines at one clock angle.</content>
internal sealed partial class Mate
{
    /// <summary>
    /// The half-plane of one clock angle, spanned by the distance ρ from the tube's axis and by t. The mate cuts it in a
    /// convex region: below t₂(ρ), above t₁(ρ), within the clip line.
    /// </summary>
    public readonly struct HalfPlane(Mate mate, double w1Slope, double w2Slope, double depthSlope)
    {
        /// <summary>Where the wall line at ρ meets the mate on its way from the tube's middle to the end.</summary>
        /// <param name="radius">ρ, mm.</param>
        /// <param name="middle">t of the tube's middle: a mate met only beyond it is not in the way.</param>
        /// <param name="t">mm.</param>
        /// <param name="onLimit">True where it stops on the plane in which the mate ends.</param>
        /// <returns>False where it meets nothing of this mate.</returns>
        public bool Meets(double radius, double middle, out double t, out bool onLimit)
        {
            onLimit = false;
            if (!Chord(radius, out double begin, out t))
            {
                return false;
            }

            if (mate._limit is not null)
            {
                double depth = mate._depth + (depthSlope * radius);
                double slope = mate._depthSlope;
                if (Math.Abs(slope) < 1e-12)
                {
                    if (depth < -Outline.Graze)
                    {
                        return false;
                    }
                }
                else if (slope > 0)
                {
                    if (depth + (slope * t) < -Outline.Graze)
                    {
                        return false;
                    }

                    begin = Math.Max(begin, -depth / slope);
                }
                else
                {
                    if (depth + (slope * begin) < -Outline.Graze)
                    {
                        return false;
                    }

                    double end = -depth / slope;
                    if (end < t - Outline.Graze)
                    {
                        (t, onLimit) = (end, true);
                    }
                }
            }

            return begin < middle;
        }

        /// <summary>
        /// Largest t over all ρ in [inner, outer] that meet the mate: exact, since t₂ is concave and the limit a line.
        /// </summary>
        /// <param name="inner">mm.</param>
        /// <param name="outer">mm.</param>
        /// <param name="middle">t of the tube's middle.</param>
        /// <param name="low">Least ρ that meets the mate.</param>
        /// <param name="high">Greatest ρ that meets the mate.</param>
        /// <param name="t">Largest t, mm.</param>
        /// <param name="place">What decides it, a small number: a change of it may be a corner.</param>
        /// <returns>False where no ρ meets it.</returns>
        public bool Top(double inner, double outer, double middle, out double low, out double high, out double t, out int place)
        {
            (low, high, t, place) = (inner, outer, double.NegativeInfinity, 0);
            if (mate.IsParallel)
            {
                return TopAlong(ref low, ref high, ref t, ref place);
            }

            if (!Across(ref low, ref high))
            {
                return false;
            }

            bool endsHere = mate._limit is not null && mate._depthSlope <= -1e-12;
            double limit0 = 0, limit1 = 0;
            if ((mate._limit is not null && !WithinLimit(middle, ref low, ref high, out limit0, out limit1)) ||
                ((Begin(low) >= middle || Begin(high) >= middle) && !KeepBelow(middle, 0, false, ref low, ref high)))
            {
                return false;
            }

            double top = Math.Clamp(Summit(), low, high);
            if (double.IsNaN(top))
            {
                top = End(low) >= End(high) ? low : high;
            }

            // A whole flat may have its summit at a skin or its limit on the mate's side: rounding must not choose there.
            const double Graze = Outline.Graze;
            int topPlace = top <= inner + Graze ? 0 : top >= outer - Graze ? 1 : top <= low + Graze || top >= high - Graze ? 4 : 2;
            if (!endsHere)
            {
                (t, place) = (End(top), topPlace + (10 * PieceAt(top)));
                return true;
            }

            // Largest of min(t₂, limit): at the summit, where the two cross, or at an end of the interval.
            Consider(top, topPlace, limit0, limit1, ref t, ref place);
            Consider(low, low <= inner + Graze ? 0 : 4, limit0, limit1, ref t, ref place);
            Consider(high, high >= outer - Graze ? 1 : 4, limit0, limit1, ref t, ref place);
            if (Crossings(limit0, limit1, out double first, out double second, out _, out _))
            {
                Consider(Math.Clamp(first, low, high), 3, limit0, limit1, ref t, ref place);
                Consider(Math.Clamp(second, low, high), 3, limit0, limit1, ref t, ref place);
            }

            return true;
        }

        /// <summary>
        /// By how far the wall line at ρ lies inside the limit where it leaves and where it enters the endless prism, mm;
        /// NaN where it misses that or nothing limits it.
        /// </summary>
        public (double AtEnd, double AtBegin) LimitDepths(double radius)
        {
            if (mate._limit is null || mate.IsParallel || !Chord(radius, out double begin, out double end))
            {
                return (double.NaN, double.NaN);
            }

            double depth = mate._depth + (depthSlope * radius);
            return (depth + (mate._depthSlope * end), depth + (mate._depthSlope * begin));
        }

        /// <summary>By how much the wall line at ρ misses the mate, mm: past its side, past its end, or beyond the middle.</summary>
        public double Shortfall(double radius, double middle)
        {
            if (!Chord(radius, out double begin, out double end))
            {
                double across = mate._w2 + (w2Slope * radius);
                return mate.IsParallel
                    ? mate.DistanceOutside(across, mate._w1 + (w1Slope * radius))
                    : Math.Abs(across) - mate.HalfWidth;
            }

            if (mate._limit is not null)
            {
                double depth = mate._depth + (depthSlope * radius);
                double deepest = mate._depthSlope == 0
                    ? depth
                    : depth + Math.Max(mate._depthSlope * begin, mate._depthSlope * end);
                if (deepest < 0)
                {
                    return -deepest;
                }
            }

            return Math.Max(0, begin - middle);
        }

        /// <summary>Which smooth piece of the mate's outline the wall line at ρ leaves by.</summary>
        public int PieceAt(double radius) => mate._view.PieceAt(mate._w2 + (w2Slope * radius));

        private bool Chord(double radius, out double begin, out double end)
        {
            double across = mate._w2 + (w2Slope * radius);
            bool reaches = mate._view.Reaches(across);
            (double near, double far) = mate._view.Chord(across);
            if (mate.IsParallel)
            {
                double along = mate._w1 + (w1Slope * radius);
                (begin, end) = (double.NegativeInfinity, double.PositiveInfinity);
                return reaches && along >= near - Outline.Graze && along <= far + Outline.Graze;
            }

            double centre = -mate._w1 - (w1Slope * radius);
            (begin, end) = ((centre + near) / mate._sine, (centre + far) / mate._sine);
            return reaches;
        }

        private double Begin(double radius) =>
            (-mate._w1 - (w1Slope * radius) + mate._view.Near(mate._w2 + (w2Slope * radius))) / mate._sine;

        private double End(double radius) =>
            (-mate._w1 - (w1Slope * radius) + mate._view.Far(mate._w2 + (w2Slope * radius))) / mate._sine;

        // Where t₂ has its summit: where the outline's normal is square to the ray; NaN where t₂ is a straight line.
        private double Summit()
        {
            if (Math.Abs(w2Slope) < 1e-14)
            {
                return double.NaN;
            }

            Point2 normal = new(-Math.Sign(w2Slope) * w1Slope, Math.Abs(w2Slope));
            return (mate._view.Farthest(normal) - mate._w2) / w2Slope;
        }

        // Keeps the ρ whose line is no farther across than the radius.
        private bool Across(ref double low, ref double high)
        {
            double reach = mate.HalfWidth + Outline.Graze;
            return KeepPositive(reach - mate._w2, -w2Slope, ref low, ref high) &&
                KeepPositive(reach + mate._w2, w2Slope, ref low, ref high);
        }

        // Keeps the ρ that meet the mate within its limit, the line t = limit0 + limit1 ρ (0 and 0 where it runs along the
        // wall lines), moved out by the same graze as everywhere.
        private bool WithinLimit(double middle, ref double low, ref double high, out double limit0, out double limit1)
        {
            double slope = mate._depthSlope;
            (limit0, limit1) = (0, 0);
            if (Math.Abs(slope) < 1e-12)
            {
                return KeepPositive(mate._depth + Outline.Graze, depthSlope, ref low, ref high);
            }

            (limit0, limit1) = (-mate._depth / slope, -depthSlope / slope);
            double graze = Outline.Graze / Math.Abs(slope);
            return slope < 0
                ? KeepBelow(limit0 + graze, limit1, false, ref low, ref high)
                : KeepBelow(limit0 - graze, limit1, true, ref low, ref high) &&
                    KeepPositive(middle - limit0, -limit1, ref low, ref high);
        }

        // Keeps the ρ with constant + slope ρ >= 0.
        private static bool KeepPositive(double constant, double slope, ref double low, ref double high)
        {
            double atLow = constant + (slope * low);
            double atHigh = constant + (slope * high);
            if (atLow < 0 && atHigh < 0)
            {
                return false;
            }

            if (atLow < 0)
            {
                low = Math.Clamp(-constant / slope, low, high);
            }
            else if (atHigh < 0)
            {
                high = Math.Clamp(-constant / slope, low, high);
            }

            return true;
        }

        // Keeps the ρ where t₁ lies below the line t = line0 + line1 ρ (above: where t₂ lies above it): an interval.
        private bool KeepBelow(double line0, double line1, bool above, ref double low, ref double high)
        {
            bool lowIn = above ? End(low) >= line0 + (line1 * low) : Begin(low) <= line0 + (line1 * low);
            bool highIn = above ? End(high) >= line0 + (line1 * high) : Begin(high) <= line0 + (line1 * high);
            if (lowIn && highIn)
            {
                return true;
            }

            if (!Crossings(line0, line1, out double first, out double second, out bool firstOnEnd, out bool secondOnEnd))
            {
                return false;
            }

            // Only crossings on the asked branch bound the interval.
            bool firstCounts = firstOnEnd == above && first >= low && first <= high;
            bool secondCounts = secondOnEnd == above && second >= low && second <= high;
            if (lowIn)
            {
                high = secondCounts ? second : firstCounts ? first : high;
                return true;
            }

            if (highIn)
            {
                low = firstCounts ? first : secondCounts ? second : low;
                return true;
            }

            if (!(firstCounts && secondCounts))
            {
                return false;
            }

            (low, high) = (first, second);
            return true;
        }

        // Where the line t = line0 + line1 ρ crosses the outline of the region, smaller ρ first, and on which branch. In the mate's
        // section it is a straight line too.
        private bool Crossings(double line0, double line1, out double first, out double second, out bool firstOnEnd, out bool secondOnEnd)
        {
            double along0 = mate._w1 + (mate._sine * line0);
            double along1 = w1Slope + (mate._sine * line1);
            (firstOnEnd, secondOnEnd) = (false, false);
            if (!mate._view.Cross(new Point2(mate._w2, along0), new Point2(w2Slope, along1), out first, out second))
            {
                return false;
            }

            firstOnEnd = IsOnFarSide(mate._w2 + (w2Slope * first), along0 + (along1 * first));
            secondOnEnd = IsOnFarSide(mate._w2 + (w2Slope * second), along0 + (along1 * second));
            return true;
        }

        private bool IsOnFarSide(double across, double along)
        {
            (double near, double far) = mate._view.Chord(across);
            return along >= (near + far) / 2;
        }

        private void Consider(double radius, int candidate, double limit0, double limit1, ref double t, ref int place)
        {
            double end = End(radius);
            double limit = limit0 + (limit1 * radius);
            double value = Math.Min(end, limit);
            if (value > t + Outline.Graze)
            {
                // Where the two cross, which of them is lower is rounding and no corner.
                (t, place) = (value, limit < end - Outline.Graze && candidate != 3 ? candidate + 5 : candidate + (10 * PieceAt(radius)));
            }
        }

        // Axes that run along each other: the lines inside the outline all stop on the limit.
        private bool TopAlong(ref double low, ref double high, ref double t, ref int place)
        {
            OutlineView grazed = mate._outline.Grown(Outline.Graze).Seen(mate._along, mate._across);
            if (!grazed.Cross(new Point2(mate._w2, mate._w1), new Point2(w2Slope, w1Slope), out double first, out double second))
            {
                return false;
            }

            (low, high) = (Math.Max(low, first), Math.Min(high, second));
            if (!(low <= high) || mate.Swallows)
            {
                t = double.PositiveInfinity;
                return low <= high;
            }

            double atLow = -(mate._depth + (depthSlope * low)) / mate._depthSlope;
            double atHigh = -(mate._depth + (depthSlope * high)) / mate._depthSlope;
            (t, place) = atLow >= atHigh ? (atLow, 8) : (atHigh, 9);
            return true;
        }
    }
}
