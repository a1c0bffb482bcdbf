namespace FrameGen.Spec.Quantities;

/// <summary>All units of the spec format.</summary>
internal static class UnitTable
{
    /// <summary>mm in an inch, exact by definition (international yard and pound agreement, 1959).</summary>
    private const decimal Inch = 25.4m;

    private const decimal Foot = 12 * Inch;

    /// <summary>kg in a pound, exact by the same definition.</summary>
    private const decimal Pound = 0.45359237m;

    /// <summary>Standard acceleration of free fall, m/s² (3rd CGPM, 1901).</summary>
    public const decimal StandardGravity = 9.80665m;

    /// <summary>N in a pound-force: 4.4482216152605, exact.</summary>
    private const decimal PoundForce = Pound * StandardGravity;

    private static readonly Unit[] Units =
    [
        new("mm", QuantityKind.Length, 1),
        new("cm", QuantityKind.Length, 10),
        new("m", QuantityKind.Length, 1000),
        new("um", QuantityKind.Length, 0.001m),
        new("in", QuantityKind.Length, Inch),
        new("inch", QuantityKind.Length, Inch),
        new("ft", QuantityKind.Length, Foot),
        new("thou", QuantityKind.Length, Inch / 1000),
        new("mm2", QuantityKind.Area, 1),
        new("cm2", QuantityKind.Area, 100),
        new("m2", QuantityKind.Area, 1_000_000),
        new("in2", QuantityKind.Area, Inch * Inch),
        new("deg", QuantityKind.Angle, 1, Math.PI, 180),
        new("rad", QuantityKind.Angle, 1),
        new("kg", QuantityKind.Mass, 1),
        new("g", QuantityKind.Mass, 0.001m),
        new("t", QuantityKind.Mass, 1000),
        new("lb", QuantityKind.Mass, Pound),
        new("N", QuantityKind.Force, 1),
        new("kN", QuantityKind.Force, 1000),
        new("MN", QuantityKind.Force, 1_000_000),
        new("lbf", QuantityKind.Force, PoundForce),
        new("kip", QuantityKind.Force, 1000 * PoundForce),
        new("kgf", QuantityKind.Force, StandardGravity),
        new("MPa", QuantityKind.Stress, 1),
        new("Pa", QuantityKind.Stress, 0.000001m),
        new("kPa", QuantityKind.Stress, 0.001m),
        new("GPa", QuantityKind.Stress, 1000),
        new("N/mm2", QuantityKind.Stress, 1),
        new("psi", QuantityKind.Stress, PoundForce, 1, 645.16),
        new("ksi", QuantityKind.Stress, 1000 * PoundForce, 1, 645.16),
        new("N/mm", QuantityKind.LineLoad, 1),
        new("N/m", QuantityKind.LineLoad, 0.001m),
        new("kN/m", QuantityKind.LineLoad, 1),
        new("lbf/in", QuantityKind.LineLoad, PoundForce, 1, 25.4),
        new("lbf/ft", QuantityKind.LineLoad, PoundForce, 1, 304.8),
        new("kN/mm", QuantityKind.Stiffness, 1000),
        new("N.mm", QuantityKind.Moment, 1),
        new("N.m", QuantityKind.Moment, 1000),
        new("kN.m", QuantityKind.Moment, 1_000_000),
        new("Nmm", QuantityKind.Moment, 1),
        new("Nm", QuantityKind.Moment, 1000),
        new("kNm", QuantityKind.Moment, 1_000_000),
        new("lbf.in", QuantityKind.Moment, PoundForce * Inch),
        new("lbf.ft", QuantityKind.Moment, PoundForce * Foot),
        new("N.mm/rad", QuantityKind.TurningStiffness, 1),
        new("N.mm/deg", QuantityKind.TurningStiffness, 180, 1, Math.PI),
        new("N.m/rad", QuantityKind.TurningStiffness, 1000),
        new("N.m/deg", QuantityKind.TurningStiffness, 180_000, 1, Math.PI),
        new("Nm/rad", QuantityKind.TurningStiffness, 1000),
        new("Nm/deg", QuantityKind.TurningStiffness, 180_000, 1, Math.PI),
        new("kN.m/rad", QuantityKind.TurningStiffness, 1_000_000),
        new("kN.m/deg", QuantityKind.TurningStiffness, 180_000_000, 1, Math.PI),
        new("lbf.in/rad", QuantityKind.TurningStiffness, PoundForce * Inch),
        new("lbf.in/deg", QuantityKind.TurningStiffness, PoundForce * Inch * 180, 1, Math.PI),
        new("lbf.ft/rad", QuantityKind.TurningStiffness, PoundForce * Foot),
        new("lbf.ft/deg", QuantityKind.TurningStiffness, PoundForce * Foot * 180, 1, Math.PI),
        new("kg/m3", QuantityKind.Density, 0.000000001m),
        new("g/cm3", QuantityKind.Density, 0.000001m),
        new("kg/mm3", QuantityKind.Density, 1),
        new("lb/in3", QuantityKind.Density, Pound, 1, 16387.064),
        new("m/s2", QuantityKind.Acceleration, 1000),
        new("mm/s2", QuantityKind.Acceleration, 1),
        new("Hz", QuantityKind.Frequency, 1),
        new("N.m2", QuantityKind.BendingStiffness, 1_000_000),
        new("N.mm2", QuantityKind.BendingStiffness, 1),
        new("%", QuantityKind.Share, 0.01m),
    ];

    private static readonly Dictionary<string, Unit> ByName = Units.ToDictionary(unit => unit.Name, StringComparer.Ordinal);

    private static readonly int LongestName = Units.Max(unit => unit.Name.Length);

    /// <summary>All units in the order of the format's description.</summary>
    public static IReadOnlyList<Unit> All => Units;

    /// <summary>The unit of this name, <c>²</c>, <c>³</c>, <c>·</c>, <c>*</c> and <c>µ</c> allowed; null for none.</summary>
    public static Unit? Find(ReadOnlySpan<char> name) => ByName.GetValueOrDefault(Plain(name));

    /// <summary>The longest unit that begins at <paramref name="start"/> and is not followed by a letter or digit.</summary>
    /// <returns>The unit and how many characters it takes; null for none.</returns>
    public static (Unit Unit, int Length)? LongestAt(string text, int start)
    {
        int run = start;
        while (run < text.Length && run - start < LongestName && IsUnitCharacter(text[run]))
        {
            run++;
        }

        for (int end = run; end > start; end--)
        {
            bool ends = text[end - 1] == '%' || end == text.Length || !IsNameCharacter(text[end]);
            if (ends && Find(text.AsSpan(start, end - start)) is { } unit)
            {
                return (unit, end - start);
            }
        }

        return null;
    }

    /// <summary>What to say of a unit that does not exist.</summary>
    /// <param name="written">As written.</param>
    /// <param name="kinds">What is expected, whose units are the likeliest; empty where anything may be meant.</param>
    public static string Unknown(string written, IReadOnlyList<QuantityKind> kinds)
    {
        string plain = Plain(written);
        if (plain.Contains('^', StringComparison.Ordinal)
            && Find(plain.Replace("^", string.Empty, StringComparison.Ordinal)) is { } power)
        {
            return $"unknown unit '{written}'; write '{power.Name}'";
        }

        IEnumerable<string> likely = Units
            .Where(unit => kinds.Any(kind => KindInfo.Of(kind).Dimension == unit.Dimension))
            .Select(unit => unit.Name);
        string? nearest = NearestName.Among(plain, likely) ?? NearestName.Among(plain, Units.Select(unit => unit.Name));
        return nearest is null ? $"unknown unit '{written}'" : $"unknown unit '{written}'; did you mean '{nearest}'?";
    }

    /// <summary>True for what may stand in a unit's name.</summary>
    public static bool IsUnitCharacter(char c) => IsNameCharacter(c) || c is '%' or '.' or '/' or '*' or '·' or '⋅';

    private static bool IsNameCharacter(char c) => char.IsAsciiLetterOrDigit(c) || c is '_' or '²' or '³' or 'µ' or 'μ';

    private static string Plain(ReadOnlySpan<char> name)
    {
        Span<char> plain = name.Length <= 64 ? stackalloc char[name.Length] : new char[name.Length];
        for (int i = 0; i < name.Length; i++)
        {
            plain[i] = name[i] switch
            {
                '²' => '2',
                '³' => '3',
                '·' or '⋅' or '*' => '.',
                'µ' or 'μ' => 'u',
                char other => other,
            };
        }

        return plain.ToString();
    }
}
