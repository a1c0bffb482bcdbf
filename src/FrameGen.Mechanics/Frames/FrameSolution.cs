using System.Runtime.Intrinsics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Mechanics.Frames;

/// <summary>Displacements, reactions and internal forces under one load set.</summary>
public sealed class FrameSolution
{
    private const int Six = SymbolicFactor.Six;

    private readonly FrameLayout _layout;
    private readonly double[] _loadsAlong;
    private readonly SectionForces[] _starts;

    internal FrameSolution(FrameLayout layout)
    {
        _layout = layout;
        Displacements = new double[layout.Held.Length];
        Residuals = new double[layout.Held.Length];
        _loadsAlong = new double[3 * layout.Profiles.Length];
        _starts = new SectionForces[layout.Profiles.Length];
    }

    /// <summary>Largest unbalance of loads and reactions, forces and moments about the origin, relative to the largest load or reaction
    /// term; the frame's size joins forces and moments into one scale.</summary>
    public double EquilibriumError { get; internal set; }

    /// <summary>Backward error of the solve, ‖K u − f‖∞ / (‖K‖∞ ‖u‖∞ + ‖f‖∞), free freedoms only.</summary>
    public double BackwardError { get; internal set; }

    /// <summary>Six values a node, mm and rad.</summary>
    internal double[] Displacements { get; }

    /// <summary>K u − f, six values a node, N and N·mm: the reaction where held, else what the solve left over.</summary>
    internal double[] Residuals { get; }

    /// <summary>Displacement of a node, mm, global.</summary>
    public Vector3 Displacement(int node) => At(Displacements, Six * node);

    /// <summary>Rotation of a node, rad, global.</summary>
    public Vector3 Rotation(int node) => At(Displacements, (Six * node) + 3);

    /// <summary>Force, N, and moment, N·mm, that the support of a node puts on the frame; zero in freedoms not held.</summary>
    public (Vector3 Force, Vector3 Moment) Reaction(int node)
    {
        int k = Six * node;
        return (new Vector3(Held(k), Held(k + 1), Held(k + 2)), new Vector3(Held(k + 3), Held(k + 4), Held(k + 5)));

        double Held(int freedom) => _layout.Held[freedom] ? Residuals[freedom] : 0;
    }

    /// <summary>Internal forces along an element.</summary>
    public ElementForces Forces(int element)
    {
        int k = 3 * element;
        return new ElementForces(
            _starts[element], _layout.Modes.Lengths[element], _loadsAlong[k], _loadsAlong[k + 1], _loadsAlong[k + 2]);
    }

    internal bool IsOf(FrameLayout other) => ReferenceEquals(_layout, other);

    /// <summary>Writes minus the nodal loads, equivalents of the even loads among them, into <see cref="Residuals"/>.</summary>
    internal void Apply(BeamLoads loads)
    {
        Array.Clear(Residuals);
        Array.Clear(_loadsAlong);
        for (int k = 0; k < loads.NodalLoads.Count; k++)
        {
            NodalLoad load = loads.NodalLoads[k];
            if (load.Node < 0 || load.Node >= _layout.Frame.Nodes.Count || !IsFinite(load.Force) || !IsFinite(load.Moment))
            {
                throw new ArgumentOutOfRangeException(nameof(loads), load, "A load needs a node of the frame and finite values.");
            }

            Subtract(load.Node, load.Force, load.Moment);
        }

        for (int k = 0; k < loads.ElementLoads.Count; k++)
        {
            ElementLoad load = loads.ElementLoads[k];
            if (load.Element < 0 || load.Element >= _starts.Length || !IsFinite(load.PerLength))
            {
                throw new ArgumentOutOfRangeException(nameof(loads), load, "A load needs an element of the frame and a finite value.");
            }

            // Fixed ends carry half the load each, and ±pL²/12, with or without shear deformation: by symmetry the shear force is
            // the same.
            BeamElement element = _layout.Frame.Elements[load.Element];
            double length = _layout.Modes.Lengths[load.Element];
            Vector3 half = 0.5 * length * load.PerLength;
            Vector3 moment = length * length / 12 * element.Axes.X.Cross(load.PerLength);
            Subtract(element.Start, half, moment + element.StartOffset.Cross(half));
            Subtract(element.End, half, element.EndOffset.Cross(half) - moment);
            _loadsAlong[3 * load.Element] += load.PerLength.Dot(element.Axes.X);
            _loadsAlong[(3 * load.Element) + 1] += load.PerLength.Dot(element.Axes.Y);
            _loadsAlong[(3 * load.Element) + 2] += load.PerLength.Dot(element.Axes.Z);
        }
    }

    /// <summary>From displacements to internal forces and reactions.</summary>
    /// <param name="stiffness">Six values an element.</param>
    internal void Recover(double[] stiffness)
    {
        Span<double> ends = stackalloc double[ElementModes.Freedoms];
        Span<double> strengths = stackalloc double[ElementModes.Modes];
        ref double u = ref ends[0];
        for (int e = 0; e < _starts.Length; e++)
        {
            (int start, int end) = (Six * _layout.StartNodes[e], Six * _layout.EndNodes[e]);
            Span<double> atStart = Residuals.AsSpan(start, Six);
            Span<double> atEnd = Residuals.AsSpan(end, Six);
            Displacements.AsSpan(start, Six).CopyTo(ends);
            Displacements.AsSpan(end, Six).CopyTo(ends[Six..]);
            ref double g = ref _layout.Modes.Vectors[ElementModes.Stride * e];
            Vector256<double> u0 = Vector256.LoadUnsafe(ref u);
            Vector256<double> u1 = Vector256.LoadUnsafe(ref u, 4);
            Vector256<double> u2 = Vector256.LoadUnsafe(ref u, 8);
            Vector256<double> f0 = Vector256<double>.Zero;
            Vector256<double> f1 = f0;
            Vector256<double> f2 = f0;
            for (int m = 0; m < ElementModes.Modes; m++)
            {
                nuint at = (nuint)(ElementModes.Freedoms * m);
                Vector256<double> g0 = Vector256.LoadUnsafe(ref g, at);
                Vector256<double> g1 = Vector256.LoadUnsafe(ref g, at + 4);
                Vector256<double> g2 = Vector256.LoadUnsafe(ref g, at + 8);
                Vector256<double> product = Vector256.FusedMultiplyAdd(g2, u2, Vector256.FusedMultiplyAdd(g1, u1, g0 * u0));
                Vector128<double> two = product.GetLower() + product.GetUpper();
                double strength = stiffness[(ElementModes.Modes * e) + m] * (two[0] + two[1]);
                strengths[m] = strength;
                Vector256<double> factor = Vector256.Create(strength);
                f0 = Vector256.FusedMultiplyAdd(factor, g0, f0);
                f1 = Vector256.FusedMultiplyAdd(factor, g1, f1);
                f2 = Vector256.FusedMultiplyAdd(factor, g2, f2);
            }

            f0.StoreUnsafe(ref u);
            f1.StoreUnsafe(ref u, 4);
            f2.StoreUnsafe(ref u, 8);
            for (int i = 0; i < Six; i++)
            {
                atStart[i] += ends[i];
                atEnd[i] += ends[Six + i];
            }

            _starts[e] = StartForces(strengths, _layout.Modes.Lengths[e], _loadsAlong.AsSpan(3 * e, 3));
        }
    }

    /// <summary>What the node does to the start, turned round; with the fixed-end forces of the even load.</summary>
    private static SectionForces StartForces(ReadOnlySpan<double> q, double length, ReadOnlySpan<double> p)
    {
        double half = 0.5 * length;
        double twelfth = length * length / 12;
        return new SectionForces(
            q[0] + (half * p[0]),
            (half * p[1]) - q[4],
            (half * p[2]) - q[5],
            q[1],
            q[3] + (half * q[5]) - (twelfth * p[2]),
            q[2] - (half * q[4]) + (twelfth * p[1]));
    }

    private static Vector3 At(double[] values, int k) => new(values[k], values[k + 1], values[k + 2]);

    private static bool IsFinite(Vector3 v) => double.IsFinite(v.X) && double.IsFinite(v.Y) && double.IsFinite(v.Z);

    private void Subtract(int node, Vector3 force, Vector3 moment)
    {
        Span<double> six = Residuals.AsSpan(Six * node, Six);
        six[0] -= force.X;
        six[1] -= force.Y;
        six[2] -= force.Z;
        six[3] -= moment.X;
        six[4] -= moment.Y;
        six[5] -= moment.Z;
    }
}
