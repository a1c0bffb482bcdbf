using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>
/// Saddles and miters against tables computed elsewhere, in 40-digit arithmetic, from
/// s(θ) = (√(R² − (e + r sin θ)²) − r cos θ cos φ) / sin φ. θ grows against the clock here: see <see cref="Tee"/>.
/// </summary>
public class SaddleTableTests
{
    private static readonly double[,] Table =
    {
        // θ in degrees, then s in mm: case A, B, C, D.
        { 0, 20.000000000, 14.664696837, 14.750173469, 32.557585794 },
        { 15, 19.318516526, 14.584616891, 13.335816094, 34.395937317 },
        { 30, 17.320508076, 14.389013156, 11.808517811, 36.754183930 },
        { 45, 14.142135624, 14.214817153, 10.254419651, 39.659789528 },
        { 60, 10.000000000, 14.294338033, 8.941917845, 43.145013503 },
        { 75, 5.176380902, 14.931464502, 8.577943121, 47.198463148 },
        { 90, 0.000000000, 16.395629499, 10.787492758, 51.711642983 },
        { 105, 5.176380902, 18.726967334, 16.795447803, 56.439260732 },
        { 120, 10.000000000, 21.626686451, 24.816917845, 60.996863588 },
        { 135, 14.142135624, 24.584323731, 32.705059954, 64.906118031 },
        { 150, 17.320508076, 27.089013156, 39.304824381, 67.674495285 },
        { 165, 19.318516526, 28.749626301, 44.003961079, 68.883063404 },
        { 180, 20.000000000, 29.329393675, 46.500173469, 68.261285963 },
        { 195, 19.318516526, 28.749626301, 46.739686723, 65.740519165 },
        { 210, 17.320508076, 27.089013156, 44.903304344, 61.486408130 },
        { 225, 14.142135624, 24.584323731, 41.398023511, 55.910306035 },
        { 240, 10.000000000, 21.626686451, 36.831113104, 49.649775339 },
        { 255, 5.176380902, 18.726967334, 31.935271014, 43.489159979 },
        { 270, 0.000000000, 16.395629499, 27.411129127, 38.187057078 },
        { 285, 5.176380902, 14.931464502, 23.717766332, 34.248362395 },
        { 300, 10.000000000, 14.294338033, 20.956113104, 31.797925255 },
        { 315, 14.142135624, 14.214817153, 18.947383208, 30.663977532 },
        { 330, 17.320508076, 14.389013156, 17.406997774, 30.566096775 },
        { 345, 19.318516526, 14.584616891, 16.071541739, 31.253393078 },
    };

    private static readonly (double Branch, double Main, double Degrees, double Offset, double Least, double Greatest)[] Cases =
    [
        (20, 20, 90, 0, 0, 20),
        (12.7, 19.05, 60, 0, 14.1990316571, 29.3293936748),
        (15.875, 22.225, 45, 5, 8.50956142654, 46.9083297316),
        (12.5, 30, 35, -8, 30.4985860326, 68.9111625751),
    ];

    // F(r) / sin φ, mm³: what the saddle leaves of a solid branch below s.
    private static readonly double[] SolidVolumes = [21333.3333333, 10486.4361229, 22325.9508692, 24100.0350574];

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void Wall_lines_stop_where_the_table_says(int index)
    {
        (double branch, double main, double degrees, double offset, _, _) = Cases[index];
        CutTube tube = Tee.Cut(main, new RoundTube(2 * branch, 1), degrees * Math.PI / 180, offset);
        for (int row = 0; row < Table.GetLength(0); row++)
        {
            double theta = Table[row, 0] * Math.PI / 180;
            double t = tube.From.Surface.At(-theta, branch);
            Assert.InRange(t, Table[row, index + 1] - 1e-6, Table[row, index + 1] + 1e-6);
        }
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void The_curve_reaches_the_printed_extremes(int index)
    {
        (double branch, double main, double degrees, double offset, double least, double greatest) = Cases[index];
        CutTube tube = Tee.Cut(main, new RoundTube(2 * branch, 1), degrees * Math.PI / 180, offset);
        Assert.InRange(tube.From.Outer.Min, least - 1e-6, least + 1e-6);
        Assert.InRange(tube.From.Outer.Max, greatest - 1e-6, greatest + 1e-6);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void A_solid_branch_loses_the_printed_volume(int index)
    {
        (double branch, double main, double degrees, double offset, _, _) = Cases[index];
        CutTube tube = Tee.Cut(main, new Rod(2 * branch), degrees * Math.PI / 180, offset, length: 400);
        double lost = (Math.PI * branch * branch * 400) - tube.Volume;
        Assert.InRange(lost, SolidVolumes[index] * (1 - 1e-6), SolidVolumes[index] * (1 + 1e-6));
    }

    // Half of Steinmetz's 16 r³/3 (common to two equal cylinders at 90°) is what the upper half of the main tube takes.
    [Fact]
    public void Two_equal_rods_at_right_angles_share_Steinmetz_volume()
    {
        CutTube tube = Tee.Cut(20, new Rod(40), Math.PI / 2, 0, length: 300);
        double lost = (Math.PI * 20 * 20 * 300) - tube.Volume;
        Assert.InRange(lost, (8 * 8000 / 3.0) * (1 - 1e-6), (8 * 8000 / 3.0) * (1 + 1e-6));
    }

    // Both skins lie on the main cylinder: V = (F(ro) − F(ri)) / sin φ, F by Simpson's rule here in y = q sin v.
    [Theory]
    [InlineData(12.7, 1.6, 19.05, 60, 0)]
    [InlineData(15.875, 2.5, 22.225, 45, 5)]
    [InlineData(12.5, 3, 30, 35, -8)]
    public void A_milled_cope_takes_the_difference_of_two_solid_ones(double branch, double wall, double main, double degrees, double offset)
    {
        CutTube tube = Tee.Cut(main, new RoundTube(2 * branch, wall), degrees * Math.PI / 180, offset, length: 350);
        double area = Math.PI * wall * ((2 * branch) - wall);
        double lost = (Taken(branch, main, offset) - Taken(branch - wall, main, offset)) / Math.Sin(degrees * Math.PI / 180);
        Assert.InRange(tube.Volume, ((area * 350) - lost) * (1 - 1e-7), ((area * 350) - lost) * (1 + 1e-7));
    }

    // ro 12.7, wall 1.6, R 19.05, 90°, at θ = 90°: printed for a cut square to the skin and for both skins on the mate.
    [Fact]
    public void A_radial_cut_is_moved_back_to_the_inner_skin_at_the_side()
    {
        RoundTube branch = new(25.4, 1.6);
        CutTube contour = Tee.Cut(19.05, branch, Math.PI / 2, 0);
        CutTube radial = Tee.Cut(19.05, branch, Math.PI / 2, 0, FrameGen.Spec.CutMode.Radial);
        Assert.InRange(contour.From.Surface.At(Math.PI / 2, 12.7), 14.199032 - 5e-7, 14.199032 + 5e-7);
        Assert.InRange(contour.From.Surface.At(Math.PI / 2, 11.1), 15.482006 - 5e-7, 15.482006 + 5e-7);
        Assert.InRange(radial.From.Surface.At(Math.PI / 2, 12.7), 15.482006 - 5e-7, 15.482006 + 5e-7);
        Assert.InRange(radial.From.Surface.At(Math.PI / 2, 11.1), 15.482006 - 5e-7, 15.482006 + 5e-7);
    }

    // e = 0, r = R: s = r cos θ tan(φ/2) on one side, r |cos θ| cot(φ/2) on the other.
    [Theory]
    [InlineData(30)]
    [InlineData(60)]
    [InlineData(75)]
    public void Equal_tubes_meet_in_two_plane_miters(double degrees)
    {
        double angle = degrees * Math.PI / 180;
        CutTube tube = Tee.Cut(20, new RoundTube(40, 1.5), angle, 0);
        for (int i = 0; i < 72; i++)
        {
            double theta = 2 * Math.PI * i / 72;
            double cos = Math.Cos(theta);
            double expected = cos >= 0 ? 20 * cos * Math.Tan(angle / 2) : -20 * cos / Math.Tan(angle / 2);
            Assert.Equal(expected, tube.From.Surface.At(-theta, 20), 1e-6);
        }

        Assert.Equal(20 / Math.Tan(angle / 2), tube.From.Outer.Max, 1e-9);
        Assert.Equal(0, tube.From.Outer.Min, 1e-6);
    }

    // s_max = (R + r cos φ)/sin φ; s_min = √(R² − r²), or (R − r cos φ)/sin φ where the tip falls at θ = 0.
    [Theory]
    [InlineData(12, 25, 90)]
    [InlineData(12, 25, 80)]
    [InlineData(12, 25, 50)]
    [InlineData(18, 20, 65)]
    [InlineData(18, 20, 35)]
    public void Saddle_depth_follows_the_closed_form(double branch, double main, double degrees)
    {
        double angle = degrees * Math.PI / 180;
        CutTube tube = Tee.Cut(main, new RoundTube(2 * branch, 1), angle, 0);
        double greatest = (main + (branch * Math.Cos(angle))) / Math.Sin(angle);
        double least = Math.Tan(angle) >= Math.Sqrt((main * main / (branch * branch)) - 1)
            ? Math.Sqrt((main * main) - (branch * branch))
            : (main - (branch * Math.Cos(angle))) / Math.Sin(angle);
        Assert.Equal(greatest, tube.From.Outer.Max, 1e-9);
        Assert.Equal(least, tube.From.Outer.Min, 1e-9);
    }

    private static double Taken(double q, double main, double offset)
    {
        const int Steps = 20_000;
        double sum = 0;
        for (int i = 0; i <= Steps; i++)
        {
            double v = Math.PI * (((double)i / Steps) - 0.5);
            double y = q * Math.Sin(v);
            double value = 2 * q * q * Math.Cos(v) * Math.Cos(v) * Math.Sqrt((main * main) - ((y + offset) * (y + offset)));
            sum += value * (i is 0 or Steps ? 1 : i % 2 == 1 ? 4 : 2);
        }

        return sum * Math.PI / Steps / 3;
    }
}
