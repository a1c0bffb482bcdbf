using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Sizing;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>
/// A whole frame, from the spec's text to its results, beside calculix-ccx: a braced stand of four legs, four rails and four braces, with an arm that
/// sticks out from one corner, 13 tubes.
/// </summary>
public class CalculixTests
{
    private const string Stand = """
        framegen: 1
        title: Stand with an arm
        nodes:
          foot-1: [0 mm, 0 mm, 0 mm]
          foot-2: [700 mm, 0 mm, 0 mm]
          foot-3: [760 mm, 520 mm, 0 mm]
          foot-4: [0 mm, 460 mm, 0 mm]
          top-1: [80 mm, 60 mm, 800 mm]
          top-2: [620 mm, 60 mm, 840 mm]
          top-3: [640 mm, 440 mm, 780 mm]
          top-4: [60 mm, 400 mm, 820 mm]
          tip: [1050 mm, 560 mm, 830 mm]
        tubes:
          leg-1: {from: foot-1, to: top-1, group: legs}
          leg-2: {from: foot-2, to: top-2, group: legs}
          leg-3: {from: foot-3, to: top-3, group: legs}
          leg-4: {from: foot-4, to: top-4, group: legs}
          rail-1: {from: top-1, to: top-2, group: rails}
          rail-2: {from: top-2, to: top-3, group: rails}
          rail-3: {from: top-3, to: top-4, group: rails}
          rail-4: {from: top-4, to: top-1, group: rails}
          brace-1: {from: foot-1, to: top-2, group: braces}
          brace-2: {from: foot-2, to: top-3, group: braces}
          brace-3: {from: foot-3, to: top-4, group: braces}
          brace-4: {from: foot-4, to: top-1, group: braces}
          arm: {from: top-3, to: tip, group: legs}
        groups:
          legs: {material: metal, section: round 22 x 2 mm}
          rails: {material: metal, section: round 20 x 2 mm}
          braces: {material: metal, section: round 16 x 1.5 mm}
        supports:
          foot-1: {hold: [x, y, z, rx, ry, rz]}
          foot-2: {hold: [x, y, z, rx, ry, rz]}
          foot-3: {hold: [x, y, z, rx, ry, rz]}
          foot-4: {hold: [x, y, z, rx, ry, rz]}
        cases:
          work:
            loads:
              - {node: top-1, force: [300 N, -200 N, -1500 N]}
              - {node: top-2, force: [0 N, 150 N, -2500 N]}
              - {node: top-3, force: [-100 N, 400 N, -1000 N]}
              - {node: top-4, force: [0 N, 0 N, -2000 N]}
              - {node: tip, force: [0 N, 60 N, -90 N]}

        """;

    // Bricks differ from beams in two ways. Where tubes meet or are clamped, their end faces are rigid and can't get narrower as the tube is stretched, which
    // stiffens the element next to them: with Poisson's ratio 0 there is nothing to hold back. And their sections hardly warp under shear: they have the
    // whole area for it, where Cowper's beam has about half, 0.1 to 0.2 % of the bending of a tube twenty diameters long. Seen: displacements within 0.13 %
    // of the largest, which is the arm's tip, reactions within 0.007 %, the buckling factor within 0.1 %, three frequencies within 0.1 %.
    [Fact]
    public void A_braced_stand_of_a_metal_that_does_not_contract()
    {
        SizedFrame sized = Size("{E: 210 GPa, poisson: 0, density: 7850 kg/m3}");
        Answers bricks = Answers.Of(sized, elements: 12);
        bricks.ExpectNear(sized, 0.002);
        bricks.ExpectReactionsNear(sized, 0.0002);
    }

    // Steel: what the end faces hold back stiffens the frame by a share that goes with an element's length, 1.4 % of the tip's movement with 12 elements a
    // tube and 0.9 % with 24. Carried on to elements of no length, the two agree with beams within 0.42 % there, 0.31 % in the buckling factor and 0.22 % in
    // the frequencies: shear as above, and what is left of the end faces.
    [Fact]
    public void A_braced_stand_of_steel()
    {
        SizedFrame sized = Size("{E: 210 GPa, poisson: 0.3, density: 7850 kg/m3}");
        Answers bricks = Answers.Of(sized, elements: 24).CarriedOnFrom(Answers.Of(sized, elements: 12));
        bricks.ExpectNear(sized, 0.005);
        bricks.ExpectReactionsNear(sized, 0.0005);
    }

    private static SizedFrame Size(string metal)
    {
        DiagnosticList diagnostics = [];
        var pipeline = new FramePipeline(diagnostics);
        byte[] text = Encoding.UTF8.GetBytes($"{Stand}materials: {{metal: {metal}}}\n");
        SizedFrame? sized = pipeline.Size(pipeline.Resolve(
            pipeline.Read("stand.yaml", path => string.Equals(path, "stand.yaml", StringComparison.Ordinal) ? text : null)));
        Assert.True(sized is not null, string.Join('\n', diagnostics));
        return sized;
    }

    /// <summary>What the other program says of the stand.</summary>
    private sealed record Answers(Vector3[] Displacements, Vector3[] Reactions, double Buckling, double[] Hertz)
    {
        public static Answers Of(SizedFrame sized, int elements)
        {
            var deck = new CalculixDeck(sized, elements);
            (Vector3[] displacements, Vector3[] reactions) = deck.Static(0);
            return new Answers(displacements, reactions, deck.Buckling(0), deck.Frequencies(3));
        }

        /// <summary>From elements of twice this one's length to none.</summary>
        public Answers CarriedOnFrom(Answers twice) => new(
            [.. Displacements.Zip(twice.Displacements, (one, two) => (2 * one) - two)],
            [.. Reactions.Zip(twice.Reactions, (one, two) => (2 * one) - two)],
            (2 * Buckling) - twice.Buckling,
            [.. Hertz.Zip(twice.Hertz, (one, two) => (2 * one) - two)]);

        public void ExpectNear(SizedFrame sized, double share)
        {
            CaseResult ours = sized.Cases[0];
            double furthest = Displacements.Max(d => d.Length);
            Assert.All(Displacements, (d, node) => Assert.InRange((d - ours.Displacements[node]!.Value).Length, 0, share * furthest));
            Assert.Equal(Buckling, ours.BucklingFactor!.Value, share * Buckling);
            Assert.All(Hertz, (f, i) => Assert.Equal(f, sized.Frequencies![i], share * f));
        }

        public void ExpectReactionsNear(SizedFrame sized, double share)
        {
            double largest = sized.Cases[0].Reactions.Max(r => r.Force.Length);
            Assert.All(
                sized.Cases[0].Reactions,
                (r, i) => Assert.InRange((r.Force - Reactions[sized.Model.Supports[i].Node]).Length, 0, share * largest));
        }
    }
}
