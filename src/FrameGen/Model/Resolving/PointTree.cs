using FrameGen.Geometry;

namespace FrameGen.Model.Resolving;

/// <summary>
/// Points sorted into nested boxes, to find those near a line without looking at them all: time to build n log n, to ask
/// about log n and what is found, however the points are spread.
/// </summary>
internal sealed class PointTree
{
    private const int LeafSize = 8;

    private readonly Vector3[] _points;
    private readonly int[] _order;
    private readonly List<Box> _boxes = [];

    /// <summary>Sorts points.</summary>
    public PointTree(Vector3[] points)
    {
        _points = points;
        _order = [.. Enumerable.Range(0, points.Length)];
        if (points.Length > 0)
        {
            Build(0, points.Length);
        }
    }

    /// <summary>Numbers of the points no farther than a distance from a line between two places, ends included; ascending.</summary>
    /// <param name="from">One end of the line, mm.</param>
    /// <param name="to">The other end; may be the same.</param>
    /// <param name="distance">mm.</param>
    /// <param name="found">Cleared first.</param>
    public void FindNear(Vector3 from, Vector3 to, double distance, List<int> found)
    {
        found.Clear();
        if (_boxes.Count > 0)
        {
            Search(0, from, to, distance, found);
            found.Sort();
        }
    }

    private int Build(int start, int stop)
    {
        Vector3 low = _points[_order[start]];
        Vector3 high = low;
        for (int i = start + 1; i < stop; i++)
        {
            Vector3 p = _points[_order[i]];
            low = new Vector3(Math.Min(low.X, p.X), Math.Min(low.Y, p.Y), Math.Min(low.Z, p.Z));
            high = new Vector3(Math.Max(high.X, p.X), Math.Max(high.Y, p.Y), Math.Max(high.Z, p.Z));
        }

        int box = _boxes.Count;
        _boxes.Add(new Box(low, high, start, stop, Right: 0));
        if (stop - start <= LeafSize)
        {
            return box;
        }

        Vector3 size = high - low;
        int axis = size.X >= size.Y && size.X >= size.Z ? 0 : size.Y >= size.Z ? 1 : 2;
        Array.Sort(_order, start, stop - start, Comparer<int>.Create((a, b) =>
        {
            int byPlace = Component(_points[a], axis).CompareTo(Component(_points[b], axis));
            return byPlace != 0 ? byPlace : a.CompareTo(b);
        }));
        int middle = (start + stop) / 2;
        Build(start, middle);
        int right = Build(middle, stop);
        _boxes[box] = _boxes[box] with { Right = right };
        return box;
    }

    private void Search(int index, Vector3 from, Vector3 to, double distance, List<int> found)
    {
        Box box = _boxes[index];
        if (!Touches(box, from, to - from, distance))
        {
            return;
        }

        if (box.Right > 0)
        {
            Search(index + 1, from, to, distance, found);
            Search(box.Right, from, to, distance, found);
            return;
        }

        for (int i = box.Start; i < box.Stop; i++)
        {
            if (DistanceToLine(_points[_order[i]], from, to) <= distance)
            {
                found.Add(_order[i]);
            }
        }
    }

    /// <summary>Distance of a point from a line between two places, ends included, mm.</summary>
    public static double DistanceToLine(Vector3 point, Vector3 from, Vector3 to)
    {
        Vector3 along = to - from;
        double square = along.Dot(along);
        double share = square > 0 ? Math.Clamp((point - from).Dot(along) / square, 0, 1) : 0;
        return (point - (from + (share * along))).Length;
    }

    // The line's part within the grown box' slabs; empty means that nothing in the box can be near.
    private static bool Touches(Box box, Vector3 from, Vector3 along, double grown)
    {
        double enter = 0;
        double leave = 1;
        return Clip(from.X, along.X, box.Low.X - grown, box.High.X + grown, ref enter, ref leave)
            && Clip(from.Y, along.Y, box.Low.Y - grown, box.High.Y + grown, ref enter, ref leave)
            && Clip(from.Z, along.Z, box.Low.Z - grown, box.High.Z + grown, ref enter, ref leave);
    }

    private static bool Clip(double from, double along, double low, double high, ref double enter, ref double leave)
    {
        // Nearly parallel to the slab: a quotient would be worth nothing.
        if (Math.Abs(along) < 1e-12)
        {
            return from >= low && from <= high;
        }

        double a = (low - from) / along;
        double b = (high - from) / along;
        enter = Math.Max(enter, Math.Min(a, b));
        leave = Math.Min(leave, Math.Max(a, b));
        return enter <= leave;
    }

    private static double Component(Vector3 v, int axis) => axis switch { 0 => v.X, 1 => v.Y, _ => v.Z };

    private readonly record struct Box(Vector3 Low, Vector3 High, int Start, int Stop, int Right);
}
