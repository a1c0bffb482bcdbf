using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;

namespace FrameGen.Tests.Mechanics;

/// <summary>
/// A plain second method: the 12 x 12 matrix of Przemieniecki (Theory of Matrix Structural Analysis, 1968, eq. 5.116) written out,
/// turned and shifted to the nodes, in one dense matrix, solved by Gaussian elimination with pivoting.
/// </summary>
internal static class DenseFrame
{
    /// <summary>Six displacements a node under nodal loads.</summary>
    public static double[] Solve(FrameSketch sketch, IReadOnlyList<BeamProfile> design, IReadOnlyList<NodalLoad> loads)
    {
        int n = 6 * sketch.Nodes.Count;
        double[,] k = new double[n, n + 1];
        foreach (BeamElement element in sketch.Elements)
        {
            double length = (sketch.Nodes[element.End] + element.EndOffset - sketch.Nodes[element.Start] - element.StartOffset).Length;
            double[,] local = Local(design[element.Profile], length);
            double[,] t = ToLocal(element);
            int[] at = [.. Enumerable.Range(0, 12).Select(i => i < 6 ? (6 * element.Start) + i : (6 * element.End) + i - 6)];
            for (int i = 0; i < 12; i++)
            {
                for (int j = 0; j < 12; j++)
                {
                    double sum = 0;
                    for (int a = 0; a < 12; a++)
                    {
                        for (int b = 0; b < 12; b++)
                        {
                            sum += t[a, i] * local[a, b] * t[b, j];
                        }
                    }

                    k[at[i], at[j]] += sum;
                }
            }
        }

        foreach (NodalLoad load in loads)
        {
            double[] six = [load.Force.X, load.Force.Y, load.Force.Z, load.Moment.X, load.Moment.Y, load.Moment.Z];
            for (int i = 0; i < 6; i++)
            {
                k[(6 * load.Node) + i, n] += six[i];
            }
        }

        foreach (Restraint restraint in sketch.Restraints)
        {
            for (int i = 0; i < 6; i++)
            {
                if (restraint.Held[i])
                {
                    int held = (6 * restraint.Node) + i;
                    for (int j = 0; j <= n; j++)
                    {
                        k[held, j] = j == held ? 1 : 0;
                    }
                }
            }
        }

        return Eliminate(k, n);
    }

    private static double[,] Local(BeamProfile p, double l)
    {
        double[,] k = new double[12, 12];
        double phiY = 12 * p.E * p.Iz / (p.G * p.ShearAreaY * l * l);
        double phiZ = 12 * p.E * p.Iy / (p.G * p.ShearAreaZ * l * l);
        Both(0, 6, p.E * p.Area / l);
        Both(3, 9, p.G * p.J / l);

        // Bending in x-y: y forces with rotations about z; in x-z: z forces with rotations about -y.
        Bend(1, 5, 7, 11, p.E * p.Iz, phiY, 1);
        Bend(2, 4, 8, 10, p.E * p.Iy, phiZ, -1);
        return k;

        void Both(int i, int j, double value)
        {
            (k[i, i], k[j, j], k[i, j], k[j, i]) = (value, value, -value, -value);
        }

        void Bend(int v1, int r1, int v2, int r2, double ei, double phi, int sign)
        {
            double shear = 12 * ei / (l * l * l * (1 + phi));
            double mixed = sign * 6 * ei / (l * l * (1 + phi));
            double near = (4 + phi) * ei / (l * (1 + phi));
            double far = (2 - phi) * ei / (l * (1 + phi));
            Both(v1, v2, shear);
            (k[r1, r1], k[r2, r2], k[r1, r2], k[r2, r1]) = (near, near, far, far);
            foreach (int r in (int[])[r1, r2])
            {
                (k[v1, r], k[r, v1], k[v2, r], k[r, v2]) = (mixed, mixed, -mixed, -mixed);
            }
        }
    }

    /// <summary>Node displacements, global, to displacements of the axis' ends, local: u + rotation x offset, then the axes.</summary>
    private static double[,] ToLocal(BeamElement element)
    {
        double[,] t = new double[12, 12];
        Vector3[] axes = [element.Axes.X, element.Axes.Y, element.Axes.Z];
        for (int end = 0; end < 2; end++)
        {
            Vector3 offset = end == 0 ? element.StartOffset : element.EndOffset;
            for (int a = 0; a < 3; a++)
            {
                // axis . (u + r x o) = axis . u + (o x axis) . r
                Vector3 arm = offset.Cross(axes[a]);
                for (int i = 0; i < 3; i++)
                {
                    t[(6 * end) + a, (6 * end) + i] = Component(axes[a], i);
                    t[(6 * end) + a, (6 * end) + 3 + i] = Component(arm, i);
                    t[(6 * end) + 3 + a, (6 * end) + 3 + i] = Component(axes[a], i);
                }
            }
        }

        return t;
    }

    private static double Component(Vector3 v, int i) => i == 0 ? v.X : i == 1 ? v.Y : v.Z;

    private static double[] Eliminate(double[,] k, int n)
    {
        for (int c = 0; c < n; c++)
        {
            int pivot = Enumerable.Range(c, n - c).MaxBy(r => Math.Abs(k[r, c]));
            for (int j = 0; j <= n; j++)
            {
                (k[c, j], k[pivot, j]) = (k[pivot, j], k[c, j]);
            }

            for (int r = c + 1; r < n; r++)
            {
                double factor = k[r, c] / k[c, c];
                for (int j = c; j <= n; j++)
                {
                    k[r, j] -= factor * k[c, j];
                }
            }
        }

        double[] x = new double[n];
        for (int r = n - 1; r >= 0; r--)
        {
            x[r] = k[r, n];
            for (int j = r + 1; j < n; j++)
            {
                x[r] -= k[r, j] * x[j];
            }

            x[r] /= k[r, r];
        }

        return x;
    }
}
