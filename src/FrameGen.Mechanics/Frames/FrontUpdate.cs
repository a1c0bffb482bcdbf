namespace FrameGen.Mechanics.Frames;

/// <summary>How an earlier front reaches into a later one's columns.</summary>
/// <param name="Source">The earlier front.</param>
/// <param name="Start">The first of its rows below, in nodes, that is an own column of the later one.</param>
/// <param name="End">One past the last of these.</param>
/// <param name="Runs">Rows below from <paramref name="Start"/> on, by runs that follow one another in the later front too.</param>
internal sealed record FrontUpdate(Front Source, int Start, int End, FrontUpdate.Run[] Runs)
{
    /// <summary>Pairs up every front with the earlier ones that reach into it.</summary>
    /// <param name="fronts">Fronts, children before parents.</param>
    /// <param name="frontOf">Front of each column.</param>
    public static void Connect(Front[] fronts, int[] frontOf)
    {
        // The place of a column in the front at hand, in nodes; what it holds for other columns is never asked.
        int[] place = new int[frontOf.Length];
        int[] next = new int[fronts.Length];
        var waiting = new List<int>[fronts.Length];
        var runs = new List<Run>();
        for (int s = 0; s < fronts.Length; s++)
        {
            Front front = fronts[s];
            int end = front.First + front.Columns;
            for (int k = front.First; k < end; k++)
            {
                place[k] = k - front.First;
            }

            for (int a = 0; a < front.Below.Length; a++)
            {
                place[front.Below[a]] = front.Columns + a;
            }

            List<int> sources = waiting[s] ?? [];
            sources.Sort();
            front.Updates = new FrontUpdate[sources.Count];
            for (int u = 0; u < sources.Count; u++)
            {
                int source = sources[u];
                int[] below = fronts[source].Below;
                int start = next[source];
                int stop = start;
                while (stop < below.Length && below[stop] < end)
                {
                    stop++;
                }

                front.Updates[u] = new FrontUpdate(fronts[source], start, stop, RunsOf(below, start, place, runs));
                next[source] = stop;
                Wait(source);
            }

            Wait(s);
        }

        void Wait(int source)
        {
            if (next[source] < fronts[source].Below.Length)
            {
                (waiting[frontOf[fronts[source].Below[next[source]]]] ??= []).Add(source);
            }
        }
    }

    private static Run[] RunsOf(int[] below, int start, int[] place, List<Run> runs)
    {
        runs.Clear();
        for (int a = start; a < below.Length; a++)
        {
            int row = SymbolicFactor.Six * place[below[a]];
            if (runs.Count > 0 && runs[^1] is var last && last.Row + (SymbolicFactor.Six * (a - last.Start)) == row)
            {
                runs[^1] = last with { End = a + 1 };
            }
            else
            {
                runs.Add(new Run(a, a + 1, row));
            }
        }

        return [.. runs];
    }

    /// <summary>Rows below of the earlier front, in nodes, from Start to End, that stand in the later one from Row (in freedoms) on.</summary>
    internal readonly record struct Run(int Start, int End, int Row);
}
