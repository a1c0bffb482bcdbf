using System.Globalization;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using UnitsNet;

namespace FrameGen.Output;

/// <summary>Prints quantities for people, in the units that the spec's <c>display</c> asks for.</summary>
/// <remarks>
/// Conversions go through typed quantities; the digits are those of <see cref="FixedDigits"/>.
/// Machine-readable files don't use it: they are always in mm, kg, N and MPa.
/// </remarks>
/// <param name="display">Units asked for.</param>
public sealed class DisplayFormat(DisplaySpec display)
{
    /// <summary>Unit of <see cref="LengthNumber"/>: mm, cm or in.</summary>
    public string LengthUnitName => display.Length switch
    {
        LengthUnit.Millimetre => "mm",
        LengthUnit.Centimetre => "cm",
        _ => "in",
    };

    /// <summary>Unit of <see cref="MassNumber"/>: kg or lb.</summary>
    public string MassUnitName => display.Mass == MassUnit.Kilogram ? "kg" : "lb";

    /// <summary>Unit of <see cref="MassPerLengthNumber"/>: kg/m or lb/ft.</summary>
    public string MassPerLengthUnitName => display.Mass == MassUnit.Kilogram ? "kg/m" : "lb/ft";

    /// <summary>Unit of <see cref="ForceNumber"/>: N, kN or lbf.</summary>
    public string ForceUnitName => display.Force switch
    {
        ForceUnit.Newton => "N",
        ForceUnit.Kilonewton => "kN",
        _ => "lbf",
    };

    /// <summary>Unit of <see cref="MomentNumber"/>: N.m, kN.m or lbf.ft.</summary>
    public string MomentUnitName => display.Force switch
    {
        ForceUnit.Newton => "N.m",
        ForceUnit.Kilonewton => "kN.m",
        _ => "lbf.ft",
    };

    /// <summary>A length with its unit: <c>412.3 mm</c>, <c>41.23 cm</c>, <c>16-1/4 in</c>, <c>16.232 in</c>.</summary>
    /// <param name="mm">Length, mm.</param>
    public string Length(double mm) => $"{LengthNumber(mm)} {LengthUnitName}";

    /// <summary>An area with its unit: <c>0.87 m2</c>, <c>9.3 ft2</c> where papers are in inches.</summary>
    /// <param name="squareMillimetres">Area, mm².</param>
    public string Area(double squareMillimetres)
    {
        UnitsNet.Area area = UnitsNet.Area.FromSquareMillimeters(squareMillimetres);
        return display.Length == LengthUnit.Inch
            ? $"{FixedDigits.Print(area.SquareFeet, "0.0")} ft2"
            : $"{FixedDigits.Print(area.SquareMeters, "0.00")} m2";
    }

    /// <summary>A mass with its unit: <c>1.204 kg</c>, <c>2.654 lb</c>.</summary>
    /// <param name="kg">Mass, kg.</param>
    public string Mass(double kg) => $"{MassNumber(kg)} {MassUnitName}";

    /// <summary>A force with its unit: <c>812.5 N</c>, <c>0.813 kN</c>, <c>182.7 lbf</c>.</summary>
    /// <param name="newtons">Force, N.</param>
    public string Force(double newtons) => $"{ForceNumber(newtons)} {ForceUnitName}";

    /// <summary>A moment with its unit: <c>12.4 N.m</c>, <c>0.012 kN.m</c>, <c>9.1 lbf.ft</c>.</summary>
    /// <param name="newtonMillimetres">Moment, N·mm.</param>
    public string Moment(double newtonMillimetres) => $"{MomentNumber(newtonMillimetres)} {MomentUnitName}";

    /// <summary>A length in <see cref="LengthUnitName"/>, for a column whose head names the unit.</summary>
    /// <param name="mm">Length, mm.</param>
    public string LengthNumber(double mm)
    {
        UnitsNet.Length length = UnitsNet.Length.FromMillimeters(mm);
        return display.Length switch
        {
            LengthUnit.Millimetre => FixedDigits.Print(mm, "0.0"),
            LengthUnit.Centimetre => FixedDigits.Print(length.Centimeters, "0.00"),
            _ => display.Fraction is { } parts ? Fraction(length.Inches, parts) : FixedDigits.Print(length.Inches, "0.000"),
        };
    }

    /// <summary>A mass in <see cref="MassUnitName"/>, for a column whose head names the unit.</summary>
    /// <param name="kg">Mass, kg.</param>
    public string MassNumber(double kg) =>
        FixedDigits.Print(display.Mass == MassUnit.Kilogram ? kg : UnitsNet.Mass.FromKilograms(kg).Pounds, "0.000");

    /// <summary>Unit of <see cref="SmallMassNumber"/>: g or oz.</summary>
    public string SmallMassUnitName => display.Mass == MassUnit.Kilogram ? "g" : "oz";

    /// <summary>A mass of grams in <see cref="SmallMassUnitName"/>, for a column whose head names the unit.</summary>
    /// <param name="kg">Mass, kg.</param>
    public string SmallMassNumber(double kg) => display.Mass == MassUnit.Kilogram
        ? FixedDigits.Print(UnitsNet.Mass.FromKilograms(kg).Grams, "0.0")
        : FixedDigits.Print(UnitsNet.Mass.FromKilograms(kg).Ounces, "0.00");

    /// <summary>Mass per length in <see cref="MassPerLengthUnitName"/>.</summary>
    /// <param name="kgPerMetre">kg/m.</param>
    public string MassPerLengthNumber(double kgPerMetre) => FixedDigits.Print(
        display.Mass == MassUnit.Kilogram ? kgPerMetre : LinearDensity.FromKilogramsPerMeter(kgPerMetre).PoundsPerFoot, "0.000");

    /// <summary>A force in <see cref="ForceUnitName"/>, for a column whose head names the unit.</summary>
    /// <param name="newtons">Force, N.</param>
    public string ForceNumber(double newtons) => display.Force switch
    {
        ForceUnit.Newton => FixedDigits.Print(newtons, "0.0"),
        ForceUnit.Kilonewton => FixedDigits.Print(UnitsNet.Force.FromNewtons(newtons).Kilonewtons, "0.000"),
        _ => FixedDigits.Print(UnitsNet.Force.FromNewtons(newtons).PoundsForce, "0.0"),
    };

    /// <summary>A moment in <see cref="MomentUnitName"/>, for a column whose head names the unit.</summary>
    /// <param name="newtonMillimetres">Moment, N·mm.</param>
    public string MomentNumber(double newtonMillimetres)
    {
        Torque moment = Torque.FromNewtonMillimeters(newtonMillimetres);
        return display.Force switch
        {
            ForceUnit.Newton => FixedDigits.Print(moment.NewtonMeters, "0.0"),
            ForceUnit.Kilonewton => FixedDigits.Print(moment.KilonewtonMeters, "0.000"),
            _ => FixedDigits.Print(moment.PoundForceFeet, "0.0"),
        };
    }

    /// <summary>A length to be measured off: with decimal inches in brackets where rounding to a fraction would show, <c>6-3/8 in (6.354)</c>.</summary>
    /// <param name="mm">Length, mm.</param>
    public string MeasuredLength(double mm)
    {
        const double Visible = 0.05;
        if (display.Length != LengthUnit.Inch || display.Fraction is not { } parts)
        {
            return Length(mm);
        }

        double inches = UnitsNet.Length.FromMillimeters(mm).Inches;
        double lost = Math.Abs(inches - (Math.Round(inches * parts) / parts)) * 25.4;
        return lost < Visible ? Length(mm) : $"{Length(mm)} ({FixedDigits.Print(inches, "0.000")})";
    }

    /// <summary>A length to be measured off in <see cref="LengthUnitName"/>, for a column whose head names the unit; fractions of an inch with the decimals beside them, <c>6-3/8 (6.354)</c>.</summary>
    /// <param name="mm">Length, mm.</param>
    public string MeasuredNumber(double mm) => display.Length == LengthUnit.Inch && display.Fraction is not null
        ? $"{LengthNumber(mm)} ({FixedDigits.Print(UnitsNet.Length.FromMillimeters(mm).Inches, "0.000")})"
        : LengthNumber(mm);

    /// <summary>A small movement in <see cref="LengthUnitName"/>, three significant digits, at most six decimals: <c>0.0312</c>, <c>1.64</c>, <c>412</c>; never a fraction.</summary>
    /// <param name="mm">Length, mm.</param>
    public string SmallLengthNumber(double mm)
    {
        UnitsNet.Length length = UnitsNet.Length.FromMillimeters(mm);
        double value = display.Length switch
        {
            LengthUnit.Millimetre => mm,
            LengthUnit.Centimetre => length.Centimeters,
            _ => length.Inches,
        };
        int decimals = value == 0 ? 0 : Math.Clamp(2 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 6);

        // 0.9996 has three digits as 1.00, not as 1.000.
        decimals = value != 0 && Math.Round(Math.Abs(value), decimals) >= Math.Pow(10, 3 - decimals) ? Math.Max(0, decimals - 1) : decimals;
        return FixedDigits.Print(value, "F" + decimals.ToString(CultureInfo.InvariantCulture));
    }

    /// <summary>A section as a shop asks for it: a size in whole parts of an inch in inches where papers are in inches, any other as its name says.</summary>
    /// <param name="section">The section.</param>
    /// <returns><c>round 1.5 x 0.083 in</c>, <c>square 2 x 0.125 in</c>, <c>round 38 x 1.5 mm</c>.</returns>
    public string Section(Section section)
    {
        if (display.Length != LengthUnit.Inch)
        {
            return section.Name;
        }

        return section switch
        {
            RoundTube tube when Inches(tube.OutsideDiameter) is { } od && Inches(tube.Wall) is { } wall => $"round {od} x {wall} in",
            Rod rod when Inches(rod.Diameter) is { } diameter => $"rod {diameter} in",
            CellTube tube when Inches(tube.Height) is { } height && Inches(tube.Width) is { } width && Inches(tube.Wall) is { } wall =>
                $"{tube.Shape} {height} x {(tube.Shape is "square" ? string.Empty : $"{width} x ")}{wall} in{Corners(tube)}",
            _ => section.Name,
        };

        // Corners that are not the rule's, as the name has them; in millimetres where they are no inch size.
        static string Corners(CellTube tube)
        {
            int corner = tube.Name.IndexOf(" corner ", StringComparison.Ordinal);
            if (corner < 0 || tube is not FlatSidedTube flat)
            {
                return string.Empty;
            }

            bool hasInner = tube.Name.Contains(" inner ", StringComparison.Ordinal);
            return Inches(flat.OuterCorner) is { } outer && Inches(flat.InnerCorner) is { } inner
                ? $" corner {outer} in{(hasInner ? $" inner {inner} in" : string.Empty)}"
                : tube.Name[corner..];
        }

        // Inch sizes are printed to four decimals at most (0.083, 0.0625); a metric size is none of them.
        static string? Inches(double mm)
        {
            const double Rounding = 1e-9;
            double inches = UnitsNet.Length.FromMillimeters(mm).Inches;
            double printed = Math.Round(inches, 4);
            return Math.Abs(inches - printed) <= Rounding * Math.Max(inches, 1) ? printed.ToString("0.####", CultureInfo.InvariantCulture) : null;
        }
    }

    /// <summary>A section as a shop asks for it, and the size of the tube in hand where that was measured.</summary>
    /// <param name="chosen">The section as bought and as it is.</param>
    /// <returns><c>round 38 x 1.5 mm (measured 38.06 x 1.47 mm)</c>; <see cref="Section(Mechanics.Sections.Section)"/> where nothing was measured.</returns>
    public string Section(Candidate chosen) =>
        chosen.IsMeasured ? $"{Section(chosen.Nominal)} (measured {Measured(chosen)})" : Section(chosen.Nominal);

    /// <summary>What a caliper reads on the tube in hand, to 0.001 mm or 0.0001 in: <c>38.06 x 1.47 mm</c>; empty where nothing was measured.</summary>
    /// <param name="chosen">The section as bought and as it is.</param>
    public string Measured(Candidate chosen)
    {
        if (!chosen.IsMeasured)
        {
            return string.Empty;
        }

        bool inches = display.Length == LengthUnit.Inch;
        Section section = chosen.Section;
        double[] sizes = section switch
        {
            Rod => [section.Height],
            RoundTube => [section.Height, section.Wall],
            _ => [section.Height, section.Width, section.Wall],
        };
        IEnumerable<string> numbers = sizes.Select(mm => inches
            ? FixedDigits.Print(UnitsNet.Length.FromMillimeters(mm).Inches, "0.####")
            : FixedDigits.Print(mm, "0.###"));
        return $"{string.Join(" x ", numbers)} {(inches ? "in" : "mm")}";
    }

    /// <summary>What a target's value is multiplied with to be shown, and the unit it then has.</summary>
    /// <param name="unit">mm, deg, N/mm, N.m/deg, N.m2 or none.</param>
    public (double Scale, string Unit) TargetUnit(string unit) => (unit, display.Length, display.Force) switch
    {
        ("mm", LengthUnit.Centimetre, _) => (UnitsNet.Length.FromMillimeters(1).Centimeters, "cm"),
        ("mm", LengthUnit.Inch, _) => (UnitsNet.Length.FromMillimeters(1).Inches, "in"),
        ("N/mm", _, ForceUnit.PoundForce) => (UnitsNet.Force.FromNewtons(1).PoundsForce / UnitsNet.Length.FromMillimeters(1).Inches, "lbf/in"),
        ("N.m/deg", _, ForceUnit.PoundForce) => (Torque.FromNewtonMeters(1).PoundForceFeet, "lbf.ft/deg"),
        _ => (1, unit),
    };

    /// <summary>Inches rounded to a fraction in lowest terms: <c>16-1/4</c>, <c>3/8</c>, <c>-2</c>.</summary>
    private static string Fraction(double inches, int parts)
    {
        // A length of 1e9 mm in 64ths stays far below the range of long.
        long total = (long)Math.Round(Math.Abs(inches) * parts, MidpointRounding.AwayFromZero);
        string sign = inches < 0 && total > 0 ? "-" : string.Empty;
        (long whole, long over) = Math.DivRem(total, parts);
        long under = parts;
        while (over > 0 && over % 2 == 0)
        {
            (over, under) = (over / 2, under / 2);
        }

        string fraction = string.Create(CultureInfo.InvariantCulture, $"{over}/{under}");
        return (whole, over) switch
        {
            (_, 0) => string.Create(CultureInfo.InvariantCulture, $"{sign}{whole}"),
            (0, _) => sign + fraction,
            _ => string.Create(CultureInfo.InvariantCulture, $"{sign}{whole}-{fraction}"),
        };
    }
}
