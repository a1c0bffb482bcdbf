using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Benchmarks.Mechanics;

/// <summary>
/// Box lattices: edges, one diagonal a cell face, one body diagonal a cell; clamped at the base, pushed sideways and down at the top.
/// Steel tube 38.1 x 1.65 mm, cells of 500 mm.
/// </summary>
internal static class Lattice
{
    private const double Cell = 500;

    private static readonly (int X, int Y, int Z)[] Directions =
        [(1, 0, 0), (0, 1, 0), (0, 0, 1), (1, 1, 0), (1, 0, 1), (0, 1, 1), (1, 1, 1)];

    public static (BeamFrame Frame, Restraint[] Restraints, BeamLoads Loads) Build(int nx, int ny, int nz)
    {
        var nodes = new List<Vector3>();
        var elements = new List<BeamElement>();
        for (int c = 0; c <= nz; c++)
        {
            for (int b = 0; b <= ny; b++)
            {
                for (int a = 0; a <= nx; a++)
                {
                    nodes.Add(new Vector3(a * Cell, b * Cell, c * Cell));
                }
            }
        }

        foreach ((int da, int db, int dc) in Directions)
        {
            TubeAxes axes = TubeAxes.Along(Cell * new Vector3(da, db, dc));
            for (int c = dc == 0 ? 1 : 0; c + dc <= nz; c++)
            {
                for (int b = 0; b + db <= ny; b++)
                {
                    for (int a = 0; a + da <= nx; a++)
                    {
                        (int i, int j) = (Index(a, b, c), Index(a + da, b + db, c + dc));
                        elements.Add(new BeamElement(i, j, Vector3.Zero, Vector3.Zero, axes, 0));
                    }
                }
            }
        }

        var restraints = new List<Restraint>();
        var loads = new List<NodalLoad>();
        for (int node = 0; node < nodes.Count; node++)
        {
            if (nodes[node].Z == 0)
            {
                restraints.Add(new Restraint(node, [true, true, true, true, true, true]));
            }
            else if (nodes[node].Z == nz * Cell)
            {
                loads.Add(new NodalLoad(node, new Vector3(1000, 0, -2000), Vector3.Zero));
            }
        }

        return (new BeamFrame(nodes, elements), [.. restraints], new BeamLoads(loads, []));

        int Index(int a, int b, int c) => (((c * (ny + 1)) + b) * (nx + 1)) + a;
    }

    public static BeamProfile[] Profiles()
    {
        var tube = new RoundTube(38.1, 1.65);
        return
        [
            new BeamProfile(205_000, 80_000, tube.Area, tube.Iy, tube.Iz, tube.J, double.PositiveInfinity, double.PositiveInfinity),
        ];
    }
}
