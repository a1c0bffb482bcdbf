using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Joints;

/// <summary>Cuts single ends as planned: surface, curves, contacts, integrals. Keeps working lists between ends.</summary>
internal sealed class EndCutter(FrameModel model, IReadOnlyList<Section> sections)
{
    private readonly CurveSampler _sampler = new();

    /// <summary>Cuts an end.</summary>
    public CutterEnd Cut(EndPlan end)
    {
        Tube tube = model.Tubes[end.Id.Tube];
        Section section = sections[tube.Group];
        CutterEnd cut = end.Kind == CutKind.Cope ? Cope(end, tube, section.Bore, section.Outline) : Plane(end, section.Bore, section.Outline);
        return tube[end.Id.End].Vent is { } diameter
            ? cut with { Cut = cut.Cut with { Vent = Vent.Beside(cut.Cut, diameter, section.Outline, end.Frame.Axes) } }
            : cut;
    }

    private CutterEnd Plane(EndPlan end, Outline inner, Outline outer)
    {
        PlaneCut plane = end.Kind == CutKind.Square ? PlaneCut.Square(end.Extension) : PlaneCut.On(end.Limit, end.Frame);
        IReadOnlyList<Contact> contacts = [];
        if (end.Partner is { } partner)
        {
            Tube mate = model.Tubes[partner.Tube];
            Line3 axis = new(mate[partner.End].Point, mate.Into(partner.End));
            contacts = [Contacts.Of(end.Frame, partner.Tube, axis, isThrough: false)];
        }

        EndCurve outerCurve = _sampler.Sample(plane, outer, outer, model.Fabrication.Tolerance);
        double length = _sampler.Length();
        EndCurve innerCurve = _sampler.Sample(plane, inner, outer, model.Fabrication.Tolerance);
        EndCut cut = new(end.Kind, contacts, 0, plane, outerCurve, innerCurve, length);
        return new CutterEnd(cut, EndMoments.Of(plane, inner, outer), false);
    }

    private CutterEnd Cope(EndPlan end, Tube tube, Outline inner, Outline outer)
    {
        ContourCope asMet = new(end.Mates, tube.Middle(end.Id.End));
        bool[] touched = Touching.All(asMet, inner, outer, _sampler, out bool partlyMissing);
        List<Contact> contacts = [];
        for (int i = 0; i < touched.Length; i++)
        {
            if (touched[i])
            {
                Mate mate = end.Mates[i];
                contacts.Add(Contacts.Of(end.Frame, mate.Tube, mate.Axis, mate.IsThrough));
            }
        }

        double tolerance = model.Fabrication.Tolerance;
        CutSurface surface = model.Fabrication.Cut == CutMode.Radial ? new RadialCope(asMet, inner, outer) : asMet;
        EndCurve outerCurve = _sampler.Sample(surface, outer, outer, tolerance);
        double length = _sampler.Length();
        List<double> corners = [];
        AddCorners(corners);
        EndCurve innerCurve = outerCurve;
        if (!surface.IsRadial || inner.IsPoint)
        {
            innerCurve = _sampler.Sample(surface, inner, outer, tolerance);
            if (!inner.IsPoint)
            {
                AddCorners(corners);
            }
        }

        EndCut cut = new(CutKind.Cope, contacts, tube[end.Id.End].Gap, surface, outerCurve, innerCurve, length);
        return new CutterEnd(cut, EndMoments.Of(surface, inner, outer, corners), partlyMissing);
    }

    private void AddCorners(List<double> corners)
    {
        IReadOnlyList<CutSample> trace = _sampler.Trace;
        for (int i = 1; i < trace.Count; i++)
        {
            if (!trace[i].Continues(trace[i - 1]))
            {
                corners.Add(trace[i].Clock);
            }
        }
    }
}

/// <summary>A cut end with what the tube's volume needs from it.</summary>
/// <param name="Cut">The cut.</param>
/// <param name="Moments">Integrals over the section.</param>
/// <param name="PartlyMissing">True where some wall lines meet nothing.</param>
internal sealed record CutterEnd(EndCut Cut, EndMoments Moments, bool PartlyMissing);
