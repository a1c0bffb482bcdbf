using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class TubePlacementTests
{
    [Fact]
    public void Takes_the_general_gap_unless_an_end_has_its_own()
    {
        SpecBuilder spec = SpecBuilder.WithTubes().Node("a", 0, 0, 0).Node("b", 500, 0, 0).Gap("0.3 mm");
        Tube tube = spec.Tube("beam", "a", "b", fromCut: spec.Cut(RequestedCut.Default, gap: "0.1 mm")).Model().Tubes[0];

        Assert.Equal(0.1, tube.From.Gap);
        Assert.Equal(0.3, tube.To.Gap);
    }

    [Fact]
    public void Turns_the_top_line_to_where_up_points()
    {
        Tube tube = SpecBuilder.WithTubes().Node("a", 0, 0, 0).Node("b", 500, 0, 0).Tube("beam", "a", "b", up: (3, 2, 0)).Model().Tubes[0];

        Assert.Equal(Vector3.UnitY, tube.Axes.Z);
    }

    [Fact]
    public void Refuses_a_tube_that_begins_and_ends_at_one_node()
    {
        string error = SpecBuilder.WithTubes(("ring", "a", "a")).Node("a", 0, 0, 0).Error();

        Assert.Contains("tube ring begins and ends at node a", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_a_tube_whose_offsets_leave_it_no_length()
    {
        string error = SpecBuilder.WithTubes().Node("a", 0, 0, 0).Node("b", 500, 0, 0).Tube("stub", "a", "b", toOffset: (-500, 0, 0)).Error();

        Assert.Contains("tube stub has no length", error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(1, 0, 0, "up points along the tube")]
    [InlineData(-2, 0, 0, "up points along the tube")]
    [InlineData(0, 0, 0, "up has no direction")]
    public void Refuses_an_up_that_tells_no_side(double x, double y, double z, string expected)
    {
        string error = SpecBuilder.WithTubes().Node("a", 0, 0, 0).Node("b", 500, 0, 0).Tube("beam", "a", "b", up: (x, y, z)).Error();

        Assert.Contains(expected, error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_extend_on_an_end_that_is_to_be_coped()
    {
        SpecBuilder spec = SpecBuilder.WithTubes().Node("a", 0, 0, 0).Node("b", 500, 0, 0);
        string error = spec.Tube("beam", "a", "b", toCut: spec.Cut(RequestedCut.Cope, extend: "5 mm")).Error();

        Assert.Contains("tube beam, to end: extend moves a square end", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Refuses_two_tubes_on_one_axis()
    {
        string error = SpecBuilder.WithTubes(("one", "a", "b"), ("other", "b", "a")).Node("a", 0, 0, 0).Node("b", 500, 0, 0).Error();

        Assert.Contains("tubes one and other have the same axis", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Lets_two_tubes_lie_side_by_side_between_the_same_nodes()
    {
        FrameModel model = SpecBuilder.WithTubes(("one", "a", "b"))
            .Node("a", 0, 0, 0).Node("b", 500, 0, 0)
            .Tube("other", "a", "b", fromOffset: (0, 40, 0), toOffset: (0, 40, 0))
            .Model();

        Assert.Equal(2, model.Tubes.Count);
    }

    [Fact]
    public void Reports_every_error_at_once()
    {
        string[] errors = SpecBuilder.WithTubes(("one", "a", "q"), ("two", "b", "b"))
            .Node("a", 0, 0, 0).Node("b", 500, 0, 0)
            .Tube("three", "a", "b", group: "mian")
            .Hold("z")
            .AllErrors();

        Assert.Equal(4, errors.Length);
        Assert.Contains(errors, e => e.Contains("tube three: there is no group mian; did you mean 'main'?", StringComparison.Ordinal));
    }

    [Fact]
    public void Gives_the_spec_its_hash_and_its_file_name_as_title()
    {
        SpecIdentity identity = SpecBuilder.WithTubes(("beam", "a", "b")).Node("a", 0, 0, 0).Node("b", 500, 0, 0).Model().Spec;

        // FIPS 180-2, appendix B.1: SHA-256 of "abc".
        Assert.Equal("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad", identity.Sha256);
        Assert.Equal("bench", identity.Title);
        Assert.Equal("bench.yaml", identity.FileName);
    }

    [Fact]
    public void Leaves_out_a_group_without_tubes_and_says_so()
    {
        SpecBuilder spec = SpecBuilder.New()
            .Fixed("spare", "S235", new RoundTube(20, 2))
            .Fixed("main", "S235", new RoundTube(30, 2))
            .Node("a", 0, 0, 0).Node("b", 500, 0, 0)
            .Tube("beam", "a", "b");

        FrameModel model = spec.Model();

        Assert.Equal("main", Assert.Single(model.Groups).Name);
        Assert.Equal(0, model.Tubes[0].Group);
        Assert.Equal("group spare has no tubes and is left out", Assert.Single(spec.Said(Severity.Warning)));
    }
}
