using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Tests.Spec;
using Xunit;

namespace FrameGen.Tests.Model;

/// <summary>Bends, hinges and springs from the spec's text to the model.</summary>
public class BendTests
{
    private const string Start = """
        framegen: 1
        mirror: {across: y, suffix: [-l, -r]}
        groups: {main: {material: S235, section: round 30 x 2 mm}}

        """;

    private const string Hoop = Start + """
        nodes:
          foot-l: [0 mm, 400 mm, 0 mm]
          top-l: [0 mm, 400 mm, 800 mm]
          mid-l: {on: hoop, distance: 300 mm}
          end-l: [600 mm, 400 mm, 0 mm]
        tubes:
          hoop: {from: foot-l, to: foot-r, via: [top-l, top-r], bend_radius: 150 mm, group: main}
          stay-l: {from: end-l, to: mid-l, group: main, hinge: {from: [ry], to: [rx, ry, rz]}}

        """;

    [Fact]
    public void A_bent_tube_has_its_true_length_and_nodes_along_it()
    {
        FrameModel model = Sound(Hoop);
        Tube hoop = model.Tubes[0];
        double length = 2400 - 600 + (150 * Math.PI);
        Assert.Equal(length, hoop.Length, 1e-9);
        Node left = model.Nodes.Single(n => string.Equals(n.Name, "mid-l", StringComparison.Ordinal));
        Node right = model.Nodes.Single(n => string.Equals(n.Name, "mid-r", StringComparison.Ordinal));
        Assert.Equal(new Vector3(0, 400, 300), left.Position);
        Assert.InRange((right.Position - new Vector3(0, -400, 300)).Length, 0, 1e-9);
        Assert.Equal(length - 300, right.ThroughDistance, 1e-9);
        Assert.Equal(-Vector3.UnitZ, -hoop.Into(End.To));
    }

    [Fact]
    public void Hinges_are_those_of_the_ends_on_both_sides_of_the_mirror()
    {
        FrameModel model = Sound(Hoop);
        Assert.Equal(Hinges.StartY | Hinges.End, model.Tubes[1].Hinges);
        Assert.Equal(Hinges.StartY | Hinges.End, model.Tubes[2].Hinges);
        Assert.Equal(Hinges.None, model.Tubes[0].Hinges);
    }

    [Fact]
    public void Springs_have_twins_and_stand_beside_what_is_held()
    {
        FrameModel model = Sound(Hoop + "supports: {foot-l: {hold: [x, y], spring: {z: 40 N/mm, rx: 12 N.m/deg}}, end-l: {spring: {z: 2 kN/m}, mirror: false}}\n");
        Assert.Equal(3, model.Supports.Count);
        Assert.Equal([0, 0, 40, 12_000 * 180 / Math.PI, 0, 0], model.Supports[0].Springs.Select(s => Math.Round(s, 9)), (a, b) => Math.Abs(a - b) < 1e-6);
        Assert.Equal(model.Supports[0].Springs, model.Supports[1].Springs);
        Assert.Equal([true, true, false, false, false, false], model.Supports[1].Held);
        Assert.Equal(2, model.Supports[2].Springs[2], 1e-12);
        Assert.True(model.Supports[2].Resists(2) && !model.Supports[2].ResistsTurning && model.Supports[0].ResistsTurning);
    }

    [Fact]
    public void A_twin_of_a_bent_tube_bends_the_other_way()
    {
        FrameModel model = Sound(Start + """
            nodes:
              a-l: [0 mm, 300 mm, 0 mm]
              k-l: [500 mm, 300 mm, 0 mm]
              b-l: [500 mm, 700 mm, 0 mm]
            tubes:
              bow-l: {from: a-l, to: b-l, via: [k-l], bend_radius: 100 mm, group: main}
            """);
        (Tube left, Tube right) = (model.Tubes[0], model.Tubes[1]);
        for (double s = 0; s <= left.Length; s += 50)
        {
            Vector3 image = left.PointAt(s);
            Assert.InRange((right.PointAt(s) - new Vector3(image.X, -image.Y, image.Z)).Length, 0, 1e-9);
        }
    }

    [Theory]
    [InlineData("150 mm", "[top-l, top-r]", "{on: hoop, distance: 700 mm}", "node mid-l lies in a bend of tube hoop: at 700 mm along it, and the bend goes from 650 to 885.6 mm; joints are made on its straights: 0 to 650 mm, 885.6 to 1385.6 mm")]
    [InlineData("450 mm", "[top-l, top-r]", "[0 mm, 0 mm, 90 mm]", "tube hoop: the bends at top-l and top-r overlap: with a radius of 450 mm they need 900 mm, and it is 800 mm from top-l to top-r; a bend_radius of up to 400 mm fits there")]
    [InlineData("900 mm", "[top-l]", "[0 mm, 0 mm, 90 mm]", "tube hoop: the bend at top-l reaches beyond foot-l")]
    [InlineData("90 mm", "[half-l, top-l, top-r]", "[0 mm, 0 mm, 90 mm]", "tube hoop: it does not bend at half-l, which lies in line between foot-l and top-l; leave half-l out of via")]
    [InlineData("90 mm", "[top-l, half-l, top-r]", "[0 mm, 0 mm, 90 mm]", "tube hoop: it turns straight back at top-l")]
    [InlineData("90 mm", "[top-l, top-l]", "[0 mm, 0 mm, 90 mm]", "'top-l' is named twice")]
    [InlineData("90 mm", "[foot-l, top-l]", "[0 mm, 0 mm, 90 mm]", "tube hoop: via names the node it begins or ends at")]
    [InlineData("90 mm", "[topp]", "[0 mm, 0 mm, 90 mm]", "tube hoop: there is no node topp; did you mean 'top-l'?")]
    [InlineData("0 mm", "[top-l]", "[0 mm, 0 mm, 90 mm]", "`0 mm` must be more than 0")]
    public void Says_why_a_bend_can_not_be_made(string radius, string via, string mid, string message)
    {
        string text = Start + $$"""
            nodes:
              foot-l: [0 mm, 400 mm, 0 mm]
              half-l: [0 mm, 400 mm, 300 mm]
              top-l: [0 mm, 400 mm, 800 mm]
              mid-l: {{mid}}
            tubes:
              hoop: {from: foot-l, to: foot-r, via: {{via}}, bend_radius: {{radius}}, group: main}
            """;
        text = text.Replace("  mid-l: [0 mm", "  mid: [0 mm", StringComparison.Ordinal);
        (FrameGen.Spec.FrameSpec? spec, DiagnosticList diagnostics) = SpecText.Read(text);
        if (spec is not null)
        {
            Assert.Null(ModelResolver.Resolve(spec, diagnostics));
        }

        Assert.Contains(diagnostics, d => d.Severity == Severity.Error && d.Message.Contains(message, StringComparison.Ordinal));
    }

    [Fact]
    public void A_corner_carries_nothing()
    {
        var diagnostics = new DiagnosticList();
        Assert.Null(ModelResolver.Resolve(SpecText.Sound(Hoop + "supports: {top-l: {hold: [x]}}\n"), diagnostics));
        Assert.Contains("no tube meets node top-l", diagnostics.First().Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_node_on_a_straight_without_being_joined_is_found()
    {
        var diagnostics = new DiagnosticList();
        string text = Hoop.Replace("mid-l: {on: hoop, distance: 300 mm}", "mid-l: [0 mm, 400 mm, 300 mm]", StringComparison.Ordinal);
        Assert.Null(ModelResolver.Resolve(SpecText.Sound(text), diagnostics));
        Assert.Contains("node mid-l lies on the axis of tube hoop without being joined to it; write mid-l: {on: hoop, distance: 300 mm}", diagnostics.First().Message, StringComparison.Ordinal);
    }

    private static FrameModel Sound(string text)
    {
        var diagnostics = new DiagnosticList();
        FrameModel? model = ModelResolver.Resolve(SpecText.Sound(text), diagnostics);
        Assert.True(model is not null, string.Join("\n", diagnostics));
        return model;
    }
}
