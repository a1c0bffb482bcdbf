using FrameGen.Geometry;

namespace FrameGen.Mechanics.Frames;

/// <summary>
/// The elements in natural form: each has six ways to strain, K = Σ s g gᵀ over them, where g (12 values, global axes, at the nodes)
/// comes from the geometry alone and s from the profile. It is the Timoshenko beam of J. Przemieniecki, Theory of Matrix Structural
/// Analysis (1968), section 5.6, taken apart; a motion as a rigid body strains nothing, also in rounded numbers.
/// </summary>
/// <remarks>
/// With X, Y, Z the local axes and forces and moments at the axis' own two ends, the modes are
/// stretch (−X, 0, X, 0), s = EA/L;
/// twist (0, −X, 0, X), s = GJ/L;
/// even bending in the x-y plane (0, −Z, 0, Z), s = E Iz/L; in the x-z plane (0, −Y, 0, Y), s = E Iy/L;
/// shearing bending in x-y (Y, ½L Z, −Y, ½L Z), s = 12 E Iz/(L³ (1 + φ)), φ = 12 E Iz/(G Ay L²);
/// in x-z (Z, −½L Y, −Z, −½L Y), s = 12 E Iy/(L³ (1 + φ)), φ = 12 E Iy/(G Az L²).
/// An axis end that stands off its node by o passes its force on with the moment o × force.
/// A hinge takes a mode away. With one end hinged in a plane, even bending (e) and shearing bending (s) only come together, as s ∓ ½L e, which
/// has no moment at that end, with 1/s' = 1/s_s + L²/(4 s_e); with both, neither is left. A torque is carried by both ends or by none.
/// </remarks>
internal sealed class ElementModes
{
    /// <summary>Ways to strain.</summary>
    public const int Modes = 6;

    /// <summary>Freedoms of two nodes.</summary>
    public const int Freedoms = 12;

    /// <summary>Doubles an element in <see cref="Vectors"/>.</summary>
    public const int Stride = Modes * Freedoms;

    private const double AxisTolerance = 1e-6;

    /// <summary>Works out the modes of a frame's elements.</summary>
    /// <exception cref="ArgumentException">An element has no length, joins a node with itself, names a missing node, or its axes
    /// don't run along it.</exception>
    public ElementModes(BeamFrame frame)
    {
        int count = frame.Elements.Count;
        Vectors = new double[Stride * count];
        Lengths = new double[count];
        Hinges = new Hinges[count];
        for (int e = 0; e < count; e++)
        {
            BeamElement element = frame.Elements[e];
            if (element.Start == element.End || !IsNode(element.Start) || !IsNode(element.End))
            {
                throw new ArgumentException(
                    $"Element {e} joins nodes {element.Start} and {element.End}; it needs two different nodes of the frame's {frame.Nodes.Count}.",
                    nameof(frame));
            }

            if (element.Profile < 0)
            {
                throw new ArgumentException($"Element {e} has profile {element.Profile}; profiles count from 0.", nameof(frame));
            }

            Vector3 along = frame.Nodes[element.End] + element.EndOffset - frame.Nodes[element.Start] - element.StartOffset;
            TubeAxes axes = element.Axes;
            double length = along.Dot(axes.X);
            if (!(length > 0 && double.IsFinite(length) && along.Cross(axes.X).Length <= AxisTolerance * length))
            {
                throw new ArgumentException($"Element {e} runs along {along}, which is not along its x axis {axes.X}.", nameof(frame));
            }

            Lengths[e] = length;
            Vector3 zero = Vector3.Zero;
            Set(e, 0, element, -axes.X, zero, axes.X, zero);
            Set(e, 1, element, zero, -axes.X, zero, axes.X);
            Set(e, 2, element, zero, -axes.Z, zero, axes.Z);
            Set(e, 3, element, zero, -axes.Y, zero, axes.Y);
            Set(e, 4, element, axes.Y, 0.5 * length * axes.Z, -axes.Y, 0.5 * length * axes.Z);
            Set(e, 5, element, axes.Z, -0.5 * length * axes.Y, -axes.Z, -0.5 * length * axes.Y);
            Hinges[e] = element.Hinges;
            HasHinges |= element.Hinges != Frames.Hinges.None;
            Join(e, 4, 2, HingeSide(element.Hinges, Frames.Hinges.StartZ, Frames.Hinges.EndZ) * 0.5 * length);
            Join(e, 5, 3, -HingeSide(element.Hinges, Frames.Hinges.StartY, Frames.Hinges.EndY) * 0.5 * length);
        }

        bool IsNode(int node) => node >= 0 && node < frame.Nodes.Count;
    }

    /// <summary>True where some element has one.</summary>
    public bool HasHinges { get; }

    /// <summary>Of each element.</summary>
    public Hinges[] Hinges { get; }

    /// <summary>L of each element, mm.</summary>
    public double[] Lengths { get; }

    /// <summary>For each element and mode 12 values: force and moment at the start node, then at the end node.</summary>
    public double[] Vectors { get; }

    /// <summary>The six stiffnesses of an element: N/mm for stretch and shear, N·mm for the others.</summary>
    /// <param name="profile">The element's profile.</param>
    /// <param name="length">L, mm.</param>
    /// <param name="stiffness">Out: six values in the order of the modes.</param>
    public static void Stiffness(in BeamProfile profile, double length, Span<double> stiffness)
    {
        double perLength = 1 / length;
        double aboutZ = profile.E * profile.Iz * perLength;
        double aboutY = profile.E * profile.Iy * perLength;
        double twelve = 12 * perLength * perLength;
        stiffness[0] = profile.E * profile.Area * perLength;
        stiffness[1] = profile.G * profile.J * perLength;
        stiffness[2] = aboutZ;
        stiffness[3] = aboutY;
        stiffness[4] = twelve * aboutZ / (1 + (twelve * length * aboutZ / (profile.G * profile.ShearAreaY)));
        stiffness[5] = twelve * aboutY / (1 + (twelve * length * aboutY / (profile.G * profile.ShearAreaZ)));
    }

    /// <summary>Takes from the six stiffnesses of an element what its hinges don't carry.</summary>
    /// <param name="hinges">Not none.</param>
    /// <param name="length">L, mm.</param>
    /// <param name="stiffness">In: as without hinges. Out: of the modes that are left, 0 for those that are not.</param>
    /// <returns>For bending about y and about z ½L s_s/(s_e + ¼L² s_s), 1/mm, of a plane with one hinge: the shear force that an end moment brings along when
    /// it is let go, per moment; 0 for the others.</returns>
    public static (double Y, double Z) Release(Hinges hinges, double length, Span<double> stiffness)
    {
        if ((hinges & (Frames.Hinges.StartX | Frames.Hinges.EndX)) != Frames.Hinges.None)
        {
            stiffness[1] = 0;
        }

        return (
            Release(hinges & Frames.Hinges.StartY, hinges & Frames.Hinges.EndY, length, ref stiffness[3], ref stiffness[5]),
            Release(hinges & Frames.Hinges.StartZ, hinges & Frames.Hinges.EndZ, length, ref stiffness[2], ref stiffness[4]));
    }

    /// <summary>1 with a hinge at the start alone, −1 at the end alone, 0 with none or both.</summary>
    public static int HingeSide(Hinges hinges, Hinges start, Hinges end) => ((hinges & start) != Frames.Hinges.None ? 1 : 0) - ((hinges & end) != Frames.Hinges.None ? 1 : 0);

    private static double Release(Hinges start, Hinges end, double length, ref double even, ref double shearing)
    {
        if (start == Frames.Hinges.None && end == Frames.Hinges.None)
        {
            return 0;
        }

        double sum = even + (0.25 * length * length * shearing);
        bool both = start != Frames.Hinges.None && end != Frames.Hinges.None;
        double share = both || sum == 0 ? 0 : shearing / sum;
        (even, shearing) = (0, share * even);
        return 0.5 * length * share;
    }

    // What is left of two bending modes at a hinge: mode += factor · other.
    private void Join(int element, int mode, int other, double factor)
    {
        if (factor != 0)
        {
            Span<double> g = Vectors.AsSpan((Stride * element) + (Freedoms * mode), Freedoms);
            ReadOnlySpan<double> added = Vectors.AsSpan((Stride * element) + (Freedoms * other), Freedoms);
            for (int i = 0; i < Freedoms; i++)
            {
                g[i] += factor * added[i];
            }
        }
    }

    private void Set(
        int element, int mode, BeamElement beam, Vector3 startForce, Vector3 startMoment, Vector3 endForce, Vector3 endMoment)
    {
        Span<double> g = Vectors.AsSpan((Stride * element) + (Freedoms * mode), Freedoms);
        Put(g, startForce, startMoment + beam.StartOffset.Cross(startForce));
        Put(g[6..], endForce, endMoment + beam.EndOffset.Cross(endForce));
    }

    private static void Put(Span<double> six, Vector3 force, Vector3 moment)
    {
        (six[0], six[1], six[2]) = (force.X, force.Y, force.Z);
        (six[3], six[4], six[5]) = (moment.X, moment.Y, moment.Z);
    }
}
