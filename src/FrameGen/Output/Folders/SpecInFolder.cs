namespace FrameGen.Output.Folders;

/// <summary>The copies of a spec and its included files in an output folder, given to the reader in the order it asks.</summary>
/// <remarks>
/// A reader asks once for each file, in the order in which the manifest lists them. Its paths are of no use here: the copies
/// all lie side by side.
/// </remarks>
internal sealed class SpecInFolder(string folder, Manifest manifest)
{
    private readonly Queue<string> _files = new(Files(manifest));

    /// <summary>Where the copies are in the folder: the root, then the included files, each once.</summary>
    public static IEnumerable<string> Files(Manifest manifest) =>
        manifest.Includes.Select(i => i.File).Prepend($"spec/{manifest.SpecFile}").Distinct(StringComparer.Ordinal);

    /// <summary>The bytes of the next file; null where the manifest lists no more.</summary>
    public byte[]? Content(string path) => _files.TryDequeue(out string? file) ? File.ReadAllBytes(Path.Join(folder, file)) : null;
}
