using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>What the bending list's template can print; names in the template are these in snake case.</summary>
/// <param name="Head">What stands on top of every paper.</param>
/// <param name="Parts">Bent parts, in the order of the cut list.</param>
/// <param name="Springback">What a bend opens, <c>2.0 degrees</c> or <c>4 % of its angle</c>; empty for nothing.</param>
/// <param name="Cautions">Sentences.</param>
public sealed record BendsModel(PaperHead Head, IReadOnlyList<BentPart> Parts, string Springback, IReadOnlyList<string> Cautions)
{
    /// <summary>Takes it from the shop's package.</summary>
    public static BendsModel From(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        var display = new DisplayFormat(model.Display);
        Springback opens = model.Fabrication.Springback;
        string springback = opens.Share > 0
            ? string.Create(CultureInfo.InvariantCulture, $"{100 * opens.Share:0.##} % of its angle")
            : opens.Angle > 0 ? $"{FixedDigits.Tenths(double.RadiansToDegrees(opens.Angle))} degrees" : string.Empty;
        return new BendsModel(
            PaperHead.Of(package.Cut.Sized),
            [.. package.Parts.Where(p => model.Tubes[p.Drawn.Tube].Bent is not null).Select(p => BentPart.From(package, p, display))],
            springback,
            Output.Cautions.All);
    }
}

/// <summary>A bent part.</summary>
/// <param name="Mark">With its hand where it has one.</param>
/// <param name="Quantity">How many to make.</param>
/// <param name="Tubes">Names, separated by spaces.</param>
/// <param name="Section">As a shop asks for it.</param>
/// <param name="Material">Name.</param>
/// <param name="CutLength">Of the blank, straightened.</param>
/// <param name="Clock">Clock angle of the inside of the first bend, degrees in [0, 360).</param>
/// <param name="Bends">In the order of bending.</param>
/// <param name="LastStraight">Behind the last bend, to the end of the blank.</param>
public sealed record BentPart(
    string Mark,
    int Quantity,
    string Tubes,
    string Section,
    string Material,
    string CutLength,
    string Clock,
    IReadOnlyList<BendRow> Bends,
    string LastStraight)
{
    internal static BentPart From(ShopPackage package, Part part, DisplayFormat display)
    {
        FrameModel model = package.Cut.Sized.Model;
        IReadOnlyList<BendStep> steps = BendStep.Of(model, part.Drawn);
        return new BentPart(
            part.Name,
            part.Quantity,
            string.Join(' ', part.Tubes.Select(t => model.Tubes[t].Name)),
            display.Section(package.Cut.Sized.ChosenFor(part.Drawn.Tube)),
            model.Groups[model.Tubes[part.Drawn.Tube].Group].Material.Name,
            display.MeasuredNumber(part.Drawn.CutLength),
            BendRow.ClockText(steps[0].Bend),
            [.. steps.Select(s => BendRow.From(s, display))],
            display.MeasuredNumber(part.Drawn.CutLength - steps[^1].Stop));
    }
}

/// <summary>A bend.</summary>
/// <param name="Number">1 for the first.</param>
/// <param name="Straight">Before it.</param>
/// <param name="Rotation">Of the tube's plane since the bend before, degrees, right-handed along the tube; empty for the first.</param>
/// <param name="Angle">Of the finished part, degrees.</param>
/// <param name="MachineAngle">To set on the machine, degrees.</param>
/// <param name="Radius">Of the centre line.</param>
/// <param name="Start">Where it begins, from the end of the blank.</param>
/// <param name="Stop">Where it ends.</param>
public sealed record BendRow(
    int Number, string Straight, string Rotation, string Angle, string MachineAngle, string Radius, string Start, string Stop)
{
    internal static BendRow From(BendStep step, DisplayFormat display) => new(
        step.Bend.Number,
        display.MeasuredNumber(step.Straight),
        step.Bend.Number == 1 ? string.Empty : FixedDigits.Tenths(double.RadiansToDegrees(step.Bend.Rotation)),
        FixedDigits.Tenths(double.RadiansToDegrees(step.Bend.Angle)),
        FixedDigits.Tenths(double.RadiansToDegrees(step.MachineAngle)),
        display.MeasuredNumber(step.Bend.Radius),
        display.MeasuredNumber(step.Start),
        display.MeasuredNumber(step.Stop));

    internal static string ClockText(TubeBend bend)
    {
        double degrees = Math.Round(double.RadiansToDegrees(bend.Clock), 1);
        return FixedDigits.Tenths(degrees < 0 ? degrees + 360 : degrees);
    }
}
