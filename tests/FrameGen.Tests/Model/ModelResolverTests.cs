using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Model;

/// <summary>From text to model.</summary>
public sealed class ModelResolverTests
{
    private const string HandCart = """
        framegen: 1
        title: Pump cart
        parameters:
          deck:  900 mm
          width: 500 mm
        mirror: {across: y, suffix: [-l, -r]}
        nodes:
          front-l: [0 mm, =width/2, 0 mm]
          rear-l:  [=-deck, =width/2, 0 mm]
          axle-l:  {on: rail-l, at: 60 %}
          handle:  [600 mm, 0 mm, 300 mm]
        tubes:
          rail-l:  {from: front-l, to: rear-l, group: rails}
          bow:     {from: front-l, to: front-r, group: cross}
          tail:    {from: rear-l, to: rear-r, group: cross}
          beam:    {from: axle-l, to: axle-r, group: cross}
          shaft-l: {from: front-l, to: handle, group: rails}
        groups:
          rails: {material: E235+N, choose: {stock: en10305, od: 20 mm .. 30 mm, wall: 1.5 mm ..}}
          cross: {material: E235+N, section: round 30 x 2 mm}
        supports:
          axle-l: {hold: [y, z]}
          handle: {hold: [x, y, z]}
        masses:
          - {tube: rail-l, mass: 30 kg}
        cases:
          standing: {self_weight: [0, 0, -1]}
          jolt: {add: {standing: 2.5}, loads: [{node: front-l, force: [0 N, 50 N, -0.2 kN]}]}
        targets:
          - displacement: {case: standing, node: rear-l, along: -z, max: 2 mm}
          - strength: {safety_factor: 2}
        joints:
          front-l: {order: [bow, rail-l]}
        """;

    [Fact]
    public void Resolves_a_whole_spec()
    {
        (FrameModel? model, DiagnosticList diagnostics) = Resolve(HandCart);

        Assert.Empty(diagnostics);
        Assert.NotNull(model);
        Assert.Equal("front-l front-r rear-l rear-r axle-l axle-r handle", string.Join(' ', model.Nodes.Select(n => n.Name)));
        Assert.Equal("rail-l rail-r bow tail beam shaft-l shaft-r", string.Join(' ', model.Tubes.Select(t => t.Name)));
        Assert.Equal(new Vector3(-540, -250, 0), model.Nodes[5].Position);
        Assert.Equal("Pump cart", model.Spec.Title);
        Assert.Equal(new Vector3(0, 0, -2.5), model.Cases[1].SelfWeight);
        Assert.Equal(
            [new NodeLoad(0, new Vector3(0, 50, -200), Vector3.Zero), new NodeLoad(1, new Vector3(0, -50, -200), Vector3.Zero)],
            model.Cases[1].NodeLoads);
        Assert.Equal(new Vector3(0, 0, -1), ((DisplacementTarget)model.Targets[0]).Along);
        Assert.Equal([2, 0], model.JointAt[0]!.Order);
        Assert.Equal([2, 1], model.JointAt[1]!.Order);
    }

    [Fact]
    public void Tells_errors_in_the_order_of_the_text_with_their_places()
    {
        (FrameModel? model, DiagnosticList diagnostics) = Resolve(HandCart
            .Replace("to: handle, group: rails", "to: handel, group: rials", StringComparison.Ordinal)
            .Replace("standing: 2.5", "standng: 2.5", StringComparison.Ordinal)
            .Replace("cross: {material: E235+N", "cross: {material: E235-N", StringComparison.Ordinal));

        Assert.Null(model);
        Assert.Equal(
            """
            cart.yaml:17:32: error: tube shaft-l: there is no node handel; did you mean 'handle'?
            cart.yaml:17:47: error: tube shaft-l: there is no group rials; did you mean 'rails'?
            cart.yaml:20:21: error: group cross: there is no material E235-N; did you mean 'E235+N'?
            cart.yaml:28:16: error: case jolt: add: there is no case standng; did you mean 'standing'?
            """,
            string.Join('\n', diagnostics.Where(d => d.Severity == Severity.Error)));
    }

    [Fact]
    public void Gives_the_same_model_twice()
    {
        FrameModel first = Resolve(HandCart).Model!;
        FrameModel second = Resolve(HandCart).Model!;

        Assert.Equal(first.Nodes, second.Nodes);
        Assert.Equal(first.Groups.SelectMany(g => g.Candidates), second.Groups.SelectMany(g => g.Candidates));
    }

    private static (FrameModel? Model, DiagnosticList Diagnostics) Resolve(string text)
    {
        var diagnostics = new DiagnosticList();
        FrameSpec? spec = SpecReader.Read("cart.yaml", path => path == "cart.yaml" ? Encoding.UTF8.GetBytes(text) : null, diagnostics);
        Assert.True(spec is not null, string.Join('\n', diagnostics));
        return (ModelResolver.Resolve(spec, diagnostics), diagnostics);
    }
}
