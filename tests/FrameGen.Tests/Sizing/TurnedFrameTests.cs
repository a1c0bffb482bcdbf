using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>
/// A whole frame turned in space, its top lines, loads and self weight with it, has the same answers turned: round, flat-sided and elliptic tubes, a bend, hinges,
/// springs, an offset, loads on nodes, along tubes and at places, masses.
/// </summary>
public sealed class TurnedFrameTests
{
    [Theory]
    [InlineData(2, -1, 2, 1.1)]
    [InlineData(-1, 3, 0.5, 2.7)]
    [InlineData(0, 0, 1, 0.4)]
    [InlineData(1, 1, 1, 2.0943951023931953)]
    public void Turning_the_whole_frame_turns_every_answer(double x, double y, double z, double angle)
    {
        // O. Rodrigues' formula.
        Vector3 axis = new Vector3(x, y, z).Normalized();
        (double sin, double cos) = Math.SinCos(angle);
        Vector3 Turn(Vector3 v) => (cos * v) + (sin * axis.Cross(v)) + ((1 - cos) * axis.Dot(v) * axis);

        SizedFrame still = Stand(v => v, Vector3.Zero).Size();
        SizedFrame turned = Stand(Turn, new Vector3(1200, -700, 90)).Size();
        Assert.Equal(still.MassKg, turned.MassKg, 1e-10);
        for (int c = 0; c < still.Cases.Count; c++)
        {
            (CaseResult a, CaseResult b) = (still.Cases[c], turned.Cases[c]);
            double furthest = a.LargestDisplacement().Displacement.Length;
            for (int n = 0; n < a.Displacements.Count; n++)
            {
                Near(Turn(a.Displacements[n]!.Value), b.Displacements[n]!.Value, 1e-8 * furthest);
                Near(Turn(a.Rotations[n]!.Value), b.Rotations[n]!.Value, 1e-8 * a.Rotations.Max(r => r!.Value.Length));
            }

            for (int s = 0; s < a.Reactions.Count; s++)
            {
                Near(Turn(a.Reactions[s].Force), b.Reactions[s].Force, 1e-8 * a.Reactions.Max(r => r.Force.Length));
                Near(Turn(a.Reactions[s].Moment), b.Reactions[s].Moment, 1e-8 * a.Reactions.Max(r => r.Moment.Length));
            }

            double stress = a.Tubes.Max(t => t.MaxStress);
            for (int t = 0; t < a.Tubes.Count; t++)
            {
                Assert.Equal(a.Tubes[t].MaxStress, b.Tubes[t].MaxStress, 1e-7 * stress);
                Assert.Equal(a.Tubes[t].Use!.Value.Share, b.Tubes[t].Use!.Value.Share, 1e-7 * stress / 235);
                SectionForces there = a.Tubes[t].Diagram.At(0.37 * still.Model.Tubes[t].Length);
                SectionForces here = b.Tubes[t].Diagram.At(0.37 * still.Model.Tubes[t].Length);
                double force = a.Reactions.Max(r => r.Force.Length);
                Near(new Vector3(there.N, there.Vy, there.Vz), new Vector3(here.N, here.Vy, here.Vz), 1e-7 * force);
                Near(new Vector3(there.T, there.My, there.Mz), new Vector3(here.T, here.My, here.Mz), 1e-4 * force);
            }

            Assert.Equal(a.BucklingFactor!.Value, b.BucklingFactor!.Value, 1e-7 * a.BucklingFactor!.Value);
            Assert.Equal(a.BucklesAt, b.BucklesAt);
        }

        Assert.All(still.Frequencies!.Zip(turned.Frequencies!), pair => Assert.Equal(pair.First, pair.Second, 1e-7 * pair.First));
        Assert.All(still.Targets.Zip(turned.Targets), pair => Assert.Equal(pair.First.Value, pair.Second.Value, 1e-7 * pair.First.Value));
    }

    private static void Near(Vector3 expected, Vector3 actual, double tolerance) => Assert.InRange((expected - actual).Length, 0, tolerance);

    private static FrameBuilder Stand(Func<Vector3, Vector3> turn, Vector3 shift)
    {
        FrameBuilder frame = new FrameBuilder()
            .Fixed("round", new RoundTube(33.7, 2.6)).Fixed("flat", new FlatSidedTube(40, 20, 2)).Fixed("oval", new EllipseTube(45, 28, 1.5));
        Vector3[] places =
        [
            new(0, 0, 0), new(900, 100, 0), new(850, 700, 50), new(-50, 650, 0), new(100, 100, 700), new(800, 150, 750), new(750, 600, 720), new(300, 900, 700),
        ];
        for (int i = 0; i < places.Length; i++)
        {
            Vector3 place = turn(places[i]) + shift;
            frame.Node($"n{i}", place.X, place.Y, place.Z);
        }

        (int From, int To, string Group, Vector3 Up, Vector3? Offset)[] tubes =
        [
            (0, 4, "flat", new(1, 0.2, 0), null), (1, 5, "flat", new(0, 1, 0.1), null), (2, 6, "round", new(1, 0, 0), null),
            (4, 5, "oval", new(0, 0.3, 1), null), (5, 6, "flat", new(0.2, 0, 1), new Vector3(0, 0, 30)), (6, 4, "round", new(0, 0, 1), null),
            (0, 5, "round", new(0, 1, 0), null), (7, 6, "flat", new(0, 0, 1), null), (3, 7, "oval", new(1, 0, 0), null),
        ];
        foreach ((int from, int to, string group, Vector3 up, Vector3? offset) in tubes)
        {
            Vector3? beside = offset is { } o ? turn(o) : null;
            string name = $"t{from}{to}";
            frame.Tube(name, $"n{from}", $"n{to}", group, beside, beside);
            if ((from, to) == (3, 7))
            {
                frame.Bend(name, 150, turn(new Vector3(-50, 650, 650)) + shift);
            }

            frame.Up(name, turn(up));
        }

        frame.Hinge("t64", Hinges.StartY).Hinge("t05", Hinges.EndY | Hinges.EndZ)
            .Clamp("n0").Clamp("n1").Hold("n2", "x", "y", "z").Hold("n3", "x", "y", "z", "rx", "ry", "rz").Spring("n4", 40, 40, 40, 5e5, 5e5, 5e5)
            .MassOnNode("n5", 8).MassAlong("t37", 3);
        return frame
            .Case("rest", turn(new Vector3(0, 0, -1)), Load(frame.Force, "n4", new(300, -200, -2500)), Load(frame.Moment, "n7", new(9e4, 0, -5e4)), Load(frame.Line, "t64", new(0, 0.2, -0.6)))
            .Case("shove", turn(new Vector3(0.4, 0, -1)), Load((t, a, b, c) => frame.Point(t, 260, a, b, c), "t45", new(100, 0, -900)), Load(frame.Line, "t37", new(-0.3, 0, -1.2)), Load((t, a, b, c) => frame.Point(t, 610, a, b, c), "t37", new(0, -200, -400)))
            .Displacement("rest", "n4", null, 50).Stiffness("n6", turn(new Vector3(0, 1, 0)), 1).Strength(1).Buckling(0.01).Frequency(0.1);

        T Load<T>(Func<string, double, double, double, T> load, string where, Vector3 v)
        {
            Vector3 turned = turn(v);
            return load(where, turned.X, turned.Y, turned.Z);
        }
    }
}
