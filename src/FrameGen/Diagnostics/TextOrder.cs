namespace FrameGen.Diagnostics;

/// <summary>Puts diagnostics in the order in which an author reads the text.</summary>
internal static class TextOrder
{
    /// <summary>By file, line and column; what has no place comes first, what stands in an unknown file last; equal places as given.</summary>
    /// <param name="found">The diagnostics.</param>
    /// <param name="files">The files' names in their order.</param>
    public static IEnumerable<Diagnostic> Sort(IEnumerable<Diagnostic> found, IEnumerable<string> files)
    {
        var order = new Dictionary<string, int>(StringComparer.Ordinal);
        foreach (string file in files)
        {
            order.TryAdd(file, order.Count);
        }

        return found
            .OrderBy(d => d.At is { } at ? order.GetValueOrDefault(at.File, order.Count) : -1)
            .ThenBy(d => d.At?.Line)
            .ThenBy(d => d.At?.Column);
    }
}
