using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Program;

namespace FrameGen.Sizing.Search;

/// <summary>
/// Rows before the search for whole choices: the program with fractions gives a mixture, the design next to it is analysed, its rows are added, until the bound
/// stands. Each round costs one analysis and no branching; a row is valid whatever design it is made from.
/// </summary>
/// <param name="space">The designs.</param>
/// <param name="analysis">Turned to design after design.</param>
/// <param name="rows">The program.</param>
/// <param name="fits">Told of designs that can't be made; null where that does not matter.</param>
/// <param name="look">Adds the rows of the design that the analysis stands at.</param>
internal sealed class RootRows(DesignSpace space, DesignAnalysis analysis, SizingProgram rows, FitRows? fits, Action<int[]> look)
{
    private const int MostRounds = 100;
    private const int Patience = 6;
    private const double Gain = 1e-5;

    /// <summary>True once a design came up that some joint refused.</summary>
    public bool FitsRefused { get; private set; }

    /// <summary>Adds rows until the bound stands.</summary>
    /// <returns>The last design that can be made; null where none was met with.</returns>
    public int[]? Run()
    {
        ChoiceProgram program = rows.Program;
        var relaxation = new Relaxation(program);
        var all = OptionSet.All(program.Variables);
        int[]? last = null;
        (double stood, int since) = (0, 0);
        for (int round = 0; round < MostRounds && since < Patience; round++)
        {
            relaxation.Solve(all, [.. relaxation.Tight], long.MaxValue);
            if (relaxation.Bound == long.MaxValue || relaxation.Fractions.Count == 0)
            {
                return last;
            }

            (stood, since) = relaxation.Bound > stood * (1 + Gain) ? (relaxation.Bound, 0) : (stood, since + 1);
            int[] design = Nearest(relaxation.Fractions, round);
            analysis.Set(design);
            if (fits?.Look(design, analysis.Sections) == false)
            {
                FitsRefused = true;
            }
            else if (space.IsAllowed(design))
            {
                last = design;
                look(design);
            }
        }

        return last;
    }

    // The option with the largest share of every group; every second time the heaviest with a share worth the name, so that both sides of the limits are seen.
    private int[] Nearest(List<(int Variable, double Value)> fractions, int round)
    {
        const double WorthTheName = 0.15;
        var design = new int[space.Groups];
        var best = new double[space.Groups];
        foreach ((int variable, double value) in fractions)
        {
            int group = rows.Program.SetOf[variable];
            if (group >= space.Groups)
            {
                continue;
            }

            bool takes = round % 2 == 0 ? value > best[group] : value > WorthTheName || value > best[group];
            if (takes)
            {
                (design[group], best[group]) = (variable - rows.Program.First(group), round % 2 == 0 ? value : Math.Max(best[group], value));
            }
        }

        return design;
    }
}
