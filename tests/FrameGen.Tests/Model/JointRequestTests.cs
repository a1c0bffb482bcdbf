using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class JointRequestTests
{
    [Theory]
    [InlineData("a far", "tube far does not meet this node; name only tubes that end here: a, b, c")]
    [InlineData("a b a", "names tube a twice")]
    [InlineData("a nix", "there is no tube nix")]
    public void Refuses_an_order_that_can_not_be_kept(string order, string expected)
    {
        string error = Corner().Joint("hub", order: order.Split(' ')).Error();

        Assert.Contains(expected, error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_through_tube_named_after_others()
    {
        string error = Tee().Joint("knee", order: ["post", "beam"]).Error();

        Assert.Contains("tube beam runs through and always stands first", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_miter_where_a_tube_runs_through()
    {
        string error = Tee().Joint("knee", miter: ["post", "arm"]).Error();

        Assert.Contains("post and arm can't be mitred where tube beam runs through", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_mitred_tube_in_the_order_too()
    {
        string error = Corner().Joint("hub", miter: ["a", "b"], order: ["b", "c"]).Error();

        Assert.Contains("names tube b twice", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_to_mitre_axes_that_end_apart()
    {
        string error = Corner().Tube("d", "hub", "far", fromOffset: (0, 4, 3)).Joint("hub", miter: ["a", "d"]).Error();

        Assert.Contains("a and d can't be mitred, since their axes end 5 mm apart", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_extend_on_a_mitred_end()
    {
        SpecBuilder spec = Corner();
        string error = spec.Tube("d", "hub", "far", fromCut: spec.Cut(RequestedCut.Default, extend: "3 mm")).Joint("hub", miter: ["a", "d"]).Error();

        Assert.Contains("tube d is mitred here, and extend moves square ends only", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_another_cut_on_a_mitred_end()
    {
        SpecBuilder spec = Corner();
        string error = spec.Tube("d", "hub", "far", fromCut: spec.Cut(RequestedCut.Square)).Joint("hub", miter: ["a", "d"]).Error();

        Assert.Contains("its end asks for cut: square", error, StringComparison.Ordinal);
    }

    // Three tubes that meet at a hub, and one that does not.
    private static SpecBuilder Corner() => SpecBuilder
        .WithTubes(("a", "hub", "p"), ("b", "hub", "q"), ("c", "r", "hub"), ("far", "p", "q"))
        .Node("hub", 0, 0, 0).Node("p", 500, 0, 0).Node("q", 0, 500, 0).Node("r", 0, 0, 500).Node("far", -400, -300, 0);

    private static SpecBuilder Tee() => SpecBuilder
        .WithTubes(("beam", "a", "b"), ("post", "knee", "foot"), ("arm", "knee", "hand"))
        .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Node("foot", 500, 0, -500).Node("hand", 500, 400, 0)
        .On("knee", "beam", share: "50 %");
}
