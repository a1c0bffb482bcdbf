using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using FrameGen.Spec;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing;

/// <summary>
/// Roark's Formulas for Stress and Strain, 8th ed., table 8.1 (the same in Gere and Goodno, app. G), with numbers: tube 48.3 × 3.2 mm,
/// E = 210 000 MPa, L = 1500 mm, P = 1000 N, w = 1 N/mm. Deflections are of plain bending; σ = M/W.
/// </summary>
public sealed class PublishedBeamsTests
{
    private const double HalfOfTheLastDigit = 0.00005;

    private static readonly RoundTube Section = Round(48.3, 3.2);

    private static FrameBuilder Beam() => new FrameBuilder()
        .Node("a", 0, 0, 0).Node("b", 1500, 0, 0).Fixed("beams", Section).Tube("beam", "a", "b", "beams");

    private static FrameBuilder SimplySupported() => Beam().Hold("a", "x", "y", "z", "rx").Hold("b", "y", "z");

    [Theory]
    [InlineData(SpanKind.Cantilever, 46.239467)]
    [InlineData(SpanKind.SimplySupported, 2.889967)]
    [InlineData(SpanKind.FixedFixed, 0.722492)]
    public void Member_deflection(SpanKind span, double deflection)
    {
        SizedFrame sized = Beam().MemberDeflection("beams", span, 1000, 50).Size();
        Assert.Equal(deflection, sized.Targets[0].Value, 0.0000005);
        Assert.Equal(0, sized.Analyses);
    }

    [Fact]
    public void Member_torsion()
    {
        // GJ/L = 12 476.8541 N·m/rad at L = 1.5 m.
        SizedFrame sized = Beam().MemberStiffness("beams", null, 1).Size();
        Assert.Equal(12476.8541 * 1.5, sized.Targets[0].Value, HalfOfTheLastDigit * 1.5);
    }

    [Fact]
    public void Cantilever_with_an_end_load() => Check(b => b.Clamp("a").Case("c", default, b.Force("b", 0, 0, -1000)), 312.6713);

    [Fact]
    public void Cantilever_with_an_even_load() => Check(b => b.Clamp("a").Case("c", default, b.Line("beam", 0, 0, -1)), 234.5035);

    [Fact]
    public void Clamped_both_ends_with_an_even_load() =>
        Check(b => b.Clamp("a").Clamp("b").Case("c", default, b.Line("beam", 0, -1, 0)), 39.0839);

    [Fact]
    public void Clamped_both_ends_with_a_load_in_the_middle() =>
        Check(b => b.Clamp("a").Clamp("b").Case("c", default, b.Point("beam", 750, 0, -1000, 0)), 39.0839);

    [Fact]
    public void Simply_supported_with_an_even_load() =>
        Check(_ => { var b = SimplySupported(); return b.Case("c", default, b.Line("beam", 0, 0, -1)); }, 58.6259);

    [Fact]
    public void Simply_supported_with_a_load_in_the_middle() =>
        Check(_ => { var b = SimplySupported(); return b.Case("c", default, b.Point("beam", 750, 0, 0, -1000)); }, 78.1678);

    [Fact]
    public void Simply_supported_with_two_loads_at_the_thirds() =>
        Check(
            _ =>
            {
                var b = SimplySupported();
                return b.Case("c", default, b.Point("beam", 500, 0, 0, -1000), b.Point("beam", 1000, 0, 0, -1000));
            },
            104.2238);

    [Fact]
    public void Simply_supported_with_one_load_at_a_third() =>
        Check(_ => { var b = SimplySupported(); return b.Case("c", default, b.Point("beam", 500, 0, 0, -1000)); }, 69.4825);

    private static void Check(Func<FrameBuilder, FrameBuilder> loaded, double stress)
    {
        SizedFrame sized = loaded(Beam()).Size();
        Assert.Equal(stress, sized.Cases[0].Tubes[0].MaxStress, HalfOfTheLastDigit);
    }
}
