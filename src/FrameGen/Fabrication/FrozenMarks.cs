using FrameGen.Diagnostics;
using FrameGen.Model;

namespace FrameGen.Fabrication;

/// <summary>Holds a frame's parts against the marks of the pieces that were cut when its sizes were frozen.</summary>
internal static class FrozenMarks
{
    private const int MostNamed = 6;

    /// <summary>Warns of tubes that are another part now: pieces cut before don't fit the new papers.</summary>
    public static void Look(ShopPackage package, DiagnosticList diagnostics)
    {
        FrameModel model = package.Cut.Sized.Model;
        if (model.Frozen is not { Marks.Count: > 0 } frozen)
        {
            return;
        }

        var now = new Dictionary<string, string>(StringComparer.OrdinalIgnoreCase);
        foreach (Part part in package.Parts)
        {
            foreach (int tube in part.Tubes)
            {
                now[model.Tubes[tube].Name] = part.Name;
            }
        }

        string[] changed =
        [
            .. frozen.Marks
                .Where(m => !string.Equals(now.GetValueOrDefault(m.Tube), m.Mark, StringComparison.Ordinal))
                .Select(m => now.TryGetValue(m.Tube, out string? mark) ? $"{m.Tube} was {m.Mark} and is {mark}" : $"{m.Tube} ({m.Mark}) is gone"),
        ];
        if (changed.Length > 0)
        {
            string more = changed.Length > MostNamed ? $" and {changed.Length - MostNamed} more" : string.Empty;
            diagnostics.Warning(
                null,
                $"{frozen.FileName}: these pieces have another length or other ends than when the sizes were frozen: {string.Join(", ", changed.Take(MostNamed))}{more}; "
                + "pieces cut before don't fit the new papers");
        }
    }
}
