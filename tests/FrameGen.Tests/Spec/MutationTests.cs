using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

/// <summary>Broken text of every sort: the reader and the parameters answer with errors that have a place, never with an exception.</summary>
public class MutationTests
{
    private const string Good = """
        framegen: 1
        title: "Machine \u00e9 stand"
        notes: |
          for the lathe
          in the back
        display: {length: in, fraction: 1/16, mass: lb, force: lbf}
        include: [rack.yaml]
        parameters: {w: 600 mm, h: "=w * 3/2 + 5 mm", s: 30 deg, f: '=max(1, 2) ^ 2'}
        mirror: {across: y, suffix: [-l, -r]}
        nodes: &nodes
          a-l: [0 mm, =w/2, 0 mm]
          b-l: [=-h * cos(s), =w/2, 1-1/2 in]
          c: {on: t-l, at: 40 %}
          d: {between: [a-l, b-l], at: 50 %}
          e: {from: c, offset: [0 mm, 5 ft 3 in, 0.5 m]}
        tubes:
          t-l: &t {from: a-l, to: b-l, group: g, up: [0, 0, 1], ends: {from: {cut: square, extend: -2 mm}, to: {gap: 0.2 mm, wrap: true}}}
          u: {<<: *t, to: {node: e, offset: [0 mm, 0 mm, 9 mm]}}
        groups:
          g: {material: E235+N, choose: {stock: [en10305, rack], shape: round, od: 25 .. 40 mm, wall: 1.5 mm ..}, welded: false}
          k: {material: 1.4301, section: round 38 × 1.5 mm}
        materials: {m: {E: 210 GPa, poisson: 0.3, density: 7.85 g/cm³, yield: 235 N/mm²}}
        have: [{section: rod 16 mm, material: m, lengths: [1850 mm]}]
        supports: {a-l: {hold: [x, y, z]}}
        masses: [{tube: t-l, mass: 12 kg}]
        cases:
          one: {self_weight: [0, 0, -1], loads: [{node: c, force: [-900 N, 0 N, 0 kN], moment: [0 Nm, 1 N·m, 1 lbf.ft]}]}
          two: {add: {one: 1.5}, supports: [a-l], loads: [{tube: u, line: [0 N/m, 0 N/m, -5 N/m]}, {tube: u, at: 40 %, force: [1 N, 1 N, 1 N]}]}
        targets:
          - displacement: {case: one, node: c, along: any, max: 3 mm}
          - rotation: {case: two, from: a-l, to: c, about: -z, max: 0.5 deg}
          - stiffness: {node: c, about: x, min: 12 N.m/deg, supports: [a-l]}
          - strength: {cases: all, safety_factor: =f/2, groups: [g]}
          - member: {tube: u, as: cantilever, load: 400 N, max_deflection: 2 mm, along: top}
        joints: {a-l: {miter: [t-l, u]}}
        fabrication: {cut: contour, gap: 0 mm, springback: 4 %, grip: 60 mm, page: letter}
        """;

    private static readonly byte[] Rack = "framegen: 1\nstock: {rack: {material: m, sizes: [round 25 x 1.5 mm]}}\n"u8.ToArray();

    private static readonly byte[] Interesting = "=:{}[]&*!|>'\"%@`,#?-<\\\n\t\r ~.0123456789eExmNi()^/+\0\xFF"u8.ToArray();

    [Fact]
    public void The_unbroken_text_is_right() => Assert.Empty(Read(Encoding.UTF8.GetBytes(Good)));

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    public void No_broken_text_gets_more_than_errors(int seed)
    {
        byte[] good = Encoding.UTF8.GetBytes(Good);

        // A linear congruential generator (Knuth's MMIX constants), so that every run breaks the text in the same ways.
        ulong state = (ulong)seed;
        int broken = 0;
        for (int round = 0; round < 1500; round++)
        {
            byte[] text = Mutate(good, ref state);
            DiagnosticList diagnostics = Read(text);
            broken += diagnostics.Count > 0 ? 1 : 0;
            Assert.All(diagnostics, error => Assert.False(string.IsNullOrWhiteSpace(error.Message)));
            Assert.All(diagnostics.Where(error => error.At is not null), error => Assert.True(error.At is { Line: > 0, Column: > 0 }, error.ToString()));
        }

        // Or the breaking would break nothing.
        Assert.InRange(broken, 500, 1500);
    }

    private static byte[] Mutate(byte[] good, ref ulong state)
    {
        List<byte> text = [.. good];
        int changes = 1 + Next(ref state, 4);
        for (int change = 0; change < changes; change++)
        {
            int at = Next(ref state, text.Count);
            switch (Next(ref state, 6))
            {
                case 0:
                    text[at] = (byte)Next(ref state, 256);
                    break;
                case 1:
                    text[at] = Interesting[Next(ref state, Interesting.Length)];
                    break;
                case 2:
                    text.RemoveRange(at, Math.Min(1 + Next(ref state, 12), text.Count - at));
                    break;
                case 3:
                    text.Insert(at, Interesting[Next(ref state, Interesting.Length)]);
                    break;
                case 4:
                    int length = Math.Min(1 + Next(ref state, 40), text.Count - at);
                    text.InsertRange(Next(ref state, text.Count), text.GetRange(at, length));
                    break;
                default:
                    text.RemoveRange(at, text.Count - at);
                    break;
            }

            if (text.Count == 0)
            {
                break;
            }
        }

        return [.. text];
    }

    private static DiagnosticList Read(byte[] text)
    {
        var diagnostics = new DiagnosticList();
        FrameSpec? spec = SpecReader.Read("a.yaml", path => path switch { "a.yaml" => text, "rack.yaml" => Rack, _ => null }, diagnostics);
        Assert.Equal(spec is null, diagnostics.HasErrors);
        if (spec is not null)
        {
            ParameterTable table = ParameterTable.Evaluate(spec.Parameters, diagnostics);
            foreach (PointPositionSpec point in spec.Nodes.Select(node => node.Position).OfType<PointPositionSpec>())
            {
                table.Value(point.Point.X, diagnostics);
                table.Value(point.Point.Y, diagnostics);
                table.Value(point.Point.Z, diagnostics);
            }

            foreach (StrengthTargetSpec strength in spec.Targets.OfType<StrengthTargetSpec>())
            {
                table.Value(strength.SafetyFactor, diagnostics);
            }
        }

        return diagnostics;
    }

    private static int Next(ref ulong state, int count)
    {
        state = (state * 6364136223846793005) + 1442695040888963407;
        return (int)((state >> 33) % (ulong)count);
    }
}
