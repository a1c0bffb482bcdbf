using System.Globalization;

namespace FrameGen.Output.Folders;

/// <summary>The folder beside an output folder where a user's files are moved to, so that a build never deletes one.</summary>
/// <param name="folder">Its path: NAME.kept.</param>
internal sealed class KeptFiles(string folder)
{
    /// <summary>Its path.</summary>
    public string Folder => folder;

    /// <summary>Moves a file or a link here, under its own path; a number is added where that is taken.</summary>
    /// <param name="source">The folder it lies in.</param>
    /// <param name="path">Its path in that folder, with <c>/</c> between names.</param>
    /// <returns>Where it is now.</returns>
    /// <exception cref="IOException">It can't be moved, or a folder on the way is a link.</exception>
    public string Take(string source, string path)
    {
        string[] names = path.Split('/');
        string into = folder;
        MakeFolder(into);
        foreach (string name in names[..^1])
        {
            into = Path.Join(into, name);
            MakeFolder(into);
        }

        string from = Path.Join(source, path);
        string to = FreePath(into, names[^1]);
        if (Directory.Exists(from))
        {
            Directory.Move(from, to); // a link to a folder: the link moves, not what it points to
        }
        else
        {
            File.Move(from, to, overwrite: false);
        }

        return to;
    }

    private static void MakeFolder(string path)
    {
        if (new DirectoryInfo(path).LinkTarget is not null)
        {
            throw new IOException($"{path} is a link; files are kept in real folders only");
        }

        Directory.CreateDirectory(path);
    }

    private static string FreePath(string folder, string name)
    {
        string free = Path.Join(folder, name);
        for (int number = 2; Path.Exists(free) || new FileInfo(free).LinkTarget is not null; number++)
        {
            string numbered = string.Create(
                CultureInfo.InvariantCulture, $"{Path.GetFileNameWithoutExtension(name)}-{number}{Path.GetExtension(name)}");
            free = Path.Join(folder, numbered);
        }

        return free;
    }
}
