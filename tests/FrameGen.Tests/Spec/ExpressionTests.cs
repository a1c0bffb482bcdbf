using FrameGen.Diagnostics;
using FrameGen.Spec;
using FrameGen.Spec.Quantities;
using Xunit;

namespace FrameGen.Tests.Spec;

public class ExpressionTests
{
    private static readonly (string Name, string Value)[] Parameters =
    [
        ("deck", "1200 mm"), ("width", "640 mm"), ("payload", "90 kg"), ("lift", "0.9 kN"), ("slope", "30 deg"), ("wall-gap", "3 mm"), ("n", "4"),
    ];

    // Expected values are worked out by hand.
    [Theory]
    [InlineData("=deck/2 + 40 mm", QuantityKind.Length, 640)]
    [InlineData("=-deck", QuantityKind.Length, -1200)]
    [InlineData("=deck - width - 10 mm", QuantityKind.Length, 550)]
    [InlineData("=deck / 2 / 3", QuantityKind.Length, 200)]
    [InlineData("=2 * (deck + width)", QuantityKind.Length, 3680)]
    [InlineData("=wall-gap * n", QuantityKind.Length, 12)]
    [InlineData("=DECK", QuantityKind.Length, 1200)]
    [InlineData("=2 mm ^ 2", QuantityKind.Area, 4)]
    [InlineData("=2 ^ 3 ^ 2", QuantityKind.Number, 512)]
    [InlineData("=-2 ^ 2", QuantityKind.Number, -4)]
    [InlineData("=2 ^ -1", QuantityKind.Number, 0.5)]
    [InlineData("=1 + 2 * 3 - 4 / 2", QuantityKind.Number, 5)]
    [InlineData("=10 - 3 - 2", QuantityKind.Number, 5)]
    [InlineData("=hypot(300 mm, 400 mm)", QuantityKind.Length, 500)]
    [InlineData("=sqrt(deck * 3 mm)", QuantityKind.Length, 60)]
    [InlineData("=sin(slope)", QuantityKind.Number, 0.5)]
    [InlineData("=cos(60 deg)", QuantityKind.Number, 0.5)]
    [InlineData("=tan(45 deg)", QuantityKind.Number, 1)]
    [InlineData("=sin(pi/2 * 1 rad)", QuantityKind.Number, 1)]
    [InlineData("=asin(1)", QuantityKind.Angle, Math.PI / 2)]
    [InlineData("=acos(0)", QuantityKind.Angle, Math.PI / 2)]
    [InlineData("=atan(1)", QuantityKind.Angle, Math.PI / 4)]
    [InlineData("=atan2(1 mm, -1 mm)", QuantityKind.Angle, 3 * Math.PI / 4)]
    [InlineData("=abs(-deck)", QuantityKind.Length, 1200)]
    [InlineData("=min(deck, width, 2 m)", QuantityKind.Length, 640)]
    [InlineData("=max(deck, width)", QuantityKind.Length, 1200)]
    [InlineData("=round(2.5)", QuantityKind.Number, 3)]
    [InlineData("=round(-2.5)", QuantityKind.Number, -3)]
    [InlineData("=floor(2.7)", QuantityKind.Number, 2)]
    [InlineData("=ceil(2.1)", QuantityKind.Number, 3)]
    [InlineData("=round(deck / 7 / 1 mm) * 1 mm", QuantityKind.Length, 171)]
    [InlineData("=payload * g", QuantityKind.Force, 90 * 9.80665)]
    [InlineData("=payload * g / deck", QuantityKind.LineLoad, 90 * 9.80665 / 1200)]
    [InlineData("=lift * deck", QuantityKind.Moment, 1080000)]
    [InlineData("=lift / (10 mm * 9 mm)", QuantityKind.Stress, 10)]
    [InlineData("=lift / 15 mm", QuantityKind.Stiffness, 60)]
    [InlineData("=18 N.m / 1.5 rad", QuantityKind.TurningStiffness, 12000)]
    [InlineData("=12 N.m/rad * 2 rad", QuantityKind.Moment, 24000)]
    [InlineData("=deck * 0.5 rad", QuantityKind.Length, 600)]
    [InlineData("=payload / (1 m2 * 30 mm)", QuantityKind.Density, 3e-6)]
    [InlineData("=5 N/m", QuantityKind.LineLoad, 0.005)]
    [InlineData("=g", QuantityKind.Acceleration, 9806.65)]
    [InlineData("=sqrt(4 N/mm / 1 kg)", QuantityKind.Frequency, 63.24555320336759)]
    [InlineData("=deck * 40 %", QuantityKind.Length, 480)]
    [InlineData("=1/4", QuantityKind.Share, 0.25)]
    [InlineData("=50 % / 2", QuantityKind.Share, 0.25)]
    [InlineData("=900 N.m2 / 2", QuantityKind.BendingStiffness, 450e6)]
    public void Comes_to(string written, QuantityKind kind, double expected)
    {
        (double? value, DiagnosticList diagnostics) = Evaluate(written, kind);
        Assert.Empty(diagnostics);
        Assert.Equal(expected, value!.Value, Math.Abs(expected) * 1e-14);
    }

    [Theory]
    [InlineData("=deck + 3 kg", 6, "`deck` is a length (mm) and `3 kg` is a mass (kg): they can't be added")]
    [InlineData("=deck - 2", 6, "`deck` is a length (mm) and `2` is a plain number: they can't be subtracted")]
    [InlineData("=1 + 3 deg", 3, "`1` is a plain number and `3 deg` is an angle (rad)")]
    [InlineData("=12 N.m + 12 N.m/deg", 8, "a moment (N.mm) and `12 N.m/deg` is a turning stiffness (N.mm/rad)")]
    [InlineData("=(deck + width) * width + 3 mm", 24, "`(deck + width) * width` is an area (mm2)")]
    [InlineData("=payload", 0, "expected a length such as `38 mm` or `1.5 in`, got a mass (kg): 90 kg")]
    [InlineData("=3", 0, "expected a length such as `38 mm` or `1.5 in`, got the plain number 3")]
    [InlineData("=sin(30) * 1 mm", 5, "sin takes an angle, and `30` is a plain number; write `30 deg`")]
    [InlineData("=sin(deck) * 1 mm", 5, "sin takes an angle, and `deck` is a length (mm)")]
    [InlineData("=round(deck)", 7, "round takes a plain number, and `deck` is a length (mm)")]
    [InlineData("=acos(2) / 1 rad * 1 mm", 6, "from -1 to 1, and `2` is 2")]
    [InlineData("=sqrt(-4) * 1 mm", 6, "no negative value")]
    [InlineData("=sqrt(deck)", 6, "has no unit")]
    [InlineData("=deck ^ 0.5", 6, "its power 0.5 has no unit")]
    [InlineData("=2 ^ deck", 5, "a power must be a plain number")]
    [InlineData("=min(deck, payload)", 11, "`deck` is a length (mm), `payload` a mass (kg)")]
    [InlineData("=deck / (n - 4)", 8, "`(n - 4)` is 0")]
    [InlineData("=0 ^ -1 * 1 mm", 1, "no negative power")]
    [InlineData("=1e200 * 1e200 * 1 mm", 1, "too large or no number")]
    [InlineData("=deck * 1e7", 0, "larger than any frame needs (at most 1E+09 mm)")]
    [InlineData("=dekc", 1, "unknown parameter 'dekc'; did you mean 'deck'?")]
    [InlineData("=deck-2", 1, "unknown parameter 'deck-2'; did you mean 'deck'?")]
    [InlineData("=width-deck", 1, "put spaces round a minus")]
    [InlineData("=5 N/m2 * 1 m2", 5, "a unit stands straight behind a number, as in 1 m2")]
    [InlineData("=n * kg", 5, "a unit stands straight behind a number, as in 1 kg")]
    public void Refuses_what_has_no_meaning_and_says_where(string written, int offset, string message)
    {
        (double? value, DiagnosticList diagnostics) = Evaluate(written, QuantityKind.Length);
        Assert.Null(value);
        Diagnostic error = Assert.Single(diagnostics);
        Assert.Contains(message, error.Message, StringComparison.Ordinal);
        Assert.Equal((9, 20 + offset), (error.At!.Line, error.At.Column));
    }

    [Theory]
    [InlineData("=", 1, "ends where a value is missing")]
    [InlineData("=deck +", 7, "ends where a value is missing")]
    [InlineData("=deck 5", 6, "expected an operator")]
    [InlineData("=(deck", 1, "never closed")]
    [InlineData("=deck)", 5, "closes nothing")]
    [InlineData("=max(1 2)", 7, "expected ')'")]
    [InlineData("=*2", 1, "expected a number, a parameter or '('")]
    [InlineData("=2 deck", 3, "For a parameter write 2 * deck")]
    [InlineData("=5 mmm", 3, "unknown unit 'mmm'; did you mean 'mm'?")]
    [InlineData("=sine(2 deg)", 1, "unknown function 'sine'; did you mean 'sin'?")]
    [InlineData("=sin(1 deg, 2 deg)", 1, "sin takes one value, not 2")]
    [InlineData("=atan2(1)", 1, "atan2 takes two values")]
    [InlineData("=1,5 mm", 2, "expected an operator")]
    public void Refuses_what_is_no_expression(string written, int offset, string message)
    {
        ValueException wrong = Assert.Throws<ValueException>(() => Parse(written));
        Assert.Contains(message, wrong.Message, StringComparison.Ordinal);
        Assert.Equal(offset, wrong.Offset);
    }

    [Fact]
    public void Nests_a_hundred_deep_and_no_deeper()
    {
        Assert.NotNull(Parse($"={new string('(', 99)}1{new string(')', 99)}"));
        Assert.Contains("nested deeper than 100", Assert.Throws<ValueException>(() => Parse($"={new string('(', 100)}1{new string(')', 100)}")).Message, StringComparison.Ordinal);
        Assert.Contains("nested deeper than 100", Assert.Throws<ValueException>(() => Parse($"={new string('-', 4000)}1")).Message, StringComparison.Ordinal);
        Assert.Contains("nested deeper than 100", Assert.Throws<ValueException>(() => Parse($"=1{string.Concat(Enumerable.Repeat("^1", 1000))}")).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Is_at_most_4096_characters_long_and_sums_that_long_are_fine()
    {
        string sum = "=1" + string.Concat(Enumerable.Repeat("+1", 2047));
        Assert.Equal(4096, sum.Length);
        Assert.Equal(2048, ExpressionEvaluator.Evaluate(Parse(sum), _ => default).Value);
        Assert.Contains("4097 characters", Assert.Throws<ValueException>(() => Parse(sum + " ")).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Parameters_use_each_other_in_any_order()
    {
        (ParameterTable table, DiagnosticList diagnostics) = Table(("a", "=b + 1 mm"), ("b", "=c * 2"), ("c", "5 mm"));
        Assert.Equal(11, table.Value(Quantity("=a", QuantityKind.Length), diagnostics));
        Assert.Empty(diagnostics);
    }

    [Fact]
    public void A_long_chain_of_parameters_needs_no_deep_stack()
    {
        (string Name, string Value)[] chain = [.. Enumerable.Range(0, 20000).Select(i => ($"p{i}", $"=p{i + 1}")), ("p20000", "7 mm")];
        (ParameterTable table, DiagnosticList diagnostics) = Table(chain);
        Assert.Equal(7, table.Value(Quantity("=p0", QuantityKind.Length), diagnostics));
        Assert.Empty(diagnostics);
    }

    [Fact]
    public void A_circle_is_shown_once_and_what_uses_it_is_silent()
    {
        (ParameterTable table, DiagnosticList diagnostics) = Table(("a", "=b"), ("b", "=c + 1 mm"), ("c", "=a"), ("d", "=a"), ("e", "3 mm"));
        Assert.Contains("a -> b -> c -> a", Assert.Single(diagnostics).Message, StringComparison.Ordinal);
        Assert.Null(table.Value(Quantity("=d + e", QuantityKind.Length), diagnostics));
        Assert.Single(diagnostics);
        Assert.Equal(3, table.Value(Quantity("=e", QuantityKind.Length), diagnostics));
    }

    [Fact]
    public void A_parameter_that_uses_itself_is_a_circle() =>
        Assert.Contains("a -> a", Assert.Single(Table(("a", "=a")).Diagnostics).Message, StringComparison.Ordinal);

    [Theory]
    [InlineData("1e10 mm", "parameter 'p' is 1E+10 mm, larger than any frame needs (at most 1E+09 mm)")]
    [InlineData("1e16 N", "parameter 'p' is 1E+16 N")]
    [InlineData("=1 kg * 1e16", "parameter 'p' is 1E+16 kg")]
    public void A_parameter_out_of_all_bounds_is_named_with_its_value(string value, string message) =>
        Assert.Contains(message, Assert.Single(Table(("p", value)).Diagnostics).Message, StringComparison.Ordinal);

    [Fact]
    public void The_range_of_a_place_holds_for_expressions_too()
    {
        (ParameterTable table, DiagnosticList diagnostics) = Table(("deck", "1200 mm"));
        SpecQuantity quantity = Quantity("=-deck", QuantityKind.Length) with { Range = ValueRange.Positive };
        Assert.Null(table.Value(quantity, diagnostics));
        Assert.Contains("must be more than 0; it comes to -1200 mm", Assert.Single(diagnostics).Message, StringComparison.Ordinal);
    }

    private static (double? Value, DiagnosticList Diagnostics) Evaluate(string written, QuantityKind kind)
    {
        (ParameterTable table, DiagnosticList diagnostics) = Table(Parameters);
        Assert.Empty(diagnostics);
        return (table.Value(Quantity(written, kind), diagnostics), diagnostics);
    }

    private static (ParameterTable Table, DiagnosticList Diagnostics) Table(params (string Name, string Value)[] parameters)
    {
        var diagnostics = new DiagnosticList();
        ParameterSpec[] specs =
        [
            .. parameters.Select((parameter, line) => new ParameterSpec(
                new Placed<string>(parameter.Name, new SourcePlace("a.yaml", line + 1, 1)),
                Parse(parameter.Value, line + 1),
                new SourcePlace("a.yaml", line + 1, 20))),
        ];
        return (ParameterTable.Evaluate(specs, diagnostics), diagnostics);
    }

    private static SpecQuantity Quantity(string written, QuantityKind kind) => new(kind, Parse(written, 9), new SourcePlace("a.yaml", 9, 20));

    private static Expression Parse(string written, int line = 1)
    {
        var source = new ExpressionSource(written, new SourcePlace("a.yaml", line, 20), 20);
        return written.StartsWith('=') ? ExpressionParser.Parse(source) : PlainValue.Read(source);
    }
}
