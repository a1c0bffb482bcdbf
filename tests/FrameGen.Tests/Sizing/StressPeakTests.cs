using CsCheck;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing.Analysis;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>The stations that are looked at against a plain walk along the element.</summary>
public sealed class StressPeakTests
{
    private static readonly Gen<double> Value = Gen.Double[-1, 1];

    [Fact]
    public void Cubic_roots_are_roots_and_none_is_missed()
    {
        Gen.Select(Value, Value, Value).Sample((a, b, c) =>
        {
            // (x − a)(x − b)(x − c)
            Span<double> roots = stackalloc double[3];
            int count = Cubic.Roots(2, -2 * (a + b + c), 2 * ((a * b) + (b * c) + (c * a)), -2 * a * b * c, roots);
            double[] all = [a, b, c];
            for (int k = 0; k < 3; k++)
            {
                double nearest = double.PositiveInfinity;
                for (int i = 0; i < count; i++)
                {
                    nearest = Math.Min(nearest, Math.Abs(roots[i] - all[k]));
                }

                // Of two roots that nearly coincide, rounding may lose both: the sign hardly changes between them.
                double apart = Math.Min(Math.Abs(all[k] - all[(k + 1) % 3]), Math.Abs(all[k] - all[(k + 2) % 3]));
                Assert.True(nearest < 1e-6 || apart < 1e-3, $"{all[k]} of {a}, {b}, {c}");
            }
        });
    }

    [Theory]
    [InlineData(0, 1, -3, 2, 1, 2)] // (x − 1)(x − 2)
    [InlineData(0, 0, 2, -3, 1.5, 1.5)]
    public void Lower_degrees(double a, double b, double c, double d, double first, double last)
    {
        Span<double> roots = stackalloc double[3];
        int count = Cubic.Roots(a, b, c, d, roots);
        double[] sorted = [.. roots[..count].ToArray().Order()];
        Assert.Equal(first, sorted[0], 12);
        Assert.Equal(last, sorted[^1], 12);
    }

    [Fact]
    public void A_cubic_with_one_real_root()
    {
        // (x − 3)(x² + 1) and x³ − 8
        Span<double> roots = stackalloc double[3];
        Assert.Equal(1, Cubic.Roots(1, -3, 1, -3, roots));
        Assert.Equal(3, roots[0], 12);
        Assert.Equal(1, Cubic.Roots(1, 0, 0, -8, roots));
        Assert.Equal(2, roots[0], 12);
    }

    [Fact]
    public void No_place_along_a_bent_element_is_stressed_more()
    {
        // Slender tubes, where bending governs between the stations: no more than a part in a thousand may lie between them.
        Gen.Select(Value, Value, Value, Value, Value, Value).Sample((my, mz, vy, vz, py, pz) =>
        {
            const double Length = 1000;
            var section = new RoundTube(30, 2);
            var forces = new ElementForces(
                new SectionForces(500, 400 * vy, 400 * vz, 1000, 100_000 * my, 100_000 * mz), Length, 0, 0.8 * py, 0.8 * pz);
            StressPeak peak = StressPeak.Find(in forces, section, 0, Length);
            double walked = 0;
            for (int i = 0; i <= 2000; i++)
            {
                SectionForces there = forces.At(Length * i / 2000);
                walked = Math.Max(walked, section.VonMises(in there));
            }

            SectionForces at = forces.At(peak.At);
            Assert.Equal(section.VonMises(in at), peak.Stress, 9);
            Assert.InRange(walked, 0, peak.Stress * 1.001);
        });
    }
}
