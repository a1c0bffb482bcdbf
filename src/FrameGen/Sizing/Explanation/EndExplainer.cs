using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Sizing.Explanation;

/// <summary>Says what cuts an end, from the joint's plan: the one that sizing and the copes go by.</summary>
internal static class EndExplainer
{
    /// <summary>Explains an end.</summary>
    public static ExplainedEnd Explain(SizedFrame sized, int tube, End end)
    {
        FrameModel model = sized.Model;
        NodeJoint joint = sized.Joints[model.Tubes[tube][end].Node];
        var id = new TubeEndId(tube, end);
        var plan = JointPlan.Make(model, joint, sized.Sections);
        EndPlan own = plan.Ends.First(e => e.Id == id);
        bool canCut = model.Tubes[tube].Bent is null || sized.SectionOf(tube) is RoundTube or Rod;
        IReadOnlyList<Contact> contacts = canCut ? new EndCutter(model, sized.Sections).Cut(own).Cut.Contacts : Planned(model, own);
        return new ExplainedEnd(
            end,
            joint,
            own.Kind,
            contacts,
            canCut,
            own.Extension,
            model.JointAt[joint.Node] is not null,
            [.. JointFit.Check(model, plan, sized.Sections).Where(p => p.End == id).Select(p => FitReport.Words(model, p, [.. sized.Sections]))]);
    }

    private static Contact[] Planned(FrameModel model, EndPlan end) => end.Partner is { } partner
        ? [Contacts.Of(end.Frame, partner.Tube, new(model.Tubes[partner.Tube][partner.End].Point, model.Tubes[partner.Tube].Into(partner.End)), isThrough: false)]
        : [.. end.Mates.Select(m => Contacts.Of(end.Frame, m.Tube, m.Axis, m.IsThrough))];
}
