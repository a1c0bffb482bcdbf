namespace FrameGen.Geometry;

/// <summary>
/// An outline as the parallel lines of one direction meet it: u is a line's distance from the axis, v the place along it. The far
/// side, where lines leave, is a concave curve v(u); the near side is the far side turned by half a turn, v = −far(−u).
/// </summary>
public abstract class OutlineView
{
    private protected OutlineView()
    {
    }

    /// <summary>Lines farther from the axis than this miss, mm.</summary>
    public abstract double HalfWidth { get; }

    /// <summary>Where the far side goes from flat to corner arc or has a sharp corner: u inside ±<see cref="HalfWidth"/>, mm, growing.</summary>
    public abstract IReadOnlyList<double> Breaks { get; }

    /// <summary>Unit directions (u, v) of the outline's flats, each once.</summary>
    public abstract IReadOnlyList<Point2> Flats { get; }

    /// <summary>Whether a line meets the outline, or passes it by no more than <see cref="Outline.Graze"/>.</summary>
    /// <param name="u">mm.</param>
    public bool Reaches(double u) => Math.Abs(u) <= HalfWidth + Outline.Graze;

    /// <summary>Where a line leaves, mm; of the outermost line for one that misses.</summary>
    /// <param name="u">mm.</param>
    public abstract double Far(double u);

    /// <summary>Where a line comes in, mm.</summary>
    /// <param name="u">mm.</param>
    public virtual double Near(double u) => -Far(-u);

    /// <summary>Where a line comes in and where it leaves, mm.</summary>
    /// <param name="u">mm.</param>
    public virtual (double Near, double Far) Chord(double u) => (-Far(-u), Far(u));

    /// <summary>
    /// Which smooth piece of the far side a line leaves by: how many <see cref="Breaks"/> lie more than <see cref="Outline.Graze"/>
    /// below it, so that rounding can't choose for a flat of lines that all leave at a break.
    /// </summary>
    /// <param name="u">mm.</param>
    public abstract int PieceAt(double u);

    /// <summary>u of the point whose outward normal has a direction, mm; of the middle of a flat that has.</summary>
    /// <param name="normal">(u, v); any length but zero.</param>
    public abstract double Farthest(Point2 normal);

    /// <summary>Where a line of any direction crosses the outline.</summary>
    /// <param name="point">On the line, (u, v).</param>
    /// <param name="direction">Of the line, (u, v); any length but zero.</param>
    /// <param name="enter">How many times <paramref name="direction"/> past <paramref name="point"/> it comes in.</param>
    /// <param name="leave">How many times <paramref name="direction"/> past <paramref name="point"/> it goes out.</param>
    /// <returns>False where it misses.</returns>
    public abstract bool Cross(Point2 point, Point2 direction, out double enter, out double leave);
}
