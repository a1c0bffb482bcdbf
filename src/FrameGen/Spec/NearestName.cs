namespace FrameGen.Spec;

/// <summary>Finds what a misspelt name was probably meant to be.</summary>
internal static class NearestName
{
    /// <summary>The known name with the fewest slips of the pen (a letter too many, too few, wrong, or two swapped).</summary>
    /// <param name="name">As written.</param>
    /// <param name="known">All names that would be right; of equally near ones the first is taken.</param>
    /// <returns>The nearest name, or null where nothing is near: about one slip in three letters, no more than four.</returns>
    public static string? Among(string name, IEnumerable<string> known)
    {
        string? nearest = null;
        int fewest = Math.Clamp((name.Length + 2) / 3, 1, 4) + 1;
        foreach (string candidate in known)
        {
            // Names can't be nearer than the difference of their lengths: this skips most of a long list.
            if (Math.Abs(candidate.Length - name.Length) >= fewest)
            {
                continue;
            }

            int slips = Slips(name, candidate);
            if (slips < fewest && slips < Math.Max(name.Length, candidate.Length))
            {
                (nearest, fewest) = (candidate, slips);
            }
        }

        return nearest;
    }

    /// <summary>A message's tail: <c>; did you mean 'rail-l'?</c>, or nothing.</summary>
    public static string Suggest(string name, IEnumerable<string> known) =>
        Among(name, known) is { } nearest ? $"; did you mean '{nearest}'?" : string.Empty;

    /// <summary>Optimal string alignment distance, letters compared without regard to case.</summary>
    private static int Slips(string a, string b)
    {
        int width = b.Length + 1;
        int[] beforeLast = new int[width];
        int[] last = new int[width];
        int[] row = new int[width];
        for (int j = 0; j < width; j++)
        {
            last[j] = j;
        }

        for (int i = 1; i <= a.Length; i++)
        {
            row[0] = i;
            for (int j = 1; j < width; j++)
            {
                int cost = Same(a[i - 1], b[j - 1]) ? 0 : 1;
                int slips = Math.Min(Math.Min(last[j] + 1, row[j - 1] + 1), last[j - 1] + cost);
                if (i > 1 && j > 1 && Same(a[i - 1], b[j - 2]) && Same(a[i - 2], b[j - 1]))
                {
                    slips = Math.Min(slips, beforeLast[j - 2] + 1);
                }

                row[j] = slips;
            }

            (beforeLast, last, row) = (last, row, beforeLast);
        }

        return last[width - 1];
    }

    private static bool Same(char a, char b) => char.ToLowerInvariant(a) == char.ToLowerInvariant(b);
}
