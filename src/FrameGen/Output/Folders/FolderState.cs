using System.Security.Cryptography;

namespace FrameGen.Output.Folders;

/// <summary>What lies in an output folder, held against its manifest. Links are not followed.</summary>
/// <param name="Manifest">Null where there is none, or none that can be read.</param>
/// <param name="Known">Paths of files that are as the manifest says, and of the manifest itself.</param>
/// <param name="Changed">Paths of files whose bytes are not those of the manifest; the manifest's own where it can't be read.</param>
/// <param name="Missing">Paths of the manifest that are not there.</param>
/// <param name="Extra">Paths that no build wrote.</param>
internal sealed record FolderState(
    Manifest? Manifest,
    IReadOnlyList<string> Known,
    IReadOnlyList<string> Changed,
    IReadOnlyList<string> Missing,
    IReadOnlyList<string> Extra)
{
    private static readonly string HashOfNothing = Manifest.Hash([]);

    private static readonly EnumerationOptions Everything = new() { AttributesToSkip = FileAttributes.None, IgnoreInaccessible = false };

    /// <summary>Files that are not a build's own any more: those a build must not delete.</summary>
    public IReadOnlyList<string> Foreign => [.. Changed, .. Extra];

    /// <summary>Looks at every file of a folder.</summary>
    /// <exception cref="IOException">It can't be read.</exception>
    /// <exception cref="UnauthorizedAccessException">It can't be read.</exception>
    public static FolderState Examine(string folder)
    {
        Manifest? manifest = ReadManifest(folder);
        var expected = new Dictionary<string, string>(StringComparer.Ordinal);
        foreach (ManifestEntry entry in manifest?.Files ?? [])
        {
            expected[entry.Path] = entry.Sha256;
        }

        List<string> found = [.. Files(new DirectoryInfo(folder), string.Empty).Order(StringComparer.Ordinal)];
        var known = new List<string>();
        var changed = new List<string>();
        var extra = new List<string>();
        foreach (string path in found)
        {
            List<string> list = (path, expected.TryGetValue(path, out string? hash)) switch
            {
                (Manifest.FileName, _) => manifest is null ? changed : known,
                (_, false) => extra,
                _ => HasHash(Path.Join(folder, path), hash!) ? known : changed,
            };
            list.Add(path);
        }

        var there = new HashSet<string>(found, StringComparer.Ordinal);
        List<string> missing = [.. expected.Keys.Where(p => !there.Contains(p)).Order(StringComparer.Ordinal)];
        if (!there.Contains(Manifest.FileName))
        {
            missing.Add(Manifest.FileName);
        }

        return new FolderState(manifest, known, changed, missing, extra);
    }

    private static Manifest? ReadManifest(string folder)
    {
        var file = new FileInfo(Path.Join(folder, Manifest.FileName));
        return file.Exists && file.LinkTarget is null ? Manifest.Read(File.ReadAllBytes(file.FullName)) : null;
    }

    private static IEnumerable<string> Files(DirectoryInfo folder, string prefix)
    {
        foreach (FileSystemInfo entry in folder.EnumerateFileSystemInfos("*", Everything))
        {
            if (entry is DirectoryInfo inner && inner.LinkTarget is null)
            {
                foreach (string path in Files(inner, $"{prefix}{entry.Name}/"))
                {
                    yield return path;
                }
            }
            else
            {
                yield return prefix + entry.Name;
            }
        }
    }

    private static bool HasHash(string path, string hash)
    {
        var file = new FileInfo(path);
        if (file.LinkTarget is not null)
        {
            return false;
        }

        if (file.Length == 0)
        {
            // Pipes and devices have no length; opening one could wait for ever.
            return string.Equals(hash, HashOfNothing, StringComparison.Ordinal);
        }

        using FileStream stream = File.OpenRead(path);
        return string.Equals(Convert.ToHexStringLower(SHA256.HashData(stream)), hash, StringComparison.Ordinal);
    }
}
