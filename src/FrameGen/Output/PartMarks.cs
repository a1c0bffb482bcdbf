using FrameGen.Fabrication;

namespace FrameGen.Output;

/// <summary>Which part each tube is.</summary>
internal static class PartMarks
{
    /// <summary>The part's mark, by tube.</summary>
    public static string[] ByTube(ShopPackage package)
    {
        string[] marks = new string[package.Cut.Tubes.Count];
        foreach (Part part in package.Parts)
        {
            foreach (int tube in part.Tubes)
            {
                marks[tube] = part.Mark;
            }
        }

        return marks;
    }
}
