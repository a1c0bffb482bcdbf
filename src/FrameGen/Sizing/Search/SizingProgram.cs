using FrameGen.Sizing.Program;

namespace FrameGen.Sizing.Search;

/// <summary>The choice of sizes as a program: a set a group, its options in their order.</summary>
internal static class SizingProgram
{
    public static ChoiceProgram Of(DesignSpace space)
    {
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

        return new ChoiceProgram(costs);
    }
}
