namespace FrameGen.Spec;

/// <summary>
/// Goes through things that need one another, each after those it needs. Depth first with a list of its own: a chain of ten
/// thousand must not end in a stack overflow.
/// </summary>
internal static class DependencyOrder
{
    private enum Progress : byte
    {
        Untouched,
        Open,
        Done,
    }

    /// <summary>Visits every thing once, in the order of their numbers as far as what they need allows.</summary>
    /// <param name="needs">By thing: the numbers of those it needs, in the order in which they are looked at; null for one that is unknown.</param>
    /// <param name="visit">Called for each thing when what it needs has been visited, but for what closes a circle.</param>
    /// <param name="circle">Called for each circle found: the way from a thing round to itself, and which need closes it.</param>
    public static void Visit(IReadOnlyList<IReadOnlyList<int?>> needs, Action<int> visit, Action<IReadOnlyList<int>, int> circle)
    {
        var progress = new Progress[needs.Count];
        var way = new List<(int Thing, int Next)>();
        for (int first = 0; first < needs.Count; first++)
        {
            if (progress[first] == Progress.Untouched)
            {
                progress[first] = Progress.Open;
                way.Add((first, 0));
            }

            while (way.Count > 0)
            {
                (int thing, int next) = way[^1];
                if (next == needs[thing].Count)
                {
                    visit(thing);
                    progress[thing] = Progress.Done;
                    way.RemoveAt(way.Count - 1);
                    continue;
                }

                way[^1] = (thing, next + 1);
                if (needs[thing][next] is not { } needed)
                {
                    continue;
                }

                if (progress[needed] == Progress.Open)
                {
                    int start = way.FindIndex(step => step.Thing == needed);
                    circle([.. way[start..].Select(step => step.Thing), needed], next);
                }
                else if (progress[needed] == Progress.Untouched)
                {
                    progress[needed] = Progress.Open;
                    way.Add((needed, 0));
                }
            }
        }
    }
}
