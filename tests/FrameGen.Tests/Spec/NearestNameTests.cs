using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

public class NearestNameTests
{
    private static readonly string[] Known = ["rail-l", "rail-r", "bow", "tail", "beam", "shaft-l"];

    [Theory]
    [InlineData("rial-l", "rail-l")]
    [InlineData("RAIL-L", "rail-l")]
    [InlineData("rail-", "rail-l")]
    [InlineData("tale", "tail")]
    [InlineData("bwo", "bow")]
    [InlineData("shaftl", "shaft-l")]
    [InlineData("beams", "beam")]
    [InlineData("hook", null)]
    [InlineData("x", null)]
    [InlineData("", null)]
    [InlineData("something-else-altogether", null)]
    public void Finds_what_was_meant_and_nothing_far_off(string name, string? nearest) => Assert.Equal(nearest, NearestName.Among(name, Known));
}
