using FrameGen.Spec;

namespace FrameGen.Output.Folders;

/// <summary>The copies of a spec and its included files in an output folder, given to the reader in the order it asks.</summary>
/// <remarks>
/// A reader asks once for each file, in the order in which the manifest lists them. Its paths are of no use here: the copies
/// all lie side by side. Only the pinned sizes are known by their name.
/// </remarks>
internal sealed class SpecInFolder(string folder, Manifest manifest)
{
    private readonly Queue<string> _files = new(Sources(manifest));
    private readonly string _frozen = FrozenSpec.PathBeside(manifest.SpecFile);

    /// <summary>Where the copies are in the folder: the root, then the included files, each once, then the pinned sizes.</summary>
    public static IEnumerable<string> Files(Manifest manifest) =>
        manifest.Frozen is null ? Sources(manifest) : Sources(manifest).Append(manifest.Frozen);

    /// <summary>The bytes of the next file, or of the pinned sizes; null where the manifest lists no more.</summary>
    public byte[]? Content(string path)
    {
        string? file = string.Equals(path, _frozen, StringComparison.Ordinal) ? manifest.Frozen : _files.TryDequeue(out string? next) ? next : null;
        return file is null ? null : File.ReadAllBytes(Path.Join(folder, file));
    }

    private static IEnumerable<string> Sources(Manifest manifest) =>
        manifest.Includes.Select(i => i.File).Prepend(SpecCopies.Folder + manifest.SpecFile).Distinct(StringComparer.Ordinal);
}
