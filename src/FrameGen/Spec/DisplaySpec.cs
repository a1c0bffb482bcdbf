namespace FrameGen.Spec;

/// <summary>Units on papers for people.</summary>
public enum LengthUnit
{
    /// <summary>Millimetres.</summary>
    Millimetre,

    /// <summary>Centimetres.</summary>
    Centimetre,

    /// <summary>Inches.</summary>
    Inch,
}

/// <summary>Units on papers for people.</summary>
public enum MassUnit
{
    /// <summary>Kilograms.</summary>
    Kilogram,

    /// <summary>Pounds.</summary>
    Pound,
}

/// <summary>Units on papers for people.</summary>
public enum ForceUnit
{
    /// <summary>Newtons.</summary>
    Newton,

    /// <summary>Kilonewtons.</summary>
    Kilonewton,

    /// <summary>Pounds-force.</summary>
    PoundForce,
}

/// <summary>How papers print quantities.</summary>
/// <param name="Length">Unit of lengths.</param>
/// <param name="Fraction">Inches are rounded to 1/Fraction (8, 16, 32 or 64); null for decimals.</param>
/// <param name="Mass">Unit of masses.</param>
/// <param name="Force">Unit of forces.</param>
public sealed record DisplaySpec(LengthUnit Length, int? Fraction, MassUnit Mass, ForceUnit Force)
{
    /// <summary>Millimetres, kilograms, newtons.</summary>
    public static readonly DisplaySpec Metric = new(LengthUnit.Millimetre, null, MassUnit.Kilogram, ForceUnit.Newton);
}
