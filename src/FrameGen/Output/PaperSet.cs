using FrameGen.Fabrication;
using FrameGen.Output.Report;

namespace FrameGen.Output;

/// <summary>Every file of an output folder.</summary>
public static class PaperSet
{
    /// <summary>Lays out all papers of a package, the manifest last.</summary>
    /// <exception cref="SelfCheckException">The outputs disagree with each other: a fault of the program.</exception>
    /// <param name="package">The frame's papers.</param>
    /// <param name="options">What was asked for beside the spec; null for the default.</param>
    public static IReadOnlyList<OutputFile> Create(ShopPackage package, PaperOptions? options = null)
    {
        var (copies, includes) = SpecCopies.Make(package.Cut.Sized.Model.Spec);
        WeldList welds = WeldPlanner.Plan(package.Cut);
        var cutList = CutListModel.From(package);
        var stock = StockPlanModel.From(package);
        var setup = SetupModel.From(package);
        var seams = WeldsModel.From(package, welds);
        var report = ReportModel.From(package, cutList, stock, setup, seams);
        var files = new List<OutputFile>
        {
            OutputFile.FromText("report.html", TextTemplate.Render("report.html", report)),
            OutputFile.FromText("cut-list.csv", CutListCsv.Write(package)),
            OutputFile.FromText("cut-list.md", TextTemplate.Render("cut-list.md", cutList)),
            OutputFile.FromText("ends.csv", EndsCsv.Write(package)),
            OutputFile.FromText("stock-plan.csv", StockPlanCsv.Write(package)),
            OutputFile.FromText("stock-plan.md", TextTemplate.Render("stock-plan.md", stock)),
            OutputFile.FromText("setup.csv", SetupCsv.Write(package)),
            OutputFile.FromText("setup.md", TextTemplate.Render("setup.md", setup)),
            OutputFile.FromText("welds.csv", WeldsCsv.Write(package.Cut, welds)),
            OutputFile.FromText("welds.md", TextTemplate.Render("welds.md", seams)),
            new("frame.json", FrameJson.Write(package)),
        };
        if (package.Cut.Sized.Model.Tubes.Any(t => t.Bent is not null))
        {
            files.Add(OutputFile.FromText("bends.csv", BendsCsv.Write(package)));
            files.Add(OutputFile.FromText("bends.md", TextTemplate.Render("bends.md", BendsModel.From(package))));
        }

        files.AddRange(ShapeFiles.Create(package, options ?? PaperOptions.Default));
        files.AddRange(copies);
        SelfCheck.Totals(package);
        SelfCheck.Stock(package);
        SelfCheck.Welds(package, welds);
        SelfCheck.Equilibrium(package.Cut.Sized);
        files.Add(new OutputFile(Manifest.FileName, (Manifest.Of(package.Cut.Sized.Model.Spec, includes, files) with { Options = options ?? PaperOptions.Default }).Write()));
        return files;
    }
}
