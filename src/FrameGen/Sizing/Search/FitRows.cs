using FrameGen.Mechanics.Sections;
using FrameGen.Sizing.Program;

namespace FrameGen.Sizing.Search;

/// <summary>
/// What the joints forbid, told to the program as designs come up that can't be made. Whether a joint can be made follows from the sizes of all groups that meet there,
/// the order of fitting included; a pair of sizes is forbidden for good where no sizes of the other groups there help it.
/// </summary>
internal sealed class FitRows(DesignSpace space, JointTable joints, ChoiceProgram program)
{
    // Joints with more combinations than this are told one combination at a time.
    private const int MostCells = 20_000;

    private readonly HashSet<int> _told = [];

    /// <summary>True where every joint of a design can be made; else rows were added that exclude it.</summary>
    public bool Look(ReadOnlySpan<int> choice, Section[] sections)
    {
        bool fits = true;
        foreach (NodeEntries node in joints.Nodes)
        {
            if (!joints.At(node, choice, sections).Fits)
            {
                fits = false;
                Tell(node, choice);
            }
        }

        return fits;
    }

    private void Tell(NodeEntries node, ReadOnlySpan<int> choice)
    {
        if (node.Combinations <= MostCells && _told.Add(node.Node))
        {
            TellPairs(node);
        }

        List<int> variables = [];
        foreach (int group in node.Groups)
        {
            variables.Add(program.First(group) + choice[group]);
        }

        program.Add(ProgramRow.AtMost(variables.Count - 1, variables));
    }

    private void TellPairs(NodeEntries node)
    {
        var choice = new int[space.Groups];
        var sections = new Section[space.Groups];
        var possible = new Dictionary<(int A, int B), bool[,]>();
        for (int i = 0; i < node.Groups.Count; i++)
        {
            for (int j = 0; j < i; j++)
            {
                possible[(j, i)] = new bool[space[node.Groups[j]].Length, space[node.Groups[i]].Length];
            }
        }

        for (int cell = 0; cell < node.Combinations; cell++)
        {
            node.Decode(cell, choice);
            for (int g = 0; g < sections.Length; g++)
            {
                sections[g] = space[g][choice[g]].Section;
            }

            if (joints.At(node, choice, sections).Fits)
            {
                for (int i = 0; i < node.Groups.Count; i++)
                {
                    for (int j = 0; j < i; j++)
                    {
                        possible[(j, i)][choice[node.Groups[j]], choice[node.Groups[i]]] = true;
                    }
                }
            }
        }

        for (int i = 0; i < node.Groups.Count; i++)
        {
            for (int j = 0; j < i; j++)
            {
                bool[,] some = possible[(j, i)];
                if (some.Cast<bool>().Contains(false))
                {
                    program.Forbid(node.Groups[j], node.Groups[i], (a, b) => !some[a, b]);
                }
            }
        }
    }
}
