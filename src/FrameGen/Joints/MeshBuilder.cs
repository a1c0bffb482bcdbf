using FrameGen.Geometry;

namespace FrameGen.Joints;

/// <summary>Puts a tube's mesh together column by column: x to the top line, y to clock 90°, z along.</summary>
/// <param name="columns">Its columns.</param>
internal sealed class MeshBuilder(Columns columns)
{
    private readonly List<Vector3> _vertices = [];
    private readonly List<int> _triangles = [];

    /// <summary>Adds a ring of vertices, two at a column where the cut steps.</summary>
    public Loop AddLoop(Outline ring, double[] before, double[] after, Func<double, double> along)
    {
        int count = columns.Clocks.Length;
        Loop loop = new(new int[count], new int[count], new double[count], new double[count]);
        for (int i = 0; i < count; i++)
        {
            (double sin, double cos) = Math.SinCos(columns.Clocks[i]);
            double radius = ring.RadiusAt(sin, cos);
            Point2 radial = new(radius * cos, radius * sin);
            loop.BeforeAlong[i] = along(before[i]);
            loop.AfterAlong[i] = along(after[i]);
            loop.Before[i] = Add(radial, loop.BeforeAlong[i]);
            loop.After[i] = before[i] == after[i] ? loop.Before[i] : Add(radial, loop.AfterAlong[i]);
        }

        return loop;
    }

    /// <summary>Adds a vertex on the axis.</summary>
    public int AddOnAxis(double along) => Add(default, along);

    /// <summary>The skin between two ends' loops, with square rings at places between them.</summary>
    /// <param name="from">At the from end.</param>
    /// <param name="to">At the to end.</param>
    /// <param name="skin">The outline that both lie on.</param>
    /// <param name="stations">Distances along the tube between the two loops, growing, mm.</param>
    /// <param name="outward">True where it faces away from the axis.</param>
    public void Skin(Loop from, Loop to, Outline skin, ReadOnlySpan<double> stations, bool outward)
    {
        Loop last = from;
        double[] square = new double[columns.Clocks.Length];
        foreach (double station in stations)
        {
            Loop next = AddLoop(skin, square, square, _ => station);
            Skin(last, next, outward);
            last = next;
        }

        Skin(last, to, outward);
    }

    private void Skin(Loop from, Loop to, bool outward)
    {
        int count = columns.Clocks.Length;
        Span<int> left = stackalloc int[4];
        Span<int> right = stackalloc int[4];
        for (int i = 0; i < count; i++)
        {
            int next = (i + 1) % count;
            int leftCount = Side(from, to, i, (from.After[i], from.AfterAlong[i]), (to.After[i], to.AfterAlong[i]), left);
            int rightCount = Side(
                from, to, next, (from.Before[next], from.BeforeAlong[next]), (to.Before[next], to.BeforeAlong[next]), right);
            Strip(left[..leftCount], right[..rightCount], outward);
        }
    }

    /// <summary>The face of an end, from ring to ring and at a rod to its axis.</summary>
    /// <param name="end">The end's rings.</param>
    /// <param name="outward">True where it faces along the tube, false where it faces back.</param>
    public void Face(EndLoops end, bool outward)
    {
        int count = columns.Clocks.Length;
        for (int ring = 0; ring < end.Rings.Count; ring++)
        {
            Loop outer = end.Rings[ring];
            Loop? inner = ring + 1 < end.Rings.Count ? end.Rings[ring + 1] : null;
            if (inner is null && end.Apex is null)
            {
                break;
            }

            for (int i = 0; i < count; i++)
            {
                int next = (i + 1) % count;
                int innerBefore = inner?.Before[i] ?? end.Apex!.Value;
                int innerAfter = inner?.After[i] ?? end.Apex!.Value;
                int innerNext = inner?.Before[next] ?? end.Apex!.Value;
                Triangle(outer.Before[i], outer.After[i], innerBefore, outward);
                Triangle(outer.After[i], innerAfter, innerBefore, outward);
                Triangle(outer.After[i], outer.Before[next], innerAfter, outward);
                Triangle(outer.Before[next], innerNext, innerAfter, outward);
            }
        }
    }

    /// <summary>The mesh.</summary>
    public TriangleMesh Build() => new(_vertices, _triangles);

    // One side of a strip, bottom to top: its two corners, and vertices of the other sides' steps that lie between.
    private static int Side(Loop from, Loop to, int column, (int Vertex, double Along) low, (int Vertex, double Along) high, Span<int> side)
    {
        Span<(double Along, int Vertex)> between = stackalloc (double, int)[4];
        int count = 0;
        ReadOnlySpan<(double Along, int Vertex)> all =
        [
            (from.BeforeAlong[column], from.Before[column]),
            (from.AfterAlong[column], from.After[column]),
            (to.BeforeAlong[column], to.Before[column]),
            (to.AfterAlong[column], to.After[column]),
        ];
        foreach ((double along, int vertex) in all)
        {
            bool known = vertex == low.Vertex || vertex == high.Vertex;
            for (int i = 0; i < count; i++)
            {
                known |= between[i].Vertex == vertex;
            }

            if (!known && along > low.Along && along < high.Along)
            {
                between[count++] = (along, vertex);
            }
        }

        between[..count].Sort();
        side[0] = low.Vertex;
        for (int i = 0; i < count; i++)
        {
            side[i + 1] = between[i].Vertex;
        }

        side[count + 1] = high.Vertex;
        return count + 2;
    }

    // A convex strip between two upright sides: every triangle has a vertex on each, so none is flat.
    private void Strip(ReadOnlySpan<int> left, ReadOnlySpan<int> right, bool outward)
    {
        (int i, int j) = (0, 0);
        while (i < left.Length - 1 || j < right.Length - 1)
        {
            bool advanceRight = i == left.Length - 1 ||
                (j < right.Length - 1 && (j + 1.0) / right.Length <= (i + 1.0) / left.Length);
            if (advanceRight)
            {
                Triangle(left[i], right[j], right[j + 1], outward);
                j++;
            }
            else
            {
                Triangle(left[i], right[j], left[i + 1], outward);
                i++;
            }
        }
    }

    private void Triangle(int a, int b, int c, bool outward)
    {
        if (a == b || b == c || c == a)
        {
            return;
        }

        _triangles.Add(a);
        _triangles.Add(outward ? b : c);
        _triangles.Add(outward ? c : b);
    }

    private int Add(Point2 radial, double along)
    {
        _vertices.Add(new Vector3(radial.X, radial.Y, along));
        return _vertices.Count - 1;
    }
}

/// <summary>A ring of vertices: at each column the vertex met from the left and the one left to the right, and where
/// they stand along the tube, mm.</summary>
internal sealed record Loop(int[] Before, int[] After, double[] BeforeAlong, double[] AfterAlong);
