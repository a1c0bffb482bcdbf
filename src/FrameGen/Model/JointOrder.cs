using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>
/// Who is cut to whom at a node: one pure function of the model and a design, asked by sizing and by the copes.
/// </summary>
public static class JointOrder
{
    // Room for rounding, so that a hexagon's corners (120 degrees) come out alike however the frame is turned.
    private const double AngleNoise = 1e-9;
    private const double MiterFrom = (120 * Math.PI / 180) + AngleNoise;
    private const double InLineFrom = (179 * Math.PI / 180) - AngleNoise;

    /// <summary>The joint at one node.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="node">Index of the node.</param>
    /// <param name="sections">The design: a section a group.</param>
    /// <exception cref="ArgumentOutOfRangeException">The model has no such node.</exception>
    public static NodeJoint At(FrameModel model, int node, IReadOnlyList<Section> sections)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(node);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(node, model.Nodes.Count);

        int? through = model.Nodes[node].Through;
        TubeEndId[] ends = InOrder(model, node, sections);
        Corner corner = through is null && ends.Length > 1 ? CornerOf(model, node, ends[0], ends[1], sections) : Corner.None;
        return new NodeJoint(node, through, ends, corner);
    }

    // Mitred pair, then the written order, then larger first; equal sizes stay as the model lists them.
    private static TubeEndId[] InOrder(FrameModel model, int node, IReadOnlyList<Section> sections)
    {
        IReadOnlyList<TubeEndId> listed = model.EndsAt[node];
        JointRequest? request = model.JointAt[node];
        if (listed.Count < 2)
        {
            return [.. listed];
        }

        var keys = new (int Written, double Smaller, int Listed)[listed.Count];
        var ends = new TubeEndId[listed.Count];
        for (int i = 0; i < ends.Length; i++)
        {
            ends[i] = listed[i];
            keys[i] = (PlaceIn(request, ends[i].Tube), -SizeKey(SectionOf(model, ends[i], sections).OuterSize), i);
        }

        Array.Sort(keys, ends);
        return ends;
    }

    private static int PlaceIn(JointRequest? request, int tube)
    {
        if (request is null)
        {
            return int.MaxValue;
        }

        if (request.Miter is { } pair)
        {
            if (tube == pair.A)
            {
                return -2;
            }

            if (tube == pair.B)
            {
                return -1;
            }
        }

        for (int i = 0; i < request.Order.Count; i++)
        {
            if (request.Order[i] == tube)
            {
                return i;
            }
        }

        return int.MaxValue;
    }

    private static Corner CornerOf(FrameModel model, int node, TubeEndId first, TubeEndId second, IReadOnlyList<Section> sections)
    {
        JointRequest? request = model.JointAt[node];
        if (request?.Miter is not null)
        {
            return Corner.Miter;
        }

        Vector3 a = model.Tubes[first.Tube].Into(first.End);
        Vector3 b = model.Tubes[second.Tube].Into(second.End);
        double angle = a.AngleTo(b);
        Section one = SectionOf(model, first, sections);
        Section other = SectionOf(model, second, sections);
        TubeEnd firstEnd = model.Tubes[first.Tube][first.End];
        TubeEnd secondEnd = model.Tubes[second.Tube][second.End];
        Vector3 between = secondEnd.Point - firstEnd.Point;

        // Axes that pass each other farther apart than the tubes are wide are no butt joint: the cope says that they miss.
        if (angle >= InLineFrom && between.Cross(a).Length < (one.OuterSize + other.OuterSize) / 2)
        {
            return Corner.InLine;
        }

        bool mitred = angle > MiterFrom
            && between.Length <= Lengths.Same
            && SameOutline(one, other)
            && IsLeftToUs(firstEnd)
            && IsLeftToUs(secondEnd)
            && !(request is not null && request.Order.Contains(first.Tube) && request.Order.Contains(second.Tube));
        return mitred ? Corner.Miter : Corner.RunOut;
    }

    private static bool SameOutline(Section a, Section b) =>
        string.Equals(a.Shape, b.Shape, StringComparison.Ordinal)
        && SizeKey(a.Height) == SizeKey(b.Height)
        && SizeKey(a.Width) == SizeKey(b.Width);

    private static bool IsLeftToUs(TubeEnd end) => end.Cut == RequestedCut.Default && end.Extend is null;

    private static Section SectionOf(FrameModel model, TubeEndId end, IReadOnlyList<Section> sections) =>
        sections[model.Tubes[end.Tube].Group];

    // Whole millionths of a millimetre: a key that sorts and compares without a tolerance's loopholes.
    private static double SizeKey(double size) => Math.Round(size / Lengths.Same);
}
