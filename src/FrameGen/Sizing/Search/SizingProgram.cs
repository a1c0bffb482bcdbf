using FrameGen.Mechanics.Sections;
using FrameGen.Sizing.Program;

namespace FrameGen.Sizing.Search;

/// <summary>
/// The choice of sizes as a program: a set a group, its options in their order. Where the number of different sizes is limited, a set more for every size, bought or not:
/// a group has only sizes that are bought, and so many may be.
/// </summary>
internal sealed class SizingProgram
{
    private const int NotBought = 0;
    private const int Bought = 1;

    private readonly DesignSpace _space;
    private readonly List<ProgramRow> _targetRows = [];
    private readonly int[][] _sizeOf = [];
    private readonly int _sizes;

    public SizingProgram(DesignSpace space)
    {
        _space = space;
        var costs = new List<IReadOnlyList<long>>();
        for (int g = 0; g < space.Groups; g++)
        {
            var of = new long[space[g].Length];
            for (int c = 0; c < of.Length; c++)
            {
                of[c] = space[g][c].Units;
            }

            costs.Add(of);
        }

        if (space.MostSizes is not { } most)
        {
            Program = new ChoiceProgram(costs);
            return;
        }

        (_sizeOf, _sizes) = Sizes(space);
        costs.AddRange(Enumerable.Repeat<IReadOnlyList<long>>([0, 0], _sizes));
        Program = new ChoiceProgram(costs);
        for (int g = 0; g < space.Groups; g++)
        {
            for (int c = 0; c < space[g].Length; c++)
            {
                int size = Program.First(space.Groups + _sizeOf[g][c]);
                Program.Add(new ProgramRow([Program.First(g) + c, size + NotBought], [1, 1], 1));
            }
        }

        Program.Add(ProgramRow.AtMost(most, [.. Enumerable.Range(0, _sizes).Select(k => Program.First(space.Groups + k) + Bought)]));
    }

    public ChoiceProgram Program { get; }

    /// <summary>Rows that follow from the targets alone: they hold whatever joints allow.</summary>
    public IReadOnlyList<ProgramRow> TargetRows => _targetRows;

    /// <summary>Adds a row that every design satisfies which meets the targets.</summary>
    public void AddTargetRow(ProgramRow row)
    {
        _targetRows.Add(row);
        Program.Add(row);
    }

    /// <summary>Whether a design keeps all rows so far.</summary>
    public bool Allows(ReadOnlySpan<int> choice)
    {
        if (_sizes == 0)
        {
            return Program.Keeps(choice);
        }

        Span<int> whole = _space.Groups + _sizes <= 512 ? stackalloc int[_space.Groups + _sizes] : new int[_space.Groups + _sizes];
        whole.Clear();
        choice.CopyTo(whole);
        for (int g = 0; g < choice.Length; g++)
        {
            whole[_space.Groups + _sizeOf[g][choice[g]]] = Bought;
        }

        return Program.Keeps(whole);
    }

    /// <summary>A design as a choice of the program: sizes that groups have are bought.</summary>
    public int[] Whole(ReadOnlySpan<int> choice)
    {
        var whole = new int[_space.Groups + _sizes];
        choice.CopyTo(whole);
        for (int g = 0; g < choice.Length && _sizes > 0; g++)
        {
            whole[_space.Groups + _sizeOf[g][choice[g]]] = Bought;
        }

        return whole;
    }

    private static (int[][] SizeOf, int Count) Sizes(DesignSpace space)
    {
        var known = new List<(string Material, Section Section)>();
        var sizeOf = new int[space.Groups][];
        for (int g = 0; g < sizeOf.Length; g++)
        {
            sizeOf[g] = new int[space[g].Length];
            for (int c = 0; c < sizeOf[g].Length; c++)
            {
                (string Material, Section Section) size = (space.Model.Groups[g].Material.Name, space[g][c].Section);
                int at = known.FindIndex(k => string.Equals(k.Material, size.Material, StringComparison.Ordinal) && k.Section.Equals(size.Section));
                if (at < 0)
                {
                    at = known.Count;
                    known.Add(size);
                }

                sizeOf[g][c] = at;
            }
        }

        return (sizeOf, known.Count);
    }
}
