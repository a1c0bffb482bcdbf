using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>Shop preferences.</summary>
/// <param name="Cut">How cut ends are made.</param>
/// <param name="Paper">Thickness of a wrapped template, mm.</param>
/// <param name="Tolerance">Of curves, mm.</param>
/// <param name="Kerf">mm.</param>
/// <param name="BarTrim">Cut off both ends of a bar, mm.</param>
/// <param name="Page">Paper size.</param>
public sealed record Fabrication(CutMode Cut, double Paper, double Tolerance, double Kerf, double BarTrim, PageSize Page)
{
    /// <summary>Shortest straight before a bend that the bender needs, mm.</summary>
    public double Grip { get; init; }

    /// <summary>What a bend opens when it is let go.</summary>
    public Springback Springback { get; init; }
}

/// <summary>What a bend opens when it is let go: so much more it is bent.</summary>
/// <param name="Angle">The same for every bend, rad.</param>
/// <param name="Share">Of the bend's own angle.</param>
public readonly record struct Springback(double Angle, double Share)
{
    /// <summary>To what a machine is set for a bend, rad.</summary>
    /// <param name="finished">The angle wanted of the part, rad.</param>
    public double MachineAngle(double finished) => (finished * (1 + Share)) + Angle;
}
