using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Stability;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Program;

namespace FrameGen.Sizing.Search;

/// <summary>Rows from the way in which a design vibrates or buckles.</summary>
/// <remarks>
/// With v a mode, every design whose lowest frequency is no lower than ω has vᵀ(K − ω²M)v ≥ 0: a sum over groups, and convex. Every design that does not buckle below λ has
/// vᵀ(K + λ Kg)v ≥ 0: vᵀK v is a sum over groups, and −vᵀKg v = −Σ N ∫ v'² dx is a response, for the axial forces N are linear in the displacements.
/// </remarks>
internal sealed class ModeCuts(DesignSpace space, StructuralModel structure, StiffnessTable table)
{
    private const double Room = 1e-8;

    // mm, N and kg: K/M comes in 1000/s².
    private const double PerSquareSecond = 1000;

    /// <summary>The row of a frequency target.</summary>
    public ProgramRow? Frequency(DesignAnalysis design, FrequencyTarget target)
    {
        IReadOnlyList<VibrationMode> modes = design.Stability.Modes();
        if (modes.Count == 0)
        {
            return null;
        }

        FrameSolver solver = structure.Fine.Solver(structure.VibrationSolver!.Value);
        var energies = new ModeEnergies(solver);
        ModeShape shape = modes[0].Shape;
        double omega = 2 * Math.PI * target.Min;
        double eigenvalue = omega * omega / PerSquareSecond;
        FrameMass mass = design.Stability.Mass();
        double points = 0;
        foreach (PointMass point in mass.Points)
        {
            points += point.Kg * shape.Displacement(point.Node).Dot(shape.Displacement(point.Node));
        }

        double[] carried = design.Stability.CarriedPerLength();
        var options = new List<double>();
        double size = eigenvalue * points;
        for (int g = 0; g < space.Groups; g++)
        {
            double largest = 0;
            for (int c = 0; c < space[g].Length; c++)
            {
                BeamProfile profile = space[g][c].Profile;
                double stiff = Stiffness(energies, g, profile, shape);
                double inert = 0;
                foreach ((int fine, int tube, double stretch) in FineElements(g))
                {
                    BeamInertia inertia = BeamInertia.Of(profile, space.Model.Groups[g].Material.Density, carried[tube]).Stretched(stretch);
                    inert += energies.Inertia(fine, profile, inertia, shape);
                }

                options.Add((eigenvalue * inert) - stiff);
                largest = Math.Max(largest, stiff + (eigenvalue * inert));
            }

            size += largest;
        }

        double springs = SpringEnergy(solver, shape);
        return new ProgramRow([.. Enumerable.Range(0, options.Count)], options, springs - (eigenvalue * points) + (Room * (size + springs)));
    }

    /// <summary>The responses of a buckling target: one a case that uses more of its limit than a share.</summary>
    public IEnumerable<Response> Buckling(DesignAnalysis design, BucklingTarget target, double above)
    {
        foreach (int loadCase in target.Cases)
        {
            if (design.Stability.Case(loadCase) is { } mode && target.MinFactor / mode.Factor > above)
            {
                yield return Make(design, loadCase, mode, target.MinFactor);
            }
        }
    }

    private Response Make(DesignAnalysis design, int loadCase, BucklingMode mode, double factor)
    {
        FrameSolver solver = structure.Fine.Solver(structure.Cases[loadCase].Solver);
        var energies = new ModeEnergies(solver);
        var along = new Dictionary<int, LoadedElement>();
        foreach (LoadedElement loaded in structure.Cases[loadCase].Elements)
        {
            along[loaded.Element] = loaded;
        }

        var own = new SectionFactors(space, table);
        RefinedFrame refined = structure.Fine.Refined;
        for (int g = 0; g < space.Groups; g++)
        {
            ReadOnlySpan<int> elements = table.Elements(g);
            for (int c = 0; c < space[g].Length; c++)
            {
                BeamProfile profile = space[g][c].Profile;
                Span<double> k = own.FactorsToFill(g, c);
                double given = 0;
                for (int i = 0; i < elements.Length; i++)
                {
                    // N = q0 + (L/2 − x) p along the whole element, q0 = s gᵀu of its stretch.
                    int element = elements[i];
                    double load = along.TryGetValue(element, out LoadedElement loaded)
                        ? (loaded.Given + (space[g][c].MassPerLength * structure.Cases[loadCase].WeightPerKg)).Dot(structure.Topology.Frame.Elements[element].Axes.X)
                        : 0;
                    double length = table.Strains.Length(element);
                    int first = refined.First(element);
                    int count = refined.First(element + 1) - first;
                    for (int f = 0; f < count; f++)
                    {
                        (double start, double end) = energies.Slopes(first + f, profile, mode.Shape);
                        k[StiffnessTable.Modes * i] -= table.Of(g, c, element)[0] * (start + end);
                        given -= load * length * (((0.5 - ((double)f / count)) * start) + ((0.5 - ((double)(f + 1) / count)) * end));
                    }
                }

                own.AddConstant(g, c, given - (Stiffness(energies, g, profile, mode.Shape) / factor));
            }
        }

        return new Response(LoadSet.Case(loadCase), SpringEnergy(solver, mode.Shape) / factor, own.Functional(design.Choice))
        {
            Own = own,
            Scale = factor / mode.Factor,
            GrowsWithStiffness = true,
        };
    }

    private double Stiffness(ModeEnergies energies, int group, in BeamProfile profile, ModeShape shape)
    {
        Span<double> strains = stackalloc double[StiffnessTable.Modes];
        double sum = 0;
        foreach ((int fine, _, _) in FineElements(group))
        {
            energies.Strains(fine, shape, strains);
            sum += energies.Energy(fine, profile, strains);
        }

        return sum;
    }

    private IEnumerable<(int Fine, int Tube, double Stretch)> FineElements(int group)
    {
        RefinedFrame refined = structure.Fine.Refined;
        for (int tube = 0; tube < space.Model.Tubes.Count; tube++)
        {
            TubeElements elements = structure.Topology.Tubes[tube];
            if (space.Model.Tubes[tube].Group == group)
            {
                for (int i = 0; i < elements.Count; i++)
                {
                    for (int fine = refined.First(elements.First + i); fine < refined.First(elements.First + i + 1); fine++)
                    {
                        yield return (fine, tube, elements.StretchOf(i));
                    }
                }
            }
        }
    }

    // What does not move needs no looking at: a spring on a held freedom does nothing.
    private static double SpringEnergy(FrameSolver solver, ModeShape shape)
    {
        double energy = 0;
        foreach (Restraint restraint in solver.Restraints)
        {
            if (restraint.Springs is { } rates)
            {
                (Vector3 shift, Vector3 turn) = (shape.Displacement(restraint.Node), shape.Rotation(restraint.Node));
                energy += (rates[0] * shift.X * shift.X) + (rates[1] * shift.Y * shift.Y) + (rates[2] * shift.Z * shift.Z)
                    + (rates[3] * turn.X * turn.X) + (rates[4] * turn.Y * turn.Y) + (rates[5] * turn.Z * turn.Z);
            }
        }

        return energy;
    }
}
