using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Sizing.Analysis;

/// <summary>Stresses along one tube in one case of a design.</summary>
internal static class TubeScan
{
    /// <summary>Where a tube is nearest its yield: the welded yield holds within reach of a weld, on both sides of its edge the worse.</summary>
    /// <param name="analysis">The design.</param>
    /// <param name="loadCase">Index of the case.</param>
    /// <param name="tube">Index of the tube; its material has the yields asked for.</param>
    /// <param name="enough">A share of yield that settles the matter: the scan stops when one is above it.</param>
    public static TubeUse MostUsed(DesignAnalysis analysis, int loadCase, int tube, double enough = double.PositiveInfinity)
    {
        StructuralModel structure = analysis.Structure!;
        FrameSolution solution = analysis.Case(loadCase);
        TubeElements elements = structure.Topology.Tubes[tube];
        int group = structure.Model.Tubes[tube].Group;
        Section section = analysis.Sections[group];
        Material material = structure.Model.Groups[group].Material;
        double yield = material.Yield ?? double.NaN;
        double welded = material.YieldWelded ?? double.NaN;
        ReadOnlySpan<WeldZone> zones = analysis.Welds().Of(tube);
        var most = new TubeUse(-1, 0, 0, yield, false);
        for (int i = 0; i < elements.Count; i++)
        {
            DiagramPiece piece = Piece(solution, elements, i);
            (double start, double stop) = (piece.From, piece.To);

            // Stretches between weld zones and within them, in order; a touching edge belongs to both.
            double reached = start;
            foreach (WeldZone zone in zones)
            {
                if (zone.To <= start || zone.From >= stop)
                {
                    continue;
                }

                if (zone.From > reached)
                {
                    Look(reached, zone.From, yield, false);
                }

                Look(Math.Max(start, zone.From), Math.Min(stop, zone.To), welded, true);
                reached = Math.Min(stop, zone.To);
            }

            if (reached < stop)
            {
                Look(reached, stop, yield, false);
            }

            if (most.Share > enough)
            {
                break;
            }

            void Look(double from, double to, double allowed, bool nearWeld)
            {
                StressPeak peak = StressPeak.Find(in piece, section, from, to);
                double share = peak.Stress / allowed;
                if (!(share <= most.Share))
                {
                    most = new TubeUse(share, peak.At, peak.Stress, allowed, nearWeld);
                }
            }
        }

        return most;
    }

    /// <summary>What a case does to a tube.</summary>
    public static TubeForces Describe(DesignAnalysis analysis, int loadCase, int tube)
    {
        StructuralModel structure = analysis.Structure!;
        FrameSolution solution = analysis.Case(loadCase);
        TubeElements elements = structure.Topology.Tubes[tube];
        int group = structure.Model.Tubes[tube].Group;
        Section section = analysis.Sections[group];
        Material material = structure.Model.Groups[group].Material;
        var highest = new StressPeak(double.NegativeInfinity, 0);
        var pieces = new DiagramPiece[elements.Count];
        for (int i = 0; i < pieces.Length; i++)
        {
            pieces[i] = Piece(solution, elements, i);
            StressPeak peak = StressPeak.Find(in pieces[i], section, pieces[i].From, pieces[i].To);
            highest = peak.Stress > highest.Stress ? peak : highest;
        }

        DiagramPiece last = pieces[^1];
        bool known = material.Yield is not null && (material.YieldWelded is not null || analysis.Welds().Of(tube).Length == 0);
        return new TubeForces(
            highest.Stress,
            highest.At,
            pieces[0].At(0).N,
            last.At(last.To).N,
            MinAxial(solution, elements.First, elements.Count))
        {
            Diagram = new TubeDiagram(pieces),
            Use = known ? WithShares(MostUsed(analysis, loadCase, tube), pieces, section) : null,
        };
    }

    // Where a load makes the forces jump, those on the side of the higher stress.
    private static TubeUse WithShares(TubeUse use, DiagramPiece[] pieces, Section section)
    {
        SectionForces worst = default;
        double highest = double.NegativeInfinity;
        foreach (DiagramPiece piece in pieces.Where(p => use.At >= p.From && use.At <= p.To))
        {
            SectionForces there = piece.At(use.At);
            double stress = section.VonMises(in there);
            (worst, highest) = stress > highest ? (there, stress) : (worst, highest);
        }

        return use with { Shares = StressShares.Of(section, in worst) };
    }

    private static DiagramPiece Piece(FrameSolution solution, TubeElements elements, int i) => new(
        elements.Stations[i].Distance, elements.Stations[i + 1].Distance, solution.Forces(elements.First + i), elements.Arcs[i]);

    /// <summary>The lowest axial force along elements that follow each other, N: linear along each, so an end's.</summary>
    public static double MinAxial(FrameSolution solution, int first, int count)
    {
        double lowest = double.PositiveInfinity;
        for (int i = first; i < first + count; i++)
        {
            ElementForces forces = solution.Forces(i);
            lowest = Math.Min(lowest, Math.Min(forces.Start.N, forces.At(forces.Length).N));
        }

        return lowest;
    }
}
