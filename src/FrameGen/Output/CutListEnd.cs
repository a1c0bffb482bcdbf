using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>How a cut end is set out: one row a tube that it fits. Square ends need none.</summary>
/// <param name="Mark">Of the part, with its hand where it has one; empty where it is that of the row before.</param>
/// <param name="End">Which end; empty where it is that of the row before.</param>
/// <param name="Cut">Kind of cut; empty likewise.</param>
/// <param name="Fits">The tube it fits; the first of an end is its seat.</param>
/// <param name="Angle">Between the axes, each pointing away from the node, degrees.</param>
/// <param name="FromSquare">How far the cut is turned from square, degrees: what a saw or a hole-saw jig is set to.</param>
/// <param name="Clock">Clock angle where the other tube leaves, degrees; empty where the axes are in line.</param>
/// <param name="Offset">By how much the axes miss each other; empty for not at all.</param>
/// <param name="HoleSaw">Its diameter; empty but for a coped end's round seat.</param>
public sealed record CutListEnd(
    string Mark, string End, string Cut, string Fits, string Angle, string FromSquare, string Clock, string Offset, string HoleSaw)
{
    internal static IEnumerable<CutListEnd> Of(CutFrame frame, Part part, DisplayFormat display)
    {
        bool isNamed = false;
        foreach (End end in (End[])[Model.End.From, Model.End.To])
        {
            EndCut cut = part.Drawn[end];
            for (int i = 0; i < cut.Contacts.Count; i++)
            {
                yield return From(frame, cut, i, end, isNamed ? string.Empty : part.Name, display);
                isNamed = true;
            }
        }
    }

    private static CutListEnd From(CutFrame frame, EndCut cut, int index, End end, string mark, DisplayFormat display)
    {
        const double Visible = 0.05;
        Contact mate = cut.Contacts[index];
        double angle = double.RadiansToDegrees(mate.Angle);
        bool isMiter = cut.Kind == CutKind.Miter;
        return new CutListEnd(
            mark,
            index == 0 ? EndText.Name(end) : string.Empty,
            index == 0 ? EndText.Kind(cut.Kind) : string.Empty,
            frame.Sized.Model.Tubes[mate.Tube].Name,
            FixedDigits.Tenths(angle),

            // A miter halves the angle; a square cut is half of a straight one.
            FixedDigits.Tenths(isMiter ? (180 - angle) / 2 : Math.Abs(90 - angle)),
            mate.Clock is { } clock
                ? FixedDigits.Tenths(Math.Round(double.RadiansToDegrees(clock), 1) % (mate.SquareCrossing ? 180 : 360))
                : string.Empty,
            mate.Offset >= Visible ? display.MeasuredNumber(mate.Offset) : string.Empty,
            index == 0 && Fabrication.HoleSaw.Of(frame.Sized, cut) is { } diameter ? display.MeasuredNumber(diameter) : string.Empty);
    }
}
