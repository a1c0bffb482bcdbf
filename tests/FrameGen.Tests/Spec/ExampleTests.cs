using FrameGen.Mechanics.Sections;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

/// <summary>The example of the format's description, whole.</summary>
public class ExampleTests
{
    private const string Example = """
        framegen: 1
        title: Quayside cargo trailer
        revision: C
        notes: Two-wheel trailer for crates; drawn for the demonstration.

        display: {length: mm, mass: kg}          # or {length: in, fraction: 1/16, mass: lb}

        parameters:
          deck:    1200 mm
          width:   640 mm
          payload: 90 kg

        mirror: {across: y, suffix: [-l, -r]}    # everything named ...-l gets a twin named ...-r

        nodes:                                   # x forward, y left, z up
          front-l:  [0 mm, =width/2, 0 mm]
          rear-l:   [=-deck, =width/2, 0 mm]
          axle-l:   {on: rail-l, at: 55 %}       # lies on that tube; the tube stays one piece
          coupling: [850 mm, 0 mm, -60 mm]

        tubes:
          rail-l: {from: front-l, to: rear-l, group: rails}
          bow:    {from: front-l, to: front-r, group: cross}
          tail:   {from: rear-l, to: rear-r, group: cross}
          beam:   {from: axle-l, to: axle-r, group: beams}
          shaft-l: {from: front-l, to: coupling, group: shafts}

        groups:
          rails:  {material: E235+N, choose: {stock: en10305, od: 25 mm .. 40 mm, wall: 1.5 mm ..}}
          cross:  {material: E235+N, choose: {stock: en10305, od: 30 mm .. 50 mm}}   # the rails land on these
          beams:  {material: E235+N, choose: {stock: en10305, od: .. 30 mm}}         # these land on the rails
          shafts: {material: E235+N, section: round 28 x 2 mm}

        supports:
          axle-l:   {hold: [y, z]}               # any of x y z rx ry rz
          coupling: {hold: [x, y, z]}

        masses:
          - {tube: rail-l, mass: =payload/2}     # spread along it; moves with every case's self_weight, counts for frequency
          - {node: coupling, mass: 2.5 kg}

        cases:
          standing: {self_weight: [0, 0, -1]}    # multiples of g
          bump:     {self_weight: [0, 0, -3]}
          braking:  {add: {standing: 1}, self_weight: [0.6, 0, 0]}
          kerb:
            add: {standing: 1}                   # another case's loads, times a factor
            loads:
              - {node: axle-l, force: [-900 N, 0 N, 0 N], mirror: false}

        targets:
          - displacement: {case: standing, node: rear-l, along: z, max: 3 mm}
          - stiffness:    {node: rear-l, along: z, min: 60 N/mm}          # push there alone
          - rotation:     {case: kerb, node: rear-l, about: z, max: 0.5 deg}
          - strength:     {safety_factor: 2.0}
          - buckling:     {min_factor: 3}

        joints:
          front-l:  {order: [bow, rail-l, shaft-l]}
          coupling: {miter: [shaft-l, shaft-r]}

        fabrication: {cut: radial, gap: 0 mm, paper: 0.1 mm, kerf: 2 mm, page: A4}
        """;

    [Fact]
    public void Holds_what_is_written()
    {
        FrameSpec spec = SpecText.Sound(Example);
        Assert.Equal(("Quayside cargo trailer", "C"), (spec.Title, spec.Revision));
        Assert.Equal("deck width payload", string.Join(' ', spec.Parameters.Select(p => p.Name.Value)));
        Assert.Equal((1, "-l", "-r"), (spec.Mirror!.Axis, spec.Mirror.Suffix, spec.Mirror.TwinSuffix));
        Assert.Equal("front-l rear-l axle-l coupling", string.Join(' ', spec.Nodes.Select(n => n.Name.Value)));
        Assert.Equal("rail-l", Assert.IsType<OnTubePositionSpec>(spec.Nodes[2].Position).Tube.Value);
        Assert.Equal("rail-l bow tail beam shaft-l", string.Join(' ', spec.Tubes.Select(t => t.Name.Value)));
        Assert.Equal(("front-l", "coupling", "shafts"), (spec.Tubes[4].From.Node.Value, spec.Tubes[4].To.Node.Value, spec.Tubes[4].Group.Value));
        Assert.Equal("en10305", Assert.Single(spec.Groups[0].Choose!.Lists).Value);
        Assert.Equal((null, "1.5 mm .."), (spec.Groups[0].Choose!.Wall!.Max, spec.Groups[0].Choose!.Wall!.Text));
        Assert.Equal(new RoundTube(28, 2), spec.Groups[3].Section!.Value);
        Assert.Equal([false, true, true, false, false, false], spec.Supports[0].Held);
        Assert.Equal((null, "rail-l"), (spec.Masses[0].Node, spec.Masses[0].Tube!.Value));
        Assert.Equal("standing bump braking kerb", string.Join(' ', spec.Cases.Select(c => c.Name.Value)));
        Assert.Equal("standing", Assert.Single(spec.Cases[3].Add).Case.Value);
        Assert.False(Assert.IsType<NodeLoadSpec>(Assert.Single(spec.Cases[3].Loads)).Mirror);
        Assert.Equal(
            [
                typeof(DisplacementTargetSpec), typeof(StiffnessTargetSpec), typeof(RotationTargetSpec), typeof(StrengthTargetSpec),
                typeof(BucklingTargetSpec),
            ],
            spec.Targets.Select(t => t.GetType()));
        Assert.Equal("shaft-l shaft-r", string.Join(' ', spec.Joints[1].Miter!.Select(t => t.Value)));
        Assert.Equal((CutMode.Radial, PageSize.A4), (spec.Fabrication.Cut, spec.Fabrication.Page));
    }

    [Fact]
    public void Evaluates_to_the_sizes_that_its_parameters_give()
    {
        FrameSpec spec = SpecText.Sound(Example);
        var diagnostics = new FrameGen.Diagnostics.DiagnosticList();
        ParameterTable table = ParameterTable.Evaluate(spec.Parameters, diagnostics);
        SpecVector rear = Assert.IsType<PointPositionSpec>(spec.Nodes[1].Position).Point;
        Assert.Equal(-1200, table.Value(rear.X, diagnostics));
        Assert.Equal(320, table.Value(rear.Y, diagnostics));
        Assert.Equal(45, table.Value(spec.Masses[0].Mass, diagnostics));
        Assert.Equal(0.55, table.Value(Assert.IsType<OnTubePositionSpec>(spec.Nodes[2].Position).Share!, diagnostics));
        Assert.Equal(60, table.Value(Assert.IsType<StiffnessTargetSpec>(spec.Targets[1]).Min, diagnostics));
        Assert.Empty(diagnostics);
    }
}
