using System.Globalization;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Fabrication;

/// <summary>Short names of parts, which are file names too.</summary>
internal static class Marks
{
    /// <summary>The tubes' names, by tube; one that can't be a file name of its own gets a number.</summary>
    public static IReadOnlyList<string> Of(FrameModel model)
    {
        var used = new HashSet<string>(model.Tubes.Select(t => t.Name), StringComparer.OrdinalIgnoreCase);
        var marks = new List<string>(model.Tubes.Count);
        foreach (Tube tube in model.Tubes)
        {
            string mark = tube.Name;
            if (IsTaken(mark))
            {
                for (int number = 1; !used.Add(mark); number++)
                {
                    mark = string.Create(CultureInfo.InvariantCulture, $"{tube.Name}-{number}");
                }
            }

            marks.Add(mark);
        }

        return marks;
    }

    // frame.stl is the whole frame's; names of Windows' devices can't be files, and a mirror's ending can make one of them.
    private static bool IsTaken(string mark) =>
        string.Equals(mark, "frame", StringComparison.OrdinalIgnoreCase) || SpecName.IsDeviceName(mark);
}
