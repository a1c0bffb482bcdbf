using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output.Report;

/// <summary>What the report's template can print; names in the template are these in snake case.</summary>
/// <param name="Head">What stands on top of every paper.</param>
/// <param name="Notes">Of the spec; a user's words; may be empty.</param>
/// <param name="Answers">What a builder asks first.</param>
/// <param name="Picture">The frame as a line drawing.</param>
/// <param name="SceneFrame">JSON of the 3D picture: the frame. Safe inside a script element as it is.</param>
/// <param name="SceneTubes">JSON of the 3D picture: one text a tube.</param>
/// <param name="Tubes">In the order of the spec.</param>
/// <param name="Sizing">Sizes, targets, load cases.</param>
/// <param name="MassPerLengthUnit">Of the sizes.</param>
/// <param name="Masses">One a group, heavy ones first.</param>
/// <param name="CutList">As on its own paper.</param>
/// <param name="Stock">As on its own paper.</param>
/// <param name="LongestBar">Of the stock plan, mm: what bars are drawn to.</param>
/// <param name="Setup">As on its own paper.</param>
/// <param name="Welds">As on its own paper.</param>
/// <param name="Cautions">Sentences.</param>
/// <param name="Provenance">What the page was made from: name and value.</param>
/// <param name="Style">Of the page, as built in.</param>
/// <param name="Script">Of the page, as built in.</param>
public sealed record ReportModel(
    PaperHead Head,
    string Notes,
    IReadOnlyList<ReportAnswer> Answers,
    FramePicture Picture,
    string SceneFrame,
    IReadOnlyList<string> SceneTubes,
    IReadOnlyList<ReportTube> Tubes,
    SizingModel Sizing,
    string MassPerLengthUnit,
    IReadOnlyList<ReportMass> Masses,
    CutListModel CutList,
    StockPlanModel Stock,
    double LongestBar,
    SetupModel Setup,
    WeldsModel Welds,
    IReadOnlyList<string> Cautions,
    IReadOnlyList<ReportFact> Provenance,
    string Style,
    string Script)
{
    /// <summary>Takes it from the shop's package and the models of the other papers.</summary>
    public static ReportModel From(ShopPackage package, CutListModel cutList, StockPlanModel stock, SetupModel setup, WeldsModel welds)
    {
        SizedFrame sized = package.Cut.Sized;
        var scene = new SceneJson(package);
        var sizing = SizingModel.From(sized);
        return new ReportModel(
            PaperHead.Of(sized),
            sized.Model.Spec.Notes,
            [ReportAnswer.OnTargets(sized), ReportAnswer.OnMass(package, sizing), ReportAnswer.OnBuying(stock)],
            FramePicture.Of(package),
            scene.Frame(FramePicture.View.Azimuth, FramePicture.View.Elevation),
            [.. scene.Tubes()],
            ReportTube.Of(package, scene),
            sizing,
            new DisplayFormat(sized.Model.Display).MassPerLengthUnitName,
            ReportMass.Of(package),
            cutList,
            stock,
            package.Stock.Lots.Count == 0 ? 0 : package.Stock.Lots.Max(l => l.BarLength),
            setup,
            welds,
            Output.Cautions.All,
            ReportFact.Of(sized),
            TextTemplate.Load("report.css"),
            string.Join('\n', ScriptParts.Select(TextTemplate.Load)));
    }

    private static readonly string[] ScriptParts = ["report-mesh.js", "report-view.js", "report.js"];
}

/// <summary>A question of a builder, answered in one line.</summary>
/// <param name="Question">In his words.</param>
/// <param name="Answer">In few words.</param>
/// <param name="Detail">The rest of the line.</param>
/// <param name="IsBad">True where it should stop him.</param>
public sealed record ReportAnswer(string Question, string Answer, string Detail, bool IsBad)
{
    internal static ReportAnswer OnTargets(SizedFrame sized)
    {
        const string Asked = "Does it meet the targets?";
        if (sized.Targets.Count == 0)
        {
            return new ReportAnswer(Asked, "No target is set", "Nothing here says that the frame is stiff or strong enough.", IsBad: true);
        }

        TargetResult nearest = sized.Targets.MaxBy(t => t.Ratio)!;
        string use = $"{nearest.Kind} of {nearest.Label}, {SizingModel.Percent(nearest.Ratio)} of its limit";
        int missed = sized.Targets.Count(t => !t.Met);
        return missed > 0
            ? new ReportAnswer(Asked, $"No, {Whole(missed)} of {Whole(sized.Targets.Count)} missed", $"Worst: {use}.", IsBad: true)
            : new ReportAnswer(Asked, sized.Targets.Count == 1 ? "Yes" : $"Yes, all {Whole(sized.Targets.Count)}", $"Nearest its limit: {use}.", IsBad: false);
    }

    internal static ReportAnswer OnMass(ShopPackage package, SizingModel sizing)
    {
        var display = new DisplayFormat(package.Cut.Sized.Model.Display);
        return new ReportAnswer("What does it weigh?", display.Mass(package.Totals.MassKg), $"Cut tubes, without filler. {sizing.Verdict}.", IsBad: false);
    }

    internal static ReportAnswer OnBuying(StockPlanModel stock)
    {
        const string Asked = "What do I buy?";
        if (stock.Bars == 0)
        {
            return new ReportAnswer(Asked, "Nothing", "The rack has it all.", IsBad: false);
        }

        bool sameLength = stock.Buy.All(l => string.Equals(l.BarLength, stock.Buy[0].BarLength, StringComparison.Ordinal));
        string lots = string.Join("; ", stock.Buy.Select(l =>
            $"{Whole(l.Bars)} of {l.Section} {l.Material}{(sameLength ? string.Empty : $", {l.BarLength} {stock.Head.LengthUnit}")}"));
        string cost = stock.Cost.Length > 0 ? $", {stock.Cost} in all" : string.Empty;
        return new ReportAnswer(Asked, $"{Whole(stock.Bars)} {(stock.Bars == 1 ? "bar" : "bars")}, {stock.Mass} {stock.Head.MassUnit}{cost}", $"{(sameLength ? $"{stock.Buy[0].BarLength} {stock.Head.LengthUnit} long: " : string.Empty)}{lots}.", IsBad: false);
    }

    private static string Whole(int count) => count.ToString(CultureInfo.InvariantCulture);
}

/// <summary>A tube of the frame.</summary>
/// <param name="Name">Of the tube.</param>
/// <param name="Mark">Of its part, with its hand.</param>
/// <param name="Group">Name of its group.</param>
/// <param name="Section">As a shop asks for it.</param>
/// <param name="CutLength">Long point to long point.</param>
/// <param name="Mass">Of the cut tube.</param>
/// <param name="Used">Share of its nearest limit, or of its yield where no target looks at single tubes; empty where neither is known.</param>
public sealed record ReportTube(string Name, string Mark, string Group, string Section, string CutLength, string Mass, string Used)
{
    internal static IReadOnlyList<ReportTube> Of(ShopPackage package, SceneJson scene)
    {
        SizedFrame sized = package.Cut.Sized;
        var display = new DisplayFormat(sized.Model.Display);
        string[] marks = PartMarks.NamesByTube(package);
        return [.. sized.Model.Tubes.Select((tube, t) => new ReportTube(
            tube.Name,
            marks[t],
            sized.Model.Groups[tube.Group].Name,
            display.Section(sized.ChosenFor(t)),
            display.MeasuredNumber(package.Cut.Tubes[t].CutLength),
            display.MassNumber(package.Cut.Tubes[t].MassKg),
            scene.UseOf(t) is { } use ? SizingModel.Percent(use) : string.Empty))];
    }
}

/// <summary>What the tubes of a group weigh.</summary>
/// <param name="Group">Its name.</param>
/// <param name="Mass">Of its cut tubes.</param>
/// <param name="Percent">Of the frame.</param>
/// <param name="Share">Of the heaviest group, 0 to 1, for drawing.</param>
public sealed record ReportMass(string Group, string Mass, string Percent, double Share)
{
    internal static IReadOnlyList<ReportMass> Of(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        var display = new DisplayFormat(model.Display);
        double[] masses = [.. model.Groups.Select((_, g) => package.Cut.Tubes.Where(t => model.Tubes[t.Tube].Group == g).Sum(t => t.MassKg))];
        double heaviest = masses.Max();
        return [.. Enumerable.Range(0, masses.Length).OrderByDescending(g => masses[g]).Select(g => new ReportMass(
            model.Groups[g].Name,
            display.MassNumber(masses[g]),
            SizingModel.Percent(masses[g] / package.Totals.MassKg),
            masses[g] / heaviest))];
    }
}

/// <summary>A fact about where the page comes from.</summary>
/// <param name="Name">What.</param>
/// <param name="Value">A text that people compare letter by letter.</param>
public sealed record ReportFact(string Name, string Value)
{
    internal static IReadOnlyList<ReportFact> Of(SizedFrame sized)
    {
        SpecIdentity spec = sized.Model.Spec;
        var facts = new List<ReportFact>
        {
            new("Spec", spec.FileName),
            new("SHA-256 of the spec", spec.Sha256),
        };
        if (sized.Model.Frozen is { } frozen)
        {
            facts.AddRange([new("Sizes frozen by", frozen.FileName), new("SHA-256 of that file", frozen.Sha256)]);
        }

        facts.AddRange(spec.Includes.Select(i => new ReportFact("Included", i.Path)));
        facts.AddRange(sized.Model.Stock.Select(s => new ReportFact("Stock list", $"{s.List} {s.Version}")));
        facts.Add(new("Made by", $"{ToolIdentity.Name} {ToolIdentity.Version}"));
        return facts;
    }
}
