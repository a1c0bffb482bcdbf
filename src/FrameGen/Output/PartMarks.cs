using FrameGen.Fabrication;

namespace FrameGen.Output;

/// <summary>Which part each tube is.</summary>
internal static class PartMarks
{
    /// <summary>The part's mark, by tube.</summary>
    public static string[] ByTube(ShopPackage package) => ByTube(package, p => p.Mark);

    /// <summary>The part's mark with its hand, by tube: what stands on the piece.</summary>
    public static string[] NamesByTube(ShopPackage package) => ByTube(package, p => p.Name);

    private static string[] ByTube(ShopPackage package, Func<Part, string> name)
    {
        string[] marks = new string[package.Cut.Tubes.Count];
        foreach (Part part in package.Parts)
        {
            foreach (int tube in part.Tubes)
            {
                marks[tube] = name(part);
            }
        }

        return marks;
    }
}
