using FrameGen.Diagnostics;
using FrameGen.Spec.Quantities;
using UnitsNet;
using Xunit;

namespace FrameGen.Tests.Spec;

/// <summary>Units against UnitsNet's typed quantities, which know nothing of this table.</summary>
public class UnitTests
{
    /// <summary>A unit of the format, and what one and a half of it are in working units.</summary>
    /// <remarks>Its factors of lbf/in, lbf/ft, lb/in³ and lbf·ft/deg are rounded to seven or ten digits: there its exact parts are divided.</remarks>
    public static TheoryData<string, double> Oracle => new()
    {
        { "mm", Length.FromMillimeters(1.5).Millimeters },
        { "cm", Length.FromCentimeters(1.5).Millimeters },
        { "m", Length.FromMeters(1.5).Millimeters },
        { "um", Length.FromMicrometers(1.5).Millimeters },
        { "µm", Length.FromMicrometers(1.5).Millimeters },
        { "in", Length.FromInches(1.5).Millimeters },
        { "inch", Length.FromInches(1.5).Millimeters },
        { "ft", Length.FromFeet(1.5).Millimeters },
        { "thou", Length.FromMils(1.5).Millimeters },
        { "mm2", Area.FromSquareMillimeters(1.5).SquareMillimeters },
        { "cm²", Area.FromSquareCentimeters(1.5).SquareMillimeters },
        { "m2", Area.FromSquareMeters(1.5).SquareMillimeters },
        { "in2", Area.FromSquareInches(1.5).SquareMillimeters },
        { "deg", Angle.FromDegrees(1.5).Radians },
        { "rad", Angle.FromRadians(1.5).Radians },
        { "g", Mass.FromGrams(1.5).Kilograms },
        { "kg", Mass.FromKilograms(1.5).Kilograms },
        { "t", Mass.FromTonnes(1.5).Kilograms },
        { "lb", Mass.FromPounds(1.5).Kilograms },
        { "N", Force.FromNewtons(1.5).Newtons },
        { "kN", Force.FromKilonewtons(1.5).Newtons },
        { "MN", Force.FromMeganewtons(1.5).Newtons },
        { "lbf", Force.FromPoundsForce(1.5).Newtons },
        { "kip", Force.FromKilopoundsForce(1.5).Newtons },
        { "kgf", Force.FromKilogramsForce(1.5).Newtons },
        { "Pa", Pressure.FromPascals(1.5).Megapascals },
        { "kPa", Pressure.FromKilopascals(1.5).Megapascals },
        { "MPa", Pressure.FromMegapascals(1.5).Megapascals },
        { "GPa", Pressure.FromGigapascals(1.5).Megapascals },
        { "N/mm2", Pressure.FromNewtonsPerSquareMillimeter(1.5).Megapascals },
        { "N/mm²", Pressure.FromNewtonsPerSquareMillimeter(1.5).Megapascals },
        { "psi", Pressure.FromPoundsForcePerSquareInch(1.5).Megapascals },
        { "ksi", Pressure.FromKilopoundsForcePerSquareInch(1.5).Megapascals },
        { "N/m", ForcePerLength.FromNewtonsPerMeter(1.5).NewtonsPerMillimeter },
        { "N/mm", ForcePerLength.FromNewtonsPerMillimeter(1.5).NewtonsPerMillimeter },
        { "kN/m", ForcePerLength.FromKilonewtonsPerMeter(1.5).NewtonsPerMillimeter },
        { "kN/mm", ForcePerLength.FromKilonewtonsPerMillimeter(1.5).NewtonsPerMillimeter },
        { "lbf/in", Force.FromPoundsForce(1.5).Newtons / Length.FromInches(1).Millimeters },
        { "lbf/ft", Force.FromPoundsForce(1.5).Newtons / Length.FromFeet(1).Millimeters },
        { "N.m", Torque.FromNewtonMeters(1.5).NewtonMillimeters },
        { "Nm", Torque.FromNewtonMeters(1.5).NewtonMillimeters },
        { "N·m", Torque.FromNewtonMeters(1.5).NewtonMillimeters },
        { "N*m", Torque.FromNewtonMeters(1.5).NewtonMillimeters },
        { "N.mm", Torque.FromNewtonMillimeters(1.5).NewtonMillimeters },
        { "kN.m", Torque.FromKilonewtonMeters(1.5).NewtonMillimeters },
        { "lbf.in", Torque.FromPoundForceInches(1.5).NewtonMillimeters },
        { "lbf.ft", Torque.FromPoundForceFeet(1.5).NewtonMillimeters },
        { "N.m/rad", RotationalStiffness.FromNewtonMetersPerRadian(1.5).NewtonMillimetersPerRadian },
        { "N.m/deg", RotationalStiffness.FromNewtonMetersPerDegree(1.5).NewtonMillimetersPerRadian },
        { "Nm/deg", RotationalStiffness.FromNewtonMetersPerDegree(1.5).NewtonMillimetersPerRadian },
        { "lbf.ft/deg", Torque.FromPoundForceFeet(1.5).NewtonMillimeters / Angle.FromDegrees(1).Radians },
        { "lbf.in/deg", Torque.FromPoundForceInches(1.5).NewtonMillimeters / Angle.FromDegrees(1).Radians },
        { "kg/m3", Density.FromKilogramsPerCubicMeter(1.5).KilogramsPerCubicMillimeter },
        { "g/cm³", Density.FromGramsPerCubicCentimeter(1.5).KilogramsPerCubicMillimeter },
        { "lb/in3", Mass.FromPounds(1.5).Kilograms / Volume.FromCubicInches(1).CubicMillimeters },
        { "m/s2", Acceleration.FromMetersPerSecondSquared(1.5).MillimetersPerSecondSquared },
        { "Hz", Frequency.FromHertz(1.5).Hertz },
        { "%", Ratio.FromPercent(1.5).DecimalFractions },
    };

    [Theory]
    [MemberData(nameof(Oracle))]
    public void Agrees_with_a_foreign_table(string unit, double expected)
    {
        LiteralExpression literal = Plain($"1.5 {unit}");

        // The foreign table adds rounding errors of its own; 1e-12 is far below the last digit of any factor.
        Assert.Equal(expected, literal.Value, Math.Abs(expected) * 1e-12);
    }

    [Theory]
    [MemberData(nameof(Oracle))]
    public void Measures_the_same_in_an_expression(string unit, double expected)
    {
        KindInfo kind = KindInfo.Of(Plain($"1.5 {unit}").Unit!.Kind);
        var parsed = new ExpressionSource($"=1.5 {unit}", new SourcePlace("a.yaml", 1, 1), 1);
        Measure measure = ExpressionEvaluator.Evaluate(ExpressionParser.Parse(parsed), _ => default);
        Assert.Equal(expected, measure.Value * kind.WorkingPerBase, Math.Abs(expected) * 1e-12);
    }

    [Fact]
    public void Every_unit_of_the_format_is_in_the_foreign_comparison_or_a_plain_variant_of_one()
    {
        var compared = Oracle.Select(row => UnitTable.Find(row.Data.Item1)!.Name).ToHashSet(StringComparer.Ordinal);
        string[] variants =
        [
            "Nmm", "kNm", "N.mm/rad", "N.mm/deg", "Nm/rad", "kN.m/rad", "kN.m/deg", "lbf.in/rad", "lbf.ft/rad", "kg/mm3", "mm/s2", "N.m2", "N.mm2",
        ];
        Assert.DoesNotContain(UnitTable.All, unit => !compared.Contains(unit.Name) && !variants.Contains(unit.Name, StringComparer.Ordinal));
    }

    // Written out from the definitions: 1 in = 25.4 mm, 1 lb = 0.45359237 kg (international yard and pound agreement, 1959),
    // standard gravity 9.80665 m/s² (3rd CGPM, 1901).
    [Theory]
    [InlineData("1.5 in", 38.1)]
    [InlineData("1-1/2 in", 38.1)]
    [InlineData("1 1/2 in", 38.1)]
    [InlineData("1/2 in", 12.7)]
    [InlineData("-1-1/2 in", -38.1)]
    [InlineData("5 ft 3 in", 1600.2)]
    [InlineData("5 ft 3-1/2 in", 1612.9)]
    [InlineData("5ft 3in", 1600.2)]
    [InlineData("0.065 in", 1.651)]
    [InlineData(".5 in", 12.7)]
    [InlineData("38mm", 38)]
    [InlineData("+38 mm", 38)]
    [InlineData("3.8e1 mm", 38)]
    [InlineData("1 lbf", 4.4482216152605)]
    [InlineData("1 kip", 4448.2216152605)]
    [InlineData("1 kgf", 9.80665)]
    [InlineData("7.85 g/cm3", 7.85e-6)]
    [InlineData("7850 kg/m³", 7.85e-6)]
    [InlineData("210 GPa", 210000)]
    [InlineData("90 deg", Math.PI / 2)]
    [InlineData("40 %", 0.4)]
    [InlineData("450 N.m2", 450e6)]
    [InlineData("2.0", 2)]
    public void Is_exact_to_the_last_bit(string written, double expected) => Assert.Equal(expected, Plain(written).Value);

    [Fact]
    public void An_inch_size_finds_its_twin_in_millimetres()
    {
        for (int sixteenths = 1; sixteenths < 200; sixteenths++)
        {
            // A sixteenth of an inch is 1.5875 mm: four decimals, which the division of whole numbers gives exactly rounded.
            Assert.Equal(sixteenths * 15875 / 10000.0, Plain($"{sixteenths}/16 in").Value);
        }
    }

    [Theory]
    [InlineData("38 mmm", 3, "unknown unit 'mmm'; did you mean 'mm'?")]
    [InlineData("38 Mm", 3, "unknown unit 'Mm'; did you mean 'mm'?")]
    [InlineData("2 KN", 2, "did you mean 'kN'?")]
    [InlineData("5 lbs", 2, "did you mean 'lb'?")]
    [InlineData("9 furlongs", 2, "unknown unit 'furlongs'")]
    [InlineData("2 mm^2", 2, "write 'mm2'")]
    [InlineData("1,5 mm", 1, "decimal comma in '1,5'; write a point, as in 1.5")]
    [InlineData("1,200 mm", 1, "decimal comma")]
    [InlineData("-1,5 mm", 2, "decimal comma")]
    [InlineData("38 mm 2", 6, "more than one value")]
    [InlineData("5 ft 3", 5, "more than one value")]
    [InlineData("5 in 3 ft", 5, "more than one value")]
    [InlineData("1-5/4 in", 2, "must be less than one")]
    [InlineData("1/0 in", 0, "divides by zero")]
    [InlineData("mm", 0, "does not begin with a number")]
    [InlineData("--5 mm", 0, "does not begin with a number")]
    [InlineData(".inf", 0, "no finite number")]
    [InlineData(".nan", 0, "no finite number")]
    [InlineData("5 mm; 3 mm", 4, "means nothing")]
    public void Says_what_is_no_value_and_where(string written, int offset, string message)
    {
        ValueException wrong = Assert.Throws<ValueException>(() => Plain(written));
        Assert.Contains(message, wrong.Message, StringComparison.Ordinal);
        Assert.Equal(offset, wrong.Offset);
    }

    private static LiteralExpression Plain(string text) =>
        PlainValue.Read(new ExpressionSource(text, new SourcePlace("a.yaml", 1, 1), 1));
}
