using FrameGen.Mechanics.Frames;

namespace FrameGen.Sizing.Search;

/// <summary>
/// A number that a target limits from above, as a linear functional of the displacements: q = c + aᵀu, u = K⁻¹f. A movement has a fixed a and no c; where internal forces
/// are asked for, both follow the sections.
/// </summary>
/// <param name="Load">What acts.</param>
/// <param name="Limit">q may be no more.</param>
/// <param name="Functional">a in the design that it was read off, as loads on nodes.</param>
internal sealed record Response(LoadSet Load, double Limit, IReadOnlyList<NodalLoad> Functional)
{
    /// <summary>Where a follows the sections; null where it does not.</summary>
    public SectionFactors? Own { get; init; }

    /// <summary>By how much all stiffnesses are scaled so that the design meets the limit: q over the limit, where nothing else is said.</summary>
    public double? Scale { get; init; }

    /// <summary>True where a is made of stiffnesses, and grows as they are scaled.</summary>
    public bool GrowsWithStiffness { get; init; }
}

/// <summary>a = Σ k gᵀ over the strains of elements, c and what else is a sum over groups, option by option.</summary>
internal sealed class SectionFactors
{
    private const int Modes = StiffnessTable.Modes;

    private readonly double[]?[] _factors;
    private readonly double[]?[] _constants;
    private readonly StiffnessTable _table;

    public SectionFactors(DesignSpace space, StiffnessTable table) =>
        (_factors, _constants, _table, Space) = (new double[]?[space.Groups], new double[]?[space.Groups], table, space);

    private DesignSpace Space { get; }

    /// <summary>Room for the k of a group's option: six an element, in the order of its elements.</summary>
    public Span<double> FactorsToFill(int group, int option)
    {
        int size = Modes * _table.Elements(group).Length;
        double[] all = _factors[group] ??= new double[size * Space[group].Length];
        return all.AsSpan(size * option, size);
    }

    /// <summary>The k of a group's option; empty where they are all zero.</summary>
    public ReadOnlySpan<double> Factors(int group, int option) =>
        _factors[group] is { } all ? all.AsSpan(Modes * _table.Elements(group).Length * option, Modes * _table.Elements(group).Length) : [];

    /// <summary>Adds to what is a plain sum.</summary>
    public void AddConstant(int group, int option, double value) => (_constants[group] ??= new double[Space[group].Length])[option] += value;

    /// <summary>What an option adds as it stands.</summary>
    public double Constant(int group, int option) => _constants[group]?[option] ?? 0;

    /// <summary>a in a design, as loads on nodes.</summary>
    public IReadOnlyList<NodalLoad> Functional(ReadOnlySpan<int> choice)
    {
        var loads = new List<NodalLoad>();
        for (int g = 0; g < choice.Length; g++)
        {
            ReadOnlySpan<double> factors = Factors(g, choice[g]);
            for (int i = 0; i < factors.Length / Modes; i++)
            {
                ReadOnlySpan<double> k = factors.Slice(Modes * i, Modes);
                if (k.ContainsAnyExcept(0.0))
                {
                    (NodalLoad start, NodalLoad end) = _table.Strains.Load(_table.Elements(g)[i], k);
                    loads.Add(start);
                    loads.Add(end);
                }
            }
        }

        return loads;
    }
}
