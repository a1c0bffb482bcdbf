using System.Globalization;
using FrameGen.Diagnostics;
using FrameGen.Fabrication.Cutting;
using FrameGen.Mechanics.Materials;
using FrameGen.Model;
using FrameGen.Model.Resolving;
using FrameGen.Sizing;

namespace FrameGen.Fabrication;

/// <summary>Cuts the parts from bars: what is on the rack first, then as few bought ones as it can.</summary>
/// <remarks>Lengths are whole micrometres inside, rounded as the cut list prints them.</remarks>
internal sealed class StockPlanner(SizedFrame sized, DiagnosticList diagnostics)
{
    private const double PerMillimetre = 1000;

    private readonly FrameModel _model = sized.Model;
    private readonly long _kerf = Micrometres(sized.Model.Fabrication.Kerf);
    private readonly long _trim = Micrometres(sized.Model.Fabrication.BarTrim);

    /// <summary>Plans the bars.</summary>
    /// <param name="parts">In the order of the cut list.</param>
    /// <returns>The plan, or null where a piece is longer than its bar: an error.</returns>
    public StockPlan? Plan(IReadOnlyList<Part> parts)
    {
        var lots = new List<StockLot>();
        bool isSound = true;
        var used = new HashSet<RackTube>(ReferenceEqualityComparer.Instance);
        foreach (Part[] same in parts.GroupBy(p => (sized.ChosenFor(p.Drawn.Tube).Nominal.Name, MaterialOf(p).Name)).Select(g => g.ToArray()))
        {
            RackTube[] rack = [.. _model.Have.Where(r => IsOf(r, same[0]))];
            used.UnionWith(rack);
            isSound &= AddLots(lots, same, [.. rack.SelectMany(r => r.Lengths)]);
        }

        foreach (RackTube idle in _model.Have.Where(r => !used.Contains(r)))
        {
            diagnostics.Note(idle.At, $"have: no tube of this frame is {idle.Section.Name} of {idle.Material}; what is on the rack stays there");
        }

        return isSound ? new StockPlan(lots) : null;
    }

    private static long Micrometres(double mm) => (long)Math.Round(mm * PerMillimetre);

    private static double Millimetres(long micrometres) => micrometres / PerMillimetre;

    private Material MaterialOf(Part part) => _model.Groups[_model.Tubes[part.Drawn.Tube].Group].Material;

    private Candidate ChosenFor(Part part) => sized.ChosenFor(part.Drawn.Tube);

    private bool IsOf(RackTube rack, Part part) =>
        string.Equals(rack.Section.Name, sized.ChosenFor(part.Drawn.Tube).Nominal.Name, StringComparison.Ordinal)
        && string.Equals(rack.Material, MaterialOf(part).Name, StringComparison.Ordinal);

    // Groups of one section and material are bought together, where it is cheapest.
    private Candidate Buy(Part[] same)
    {
        Candidate? best = null;
        foreach (Part part in same)
        {
            Candidate candidate = ChosenFor(part);
            best = best is null || StockTable.IsCheaper(candidate.PricePerMetre, best.PricePerMetre) ? candidate : best;
        }

        return best!;
    }

    private bool AddLots(List<StockLot> lots, Part[] same, double[] rack)
    {
        Candidate buy = Buy(same);
        long Free(double length) => Micrometres(length) - (2 * _trim);
        double[] lengths = [.. rack.Where(l => Free(l) > 0).Order()];
        var problem = new CuttingProblem(
            Math.Max(1, Free(buy.BarLength) + _kerf),
            same.Select(p => new PieceSize(Micrometres(p.Drawn.CutLength) + _kerf, p.Quantity)),
            [.. lengths.Select(l => Free(l) + _kerf)]);
        CuttingPlan plan = CuttingSolver.Solve(problem);
        Queue<Part>[] queues = [.. problem.Sizes.Select(size => Queue(same, size - _kerf))];
        double massPerMm = buy.Section.Area * MaterialOf(same[0]).Density;

        int number = 0;
        for (int kind = 0; kind < problem.RackLengths.Length; kind++)
        {
            double length = Millimetres(problem.RackLengths[kind] - _kerf + (2 * _trim));
            StockBar[] bars =
            [
                .. InOrder(plan.Bars.Where(b => b.RackKind == kind))
                    .Select(b => Cut(string.Create(CultureInfo.InvariantCulture, $"R{++number}"), Micrometres(length), b.Counts, queues)),
            ];
            if (bars.Length > 0)
            {
                lots.Add(new StockLot(MaterialOf(same[0]).Name, buy.Nominal, length, IsRack: true, bars, 0, PricePerMetre: null, massPerMm));
            }
        }

        number = 0;
        StockBar[] bought =
        [
            .. InOrder(plan.Bars.Where(b => b.RackKind is null))
                .Select(b => Cut((++number).ToString(CultureInfo.InvariantCulture), Micrometres(buy.BarLength), b.Counts, queues)),
        ];
        if (bought.Length > 0)
        {
            lots.Add(new StockLot(
                MaterialOf(same[0]).Name, buy.Nominal, buy.BarLength, IsRack: false, bought, plan.LowerBound, buy.PricePerMetre, massPerMm));
        }

        return ReportTooLong(queues, buy, rack.Length > 0);
    }

    private static Queue<Part> Queue(Part[] same, long length) =>
        new(same.Where(p => Micrometres(p.Drawn.CutLength) == length).SelectMany(p => Enumerable.Repeat(p, p.Quantity)));

    // Bars that are cut alike stand together, those of the longest pieces first.
    private static IEnumerable<Pattern> InOrder(IEnumerable<Pattern> bars) =>
        bars.OrderByDescending(b => b.Counts, Comparer<int[]>.Create((a, b) => a.AsSpan().SequenceCompareTo(b)));

    private StockBar Cut(string label, long length, int[] counts, Queue<Part>[] queues)
    {
        var cuts = new List<StockCut>();
        long at = _trim;
        for (int size = 0; size < counts.Length; size++)
        {
            for (int i = 0; i < counts[size]; i++)
            {
                Part part = queues[size].Dequeue();
                long to = at + Micrometres(part.Drawn.CutLength);
                cuts.Add(new StockCut(part, Millimetres(at), Millimetres(to)));
                at = to + _kerf;
            }
        }

        return new StockBar(label, cuts, Millimetres(length - _trim - (at - _kerf)));
    }

    // What no bar took.
    private bool ReportTooLong(Queue<Part>[] queues, Candidate buy, bool hasRack)
    {
        bool isSound = true;
        foreach (Part part in queues.SelectMany(q => q).Distinct())
        {
            isSound = false;
            Tube tube = _model.Tubes[part.Drawn.Tube];
            string trimmed = _trim > 0 ? $", {buy.BarLength - (2 * Millimetres(_trim)):0.###} mm without bar_trim at both ends" : string.Empty;
            string rack = hasRack ? "nothing long enough is left on the rack" : "a longer one on the rack goes under have";
            diagnostics.Error(
                tube.At,
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"tube {tube.Name}: its piece is {part.Drawn.CutLength:0.###} mm long, and a bar of {buy.Nominal.Name} has {buy.BarLength:0.###} mm{trimmed}; ")
                + $"divide the tube at a node, or choose from a stock list with longer bars (bar: ...); {rack}");
        }

        return isSound;
    }
}
