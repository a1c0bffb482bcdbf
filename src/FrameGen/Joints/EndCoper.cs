using FrameGen.Diagnostics;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Joints;

/// <summary>Cuts every tube end to fit what stands before it in its joint.</summary>
public static class EndCoper
{
    /// <summary>Cuts a sized frame.</summary>
    /// <param name="sized">The frame.</param>
    /// <param name="diagnostics">Mates that miss, ends that overlap, run-outs too long, cuts in bends: errors; an end only partly seated: a warning.</param>
    /// <returns>The cut frame, or null when an error was reported.</returns>
    public static CutFrame? Cope(SizedFrame sized, DiagnosticList diagnostics)
    {
        FrameModel model = sized.Model;
        CutterEnd?[] from = new CutterEnd?[model.Tubes.Count];
        CutterEnd?[] to = new CutterEnd?[model.Tubes.Count];
        EndCutter cutter = new(model, sized.Sections);
        bool failed = false;
        foreach (NodeJoint joint in sized.Joints)
        {
            JointPlan plan = JointPlan.Make(model, joint, sized.Sections);
            DiagnosticList found = [];
            IReadOnlyList<FitProblem> wide = JointReport.Report(model, joint, plan, sized.Sections, found);
            foreach (Diagnostic diagnostic in found)
            {
                diagnostics.Add(diagnostic);
            }

            failed |= found.HasErrors;
            if (failed)
            {
                continue;
            }

            foreach (EndPlan end in plan.Ends)
            {
                CutterEnd cut = cutter.Cut(end);
                JointReport.ReportCut(model, end, cut, wide.FirstOrDefault(w => w.End == end.Id), diagnostics);
                (end.Id.End == End.From ? from : to)[end.Id.Tube] = cut;
            }
        }

        if (failed)
        {
            return null;
        }

        CutTube[] tubes = new CutTube[model.Tubes.Count];
        for (int i = 0; i < tubes.Length; i++)
        {
            if (from[i] is not { } first || to[i] is not { } last)
            {
                throw new ArgumentException($"An end of tube {model.Tubes[i].Name} stands in no joint.", nameof(sized));
            }

            Section section = sized.SectionOf(i);
            if (model.Tubes[i].Bent is null
                && TubeOverlap.Find(model.Tubes[i], section, first.Cut, last.Cut, model.Fabrication.Tolerance) is { } left)
            {
                JointReport.ReportOverlap(model, i, left, first.Cut, last.Cut, diagnostics);
                failed = true;
                continue;
            }

            failed |= JointReport.ReportVents(model, i, section, first.Cut, last.Cut, diagnostics);
            tubes[i] = TubeMeasure.Measure(model, i, section, first, last);
        }

        return failed || BendReport.Report(sized, tubes, diagnostics) ? null : WarnOfOverhangs(sized, tubes, diagnostics);
    }

    // What shows only once the seats are cut too.
    private static CutFrame WarnOfOverhangs(SizedFrame sized, CutTube[] tubes, DiagnosticList diagnostics)
    {
        foreach (NodeJoint joint in sized.Joints)
        {
            if (joint.Through is not { } through)
            {
                continue;
            }

            foreach (TubeEndId id in joint.Ends)
            {
                if (tubes[id.Tube][id.End].Contacts.All(c => c.Tube != through))
                {
                    continue;
                }

                double past = Overhang.Of(
                    sized.Model, tubes[id.Tube], id.End, sized.SectionOf(id.Tube), tubes[through], sized.SectionOf(through));
                if (past > sized.Model.Fabrication.Tolerance)
                {
                    JointReport.ReportOverhang(sized.Model, id, through, past, diagnostics);
                }
            }
        }

        return new CutFrame(sized, tubes);
    }
}
