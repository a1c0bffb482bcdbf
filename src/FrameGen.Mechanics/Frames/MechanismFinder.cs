namespace FrameGen.Mechanics.Frames;

/// <summary>Looks behind small pivots: is there a motion without strain, and which?</summary>
internal sealed class MechanismFinder(FrameLayout layout, StiffnessBlocks stiffness, NumericFactor factor)
{
    private const int Six = SymbolicFactor.Six;

    // Strain energy of a motion over the energy its terms would have without cancelling. Rounding leaves about ε² times the condition
    // of the rest, 1e-32 · 1e12; a frame soft enough to come this low could not be solved in doubles at all.
    private const double StrainlessEnergy = 1e-18;

    private const int MostMotions = 24;

    /// <summary>Independent motions without strain; none when the small pivots are only those of a soft frame.</summary>
    /// <remarks>Where it finds one, the factor is of no more use.</remarks>
    public IReadOnlyList<Mechanism> Find()
    {
        var found = new List<(int Place, double[] Motion)>();
        bool[] isFixed = new bool[Six * layout.NodeAt.Length];
        while (found.Count < MostMotions && NextMotion() is var (freedom, motion) && motion is not null)
        {
            found.Add((freedom / Six, motion));
            isFixed[freedom] = true;
            factor.Factor(isFixed);
        }

        return found.Count == 0 ? [] : MotionDescriber.Describe(layout, found);
    }

    /// <summary>
    /// The freedom moves by one, those eliminated before it follow without force, the later ones stand still. With a zero pivot
    /// that is a motion without strain.
    /// </summary>
    private (int Freedom, double[]? Motion) NextMotion()
    {
        double[] motion = new double[Six * layout.NodeAt.Length];
        foreach (int freedom in factor.Suspects)
        {
            Array.Clear(motion);
            motion[freedom] = 1;
            factor.Backward(motion);
            if (factor.IsLost(freedom) || StrainEnergyShare(motion) < StrainlessEnergy)
            {
                return (freedom, motion);
            }
        }

        return (-1, null);
    }

    private double StrainEnergyShare(double[] motion)
    {
        double energy = 0;
        double scale = 0;
        double[] vectors = layout.Modes.Vectors;
        for (int e = 0; e < layout.Profiles.Length; e++)
        {
            for (int m = 0; m < ElementModes.Modes; m++)
            {
                ReadOnlySpan<double> g = vectors.AsSpan((ElementModes.Stride * e) + (ElementModes.Freedoms * m), ElementModes.Freedoms);
                double strain = 0;
                double size = 0;
                AddEnd(layout.Starts[e], g, ref strain, ref size);
                AddEnd(layout.Ends[e], g[Six..], ref strain, ref size);
                double s = stiffness.OfModes[(ElementModes.Modes * e) + m];
                energy += s * strain * strain;
                scale += s * size * size;
            }
        }

        foreach (FrameLayout.NodeSprings springs in layout.Springs)
        {
            for (int i = 0; i < Six; i++)
            {
                double shift = motion[(Six * springs.Place) + i];
                energy += springs.Rates[i] * shift * shift;
                scale += springs.Rates[i] * shift * shift;
            }
        }

        return scale > 0 ? energy / scale : 0;

        void AddEnd(int place, ReadOnlySpan<double> g, ref double strain, ref double size)
        {
            for (int i = 0; place >= 0 && i < Six; i++)
            {
                double term = g[i] * motion[(Six * place) + i];
                strain += term;
                size += Math.Abs(term);
            }
        }
    }
}
