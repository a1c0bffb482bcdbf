using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Tests.Mechanics;

// A section's metal is what lies between its two outlines.
public class OutlineTests
{
    public static TheoryData<Section> Sections =>
    [
        new Rod(16),
        new RoundTube(38, 1.5),
        new FlatSidedTube(60, 40, 3),
        new FlatSidedTube(40, 40, 3.2, 4.8, 3.2),
        new FlatSidedTube(40, 60, 3, 0),
        new FlatSidedTube(60, 40, 3, 20),
        new EllipseTube(45, 28, 1.5),
        new EllipseTube(28, 45, 4),
    ];

    [Theory]
    [MemberData(nameof(Sections))]
    public void Area_and_second_moments_are_the_outlines_difference(Section section)
    {
        Assert.Equal(section.Outline.Area - section.Bore.Area, section.Area, 1e-11 * section.Outline.Area);
        Assert.Equal(section.Outline.SecondMomentX - section.Bore.SecondMomentX, section.Iy, 1e-11 * section.Outline.SecondMomentX);
        Assert.Equal(section.Outline.SecondMomentY - section.Bore.SecondMomentY, section.Iz, 1e-11 * section.Outline.SecondMomentY);
        Assert.Equal(section.Outline.Perimeter, section.Perimeter, 1e-12 * section.Perimeter);
        Assert.Equal((section.Height / 2, section.Width / 2), (section.Outline.HalfHeight, section.Outline.HalfWidth));
    }
}
