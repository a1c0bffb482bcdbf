using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>
/// What one shape of a frame means to its elements, profile by profile: the squares that mass and axial force weigh. The shape is given at the nodes; between them an
/// element goes as its profile has it.
/// </summary>
/// <param name="solver">The frame, divided finely enough (<see cref="RefinedFrame"/>).</param>
public sealed class ModeEnergies(FrameSolver solver)
{
    private readonly ElementModes _modes = solver.Layout.Modes;

    /// <summary>φᵀMφ of one element.</summary>
    /// <param name="element">Index of the element.</param>
    /// <param name="profile">Its profile.</param>
    /// <param name="inertia">Its inertia per length.</param>
    /// <param name="shape">φ.</param>
    public double Inertia(int element, in BeamProfile profile, in BeamInertia inertia, ModeShape shape)
    {
        ArgumentNullException.ThrowIfNull(shape);
        Span<double> stiffness = stackalloc double[ElementModes.Modes];
        ElementFields fields = Fields(element, profile, stiffness);
        Span<double> nodes = stackalloc double[ElementModes.Freedoms];
        Nodes(element, shape, nodes);
        return NaturalFrequencies.EnergyOf(fields, inertia, _modes.Lengths[element], nodes);
    }

    /// <summary>∫ (1 − ξ)(v'² + w'²) dx and ∫ ξ (v'² + w'²) dx along one element, ξ = x/L: what an axial force that changes evenly from one end to the other weighs.</summary>
    /// <param name="element">Index of the element.</param>
    /// <param name="profile">Its profile.</param>
    /// <param name="shape">The shape.</param>
    public (double Start, double End) Slopes(int element, in BeamProfile profile, ModeShape shape)
    {
        ArgumentNullException.ThrowIfNull(shape);
        Span<double> stiffness = stackalloc double[ElementModes.Modes];
        ElementFields fields = Fields(element, profile, stiffness);
        Span<double> nodes = stackalloc double[ElementModes.Freedoms];
        Nodes(element, shape, nodes);
        return LinearBuckling.SlopesOf(fields, _modes.Lengths[element], nodes);
    }

    /// <summary>The six strains of an element in the shape (<see cref="BeamStrains"/>).</summary>
    public void Strains(int element, ModeShape shape, Span<double> strains)
    {
        ArgumentNullException.ThrowIfNull(shape);
        BeamElement beam = solver.Frame.Elements[element];
        new BeamStrains(solver).Of(
            element,
            (shape.Displacement(beam.Start), shape.Rotation(beam.Start)),
            (shape.Displacement(beam.End), shape.Rotation(beam.End)),
            strains);
    }

    /// <summary>Σ s (gᵀφ)² of an element with a profile.</summary>
    public double Energy(int element, in BeamProfile profile, ReadOnlySpan<double> strains)
    {
        Span<double> stiffness = stackalloc double[ElementModes.Modes];
        ElementModes.Stiffness(profile, _modes.Lengths[element], stiffness);
        double sum = 0;
        for (int m = 0; m < stiffness.Length; m++)
        {
            sum += stiffness[m] * strains[m] * strains[m];
        }

        return sum;
    }

    private ElementFields Fields(int element, in BeamProfile profile, Span<double> stiffness)
    {
        ElementModes.Stiffness(profile, _modes.Lengths[element], stiffness);
        return new ElementFields(solver.Frame.Elements[element], _modes.Lengths[element], stiffness);
    }

    private void Nodes(int element, ModeShape shape, Span<double> values)
    {
        BeamElement beam = solver.Frame.Elements[element];
        Put(values, shape.Displacement(beam.Start), shape.Rotation(beam.Start));
        Put(values[6..], shape.Displacement(beam.End), shape.Rotation(beam.End));

        static void Put(Span<double> six, Vector3 shift, Vector3 turn)
        {
            (six[0], six[1], six[2]) = (shift.X, shift.Y, shift.Z);
            (six[3], six[4], six[5]) = (turn.X, turn.Y, turn.Z);
        }
    }
}
