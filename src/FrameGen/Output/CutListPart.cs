using FrameGen.Fabrication;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>One row of the cut list; lengths and masses in the list's units.</summary>
/// <param name="Mark">On every paper of the part, with its hand where it has one.</param>
/// <param name="Quantity">How many to make.</param>
/// <param name="Tubes">Names, separated by spaces.</param>
/// <param name="CutLength">Long point to long point.</param>
/// <param name="NodeLength">Axis from node to node.</param>
/// <param name="MassEach">Of one.</param>
/// <param name="MassTotal">Of all of this part.</param>
/// <param name="FromEnd">Kind of cut and mates: <c>cope to rail-l, tail</c>.</param>
/// <param name="ToEnd">Kind of cut and mates.</param>
/// <param name="Twist">Degrees; empty where an end has no seat.</param>
/// <param name="Note">May be empty.</param>
public sealed record CutListPart(
    string Mark,
    int Quantity,
    string Tubes,
    string CutLength,
    string NodeLength,
    string MassEach,
    string MassTotal,
    string FromEnd,
    string ToEnd,
    string Twist,
    string Note)
{
    internal static CutListPart From(ShopPackage package, Part part, DisplayFormat display)
    {
        FrameModel model = package.Cut.Sized.Model;
        Tube tube = model.Tubes[part.Drawn.Tube];
        return new CutListPart(
            part.Name,
            part.Quantity,
            string.Join(' ', part.Tubes.Select(t => model.Tubes[t].Name)),
            display.MeasuredNumber(part.Drawn.CutLength),
            display.MeasuredNumber(tube.Length),
            display.MassNumber(part.Drawn.MassKg),
            display.MassNumber(part.Drawn.MassKg * part.Quantity),
            EndText.ForPeople(model, part.Drawn.From),
            EndText.ForPeople(model, part.Drawn.To),
            part.TwistDegrees is { } twist ? FixedDigits.Tenths(twist) : string.Empty,
            part.Note);
    }
}
