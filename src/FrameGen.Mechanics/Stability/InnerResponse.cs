using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>
/// What elements do between their nodes beyond the shape of an unloaded beam: they give way to what the motion itself puts on them, the push of an axial force
/// on a bent axis or the inertia of moving mass. It is worked out element by element, both ends held, for a mode that was found without it, and taken into Rayleigh's
/// quotient.
/// </summary>
/// <remarks>
/// Without it n elements put the eigenvalue of a span too high by (kL/n)⁴/720 of itself from bending and, where tubes are stout, by far more: by (kL/n)²/12 of the part
/// that shear has in the movement. An element held at both ends gives way to an even load q by ∫ q w dx = q² (L⁵/720EI + L³/12GA).
/// </remarks>
internal static class InnerResponse
{
    private const int Planes = 2;
    private const int MostSteps = 30;
    private const double Settled = 1e-14;

    // Exact for degree 5: a mean of cubics, a mean of squared quadratics.
    private static readonly double[] Points = [0.5 - (0.5 * Math.Sqrt(0.6)), 0.5, 0.5 + (0.5 * Math.Sqrt(0.6))];
    private static readonly double[] Weights = [5.0 / 18, 8.0 / 18, 5.0 / 18];

    /// <summary>A buckling factor with it.</summary>
    /// <param name="frame">The design.</param>
    /// <param name="forces">By element.</param>
    /// <param name="theta">One over the factor without it.</param>
    /// <param name="vector">The mode.</param>
    public static double Factor(FactoredFrame frame, IReadOnlyList<AxialForce> forces, double theta, double[] vector)
    {
        double energy = VectorKernels.Dot(vector, StiffnessProduct.Of(frame, vector));
        double factor = 1 / theta;
        var gains = new Gain[Planes * forces.Count];
        Span<double> nodes = stackalloc double[ElementModes.Freedoms];
        for (int e = 0; e < forces.Count; e++)
        {
            double compression = -0.5 * (forces[e].Start + forces[e].End);
            Nodes(frame.Layout, e, vector, nodes);
            var fields = new ElementFields(frame, e);
            gains[Planes * e] = Bent(fields, frame.Layout.Modes.Lengths[e], inY: true, compression, nodes);
            gains[(Planes * e) + 1] = Bent(fields, frame.Layout.Modes.Lengths[e], inY: false, compression, nodes);

            // An element can't carry its shear stiffness as a compression.
            factor = gains[Planes * e].Within(gains[(Planes * e) + 1].Within(factor));
        }

        // Where energy = λ θ energy + all gains at λ: the right side rises and bends upwards, so that Newton's steps from above stay above.
        for (int step = 0; step < MostSteps; step++)
        {
            (double value, double slope) = (((factor * theta) - 1) * energy, theta * energy);
            foreach (Gain gain in gains)
            {
                gain.Add(factor, ref value, ref slope);
            }

            factor -= value / slope;
            if (Math.Abs(value / slope) <= Settled * factor)
            {
                break;
            }
        }

        return factor;
    }

    /// <summary>An eigenvalue of vibration with it, in the units of K/M.</summary>
    /// <param name="frame">The design.</param>
    /// <param name="mass">Its mass.</param>
    /// <param name="theta">One over the eigenvalue without it.</param>
    /// <param name="vector">The mode.</param>
    public static double Eigenvalue(FactoredFrame frame, FrameMass mass, double theta, double[] vector)
    {
        double gain = 0;
        Span<double> nodes = stackalloc double[ElementModes.Freedoms];
        Span<double> field = stackalloc double[ElementModes.Freedoms];
        for (int e = 0; e < mass.Elements.Count; e++)
        {
            Nodes(frame.Layout, e, vector, nodes);
            var fields = new ElementFields(frame, e);
            (double inY, double inZ) = (0, 0);
            for (int i = 0; i < Points.Length; i++)
            {
                fields.AcrossY(Points[i], field);
                inY += Weights[i] * VectorKernels.Dot(field, nodes);
                fields.AcrossZ(Points[i], field);
                inZ += Weights[i] * VectorKernels.Dot(field, nodes);
            }

            double length = frame.Layout.Modes.Lengths[e];
            double load = mass.Elements[e].MassPerLength;
            gain += (GivenWay(fields.RigidityInY, length) * load * load * inY * inY) + (GivenWay(fields.RigidityInZ, length) * load * load * inZ * inZ);
        }

        gain /= VectorKernels.Dot(vector, StiffnessProduct.Of(frame, vector));
        return 2 / (theta + Math.Sqrt((theta * theta) + (4 * gain)));
    }

    /// <summary>∫ w dx under an even load of 1 with both ends held; 0 where an end is hinged, whose share is small.</summary>
    private static double GivenWay((double Bending, double Shear) rigidity, double length) => rigidity.Bending > 0
        ? length * length * length * ((length * length / (720 * rigidity.Bending)) + (1 / (12 * rigidity.Shear)))
        : 0;

    private static Gain Bent(in ElementFields fields, double length, bool inY, double compression, ReadOnlySpan<double> nodes)
    {
        (double bending, double shear) = inY ? fields.RigidityInY : fields.RigidityInZ;
        if (!(bending > 0) || compression == 0)
        {
            return default;
        }

        Span<double> field = stackalloc double[ElementModes.Freedoms];
        (double mean, double squares) = (0, 0);
        for (int i = 0; i < Points.Length; i++)
        {
            if (inY)
            {
                fields.SlopeY(Points[i], field);
            }
            else
            {
                fields.SlopeZ(Points[i], field);
            }

            double slope = VectorKernels.Dot(field, nodes);
            mean += Weights[i] * slope;
            squares += Weights[i] * slope * slope;
        }

        double turned = 0;
        foreach (int end in (ReadOnlySpan<int>)[0, 1])
        {
            if (inY)
            {
                fields.TurnZ(end, field);
            }
            else
            {
                fields.TurnY(end, field);
            }

            turned = VectorKernels.Dot(field, nodes) - turned;
        }

        // The curvature is turned/L: its push on the axis gives way by L⁵/720EI of its square.
        return new Gain(compression, shear, length * Math.Max(0, squares - (mean * mean)), length * length * length * turned * turned / (720 * bending));
    }

    private static void Nodes(FrameLayout layout, int element, double[] vector, Span<double> nodes)
    {
        Put(layout.Starts[element], nodes);
        Put(layout.Ends[element], nodes[SymbolicFactor.Six..]);

        void Put(int place, Span<double> six)
        {
            if (place >= 0)
            {
                vector.AsSpan(SymbolicFactor.Six * place, SymbolicFactor.Six).CopyTo(six);
            }
            else
            {
                six[..SymbolicFactor.Six].Clear();
            }
        }
    }

    /// <summary>What one element gives in one plane.</summary>
    /// <param name="Compression">c, N; below 0 for a pull.</param>
    /// <param name="Shear">GA, N; infinite where shear does not count.</param>
    /// <param name="Slopes">∫ (v' − its mean)² dx: with shear strain free to follow it, (λc)²/(GA − λc) of that.</param>
    /// <param name="Curvature">What bending gives, over (λc)².</param>
    private readonly record struct Gain(double Compression, double Shear, double Slopes, double Curvature)
    {
        private const double Nearly = 0.999;

        public double Within(double factor) => Compression * factor >= Nearly * Shear && Compression > 0 ? Nearly * Shear / Compression : factor;

        public void Add(double factor, ref double value, ref double slope)
        {
            if (Compression == 0)
            {
                return;
            }

            double push = factor * Compression;
            double rest = Shear - push;
            value += push * push * ((Slopes / rest) + Curvature);
            slope += Compression * push * ((2 * ((Slopes / rest) + Curvature)) + (push * Slopes / (rest * rest)));
        }
    }
}
