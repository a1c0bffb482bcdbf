namespace FrameGen.Mechanics.Sections;

/// <summary>
/// A tube that is not round: one wall round one cell, the same thickness all the way, and both local axes axes of symmetry.
/// </summary>
/// <remarks>
/// Torsion follows the closed-cell rule of EN 10219-2:2006 Annex B for every such shape. With h the length of the wall's middle line,
/// Ah the area it encloses and K = 2 Ah t/h: J = t³h/3 + 2 K Ah, torsion modulus J/(t + K/t).
/// </remarks>
public abstract record CellTube : Section
{
    private CellStress? _stress;

    private protected CellTube(double height, double width, double wall) => (Height, Width, Wall) = (height, width, wall);

    /// <inheritdoc/>
    public sealed override double Height { get; }

    /// <inheritdoc/>
    public sealed override double Width { get; }

    /// <inheritdoc/>
    public sealed override double Wall { get; }

    /// <summary>h, length of the wall's middle line, mm.</summary>
    public abstract double MidLineLength { get; }

    /// <summary>Ah, area that the wall's middle line encloses, mm².</summary>
    public abstract double MidLineArea { get; }

    /// <summary>J = t³h/3 + 2 K Ah, mm⁴ (EN 10219-2:2006 Annex B).</summary>
    public sealed override double J => (Wall * Wall * Wall * MidLineLength / 3) + (2 * CellFactor * MidLineArea);

    /// <summary>J/(t + K/t), mm³ (EN 10219-2:2006 Annex B).</summary>
    public sealed override double TorsionModulus => J / (Wall + (CellFactor / Wall));

    /// <summary>Pieces of a quarter of the wall, from the top line to the side; along each the skins are smooth.</summary>
    internal abstract int Pieces { get; }

    /// <summary>Equal parts of a piece at whose ends stresses are looked at.</summary>
    internal abstract int PartsOf(int piece);

    // K = 2 Ah t/h, mm².
    private double CellFactor => 2 * MidLineArea * Wall / MidLineLength;

    /// <inheritdoc/>
    public sealed override double VonMises(in SectionForces forces)
    {
        double axial = Math.Abs(forces.N) / Area;
        double atTop = Math.Abs(forces.My) / Iy;
        double atSide = Math.Abs(forces.Mz) / Iz;
        if (forces.Vy == 0 && forces.Vz == 0)
        {
            // Torsion is the same all round a skin, so the worst place is the one that bending stresses most.
            double sigma = axial + Farthest(atSide, atTop);
            double tau = forces.T / TorsionModulus;
            return Math.Sqrt((sigma * sigma) + (3 * tau * tau));
        }

        // Two threads may both make the table: they make the same one.
        _stress ??= new CellStress(this);
        return _stress.Worst(forces);
    }

    /// <summary>Torsional stress per N·mm of torque on the outer and on the inner skin, MPa: (K/t ± t)/J.</summary>
    internal (double Outer, double Inner) TorsionStress() => (((CellFactor / Wall) + Wall) / J, ((CellFactor / Wall) - Wall) / J);

    /// <summary>The largest y·Y + z·Z over the outer skin: how far it reaches in a direction; y and z not negative.</summary>
    private protected abstract double Farthest(double y, double z);

    /// <summary>A place on a skin in the first quadrant.</summary>
    /// <param name="piece">0 ≤ piece &lt; <see cref="Pieces"/>, from the top line.</param>
    /// <param name="u">Along the piece, 0 to 1.</param>
    /// <param name="inner">True for the inner skin.</param>
    internal abstract WallPoint At(int piece, double u, bool inner);
}
