namespace FrameGen.Sizing.Program;

/// <summary>A row: a weighted sum of chosen options that is no more than a limit. Scaled so that its largest weight is 1.</summary>
internal sealed class ProgramRow
{
    private readonly double[] _dense;

    /// <summary>A row.</summary>
    /// <param name="variables">Variables with a weight, ascending.</param>
    /// <param name="weights">Their weights.</param>
    /// <param name="limit">What the sum may be.</param>
    /// <exception cref="ArgumentOutOfRangeException">A weight or the limit is not finite.</exception>
    public ProgramRow(IReadOnlyList<int> variables, IReadOnlyList<double> weights, double limit)
    {
        double largest = 0;
        for (int i = 0; i < weights.Count; i++)
        {
            if (!double.IsFinite(weights[i]))
            {
                throw new ArgumentOutOfRangeException(nameof(weights), weights[i], "A weight has to be finite.");
            }

            largest = Math.Max(largest, Math.Abs(weights[i]));
        }

        if (!double.IsFinite(limit))
        {
            throw new ArgumentOutOfRangeException(nameof(limit), limit, "A limit has to be finite.");
        }

        double scale = largest > 0 ? 1 / largest : 1;
        Limit = scale * limit;
        _dense = new double[variables.Count == 0 ? 0 : variables[^1] + 1];
        for (int i = 0; i < weights.Count; i++)
        {
            _dense[variables[i]] = scale * weights[i];
        }
    }

    public double Limit { get; }

    /// <summary>The weight of a variable.</summary>
    public double this[int variable] => variable < _dense.Length ? _dense[variable] : 0;

    /// <summary>Of some options at most so many are chosen.</summary>
    public static ProgramRow AtMost(int most, IReadOnlyList<int> variables) => new(variables, [.. variables.Select(_ => 1.0)], most);

    /// <summary>Whether a choice keeps it: to the last bit, for it is summed in one order always.</summary>
    public bool Keeps(ChoiceProgram program, ReadOnlySpan<int> choice)
    {
        double sum = 0;
        for (int set = 0; set < choice.Length; set++)
        {
            sum += this[program.First(set) + choice[set]];
        }

        return sum <= Limit;
    }
}
