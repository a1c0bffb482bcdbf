using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Output.Drawings;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen;

/// <summary>What a long job is doing.</summary>
/// <param name="Doing">In words: <c>choosing sections</c>.</param>
/// <param name="Done">Steps done; 0 where they are not counted.</param>
/// <param name="Total">Steps in all; 0 where they are not counted.</param>
public readonly record struct PipelineProgress(string Doing, long Done, long Total);

/// <summary>The way from a spec to its papers, one stage after the other; each makes its record from the one before.</summary>
/// <param name="diagnostics">What the stages have to say. A stage that reports an error returns null, and the way ends there.</param>
/// <param name="progress">Told when a stage begins, and now and then within it; may be null.</param>
public sealed class FramePipeline(DiagnosticList diagnostics, IProgress<PipelineProgress>? progress = null)
{
    /// <summary>Reads a spec.</summary>
    /// <exception cref="IOException">The file can't be read.</exception>
    public FrameSpec? Read(string path) => At("reading the spec", () => SpecReader.Read(path, diagnostics));

    /// <summary>Reads a spec from wherever its files are.</summary>
    /// <param name="path">The root file.</param>
    /// <param name="content">Gives the bytes of a file by its path, or null where there is none.</param>
    public FrameSpec? Read(string path, Func<string, byte[]?> content) =>
        At("reading the spec", () => SpecReader.Read(path, content, diagnostics));

    /// <summary>Reads a spec as if no sizes were pinned beside it.</summary>
    /// <exception cref="IOException">The file can't be read.</exception>
    public FrameSpec? ReadUnfrozen(string path)
    {
        string frozen = FrozenSpec.PathBeside(path);
        return Read(path, file => string.Equals(file, frozen, StringComparison.Ordinal) ? null : SpecFiles.FromDisk(file));
    }

    /// <summary>Gives the spec its meaning.</summary>
    /// <param name="spec">As read.</param>
    /// <param name="newGroupsChoose">True where groups without a size may choose one beside others whose sizes are pinned.</param>
    public FrameModel? Resolve(FrameSpec? spec, bool newGroupsChoose = false) =>
        spec is null ? null : At("working out the frame", () => ModelResolver.Resolve(spec, newGroupsChoose, diagnostics));

    /// <summary>Chooses the sections.</summary>
    public SizedFrame? Size(FrameModel? model) =>
        model is null ? null : At("choosing sections", () => FrozenSizing.Size(model, diagnostics, Designs()));

    /// <summary>True where the ends of a frame's tubes can be cut: of straight tubes of any shape, and of bent round ones so far.</summary>
    public static bool CanCope(SizedFrame sized) => !BentOnesNotRound(sized).Any();

    /// <summary>Cuts the tube ends.</summary>
    public CutFrame? Cope(SizedFrame? sized)
    {
        if (sized is null)
        {
            return null;
        }

        if (!CanCope(sized))
        {
            foreach (Tube tube in BentOnesNotRound(sized).Where(t => t.Original is null))
            {
                diagnostics.Error(tube.At, $"not supported yet: papers of bent tubes that are not round, and tube {tube.Name} of {sized.Sections[tube.Group].Name} is bent (`check` and `size` work with it)");
            }

            return null;
        }

        return At("cutting tube ends", () => EndCoper.Cope(sized, diagnostics));
    }

    /// <summary>Plans the shop's work.</summary>
    public ShopPackage? Plan(CutFrame? cut) =>
        cut is null ? null : At("planning the parts", () =>
        {
            ShopPackage? package = ShopPlanner.Plan(cut, diagnostics);
            if (package is not null)
            {
                FrozenMarks.Look(package, diagnostics);
            }

            return package;
        });

    /// <summary>Lays out every file.</summary>
    /// <exception cref="SelfCheckException">The outputs disagree with each other: a fault of the program.</exception>
    /// <param name="package">The shop's work.</param>
    /// <param name="options">What was asked for beside the spec; null for the default.</param>
    public IReadOnlyList<OutputFile>? Papers(ShopPackage? package, PaperOptions? options = null) =>
        package is null ? null : At("drawing the papers", () =>
        {
            NoteUnprinted(package.Cut.Sized.Model);
            return PaperSet.Create(package, options);
        });

    /// <summary>The whole way from a spec that has been read.</summary>
    /// <param name="spec">The spec.</param>
    /// <param name="options">What was asked for beside it; null for the default.</param>
    /// <returns>Every file of the output folder, or null when an error was reported.</returns>
    public IReadOnlyList<OutputFile>? Build(FrameSpec? spec, PaperOptions? options = null) =>
        Papers(Plan(Cope(Size(Resolve(spec)))), options);

    private static IEnumerable<Tube> BentOnesNotRound(SizedFrame sized) =>
        sized.Model.Tubes.Where(t => t.Bent is not null && sized.Sections[t.Group] is not (RoundTube or Rod));

    private void NoteUnprinted(FrameModel model)
    {
        const int AtMost = 5;
        IReadOnlyList<Rune> unprinted = TemplatesPdf.Unprinted(model);
        if (unprinted.Count > 0)
        {
            string letters = string.Join(' ', unprinted.Take(AtMost)) + (unprinted.Count > AtMost ? " ..." : string.Empty);
            diagnostics.Note(null, $"templates.pdf prints ? for what its font lacks of the title and revision: {letters}; all other papers keep it");
        }
    }

    private T? At<T>(string doing, Func<T?> stage)
        where T : class
    {
        progress?.Report(new PipelineProgress(doing, 0, 0));
        return stage();
    }

    private DesignProgress? Designs() => progress is null ? null : new DesignProgress(progress);

    private sealed class DesignProgress(IProgress<PipelineProgress> progress) : IProgress<SizingProgress>
    {
        public void Report(SizingProgress value) =>
            progress.Report(new PipelineProgress("choosing sections", value.Done, value.Total));
    }
}
