using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Sizing.Analysis;

/// <summary>
/// A short piece of a bend, which the solver takes for a straight beam between its two ends. Lengths, weights and loads are those of the arc, and
/// internal forces are turned to the axis as it really runs there.
/// </summary>
/// <remarks>
/// How short: a chain of chords of angle θ each is up to θ²/5 softer or stiffer than the arc, from the closed form of a quarter circle. 3 degrees leave
/// 0.05 % of that.
/// </remarks>
internal sealed class ArcChord
{
    /// <summary>Largest angle of a chord, rad.</summary>
    public const double LargestAngle = 3 * Math.PI / 180;

    private readonly Tube _tube;
    private readonly Vector3 _start;
    private readonly double _chord;

    private ArcChord(Tube tube, double from, double to)
    {
        _tube = tube;
        _start = tube.PointAt(from);
        (From, To) = (from, to);
        Vector3 along = tube.PointAt(to) - _start;
        _chord = along.Length;
        Axes = TubeAxes.Along(along, tube.AxesAt(0.5 * (from + to)).Z);
    }

    /// <summary>Where it begins, mm along the tube's axis.</summary>
    public double From { get; }

    /// <summary>Where it ends, mm along the tube's axis.</summary>
    public double To { get; }

    /// <summary>Local axes of the chord.</summary>
    public TubeAxes Axes { get; }

    /// <summary>Length of the arc over that of the chord: what a load along the tube is multiplied by along the chord.</summary>
    public double Stretch => (To - From) / _chord;

    /// <summary>The chord of a stretch of a tube; null on a straight.</summary>
    public static ArcChord? Of(Tube tube, double from, double to) =>
        tube.Bent?.PieceAt(0.5 * (from + to)) is { IsArc: true } ? new ArcChord(tube, from, to) : null;

    /// <summary>Where the solver's elements have to meet on a tube because it bends: ends of bends, and of chords within them, mm.</summary>
    public static IEnumerable<double> Places(Tube tube)
    {
        foreach (PathPiece arc in (tube.Bent?.Pieces ?? []).Where(p => p.IsArc))
        {
            int chords = (int)Math.Ceiling((arc.Length / arc.Radius / LargestAngle) - 1e-9);
            for (int i = 0; i <= chords; i++)
            {
                yield return arc.Start + (i * arc.Length / chords);
            }
        }
    }

    /// <summary>Internal forces about the true axis.</summary>
    /// <param name="forces">Of the chord.</param>
    /// <param name="distance">Place on the tube's axis, mm.</param>
    public SectionForces At(in ElementForces forces, double distance)
    {
        double x = (distance - From) / Stretch;
        SectionForces there = forces.At(x);
        Vector3 force = (there.N * Axes.X) + (there.Vy * Axes.Y) + (there.Vz * Axes.Z);
        Vector3 arm = _start + (x * Axes.X) - _tube.PointAt(distance);
        Vector3 moment = (there.T * Axes.X) + (there.My * Axes.Y) + (there.Mz * Axes.Z) + arm.Cross(force);
        TubeAxes axes = _tube.AxesAt(distance);
        return new SectionForces(
            force.Dot(axes.X), force.Dot(axes.Y), force.Dot(axes.Z), moment.Dot(axes.X), moment.Dot(axes.Y), moment.Dot(axes.Z));
    }
}
