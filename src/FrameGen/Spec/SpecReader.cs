using FrameGen.Diagnostics;
using FrameGen.Spec.Forms;
using FrameGen.Spec.Keys;

namespace FrameGen.Spec;

/// <summary>Reads a spec's text and the files it includes.</summary>
public static class SpecReader
{
    /// <summary>Reads a spec from disk.</summary>
    /// <param name="path">The root file, as the user named it.</param>
    /// <param name="diagnostics">Everything wrong with it, each with its place, in the order of the text.</param>
    /// <returns>The spec, or null when an error was reported.</returns>
    /// <exception cref="IOException">The root file can't be read.</exception>
    public static FrameSpec? Read(string path, DiagnosticList diagnostics) => Read(path, SpecFiles.FromDisk, diagnostics);

    /// <summary>Reads a spec from wherever its files are.</summary>
    /// <param name="path">The root file.</param>
    /// <param name="content">
    /// Gives the bytes of a file by its path (an included file's is relative to the same place as the root's), or null where
    /// there is none. Of a file over 1 MiB it need not give more than that and a byte. It is asked for pinned sizes beside the root too.
    /// </param>
    /// <param name="diagnostics">Everything wrong with it, each with its place, in the order of the text.</param>
    /// <returns>The spec, or null when an error was reported.</returns>
    /// <exception cref="FileNotFoundException">There is no root file.</exception>
    /// <exception cref="IOException">The root file can't be read.</exception>
    public static FrameSpec? Read(string path, Func<string, byte[]?> content, DiagnosticList diagnostics)
    {
        ArgumentNullException.ThrowIfNull(path);
        ArgumentNullException.ThrowIfNull(content);
        ArgumentNullException.ThrowIfNull(diagnostics);
        byte[] bytes = content(path) ?? throw new FileNotFoundException($"There is no file '{path}'.", path);
        var files = new IncludedFiles(content);
        MapReading? root = files.ReadRoot(path, bytes);
        FrozenSpec? frozen = files.ReadFrozen(path);
        files.Problems.TellInOrder([.. files.Files.Select(file => file.Path), FrozenSpec.PathBeside(path)], diagnostics);
        return root is { IsSound: true } && files.Problems.Count == 0 ? Spec(root, files) with { Frozen = frozen } : null;
    }

    private static FrameSpec Spec(MapReading root, IncludedFiles files) => new(
        files.Files,
        files.Includes,
        root.Find(FileKeys.Title) ?? string.Empty,
        root.Find(FileKeys.Revision) ?? string.Empty,
        root.Find(FileKeys.Notes) ?? string.Empty,
        root.Find(FileKeys.Display) ?? DisplaySpec.Metric,
        files.Parameters,
        root.Find(FileKeys.Mirror),
        root.Get(FileKeys.Nodes),
        root.Get(FileKeys.Tubes),
        root.Get(FileKeys.Groups),
        files.Materials,
        files.Stock,
        root.Items(FileKeys.Have),
        root.Items(FileKeys.Supports),
        root.Items(FileKeys.Masses),
        root.Items(FileKeys.Cases),
        root.Items(FileKeys.Targets),
        root.Items(FileKeys.Joints),
        root.Find(FileKeys.Fabrication) ?? new FabricationSpec(null, null, null, null, null, null, null, null, null, null))
    {
        Measured = root.Items(FileKeys.Measured),
        Sizing = root.Find(FileKeys.Sizing) ?? SizingSpec.Default,
    };
}
