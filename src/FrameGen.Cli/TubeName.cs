using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Cli;

/// <summary>The tube that a command line names.</summary>
internal static class TubeName
{
    private const int MostListed = 20;

    /// <summary>Index of the tube; names are compared without regard to case.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="spec">Its file, for the message.</param>
    /// <param name="name">As written; null where none was.</param>
    /// <exception cref="WrongInputException">No tube was named, or there is none of that name.</exception>
    public static int Find(FrameModel model, string spec, string? name)
    {
        string[] names = [.. model.Tubes.Select(t => t.Name)];
        if (name is null)
        {
            throw new WrongInputException($"which tube of {spec}? {Has(names)}");
        }

        int tube = Array.FindIndex(names, n => string.Equals(n, name, StringComparison.OrdinalIgnoreCase));
        if (tube >= 0)
        {
            return tube;
        }

        string suggestion = NearestName.Suggest(name, names);
        throw new WrongInputException($"{spec} has no tube {name}{(suggestion.Length > 0 ? suggestion : $". {Has(names)}")}");
    }

    private static string Has(string[] names) => $"It has {string.Join(", ", names.Take(MostListed))}{(names.Length > MostListed ? ", ..." : string.Empty)}";
}
