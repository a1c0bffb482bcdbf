using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>A shape that a frame buckles or vibrates in; its size means nothing, its largest displacement is 1.</summary>
public sealed class ModeShape
{
    private const int Six = SymbolicFactor.Six;

    private readonly double[] _values;

    internal ModeShape(FrameLayout layout, double[] vector)
    {
        _values = new double[layout.Held.Length];
        for (int place = 0; place < layout.NodeAt.Length; place++)
        {
            vector.AsSpan(Six * place, Six).CopyTo(_values.AsSpan(Six * layout.NodeAt[place], Six));
        }

        double largest = 0;
        for (int node = 0; node < _values.Length / Six; node++)
        {
            largest = Math.Max(largest, Displacement(node).Length);
        }

        for (int k = 0; k < _values.Length && largest > 0; k++)
        {
            _values[k] /= largest;
        }
    }

    /// <summary>Displacement of a node, global.</summary>
    public Vector3 Displacement(int node) => At(Six * node);

    /// <summary>Rotation of a node per mm of the largest displacement, rad, global.</summary>
    public Vector3 Rotation(int node) => At((Six * node) + 3);

    private Vector3 At(int k) => new(_values[k], _values[k + 1], _values[k + 2]);
}
