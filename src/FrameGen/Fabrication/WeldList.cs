using FrameGen.Model;

namespace FrameGen.Fabrication;

/// <summary>What there is to weld: the outer curve of every coped and mitred end, a miter once.</summary>
/// <param name="Seams">Joint by joint, in the order of fitting.</param>
public sealed record WeldList(IReadOnlyList<WeldSeam> Seams)
{
    /// <summary>Of all seams, mm.</summary>
    public double Length { get; } = Seams.Sum(s => s.Length);

    /// <summary>Estimate of the metal laid down, kg, without what is lost.</summary>
    public double FillerKg { get; } = Seams.Sum(s => s.FillerKg);
}

/// <summary>One seam.</summary>
/// <remarks>
/// Fillet where the outer surfaces meet at 60 to 120 degrees, butt elsewhere and at a miter: the range of EN 1993-1-8:2005
/// 4.3.2.1 (from memory), point by point along the curve.
/// </remarks>
/// <param name="Node">Index of the node.</param>
/// <param name="End">The end whose curve it is.</param>
/// <param name="Length">True length of the curve, mm.</param>
/// <param name="Fillet">Of it, mm, where the surfaces meet as for a fillet.</param>
/// <param name="Least">Least angle between the outer surfaces along it, rad, measured in the open.</param>
/// <param name="Most">Greatest angle, rad.</param>
/// <param name="Leg">Leg that the estimate of filler takes: the thinner of the two walls, mm (common practice, no source).</param>
/// <param name="FillerKg">Estimate of the metal laid down, kg; 0 where no heat joins the tubes.</param>
/// <param name="IsWelded">False where one of the tubes is joined without heat.</param>
public sealed record WeldSeam(
    int Node, TubeEndId End, double Length, double Fillet, double Least, double Most, double Leg, double FillerKg, bool IsWelded)
{
    /// <summary>Of it, mm, where a butt weld is needed.</summary>
    public double Butt => Length - Fillet;
}
