using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Joints;

/// <summary>What each tube end at a node is cut by, and where each ends as a mate of later ones: the shared ground of
/// <see cref="EndCoper"/> and <see cref="JointFit"/>, so that they can't disagree.</summary>
internal sealed class JointPlan
{
    private JointPlan(IReadOnlyList<EndPlan> ends, double runOut, int runOutAsker) =>
        (Ends, RunOutLength, RunOutAsker) = (ends, runOut, runOutAsker);

    /// <summary>In the joint's order.</summary>
    public IReadOnlyList<EndPlan> Ends { get; }

    /// <summary>By how much the first end runs out of its own accord, mm; 0 where it does not.</summary>
    public double RunOutLength { get; }

    /// <summary>The coped tube that asks for the longest run-out; −1 for none.</summary>
    public int RunOutAsker { get; }

    /// <summary>Plans a joint.</summary>
    public static JointPlan Make(FrameModel model, NodeJoint joint, IReadOnlyList<Section> sections)
    {
        int count = joint.Ends.Count;
        EndPlan[] ends = new EndPlan[count];
        (double runOut, int asker) = RunOutOf(model, joint, sections);
        List<MateSource> before = new(count + 1);
        if (joint.Through is { } through)
        {
            TubeStraight straight = model.StraightAt(through, joint.Node);
            before.Add(new MateSource(through, straight.Axis, straight.Axes, Skin(through), null));
        }

        for (int i = 0; i < count; i++)
        {
            TubeEndId id = joint.Ends[i];
            Tube tube = model.Tubes[id.Tube];
            TubeEnd end = tube[id.End];
            EndFrame frame = Frame(tube, id.End);
            HalfSpace limit = new(frame.Point, frame.Into);
            if (joint.Corner == Corner.Miter && i < 2)
            {
                TubeEndId partner = joint.Ends[1 - i];
                EndFrame other = Frame(model.Tubes[partner.Tube], partner.End);
                limit = MiterFace(frame, other);
                ends[i] = new EndPlan(id, CutKind.Miter, frame, limit, 0, [], partner);
            }
            else if (end.Plane is { } normal)
            {
                Vector3 inward = normal.Dot(frame.Into) < 0 ? -normal : normal;
                limit = new HalfSpace(frame.Point - ((end.Extend ?? 0) * frame.Into), inward);
                ends[i] = new EndPlan(id, CutKind.Plane, frame, limit, end.Extend ?? 0, [], null);
            }
            else if (before.Count == 0 || end.Cut == Spec.RequestedCut.Square || (joint.Corner == Corner.InLine && i < 2))
            {
                double extension = end.Extend ?? (i == 0 ? runOut : 0);
                limit = new HalfSpace(frame.Point - (extension * frame.Into), frame.Into);
                ends[i] = new EndPlan(id, CutKind.Square, frame, limit, extension, [], null);
            }
            else
            {
                Mate[] mates = new Mate[before.Count];
                for (int m = 0; m < mates.Length; m++)
                {
                    mates[m] = new Mate(before[m], end.Gap, frame);
                }

                ends[i] = new EndPlan(id, CutKind.Cope, frame, limit, 0, mates, null);
            }

            before.Add(new MateSource(id.Tube, frame.Axis, frame.Axes, Skin(id.Tube), limit));
        }

        return new JointPlan(ends, runOut, asker);

        Outline Skin(int tube) => sections[model.Tubes[tube].Group].Outline;
    }

    private static EndFrame Frame(Tube tube, End end) => new(tube[end].Point, tube.Into(end), tube.AxesAt(end));

    // One plane for both tubes. Their end points agree but where their axes are written to pass the node at different
    // distances; then it stands halfway between them.
    private static HalfSpace MiterFace(in EndFrame frame, in EndFrame other)
    {
        Vector3 normal = frame.Into - other.Into;
        Vector3 point = 0.5 * (frame.Point + other.Point);
        return new HalfSpace(point, normal.Length > Line3.ParallelSine ? normal.Normalized() : frame.Into);
    }

    private static (double Length, int Asker) RunOutOf(FrameModel model, NodeJoint joint, IReadOnlyList<Section> sections)
    {
        if (joint.Corner != Corner.RunOut || joint.Ends.Count == 0)
        {
            return (0, -1);
        }

        TubeEndId id = joint.Ends[0];
        Tube first = model.Tubes[id.Tube];
        if (first[id.End].Extend is not null || first[id.End].Plane is not null)
        {
            return (0, -1);
        }

        EndFrame frame = Frame(first, id.End);
        Outline skin = sections[first.Group].Outline;
        (double length, int asker) = (0, -1);
        for (int i = 1; i < joint.Ends.Count; i++)
        {
            TubeEndId other = joint.Ends[i];
            Tube tube = model.Tubes[other.Tube];
            if (tube[other.End].Cut is Spec.RequestedCut.Square or Spec.RequestedCut.Plane)
            {
                continue;
            }

            double needed = RunOut.Needed(frame, skin, Frame(tube, other.End), sections[tube.Group].Outline);
            if (needed > length)
            {
                (length, asker) = (needed, other.Tube);
            }
        }

        return (length, asker);
    }
}

/// <summary>How one end is cut.</summary>
/// <param name="Id">Which end.</param>
/// <param name="Kind">How.</param>
/// <param name="Frame">The end's point and directions.</param>
/// <param name="Limit">Where it ends as a mate of others; the face itself at a square, plane or mitred end.</param>
/// <param name="Extension">Past the end point, mm; square and plane ends.</param>
/// <param name="Mates">What it is coped to, in order.</param>
/// <param name="Partner">The end it is mitred with; null for none.</param>
internal sealed record EndPlan(
    TubeEndId Id, CutKind Kind, EndFrame Frame, HalfSpace Limit, double Extension, IReadOnlyList<Mate> Mates, TubeEndId? Partner);
