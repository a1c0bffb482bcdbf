using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Joints;

/// <summary>Whether a joint can be made in a design: asked by sizing before anything is cut.</summary>
public static class JointFit
{
    /// <summary>What stands in the way at one node; empty when it can be made.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="joint">The node's joint in this design.</param>
    /// <param name="sections">The design: a section a group.</param>
    /// <remarks>
    /// Depends only on the sections of the tubes that meet at the node. May be called from several threads at once.
    /// </remarks>
    public static IReadOnlyList<FitProblem> Check(FrameModel model, NodeJoint joint, IReadOnlyList<Section> sections) =>
        Check(model, JointPlan.Make(model, joint, sections), sections);

    /// <summary>
    /// Half the widths of an end and of its seat, mm, measured along the common normal of the two axes: where the end's and the axes'
    /// offset are together no more than the seat's, every wall line lands on metal.
    /// </summary>
    /// <param name="end">The end that is cut.</param>
    /// <param name="section">Of its tube.</param>
    /// <param name="seat">Axis of the seat.</param>
    /// <param name="seatAxes">The seat's local axes.</param>
    /// <param name="seatSection">Of the seat.</param>
    internal static (double Own, double Seat) HalfWidths(
        in EndFrame end, Section section, Line3 seat, TubeAxes seatAxes, Section seatSection)
    {
        Vector3 normal = Line3.CommonNormal(end.Axis, seat) ?? end.Axes.Z;
        return (section.Outline.HalfWidthAlong(end.Axes.InSection(normal)), seatSection.Outline.HalfWidthAlong(seatAxes.InSection(normal)));
    }

    /// <summary>Likewise, of an end of a tube and a straight of another.</summary>
    internal static (double Own, double Seat) HalfWidths(Tube tube, End end, Section section, TubeStraight seat, Section seatSection) =>
        HalfWidths(new EndFrame(tube[end].Point, tube.Into(end), tube.AxesAt(end)), section, seat.Axis, seat.Axes, seatSection);

    /// <summary>What stands in the way of a planned joint.</summary>
    internal static IReadOnlyList<FitProblem> Check(FrameModel model, JointPlan plan, IReadOnlyList<Section> sections)
    {
        List<FitProblem>? problems = null;
        foreach (EndPlan end in plan.Ends)
        {
            Tube tube = model.Tubes[end.Id.Tube];
            Section section = sections[tube.Group];
            if (ReferenceEquals(end, plan.Ends[0]) && plan.RunOutLength > section.OuterSize + Outline.Graze)
            {
                Add(new FitProblem(FitProblemKind.RunOutTooLong, end.Id, plan.RunOutAsker, plan.RunOutLength, section.OuterSize));
            }

            if (end.Kind != CutKind.Cope)
            {
                continue;
            }

            // Which mate is the seat takes long to find, and does not matter where the end is wider than none.
            ContourCope cope = new(end.Mates, tube.Middle(end.Id.End));
            if (!end.Mates.Any(m => IsWider(m, out _, out _)) && Touching.IsSeen(cope, section.Outline))
            {
                continue;
            }

            int seat = Touching.Seat(cope, section.Bore, section.Outline);
            if (seat < 0)
            {
                (Mate missed, double distance) = Touching.Nearest(cope, section.Bore, section.Outline, end.Frame);
                Add(new FitProblem(FitProblemKind.Misses, end.Id, missed.Tube, distance, 0));
                continue;
            }

            Mate mate = end.Mates[seat];
            if (IsWider(mate, out double needed, out double allowed))
            {
                Add(new FitProblem(FitProblemKind.WiderThanSeat, end.Id, mate.Tube, needed, allowed));
            }

            bool IsWider(Mate mate, out double needed, out double allowed)
            {
                (double half, allowed) = HalfWidths(end.Frame, section, mate.Axis, mate.Axes, sections[model.Tubes[mate.Tube].Group]);
                needed = half + mate.Axis.DistanceTo(end.Frame.Axis);
                return needed > allowed + Outline.Graze && !tube[end.Id.End].Wrap;
            }
        }

        return problems ?? (IReadOnlyList<FitProblem>)[];

        void Add(FitProblem problem) => (problems ??= []).Add(problem);
    }
}

/// <summary>What stands in the way of a joint.</summary>
public enum FitProblemKind
{
    /// <summary>The coped tube is wider than its seat; not reported at an end with <c>wrap</c>.</summary>
    WiderThanSeat,

    /// <summary>The first tube would run out by more than its own size.</summary>
    RunOutTooLong,

    /// <summary>The end meets none of the tubes it is cut to.</summary>
    Misses,
}

/// <summary>A joint that can't be made well.</summary>
/// <param name="Kind">What is wrong.</param>
/// <param name="End">The end it is about.</param>
/// <param name="Mate">The seat; the tube missed; the coped tube that asks for the run-out.</param>
/// <param name="Needed">Half width plus offset; the run-out, or the distance by which they miss; mm.</param>
/// <param name="Allowed">Half the seat's width; the longest run-out; 0 for a miss; mm.</param>
public sealed record FitProblem(FitProblemKind Kind, TubeEndId End, int Mate, double Needed, double Allowed);
