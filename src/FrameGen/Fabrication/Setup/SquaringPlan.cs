using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Fabrication.Setup;

/// <summary>Chooses which distances between nodes to measure.</summary>
/// <remarks>
/// Both diagonals of flat four-sided bays, large bays first, until every corner of every plane's bays has been in one: the whole first,
/// then what it does not hold. Then mirrored twins, and for nodes that are in none of these the two farthest nodes that share no
/// tube with them. Sides of a triangle and lengths of tubes need no measure: the tubes hold them.
/// </remarks>
internal static class SquaringPlan
{
    private const double Flat = 0.5;
    private const double SmallestCorner = 20 * Math.PI / 180;
    private const int MostBays = 20_000;
    private const int MostNodesAcross = 2_000;

    /// <summary>The measures: diagonals in pairs, then twins, then the rest.</summary>
    public static IReadOnlyList<SquaringMeasure> Of(FrameModel model)
    {
        int[][] nodesOf = [.. model.Tubes.Select(t => (int[])[t.From.Node, .. t.NodesOn, t.To.Node])];
        List<int>[] tubesAt = [.. model.Nodes.Select(_ => new List<int>())];
        for (int tube = 0; tube < nodesOf.Length; tube++)
        {
            foreach (int node in nodesOf[tube])
            {
                tubesAt[node].Add(tube);
            }
        }

        var measures = new List<SquaringMeasure>();
        foreach (Bay bay in Chosen(new BaySearch(model, nodesOf, tubesAt).Find()))
        {
            measures.Add(Measure(model, SquaringKind.Diagonal, bay.Corners[0], bay.Corners[2], bay.Corners));
            measures.Add(Measure(model, SquaringKind.Diagonal, bay.Corners[1], bay.Corners[3], bay.Corners));
        }

        AddTwins(model, nodesOf, measures);
        AddAcross(model, tubesAt, measures);
        return measures;
    }

    private static SquaringMeasure Measure(FrameModel model, SquaringKind kind, int a, int b, IReadOnlyList<int> bay) =>
        new(kind, a, b, (model.Nodes[b].Position - model.Nodes[a].Position).Length, bay);

    // A corner counts for each direction of planes on its own: a box is squared in all three.
    private static IEnumerable<Bay> Chosen(List<Bay> bays)
    {
        var held = new HashSet<(int Node, Vector3 Plane)>();
        foreach (Bay bay in bays.OrderByDescending(b => Math.Round(b.Area, 3)))
        {
            if (bay.Corners.Any(c => !held.Contains((c, bay.Plane))))
            {
                held.UnionWith(bay.Corners.Select(c => (c, bay.Plane)));
                yield return bay;
            }
        }
    }

    private static void AddTwins(FrameModel model, int[][] nodesOf, List<SquaringMeasure> measures)
    {
        HashSet<(int, int)> known = [.. measures.Select(m => (Math.Min(m.A, m.B), Math.Max(m.A, m.B)))];
        for (int twin = 0; twin < nodesOf.Length; twin++)
        {
            if (model.Tubes[twin].Original is not { } original || nodesOf[original].Length != nodesOf[twin].Length)
            {
                continue;
            }

            foreach ((int a, int b) in nodesOf[original].Zip(nodesOf[twin]))
            {
                if (a != b && known.Add((Math.Min(a, b), Math.Max(a, b))))
                {
                    measures.Add(Measure(model, SquaringKind.Twins, a, b, []));
                }
            }
        }
    }

    private static void AddAcross(FrameModel model, List<int>[] tubesAt, List<SquaringMeasure> measures)
    {
        if (model.Nodes.Count > MostNodesAcross)
        {
            return;
        }

        const int Each = 2;
        HashSet<int> held = [.. measures.SelectMany(m => (int[])[m.A, m.B])];
        HashSet<(int, int)> known = [.. measures.Select(m => (Math.Min(m.A, m.B), Math.Max(m.A, m.B)))];
        for (int node = 0; node < tubesAt.Length; node++)
        {
            if (held.Contains(node) || tubesAt[node].Count == 0)
            {
                continue;
            }

            int from = node;
            SquaringMeasure[] far =
            [
                .. Enumerable.Range(0, tubesAt.Length)
                    .Where(other => other != from && tubesAt[other].Count > 0 && !tubesAt[other].Intersect(tubesAt[from]).Any())
                    .Select(other => Measure(model, SquaringKind.Across, from, other, []))
                    .OrderByDescending(m => Math.Round(m.Distance, 3))
                    .Take(Each),
            ];
            measures.AddRange(far.Where(m => known.Add((Math.Min(m.A, m.B), Math.Max(m.A, m.B)))));
        }
    }

    /// <summary>A flat convex bay of four straight sides.</summary>
    /// <param name="Corners">Nodes in their order round it, the lowest index first.</param>
    /// <param name="Area">mm².</param>
    /// <param name="Plane">Its normal, rounded and turned one way: parallel planes have the same.</param>
    private sealed record Bay(int[] Corners, double Area, Vector3 Plane);

    /// <summary>Walks from tube to tube round four corners.</summary>
    private sealed class BaySearch(FrameModel model, int[][] nodesOf, List<int>[] tubesAt)
    {
        private readonly List<Bay> _bays = [];
        private readonly HashSet<(int, int, int, int)> _seen = [];

        public List<Bay> Find()
        {
            for (int side = 0; side < nodesOf.Length && _bays.Count < MostBays; side++)
            {
                foreach (int a in nodesOf[side])
                {
                    foreach (int b in nodesOf[side].Where(n => n > a))
                    {
                        CloseFrom(side, a, b);
                    }
                }
            }

            return _bays;
        }

        private void CloseFrom(int side, int a, int b)
        {
            foreach (int next in tubesAt[b].Where(t => t != side))
            {
                foreach (int last in tubesAt[a].Where(t => t != side && t != next))
                {
                    foreach (int c in nodesOf[next].Where(n => n != b))
                    {
                        foreach (int facing in tubesAt[c].Where(t => t != next && t != last && t != side))
                        {
                            foreach (int d in nodesOf[facing].Where(n => n != c && n != a && Array.IndexOf(nodesOf[last], n) >= 0))
                            {
                                Add(a, b, c, d);
                            }
                        }
                    }
                }
            }
        }

        private void Add(int a, int b, int c, int d)
        {
            int[] corners = [a, b, c, d];
            int first = Array.IndexOf(corners, corners.Min());
            corners = [.. corners.Skip(first).Concat(corners.Take(first))];
            if (corners[1] > corners[3])
            {
                (corners[1], corners[3]) = (corners[3], corners[1]);
            }

            if (_bays.Count < MostBays && _seen.Add((corners[0], corners[1], corners[2], corners[3])) && Measured(corners) is { } bay)
            {
                _bays.Add(bay);
            }
        }

        private Bay? Measured(int[] corners)
        {
            Vector3[] at = [.. corners.Select(c => model.Nodes[c].Position)];
            Vector3 area = 0.5 * (at[2] - at[0]).Cross(at[3] - at[1]);
            if (!(area.Length > 0))
            {
                return null;
            }

            Vector3 normal = area.Normalized();
            for (int i = 0; i < 4; i++)
            {
                Vector3 before = at[(i + 3) % 4] - at[i];
                Vector3 after = at[(i + 1) % 4] - at[i];
                double angle = after.AngleTo(before);
                bool isCorner = angle > SmallestCorner && angle < Math.PI - SmallestCorner && after.Cross(before).Dot(normal) > 0;
                if (!isCorner || Math.Abs((at[i] - at[0]).Dot(normal)) > Flat)
                {
                    return null;
                }
            }

            return new Bay(corners, area.Length, OneWay(normal));
        }

        private static Vector3 OneWay(Vector3 normal)
        {
            static double Coarse(double x) => Math.Round(x, 2) + 0.0;
            var rounded = new Vector3(Coarse(normal.X), Coarse(normal.Y), Coarse(normal.Z));
            bool isTurned = rounded.X < 0 || (rounded.X == 0 && (rounded.Y < 0 || (rounded.Y == 0 && rounded.Z < 0)));
            return isTurned ? new Vector3(0 - rounded.X, 0 - rounded.Y, 0 - rounded.Z) : rounded;
        }
    }
}
