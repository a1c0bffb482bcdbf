using FrameGen.Geometry;

namespace FrameGen.Mechanics.Frames;

/// <summary>
/// The elements of a frame by their six ways to strain, K = Σ s g gᵀ: what a displaced frame does to each of them, and what each resists with.
/// The g come from the layout alone and the s from the profile, so energies of one displaced frame can be told for many profiles.
/// </summary>
/// <param name="solver">The frame.</param>
public sealed class BeamStrains(FrameSolver solver)
{
    /// <summary>Ways to strain: stretch, twist, even bending in x-y and in x-z, shearing bending in x-y and in x-z.</summary>
    public const int Count = ElementModes.Modes;

    private readonly ElementModes _modes = solver.Layout.Modes;

    /// <summary>L of an element, mm, between the ends of its axis.</summary>
    public double Length(int element) => _modes.Lengths[element];

    /// <summary>The six stiffnesses s of an element with a profile: N/mm for stretch and shear, N·mm for the others.</summary>
    /// <param name="element">Index of the element.</param>
    /// <param name="profile">Its profile.</param>
    /// <param name="stiffness">Out: six values.</param>
    public void Stiffness(int element, in BeamProfile profile, Span<double> stiffness)
    {
        ElementModes.Stiffness(profile, _modes.Lengths[element], stiffness);
        if (_modes.Hinges[element] != Hinges.None)
        {
            ElementModes.Release(_modes.Hinges[element], _modes.Lengths[element], stiffness);
        }
    }

    /// <summary>The six strains gᵀu of an element, mm and rad.</summary>
    /// <param name="element">Index of the element.</param>
    /// <param name="start">Displacement and rotation of its start node.</param>
    /// <param name="end">Of its end node.</param>
    /// <param name="strains">Out: six values.</param>
    public void Of(
        int element, (Vector3 Shift, Vector3 Turn) start, (Vector3 Shift, Vector3 Turn) end, Span<double> strains)
    {
        ReadOnlySpan<double> u =
        [
            start.Shift.X, start.Shift.Y, start.Shift.Z, start.Turn.X, start.Turn.Y, start.Turn.Z,
            end.Shift.X, end.Shift.Y, end.Shift.Z, end.Turn.X, end.Turn.Y, end.Turn.Z,
        ];
        for (int m = 0; m < Count; m++)
        {
            ReadOnlySpan<double> g = _modes.Vectors.AsSpan((ElementModes.Stride * element) + (ElementModes.Freedoms * m), ElementModes.Freedoms);
            double sum = 0;
            for (int i = 0; i < g.Length; i++)
            {
                sum += g[i] * u[i];
            }

            strains[m] = sum;
        }
    }

    /// <summary>The six strains of an element in a solved frame.</summary>
    public void Of(int element, FrameSolution solution, Span<double> strains)
    {
        BeamElement beam = solver.Frame.Elements[element];
        Of(
            element,
            (solution.Displacement(beam.Start), solution.Rotation(beam.Start)),
            (solution.Displacement(beam.End), solution.Rotation(beam.End)),
            strains);
    }

    /// <summary>The nodal loads that ask for Σ k gᵀu: what a load set does to them is that sum.</summary>
    /// <param name="element">Index of the element.</param>
    /// <param name="factors">Six values k.</param>
    public (NodalLoad Start, NodalLoad End) Load(int element, ReadOnlySpan<double> factors)
    {
        Span<double> sum = stackalloc double[ElementModes.Freedoms];
        for (int m = 0; m < Count; m++)
        {
            ReadOnlySpan<double> g = _modes.Vectors.AsSpan((ElementModes.Stride * element) + (ElementModes.Freedoms * m), ElementModes.Freedoms);
            for (int i = 0; i < g.Length; i++)
            {
                sum[i] += factors[m] * g[i];
            }
        }

        BeamElement beam = solver.Frame.Elements[element];
        return (
            new NodalLoad(beam.Start, new Vector3(sum[0], sum[1], sum[2]), new Vector3(sum[3], sum[4], sum[5])),
            new NodalLoad(beam.End, new Vector3(sum[6], sum[7], sum[8]), new Vector3(sum[9], sum[10], sum[11])));
    }
}
