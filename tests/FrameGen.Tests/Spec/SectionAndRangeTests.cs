using FrameGen.Mechanics.Sections;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

public class SectionAndRangeTests
{
    [Theory]
    [InlineData("round 38 x 1.5 mm", 38, 1.5)]
    [InlineData("round 38x1.5mm", 38, 1.5)]
    [InlineData("round 38 × 1.5 mm", 38, 1.5)]
    [InlineData("round 38 mm x 1.5 mm", 38, 1.5)]
    [InlineData("round 38 mm x 1.5", 38, 1.5)]
    [InlineData("round 1.5 x 0.065 in", 38.1, 1.651)]
    [InlineData("round 1-1/2 in x 1.5 mm", 38.1, 1.5)]
    [InlineData("round 1 1/2 x 1/8 in", 38.1, 3.175)]
    public void Reads_round_tubes(string written, double diameter, double wall) =>
        Assert.Equal(new RoundTube(diameter, wall), Section(written));

    [Theory]
    [InlineData("rod 16 mm", 16)]
    [InlineData("rod 5/8 in", 15.875)]
    public void Reads_rods(string written, double diameter) => Assert.Equal(new Rod(diameter), Section(written));

    [Theory]
    [InlineData("square 40 x 2 mm", 40, 40, 2, 4, 2)]
    [InlineData("square 2 x 0.125 in", 50.8, 50.8, 3.175, 6.35, 3.175)]
    [InlineData("rect 60 x 40 x 2 mm", 60, 40, 2, 4, 2)]
    [InlineData("rect 40 x 60 x 2 mm", 40, 60, 2, 4, 2)]
    [InlineData("rect 60×40×2 mm corner 5 mm", 60, 40, 2, 5, 3)]
    [InlineData("square 40 x 2 mm corner 0 mm", 40, 40, 2, 0, 0)]
    [InlineData("square 40 x 3.2 mm corner 4.8 mm inner 3.2 mm", 40, 40, 3.2, 4.8, 3.2)]
    [InlineData("rect 3 x 2 x 1/8 in corner 1/4 in", 76.2, 50.8, 3.175, 6.35, 3.175)]
    public void Reads_flat_sided_tubes(string written, double height, double width, double wall, double outer, double inner) =>
        Assert.Equal(new FlatSidedTube(height, width, wall, outer, inner), Section(written));

    [Fact]
    public void Reads_ellipses() => Assert.Equal(new EllipseTube(45, 28, 1.5), Section("ellipse 45 x 28 x 1.5 mm"));

    // What an output prints is what a spec may write.
    [Theory]
    [InlineData("square 40 x 2 mm")]
    [InlineData("rect 60 x 40 x 2 mm")]
    [InlineData("rect 60 x 40 x 2 mm corner 5 mm")]
    [InlineData("square 40 x 3.2 mm corner 4.8 mm inner 3.2 mm")]
    [InlineData("square 40 x 3 mm corner 1 mm inner 2 mm")]
    [InlineData("ellipse 28 x 45 x 1.5 mm")]
    public void A_name_reads_back_as_itself(string name) => Assert.Equal(name, Section(name).Name);

    [Theory]
    [InlineData("round 12 x 6 mm", 11, "a 6 mm wall leaves no bore in 'round 12 x 6 mm'; use less than 6 mm, or a rod")]
    [InlineData("round 1.5 in x 2", 15, "a 50.8 mm wall leaves no bore")]
    [InlineData("round 38 x 1.5", 6, "expected a length such as `38 mm` or `1.5 in`, got the bare number 38")]
    [InlineData("round 38 x 1.5 kg", 6, "got a mass (kg)")]
    [InlineData("round 38 x 1.5 mn", 15, "unknown unit 'mn'; did you mean 'mm'?")]
    [InlineData("round 38 x 1,5 mm", 12, "decimal comma")]
    [InlineData("round 38 mm", 0, "round takes 2 sizes, as in `round 38 x 1.5 mm`, not 1")]
    [InlineData("rod 16 x 2 mm", 0, "rod takes 1 size, as in `rod 16 mm`, not 2")]
    [InlineData("round x 2 mm", 6, "there is no number")]
    [InlineData("round -38 x 2 mm", 6, "sizes go from 0.01 mm to 10000 mm")]
    [InlineData("round 38 x 0 mm", 11, "sizes go from 0.01 mm to 10000 mm")]
    [InlineData("round 38 x 1 m", 6, "sizes go from 0.01 mm to 10000 mm")]
    [InlineData("roud 38 x 1.5 mm", 0, "does not begin with a shape (round, rod, square, rect, ellipse); did you mean 'round'?")]
    [InlineData("38 x 1.5 mm", 0, "does not begin with a shape")]
    [InlineData("round 38 x 1.5 mm corner 2 mm", 18, "a round section has no corners")]
    [InlineData("ellipse 45 x 28 x 1.5 mm corner 2 mm", 25, "an ellipse section has no corners; remove 'corner'")]
    [InlineData("ellipse 45 x 28 x 9 mm", 18, "a 9 mm wall gives the bore of 'ellipse 45 x 28 x 9 mm' a kink where the ellipse bends most; use less than that bend's radius, 8.71111111 mm")]
    [InlineData("ellipse 45 x 1.5 mm", 0, "ellipse takes 3 sizes, as in `ellipse 45 x 28 x 1.5 mm`, not 2")]
    [InlineData("square 10 x 3 mm", 12, "the corners of EN 10219-2 for a 3 mm wall, of 6 mm radius, do not fit into a side of 10 mm; write the tube's own: `square 10 x 3 mm corner 3 mm`")]
    [InlineData("square 40 x 3.2 mm inner 3.2 mm", 19, "'inner' goes after 'corner'")]
    [InlineData("square 40 x 2 mm corner 4 mm inner 19 mm", 35, "the inner radius of this corner goes from 0 mm to 18 mm")]
    [InlineData("square 40 x 2 mm corner 15 mm inner 0 mm", 36, "the inner radius of this corner goes from 10.585786")]
    [InlineData("square 40 x 2 mm corner 4 kg", 24, "got a mass (kg)")]
    [InlineData("square 40 x 2 mm corner", 23, "there is no number")]
    [InlineData("square 40 x 20 mm", 12, "leaves no bore")]
    [InlineData("rect 60 x 2 mm", 0, "rect takes 3 sizes")]
    [InlineData("square 40 x 2 mm corner 25 mm", 24, "half the smaller side, 20 mm")]
    public void Refuses_sections_by_name(string written, int offset, string message)
    {
        string text = Text(written);
        string error = SpecText.OnlyError(text);
        Assert.Contains(message, error, StringComparison.Ordinal);

        // Behind `section: ` and a quote.
        Assert.StartsWith($"specs/stand.yaml:8:{37 + offset}:", error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("25 mm .. 40 mm", 25.0, 40.0)]
    [InlineData("25 mm..40 mm", 25.0, 40.0)]
    [InlineData("25 .. 40 mm", 25.0, 40.0)]
    [InlineData("1 in .. 40 mm", 25.4, 40.0)]
    [InlineData("1.5 mm ..", 1.5, null)]
    [InlineData(".. 30 mm", null, 30.0)]
    [InlineData("..30 mm", null, 30.0)]
    [InlineData(".5 in .. .75 in", 12.7, 19.05)]
    [InlineData("30 mm .. 30 mm", 30.0, 30.0)]
    public void Reads_ranges(string written, double? min, double? max)
    {
        RangeSpec range = SpecText.Sound(RangeText(written)).Groups[0].Choose!.Od!;
        Assert.Equal(written, range.Text);
        Assert.Equal((min, max), (Value(range.Min), Value(range.Max)));

        static double? Value(SpecQuantity? quantity) =>
            quantity is null ? null : ParameterTable.Evaluate([], []).Value(quantity, []);
    }

    [Theory]
    [InlineData("38 mm", -1, "expected a range of lengths such as `25 mm .. 40 mm`, `1.5 mm ..` or `.. 30 mm`, got '38 mm'; for one size alone write `38 mm .. 38 mm`")]
    [InlineData("..", -1, "expected a range")]
    [InlineData("1 mm .. 2 mm .. 3 mm", -1, "expected a range")]
    [InlineData("1 mm ... 2 mm", -1, "expected a range")]
    [InlineData("25 mm .. 40", 9, "got the bare number 40")]
    [InlineData("25 ..", 0, "got the bare number 25")]
    [InlineData("40 mm .. 25 mm", 0, "begins above its end; swap the two")]
    [InlineData("-5 mm .. 25 mm", 0, "must be 0 or more")]
    [InlineData("5 kg .. 25 mm", 0, "got a mass (kg)")]
    [InlineData("5 mm .. 25 mn", 11, "unknown unit 'mn'; did you mean 'mm'?")]
    public void Refuses_what_is_no_range(string written, int offset, string message)
    {
        string error = SpecText.OnlyError(RangeText(written));
        Assert.Contains(message, error, StringComparison.Ordinal);
        Assert.StartsWith($"specs/stand.yaml:8:{57 + offset}:", error, StringComparison.Ordinal);
    }

    private static Section Section(string written) => SpecText.Sound(Text(written)).Groups[0].Section!.Value;

    private static string Text(string section) =>
        SpecText.Small.Replace("section: round 38 x 1.5 mm", $"section: '{section}'", StringComparison.Ordinal);

    private static string RangeText(string range) =>
        SpecText.Small.Replace("section: round 38 x 1.5 mm", $"choose: {{stock: en10305, od: '{range}'}}", StringComparison.Ordinal);
}
