namespace FrameGen.Spec.Quantities;

/// <summary>What is known of a kind of quantity: how it is called, what it is made of, how a value of it looks.</summary>
/// <param name="Kind">The kind.</param>
/// <param name="Words">With its article: <c>a length</c>.</param>
/// <param name="Dimension">Its exponents.</param>
/// <param name="WorkingUnit">What it is in inside the program; empty for a number.</param>
/// <param name="WorkingPerBase">How many working units one coherent base unit is: 1 but for accelerations and frequencies.</param>
/// <param name="Examples">Values as a spec would write them.</param>
internal sealed record KindInfo(
    QuantityKind Kind,
    string Words,
    Dimension Dimension,
    string WorkingUnit,
    double WorkingPerBase,
    IReadOnlyList<string> Examples)
{
    private static readonly KindInfo[] All =
    [
        new(QuantityKind.Number, "a plain number", default, string.Empty, 1, ["1.5"]),
        new(QuantityKind.Length, "a length", new(1, 0, 0), "mm", 1, ["38 mm", "1.5 in"]),
        new(QuantityKind.Area, "an area", new(2, 0, 0), "mm2", 1, ["120 mm2", "0.5 in2"]),
        new(QuantityKind.Angle, "an angle", Dimension.OfAngle, "rad", 1, ["0.5 deg"]),
        new(QuantityKind.Mass, "a mass", new(0, 1, 0), "kg", 1, ["2.5 kg", "5 lb"]),
        new(QuantityKind.Force, "a force", new(1, 1, -2), "N", 1, ["900 N", "0.8 kN"]),
        new(QuantityKind.Stress, "a stress", new(-1, 1, -2), "MPa", 1, ["235 MPa", "210 GPa"]),
        new(QuantityKind.LineLoad, "a load per length", new(0, 1, -2), "N/mm", 1, ["500 N/m", "3 lbf/in"]),
        new(QuantityKind.Moment, "a moment", new(2, 1, -2), "N.mm", 1, ["40 N.m", "30 lbf.ft"]),
        new(QuantityKind.Stiffness, "a stiffness", new(0, 1, -2), "N/mm", 1, ["60 N/mm", "300 lbf/in"]),
        new(QuantityKind.TurningStiffness, "a turning stiffness", new(2, 1, -2, -1), "N.mm/rad", 1, ["12 N.m/deg"]),
        new(QuantityKind.Density, "a density", new(-3, 1, 0), "kg/mm3", 1, ["7.85 g/cm3", "7850 kg/m3"]),

        // The base unit of time is √0.001 s (see Dimension): its acceleration is m/s², its frequency 1/√0.001 Hz.
        new(QuantityKind.Acceleration, "an acceleration", new(1, 0, -2), "mm/s2", 1000, ["9.8 m/s2"]),
        new(QuantityKind.Frequency, "a frequency", new(0, 0, -1), "Hz", Math.Sqrt(1000), ["12 Hz"]),
        new(QuantityKind.BendingStiffness, "a bending or torsional stiffness", new(3, 1, -2), "N.mm2", 1, ["450 N.m2"]),
        new(QuantityKind.Share, "a share", default, "%", 1, ["40 %"]),
    ];

    /// <summary>Largest length, mm.</summary>
    public const double LargestLength = 1e9;

    /// <summary>Largest value of any other kind, in its working unit.</summary>
    public const double LargestOther = 1e15;

    /// <summary>The kind and how to write it: <c>a length such as `38 mm` or `1.5 in`</c>.</summary>
    public string WithExamples => $"{Words} such as {string.Join(" or ", Examples.Select(example => $"`{example}`"))}";

    /// <summary>What is known of a kind.</summary>
    public static KindInfo Of(QuantityKind kind) => All[(int)kind];

    /// <summary>Words for a dimension: the kind's, where one has it, else its units.</summary>
    public static string WordsFor(Dimension dimension)
    {
        foreach (KindInfo info in All)
        {
            // A share is a number, and a stiffness is told like a load per length: the first of the list speaks.
            if (info.Dimension == dimension)
            {
                return info.Kind == QuantityKind.LineLoad
                    ? "a stiffness or load per length (N/mm)"
                    : info.WorkingUnit.Length == 0 ? info.Words : $"{info.Words} ({info.WorkingUnit})";
            }
        }

        return $"something in {dimension}";
    }

    /// <summary>Largest magnitude a value of this dimension may have, in base units.</summary>
    public static double Largest(Dimension dimension) => dimension.Agrees(new(1, 0, 0)) ? LargestLength : LargestOther;
}
