using FrameGen.Output.Folders;
using FrameGen.Spec;

namespace FrameGen.Cli;

/// <summary>The spec named on the command line.</summary>
internal static class SpecFile
{
    /// <summary>Refuses what can't be a spec before any work begins.</summary>
    /// <exception cref="WrongInputException">There is no such file, or it is a folder.</exception>
    public static void Require(string path)
    {
        if (Directory.Exists(path))
        {
            throw new WrongInputException($"{path} is a folder; name a spec file in it");
        }

        if (FrozenSpec.IsNamedSo(path))
        {
            throw new WrongInputException($"{path} holds the sizes of a frame, not the frame; name the spec that it lies beside");
        }

        if (!File.Exists(path))
        {
            throw new WrongInputException($"there is no file {path}; name a spec, for instance specs/NAME.yaml");
        }
    }

    /// <summary>The folder that a spec's papers go to: the one asked for, or out/NAME.</summary>
    /// <exception cref="WrongInputException">The spec's name gives no folder's name, or the folder holds the spec.</exception>
    /// <exception cref="OutputRefusedException">The place can't be an output folder.</exception>
    public static (string Shown, OutputFolder Folder) Output(string spec, string? asked)
    {
        string name = Path.GetFileNameWithoutExtension(spec);
        if (asked is null && name.Trim('.').Length == 0)
        {
            throw new WrongInputException($"{spec} gives the output folder no name; name one with -o FOLDER");
        }

        if (asked is { Length: 0 })
        {
            throw new WrongInputException("-o needs the name of a folder");
        }

        string shown = asked ?? $"out/{name}";
        var folder = new OutputFolder(shown);
        string below = Path.GetRelativePath(folder.FullPath, Path.GetFullPath(spec));
        bool holdsSpec = !Path.IsPathRooted(below) && below.Split(Path.DirectorySeparatorChar)[0] is not "..";
        return holdsSpec
            ? throw new WrongInputException($"the output folder {shown} holds the spec {spec} itself; name another folder with -o")
            : (shown, folder);
    }
}
