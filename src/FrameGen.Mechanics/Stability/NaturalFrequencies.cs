using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>Undamped natural frequencies, K φ = ω² M φ, with the consistent mass of Timoshenko's beam and point masses.</summary>
public static class NaturalFrequencies
{
    // mm, N and kg are not coherent: K/M comes in N/(mm·kg) = 1000/s².
    private const double PerSquareSecond = 1000;

    // Four points are exact for degree 7: deflections are cubic, squared of degree 6.
    private static readonly double[] Points = FourPoints();
    private static readonly double[] Weights = FourWeights();

    /// <summary>The lowest modes.</summary>
    /// <param name="frame">The design, divided finely enough (<see cref="RefinedFrame"/>).</param>
    /// <param name="mass">What it has to carry along.</param>
    /// <param name="count">Modes wanted, at least 1.</param>
    /// <returns>Lowest first; fewer than wanted where the masses can't move in so many ways.</returns>
    /// <exception cref="ArgumentOutOfRangeException">Count below 1, not one inertia an element, a negative mass, or a mass on a node that is not there.</exception>
    public static IReadOnlyList<VibrationMode> Lowest(FactoredFrame frame, FrameMass mass, int count)
    {
        ArgumentNullException.ThrowIfNull(frame);
        ArgumentNullException.ThrowIfNull(mass);
        ArgumentOutOfRangeException.ThrowIfLessThan(count, 1);
        ArgumentOutOfRangeException.ThrowIfNotEqual(mass.Elements.Count, frame.Layout.Profiles.Length, nameof(mass));

        // Frames are symmetric and tubes round, so modes come in pairs and more: the block is wider than what is wanted.
        var found = frame.Layout.NodeAt.Length == 0
            ? []
            : new BlockLanczos(frame, Matrix(frame, mass), count, count + 1).Largest();
        return [.. found.Where(f => f.Theta > 0).Select(f => new VibrationMode(
            Math.Sqrt(PerSquareSecond * InnerResponse.Eigenvalue(frame, mass, f.Theta, f.Vector)) / (2 * Math.PI), f.Residual, new ModeShape(frame.Layout, f.Vector)))
            .OrderBy(m => m.Hertz)];
    }

    private static SymmetricBlocks Matrix(FactoredFrame frame, FrameMass mass)
    {
        var blocks = new SymmetricBlocks(frame.Layout);
        Span<double> matrix = stackalloc double[SymmetricBlocks.ElementSize];
        for (int e = 0; e < mass.Elements.Count; e++)
        {
            matrix.Clear();
            AddElement(new ElementFields(frame, e), mass.Elements[e], frame.Layout.Modes.Lengths[e], matrix);
            blocks.AddElement(e, matrix);
        }

        Span<double> field = stackalloc double[SymbolicFactor.Six];
        foreach (PointMass point in mass.Points)
        {
            if (point.Node < 0 || point.Node >= frame.Layout.Frame.Nodes.Count || !(point.Kg >= 0 && double.IsFinite(point.Kg)))
            {
                throw new ArgumentOutOfRangeException(nameof(mass), point, "A point mass needs a node of the frame and kg that are not negative.");
            }

            foreach (Vector3 axis in (ReadOnlySpan<Vector3>)[Vector3.UnitX, Vector3.UnitY, Vector3.UnitZ])
            {
                Vector3 turn = point.Offset.Cross(axis);
                (field[0], field[1], field[2]) = (axis.X, axis.Y, axis.Z);
                (field[3], field[4], field[5]) = (turn.X, turn.Y, turn.Z);
                blocks.AddNode(point.Node, point.Kg, field);
            }
        }

        return blocks;
    }

    private static void AddElement(ElementFields fields, BeamInertia inertia, double length, Span<double> matrix)
    {
        if (!(inertia.MassPerLength >= 0 && inertia.RotaryY >= 0 && inertia.RotaryZ >= 0 && inertia.Polar >= 0))
        {
            throw new ArgumentOutOfRangeException(nameof(inertia), inertia, "An inertia can't be negative.");
        }

        Span<double> field = stackalloc double[ElementModes.Freedoms];
        for (int i = 0; i < Points.Length; i++)
        {
            double x = Points[i];
            double weight = Weights[i] * length;
            fields.Along(x, field);
            SymmetricBlocks.AddSquare(matrix, weight * inertia.MassPerLength, field);
            fields.AcrossY(x, field);
            SymmetricBlocks.AddSquare(matrix, weight * inertia.MassPerLength, field);
            fields.AcrossZ(x, field);
            SymmetricBlocks.AddSquare(matrix, weight * inertia.MassPerLength, field);
            fields.Twist(x, field);
            SymmetricBlocks.AddSquare(matrix, weight * inertia.Polar, field);
            fields.TurnY(x, field);
            SymmetricBlocks.AddSquare(matrix, weight * inertia.RotaryY, field);
            fields.TurnZ(x, field);
            SymmetricBlocks.AddSquare(matrix, weight * inertia.RotaryZ, field);
        }
    }

    /// <summary>φᵀMφ of one element, φ given at its nodes.</summary>
    internal static double EnergyOf(ElementFields fields, BeamInertia inertia, double length, ReadOnlySpan<double> nodes)
    {
        Span<double> field = stackalloc double[ElementModes.Freedoms];
        double energy = 0;
        for (int i = 0; i < Points.Length; i++)
        {
            double x = Points[i];
            double weight = Weights[i] * length;
            fields.Along(x, field);
            double squares = Square(field, nodes);
            fields.AcrossY(x, field);
            squares += Square(field, nodes);
            fields.AcrossZ(x, field);
            squares += Square(field, nodes);
            fields.Twist(x, field);
            energy += weight * ((inertia.MassPerLength * squares) + (inertia.Polar * Square(field, nodes)));
            fields.TurnY(x, field);
            energy += weight * inertia.RotaryY * Square(field, nodes);
            fields.TurnZ(x, field);
            energy += weight * inertia.RotaryZ * Square(field, nodes);
        }

        return energy;
    }

    /// <summary>The square of what a field gives at its place.</summary>
    internal static double Square(ReadOnlySpan<double> field, ReadOnlySpan<double> nodes)
    {
        double sum = 0;
        for (int i = 0; i < field.Length; i++)
        {
            sum += field[i] * nodes[i];
        }

        return sum * sum;
    }

    // Abramowitz and Stegun, table 25.4, moved to [0, 1].
    private static double[] FourPoints()
    {
        double outer = 0.5 * Math.Sqrt((3.0 / 7) + (2.0 / 7 * Math.Sqrt(1.2)));
        double inner = 0.5 * Math.Sqrt((3.0 / 7) - (2.0 / 7 * Math.Sqrt(1.2)));
        return [0.5 - outer, 0.5 - inner, 0.5 + inner, 0.5 + outer];
    }

    private static double[] FourWeights()
    {
        double outer = (18 - Math.Sqrt(30)) / 72;
        double inner = (18 + Math.Sqrt(30)) / 72;
        return [outer, inner, inner, outer];
    }
}

/// <summary>A way to vibrate.</summary>
/// <param name="Hertz">Natural frequency, Hz.</param>
/// <param name="Residual">Of ω², relative, in the norm of K.</param>
/// <param name="Shape">How it goes.</param>
public sealed record VibrationMode(double Hertz, double Residual, ModeShape Shape);

/// <summary>All the mass of a frame.</summary>
/// <param name="Elements">One an element.</param>
/// <param name="Points">Point masses; several on one node add up.</param>
public sealed record FrameMass(IReadOnlyList<BeamInertia> Elements, IReadOnlyList<PointMass> Points);

/// <summary>Inertia of an element per mm of its length.</summary>
/// <param name="MassPerLength">kg/mm: the metal's ρA and what is spread along it.</param>
/// <param name="RotaryY">ρIy, kg·mm; 0 to leave rotary inertia out.</param>
/// <param name="RotaryZ">ρIz, kg·mm; 0 to leave rotary inertia out.</param>
/// <param name="Polar">ρ(Iy + Iz), kg·mm, about its axis.</param>
public readonly record struct BeamInertia(double MassPerLength, double RotaryY, double RotaryZ, double Polar)
{
    /// <summary>Of an element that stands for a longer piece of tube, as a chord does for its arc.</summary>
    /// <param name="factor">True length over the element's.</param>
    public BeamInertia Stretched(double factor) => new(factor * MassPerLength, factor * RotaryY, factor * RotaryZ, factor * Polar);

    /// <summary>Of a profile in a metal, rotary inertia included.</summary>
    /// <param name="profile">The profile.</param>
    /// <param name="density">ρ, kg/mm³.</param>
    /// <param name="carried">Spread along it beside the metal, kg/mm.</param>
    public static BeamInertia Of(in BeamProfile profile, double density, double carried = 0) => new(
        (density * profile.Area) + carried, density * profile.Iy, density * profile.Iz, density * (profile.Iy + profile.Iz));
}

/// <summary>A mass on a node.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Kg">kg.</param>
/// <param name="Offset">From the node to the mass, mm, global: a rigid arm where not zero.</param>
public readonly record struct PointMass(int Node, double Kg, Vector3 Offset = default);
