using FrameGen.Mechanics.Sections;

namespace FrameGen.Fabrication;

/// <summary>What is cut from the rack, which bars to buy, and how each is cut.</summary>
/// <param name="Lots">By section and material in the order of the cut list; of each, lengths on the rack first, short ones before long ones.</param>
public sealed record StockPlan(IReadOnlyList<StockLot> Lots)
{
    /// <summary>Bars to buy.</summary>
    public int BarsToBuy { get; } = Lots.Where(l => !l.IsRack).Sum(l => l.Bars.Count);

    /// <summary>Mass of the bars to buy, kg.</summary>
    public double BoughtMassKg { get; } = Lots.Where(l => !l.IsRack).Sum(l => l.MassKg);

    /// <summary>Price of the bars to buy, in the shop's own money; null where a bar has no price.</summary>
    public double? Cost { get; } = Lots.Where(l => !l.IsRack).Aggregate((double?)0, (sum, lot) => sum + lot.Cost);
}

/// <summary>Bars of one section, material and length that come from one place.</summary>
/// <param name="Material">Name.</param>
/// <param name="Section">As it is named and bought.</param>
/// <param name="BarLength">Of each, mm.</param>
/// <param name="IsRack">True where they are on the rack already.</param>
/// <param name="Bars">How each is cut.</param>
/// <param name="LowerBound">No plan buys fewer; 0 on the rack.</param>
/// <param name="PricePerMetre">In the shop's own money; null where unknown.</param>
/// <param name="MassKgPerMm">Of the tube; of the one in hand where it was measured.</param>
public sealed record StockLot(
    string Material,
    Section Section,
    double BarLength,
    bool IsRack,
    IReadOnlyList<StockBar> Bars,
    int LowerBound,
    double? PricePerMetre,
    double MassKgPerMm)
{
    /// <summary>True where buying fewer is proven to be impossible.</summary>
    public bool IsOptimal => IsRack || Bars.Count == LowerBound;

    /// <summary>Mass of all bars, kg.</summary>
    public double MassKg => Bars.Count * BarLength * MassKgPerMm;

    /// <summary>Price of all bars; null where unknown.</summary>
    public double? Cost => Bars.Count * BarLength / 1000 * PricePerMetre;
}

/// <summary>One bar.</summary>
/// <param name="Label">Its number within section and material: <c>1</c>; <c>R1</c> on the rack.</param>
/// <param name="Cuts">Pieces in the order of sawing.</param>
/// <param name="Offcut">What is left after pieces, kerfs between them and trims, mm.</param>
public sealed record StockBar(string Label, IReadOnlyList<StockCut> Cuts, double Offcut);

/// <summary>One piece of a bar; distances run from the bar's end as it is delivered, mm.</summary>
/// <param name="Part">The part it becomes.</param>
/// <param name="From">Where it begins.</param>
/// <param name="To">Where it ends.</param>
public sealed record StockCut(Part Part, double From, double To);
