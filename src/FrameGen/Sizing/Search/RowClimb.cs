using FrameGen.Sizing.Program;

namespace FrameGen.Sizing.Search;

/// <summary>
/// A way up along rows: of all steps of one group to a heavier size the one that does most for the rows that a design breaks, for what it costs, until none is broken. No analysis
/// is needed: a design's own rows tell how far each size would bring it.
/// </summary>
internal static class RowClimb
{
    /// <summary>Steps until a design keeps the rows.</summary>
    /// <param name="space">The designs.</param>
    /// <param name="program">Where the variables stand.</param>
    /// <param name="rows">The rows.</param>
    /// <param name="design">Changed.</param>
    /// <param name="isBuildable">Whether a design can be made.</param>
    /// <returns>True where some step was taken.</returns>
    public static bool Run(DesignSpace space, ChoiceProgram program, IReadOnlyList<ProgramRow> rows, int[] design, Func<int[], bool> isBuildable)
    {
        bool moved = false;
        while (true)
        {
            double[] over = [.. rows.Select(row => Over(program, row, design))];
            if (!over.Any(o => o > 0) || !Step(space, program, rows, over, design, isBuildable))
            {
                return moved;
            }

            moved = true;
        }
    }

    private static double Over(ChoiceProgram program, ProgramRow row, int[] design)
    {
        double sum = -row.Limit;
        for (int g = 0; g < design.Length; g++)
        {
            sum += row[program.First(g) + design[g]];
        }

        return sum;
    }

    private static bool Step(
        DesignSpace space, ChoiceProgram program, IReadOnlyList<ProgramRow> rows, double[] over, int[] design, Func<int[], bool> isBuildable)
    {
        var steps = new List<(double Worth, int Group, int Option)>();
        for (int g = 0; g < design.Length; g++)
        {
            int first = program.First(g);
            for (int c = 0; c < space[g].Length; c++)
            {
                long units = space[g][c].Units - space[g][design[g]].Units;
                if (units <= 0)
                {
                    continue;
                }

                // What it takes off each broken row, as a share of what is to be taken off; what it adds to a row counts against it.
                double gain = 0;
                for (int r = 0; r < rows.Count; r++)
                {
                    double off = rows[r][first + design[g]] - rows[r][first + c];
                    gain += over[r] > 0 ? Math.Min(1, off / over[r]) : Math.Min(0, (off - over[r]) / Math.Max(1e-9, Math.Abs(rows[r].Limit)));
                }

                if (gain > 1e-9)
                {
                    steps.Add((gain / units, g, c));
                }
            }
        }

        steps.Sort((a, b) => a.Worth != b.Worth ? b.Worth.CompareTo(a.Worth) : a.Group != b.Group ? a.Group.CompareTo(b.Group) : a.Option.CompareTo(b.Option));
        foreach ((_, int group, int option) in steps)
        {
            int kept = design[group];
            design[group] = option;
            if (isBuildable(design))
            {
                return true;
            }

            design[group] = kept;
        }

        return false;
    }
}
