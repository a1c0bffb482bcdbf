using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>K x from the elements' ways to strain and the springs, without an assembled matrix.</summary>
internal static class StiffnessProduct
{
    private const int Six = SymbolicFactor.Six;

    /// <summary>K x in elimination order, zero in held freedoms.</summary>
    /// <param name="frame">The design.</param>
    /// <param name="x">In elimination order, zero in held freedoms.</param>
    public static double[] Of(FactoredFrame frame, double[] x)
    {
        FrameLayout layout = frame.Layout;
        double[] y = new double[x.Length];
        for (int e = 0; e < layout.Profiles.Length; e++)
        {
            (int start, int end) = (layout.Starts[e], layout.Ends[e]);
            for (int m = 0; m < ElementModes.Modes; m++)
            {
                ReadOnlySpan<double> g = layout.Modes.Vectors.AsSpan(
                    (ElementModes.Stride * e) + (ElementModes.Freedoms * m), ElementModes.Freedoms);
                double force = frame.OfModes[(ElementModes.Modes * e) + m] * (Strain(g, start, x) + Strain(g[Six..], end, x));
                Add(g, force, start, y);
                Add(g[Six..], force, end, y);
            }
        }

        foreach (FrameLayout.NodeSprings springs in layout.Springs)
        {
            for (int i = 0; i < Six; i++)
            {
                y[(Six * springs.Place) + i] += springs.Rates[i] * x[(Six * springs.Place) + i];
            }
        }

        for (int k = 0; k < y.Length; k++)
        {
            y[k] = layout.HeldAt[k] ? 0 : y[k];
        }

        return y;
    }

    private static double Strain(ReadOnlySpan<double> g, int place, double[] x)
    {
        double sum = 0;
        for (int i = 0; i < Six && place >= 0; i++)
        {
            sum += g[i] * x[(Six * place) + i];
        }

        return sum;
    }

    private static void Add(ReadOnlySpan<double> g, double force, int place, double[] y)
    {
        for (int i = 0; i < Six && place >= 0; i++)
        {
            y[(Six * place) + i] += force * g[i];
        }
    }
}
