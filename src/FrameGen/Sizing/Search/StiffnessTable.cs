using FrameGen.Mechanics.Frames;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Search;

/// <summary>What every element resists with, for every option of its group: the s of K(x) = Σ s g gᵀ, the same division into elements for all.</summary>
internal sealed class StiffnessTable
{
    /// <summary>Ways in which an element strains.</summary>
    public const int Modes = BeamStrains.Count;

    private readonly double[][] _values;
    private readonly int[][] _elements;
    private readonly int[] _placeOf;

    public StiffnessTable(DesignSpace space, StructuralModel structure)
    {
        Strains = new BeamStrains(structure.Solvers[0]);
        IReadOnlyList<BeamElement> elements = structure.Topology.Frame.Elements;
        _elements = new int[space.Groups][];
        _values = new double[space.Groups][];
        _placeOf = new int[elements.Count];
        for (int g = 0; g < space.Groups; g++)
        {
            _elements[g] = [.. Enumerable.Range(0, elements.Count).Where(e => elements[e].Profile == g)];
            _values[g] = new double[Modes * _elements[g].Length * space[g].Length];
            for (int i = 0; i < _elements[g].Length; i++)
            {
                _placeOf[_elements[g][i]] = i;
                for (int c = 0; c < space[g].Length; c++)
                {
                    Strains.Stiffness(_elements[g][i], space[g][c].Profile, _values[g].AsSpan(Modes * ((c * _elements[g].Length) + i), Modes));
                }
            }
        }
    }

    public BeamStrains Strains { get; }

    /// <summary>Elements of a group.</summary>
    public ReadOnlySpan<int> Elements(int group) => _elements[group];

    /// <summary>Six stiffnesses an element of a group with an option, in the order of <see cref="Elements"/>.</summary>
    public ReadOnlySpan<double> Of(int group, int option) =>
        _values[group].AsSpan(Modes * _elements[group].Length * option, Modes * _elements[group].Length);

    /// <summary>The six of one element of a group with an option.</summary>
    public ReadOnlySpan<double> Of(int group, int option, int element) => Of(group, option).Slice(Modes * _placeOf[element], Modes);

    /// <summary>The strains of all elements in a solved frame, six an element.</summary>
    public double[] StrainsOf(FrameSolution solution)
    {
        var strains = new double[Modes * _placeOf.Length];
        for (int e = 0; e < _placeOf.Length; e++)
        {
            Strains.Of(e, solution, strains.AsSpan(Modes * e, Modes));
        }

        return strains;
    }
}
