using FrameGen.Diagnostics;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Spec;

/// <summary>A material as written.</summary>
public sealed record MaterialSpec(
    Placed<string> Name,
    SpecQuantity E,
    SpecQuantity? G,
    SpecQuantity? Poisson,
    SpecQuantity Density,
    SpecQuantity? Yield,
    SpecQuantity? Ultimate,
    SpecQuantity? YieldWelded);

/// <summary>A stock list as written.</summary>
public sealed record StockListSpec(
    Placed<string> Name,
    IReadOnlyList<Placed<string>> Materials,
    SpecQuantity? Bar,
    double? PricePerMetre,
    IReadOnlyList<Placed<Section>> Sizes);

/// <summary>Tubes on the rack.</summary>
public sealed record RackSpec(Placed<Section> Section, Placed<string> Material, IReadOnlyList<SpecQuantity> Lengths, SourcePlace At);
