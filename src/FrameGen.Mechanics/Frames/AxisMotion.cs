using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Mechanics.Frames;

/// <summary>How a place on an element's axis moves under a load set, global axes.</summary>
/// <param name="Shift">Displacement of the axis, mm.</param>
/// <param name="Turn">Rotation of the section there, rad.</param>
public readonly record struct AxisMotion(Vector3 Shift, Vector3 Turn)
{
    /// <summary>The motion of one place, exact for a Timoshenko beam under an even load, with or without hinges.</summary>
    /// <remarks>
    /// The beam's equations integrated along the internal forces: u' = N/EA, φ' = T/GJ, θy' = My/EIy, θz' = Mz/EIz, v' = θz + Vy/GAy,
    /// w' = −θy + Vz/GAz. Both ends' displacements are the nodes'; the rotations at the start follow from them, since a hinge may part those from the nodes'.
    /// </remarks>
    /// <param name="frame">The frame that was solved.</param>
    /// <param name="solution">Its solution.</param>
    /// <param name="element">Index of the element.</param>
    /// <param name="profile">Its profile in the design that was solved.</param>
    /// <param name="share">x / L: 0 at the start of the axis, 1 at its end.</param>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="share"/> is outside 0 to 1.</exception>
    public static AxisMotion At(BeamFrame frame, FrameSolution solution, int element, in BeamProfile profile, double share)
    {
        ArgumentNullException.ThrowIfNull(frame);
        ArgumentNullException.ThrowIfNull(solution);
        if (!(share is >= 0 and <= 1))
        {
            throw new ArgumentOutOfRangeException(nameof(share), share, "A place on an element lies from 0 to 1 times its length.");
        }

        BeamElement beam = frame.Elements[element];
        TubeAxes axes = beam.Axes;
        ElementForces forces = solution.Forces(element);
        double length = forces.Length;
        double x = share * length;
        Vector3 start = solution.Displacement(beam.Start) + solution.Rotation(beam.Start).Cross(beam.StartOffset);
        Vector3 end = solution.Displacement(beam.End) + solution.Rotation(beam.End).Cross(beam.EndOffset);

        // Integrals up to x and up to the end.
        Sums here = Sums.To(x, in forces, in profile);
        Sums all = Sums.To(length, in forces, in profile);
        Vector3 across = end - start;
        double turnY = -(across.Dot(axes.Z) + all.Sag.Z) / length;
        double turnZ = (across.Dot(axes.Y) - all.Sag.Y) / length;
        double twist = (beam.Hinges & Hinges.StartX) == Hinges.None
            ? solution.Rotation(beam.Start).Dot(axes.X)
            : solution.Rotation(beam.End).Dot(axes.X) - all.Turn.X;
        return new AxisMotion(
            start + (here.Sag.X * axes.X) + (((turnZ * x) + here.Sag.Y) * axes.Y) + (((-turnY * x) - here.Sag.Z) * axes.Z),
            ((twist + here.Turn.X) * axes.X) + ((turnY + here.Turn.Y) * axes.Y) + ((turnZ + here.Turn.Z) * axes.Z));
    }

    /// <summary>What the internal forces from the start to a place do: the turn of the section, and how far the axis leaves its tangent (z: against the axis).</summary>
    private readonly record struct Sums(Vector3 Sag, Vector3 Turn)
    {
        public static Sums To(double x, in ElementForces forces, in BeamProfile profile)
        {
            SectionForces s = forces.Start;
            double half = x * x / 2;
            double sixth = x * half / 3;
            double last = x * sixth / 4;
            double bendY = profile.E * profile.Iy;
            double bendZ = profile.E * profile.Iz;
            double shearY = ((s.Vy * x) - (forces.Py * half)) / (profile.G * profile.ShearAreaY);
            double shearZ = ((s.Vz * x) - (forces.Pz * half)) / (profile.G * profile.ShearAreaZ);
            return new Sums(
                new Vector3(
                    ((s.N * x) - (forces.Px * half)) / (profile.E * profile.Area),
                    (((s.Mz * half) - (s.Vy * sixth) + (forces.Py * last)) / bendZ) + shearY,
                    (((s.My * half) + (s.Vz * sixth) - (forces.Pz * last)) / bendY) - shearZ),
                new Vector3(
                    s.T * x / (profile.G * profile.J),
                    ((s.My * x) + (s.Vz * half) - (forces.Pz * sixth)) / bendY,
                    ((s.Mz * x) - (s.Vy * half) + (forces.Py * sixth)) / bendZ));
        }
    }
}
