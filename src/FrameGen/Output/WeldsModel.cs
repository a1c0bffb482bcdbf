using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>What the weld list's template can print; names in the template are these in snake case.</summary>
/// <param name="Head">What stands on top of every paper.</param>
/// <param name="Seams">Joint by joint.</param>
/// <param name="Legs">Sums of the seams of one leg, small ones first; seams that no heat joins have none.</param>
/// <param name="Length">Of all seams.</param>
/// <param name="Filler">Estimate for all seams.</param>
/// <param name="FillerUnit">Of all filler: g or oz.</param>
/// <param name="Area">Outer surface of the cut parts, to paint, with its unit.</param>
/// <param name="Cautions">Sentences.</param>
public sealed record WeldsModel(
    PaperHead Head,
    IReadOnlyList<WeldRow> Seams,
    IReadOnlyList<WeldLeg> Legs,
    string Length,
    string Filler,
    string FillerUnit,
    string Area,
    IReadOnlyList<string> Cautions)
{
    /// <summary>Takes it from the shop's package and its seams.</summary>
    public static WeldsModel From(ShopPackage package, WeldList welds)
    {
        var display = new DisplayFormat(package.Cut.Sized.Model.Display);
        return new WeldsModel(
            PaperHead.Of(package.Cut.Sized),
            [.. welds.Seams.Select((seam, i) => WeldRow.From(package.Cut, seam, i == 0 || welds.Seams[i - 1].Node != seam.Node, display))],
            [
                .. welds.Seams.Where(s => s.IsWelded).GroupBy(s => Math.Round(s.Leg, 3)).OrderBy(g => g.Key).Select(g => new WeldLeg(
                    display.MeasuredNumber(g.Key),
                    display.LengthNumber(g.Sum(s => s.Fillet)),
                    display.LengthNumber(g.Sum(s => s.Butt)),
                    display.SmallMassNumber(g.Sum(s => s.FillerKg)))),
            ],
            display.LengthNumber(welds.Length),
            display.SmallMassNumber(welds.FillerKg),
            display.SmallMassUnitName,
            display.Area(package.Totals.OuterArea),
            Output.Cautions.All);
    }
}

/// <summary>A seam.</summary>
/// <param name="Node">Its name; empty where it is that of the seam before.</param>
/// <param name="Tube">The tube whose end it runs round.</param>
/// <param name="End">Which end.</param>
/// <param name="Onto">What the end is cut to.</param>
/// <param name="Length">True length of its curve.</param>
/// <param name="Fillet">Of it as a fillet.</param>
/// <param name="Butt">Of it as a butt weld.</param>
/// <param name="Angles">Between the outer surfaces along it, least to greatest, degrees.</param>
/// <param name="Leg">That the estimate takes; empty where no heat joins the tubes.</param>
/// <param name="Filler">Estimate; empty likewise.</param>
public sealed record WeldRow(
    string Node, string Tube, string End, string Onto, string Length, string Fillet, string Butt, string Angles, string Leg, string Filler)
{
    internal static WeldRow From(CutFrame cut, WeldSeam seam, bool isFirst, DisplayFormat display)
    {
        FrameModel model = cut.Sized.Model;
        EndCut end = cut.Tubes[seam.End.Tube][seam.End.End];
        string least = FixedDigits.Print(double.RadiansToDegrees(seam.Least), "0");
        string most = FixedDigits.Print(double.RadiansToDegrees(seam.Most), "0");
        return new WeldRow(
            isFirst ? model.Nodes[seam.Node].Name : string.Empty,
            model.Tubes[seam.End.Tube].Name,
            EndText.Name(seam.End.End),
            EndText.ForPeople(model, end),
            display.LengthNumber(seam.Length),
            display.LengthNumber(seam.Fillet),
            display.LengthNumber(seam.Butt),
            end.Kind == CutKind.Miter ? string.Empty : $"{least} to {most}",
            seam.IsWelded ? display.MeasuredNumber(seam.Leg) : string.Empty,
            seam.IsWelded ? display.SmallMassNumber(seam.FillerKg) : string.Empty);
    }
}

/// <summary>Sums of the seams of one leg.</summary>
/// <param name="Leg">The leg.</param>
/// <param name="Fillet">Length as fillets.</param>
/// <param name="Butt">Length as butt welds.</param>
/// <param name="Filler">Estimate.</param>
public sealed record WeldLeg(string Leg, string Fillet, string Butt, string Filler);
