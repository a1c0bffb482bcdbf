using System.Globalization;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Output;

/// <summary>Copies of the spec and of what it includes, as read, so that a folder can be rebuilt from itself.</summary>
internal static class SpecCopies
{
    /// <summary>Where the copies are in an output folder.</summary>
    public const string Folder = "spec/";

    /// <summary>Makes the copies, the root first, under their own file names; a second one of the same name gets a number.</summary>
    /// <returns>The copies, by file of the spec, and where each included path is now, in the order of the files.</returns>
    public static (IReadOnlyList<OutputFile> Copies, IReadOnlyList<(string Path, string File)> Includes) Make(SpecIdentity spec)
    {
        // Without regard to case, so that the folder can be copied to any file system.
        var taken = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        var copies = new List<OutputFile>(spec.Files.Count);

        // Read by its name, unlike included files: no other copy may take it.
        string frozen = FrozenSpec.PathBeside(spec.FileName);
        if (spec.Frozen is not null)
        {
            taken.Add(frozen);
        }

        foreach (SourceFile file in spec.Files)
        {
            string name = FreeName(copies.Count == 0 ? spec.FileName : SafeName(file.Path), taken);
            taken.Add(name);
            copies.Add(new OutputFile(Folder + name, file.Bytes));
        }

        (string, string)[] includes = [.. spec.Includes.OrderBy(i => i.File).Select(i => (i.Path, copies[i.File].Path))];
        if (spec.Frozen is { } sizes)
        {
            copies.Add(new OutputFile(Folder + frozen, sizes.Bytes));
        }

        return (copies, includes);
    }

    private static string SafeName(string path)
    {
        string name = path[(path.LastIndexOfAny(['/', '\\']) + 1)..];
        return name is "" or "." or ".." ? "included.yaml" : name;
    }

    private static string FreeName(string name, HashSet<string> taken)
    {
        string free = name;
        for (int number = 2; taken.Contains(free); number++)
        {
            free = string.Create(
                CultureInfo.InvariantCulture, $"{Path.GetFileNameWithoutExtension(name)}-{number}{Path.GetExtension(name)}");
        }

        return free;
    }
}
