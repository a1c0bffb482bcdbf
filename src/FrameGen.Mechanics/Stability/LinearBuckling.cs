using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>
/// Linear buckling: the factor at which a load case, all its axial forces growing alike, lets the frame bend away without more force,
/// (K + λ Kg) φ = 0. Perfect members that stay elastic; the forces are those of the frame's statics.
/// </summary>
/// <remarks>
/// Kg = ∫ N (v'² + w'²) dx on the slopes of Timoshenko's beam, shear included (F. Engesser, Zentralblatt der Bauverwaltung 11 (1891) 483), N even or
/// changing evenly along an element. Moments and torques, which make open sections tip over, are left out: closed tubes don't.
/// </remarks>
public static class LinearBuckling
{
    // Axial forces below this part of the frame's largest are rounding.
    private const double Noise = 1e-9;

    // Three points are exact for degree 5: slopes are quadratic, squared quartic, times an even change of N.
    private static readonly double[] Points = [0.5 - (0.5 * Math.Sqrt(0.6)), 0.5, 0.5 + (0.5 * Math.Sqrt(0.6))];
    private static readonly double[] Weights = [5.0 / 18, 8.0 / 18, 5.0 / 18];

    /// <summary>The lowest positive factor; null where nothing is compressed, or no factor of this sign exists.</summary>
    /// <param name="frame">The design, divided finely enough (<see cref="RefinedFrame"/>).</param>
    /// <param name="forces">By element of that frame.</param>
    /// <param name="scale">The largest internal force of the case, N: axial forces that are nothing beside it are rounding; 0 to compare them with each other only.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not one force an element.</exception>
    public static BucklingMode? Lowest(FactoredFrame frame, IReadOnlyList<AxialForce> forces, double scale = 0)
    {
        ArgumentNullException.ThrowIfNull(frame);
        ArgumentNullException.ThrowIfNull(forces);
        ArgumentOutOfRangeException.ThrowIfNotEqual(forces.Count, frame.Layout.Profiles.Length, nameof(forces));
        double largest = scale;
        double lowest = 0;
        for (int e = 0; e < forces.Count; e++)
        {
            largest = Math.Max(largest, Math.Max(Math.Abs(forces[e].Start), Math.Abs(forces[e].End)));
            lowest = Math.Min(lowest, Math.Min(forces[e].Start, forces[e].End));
        }

        if (!(lowest < -Noise * largest) || frame.Layout.NodeAt.Length == 0)
        {
            return null;
        }

        var found = new BlockLanczos(frame, Softening(frame, forces, Noise * largest), count: 1, block: 1).Largest();
        return found.Count == 1 && found[0].Theta > 0
            ? new BucklingMode(InnerResponse.Factor(frame, forces, found[0].Theta, found[0].Vector), found[0].Residual, new ModeShape(frame.Layout, found[0].Vector))
            : null;
    }

    /// <summary>∫ (1 − ξ)(v'² + w'²) dx and ∫ ξ (v'² + w'²) dx along one element, the shape given at its nodes.</summary>
    internal static (double Start, double End) SlopesOf(ElementFields fields, double length, ReadOnlySpan<double> nodes)
    {
        Span<double> field = stackalloc double[ElementModes.Freedoms];
        (double start, double end) = (0, 0);
        for (int i = 0; i < Points.Length; i++)
        {
            fields.SlopeY(Points[i], field);
            double squares = NaturalFrequencies.Square(field, nodes);
            fields.SlopeZ(Points[i], field);
            squares += NaturalFrequencies.Square(field, nodes);
            start += Weights[i] * length * (1 - Points[i]) * squares;
            end += Weights[i] * length * Points[i] * squares;
        }

        return (start, end);
    }

    /// <summary>−Kg: what a compression takes from the stiffness.</summary>
    private static SymmetricBlocks Softening(FactoredFrame frame, IReadOnlyList<AxialForce> forces, double noise)
    {
        var softening = new SymmetricBlocks(frame.Layout);
        Span<double> matrix = stackalloc double[SymmetricBlocks.ElementSize];
        Span<double> field = stackalloc double[ElementModes.Freedoms];
        for (int e = 0; e < forces.Count; e++)
        {
            AxialForce force = forces[e];
            if (Math.Abs(force.Start) <= noise && Math.Abs(force.End) <= noise)
            {
                continue;
            }

            matrix.Clear();
            var fields = new ElementFields(frame, e);
            for (int i = 0; i < Points.Length; i++)
            {
                double compression = -(force.Start + (Points[i] * (force.End - force.Start)));
                double weight = Weights[i] * frame.Layout.Modes.Lengths[e] * compression;
                fields.SlopeY(Points[i], field);
                SymmetricBlocks.AddSquare(matrix, weight, field);
                fields.SlopeZ(Points[i], field);
                SymmetricBlocks.AddSquare(matrix, weight, field);
            }

            softening.AddElement(e, matrix);
        }

        return softening;
    }
}

/// <summary>A way to buckle.</summary>
/// <param name="Factor">Times the case, it buckles.</param>
/// <param name="Residual">Relative, in the norm of K: the factor is no further off.</param>
/// <param name="Shape">How it goes.</param>
public sealed record BucklingMode(double Factor, double Residual, ModeShape Shape);
