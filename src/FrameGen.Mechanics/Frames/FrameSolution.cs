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

    // What the displacements are longer by than a double holds; used only where one is not enough.
    private readonly double[] _rest;
    private bool _hasRest;

    internal FrameSolution(FrameLayout layout)
    {
        _layout = layout;
        Displacements = new double[layout.Held.Length];
        Residuals = new double[layout.Held.Length];
        _loadsAlong = new double[3 * layout.Profiles.Length];
        _starts = new SectionForces[layout.Profiles.Length];
        _rest = new double[layout.Held.Length];
    }

    /// <summary>Largest unbalance of loads and reactions, forces and moments about the origin, relative to the largest load or reaction
    /// term; the frame's size joins forces and moments into one scale.</summary>
    public double EquilibriumError { get; internal set; }

    /// <summary>
    /// Backward error of the solve: the displacements and internal forces are those of loads that differ from the given ones by no more than
    /// this, relative. It is the largest part of a node's loads that the forces in its tubes and springs leave unbalanced, over the largest force on any element's
    /// end or any node; moments likewise, the longest element joining forces and moments into one scale.
    /// </summary>
    /// <remarks>No norm of K stands below the line, so that a small answer of great forces that cancel doesn't pass for a good one.</remarks>
    public double BackwardError { get; internal set; }

    /// <summary>The node where the backward error is largest; −1 where there is none.</summary>
    public int WorstNode { get; internal set; } = -1;

    /// <summary>Six values a node, mm and rad.</summary>
    internal double[] Displacements { get; }

    /// <summary>The largest force, N, on an element's end or as a load on a node.</summary>
    internal double LargestForce { get; private set; }

    /// <summary>The largest moment, N·mm, likewise.</summary>
    internal double LargestMoment { get; private set; }

    /// <summary>K u − f, six values a node, N and N·mm: the reaction where held, else what the solve left over.</summary>
    internal double[] Residuals { get; }

    /// <summary>Displacement of a node, mm, global.</summary>
    public Vector3 Displacement(int node) => At(Displacements, Six * node);

    /// <summary>Rotation of a node, rad, global.</summary>
    public Vector3 Rotation(int node) => At(Displacements, (Six * node) + 3);

    /// <summary>Force, N, and moment, N·mm, that the support of a node puts on the frame, its springs included; zero in freedoms neither held nor sprung.</summary>
    public (Vector3 Force, Vector3 Moment) Reaction(int node)
    {
        int k = Six * node;
        int sprung = Array.BinarySearch(_layout.SprungNodes, node);
        double[]? rates = sprung < 0 ? null : _layout.Springs[sprung].Rates;
        return (new Vector3(At(0), At(1), At(2)), new Vector3(At(3), At(4), At(5)));

        double At(int i) => _layout.Held[k + i] ? Residuals[k + i] : rates is null ? 0 : -(rates[i] * Displacements[k + i]);
    }

    /// <summary>Internal forces along an element.</summary>
    public ElementForces Forces(int element)
    {
        int k = 3 * element;
        return new ElementForces(
            _starts[element], _layout.Modes.Lengths[element], _loadsAlong[k], _loadsAlong[k + 1], _loadsAlong[k + 2]);
    }

    internal bool IsOf(FrameLayout other) => ReferenceEquals(_layout, other);

    /// <summary>Takes the displacements, in elimination order, as they are.</summary>
    internal void Set(ReadOnlySpan<double> displacements)
    {
        _hasRest = false;
        for (int place = 0; place < _layout.NodeAt.Length; place++)
        {
            displacements.Slice(Six * place, Six).CopyTo(Displacements.AsSpan(Six * _layout.NodeAt[place], Six));
        }
    }

    /// <summary>From here on the displacements have twice a double's digits.</summary>
    internal void KeepRest()
    {
        Array.Clear(_rest);
        _hasRest = true;
    }

    /// <summary>Adds to displacements of twice a double's digits (D. Knuth, The Art of Computer Programming 2, 4.2.2, theorem B).</summary>
    internal void Add(ReadOnlySpan<double> corrections)
    {
        for (int k = 0; k < corrections.Length; k++)
        {
            int freedom = (Six * _layout.NodeAt[k / Six]) + (k % Six);
            double before = Displacements[freedom];
            double correction = corrections[k] + _rest[freedom];
            double sum = before + correction;
            double taken = sum - before;
            _rest[freedom] = before - (sum - taken) + (correction - taken);
            Displacements[freedom] = sum;
        }
    }

    /// <summary>Writes minus the nodal loads, equivalents of the even loads among them, into <see cref="Residuals"/>.</summary>
    /// <param name="loads">Loads.</param>
    /// <param name="hingeShears">Of the design, <see cref="StiffnessBlocks.HingeShears"/>.</param>
    internal void Apply(BeamLoads loads, double[] hingeShears)
    {
        Array.Clear(Residuals);
        Array.Clear(_loadsAlong);
        (LargestForce, LargestMoment) = (0, 0);
        for (int k = 0; k < loads.NodalLoads.Count; k++)
        {
            NodalLoad load = loads.NodalLoads[k];
            if (load.Node < 0 || load.Node >= _layout.Frame.Nodes.Count || !IsFinite(load.Force) || !IsFinite(load.Moment))
            {
                throw new ArgumentOutOfRangeException(nameof(loads), load, "A load needs a node of the frame and finite values.");
            }

            Subtract(load.Node, load.Force, load.Moment);
            LargestForce = Math.Max(LargestForce, Largest(load.Force));
            LargestMoment = Math.Max(LargestMoment, Largest(load.Moment));
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
            (double py, double pz) = (load.PerLength.Dot(element.Axes.Y), load.PerLength.Dot(element.Axes.Z));
            _loadsAlong[3 * load.Element] += load.PerLength.Dot(element.Axes.X);
            _loadsAlong[(3 * load.Element) + 1] += py;
            _loadsAlong[(3 * load.Element) + 2] += pz;
            LargestForce = Math.Max(LargestForce, Largest(half));
            LargestMoment = Math.Max(LargestMoment, Largest(moment));
            if (hingeShears.Length > 0)
            {
                LetGo(load.Element, element, py * length * length / 12, pz * length * length / 12, hingeShears);
            }
        }
    }

    // A hinge lets go of the end moment ∓m of a clamped element. Of its modes the even one then carries m, and the shearing one what the other
    // end's clamp makes of it, in the way they are left at a hinge.
    private void LetGo(int index, BeamElement element, double aboutZ, double aboutY, double[] hingeShears)
    {
        const Hinges Y = Hinges.StartY | Hinges.EndY;
        const Hinges Z = Hinges.StartZ | Hinges.EndZ;
        if ((element.Hinges & Y) != Hinges.None)
        {
            AddMode(index, 3, element, aboutY);
            AddMode(index, 5, element, aboutY * hingeShears[2 * index] * ElementModes.HingeSide(element.Hinges, Hinges.StartY, Hinges.EndY));
        }

        if ((element.Hinges & Z) != Hinges.None)
        {
            AddMode(index, 2, element, -aboutZ);
            AddMode(index, 4, element, aboutZ * hingeShears[(2 * index) + 1] * ElementModes.HingeSide(element.Hinges, Hinges.StartZ, Hinges.EndZ));
        }
    }

    private void AddMode(int index, int mode, BeamElement element, double strength)
    {
        ReadOnlySpan<double> g = _layout.Modes.Vectors.AsSpan((ElementModes.Stride * index) + (ElementModes.Freedoms * mode), ElementModes.Freedoms);
        for (int i = 0; i < Six; i++)
        {
            Residuals[(Six * element.Start) + i] += strength * g[i];
            Residuals[(Six * element.End) + i] += strength * g[Six + i];
        }
    }

    /// <summary>From displacements to internal forces and reactions.</summary>
    /// <param name="stiffness">Six values an element.</param>
    /// <param name="hingeShears">Of the design, <see cref="StiffnessBlocks.HingeShears"/>.</param>
    internal void Recover(double[] stiffness, double[] hingeShears)
    {
        Span<double> ends = stackalloc double[ElementModes.Freedoms];
        Span<double> strengths = stackalloc double[ElementModes.Modes];
        var largest = default(LargestOfEnds);
        for (int e = 0; e < _starts.Length; e++)
        {
            RecoverEnds(e, stiffness, ends, strengths, ref largest);
            Span<double> atStart = Residuals.AsSpan(Six * _layout.StartNodes[e], Six);
            Span<double> atEnd = Residuals.AsSpan(Six * _layout.EndNodes[e], Six);
            for (int i = 0; i < Six; i++)
            {
                atStart[i] += ends[i];
                atEnd[i] += ends[Six + i];
            }

            if (hingeShears.Length > 0 && _layout.Modes.Hinges[e] != Hinges.None)
            {
                Hinge(e, strengths, hingeShears);
            }

            _starts[e] = StartForces(strengths, _layout.Modes.Lengths[e], _loadsAlong.AsSpan(3 * e, 3));
        }

        AddSprings();
        LargestForce = Math.Max(LargestForce, largest.Force);
        LargestMoment = Math.Max(LargestMoment, largest.Moment);
    }

    /// <summary>Forces and moments that the nodes put on an element's two ends, and the strengths of its modes.</summary>
    private void RecoverEnds(int e, double[] stiffness, Span<double> ends, Span<double> strengths, ref LargestOfEnds largest)
    {
        (int start, int end) = (Six * _layout.StartNodes[e], Six * _layout.EndNodes[e]);
        Displacements.AsSpan(start, Six).CopyTo(ends);
        Displacements.AsSpan(end, Six).CopyTo(ends[Six..]);
        ref double u = ref ends[0];
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
            double strain = _hasRest ? Strain(e, m) : two[0] + two[1];
            double strength = stiffness[(ElementModes.Modes * e) + m] * strain;
            strengths[m] = strength;
            Vector256<double> factor = Vector256.Create(strength);
            f0 = Vector256.FusedMultiplyAdd(factor, g0, f0);
            f1 = Vector256.FusedMultiplyAdd(factor, g1, f1);
            f2 = Vector256.FusedMultiplyAdd(factor, g2, f2);
        }

        largest.Take(f0, f1, f2);
        f0.StoreUnsafe(ref u);
        f1.StoreUnsafe(ref u, 4);
        f2.StoreUnsafe(ref u, 8);
    }

    private void AddSprings()
    {
        foreach (FrameLayout.NodeSprings springs in _layout.Springs)
        {
            for (int i = 0; i < Six; i++)
            {
                int k = (Six * springs.Node) + i;
                Residuals[k] += springs.Rates[i] * Displacements[k];
            }
        }
    }

    /// <summary>How far an element strains in a way, to twice a double's digits before the last rounding (T. Ogita, S. Rump, S. Oishi, SIAM J. Sci. Comput. 26
    /// (2005) 1955, algorithm 5.3).</summary>
    private double Strain(int e, int mode)
    {
        (int start, int end) = (Six * _layout.StartNodes[e], Six * _layout.EndNodes[e]);
        ReadOnlySpan<double> g = _layout.Modes.Vectors.AsSpan((ElementModes.Stride * e) + (ElementModes.Freedoms * mode), ElementModes.Freedoms);
        double sum = 0;
        double rest = 0;
        for (int i = 0; i < ElementModes.Freedoms; i++)
        {
            int k = i < Six ? start + i : end + i - Six;
            double product = g[i] * Displacements[k];
            double next = sum + product;
            double taken = next - sum;
            rest += Math.FusedMultiplyAdd(g[i], Displacements[k], -product) + (sum - (next - taken)) + (product - taken) + (g[i] * _rest[k]);
            sum = next;
        }

        return sum + rest;
    }

    // The strengths of the modes without hinges that make up those with them, and what the hinges let go of the even load.
    private void Hinge(int e, Span<double> q, double[] hingeShears)
    {
        Hinges hinges = _layout.Modes.Hinges[e];
        double length = _layout.Modes.Lengths[e];
        double twelfth = length * length / 12;
        if ((hinges & (Hinges.StartY | Hinges.EndY)) != Hinges.None)
        {
            double moment = twelfth * _loadsAlong[(3 * e) + 2];
            int side = ElementModes.HingeSide(hinges, Hinges.StartY, Hinges.EndY);
            q[5] += side * moment * hingeShears[2 * e];
            q[3] = moment - (side * 0.5 * length * q[5]);
        }

        if ((hinges & (Hinges.StartZ | Hinges.EndZ)) != Hinges.None)
        {
            double moment = twelfth * _loadsAlong[(3 * e) + 1];
            int side = ElementModes.HingeSide(hinges, Hinges.StartZ, Hinges.EndZ);
            q[4] += side * moment * hingeShears[(2 * e) + 1];
            q[2] = (side * 0.5 * length * q[4]) - moment;
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

    private static double Largest(Vector3 v) => Math.Max(Math.Max(Math.Abs(v.X), Math.Abs(v.Y)), Math.Abs(v.Z));

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

    /// <summary>The largest of what nodes put on elements' ends; of twelve values 0 to 2 and 6 to 8 are forces.</summary>
    private struct LargestOfEnds
    {
        private Vector256<double> _first;
        private Vector256<double> _second;
        private Vector256<double> _third;

        public readonly double Force => Math.Max(Math.Max(Math.Max(_first[0], _first[1]), Math.Max(_first[2], _second[2])), Math.Max(_second[3], _third[0]));

        public readonly double Moment => Math.Max(Math.Max(Math.Max(_first[3], _second[0]), Math.Max(_second[1], _third[1])), Math.Max(_third[2], _third[3]));

        public void Take(Vector256<double> f0, Vector256<double> f1, Vector256<double> f2)
        {
            _first = Vector256.Max(_first, Vector256.Abs(f0));
            _second = Vector256.Max(_second, Vector256.Abs(f1));
            _third = Vector256.Max(_third, Vector256.Abs(f2));
        }
    }
}
