using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>A frame of thirty tubes such as a shop sizes: two ladders of five bays, posts between them; five load sets.</summary>
internal static class SmallFrame
{
    public static (BeamFrame Frame, Restraint[] Restraints, BeamLoads[] Loads) Build()
    {
        var nodes = new List<Vector3>();
        for (int level = 0; level < 2; level++)
        {
            for (int side = 0; side < 2; side++)
            {
                for (int k = 0; k < 5; k++)
                {
                    nodes.Add(new Vector3(400 * k, 600 * side, 450 * level));
                }
            }
        }

        var elements = new List<BeamElement>();
        for (int k = 0; k < 5; k++)
        {
            for (int line = 0; line < 4 && k < 4; line++)
            {
                Join((5 * line) + k, (5 * line) + k + 1, 0);
            }

            Join(k, 5 + k, 1);
            if (k % 2 == 0)
            {
                Join(10 + k, 15 + k, 1);
                Join(k, 10 + k, 2);
                Join(5 + k, 15 + k, 2);
            }
        }

        Restraint[] restraints =
        [
            new(0, [true, true, true, false, false, false]), new(4, [false, true, true, false, false, false]),
            new(5, [false, false, true, false, false, false]), new(9, [false, false, true, false, false, false]),
        ];
        var loads = new BeamLoads[5];
        for (int k = 0; k < loads.Length; k++)
        {
            var g = new Vector3(0.3 * k, 0.2 * (k % 2), -1);
            loads[k] = new BeamLoads(
                [new NodalLoad(10 + k, 500 * g, Vector3.Zero), new NodalLoad(19 - k, 300 * g, Vector3.Zero)],
                [.. Enumerable.Range(0, elements.Count).Select(e => new ElementLoad(e, 0.02 * g))]);
        }

        return (new BeamFrame(nodes, elements), restraints, loads);

        void Join(int i, int j, int profile) => elements.Add(
            new BeamElement(i, j, Vector3.Zero, Vector3.Zero, TubeAxes.Along(nodes[j] - nodes[i]), profile));
    }

    public static BeamProfile[] Profiles(double diameter)
    {
        return [Of(diameter, 2), Of(0.8 * diameter, 1.5), Of(0.7 * diameter, 1.5)];

        static BeamProfile Of(double d, double wall)
        {
            var tube = new RoundTube(d, wall);
            (double y, double z) = tube.ShearAreas(0.3);
            return new BeamProfile(210_000, 80_769, tube.Area, tube.Iy, tube.Iz, tube.J, y, z);
        }
    }
}
