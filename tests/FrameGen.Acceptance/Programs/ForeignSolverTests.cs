using System.Globalization;
using System.Text;
using FrameGen.Sizing.Program;
using FrameGen.Tests.Sizing;
using Xunit;

namespace FrameGen.Acceptance.Programs;

/// <summary>The integer program against two solvers that this project did not write: the same least cost of the same program, read from a file in the LP format.</summary>
public sealed class ForeignSolverTests
{
    // Sets, options, rows: from small to middling.
    public static TheoryData<int, int, int, int> Programs => new()
    {
        { 11, 5, 8, 3 }, { 12, 8, 10, 6 }, { 13, 10, 20, 4 }, { 14, 12, 12, 3 },
    };

    [Theory]
    [MemberData(nameof(Programs))]
    public void Cbc_finds_the_same_optimum(int seed, int sets, int options, int rows)
    {
        ForeignProgram cbc = ForeignProgram.Find("cbc");
        ChoiceProgram program = RandomProgram.Make(seed, sets, options, rows, pairs: 3);
        using var folder = new ScratchFolder();
        string file = folder.Write("program.lp", LpText(program));
        cbc.Run(file, "-ratioGap", "0", "-allowableGap", "0", "-solve", "-solution", folder["out.txt"]);
        string first = File.ReadLines(folder["out.txt"]).First();
        Compare(program, first.Contains("nfeasible", StringComparison.Ordinal) ? null : ReadChoice(program, File.ReadLines(folder["out.txt"]).Skip(1)));
    }

    [Theory]
    [MemberData(nameof(Programs))]
    public void Glpk_finds_the_same_optimum(int seed, int sets, int options, int rows)
    {
        if (sets > 12)
        {
            // Its branch and bound takes minutes for the large ones.
            return;
        }

        ForeignProgram glpsol = ForeignProgram.Find("glpsol");
        ChoiceProgram program = RandomProgram.Make(seed, sets, options, rows, pairs: 3);
        using var folder = new ScratchFolder();
        string file = folder.Write("program.lp", LpText(program));
        glpsol.Run("--lp", file, "--cuts", "-o", folder["out.txt"]);
        string text = File.ReadAllText(folder["out.txt"]);
        if (!text.Contains("INTEGER OPTIMAL", StringComparison.Ordinal))
        {
            Compare(program, null);
            return;
        }

        // "   No. Column name       Activity ...", then number, name, '*', activity.
        IEnumerable<string> columns = text.Split('\n').SkipWhile(l => !l.Contains("Column name", StringComparison.Ordinal)).Where(l => l.Contains('*', StringComparison.Ordinal));
        Compare(program, ReadChoice(program, columns.Select(l => l.Replace("*", " ", StringComparison.Ordinal))));
    }

    private static void Compare(ChoiceProgram program, int[]? foreign)
    {
        int[]? ours = new ProgramTree(program).Next(1_000_000);
        Assert.Equal(foreign is null, ours is null);
        if (ours is not null)
        {
            Assert.True(program.Keeps(ours));

            // They hold rows to 1e-6 or so: theirs may be cheaper by what breaks a row by less.
            long theirs = program.CostOf(foreign!);
            Assert.True(program.CostOf(ours) == theirs || (program.CostOf(ours) > theirs && !program.Keeps(foreign!)), $"ours {program.CostOf(ours)}, theirs {theirs}");
        }
    }

    // Lines "number name value ...".
    private static int[] ReadChoice(ChoiceProgram program, IEnumerable<string> lines)
    {
        var choice = new int[program.Sets];
        foreach (string line in lines)
        {
            string[] words = line.Split(' ', StringSplitOptions.RemoveEmptyEntries);
            if (words.Length > 2 && words[1].StartsWith('x') && double.Parse(words[2], CultureInfo.InvariantCulture) > 0.5)
            {
                int variable = int.Parse(words[1].AsSpan(1), CultureInfo.InvariantCulture);
                choice[program.SetOf[variable]] = variable - program.First(program.SetOf[variable]);
            }
        }

        return choice;
    }

    private static string LpText(ChoiceProgram program)
    {
        var text = new StringBuilder("Minimize\n cost:");
        for (int v = 0; v < program.Variables; v++)
        {
            Term(program.Costs[v] / 1e8, v);
        }

        text.Append("\nSubject To\n");
        for (int set = 0; set < program.Sets; set++)
        {
            text.Append(CultureInfo.InvariantCulture, $" s{set}:");
            for (int v = program.First(set); v < program.First(set + 1); v++)
            {
                Term(1, v);
            }

            text.Append(" = 1\n");
        }

        for (int r = 0; r < program.Rows.Count; r++)
        {
            text.Append(CultureInfo.InvariantCulture, $" r{r}:");
            for (int v = 0; v < program.Variables; v++)
            {
                if (program.Rows[r][v] != 0)
                {
                    Term(program.Rows[r][v], v);
                }
            }

            text.Append(CultureInfo.InvariantCulture, $" <= {program.Rows[r].Limit:R}\n");
        }

        text.Append("Binaries\n");
        for (int v = 0; v < program.Variables; v++)
        {
            text.Append(CultureInfo.InvariantCulture, $" x{v}\n");
        }

        return text.Append("End\n").ToString();

        void Term(double weight, int variable) =>
            text.Append(CultureInfo.InvariantCulture, $"\n {(weight < 0 ? '-' : '+')} {Math.Abs(weight):R} x{variable}");
    }
}
