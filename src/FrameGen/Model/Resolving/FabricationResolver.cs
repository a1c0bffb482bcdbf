using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Gives shop preferences their values or defaults.</summary>
internal static class FabricationResolver
{
    // Finer curves cost time and paper nothing can cut; coarser ones are no templates.
    private const double FinestTolerance = 1e-4;
    private const double CoarsestTolerance = 1;

    /// <summary>The shop preferences and the general gap of coped ends, mm; null after an error.</summary>
    public static (Fabrication Fabrication, double Gap)? Resolve(FabricationSpec spec, SpecValues values)
    {
        double? gap = values.NotNegative(spec.Gap, "fabrication: gap", 0);
        double? paper = values.NotNegative(spec.Paper, "fabrication: paper", 0.1);
        double? tolerance = values.NotNegative(spec.Tolerance, "fabrication: tolerance", 0.02);
        double? kerf = values.NotNegative(spec.Kerf, "fabrication: kerf", 2);
        double? trim = values.NotNegative(spec.BarTrim, "fabrication: bar_trim", 0);
        double? grip = values.NotNegative(spec.Grip, "fabrication: grip", 0);
        double? spring = values.NotNegative(spec.Springback, "fabrication: springback", 0);
        if (tolerance is < FinestTolerance or > CoarsestTolerance)
        {
            values.Diagnostics.Error(
                spec.Tolerance?.At,
                $"fabrication: tolerance must be between {FinestTolerance:0.####} mm and {CoarsestTolerance} mm, and is {tolerance:G6} mm; 0.02 mm is usual");
            return null;
        }

        return gap is { } g && paper is { } p && tolerance is { } t && kerf is { } k && trim is { } b && grip is { } straight && spring is { } opens
            ? (new Fabrication(spec.Cut ?? CutMode.Radial, p, t, k, b, spec.Page ?? PageSize.A4)
            {
                Grip = straight,
                Springback = spec.Springback?.Kind == QuantityKind.Share ? new Springback(0, opens) : new Springback(opens, 0),
            }, g)
            : null;
    }
}
