using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Search;

/// <summary>Reads the stresses that a strength target is about off a design, as responses: of every group the place nearest its limit.</summary>
internal sealed class StressResponses(DesignSpace space, StructuralModel structure, StiffnessTable table, WeldPairs welds)
{
    private const int Modes = StiffnessTable.Modes;

    /// <summary>The responses of a target that use more of their limit than a share.</summary>
    public IEnumerable<Response> Of(DesignAnalysis design, StrengthTarget target, double above)
    {
        var worst = new (TubeUse Use, int Tube, int Case)[space.Groups];
        Array.Fill(worst, (default, -1, -1));
        var looked = new bool[space.Groups];
        foreach (int group in target.Groups)
        {
            looked[group] = true;
        }

        for (int c = 0; c < target.Cases.Count; c++)
        {
            for (int tube = 0; tube < space.Model.Tubes.Count; tube++)
            {
                int group = space.Model.Tubes[tube].Group;
                if (!looked[group])
                {
                    continue;
                }

                TubeUse use = TubeScan.MostUsed(design, target.Cases[c], tube);
                if (use.Share > worst[group].Use.Share)
                {
                    worst[group] = (use, tube, target.Cases[c]);
                }
            }
        }

        foreach ((TubeUse use, int tube, int loadCase) in worst)
        {
            // In a bend the forces are turned to the axis, and the place is one of the arc, not of its chord: no row is made of that.
            bool isInBend = tube >= 0 && space.Model.Tubes[tube].Bent?.PieceAt(use.At).IsArc == true;
            if (tube >= 0 && !isInBend && target.SafetyFactor * use.Share > above && Make(design, target, use, tube, loadCase) is { } response)
            {
                yield return response;
            }
        }
    }

    private Response? Make(DesignAnalysis design, StrengthTarget target, in TubeUse use, int tube, int loadCase)
    {
        int group = space.Model.Tubes[tube].Group;
        TubeElements elements = structure.Topology.Tubes[tube];
        FrameSolution solution = design.Case(loadCase);
        Section section = design.Sections[group];
        (int element, double x, double most) = (-1, 0, -1);
        for (int i = 0; i < elements.Count; i++)
        {
            // Where two elements meet, the one with the higher stress is meant.
            double within = use.At - elements.Stations[i].Distance;
            double length = elements.Stations[i + 1].Distance - elements.Stations[i].Distance;
            if (within < -Lengths.Same || within > length + Lengths.Same)
            {
                continue;
            }

            double stress = section.VonMises(solution.Forces(elements.First + i).At(within));
            if (stress > most)
            {
                (element, x, most) = (elements.First + i, within, stress);
            }
        }

        if (element < 0)
        {
            return null;
        }

        SectionForces forces = solution.Forces(element).At(x);
        var point = StressPoint.Worst(section, in forces);
        var own = new SectionFactors(space, table);
        int place = table.Elements(group).IndexOf(element);
        double half = (table.Strains.Length(element) / 2) - x;
        (Vector3 given, Vector3 perKg) = LoadAlong(loadCase, element);
        TubeAxes axes = structure.Topology.Frame.Elements[element].Axes;
        for (int c = 0; c < space[group].Length; c++)
        {
            // N = q0 + h px, Vy = h py − q4, Vz = h pz − q5, T = q1, My = q3 + h q5 + m pz, Mz = q2 − h q4 − m py with q = s gᵀu, h = L/2 − x.
            SectionForces f = point.Factors(space[group][c].Section);
            ReadOnlySpan<double> s = table.Of(group, c, element);
            Span<double> k = own.FactorsToFill(group, c).Slice(Modes * place, Modes);
            (k[0], k[1], k[2], k[3]) = (s[0] * f.N, s[1] * f.T, s[2] * f.Mz, s[3] * f.My);
            (k[4], k[5]) = (s[4] * (-f.Vy - (half * f.Mz)), s[5] * ((half * f.My) - f.Vz));
            Vector3 load = given + (space[group][c].MassPerLength * perKg);
            double length = table.Strains.Length(element);
            double m = (-length * length / 12) + (x * length / 2) - (x * x / 2);
            double straight = half * f.N * load.Dot(axes.X);
            double acrossY = ((half * f.Vy) - (m * f.Mz)) * load.Dot(axes.Y);
            own.AddConstant(group, c, straight + acrossY + (((half * f.Vz) + (m * f.My)) * load.Dot(axes.Z)));
        }

        return new Response(LoadSet.Case(loadCase), Allowed(tube, use.At) / target.SafetyFactor, own.Functional(design.Choice)) { Own = own };
    }

    private (Vector3 Given, Vector3 PerKg) LoadAlong(int loadCase, int element)
    {
        CaseLoads loads = structure.Cases[loadCase];
        foreach (LoadedElement loaded in loads.Elements)
        {
            if (loaded.Element == element)
            {
                return (loaded.Given, loads.WeightPerKg);
            }
        }

        return (Vector3.Zero, Vector3.Zero);
    }

    // The yield that holds at a place in every design: the welded one only where no weld's reach can be so short as to leave it out.
    private double Allowed(int tube, double at)
    {
        Material material = space.Model.Groups[space.Model.Tubes[tube].Group].Material;
        double plain = material.Yield ?? double.NaN;
        double welded = material.YieldWelded ?? plain;
        bool always = welds.ByNode.Any(node => node.Any(pair => IsNear(pair.A) || IsNear(pair.B)));
        return always ? welded : Math.Max(plain, welded);

        bool IsNear(WeldMember member) => member.Tube == tube && Math.Abs(member.At - at) <= WeldReach.HeatAffected;
    }
}
