using FrameGen.Mechanics.Sections;

namespace FrameGen.Mechanics.Frames;

/// <summary>Internal forces along one element: those at its start and the even load along it.</summary>
/// <param name="Start">At x = 0.</param>
/// <param name="Length">L, mm, of the axis between its own ends.</param>
/// <param name="Px">Even load along local x, N/mm.</param>
/// <param name="Py">Even load along local y, N/mm.</param>
/// <param name="Pz">Even load along local z, N/mm.</param>
public readonly record struct ElementForces(SectionForces Start, double Length, double Px, double Py, double Pz)
{
    /// <summary>Internal forces at x, exact under the even load.</summary>
    /// <param name="x">mm from the start, 0 to <see cref="Length"/>.</param>
    public SectionForces At(double x) => new(
        Start.N - (Px * x),
        Start.Vy - (Py * x),
        Start.Vz - (Pz * x),
        Start.T,
        Start.My + (x * (Start.Vz - (0.5 * Pz * x))),
        Start.Mz - (x * (Start.Vy - (0.5 * Py * x))));
}
