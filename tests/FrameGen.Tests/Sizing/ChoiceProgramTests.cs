using FrameGen.Sizing.Program;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>The integer program against a look at every choice.</summary>
public sealed class ChoiceProgramTests
{
    [Theory]
    [InlineData(1, 3, 6, 2)]
    [InlineData(2, 4, 6, 4)]
    [InlineData(3, 5, 5, 3)]
    [InlineData(4, 6, 4, 6)]
    [InlineData(5, 7, 4, 8)]
    [InlineData(6, 5, 6, 1)]
    [InlineData(7, 6, 5, 5)]
    [InlineData(8, 8, 3, 7)]
    [InlineData(9, 3, 12, 9)]
    [InlineData(10, 2, 40, 3)]
    public void Gives_choices_in_the_order_of_their_costs(int seed, int sets, int options, int rows)
    {
        ChoiceProgram program = RandomProgram.Make(seed, sets, options, rows, pairs: seed % 3);
        List<long> all = [.. Choices(program, options).Where(c => program.Keeps(c)).Select(c => program.CostOf(c)).Order()];

        // Ten of them, one excluded after the other; then a row more, which takes some of the rest away.
        var tree = new ProgramTree(program);
        var taken = new HashSet<string>(StringComparer.Ordinal);
        for (int i = 0; i < Math.Min(10, all.Count); i++)
        {
            int[] next = tree.Next(100_000) ?? [];
            Assert.Equal(sets, next.Length);
            Assert.True(program.Keeps(next));
            Assert.True(taken.Add(string.Join(',', next)));
            Assert.Equal(all[i], program.CostOf(next));
            Assert.Equal(all[i], tree.Bound);
            tree.Exclude();
        }

        program.Add(RandomProgram.Row(new Random(seed + 100), program, 0.5));
        List<long> rest = [.. Choices(program, options)
            .Where(c => program.Keeps(c) && !taken.Contains(string.Join(',', c))).Select(c => program.CostOf(c)).Order()];
        int[]? after = tree.Next(100_000);
        Assert.Equal(rest.Count == 0, after is null);
        if (after is not null)
        {
            Assert.Equal(rest[0], program.CostOf(after));
        }
        else
        {
            Assert.Equal(long.MaxValue, tree.Bound);
        }
    }

    [Fact]
    public void Options_that_exclude_each_other_are_not_chosen_together()
    {
        // Sizes 0..5 of two sets, the second no larger than the first, and cheap where the first is dear.
        var program = new ChoiceProgram([[1, 2, 3, 4, 5, 6], [60, 50, 40, 30, 20, 10]]);
        program.Forbid(0, 1, (a, b) => b > a);
        int[]? best = new ProgramTree(program).Next(1000);
        Assert.Equal([5, 5], best!);
    }

    [Fact]
    public void Without_a_choice_it_says_so()
    {
        var program = new ChoiceProgram([[1, 2], [3, 4]]);
        program.Add(new ProgramRow([0, 1], [-1, -2], -3));
        var tree = new ProgramTree(program);
        Assert.Null(tree.Next(1000));
        Assert.Equal(long.MaxValue, tree.Bound);
    }

    [Fact]
    public void A_cutoff_leaves_only_what_costs_no_more()
    {
        var program = new ChoiceProgram([[5, 1], [7, 2]]);
        program.Add(new ProgramRow([1, 3], [1, 1], 1));
        var tree = new ProgramTree(program) { Cutoff = 7 };
        Assert.Equal([0, 1], tree.Next(1000)!);
        tree.Exclude();
        Assert.Null(tree.Next(1000));
    }

    private static IEnumerable<int[]> Choices(ChoiceProgram program, int options)
    {
        var choice = new int[program.Sets];
        while (true)
        {
            yield return [.. choice];
            int set = 0;
            while (set < choice.Length && ++choice[set] == options)
            {
                choice[set++] = 0;
            }

            if (set == choice.Length)
            {
                yield break;
            }
        }
    }
}
