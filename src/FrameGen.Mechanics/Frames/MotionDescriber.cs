using FrameGen.Geometry;

namespace FrameGen.Mechanics.Frames;

/// <summary>
/// Puts motions without strain into words a builder knows: slides and turns of the parts of the frame. Of the many ways to choose
/// independent motions it takes slides first, then turns, along the global axes where it can.
/// </summary>
internal static class MotionDescriber
{
    private const int Six = SymbolicFactor.Six;
    private const double Tolerance = 1e-6;

    /// <summary>Describes motions.</summary>
    /// <param name="layout">The frame.</param>
    /// <param name="found">Independent motions in elimination order, each of one part, with a place in that part.</param>
    public static IReadOnlyList<Mechanism> Describe(FrameLayout layout, IReadOnlyList<(int Place, double[] Motion)> found)
    {
        int[] parts = PartsOf(layout);
        var mechanisms = new List<Mechanism>();
        foreach (IGrouping<int, (int Place, double[] Motion)> part in found.GroupBy(f => parts[f.Place]).OrderBy(g => g.Key))
        {
            int[] nodes = [.. Enumerable.Range(0, parts.Length).Where(p => parts[p] == part.Key).Select(p => layout.NodeAt[p]).Order()];
            mechanisms.AddRange(DescribePart(layout, nodes, [.. part.Select(f => f.Motion)]));
        }

        return mechanisms;
    }

    /// <summary>For each place the part it belongs to, named by the part's lowest node; parts meet only at nodes held altogether.</summary>
    private static int[] PartsOf(FrameLayout layout)
    {
        int[] parts = (int[])layout.NodeAt.Clone();
        bool changed = true;
        while (changed)
        {
            changed = false;
            for (int pair = 0; pair < layout.PairRows.Length; pair++)
            {
                (int i, int j) = (layout.PairRows[pair], layout.PairColumns[pair]);
                int lower = Math.Min(parts[i], parts[j]);
                changed |= parts[i] != parts[j];
                (parts[i], parts[j]) = (lower, lower);
            }
        }

        return parts;
    }

    private static IEnumerable<Mechanism> DescribePart(FrameLayout layout, int[] nodes, double[][] motions)
    {
        IReadOnlyList<Vector3> positions = layout.Frame.Nodes;
        Vector3 middle = nodes.Aggregate(Vector3.Zero, (sum, node) => sum + positions[node]) / nodes.Length;
        double size = nodes.Max(node => (positions[node] - middle).Length);
        size = size > 0 ? size : 1;

        var twists = new List<Twist>();
        var others = new List<Mechanism>();
        foreach (double[] motion in motions)
        {
            Twist twist = Fit(layout, nodes, motion, middle);
            double largest = nodes.Max(node => Math.Max(Slide(node).Length, size * Turn(node).Length));
            bool rigid = nodes.All(node =>
                (Slide(node) - twist.At(positions[node] - middle)).Length <= Tolerance * largest
                && (Turn(node) - twist.Turn).Length * size <= Tolerance * largest);
            if (rigid)
            {
                twists.Add((1 / largest) * new Twist(twist.Slide, twist.Turn));
            }
            else
            {
                int[] moved = [.. nodes.Where(node => Math.Max(Slide(node).Length, size * Turn(node).Length) > Tolerance * largest)];
                others.Add(new Mechanism(moved, null, null, null));
            }

            Vector3 Slide(int node) => Read(motion, Six * layout.PlaceOf[node]);
            Vector3 Turn(int node) => Read(motion, (Six * layout.PlaceOf[node]) + 3);
        }

        (List<Vector3> slides, List<Twist> turns) = Separate(twists, size);
        Vector3[] slideAxes = Axes(slides);
        foreach (Vector3 axis in slideAxes)
        {
            yield return new Mechanism(nodes, axis, null, null);
        }

        foreach (Vector3 axis in Axes([.. turns.Select(t => t.Turn)]))
        {
            yield return DescribeTurn(layout, nodes, TwistAbout(axis, turns, slideAxes), middle, size);
        }

        foreach (Mechanism other in others)
        {
            yield return other;
        }
    }

    private static Mechanism DescribeTurn(FrameLayout layout, int[] nodes, Twist twist, Vector3 middle, double size)
    {
        // A turn that slides along its own axis as well is a screw, and gets no name.
        Vector3 axis = twist.Turn;
        if (Math.Abs(twist.Slide.Dot(axis)) > Tolerance * Math.Max(size, twist.Slide.Length))
        {
            return new Mechanism(nodes, null, null, null);
        }

        Vector3 centre = middle + axis.Cross(twist.Slide);
        IEnumerable<int> onAxis = nodes.Where(node => (layout.Frame.Nodes[node] - centre).Cross(axis).Length <= Tolerance * size);
        int[] bySupport = [.. onAxis.OrderBy(node => layout.PartlyHeld[layout.PlaceOf[node]] ? 0 : 1).ThenBy(node => node)];
        return new Mechanism(nodes, null, axis, bySupport.Length > 0 ? layout.Frame.Nodes[bySupport[0]] : centre);
    }

    private static Twist Fit(FrameLayout layout, int[] nodes, double[] motion, Vector3 middle)
    {
        Vector3 turn = Vector3.Zero;
        Vector3 slide = Vector3.Zero;
        foreach (int node in nodes)
        {
            int k = Six * layout.PlaceOf[node];
            turn += Read(motion, k + 3) / nodes.Length;
        }

        foreach (int node in nodes)
        {
            Vector3 arm = layout.Frame.Nodes[node] - middle;
            slide += (Read(motion, Six * layout.PlaceOf[node]) - turn.Cross(arm)) / nodes.Length;
        }

        return new Twist(slide, turn);
    }

    /// <summary>Splits the space of rigid motions into those without any turning, and the rest with independent turns.</summary>
    private static (List<Vector3> Slides, List<Twist> Turns) Separate(List<Twist> twists, double size)
    {
        var rest = new List<Twist>(twists);
        var turns = new List<Twist>();
        while (rest.Count > 0)
        {
            Twist strongest = rest.MaxBy(t => t.Turn.Length);
            if (strongest.Turn.Length * size <= Tolerance)
            {
                break;
            }

            rest.Remove(strongest);
            Vector3 along = strongest.Turn.Normalized();
            Twist unit = (1 / strongest.Turn.Length) * strongest;
            rest = rest.ConvertAll(t => t - (t.Turn.Dot(along) * unit));
            turns.Add(unit);
        }

        return (rest.ConvertAll(t => t.Slide), turns);
    }

    /// <summary>The combination of turns that turns by one about an axis, without the part of its slide that is a slide of its own.</summary>
    private static Twist TwistAbout(Vector3 axis, List<Twist> turns, Vector3[] slideAxes)
    {
        // Separate leaves the turns square to one another.
        var sum = new Twist(Vector3.Zero, Vector3.Zero);
        foreach (Twist turn in turns)
        {
            sum += (axis.Dot(turn.Turn) / turn.Turn.Dot(turn.Turn)) * turn;
        }

        Vector3 slide = sum.Slide;
        foreach (Vector3 own in slideAxes)
        {
            slide -= slide.Dot(own) * own;
        }

        return new Twist(slide, axis);
    }

    /// <summary>Orthonormal directions of the same span, along global axes as far as those lie in it.</summary>
    private static Vector3[] Axes(List<Vector3> span)
    {
        var basis = new List<Vector3>();
        double longest = span.Count == 0 ? 0 : span.Max(v => v.Length);
        foreach (Vector3 direction in span)
        {
            Vector3 left = Without(Without(direction, basis), basis);
            if (left.Length > Tolerance * longest)
            {
                basis.Add(left.Normalized());
            }
        }

        var axes = new List<Vector3>();
        foreach (Vector3 global in (Vector3[])[Vector3.UnitX, Vector3.UnitY, Vector3.UnitZ])
        {
            if (Without(global, basis).Length <= Tolerance)
            {
                axes.Add(global);
            }
        }

        // What is left of the span after the global axes: nothing, a line, or a plane without any of them.
        foreach (Vector3 direction in basis)
        {
            Vector3 left = Without(direction, axes);
            if (axes.Count < basis.Count && left.Length > 0.1)
            {
                axes.Add(Forward(left.Normalized()));
            }
        }

        return [.. axes];
    }

    private static Vector3 Without(Vector3 direction, List<Vector3> basis) =>
        basis.Aggregate(direction, (left, axis) => left - (left.Dot(axis) * axis));

    /// <summary>Of the two directions of a line, the one whose largest component is positive.</summary>
    private static Vector3 Forward(Vector3 v)
    {
        double largest = Math.Max(Math.Max(Math.Abs(v.X), Math.Abs(v.Y)), Math.Abs(v.Z));
        double leading = Math.Abs(v.X) > (1 - Tolerance) * largest ? v.X : Math.Abs(v.Y) > (1 - Tolerance) * largest ? v.Y : v.Z;
        return leading < 0 ? -v : v;
    }

    private static Vector3 Read(double[] values, int k) => new(values[k], values[k + 1], values[k + 2]);

    /// <summary>A motion as a rigid body: the slide of the part's middle and the turn about it.</summary>
    private readonly record struct Twist(Vector3 Slide, Vector3 Turn)
    {
        public static Twist operator +(Twist a, Twist b) => new(a.Slide + b.Slide, a.Turn + b.Turn);

        public static Twist operator -(Twist a, Twist b) => new(a.Slide - b.Slide, a.Turn - b.Turn);

        public static Twist operator *(double factor, Twist a) => new(factor * a.Slide, factor * a.Turn);

        public Vector3 At(Vector3 arm) => Slide + Turn.Cross(arm);
    }
}
